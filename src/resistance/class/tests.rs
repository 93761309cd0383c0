use super::*;
use crate::section::catalogue::{Lookup, LookupOptions, find};
use crate::section::shape::{Angle, CircularHollow, Flat, RectangularHollow, Stated};
use crate::units::{Area, Length};

fn mm(value: f64) -> Length {
    Length::from_mm(value)
}

fn named(name: &str) -> Shape {
    match find(name, &LookupOptions::default()) {
        Lookup::Found(row) => row.shape,
        other => panic!("{name}: {other:?}"),
    }
}

fn class(shape: &Shape, fy: f64, action: Action) -> (u8, String) {
    let found = classify(shape, Stress::from_mpa(fy), action).unwrap();
    (found.class, found.governing)
}

/// Computed by hand: HE 200 B has c/t of the flange 77.5/15 = 5.17 and of the web 134/9 = 14.89; ε for 235 is 0.85.
#[test]
fn stocky_h_is_class_1() {
    let h = named("HE 200 B");
    let found = class(&h, 235.0, Action::Compression);
    assert_eq!(found, (1, "flange c/t 5.2 ≤ 9ε = 7.6".to_owned()));
    assert_eq!(class(&h, 235.0, Action::BendingMinor).0, 1);
}

/// Computed by hand: 50 × 1.25 has d/t 40; ε² for 355 is 0.7225 · 235/355 = 0.47828, 70 ε² = 33.5, 90 ε² = 43.0.
#[test]
fn tubes_count_with_the_square_of_epsilon() {
    let tube = Shape::CircularHollow(CircularHollow {
        d: mm(50.0),
        t: mm(1.25),
    });
    let found = class(&tube, 355.0, Action::Bending);
    assert_eq!(found, (3, "wall d/t 40.0 ≤ 90ε² = 43.0".to_owned()));
}

/// Computed by hand: RHS 200 × 100 × 5 has c/t 17 and 37, ε for 355 is 0.6916: 42ε = 29.0, 72ε = 49.8, 33ε = 22.8.
#[test]
fn hollow_sections_turn_with_the_axis() {
    let tube = Shape::RectangularHollow(RectangularHollow::hot_finished(mm(200.0), mm(100.0), mm(5.0)));
    assert_eq!(class(&tube, 355.0, Action::Compression).0, 4);
    assert_eq!(class(&tube, 355.0, Action::Bending).0, 1);
    assert_eq!(class(&tube, 355.0, Action::BendingMinor).0, 4);
}

/// Computed by hand: L 100 × 100 × 10, fy 275: ε = 0.7858, 15ε = 11.8, 11.5ε = 9.04 < 10: class 4 in compression;
/// of 12 mm 8.33: class 3.
#[test]
fn angles_know_class_3_and_4_in_compression() {
    let angle = |t: f64| {
        Shape::Angle(Angle {
            h: mm(100.0),
            b: mm(100.0),
            t: mm(t),
            root: mm(12.0),
            toe: mm(6.0),
        })
    };
    let thin = class(&angle(10.0), 275.0, Action::Compression);
    assert_eq!(thin, (4, "legs (b + h)/2t 10.0 > 11.5ε = 9.0".to_owned()));
    assert_eq!(class(&angle(12.0), 275.0, Action::Compression).0, 3);
}

/// Computed by hand: with α 0.5 and ψ -1 the limits of bending and compression are those of bending.
#[test]
fn limits_of_a_bent_web_join_those_of_mid_depth() {
    let [first, second, third] = bent_web(0.5, -1.0);
    assert!((first - 72.0).abs() < 1e-9 && (second - 83.0).abs() < 1e-9 && (third - 124.0).abs() < 1e-9);
    let [first, second, third] = bent_web(1.0, 1.0);
    assert!((first - 33.0).abs() < 1e-9 && (second - 38.0).abs() < 1e-9 && (third - 42.0).abs() < 1e-9);
}

/// Computed by hand, fy 235, web c/t 550/10 = 55: alike 72ε = 61.2. With 320 × 20 below, 0.714 of the web is in
/// compression the other way up, and the limits of classes 1 and 2 are 47.8ε = 40.6 and 55.0ε = 46.8.
#[test]
fn a_heavy_flange_leaves_more_of_the_web_in_compression() {
    let girder = |b_bottom: f64| {
        Shape::WeldedI(WeldedI {
            h: mm(600.0),
            b_top: mm(200.0),
            tf_top: mm(20.0),
            b_bottom: mm(b_bottom),
            tf_bottom: mm(20.0),
            tw: mm(10.0),
            weld: mm(5.0),
        })
    };
    assert_eq!(class(&girder(200.0), 235.0, Action::Bending).0, 1);
    let (class, governing) = class(&girder(320.0), 235.0, Action::Bending);
    assert!(
        class == 3 && governing.starts_with("web c/t 55.0 ≤"),
        "{class} {governing}"
    );
}

#[test]
fn no_class_without_parts_or_compression() {
    let stated = Shape::Stated(Stated {
        area: Area::from_mm2(5000.0),
        perimeter: mm(900.0),
        box_perimeter: None,
        mass: None,
    });
    assert_eq!(classify(&stated, Stress::from_mpa(355.0), Action::Bending), None);
    let flat = Shape::Flat(Flat {
        b: mm(200.0),
        t: mm(10.0),
    });
    assert_eq!(classify(&flat, Stress::from_mpa(355.0), Action::Tension), None);
    assert_eq!(class(&flat, 355.0, Action::Compression).0, 1);
}
