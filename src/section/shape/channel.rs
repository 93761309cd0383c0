//! Channels, parallel and taper flanges. The web stands at the left.

use super::error::{HALF_DEPTH, ShapeError, below, no_fit, not_negative, positive};
use super::i::taper;
use super::{Form, Kind};
use crate::section::geometry::Flange;
use crate::section::outline::{Corner, Outline};
use crate::units::Length;

/// A channel with parallel flanges (UPE, PFC).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Channel {
    /// Depth.
    pub h: Length,
    /// Flange width, web included.
    pub b: Length,
    /// Web thickness.
    pub tw: Length,
    /// Flange thickness.
    pub tf: Length,
    /// Root radius.
    pub r: Length,
}

/// A channel with taper flanges (UPN, C and MC shapes, ISMC).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct TaperChannel {
    /// Depth.
    pub h: Length,
    /// Flange width, web included.
    pub b: Length,
    /// Web thickness.
    pub tw: Length,
    /// Flange thickness, measured at `tf_at` from the flange tip.
    pub tf: Length,
    /// Root radius.
    pub r: Length,
    /// Toe radius.
    pub toe: Length,
    /// Slope of the inner face of the flange: 0.08 for 8 %.
    pub slope: f64,
    /// Distance from the flange tip to where `tf` is measured.
    pub tf_at: Length,
}

impl Channel {
    fn as_taper(&self) -> TaperChannel {
        let zero = Length::from_mm(0.0);
        TaperChannel {
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

impl TaperChannel {
    /// The flange thickness at the tip and, extended to it, at the web, mm.
    fn thicknesses(&self) -> (f64, f64) {
        taper(self.tf, self.tf_at, self.slope, self.b.mm() - self.tw.mm())
    }
}

impl Form for Channel {
    fn name(&self) -> &'static str {
        "channel"
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

impl Form for TaperChannel {
    fn name(&self) -> &'static str {
        "taper channel"
    }

    fn check(&self) -> Result<(), ShapeError> {
        for (name, value) in [("h", self.h), ("b", self.b), ("tw", self.tw), ("tf", self.tf)] {
            positive(name, value.mm())?;
        }
        not_negative("r", self.r.mm())?;
        not_negative("toe", self.toe.mm())?;
        not_negative("slope", self.slope)?;
        not_negative("tf at", self.tf_at.mm())?;
        below("tw", self.tw.mm(), self.b.mm(), "the flange width includes the web")?;
        let (tip, root) = self.thicknesses();
        positive("tf", tip)?;
        below("tf", root, self.h.mm() / 2.0, HALF_DEPTH)
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let (tip, root) = self.thicknesses();
        let (h, b, tw) = (self.h.mm(), self.b.mm(), self.tw.mm());
        let (r, toe) = (self.r.mm(), self.toe.mm());
        let corners = [
            Corner::sharp(0.0, 0.0),
            Corner::sharp(b, 0.0),
            Corner::round(b, tip, toe),
            Corner::round(tw, root, r),
            Corner::round(tw, h - root, r),
            Corner::round(b, h - tip, toe),
            Corner::sharp(b, h),
            Corner::sharp(0.0, h),
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
