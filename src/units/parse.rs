//! Reading a quantity from the text of a scalar.

use std::fmt;

use super::table::{Dimension, UNITS, Unit, units_of};

/// Why a text is not a quantity of the kind that is wanted.
#[derive(Debug, Clone, PartialEq)]
pub enum QuantityError {
    /// The text does not begin with a number.
    NotANumber,
    /// A decimal comma; the text with a point instead is given.
    DecimalComma(String),
    /// The number is NaN, infinite or too large to hold.
    NotFinite,
    /// The unit is known but measures something else.
    WrongDimension {
        /// The unit as written.
        unit: String,
        /// What it measures.
        found: Dimension,
    },
    /// The unit is not known; the nearest of the wanted kind, if one is near.
    UnknownUnit {
        /// The unit as written.
        unit: String,
        /// A known unit that it may be meant for.
        nearest: Option<&'static str>,
    },
}

impl fmt::Display for QuantityError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NotANumber => write!(f, "not a number"),
            Self::DecimalComma(repaired) => write!(f, "a decimal comma; write `{repaired}`"),
            Self::NotFinite => write!(f, "not a finite number"),
            Self::WrongDimension { unit, found } => write!(f, "`{unit}` measures {}", found.noun()),
            Self::UnknownUnit {
                unit,
                nearest: Some(nearest),
            } => {
                write!(f, "the unit `{unit}` is not known; perhaps `{nearest}`")
            }
            Self::UnknownUnit { unit, nearest: None } => write!(f, "the unit `{unit}` is not known"),
        }
    }
}

/// Reads `text` as a quantity of the wanted `dimension`, in its base unit.
///
/// A bare number is taken in `bare`, the key's own unit (one of the spellings of the dimension); a unit in the text
/// wins. Fractions and mixed numbers are read (`3/4 in`, `1 1/2 in`), as are `20 mm`, `20mm` and `1.5e3 N`.
///
/// # Errors
/// [`QuantityError`] says what is wrong with the text. NaN and infinities are refused; bounds are not checked here.
pub fn parse_quantity(text: &str, dimension: Dimension, bare: &str) -> Result<f64, QuantityError> {
    let text = text.trim();
    let (number, rest) = split_number(text)?;
    let rest = rest.trim();
    if !number.is_finite() {
        return Err(QuantityError::NotFinite);
    }
    let unit = if rest.is_empty() {
        match find_unit(bare, dimension) {
            Some(unit) => unit,
            None => return Ok(number),
        }
    } else {
        match find_unit(rest, dimension) {
            Some(unit) => unit,
            None => return Err(unit_error(rest, dimension)),
        }
    };
    let value = number * unit.factor + unit.shift;
    if value.is_finite() {
        Ok(value)
    } else {
        Err(QuantityError::NotFinite)
    }
}

/// Reads a fire resistance period: any time, and `R 60`, `R60`, `R-60`, `REI 60`.
///
/// # Errors
/// As [`parse_quantity`].
pub fn parse_duration(text: &str) -> Result<f64, QuantityError> {
    let trimmed = text.trim();
    for prefix in ["REI", "R"] {
        if let Some(head) = trimmed.get(..prefix.len())
            && head.eq_ignore_ascii_case(prefix)
        {
            let rest = trimmed[prefix.len()..].trim_start_matches([' ', '-']);
            if rest.starts_with(|c: char| c.is_ascii_digit()) {
                return parse_quantity(rest, Dimension::Time, "min");
            }
        }
    }
    parse_quantity(trimmed, Dimension::Time, "min")
}

fn find_unit(text: &str, dimension: Dimension) -> Option<&'static Unit> {
    let same = |spelling: &str| spelling == text || squeeze(spelling) == squeeze(text);
    units_of(dimension)
        .find(|unit| unit.spellings.contains(&text))
        .or_else(|| units_of(dimension).find(|unit| unit.spellings.iter().any(|s| same(s))))
}

/// Spaces do not tell units apart (`kN m`, `W / mK`).
fn squeeze(text: &str) -> String {
    text.chars().filter(|c| !c.is_whitespace()).collect()
}

fn unit_error(text: &str, wanted: Dimension) -> QuantityError {
    if let Some(unit) = UNITS
        .iter()
        .find(|unit| unit.dimension != wanted && unit.spellings.iter().any(|s| squeeze(s) == squeeze(text)))
    {
        return QuantityError::WrongDimension {
            unit: text.to_owned(),
            found: unit.dimension,
        };
    }
    let lower = text.to_lowercase();
    let nearest = units_of(wanted)
        .flat_map(|unit| unit.spellings.iter().map(move |s| (unit, *s)))
        .map(|(unit, s)| (strsim::damerau_levenshtein(&lower, &s.to_lowercase()), unit))
        .min_by_key(|(distance, _)| *distance)
        .filter(|(distance, unit)| *distance <= 1.max(unit.spellings[0].chars().count() / 3))
        .map(|(_, unit)| unit.spellings[0]);
    QuantityError::UnknownUnit {
        unit: text.to_owned(),
        nearest,
    }
}

/// Splits a leading number (integer, decimal, exponent, fraction, mixed number) from what follows.
fn split_number(text: &str) -> Result<(f64, &str), QuantityError> {
    for word in [
        ".nan",
        "nan",
        ".inf",
        "-.inf",
        "+.inf",
        "inf",
        "-inf",
        "infinity",
        "+inf",
        "-infinity",
    ] {
        if text.eq_ignore_ascii_case(word) {
            return Err(QuantityError::NotFinite);
        }
    }
    let end = number_end(text);
    let number: f64 = text[..end].parse().map_err(|_| QuantityError::NotANumber)?;
    let rest = &text[end..];
    if let Some(after) = rest.strip_prefix(',') {
        let digits = after.bytes().take_while(u8::is_ascii_digit).count();
        if digits > 0 {
            return Err(QuantityError::DecimalComma(format!("{}.{after}", &text[..end])));
        }
    }
    if let Some(denominator) = rest.strip_prefix('/') {
        return fraction(0.0, number, denominator);
    }
    // A mixed number: `1 1/2 in` or `1-1/2 in`.
    let whole = text[..end].bytes().all(|b| b.is_ascii_digit());
    let after = rest.trim_start_matches([' ', '-']);
    let next = number_end(after);
    if whole
        && after.len() < rest.len()
        && next > 0
        && after[..next].bytes().all(|b| b.is_ascii_digit())
        && let Some(denominator) = after[next..].strip_prefix('/')
        && let Ok(numerator) = after[..next].parse()
    {
        return fraction(number, numerator, denominator);
    }
    Ok((number, rest))
}

fn fraction(whole: f64, numerator: f64, rest: &str) -> Result<(f64, &str), QuantityError> {
    let end = rest.bytes().take_while(u8::is_ascii_digit).count();
    let denominator: f64 = rest[..end].parse().map_err(|_| QuantityError::NotANumber)?;
    if denominator == 0.0 {
        return Err(QuantityError::NotFinite);
    }
    Ok((whole + numerator / denominator, &rest[end..]))
}

/// Length of the longest prefix that is a decimal number.
fn number_end(text: &str) -> usize {
    let bytes = text.as_bytes();
    let digits = |from: usize| bytes[from..].iter().take_while(|b| b.is_ascii_digit()).count();
    let mut at = usize::from(matches!(bytes.first(), Some(b'+' | b'-')));
    let start = at;
    at += digits(at);
    if bytes.get(at) == Some(&b'.') {
        let decimals = digits(at + 1);
        if decimals > 0 || at > start {
            at += 1 + decimals;
        }
    }
    if at == start || (at == start + 1 && bytes[start] == b'.') {
        return 0;
    }
    if matches!(bytes.get(at), Some(b'e' | b'E')) {
        let sign = usize::from(matches!(bytes.get(at + 1), Some(b'+' | b'-')));
        let exponent = digits(at + 1 + sign);
        if exponent > 0 {
            at += 1 + sign + exponent;
        }
    }
    at
}

#[cfg(test)]
mod tests {
    use super::*;

    fn length(text: &str) -> Result<f64, QuantityError> {
        parse_quantity(text, Dimension::Length, "mm")
    }

    #[test]
    fn reads_units_fractions_and_bare_numbers() {
        assert_eq!(length("20"), Ok(20.0));
        assert_eq!(length("20mm"), Ok(20.0));
        assert_eq!(length("7.5 m"), Ok(7500.0));
        assert!((length("3/4 in").unwrap() - 19.05).abs() < 1e-9);
        assert!((length("1 1/2 in").unwrap() - 38.1).abs() < 1e-9);
        assert_eq!(length("900 µm"), Ok(0.9));
        assert_eq!(parse_quantity("7.5", Dimension::Length, "m"), Ok(7500.0));
        assert_eq!(parse_quantity("45 kNm", Dimension::Moment, "kNm"), Ok(45.0));
        assert_eq!(parse_quantity("0.17 W/mK", Dimension::Conductivity, "W/mK"), Ok(0.17));
        assert_eq!(parse_quantity("65 %", Dimension::Ratio, ""), Ok(0.65));
        assert_eq!(parse_quantity("0.65", Dimension::Ratio, ""), Ok(0.65));
        let fahrenheit = parse_quantity("1000 °F", Dimension::Temperature, "°C").unwrap();
        assert!((fahrenheit - 537.777_777).abs() < 1e-5);
        let pcf = parse_quantity("14 lb/ft3", Dimension::Density, "kg/m3").unwrap();
        assert!((pcf - 224.258).abs() < 1e-3);
    }

    #[test]
    fn reads_periods() {
        for text in ["60", "60 min", "1 h", "R 60", "R60", "r60", "REI 60", "3600 s"] {
            assert_eq!(parse_duration(text), Ok(60.0), "{text}");
        }
        assert_eq!(parse_duration("1.5 h"), Ok(90.0));
    }

    #[test]
    fn refuses_what_is_no_quantity_of_the_kind() {
        assert_eq!(
            length("20 min"),
            Err(QuantityError::WrongDimension {
                unit: "min".into(),
                found: Dimension::Time
            })
        );
        assert_eq!(length("7,5"), Err(QuantityError::DecimalComma("7.5".into())));
        assert_eq!(length("7,5 mm"), Err(QuantityError::DecimalComma("7.5 mm".into())));
        assert_eq!(
            length("20 mmm"),
            Err(QuantityError::UnknownUnit {
                unit: "mmm".into(),
                nearest: Some("mm")
            })
        );
        assert_eq!(length(".nan"), Err(QuantityError::NotFinite));
        assert_eq!(length("1e999"), Err(QuantityError::NotFinite));
        assert_eq!(length("1/0"), Err(QuantityError::NotFinite));
        assert_eq!(length("thick"), Err(QuantityError::NotANumber));
        assert_eq!(length(""), Err(QuantityError::NotANumber));
    }
}
