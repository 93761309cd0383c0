//! What a design file says, typed, with the place of every value.

pub mod head;
pub mod library;
pub mod member;
