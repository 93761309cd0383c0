//! Solid bars: flats and rounds.

use super::error::{ShapeError, positive};
use super::hollow::rectangle;
use super::{Form, Kind};
use crate::section::outline::{Outline, Point};
use crate::units::Length;

/// A flat bar or plate, lying: b wide, t high.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Flat {
    /// Width.
    pub b: Length,
    /// Thickness.
    pub t: Length,
}

/// A round bar.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Round {
    /// Diameter.
    pub d: Length,
}

impl Form for Flat {
    fn name(&self) -> &'static str {
        "flat"
    }

    fn check(&self) -> Result<(), ShapeError> {
        positive("b", self.b.mm())?;
        positive("t", self.t.mm())
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        rectangle(self.t.mm(), self.b.mm(), 0.0, "b").map(Some)
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Solid)
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![("b", self.b.mm()), ("t", self.t.mm())]
    }
}

impl Form for Round {
    fn name(&self) -> &'static str {
        "round"
    }

    fn check(&self) -> Result<(), ShapeError> {
        positive("d", self.d.mm())
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        Ok(Some(Outline::circle(Point { x: 0.0, y: 0.0 }, self.d.mm() / 2.0)))
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Solid)
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![("d", self.d.mm())]
    }
}
