//! What a protection product is, as far as thickness depends on it.

use std::hash::{Hash, Hasher};

use crate::heating::flux::Insulation;
use crate::protection::table::Table;
use crate::units::{Length, SectionFactor, Temperature, Time};

/// The kind of product.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Kind {
    /// Boards, boxed unless stated.
    Board,
    /// Sprays.
    Spray,
    /// Reactive coatings: dry films by assessed tables only.
    Coating,
    /// Concrete encasement.
    Concrete,
}

impl Kind {
    /// The word of the file.
    #[must_use]
    pub const fn word(self) -> &'static str {
        match self {
            Self::Board => "board",
            Self::Spray => "spray",
            Self::Coating => "coating",
            Self::Concrete => "concrete",
        }
    }
}

/// How the thickness of a product is found.
#[derive(Debug, Clone, PartialEq)]
pub enum Method {
    /// Thermal properties (EN 1993-1-2:2005 4.2.5.2).
    Properties(Insulation),
    /// Assessed tables of dry film (the output of an EN 13381-8, -9 or -10 assessment).
    Tables {
        /// The tables.
        tables: Vec<Table>,
        /// Whether values between entries are interpolated; otherwise the next more onerous entry is taken.
        interpolate: bool,
    },
    /// The regression of EN 13381-4, read but not yet computed.
    Regression(Box<[f64; 8]>),
}

/// The shape of a section as assessments tell them apart.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum ShapeClass {
    /// I, H, channels, angles, tees.
    Open,
    /// Square and rectangular hollow sections.
    RectangularHollow,
    /// Circular hollow sections.
    CircularHollow,
    /// Beams with web openings.
    Cellular,
    /// Solid bars.
    Solid,
}

impl ShapeClass {
    /// The words of the file.
    #[must_use]
    pub const fn words(self) -> &'static str {
        match self {
            Self::Open => "open",
            Self::RectangularHollow => "rectangular hollow",
            Self::CircularHollow => "circular hollow",
            Self::Cellular => "cellular",
            Self::Solid => "solid",
        }
    }
}

/// The range that was assessed. What is not stated is not known.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Assessed {
    /// Section factors.
    pub factor: Option<(SectionFactor, SectionFactor)>,
    /// Thicknesses of all layers, or dry films.
    pub thickness: Option<(Length, Length)>,
    /// Steel temperatures.
    pub temperature: Option<(Temperature, Temperature)>,
    /// Periods.
    pub period: Option<(Time, Time)>,
    /// Shapes; open sections where empty.
    pub shapes: Vec<ShapeClass>,
    /// Whether it was assessed as beam and as column; both where neither is stated.
    pub beam: bool,
    /// See `beam`.
    pub column: bool,
}

/// A product by content.
#[derive(Debug, Clone, PartialEq)]
pub struct Product {
    /// Kind.
    pub kind: Kind,
    /// How its thickness is found.
    pub method: Method,
    /// The range that was assessed.
    pub assessed: Assessed,
    /// Stock thicknesses, ascending.
    pub stock: Vec<Length>,
    /// Step of the thickness where there is no stock.
    pub round_to: Option<Length>,
    /// Most layers; one unless stated.
    pub most_layers: u32,
    /// Greatest dry film of one coat.
    pub most_per_coat: Option<Length>,
    /// Volume solids of a coating, as a share.
    pub volume_solids: Option<f64>,
}

impl Eq for Product {}

impl Hash for Product {
    fn hash<H: Hasher>(&self, state: &mut H) {
        (self.kind, self.most_layers).hash(state);
        match &self.method {
            Method::Properties(insulation) => insulation.hash(state),
            Method::Tables { tables, interpolate } => {
                interpolate.hash(state);
                tables.iter().for_each(|table| table.hash_bits(state));
            }
            Method::Regression(numbers) => numbers.iter().for_each(|number| number.to_bits().hash(state)),
        }
        let assessed = &self.assessed;
        assessed.factor.map(|(a, b)| (a.bits(), b.bits())).hash(state);
        assessed.thickness.map(|(a, b)| (a.bits(), b.bits())).hash(state);
        assessed.temperature.map(|(a, b)| (a.bits(), b.bits())).hash(state);
        assessed.period.map(|(a, b)| (a.bits(), b.bits())).hash(state);
        (&assessed.shapes, assessed.beam, assessed.column).hash(state);
        self.stock.iter().for_each(|length| length.bits().hash(state));
        (self.round_to.map(Length::bits), self.most_per_coat.map(Length::bits)).hash(state);
    }
}
