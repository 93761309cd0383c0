//! Regular expressions of quantities, in the dialect that JSON Schema recommends (ECMA-262).

use crate::units::{Dimension, units_of};

/// A decimal number, a fraction or a mixed number.
const NUMBER: &str =
    r"[-+]?([0-9]+(\.[0-9]*)?|\.[0-9]+)([eE][-+]?[0-9]+)?|[0-9]+(\.[0-9]+)?/[0-9]+|[0-9]+[ -]+[0-9]+/[0-9]+";

/// What a text of this dimension looks like: a number, then perhaps one of the units that measure it.
pub fn quantity_pattern(dimension: Dimension) -> String {
    let units = units(dimension);
    if units.is_empty() {
        return format!("^ *({NUMBER}) *$");
    }
    format!("^ *({NUMBER}) *({units})? *$")
}

/// What a fire resistance period looks like: a time, or a classification such as `R 60`.
pub fn period_pattern() -> String {
    let units = units(Dimension::Time);
    format!("^ *(([Rr]([Ee][Ii])?[ -]*)?[0-9]+(\\.[0-9]*)?|{NUMBER}) *({units})? *$")
}

/// The spellings of the units of a dimension, each also without its spaces, as alternatives.
fn units(dimension: Dimension) -> String {
    let mut spellings: Vec<String> = Vec::new();
    for spelling in units_of(dimension).flat_map(|unit| unit.spellings) {
        for text in [(*spelling).to_owned(), spelling.replace(' ', "")] {
            let text = escaped(&text);
            if !spellings.contains(&text) {
                spellings.push(text);
            }
        }
    }
    spellings.join("|")
}

/// A text as a pattern of itself.
fn escaped(text: &str) -> String {
    let mut pattern = String::new();
    for c in text.chars() {
        if "^$\\.*+?()[]{}|/".contains(c) {
            pattern.push('\\');
        }
        pattern.push(c);
    }
    pattern
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn texts_stand_for_themselves() {
        assert_eq!(escaped("W/(m K)"), r"W\/\(m K\)");
        assert_eq!(units(Dimension::Temperature), "°C|C|degC|℃|°F|F|degF|℉|K");
        assert!(units(Dimension::Moment).starts_with(r"kNm|kN m|kN·m|kN\*m"));
    }
}
