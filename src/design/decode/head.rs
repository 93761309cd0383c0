//! Decoding what a steelwork file says outside its members.

use crate::design::decode::fire;
use crate::design::decode::member::{Owner, shared_keys};
use crate::design::decode::reader::{Reader, same_word};
use crate::design::given::Given;
use crate::design::keys::steelwork as table;
use crate::design::keys::{Key, nearest};
use crate::design::model::head::{Basis, Factors, Head, Method, Project};
use crate::design::slip::{Slip, SlipKind};
use crate::syntax::{Entry, Value};
use crate::text::Spanned;
use crate::units::Temperature;

/// Decodes one top-level entry that is not a list of members or groups into the head.
pub fn entry(reader: &mut Reader, head: &mut Head, key: &'static Key, entry: &Entry) {
    let node = &entry.value;
    if table::HEAD_ONLY.contains(&key.name) {
        head.head_only.push(Spanned {
            value: key.name,
            span: entry.key.span,
        });
    }
    match key.name {
        "steelwork" => {
            head.version = reader.whole(node, key);
            head.version_at = Some(entry.key.span);
        }
        "part of" => head.part_of = reader.text(node, key),
        "project" => head.project = project(reader, entry),
        "basis" => head.basis = basis(reader, entry),
        "libraries" => head.libraries = names(reader, entry, key),
        "parts" => head.parts = names(reader, entry, key),
        "fires" => head.fires = fire::fires(reader, node, key),
        "defaults" => head.defaults = shared_keys(reader, node, Owner::Defaults),
        other => reader.slip(SlipKind::UnknownKey, &entry.key, format!("`{other}` can't stand here")),
    }
}

fn names(reader: &mut Reader, entry: &Entry, key: &'static Key) -> Vec<Spanned<String>> {
    match reader.names(&entry.value, key) {
        Given::Value(names) => names.value,
        _ => Vec::new(),
    }
}

fn project(reader: &mut Reader, entry: &Entry) -> Project {
    let mut project = Project::default();
    reader.entries(&entry.value, table::PROJECT, "`project`", |reader, key, entry| {
        let text = reader.text(&entry.value, key).value().cloned();
        match key.name {
            "name" => project.name = text,
            "reference" => project.reference = text,
            "revision" => project.revision = text,
            "status" => project.status = text,
            _ => {}
        }
    });
    project
}

fn basis(reader: &mut Reader, entry: &Entry) -> Basis {
    let mut basis = Basis::default();
    if matches!(entry.value.value, Value::Null) {
        return basis;
    }
    reader.entries(&entry.value, table::BASIS, "`basis`", |reader, key, entry| {
        let node = &entry.value;
        match key.name {
            "method" => basis.method = method(reader, entry, key),
            "units" => basis.imperial = reader.choice(node, key).value() == Some(&1),
            "currency" => basis.currency = reader.text(node, key).value().cloned(),
            "rates" => {
                reader.entries(node, table::RATES, "`rates`", |reader, key, entry| {
                    let rate = reader.quantity(&entry.value, key).value().copied();
                    if key.name == "steel" {
                        basis.steel_rate = rate
                    } else {
                        basis.carbon_rate = rate
                    }
                });
            }
            "default critical temperature" => {
                basis.default_critical = reader.quantity(node, key).map(Temperature::from_celsius);
            }
            "factors" => basis.factors = factors(reader, entry),
            "yield from" => basis.yield_from_en10025 = reader.choice(node, key).value() == Some(&1),
            "section tables" => {
                for entry in reader.list(node) {
                    if let Some(at) = reader.choice(entry, key).value() {
                        basis.section_tables.push(key.kind.choices()[*at]);
                    }
                }
            }
            _ => basis.hollow_hot_finished = reader.choice(node, key).value().map(|at| *at == 0),
        }
    });
    basis
}

fn factors(reader: &mut Reader, entry: &Entry) -> Factors {
    let mut factors = Factors::default();
    reader.entries(&entry.value, table::FACTORS, "`factors`", |reader, key, entry| {
        let Some(value) = reader.quantity(&entry.value, key).value().copied() else {
            return;
        };
        match key.name {
            "gamma M fi" => factors.gamma_m_fi = value,
            "gamma M0" => factors.gamma_m0 = value,
            "permanent" => factors.permanent = value,
            "variable" => factors.variable = value,
            _ => factors.xi = value,
        }
    });
    factors
}

fn method(reader: &mut Reader, entry: &Entry, key: &'static Key) -> Given<Method> {
    let node = &entry.value;
    let Some(scalar) = reader.scalar(node, key) else {
        return Given::unreadable(node.span);
    };
    const METHODS: [Method; 3] = [Method::En1993, Method::Asce29, Method::As4100];
    if let Some(method) = METHODS
        .into_iter()
        .find(|method| same_word(method.edition(), &scalar.text))
    {
        return Given::new(method, node.span);
    }
    let editions = table::METHODS.join(", ");
    let text = format!(
        "the method `{}` is not supported; supported are {editions}. No member is verified until one of them is named",
        scalar.text
    );
    let mut slip = Slip::new(SlipKind::MethodNotSupported, node.span, text).at_key(key.name);
    if let (Some(near), false) = (
        nearest(&scalar.text, table::METHODS.iter().copied()),
        node.through_alias,
    ) {
        slip = slip.repair(format!("write `{near}`"), false, node.span, near);
    }
    reader.slips.push(slip);
    Given::unreadable(node.span)
}
