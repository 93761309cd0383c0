//! What an editor shows beside the findings: plain functions on byte offsets, free of any protocol.

pub mod actions;
pub mod completion;
pub mod cursor;
pub mod definition;
mod depart;
mod fill;
pub mod folding;
pub mod hints;
pub mod hover;
mod layout;
pub mod lens;
pub mod links;
pub mod names;
mod protect;
pub mod references;
pub mod rename;
pub mod selection;
pub mod symbols;
pub mod view;
mod write;
