//! Keys of a `section` mapping and which of them each shape takes.

use super::member::SHAPE_NAMES;
use super::{Dimension, Key, Kind, key, number, required, size};

/// A shape of a section mapping: the keys it wants and those it may have.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ShapeKeys {
    /// As written in `shape`.
    pub name: &'static str,
    /// Keys without which the shape is incomplete.
    pub wants: &'static [&'static str],
    /// Keys that may be left out.
    pub may: &'static [&'static str],
    /// What it is.
    pub doc: &'static str,
}

const fn shape(
    name: &'static str,
    wants: &'static [&'static str],
    may: &'static [&'static str],
    doc: &'static str,
) -> ShapeKeys {
    ShapeKeys { name, wants, may, doc }
}

/// Every shape that is read.
pub const SHAPES: &[ShapeKeys] = &[
    shape(
        "i",
        &["h", "b", "tw", "tf"],
        &["r"],
        "Rolled I or H with parallel flanges.",
    ),
    shape(
        "welded i",
        &["h", "tw"],
        &["b", "tf", "b top", "tf top", "b bottom", "tf bottom", "weld"],
        "Plate girder; flanges may differ.",
    ),
    shape(
        "channel",
        &["h", "b", "tw", "tf"],
        &["r"],
        "Channel with parallel flanges.",
    ),
    shape("tee", &["h", "b", "tw", "tf"], &["r"], "Tee, flange on top."),
    shape("angle", &["h", "b", "t"], &["r", "toe"], "Angle, equal or unequal."),
    shape(
        "rectangular hollow",
        &["h", "b", "t"],
        &["ro", "ri"],
        "Rectangular or square hollow section.",
    ),
    shape("circular hollow", &["d", "t"], &[], "Circular hollow section."),
    shape("round", &["d"], &[], "Solid round bar."),
    shape("flat", &["b", "t"], &[], "Flat bar or plate."),
    shape(
        "cold formed c",
        &["h", "b", "lip", "t"],
        &["r"],
        "Lipped channel, cold formed.",
    ),
    shape(
        "cold formed z",
        &["h", "b", "lip", "t"],
        &["r"],
        "Lipped zed, cold formed.",
    ),
    shape("box girder", &["h", "b", "tw", "tf"], &["weld"], "Welded box."),
    shape("pair", &["of"], &["gap"], "Two channels or angles back to back."),
    shape("cruciform", &["of"], &["gap"], "Two sections crossed."),
    shape(
        "slim floor",
        &["of", "plate width", "plate thickness"],
        &[],
        "Open section on a wider bottom plate.",
    ),
    shape(
        "stated",
        &["area", "perimeter"],
        &["box perimeter", "mass"],
        "Area and perimeter as stated by the user.",
    ),
];

/// Every key of a section mapping; [`SHAPES`] says which of them a shape takes.
pub const SECTION: &[Key] = &[
    required(
        "shape",
        Kind::Choice(SHAPE_NAMES),
        "The shape; the other keys follow from it.",
    ),
    key("h", size("a depth"), "Depth."),
    key("b", size("a width"), "Width of the flange or leg."),
    key("tw", size("a web thickness"), "Thickness of the web."),
    key("tf", size("a flange thickness"), "Thickness of the flange."),
    key("t", size("a wall thickness"), "Thickness of wall, leg or plate."),
    key("d", size("a diameter"), "Outside diameter."),
    key(
        "r",
        radius("a root radius"),
        "Root radius; inside bend radius of cold-formed sections.",
    ),
    key("toe", radius("a toe radius"), "Toe radius of an angle."),
    key("ro", radius("a corner radius"), "Outer corner radius."),
    key("ri", radius("a corner radius"), "Inner corner radius."),
    key("b top", size("a flange width"), "Width of the top flange."),
    key("tf top", size("a flange thickness"), "Thickness of the top flange."),
    key("b bottom", size("a flange width"), "Width of the bottom flange."),
    key(
        "tf bottom",
        size("a flange thickness"),
        "Thickness of the bottom flange.",
    ),
    key(
        "weld",
        number("a weld size", Dimension::Length, "mm", 0.0, 100.0),
        "Leg of the fillet welds.",
    ),
    key("lip", size("a lip"), "Outside length of the lips."),
    key(
        "of",
        Kind::Designation,
        "The section that is paired, crossed or plated.",
    ),
    key(
        "gap",
        number("a gap", Dimension::Length, "mm", 0.0, 1000.0),
        "Clear gap between the two.",
    ),
    key("plate width", size("a plate width"), "Width of the bottom plate."),
    key(
        "plate thickness",
        size("a plate thickness"),
        "Thickness of the bottom plate.",
    ),
    key(
        "area",
        number("an area", Dimension::Area, "mm2", 1.0, 1e8),
        "Area of the steel.",
    ),
    key("perimeter", size("a perimeter"), "Perimeter of the outline."),
    key("box perimeter", size("a perimeter"), "Perimeter of the enclosing box."),
    key(
        "mass",
        number("a mass per length", Dimension::MassPerLength, "kg/m", 0.01, 1e5),
        "Mass per length.",
    ),
];

const fn radius(noun: &'static str) -> Kind {
    number(noun, Dimension::Length, "mm", 0.0, 1000.0)
}

impl ShapeKeys {
    /// The shape called `name`.
    #[must_use]
    pub fn find(name: &str) -> Option<&'static Self> {
        SHAPES.iter().find(|shape| shape.name == name)
    }

    /// Whether the shape takes a key.
    #[must_use]
    pub fn takes(&self, name: &str) -> bool {
        name == "shape" || self.wants.contains(&name) || self.may.contains(&name)
    }
}
