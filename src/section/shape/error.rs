//! Why a shape can't be made of the dimensions given.

use std::fmt;

/// The largest dimension taken for a cross-section, mm.
pub const LARGEST: f64 = 20_000.0;

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

/// Holds a dimension to: finite, above zero, not beyond [`LARGEST`].
pub(super) fn positive(dimension: &'static str, value: f64) -> Result<(), ShapeError> {
    let problem = if !value.is_finite() {
        Problem::NotFinite
    } else if value <= 0.0 {
        Problem::NotPositive { value }
    } else if value > LARGEST {
        Problem::TooLarge { value }
    } else {
        return Ok(());
    };
    Err(ShapeError { dimension, problem })
}

/// Holds a radius or weld to: finite, zero or above, not beyond [`LARGEST`].
pub(super) fn not_negative(dimension: &'static str, value: f64) -> Result<(), ShapeError> {
    if value == 0.0 {
        return Ok(());
    }
    positive(dimension, value)
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
