//! Fire design of structural steel members from plain-text design files.
//!
//! The modules stand in layers: each may import only those above it, as the table in `DEVELOPERS.md` says and
//! `tests/layers.rs` checks. Physics (`section`, `heating`, `resistance`, `protection`) knows no text; text
//! (`text`, `syntax`, `design`) knows no physics beyond its types; `analysis` joins the two.

#![warn(missing_docs, clippy::unwrap_used, clippy::expect_used, clippy::panic)]

pub mod analysis;
pub mod check;
pub mod cli;
pub mod design;
pub mod draw;
pub mod editor;
pub mod exchange;
pub mod findings;
pub mod heating;
pub mod lsp;
pub mod protection;
pub mod report;
pub mod resistance;
pub mod scenario;
pub mod section;
pub mod syntax;
pub mod text;
pub mod units;
