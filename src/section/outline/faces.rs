//! From which faces of the enclosing box the fire reaches each piece of an outline.

use super::{Outline, Point, Segment};
use crate::section::exposure::{Face, Faces};

/// A point this near to the box lies on it, mm.
const TOUCH: f64 = 1e-5;

/// The outline, split by the set of faces of the enclosing box from which it is reached.
///
/// A piece that lies on a face is reached through that face. Between two places where the outline touches the box it
/// bounds a pocket; the pocket is reached through every face it opens to. The space between the flanges of an I opens
/// to one side, the space under a tee to a side and to the bottom.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct FaceLengths {
    by_set: [f64; 16],
    on_face: [f64; 4],
}

impl FaceLengths {
    /// Splits an outline.
    #[must_use]
    pub fn of(outline: &Outline) -> Self {
        let walk = Walk::new(outline);
        let mut lengths = Self {
            by_set: [0.0; 16],
            on_face: [0.0; 4],
        };
        let segments = outline.segments();
        let Some(first) = segments.iter().position(|s| walk.touches(s.from())) else {
            return lengths;
        };
        let mut run_from = 0.0;
        let mut run_length = 0.0;
        for segment in segments.iter().cycle().skip(first).take(segments.len()) {
            let (from, to, length) = (segment.from(), segment.to(), segment.length());
            let straight = matches!(segment, Segment::Line { .. }) && run_length == 0.0;
            if let Some(face) = walk.shared_face(from, to).filter(|_| straight) {
                lengths.by_set[usize::from(Faces::from(face).bits())] += length;
                lengths.on_face[face as usize] += length;
                continue;
            }
            if run_length == 0.0 {
                run_from = walk.way(from);
            }
            run_length += length;
            if walk.touches(to) {
                let set = walk.between(run_from, walk.way(to));
                lengths.by_set[usize::from(set.bits())] += run_length;
                run_length = 0.0;
            }
        }
        lengths
    }

    /// The length that the fire reaches when the `covered` faces are closed, mm: every piece that still has an open
    /// face.
    #[must_use]
    pub fn exposed(&self, covered: Faces) -> f64 {
        self.sum(|set| !set.without(covered).is_empty())
    }

    /// The length that lies on the face itself, mm.
    #[must_use]
    pub fn on(&self, face: Face) -> f64 {
        self.on_face[face as usize]
    }

    /// Whether a pocket is left in what the fire reaches: exposed outline that does not lie on the box.
    #[must_use]
    pub fn has_open_pocket(&self, covered: Faces) -> bool {
        let flat: f64 = Face::ALL
            .iter()
            .filter(|face| !covered.contains(**face))
            .map(|face| self.on(*face))
            .sum();
        self.exposed(covered) - flat > TOUCH
    }

    fn sum(&self, wanted: impl Fn(Faces) -> bool) -> f64 {
        (0_u8..16)
            .filter(|bits| wanted(Faces::from_bits(*bits)))
            .map(|bits| self.by_set[usize::from(bits)])
            .sum()
    }
}

/// Ways around the enclosing box, anticlockwise from its lower left corner.
struct Walk {
    origin: Point,
    width: f64,
    height: f64,
}

impl Walk {
    fn new(outline: &Outline) -> Self {
        let bounds = outline.bounds();
        Self {
            origin: bounds.min,
            width: bounds.width(),
            height: bounds.height(),
        }
    }

    fn lies_on(&self, p: Point, face: Face) -> bool {
        let gap = match face {
            Face::Bottom => p.y - self.origin.y,
            Face::Right => self.origin.x + self.width - p.x,
            Face::Top => self.origin.y + self.height - p.y,
            Face::Left => p.x - self.origin.x,
        };
        gap < TOUCH
    }

    fn touches(&self, p: Point) -> bool {
        Face::ALL.iter().any(|face| self.lies_on(p, *face))
    }

    fn shared_face(&self, from: Point, to: Point) -> Option<Face> {
        Face::ALL
            .into_iter()
            .find(|face| self.lies_on(from, *face) && self.lies_on(to, *face))
    }

    fn way(&self, p: Point) -> f64 {
        let (x, y) = (p.x - self.origin.x, p.y - self.origin.y);
        if self.lies_on(p, Face::Bottom) {
            x
        } else if self.lies_on(p, Face::Right) {
            self.width + y
        } else if self.lies_on(p, Face::Top) {
            2.0 * self.width + self.height - x
        } else {
            2.0 * (self.width + self.height) - y
        }
    }

    /// The faces passed between two ways, going anticlockwise.
    fn between(&self, from: f64, to: f64) -> Faces {
        let round = 2.0 * (self.width + self.height);
        let to = if to < from - TOUCH { to + round } else { to };
        let mut set = Faces::NONE;
        let mut at = 0.0;
        for lap in [Face::Bottom, Face::Right, Face::Top, Face::Left]
            .iter()
            .cycle()
            .take(8)
        {
            let length = match lap {
                Face::Bottom | Face::Top => self.width,
                Face::Left | Face::Right => self.height,
            };
            if to.min(at + length) - from.max(at) > TOUCH {
                set = set.with(*lap);
            }
            at += length;
        }
        // A piece too small to tell is taken as reached from everywhere.
        if set.is_empty() { Faces::ALL } else { set }
    }
}
