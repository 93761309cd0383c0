//! JSON Schemas (2020-12) of both file kinds, generated from the table of keys.
//!
//! A schema takes each word in the spelling of the table; the reader is more lenient about case and hyphens. What
//! depends on more than one value (names that must be known, ways to state a load that exclude each other) is left to
//! the reader.

mod pattern;

use std::collections::BTreeMap;

use serde_json::{Map, Value, json};

use self::pattern::{period_pattern, quantity_pattern};
use crate::design::keys::member::MEMBER;
use crate::design::keys::protection::PROTECTION_FILE;
use crate::design::keys::section::{SECTION, SHAPES};
use crate::design::keys::steelwork::STEELWORK;
use crate::design::keys::{Key, Kind, Measure};

/// The longest text that is read; messages repeat it.
const LONGEST_TEXT: usize = 2000;
/// Keys of a member that neither a group nor the defaults may carry.
const OWN: [&str; 2] = ["mark", "departures"];

/// The schema of a steelwork file.
#[must_use]
pub fn steelwork() -> String {
    document(
        "Steelwork file: the members of a frame and how each is meant to survive the fire",
        STEELWORK,
    )
}

/// The schema of a protection file.
#[must_use]
pub fn protection() -> String {
    document(
        "Protection file: products and the range that was assessed",
        PROTECTION_FILE,
    )
}

fn document(title: &str, keys: &'static [Key]) -> String {
    let mut definitions = BTreeMap::new();
    let body = mapping(keys, &mut definitions);
    let mut schema = Map::new();
    schema.insert(
        "$schema".to_owned(),
        json!("https://json-schema.org/draft/2020-12/schema"),
    );
    schema.insert("title".to_owned(), json!(title));
    if let Value::Object(body) = body {
        schema.extend(body);
    }
    if !definitions.is_empty() {
        schema.insert("$defs".to_owned(), json!(definitions));
    }
    let mut text = serde_json::to_string_pretty(&schema).unwrap_or_default();
    text.push('\n');
    text
}

/// What is referred to from several places, by name.
type Definitions = BTreeMap<String, Value>;

/// A mapping that takes these keys and no other.
fn mapping(keys: &'static [Key], definitions: &mut Definitions) -> Value {
    let properties: Map<String, Value> = keys
        .iter()
        .map(|key| (key.name.to_owned(), property(key, definitions)))
        .collect();
    let required: Vec<&str> = keys.iter().filter(|key| key.required).map(|key| key.name).collect();
    let mut schema = json!({ "type": "object", "properties": properties, "additionalProperties": false });
    if let Value::Object(map) = &mut schema {
        if !required.is_empty() {
            map.insert("required".to_owned(), json!(required));
        }
        if std::ptr::eq(keys, SECTION) {
            map.insert("allOf".to_owned(), shapes());
        }
    }
    schema
}

/// What each shape of a section mapping wants and takes.
fn shapes() -> Value {
    let one = |shape: &crate::design::keys::section::ShapeKeys| {
        let takes: Vec<&str> = SECTION
            .iter()
            .map(|key| key.name)
            .filter(|name| shape.takes(name))
            .collect();
        json!({
            "if": { "properties": { "shape": { "const": shape.name } }, "required": ["shape"] },
            "then": { "description": shape.doc, "required": shape.wants, "propertyNames": { "enum": takes } },
        })
    };
    SHAPES.iter().map(one).collect()
}

/// A member, or what groups and defaults may say of members. Both share the schemas of the keys.
fn member(own: bool, definitions: &mut Definitions) -> Value {
    let name = if own { "member" } else { "shared by members" };
    if !definitions.contains_key(name) {
        let mut properties = Map::new();
        for key in MEMBER.iter().filter(|key| own || !OWN.contains(&key.name)) {
            let shared = format!("key: {}", key.name);
            if !definitions.contains_key(&shared) {
                let schema = property(key, definitions);
                definitions.insert(shared.clone(), schema);
            }
            properties.insert(key.name.to_owned(), reference(&shared));
        }
        let mut schema = json!({ "type": "object", "properties": properties, "additionalProperties": false });
        // All else that a member needs may come from its group or the defaults.
        if let (true, Value::Object(map)) = (own, &mut schema) {
            map.insert("required".to_owned(), json!(["mark"]));
        }
        definitions.insert(name.to_owned(), schema);
    }
    reference(name)
}

/// A reference to a definition; its name as part of a URI.
fn reference(name: &str) -> Value {
    json!({ "$ref": format!("#/$defs/{}", name.replace(' ', "%20")) })
}

fn property(key: &'static Key, definitions: &mut Definitions) -> Value {
    let mut schema = match (key.name, &key.kind) {
        // The members are always a list; elsewhere one value may stand for a list of one.
        ("members", _) => json!({ "type": ["array", "null"], "items": member(true, definitions) }),
        _ => of(&key.kind, definitions),
    };
    let unit = key
        .kind
        .measure()
        .map(|measure| measure.unit)
        .filter(|unit| !unit.is_empty());
    let description = match unit {
        Some(unit) => format!("{} In {unit} where no unit is written.", key.doc),
        None => key.doc.to_owned(),
    };
    if let Value::Object(map) = &mut schema {
        map.insert("description".to_owned(), json!(description));
    }
    schema
}

fn of(kind: &'static Kind, definitions: &mut Definitions) -> Value {
    match kind {
        // Marks, names and designations keep their source text, so a number is taken as text too.
        Kind::Text | Kind::Name(_) | Kind::Designation => {
            json!({ "type": ["string", "number", "boolean"], "maxLength": LONGEST_TEXT })
        }
        Kind::Number(measure) => quantity(measure),
        Kind::Whole(min, max) => json!({ "type": "integer", "minimum": min, "maximum": max }),
        Kind::Period => json!({ "anyOf": [
            { "type": "number", "minimum": 1, "maximum": 360 },
            { "type": "string", "pattern": period_pattern() },
        ] }),
        Kind::Date => json!({ "type": "string", "format": "date", "pattern": "^[0-9]{4}-[0-9]{2}-[0-9]{2}$" }),
        Kind::YesNo => json!({ "enum": ["yes", "no", true, false] }),
        Kind::Choice(words) => json!({ "enum": words }),
        Kind::List(entry) => {
            let entry = of(entry, definitions);
            json!({ "anyOf": [{ "type": "array", "items": entry }, entry, { "type": "null" }] })
        }
        Kind::Tuple(entry, n) => {
            json!({ "type": "array", "items": of(entry, definitions), "minItems": n, "maxItems": n })
        }
        Kind::Map(keys) if std::ptr::eq(*keys, MEMBER) => member(false, definitions),
        Kind::Map(keys) => mapping(keys, definitions),
        Kind::Named(entry) => json!({ "type": ["object", "null"], "additionalProperties": of(entry, definitions) }),
        Kind::Numbered(measure, entry) => json!({
            "type": "object",
            "propertyNames": { "pattern": quantity_pattern(measure.dimension) },
            "additionalProperties": of(entry, definitions),
        }),
        Kind::Blank => json!({ "type": "null" }),
        Kind::OneOf(kinds) => {
            let kinds: Vec<Value> = kinds.iter().map(|kind| of(kind, definitions)).collect();
            json!({ "anyOf": kinds })
        }
    }
}

/// A bare number within the bounds of its unit, or a number with one of the units that measure the same. The bounds of
/// the latter are the reader's to hold.
fn quantity(measure: &Measure) -> Value {
    json!({ "anyOf": [
        { "type": "number", "minimum": measure.min, "maximum": measure.max },
        { "type": "string", "pattern": quantity_pattern(measure.dimension) },
    ] })
}
