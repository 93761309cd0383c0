//! Fire protection: products within their assessed range, and the thickness that a member needs of them.
//!
//! A result never comes from outside what was assessed. On the safe side the edge of the range holds (a lower section
//! factor, a higher critical temperature, a shorter period); on the unsafe side nothing is extrapolated.

pub mod product;
pub mod refusal;
pub mod requirement;
pub mod stock;
pub mod table;
