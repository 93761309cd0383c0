//! The language server as a program: what an editor sends it, and what it answers.

mod calm;
mod chaos;
mod client;
mod files;
mod life;
mod requests;
mod sync;
