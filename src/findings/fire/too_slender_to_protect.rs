//! No assessed thickness of the product holds the section for the period.

use crate::analysis::exposure::reached;
use crate::analysis::inputs::row_of;
use crate::analysis::names::lookup_options;
use crate::design::model::member::SectionChoice;
use crate::findings::context::Context;
use crate::findings::finding::Severity;
use crate::findings::insert;
use crate::findings::registry::Declaration;
use crate::protection::refusal::Refusal;
use crate::section::catalogue::{CatalogueRow, family_neighbours};
use crate::section::{Casing, Exposure, heated};
use crate::units::SectionFactor;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "too-slender-to-protect",
    severity: Severity::Error,
    clause: "EN 13381-4, EN 13381-8: scope of the assessment",
    summary: "No assessed thickness of the product holds the section for the period.",
    answer: "Take a heavier section, box it in, or take another product.",
    fix: "Swaps to the nearest section of the family that the product holds. It changes the design, so it wants a decision.",
    before: r"- { mark: B1, section: IPE 80, critical temperature: 550, period: 120, protection: white spray }",
    after: r"- { mark: B1, section: IPE 450, critical temperature: 550, period: 120, protection: white spray }",
};

/// The headline: names the section factor, the largest that the product holds for the period and the temperature, and
/// the nearest section of the family that it holds.
pub(super) fn check(cx: &mut Context<'_>) {
    let (Some(state), Some(section), Some(product), Some(period)) =
        (&cx.outcome.protected, &cx.outcome.section, cx.product, cx.period)
    else {
        return;
    };
    match &state.requirement {
        Err(Refusal::TooSlender { .. }) => {}
        // A film that its table gives, but that no stock of the product makes up.
        Ok(needed) if needed.next.is_none() && state.provided.is_none() => {
            let message = format!(
                "{} can't be protected at {:.0} min: it needs {} of `{}`, but no build-up of its stock is so thick",
                cx.mark,
                period.min(),
                cx.needed(needed.exact, product.film),
                product.name
            );
            return cx.add(&DECLARATION, "protection", cx.own().protection.span(), message);
        }
        _ => return,
    }
    let choice = cx.keys.get(|keys| &keys.section).value();
    let row = row_of(choice, &lookup_options(cx.design.basis()));
    let called = match (row, choice) {
        (Some(row), _) => row.designation.to_string(),
        (None, Some(SectionChoice::Designation(text))) => text.clone(),
        _ => "its section".to_owned(),
    };
    let limit = cx.outcome.critical.as_ref().map_or_else(String::new, |critical| {
        format!(" at {}", cx.temperature(critical.protected))
    });
    let holds = match state.largest_factor {
        Some(largest) => format!("holds at most {}{limit}", cx.units.section_factor(largest)),
        None => format!("holds no section for so long{limit}"),
    };
    let better = state
        .largest_factor
        .zip(row)
        .and_then(|(largest, row)| nearest_held(cx, row, largest, section.box_factor == Some(section.factor)));
    let nearest = match better {
        Some((other, factor)) => format!(
            ". The nearest of the family that it holds is {} ({})",
            other.designation,
            cx.units.section_factor(factor)
        ),
        None if row.is_some() => ". No heavier section of the family is held either".to_owned(),
        None => String::new(),
    };
    let message = format!(
        "{} is too slender to protect at {:.0} min: {called} has {}, but `{}` {holds}{nearest}",
        cx.mark,
        period.min(),
        cx.factor(section.factor),
        product.name
    );
    let span = cx.own().section.span();
    cx.add(&DECLARATION, "section", span, message);
    let Some((other, _)) = better else { return };
    let title = format!("swap to {}", other.designation);
    match span {
        Some(span) => cx.fix(title, span, insert::scalar(&other.designation)),
        None => cx.state(title, "section", &insert::scalar(&other.designation)),
    }
}

/// The nearest heavier section of the family whose factor is no larger than what the product holds.
fn nearest_held(
    cx: &Context<'_>,
    row: &'static CatalogueRow,
    largest: SectionFactor,
    boxed: bool,
) -> Option<(&'static CatalogueRow, SectionFactor)> {
    let casing = if boxed { Casing::Box } else { Casing::Profile };
    let stated = cx.keys.get(|keys| &keys.exposure).value().copied();
    let shield = cx.keys.get(|keys| &keys.shield).value().copied();
    let exposure = reached(stated.unwrap_or(Exposure::AllRound), shield).exposure;
    let heavier = |other: &&CatalogueRow| other.mass.kg_m() > row.mass.kg_m();
    family_neighbours(row).into_iter().filter(heavier).find_map(|other| {
        let factor = heated(other.geometry(), exposure, casing).ok()?.factor;
        (factor.per_m() <= largest.per_m()).then_some((other, factor))
    })
}
