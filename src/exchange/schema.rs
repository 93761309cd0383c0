//! JSON Schemas (2020-12) of both file kinds, generated from the table of keys.

use serde_json::{Map, Value, json};

use crate::design::keys::protection::PROTECTION_FILE;
use crate::design::keys::steelwork::STEELWORK;
use crate::design::keys::{Key, Kind};

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
    let mut schema = mapping(keys, true);
    if let Value::Object(map) = &mut schema {
        map.insert(
            "$schema".to_owned(),
            json!("https://json-schema.org/draft/2020-12/schema"),
        );
        map.insert("title".to_owned(), json!(title));
    }
    let mut text = serde_json::to_string_pretty(&schema).unwrap_or_default();
    text.push('\n');
    text
}

/// A mapping that takes these keys only. Member keys may come by inheritance, so there only the mark is required.
fn mapping(keys: &'static [Key], strict: bool) -> Value {
    let member = keys.first().is_some_and(|key| key.name == "mark");
    let required: Vec<&str> = keys
        .iter()
        .filter(|key| key.required && strict && !member)
        .map(|key| key.name)
        .collect();
    let mut properties = Map::new();
    for key in keys {
        let mut schema = of(&key.kind);
        if let Value::Object(map) = &mut schema {
            map.insert("description".to_owned(), json!(key.doc));
        }
        properties.insert(key.name.to_owned(), schema);
    }
    json!({ "type": "object", "properties": properties, "required": required, "additionalProperties": false })
}

fn of(kind: &Kind) -> Value {
    match kind {
        // Marks, names and designations keep their source text, so a number is taken as text too.
        Kind::Text | Kind::Name(_) | Kind::Designation => json!({ "type": ["string", "number", "boolean"] }),
        Kind::Number(measure) => json!({ "anyOf": [
            { "type": "number", "minimum": measure.min, "maximum": measure.max },
            { "type": "string", "pattern": "^[-+0-9.]" },
        ] }),
        Kind::Whole(min, max) => json!({ "type": "integer", "minimum": min, "maximum": max }),
        Kind::Period => json!({ "anyOf": [
            { "type": "number", "minimum": 1, "maximum": 360 },
            { "type": "string", "pattern": "^([Rr]([Ee][Ii])?[ -]?)?[0-9.]" },
        ] }),
        Kind::Date => json!({ "type": "string", "pattern": "^[0-9]{4}-[0-9]{2}-[0-9]{2}$" }),
        Kind::YesNo => json!({ "enum": ["yes", "no", true, false] }),
        Kind::Choice(words) => json!({ "enum": words }),
        Kind::List(entry) => {
            let entry = of(entry);
            json!({ "anyOf": [{ "type": "array", "items": entry }, entry, { "type": "null" }] })
        }
        Kind::Tuple(entry, n) => json!({ "type": "array", "items": of(entry), "minItems": n, "maxItems": n }),
        Kind::Map(keys) => mapping(keys, true),
        Kind::Named(entry) => json!({ "type": ["object", "null"], "additionalProperties": of(entry) }),
        Kind::Numbered(_, entry) => json!({ "type": "object", "additionalProperties": of(entry) }),
        Kind::Blank => json!({ "type": "null" }),
        Kind::OneOf(kinds) => json!({ "anyOf": kinds.iter().map(of).collect::<Vec<_>>() }),
    }
}
