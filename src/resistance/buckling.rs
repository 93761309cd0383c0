//! Members in compression, EN 1993-1-2:2005 4.2.3.2 (4.5) to (4.7); memory.
//!
//! Flexural buckling only: torsional-flexural buckling is refused where it can govern (see `critical`).

use crate::resistance::reduction::{modulus_factor, yield_factor};
use crate::section::{Properties, Shape};
use crate::units::{Force, Length, Stress, Temperature};

/// Young's modulus at 20 °C in MPa (EN 1993-1-1:2005 3.2.6).
pub const MODULUS: f64 = 210_000.0;

/// An axis of buckling.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Axis {
    /// y-y, the strong axis of an I.
    Y,
    /// z-z, the weak axis of an I.
    Z,
    /// v-v, the axis of the least radius of gyration of an angle.
    V,
}

impl Axis {
    /// The clause with the axis.
    #[must_use]
    pub const fn clause(self) -> &'static str {
        match self {
            Self::Y => "EN 1993-1-2 4.2.3.2 (4.5), buckling about y-y",
            Self::Z => "EN 1993-1-2 4.2.3.2 (4.5), buckling about z-z",
            Self::V => "EN 1993-1-2 4.2.3.2 (4.5), buckling about v-v",
        }
    }
}

/// Buckling lengths in the fire situation; zero means held throughout.
///
/// In a braced frame of separate fire compartments 0.5 of the storey height, 0.7 in the top storey (4.2.3.2 (5)).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Lengths {
    /// About y-y.
    pub y: Length,
    /// About z-z.
    pub z: Length,
}

/// The non-dimensional slenderness at 20 °C, λ = Lcr/i /(π √(E/fy)) (EN 1993-1-1:2005 (6.50), class 1 to 3).
#[must_use]
pub fn slenderness(length: Length, radius: Length, fy: Stress) -> f64 {
    length.mm() / radius.mm() / (std::f64::consts::PI * (MODULUS / fy.mpa()).sqrt())
}

/// χfi, (4.6), of a slenderness at 20 °C: λθ = λ √(ky,θ/kE,θ) by (4.7), α = 0.65 √(235/fy).
///
/// At 1200 °C, where both factors are zero, the ratio is that just below.
#[must_use]
pub fn reduction_factor(slenderness: f64, fy: Stress, temperature: Temperature) -> f64 {
    let (ky, ke) = (yield_factor(temperature), modulus_factor(temperature));
    // Both fall in a straight line from 1100 °C to zero at 1200 °C, so their ratio there is the one at 1100 °C.
    let ratio = if ke > 0.0 { ky / ke } else { 0.02 / 0.0225 };
    let bar = slenderness * ratio.sqrt();
    let alpha = 0.65 * (235.0 / fy.mpa()).sqrt();
    let phi = 0.5 * (1.0 + alpha * bar + bar * bar);
    1.0 / (phi + (phi * phi - bar * bar).sqrt())
}

/// The axis about which a member buckles first, and its slenderness at 20 °C.
///
/// An angle is taken to buckle about v-v with the longer of the lengths. One χ curve serves all axes in fire, so the
/// greater slenderness governs at every temperature.
#[must_use]
pub fn governing_slenderness(shape: &Shape, properties: &Properties, fy: Stress, lengths: Lengths) -> (Axis, f64) {
    if matches!(shape, Shape::Angle(_)) {
        let longer = Length::from_mm(lengths.y.mm().max(lengths.z.mm()));
        return (Axis::V, slenderness(longer, properties.radius_v(), fy));
    }
    let y = slenderness(lengths.y, properties.radius_y(), fy);
    let z = slenderness(lengths.z, properties.radius_z(), fy);
    if z >= y { (Axis::Z, z) } else { (Axis::Y, y) }
}

/// Nb,fi,θ,Rd = χfi A ky,θ fy/γM,fi, (4.5), of a slenderness at 20 °C; classes 1 to 3.
#[must_use]
pub fn resistance(
    slenderness: f64,
    properties: &Properties,
    fy: Stress,
    gamma_m_fi: f64,
    temperature: Temperature,
) -> Force {
    let chi = reduction_factor(slenderness, fy, temperature);
    let squash = properties.area.mm2() * fy.mpa() / 1000.0 / gamma_m_fi;
    Force::from_kn(chi * yield_factor(temperature) * squash)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::section::shape::{Angle, Flat};

    fn mm(value: f64) -> Length {
        Length::from_mm(value)
    }

    #[test]
    fn without_length_nothing_buckles() {
        let chi = reduction_factor(0.0, Stress::from_mpa(355.0), Temperature::from_celsius(600.0));
        assert!((chi - 1.0).abs() < 1e-12);
    }

    /// Computed by hand: π √(210000/355) = 76.41; 3000/30/76.41 = 1.3087.
    #[test]
    fn slenderness_by_hand() {
        let found = slenderness(mm(3000.0), mm(30.0), Stress::from_mpa(355.0));
        assert!((found - 1.308_7).abs() < 1e-4, "{found}");
    }

    /// A flat 100 × 20: i = t/√12 = 5.77 mm about y-y (it lies), 28.87 mm about z-z (computed).
    #[test]
    fn the_greater_slenderness_governs() {
        let flat = Shape::Flat(Flat {
            b: mm(100.0),
            t: mm(20.0),
        });
        let properties = flat.properties().unwrap().unwrap();
        let fy = Stress::from_mpa(235.0);
        let governing =
            |y: f64, z: f64| governing_slenderness(&flat, &properties, fy, Lengths { y: mm(y), z: mm(z) }).0;
        assert_eq!(governing(1000.0, 1000.0), Axis::Y);
        assert_eq!(governing(100.0, 1000.0), Axis::Z);
    }

    #[test]
    fn angles_buckle_about_v() {
        let angle = Shape::Angle(Angle {
            h: mm(100.0),
            b: mm(100.0),
            t: mm(12.0),
            root: mm(12.0),
            toe: mm(6.0),
        });
        let properties = angle.properties().unwrap().unwrap();
        let lengths = Lengths {
            y: mm(1000.0),
            z: mm(2000.0),
        };
        let (axis, found) = governing_slenderness(&angle, &properties, Stress::from_mpa(275.0), lengths);
        assert_eq!(axis, Axis::V);
        // EN 10056-1: iv of L 100 × 100 × 12 is 19.4 mm (memory); π √(E/fy) = 86.81.
        assert!((found - 2000.0 / 19.4 / 86.81).abs() < 0.01, "{found}");
    }

    #[test]
    fn resistance_never_rises_with_temperature() {
        let flat = Shape::Flat(Flat {
            b: mm(100.0),
            t: mm(20.0),
        });
        let properties = flat.properties().unwrap().unwrap();
        for fy in [235.0, 355.0, 460.0].map(Stress::from_mpa) {
            for slenderness in [0.0, 0.3, 0.7, 1.0, 1.5, 2.5, 5.0] {
                let mut last = f64::INFINITY;
                for step in 0..=236 {
                    let t = Temperature::from_celsius(20.0 + 5.0 * f64::from(step));
                    let now = resistance(slenderness, &properties, fy, 1.0, t).kn();
                    assert!(now <= last + 1e-9, "λ {slenderness} at {t:?}");
                    last = now;
                }
            }
        }
    }
}
