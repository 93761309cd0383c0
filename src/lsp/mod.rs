//! The language server: the protocol around [`check::session`](crate::check::session) and [`editor`](crate::editor).
//!
//! Documents change in the order of the messages, before a handler first waits. One worker checks the newest version of
//! everything and publishes; requests wait until the version that they were asked about is checked.

mod capabilities;
mod convert;
mod diagnostics;
pub mod disk;
mod documents;
mod explain;
pub mod folders;
mod overlay;
mod progress;
mod publish;
mod requests;
mod server;
mod settings;
mod shared;
mod worker;

pub use server::serve;
