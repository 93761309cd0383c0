//! To be filled by its owner.
