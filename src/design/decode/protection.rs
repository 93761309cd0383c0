//! Decoding a member's `protection`.

use crate::design::decode::member::is_none_word;
use crate::design::decode::reader::Reader;
use crate::design::given::Given;
use crate::design::keys::Key;
use crate::design::keys::member as table;
use crate::design::model::member::Protection;
use crate::syntax::{Node, Value};
use crate::text::Spanned;
use crate::units::Length;

/// `none`, a product's name, or a mapping.
pub fn protection(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Box<Protection>> {
    let mut protection = Protection::default();
    if is_none_word(node) {
        return Given::new(Box::new(protection), node.span);
    }
    match &node.value {
        Value::Scalar(name) => {
            protection.product = Some(Spanned {
                value: name.text.clone(),
                span: node.span,
            });
            return Given::new(Box::new(protection), node.span);
        }
        Value::Mapping(_) => {}
        _ => {
            reader.wrong_kind(node, key);
            return Given::unreadable(node.span);
        }
    }
    let before = reader.slips.len();
    reader.entries(node, table::PROTECTION, "`protection`", |reader, key, entry| {
        let value = &entry.value;
        match key.name {
            "product" => match reader.text(value, key) {
                Given::Value(_) if is_none_word(value) => {}
                Given::Value(name) => protection.product = Some(name),
                _ => protection.unreadable = true,
            },
            "form" => protection.boxed = reader.choice(value, key).map(|at| at == 1),
            "thickness" => protection.thickness = thickness(reader, value, key),
            "layers" => protection.layers = reader.whole(value, key),
            "dft" => protection.dft = reader.quantity(value, key).map(Length::from_mm),
            "reading" => protection.reading = reader.quantity(value, key).map(Length::from_mm),
            "primer" => protection.primer = reader.text(value, key).value().cloned(),
            "topcoat" => protection.topcoat = reader.text(value, key).value().cloned(),
            _ => protection.on_site = reader.choice(value, key).value().map(|at| *at == 1),
        }
    });
    reader.wanted(node, table::PROTECTION, "`protection`");
    protection.unreadable |= reader.slips.len() > before;
    Given::new(Box::new(protection), node.span)
}

fn thickness(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Vec<Length>> {
    let mut layers = Vec::new();
    for entry in reader.list(node) {
        match reader.quantity(entry, key).value() {
            Some(mm) => layers.push(Length::from_mm(*mm)),
            None => return Given::unreadable(node.span),
        }
    }
    if layers.is_empty() {
        reader.wrong_kind(node, key);
        return Given::unreadable(node.span);
    }
    Given::new(layers, node.span)
}
