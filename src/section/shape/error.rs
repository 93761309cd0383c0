//! Why a shape can't be made of the dimensions given.

use std::fmt;

/// The largest dimension taken for a cross-section, mm.
pub const LARGEST: f64 = 20_000.0;

/// Dimensions must be larger than this, mm.
pub const SMALLEST: f64 = 0.1;

/// A shape that can't be: the dimension at fault, by its key in design files, and what is wrong with it.
#[derive(Debug, Clone, PartialEq)]
pub struct ShapeError {
    /// The key of the dimension: `h`, `tw`, `b top`, ...
    pub dimension: &'static str,
    /// What is wrong.
    pub problem: Problem,
}

/// What is wrong with a dimension of a shape.
#[derive(Debug, Clone, PartialEq)]
pub enum Problem {
    /// It is not a number above zero (for a radius or weld: not zero or above).
    NotPositive {
        /// The value given, mm.
        value: f64,
    },
    /// It is infinite or not a number.
    NotFinite,
    /// It is larger than [`LARGEST`].
    TooLarge {
        /// The value given, mm (mm² for an area).
        value: f64,
    },
    /// It must be below a limit that follows from the other dimensions.
    NoRoom {
        /// The value given, mm.
        value: f64,
        /// What it must stay below, mm.
        limit: f64,
        /// Where the limit comes from, in words.
        because: &'static str,
    },
    /// It must be above a limit that follows from the other dimensions.
    TooSmall {
        /// The value given, mm.
        value: f64,
        /// What it must exceed, mm.
        limit: f64,
        /// Where the limit comes from, in words.
        because: &'static str,
    },
    /// The radii or welds at both ends of a side are longer than the side.
    RadiiDoNotFit,
}

impl fmt::Display for ShapeError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        let name = self.dimension;
        match &self.problem {
            Problem::NotPositive { value } => write!(f, "`{name}` is {value}, which no steel section can have"),
            Problem::NotFinite => write!(f, "`{name}` is not a finite number"),
            Problem::TooLarge { value } => write!(f, "`{name}` is {value}, too large for a cross-section"),
            Problem::NoRoom { value, limit, because } => {
                write!(
                    f,
                    "`{name}` is {value:.1} mm but must be below {limit:.1} mm: {because}"
                )
            }
            Problem::TooSmall { value, limit, because } => {
                write!(
                    f,
                    "`{name}` is {value:.1} mm but must be above {limit:.1} mm: {because}"
                )
            }
            Problem::RadiiDoNotFit => write!(f, "`{name}` is too large for the sides that it joins"),
        }
    }
}

impl std::error::Error for ShapeError {}

/// Why a flange thickness must stay below half the depth.
pub(super) const HALF_DEPTH: &str = "both flanges must fit into the depth, so each is thinner than half of it";

/// Holds a dimension to: finite, from [`SMALLEST`] to [`LARGEST`].
pub(super) fn positive(dimension: &'static str, value: f64) -> Result<(), ShapeError> {
    not_negative(dimension, value)?;
    if value == 0.0 {
        let problem = Problem::NotPositive { value };
        return Err(ShapeError { dimension, problem });
    }
    above(dimension, value, SMALLEST, "no steel is rolled thinner")
}

/// Holds a radius or weld to: finite, zero or above, not beyond [`LARGEST`].
pub(super) fn not_negative(dimension: &'static str, value: f64) -> Result<(), ShapeError> {
    let problem = if !value.is_finite() {
        Problem::NotFinite
    } else if value < 0.0 {
        Problem::NotPositive { value }
    } else if value > LARGEST {
        Problem::TooLarge { value }
    } else {
        return Ok(());
    };
    Err(ShapeError { dimension, problem })
}

/// Holds a dimension below a limit given by the others.
pub(super) fn below(dimension: &'static str, value: f64, limit: f64, because: &'static str) -> Result<(), ShapeError> {
    if value < limit {
        return Ok(());
    }
    let problem = Problem::NoRoom { value, limit, because };
    Err(ShapeError { dimension, problem })
}

/// Holds a dimension above a limit given by the others.
pub(super) fn above(dimension: &'static str, value: f64, limit: f64, because: &'static str) -> Result<(), ShapeError> {
    if value > limit {
        return Ok(());
    }
    let problem = Problem::TooSmall { value, limit, because };
    Err(ShapeError { dimension, problem })
}

/// The error of a radius that does not fit.
pub(super) const fn no_fit(dimension: &'static str) -> ShapeError {
    ShapeError {
        dimension,
        problem: Problem::RadiiDoNotFit,
    }
}

#[cfg(test)]
mod tests {
    use crate::section::Shape;
    use crate::section::shape::{CircularHollow, ParallelI, RectangularHollow, Stated, WeldedI};
    use crate::units::{Area, Length};

    fn mm(value: f64) -> Length {
        Length::from_mm(value)
    }

    fn parallel(h: f64, b: f64, tw: f64, tf: f64, r: f64) -> Shape {
        Shape::I(ParallelI {
            h: mm(h),
            b: mm(b),
            tw: mm(tw),
            tf: mm(tf),
            r: mm(r),
        })
    }

    #[track_caller]
    fn refused(shape: &Shape, dimension: &str, words: &str) {
        let error = shape.check().unwrap_err();
        assert_eq!(error.dimension, dimension, "{error}");
        assert!(error.to_string().contains(words), "{error}");
    }

    #[test]
    fn impossible_dimensions_are_refused_by_name() {
        assert_eq!(parallel(300.0, 150.0, 7.1, 10.7, 15.0).check(), Ok(()));
        refused(&parallel(f64::NAN, 150.0, 7.1, 10.7, 15.0), "h", "finite");
        refused(&parallel(300.0, -150.0, 7.1, 10.7, 15.0), "b", "-150");
        refused(&parallel(300.0, 1e308, 7.1, 10.7, 15.0), "b", "too large");
        refused(&parallel(300.0, 150.0, 151.0, 10.7, 15.0), "tw", "below 150.0 mm");
        refused(&parallel(300.0, 150.0, 7.1, 150.0, 0.0), "tf", "below 150.0 mm");
        refused(&parallel(300.0, 150.0, 7.1, 10.7, 72.0), "r", "too large for the sides");
        refused(&parallel(300.0, 150.0, 0.0, 10.7, 15.0), "tw", "`tw` is 0");
        refused(&parallel(300.0, 150.0, 0.01, 10.7, 15.0), "tw", "above 0.1 mm");
    }

    #[test]
    fn hollow_welded_and_stated_sections_too() {
        let hollow = RectangularHollow::hot_finished(mm(100.0), mm(50.0), mm(8.0));
        assert_eq!(Shape::RectangularHollow(hollow).check(), Ok(()));
        let thick = RectangularHollow { t: mm(25.0), ..hollow };
        refused(&Shape::RectangularHollow(thick), "t", "below 25.0 mm");
        let round = RectangularHollow { ro: mm(26.0), ..hollow };
        refused(&Shape::RectangularHollow(round), "ro", "too large");
        let tube = CircularHollow {
            d: mm(60.0),
            t: mm(30.0),
        };
        refused(&Shape::CircularHollow(tube), "t", "below 30.0 mm");
        let welded = WeldedI {
            h: mm(40.0),
            b_top: mm(200.0),
            tf_top: mm(20.0),
            b_bottom: mm(200.0),
            tf_bottom: mm(25.0),
            tw: mm(10.0),
            weld: mm(0.0),
        };
        refused(&Shape::WeldedI(welded), "h", "above 45.0 mm");
        let deep = WeldedI {
            h: mm(400.0),
            weld: mm(200.0),
            ..welded
        };
        refused(&Shape::WeldedI(deep), "weld", "too large");
        let stated = Stated {
            area: Area::from_mm2(10_000.0),
            perimeter: mm(300.0),
            box_perimeter: None,
            mass: None,
        };
        refused(&Shape::Stated(stated), "perimeter", "no shorter outline");
        let endless = Stated {
            area: Area::from_mm2(f64::INFINITY),
            ..stated
        };
        refused(&Shape::Stated(endless), "area", "finite");
    }
}
