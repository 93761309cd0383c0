//! How the items of a file lie in its lines.

use crate::text::Span;

/// A span of whole lines without the blank lines and comments at its end: those stand before the next item, which they
/// likely speak of.
#[must_use]
pub fn content(text: &str, span: Span) -> Span {
    let mut end = span.end as usize;
    while let Some(inside) = text.get(span.start as usize..end) {
        let line = inside.trim_end().rfind('\n').map_or(0, |at| at + 1);
        let last = inside[line..].trim();
        if line > 0 && (last.is_empty() || last.starts_with('#')) {
            end = span.start as usize + line;
            continue;
        }
        end = span.start as usize + inside.trim_end().len();
        break;
    }
    Span {
        start: span.start,
        end: Span::new(0, end).end,
    }
}

/// From the key of a list to the end of its last item; `first` and `last` are the spans of its items.
#[must_use]
pub fn list(text: &str, key: &str, first: Span, last: Span) -> (Span, Span) {
    let end = content(text, last).end;
    let before = text.get(..first.start as usize).unwrap_or("");
    let found = before.rmatch_indices(key).map(|(at, _)| at).find(|at| {
        let line = before[..*at].rfind('\n').map_or(0, |at| at + 1);
        // In block style it begins its line; the braces of a file in flow style may stand before it.
        let lead = before[line..*at].trim_matches(['"', '\'', ' ', '\t', '\u{feff}']);
        let rest = before[*at + key.len()..].trim_start_matches(['"', '\'', ' ', '\t']);
        rest.starts_with(':') && (lead.is_empty() || lead.ends_with(['{', ',']))
    });
    let key = match found {
        Some(at) => Span::new(at, at + key.len()),
        None => Span {
            start: first.start,
            end: first.start,
        },
    };
    (Span { start: key.start, end }, key)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn comments_and_blank_lines_at_the_end_belong_to_what_follows() {
        let text =
            "  - mark: B1\n    # about the section\n    section: IPE 300\n\n  # the next ones\n  - mark: B2\r\n\r\n";
        let end = text.find("  - mark: B2").unwrap();
        assert!(content(text, Span::new(0, end)).slice(text).ends_with("IPE 300"));
        assert!(content(text, Span::new(end, text.len())).slice(text).ends_with("B2"));
        assert_eq!(content("# x\n# y\n", Span::new(0, 8)).slice("# x\n# y\n"), "# x");
    }

    #[test]
    fn a_list_begins_at_its_key() {
        let text = "steelwork: 1\nmembers:   # all members\n  # members: of the first floor\n  - mark: B1\n";
        let item = Span::new(text.find("  - ").unwrap(), text.len());
        let (whole, key) = list(text, "members", item, item);
        assert!(whole.slice(text).ends_with("- mark: B1"));
        assert_eq!(key.slice(text), "members");
    }
}
