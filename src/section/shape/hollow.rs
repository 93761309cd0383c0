//! Hollow sections. Only the outer outline is heated.

use super::error::{ShapeError, below, no_fit, not_negative, positive};
use super::{Form, Kind};
use crate::section::outline::{Corner, Outline, Point};
use crate::units::Length;

/// Why a wall must stay below half the width.
const HALF_WIDTH: &str = "a hollow section has two walls, so each is thinner than half of it";

/// A square or rectangular hollow section.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct RectangularHollow {
    /// Depth.
    pub h: Length,
    /// Width.
    pub b: Length,
    /// Wall thickness.
    pub t: Length,
    /// Outer corner radius.
    pub ro: Length,
    /// Inner corner radius.
    pub ri: Length,
}

/// A circular hollow section.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct CircularHollow {
    /// Outside diameter.
    pub d: Length,
    /// Wall thickness.
    pub t: Length,
}

impl RectangularHollow {
    /// A hot finished section with the corner radii for calculation of EN 10210-2:2006 Annex A: outer 1.5 t, inner t.
    #[must_use]
    pub const fn hot_finished(h: Length, b: Length, t: Length) -> Self {
        let (ro, ri) = (Length::from_mm(1.5 * t.mm()), t);
        Self { h, b, t, ro, ri }
    }
}

/// A rectangle about the origin with rounded corners.
pub(super) fn rectangle(h: f64, b: f64, r: f64, radius: &'static str) -> Result<Outline, ShapeError> {
    let (x, y) = (b / 2.0, h / 2.0);
    let corners = [(-x, -y), (x, -y), (x, y), (-x, y)].map(|(x, y)| Corner::round(x, y, r));
    Outline::from_corners(&corners).map_err(|_| no_fit(radius))
}

impl Form for RectangularHollow {
    fn name(&self) -> &'static str {
        "rectangular hollow"
    }

    fn check(&self) -> Result<(), ShapeError> {
        for (name, value) in [("h", self.h), ("b", self.b), ("t", self.t)] {
            positive(name, value.mm())?;
        }
        not_negative("ro", self.ro.mm())?;
        not_negative("ri", self.ri.mm())?;
        let narrow = self.h.mm().min(self.b.mm());
        below("t", self.t.mm(), narrow / 2.0, HALF_WIDTH)?;
        // The inner corner must stay within the outer one: their centres lie on the diagonal.
        let (ro, ri, t) = (self.ro.mm(), self.ri.mm(), self.t.mm());
        let thinnest = std::f64::consts::SQRT_2 * t - (std::f64::consts::SQRT_2 - 1.0) * (ro - ri);
        if thinnest <= 0.0 {
            return Err(no_fit("ro"));
        }
        Ok(())
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        rectangle(self.h.mm(), self.b.mm(), self.ro.mm(), "ro").map(Some)
    }

    fn hole(&self) -> Result<Option<Outline>, ShapeError> {
        let (h, b, t) = (self.h.mm(), self.b.mm(), self.t.mm());
        rectangle(h - 2.0 * t, b - 2.0 * t, self.ri.mm(), "ri").map(Some)
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::RectangularHollow)
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![
            ("h", self.h.mm()),
            ("b", self.b.mm()),
            ("t", self.t.mm()),
            ("ro", self.ro.mm()),
            ("ri", self.ri.mm()),
        ]
    }
}

impl Form for CircularHollow {
    fn name(&self) -> &'static str {
        "circular hollow"
    }

    fn check(&self) -> Result<(), ShapeError> {
        positive("d", self.d.mm())?;
        positive("t", self.t.mm())?;
        below("t", self.t.mm(), self.d.mm() / 2.0, HALF_WIDTH)
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        Ok(Some(Outline::circle(Point { x: 0.0, y: 0.0 }, self.d.mm() / 2.0)))
    }

    fn hole(&self) -> Result<Option<Outline>, ShapeError> {
        let radius = self.d.mm() / 2.0 - self.t.mm();
        Ok(Some(Outline::circle(Point { x: 0.0, y: 0.0 }, radius)))
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::CircularHollow)
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![("d", self.d.mm()), ("t", self.t.mm())]
    }
}
