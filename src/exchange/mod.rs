//! Forms in which results leave: JSON, CSV, tables.

pub mod csv;
pub mod json;
pub mod schema;
pub mod table;
