//! Findings of what the design intends: what covers a member, and what carries it. Linear in the size of the design.

pub mod bare_on_protected;
pub mod shield_not_stated;
pub mod support_cycle;
pub mod support_rating_lower;
pub mod thin_steel;

use std::sync::Arc;

use rustc_hash::FxHashMap;

use crate::analysis::design::{Design, MemberAt};
use crate::analysis::outcome::Outcome;
use crate::design::model::member::Period;
use crate::findings::context::Context;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::registry::Declaration;
use crate::text::Span;
use crate::units::Time;

/// A member and one that carries it.
pub(super) struct Support<'a> {
    design: &'a Design,
    at: MemberAt,
    /// The mark of what is carried.
    mark: &'a str,
    /// What the analysis says of it.
    carried: &'a Outcome,
    /// Its period.
    period: Option<Time>,
    /// The mark of the support, as the member writes it.
    name: &'a str,
    span: Span,
    /// What the analysis says of the support.
    outcome: &'a Outcome,
    /// The support's own period.
    support_period: Option<Time>,
    /// The fires of the member and of its support, where they differ.
    fires: Option<(&'a str, &'a str)>,
    out: &'a mut Vec<Finding>,
}

impl Support<'_> {
    /// Adds a finding at the support's mark in the member.
    fn add(&mut self, declaration: &'static Declaration, message: String) {
        let mut finding = Finding::new(declaration, place(self.design, self.at, self.span), message);
        finding.mark = Some(self.mark.to_owned());
        finding.key = Some("supported by".to_owned());
        self.out.push(finding);
    }

    /// Adds it as no more than a warning.
    fn warn(&mut self, declaration: &'static Declaration, message: String) {
        self.add(declaration, message);
        if let Some(finding) = self.out.last_mut() {
            finding.severity = Severity::Warning;
        }
    }
}

fn place(design: &Design, at: MemberAt, span: Span) -> Place {
    Place {
        path: Arc::clone(&design.files[at.file].path),
        span: design.member(at).place(span),
    }
}

/// What a member alone tells.
pub(super) fn member(cx: &mut Context<'_>) {
    shield_not_stated::check(cx);
    thin_steel::check(cx);
}

fn period(design: &Design, at: MemberAt) -> Option<Time> {
    match design
        .inherited(design.member(at).value())
        .get(|keys| &keys.period)
        .value()
    {
        Some(Period::Of(time)) => Some(*time),
        _ => None,
    }
}

fn fire(design: &Design, at: MemberAt) -> &str {
    let keys = design.inherited(design.member(at).value());
    keys.get(|keys| &keys.fire).value().map_or("standard", String::as_str)
}

/// What members do to each other; outcomes in the order of the design's members.
pub(super) fn design(design: &Design, outcomes: &[Arc<Outcome>], out: &mut Vec<Finding>) {
    let index: FxHashMap<MemberAt, usize> = design.members.iter().enumerate().map(|(n, at)| (*at, n)).collect();
    for (at, carried) in design.members.iter().zip(outcomes) {
        let member = design.member(*at).value();
        for name in member.keys.supported_by.value().into_iter().flatten() {
            let Some(support) = design.marks.get(&name.value) else {
                continue;
            };
            let Some(outcome) = index.get(support).and_then(|n| outcomes.get(*n)) else {
                continue;
            };
            let mut link = Support {
                design,
                at: *at,
                mark: member.mark.value().map_or("this member", String::as_str),
                carried,
                period: period(design, *at),
                name: &name.value,
                span: name.span,
                outcome,
                support_period: period(design, *support),
                fires: Some((fire(design, *at), fire(design, *support))).filter(|(own, other)| own != other),
                out: &mut *out,
            };
            support_rating_lower::check(&mut link);
            bare_on_protected::check(&mut link);
        }
    }
    support_cycle::check(design, out);
}
