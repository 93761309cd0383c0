//! Reports as plain data.

pub mod schedule;
