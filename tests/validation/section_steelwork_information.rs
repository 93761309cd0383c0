//! Source: the steelwork information site of the UK sector, "Calculating section factors": 533x210x82 UB. Status:
//! published, second-hand. Tolerance: half the last digit of the outline; 0.3 % of the factor, whose area is printed as
//! 105 cm².

use crate::support::{near, within};
use scorchline::section::Shape;
use scorchline::section::shape::ParallelI;
use scorchline::units::Length;

#[test]
fn beam_533x210x82() {
    let mm = Length::from_mm;
    let beam = Shape::I(ParallelI {
        h: mm(528.3),
        b: mm(208.8),
        tw: mm(9.6),
        tf: mm(13.2),
        r: mm(12.7),
    });
    let geometry = beam.geometry().unwrap();
    near("outline", geometry.perimeter.mm(), 1851.0, 0.8);
    near(
        "factor over the printed area",
        geometry.perimeter.mm() / 105e2 * 1e3,
        176.3,
        0.1,
    );
    within("area", geometry.area.mm2(), 10500.0, 3e-3);
    // The catalogue has the same beam.
    let row = crate::support::row("533x210x82 UB");
    near("h", row.geometry().height.unwrap().mm(), 528.3, 1e-9);
}
