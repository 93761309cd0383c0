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
use crate::analysis::design::MemberAt;
use crate::analysis::source::FileKind;
use crate::check::Checked;

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
    for (at, outcome) in design.members.iter().zip(&checked.outcomes) {
        let mut row = row::row(design, design.member(*at).value(), outcome);
        if let Some((findings, departures)) = by_member.remove(at) {
            row.findings = findings;
            row.departures = departures;
        }
        out.push(row);
    }
}
