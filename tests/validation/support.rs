//! What the files of this folder share.

use scorchline::section::catalogue::{CatalogueRow, Lookup, LookupOptions, Table, find};
use scorchline::section::{Casing, Exposure, Geometry, Heated, heated};

/// The one row of a designation.
#[track_caller]
pub fn row(designation: &str) -> &'static CatalogueRow {
    row_of(designation, None)
}

/// The one row of a designation, a table being preferred.
#[track_caller]
pub fn row_of(designation: &str, table: Option<Table>) -> &'static CatalogueRow {
    let options = LookupOptions {
        tables: table.map(|table| vec![table]),
        hollow: None,
    };
    match find(designation, &options) {
        Lookup::Found(row) => row,
        other => panic!("{designation}: {other:?}"),
    }
}

/// The heated perimeter and section factor.
#[track_caller]
pub fn factor(geometry: &Geometry, exposure: Exposure, casing: Casing) -> Heated {
    heated(geometry, exposure, casing).unwrap()
}

/// Holds a value to a published one within a share of it.
#[track_caller]
pub fn within(what: &str, value: f64, published: f64, share: f64) {
    assert!(
        (value - published).abs() <= share * published.abs(),
        "{what}: {value} against {published}, more than {share} off"
    );
}

/// Holds a value to a published one within an absolute tolerance.
#[track_caller]
pub fn near(what: &str, value: f64, published: f64, tolerance: f64) {
    assert!(
        (value - published).abs() <= tolerance,
        "{what}: {value} against {published}, more than {tolerance} off"
    );
}
