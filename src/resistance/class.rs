//! Cross-section class in fire: ε = 0.85 √(235/fy) (EN 1993-1-2:2005 (4.2)) with the limits of EN 1993-1-1:2005
//! Table 5.2 (from memory).

use crate::section::Shape;
use crate::units::Stress;

/// What the section is stressed by.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Action {
    /// Pure compression.
    Compression,
    /// Bending about the strong axis.
    Bending,
}

/// A class with the part that sets it.
#[derive(Debug, Clone, PartialEq)]
pub struct Classified {
    /// 1 to 4.
    pub class: u8,
    /// The governing part with its numbers.
    pub governing: String,
}

/// Limits of c/t over ε for classes 1, 2 and 3.
const INTERNAL_COMPRESSION: [f64; 3] = [33.0, 38.0, 42.0];
const INTERNAL_BENDING: [f64; 3] = [72.0, 83.0, 124.0];
const OUTSTAND: [f64; 3] = [9.0, 10.0, 14.0];

/// ε in fire, EN 1993-1-2:2005 (4.2).
#[must_use]
pub fn epsilon(fy: Stress) -> f64 {
    0.85 * (235.0 / fy.mpa()).sqrt()
}

/// The class of a section; `None` for shapes whose parts are not known (stated figures).
#[must_use]
pub fn classify(shape: &Shape, fy: Stress, action: Action) -> Option<Classified> {
    let e = epsilon(fy);
    let size = |name: &str| shape.dimension(name).map_or(0.0, |length| length.mm());
    let part = |name: &str, ratio: f64, limits: [f64; 3]| {
        let class = limits
            .iter()
            .position(|limit| ratio <= limit * e)
            .map_or(4, |at| at as u8 + 1);
        let bound = limits[usize::from(class.clamp(1, 3)) - 1];
        let sign = if class == 4 { ">" } else { "≤" };
        Classified {
            class,
            governing: format!("{name} c/t {ratio:.1} {sign} {bound}ε = {:.1}", bound * e),
        }
    };
    let internal = if action == Action::Compression {
        INTERNAL_COMPRESSION
    } else {
        INTERNAL_BENDING
    };
    let worst = |parts: Vec<Classified>| parts.into_iter().max_by_key(|part| part.class);
    match shape {
        Shape::I(_) | Shape::TaperI(_) => {
            let (h, b, tw, tf, r) = (size("h"), size("b"), size("tw"), size("tf"), size("r"));
            worst(vec![
                part("flange", ((b - tw) / 2.0 - r) / tf, OUTSTAND),
                part("web", (h - 2.0 * tf - 2.0 * r) / tw, internal),
            ])
        }
        Shape::WeldedI(i) => {
            let (tw, weld) = (i.tw.mm(), i.weld.mm());
            worst(vec![
                part("flange", ((i.b_top.mm() - tw) / 2.0 - weld) / i.tf_top.mm(), OUTSTAND),
                part(
                    "flange",
                    ((i.b_bottom.mm() - tw) / 2.0 - weld) / i.tf_bottom.mm(),
                    OUTSTAND,
                ),
                part(
                    "web",
                    (i.h.mm() - i.tf_top.mm() - i.tf_bottom.mm() - 2.0 * weld) / tw,
                    internal,
                ),
            ])
        }
        Shape::Channel(_) | Shape::TaperChannel(_) => {
            let (h, b, tw, tf, r) = (size("h"), size("b"), size("tw"), size("tf"), size("r"));
            worst(vec![
                part("flange", (b - tw - r) / tf, OUTSTAND),
                part("web", (h - 2.0 * tf - 2.0 * r) / tw, internal),
            ])
        }
        Shape::RectangularHollow(s) => {
            let (h, b, t) = (s.h.mm(), s.b.mm(), s.t.mm());
            worst(vec![
                part("flange", (b - 3.0 * t) / t, INTERNAL_COMPRESSION),
                part("web", (h - 3.0 * t) / t, internal),
            ])
        }
        Shape::CircularHollow(s) => {
            // Table 5.2 sheet 3 counts with ε², here that of fire.
            let ratio = s.d.mm() / s.t.mm();
            let limits = [50.0, 70.0, 90.0].map(|limit| limit * e);
            Some(part("wall", ratio, limits))
        }
        Shape::Angle(a) => {
            let (h, b, t) = (a.h.mm(), a.b.mm(), a.t.mm());
            let class = if h.max(b) / t <= 15.0 * e && (h + b) / (2.0 * t) <= 11.5 * e {
                3
            } else {
                4
            };
            let governing = format!("leg h/t {:.1} against 15ε = {:.1}", h.max(b) / t, 15.0 * e);
            Some(Classified { class, governing })
        }
        Shape::Tee(_) | Shape::TaperTee(_) => {
            let (h, b, tw, tf, r) = (size("h"), size("b"), size("tw"), size("tf"), size("r"));
            worst(vec![
                part("flange", ((b - tw) / 2.0 - r) / tf, OUTSTAND),
                part("stem", (h - tf - r) / tw, OUTSTAND),
            ])
        }
        Shape::Flat(_) | Shape::Round(_) => Some(Classified {
            class: 1,
            governing: "solid".to_owned(),
        }),
        Shape::Stated(_) => None,
    }
}
