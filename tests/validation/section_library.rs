//! Source: the general-purpose Python library `sectionproperties` 3.10.2, by `section_library.py` beside this file; its
//! output is `section_library.csv`. Status: computed (an independent program: meshed triangles, arcs of 48 chords).
//! Tolerance: 0.1 % for area and perimeter, 0.2 % for second moments and plastic moduli.

use crate::support::{row_of, within};
use scorchline::section::catalogue::Table;
use scorchline::section::shape::{Flat, Round, WeldedI};
use scorchline::section::{Kind, Shape};
use scorchline::units::Length;

/// The shapes that no table holds.
fn own(name: &str) -> Shape {
    let mm = Length::from_mm;
    match name {
        "flat 200x20" => Shape::Flat(Flat {
            b: mm(200.0),
            t: mm(20.0),
        }),
        "round 60" => Shape::Round(Round { d: mm(60.0) }),
        "welded 800 200x15 350x25 12" => Shape::WeldedI(WeldedI {
            h: mm(800.0),
            b_top: mm(200.0),
            tf_top: mm(15.0),
            b_bottom: mm(350.0),
            tf_bottom: mm(25.0),
            tw: mm(12.0),
            weld: mm(0.0),
        }),
        other => panic!("no shape for {other}"),
    }
}

#[test]
fn area_outline_and_moments() {
    let text: String = include_str!("section_library.csv")
        .lines()
        .filter(|line| !line.starts_with('#'))
        .map(|line| format!("{line}\n"))
        .collect();
    let mut count = 0;
    for line in csv::Reader::from_reader(text.as_bytes()).records() {
        let line = line.unwrap();
        let (table, name) = (&line[0], &line[1]);
        let shape = match Table::ALL.into_iter().find(|t| t.code() == table) {
            Some(table) => row_of(name, Some(table)).shape,
            None => own(name),
        };
        let theirs: Vec<f64> = line.iter().skip(2).map(|field| field.parse().unwrap()).collect();
        let geometry = shape.geometry().unwrap();
        let ours = shape.properties().unwrap().unwrap();
        within(&format!("{name} A"), geometry.area.mm2(), theirs[0], 1e-3);
        // The library counts the outer outline of hollow sections, as does the fire.
        within(&format!("{name} outline"), geometry.perimeter.mm(), theirs[1], 1e-3);
        within(&format!("{name} Iy"), ours.iy_mm4, theirs[2], 2e-3);
        within(&format!("{name} Iz"), ours.iz_mm4, theirs[3], 2e-3);
        within(&format!("{name} Iv"), ours.iv_mm4, theirs[5], 2e-3);
        within(&format!("{name} Wpl,y"), ours.wpl_y_mm3, theirs[6], 2e-3);
        within(&format!("{name} Wpl,z"), ours.wpl_z_mm3, theirs[7], 2e-3);
        if geometry.kind == Some(Kind::Open) {
            within(
                &format!("{name} |Iyz|"),
                ours.iyz_mm4.abs() + 1e3,
                theirs[4].abs() + 1e3,
                2e-3,
            );
        }
        count += 1;
    }
    assert_eq!(count, 81);
}
