//! Centroid, second moments, moduli and radii of gyration.

use crate::section::outline::{Moments, Outline};
use crate::section::shape::{Shape, ShapeError};
use crate::units::{Area, Length};

/// Properties about the centroid. Axis y-y is horizontal, z-z vertical (EN 1993-1-1:2005 1.7); for an upright I they
/// are the strong and the weak axis.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Properties {
    /// Area of steel.
    pub area: Area,
    /// The centroid below the top of the section.
    pub centroid_from_top: Length,
    /// The centroid right of the left edge of the section.
    pub centroid_from_left: Length,
    /// Second moment of area about y-y, mm⁴.
    pub iy_mm4: f64,
    /// Second moment of area about z-z, mm⁴.
    pub iz_mm4: f64,
    /// Product moment of area ∫ y z dA, mm⁴, with z upwards and y to the right; zero for a symmetric section.
    pub iyz_mm4: f64,
    /// Largest second moment about any axis (u-u), mm⁴.
    pub iu_mm4: f64,
    /// Least second moment about any axis (v-v), mm⁴.
    pub iv_mm4: f64,
    /// Elastic modulus about y-y at the farther edge, mm³.
    pub wel_y_mm3: f64,
    /// Elastic modulus about z-z at the farther edge, mm³.
    pub wel_z_mm3: f64,
    /// Plastic modulus about the horizontal axis of equal areas, mm³.
    pub wpl_y_mm3: f64,
    /// Plastic modulus about the vertical axis of equal areas, mm³.
    pub wpl_z_mm3: f64,
}

impl Properties {
    /// Works out the properties of a shape; none for stated figures.
    ///
    /// # Errors
    /// When the dimensions are those of no possible section.
    pub fn of(shape: &Shape) -> Result<Option<Self>, ShapeError> {
        let (outer, hole) = shape.outlines()?;
        Ok(outer.map(|outer| Self::of_outlines(&outer, hole.as_ref())))
    }

    fn of_outlines(outer: &Outline, hole: Option<&Outline>) -> Self {
        let bounds = outer.bounds();
        let gross = outer.moments();
        let net = hole.map_or(gross, |hole| gross.plus(&hole.moments(), -1.0));
        let (x, y) = (net.x / net.area, net.y / net.area);
        let Moments { area, xx, yy, xy, .. } = net.moved(-x, -y);
        let mean = f64::midpoint(xx, yy);
        let radius = ((xx - yy) / 2.0).hypot(xy);
        let below = y - bounds.min.y;
        let left = x - bounds.min.x;
        let above = bounds.height() - below;
        let right = bounds.width() - left;
        let turned = (outer.turned(), hole.map(Outline::turned));
        Self {
            area: Area::from_mm2(area),
            centroid_from_top: Length::from_mm(above),
            centroid_from_left: Length::from_mm(left),
            iy_mm4: yy,
            iz_mm4: xx,
            iyz_mm4: xy,
            iu_mm4: mean + radius,
            iv_mm4: mean - radius,
            wel_y_mm3: yy / above.max(below),
            wel_z_mm3: xx / left.max(right),
            wpl_y_mm3: plastic_modulus(outer, hole),
            wpl_z_mm3: plastic_modulus(&turned.0, turned.1.as_ref()),
        }
    }

    /// Radius of gyration about y-y.
    #[must_use]
    pub fn radius_y(&self) -> Length {
        self.radius(self.iy_mm4)
    }

    /// Radius of gyration about z-z.
    #[must_use]
    pub fn radius_z(&self) -> Length {
        self.radius(self.iz_mm4)
    }

    /// Radius of gyration about v-v, the least: what buckling of an unrestrained strut goes by.
    #[must_use]
    pub fn radius_v(&self) -> Length {
        self.radius(self.iv_mm4)
    }

    fn radius(&self, second_moment: f64) -> Length {
        Length::from_mm((second_moment / self.area.mm2()).sqrt())
    }
}

/// The first moments of both halves about the horizontal line that halves the area, mm³.
fn plastic_modulus(outer: &Outline, hole: Option<&Outline>) -> f64 {
    let above = |level: f64| {
        let mut part = outer.above(level);
        if let Some(hole) = hole {
            let cut = hole.above(level);
            part.area -= cut.area;
            part.moment -= cut.moment;
        }
        part
    };
    let bounds = outer.bounds();
    let (mut low, mut high) = (bounds.min.y, bounds.max.y);
    let base = low;
    let whole = above(low);
    let half = whole.area / 2.0;
    // What is above a level beyond the half: falling with the level, kinked where the width jumps.
    let (mut below, mut beyond) = (half, -half);
    let mut level = f64::midpoint(low, high);
    let mut upper = above(level);
    // The modulus is flat about the line of equal areas, so that a line this near gives it to the last digits.
    for _ in 0..60 {
        let excess = upper.area - half;
        if excess.abs() <= 1e-9 * half || high - low <= 1e-12 * (bounds.max.y - base) {
            break;
        }
        if excess > 0.0 {
            (low, below) = (level, excess);
        } else {
            (high, beyond) = (level, excess);
        }
        // A secant held well inside the bracket.
        let share = (below / (below - beyond)).clamp(0.1, 0.9);
        level = low + share * (high - low);
        upper = above(level);
    }
    // The whole about the line is the upper moment less the lower one.
    let about_line = whole.moment - whole.area * (level - base);
    2.0 * upper.moment - about_line
}
