//! Critical temperature from the loading (EN 1993-1-2:2005 4.2.3 and 4.2.4; from memory).
//!
//! What is not covered is [`Unverified`], never a pass: lateral-torsional buckling, axial force with bending, bending
//! about the weak axis and shear are refused for now.

use crate::resistance::class::{Action, classify};
use crate::resistance::reduction::{modulus_factor, yield_factor};
use crate::section::{Properties, Shape};
use crate::units::{Force, Length, Moment, Stress, Temperature};

/// Critical temperature of class 4 sections where nothing better is known (4.2.3.6 (2)), °C.
pub const CLASS_4: f64 = 350.0;
/// Young's modulus at 20 °C in MPa (EN 1993-1-1:2005 3.2.6).
const MODULUS: f64 = 210_000.0;
/// The least utilisation for which (4.22) holds.
const LEAST_UTILISATION: f64 = 0.013;

/// The steel of a member and how it stands.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Member {
    /// Its shape.
    pub shape: Shape,
    /// Yield strength at 20 °C.
    pub fy: Stress,
    /// γM,fi.
    pub gamma_m_fi: f64,
    /// Whether it works in compression (columns, braces, chords): its class is that of compression.
    pub compression: bool,
    /// Whether it works in tension, which class 4 does not touch.
    pub tension: bool,
    /// Whether a slab covers it on three sides: κ1 is 0.70 bare and 0.85 protected.
    pub slab: bool,
}

/// The loading in the fire situation.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Loading {
    /// Degree of utilisation μ0.
    Utilisation(f64),
    /// Axial compression with the buckling lengths about y-y and z-z.
    Compression(Force, Option<Length>, Option<Length>),
    /// Axial tension.
    Tension(Force),
    /// Bending of a laterally restrained beam; whether it is continuous over its supports.
    Bending(Moment, bool),
}

/// A critical temperature with what set it.
#[derive(Debug, Clone, PartialEq)]
pub struct Limit {
    /// If bare.
    pub bare: Temperature,
    /// If protected.
    pub protected: Temperature,
    /// The clause.
    pub governing: String,
    /// Cross-section class, where known.
    pub class: Option<u8>,
}

/// Why there is no critical temperature.
#[derive(Debug, Clone, PartialEq)]
pub enum Unverified {
    /// The load exceeds the resistance at 20 °C; the utilisation.
    FailsCold(f64),
    /// A key is missing.
    Missing(&'static str),
    /// Not covered; why, as a sentence.
    NotCovered(&'static str),
}

/// (4.22): the critical temperature of a degree of utilisation, classes 1 to 3.
///
/// Below 0.013 the temperature of 0.013 is taken, on the safe side.
///
/// # Errors
/// A utilisation above 1 fails at once.
pub fn from_utilisation(mu: f64) -> Result<Temperature, Unverified> {
    if mu > 1.0 {
        return Err(Unverified::FailsCold(mu));
    }
    let mu = mu.max(LEAST_UTILISATION);
    Ok(Temperature::from_celsius(
        39.19 * (1.0 / (0.9674 * mu.powf(3.833)) - 1.0).ln() + 482.0,
    ))
}

/// ηfi = (Gk + ψ Qk)/(γG Gk + γQ Qk), EN 1993-1-2:2005 (2.5), ξ reducing the permanent action.
#[must_use]
pub fn load_reduction(permanent: f64, variable: f64, combination: f64, gamma: (f64, f64), xi: f64) -> f64 {
    (permanent + combination * variable) / (xi * gamma.0 * permanent + gamma.1 * variable)
}

/// χfi of (4.5) and (4.6) for a slenderness at 20 °C.
#[must_use]
pub fn buckling_factor(slenderness: f64, fy: Stress, celsius: f64) -> f64 {
    let (ky, ke) = (yield_factor(celsius), modulus_factor(celsius));
    let bar = slenderness * (ky / ke).sqrt();
    let alpha = 0.65 * (235.0 / fy.mpa()).sqrt();
    let phi = 0.5 * (1.0 + alpha * bar + bar * bar);
    (1.0 / (phi + (phi * phi - bar * bar).sqrt())).min(1.0)
}

/// The temperature at which a falling resistance meets a load; the highest looked at is 1200 °C.
fn meets(load: f64, resistance: impl Fn(f64) -> f64) -> Result<Temperature, Unverified> {
    let cold = resistance(20.0);
    if load > cold {
        return Err(Unverified::FailsCold(load / cold));
    }
    let (mut low, mut high) = (20.0, 1199.0);
    if resistance(high) >= load {
        return Ok(Temperature::from_celsius(high));
    }
    while high - low > 1e-4 {
        let middle = 0.5 * (low + high);
        if resistance(middle) >= load {
            low = middle
        } else {
            high = middle
        }
    }
    Ok(Temperature::from_celsius(low))
}

/// The critical temperature of a member.
///
/// # Errors
/// [`Unverified`], where the load exceeds the resistance at 20 °C, or something is missing or not covered.
pub fn critical_temperature(member: &Member, loading: Loading) -> Result<Limit, Unverified> {
    let compression = member.compression || matches!(loading, Loading::Compression(..));
    let tension = member.tension || matches!(loading, Loading::Tension(_));
    let action = if compression {
        Action::Compression
    } else {
        Action::Bending
    };
    let class = if tension {
        None
    } else {
        classify(&member.shape, member.fy, action)
    };
    let number = class.as_ref().map(|class| class.class);
    let properties = member.shape.properties().ok().flatten();
    let both = |t: Temperature, clause: &str| Limit {
        bare: t,
        protected: t,
        governing: clause.to_owned(),
        class: number,
    };
    let limit = match loading {
        Loading::Utilisation(mu) => both(from_utilisation(mu)?, "EN 1993-1-2 4.2.4 (4.22)"),
        Loading::Tension(force) => {
            let area = properties.as_ref().ok_or(NO_FIGURES)?.area;
            let plastic = area.mm2() * member.fy.mpa() / 1000.0 / member.gamma_m_fi;
            let t = meets(force.kn().abs(), |celsius| plastic * yield_factor(celsius))?;
            both(t, "EN 1993-1-2 4.2.3.1 (4.3), tension")
        }
        Loading::Compression(force, y, z) => {
            let y = y.ok_or(Unverified::Missing("buckling length"))?;
            let t = compression_limit(member, force, y, z.unwrap_or(y), properties.as_ref().ok_or(NO_FIGURES)?)?;
            both(t.0, t.1)
        }
        Loading::Bending(moment, continuous) => bending_limit(
            member,
            moment,
            continuous,
            properties.as_ref().ok_or(NO_FIGURES)?,
            number,
        )?,
    };
    if number == Some(4) {
        let governing = format!(
            "EN 1993-1-2 4.2.3.6 (2), class 4: {}",
            class.map(|class| class.governing).unwrap_or_default()
        );
        let held = |t: Temperature| Temperature::from_celsius(t.celsius().min(CLASS_4));
        return Ok(Limit {
            bare: held(limit.bare),
            protected: held(limit.protected),
            governing,
            class: number,
        });
    }
    Ok(limit)
}

const NO_FIGURES: Unverified =
    Unverified::NotCovered("of a stated section the resistance is not known; state the critical temperature instead");

fn compression_limit(
    member: &Member,
    force: Force,
    y: Length,
    z: Length,
    properties: &Properties,
) -> Result<(Temperature, &'static str), Unverified> {
    let fy = member.fy;
    let euler = std::f64::consts::PI * (MODULUS / fy.mpa()).sqrt();
    let angle = matches!(member.shape, Shape::Angle(_));
    let (radius_y, radius_z) = if angle {
        (properties.radius_v(), properties.radius_v())
    } else {
        (properties.radius_y(), properties.radius_z())
    };
    let about_y = y.mm() / radius_y.mm() / euler;
    let about_z = z.mm() / radius_z.mm() / euler;
    let plastic = properties.area.mm2() * fy.mpa() / 1000.0 / member.gamma_m_fi;
    let t = meets(force.kn(), |celsius| {
        buckling_factor(about_y.max(about_z), fy, celsius) * yield_factor(celsius) * plastic
    })?;
    let clause = if angle {
        "EN 1993-1-2 4.2.3.2 (4.5), buckling about v-v"
    } else if about_z >= about_y {
        "EN 1993-1-2 4.2.3.2 (4.5), buckling about z-z"
    } else {
        "EN 1993-1-2 4.2.3.2 (4.5), buckling about y-y"
    };
    Ok((t, clause))
}

fn bending_limit(
    member: &Member,
    moment: Moment,
    continuous: bool,
    properties: &Properties,
    class: Option<u8>,
) -> Result<Limit, Unverified> {
    let modulus = match class {
        Some(1 | 2) => properties.wpl_y_mm3,
        Some(3 | 4) => properties.wel_y_mm3,
        _ => {
            return Err(Unverified::NotCovered(
                "the cross-section class in bending is not known",
            ));
        }
    };
    let cold = modulus * member.fy.mpa() / 1e6 / member.gamma_m_fi;
    if moment.knm().abs() > cold {
        return Err(Unverified::FailsCold(moment.knm().abs() / cold));
    }
    let kappa2 = if continuous { 0.85 } else { 1.0 };
    let at = |kappa1: f64| {
        meets(moment.knm().abs(), |celsius| {
            cold * (yield_factor(celsius) / (kappa1 * kappa2)).min(1.0)
        })
    };
    let (bare, protected) = if member.slab {
        (at(0.70)?, at(0.85)?)
    } else {
        (at(1.0)?, at(1.0)?)
    };
    let governing = "EN 1993-1-2 4.2.3.3 (4.8), (4.10), bending, laterally restrained".to_owned();
    Ok(Limit {
        bare,
        protected,
        governing,
        class,
    })
}
