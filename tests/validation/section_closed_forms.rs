//! Source: EN 1993-1-2:2005 Tables 4.2 and 4.3 and 4.2.5.1 (2), with the closed forms of area and outline of an I section,
//! A = 2 b tf + (h - 2 tf) tw + (4 - π) r² and P = 4 b + 2 h - 2 tw - (8 - 2 π) r. Status: computed, memory of the
//! clauses. Tolerance: half the last digit.

use crate::support::{factor, near, row};
use scorchline::section::shadow::shadow_factor;
use scorchline::section::shape::{Flat, Stated};
use scorchline::section::{Casing, Exposure, ExposureRefusal, Face, Faces, Shape};
use scorchline::units::{Area, Length};

const ROUND: Exposure = Exposure::AllRound;
const THREE: Exposure = Exposure::ThreeSides;

#[test]
fn i_sections_with_fillets() {
    for (name, area, outline, four, three, box4, box3, shadow4, shadow3) in [
        ("IPE 200", 2848.4, 768.2, 269.69, 234.59, 210.64, 175.54, 0.7029, 0.6735),
        (
            "IPE 300", 5381.2, 1160.0, 215.57, 187.70, 167.25, 139.37, 0.6982, 0.6683,
        ),
        (
            "HE 200 A", 5383.1, 1136.1, 211.05, 173.89, 144.90, 107.74, 0.6179, 0.5576,
        ),
        ("HE 300 B", 14907.8, 1731.6, 116.16, 96.03, 80.49, 60.37, 0.6237, 0.5658),
        ("HE 300 M", 30307.8, 1831.6, 60.43, 50.21, 42.89, 32.66, 0.6388, 0.5856),
    ] {
        let geometry = row(name).geometry();
        let per_m = |exposure, casing| factor(geometry, exposure, casing).factor.per_m();
        near(name, geometry.area.mm2(), area, 0.051);
        near(name, geometry.perimeter.mm(), outline, 0.051);
        near(name, per_m(ROUND, Casing::Bare), four, 0.0051);
        near(name, per_m(ROUND, Casing::Profile), four, 0.0051);
        near(name, per_m(THREE, Casing::Bare), three, 0.0051);
        near(name, per_m(ROUND, Casing::Box), box4, 0.0051);
        near(name, per_m(THREE, Casing::Box), box3, 0.0051);
        near(name, shadow_factor(geometry, ROUND, true).unwrap(), shadow4, 5.1e-5);
        near(name, shadow_factor(geometry, THREE, true).unwrap(), shadow3, 5.1e-5);
        // (4.26b): not a nominal fire, no factor of 0.9.
        near(
            name,
            shadow_factor(geometry, ROUND, false).unwrap(),
            shadow4 / 0.9,
            6e-5,
        );
    }
}

#[test]
fn a_flange_alone() {
    let heated = factor(row("HE 300 B").geometry(), Exposure::FlangeOnly, Casing::Bare);
    near("HE 300 B", heated.factor.per_m(), 59.3, 0.05);
    near("perimeter", heated.perimeter.mm(), 338.0, 1e-9);
    near("area", heated.area.mm2(), 5700.0, 1e-9);
    for name in ["CHS 168.3x10", "SHS HF 150x150x8", "L 100x100x10"] {
        let refused = scorchline::section::heated(row(name).geometry(), Exposure::FlangeOnly, Casing::Bare);
        assert_eq!(refused, Err(ExposureRefusal::NoFlange), "{name}");
    }
}

/// A plate of 10 mm heated on both faces: 200 1/m is an effective thickness of 5 mm (common practice).
#[test]
fn a_plate_heated_on_both_faces() {
    let plate = Shape::Flat(Flat {
        b: Length::from_mm(1e4),
        t: Length::from_mm(10.0),
    });
    let sides: Faces = [Face::Left, Face::Right].into_iter().collect();
    let heated = factor(&plate.geometry().unwrap(), Exposure::Covered(sides), Casing::Bare);
    near("factor", heated.factor.per_m(), 200.0, 1e-9);
    near("V/A", heated.effective_thickness().mm(), 5.0, 1e-12);
}

/// Tubes: 1/t to the first order (Table 4.2), d/((d - t) t) exactly; convex, so that nothing shades.
#[test]
fn hollow_sections() {
    let geometry = row("CHS 168.3x10").geometry();
    near(
        "CHS",
        factor(geometry, ROUND, Casing::Bare).factor.per_m(),
        168.3 / (158.3 * 10.0) * 1e3,
        1e-9,
    );
    assert_eq!(shadow_factor(geometry, ROUND, true).unwrap(), 1.0);
    // EN 10210-2 Annex A: A = 2 t (b + h - 2 t) - (4 - π)(ro² - ri²).
    let geometry = row("RHS HF 200x100x8").geometry();
    let corners = (4.0 - std::f64::consts::PI) * (144.0 - 64.0);
    near("A", geometry.area.mm2(), 2.0 * 8.0 * (300.0 - 16.0) - corners, 1e-6);
    near(
        "outline",
        geometry.perimeter.mm(),
        600.0 - (8.0 - 2.0 * std::f64::consts::PI) * 12.0,
        1e-9,
    );
    // Only what lies against the slab is shielded: the flat between the corners.
    near(
        "three",
        factor(geometry, THREE, Casing::Bare).perimeter.mm(),
        geometry.perimeter.mm() - 76.0,
        1e-9,
    );
}

/// A box can have the longer way round: an angle.
#[test]
fn a_box_around_an_angle_is_longer_than_its_outline() {
    let geometry = row("L 100x100x10").geometry();
    assert!(factor(geometry, ROUND, Casing::Box).perimeter > factor(geometry, ROUND, Casing::Profile).perimeter);
    assert_eq!(shadow_factor(geometry, ROUND, false).unwrap(), 1.0);
}

/// Walls against both sides of a column leave the outer faces of its flanges, and close what is between them.
#[test]
fn a_column_between_walls() {
    let geometry = row("HE 300 B").geometry();
    let sides: Faces = [Face::Left, Face::Right].into_iter().collect();
    let heated = factor(geometry, Exposure::Covered(sides), Casing::Bare);
    near("both", heated.perimeter.mm(), 600.0, 1e-9);
    assert_eq!(shadow_factor(geometry, Exposure::Covered(sides), true).unwrap(), 1.0);
    let one = factor(geometry, Exposure::Covered(Faces::from(Face::Left)), Casing::Bare);
    near("one", one.perimeter.mm(), 600.0 + (1731.6 - 600.0) / 2.0, 0.05);
    let none = scorchline::section::heated(geometry, Exposure::Covered(Faces::ALL), Casing::Box);
    assert_eq!(none, Err(ExposureRefusal::NothingExposed));
}

#[test]
fn stated_figures_have_no_faces() {
    let stated = Shape::Stated(Stated {
        area: Area::from_mm2(5000.0),
        perimeter: Length::from_mm(1000.0),
        box_perimeter: None,
        mass: None,
    });
    let geometry = stated.geometry().unwrap();
    near(
        "all round",
        factor(&geometry, ROUND, Casing::Profile).factor.per_m(),
        200.0,
        1e-9,
    );
    let three = scorchline::section::heated(&geometry, THREE, Casing::Profile);
    assert_eq!(three, Err(ExposureRefusal::FacesUnknown));
    let part = Exposure::Perimeter(Length::from_mm(750.0));
    near(
        "stated",
        factor(&geometry, part, Casing::Bare).factor.per_m(),
        150.0,
        1e-9,
    );
    let boxed = scorchline::section::heated(&geometry, ROUND, Casing::Box);
    assert_eq!(boxed, Err(ExposureRefusal::BoxUnknown));
    near("mass", geometry.mass.kg_m(), 39.25, 1e-9);
}
