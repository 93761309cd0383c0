//! Shear, EN 1993-1-2:2005 4.2.3.3 (4.16) and 4.2.3.4 (4.20) with the shear areas of EN 1993-1-1:2005 6.2.6 (3);
//! memory.

use crate::resistance::class::epsilon;
use crate::resistance::reduction::yield_factor;
use crate::section::{Properties, Shape};
use crate::units::{Area, Force, Stress, Temperature};

/// The clause of the equation.
pub const CLAUSE: &str = "EN 1993-1-2 4.2.3.3 (4.16), shear";

/// Av for shear parallel to z-z, along the web. None for stated figures and for angles, whose legs share shear in a way
/// that 6.2.6 (3) does not give.
///
/// η is 1, on the safe side. Taper flanges count with their nominal thickness.
#[must_use]
pub fn area(shape: &Shape, properties: &Properties) -> Option<Area> {
    let size = |name: &str| shape.dimension(name).map_or(0.0, |length| length.mm());
    let (h, b, tw, tf, r) = (size("h"), size("b"), size("tw"), size("tf"), size("r"));
    let whole = properties.area.mm2();
    let sheared = match shape {
        Shape::I(_) | Shape::TaperI(_) => (whole - 2.0 * b * tf + (tw + 2.0 * r) * tf).max((h - 2.0 * tf) * tw),
        Shape::Channel(_) | Shape::TaperChannel(_) => whole - 2.0 * b * tf + (tw + r) * tf,
        Shape::WeldedI(i) => (i.h.mm() - i.tf_top.mm() - i.tf_bottom.mm()) * tw,
        // A - b tf + (tw + 2r) tf/2 for rolled tees.
        Shape::Tee(_) | Shape::TaperTee(_) => whole - b * tf + (tw + 2.0 * r) * tf / 2.0,
        Shape::RectangularHollow(_) => whole * h / (b + h),
        Shape::CircularHollow(_) => 2.0 * whole / std::f64::consts::PI,
        // Elastic distribution, 6.2.6 (4): the peak is 3/2 and 4/3 of the mean.
        Shape::Flat(_) => whole / 1.5,
        Shape::Round(_) => whole * 0.75,
        Shape::Angle(_) | Shape::Stated(_) => return None,
    };
    Some(Area::from_mm2(sheared))
}

/// Whether the web can buckle in shear: hw/tw > 72 ε/η (EN 1993-1-1:2005 6.2.6 (6)), with η = 1 and the ε of fire.
#[must_use]
pub fn web_is_slender(shape: &Shape, fy: Stress) -> bool {
    let size = |name: &str| shape.dimension(name).map_or(0.0, |length| length.mm());
    let (h, tw, tf) = (size("h"), size("tw"), size("tf"));
    let (depth, thickness) = match shape {
        Shape::I(_) | Shape::TaperI(_) | Shape::Channel(_) | Shape::TaperChannel(_) => (h - 2.0 * tf, tw),
        Shape::WeldedI(i) => ((i.h.mm() - i.tf_top.mm() - i.tf_bottom.mm()), tw),
        Shape::Tee(_) | Shape::TaperTee(_) => (h - tf, tw),
        Shape::RectangularHollow(s) => (s.h.mm() - 2.0 * s.t.mm(), s.t.mm()),
        Shape::CircularHollow(_) | Shape::Angle(_) | Shape::Flat(_) | Shape::Round(_) | Shape::Stated(_) => {
            return false;
        }
    };
    depth > 72.0 * epsilon(fy) * thickness
}

/// Vfi,θ,Rd = ky,θ Av fy/√3/γM,fi.
#[must_use]
pub fn resistance(area: Area, fy: Stress, gamma_m_fi: f64, temperature: Temperature) -> Force {
    Force::from_kn(yield_factor(temperature) * area.mm2() * fy.mpa() / 3.0_f64.sqrt() / 1000.0 / gamma_m_fi)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::section::catalogue::{Lookup, LookupOptions, find};
    use crate::section::shape::{CircularHollow, RectangularHollow, WeldedI};
    use crate::units::Length;

    fn mm(value: f64) -> Length {
        Length::from_mm(value)
    }

    fn named(name: &str) -> Shape {
        match find(name, &LookupOptions::default()) {
            Lookup::Found(row) => row.shape,
            other => panic!("{name}: {other:?}"),
        }
    }

    fn sheared(shape: &Shape) -> f64 {
        let properties = shape.properties().unwrap().unwrap();
        area(shape, &properties).unwrap().mm2()
    }

    /// Computed by hand from the exact area 5381.2: A - 2·150·10.7 + (7.1 + 30)·10.7 = 2568.2 mm² (tables print 25.68 cm²,
    /// memory).
    #[test]
    fn rolled_i() {
        assert!((sheared(&named("IPE 300")) - 2568.2).abs() < 0.1);
        assert!(!web_is_slender(&named("IPE 300"), Stress::from_mpa(355.0)));
    }

    /// Computed by hand.
    #[test]
    fn other_shapes() {
        let girder = Shape::WeldedI(WeldedI {
            h: mm(1000.0),
            b_top: mm(300.0),
            tf_top: mm(20.0),
            b_bottom: mm(300.0),
            tf_bottom: mm(30.0),
            tw: mm(10.0),
            weld: mm(6.0),
        });
        assert!((sheared(&girder) - 9500.0).abs() < 1e-9);
        assert!(web_is_slender(&girder, Stress::from_mpa(355.0)));
        let square = Shape::RectangularHollow(RectangularHollow::hot_finished(mm(100.0), mm(100.0), mm(5.0)));
        let whole = square.properties().unwrap().unwrap().area.mm2();
        assert!((sheared(&square) - whole / 2.0).abs() < 1e-9);
        let tube = Shape::CircularHollow(CircularHollow {
            d: mm(100.0),
            t: mm(5.0),
        });
        // 2A/π with A = π · 95 · 5.
        assert!((sheared(&tube) - 950.0).abs() < 1e-6);
    }

    /// Computed by hand: 0.78 · 1000 mm² · 235 MPa/√3 = 105.83 kN.
    #[test]
    fn falls_with_ky() {
        let t = Temperature::from_celsius(500.0);
        let found = resistance(Area::from_mm2(1000.0), Stress::from_mpa(235.0), 1.0, t);
        assert!((found.kn() - 105.829).abs() < 1e-3);
    }
}
