//! The critical temperature of a member from its loading, EN 1993-1-2:2005 4.2.3 and 4.2.4.
//!
//! What is not covered is [`Unverified`], never a pass.

use crate::resistance::class::{Action, Classified, classify};
use crate::resistance::effects::by_effects;
use crate::resistance::utilisation;
use crate::section::Shape;
use crate::units::{Force, Length, Moment, Stress, Temperature};

/// Critical temperature of class 4 sections, 4.2.3.6 (2), °C; a recommended value that national annexes may change.
pub const CLASS_4: f64 = 350.0;

/// The effects of actions in the fire situation, as magnitudes, with what holds the member.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Actions {
    /// Axial compression, positive.
    pub axial_compression: Option<Force>,
    /// Axial tension, positive.
    pub axial_tension: Option<Force>,
    /// Moment about y-y.
    pub bending: Option<Moment>,
    /// Moment about z-z.
    pub bending_minor: Option<Moment>,
    /// Shear along the web.
    pub shear: Option<Force>,
    /// Buckling length about y-y; zero means held throughout.
    pub buckling_length: Option<Length>,
    /// Buckling length about z-z; that about y-y unless given.
    pub buckling_length_minor: Option<Length>,
    /// Length between lateral restraints of the compression flange; zero means held throughout.
    pub lateral_length: Option<Length>,
    /// Whether the compression flange is held throughout, as by a slab.
    pub laterally_restrained: bool,
    /// Whether it is a continuous beam, for κ2.
    pub continuous: bool,
}

/// How the loading is known.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Loading {
    /// The degree of utilisation μ0 in the fire situation at 20 °C, 4.2.4 (4.23).
    Utilisation(f64),
    /// Effects of actions, which resistances at temperature are held against.
    Effects(Actions),
}

/// The steel of a member and how it stands.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Member {
    /// Its shape.
    pub shape: Shape,
    /// Yield strength at 20 °C.
    pub fy: Stress,
    /// γM,fi.
    pub gamma_m_fi: f64,
    /// γM0.
    pub gamma_m0: f64,
    /// Whether it works in compression (columns, braces): with a utilisation alone, its class is that of compression.
    pub compression_member: bool,
    /// Whether it works in tension: with a utilisation alone, it has no class.
    pub tension_member: bool,
    /// Whether it is exposed on three sides with a slab on the fourth: κ1 is 0.70 bare and 0.85 protected.
    pub slab_on_three_sides: bool,
}

/// A critical temperature with what set it.
#[derive(Debug, Clone, PartialEq)]
pub struct Limit {
    /// If bare.
    pub bare: Temperature,
    /// If protected.
    pub protected: Temperature,
    /// The clause that sets it if bare.
    pub governing_bare: String,
    /// The clause that sets it if protected: `EN 1993-1-2 4.2.3.2 (4.5), buckling about z-z`.
    pub governing: String,
    /// Cross-section class in fire; none in tension and shear.
    pub class: Option<u8>,
    /// What sets the class: `web c/t 37.3 > 42ε = 29.0`.
    pub class_note: Option<String>,
}

/// Why there is no critical temperature.
#[derive(Debug, Clone, PartialEq)]
pub enum Unverified {
    /// The load exceeds the resistance at 20 °C: the member fails at once.
    FailsCold {
        /// Load over resistance at 20 °C.
        utilisation: f64,
        /// The clause of the resistance.
        clause: String,
    },
    /// A key of the loading is missing; its name.
    Missing(&'static str),
    /// Not covered; why, as a clause that may follow "because".
    NotCovered(String),
}

/// Refuses with a reason.
pub(super) fn not_covered<T>(why: &str) -> Result<T, Unverified> {
    Err(Unverified::NotCovered(why.to_owned()))
}

/// The critical temperature of a member.
///
/// With a utilisation (4.22) is used, κ1 and κ2 never. With effects every effect is held against its resistance at
/// temperature, and the lowest temperature governs. Class 4 takes at most 350 °C, tension apart.
///
/// # Errors
/// [`Unverified`], where the load exceeds the resistance at 20 °C, or something is missing or not covered: axial force
/// with bending, bending about both axes, lateral-torsional buckling, torsional-flexural buckling, shear buckling,
/// stated sections.
pub fn critical_temperature(member: &Member, loading: &Loading) -> Result<Limit, Unverified> {
    let positive = |value: f64| value.is_finite() && value > 0.0;
    if !positive(member.fy.mpa()) || !positive(member.gamma_m_fi) || !positive(member.gamma_m0) {
        return not_covered("the yield strength and the partial factors are to be positive numbers");
    }
    match loading {
        Loading::Utilisation(mu0) => by_utilisation(member, *mu0),
        Loading::Effects(actions) => by_effects(member, actions),
    }
}

/// The limit of one effect.
pub(super) struct Check {
    bare: Temperature,
    protected: Temperature,
    clause: String,
    class: Option<Classified>,
}

impl Check {
    /// The check of a class, which for class 4 holds the temperature to 350 °C.
    pub(super) fn new(bare: Temperature, protected: Temperature, clause: &str, class: Option<Classified>) -> Self {
        let mut check = Self {
            bare,
            protected,
            clause: clause.to_owned(),
            class,
        };
        if let Some(Classified { class: 4, governing }) = &check.class {
            // Above 350 °C both ways, the clause is that of class 4; else the resistance of the gross section governs.
            let above = protected.celsius() >= CLASS_4;
            check.clause = if above {
                format!("EN 1993-1-2 4.2.3.6 (2), class 4: {governing}")
            } else {
                format!("{clause}, class 4: {governing}")
            };
            let held = |t: Temperature| Temperature::from_celsius(t.celsius().min(CLASS_4));
            (check.bare, check.protected) = (held(bare), held(protected));
        }
        check
    }
}

/// The lowest of the checks, of which there is one at least.
pub(super) fn lowest(checks: Vec<Check>) -> Result<Limit, Unverified> {
    let low = |of: fn(&Check) -> Temperature| checks.iter().min_by(|a, b| of(a).celsius().total_cmp(&of(b).celsius()));
    let (Some(bare), Some(protected)) = (low(|check| check.bare), low(|check| check.protected)) else {
        return not_covered("the effects in fire are all zero");
    };
    // A check without a class (shear) may govern beside one with a class (bending), which the member then has.
    let class = [protected.class.as_ref()]
        .into_iter()
        .chain(checks.iter().map(|check| check.class.as_ref()))
        .flatten()
        .next();
    Ok(Limit {
        bare: bare.bare,
        protected: protected.protected,
        governing_bare: bare.clause.clone(),
        governing: protected.clause.clone(),
        class: class.map(|class| class.class),
        class_note: class.map(|class| class.governing.clone()),
    })
}

fn by_utilisation(member: &Member, mu0: f64) -> Result<Limit, Unverified> {
    let temperature = utilisation::critical_from_utilisation(mu0)?;
    let class = if member.tension_member {
        None
    } else {
        let action = if member.compression_member {
            Action::Compression
        } else {
            Action::Bending
        };
        match classify(&member.shape, member.fy, action) {
            Some(class) => Some(class),
            None => return not_covered("the class of a stated section is not known, and (4.22) is for classes 1 to 3"),
        }
    };
    lowest(vec![Check::new(temperature, temperature, utilisation::CLAUSE, class)])
}

#[cfg(test)]
mod tests;
