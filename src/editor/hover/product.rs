//! What is known of a product.

use super::escaped;
use crate::design::model::library::NamedProduct;
use crate::editor::view::View;
use crate::protection::product::{Kind, Product};
use crate::units::{DisplayUnits, Length};

/// The product of an index in the file.
pub fn described(view: &View<'_>, index: usize) -> String {
    let named = view.source().products[index].value();
    of(named, view.design.units())
}

/// A product: its kind, the range that it is assessed for, and the evidence.
pub fn of(named: &NamedProduct, units: DisplayUnits) -> String {
    let name = escaped(&named.name.value);
    let Some(product) = &named.product else {
        return format!("**{name}**\n\n- its entry can't be read: nothing is verified with it");
    };
    let mut facts = range(product, units);
    if facts.is_empty() {
        facts.push("no range of assessment is stated: nothing is verified with it".to_owned());
    }
    let fires: Vec<&str> = named.fires.iter().map(|fire| fire.value.as_str()).collect();
    let fires = if fires.is_empty() {
        "standard".to_owned()
    } else {
        fires.join(", ")
    };
    facts.push(format!("fires: {}", escaped(&fires)));
    let evidence = &named.evidence;
    let expires = evidence.expires.as_ref().map(|date| format!("until {}", date.value));
    let report = evidence.report.as_ref().map(|report| escaped(report));
    let evidence: Vec<String> = [report, expires].into_iter().flatten().collect();
    if evidence.is_empty() {
        facts.push("no evidence is named".to_owned());
    } else {
        facts.push(format!("evidence: {}", evidence.join(", ")));
    }
    let facts: Vec<String> = facts.into_iter().map(|fact| format!("- {fact}")).collect();
    format!("**{name}**, {}\n\n{}", product.kind.word(), facts.join("\n"))
}

fn range(product: &Product, units: DisplayUnits) -> Vec<String> {
    let assessed = &product.assessed;
    let shown = |value: Length| {
        if product.kind == Kind::Coating {
            units.film(value)
        } else {
            units.thickness(value)
        }
    };
    let between = |name: &str, from: String, to: String| format!("{name}: {from} to {to}");
    let mut facts = Vec::new();
    if let Some((from, to)) = assessed.factor {
        facts.push(between(
            "section factor",
            units.section_factor(from),
            units.section_factor(to),
        ));
    }
    if let Some((from, to)) = assessed.thickness {
        let name = if product.kind == Kind::Coating {
            "dry film"
        } else {
            "thickness"
        };
        facts.push(between(name, shown(from), shown(to)));
    }
    if let Some((from, to)) = assessed.temperature {
        facts.push(between(
            "steel temperature",
            units.temperature(from),
            units.temperature(to),
        ));
    }
    if let Some((from, to)) = assessed.period {
        facts.push(between(
            "period",
            format!("{:.0}", from.min()),
            format!("{:.0} min", to.min()),
        ));
    }
    if !product.stock.is_empty() {
        let stock: Vec<String> = product.stock.iter().map(|layer| shown(*layer)).collect();
        facts.push(format!("stock: {}", stock.join(", ")));
    }
    facts
}
