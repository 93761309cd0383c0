//! Agreed departures: they move a finding to a list of their own and never change a verdict.

pub mod departure_expired;
pub mod departure_outgrown;
pub mod departure_unused;
pub mod departure_without_reason;

use std::sync::Arc;

use jiff::civil::Date;

use crate::analysis::design::{Design, MemberAt};
use crate::analysis::outcome::Outcome;
use crate::design::given::Given;
use crate::design::keys::nearest;
use crate::design::model::member::Departure;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::reading;
use crate::findings::registry;
use crate::units::{DisplayUnits, Length, SectionFactor, Time};

/// Splits the findings of a member into open and agreed ones, and reports departures that don't hold.
pub fn apply(
    design: &Design,
    at: MemberAt,
    outcome: &Outcome,
    on: Date,
    findings: Vec<Finding>,
) -> (Vec<Finding>, Vec<Finding>) {
    let item = design.member(at);
    let departures = &item.value().departures;
    if departures.is_empty() {
        return (findings, Vec::new());
    }
    let mark = item.value().mark.value().cloned().unwrap_or_default();
    let mut open = Vec::new();
    let mut agreed = Vec::new();
    let mut own = Vec::new();
    let mut holds = vec![false; departures.len()];
    for (n, departure) in departures.iter().enumerate() {
        let from = &departure.from;
        let place = Place {
            path: Arc::clone(&design.files[at.file].path),
            span: item.place(from.span),
        };
        let mut add = |declaration, message: String| {
            let mut finding = Finding::new(declaration, place.clone(), message);
            finding.member = Some(at);
            finding.mark = Some(mark.clone());
            finding.key = Some("departures".to_owned());
            own.push(finding);
        };
        let Some(declaration) = registry::find(&from.value) else {
            add(
                &departure_unused::DECLARATION,
                match nearest(
                    &from.value,
                    registry::REGISTRY.iter().map(|declaration| declaration.name),
                ) {
                    Some(near) => format!(
                        "{mark} departs from `{}`, which is no finding; perhaps `{near}`",
                        from.value
                    ),
                    None => format!("{mark} departs from `{}`, which is no finding", from.value),
                },
            );
            continue;
        };
        if reading::SLIPS.iter().any(|slip| std::ptr::eq(*slip, declaration)) {
            add(
                &departure_unused::DECLARATION,
                format!(
                    "{mark} departs from {}, which is a slip of the file to be mended",
                    from.value
                ),
            );
            continue;
        }
        let error = declaration.severity == Severity::Error;
        let lacks = |given: bool, key: &str| (!given).then(|| format!("`{key}`"));
        // An empty text is a place kept for a reason, not one.
        let said = |text: &Given<String>| text.value().is_some_and(|text| !text.trim().is_empty());
        let mut missing: Vec<String> = lacks(said(&departure.because), "because").into_iter().collect();
        if error {
            missing.extend(lacks(said(&departure.by), "by"));
            missing.extend(lacks(departure.until.value().is_some(), "until"));
        }
        if !missing.is_empty() {
            add(
                &departure_without_reason::DECLARATION,
                format!("{mark}: the departure from {} lacks {}", from.value, missing.join(", ")),
            );
        } else if departure.until.value().is_some_and(|until| *until < on) {
            add(
                &departure_expired::DECLARATION,
                format!(
                    "{mark}: the departure from {} ran out{}",
                    from.value,
                    departure
                        .until
                        .value()
                        .map_or_else(String::new, |until| format!(" on {until}"))
                ),
            );
        } else if let Some(worse) = outgrown(departure, outcome, design.units()) {
            add(
                &departure_outgrown::DECLARATION,
                format!("{mark}: the departure from {} is outgrown: {worse}", from.value),
            );
        } else if findings.iter().any(|finding| finding.name() == from.value) {
            holds[n] = true;
        } else {
            add(
                &departure_unused::DECLARATION,
                format!("{mark} departs from {}, which was not found", from.value),
            );
        }
    }
    for finding in findings {
        let met = departures
            .iter()
            .zip(&holds)
            .any(|(departure, holds)| *holds && departure.from.value == finding.name());
        if met { agreed.push(finding) } else { open.push(finding) }
    }
    open.append(&mut own);
    (open, agreed)
}

/// What has worsened since the departure was agreed.
fn outgrown(departure: &Departure, outcome: &Outcome, units: DisplayUnits) -> Option<String> {
    let requirement = outcome.protected.as_ref().map(|state| &state.requirement);
    if let Some(was) = departure.at.needs {
        // Films are agreed to the micrometre, boards and sprays to a tenth of a millimetre.
        let film = was.mm() < 5.0;
        let show = |value: Length| {
            if film {
                units.film(value)
            } else {
                units.thickness(value)
            }
        };
        let tolerance = if film { 5e-4 } else { 0.05 };
        match requirement {
            Some(Ok(needed)) if needed.exact.mm() > was.mm() + tolerance => {
                return Some(format!("it needed {}, now {}", show(was), show(needed.exact)));
            }
            Some(Err(refusal)) => return Some(format!("it needed {}, now {}", show(was), refusal.words(units))),
            None => return Some(format!("it needed {}, now what it needs is not known", show(was))),
            Some(Ok(_)) => {}
        }
    }
    if let Some(was) = departure.at.section_factor {
        let show = |per_m| units.section_factor(SectionFactor::from_per_m(per_m));
        match &outcome.section {
            Some(section) if section.factor.per_m() > was + 0.5 => {
                return Some(format!(
                    "the section factor was {}, now {}",
                    show(was),
                    units.section_factor(section.factor)
                ));
            }
            None => return Some(format!("the section factor was {}, now it is not known", show(was))),
            Some(_) => {}
        }
    }
    let temperature = outcome.bare.and_then(|bare| bare.at_period);
    let temperature = outcome
        .protected
        .as_ref()
        .and_then(|state| state.at_period)
        .or(temperature);
    if let Some(was) = departure.at.temperature {
        let was_at = format!("the steel reached {}", units.temperature(was));
        match temperature {
            Some(is) if is.celsius() > was.celsius() + 0.5 => {
                return Some(format!("{was_at}, now {}", units.temperature(is)));
            }
            None => return Some(format!("{was_at}, now its temperature is not known")),
            Some(_) => {}
        }
    }
    if let Some(was) = departure.at.resistance {
        let was_at = format!("it lasted {:.0} min", was.min());
        match lasts(outcome) {
            Some(is) if is + 0.5 < was.min() => return Some(format!("{was_at}, now {:.0} min", is.floor())),
            None => return Some(format!("{was_at}, now it is not known how long it lasts")),
            Some(_) => {}
        }
    }
    None
}

/// How long a member lasts in minutes, infinite where the steel never gets so hot; `None` where nobody knows.
fn lasts(outcome: &Outcome) -> Option<f64> {
    outcome.critical.as_ref()?;
    match &outcome.protected {
        Some(state) => state.resistance.map(Time::min),
        None => outcome
            .bare
            .map(|bare| bare.resistance.map_or(f64::INFINITY, Time::min)),
    }
}
