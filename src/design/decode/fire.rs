//! Decoding `fires`.

use crate::design::decode::reader::Reader;
use crate::design::keys::Key;
use crate::design::keys::steelwork::FIRE;
use crate::design::model::head::NamedFire;
use crate::design::slip::{Slip, SlipKind};
use crate::heating::fire::{Fire, Growth, Parametric, ParametricInput, Points};
use crate::syntax::{Node, Value};
use crate::text::Spanned;
use crate::units::{Temperature, Time};

/// The built-in fires by name.
pub const BUILT_IN: &[(&str, Fire)] = &[
    ("standard", Fire::Standard),
    ("external", Fire::External),
    ("hydrocarbon", Fire::Hydrocarbon),
    ("slow heating", Fire::SlowHeating),
];

/// Decodes the mapping from names to fires.
pub fn fires(reader: &mut Reader, node: &Node, key: &'static Key) -> Vec<NamedFire> {
    let entries = match &node.value {
        Value::Mapping(entries) => entries,
        Value::Null => return Vec::new(),
        _ => {
            reader.wrong_kind(node, key);
            return Vec::new();
        }
    };
    let mut fires: Vec<NamedFire> = Vec::new();
    for entry in entries {
        let Value::Scalar(name) = &entry.key.value else {
            reader.slip(SlipKind::WrongKind, &entry.key, "the name of a fire is a word");
            continue;
        };
        if fires.iter().any(|fire| fire.name.value == name.text) {
            reader.twice(&entry.key, &name.text);
            continue;
        }
        if BUILT_IN.iter().any(|(built_in, _)| *built_in == name.text) {
            let text = format!("`{}` is built in; give this fire another name", name.text);
            reader.slip(SlipKind::WrongKind, &entry.key, text);
            continue;
        }
        let name = Spanned {
            value: name.text.clone(),
            span: entry.key.span,
        };
        let fire = fire(reader, &entry.value, &name.value);
        fires.push(NamedFire { name, fire });
    }
    fires
}

const PARAMETRIC: &[&str] = &[
    "opening factor",
    "fire load",
    "thermal inertia",
    "floor area",
    "enclosure area",
    "growth",
];

fn fire(reader: &mut Reader, node: &Node, name: &str) -> Option<Fire> {
    let owner = format!("the fire `{name}`");
    let before = reader.slips.len();
    let mut numbers: Vec<(&'static str, f64)> = Vec::new();
    let mut points = Vec::new();
    let (mut kind, mut growth, mut roof_openings) = (None, None, false);
    reader.entries(node, FIRE, &owner, |reader, key, entry| {
        let value = &entry.value;
        match key.name {
            "kind" => kind = reader.choice(value, key).value().copied(),
            "growth" => {
                growth = reader
                    .choice(value, key)
                    .value()
                    .map(|at| [Growth::Slow, Growth::Medium, Growth::Fast][*at])
            }
            "roof openings" => roof_openings = reader.yes_no(value, key).value().copied().unwrap_or(false),
            "points" => {
                for point in reader.list(value) {
                    if let Some([minutes, celsius]) = reader.tuple::<2>(point, key).value() {
                        points.push((Time::from_min(*minutes), Temperature::from_celsius(*celsius)));
                    }
                }
            }
            "note" => {}
            name => {
                if let Some(number) = reader.quantity(value, key).value() {
                    numbers.push((name, *number));
                }
            }
        }
    });
    let get = |name: &str| numbers.iter().find(|(key, _)| *key == name).map(|(_, value)| *value);
    let wants: &[&'static str] = match kind {
        Some(0) => PARAMETRIC,
        Some(_) => &["points"],
        None => &["kind"],
    };
    for name in wants.iter().filter(|name| node.get(name).is_none()) {
        reader.missing(node.span, name, &owner);
    }
    if reader.slips.len() > before {
        return None;
    }
    let built = match kind {
        Some(0) => Parametric::new(ParametricInput {
            opening_factor: get("opening factor")?,
            fire_load: get("fire load")?,
            thermal_inertia: get("thermal inertia")?,
            floor_area: get("floor area")?,
            enclosure_area: get("enclosure area")?,
            growth: growth?,
            height: get("height").map(crate::units::Length::from_mm),
            roof_openings,
        })
        .map(Fire::Parametric),
        _ => Points::new(points, get("convection")).map(Fire::Points),
    };
    match built {
        Ok(fire) => Some(fire),
        Err(error) => {
            reader.slips.push(Slip::new(
                SlipKind::OutOfBounds,
                node.span,
                format!("{owner} can't burn so: {error}"),
            ));
            None
        }
    }
}
