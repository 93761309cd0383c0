//! Findings: what a design's author should know.

pub mod departures;
pub mod design;
pub mod finding;
pub mod member;
pub mod reading;
pub mod registry;
mod slender;
