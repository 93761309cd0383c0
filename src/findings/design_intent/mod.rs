//! Findings of what the design intends: what covers a member, and what carries it. Linear in the size of the design.

pub mod bare_on_protected;
pub mod deck_contact_low;
pub mod deck_voids_unfilled;
mod demand;
mod links;
pub mod shield_not_stated;
pub mod support_cycle;
pub mod support_rating_lower;
pub mod thin_steel;

use std::sync::Arc;

use self::demand::{Demand, demands};
use self::links::{Link, Links};
use crate::analysis::design::{Design, MemberAt};
use crate::analysis::exposure::{ShieldDoubt, reached};
use crate::analysis::outcome::Outcome;
use crate::design::model::member::Period;
use crate::findings::context::Context;
use crate::findings::finding::{Finding, Severity};
use crate::findings::registry::Declaration;
use crate::section::Exposure;
use crate::units::{DisplayUnits, Time};

/// A member and one that carries it.
pub(super) struct Support<'a> {
    links: &'a Links<'a>,
    link: Link<'a>,
    units: DisplayUnits,
    /// The mark of what is carried.
    mark: &'a str,
    /// What protects it.
    carried: Cover,
    /// How long it must last, and who asks for that.
    demand: Option<Demand>,
    /// The mark of the support.
    name: &'a str,
    /// What protects the support.
    cover: Cover,
    /// What the analysis says of the support.
    outcome: &'a Outcome,
    /// The support's own period.
    support_period: Option<Time>,
    /// The fire of who asks and that of the support, where they differ.
    fires: Option<(&'a str, &'a str)>,
    out: &'a mut Vec<Finding>,
}

impl Support<'_> {
    /// Adds a finding at the support's mark in the member.
    fn add(&mut self, declaration: &'static Declaration, message: String) {
        self.out.push(self.links.finding(self.link, declaration, message));
    }

    /// Adds it as no more than a warning.
    fn warn(&mut self, declaration: &'static Declaration, message: String) {
        self.add(declaration, message);
        if let Some(finding) = self.out.last_mut() {
            finding.severity = Severity::Warning;
        }
    }
}

/// What a member states of its protection.
#[derive(Clone, Copy, PartialEq, Eq)]
pub(super) enum Cover {
    /// None is stated, or `none`.
    Bare,
    /// A product is named, whether it is known or not.
    Product,
    /// Something that can't be read.
    Unread,
}

/// What a member alone tells.
pub(super) fn member(cx: &mut Context<'_>) {
    shield_not_stated::check(cx);
    deck_contact_low::check(cx);
    deck_voids_unfilled::check(cx);
    thin_steel::check(cx);
}

/// What is doubtful about the faces that are said to be covered.
fn doubt(cx: &Context<'_>) -> Option<ShieldDoubt> {
    let exposure = cx.keys.get(|keys| &keys.exposure).value().copied();
    let shield = cx.keys.get(|keys| &keys.shield);
    if shield.given.is_unreadable() {
        return None;
    }
    reached(exposure.unwrap_or(Exposure::AllRound), shield.value().copied()).doubt
}

fn cover(design: &Design, at: MemberAt) -> Cover {
    let member = design.member(at).value();
    let found = design.inherited(member).get(|keys| &keys.protection);
    match found.value() {
        Some(stated) if stated.product.is_some() => Cover::Product,
        Some(stated) if stated.unreadable => Cover::Unread,
        // A broken member may name a product where it can't be read.
        None if found.given.is_unreadable() || member.broken => Cover::Unread,
        _ => Cover::Bare,
    }
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
    let links = Links::of(design);
    if links.all().is_empty() {
        return;
    }
    let demands = demands(&links, |member| period(design, links.at(member)));
    for link in links.all() {
        // A member that is said to support itself is no support: the circle says so.
        let Some(outcome) = outcomes.get(link.to).filter(|_| link.from != link.to) else {
            continue;
        };
        let demand = demands[link.from];
        let asker = links.at(demand.map_or(link.from, |demand| demand.asked_by));
        let support = links.at(link.to);
        let mut link = Support {
            links: &links,
            link: *link,
            units: design.units(),
            mark: links.mark(link.from),
            carried: cover(design, links.at(link.from)),
            demand,
            name: links.mark(link.to),
            cover: cover(design, support),
            outcome,
            support_period: period(design, support),
            fires: Some((fire(design, asker), fire(design, support))).filter(|(own, other)| own != other),
            out: &mut *out,
        };
        support_rating_lower::check(&mut link);
        bare_on_protected::check(&mut link);
    }
    support_cycle::check(&links, out);
}
