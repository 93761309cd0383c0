//! Designations as one types them.

use std::sync::OnceLock;

use super::find::{Lookup, LookupOptions, find, keys, other_name, row};
use super::key::Key;
use super::nearest::squeezed;
use super::{CatalogueRow, rows};

/// A row whose designation begins with what was typed.
#[derive(Debug, Clone)]
pub struct Begun {
    /// The row.
    pub row: &'static CatalogueRow,
    /// What is still to be typed of it, in the way of writing that was begun.
    pub rest: String,
}

/// Every row in the ways of writing that a typed text is compared with.
struct Forms(Vec<Vec<Box<str>>>);

impl Forms {
    fn of(rows: &[CatalogueRow]) -> Self {
        Self(rows.iter().map(forms).collect())
    }
}

fn forms(row: &CatalogueRow) -> Vec<Box<str>> {
    let mut forms = vec![squeezed(&row.designation).into_boxed_str()];
    let mut add = |form: String| {
        if !forms.iter().any(|known| **known == *form) {
            forms.push(form.into_boxed_str());
        }
    };
    for key in keys(row) {
        // Letters first, and numbers first.
        if let Some((letters, numbers)) = key.split_once('|') {
            add(format!("{letters}{numbers}"));
            add(format!("{numbers}{letters}"));
        }
    }
    forms
}

/// The rows whose designation begins with a text, however it is written, in the order of the tables; what is written to
/// its end comes first, then the family of the row `like`. Of the very same section in several tables the first is named. Left out are rows that their own
/// designation does not settle under `options`, and those of other tables or finishes than preferred where some of these
/// begin so. At most `most` rows, and whether there are more.
#[must_use]
pub fn beginning(text: &str, options: &LookupOptions, like: Option<&CatalogueRow>, most: usize) -> (Vec<Begun>, bool) {
    static FORMS: OnceLock<Forms> = OnceLock::new();
    let rows = rows();
    let forms = FORMS.get_or_init(|| Forms::of(rows));
    let typed = squeezed(text);
    let finish = Key::of(text).filter(|key| key.finish.is_some());
    let alias = alias(&typed);
    let begun = |n: usize| -> Option<Begun> {
        let row = &rows[n];
        let rest = |typed: &str| {
            let rests = forms.0[n].iter().filter_map(|form| form.strip_prefix(typed));
            rests.min_by_key(|rest| rest.len()).map(str::to_owned)
        };
        let named = || {
            let key = finish.as_ref()?;
            (row.finish == key.finish).then(|| rest(&key.index().replace('|', "")))?
        };
        let rest = rest(&typed)
            .or_else(named)
            .or_else(|| alias.as_deref().and_then(rest))?;
        Some(Begun { row, rest })
    };
    let mut found: Vec<Begun> = (0..rows.len()).filter_map(begun).collect();
    if let Some(tables) = &options.tables {
        prefer(&mut found, |row| tables.contains(&row.table));
    }
    if let Some(hollow) = options.hollow {
        prefer(&mut found, |row| row.finish.is_none_or(|own| own == hollow));
    }
    let family = |row: &CatalogueRow| like.is_some_and(|like| (row.table, &row.family) == (like.table, &like.family));
    found.sort_by_key(|begun| (!begun.rest.is_empty(), !family(begun.row)));
    let mut named: Vec<Begun> = Vec::new();
    for begun in found {
        // What the designation means must be the row, or one alike that was named before.
        let meant = super::row(&begun.row.designation, options);
        let alike = |known: &Begun| known.row.shape == begun.row.shape && known.row.family == begun.row.family;
        if meant.is_none_or(|meant| meant.shape != begun.row.shape) || named.iter().any(alike) {
            continue;
        }
        if named.len() == most {
            return (named, true);
        }
        named.push(begun);
    }
    (named, false)
}

/// The rows whose designation is most like a text that begins none, each settled by its own designation.
#[must_use]
pub fn alike(text: &str, options: &LookupOptions) -> Vec<&'static CatalogueRow> {
    match find(text, options) {
        Lookup::Unknown { nearest } => nearest
            .into_iter()
            .filter(|near| row(&near.designation, options).is_some())
            .collect(),
        Lookup::Found(_) | Lookup::Ambiguous(_) => Vec::new(),
    }
}

/// The text under the name that the tables use for its family.
fn alias(typed: &str) -> Option<String> {
    let digits = typed.find(|c: char| c.is_ascii_digit()).unwrap_or(typed.len());
    let (letters, numbers) = typed.split_at(digits);
    let count = numbers.split('x').count();
    Some(format!("{}{numbers}", other_name(letters, count)?))
}

fn prefer(found: &mut Vec<Begun>, wanted: impl Fn(&CatalogueRow) -> bool) {
    if found.iter().any(|begun| wanted(begun.row)) {
        found.retain(|begun| wanted(begun.row));
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn names(text: &str) -> Vec<String> {
        let (found, _) = beginning(text, &LookupOptions::default(), None, 20);
        found.iter().map(|begun| begun.row.designation.to_string()).collect()
    }

    #[test]
    fn a_designation_is_found_by_any_beginning_of_any_way_of_writing_it() {
        for text in ["heb24", "HE B 24", "he-b 240", "240heb", "HE 240 B", "he240b"] {
            assert_eq!(names(text)[0], "HE 240 B", "{text}");
        }
        assert!(names("ipe 30").contains(&"IPE 300".to_owned()));
        assert_eq!(names("IPE 80")[0], "IPE 80");
        assert_eq!(names("unp 20")[0], "UPN 200");
        assert!(names("203x203x60").iter().any(|name| name == "UC 203x203x60"));
        let hot = names("hf shs 150x150x8");
        assert!(
            !hot.is_empty() && hot.iter().all(|name| name.starts_with("SHS HF 150x150x8")),
            "{hot:?}"
        );
        assert!(names("brick").is_empty());
    }

    #[test]
    fn the_rest_completes_what_was_typed() {
        let (found, _) = beginning("heb24", &LookupOptions::default(), None, 5);
        assert_eq!(found[0].rest, "0");
        let (found, more) = beginning("", &LookupOptions::default(), None, 100);
        assert!(more && found.len() == 100);
    }

    #[test]
    fn a_misspelt_one_has_its_like() {
        let near = alike("IPEE 300", &LookupOptions::default());
        assert!(near.iter().any(|row| &*row.designation == "IPE 300"));
        assert!(alike("IPE 300", &LookupOptions::default()).is_empty());
    }
}
