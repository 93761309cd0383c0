//! From files to outcomes: reading, names, and the evaluation of each member.

pub mod curves;
pub mod design;
pub mod evaluate;
pub mod exposure;
pub mod files;
pub mod inputs;
pub mod load;
pub mod memo;
pub mod names;
pub mod outcome;
pub mod read;
pub mod reread;
pub mod source;
