//! Decoding `loading`: one of several definitions, which are not synonyms.

use crate::design::decode::reader::Reader;
use crate::design::given::Given;
use crate::design::keys::Key;
use crate::design::keys::member as table;
use crate::design::model::member::{Effects, Load, Loading, Reduction, Restraint};
use crate::design::slip::SlipKind;
use crate::syntax::Node;
use crate::units::{Force, Length, Moment};

/// What `loading` may hold beside each other; a member states its load in one of these ways.
const UTILISATION: &[&str] = &["utilisation"];
const AMBIENT: &[&str] = &[
    "ambient utilisation",
    "reduction",
    "permanent",
    "variable",
    "combination factor",
];
const RATIO: &[&str] = &["load ratio"];

/// Keys that refine a stated utilisation: the slenderness that the utilisation alone does not show.
const LENGTHS: &[&str] = &[
    "buckling length",
    "buckling length minor",
    "lateral length",
    "moment shape",
    "support",
];

/// Decodes the mapping of `loading`.
pub fn loading(reader: &mut Reader, node: &Node) -> Given<Box<Loading>> {
    let before = reader.slips.len();
    let mut numbers = [None::<f64>; 7];
    let mut effects = Effects::default();
    let mut restraint = Restraint::default();
    let mut ways: Vec<(&'static str, &'static str)> = Vec::new();
    let read = reader.entries(node, table::LOADING, "`loading`", |reader, key, entry| {
        let value = &entry.value;
        let way = way_of(key.name);
        if !LENGTHS.contains(&key.name) && !ways.iter().any(|(w, _)| *w == way) {
            ways.push((way, key.name));
        }
        if let Some(slot) = UTILISATION
            .iter()
            .chain(AMBIENT)
            .chain(RATIO)
            .position(|name| *name == key.name)
        {
            numbers[slot] = reader.quantity(value, key).value().copied();
            return;
        }
        effect(reader, &mut effects, &mut restraint, key, value);
    });
    if !read {
        return Given::unreadable(node.span);
    }
    if ways.len() > 1 {
        let names: Vec<String> = ways.iter().map(|(_, name)| format!("`{name}`")).collect();
        let text = format!(
            "`loading` states the load in more than one way ({}); keep one of them",
            names.join(" and ")
        );
        reader.slip(SlipKind::WrongKind, node, text);
    }
    let [utilisation, ambient, reduction, permanent, variable, combination, ratio] = numbers;
    let load = match ways.first().map(|(way, _)| *way) {
        Some("utilisation") => utilisation.map(Load::Utilisation),
        Some("ambient") => {
            let reduction = match (reduction, permanent, variable, combination) {
                (Some(factor), ..) => Some(Reduction::Factor(factor)),
                (None, Some(permanent), Some(variable), Some(combination)) => Some(Reduction::Actions {
                    permanent,
                    variable,
                    combination,
                }),
                _ => None,
            };
            if ambient.is_none() && reader.slips.len() == before {
                reader.missing(node.span, "ambient utilisation", "`loading`");
            } else if reduction.is_none() && reader.slips.len() == before {
                let text = "`ambient utilisation` needs `reduction` (ηfi), or `permanent`, `variable` and `combination factor`";
                reader.slip(SlipKind::MissingKey, node, text);
            }
            ambient
                .zip(reduction)
                .map(|(utilisation, reduction)| Load::Ambient { utilisation, reduction })
        }
        Some("ratio") => ratio.map(Load::Ratio),
        Some(_) => Some(Load::Effects(effects)),
        None => {
            if reader.slips.len() == before {
                let text = "`loading` states no load: give `utilisation`, `ambient utilisation` with `reduction`, or the \
                            effects in fire (`axial`, `bending`, `shear`)";
                reader.slip(SlipKind::MissingKey, node, text);
            }
            None
        }
    };
    match load {
        Some(load) if reader.slips.len() == before => Given::new(Box::new(Loading { load, restraint }), node.span),
        _ => Given::unreadable(node.span),
    }
}

fn way_of(name: &str) -> &'static str {
    if UTILISATION.contains(&name) {
        "utilisation"
    } else if AMBIENT.contains(&name) {
        "ambient"
    } else if RATIO.contains(&name) {
        "ratio"
    } else {
        "effects"
    }
}

fn effect(reader: &mut Reader, effects: &mut Effects, restraint: &mut Restraint, key: &'static Key, node: &Node) {
    match key.name {
        "moment shape" => {
            restraint.moment_shape = reader.choice(node, key).value().map(|at| key.kind.choices()[*at]);
            return;
        }
        "support" => {
            restraint.continuous = reader.choice(node, key).value() == Some(&1);
            return;
        }
        _ => {}
    }
    let Some(number) = reader.quantity(node, key).value().copied() else {
        return;
    };
    match key.name {
        "axial" => effects.axial = Some(Force::from_kn(number)),
        "bending" => effects.bending = Some(Moment::from_knm(number)),
        "bending minor" => effects.bending_minor = Some(Moment::from_knm(number)),
        "shear" => effects.shear = Some(Force::from_kn(number)),
        "buckling length" => restraint.buckling_length = Some(Length::from_mm(number)),
        "buckling length minor" => restraint.buckling_length_minor = Some(Length::from_mm(number)),
        _ => restraint.lateral_length = Some(Length::from_mm(number)),
    }
}
