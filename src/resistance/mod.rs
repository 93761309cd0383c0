//! Steel in fire as a structure: reduction factors, cross-section classes, and critical temperatures
//! (EN 1993-1-2:2005 3.2, 4.2.2 to 4.2.4).

pub mod class;
pub mod critical;
pub mod grade;
pub mod reduction;
