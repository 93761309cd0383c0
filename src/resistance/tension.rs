//! Tension members, EN 1993-1-2:2005 4.2.3.1 (4.3); memory.

use crate::resistance::reduction::yield_factor;
use crate::units::{Area, Force, Stress, Temperature};

/// The clause of the equation.
pub const CLAUSE: &str = "EN 1993-1-2 4.2.3.1 (4.3), tension";

/// Nfi,θ,Rd = ky,θ A fy/γM,fi of the gross section at one temperature.
///
/// The net section at holes need not be checked where every hole holds a fastener (Annex D, D.1 (1)).
#[must_use]
pub fn resistance(area: Area, fy: Stress, gamma_m_fi: f64, temperature: Temperature) -> Force {
    Force::from_kn(yield_factor(temperature) * area.mm2() * fy.mpa() / 1000.0 / gamma_m_fi)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Computed by hand: 0.47 · 2000 mm² · 275 MPa = 258.5 kN.
    #[test]
    fn falls_with_ky() {
        let at = |celsius: f64| {
            resistance(
                Area::from_mm2(2000.0),
                Stress::from_mpa(275.0),
                1.0,
                Temperature::from_celsius(celsius),
            )
        };
        assert!((at(600.0).kn() - 258.5).abs() < 1e-9);
        assert!((at(400.0).kn() - 550.0).abs() < 1e-9);
    }
}
