//! Findings of a single member, from its outcome.

use std::sync::Arc;

use jiff::civil::Date;

use super::finding::{Finding, Fix, FixEdit, Place};
use crate::analysis::design::{Design, MemberAt};
use crate::analysis::exposure::{ShieldDoubt, reached};
use crate::analysis::outcome::{Gap, LimitFrom, Outcome, ProtectedState, Verdict};
use crate::design::model::member::{Environment, Period, Protection, Surface};
use crate::heating::fire::Fire;
use crate::protection::product::Kind;
use crate::protection::requirement::Refusal;
use crate::protection::stock::BuildUp;
use crate::section::Exposure;
use crate::text::Span;
use crate::units::{Length, SectionFactor, significant};

/// A member with all that its findings are made from.
pub(super) struct Context<'a> {
    pub(super) design: &'a Design,
    pub(super) at: MemberAt,
    pub(super) outcome: &'a Outcome,
    pub(super) mark: String,
    out: &'a mut Vec<Finding>,
}

impl Context<'_> {
    /// Adds a finding at a key's value in the member itself, or at its mark.
    pub(super) fn add(&mut self, name: &str, key: &'static str, span: Option<Span>, message: String) {
        let item = self.design.member(self.at);
        let span = span.or_else(|| item.value().mark.span()).unwrap_or_default();
        let place = Place {
            path: Arc::clone(&self.design.files[self.at.file].path),
            span: item.place(span),
        };
        if let Some(mut finding) = Finding::new(name, place, message) {
            finding.mark = Some(self.mark.clone());
            finding.key = Some(key.to_owned());
            self.out.push(finding);
        }
    }

    pub(super) fn fix(&mut self, title: String, span: Span, text: String) {
        let item = self.design.member(self.at);
        let place = Place {
            path: Arc::clone(&self.design.files[self.at.file].path),
            span: item.place(span),
        };
        if let Some(finding) = self.out.last_mut() {
            finding.fixes.push(Fix {
                title,
                safe: false,
                edits: vec![FixEdit { place, text }],
            });
        }
    }
}

pub(super) fn factor(value: SectionFactor) -> String {
    format!(
        "{:.0} 1/m (V/A {} mm)",
        value.per_m(),
        significant(value.effective_thickness().mm(), 1)
    )
}

fn thickness(value: Length, film: bool) -> String {
    if film {
        format!("{:.0} µm", (value.um() - 1e-6).ceil())
    } else {
        format!("{} mm", significant(value.mm(), 1))
    }
}

/// Every finding of one member.
pub fn member(design: &Design, at: MemberAt, outcome: &Outcome, on: Date, out: &mut Vec<Finding>) {
    let member = design.member(at).value();
    let keys = design.inherited(member);
    let mark = member.mark.value().cloned().unwrap_or_else(|| "this member".to_owned());
    let mut cx = Context {
        design,
        at,
        outcome,
        mark,
        out,
    };
    let own = &member.keys;
    if !member.broken {
        for key in outcome
            .gaps
            .iter()
            .filter_map(|gap| if let Gap::Unread(key) = gap { Some(*key) } else { None })
        {
            let absent = match key {
                "role" => keys.get(|k| &k.role).given.is_absent(),
                "section" => keys.get(|k| &k.section).given.is_absent(),
                "steel" => keys.get(|k| &k.steel).given.is_absent(),
                "period" => keys.get(|k| &k.period).given.is_absent(),
                _ => false,
            };
            if absent {
                let message = format!("{} has no `{key}`, nor has its group or `defaults`", cx.mark);
                cx.add("missing-key", key, None, message);
            }
        }
    }
    gaps(&mut cx, own.loading.span());
    let shield = keys.get(|k| &k.shield).value().copied();
    let exposure = keys.get(|k| &k.exposure).value().copied().unwrap_or(Exposure::AllRound);
    if let Some(doubt) = reached(exposure, shield).doubt {
        let why = match doubt {
            ShieldDoubt::NotStated => {
                "nothing is said to cover the rest: state `shielded by` (computed as stated, κ1 = 1)".to_owned()
            }
            ShieldDoubt::NoShield => "bare sheeting or nothing is no shield: computed all round".to_owned(),
            ShieldDoubt::LowContact(share) => {
                format!(
                    "the deck touches {:.0} % of the flange, less than 85 %, and its voids are not filled: computed all round",
                    100.0 * share
                )
            }
            ShieldDoubt::VoidsOpen => {
                "the deck's contact is not stated and its voids are not filled: computed all round".to_owned()
            }
        };
        let message = format!("{} is exposed on part of its faces, but {why}", cx.mark);
        cx.add("shield-not-stated", "exposure", own.exposure.span(), message);
    }
    let period = match keys.get(|k| &k.period).value() {
        Some(Period::Of(time)) => Some(time.min()),
        _ => None,
    };
    if let Some(section) = &outcome.section {
        if section.below_ten {
            let message = format!("{} has {}: 10 1/m is used", cx.mark, factor(section.factor));
            cx.add("section-factor-low", "section", own.section.span(), message);
        }
        let thin = section.factor.effective_thickness().mm() < 3.5;
        if thin && period.is_some_and(|min| min >= 60.0) {
            let message = format!(
                "{} is thin steel for {:.0} min: {}",
                cx.mark,
                period.unwrap_or_default(),
                factor(section.factor)
            );
            cx.add("thin-steel", "section", own.section.span(), message);
        }
    }
    let fire_name = keys.get(|k| &k.fire).value().map_or("standard", String::as_str);
    fire(&mut cx, fire_name, own.fire.span());
    if matches!(
        keys.get(|k| &k.surface).value(),
        Some(Surface::GalvanisedTo { category: 'A' | 'B' })
    ) {
        let message = format!(
            "{} is computed with an emissivity of 0.35 up to 500 °C for its declared zinc coating",
            cx.mark
        );
        cx.add("galvanised-benefit-claimed", "surface", own.surface.span(), message);
    }
    let Some(minutes) = period else { return };
    let protection = keys.get(|k| &k.protection).value();
    let environment = keys.get(|k| &k.environment).value().copied();
    match (
        &outcome.protected,
        protection.and_then(|p| p.product.as_ref().map(|name| (p, name))),
    ) {
        (Some(state), Some((stated, name))) => {
            protected(&mut cx, state, stated, &name.value, minutes);
            product(&mut cx, stated, &name.value, environment, on);
        }
        (None, Some((stated, name))) => product(&mut cx, stated, &name.value, environment, on),
        _ => bare(&mut cx, minutes),
    }
}

fn gaps(cx: &mut Context<'_>, loading: Option<Span>) {
    for gap in &cx.outcome.gaps {
        match gap {
            Gap::Unread(_) => {}
            Gap::Missing(key) => {
                let message = format!(
                    "{} has no `{key}` in its `loading`, which its resistance in fire depends on",
                    cx.mark
                );
                cx.add("missing-key", key, loading, message);
            }
            Gap::FailsCold(utilisation) => {
                let message = format!(
                    "{} fails at once: its load in fire is {utilisation:.2} of its resistance at 20 °C",
                    cx.mark
                );
                cx.add("ambient-check-fails", "loading", loading, message);
            }
            // Where no period is wanted no temperature is either.
            Gap::CriticalTemperature(_) if cx.outcome.verdict == Verdict::NoPeriod => {}
            Gap::CriticalTemperature(why) => {
                let message = format!(
                    "{} is not verified: its critical temperature is unknown, for {why}",
                    cx.mark
                );
                cx.add("critical-temperature-unknown", "loading", loading, message);
            }
            Gap::NotCovered { key, why } => {
                let message = format!("{} is not verified: {why}", cx.mark);
                cx.add("not-covered", key, None, message);
            }
        }
    }
    let Some(critical) = &cx.outcome.critical else { return };
    if critical.from == LimitFrom::Default {
        let message = format!(
            "{} states neither loading nor a critical temperature: the named default of {:.0} °C is taken",
            cx.mark,
            critical.as_built.celsius()
        );
        cx.add("critical-temperature-assumed", "loading", loading, message);
    }
    if let Some(derived) = critical
        .by_loading
        .filter(|derived| critical.as_built.celsius() > derived.celsius() + 0.5)
    {
        let message = format!(
            "{} states a critical temperature of {:.0} °C, but its loading gives {:.0} °C",
            cx.mark,
            critical.as_built.celsius(),
            derived.celsius()
        );
        let span = cx.design.member(cx.at).value().keys.critical_temperature.span();
        cx.add("critical-temperature-too-high", "critical temperature", span, message);
    }
    if critical.governing.contains("class 4") {
        let message = format!(
            "{} is class 4 in fire, so at most 350 °C is taken ({})",
            cx.mark, critical.governing
        );
        cx.add("class-4-temperature", "section", loading, message);
    }
}

fn fire(cx: &mut Context<'_>, name: &str, span: Option<Span>) {
    match cx.design.fires.get(name).and_then(Option::as_deref) {
        Some(Fire::SlowHeating) => {
            let message = format!(
                "{} is computed in slow heating, which is a test exposure and no design fire",
                cx.mark
            );
            cx.add("fire-outside-validity", "fire", span, message);
        }
        Some(Fire::Parametric(parametric)) => {
            for breach in parametric.outside_validity() {
                let message = format!(
                    "{}: the fire `{name}` is outside its validity: {}, {} is covered",
                    cx.mark, breach.what, breach.bound
                );
                cx.add("fire-outside-validity", "fire", span, message);
            }
        }
        _ => {}
    }
}

fn bare(cx: &mut Context<'_>, minutes: f64) {
    let (Some(critical), Some(state), Some(section)) = (&cx.outcome.critical, cx.outcome.bare, &cx.outcome.section)
    else {
        return;
    };
    if cx.outcome.verdict != Verdict::Fails {
        return;
    }
    let lasts = state.resistance.map_or(360.0, |time| time.min());
    let message = format!(
        "{} is bare and reaches its critical temperature of {:.0} °C after {lasts:.0} min of {minutes:.0}: it has {}. Protect it, or take a heavier section",
        cx.mark,
        critical.bare.celsius(),
        factor(section.bare_factor)
    );
    cx.add("bare-steel-fails", "protection", None, message);
}

fn protected(cx: &mut Context<'_>, state: &ProtectedState, stated: &Protection, name: &str, minutes: f64) {
    let Some(section) = cx.outcome.section.clone() else {
        return;
    };
    let limit = cx
        .outcome
        .critical
        .as_ref()
        .map_or(0.0, |critical| critical.protected.celsius());
    let film = cx
        .design
        .product(name)
        .and_then(|(_, item)| item.value().product.clone())
        .is_some_and(|p| p.kind == Kind::Coating);
    let own = cx.design.member(cx.at).value();
    let span = own.keys.protection.span();
    match &state.requirement {
        Err(Refusal::TooSlender { .. }) => super::slender::too_slender(cx, state, name, minutes, limit, section.factor),
        Err(refusal @ (Refusal::OutsideRange { .. } | Refusal::OrientationNotAssessed(_))) => {
            let message = format!("{} lies outside what `{name}` was assessed for: {refusal}", cx.mark);
            cx.add("outside-assessed-range", "protection", span, message);
        }
        Err(Refusal::ShapeNotAssessed(shape)) => {
            let message = format!("{}: `{name}` was not assessed for {} sections", cx.mark, shape.words());
            cx.add("shape-not-assessed", "protection", span, message);
        }
        Err(Refusal::FireNotAssessed) => {
            let message = format!("{}: `{name}` was not assessed for the member's fire", cx.mark);
            cx.add("fire-not-assessed", "protection", span, message);
        }
        Err(Refusal::NotCovered(why)) => {
            let message = format!("{} is not verified: {why}", cx.mark);
            cx.add("not-covered", "protection", span, message);
        }
        Ok(needed) => {
            if !needed.unstated.is_empty() {
                let message = format!(
                    "{} is not verified: `{name}` states no assessed range of {}",
                    cx.mark,
                    needed.unstated.join(", ")
                );
                cx.add("outside-assessed-range", "protection", span, message);
            }
            if let (Some((least, most)), Some(provided)) = (state.outside_thickness, state.provided) {
                let message = format!(
                    "{}: {} of `{name}` lies outside the assessed {} to {}",
                    cx.mark,
                    thickness(provided, film),
                    thickness(least, film),
                    thickness(most, film)
                );
                cx.add("outside-assessed-range", "protection", span, message);
            }
            if let (true, Some(provided)) = (state.stated, state.provided) {
                stated_thickness(
                    cx,
                    needed.exact,
                    needed.next.as_ref(),
                    provided,
                    stated,
                    (name, film, minutes, limit),
                );
            }
            if let Some(reading) = stated
                .reading
                .value()
                .filter(|reading| reading.mm() < needed.exact.mm())
            {
                let message = format!(
                    "{}: the measured film of {} is below the {} needed",
                    cx.mark,
                    thickness(*reading, true),
                    thickness(needed.exact, true)
                );
                cx.add(
                    "reading-below-required",
                    "reading",
                    stated.reading.span().filter(|_| span.is_some()),
                    message,
                );
            }
            if film && state.layers.is_some_and(|coats| coats > 3) {
                let message = format!(
                    "{} takes {} coats of `{name}`",
                    cx.mark,
                    state.layers.unwrap_or_default()
                );
                cx.add("too-many-coats", "protection", span, message);
            }
            let lasts_bare = cx
                .outcome
                .bare
                .is_some_and(|bare| bare.resistance.is_none_or(|time| time.min() >= minutes));
            if lasts_bare {
                let message = format!("{} would last its {minutes:.0} min bare", cx.mark);
                cx.add("protection-not-needed", "protection", span, message);
            }
        }
    }
}

/// Findings of a thickness that the file states.
fn stated_thickness(
    cx: &mut Context<'_>,
    exact: Length,
    next: Option<&BuildUp>,
    provided: Length,
    stated: &Protection,
    (name, film, minutes, limit): (&str, bool, f64, f64),
) {
    let own = cx.design.member(cx.at).value().keys.protection.span();
    let value = if film {
        stated.dft.span()
    } else {
        stated.thickness.span()
    };
    let span = value.filter(|_| own.is_some());
    let past_next = next.is_some_and(|next| provided.mm() > next.total().mm() + 1e-6);
    if provided.mm() + 1e-9 < exact.mm() {
        let next_words = match next {
            Some(next) => format!("; the next stock is {}", build_up(next, film)),
            None => "; no build-up of its stock is so thick".to_owned(),
        };
        let message = format!(
            "{}: {} of `{name}` is too thin for {minutes:.0} min at {limit:.0} °C; it needs {}{next_words}",
            cx.mark,
            thickness(provided, film),
            thickness(exact, film)
        );
        cx.add("protection-too-thin", "thickness", span, message);
    } else if let Some(next) = next.filter(|_| past_next) {
        let message = format!(
            "{}: {} of `{name}` is more than needed ({}); the next stock is {}",
            cx.mark,
            thickness(provided, film),
            thickness(exact, film),
            build_up(next, film)
        );
        cx.add("protection-over-thick", "thickness", span, message);
    } else {
        return;
    }
    // Where `layers` multiplies the thickness, two keys would have to change together.
    if let (Some(span), Some(next), None | Some(1)) = (span, next, stated.layers.value()) {
        let text = match next.layers.as_slice() {
            [film_or_layer] if film => significant(film_or_layer.um(), 0),
            [layer] => significant(layer.mm(), 3),
            layers => {
                let layers: Vec<String> = layers.iter().map(|layer| significant(layer.mm(), 3)).collect();
                format!("[{}]", layers.join(", "))
            }
        };
        cx.fix(
            format!("use the next stock thickness, {}", build_up(next, film)),
            span,
            text,
        );
    }
}

/// A build-up with its layers, where there are several: `35 mm (20 + 15)`.
fn build_up(next: &BuildUp, film: bool) -> String {
    let total = thickness(next.total(), film);
    if next.layers.len() < 2 {
        return total;
    }
    let layers: Vec<String> = next.layers.iter().map(|layer| significant(layer.mm(), 1)).collect();
    format!("{total} ({})", layers.join(" + "))
}

fn product(cx: &mut Context<'_>, stated: &Protection, name: &str, environment: Option<Environment>, on: Date) {
    let Some((_, item)) = cx.design.product(name) else {
        return;
    };
    let named = item.value();
    let span = cx.design.member(cx.at).value().keys.protection.span();
    let coating = named
        .product
        .as_ref()
        .is_some_and(|product| product.kind == Kind::Coating);
    if let (Some(wanted), Some(serves), true) = (environment, named.environment, coating) {
        // A coating for a more severe environment serves the milder ones.
        if serves > wanted {
            let message = format!(
                "{} stands in {}, but `{name}` serves in {} at most",
                cx.mark,
                wanted.words(),
                serves.words()
            );
            cx.add("coating-environment", "protection", span, message);
        }
    }
    let board = named
        .product
        .as_ref()
        .is_some_and(|product| product.kind == Kind::Board);
    if board && stated.boxed.value() == Some(&false) {
        let own = stated.boxed.span().filter(|_| span.is_some());
        let message = format!(
            "{}: `{name}` is a board, and boards box the section in: take the box form, or a spray that follows the profile",
            cx.mark
        );
        cx.add("profile-board", "form", own, message);
        if let Some(span) = own {
            cx.fix("write `box`".to_owned(), span, "box".to_owned());
        }
    }
    if let Some(expires) = named.evidence.expires.as_ref().filter(|date| date.value < on) {
        let message = format!("{}: the evidence of `{name}` expired on {}", cx.mark, expires.value);
        cx.add("evidence-expired", "protection", span, message);
    }
}
