//! Findings: what a design's author should know.
//!
//! Each is declared in a file of its own, named after it, under the phase that decides it.

pub mod departures;
pub mod design;
pub mod design_intent;
pub mod finding;
pub mod fire;
pub mod member;
pub mod reading;
pub mod registry;
mod slender;
