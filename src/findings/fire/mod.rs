//! Findings of a member in fire.

pub mod ambient_check_fails;
pub mod bare_steel_fails;
pub mod class_4_temperature;
pub mod coating_environment;
pub mod critical_temperature_assumed;
pub mod critical_temperature_ignores_buckling;
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

use crate::findings::context::Context;

/// Everything that the outcome of a member tells.
pub(super) fn member(cx: &mut Context<'_>) {
    ambient_check_fails::check(cx);
    critical_temperature_unknown::check(cx);
    critical_temperature_assumed::check(cx);
    critical_temperature_too_high::check(cx);
    critical_temperature_ignores_buckling::check(cx);
    class_4_temperature::check(cx);
    section_factor_low::check(cx);
    fire_outside_validity::check(cx);
    galvanised_benefit_claimed::check(cx);
    bare_steel_fails::check(cx);
    too_slender_to_protect::check(cx);
    outside_assessed_range::check(cx);
    fire_not_assessed::check(cx);
    shape_not_assessed::check(cx);
    protection_too_thin::check(cx);
    protection_over_thick::check(cx);
    reading_below_required::check(cx);
    too_many_coats::check(cx);
    protection_not_needed::check(cx);
    profile_board::check(cx);
    coating_environment::check(cx);
    evidence_expired::check(cx);
}
