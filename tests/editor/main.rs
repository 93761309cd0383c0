//! What the editor shows, on texts with a cursor: `|` stands where it is.

mod actions;
mod fixture;
mod hover;
mod names;
mod outline;
