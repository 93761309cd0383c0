//! A member, and the keys that members share with groups and defaults.

use jiff::civil::Date;

use crate::design::given::Given;
use crate::section::{Exposure, Shape};
use crate::text::{Span, Spanned};
use crate::units::{Force, Length, Moment, Stress, Temperature, Time};

/// A member of the list.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Member {
    /// The mark, unique in the design.
    pub mark: Given<String>,
    /// Every other key.
    pub keys: MemberKeys,
    /// Agreed departures.
    pub departures: Vec<Departure>,
    /// Whether a syntax error broke the text of the member: keys may be lacking that its author wrote.
    pub broken: bool,
    /// The characters of the whole item.
    pub extent: Extent,
}

/// Where an item stands. Equal to any other, as spans don't count for equality.
#[derive(Debug, Clone, Copy, Default)]
pub struct Extent(pub Span);

impl PartialEq for Extent {
    fn eq(&self, _: &Self) -> bool {
        true
    }
}

/// The keys that a member, a group and the defaults may carry.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct MemberKeys {
    /// The group that a member names.
    pub group: Given<String>,
    /// Where it is.
    pub location: Given<Box<Location>>,
    /// Drawing number.
    pub drawing: Given<String>,
    /// Revision.
    pub revision: Given<String>,
    /// Remark.
    pub note: Given<String>,
    /// How many.
    pub count: Given<u32>,
    /// Length of one.
    pub length: Given<Length>,
    /// What it does in the frame.
    pub role: Given<Role>,
    /// Its section.
    pub section: Given<SectionChoice>,
    /// Web openings.
    pub openings: Given<Box<Openings>>,
    /// Taper.
    pub taper: Given<Vec<Length>>,
    /// Steel.
    pub steel: Given<Steel>,
    /// Surface.
    pub surface: Given<Surface>,
    /// What the fire reaches.
    pub exposure: Given<Exposure>,
    /// What covers the rest.
    pub shield: Given<Shield>,
    /// Service environment.
    pub environment: Given<Environment>,
    /// Fire resistance period.
    pub period: Given<Period>,
    /// Name of the fire.
    pub fire: Given<String>,
    /// Stated critical temperature.
    pub critical_temperature: Given<StatedTemperature>,
    /// Loading in the fire situation.
    pub loading: Given<Box<Loading>>,
    /// Protection.
    pub protection: Given<Box<Protection>>,
    /// Marks of what carries it.
    pub supported_by: Given<Vec<Spanned<String>>>,
    /// Marks of what it keeps stable.
    pub steadies: Given<Vec<Spanned<String>>>,
    /// Connection.
    pub connection: Given<Connection>,
    /// Restrained assembly (ASCE 29).
    pub restrained: Given<bool>,
    /// Whether a key stands among them that is not known, or one stands twice, and a verdict may rest on what their
    /// author meant by it.
    pub strange: bool,
}

/// Where a member is; schedules go by it.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Location {
    /// Level or storey.
    pub level: Option<String>,
    /// Grid reference.
    pub grid: Option<String>,
    /// Zone.
    pub zone: Option<String>,
    /// Phase of the works.
    pub phase: Option<String>,
}

/// What a member does in the frame.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
#[allow(missing_docs)] // the words of the file are the names
pub enum Role {
    Beam,
    Column,
    Brace,
    Tie,
    Hanger,
    Purlin,
    Rail,
    Rafter,
    TrussChord,
    TrussWeb,
    Trimmer,
    TransferBeam,
    Lintel,
}

impl Role {
    /// The roles in the order of the key table's words.
    pub const ALL: [Self; 13] = [
        Self::Beam,
        Self::Column,
        Self::Brace,
        Self::Tie,
        Self::Hanger,
        Self::Purlin,
        Self::Rail,
        Self::Rafter,
        Self::TrussChord,
        Self::TrussWeb,
        Self::Trimmer,
        Self::TransferBeam,
        Self::Lintel,
    ];

    /// The word of the file.
    #[must_use]
    pub const fn word(self) -> &'static str {
        crate::design::keys::member::ROLES[self as usize]
    }

    /// Whether assessments of beams serve it; all others read those of columns, four sides.
    #[must_use]
    pub const fn reads_as_beam(self) -> bool {
        matches!(
            self,
            Self::Beam | Self::Purlin | Self::Rail | Self::Rafter | Self::Trimmer | Self::TransferBeam | Self::Lintel
        )
    }

    /// Whether its axial force is given with tension positive.
    #[must_use]
    pub const fn is_tie(self) -> bool {
        matches!(self, Self::Tie | Self::Hanger)
    }
}

/// A section as the file names it.
#[derive(Debug, Clone, PartialEq)]
pub enum SectionChoice {
    /// A designation, still to be looked up.
    Designation(String),
    /// A mapping with a shape that the methods cover.
    Shape(Box<Shape>),
    /// A mapping with a shape that is read but not yet verified; its name.
    NotCovered(&'static str),
}

/// Web openings.
#[derive(Debug, Clone, PartialEq)]
pub struct Openings {
    /// circular, hexagonal or rectangular.
    pub shape: &'static str,
    /// Diameter of circular openings, width of others.
    pub width: Option<Length>,
    /// Height of hexagonal and rectangular openings.
    pub height: Option<Length>,
    /// Centres.
    pub spacing: Option<Length>,
    /// Depth of the tee below the opening.
    pub web_below: Option<Length>,
}

/// Steel as the file names it.
#[derive(Debug, Clone, PartialEq)]
pub enum Steel {
    /// A grade by name, one of the key table's.
    Grade(&'static str),
    /// A stated yield strength.
    Yield(Stress),
}

/// Surface of the steel.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Surface {
    /// Bare or painted.
    Plain,
    /// Galvanised, without the declarations that a lower emissivity needs.
    Galvanised,
    /// Hot-dip galvanised to EN ISO 1461; the steel's category.
    GalvanisedTo {
        /// Category of the steel: A to D.
        category: char,
    },
}

/// What covers the face that the fire does not reach.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Shield {
    /// Nothing.
    None,
    /// A concrete slab.
    Slab,
    /// A wall.
    Wall,
    /// A metal deck.
    Deck {
        /// Whether it carries concrete.
        concrete: Option<bool>,
        /// Share of the flange in contact.
        contact: Option<f64>,
        /// Whether the voids above the flange are filled.
        voids_filled: Option<bool>,
        /// Whether the profile is re-entrant (trapezoidal otherwise), where stated.
        re_entrant: Option<bool>,
    },
}

/// Service environment, the most severe first.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Environment {
    /// Exposed.
    X,
    /// Semi exposed.
    Y,
    /// Internal, humid.
    Z1,
    /// Internal, dry.
    Z2,
}

impl Environment {
    /// The letter and its words.
    #[must_use]
    pub const fn words(self) -> &'static str {
        match self {
            Self::X => "X (exposed)",
            Self::Y => "Y (semi exposed)",
            Self::Z1 => "Z1 (internal humid)",
            Self::Z2 => "Z2 (internal dry)",
        }
    }
}

/// Fire resistance period.
#[derive(Debug, Clone, PartialEq)]
pub enum Period {
    /// So long.
    Of(Time),
    /// None is wanted.
    None {
        /// Why.
        because: Option<String>,
    },
}

/// A critical temperature that the user states.
#[derive(Debug, Clone, PartialEq)]
pub struct StatedTemperature {
    /// The temperature.
    pub value: Temperature,
    /// Who stated it.
    pub by: Option<String>,
    /// Whether it is preliminary (approved otherwise), where said.
    pub preliminary: Option<bool>,
}

/// Loading in the fire situation.
#[derive(Debug, Clone, PartialEq)]
pub struct Loading {
    /// How the load is stated.
    pub load: Load,
    /// What holds the member, where the file says.
    pub restraint: Restraint,
}

/// How the load is stated. The ways are not synonyms.
#[derive(Debug, Clone, PartialEq)]
pub enum Load {
    /// μ0.
    Utilisation(f64),
    /// Utilisation at normal temperature with a reduction.
    Ambient {
        /// Utilisation at normal temperature.
        utilisation: f64,
        /// How it is reduced.
        reduction: Reduction,
    },
    /// rf of AS 4100.
    Ratio(f64),
    /// Effects of actions in fire.
    Effects(Effects),
}

/// The reduction of the load level in fire.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Reduction {
    /// ηfi as given.
    Factor(f64),
    /// From the actions.
    Actions {
        /// Gk.
        permanent: f64,
        /// Qk.
        variable: f64,
        /// ψ.
        combination: f64,
    },
}

/// Effects of actions in the fire situation.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Effects {
    /// Axial force, compression positive (tension positive in ties and hangers).
    pub axial: Option<Force>,
    /// Moment about the strong axis.
    pub bending: Option<Moment>,
    /// Moment about the weak axis.
    pub bending_minor: Option<Moment>,
    /// Shear.
    pub shear: Option<Force>,
}

/// What holds a member against buckling.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Restraint {
    /// Buckling length, strong axis.
    pub buckling_length: Option<Length>,
    /// Buckling length, weak axis.
    pub buckling_length_minor: Option<Length>,
    /// Length between lateral restraints.
    pub lateral_length: Option<Length>,
    /// Word of the moment diagram.
    pub moment_shape: Option<&'static str>,
    /// Whether the beam is continuous over its supports.
    pub continuous: bool,
}

/// Protection as the member states it.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Protection {
    /// Name of the product; none where the member is bare on purpose.
    pub product: Option<Spanned<String>>,
    /// Whether it boxes the section in; by the product's kind unless stated.
    pub boxed: Given<bool>,
    /// Thickness of each layer; a single entry holds for all.
    pub thickness: Given<Vec<Length>>,
    /// Number of layers.
    pub layers: Given<u32>,
    /// Dry film thickness.
    pub dft: Given<Length>,
    /// Measured dry film thickness.
    pub reading: Given<Length>,
    /// Primer.
    pub primer: Option<String>,
    /// Topcoat.
    pub topcoat: Option<String>,
    /// Whether it is applied on site (in the shop otherwise), where said.
    pub on_site: Option<bool>,
    /// Whether any of it can't be read.
    pub unreadable: bool,
}

/// A connection's share.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Connection {
    /// Degree of utilisation.
    pub utilisation: Option<f64>,
    /// Whether it has the member's protection.
    pub same_protection: Option<bool>,
}

/// An agreed departure from a finding.
#[derive(Debug, Clone, PartialEq)]
pub struct Departure {
    /// The finding departed from.
    pub from: Spanned<String>,
    /// The reason.
    pub because: Given<String>,
    /// Who agreed.
    pub by: Given<String>,
    /// How long it holds.
    pub until: Given<Date>,
    /// The figures it was agreed at.
    pub at: Agreed,
    /// The characters of the entry.
    pub extent: Extent,
}

/// Figures that a departure was agreed at; it lapses when they worsen.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Agreed {
    /// Thickness needed.
    pub needs: Option<Length>,
    /// Section factor in 1/m.
    pub section_factor: Option<f64>,
    /// Steel temperature.
    pub temperature: Option<Temperature>,
    /// Fire resistance.
    pub resistance: Option<Time>,
}
