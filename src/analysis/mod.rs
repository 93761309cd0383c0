//! From files to outcomes: reading, names, and the evaluation of each member.

pub mod design;
pub mod exposure;
pub mod files;
pub mod inputs;
pub mod names;
pub mod outcome;
pub mod read;
pub mod source;
