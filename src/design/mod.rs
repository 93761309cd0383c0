//! The design as its files say it: the table of keys, the typed model, decoding, names and inheritance.

pub mod decode;
pub mod given;
pub mod inherit;
pub mod keys;
pub mod model;
pub mod slip;
