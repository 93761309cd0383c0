//! What is known of a member.

use super::{HoverOptions, escaped, picture};
use crate::analysis::design::MemberAt;
use crate::analysis::inputs::{Names, row_of};
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::{Gap, LimitFrom, Outcome};
use crate::design::inherit::{Inherited, Origin};
use crate::design::model::member::SectionChoice;
use crate::editor::hover::product;
use crate::editor::view::View;
use crate::report::schedule::row::{Row, row};
use crate::units::{DisplayUnits, Length, SectionFactor, significant};

/// A member's section factor, limit, heating, protection and verdict, with its curve.
pub fn summary(view: &View<'_>, at: MemberAt, options: HoverOptions) -> Option<String> {
    let outcome = view.outcome(at)?;
    let member = view.design.member(at).value();
    let names = Names {
        design: view.design,
        options: lookup_options(view.design.basis()),
    };
    let row = row(&names, member, outcome);
    let units = view.design.units();
    let mut lines = vec![headline(&row)];
    let mut facts: Vec<String> = Vec::new();
    facts.extend(factor(&row, outcome, units));
    facts.extend(limit(outcome, units));
    facts.extend(bare(&row, outcome, units));
    facts.extend(behind(&row, outcome, units));
    facts.extend(gaps(outcome));
    facts.push(format!("verdict: **{}**", row.verdict));
    lines.push(listed(facts));
    lines.extend(picture::heating(view, at, options));
    let inherited = inherited(&view.design.inherited(member));
    if !inherited.is_empty() {
        lines.push(format!("Inherited: {}", inherited.join("; ")));
    }
    Some(lines.join("\n\n"))
}

fn listed(facts: Vec<String>) -> String {
    let lines: Vec<String> = facts.into_iter().map(|fact| format!("- {fact}")).collect();
    lines.join("\n")
}

fn headline(row: &Row) -> String {
    let known = [&row.section, &row.role, &row.steel].into_iter().flatten();
    let known: Vec<String> = known.map(|text| escaped(text)).collect();
    let mark = escaped(row.mark.as_deref().unwrap_or("member without a mark"));
    format!("**{mark}** {}", known.join(", "))
}

fn factor(row: &Row, outcome: &Outcome, units: DisplayUnits) -> Option<String> {
    let section = outcome.section.as_ref()?;
    let casing = match &row.form {
        Some(form) => format!("{form} outline"),
        None => "bare outline".to_owned(),
    };
    let exposure = row.exposure.as_deref().unwrap_or("unknown exposure");
    let mut text = format!(
        "section factor: **{}** (V/A {}), {exposure}, {casing}",
        units.section_factor(section.factor),
        units.thickness(section.factor.effective_thickness())
    );
    if row.product.is_none() && section.shadow_factor < 1.0 {
        text.push_str(&format!("; shadow factor {}", significant(section.shadow_factor, 2)));
    }
    Some(text)
}

fn limit(outcome: &Outcome, units: DisplayUnits) -> Option<String> {
    let critical = outcome.critical.as_ref()?;
    let from = match critical.from {
        LimitFrom::Loading => format!("from the loading ({})", escaped(&critical.governing)),
        LimitFrom::Stated => "as stated".to_owned(),
        LimitFrom::Default => "the default of the design, assumed".to_owned(),
    };
    Some(format!(
        "critical temperature: **{}** {from}",
        units.temperature(critical.as_built)
    ))
}

fn bare(row: &Row, outcome: &Outcome, units: DisplayUnits) -> Option<String> {
    let bare = outcome.bare?;
    let lasts = bare
        .resistance
        .map(|time| format!("critical after {:.0} min", time.min().floor()));
    let lasts = lasts.or_else(|| {
        outcome
            .critical
            .as_ref()
            .map(|_| "not critical within 360 min".to_owned())
    });
    let at = bare.at_period.zip(row.period_min);
    let at = at.map(|(celsius, period)| format!("{} at {period:.0} min", units.temperature(celsius)));
    let known: Vec<String> = [lasts, at].into_iter().flatten().collect();
    (!known.is_empty()).then(|| format!("bare: {}", known.join(", ")))
}

fn behind(row: &Row, outcome: &Outcome, units: DisplayUnits) -> Option<String> {
    let state = outcome.protected.as_ref()?;
    let film = row.coats.is_some() || row.litres.is_some();
    let shown = |value: Length| {
        if film {
            units.film(value)
        } else {
            units.thickness(value)
        }
    };
    let needs = match &state.requirement {
        Ok(needed) if film => format!("needs {}", units.needed_film(needed.exact)),
        Ok(needed) => format!("needs {}", units.needed_thickness(needed.exact)),
        Err(refusal) => format!("**{}**", refusal.words(units)),
    };
    let has = state.provided.map(|provided| {
        let whose = if state.stated { "has" } else { "would take" };
        format!("{whose} {}", shown(provided))
    });
    let at = state.at_period.zip(row.period_min);
    let at = at.map(|(celsius, period)| format!("{} at {period:.0} min", units.temperature(celsius)));
    let lasts = state
        .resistance
        .map(|time| format!("lasts {:.0} min", time.min().floor()));
    let product = escaped(row.product.as_deref().unwrap_or("protection"));
    let known: Vec<String> = [Some(needs), has, at, lasts].into_iter().flatten().collect();
    Some(format!("{product}: {}", known.join(", ")))
}

fn gaps(outcome: &Outcome) -> Vec<String> {
    let words = outcome.gaps.iter().map(|gap| match gap {
        Gap::Unread(key) => format!("`{key}` is lacking or can't be read"),
        Gap::CriticalTemperature(why) => format!("the critical temperature is not known: {}", escaped(why)),
        Gap::Missing(key) => format!("`{key}` is missing"),
        Gap::FailsCold(utilisation) => {
            format!(
                "the load exceeds the resistance at 20 °C ({} of it)",
                significant(*utilisation, 2)
            )
        }
        Gap::NotCovered { key, why } => format!("`{key}`: {}", escaped(why)),
    });
    words.map(|words| format!("not verified: {words}")).collect()
}

/// What the member does not state itself, and whose it is.
fn inherited(keys: &Inherited<'_>) -> Vec<String> {
    let mut found = Vec::new();
    let mut note = |name: &str, origin: Origin| match origin {
        Origin::Group => found.push(format!("`{name}` from the group")),
        Origin::Defaults => found.push(format!("`{name}` from `defaults`")),
        Origin::Member | Origin::BuiltIn => {}
    };
    note("role", keys.get(|k| &k.role).origin);
    note("section", keys.get(|k| &k.section).origin);
    note("steel", keys.get(|k| &k.steel).origin);
    note("exposure", keys.get(|k| &k.exposure).origin);
    note("period", keys.get(|k| &k.period).origin);
    note("fire", keys.get(|k| &k.fire).origin);
    note("critical temperature", keys.get(|k| &k.critical_temperature).origin);
    note("loading", keys.get(|k| &k.loading).origin);
    note("protection", keys.get(|k| &k.protection).origin);
    found
}

/// A section: its dimensions, area and mass, and its factors for the member's exposure.
pub fn section(view: &View<'_>, at: MemberAt) -> Option<String> {
    let member = view.design.member(at).value();
    let keys = view.design.inherited(member);
    let choice = keys.get(|k| &k.section).value()?;
    let units = view.design.units();
    let outcome = view.outcome(at)?;
    let mut facts = Vec::new();
    let name = match (row_of(Some(choice), &lookup_options(view.design.basis())), choice) {
        (Some(row), _) => {
            let shape = match row.shape.name() {
                "i" => "I or H section",
                name => name,
            };
            facts.push(format!("{shape}, {}", row.standard));
            facts.push(format!("{} kg/m", significant(row.mass.kg_m(), 1)));
            row.designation.to_string()
        }
        (None, SectionChoice::Shape(shape)) => shape.name().to_owned(),
        (None, _) => return None,
    };
    if let Some(section) = &outcome.section {
        facts.push(format!("area {} mm²", significant(section.area.mm2(), 0)));
        let factor = |name: &str, value: SectionFactor| {
            let thickness = units.thickness(value.effective_thickness());
            format!("{name}: {} (V/A {thickness})", units.section_factor(value))
        };
        facts.push(factor("bare outline", section.bare_factor));
        facts.extend(section.box_factor.map(|value| factor("box", value)));
        facts.extend(section.class.map(|class| format!("class {class} in fire")));
    }
    Some(format!("**{}**\n\n{}", escaped(&name), listed(facts)))
}

/// The product that protects a member, and what it is assessed for.
pub fn protection(view: &View<'_>, at: MemberAt) -> Option<String> {
    let member = view.design.member(at).value();
    let keys = view.design.inherited(member);
    let name = &keys.get(|k| &k.protection).value()?.product.as_ref()?.value;
    let (_, item) = view.design.product(name)?;
    Some(product::of(item.value(), view.design.units()))
}
