//! What the editor shows, on texts with a cursor: `|` stands where it is.

mod actions;
mod completion;
mod completion_everywhere;
mod completion_values;
mod fixture;
mod hover;
mod names;
mod outline;
