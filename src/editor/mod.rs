//! What an editor shows beside the findings: plain functions on byte offsets, free of any protocol.

pub mod view;
