//! The catalogue of rolled, welded and hollow sections.
//!
//! The tables are embedded; `tables/NOTICE` tells where each row comes from and under which licence. They are read once,
//! at the first question.

mod family;
mod find;
mod key;
mod nearest;
mod radii;
mod read;
mod typed;

use std::fmt;
use std::sync::OnceLock;

pub use family::family_neighbours;
pub use find::{Lookup, LookupOptions, find, row};
pub use typed::{Begun, alike, beginning};

use crate::section::geometry::Geometry;
use crate::section::properties::Properties;
use crate::section::shape::Shape;
use crate::units::{Area, LinearMass};

/// A section table, by the market that it serves.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Table {
    /// European: EN 10365, EN 10279, EN 10056-1, EN 10210-2, EN 10219-2.
    EU,
    /// British: BS 4-1 and the large beams of EN 10365.
    UK,
    /// United States: ASTM A6, A500, A53.
    US,
    /// Canadian: CSA G40.20.
    CA,
    /// Australian and New Zealand: AS/NZS 3679.1, 3679.2, 1163.
    AU,
    /// Indian: IS 808.
    IN,
}

impl Table {
    /// All tables, in the order in which identical sections are named.
    pub const ALL: [Self; 6] = [Self::EU, Self::UK, Self::US, Self::CA, Self::AU, Self::IN];

    /// The code of the table in design files.
    #[must_use]
    pub const fn code(self) -> &'static str {
        match self {
            Self::EU => "EU",
            Self::UK => "UK",
            Self::US => "US",
            Self::CA => "CA",
            Self::AU => "AU",
            Self::IN => "IN",
        }
    }
}

impl fmt::Display for Table {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.write_str(self.code())
    }
}

/// How a hollow section was made: its corner radii depend on it.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Finish {
    /// Hot finished (EN 10210).
    HotFinished,
    /// Cold formed (EN 10219, AS/NZS 1163, ASTM A500).
    ColdFormed,
}

/// A row of a section table.
#[derive(Debug)]
pub struct CatalogueRow {
    /// The designation as the table writes it.
    pub designation: Box<str>,
    /// The family within the table: `IPE`, `HEB`, `UB`, `SHS_HF`, ...
    pub family: Box<str>,
    /// The table.
    pub table: Table,
    /// The standard that the dimensions are of.
    pub standard: &'static str,
    /// The shape with its nominal dimensions.
    pub shape: Shape,
    /// How a hollow section was made, where the table tells finishes apart.
    pub finish: Option<Finish>,
    /// The nominal mass.
    pub mass: LinearMass,
    /// The area as printed, rounded; computations go by [`CatalogueRow::geometry`].
    pub printed_area: Area,
    /// The package and licence that the row was taken from.
    pub source: Box<str>,
    geometry: Geometry,
    properties: OnceLock<Option<Properties>>,
}

impl CatalogueRow {
    /// Area, outline and box, exact from the nominal dimensions.
    #[must_use]
    pub const fn geometry(&self) -> &Geometry {
        &self.geometry
    }

    /// Centroid, second moments and radii of gyration.
    #[must_use]
    pub fn properties(&self) -> Option<&Properties> {
        self.properties
            .get_or_init(|| self.shape.properties().ok().flatten())
            .as_ref()
    }
}

/// Every row, table by table in the order of [`Table::ALL`], each as its table orders them.
#[must_use]
pub fn rows() -> &'static [CatalogueRow] {
    &catalogue().rows
}

/// The rows with what finds them.
struct Catalogue {
    rows: Vec<CatalogueRow>,
    index: find::Index,
    nearest: OnceLock<nearest::Candidates>,
}

impl Catalogue {
    /// What misspelt designations are compared with; made at the first of them.
    fn nearest(&'static self, text: &str) -> Vec<&'static CatalogueRow> {
        let candidates = self.nearest.get_or_init(|| nearest::Candidates::of(&self.rows));
        candidates.to(text, &self.rows)
    }
}

fn catalogue() -> &'static Catalogue {
    static CATALOGUE: OnceLock<Catalogue> = OnceLock::new();
    CATALOGUE.get_or_init(|| {
        let rows = read::all();
        let index = find::Index::of(&rows);
        let nearest = OnceLock::new();
        Catalogue { rows, index, nearest }
    })
}

#[cfg(test)]
mod tests;
