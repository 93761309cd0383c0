//! A support does not last as long as what it carries.

use super::{Demand, Support};
use crate::analysis::outcome::Verdict;
use crate::findings::finding::Severity;
use crate::findings::registry::Declaration;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "support-rating-lower",
    severity: Severity::Error,
    clause: "common practice",
    summary: "A support does not last as long as what it carries.",
    answer: "Raise the support's period and protection.",
    fix: "None: the support is another member, and its protection a choice.",
    before: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 90, protection: grey board, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B, critical temperature: 500, period: 30, protection: { product: grey board, thickness: 15 } }",
    after: r"- { mark: B1, section: IPE 300, critical temperature: 550, period: 90, protection: grey board, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B, critical temperature: 500, period: 90, protection: { product: grey board, thickness: 30 } }",
};

/// A support that fails before what it carries may. One that is not verified is no proof either: a warning says so.
pub(super) fn check(link: &mut Support<'_>) {
    let Some(Demand { period, asked_by }) = link.demand else {
        return;
    };
    let reached = match (&link.outcome.protected, link.outcome.bare, &link.outcome.critical) {
        (Some(state), ..) => state.resistance.map(|time| time.min()),
        (None, Some(bare), Some(_)) => Some(bare.resistance.map_or(360.0, |time| time.min())),
        _ => None,
    };
    let own = link.support_period.map_or(0.0, |time| time.min());
    let sake = if asked_by == link.link.from {
        String::new()
    } else {
        format!(" for the sake of {}, which rests on it", link.links.mark(asked_by))
    };
    let must = format!("{} must last {:.0} min{sake}", link.mark, period.min());
    let lasts = match link.outcome.verdict {
        // A support that is verified for its own period lasts at least so long.
        Verdict::Passes => reached.unwrap_or(own).max(own),
        Verdict::Fails => reached.unwrap_or(0.0),
        Verdict::CannotBeProtected => {
            let message = format!(
                "{must}, but {}, which supports it, can't be protected for its own {own:.0} min",
                link.name
            );
            return link.add(&DECLARATION, message);
        }
        Verdict::NoPeriod if reached.is_some() => reached.unwrap_or(0.0),
        Verdict::NoPeriod | Verdict::NotVerified => {
            let message = format!(
                "{must}, but {}, which supports it, is not verified: how long it lasts is not known",
                link.name
            );
            return link.warn(&DECLARATION, message);
        }
    };
    if lasts + 1e-6 < period.min() {
        let message = format!(
            "{must}, but {}, which supports it, lasts {:.0} min",
            link.name,
            lasts.floor()
        );
        link.add(&DECLARATION, message);
    } else if let Some((own, other)) = link.fires {
        let message = format!(
            "{must} in the fire `{own}`, but {}, which supports it, is verified in the fire `{other}` only",
            link.name
        );
        link.warn(&DECLARATION, message);
    }
}
