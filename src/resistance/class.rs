//! Cross-section class in fire: the limits of EN 1993-1-1:2005 Table 5.2 with ε = 0.85 √(235/fy) of EN 1993-1-2:2005
//! (4.2). Source: memory.

use crate::section::Shape;
use crate::section::shape::WeldedI;
use crate::units::Stress;

/// What the section is stressed by.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Action {
    /// Pure compression.
    Compression,
    /// Bending about y-y, either way up.
    Bending,
    /// Bending about z-z, either way.
    BendingMinor,
    /// Pure tension: no part is in compression, so there is no class.
    Tension,
}

/// A class with the part that sets it.
#[derive(Debug, Clone, PartialEq)]
pub struct Classified {
    /// 1 to 4.
    pub class: u8,
    /// The governing part with its numbers: `web c/t 37.3 > 42ε = 29.0`.
    pub governing: String,
}

/// Internal parts in uniform compression, Table 5.2 sheet 1: limits of c/t over ε for classes 1, 2 and 3.
const INTERNAL: [f64; 3] = [33.0, 38.0, 42.0];
/// Internal parts in bending about mid-depth, sheet 1.
const INTERNAL_BENT: [f64; 3] = [72.0, 83.0, 124.0];
/// Outstand flanges in uniform compression, sheet 2; on the safe side for any other stress.
const OUTSTAND: [f64; 3] = [9.0, 10.0, 14.0];

/// ε in fire, EN 1993-1-2:2005 (4.2): 0.85 √(235/fy).
#[must_use]
pub fn epsilon(fy: Stress) -> f64 {
    0.85 * (235.0 / fy.mpa()).sqrt()
}

/// A part of a section with its limits.
struct Part {
    /// Part and ratio: `web c/t`.
    name: &'static str,
    ratio: f64,
    limits: [f64; 3],
}

/// Makes a part of a width and a thickness in mm.
fn part(name: &'static str, width: f64, thickness: f64, limits: [f64; 3]) -> Part {
    Part {
        name,
        ratio: width.max(0.0) / thickness,
        limits,
    }
}

impl Part {
    /// The class, and how much of the limit of that class (of class 3 in class 4) is used.
    fn class(&self, unit: f64) -> (u8, f64) {
        let within = |limit: f64| self.ratio <= limit * unit;
        let class = match self.limits {
            [first, ..] if within(first) => 1,
            [_, second, _] if within(second) => 2,
            [.., third] if within(third) => 3,
            _ => 4,
        };
        (class, self.ratio / (self.limit(class) * unit))
    }

    fn limit(&self, class: u8) -> f64 {
        let [first, second, third] = self.limits;
        match class {
            1 => first,
            2 => second,
            _ => third,
        }
    }

    fn classified(&self, unit: f64, unit_name: &str) -> Classified {
        let (class, _) = self.class(unit);
        let limit = self.limit(class);
        let sign = if class == 4 { ">" } else { "≤" };
        let shown = (limit * 10.0).round() / 10.0;
        Classified {
            class,
            governing: format!(
                "{} {:.1} {sign} {shown}{unit_name} = {:.1}",
                self.name,
                self.ratio,
                limit * unit
            ),
        }
    }
}

/// The worst part: of the highest class, and among equals the nearest to its limit.
fn worst(parts: &[Part], unit: f64, unit_name: &str) -> Option<Classified> {
    parts
        .iter()
        .max_by(|a, b| {
            let (a, b) = (a.class(unit), b.class(unit));
            a.0.cmp(&b.0).then(a.1.total_cmp(&b.1))
        })
        .map(|part| part.classified(unit, unit_name))
}

/// The class of a section for a yield strength.
///
/// None in tension, and for stated figures, whose parts are not known. Widths c are those between fillets or welds; of
/// hollow sections between corners, of outer radius at most 1.5 t. The stem of a tee and the legs of an angle are taken
/// as compressed throughout, which is on the safe side in bending. A taper flange counts with its nominal thickness.
#[must_use]
pub fn classify(shape: &Shape, fy: Stress, action: Action) -> Option<Classified> {
    if action == Action::Tension {
        return None;
    }
    let e = epsilon(fy);
    let size = |name: &str| shape.dimension(name).map_or(0.0, |length| length.mm());
    let (h, b, tw, tf, r) = (size("h"), size("b"), size("tw"), size("tf"), size("r"));
    let mut parts = Vec::with_capacity(3);
    match shape {
        Shape::I(_) | Shape::TaperI(_) => {
            parts.push(part("flange c/t", (b - tw) / 2.0 - r, tf, OUTSTAND));
            parts.extend(web("web c/t", h - 2.0 * tf - 2.0 * r, tw, action));
        }
        Shape::WeldedI(i) => welded(i, shape, action, &mut parts),
        Shape::Channel(_) | Shape::TaperChannel(_) => {
            parts.push(part("flange c/t", b - tw - r, tf, OUTSTAND));
            let depth = h - 2.0 * tf - 2.0 * r;
            // Bent about z-z the web is an edge of the section, and compressed one way round.
            parts.push(match action {
                Action::Bending => part("web c/t", depth, tw, INTERNAL_BENT),
                _ => part("web c/t", depth, tw, INTERNAL),
            });
        }
        Shape::RectangularHollow(s) => {
            let t = s.t.mm();
            let corners = 2.0 * s.ro.mm().min(1.5 * t);
            let (across, along) = match action {
                Action::Bending => (INTERNAL, INTERNAL_BENT),
                Action::BendingMinor => (INTERNAL_BENT, INTERNAL),
                _ => (INTERNAL, INTERNAL),
            };
            parts.push(part("flange c/t", s.b.mm() - corners, t, across));
            parts.push(part("web c/t", s.h.mm() - corners, t, along));
        }
        Shape::CircularHollow(s) => {
            // Sheet 3 counts with ε².
            let wall = part("wall d/t", s.d.mm(), s.t.mm(), [50.0, 70.0, 90.0]);
            return Some(wall.classified(e * e, "ε²"));
        }
        Shape::Angle(a) => {
            let (long, short, t) = (a.h.mm().max(a.b.mm()), a.h.mm().min(a.b.mm()), a.t.mm());
            if action == Action::Compression {
                // Sheet 3 knows class 3 only.
                parts.push(part("leg h/t", long, t, [0.0, 0.0, 15.0]));
                parts.push(part("legs (b + h)/2t", f64::midpoint(long, short), t, [0.0, 0.0, 11.5]));
            } else {
                parts.push(part("leg c/t", long, t, OUTSTAND));
            }
        }
        Shape::Tee(_) | Shape::TaperTee(_) => {
            parts.push(part("flange c/t", (b - tw) / 2.0 - r, tf, OUTSTAND));
            // Bent about z-z the stem lies on the neutral axis.
            if action != Action::BendingMinor {
                parts.push(part("stem c/t", h - tf - r, tw, OUTSTAND));
            }
        }
        Shape::Flat(_) | Shape::Round(_) => {
            return Some(Classified {
                class: 1,
                governing: "solid".to_owned(),
            });
        }
        Shape::Stated(_) => return None,
    }
    worst(&parts, e, "ε")
}

/// The web of a section that is symmetric about y-y; bent about z-z it lies on the neutral axis.
fn web(name: &'static str, depth: f64, thickness: f64, action: Action) -> Option<Part> {
    match action {
        Action::Compression => Some(part(name, depth, thickness, INTERNAL)),
        Action::Bending => Some(part(name, depth, thickness, INTERNAL_BENT)),
        Action::BendingMinor | Action::Tension => None,
    }
}

/// The parts of a welded I. With unlike flanges the neutral axes leave mid-depth, and the limits of the web follow from
/// where they are (sheet 1, bending and compression), the worse way up.
fn welded(i: &WeldedI, shape: &Shape, action: Action, parts: &mut Vec<Part>) {
    let (h, tw, weld) = (i.h.mm(), i.tw.mm(), i.weld.mm());
    let (top, bottom) = (i.tf_top.mm(), i.tf_bottom.mm());
    let outstand = |b: f64, tf: f64| part("flange c/t", (b - tw) / 2.0 - weld, tf, OUTSTAND);
    parts.push(outstand(i.b_top.mm(), top));
    parts.push(outstand(i.b_bottom.mm(), bottom));
    let depth = h - top - bottom - 2.0 * weld;
    let alike = i.b_top == i.b_bottom && i.tf_top == i.tf_bottom;
    if alike || action != Action::Bending {
        parts.extend(web("web c/t", depth, tw, action));
        return;
    }
    let clear = h - top - bottom;
    // Plastic: the line that halves the area, as a share of the web from its top.
    let (upper, lower) = (i.b_top.mm() * top, i.b_bottom.mm() * bottom);
    let share = ((clear * tw + lower - upper) / (2.0 * tw) / clear).clamp(0.0, 1.0);
    let centroid = match shape.properties() {
        Ok(Some(properties)) => properties.centroid_from_top.mm(),
        _ => h / 2.0,
    };
    let (above, below) = (centroid - top - weld, h - bottom - weld - centroid);
    for (alpha, compressed, tensioned) in [(share, above, below), (1.0 - share, below, above)] {
        if compressed <= 0.0 {
            continue;
        }
        parts.push(part("web c/t", depth, tw, bent_web(alpha, -tensioned / compressed)));
    }
}

/// Limits over ε of an internal part in bending and compression, sheet 1: α is the share in compression of the plastic
/// stresses, ψ the ratio of the elastic ones, compression positive.
fn bent_web(alpha: f64, psi: f64) -> [f64; 3] {
    let (first, second) = if alpha > 0.5 {
        (396.0 / (13.0 * alpha - 1.0), 456.0 / (13.0 * alpha - 1.0))
    } else if alpha > 0.0 {
        (36.0 / alpha, 41.5 / alpha)
    } else {
        (f64::INFINITY, f64::INFINITY)
    };
    let third = if psi > -1.0 {
        42.0 / (0.67 + 0.33 * psi)
    } else {
        62.0 * (1.0 - psi) * (-psi).sqrt()
    };
    [first, second, third]
}

#[cfg(test)]
mod tests;
