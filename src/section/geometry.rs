//! Area, outline and enclosing box of a shape: what section factors are made of.

use crate::section::exposure::{Face, Faces};
use crate::section::outline::{FaceLengths, Outline};
use crate::section::shape::{Kind, Shape, ShapeError};
use crate::units::{Area, Length, LinearMass};

/// The density of steel, kg/m³ (EN 1993-1-2:2005 3.2.2; EN 1991-1-1:2002 Table A.4 range).
pub const DENSITY: f64 = 7850.0;

/// A flange: a plate of the section that can be exposed alone.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Flange {
    /// Its width b.
    pub width: Length,
    /// Its nominal thickness tf.
    pub thickness: Length,
}

/// The figures of a shape on which section factors rest.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Geometry {
    /// Area of steel, exact from nominal dimensions and radii.
    pub area: Area,
    /// The outer outline, all round.
    pub perimeter: Length,
    /// The enclosing box all round, 2 (b + h); none where no box is stated.
    pub box_perimeter: Option<Length>,
    /// Height of the enclosing box; none for stated figures.
    pub height: Option<Length>,
    /// Width of the enclosing box; none for stated figures.
    pub width: Option<Length>,
    /// Mass per length: 7850 kg/m³ times the area, or as stated.
    pub mass: LinearMass,
    /// The kind of section; none for stated figures.
    pub kind: Option<Kind>,
    /// Whether the outer outline is convex, so that no part of the section shades another.
    pub convex: bool,
    /// Whether it is an I or H section.
    pub is_i: bool,
    /// The flange that "flange only" exposes.
    pub flange: Option<Flange>,
    /// The outline by the faces that it is reached from; none for stated figures.
    pub faces: Option<FaceLengths>,
}

impl Geometry {
    /// Works out the figures of a shape.
    ///
    /// # Errors
    /// When the dimensions are those of no possible section.
    pub fn of(shape: &Shape) -> Result<Self, ShapeError> {
        let (outer, hole) = shape.outlines()?;
        if let Shape::Stated(stated) = shape {
            let mass = stated.mass.unwrap_or_else(|| plain_mass(stated.area));
            return Ok(Self {
                area: stated.area,
                perimeter: stated.perimeter,
                box_perimeter: stated.box_perimeter,
                height: None,
                width: None,
                mass,
                kind: None,
                convex: false,
                is_i: false,
                flange: None,
                faces: None,
            });
        }
        let area = |outline: &Option<Outline>| outline.as_ref().map_or(0.0, |o| o.moments().area);
        let area = Area::from_mm2(area(&outer) - area(&hole));
        let bounds = outer.as_ref().map(Outline::bounds);
        let height = bounds.map(|b| Length::from_mm(b.height()));
        let width = bounds.map(|b| Length::from_mm(b.width()));
        Ok(Self {
            area,
            perimeter: Length::from_mm(outer.as_ref().map_or(0.0, Outline::length)),
            box_perimeter: bounds.map(|b| Length::from_mm(2.0 * (b.width() + b.height()))),
            height,
            width,
            mass: plain_mass(area),
            kind: shape.kind(),
            convex: outer.as_ref().is_some_and(Outline::is_convex),
            is_i: shape.is_i(),
            flange: shape.flange(),
            faces: outer.as_ref().map(FaceLengths::of),
        })
    }

    /// The length of a face of the enclosing box; none for stated figures.
    #[must_use]
    pub fn box_face(&self, face: Face) -> Option<Length> {
        match face {
            Face::Top | Face::Bottom => self.width,
            Face::Left | Face::Right => self.height,
        }
    }

    /// The enclosing box less its covered faces; none for stated figures.
    #[must_use]
    pub fn open_box(&self, covered: Faces) -> Option<Length> {
        Face::ALL
            .into_iter()
            .filter(|face| !covered.contains(*face))
            .try_fold(0.0, |sum, face| Some(sum + self.box_face(face)?.mm()))
            .map(Length::from_mm)
    }
}

/// The mass of an area of steel.
fn plain_mass(area: Area) -> LinearMass {
    LinearMass::from_kg_m(area.m2() * DENSITY)
}

#[cfg(test)]
mod tests {
    use crate::section::catalogue::{Lookup, LookupOptions, find};

    /// Exact figures of parallel I sections by their closed forms (computed).
    #[test]
    fn parallel_i_sections() {
        for (name, area, outline) in [
            ("IPE 200", 2848.4, 768.2),
            ("IPE 300", 5381.2, 1160.0),
            ("HE 200 A", 5383.1, 1136.1),
            ("HE 300 B", 14907.8, 1731.6),
            ("HE 300 M", 30307.8, 1831.6),
        ] {
            let Lookup::Found(row) = find(name, &LookupOptions::default()) else {
                panic!("{name}")
            };
            assert!((row.geometry().area.mm2() - area).abs() < 0.05, "{name}");
            assert!((row.geometry().perimeter.mm() - outline).abs() < 0.05, "{name}");
        }
    }
}
