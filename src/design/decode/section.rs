//! Decoding `section`: a designation, or a mapping with `shape`.

use crate::design::decode::reader::Reader;
use crate::design::given::Given;
use crate::design::keys::Key;
use crate::design::keys::section::{SECTION, ShapeKeys};
use crate::design::model::member::SectionChoice;
use crate::design::slip::{Slip, SlipKind};
use crate::section::Shape;
use crate::section::shape::{
    Angle, Channel, CircularHollow, Flat, ParallelI, RectangularHollow, Round, Stated, Tee, WeldedI,
};
use crate::syntax::{Node, Value};
use crate::units::{Area, Length, LinearMass};

/// Decodes the value of `section`. Designations are looked up later, when the design's tables are known.
pub fn section(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<SectionChoice> {
    match &node.value {
        Value::Scalar(scalar) => Given::new(SectionChoice::Designation(scalar.text.clone()), node.span),
        Value::Mapping(_) => shape(reader, node),
        _ => {
            reader.wrong_kind(node, key);
            Given::unreadable(node.span)
        }
    }
}

/// The numbers of a section mapping by key, in the base units.
struct Sizes(Vec<(&'static str, f64)>);

impl Sizes {
    fn get(&self, name: &str) -> Option<f64> {
        self.0.iter().find(|(key, _)| *key == name).map(|(_, value)| *value)
    }

    fn length(&self, name: &str) -> Length {
        Length::from_mm(self.get(name).unwrap_or(0.0))
    }

    /// The first of several keys that is given.
    fn first(&self, names: &[&str]) -> Length {
        Length::from_mm(names.iter().find_map(|name| self.get(name)).unwrap_or(0.0))
    }
}

fn shape(reader: &mut Reader, node: &Node) -> Given<SectionChoice> {
    let before = reader.slips.len();
    let mut kind = None;
    if let Some(named) = node.get("shape") {
        let key = &SECTION[0];
        kind = reader
            .choice(named, key)
            .value()
            .and_then(|at| ShapeKeys::find(key.kind.choices()[*at]));
    } else {
        reader.missing(node.span, "shape", "a section mapping");
    }
    let mut sizes = Sizes(Vec::new());
    reader.entries(node, SECTION, "`section`", |reader, key, entry| {
        if key.name == "shape" {
            return;
        }
        if let Some(kind) = kind.filter(|kind| !kind.takes(key.name)) {
            let takes: Vec<&str> = kind.wants.iter().chain(kind.may).copied().collect();
            let text = format!(
                "the shape `{}` takes no `{}`; its keys are {}",
                kind.name,
                key.name,
                takes.join(", ")
            );
            reader
                .slips
                .push(Slip::new(SlipKind::UnknownKey, entry.key.span, text).at_key(key.name));
            return;
        }
        if key.name == "of" {
            reader.text(&entry.value, key);
        } else if let Some(value) = reader.quantity(&entry.value, key).value() {
            sizes.0.push((key.name, *value));
        }
    });
    let Some(kind) = kind else {
        return Given::unreadable(node.span);
    };
    for name in kind.wants.iter().filter(|name| node.get(name).is_none()) {
        let text = format!(
            "the shape `{}` has no `{name}`; it wants {}",
            kind.name,
            kind.wants.join(", ")
        );
        reader
            .slips
            .push(Slip::new(SlipKind::MissingKey, node.span, text).at_key(name));
    }
    if reader.slips.len() > before {
        return Given::unreadable(node.span);
    }
    let Some(shape) = build(kind.name, &sizes) else {
        return Given::new(SectionChoice::NotCovered(kind.name), node.span);
    };
    if let Err(error) = shape.check() {
        let span = node.get(error.dimension).map_or(node.span, |at| at.span);
        reader
            .slips
            .push(Slip::new(SlipKind::OutOfBounds, span, format!("no section can be so: {error}")).at_key("section"));
        return Given::unreadable(node.span);
    }
    Given::new(SectionChoice::Shape(Box::new(shape)), node.span)
}

/// The shape of the sizes; none for shapes whose geometry is not covered.
fn build(kind: &str, sizes: &Sizes) -> Option<Shape> {
    let at = |name: &str| sizes.length(name);
    Some(match kind {
        "i" => Shape::I(ParallelI {
            h: at("h"),
            b: at("b"),
            tw: at("tw"),
            tf: at("tf"),
            r: at("r"),
        }),
        "welded i" => Shape::WeldedI(WeldedI {
            h: at("h"),
            b_top: sizes.first(&["b top", "b"]),
            tf_top: sizes.first(&["tf top", "tf"]),
            b_bottom: sizes.first(&["b bottom", "b"]),
            tf_bottom: sizes.first(&["tf bottom", "tf"]),
            tw: at("tw"),
            weld: at("weld"),
        }),
        "channel" => Shape::Channel(Channel {
            h: at("h"),
            b: at("b"),
            tw: at("tw"),
            tf: at("tf"),
            r: at("r"),
        }),
        "tee" => Shape::Tee(Tee {
            h: at("h"),
            b: at("b"),
            tw: at("tw"),
            tf: at("tf"),
            r: at("r"),
        }),
        "angle" => Shape::Angle(Angle {
            h: at("h"),
            b: at("b"),
            t: at("t"),
            root: at("r"),
            toe: at("toe"),
        }),
        "rectangular hollow" => {
            // Corners that are not stated are those of hot finished sections.
            let plain = RectangularHollow::hot_finished(at("h"), at("b"), at("t"));
            let radius = |name: &str, unstated: Length| sizes.get(name).map_or(unstated, Length::from_mm);
            Shape::RectangularHollow(RectangularHollow {
                ro: radius("ro", plain.ro),
                ri: radius("ri", plain.ri),
                ..plain
            })
        }
        "circular hollow" => Shape::CircularHollow(CircularHollow { d: at("d"), t: at("t") }),
        "round" => Shape::Round(Round { d: at("d") }),
        "flat" => Shape::Flat(Flat { b: at("b"), t: at("t") }),
        "stated" => Shape::Stated(Stated {
            area: Area::from_mm2(sizes.get("area").unwrap_or(0.0)),
            perimeter: at("perimeter"),
            box_perimeter: sizes.get("box perimeter").map(Length::from_mm),
            mass: sizes.get("mass").map(LinearMass::from_kg_m),
        }),
        _ => return None,
    })
}
