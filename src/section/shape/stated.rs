//! A section known only by its stated figures.

use super::error::{LARGEST, Problem, ShapeError, above, positive};
use super::{Form, Kind};
use crate::section::outline::Outline;
use crate::units::{Area, Length, LinearMass};

/// A section of which only figures are stated: no outline, so no faces, no second moments, and of unknown kind.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Stated {
    /// Area of steel.
    pub area: Area,
    /// Outline, all round.
    pub perimeter: Length,
    /// Outline of the enclosing box, all round, if stated.
    pub box_perimeter: Option<Length>,
    /// Mass, if stated; else 7850 kg/m³ times the area.
    pub mass: Option<LinearMass>,
}

impl Form for Stated {
    fn name(&self) -> &'static str {
        "stated"
    }

    fn check(&self) -> Result<(), ShapeError> {
        let area = self.area.mm2();
        if area.is_finite() && area > LARGEST * LARGEST {
            return Err(ShapeError {
                dimension: "area",
                problem: Problem::TooLarge { value: area },
            });
        }
        // An area has the square of the limit of a length.
        positive(
            "area",
            if area > LARGEST && area.is_finite() {
                LARGEST
            } else {
                area
            },
        )?;
        let perimeters = [
            Some(("perimeter", self.perimeter)),
            self.box_perimeter.map(|p| ("box perimeter", p)),
        ];
        for (name, perimeter) in perimeters.into_iter().flatten() {
            positive(name, perimeter.mm())?;
            // No closed line encloses more than a circle of its length does.
            let circle = (4.0 * std::f64::consts::PI * area).sqrt();
            above(
                name,
                perimeter.mm(),
                circle * 0.999,
                "no shorter outline can enclose the stated area",
            )?;
        }
        self.mass.map_or(Ok(()), |mass| positive("mass", mass.kg_m()))
    }

    fn outer(&self) -> Result<Option<Outline>, ShapeError> {
        Ok(None)
    }

    fn kind(&self) -> Option<Kind> {
        None
    }

    fn dimensions(&self) -> Vec<(&'static str, f64)> {
        let mut stated = vec![("area", self.area.mm2()), ("perimeter", self.perimeter.mm())];
        stated.extend(self.box_perimeter.map(|p| ("box perimeter", p.mm())));
        stated.extend(self.mass.map(|mass| ("mass", mass.kg_m())));
        stated
    }
}
