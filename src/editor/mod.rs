//! What an editor shows beside the findings: plain functions on byte offsets, free of any protocol.

pub mod definition;
pub mod names;
pub mod references;
pub mod rename;
pub mod view;
