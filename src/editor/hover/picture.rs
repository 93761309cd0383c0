//! A member's heating, drawn.

use base64::Engine;
use base64::engine::general_purpose::STANDARD;

use super::HoverOptions;
use crate::analysis::curves::curves;
use crate::analysis::design::MemberAt;
use crate::analysis::inputs::{Inputs, Names};
use crate::analysis::names::lookup_options;
use crate::draw::{Heating, blocks, svg};
use crate::editor::view::View;

/// The heating of a member as a picture, or as block characters. `None` where it is not known.
pub fn heating(view: &View<'_>, at: MemberAt, options: HoverOptions) -> Option<String> {
    let design = view.design;
    let outcome = view.outcome(at)?;
    let names = Names {
        design,
        options: lookup_options(design.basis()),
    };
    let member = design.member(at).value();
    let inputs = Inputs::of(member, &names);
    let curves = curves(&inputs, outcome)?;
    let units = design.units();
    let mut steel = vec![("bare".to_owned(), curves.bare)];
    if let (Some(protected), Some(provided)) = (curves.protected, outcome.protected.as_ref().and_then(|s| s.provided)) {
        steel.push((format!("behind {}", units.thickness(provided)), protected));
    }
    let mark = member.mark.value().map_or("this member", String::as_str);
    let drawn = Heating {
        title: format!("Heating of {mark}"),
        minutes: curves.minutes,
        gas: curves.gas,
        steel,
        limit: outcome.critical.as_ref().map(|critical| critical.as_built.celsius()),
        period: inputs.period.map(|period| period.min()),
        fahrenheit: design.basis().imperial,
    };
    if options.images {
        let picture = STANDARD.encode(svg::heating(&drawn));
        return Some(format!("![Heating curve](data:image/svg+xml;base64,{picture})"));
    }
    Some(format!("```text\n{}\n```", blocks::heating(&drawn)))
}
