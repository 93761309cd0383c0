//! The shapes of cross-sections, one file a family.

mod angle;
mod channel;
mod error;
mod hollow;
mod i;
mod solid;
mod stated;
mod tee;

use std::hash::{Hash, Hasher};

pub use angle::Angle;
pub use channel::{Channel, TaperChannel};
pub use error::{LARGEST, Problem, SMALLEST, ShapeError};
pub use hollow::{CircularHollow, RectangularHollow};
pub use i::{ParallelI, TaperI, WeldedI};
pub use solid::{Flat, Round};
pub use stated::Stated;
pub use tee::{TaperTee, Tee};

use crate::section::geometry::{Flange, Geometry};
use crate::section::outline::Outline;
use crate::section::properties::Properties;
use crate::units::Length;

/// What kind of section it is, as assessments of fire protection tell them apart.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Kind {
    /// Open: I, H, channel, angle, tee.
    Open,
    /// Square or rectangular hollow.
    RectangularHollow,
    /// Circular hollow.
    CircularHollow,
    /// Solid bar: flat or round.
    Solid,
}

/// The shape of a cross-section with its nominal dimensions.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Shape {
    /// I or H with parallel flanges.
    I(ParallelI),
    /// I with taper flanges.
    TaperI(TaperI),
    /// I welded from plates.
    WeldedI(WeldedI),
    /// Channel with parallel flanges.
    Channel(Channel),
    /// Channel with taper flanges.
    TaperChannel(TaperChannel),
    /// Angle.
    Angle(Angle),
    /// Tee with a parallel flange.
    Tee(Tee),
    /// Tee with a taper flange.
    TaperTee(TaperTee),
    /// Square or rectangular hollow section.
    RectangularHollow(RectangularHollow),
    /// Circular hollow section.
    CircularHollow(CircularHollow),
    /// Flat bar.
    Flat(Flat),
    /// Round bar.
    Round(Round),
    /// Stated figures.
    Stated(Stated),
}

/// What each family of shapes tells of itself; everything else follows from the outline.
trait Form {
    /// The name of the shape in design files and reports.
    fn name(&self) -> &'static str;

    /// Refuses dimensions that no section can have.
    fn check(&self) -> Result<(), ShapeError>;

    /// The outer outline; none where only figures are known.
    fn outer(&self) -> Result<Option<Outline>, ShapeError>;

    /// The outline of the hole of a hollow section.
    fn hole(&self) -> Result<Option<Outline>, ShapeError> {
        Ok(None)
    }

    /// The kind, if known.
    fn kind(&self) -> Option<Kind>;

    /// The flange that "flange only" exposes, if the shape has one.
    fn flange(&self) -> Option<Flange> {
        None
    }

    /// The dimensions by their keys in design files, mm (areas mm², masses kg/m, slopes plain), in a fixed order.
    fn dimensions(&self) -> Vec<(&'static str, f64)>;
}

impl Shape {
    fn form(&self) -> &dyn Form {
        match self {
            Self::I(form) => form,
            Self::TaperI(form) => form,
            Self::WeldedI(form) => form,
            Self::Channel(form) => form,
            Self::TaperChannel(form) => form,
            Self::Angle(form) => form,
            Self::Tee(form) => form,
            Self::TaperTee(form) => form,
            Self::RectangularHollow(form) => form,
            Self::CircularHollow(form) => form,
            Self::Flat(form) => form,
            Self::Round(form) => form,
            Self::Stated(form) => form,
        }
    }

    /// The name of the shape: `i`, `taper i`, `rectangular hollow`, ...
    #[must_use]
    pub fn name(&self) -> &'static str {
        self.form().name()
    }

    /// Whether the section can be: finite, positive dimensions that fit together, radii included.
    ///
    /// # Errors
    /// The first dimension at fault.
    pub fn check(&self) -> Result<(), ShapeError> {
        self.outlines().map(|_| ())
    }

    /// The dimensions by their keys in design files, mm (areas mm², masses kg/m, slopes plain), in a fixed order.
    #[must_use]
    pub fn dimensions(&self) -> Vec<(&'static str, f64)> {
        self.form().dimensions()
    }

    /// One dimension by its key: `h`, `tw`, `d`, ...; none if the shape has no such dimension.
    #[must_use]
    pub fn dimension(&self, key: &str) -> Option<Length> {
        let named = self.dimensions().into_iter().find(|(name, _)| *name == key)?;
        Some(Length::from_mm(named.1))
    }

    /// The kind of section; none for stated figures.
    #[must_use]
    pub fn kind(&self) -> Option<Kind> {
        self.form().kind()
    }

    /// Whether it is an I or H, for which EN 1993-1-2:2005 (4.26a) has its own shadow factor.
    #[must_use]
    pub const fn is_i(&self) -> bool {
        matches!(self, Self::I(_) | Self::TaperI(_) | Self::WeldedI(_))
    }

    /// The flange that "flange only" exposes; none for a shape without one.
    #[must_use]
    pub fn flange(&self) -> Option<Flange> {
        self.form().flange()
    }

    /// The outer outline and the hole, for drawing; no outline for stated figures.
    ///
    /// # Errors
    /// As [`Shape::check`].
    pub fn outlines(&self) -> Result<(Option<Outline>, Option<Outline>), ShapeError> {
        let form = self.form();
        form.check()?;
        Ok((form.outer()?, form.hole()?))
    }

    /// Area, outline, box and what each face shields.
    ///
    /// # Errors
    /// As [`Shape::check`].
    pub fn geometry(&self) -> Result<Geometry, ShapeError> {
        Geometry::of(self)
    }

    /// Centroid, second moments, moduli and radii of gyration; none for stated figures.
    ///
    /// # Errors
    /// As [`Shape::check`].
    pub fn properties(&self) -> Result<Option<Properties>, ShapeError> {
        Properties::of(self)
    }

    /// Feeds the shape to a hasher by the bits of its dimensions: equal feeds mean the same section, whatever it is
    /// called.
    pub fn hash_bits<H: Hasher>(&self, state: &mut H) {
        std::mem::discriminant(self).hash(state);
        for (name, value) in self.form().dimensions() {
            name.hash(state);
            state.write_u64(value.to_bits());
        }
    }
}
