//! Radii and slopes that the US and Canadian tables leave open, from what they do print.

use crate::section::shape::{Angle, ParallelI, Shape, TaperChannel, TaperI, TaperTee, Tee};
use crate::units::{Area, Length};

/// The slope of the inner faces of the flanges of an MC shape.
///
/// C and S shapes are rolled to 1 in 6 (ASTM A6); MC shapes are those that are not, and no table prints theirs. So it is
/// taken from the second moments about the weak axis that the US shapes database publishes (computed): 1 in 6 for the few
/// that are rolled like C shapes, about a tenth for three small ones, and for all others 4 to 8 %, here 5 %. A flatter
/// flange has the longer outline, so that none of the three lies on the side of too low a section factor.
pub(super) fn slope_of_mc(designation: &str) -> f64 {
    const LIKE_C: [&str; 8] = [
        "MC13X",
        "MC12X14.3",
        "MC12X10.6",
        "MC10X8.4",
        "MC8X8.5",
        "MC330x",
        "MC310x15.8",
        "MC250x12.5",
    ];
    const TENTH: [&str; 3] = ["MC6X7", "MC6X6.5", "MC3X7.1"];
    let is_one_of = |names: &[&str]| names.iter().any(|name| designation.starts_with(name));
    if is_one_of(&LIKE_C) || designation == "MC200x12.6" {
        1.0 / 6.0
    } else if is_one_of(&TENTH) {
        0.1
    } else {
        0.05
    }
}

/// The shape with no more steel in its corners than its printed area leaves room for.
///
/// The root radius of the US table comes from k, which is printed for detailing: rounded up, and for M, MT and a few HP
/// shapes too large by up to 5 % of the area. Toe radii it does not have at all. Too much area is too low a section factor,
/// so the corners are made to hold what the printed area has beyond the sharp-cornered plates:
///
/// - parallel flanges, where the shape exceeds its printed area by more than 1 %: by their root radius;
/// - taper flanges: by a toe radius of up to half of what the tip can hold, and by their root radius beyond it. The outline
///   is then within 0.7 % of that by the radii of American Standard shapes: at the root the least web of the depth and
///   0.1 in, at the toe 0.6 of that web (memory);
/// - angles: by their root radius alone; the toes are left sharp, the longer outline.
pub(super) fn within_printed_area(shape: Shape, printed: Area) -> Shape {
    let area = |shape: &Shape| shape.geometry().map_or(0.0, |g| g.area.mm2());
    let excess = area(&shape) - printed.mm2();
    let sharp = Length::from_mm(0.0);
    // A quarter round of radius r in a right angle holds this times r².
    let quarter = 1.0 - std::f64::consts::FRAC_PI_4;
    let root = |plates: Shape, corners: f64| {
        let rest = printed.mm2() - area(&plates);
        Length::from_mm((rest.max(0.0) / (corners * quarter)).sqrt())
    };
    match shape {
        Shape::I(i) if excess > 0.01 * printed.mm2() => Shape::I(ParallelI {
            r: root(Shape::I(ParallelI { r: sharp, ..i }), 4.0),
            ..i
        }),
        Shape::Tee(tee) if excess > 0.01 * printed.mm2() => Shape::Tee(Tee {
            r: root(Shape::Tee(Tee { r: sharp, ..tee }), 2.0),
            ..tee
        }),
        Shape::Angle(angle) if excess > 0.0 => Shape::Angle(Angle {
            root: root(Shape::Angle(Angle { root: sharp, ..angle }), 1.0),
            ..angle
        }),
        Shape::TaperI(i) if excess > 0.0 => {
            let tip = i.tf.mm() - i.slope * i.tf_at.mm();
            let (r, toe) = taper_corners(i.slope, tip, i.r, excess / 4.0);
            Shape::TaperI(TaperI { r, toe, ..i })
        }
        Shape::TaperChannel(channel) if excess > 0.0 => {
            let tip = channel.tf.mm() - channel.slope * channel.tf_at.mm();
            let (r, toe) = taper_corners(channel.slope, tip, channel.r, excess / 2.0);
            Shape::TaperChannel(TaperChannel { r, toe, ..channel })
        }
        Shape::TaperTee(tee) if excess > 0.0 => {
            let tip = tee.tf.mm() - tee.slope * tee.tf_at.mm();
            let (r, toe) = taper_corners(tee.slope, tip, tee.r, excess / 2.0);
            Shape::TaperTee(TaperTee { r, toe, ..tee })
        }
        other => other,
    }
}

/// The root and toe radius of a taper flange that has less by an area, mm², than with its root radius and a sharp toe.
fn taper_corners(slope: f64, tip: f64, root: Length, less: f64) -> (Length, Length) {
    // The faces turn by a quarter less the slope, at the root as at the toe.
    let turn = std::f64::consts::FRAC_PI_2 - slope.atan();
    let tangent = (turn / 2.0).tan();
    let area = tangent - turn / 2.0;
    let toe = (less / area).sqrt().min(0.5 * tip / tangent);
    let root = root.mm().powi(2) - (less / area - toe.powi(2));
    (Length::from_mm(root.max(0.0).sqrt()), Length::from_mm(toe))
}
