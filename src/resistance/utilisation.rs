//! The degree of utilisation and the critical temperature from it (EN 1993-1-2:2005 2.4.2 and 4.2.4; memory).

use crate::resistance::critical::Unverified;
use crate::units::Temperature;

/// The clause of the equation.
pub const CLAUSE: &str = "EN 1993-1-2 4.2.4 (4.22)";
/// The least degree of utilisation for which (4.22) holds.
pub const LEAST: f64 = 0.013;

/// (4.22): the critical temperature of a degree of utilisation μ0, for classes 1 to 3, where neither buckling nor
/// deflection governs.
///
/// The equation is a fit to the inverse of ky: up to 13 °C above it (unsafe) for μ0 of 0.8 to 0.95 and 15 °C at 0.11,
/// some 10 °C below for 0.3 to 0.5, 51 °C below at 1 (computed). It holds from 0.013 to 1; below 0.013 the temperature
/// of 0.013 (1136 °C) is held, on the safe side.
///
/// # Errors
/// [`Unverified::FailsCold`] above 1; [`Unverified::NotCovered`] for what is not a number from 0 up.
pub fn critical_from_utilisation(mu0: f64) -> Result<Temperature, Unverified> {
    if mu0.is_nan() || mu0 < 0.0 {
        return Err(Unverified::NotCovered(
            "the degree of utilisation is not a number from 0 up".to_owned(),
        ));
    }
    if mu0 > 1.0 {
        return Err(Unverified::FailsCold {
            utilisation: mu0,
            clause: CLAUSE.to_owned(),
        });
    }
    let mu0 = mu0.max(LEAST);
    Ok(Temperature::from_celsius(
        39.19 * (1.0 / (0.9674 * mu0.powf(3.833)) - 1.0).ln() + 482.0,
    ))
}

/// Permanent and leading variable action with what turns them into design loads: any one unit for both.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ActionMix {
    /// Gk, the permanent action.
    pub permanent: f64,
    /// Qk,1, the leading variable action.
    pub variable: f64,
    /// ψfi, which the national annex takes as ψ1,1 or ψ2,1.
    pub combination: f64,
    /// γG.
    pub gamma_permanent: f64,
    /// γQ,1.
    pub gamma_variable: f64,
    /// ξ of EN 1990 (6.10b); 1 for (6.10).
    pub xi: f64,
}

/// ηfi, the load in fire over the load of the design at 20 °C: (2.5) with ξ = 1, (2.5b) with the ξ of (6.10b). Of (2.5a)
/// and (2.5b) the smaller may be taken, so that (2.5b) alone is on the safe side. None where the design load is not
/// positive.
#[must_use]
pub fn reduction_factor(mix: &ActionMix) -> Option<f64> {
    let in_fire = mix.permanent + mix.combination * mix.variable;
    let cold = mix.xi * mix.gamma_permanent * mix.permanent + mix.gamma_variable * mix.variable;
    (cold > 0.0 && in_fire.is_finite()).then(|| in_fire / cold)
}

/// (4.24) for a member that is used to `ambient` (Ed/Rd) at 20 °C: μ0 = Ed/Rd · ηfi · γM,fi/γM0.
///
/// Valid for tension members, and for beams where lateral-torsional buckling does not govern.
#[must_use]
pub fn from_ambient(ambient: f64, eta_fi: f64, gamma_m_fi: f64, gamma_m0: f64) -> f64 {
    ambient * eta_fi * gamma_m_fi / gamma_m0
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::resistance::reduction::inverse_ky;

    #[test]
    fn held_below_and_refused_above() {
        let least = critical_from_utilisation(LEAST);
        assert_eq!(critical_from_utilisation(0.0), least);
        assert_eq!(critical_from_utilisation(0.005), least);
        // Computed: 39.19 ln(1/(0.9674 · 0.013^3.833) - 1) + 482.
        assert!((least.unwrap().celsius() - 1135.655).abs() < 1e-3);
        assert!(matches!(
            critical_from_utilisation(1.2),
            Err(Unverified::FailsCold { utilisation, .. }) if utilisation == 1.2
        ));
        for nonsense in [f64::NAN, -0.1] {
            let refused = critical_from_utilisation(nonsense);
            assert!(matches!(refused, Err(Unverified::NotCovered(_))));
        }
    }

    /// The fit against what it was fitted to (computed): the bounds that its doc gives.
    #[test]
    fn near_the_inverse_of_ky() {
        for thousandths in 13..=1000 {
            let mu0 = f64::from(thousandths) / 1000.0;
            let exact = inverse_ky(mu0).unwrap().celsius();
            let above = critical_from_utilisation(mu0).unwrap().celsius() - exact;
            assert!(above < 15.5 && above > -51.0, "{mu0}: {above}");
        }
    }

    #[test]
    fn falls_with_utilisation() {
        let mut last = f64::INFINITY;
        for percent in 2..=100 {
            let t = critical_from_utilisation(f64::from(percent) / 100.0).unwrap().celsius();
            assert!(t < last);
            last = t;
        }
    }

    /// Computed by hand: 0.8 · 0.65 · 1.0/1.1 = 0.4727.
    #[test]
    fn ambient_utilisation() {
        assert!((from_ambient(0.8, 0.65, 1.0, 1.1) - 0.472_727).abs() < 1e-6);
    }

    #[test]
    fn no_design_load_no_factor() {
        let mut mix = ActionMix {
            permanent: 0.0,
            variable: 0.0,
            combination: 0.3,
            gamma_permanent: 1.35,
            gamma_variable: 1.5,
            xi: 1.0,
        };
        assert_eq!(reduction_factor(&mix), None);
        mix.permanent = 1.0;
        // Computed: 1/1.35.
        assert!((reduction_factor(&mix).unwrap() - 0.740_740).abs() < 1e-5);
    }
}
