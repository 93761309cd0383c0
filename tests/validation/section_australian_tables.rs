//! Source: Australian design capacity tables for open sections, DCT/V1/03-1999, Tables 3.2-1(B) to 3.2-10(B): exposed
//! surface area to mass ratio ksm in m²/t with a mass of 7850 A. Status: published (read in a typed copy).
//! Tolerance: 0.6 %, for the tables print three digits of rounded perimeters.

use crate::support::within;
use scorchline::section::measures::{gapped_box, surface_over_mass};
use scorchline::section::shape::{Angle, Channel, ParallelI, WeldedI};
use scorchline::section::{Casing, Exposure, Geometry, Shape, heated};
use scorchline::units::Length;

/// All round and three sides: profile, box, box with a gap of 25 mm.
fn ratios(geometry: &Geometry) -> [f64; 6] {
    let gap = Length::from_mm(25.0);
    let mut ratios = [0.0; 6];
    for (n, exposure) in [Exposure::AllRound, Exposure::ThreeSides].into_iter().enumerate() {
        let perimeters = [
            heated(geometry, exposure, Casing::Profile).unwrap().perimeter,
            heated(geometry, exposure, Casing::Box).unwrap().perimeter,
            gapped_box(geometry, exposure, gap).unwrap(),
        ];
        for (k, perimeter) in perimeters.into_iter().enumerate() {
            ratios[3 * n + k] = surface_over_mass(geometry.mass, perimeter);
        }
    }
    ratios
}

#[track_caller]
fn holds(name: &str, shape: Shape, published: [f64; 6]) {
    let ours = ratios(&shape.geometry().unwrap());
    for (ours, published) in ours.into_iter().zip(published) {
        within(name, ours, published, 6e-3);
    }
}

const fn mm(value: f64) -> Length {
    Length::from_mm(value)
}

#[test]
fn beams_and_columns() {
    let beam = ParallelI {
        h: mm(612.0),
        b: mm(229.0),
        tw: mm(11.9),
        tf: mm(19.6),
        r: mm(14.0),
    };
    holds("610UB125", Shape::I(beam), [16.7, 13.4, 15.0, 14.9, 11.6, 12.4]);
    let column = ParallelI {
        h: mm(327.0),
        b: mm(311.0),
        tw: mm(15.7),
        tf: mm(25.0),
        r: mm(16.5),
    };
    holds("310UC158", Shape::I(column), [11.6, 8.08, 9.34, 9.66, 6.11, 6.74]);
    let welded = WeldedI {
        h: mm(1200.0),
        b_top: mm(500.0),
        tf_top: mm(40.0),
        b_bottom: mm(500.0),
        tf_bottom: mm(40.0),
        tw: mm(16.0),
        weld: mm(0.0),
    };
    holds(
        "1200WB455",
        Shape::WeldedI(welded),
        [9.61, 7.48, 7.92, 8.51, 6.38, 6.60],
    );
}

#[test]
fn a_channel() {
    let Shape::Channel(channel) = crate::support::row("200PFC").shape else {
        panic!("200PFC is a channel")
    };
    let channel = Channel { ..channel };
    holds("200PFC", Shape::Channel(channel), [29.6, 24.0, 32.7, 26.3, 20.7, 25.1]);
}

/// 100x100x8EA: 7.8 mm thick, radii 8 and 5 mm, which gives the printed outline of 392 mm and 11.8 kg/m.
#[test]
fn an_angle() {
    let angle = Shape::Angle(Angle {
        h: mm(100.0),
        b: mm(100.0),
        t: mm(7.8),
        root: mm(8.0),
        toe: mm(5.0),
    });
    let geometry = angle.geometry().unwrap();
    within("outline", geometry.perimeter.mm(), 392.0, 1.5e-3);
    within("mass", geometry.mass.kg_m(), 11.8, 4e-3);
    holds("100x100x8EA", angle, [33.3, 33.9, 50.9, 24.8, 25.4, 33.9]);
}
