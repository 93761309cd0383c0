//! From the tolerant tree to the typed model: never fails, collects what is wrong.

pub mod fire;
pub mod head;
pub mod library;
pub mod loading;
pub mod member;
pub mod protection;
pub mod reader;
pub mod section;
mod typing;
