//! Tees, cut from I sections. The flange is at the top.

use super::error::{ShapeError, below, no_fit, not_negative, positive};
use super::i::taper;
use super::{Form, Kind};
use crate::section::geometry::Flange;
use crate::section::outline::{Corner, Outline};
use crate::units::Length;

/// A tee with a parallel flange (WT).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Tee {
    /// Depth, flange included.
    pub h: Length,
    /// Flange width.
    pub b: Length,
    /// Stem thickness.
    pub tw: Length,
    /// Flange thickness.
    pub tf: Length,
    /// Root radius.
    pub r: Length,
}

/// A tee with a taper flange (ST).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct TaperTee {
    /// Depth, flange included.
    pub h: Length,
    /// Flange width.
    pub b: Length,
    /// Stem thickness.
    pub tw: Length,
    /// Flange thickness, measured at `tf_at` from the flange tip.
    pub tf: Length,
    /// Root radius.
    pub r: Length,
    /// Toe radius.
    pub toe: Length,
    /// Slope of the inner face of the flange: 1/6 for S shapes.
    pub slope: f64,
    /// Distance from the flange tip to where `tf` is measured.
    pub tf_at: Length,
}

impl Tee {
    fn as_taper(&self) -> TaperTee {
        let zero = Length::from_mm(0.0);
        TaperTee {
            h: self.h,
            b: self.b,
            tw: self.tw,
            tf: self.tf,
            r: self.r,
            toe: zero,
            slope: 0.0,
            tf_at: zero,
        }
    }
}

impl TaperTee {
    fn thicknesses(&self) -> (f64, f64) {
        taper(self.tf, self.tf_at, self.slope, (self.b.mm() - self.tw.mm()) / 2.0)
    }
}

impl Form for Tee {
    fn name(&self) -> &'static str {
        "tee"
    }

    fn check(&self) -> Result<(), ShapeError> {
        self.as_taper().check()
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        self.as_taper().outer()
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Open)
    }

    fn flange(&self) -> Option<Flange> {
        self.as_taper().flange()
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![
            ("h", self.h.mm()),
            ("b", self.b.mm()),
            ("tw", self.tw.mm()),
            ("tf", self.tf.mm()),
            ("r", self.r.mm()),
        ]
    }
}

impl Form for TaperTee {
    fn name(&self) -> &'static str {
        "taper tee"
    }

    fn check(&self) -> Result<(), ShapeError> {
        for (name, value) in [("h", self.h), ("b", self.b), ("tw", self.tw), ("tf", self.tf)] {
            positive(name, value.mm())?;
        }
        not_negative("r", self.r.mm())?;
        not_negative("toe", self.toe.mm())?;
        not_negative("slope", self.slope)?;
        not_negative("tf at", self.tf_at.mm())?;
        below(
            "tw",
            self.tw.mm(),
            self.b.mm(),
            "the stem is thinner than the flange is wide",
        )?;
        let (tip, root) = self.thicknesses();
        positive("tf", tip)?;
        below("tf", root, self.h.mm(), "the flange must fit into the depth")
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let (tip, root) = self.thicknesses();
        let (h, b, w) = (self.h.mm(), self.b.mm() / 2.0, self.tw.mm() / 2.0);
        let (r, toe) = (self.r.mm(), self.toe.mm());
        let corners = [
            Corner::sharp(-w, 0.0),
            Corner::sharp(w, 0.0),
            Corner::round(w, h - root, r),
            Corner::round(b, h - tip, toe),
            Corner::sharp(b, h),
            Corner::sharp(-b, h),
            Corner::round(-b, h - tip, toe),
            Corner::round(-w, h - root, r),
        ];
        Outline::from_corners(&corners).map(Some).map_err(|_| no_fit("r"))
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Open)
    }

    fn flange(&self) -> Option<Flange> {
        Some(Flange {
            width: self.b,
            thickness: self.tf,
        })
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![
            ("h", self.h.mm()),
            ("b", self.b.mm()),
            ("tw", self.tw.mm()),
            ("tf", self.tf.mm()),
            ("r", self.r.mm()),
            ("toe", self.toe.mm()),
            ("tf at", self.tf_at.mm()),
            ("slope", self.slope),
        ]
    }
}
