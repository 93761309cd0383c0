//! The published schemas are those of the table of keys; an independent validator takes the scenario and refuses wrong
//! files. `SCHEMA_WRITE=1 cargo test --test schema` writes them anew.

use std::path::PathBuf;

use scorchline::exchange::schema;
use scorchline::scenario::FILES;

fn path(name: &str) -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("schema").join(name)
}

#[test]
fn the_files_are_up_to_date() {
    let files = [
        ("steelwork.schema.json", schema::steelwork()),
        ("protection.schema.json", schema::protection()),
    ];
    for (name, wanted) in files {
        if std::env::var_os("SCHEMA_WRITE").is_some() {
            std::fs::write(path(name), &wanted).unwrap();
        }
        let found = std::fs::read_to_string(path(name)).unwrap_or_default();
        assert!(found == wanted, "{name} is out of date");
    }
}

fn accepts(schema: &str, yaml: &str) -> bool {
    let schema: serde_json::Value = serde_json::from_str(schema).unwrap();
    let value: serde_yaml::Value = serde_yaml::from_str(yaml).unwrap();
    // Keys of JSON are text; YAML's numbers as keys are written as such.
    let value = plain(value);
    jsonschema::validator_for(&schema).unwrap().is_valid(&value)
}

fn plain(value: serde_yaml::Value) -> serde_json::Value {
    use serde_yaml::Value as Y;
    match value {
        Y::Mapping(map) => serde_json::Value::Object(
            map.into_iter()
                .map(|(key, value)| {
                    let key = key
                        .as_str()
                        .map_or_else(|| serde_yaml::to_string(&key).unwrap().trim().to_owned(), str::to_owned);
                    (key, plain(value))
                })
                .collect(),
        ),
        Y::Sequence(list) => list.into_iter().map(plain).collect(),
        other => serde_json::to_value(other).unwrap(),
    }
}

#[test]
fn the_scenario_is_accepted() {
    for (name, text) in FILES {
        let schema = if name.contains("protection") {
            schema::protection()
        } else {
            schema::steelwork()
        };
        assert!(accepts(&schema, text), "{name}");
    }
}

#[test]
fn wrong_files_are_refused() {
    let wrong = [
        "members: []",
        "steelwork: 2",
        "steelwork: 1\nmember: []",
        "steelwork: 1\nmembers: [{ mark: B1, lenght: 7.5 }]",
        "steelwork: 1\nmembers: [{ mark: B1, role: pillar }]",
        "steelwork: 1\nmembers: [{ mark: B1, count: 0 }]",
        "steelwork: 1\nmembers: [{ mark: B1, length: -3 }]",
        "steelwork: 1\nmembers: [{ mark: B1, period: 600 }]",
        "steelwork: 1\nmembers: [{ mark: B1, restrained: maybe }]",
        "steelwork: 1\nmembers: [{ mark: B1, section: { shape: star, h: 3 } }]",
        "steelwork: 1\nfires: { plant: { opening factor: 0.06 } }",
        "steelwork: 1\nmembers: [{ mark: B1, exposure: { covered: [inside] } }]",
    ];
    for text in wrong {
        assert!(!accepts(&schema::steelwork(), text), "{text}");
    }
    assert!(!accepts(
        &schema::protection(),
        "protection: 1\nproducts: { a: { kind: paint, method: regression } }"
    ));
}
