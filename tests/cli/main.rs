//! The binary from outside: what a user types, and what comes back.

mod files;
mod findings;
mod forms;
mod hostile;
mod support;
