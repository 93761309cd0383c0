//! What one member tells by itself, kept until it changes.

use std::sync::Arc;

use jiff::civil::Date;

use crate::analysis::design::{Design, MemberAt};
use crate::analysis::names::Sections;
use crate::analysis::outcome::Outcome;
use crate::findings::finding::{Finding, Place};
use crate::findings::{self, departures, reading};
use crate::text::Span;

/// What a member tells by itself. Spans of the file as the item stood at [`base`](Self::base).
#[derive(Debug)]
pub(super) struct Own {
    /// Where the item began.
    pub base: u32,
    /// Whether every place lies in the item.
    pub local: bool,
    /// Slips of its text.
    pub slips: Vec<Finding>,
    /// What was found, departures not yet applied.
    pub found: Vec<Finding>,
    /// Open and agreed findings, where the member has departures.
    pub settled: Option<(Vec<Finding>, Vec<Finding>)>,
}

impl Own {
    pub fn of(design: &Design, at: MemberAt, outcome: &Outcome, on: Date, sections: &mut Sections) -> Self {
        let item = design.member(at);
        let mut slips = Vec::new();
        reading::item(design, at, sections, &mut slips);
        let mut found = Vec::new();
        findings::member(design, at, outcome, on, &mut found);
        let departs = !item.value().departures.is_empty();
        let settled = departs.then(|| departures::apply(design, at, outcome, on, found.clone()));
        let path = &design.files[at.file].path;
        let inside =
            |finding: &Finding| places(finding).all(|place| place.path == *path && within(item.piece.span, place.span));
        Self {
            base: item.base(),
            local: slips.iter().chain(&found).all(inside),
            slips,
            found,
            settled,
        }
    }
}

impl Own {
    /// Whether there is nothing to say.
    pub fn is_silent(&self) -> bool {
        self.slips.is_empty() && self.found.is_empty() && self.settled.is_none()
    }
}

fn places(finding: &Finding) -> impl Iterator<Item = &Place> {
    let notes = finding.notes.iter().filter_map(|note| note.place.as_ref());
    let edits = finding.fixes.iter().flat_map(|fix| &fix.edits).map(|edit| &edit.place);
    std::iter::once(&finding.place).chain(notes).chain(edits)
}

/// Whether a span lies in another, both ends included.
pub(super) fn within(outer: Span, span: Span) -> bool {
    outer.start <= span.start && span.end <= outer.end
}

/// Moves the places of a finding that lie in `extent` of its own file.
pub(super) fn moved(finding: &mut Finding, extent: Span, by: i64) {
    let path = Arc::clone(&finding.place.path);
    for place in places_mut(finding) {
        if place.path == path && within(extent, place.span) {
            place.span = shifted(place.span, by);
        }
    }
}

/// Every place of a finding.
pub(super) fn places_mut(finding: &mut Finding) -> impl Iterator<Item = &mut Place> {
    let notes = finding.notes.iter_mut().filter_map(|note| note.place.as_mut());
    let edits = finding
        .fixes
        .iter_mut()
        .flat_map(|fix| &mut fix.edits)
        .map(|edit| &mut edit.place);
    std::iter::once(&mut finding.place).chain(notes).chain(edits)
}

/// Whether a place of the finding touches a span of a file.
pub(super) fn touches(finding: &Finding, path: &std::path::Path, span: Span) -> bool {
    let touch = |own: Span| own.start <= span.end && span.start <= own.end;
    places(finding).any(|place| **place.path == *path && touch(place.span))
}

pub(super) fn shifted(span: Span, by: i64) -> Span {
    let shift = |offset: u32| u32::try_from(i64::from(offset) + by).unwrap_or(0);
    Span {
        start: shift(span.start),
        end: shift(span.end),
    }
}
