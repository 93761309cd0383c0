//! What the command line writes, and where. Standard output carries results only.

use std::io::{ErrorKind, Write};
use std::path::Path;

/// Writes a result. A reader that has gone away is no failure.
///
/// # Errors
/// In words, where the file or the stream can't be written.
pub fn result(out: Option<&Path>, text: &str) -> Result<(), String> {
    if let Some(path) = out {
        return std::fs::write(path, text).map_err(|error| format!("{} can't be written: {error}", path.display()));
    }
    let mut stream = std::io::stdout().lock();
    match stream.write_all(text.as_bytes()).and_then(|()| stream.flush()) {
        Err(error) if error.kind() != ErrorKind::BrokenPipe => {
            Err(format!("standard output can't be written: {error}"))
        }
        _ => Ok(()),
    }
}

/// A notice on standard error; where nobody listens nothing is lost.
pub fn notice(text: &str) {
    let _ = writeln!(std::io::stderr().lock(), "scorchline: {}", plain(text));
}

/// Text for a terminal. Characters that steer a terminal or turn the reading direction are shown as pictures, for what
/// is quoted from a file must not act on the screen.
pub fn plain(text: &str) -> String {
    text.chars().map(picture).collect()
}

/// The picture of a character that steers; any other as it is.
pub fn picture(c: char) -> char {
    match c {
        '\n' | '\t' => c,
        '\u{0}'..='\u{1F}' => char::from_u32(0x2400 + u32::from(c)).unwrap_or('\u{FFFD}'),
        '\u{7F}' => '\u{2421}',
        '\u{80}'..='\u{9F}' | '\u{2028}' | '\u{2029}' => '\u{FFFD}',
        '\u{200E}' | '\u{200F}' | '\u{202A}'..='\u{202E}' | '\u{2066}'..='\u{2069}' => '\u{FFFD}',
        _ => c,
    }
}

/// Characters of a message that are shown; a message may quote a value of any length.
const LONGEST: usize = 1000;

/// A message for a terminal, cut where nobody would read on.
pub fn message(text: &str) -> String {
    let mut out: String = text.chars().take(LONGEST).map(picture).collect();
    if text.chars().nth(LONGEST).is_some() {
        out.push('…');
    }
    out
}

#[cfg(test)]
mod tests {
    use super::{LONGEST, message, plain};

    #[test]
    fn a_long_message_is_cut() {
        assert_eq!(message("short\u{7}"), "short␇");
        assert_eq!(message(&"x".repeat(LONGEST)).chars().count(), LONGEST);
        assert_eq!(message(&"x".repeat(5 * LONGEST)), "x".repeat(LONGEST) + "…");
    }

    #[test]
    fn what_steers_a_terminal_is_shown() {
        assert_eq!(plain("B1\u{1b}[2J\u{202e}\u{7f}\u{9b}\r\n梁"), "B1␛[2J�␡�␍\n梁");
    }
}
