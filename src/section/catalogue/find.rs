//! Finding a row by its designation.

use rustc_hash::FxHashMap;

use super::key::Key;
use super::{CatalogueRow, Finish, Table, catalogue};
use crate::section::shape::Shape;
use crate::units::Length;

/// What settles a designation that several rows answer to.
#[derive(Debug, Clone, Default, PartialEq, Eq, Hash)]
pub struct LookupOptions {
    /// The tables to be preferred; none means all alike.
    pub tables: Option<Vec<Table>>,
    /// The finish of hollow sections to be preferred.
    pub hollow: Option<Finish>,
}

/// What a designation was found to mean.
#[derive(Debug, Clone)]
pub enum Lookup {
    /// One section.
    Found(&'static CatalogueRow),
    /// Several different sections.
    Ambiguous(Vec<&'static CatalogueRow>),
    /// None.
    Unknown {
        /// Rows with a designation much like it, nearest first.
        nearest: Vec<&'static CatalogueRow>,
    },
}

/// Finds the row of a designation, however it is written.
///
/// Case, spaces, `x`/`×`/`*`, the decimal comma and the order of family, numbers and letters make no difference; numbers
/// without a family are never taken. A finish in the text (`SHS HF 150x150x8`) must be met. If rows of different tables
/// or finishes answer, the preferences of `options` settle it where they leave some row. Rows with the very same
/// dimensions are one section: the first in the order of [`Table::ALL`] is named. Anything else is ambiguous.
#[must_use]
pub fn find(text: &str, options: &LookupOptions) -> Lookup {
    let found = matching(text, options);
    match (one(&found), found.is_empty()) {
        (Some(row), _) => Lookup::Found(row),
        (None, true) => Lookup::Unknown {
            nearest: catalogue().nearest(text),
        },
        (None, false) => Lookup::Ambiguous(found),
    }
}

/// The row that [`find`] finds, without the costly search for the nearest where it finds none.
#[must_use]
pub fn row(text: &str, options: &LookupOptions) -> Option<&'static CatalogueRow> {
    one(&matching(text, options))
}

/// The row that all of these are, if they have the very same dimensions.
fn one(found: &[&'static CatalogueRow]) -> Option<&'static CatalogueRow> {
    let (first, rest) = found.split_first()?;
    rest.iter().all(|row| row.shape == first.shape).then_some(first)
}

/// The rows that answer to a designation once the finish and the preferences have been heeded.
fn matching(text: &str, options: &LookupOptions) -> Vec<&'static CatalogueRow> {
    let catalogue = catalogue();
    let Some(key) = Key::of(text).filter(|key| !key.letters.is_empty() && !key.numbers.is_empty()) else {
        return Vec::new();
    };
    let mut found: Vec<&'static CatalogueRow> = catalogue
        .index
        .rows_of(&key)
        .iter()
        .map(|n| &catalogue.rows[usize::from(*n)])
        .collect();
    if let Some(finish) = key.finish {
        found.retain(|row| row.finish.is_none_or(|own| own == finish));
        // Only the European table tells finishes apart in its designations; `RHS CF 200x100x6` is written as it does.
        prefer(&mut found, |row| row.table == Table::EU);
    }
    if let Some(tables) = &options.tables {
        prefer(&mut found, |row| tables.contains(&row.table));
    }
    if let Some(finish) = options.hollow {
        prefer(&mut found, |row| row.finish.is_none_or(|own| own == finish));
    }
    found
}

/// Keeps the rows that meet a preference, or all if none does.
fn prefer(rows: &mut Vec<&'static CatalogueRow>, wanted: impl Fn(&CatalogueRow) -> bool) {
    if rows.iter().any(|row| wanted(row)) {
        rows.retain(|row| wanted(row));
    }
}

/// Rows by key.
pub(super) struct Index {
    by_key: FxHashMap<Box<str>, Vec<u16>>,
}

impl Index {
    pub fn of(rows: &[CatalogueRow]) -> Self {
        let mut by_key: FxHashMap<Box<str>, Vec<u16>> = FxHashMap::default();
        for (n, row) in (0_u16..).zip(rows) {
            for key in keys(row) {
                let held = by_key.entry(key.into()).or_default();
                if held.last() != Some(&n) {
                    held.push(n);
                }
            }
        }
        Self { by_key }
    }

    fn rows_of(&self, key: &Key) -> &[u16] {
        let exact = self.by_key.get(key.index().as_str());
        let other = || {
            let letters = other_name(&key.letters, key.numbers.len())?;
            self.by_key.get(key.index_as(letters).as_str())
        };
        exact.or_else(other).map_or(&[], Vec::as_slice)
    }
}

/// Other names in the trade for a family, taken only where no row goes by the name itself.
pub(super) fn other_name(letters: &str, numbers: usize) -> Option<&'static str> {
    Some(match letters {
        "unp" => "upn",
        "u" if numbers == 1 => "upn",
        "inp" => "ipn",
        "ukb" => "ub",
        "ukc" => "uc",
        "ukbp" => "ubp",
        "ukpfc" => "pfc",
        "rsa" | "ea" | "ua" => "l",
        "hs" => "hss",
        "hss" => "hs",
        _ => return None,
    })
}

/// The keys under which a row is found: its designation, and the short forms in use.
pub(super) fn keys(row: &CatalogueRow) -> Vec<String> {
    let Some(key) = Key::of(&row.designation) else {
        return Vec::new();
    };
    let with = |letters: &str, numbers: &[Length]| {
        Key {
            letters: letters.to_owned(),
            numbers: numbers.iter().map(|n| n.mm()).collect(),
            finish: None,
        }
        .index()
    };
    let mut keys = vec![key.index()];
    match (&row.shape, row.table) {
        // A square goes by its side once or twice, and by RHS too.
        (Shape::RectangularHollow(s), Table::EU | Table::AU) if s.h == s.b => {
            keys.push(with("shs", &[s.h, s.t]));
            keys.push(with("shs", &[s.h, s.b, s.t]));
            keys.push(with("rhs", &[s.h, s.b, s.t]));
        }
        (Shape::Angle(s), Table::EU) if s.h == s.b => keys.push(with("l", &[s.h, s.t])),
        _ => {}
    }
    // `ISMC 125 (heavy, 13.7 kg/m)` goes by its depth and mass.
    if let Some((name, _)) = row.designation.split_once(" (")
        && let Some(mut short) = Key::of(name)
    {
        short.numbers.push(row.mass.kg_m());
        keys.push(short.index());
    }
    keys
}
