//! The headline: no assessed thickness of the product holds this section for the period.

use super::member::{Context, factor};
use crate::analysis::exposure::reached;
use crate::analysis::inputs::row_of;
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::ProtectedState;
use crate::design::model::member::SectionChoice;
use crate::section::catalogue::family_neighbours;
use crate::section::{Casing, Exposure, heated};
use crate::units::SectionFactor;

/// Names the section factor, the largest that the product holds, and the nearest section of the family that meets it.
pub(super) fn too_slender(
    cx: &mut Context<'_>,
    state: &ProtectedState,
    name: &str,
    minutes: f64,
    limit: f64,
    own: SectionFactor,
) {
    let member = cx.design.member(cx.at).value();
    let keys = cx.design.inherited(member);
    let choice = keys.get(|k| &k.section).value();
    let row = row_of(choice, &lookup_options(cx.design.basis()));
    let called = match (row, choice) {
        (Some(row), _) => row.designation.to_string(),
        (None, Some(SectionChoice::Designation(text))) => text.clone(),
        _ => "the section".to_owned(),
    };
    let holds = match state.largest_factor {
        Some(largest) => format!("holds at most {:.0} 1/m at {limit:.0} °C", largest.per_m()),
        None => format!("holds nothing for so long at {limit:.0} °C"),
    };
    let casing = if cx
        .outcome
        .section
        .as_ref()
        .is_some_and(|s| s.box_factor == Some(s.factor))
    {
        Casing::Box
    } else {
        Casing::Profile
    };
    let shield = keys.get(|k| &k.shield).value().copied();
    let exposure = reached(
        keys.get(|k| &k.exposure).value().copied().unwrap_or(Exposure::AllRound),
        shield,
    )
    .exposure;
    let better = state.largest_factor.and_then(|largest| {
        let row = row?;
        family_neighbours(row)
            .into_iter()
            .filter(|other| other.mass.kg_m() > row.mass.kg_m())
            .find_map(|other| {
                let factor = heated(other.geometry(), exposure, casing).ok()?.factor;
                (factor.per_m() <= largest.per_m()).then_some((other, factor))
            })
    });
    let nearest = better.map_or(String::new(), |(other, factor)| {
        format!(
            ". The nearest of the family that it holds is {} ({:.0} 1/m)",
            other.designation,
            factor.per_m()
        )
    });
    let message = format!(
        "{} is too slender to protect at {minutes:.0} min: {called} has {}, but `{name}` {holds}{nearest}",
        cx.mark,
        factor(own)
    );
    let span = member.keys.section.span();
    cx.add("too-slender-to-protect", "section", span, message);
    if let (Some(span), Some((other, _)), Some(SectionChoice::Designation(_))) =
        (span, better, member.keys.section.value())
    {
        cx.fix(
            format!("swap to {}", other.designation),
            span,
            other.designation.to_string(),
        );
    }
}
