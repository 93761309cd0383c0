//! The slips of a person typing: decimal commas, missing colons, units of another kind.

use crate::design::keys::Key;
use crate::design::slip::{Slip, SlipKind};
use crate::syntax::{Entry, Node, Scalar, Style, Value};
use crate::text::Span;
use crate::units::QuantityError;

/// The slip of a text that is no quantity of the kind that is wanted.
pub(super) fn quantity_slip(
    error: &QuantityError,
    text: &str,
    node: &Node,
    wanted: &str,
    noun: &str,
    unit: &str,
) -> Slip {
    let span = node.span;
    let short: String = text.chars().take(40).collect();
    let slip = match error {
        QuantityError::NotANumber => Slip::new(
            SlipKind::WrongKind,
            span,
            format!("`{short}` is no number; {wanted} is wanted"),
        ),
        QuantityError::DecimalComma(repaired) => {
            let text = format!("`{short}` has a decimal comma; numbers take a point: `{repaired}`");
            let slip = Slip::new(SlipKind::WrongKind, span, text);
            return if node.through_alias {
                slip
            } else {
                slip.repair(format!("write `{repaired}`"), true, span, repaired)
            };
        }
        QuantityError::NotFinite => Slip::new(
            SlipKind::OutOfBounds,
            span,
            format!("`{short}` is no finite number; {wanted} is wanted"),
        ),
        QuantityError::WrongDimension { found, .. } => {
            let unit = if unit.is_empty() {
                String::new()
            } else {
                format!(", in {unit}")
            };
            Slip::new(
                SlipKind::WrongUnit,
                span,
                format!("`{short}` is {}; {noun} is wanted{unit}", found.noun()),
            )
        }
        QuantityError::UnknownUnit { unit: written, nearest } => {
            let near = nearest.map(|near| format!("; perhaps `{near}`")).unwrap_or_default();
            let slip = Slip::new(
                SlipKind::WrongUnit,
                span,
                format!("the unit of `{short}` is not known{near}; {wanted} is wanted"),
            );
            return match nearest {
                Some(near) if !node.through_alias => {
                    let repaired = text.replacen(written.as_str(), near, 1);
                    slip.repair(format!("write `{repaired}`"), false, span, repaired)
                }
                _ => slip,
            };
        }
    };
    // A unit of the wrong kind is most often a slip for the right one: offer the number in the key's own unit.
    if slip.kind == SlipKind::WrongUnit && !node.through_alias && !unit.is_empty() {
        let end = text
            .find(|c: char| !c.is_ascii_digit() && !matches!(c, '.' | '-' | '+' | ' '))
            .unwrap_or(text.len());
        let number = text[..end].trim();
        if number.parse::<f64>().is_ok() {
            let repaired = format!("{number} {unit}");
            return slip.repair(format!("write `{repaired}`"), false, span, repaired);
        }
    }
    slip
}

/// `{ thickness: 7,5 }` is read by YAML as two entries, `thickness: 7` and a key `5`: a decimal comma.
pub(super) fn decimal_comma(entries: &[Entry], at: usize, name: &Scalar) -> Option<Slip> {
    let entry = &entries[at];
    let before = &entries.get(at.checked_sub(1)?)?.value;
    let Value::Scalar(number) = &before.value else {
        return None;
    };
    let digits = |text: &str| !text.is_empty() && text.bytes().all(|b| b.is_ascii_digit());
    let fraction = name.text.split(' ').next().is_some_and(digits);
    let adjacent = entry.key.span.start == before.span.end + 1;
    if !matches!(entry.value.value, Value::Null) || !fraction || !digits(&number.text) || !adjacent {
        return None;
    }
    let span = Span {
        start: before.span.start,
        end: entry.key.span.end,
    };
    let repaired = format!("{}.{}", number.text, name.text);
    let text = format!(
        "`{},{}` has a decimal comma; numbers take a point: `{repaired}`",
        number.text, name.text
    );
    let slip = Slip::new(SlipKind::WrongKind, span, text);
    if entry.key.through_alias || number.style != Style::Plain {
        return Some(slip);
    }
    Some(slip.repair(format!("write `{repaired}`"), true, span, repaired))
}

/// `{ length 7.5 }` is read by YAML as a key `length 7.5` without a value: the colon is missing.
pub(super) fn missing_colon(entry: &Entry, name: &Scalar, table: &'static [Key]) -> Option<Slip> {
    if !matches!(entry.value.value, Value::Null) || name.style != Style::Plain {
        return None;
    }
    let key = table.iter().filter(|key| {
        name.text
            .strip_prefix(key.name)
            .is_some_and(|rest| rest.starts_with(' '))
    });
    let key = key.max_by_key(|key| key.name.len())?;
    let repaired = format!("{}: {}", key.name, name.text[key.name.len()..].trim_start());
    let text = format!("`{}` has no colon; write `{repaired}`", name.text);
    let slip = Slip::new(SlipKind::UnknownKey, entry.key.span, text).at_key(key.name);
    Some(if entry.key.through_alias {
        slip
    } else {
        slip.repair(format!("write `{repaired}`"), true, entry.key.span, repaired)
    })
}
