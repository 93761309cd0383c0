//! The embedded tables, read into rows.

use std::sync::OnceLock;

use super::radii::{slope_of_mc, within_printed_area};
use super::{CatalogueRow, Finish, Table};
use crate::section::shape::{
    Angle, Channel, CircularHollow, ParallelI, RectangularHollow, Shape, TaperChannel, TaperI, TaperTee, Tee, WeldedI,
};
use crate::units::{Area, Length, LinearMass};

const SOURCES: [(Table, &str); 6] = [
    (Table::EU, include_str!("../tables/eu.csv")),
    (Table::UK, include_str!("../tables/uk.csv")),
    (Table::US, include_str!("../tables/us.csv")),
    (Table::CA, include_str!("../tables/ca.csv")),
    (Table::AU, include_str!("../tables/au.csv")),
    (Table::IN, include_str!("../tables/in.csv")),
];

/// A line of a table as it stands in the file, column by column.
#[derive(serde::Deserialize)]
struct Line<'a> {
    designation: &'a str,
    family: &'a str,
    shape: &'a str,
    h_mm: Option<f64>,
    b_mm: Option<f64>,
    tw_mm: Option<f64>,
    tf_mm: Option<f64>,
    r_mm: Option<f64>,
    r2_mm: Option<f64>,
    t_mm: Option<f64>,
    d_mm: Option<f64>,
    area_cm2: f64,
    mass_kg_m: f64,
    source: &'a str,
}

/// All rows. A test holds that no line of a table is lost.
pub(super) fn all() -> Vec<CatalogueRow> {
    let mut rows = Vec::with_capacity(4800);
    for (table, text) in SOURCES {
        let mut reader = csv::Reader::from_reader(text.as_bytes());
        let mut record = csv::StringRecord::new();
        while matches!(reader.read_record(&mut record), Ok(true)) {
            if let Ok(line) = record.deserialize::<Line>(None) {
                rows.extend(row(table, &line));
            }
        }
    }
    rows
}

/// The designations of all lines, to compare the rows with.
#[cfg(test)]
pub(super) fn designations() -> Vec<String> {
    let mut all = Vec::new();
    for (_, text) in SOURCES {
        let mut reader = csv::Reader::from_reader(text.as_bytes());
        all.extend(reader.records().map(|line| line.unwrap()[0].to_owned()));
    }
    all
}

fn row(table: Table, line: &Line) -> Option<CatalogueRow> {
    let mut shape = shape(table, line)?;
    let printed_area = Area::from_mm2(line.area_cm2 * 100.0);
    if table == Table::US {
        shape = within_printed_area(shape, printed_area);
    }
    Some(CatalogueRow {
        designation: line.designation.into(),
        family: line.family.into(),
        table,
        standard: standard(table, line),
        shape,
        finish: finish(table, line.family),
        mass: LinearMass::from_kg_m(line.mass_kg_m),
        printed_area,
        source: line.source.into(),
        geometry: shape.geometry().ok()?,
        properties: OnceLock::new(),
    })
}

fn shape(table: Table, line: &Line) -> Option<Shape> {
    let h = || line.h_mm.map(Length::from_mm);
    let b = || line.b_mm.map(Length::from_mm);
    let tw = || line.tw_mm.map(Length::from_mm);
    let tf = || line.tf_mm.map(Length::from_mm);
    let t = || line.t_mm.map(Length::from_mm);
    // Where a table prints no radius the corner is taken as sharp: less area and a longer outline, the onerous side.
    let r = Length::from_mm(line.r_mm.unwrap_or(0.0));
    let r2 = Length::from_mm(line.r2_mm.unwrap_or(0.0));
    let shape = match line.shape {
        "I" => Shape::I(ParallelI {
            h: h()?,
            b: b()?,
            tw: tw()?,
            tf: tf()?,
            r,
        }),
        "I_welded" => Shape::WeldedI(WeldedI {
            h: h()?,
            b_top: b()?,
            tf_top: tf()?,
            b_bottom: b()?,
            tf_bottom: tf()?,
            tw: tw()?,
            weld: Length::from_mm(0.0),
        }),
        "I_taper" => {
            let taper = taper(table, line)?;
            Shape::TaperI(TaperI {
                h: h()?,
                b: b()?,
                tw: tw()?,
                tf: tf()?,
                r: taper.root,
                toe: taper.toe,
                slope: taper.slope,
                tf_at: taper.tf_at,
            })
        }
        "C" => Shape::Channel(Channel {
            h: h()?,
            b: b()?,
            tw: tw()?,
            tf: tf()?,
            r,
        }),
        "C_taper" => {
            let taper = taper(table, line)?;
            Shape::TaperChannel(TaperChannel {
                h: h()?,
                b: b()?,
                tw: tw()?,
                tf: tf()?,
                r: taper.root,
                toe: taper.toe,
                slope: taper.slope,
                tf_at: taper.tf_at,
            })
        }
        "T" => Shape::Tee(Tee {
            h: h()?,
            b: b()?,
            tw: tw()?,
            tf: tf()?,
            r,
        }),
        "T_taper" => {
            let taper = taper(table, line)?;
            Shape::TaperTee(TaperTee {
                h: h()?,
                b: b()?,
                tw: tw()?,
                tf: tf()?,
                r: taper.root,
                toe: taper.toe,
                slope: taper.slope,
                tf_at: taper.tf_at,
            })
        }
        "L" => Shape::Angle(Angle {
            h: h()?,
            b: b()?,
            t: t()?,
            root: r,
            toe: r2,
        }),
        "RHS" => Shape::RectangularHollow(RectangularHollow {
            h: h()?,
            b: b()?,
            t: t()?,
            ro: r,
            // Without an inner radius the wall keeps its thickness around the corner.
            ri: Length::from_mm(line.r2_mm.unwrap_or(r.mm() - line.t_mm?).max(0.0)),
        }),
        "CHS" => Shape::CircularHollow(CircularHollow {
            d: line.d_mm.map(Length::from_mm)?,
            t: t()?,
        }),
        _ => return None,
    };
    Some(shape)
}

/// The slope of a taper flange, how far from its tip the thickness is measured, and its radii.
struct Taper {
    slope: f64,
    tf_at: Length,
    root: Length,
    toe: Length,
}

fn taper(table: Table, line: &Line) -> Option<Taper> {
    let (h, b, tw) = (line.h_mm?, line.b_mm?, line.tw_mm?);
    let middle_of_channel = (b - tw) / 2.0;
    let middle_of_outstand = (b - tw) / 4.0;
    let (slope, tf_at) = match line.family {
        // DIN 1025-1: 14 %, at a quarter of the width.
        "IPN" => (0.14, b / 4.0),
        // DIN 1026-1: 8 % at half the width up to 300 mm, 5 % at the middle of the outstand above.
        "UPN" | "U" if h <= 300.0 => (0.08, b / 2.0),
        "UPN" => (0.05, middle_of_channel),
        // IS 808: the flanges of ISMB at 98°, of ISWB and ISMC at 96° to the web; at the middle of the outstand.
        "ISMB" => (8_f64.to_radians().tan(), middle_of_outstand),
        "ISWB" => (6_f64.to_radians().tan(), middle_of_outstand),
        "ISMC" => (6_f64.to_radians().tan(), middle_of_channel),
        // ASTM A6: 1 in 6, at the middle of the outstand.
        "C" => (1.0 / 6.0, middle_of_channel),
        "MC" => (slope_of_mc(line.designation), middle_of_channel),
        "S" | "ST" | "SLB" => (1.0 / 6.0, middle_of_outstand),
        _ => return None,
    };
    // An arc of radius r in a corner that turns by a quarter less the slope ends r times this from the corner.
    let tangent = ((std::f64::consts::FRAC_PI_2 - slope.atan()) / 2.0).tan();
    // Two ISWB print a toe radius larger than their tip can hold; the arc then takes the whole tip.
    let largest = (line.tf_mm? - slope * tf_at) / tangent;
    let printed = line.r_mm.unwrap_or(0.0);
    let root = if table == Table::US {
        // The US table has no radius but k, the distance from the outer face to where the fillet meets the web: what
        // stands in the column is k - tf. At the web the flange is thicker than tf by the slope.
        let outstand = if line.shape == "C_taper" {
            b - tw
        } else {
            (b - tw) / 2.0
        };
        ((printed - slope * (outstand - tf_at)) / tangent).max(0.0)
    } else {
        printed
    };
    Some(Taper {
        slope,
        tf_at: Length::from_mm(tf_at),
        root: Length::from_mm(root),
        toe: Length::from_mm(line.r2_mm.unwrap_or(0.0).min(largest)),
    })
}

fn finish(table: Table, family: &str) -> Option<Finish> {
    match (table, family) {
        (Table::EU, "SHS_HF" | "RHS_HF") => Some(Finish::HotFinished),
        (Table::EU, "SHS_CF" | "RHS_CF") | (Table::AU, "SHS" | "RHS" | "CHS") => Some(Finish::ColdFormed),
        _ => None,
    }
}

fn standard(table: Table, line: &Line) -> &'static str {
    match (table, line.family) {
        (Table::EU, "L_equal" | "L_unequal") => "EN 10056-1",
        (Table::EU, "SHS_HF" | "RHS_HF") => "EN 10210-2",
        (Table::EU, "SHS_CF" | "RHS_CF") => "EN 10219-2",
        (Table::EU, "CHS") => "EN 10210-2, EN 10219-2",
        (Table::EU, "U") => "EN 10279",
        (Table::EU, _) => "EN 10365",
        // The large beams keep the dimensions of EN 10365; all else is of the British series.
        (Table::UK, "UB") if line.source.starts_with("structuralcodes") && !line.source.contains("BS 4-1") => {
            "EN 10365"
        }
        (Table::UK, _) => "BS 4-1:2005",
        (Table::US, "PIPE") => "ASTM A53",
        (Table::US, "HSS_rect" | "HSS_square" | "HSS_round") => "ASTM A500",
        (Table::US, _) => "ASTM A6",
        (Table::CA, _) => "CSA G40.20",
        (Table::AU, "WB" | "WC") => "AS/NZS 3679.2",
        (Table::AU, "RHS" | "SHS" | "CHS") => "AS/NZS 1163",
        (Table::AU, _) => "AS/NZS 3679.1",
        (Table::IN, _) => "IS 808:2021",
    }
}
