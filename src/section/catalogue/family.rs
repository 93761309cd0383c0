//! The sections of a family.

use super::{CatalogueRow, rows};

/// The rows of the same family and table as `row`, itself included, lightest first.
#[must_use]
pub fn family_neighbours(row: &CatalogueRow) -> Vec<&'static CatalogueRow> {
    let mut family: Vec<_> = rows()
        .iter()
        .filter(|other| other.table == row.table && other.family == row.family)
        .collect();
    family.sort_by(|a, b| a.mass.kg_m().total_cmp(&b.mass.kg_m()));
    family
}
