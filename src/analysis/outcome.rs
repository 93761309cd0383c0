//! What the analysis says of a member: plain data without spans, the value of the memo.

use crate::protection::refusal::Refusal;
use crate::protection::requirement::Requirement;
use crate::units::{Area, Length, SectionFactor, Temperature, Time};

/// The verdict on a member. Unknown is never a pass.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Verdict {
    /// It lasts for its period.
    Passes,
    /// It does not, as designed.
    Fails,
    /// No assessed thickness of its product holds it.
    CannotBeProtected,
    /// Something is lacking or not covered; nothing is claimed.
    NotVerified,
    /// No fire resistance is wanted of it.
    NoPeriod,
}

impl Verdict {
    /// The words of the schedule.
    #[must_use]
    pub const fn words(self) -> &'static str {
        match self {
            Self::Passes => "passes",
            Self::Fails => "fails",
            Self::CannotBeProtected => "cannot be protected",
            Self::NotVerified => "not verified",
            Self::NoPeriod => "no period",
        }
    }
}

/// Where a critical temperature comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum LimitFrom {
    /// Stated in the file.
    Stated,
    /// Worked out from the loading.
    Loading,
    /// The named default of the basis.
    Default,
}

impl LimitFrom {
    /// The word of the schedule.
    #[must_use]
    pub const fn word(self) -> &'static str {
        match self {
            Self::Stated => "stated",
            Self::Loading => "loading",
            Self::Default => "default",
        }
    }
}

/// A critical temperature with what set it.
#[derive(Debug, Clone, PartialEq)]
pub struct Critical {
    /// Of the member as built: bare where it is bare, protected where it is protected.
    pub as_built: Temperature,
    /// If it were bare.
    pub bare: Temperature,
    /// If it were protected.
    pub protected: Temperature,
    /// What the loading gives, where a temperature is stated beside a loading that it can be worked out from.
    pub by_loading: Option<Temperature>,
    /// Where it comes from.
    pub from: LimitFrom,
    /// The clause that set it.
    pub governing: String,
    /// Whether a utilisation set it that takes no account of buckling, though the member may buckle.
    pub buckling: Option<Buckling>,
}

/// What is known of the buckling of a member whose critical temperature ignores it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Buckling {
    /// Its buckling length is not given.
    LengthUnknown,
    /// The non-dimensional slenderness at 20 °C by its buckling length; above 0.2, below which buckling may be ignored
    /// (EN 1993-1-1:2005 6.3.1.2 (4)).
    Slender(f64),
}

impl Critical {
    /// What the loading gives, where it lies below the temperature that is stated: one of the two is wrong.
    #[must_use]
    pub fn contradicted_by(&self) -> Option<Temperature> {
        self.by_loading
            .filter(|derived| self.as_built.celsius() > derived.celsius() + 0.5)
    }
}

/// Why a member is not verified; each reads as a sentence.
#[derive(Debug, Clone, PartialEq)]
pub enum Gap {
    /// A value of the file is lacking or can't be read; a reading finding says so at the place.
    Unread(&'static str),
    /// The critical temperature is neither stated nor derivable.
    CriticalTemperature(String),
    /// A key of the loading is missing.
    Missing(&'static str),
    /// The load exceeds the resistance at 20 °C; the utilisation.
    FailsCold(f64),
    /// The methods of the product do not cover it (yet).
    NotCovered {
        /// The key concerned.
        key: &'static str,
        /// Why, as a sentence.
        why: String,
    },
}

/// The section as exposed.
#[derive(Debug, Clone, PartialEq)]
pub struct ExposedSection {
    /// The shape's word: `i`, `rectangular hollow`, ..
    pub shape: &'static str,
    /// Area.
    pub area: Area,
    /// Mass per metre in kg.
    pub mass_per_m: f64,
    /// Heated perimeter of the outline that the verdict rests on.
    pub heated_perimeter: Length,
    /// The section factor that the verdict rests on.
    pub factor: SectionFactor,
    /// The factor of the bare outline.
    pub bare_factor: SectionFactor,
    /// The factor of the enclosing box, where the exposure has one.
    pub box_factor: Option<SectionFactor>,
    /// The shadow factor of the bare member.
    pub shadow_factor: f64,
    /// Cross-section class in fire, 1 to 4, where it is known.
    pub class: Option<u8>,
    /// Whether the factor is below 10 1/m, so that 10 is used (EN 1993-1-2 4.2.5.1).
    pub below_ten: bool,
}

/// The member without protection.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct BareState {
    /// Steel temperature at the period.
    pub at_period: Option<Temperature>,
    /// Time to the critical temperature; `None` if not reached within 360 min.
    pub resistance: Option<Time>,
}

/// The member with its protection.
#[derive(Debug, Clone, PartialEq)]
pub struct ProtectedState {
    /// What is needed, or why nothing holds.
    pub requirement: Result<Requirement, Refusal>,
    /// The assessed range of thickness, where what is provided lies outside it.
    pub outside_thickness: Option<(Length, Length)>,
    /// Where nothing holds the member: the largest section factor that the product holds.
    pub largest_factor: Option<SectionFactor>,
    /// Thickness of all layers (dry film of a coating) that the verdict rests on.
    pub provided: Option<Length>,
    /// Whether the file states it; the next stock thickness otherwise.
    pub stated: bool,
    /// Number of layers, or coats of a coating.
    pub layers: Option<u32>,
    /// Steel temperature at the period with what is provided; none for coatings.
    pub at_period: Option<Temperature>,
    /// Fire resistance with what is provided; none if beyond 360 min or unknown.
    pub resistance: Option<Time>,
}

/// Everything the analysis says of a member.
#[derive(Debug, Clone, PartialEq)]
pub struct Outcome {
    /// The verdict.
    pub verdict: Verdict,
    /// Why it is not verified, if so.
    pub gaps: Vec<Gap>,
    /// The section as exposed, if it could be worked out.
    pub section: Option<ExposedSection>,
    /// The critical temperature, if it could be worked out.
    pub critical: Option<Critical>,
    /// The bare member.
    pub bare: Option<BareState>,
    /// The protected member, where a product is named and known.
    pub protected: Option<ProtectedState>,
}
