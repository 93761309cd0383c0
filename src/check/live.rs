//! A checked design that is checked again after a change: what the change does not reach is kept.
//!
//! A member's outcome and findings are kept while its text and its surroundings are what they were. What members do to
//! each other is found in one pass over the design, and kept while no fact that it rests on has changed.

use std::borrow::Cow;
use std::sync::Arc;

use jiff::civil::Date;
use rayon::prelude::*;

use super::Checked;
use super::around::{self, Around};
use super::kept::{Kept, runs};
use super::own::{self, Own};
use crate::analysis::design::{Design, FileIndex, MemberAt};
use crate::analysis::inputs::{Inputs, Names};
use crate::analysis::memo::Memo;
use crate::analysis::names::{Sections, lookup_options};
use crate::analysis::outcome::Outcome;
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::uses::Uses;
use crate::findings::{self, departures, reading};
use crate::text::Span;

/// Asks whether the work is still wanted.
pub type Cancelled<'a> = &'a (dyn Fn() -> bool + Sync);

/// A checked design.
#[derive(Debug)]
pub struct Live {
    /// The design.
    pub design: Arc<Design>,
    /// Outcomes in the order of the design's members.
    pub outcomes: Vec<Arc<Outcome>>,
    pub(super) own: Vec<Arc<Own>>,
    /// The members of which there is anything to say by themselves, by their place in the order.
    pub(super) loud: Vec<usize>,
    /// Findings outside the members.
    outside: Vec<Finding>,
    /// Findings between members, by member.
    pub(super) between: Vec<Finding>,
    /// What the members use.
    pub(super) uses: Uses,
    on: Date,
}

/// A finding with what has moved it since it was made.
#[derive(Debug)]
pub struct Shown<'a> {
    finding: Cow<'a, Finding>,
    /// The member that it is of, where that may have another number now.
    member: Option<MemberAt>,
    extent: Span,
    by: i64,
}

/// Members so few that threads would not pay.
const FEW: usize = 64;

impl Live {
    /// Checks a design, with what an older version of it left. `None` where the work was cancelled.
    #[must_use]
    pub fn check(
        design: Arc<Design>,
        older: Option<&Self>,
        on: Date,
        memo: &Memo,
        cancelled: Cancelled<'_>,
    ) -> Option<Self> {
        let older = older.filter(|older| older.on == on);
        let around = older.map_or(Around::Changed, |older| around::compare(&older.design, &design));
        let kept = older
            .filter(|_| around != Around::Changed)
            .map(|older| Kept::of(older, &design));
        let names = Names {
            design: &design,
            options: lookup_options(design.basis()),
        };
        let sections = || Sections::of(design.basis());
        let fresh = |sections: &mut Sections, order: usize| {
            if cancelled() {
                return None;
            }
            let at = design.members[order];
            let outcome = memo.outcome(Inputs::of(design.member(at).value(), &names));
            let own = Own::of(&design, at, &outcome, on, sections);
            Some((outcome, Arc::new(own)))
        };
        let count = design.members.len();
        let mut outcomes = Vec::with_capacity(count);
        let mut own = Vec::with_capacity(count);
        let mut loud = Vec::new();
        for strip in runs(kept.as_ref(), &design) {
            let first = outcomes.len();
            if let Some((older, old)) = strip.kept {
                outcomes.extend_from_slice(&older.outcomes[old.clone()]);
                own.extend_from_slice(&older.own[old.clone()]);
                let voices = older.loud.partition_point(|order| *order < old.start);
                let voices = older.loud[voices..].iter().take_while(|order| **order < old.end);
                loud.extend(voices.map(|order| order - old.start + first));
                continue;
            }
            let orders = first..first + strip.fresh;
            let checked: Option<Vec<_>> = if strip.fresh <= FEW {
                let mut sections = sections();
                orders.map(|order| fresh(&mut sections, order)).collect()
            } else {
                orders.into_par_iter().map_init(sections, fresh).collect()
            };
            for (outcome, mine) in checked? {
                if !mine.is_silent() {
                    loud.push(own.len());
                }
                outcomes.push(outcome);
                own.push(mine);
            }
        }
        if around == Around::Alike {
            // What points at the surroundings may point elsewhere now.
            let mut sections = sections();
            for order in &loud {
                let (at, outcome) = (design.members[*order], &outcomes[*order]);
                if !own[*order].local {
                    own[*order] = Arc::new(Own::of(&design, at, outcome, on, &mut sections));
                }
            }
        }
        let mut live = Self {
            outside: Vec::new(),
            between: Vec::new(),
            uses: Uses::default(),
            outcomes,
            own,
            loud,
            on,
            design: Arc::clone(&design),
        };
        reading::outside(&design, &mut sections(), &mut live.outside);
        let kept = kept.filter(|_| around == Around::Same);
        live.uses = kept
            .as_ref()
            .map_or_else(|| Uses::of(&design), |kept| kept.uses(&design));
        match kept.filter(|kept| kept.ties_hold(&live)) {
            Some(kept) => live.between = kept.between(&design),
            None => {
                findings::between(&design, &live.outcomes, &live.uses, &mut live.between);
                live.between.sort_by_key(|finding| finding.member);
            }
        }
        Some(live)
    }

    /// Whether it is the check of this very design on this date.
    #[must_use]
    pub fn is_of(&self, design: &Arc<Design>, on: Date) -> bool {
        Arc::ptr_eq(&self.design, design) && self.on == on
    }

    /// Everything, as command line and reports want it.
    #[must_use]
    pub fn checked(&self) -> Checked {
        let settled: Vec<(Vec<Finding>, Vec<Finding>)> = (0..self.outcomes.len())
            .into_par_iter()
            .map(|order| self.settled(order))
            .collect();
        let between = self.between.iter().filter(|finding| finding.member.is_none());
        let mut findings: Vec<Finding> = self.outside.iter().chain(between).cloned().collect();
        let mut agreed = Vec::new();
        for (mut open, mut accepted) in settled {
            findings.append(&mut open);
            agreed.append(&mut accepted);
        }
        let order = |finding: &Finding| (finding.place.path.to_path_buf(), finding.place.span, finding.severity);
        findings.sort_by_cached_key(order);
        agreed.sort_by_cached_key(order);
        Checked {
            design: Arc::clone(&self.design),
            outcomes: self.outcomes.clone(),
            findings,
            agreed,
        }
    }

    /// The open and the agreed findings of a member, by its place in the order of the design.
    #[must_use]
    pub fn settled(&self, order: usize) -> (Vec<Finding>, Vec<Finding>) {
        let at = self.design.members[order];
        let own = &self.own[order];
        let (extent, by) = self.moved(at, own);
        let here = |finding: &Finding| {
            let mut finding = finding.clone();
            finding.member = Some(at);
            if by != 0 {
                own::moved(&mut finding, extent, by);
            }
            finding
        };
        let mut open: Vec<Finding> = own.slips.iter().map(here).collect();
        let between = self.between_of(at);
        let (mut rest, agreed) = match &own.settled {
            None => (
                own.found.iter().map(here).chain(between.iter().cloned()).collect(),
                Vec::new(),
            ),
            Some((open, agreed)) if between.is_empty() => {
                (open.iter().map(here).collect(), agreed.iter().map(here).collect())
            }
            Some(_) => {
                let (slips, ties): (Vec<Finding>, Vec<Finding>) = between.iter().cloned().partition(reading::is_slip);
                let found = own.found.iter().map(here).chain(ties).collect();
                let (mut rest, agreed) = departures::apply(&self.design, at, &self.outcomes[order], self.on, found);
                rest.extend(slips);
                (rest, agreed)
            }
        };
        open.append(&mut rest);
        (open, agreed)
    }

    /// The open findings of a file, in no order, without copying what need not be.
    pub fn shown(&self, file: FileIndex) -> Vec<Shown<'_>> {
        let path = &self.design.files[file].path;
        let still = |finding| Shown {
            finding: Cow::Borrowed(finding),
            member: None,
            extent: Span::default(),
            by: 0,
        };
        let between = self.between.iter().filter(|finding| finding.member.is_none());
        let outside = self
            .outside
            .iter()
            .chain(between)
            .filter(|finding| finding.place.path == *path);
        let mut shown: Vec<Shown<'_>> = outside.map(still).collect();
        let first = self.design.members.partition_point(|at| at.file < file);
        let last = self.design.members.partition_point(|at| at.file <= file);
        let from = self.loud.partition_point(|order| *order < first);
        let to = self.loud.partition_point(|order| *order < last);
        for order in &self.loud[from..to] {
            let (at, own) = (self.design.members[*order], &self.own[*order]);
            if own.settled.is_some() {
                let (open, _) = self.settled(*order);
                shown.extend(open.into_iter().map(|finding| Shown {
                    finding: Cow::Owned(finding),
                    member: None,
                    extent: Span::default(),
                    by: 0,
                }));
                continue;
            }
            let (extent, by) = self.moved(at, own);
            shown.extend(own.slips.iter().chain(&own.found).map(|finding| Shown {
                finding: Cow::Borrowed(finding),
                member: Some(at),
                extent,
                by,
            }));
        }
        // Of members with departures they are settled above.
        let tied = self.between.iter().filter(|finding| {
            let order = finding.member.filter(|at| at.file == file);
            let order = order.and_then(|at| self.design.members.binary_search(&at).ok());
            order.is_some_and(|order| self.own[order].settled.is_none())
        });
        shown.extend(tied.map(still));
        shown
    }

    /// The open findings of a file that touch a span, by position.
    #[must_use]
    pub fn findings_at(&self, file: FileIndex, span: Span) -> Vec<Finding> {
        let touching = |shown: &Shown<'_>| {
            let own = shown.span();
            own.start <= span.end && span.start <= own.end
        };
        let shown = self.shown(file).into_iter().filter(touching);
        let mut findings: Vec<Finding> = shown.map(Shown::into_finding).collect();
        findings.sort_by_key(|finding| (finding.place.span, finding.severity));
        findings
    }

    /// Every open finding of a file, by position.
    #[must_use]
    pub fn findings(&self, file: FileIndex) -> Vec<Finding> {
        let mut findings: Vec<Finding> = self.shown(file).into_iter().map(Shown::into_finding).collect();
        findings.sort_by_key(|finding| (finding.place.span, finding.severity));
        findings
    }

    /// Where the findings of a member were made, and how far it has moved since.
    fn moved(&self, at: MemberAt, own: &Own) -> (Span, i64) {
        let span = self.design.member(at).piece.span;
        let extent = Span {
            start: own.base,
            end: own.base.saturating_add(span.len()),
        };
        (extent, i64::from(span.start) - i64::from(own.base))
    }

    fn between_of(&self, at: MemberAt) -> &[Finding] {
        let first = self.between.partition_point(|finding| finding.member < Some(at));
        let count = self.between[first..].partition_point(|finding| finding.member == Some(at));
        &self.between[first..first + count]
    }
}

impl Shown<'_> {
    /// Its characters.
    #[must_use]
    pub fn span(&self) -> Span {
        self.now(&self.finding.place)
    }

    /// Whether it is a slip of the text.
    #[must_use]
    pub fn is_slip(&self) -> bool {
        reading::is_slip(&self.finding)
    }

    /// How grave it is.
    #[must_use]
    pub fn severity(&self) -> Severity {
        self.finding.severity
    }

    /// The finding, its places as they were when it was made.
    #[must_use]
    pub fn made(&self) -> &Finding {
        &self.finding
    }

    /// Where a place of the finding is now.
    #[must_use]
    pub fn now(&self, place: &Place) -> Span {
        let moved = self.by != 0 && place.path == self.finding.place.path && own::within(self.extent, place.span);
        if moved {
            own::shifted(place.span, self.by)
        } else {
            place.span
        }
    }

    /// The finding.
    #[must_use]
    pub fn into_finding(self) -> Finding {
        let mut finding = self.finding.into_owned();
        finding.member = self.member.or(finding.member);
        if self.by != 0 {
            own::moved(&mut finding, self.extent, self.by);
        }
        finding
    }
}
