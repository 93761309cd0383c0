//! The shadow factor of bare steel (EN 1993-1-2:2005 4.2.5.1 (2)).

use crate::section::exposure::{Casing, Exposure, ExposureRefusal, Faces, heated};
use crate::section::geometry::Geometry;

/// The correction factor for the shadow effect, ksh, of a bare section; never above 1.
///
/// (4.26a) I-sections under nominal fire actions: 0.9 [Am/V]b/[Am/V]; (4.26b) all other cases: [Am/V]b/[Am/V], b
/// being the box. 1 where nothing shades: a convex outline, a single flange, a stated perimeter, covered faces that
/// leave no pocket open, and stated figures without a box. Protected sections have none.
///
/// # Errors
/// When the exposure means nothing for the section.
pub fn shadow_factor(geometry: &Geometry, exposure: Exposure, nominal_fire: bool) -> Result<f64, ExposureRefusal> {
    let bare = heated(geometry, exposure, Casing::Bare)?;
    let covered = match exposure {
        Exposure::FlangeOnly | Exposure::Perimeter(_) => return Ok(1.0),
        Exposure::AllRound => Faces::NONE,
        Exposure::ThreeSides => Faces::TOP,
        Exposure::Covered(faces) => faces,
    };
    let no_pocket = geometry.faces.is_some_and(|faces| !faces.has_open_pocket(covered));
    if geometry.convex || no_pocket {
        return Ok(1.0);
    }
    let in_box = match heated(geometry, exposure, Casing::Box) {
        Ok(in_box) => in_box,
        Err(ExposureRefusal::BoxUnknown) => return Ok(1.0),
        Err(refusal) => return Err(refusal),
    };
    let ratio = in_box.factor.per_m() / bare.factor.per_m();
    let share = if geometry.is_i && nominal_fire { 0.9 } else { 1.0 };
    Ok((share * ratio).min(1.0))
}
