//! Integrals over the area within an outline, in closed form.
//!
//! A line from p to q stands for the triangle with the origin. An arc stands for the two triangles of the origin with
//! its centre and its ends, and the sector about its centre. Summed with their signs they are the area within.

use super::{Outline, Point, Segment};

/// Area, first and second moments about the axes of the coordinates.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Moments {
    /// ∫ dA, mm².
    pub area: f64,
    /// ∫ x dA, mm³.
    pub x: f64,
    /// ∫ y dA, mm³.
    pub y: f64,
    /// ∫ x² dA, mm⁴.
    pub xx: f64,
    /// ∫ y² dA, mm⁴.
    pub yy: f64,
    /// ∫ x y dA, mm⁴.
    pub xy: f64,
}

impl Moments {
    fn triangle(p: Point, q: Point) -> Self {
        let cross = p.x * q.y - q.x * p.y;
        Self {
            area: cross / 2.0,
            x: cross * (p.x + q.x) / 6.0,
            y: cross * (p.y + q.y) / 6.0,
            xx: cross * (p.x * p.x + p.x * q.x + q.x * q.x) / 12.0,
            yy: cross * (p.y * p.y + p.y * q.y + q.y * q.y) / 12.0,
            xy: cross * (2.0 * p.x * p.y + p.x * q.y + q.x * p.y + 2.0 * q.x * q.y) / 24.0,
        }
    }

    fn sector(centre: Point, radius: f64, start: f64, sweep: f64) -> Self {
        let (s0, c0) = start.sin_cos();
        let (s1, c1) = (start + sweep).sin_cos();
        let double = (s1 * c1 - s0 * c0) / 2.0;
        let (r3, r4) = (radius.powi(3) / 3.0, radius.powi(4) / 4.0);
        Self {
            area: radius * radius * sweep / 2.0,
            x: r3 * (s1 - s0),
            y: r3 * (c0 - c1),
            xx: r4 * (sweep / 2.0 + double),
            yy: r4 * (sweep / 2.0 - double),
            xy: r4 * (s1 * s1 - s0 * s0) / 2.0,
        }
        .moved(centre.x, centre.y)
    }

    /// The same area moved by (dx, dy).
    #[must_use]
    pub fn moved(&self, dx: f64, dy: f64) -> Self {
        Self {
            area: self.area,
            x: self.x + dx * self.area,
            y: self.y + dy * self.area,
            xx: self.xx + 2.0 * dx * self.x + dx * dx * self.area,
            yy: self.yy + 2.0 * dy * self.y + dy * dy * self.area,
            xy: self.xy + dx * self.y + dy * self.x + dx * dy * self.area,
        }
    }

    /// This area and `factor` times the other (-1 cuts a hole).
    #[must_use]
    pub fn plus(&self, other: &Self, factor: f64) -> Self {
        Self {
            area: self.area + factor * other.area,
            x: self.x + factor * other.x,
            y: self.y + factor * other.y,
            xx: self.xx + factor * other.xx,
            yy: self.yy + factor * other.yy,
            xy: self.xy + factor * other.xy,
        }
    }
}

/// The part of an area above a horizontal line.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct AboveLine {
    /// Its area, mm².
    pub area: f64,
    /// Its first moment about the line, mm³.
    pub moment: f64,
}

impl Outline {
    /// Area and moments of the area within.
    #[must_use]
    pub fn moments(&self) -> Moments {
        self.segments
            .iter()
            .fold(Moments::default(), |sum, segment| match *segment {
                Segment::Line { from, to } => sum.plus(&Moments::triangle(from, to), 1.0),
                Segment::Arc {
                    centre,
                    radius,
                    start,
                    sweep,
                } => sum
                    .plus(&Moments::triangle(segment.from(), centre), 1.0)
                    .plus(&Moments::triangle(centre, segment.to()), 1.0)
                    .plus(&Moments::sector(centre, radius, start, sweep), 1.0),
            })
    }

    /// The part of the area within that lies above y = `level`.
    ///
    /// By Green's theorem area and first moment are ∮ -y dx and ∮ -y²/2 dx with y counted from the line: the piece of
    /// the line that closes the part adds nothing, so only the pieces of the outline above it are summed.
    #[must_use]
    pub fn above(&self, level: f64) -> AboveLine {
        let mut sum = AboveLine::default();
        for segment in &self.segments {
            match *segment {
                Segment::Line { from, to } => add_line(&mut sum, from, to, level),
                Segment::Arc {
                    centre,
                    radius,
                    start,
                    sweep,
                } => add_arc(&mut sum, centre.y - level, radius, start, sweep),
            }
        }
        sum
    }
}

fn add_line(sum: &mut AboveLine, from: Point, to: Point, level: f64) {
    let (mut x0, mut y0, mut x1, mut y1) = (from.x, from.y - level, to.x, to.y - level);
    if y0 <= 0.0 && y1 <= 0.0 {
        return;
    }
    if y0 < 0.0 {
        x0 -= y0 * (x1 - x0) / (y1 - y0);
        y0 = 0.0;
    } else if y1 < 0.0 {
        x1 -= y1 * (x1 - x0) / (y1 - y0);
        y1 = 0.0;
    }
    let dx = x1 - x0;
    sum.area -= dx * (y0 + y1) / 2.0;
    sum.moment -= dx * (y0 * y0 + y0 * y1 + y1 * y1) / 6.0;
}

/// Adds the pieces of the arc that lie above the line, `height` being that of its centre.
fn add_arc(sum: &mut AboveLine, height: f64, radius: f64, start: f64, sweep: f64) {
    let sine = -height / radius;
    let mut cuts = vec![0.0, sweep];
    if sine.abs() < 1.0 {
        let (low, high) = (sweep.min(0.0), sweep.max(0.0));
        for base in [sine.asin(), std::f64::consts::PI - sine.asin()] {
            let turn = std::f64::consts::TAU;
            let mut at = base - start + ((low - base + start) / turn).ceil() * turn;
            while at < high {
                cuts.push(at);
                at += turn;
            }
        }
        cuts.sort_by(f64::total_cmp);
        if sweep < 0.0 {
            cuts.reverse();
        }
    }
    for pair in cuts.windows(2) {
        let (a, b) = (start + pair[0], start + pair[1]);
        if height + radius * f64::midpoint(a, b).sin() <= 0.0 {
            continue;
        }
        let ((s0, c0), (s1, c1)) = (a.sin_cos(), b.sin_cos());
        // ∫ sin, ∫ sin² and ∫ sin³ from a to b.
        let one = c0 - c1;
        let two = (b - a) / 2.0 - (s1 * c1 - s0 * c0) / 2.0;
        let three = one - (c0.powi(3) - c1.powi(3)) / 3.0;
        sum.area += radius * (height * one + radius * two);
        sum.moment += radius / 2.0 * (height * height * one + 2.0 * height * radius * two + radius * radius * three);
    }
}
