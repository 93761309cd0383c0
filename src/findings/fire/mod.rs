//! Findings of a member in fire.

pub mod ambient_check_fails;
pub mod bare_steel_fails;
pub mod class_4_temperature;
pub mod coating_environment;
pub mod critical_temperature_assumed;
pub mod critical_temperature_too_high;
pub mod critical_temperature_unknown;
pub mod evidence_expired;
pub mod fire_not_assessed;
pub mod fire_outside_validity;
pub mod galvanised_benefit_claimed;
pub mod outside_assessed_range;
pub mod profile_board;
pub mod protection_not_needed;
pub mod protection_over_thick;
pub mod protection_too_thin;
pub mod reading_below_required;
pub mod section_factor_low;
pub mod shape_not_assessed;
pub mod too_many_coats;
pub mod too_slender_to_protect;
