//! How long each member must last: its own period, and that of all that it carries.

use super::links::Links;
use crate::units::Time;

/// What is asked of a member.
#[derive(Clone, Copy)]
pub(super) struct Demand {
    /// How long it must last.
    pub period: Time,
    /// The member whose period that is: the member itself, or one that rests on it.
    pub asked_by: usize,
}

/// What is asked of every member, from the top of the frame down. Members in a circle ask for themselves and for
/// what rests on them from outside it: the circle is a finding of its own.
pub(super) fn demands(links: &Links<'_>, period: impl Fn(usize) -> Option<Time>) -> Vec<Option<Demand>> {
    let own = |asked_by: usize| period(asked_by).map(|period| Demand { period, asked_by });
    let mut demands: Vec<Option<Demand>> = (0..links.members()).map(own).collect();
    let mut carries = vec![0_usize; links.members()];
    for link in links.all() {
        carries[link.to] += 1;
    }
    let mut ready: Vec<usize> = (0..links.members()).filter(|member| carries[*member] == 0).collect();
    while let Some(member) = ready.pop() {
        for link in links.under(member) {
            let asked = demands[member].filter(|asked| {
                demands[link.to].is_none_or(|known| {
                    // Of equal periods that of the first member in the file is named, whatever the order of the walk;
                    // a member's own goes before all others.
                    let earlier = known.asked_by != link.to && asked.asked_by < known.asked_by;
                    asked.period.min() > known.period.min() || (asked.period.min() >= known.period.min() && earlier)
                })
            });
            if asked.is_some() {
                demands[link.to] = asked;
            }
            carries[link.to] -= 1;
            if carries[link.to] == 0 {
                ready.push(link.to);
            }
        }
    }
    demands
}
