//! Fires and the temperature of steel in them: EN 1991-1-2:2002 section 3, EN 1993-1-2:2005 section 3 and 4.2.5.
//!
//! Temperatures are converged: within 0.5 °C of the limit of vanishing time steps, and never more than 0.1 °C below it.
//! The code's own explicit march (4.2.5.1 (4), 4.2.5.2 (2)) depends on the step by up to some 4 °C; [`explicit`] has it
//! for checking by hand.

pub mod explicit;
pub mod family;
pub mod fire;
pub mod flux;
pub mod history;
pub mod march;
pub mod parametric;
pub mod steel;
