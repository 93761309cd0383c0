//! The one table of keys: every key of both file kinds with its kind, unit, bounds and meaning.
//!
//! The decoder, the published schemas, completion and the documentation all read this table, so that none can know a
//! key that another does not.

pub mod member;
pub mod protection;
pub mod section;
pub mod steelwork;

use crate::units::Dimension;

/// A key that a mapping may carry.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Key {
    /// As it is written in the file.
    pub name: &'static str,
    /// What its value may be.
    pub kind: Kind,
    /// Whether the mapping is incomplete without it (for member keys: after inheritance).
    pub required: bool,
    /// What it means, in a sentence.
    pub doc: &'static str,
}

/// A number with a unit: what it is called, its dimension, the unit of a bare number, and its physical bounds.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Measure {
    /// With its article, for messages: "a thickness".
    pub noun: &'static str,
    /// The kind of quantity.
    pub dimension: Dimension,
    /// The unit that a bare number is in.
    pub unit: &'static str,
    /// The least value allowed, in `unit`.
    pub min: f64,
    /// The greatest value allowed, in `unit`.
    pub max: f64,
}

/// What a value may be.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Kind {
    /// Text, kept as it is written.
    Text,
    /// A mark, or the name of a group, product or fire, kept as it is written.
    Name(NameOf),
    /// A section designation.
    Designation,
    /// A quantity.
    Number(Measure),
    /// A whole number between two bounds.
    Whole(u32, u32),
    /// A fire resistance period.
    Period,
    /// A date, `2027-06-30`.
    Date,
    /// yes or no, true or false.
    YesNo,
    /// One of these words.
    Choice(&'static [&'static str]),
    /// A list of one kind of value; a single value stands for a list of one.
    List(&'static Kind),
    /// A list of exactly this many values.
    Tuple(&'static Kind, usize),
    /// A mapping with these keys.
    Map(&'static [Key]),
    /// A mapping from names of the user's choice.
    Named(&'static Kind),
    /// A mapping from numbers (of the measure) to a value.
    Numbered(Measure, &'static Kind),
    /// `~`: left blank on purpose.
    Blank,
    /// Any one of these.
    OneOf(&'static [Kind]),
}

/// What a name refers to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum NameOf {
    /// A member's mark.
    Mark,
    /// A group.
    Group,
    /// A protection product.
    Product,
    /// A fire.
    Fire,
    /// A finding, in a departure.
    Finding,
    /// A file, by a path relative to the file that names it.
    File,
}

/// A key that may be left out.
const fn key(name: &'static str, kind: Kind, doc: &'static str) -> Key {
    Key {
        name,
        kind,
        required: false,
        doc,
    }
}

/// A key that the mapping is incomplete without.
const fn required(name: &'static str, kind: Kind, doc: &'static str) -> Key {
    Key {
        name,
        kind,
        required: true,
        doc,
    }
}

const fn measure(noun: &'static str, dimension: Dimension, unit: &'static str, min: f64, max: f64) -> Measure {
    Measure {
        noun,
        dimension,
        unit,
        min,
        max,
    }
}

const fn number(noun: &'static str, dimension: Dimension, unit: &'static str, min: f64, max: f64) -> Kind {
    Kind::Number(measure(noun, dimension, unit, min, max))
}

/// A plain number between two bounds.
const fn plain(noun: &'static str, min: f64, max: f64) -> Kind {
    number(noun, Dimension::Number, "", min, max)
}

/// A dimension of a section in mm.
const fn size(noun: &'static str) -> Kind {
    number(noun, Dimension::Length, "mm", 0.1, 10_000.0)
}

/// A steel or gas temperature in °C.
const fn temperature(noun: &'static str, min: f64, max: f64) -> Kind {
    number(noun, Dimension::Temperature, "°C", min, max)
}

impl Key {
    /// The key called `name` in a table.
    #[must_use]
    pub fn find(table: &'static [Key], name: &str) -> Option<&'static Key> {
        table.iter().find(|key| key.name == name)
    }

    /// The key of a table whose name is nearest to `name` in spelling, if one is near enough to be meant.
    #[must_use]
    pub fn nearest(table: &'static [Key], name: &str) -> Option<&'static str> {
        nearest(name, table.iter().map(|key| key.name))
    }
}

impl Kind {
    /// The mapping's keys, where the kind is a mapping or may be one.
    #[must_use]
    pub fn map(&self) -> Option<&'static [Key]> {
        match self {
            Self::Map(keys) => Some(keys),
            Self::OneOf(kinds) => kinds.iter().find_map(Self::map),
            Self::List(kind) | Self::Named(kind) => kind.map(),
            _ => None,
        }
    }

    /// The measure, where the kind is a number or may be one.
    #[must_use]
    pub fn measure(&self) -> Option<Measure> {
        match self {
            Self::Number(measure) => Some(*measure),
            Self::OneOf(kinds) => kinds.iter().find_map(Self::measure),
            Self::List(kind) | Self::Tuple(kind, _) => kind.measure(),
            _ => None,
        }
    }

    /// The words, where the kind is a choice or may be one.
    #[must_use]
    pub fn choices(&self) -> &'static [&'static str] {
        match self {
            Self::Choice(words) => words,
            Self::OneOf(kinds) => kinds.iter().map(Self::choices).find(|c| !c.is_empty()).unwrap_or(&[]),
            Self::List(kind) => kind.choices(),
            _ => &[],
        }
    }

    /// What is wanted, in words for a message: "a thickness in mm", "one of plain, galvanised", "a mapping".
    #[must_use]
    pub fn wanted(&self) -> String {
        match self {
            Self::Text => "text".to_owned(),
            Self::Name(NameOf::Mark) => "a member's mark".to_owned(),
            Self::Name(NameOf::Group) => "the name of a group".to_owned(),
            Self::Name(NameOf::Product) => "the name of a product".to_owned(),
            Self::Name(NameOf::Fire) => "the name of a fire".to_owned(),
            Self::Name(NameOf::Finding) => "the name of a finding".to_owned(),
            Self::Name(NameOf::File) => "a relative path".to_owned(),
            Self::Designation => "a section designation".to_owned(),
            Self::Number(measure) if measure.unit.is_empty() => measure.noun.to_owned(),
            Self::Number(measure) => format!("{} in {}", measure.noun, measure.unit),
            Self::Whole(min, max) => format!("a whole number from {min} to {max}"),
            Self::Period => "a period in min (`60`, `R 60` or `1.5 h`)".to_owned(),
            Self::Date => "a date such as 2027-06-30".to_owned(),
            Self::YesNo => "yes or no".to_owned(),
            Self::Choice(words) if words.len() == 1 => words[0].to_owned(),
            Self::Choice(words) => format!("one of {}", words.join(", ")),
            Self::List(kind) => format!("a list; each entry {}", kind.wanted()),
            Self::Tuple(kind, n) => format!("a list of {n}; each entry {}", kind.wanted()),
            Self::Map(keys) => {
                let names: Vec<&str> = keys.iter().take(4).map(|k| k.name).collect();
                let more = if keys.len() > 4 { ", .." } else { "" };
                format!("a mapping {{{}{more}}}", names.join(", "))
            }
            Self::Named(_) => "a mapping from names".to_owned(),
            Self::Numbered(..) => "a mapping from numbers".to_owned(),
            Self::Blank => "~".to_owned(),
            Self::OneOf(kinds) => {
                let words: Vec<String> = kinds.iter().filter(|k| **k != Kind::Blank).map(Self::wanted).collect();
                words.join(", or ")
            }
        }
    }
}

/// The candidate nearest in spelling to `word`, without regard to case, if it is near enough to be what was meant: at
/// most one slip in three letters.
pub fn nearest<'a>(word: &str, candidates: impl IntoIterator<Item = &'a str>) -> Option<&'a str> {
    let word = word.to_lowercase();
    let length = word.chars().count();
    let allowed = |candidate: &str| candidate.chars().count().max(3) / 3;
    candidates
        .into_iter()
        // Words that differ by more letters than are allowed needn't be compared.
        .filter(|candidate| length.abs_diff(candidate.chars().count()) <= allowed(candidate))
        .map(|candidate| (strsim::damerau_levenshtein(&word, &candidate.to_lowercase()), candidate))
        .min_by_key(|(distance, _)| *distance)
        .filter(|(distance, candidate)| *distance <= allowed(candidate))
        .map(|(_, candidate)| candidate)
}
