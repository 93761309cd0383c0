//! Reports as plain data.

pub mod schedule;
pub mod why;
