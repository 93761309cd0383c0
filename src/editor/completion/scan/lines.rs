//! Lines, keys and scalars of half-typed text.

/// Where the line at an offset ends, and where the next one begins.
pub(super) fn line_at(text: &str, at: usize) -> (usize, usize) {
    let end = text[at..].find('\n').map_or(text.len(), |n| at + n);
    let next = (end + 1).min(text.len());
    let end = if text[at..end].ends_with('\r') { end - 1 } else { end };
    (end, next)
}

pub(super) fn line_start(text: &str, at: usize) -> usize {
    text[..at].rfind('\n').map_or(0, |n| n + 1)
}

/// The indentation of the next line that holds something.
pub(super) fn indent_after(text: &str, mut at: usize) -> Option<usize> {
    while at < text.len() {
        let (end, next) = line_at(text, at);
        let rest = text[at..end].trim_start_matches(' ');
        if !rest.trim().is_empty() && !rest.starts_with('#') {
            return Some(end - at - rest.len());
        }
        at = next;
    }
    None
}

/// Whether the lines from an offset on are the value of a key at a column.
pub(super) fn holds_below(text: &str, mut at: usize, column: usize) -> bool {
    while at < text.len() {
        let (end, next) = line_at(text, at);
        let rest = text[at..end].trim_start_matches(' ');
        if !rest.trim().is_empty() && !rest.starts_with('#') {
            let indent = end - at - rest.len();
            return indent > column || indent == column && is_dash(rest);
        }
        at = next;
    }
    false
}

pub(super) fn is_dash(text: &str) -> bool {
    text.strip_prefix('-')
        .is_some_and(|rest| rest.is_empty() || rest.starts_with([' ', '\t']))
}

/// Where a key at `pos` ends and where its colon stands, if the line has one. A colon that was just typed counts.
pub(super) fn key_at(text: &str, pos: usize, end: usize, cursor: usize) -> Option<(usize, usize)> {
    let bytes = text.as_bytes();
    if matches!(bytes.get(pos), Some(b'"' | b'\'')) {
        let close = quoted_end(text, pos, end, 0).filter(|close| *close <= end)?;
        let rest = &text[close..end];
        let colon = close + (rest.len() - rest.trim_start().len());
        return (bytes.get(colon) == Some(&b':')).then_some((close, colon));
    }
    for at in pos..end {
        match bytes[at] {
            b'#' if at > pos && bytes[at - 1] == b' ' => return None,
            b':' if at > pos && (at + 1 == end || at + 1 == cursor || matches!(bytes[at + 1], b' ' | b'\t')) => {
                let to = pos + text[pos..at].trim_end().len();
                return Some((to, at));
            }
            _ => {}
        }
    }
    None
}

/// Where a plain scalar on a line ends: before a comment, spaces left out.
pub(super) fn plain_end(text: &str, pos: usize, end: usize) -> usize {
    let content = &text[pos..end];
    let comment = content.find(" #").unwrap_or(content.len());
    pos + content[..comment].trim_end().len()
}

/// Where a scalar in quotes at `pos` ends, behind its quote, perhaps some lines down; the end of the line where it is not
/// closed. `None` where no quote stands at `pos`.
pub(super) fn quoted_end(text: &str, pos: usize, end: usize, column: usize) -> Option<usize> {
    let bytes = text.as_bytes();
    let quote = *bytes.get(pos).filter(|byte| matches!(byte, b'"' | b'\''))?;
    let mut at = pos + 1;
    while at < bytes.len() {
        match bytes[at] {
            b'\\' if quote == b'"' => at += 1,
            // A line that is not indented deeper has nothing to do with it.
            b'\n' if indent_after(text, at + 1).is_none_or(|indent| indent <= column) => return Some(end),
            byte if byte == quote && quote == b'\'' && bytes.get(at + 1) == Some(&quote) => at += 1,
            byte if byte == quote => return Some(at + 1),
            _ => {}
        }
        at += 1;
    }
    Some(end)
}

/// A scalar without its quotes.
pub(super) fn unquoted(text: &str) -> String {
    let text = text.trim();
    let inner = |quote: char| text.strip_prefix(quote).and_then(|text| text.strip_suffix(quote));
    match (inner('\''), inner('"')) {
        (Some(inner), _) => inner.replace("''", "'"),
        (_, Some(inner)) => inner.replace("\\\"", "\"").replace("\\\\", "\\"),
        _ => text.to_owned(),
    }
}
