//! Steel in fire as a structure: reduction factors, cross-section classes, resistances at temperature, and the critical
//! temperatures that follow (EN 1993-1-2:2005 3.2, 4.2.2 to 4.2.4).
//!
//! Equations are from memory of the standard; which values were read or worked out elsewhere is told beside the checks.
//! Members are at one temperature throughout; κ1 and κ2 stand for what differs over the section and along the beam.

pub mod bending;
pub mod buckling;
pub mod class;
pub mod critical;
mod effects;
pub mod grade;
pub mod reduction;
mod search;
pub mod shear;
pub mod tension;
pub mod utilisation;
