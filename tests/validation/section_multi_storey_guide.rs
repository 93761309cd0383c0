//! Source: Steel Buildings in Europe, Multi-Storey Steel Buildings, Part 6, p. 6-51: IPE 300 on three sides, profile 200,
//! box 145 1/m, worked out without fillets. Status: published (read). Tolerance: 2.5 1/m, as the page rounds to 5.

use crate::support::{factor, near, row};
use scorchline::section::shape::ParallelI;
use scorchline::section::{Casing, Exposure, Shape};
use scorchline::units::Length;

#[test]
fn ipe_300_with_sharp_corners() {
    let Shape::I(rolled) = row("IPE 300").shape else {
        panic!("IPE 300 is an I")
    };
    let sharp = Shape::I(ParallelI {
        r: Length::from_mm(0.0),
        ..rolled
    });
    let geometry = sharp.geometry().unwrap();
    let per_m = |casing| factor(&geometry, Exposure::ThreeSides, casing).factor.per_m();
    near("profile", per_m(Casing::Profile), 200.0, 2.5);
    near("box", per_m(Casing::Box), 145.0, 2.5);
}
