//! What an older version of a design leaves to a newer one.

use std::ops::Range;
use std::sync::Arc;

use super::live::Live;
use super::own;
use crate::analysis::design::{Design, MemberAt};
use crate::design::model::member::Member;
use crate::findings::finding::Finding;
use crate::findings::uses::{Uses, is_linked};
use crate::text::Span;

/// A run of members: kept from an older version, or fresh.
pub(super) struct Run<'a> {
    /// The older version, and the places there.
    pub kept: Option<(&'a Live, Range<usize>)>,
    /// How many are fresh.
    pub fresh: usize,
}

/// The runs of a design's members, in their order.
pub(super) fn runs<'a>(kept: Option<&Kept<'a>>, design: &Design) -> Vec<Run<'a>> {
    let Some(kept) = kept else {
        let fresh = design.members.len();
        return vec![Run { kept: None, fresh }];
    };
    let runs = kept.files.iter().flat_map(|strip| {
        let (older, first) = (kept.older, strip.first);
        let behind = first + strip.old - strip.behind..first + strip.old;
        let fresh = strip.new - strip.before - strip.behind;
        [
            (Some((older, first..first + strip.before)), 0),
            (None, fresh),
            (Some((older, behind)), 0),
        ]
    });
    runs.map(|(kept, fresh)| Run { kept, fresh }).collect()
}

/// What an older version of a design leaves: the members at the beginning and at the end of each file that were not read
/// anew.
pub(super) struct Kept<'a> {
    older: &'a Live,
    /// Of each file: members that stand as they stood, those behind a change, and how many there were and are.
    files: Vec<Strip>,
}

struct Strip {
    before: usize,
    behind: usize,
    old: usize,
    new: usize,
    /// The place of the file's first member in the older order.
    first: usize,
}

impl<'a> Kept<'a> {
    pub fn of(older: &'a Live, design: &Design) -> Self {
        let mut first = 0;
        let strips = older.design.files.iter().zip(&design.files).map(|(old, new)| {
            let (a, b) = (&old.members, &new.members);
            let same = |n: usize, m: usize| Arc::ptr_eq(&a[n].decoded, &b[m].decoded);
            let shorter = a.len().min(b.len());
            let (before, behind) = if Arc::ptr_eq(old, new) {
                (shorter, 0)
            } else {
                let before = (0..shorter).take_while(|n| same(*n, *n)).count();
                let left = shorter - before;
                let behind = (1..=left).take_while(|n| same(a.len() - n, b.len() - n)).count();
                (before, behind)
            };
            let strip = Strip {
                before,
                behind,
                old: a.len(),
                new: b.len(),
                first,
            };
            first += a.len();
            strip
        });
        let files: Vec<Strip> = strips.collect();
        Self { older, files }
    }

    /// What the members use now.
    pub fn uses(&self, design: &Design) -> Uses {
        let mut uses = self.older.uses.clone();
        for (file, strip) in self.files.iter().enumerate() {
            let old = &*self.older.design;
            for item in &old.files[file].members[strip.before..strip.old - strip.behind] {
                uses.remove(old, item.value());
            }
            for item in &design.files[file].members[strip.before..strip.new - strip.behind] {
                uses.add(design, item.value());
            }
        }
        uses
    }

    /// Whether the findings between members are those of the older version.
    pub fn ties_hold(&self, live: &Live) -> bool {
        let (old, new) = (&*self.older.design, &*live.design);
        if !live.uses.alike(&self.older.uses) {
            return false;
        }
        if !Arc::ptr_eq(&old.marks, &new.marks) {
            let free = |design: &Design, uses: &Uses| !design.repeated && !uses.any_linked();
            return free(old, &self.older.uses) && free(new, &live.uses) && self.older.between.iter().all(is_free);
        }
        self.files.iter().enumerate().all(|(file, strip)| {
            (strip.before..strip.new - strip.behind).all(|index| {
                let at = MemberAt { file, index };
                let order = strip.first + index;
                let (a, b) = (old.member(at), new.member(at));
                let alike = self.older.outcomes[order] == live.outcomes[order];
                let path = &old.files[file].path;
                self.tied_alike((old, a.value()), (new, b.value()), alike)
                    && !self
                        .older
                        .between
                        .iter()
                        .any(|tie| own::touches(tie, path, a.piece.span))
            })
        })
    }

    /// Whether nothing has changed in a member that others could tell, where it has to do with others.
    fn tied_alike(&self, (old, a): (&Design, &Member), (new, b): (&Design, &Member), alike: bool) -> bool {
        let rests = a.mark.value().is_some_and(|mark| self.older.uses.support(mark));
        if !rests && !is_linked(old, a) && !is_linked(new, b) {
            return true;
        }
        a.broken == b.broken
            && a.keys.group == b.keys.group
            && a.keys.supported_by == b.keys.supported_by
            && a.keys.steadies == b.keys.steadies
            && a.keys.protection == b.keys.protection
            && a.keys.period == b.keys.period
            && a.keys.fire == b.keys.fire
            && (!rests || alike)
    }

    /// The findings between members of the older version, at their places now.
    pub fn between(&self, design: &Design) -> Vec<Finding> {
        let mut between = self.older.between.clone();
        for (file, strip) in self.files.iter().enumerate() {
            let (old, new) = (&self.older.design.files[file], &design.files[file]);
            if Arc::ptr_eq(old, new) {
                continue;
            }
            // Each place moves with the member that it lies in: they need not all have moved alike.
            let moved = |span: Span| {
                let index = old
                    .members
                    .partition_point(|item| item.base() <= span.start)
                    .checked_sub(1)?;
                let item = old
                    .members
                    .get(index)
                    .filter(|item| own::within(item.piece.span, span))?;
                let behind = (index + strip.new).checked_sub(strip.old);
                let now = if index < strip.before { Some(index) } else { behind };
                let by = i64::from(new.members.get(now?)?.base()) - i64::from(item.base());
                Some(own::shifted(span, by))
            };
            for place in between.iter_mut().flat_map(own::places_mut) {
                if *place.path == *old.path {
                    place.span = moved(place.span).unwrap_or(place.span);
                }
            }
        }
        between
    }
}

/// Whether a finding is of no member.
fn is_free(finding: &Finding) -> bool {
    finding.member.is_none()
}
