//! Writing a key into a member that does not state it, in the style that the member is written in.

use crate::analysis::design::{Design, MemberAt};
use crate::design::model::member::Protection;
use crate::text::Span;
use crate::units::{Length, significant};

/// Where in the file, and what, is written so that a member states `key: value` itself: after its mark, in flow style in
/// a flow mapping and on a line of its own in a block. `None` where the member has no mark of its own to go by, or stands
/// there by an alias.
pub fn key(design: &Design, at: MemberAt, key: &str, value: &str) -> Option<(Span, String)> {
    let text: &str = &design.files[at.file].text;
    let item = design.member(at);
    let member = item.value();
    let extent = item.place(member.extent.0);
    let mark = item.place(member.mark.span()?);
    let inside = extent.start <= mark.start && mark.end <= extent.end;
    if member.broken || !inside || through_alias(text, extent) || through_alias(text, mark) {
        return None;
    }
    let empty_at = |at: u32| Span { start: at, end: at };
    if extent.slice(text).starts_with('{') {
        return Some((empty_at(mark.end), format!(", {key}: {value}")));
    }
    let line = text[..mark.start as usize].rfind('\n').map_or(0, |at| at + 1);
    let before = &text[line..mark.start as usize];
    let name = before.trim_end().strip_suffix(':')?.trim_end();
    // The key stands after indentation and dashes only; its column is that of all the member's keys.
    let start = name
        .rfind(|c: char| c.is_whitespace() || c == '-')
        .map_or(0, |at| at + 1);
    if name[..start].contains(|c: char| !c.is_whitespace() && c != '-') || name[..start].contains('\t') {
        return None;
    }
    let end = text[mark.end as usize..]
        .find('\n')
        .map_or(text.len(), |at| mark.end as usize + at);
    let rest = text[mark.end as usize..end].trim_start();
    if !rest.is_empty() && !rest.starts_with('#') {
        return None;
    }
    let (end, line_break) = if text[..end].ends_with('\r') {
        (end - 1, "\r\n")
    } else {
        (end, "\n")
    };
    let indent = " ".repeat(name[..start].chars().count());
    Some((
        empty_at(u32::try_from(end).ok()?),
        format!("{line_break}{indent}{key}: {value}"),
    ))
}

/// All that is stated of a protection in one mapping, with some keys changed: a mapping is inherited whole, so that one
/// which overrides it must say the rest as well. `None` of a bare member.
pub fn protection(stated: &Protection, changed: &[(&str, &str)]) -> Option<String> {
    let mm = |layers: &Vec<Length>| build_up(layers, |layer| significant(layer.mm(), 6));
    let um = |film: &Length| significant(film.um(), 6);
    let form = |boxed: &bool| if *boxed { "box" } else { "profile" }.to_owned();
    let applied = |site| if site { "site" } else { "shop" }.to_owned();
    let keys = [
        ("product", Some(scalar(&stated.product.as_ref()?.value))),
        ("form", stated.boxed.value().map(form)),
        ("thickness", stated.thickness.value().map(mm)),
        ("layers", stated.layers.value().map(u32::to_string)),
        ("dft", stated.dft.value().map(um)),
        ("reading", stated.reading.value().map(um)),
        ("primer", stated.primer.as_deref().map(scalar)),
        ("topcoat", stated.topcoat.as_deref().map(scalar)),
        ("applied", stated.on_site.map(applied)),
    ];
    let written = keys.into_iter().filter_map(|(key, stated)| {
        let new = changed.iter().find(|(name, _)| *name == key);
        let value = new.map(|(_, value)| (*value).to_owned()).or(stated)?;
        Some(format!("{key}: {value}"))
    });
    Some(format!("{{ {} }}", written.collect::<Vec<_>>().join(", ")))
}

/// The layers of a build-up: one thickness, or a list of several.
pub fn build_up(layers: &[Length], each: impl Fn(&Length) -> String) -> String {
    match layers {
        [layer] => each(layer),
        layers => format!("[{}]", layers.iter().map(each).collect::<Vec<_>>().join(", ")),
    }
}

/// Whether a value stands in the file by an alias only: what is written there would not be the value.
pub fn through_alias(text: &str, span: Span) -> bool {
    span.slice(text).starts_with('*')
}

/// A name as a plain scalar, or in quotes where YAML would take it for something else.
pub fn scalar(name: &str) -> String {
    let plain = name.starts_with(|c: char| c.is_alphabetic())
        && !name.ends_with(' ')
        && name
            .chars()
            .all(|c| c.is_alphanumeric() || matches!(c, ' ' | '_' | '.' | '/' | '-'))
        && !matches!(
            name.to_ascii_lowercase().as_str(),
            "null" | "true" | "false" | "yes" | "no" | "on" | "off" | "y" | "n"
        );
    if plain {
        return name.to_owned();
    }
    format!("'{}'", name.replace('\'', "''"))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_are_quoted_where_yaml_would_misread_them() {
        assert_eq!(scalar("grey board"), "grey board");
        assert_eq!(scalar("board: grey"), "'board: grey'");
        assert_eq!(scalar("1E2"), "'1E2'");
        assert_eq!(scalar("null"), "'null'");
        assert_eq!(scalar("No"), "'No'");
        assert_eq!(scalar("it's"), "'it''s'");
    }
}
