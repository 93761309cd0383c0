//! Cross-sections: the catalogue, exact geometry of shapes, and what the fire reaches of them.
//!
//! Shapes are built as outlines of straight lines and circular arcs; area, perimeter and moments follow from the
//! outline in closed form, root, toe and corner radii included. Axes are those of EN 1993-1-1 1.7: y-y is horizontal
//! (the strong axis of an I standing upright), z-z vertical. Tees and angles stand with their flange, or horizontal
//! leg, at the top, so that "three sides" means the same for every shape: the top face is covered.

pub mod catalogue;
mod exposure;
mod geometry;
pub mod measures;
pub mod outline;
mod properties;
pub mod shadow;
pub mod shape;

pub use exposure::{Casing, Exposure, ExposureRefusal, Face, Faces, Heated, heated};
pub use geometry::{Flange, Geometry};
pub use properties::Properties;
pub use shape::{Kind, Shape, ShapeError};

#[cfg(test)]
mod tests;
