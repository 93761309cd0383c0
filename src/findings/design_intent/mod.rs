//! Findings between members and of what the design intends.

pub mod bare_on_protected;
pub mod shield_not_stated;
pub mod support_cycle;
pub mod support_rating_lower;
pub mod thin_steel;
