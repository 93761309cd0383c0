//! I and H sections: parallel flanges, taper flanges, and welded from plates.

use super::error::{HALF_DEPTH, ShapeError, above, below, no_fit, not_negative, positive};
use super::{Form, Kind};
use crate::section::geometry::Flange;
use crate::section::outline::{Corner, Outline};
use crate::units::Length;

/// A rolled I or H with parallel flanges (EN 10365, BS 4-1, W and HP shapes).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ParallelI {
    /// Depth.
    pub h: Length,
    /// Flange width.
    pub b: Length,
    /// Web thickness.
    pub tw: Length,
    /// Flange thickness.
    pub tf: Length,
    /// Root radius; zero for a shape without fillets.
    pub r: Length,
}

/// A rolled I with taper flanges (IPN, S shapes, ISMB).
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct TaperI {
    /// Depth.
    pub h: Length,
    /// Flange width.
    pub b: Length,
    /// Web thickness.
    pub tw: Length,
    /// Flange thickness, measured at `tf_at` from the flange tip.
    pub tf: Length,
    /// Root radius.
    pub r: Length,
    /// Toe radius.
    pub toe: Length,
    /// Slope of the inner face of the flange: 0.14 for 14 %.
    pub slope: f64,
    /// Distance from the flange tip to where `tf` is measured.
    pub tf_at: Length,
}

/// An I welded from three plates, the flanges not necessarily alike.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct WeldedI {
    /// Overall depth.
    pub h: Length,
    /// Width of the top flange.
    pub b_top: Length,
    /// Thickness of the top flange.
    pub tf_top: Length,
    /// Width of the bottom flange.
    pub b_bottom: Length,
    /// Thickness of the bottom flange.
    pub tf_bottom: Length,
    /// Web thickness.
    pub tw: Length,
    /// Leg length of the fillet welds between web and flanges, on both sides of the web; zero leaves them out.
    pub weld: Length,
}

/// A flange with its thickness at the tip and, extended to it, at the web, mm.
struct Plate {
    b: f64,
    tip: f64,
    root: f64,
}

fn outline(h: f64, tw: f64, top: &Plate, bottom: &Plate, r: f64, toe: f64) -> Result<Outline, ShapeError> {
    let (w, bt, bb) = (tw / 2.0, top.b / 2.0, bottom.b / 2.0);
    let corners = [
        Corner::sharp(-bb, 0.0),
        Corner::sharp(bb, 0.0),
        Corner::round(bb, bottom.tip, toe),
        Corner::round(w, bottom.root, r),
        Corner::round(w, h - top.root, r),
        Corner::round(bt, h - top.tip, toe),
        Corner::sharp(bt, h),
        Corner::sharp(-bt, h),
        Corner::round(-bt, h - top.tip, toe),
        Corner::round(-w, h - top.root, r),
        Corner::round(-w, bottom.root, r),
        Corner::round(-bb, bottom.tip, toe),
    ];
    Outline::from_corners(&corners).map_err(|_| no_fit("r"))
}

impl Form for ParallelI {
    fn name(&self) -> &'static str {
        "i"
    }

    fn check(&self) -> Result<(), ShapeError> {
        let Self { h, b, tw, tf, r } = *self;
        for (name, value) in [("h", h), ("b", b), ("tw", tw), ("tf", tf)] {
            positive(name, value.mm())?;
        }
        not_negative("r", r.mm())?;
        below("tw", tw.mm(), b.mm(), "the web is thinner than the flange is wide")?;
        below("tf", tf.mm(), h.mm() / 2.0, HALF_DEPTH)
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let flange = Plate {
            b: self.b.mm(),
            tip: self.tf.mm(),
            root: self.tf.mm(),
        };
        outline(self.h.mm(), self.tw.mm(), &flange, &flange, self.r.mm(), 0.0).map(Some)
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
        ]
    }
}

impl Form for TaperI {
    fn name(&self) -> &'static str {
        "taper i"
    }

    fn check(&self) -> Result<(), ShapeError> {
        let Self { h, b, tw, tf, .. } = *self;
        for (name, value) in [("h", h), ("b", b), ("tw", tw), ("tf", tf)] {
            positive(name, value.mm())?;
        }
        not_negative("r", self.r.mm())?;
        not_negative("toe", self.toe.mm())?;
        not_negative("slope", self.slope)?;
        not_negative("tf at", self.tf_at.mm())?;
        below("tw", tw.mm(), b.mm(), "the web is thinner than the flange is wide")?;
        let (tip, root) = self.thicknesses();
        positive("tf", tip)?;
        below("tf", root, h.mm() / 2.0, HALF_DEPTH)
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let (tip, root) = self.thicknesses();
        let b = self.b.mm();
        let flange = Plate { b, tip, root };
        outline(self.h.mm(), self.tw.mm(), &flange, &flange, self.r.mm(), self.toe.mm()).map(Some)
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

impl TaperI {
    /// The flange thickness at the tip and, extended to it, at the web, mm.
    fn thicknesses(&self) -> (f64, f64) {
        taper(self.tf, self.tf_at, self.slope, (self.b.mm() - self.tw.mm()) / 2.0)
    }
}

/// The thickness of a sloping flange at its tip and at the web, `outstand` mm from the tip.
pub(super) fn taper(tf: Length, tf_at: Length, slope: f64, outstand: f64) -> (f64, f64) {
    let tip = tf.mm() - slope * tf_at.mm();
    (tip, tip + slope * outstand)
}

impl WeldedI {
    fn plates(&self) -> [Plate; 2] {
        [(self.b_top, self.tf_top), (self.b_bottom, self.tf_bottom)].map(|(b, t)| Plate {
            b: b.mm(),
            tip: t.mm(),
            root: t.mm(),
        })
    }
}

impl Form for WeldedI {
    fn name(&self) -> &'static str {
        "welded i"
    }

    fn check(&self) -> Result<(), ShapeError> {
        let lengths = [
            ("h", self.h),
            ("b top", self.b_top),
            ("tf top", self.tf_top),
            ("b bottom", self.b_bottom),
            ("tf bottom", self.tf_bottom),
            ("tw", self.tw),
        ];
        for (name, value) in lengths {
            positive(name, value.mm())?;
        }
        not_negative("weld", self.weld.mm())?;
        let narrow = self.b_top.mm().min(self.b_bottom.mm());
        below(
            "tw",
            self.tw.mm(),
            narrow,
            "the web is thinner than either flange is wide",
        )?;
        let flanges = self.tf_top.mm() + self.tf_bottom.mm();
        above("h", self.h.mm(), flanges, "both flanges must fit into the depth")?;
        let room = ((narrow - self.tw.mm()) / 2.0).min((self.h.mm() - flanges) / 2.0);
        if self.weld.mm() > room {
            return Err(no_fit("weld"));
        }
        Ok(())
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        let [top, bottom] = self.plates();
        let (h, w, leg) = (self.h.mm(), self.tw.mm() / 2.0, self.weld.mm());
        if leg == 0.0 {
            return outline(h, self.tw.mm(), &top, &bottom, 0.0, 0.0).map(Some);
        }
        let (bt, bb) = (top.b / 2.0, bottom.b / 2.0);
        let right = [
            (bb, 0.0),
            (bb, bottom.tip),
            (w + leg, bottom.tip),
            (w, bottom.tip + leg),
            (w, h - top.tip - leg),
            (w + leg, h - top.tip),
            (bt, h - top.tip),
            (bt, h),
        ];
        let left = right.iter().rev().map(|(x, y)| (-x, *y));
        // A weld that reaches the flange tip makes two corners of one.
        let mut corners: Vec<Corner> = Vec::with_capacity(16);
        for (x, y) in right.into_iter().chain(left) {
            let corner = Corner::sharp(x, y);
            if corners.last() != Some(&corner) {
                corners.push(corner);
            }
        }
        Outline::from_corners(&corners).map(Some).map_err(|_| no_fit("weld"))
    }

    fn kind(&self) -> Option<Kind> {
        Some(Kind::Open)
    }

    /// The bottom flange: the one that a fire below reaches when the rest is built in.
    fn flange(&self) -> Option<Flange> {
        Some(Flange {
            width: self.b_bottom,
            thickness: self.tf_bottom,
        })
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        vec![
            ("h", self.h.mm()),
            ("b top", self.b_top.mm()),
            ("tf top", self.tf_top.mm()),
            ("b bottom", self.b_bottom.mm()),
            ("tf bottom", self.tf_bottom.mm()),
            ("tw", self.tw.mm()),
            ("weld", self.weld.mm()),
        ]
    }
}
