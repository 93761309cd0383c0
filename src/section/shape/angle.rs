//! Angles. The leg b lies at the top, the leg h hangs at the left, so that the covered top is the leg against a slab.

use super::error::{ShapeError, below, no_fit, not_negative, positive};
use super::{Form, Kind};
use crate::section::outline::{Corner, Outline};
use crate::units::Length;

/// An angle (EN 10056-1, L shapes).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Angle {
    /// The standing leg.
    pub h: Length,
    /// The lying leg.
    pub b: Length,
    /// Thickness of both legs.
    pub t: Length,
    /// Root radius.
    pub root: Length,
    /// Toe radius.
    pub toe: Length,
}

impl Form for Angle {
    fn name(&self) -> &'static str {
        "angle"
    }

    fn check(&self) -> Result<(), ShapeError> {
        for (name, value) in [("h", self.h), ("b", self.b), ("t", self.t)] {
            positive(name, value.mm())?;
        }
        not_negative("r", self.root.mm())?;
        not_negative("toe", self.toe.mm())?;
        let shorter = self.h.mm().min(self.b.mm());
        below("t", self.t.mm(), shorter, "a leg is longer than it is thick")
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let (h, b, t) = (self.h.mm(), self.b.mm(), self.t.mm());
        let toe = self.toe.mm();
        let corners = [
            Corner::sharp(0.0, 0.0),
            Corner::round(t, 0.0, toe),
            Corner::round(t, h - t, self.root.mm()),
            Corner::round(b, h - t, toe),
            Corner::sharp(b, h),
            Corner::sharp(0.0, h),
        ];
        let name = if toe > t { "toe" } else { "r" };
        Outline::from_corners(&corners).map(Some).map_err(|_| no_fit(name))
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Open)
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![
            ("h", self.h.mm()),
            ("b", self.b.mm()),
            ("t", self.t.mm()),
            ("r", self.root.mm()),
            ("toe", self.toe.mm()),
        ]
    }
}
