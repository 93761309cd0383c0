//! Bending of beams that are held laterally, EN 1993-1-2:2005 4.2.3.3 (4.8), (4.10) for classes 1 and 2, 4.2.3.4 (4.17),
//! (4.18) for class 3; memory.

use crate::resistance::reduction::yield_factor;
use crate::resistance::shear;
use crate::section::{Properties, Shape};
use crate::units::{Force, Moment, Stress, Temperature};

/// Axis of bending.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Axis {
    /// y-y, the strong axis of an I.
    Y,
    /// z-z.
    Z,
}

/// κ1, for temperature that differs over the section (4.2.3.3 (7)).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Kappa {
    /// κ1: 1 exposed all round, 0.70 bare and 0.85 protected on three sides under a slab.
    pub section: f64,
    /// κ2: 0.85 at the supports of a continuous beam, else 1 (4.2.3.3 (8)).
    pub beam: f64,
}

impl Kappa {
    /// Of a member; `slab` means exposed on three sides with a concrete or composite slab on the fourth.
    #[must_use]
    pub const fn of(slab: bool, protected: bool, continuous: bool) -> Self {
        let section = match (slab, protected) {
            (false, _) => 1.0,
            (true, false) => 0.70,
            (true, true) => 0.85,
        };
        let beam = if continuous { 0.85 } else { 1.0 };
        Self { section, beam }
    }
}

/// The clause for a class.
#[must_use]
pub const fn clause(class: u8) -> &'static str {
    match class {
        1 | 2 => "EN 1993-1-2 4.2.3.3 (4.8), (4.10), bending, laterally restrained",
        _ => "EN 1993-1-2 4.2.3.4 (4.17), (4.18), bending, laterally restrained",
    }
}

/// Section modulus for a class: plastic for 1 and 2, elastic above. mm³.
#[must_use]
pub const fn modulus(properties: &Properties, class: u8, axis: Axis) -> f64 {
    match (axis, class) {
        (Axis::Y, 1 | 2) => properties.wpl_y_mm3,
        (Axis::Y, _) => properties.wel_y_mm3,
        (Axis::Z, 1 | 2) => properties.wpl_z_mm3,
        (Axis::Z, _) => properties.wel_z_mm3,
    }
}

/// What bending takes place in.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Bent<'a> {
    /// The shape.
    pub shape: &'a Shape,
    /// Its properties.
    pub properties: &'a Properties,
    /// Cross-section class.
    pub class: u8,
    /// Axis.
    pub axis: Axis,
    /// Yield strength at 20 °C.
    pub fy: Stress,
    /// γM,fi.
    pub gamma_m_fi: f64,
    /// γM0.
    pub gamma_m0: f64,
    /// Shear that acts where the moment does; only along the web, with bending about y-y.
    pub shear: Option<Force>,
}

/// Mfi,t,Rd = ky,θ W fy/(γM,fi κ1 κ2), at most the resistance MRd = W fy/γM0 of 20 °C, reduced for shear by EN
/// 1993-1-1:2005 6.2.8 with the resistances at temperature.
#[must_use]
pub fn resistance(bent: &Bent<'_>, kappa: Kappa, temperature: Temperature) -> Moment {
    let ky = yield_factor(temperature);
    let whole = modulus(bent.properties, bent.class, bent.axis);
    let left = whole * (1.0 - shear_loss(bent, whole, temperature));
    let yielding = left * bent.fy.mpa() / 1e6;
    let hot = ky * yielding / bent.gamma_m_fi / (kappa.section * kappa.beam);
    Moment::from_knm(hot.min(yielding / bent.gamma_m0))
}

/// The share of the modulus that is lost to shear above half the shear resistance. For an I of like flanges only the
/// web loses strength (6.30), else the whole section, on the safe side.
fn shear_loss(bent: &Bent<'_>, whole: f64, temperature: Temperature) -> f64 {
    let (Some(force), Some(area)) = (bent.shear, shear::area(bent.shape, bent.properties)) else {
        return 0.0;
    };
    let limit = shear::resistance(area, bent.fy, bent.gamma_m_fi, temperature).kn();
    let force = force.kn().abs();
    if force <= 0.5 * limit {
        return 0.0;
    }
    if force >= limit {
        return 1.0;
    }
    let rho = (2.0 * force / limit - 1.0).powi(2);
    match bent.shape {
        Shape::I(i) if bent.class < 3 => {
            let (hw, tw) = (i.h.mm() - 2.0 * i.tf.mm(), i.tw.mm());
            rho * hw * hw * tw / 4.0 / whole
        }
        _ => rho,
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::section::catalogue::{Lookup, LookupOptions, find};

    fn ipe_300() -> (Shape, Properties) {
        let Lookup::Found(row) = find("IPE 300", &LookupOptions::default()) else {
            panic!("IPE 300")
        };
        (row.shape, row.shape.properties().unwrap().unwrap())
    }

    fn knm(class: u8, kappa: Kappa, shear: Option<f64>, celsius: f64) -> f64 {
        let (shape, properties) = ipe_300();
        let bent = Bent {
            shape: &shape,
            properties: &properties,
            class,
            axis: Axis::Y,
            fy: Stress::from_mpa(275.0),
            gamma_m_fi: 1.0,
            gamma_m0: 1.0,
            shear: shear.map(Force::from_kn),
        };
        resistance(&bent, kappa, Temperature::from_celsius(celsius)).knm()
    }

    /// Wpl,y 628.4 cm³ and Wel,y 557.1 cm³ of IPE 300 as tables print them (memory), fy 275; products by hand.
    #[test]
    fn plastic_and_elastic() {
        let plain = Kappa::of(false, false, false);
        assert!((knm(1, plain, None, 20.0) - 172.81).abs() < 0.05);
        assert!((knm(3, plain, None, 20.0) - 153.20).abs() < 0.05);
        assert!((knm(1, plain, None, 600.0) - 81.22).abs() < 0.03);
    }

    /// By hand: 81.22/0.7 = 116.03, 81.22/(0.85 · 0.85) = 112.42; never above the resistance of 20 °C.
    #[test]
    fn kappa_raises_up_to_the_cold_resistance() {
        assert!((knm(1, Kappa::of(true, false, false), None, 600.0) - 116.03).abs() < 0.04);
        assert!((knm(1, Kappa::of(true, true, true), None, 600.0) - 112.42).abs() < 0.04);
        assert!((knm(1, Kappa::of(true, false, true), None, 400.0) - 172.81).abs() < 0.05);
    }

    /// By hand: VRd at 600 °C is 0.47 · 2568.2 · 275/√3 = 191.64 kN. For 150 kN ρ = 0.3199; the web has
    /// 278.6² · 7.1/4 = 137 772 mm³; 81.22 - 0.47 · 0.3199 · 137 772 · 275e-6 = 75.52 kNm.
    #[test]
    fn shear_above_half_the_resistance_takes_from_bending() {
        let plain = Kappa::of(false, false, false);
        assert_eq!(knm(1, plain, Some(95.0), 600.0), knm(1, plain, None, 600.0));
        let reduced = knm(1, plain, Some(150.0), 600.0);
        assert!((reduced - 75.52).abs() < 0.05, "{reduced}");
        assert_eq!(knm(1, plain, Some(200.0), 600.0), 0.0);
    }
}
