//! Designations without the ways of writing them: case, spaces, `x`, `×` and `*`, decimal comma, fractions of an inch,
//! and the order of family and numbers.

use super::Finish;

/// Longer texts are no designation.
const LONGEST: usize = 64;

/// A designation taken apart.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Key {
    /// All letters, in their order: `heb` for `HE 240 B`.
    pub letters: String,
    /// All numbers, in their order.
    pub numbers: Vec<f64>,
    /// A finish named in the text.
    pub finish: Option<Finish>,
}

impl Key {
    /// Takes a text apart; none if it can't be a designation.
    pub fn of(text: &str) -> Option<Self> {
        if text.len() > LONGEST {
            return None;
        }
        let mut lower = if text.is_ascii() {
            text.to_ascii_lowercase()
        } else {
            text.to_lowercase()
        };
        let mut finish = named_finish(&mut lower);
        let chars: Vec<char> = lower.chars().collect();
        let mut letters = String::new();
        let mut numbers = Vec::new();
        let mut at = 0;
        while let Some(&c) = chars.get(at) {
            if let Some((value, next)) = number(&chars, at) {
                numbers.push(value);
                at = next;
                continue;
            }
            match c {
                '×' | '✕' | '*' => {}
                'x' if !numbers.is_empty() && leads_to_number(&chars, at + 1) => {}
                c if c.is_alphabetic() => {
                    let end = chars[at..].iter().take_while(|c| c.is_alphabetic()).count() + at;
                    // A cross that leads to a number ends the word: `ubx203` is none, `b x 8` is.
                    let word: String = chars[at..end].iter().collect();
                    if let Some((rest, named)) = finish_of(&word) {
                        finish = Some(named);
                        letters.push_str(rest);
                    } else {
                        letters.push_str(&word);
                    }
                    at = end;
                    continue;
                }
                ' ' | '\t' | '\u{a0}' | '-' | '–' | '_' | '(' | ')' | '/' | '.' | ',' => {}
                _ => return None,
            }
            at += 1;
        }
        Some(Self {
            letters,
            numbers,
            finish,
        })
    }

    /// The text by which rows are indexed.
    pub fn index(&self) -> String {
        self.index_as(&self.letters)
    }

    /// The same numbers under other letters.
    pub fn index_as(&self, letters: &str) -> String {
        use std::fmt::Write;
        let mut text = String::with_capacity(24);
        text.push_str(letters);
        for (n, number) in self.numbers.iter().enumerate() {
            text.push(if n == 0 { '|' } else { 'x' });
            // Thousandths tell all sizes apart and take 3/16 in for the 0.188 of the tables.
            let thousandths = (number * 1000.0).round_ties_even();
            if thousandths < 1e9 {
                // Written as whole numbers, which is many times quicker than as a decimal.
                let (whole, rest) = (thousandths as u32 / 1000, thousandths as u32 % 1000);
                let _ = write!(text, "{whole}");
                if rest > 0 {
                    let _ = write!(text, ".{rest:03}");
                    text.truncate(text.trim_end_matches('0').len());
                }
            } else {
                let _ = write!(text, "{number}");
            }
        }
        text
    }
}

/// Cuts the words of a finish or of its standard out of a text.
fn named_finish(text: &mut String) -> Option<Finish> {
    const WORDS: [(&str, Finish); 10] = [
        ("hot finished", Finish::HotFinished),
        ("hot-finished", Finish::HotFinished),
        ("en 10210-2", Finish::HotFinished),
        ("en 10210", Finish::HotFinished),
        ("en10210", Finish::HotFinished),
        ("cold formed", Finish::ColdFormed),
        ("cold-formed", Finish::ColdFormed),
        ("en 10219-2", Finish::ColdFormed),
        ("en 10219", Finish::ColdFormed),
        ("en10219", Finish::ColdFormed),
    ];
    if !(text.contains("hot") || text.contains("cold") || text.contains("en")) {
        return None;
    }
    let (word, finish) = WORDS.into_iter().find(|(word, _)| text.contains(word))?;
    *text = text.replace(word, " ");
    Some(finish)
}

/// `hf` and `cf`, alone or grown together with the family.
fn finish_of(word: &str) -> Option<(&str, Finish)> {
    for (mark, finish) in [("hf", Finish::HotFinished), ("cf", Finish::ColdFormed)] {
        for rest in [word.strip_prefix(mark), word.strip_suffix(mark)].into_iter().flatten() {
            if matches!(rest, "" | "shs" | "rhs" | "chs") {
                return Some((rest, finish));
            }
        }
    }
    None
}

fn leads_to_number(chars: &[char], mut at: usize) -> bool {
    while chars.get(at).is_some_and(|c| c.is_whitespace()) {
        at += 1;
    }
    number(chars, at).is_some()
}

/// A number at `at`, with its fraction: `8`, `.25`, `168,3`, `1/2`, `3-1/2`, `3 1/2`; and where it ends.
fn number(chars: &[char], at: usize) -> Option<(f64, usize)> {
    let (whole, mut end) = decimal(chars, at)?;
    if let Some((value, end)) = over(chars, whole, end) {
        return Some((value, end));
    }
    if matches!(chars.get(end), Some('-' | ' '))
        && whole.fract() == 0.0
        && let Some((top, next)) = decimal(chars, end + 1)
        && let Some((part, next)) = over(chars, top, next)
    {
        return Some((whole + part, next));
    }
    // `8.` is 8 and a full stop.
    if chars.get(end) == Some(&'.') {
        end += 1;
    }
    Some((whole, end))
}

/// The rest of a fraction after its numerator.
fn over(chars: &[char], top: f64, at: usize) -> Option<(f64, usize)> {
    if chars.get(at) != Some(&'/') {
        return None;
    }
    let (bottom, end) = decimal(chars, at + 1)?;
    (bottom > 0.0).then_some((top / bottom, end))
}

fn decimal(chars: &[char], at: usize) -> Option<(f64, usize)> {
    let digits = |from: usize| {
        chars[from.min(chars.len())..]
            .iter()
            .take_while(|c| c.is_ascii_digit())
            .count()
    };
    let mut end = at + digits(at);
    if matches!(chars.get(end), Some('.' | ',')) {
        let decimals = digits(end + 1);
        let leading_comma = end == at && chars[end] == ',';
        if decimals > 0 && !leading_comma {
            end += 1 + decimals;
        }
    }
    if end == at {
        return None;
    }
    let text: String = chars[at..end]
        .iter()
        .map(|c| if *c == ',' { '.' } else { *c })
        .collect();
    text.parse().ok().map(|value| (value, end))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[track_caller]
    fn index(text: &str, expect: &str) {
        assert_eq!(Key::of(text).unwrap().index(), expect, "{text}");
    }

    #[test]
    fn ways_of_writing_give_one_key() {
        for text in ["HE 240 B", "HEB240", "heb 240", "240 HEB", "HE-B 240", "he240b"] {
            index(text, "heb|240");
        }
        for text in ["W14X90", "w14 x 90", "W 14×90", "w14*90"] {
            index(text, "w|14x90");
        }
        for text in ["305x305x97 UC", "UC305x305x97", "UC 305 x 305 x 97"] {
            index(text, "uc|305x305x97");
        }
        index("CHS 168,3x10", "chs|168.3x10");
        index("CHS 168.3 × 10.0", "chs|168.3x10");
        index("530UB82.0", "ub|530x82");
        index("Pipe3XXS", "pipexxs|3");
    }

    #[test]
    fn fractions_of_an_inch() {
        index("L5X3-1/2X3/8", "l|5x3.5x0.375");
        index("L 5 x 3 1/2 x 3/8", "l|5x3.5x0.375");
        index("HSS13.375X0.188", "hss|13.375x0.188");
        index("HSS13.375x3/16", "hss|13.375x0.188");
        index("HSS4X4X.250", "hss|4x4x0.25");
        index("HSS4X4X1/4", "hss|4x4x0.25");
    }

    #[test]
    fn finishes() {
        for (text, finish) in [
            ("SHS HF 150x150x8", Finish::HotFinished),
            ("HFSHS 150x150x8", Finish::HotFinished),
            ("SHS 150x150x8 hot finished", Finish::HotFinished),
            ("SHS 150x150x8 EN 10219-2", Finish::ColdFormed),
            ("cf shs 150x150x8", Finish::ColdFormed),
        ] {
            let key = Key::of(text).unwrap();
            assert_eq!(
                (key.index().as_str(), key.finish),
                ("shs|150x150x8", Some(finish)),
                "{text}"
            );
        }
    }

    #[test]
    fn other_text_is_no_designation() {
        assert_eq!(Key::of("W14?90"), None);
        assert_eq!(Key::of(&"9".repeat(1000)), None);
        assert_eq!(Key::of("").unwrap().index(), "");
    }
}
