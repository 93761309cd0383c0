//! What a steelwork file says outside its members.

use crate::design::given::Given;
use crate::design::model::member::{Extent, MemberKeys};
use crate::heating::fire::Fire;
use crate::text::{Span, Spanned};
use crate::units::Temperature;

/// A steelwork file without its members.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Head {
    /// Version of the format.
    pub version: Given<u32>,
    /// Where `steelwork:` stands.
    pub version_at: Option<Span>,
    /// The head file that a part names.
    pub part_of: Given<String>,
    /// Headings of the papers.
    pub project: Project,
    /// Basis of design.
    pub basis: Basis,
    /// Protection files.
    pub libraries: Vec<Spanned<String>>,
    /// Parts.
    pub parts: Vec<Spanned<String>>,
    /// Fires of the file's own, by name.
    pub fires: Vec<NamedFire>,
    /// Defaults.
    pub defaults: MemberKeys,
    /// Head-only keys that stand in the file, with the span of each key.
    pub head_only: Vec<Spanned<&'static str>>,
    /// Whether a syntax error or a strange key stands outside the items, or something in the basis of design can't be
    /// read: what holds for all members is then not known.
    pub doubtful: bool,
}

/// A fire of the file's own.
#[derive(Debug, Clone, PartialEq)]
pub struct NamedFire {
    /// Its name.
    pub name: Spanned<String>,
    /// The fire; absent where its entry can't be read.
    pub fire: Option<Fire>,
}

/// A group.
#[derive(Debug, Clone, PartialEq)]
pub struct Group {
    /// Its name.
    pub name: Spanned<String>,
    /// Its keys.
    pub keys: MemberKeys,
    /// The characters of the entry.
    pub extent: Extent,
}

/// Headings of the papers.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Project {
    /// Name.
    pub name: Option<String>,
    /// Reference.
    pub reference: Option<String>,
    /// Revision.
    pub revision: Option<String>,
    /// Status.
    pub status: Option<String>,
}

/// Method of design.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Default)]
pub enum Method {
    /// EN 1993-1-2:2005.
    #[default]
    En1993,
    /// ASCE 29-05.
    Asce29,
    /// AS 4100:2020.
    As4100,
}

impl Method {
    /// The edition as reports print it.
    #[must_use]
    pub const fn edition(self) -> &'static str {
        crate::design::keys::steelwork::METHODS[self as usize]
    }
}

/// Basis of design.
#[derive(Debug, Clone, PartialEq)]
pub struct Basis {
    /// Method; unreadable where an edition is named that is not supported.
    pub method: Given<Method>,
    /// Whether reports show imperial units.
    pub imperial: bool,
    /// Currency.
    pub currency: Option<String>,
    /// Price of steel per kg erected.
    pub steel_rate: Option<f64>,
    /// kg CO2e per kg of steel.
    pub carbon_rate: Option<f64>,
    /// The named default of the critical temperature.
    pub default_critical: Given<Temperature>,
    /// Partial factors.
    pub factors: Factors,
    /// Whether yield strengths are read from EN 10025 (EN 1993-1-1 Table 3.1 otherwise).
    pub yield_from_en10025: bool,
    /// Section tables that designations are looked up in, by their letters; all where empty.
    pub section_tables: Vec<&'static str>,
    /// Whether hollow sections without a word are hot finished (cold formed otherwise), where said.
    pub hollow_hot_finished: Option<bool>,
}

impl Default for Basis {
    fn default() -> Self {
        Self {
            method: Given::Absent,
            imperial: false,
            currency: None,
            steel_rate: None,
            carbon_rate: None,
            default_critical: Given::Absent,
            factors: Factors::default(),
            yield_from_en10025: false,
            section_tables: Vec::new(),
            hollow_hot_finished: None,
        }
    }
}

/// Partial factors, with the values that EN 1990 and EN 1993 recommend.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Factors {
    /// γM,fi.
    pub gamma_m_fi: f64,
    /// γM0.
    pub gamma_m0: f64,
    /// γG.
    pub permanent: f64,
    /// γQ.
    pub variable: f64,
    /// ξ.
    pub xi: f64,
}

impl Default for Factors {
    fn default() -> Self {
        Self {
            gamma_m_fi: 1.0,
            gamma_m0: 1.0,
            permanent: 1.35,
            variable: 1.5,
            xi: 1.0,
        }
    }
}
