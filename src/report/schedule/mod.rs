//! The fire protection schedule: a row a member, totals a product, the basis and what to be careful of.

pub mod basis;
mod cautions;
pub mod quantities;
pub mod row;
pub mod totals;

use rustc_hash::FxHashMap;
use serde::Serialize;

use self::basis::Basis;
use self::row::Row;
use self::totals::{ProductTotal, Totals};
use crate::analysis::design::{Design, FileIndex, MemberAt};
use crate::analysis::inputs::Names;
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::Verdict;
use crate::analysis::source::FileKind;
use crate::check::Checked;
use crate::design::model::member::Member;
use crate::findings::finding::{Finding, Severity};
use crate::text::Span;

/// The schedule.
#[derive(Debug, Clone, Default, Serialize)]
pub struct Schedule {
    /// A row a member, in the order of the files.
    pub members: Vec<Row>,
    /// Totals a product.
    pub products: Vec<ProductTotal>,
    /// Totals of the whole.
    pub totals: Totals,
    /// What it rests on.
    pub basis: Basis,
    /// What to be careful of; each a sentence.
    pub cautions: Vec<String>,
}

/// Makes the schedule of designs; several stand one after the other in one schedule.
#[must_use]
pub fn schedule(checked: &[Checked]) -> Schedule {
    let mut members = Vec::new();
    let mut bases: Vec<Basis> = Vec::new();
    // A library by itself is a design without members, and has no basis.
    for design in checked
        .iter()
        .filter(|design| design.design.files[0].kind == FileKind::Steelwork)
    {
        bases.push(basis::basis(design.design.project(), design.design.basis()));
        rows(design, &mut members);
    }
    let bases_differ = bases.windows(2).any(|pair| pair[0] != pair[1]);
    let one_currency = bases.windows(2).all(|pair| pair[0].currency == pair[1].currency);
    let cautions = cautions::cautions(checked, &members, bases_differ);
    let basis = bases
        .clone()
        .into_iter()
        .reduce(|a, b| basis::common(a, &b))
        .unwrap_or_default();
    Schedule {
        products: totals::by_product(&members),
        totals: totals::totals(&members, one_currency),
        basis,
        cautions,
        members,
    }
}

fn rows(checked: &Checked, out: &mut Vec<Row>) {
    let design = &checked.design;
    let mut by_member: FxHashMap<MemberAt, (Vec<String>, Vec<String>)> = FxHashMap::default();
    for (finding, agreed) in (checked.findings.iter().map(|finding| (finding, false)))
        .chain(checked.agreed.iter().map(|finding| (finding, true)))
    {
        if let Some(member) = finding.member {
            let (open, departures) = by_member.entry(member).or_default();
            let names = if agreed { departures } else { open };
            names.push(finding.name().to_owned());
        }
    }
    let shared = faults(checked);
    let names = Names {
        design,
        options: lookup_options(design.basis()),
    };
    for (at, outcome) in design.members.iter().zip(&checked.outcomes) {
        let member = design.member(*at).value();
        let mut row = row::row(&names, member, outcome);
        if let Some((findings, departures)) = by_member.remove(at) {
            row.findings = findings;
            row.departures = departures;
        }
        if outcome.verdict == Verdict::NotVerified {
            row.findings.extend(inherited_faults(design, member, &shared));
        }
        out.push(row);
    }
}

/// Errors outside the members.
fn faults(checked: &Checked) -> Vec<&Finding> {
    let outside = |finding: &&Finding| finding.member.is_none() && finding.severity == Severity::Error;
    checked.findings.iter().filter(outside).collect()
}

/// The errors, outside a member that is not verified, in what it inherits or is protected by: its group, its product, and
/// what the head file says for all.
fn inherited_faults(design: &Design, member: &Member, faults: &[&Finding]) -> Vec<String> {
    let keys = design.inherited(member);
    let group = keys.get(|keys| &keys.group).value().and_then(|name| design.group(name));
    let stated = keys.get(|keys| &keys.protection).value();
    let product = stated.and_then(|stated| design.product(&stated.product.as_ref()?.value));
    let items = [
        group.map(|(file, item)| (file, item.piece.span)),
        product.map(|(file, item)| (file, item.piece.span)),
    ];
    let head = design.files[0].entries.iter().map(|piece| (0, piece.span));
    let pieces: Vec<(FileIndex, Span)> = items.into_iter().flatten().chain(head).collect();
    let within = |finding: &&&Finding| {
        let (path, at) = (&finding.place.path, finding.place.span);
        pieces
            .iter()
            .any(|(file, piece)| design.files[*file].path == *path && piece.start <= at.start && at.end <= piece.end)
    };
    let mut names: Vec<String> = faults
        .iter()
        .filter(within)
        .map(|finding| finding.name().to_owned())
        .collect();
    names.dedup();
    names
}
