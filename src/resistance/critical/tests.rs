//! What governs, and what is refused.

use super::*;
use crate::resistance::{buckling, tension};
use crate::section::catalogue::{Lookup, LookupOptions, find};
use crate::section::shape::{Angle, RectangularHollow, Stated};
use crate::units::Area;

fn named(name: &str) -> Shape {
    match find(name, &LookupOptions::default()) {
        Lookup::Found(row) => row.shape,
        other => panic!("{name}: {other:?}"),
    }
}

fn member(shape: Shape, fy: f64) -> Member {
    Member {
        shape,
        fy: Stress::from_mpa(fy),
        gamma_m_fi: 1.0,
        gamma_m0: 1.0,
        compression_member: false,
        tension_member: false,
        slab_on_three_sides: false,
    }
}

fn kn(value: f64) -> Option<Force> {
    Some(Force::from_kn(value))
}

fn knm(value: f64) -> Option<Moment> {
    Some(Moment::from_knm(value))
}

fn m(value: f64) -> Option<Length> {
    Some(Length::from_m(value))
}

fn limit(member: &Member, actions: Actions) -> Result<Limit, Unverified> {
    critical_temperature(member, &Loading::Effects(actions))
}

#[track_caller]
fn refused(found: Result<Limit, Unverified>, about: &str) {
    match found {
        Err(Unverified::NotCovered(why)) => assert!(why.contains(about), "{why}"),
        other => panic!("{other:?}, wanted a refusal about {about}"),
    }
}

const RESTRAINED: Actions = Actions {
    axial_compression: None,
    axial_tension: None,
    bending: None,
    bending_minor: None,
    shear: None,
    buckling_length: None,
    buckling_length_minor: None,
    lateral_length: None,
    laterally_restrained: true,
    continuous: false,
};

/// Tension at half the strength: the inverse of ky at 0.5 is 600 - 100 · 0.03/0.31 = 590.32 °C (computed).
#[test]
fn tension_is_the_inverse_of_ky() {
    let shape = named("HE 200 B");
    let area = shape.properties().unwrap().unwrap().area.mm2();
    let mut actions = RESTRAINED;
    actions.axial_tension = kn(area * 355.0 / 2000.0);
    let found = limit(&member(shape, 355.0), actions).unwrap();
    assert!((found.protected.celsius() - 590.3226).abs() < 1e-3);
    assert_eq!((found.bare, found.class), (found.protected, None));
    actions.axial_tension = kn(area * 355.0 / 500.0);
    let fails = limit(&member(shape, 355.0), actions);
    let Err(Unverified::FailsCold { utilisation, clause }) = fails else {
        panic!("{fails:?}")
    };
    assert!((utilisation - 2.0).abs() < 1e-9 && clause == tension::CLAUSE);
}

/// By hand: IPE 300 S275, M = 0.47 · Mpl: 600 °C all round; under a slab ky may fall to 0.47 · 0.85 = 0.3995 protected
/// (629.375 °C) and to 0.47 · 0.70 = 0.329 bare (658.75 °C); at continuous supports by 0.85 more.
#[test]
fn kappa_lifts_bare_above_protected() {
    let shape = named("IPE 300");
    let plastic = shape.properties().unwrap().unwrap().wpl_y_mm3 * 275.0 / 1e6;
    let mut actions = RESTRAINED;
    actions.bending = knm(-0.47 * plastic);
    let mut beam = member(shape, 275.0);
    let all_round = limit(&beam, actions).unwrap();
    assert!((all_round.protected.celsius() - 600.0).abs() < 1e-3);
    assert_eq!(all_round.class, Some(1));
    beam.slab_on_three_sides = true;
    let slab = limit(&beam, actions).unwrap();
    assert!((slab.protected.celsius() - 629.375).abs() < 1e-3);
    assert!((slab.bare.celsius() - 658.75).abs() < 1e-3);
    actions.continuous = true;
    // ky 0.47 · 0.85² = 0.339575: 600 + 100 · 0.130425/0.24 = 654.344 °C.
    assert!((limit(&beam, actions).unwrap().protected.celsius() - 654.344).abs() < 1e-3);
}

#[test]
fn the_lowest_of_several_governs() {
    let beam = member(named("IPE 300"), 275.0);
    let mut actions = RESTRAINED;
    actions.bending = knm(10.0);
    let bending = limit(&beam, actions).unwrap();
    assert!(bending.governing.contains("bending"));
    // VRd at 20 °C is 2568.2 · 275/√3 = 407.8 kN (by hand): 366.98 kN is 0.9 of it.
    actions.shear = kn(366.98);
    let both = limit(&beam, actions).unwrap();
    assert!(both.governing.contains("shear"), "{}", both.governing);
    assert!((both.protected.celsius() - 445.45).abs() < 0.05);
    assert_eq!(both.class, Some(1));
    actions.bending = None;
    assert_eq!(limit(&beam, actions).unwrap().protected, both.protected);
}

#[test]
fn compression_needs_a_buckling_length() {
    let column = member(named("HE 200 B"), 275.0);
    let mut actions = Actions {
        axial_compression: kn(1000.0),
        ..Actions::default()
    };
    assert_eq!(limit(&column, actions), Err(Unverified::Missing("buckling length")));
    actions.buckling_length = m(0.0);
    let held = limit(&column, actions).unwrap();
    assert_eq!(held.governing, "EN 1993-1-2 4.2.3.2 (4.5), compression");
    // By hand from the exact area 7808.1: ky = 1000/2147.2 = 0.46572, 600 + 100 · 0.00428/0.24 = 601.78 °C.
    assert!((held.protected.celsius() - 601.78).abs() < 0.02);
    actions.buckling_length = m(6.0);
    actions.buckling_length_minor = m(1.0);
    assert!(limit(&column, actions).unwrap().governing.contains("y-y"));
    actions.buckling_length = m(1.0);
    actions.buckling_length_minor = None;
    assert!(limit(&column, actions).unwrap().governing.contains("z-z"));
    actions.buckling_length_minor = m(-1.0);
    refused(limit(&column, actions), "buckling length minor");
}

#[test]
fn class_4_is_held_to_350() {
    let mut column = member(named("IPE 360"), 355.0);
    column.compression_member = true;
    let found = critical_temperature(&column, &Loading::Utilisation(0.3)).unwrap();
    assert_eq!(found.protected.celsius(), 350.0);
    assert_eq!(found.class, Some(4));
    assert_eq!(found.class_note.as_deref(), Some("web c/t 37.3 > 42ε = 29.0"));
    assert!(found.governing.contains("4.2.3.6 (2)"));
    column.compression_member = false;
    assert!(
        critical_temperature(&column, &Loading::Utilisation(0.3))
            .unwrap()
            .protected
            .celsius()
            > 600.0
    );
    column.tension_member = true;
    let tie = critical_temperature(&column, &Loading::Utilisation(0.3)).unwrap();
    assert_eq!(tie.class, None);
    let mut actions = Actions {
        axial_compression: kn(100.0),
        buckling_length: m(3.0),
        ..Actions::default()
    };
    assert_eq!(limit(&column, actions).unwrap().protected.celsius(), 350.0);
    actions.axial_compression = kn(4000.0);
    assert!(matches!(limit(&column, actions), Err(Unverified::FailsCold { .. })));
}

/// The lengths at which class 4 columns buckle below 350 °C keep the lower temperature.
#[test]
fn class_4_is_no_floor() {
    let column = member(named("IPE 360"), 355.0);
    let properties = column.shape.properties().unwrap().unwrap();
    let slenderness = buckling::slenderness(Length::from_m(4.0), properties.radius_z(), column.fy);
    let at = |celsius| {
        let t = Temperature::from_celsius(celsius);
        buckling::resistance(slenderness, &properties, column.fy, 1.0, t).kn()
    };
    let actions = Actions {
        axial_compression: kn(f64::midpoint(at(200.0), at(300.0))),
        buckling_length: m(4.0),
        ..Actions::default()
    };
    let found = limit(&column, actions).unwrap();
    assert!(found.protected.celsius() > 200.0 && found.protected.celsius() < 300.0);
    assert!(
        found.governing.contains("z-z") && found.governing.contains("class 4"),
        "{}",
        found.governing
    );
}

#[test]
fn what_is_not_covered_is_refused() {
    let beam = member(named("IPE 300"), 275.0);
    let mut actions = Actions {
        bending: knm(50.0),
        ..Actions::default()
    };
    assert_eq!(limit(&beam, actions), Err(Unverified::Missing("lateral length")));
    actions.lateral_length = m(3.0);
    refused(limit(&beam, actions), "lateral-torsional");
    actions.lateral_length = m(0.0);
    assert!(limit(&beam, actions).is_ok());
    actions.bending_minor = knm(1.0);
    refused(limit(&beam, actions), "both axes");
    actions.bending_minor = None;
    actions.axial_compression = kn(1.0);
    refused(limit(&beam, actions), "axial force with bending");
    actions.axial_tension = kn(1.0);
    refused(limit(&beam, actions), "at once");
    refused(limit(&beam, Actions::default()), "all zero");
    actions = Actions::default();
    actions.shear = kn(f64::NAN);
    refused(limit(&beam, actions), "finite");
    let slender = Actions {
        axial_compression: kn(10.0),
        buckling_length: m(2.0),
        ..Actions::default()
    };
    refused(limit(&member(named("UPE 200"), 275.0), slender), "torsional-flexural");
    let mut nonsense = beam;
    nonsense.fy = Stress::from_mpa(0.0);
    refused(limit(&nonsense, RESTRAINED), "positive");
}

#[test]
fn minor_bending_goes_by_its_own_axis() {
    let shape = named("HE 200 B");
    let plastic = shape.properties().unwrap().unwrap().wpl_z_mm3 * 235.0 / 1e6;
    let mut beam = member(shape, 235.0);
    beam.slab_on_three_sides = true;
    let actions = Actions {
        bending_minor: knm(0.47 * plastic),
        ..Actions::default()
    };
    let found = limit(&beam, actions).unwrap();
    assert!((found.bare.celsius() - 600.0).abs() < 1e-3 && found.bare == found.protected);
}

#[test]
fn stiff_sections_need_no_lateral_length() {
    let mm = Length::from_mm;
    let tube = |h: f64, b: f64| {
        let shape = Shape::RectangularHollow(RectangularHollow::hot_finished(mm(h), mm(b), mm(8.0)));
        let actions = Actions {
            bending: knm(10.0),
            ..Actions::default()
        };
        limit(&member(shape, 355.0), actions)
    };
    assert!(tube(150.0, 150.0).is_ok());
    assert_eq!(tube(200.0, 100.0), Err(Unverified::Missing("lateral length")));
}

#[test]
fn stated_sections_and_angles() {
    let stated = Shape::Stated(Stated {
        area: Area::from_mm2(5000.0),
        perimeter: Length::from_mm(900.0),
        box_perimeter: None,
        mass: None,
    });
    let mut of_figures = member(stated, 355.0);
    let tension = Actions {
        axial_tension: kn(100.0),
        ..Actions::default()
    };
    refused(limit(&of_figures, tension), "stated section");
    refused(
        critical_temperature(&of_figures, &Loading::Utilisation(0.5)),
        "stated section",
    );
    of_figures.tension_member = true;
    assert!(critical_temperature(&of_figures, &Loading::Utilisation(0.5)).is_ok());
    let angle = Shape::Angle(Angle {
        h: Length::from_mm(100.0),
        b: Length::from_mm(100.0),
        t: Length::from_mm(12.0),
        root: Length::from_mm(12.0),
        toe: Length::from_mm(6.0),
    });
    let brace = Actions {
        axial_compression: kn(100.0),
        buckling_length: m(2.0),
        ..Actions::default()
    };
    let found = limit(&member(angle, 275.0), brace).unwrap();
    assert!(found.governing.contains("v-v") && found.class == Some(3));
    let mut bent = RESTRAINED;
    bent.bending = knm(1.0);
    refused(limit(&member(angle, 275.0), bent), "angles");
}
