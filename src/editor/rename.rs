//! Another name for a mark, a group, a product or a fire, wherever the design says it.

use std::sync::Arc;

use rustc_hash::FxHashMap;

use crate::analysis::design::{Design, FileIndex};
use crate::design::keys::NameOf;
use crate::editor::names::{self, Occurrence, is_built_in};
use crate::editor::view::View;
use crate::findings::finding::{FixEdit, Place};
use crate::syntax::item::{Form, parse_item};
use crate::syntax::{Node, Style, Value};
use crate::text::Span;

/// The longest name, in bytes.
const LONGEST: usize = 200;

/// The characters that a rename at an offset would replace, and the name that they are now. `None` where no name
/// stands, or one that can't be changed there: a built-in fire, or one that stands there by an alias.
#[must_use]
pub fn prepare_rename(view: &View<'_>, offset: u32) -> Option<(Span, String)> {
    let asked = names::at(view, offset)?;
    let changeable = !is_built_in(asked.of, asked.name) && !asked.is_alias(view.text());
    changeable.then(|| (asked.span, asked.name.to_owned()))
}

/// The edits that call what the name at an offset names by a new name, in all files of the design, in their order.
///
/// # Errors
/// A sentence for the user, where nothing may be renamed: no name stands there, the new one is empty or taken, or a
/// place says the old one in a way that can't be replaced.
pub fn rename(view: &View<'_>, offset: u32, new_name: &str) -> Result<Vec<FixEdit>, String> {
    let Some(asked) = names::at(view, offset) else {
        return Err("there is no mark, group, product or fire here".to_owned());
    };
    edits(view.design, asked.of, asked.name, new_name)
}

/// The edits of one design. A library may serve several designs: what is renamed in one is to be renamed in each.
///
/// # Errors
/// A sentence for the user, as [`rename`].
pub fn edits(design: &Design, of: NameOf, old: &str, new_name: &str) -> Result<Vec<FixEdit>, String> {
    let new = new_name.trim();
    let noun = noun(of);
    if is_built_in(of, old) {
        return Err(format!("the fire `{old}` is built in and keeps its name"));
    }
    allowed(of, new)?;
    if new == old {
        return Ok(Vec::new());
    }
    let mut found: Vec<(FileIndex, Occurrence<'_>)> = Vec::new();
    let mut taken = is_built_in(of, new);
    names::each(design, |file, occurrence| {
        if occurrence.of == of {
            taken |= occurrence.name == new;
            if occurrence.name == old {
                found.push((file, occurrence));
            }
        }
    });
    if taken {
        return Err(format!("the {noun} `{new}` is in the design already"));
    }
    if found.iter().filter(|(_, occurrence)| occurrence.declares).count() > 1 {
        return Err(format!(
            "the {noun} `{old}` stands twice in the design, and which of the two is meant can't be told; change one of them by hand"
        ));
    }
    // The old name is written in few ways, each of which is judged once.
    let mut known: FxHashMap<&str, Option<String>> = FxHashMap::default();
    let edit = |(file, occurrence): (FileIndex, Occurrence<'_>)| {
        let source = &design.files[file];
        let text: &str = &source.text;
        if occurrence.is_alias(text) {
            let alias = occurrence.span.slice(text);
            return Err(format!(
                "the {noun} `{old}` also stands behind the alias `{alias}`, which a rename can't follow; write the name there first"
            ));
        }
        let before = occurrence.span.slice(text);
        let written = known.entry(before).or_insert_with(|| written(new, before, old));
        let Some(written) = written.clone() else {
            return Err(format!(
                "the {noun} `{old}` is not written as a word on one line; write it so first"
            ));
        };
        Ok(FixEdit {
            place: Place {
                path: Arc::clone(&source.path),
                span: occurrence.span,
            },
            text: written,
        })
    };
    found.into_iter().map(edit).collect()
}

const fn noun(of: NameOf) -> &'static str {
    match of {
        NameOf::Mark => "mark",
        NameOf::Group => "group",
        NameOf::Product => "product",
        _ => "fire",
    }
}

fn allowed(of: NameOf, new: &str) -> Result<(), String> {
    let noun = noun(of);
    if new.is_empty() {
        return Err(format!("the new name of the {noun} is empty"));
    }
    if new.len() > LONGEST {
        return Err(format!("the new name of the {noun} is longer than {LONGEST} bytes"));
    }
    if new
        .chars()
        .any(|c| c.is_control() || matches!(c, '\u{2028}' | '\u{2029}' | '\u{feff}'))
    {
        return Err(format!(
            "the new name of the {noun} holds a character that can't be seen"
        ));
    }
    if of == NameOf::Product && new.eq_ignore_ascii_case("none") {
        return Err("`none` means that a member has no protection; no product can be called so".to_owned());
    }
    Ok(())
}

/// A name as it is written instead of `before`, which says `old`: plain or in the quotes that stood there, where it then
/// still reads as the name. `None` where `before` is no scalar on one line.
fn written(new: &str, before: &str, old: &str) -> Option<String> {
    // An anchor or a tag before the name would go with it.
    if before.starts_with(['&', '!']) || reads_as(before)? != (old.to_owned(), style_of(before)) {
        return None;
    }
    let single = || format!("'{}'", new.replace('\'', "''"));
    let double = || format!("\"{}\"", new.replace('\\', "\\\\").replace('"', "\\\""));
    let first = match style_of(before) {
        Style::SingleQuoted => single(),
        Style::DoubleQuoted => double(),
        _ => new.to_owned(),
    };
    let says = |text: &String| reads_as(text).is_some_and(|(name, _)| name == new);
    [first, single(), double()].into_iter().find(says)
}

fn style_of(text: &str) -> Style {
    match text.chars().next() {
        Some('\'') => Style::SingleQuoted,
        Some('"') => Style::DoubleQuoted,
        _ => Style::Plain,
    }
}

/// What a text is read as, where it is one and the same scalar as an entry of a list in flow style, as a key in flow
/// style and as a key in block style: wherever a name may stand.
fn reads_as(text: &str) -> Option<(String, Style)> {
    let places = [
        format!("- [{text}]\n"),
        format!("- {{{text}: 1, a: {text}}}\n"),
        format!("- {text}: 1\n"),
    ];
    let mut answers = places.iter().map(|place| {
        let tree = parse_item(place, Form::Listed);
        if tree.broken || !tree.errors.is_empty() {
            return None;
        }
        scalar(&tree.root?)
    });
    let first = answers.next().flatten()?;
    answers.all(|other| other.as_ref() == Some(&first)).then_some(first)
}

/// The one scalar of a list of one, or of the first key of a mapping.
fn scalar(node: &Node) -> Option<(String, Style)> {
    let inner = match &node.value {
        Value::Sequence(nodes) if nodes.len() == 1 => nodes.first()?,
        Value::Mapping(entries) => &entries.first()?.key,
        _ => return None,
    };
    match &inner.value {
        Value::Scalar(scalar) => Some((scalar.text.clone(), scalar.style)),
        _ => None,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_name_keeps_its_quotes_and_gets_them_where_it_needs_them() {
        let plain = |new| written(new, "B1", "B1").unwrap();
        assert_eq!(plain("B2"), "B2");
        assert_eq!(plain("007"), "007");
        assert_eq!(plain("no"), "no");
        assert_eq!(plain("null"), "'null'");
        assert_eq!(plain("~"), "'~'");
        assert_eq!(plain("B: 2"), "'B: 2'");
        assert_eq!(plain("B, 2"), "'B, 2'");
        assert_eq!(plain("B #2"), "'B #2'");
        assert_eq!(plain("*B"), "'*B'");
        assert_eq!(plain("-"), "'-'");
        assert_eq!(plain("- B"), "'- B'");
        assert_eq!(plain("it's"), "it's");
        assert_eq!(plain("'it"), "'''it'");
        assert_eq!(plain("Träger ñ 梁"), "Träger ñ 梁");
        assert_eq!(written("B2", "'B1'", "B1").unwrap(), "'B2'");
        assert_eq!(written("B\"2\\", "\"B1\"", "B1").unwrap(), "\"B\\\"2\\\\\"");
    }

    #[test]
    fn what_is_no_scalar_on_one_line_is_left_alone() {
        assert_eq!(written("B2", "|\n  B1", "B1"), None);
        assert_eq!(written("B2", "&m B1", "B1"), None);
        assert_eq!(written("B2", "!!str B1", "B1"), None);
    }
}
