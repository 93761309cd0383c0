//! The published schemas are those of the table of keys, and an independent validator of JSON Schema agrees with the
//! reader: it takes the scenario and every example of a finding that is answered, and refuses wrong files.
//! `SCHEMA_WRITE=1 cargo test --test schema` writes them anew.

use std::path::PathBuf;

use scorchline::exchange::schema;
use scorchline::findings::registry::{REGISTRY, example_files};
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
        assert!(
            found == wanted,
            "{name} is out of date: SCHEMA_WRITE=1 cargo test --test schema writes it"
        );
    }
}

/// The schemas of both kinds, compiled once each.
struct Schemas {
    steelwork: jsonschema::Validator,
    protection: jsonschema::Validator,
}

impl Schemas {
    /// As generated; that the committed files are the same has its own test.
    fn compiled() -> Self {
        let read = |text: String| {
            let schema: serde_json::Value = serde_json::from_str(&text).unwrap();
            jsonschema::draft202012::meta::validate(&schema).unwrap();
            jsonschema::draft202012::options().build(&schema).unwrap()
        };
        Self {
            steelwork: read(schema::steelwork()),
            protection: read(schema::protection()),
        }
    }

    /// What is wrong with a file, in the validator's words.
    fn errors(&self, name: &str, yaml: &str) -> Vec<String> {
        let value: serde_yaml::Value = serde_yaml::from_str(yaml).unwrap();
        let value = plain(value);
        let validator = if name.contains("protection") {
            &self.protection
        } else {
            &self.steelwork
        };
        validator
            .iter_errors(&value)
            .map(|error| format!("{name} at {}: {error}", error.instance_path()))
            .collect()
    }
}

/// YAML as JSON. Keys of JSON are text; numbers as keys are written as such.
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
    let schemas = Schemas::compiled();
    for (name, text) in FILES {
        assert_eq!(schemas.errors(name, text), Vec::<String>::new());
    }
}

#[test]
fn answered_examples_are_accepted() {
    let schemas = Schemas::compiled();
    let mut seen = 0;
    for declaration in REGISTRY {
        for (name, text) in example_files(declaration.after) {
            assert_eq!(
                schemas.errors(&name, &text),
                Vec::<String>::new(),
                "after {}",
                declaration.name
            );
            seen += 1;
        }
    }
    assert!(seen > REGISTRY.len());
}

#[test]
fn examples_of_wrong_values_are_refused() {
    let schemas = Schemas::compiled();
    for name in ["unknown-key", "wrong-kind", "wrong-unit", "out-of-bounds"] {
        let declaration = REGISTRY.iter().find(|declaration| declaration.name == name).unwrap();
        let errors: Vec<String> = example_files(declaration.before)
            .iter()
            .flat_map(|(name, text)| schemas.errors(name, text))
            .collect();
        assert!(!errors.is_empty(), "before {name}");
    }
}

/// Every way to write a quantity that the reader takes.
#[test]
fn quantities_are_accepted_as_they_may_be_written() {
    let schemas = Schemas::compiled();
    let members = [
        "length: 7.5",
        "length: 7.5 m",
        "length: 7500mm",
        "length: 24 ft",
        "length: 3/4 in",
        "length: 12 1/2 in",
        "length: 1.5e3 mm",
        "period: R60",
        "period: R 60",
        "period: REI 90",
        "period: 1.5 h",
        "period: { none: yes, because: it is a rail }",
        "critical temperature: 1000 °F",
        "critical temperature: { value: 550, by: engineer, status: approved }",
        "loading: { bending: 45 kN m, lateral length: 0 }",
        "loading: { axial: -120 kN, buckling length: 2.5 m }",
        "protection: { product: film, dft: 35 mil }",
        "protection: { product: film, dft: 0.9 mm }",
        "protection: { product: board, thickness: [20, 15 mm] }",
        "protection: none",
        "restrained: true",
        "exposure: { covered: [top, left] }",
        "exposure: { covered: top }",
        "steel: { yield: 350 MPa }",
        "section: { shape: welded i, h: 900, tw: 12, b: 300, tf: 20, weld: 6 }",
        "surface: { galvanised: { to: EN ISO 1461, category: A } }",
        "supported by: C1",
    ];
    for keys in members {
        let text = format!("steelwork: 1\nmembers:\n  - {{ mark: B1, {keys} }}\n");
        assert_eq!(schemas.errors("a.steelwork.yaml", &text), Vec::<String>::new());
    }
    assert_eq!(
        schemas.errors("a.steelwork.yaml", "steelwork: 1\nmembers:\n"),
        Vec::<String>::new()
    );
}

#[test]
fn wrong_files_are_refused() {
    let schemas = Schemas::compiled();
    let steelwork = [
        "members: []",
        "steelwork: 2",
        "steelwork: 1\nmember: []",
        "steelwork: 1\nmembers: { mark: B1 }",
        "steelwork: 1\nmembers: [{ section: IPE 300 }]",
        "steelwork: 1\nmembers: [{ mark: B1, lenght: 7.5 }]",
        "steelwork: 1\nmembers: [{ mark: B1, role: pillar }]",
        "steelwork: 1\nmembers: [{ mark: B1, count: 0 }]",
        "steelwork: 1\nmembers: [{ mark: B1, count: 2.5 }]",
        "steelwork: 1\nmembers: [{ mark: B1, length: -3 }]",
        "steelwork: 1\nmembers: [{ mark: B1, length: 20 min }]",
        "steelwork: 1\nmembers: [{ mark: B1, length: \"7,5\" }]",
        "steelwork: 1\nmembers: [{ mark: B1, length: .inf }]",
        "steelwork: 1\nmembers: [{ mark: B1, period: 600 }]",
        "steelwork: 1\nmembers: [{ mark: B1, period: R }]",
        "steelwork: 1\nmembers: [{ mark: B1, period: { none: yes } }]",
        "steelwork: 1\nmembers: [{ mark: B1, restrained: maybe }]",
        "steelwork: 1\nmembers: [{ mark: B1, section: { shape: star, h: 3 } }]",
        "steelwork: 1\nmembers: [{ mark: B1, section: { shape: flat, b: 100 } }]",
        "steelwork: 1\nmembers: [{ mark: B1, section: { shape: round, d: 30, h: 30 } }]",
        "steelwork: 1\nmembers: [{ mark: B1, departures: [{ because: no reason }] }]",
        "steelwork: 1\ngroups: { floors: { mark: B1 } }",
        "steelwork: 1\ndefaults: { departures: [] }",
        "steelwork: 1\nfires: { plant: { opening factor: 0.06 } }",
        "steelwork: 1\nmembers: [{ mark: B1, exposure: { covered: [inside] } }]",
        "steelwork: 1\nbasis: { units: parsec }",
        "- mark: B1",
    ];
    for text in steelwork {
        assert!(!schemas.errors("a.steelwork.yaml", text).is_empty(), "{text}");
    }
    let protection = [
        "products: {}",
        "protection: 1\nproducts: { a: { kind: paint, method: regression } }",
        "protection: 1\nproducts: { a: { kind: board } }",
        "protection: 1\nproducts: { a: { kind: board, method: regression, coefficients: [1, 2] } }",
        "protection: 1\nproducts: { a: { kind: coating, method: assessed table, tables: { period: 60, steel temperature: [500], rows: { wide: [300] } } } }",
        "protection: 1\nproducts: { a: { kind: board, method: constant properties, conductivity: 0.17 mm } }",
        "protection: 1\nproducts: { a: { kind: board, method: constant properties, assessed: { period: [30] } } }",
        "protection: 1\nproducts: { a: { kind: board, method: constant properties, evidence: { expires: soon } } }",
    ];
    for text in protection {
        assert!(!schemas.errors("a.protection.yaml", text).is_empty(), "{text}");
    }
}
