//! Other measures of the same thing: weight over perimeter, surface over mass, and the box with a gap of AS 4100.

use crate::section::exposure::{Casing, Exposure, ExposureRefusal, Face, Faces, heated};
use crate::section::geometry::Geometry;
use crate::units::{Length, LinearMass};

/// 1 lb/ft/in in kg/m/mm, exact: 0.45359237 kg over 0.3048 m over 25.4 mm.
pub const LB_FT_IN: f64 = 0.453_592_37 / 0.3048 / 25.4;

/// Weight over heated perimeter W/D in lb/ft/in, as ASCE 29-05 and IBC 722.5 use it: W the nominal weight, D the
/// inside perimeter of the protection.
#[must_use]
pub fn weight_over_perimeter(mass: LinearMass, perimeter: Length) -> f64 {
    mass.kg_m() / perimeter.mm() / LB_FT_IN
}

/// Exposed surface area to mass ratio ksm of AS 4100 section 12, m²/t.
#[must_use]
pub fn surface_over_mass(mass: LinearMass, perimeter: Length) -> f64 {
    perimeter.m() / (mass.kg_m() / 1000.0)
}

/// The heated perimeter of a box held off the steel by `gap` on every exposed side, counted along the inner face of
/// the board as AS 4100 does: 2 (d + b) + 8 g all round, 2 d + b + 4 g on three sides. EN 1993-1-2 takes the steel's
/// own box instead, which [`heated`] gives.
///
/// # Errors
/// When the exposure means nothing for a box around the section.
pub fn gapped_box(geometry: &Geometry, exposure: Exposure, gap: Length) -> Result<Length, ExposureRefusal> {
    let covered = match exposure {
        Exposure::AllRound => Faces::NONE,
        Exposure::ThreeSides => Faces::TOP,
        Exposure::Covered(faces) => faces,
        Exposure::FlangeOnly | Exposure::Perimeter(_) => return Err(ExposureRefusal::FacesUnknown),
    };
    let own = heated(geometry, exposure, Casing::Box)?.perimeter;
    // Each corner between two exposed sides adds a gap to both of them; a side that ends at a covered face adds one
    // at its free end only, and none at the cover.
    let corners = [
        (Face::Top, Face::Right),
        (Face::Right, Face::Bottom),
        (Face::Bottom, Face::Left),
        (Face::Left, Face::Top),
    ];
    let open = corners
        .iter()
        .filter(|(a, b)| !covered.contains(*a) && !covered.contains(*b))
        .count();
    Ok(Length::from_mm(own.mm() + 2.0 * open as f64 * gap.mm()))
}
