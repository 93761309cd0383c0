//! The `scorchline` binary.
fn main() {}
