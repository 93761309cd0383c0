//! What the fire reaches: heated perimeter and section factor (EN 1993-1-2:2005 Tables 4.2 and 4.3).

use std::fmt;

use crate::section::geometry::Geometry;
use crate::units::{Area, Length, SectionFactor};

/// A face of the box that encloses a section.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Face {
    /// The top, where a slab lies.
    Top,
    /// The right-hand side.
    Right,
    /// The bottom.
    Bottom,
    /// The left-hand side.
    Left,
}

impl Face {
    /// All four.
    pub const ALL: [Self; 4] = [Self::Top, Self::Right, Self::Bottom, Self::Left];

    const fn bit(self) -> u8 {
        1 << (self as u8)
    }
}

/// A set of faces.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Default)]
pub struct Faces(u8);

impl Faces {
    /// No face.
    pub const NONE: Self = Self(0);
    /// All four faces.
    pub const ALL: Self = Self(15);
    /// The top alone: what "three sides" covers.
    pub const TOP: Self = Self(Face::Top.bit());

    /// The set and one face more.
    #[must_use]
    pub const fn with(self, face: Face) -> Self {
        Self(self.0 | face.bit())
    }

    /// The set less the faces of another.
    #[must_use]
    pub const fn without(self, other: Self) -> Self {
        Self(self.0 & !other.0)
    }

    /// Whether the face is in the set.
    #[must_use]
    pub const fn contains(self, face: Face) -> bool {
        self.0 & face.bit() != 0
    }

    /// Whether no face is in the set.
    #[must_use]
    pub const fn is_empty(self) -> bool {
        self.0 == 0
    }

    pub(crate) const fn bits(self) -> u8 {
        self.0
    }

    pub(crate) const fn from_bits(bits: u8) -> Self {
        Self(bits & 15)
    }
}

impl From<Face> for Faces {
    fn from(face: Face) -> Self {
        Self::NONE.with(face)
    }
}

impl FromIterator<Face> for Faces {
    fn from_iter<T: IntoIterator<Item = Face>>(faces: T) -> Self {
        faces.into_iter().fold(Self::NONE, Self::with)
    }
}

/// What of a section the fire reaches.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Exposure {
    /// The whole outline.
    AllRound,
    /// The top face of the enclosing box is covered.
    ThreeSides,
    /// One flange alone; the rest is built in.
    FlangeOnly,
    /// The named faces of the enclosing box are covered along their whole width. A cover closes the pockets behind it
    /// that open to covered faces only.
    Covered(Faces),
    /// A stated length of outline, over the whole area.
    Perimeter(Length),
}

/// How the protection, if any, follows the section.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Casing {
    /// None: bare steel.
    Bare,
    /// Protection along the outline.
    Profile,
    /// Protection as a box around the outline.
    Box,
}

/// Heated perimeter over area.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Heated {
    /// The heated perimeter: of the steel, or of the inside of the box.
    pub perimeter: Length,
    /// The area that it heats: the whole section, or the flange where it alone is exposed.
    pub area: Area,
    /// The section factor Am/V, or Ap/V where protected, 1/m.
    pub factor: SectionFactor,
}

impl Heated {
    fn new(perimeter: Length, area: Area) -> Self {
        Self {
            perimeter,
            area,
            factor: SectionFactor::from_perimeter(perimeter, area),
        }
    }

    /// The effective thickness V/A, the inverse of the factor.
    #[must_use]
    pub fn effective_thickness(&self) -> Length {
        self.factor.effective_thickness()
    }
}

/// Why an exposure means nothing for a section.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum ExposureRefusal {
    /// "Flange only" of a section that has no flange.
    NoFlange,
    /// Faces are covered, but of the section only figures are known.
    FacesUnknown,
    /// A box is wanted, but of the section only figures without a box are known.
    BoxUnknown,
    /// The faces covered leave nothing for the fire.
    NothingExposed,
    /// The stated perimeter is not a length above zero and at most 100 m.
    PerimeterImpossible,
    /// The stated perimeter exceeds the whole outline.
    PerimeterBeyondOutline {
        /// The stated length.
        stated: Length,
        /// The whole outline, or the box.
        whole: Length,
    },
}

impl fmt::Display for ExposureRefusal {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NoFlange => f.write_str("this section has no flange that could be exposed alone"),
            Self::FacesUnknown => {
                f.write_str("of a stated section the faces are not known; state the exposed perimeter instead")
            }
            Self::BoxUnknown => f.write_str("of a stated section without a box perimeter the box is not known"),
            Self::NothingExposed => f.write_str("the faces covered leave nothing of the section exposed"),
            Self::PerimeterImpossible => f.write_str("the exposed perimeter must be a length above zero"),
            Self::PerimeterBeyondOutline { stated, whole } => write!(
                f,
                "the exposed perimeter of {:.0} mm is longer than the whole of {:.0} mm",
                stated.mm(),
                whole.mm()
            ),
        }
    }
}

impl std::error::Error for ExposureRefusal {}

/// Heated perimeter and section factor of a section (EN 1993-1-2:2005 Table 4.2 bare, Table 4.3 protected).
///
/// Bare and profile: the exposed outline over the area. Box: the exposed sides of the enclosing box over the area; a
/// gap between box and steel up to h/4 is left out of account as Table 4.3 allows. Flange only: (b + 2 tf)/(b tf) of
/// the flange itself, whatever the casing.
///
/// # Errors
/// When the exposure means nothing for the section.
pub fn heated(geometry: &Geometry, exposure: Exposure, casing: Casing) -> Result<Heated, ExposureRefusal> {
    match exposure {
        Exposure::FlangeOnly => flange_only(geometry),
        Exposure::Perimeter(stated) => stated_perimeter(geometry, stated, casing),
        Exposure::AllRound => with_covered(geometry, Faces::NONE, casing),
        Exposure::ThreeSides => with_covered(geometry, Faces::TOP, casing),
        Exposure::Covered(faces) => with_covered(geometry, faces, casing),
    }
}

/// A flange exposed on its underside and both edges: (b + 2 tf)/(b tf).
fn flange_only(geometry: &Geometry) -> Result<Heated, ExposureRefusal> {
    let flange = geometry.flange.ok_or(ExposureRefusal::NoFlange)?;
    let (b, tf) = (flange.width.mm(), flange.thickness.mm());
    Ok(Heated::new(Length::from_mm(b + 2.0 * tf), Area::from_mm2(b * tf)))
}

fn stated_perimeter(geometry: &Geometry, stated: Length, casing: Casing) -> Result<Heated, ExposureRefusal> {
    if !(stated.mm() > 0.0 && stated.mm() <= 1e5) {
        return Err(ExposureRefusal::PerimeterImpossible);
    }
    let whole = match casing {
        Casing::Bare | Casing::Profile => Some(geometry.perimeter),
        Casing::Box => geometry.box_perimeter,
    };
    // Figures on drawings are rounded to the millimetre or to three digits.
    match whole {
        Some(whole) if stated.mm() > whole.mm() * 1.01 => {
            Err(ExposureRefusal::PerimeterBeyondOutline { stated, whole })
        }
        _ => Ok(Heated::new(stated, geometry.area)),
    }
}

fn with_covered(geometry: &Geometry, covered: Faces, casing: Casing) -> Result<Heated, ExposureRefusal> {
    let perimeter = match casing {
        Casing::Bare | Casing::Profile if covered.is_empty() => geometry.perimeter,
        Casing::Box if covered.is_empty() => geometry.box_perimeter.ok_or(ExposureRefusal::BoxUnknown)?,
        Casing::Bare | Casing::Profile => {
            let faces = geometry.faces.ok_or(ExposureRefusal::FacesUnknown)?;
            Length::from_mm(faces.exposed(covered))
        }
        Casing::Box => geometry.open_box(covered).ok_or(ExposureRefusal::FacesUnknown)?,
    };
    if perimeter.mm() > 0.0 {
        Ok(Heated::new(perimeter, geometry.area))
    } else {
        Err(ExposureRefusal::NothingExposed)
    }
}
