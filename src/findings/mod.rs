//! Findings: what a design's author should know.

pub mod finding;
pub mod registry;
