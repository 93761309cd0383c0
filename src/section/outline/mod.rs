//! Closed outlines of straight lines and circular arcs.

mod faces;
mod integrals;

pub use faces::FaceLengths;
pub use integrals::{AboveLine, Moments};

/// A point of a cross-section in mm: x to the right, y upwards.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Point {
    /// To the right, mm.
    pub x: f64,
    /// Upwards, mm.
    pub y: f64,
}

/// A piece of an outline.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Segment {
    /// A straight line.
    Line {
        /// Where it begins.
        from: Point,
        /// Where it ends.
        to: Point,
    },
    /// A circular arc.
    Arc {
        /// Its centre.
        centre: Point,
        /// Its radius, mm.
        radius: f64,
        /// The direction from the centre to where it begins, radians anticlockwise from x.
        start: f64,
        /// The angle it turns through, radians; negative is clockwise (a fillet in a re-entrant corner).
        sweep: f64,
    },
}

impl Segment {
    /// Where the segment begins.
    #[must_use]
    pub fn from(&self) -> Point {
        match *self {
            Self::Line { from, .. } => from,
            Self::Arc { start, .. } => self.on_arc(start),
        }
    }

    /// Where the segment ends.
    #[must_use]
    pub fn to(&self) -> Point {
        match *self {
            Self::Line { to, .. } => to,
            Self::Arc { start, sweep, .. } => self.on_arc(start + sweep),
        }
    }

    /// The length of the segment, mm.
    #[must_use]
    pub fn length(&self) -> f64 {
        match *self {
            Self::Line { from, to } => (to.x - from.x).hypot(to.y - from.y),
            Self::Arc { radius, sweep, .. } => radius * sweep.abs(),
        }
    }

    fn on_arc(&self, angle: f64) -> Point {
        match *self {
            Self::Line { from, .. } => from,
            Self::Arc { centre, radius, .. } => {
                let (sin, cos) = angle.sin_cos();
                Point {
                    x: centre.x + radius * cos,
                    y: centre.y + radius * sin,
                }
            }
        }
    }
}

/// A corner of a polygon, rounded by an arc that touches both of its sides.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Corner {
    /// Where the sides would meet.
    pub at: Point,
    /// The radius of the arc, mm; zero leaves the corner sharp.
    pub radius: f64,
}

impl Corner {
    /// A sharp corner.
    #[must_use]
    pub const fn sharp(x: f64, y: f64) -> Self {
        Self::round(x, y, 0.0)
    }

    /// A corner rounded with `radius`.
    #[must_use]
    pub const fn round(x: f64, y: f64, radius: f64) -> Self {
        Self {
            at: Point { x, y },
            radius,
        }
    }
}

/// The radii at the corner of this number are too large for the side between it and the next.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct RadiiDoNotFit {
    /// The index of the corner at which the side begins.
    pub corner: usize,
}

/// The rectangle that encloses an outline, mm.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Bounds {
    /// The lower left corner.
    pub min: Point,
    /// The upper right corner.
    pub max: Point,
}

impl Bounds {
    /// The width b, mm.
    #[must_use]
    pub fn width(&self) -> f64 {
        self.max.x - self.min.x
    }

    /// The height h, mm.
    #[must_use]
    pub fn height(&self) -> f64 {
        self.max.y - self.min.y
    }
}

/// A closed outline, anticlockwise, that does not cross itself.
#[derive(Debug, Clone, PartialEq)]
pub struct Outline {
    segments: Vec<Segment>,
    convex: bool,
}

impl Outline {
    /// Rounds the corners of a polygon given anticlockwise.
    ///
    /// # Errors
    /// When the arcs at both ends of a side are longer than the side.
    pub fn from_corners(corners: &[Corner]) -> Result<Self, RadiiDoNotFit> {
        let count = corners.len();
        let side = |i: usize| {
            let (a, b) = (corners[i % count].at, corners[(i + 1) % count].at);
            let length = (b.x - a.x).hypot(b.y - a.y);
            ((b.x - a.x) / length, (b.y - a.y) / length, length)
        };
        let turns: Vec<Turn> = (0..count)
            .map(|i| {
                let (before, after) = (side(i + count - 1), side(i));
                let angle = (before.0 * after.1 - before.1 * after.0).atan2(before.0 * after.0 + before.1 * after.1);
                let tangent = corners[i].radius * (angle.abs() / 2.0).tan();
                Turn { angle, tangent }
            })
            .collect();
        let mut segments = Vec::with_capacity(2 * count);
        for i in 0..count {
            let (ux, uy, length) = side(i);
            let next = (i + 1) % count;
            let straight = length - turns[i].tangent - turns[next].tangent;
            // Rows of tables round their dimensions, so that an arc may meet the next to within a rounding error.
            if straight.is_nan() || straight < -1e-6 {
                return Err(RadiiDoNotFit { corner: i });
            }
            let (a, b) = (corners[i].at, corners[next].at);
            let (t0, t1) = (turns[i].tangent, turns[next].tangent);
            if straight > 1e-9 {
                segments.push(Segment::Line {
                    from: Point {
                        x: a.x + ux * t0,
                        y: a.y + uy * t0,
                    },
                    to: Point {
                        x: b.x - ux * t1,
                        y: b.y - uy * t1,
                    },
                });
            }
            let Corner { radius, .. } = corners[next];
            let sweep = turns[next].angle;
            if radius > 0.0 && sweep != 0.0 {
                // The centre lies to the left of the way in for a left turn, to the right for a right turn.
                let left = sweep.signum();
                let centre = Point {
                    x: b.x - ux * t1 - uy * radius * left,
                    y: b.y - uy * t1 + ux * radius * left,
                };
                let start = (-ux * left).atan2(uy * left);
                segments.push(Segment::Arc {
                    centre,
                    radius,
                    start,
                    sweep,
                });
            }
        }
        let convex = turns.iter().all(|turn| turn.angle >= -1e-12);
        Ok(Self { segments, convex })
    }

    /// A circle of radius `radius` mm about `centre`, as four quarter arcs that meet where it touches its box.
    #[must_use]
    pub fn circle(centre: Point, radius: f64) -> Self {
        use std::f64::consts::FRAC_PI_2;
        let quarter = |n: u8| Segment::Arc {
            centre,
            radius,
            start: f64::from(n) * FRAC_PI_2,
            sweep: FRAC_PI_2,
        };
        Self {
            segments: (0..4).map(quarter).collect(),
            convex: true,
        }
    }

    /// The outline turned a quarter anticlockwise about the origin.
    #[must_use]
    pub fn turned(&self) -> Self {
        let quarter = |p: Point| Point { x: -p.y, y: p.x };
        let turn = |segment: &Segment| match *segment {
            Segment::Line { from, to } => Segment::Line {
                from: quarter(from),
                to: quarter(to),
            },
            Segment::Arc {
                centre,
                radius,
                start,
                sweep,
            } => Segment::Arc {
                centre: quarter(centre),
                radius,
                start: start + std::f64::consts::FRAC_PI_2,
                sweep,
            },
        };
        Self {
            segments: self.segments.iter().map(turn).collect(),
            convex: self.convex,
        }
    }

    /// The pieces, each beginning where the one before ends.
    #[must_use]
    pub fn segments(&self) -> &[Segment] {
        &self.segments
    }

    /// Whether the outline has no re-entrant corner.
    #[must_use]
    pub const fn is_convex(&self) -> bool {
        self.convex
    }

    /// The length of the outline, mm.
    #[must_use]
    pub fn length(&self) -> f64 {
        self.segments.iter().map(Segment::length).sum()
    }

    /// The enclosing rectangle.
    #[must_use]
    pub fn bounds(&self) -> Bounds {
        let mut bounds = Bounds {
            min: Point {
                x: f64::INFINITY,
                y: f64::INFINITY,
            },
            max: Point {
                x: f64::NEG_INFINITY,
                y: f64::NEG_INFINITY,
            },
        };
        let mut take = |p: Point| {
            bounds.min.x = bounds.min.x.min(p.x);
            bounds.min.y = bounds.min.y.min(p.y);
            bounds.max.x = bounds.max.x.max(p.x);
            bounds.max.y = bounds.max.y.max(p.y);
        };
        for segment in &self.segments {
            take(segment.from());
            if let Segment::Arc { start, sweep, .. } = *segment {
                let quarter = std::f64::consts::FRAC_PI_2;
                let (low, high) = (start.min(start + sweep), start.max(start + sweep));
                let mut at = (low / quarter).ceil() * quarter;
                while at < high {
                    take(segment.on_arc(at));
                    at += quarter;
                }
            }
        }
        bounds
    }

    /// The outline as a polygon, each arc cut into `pieces` chords: for drawing, and for checks by another route.
    #[must_use]
    pub fn polygon(&self, pieces: u32) -> Vec<Point> {
        let mut points = Vec::new();
        for segment in &self.segments {
            match *segment {
                Segment::Line { from, .. } => points.push(from),
                Segment::Arc { start, sweep, .. } => {
                    let step = sweep / f64::from(pieces.max(1));
                    points.extend((0..pieces.max(1)).map(|n| segment.on_arc(start + f64::from(n) * step)));
                }
            }
        }
        points
    }
}

/// How the outline turns at a corner, and how far from it the rounding arc begins.
struct Turn {
    angle: f64,
    tangent: f64,
}
