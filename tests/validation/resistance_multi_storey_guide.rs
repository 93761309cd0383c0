//! Steel Buildings in Europe, Multi-Storey Steel Buildings, Part 6: Detailed Design (2008). Status: published.

use scorchline::resistance::utilisation::{ActionMix, reduction_factor};

use crate::support::near;

/// p. 6-54, a secondary beam: G 3.5 and Q 3.0 kN/m², ψ 0.3, γ 1.35 and 1.5: ηfi 0.477. Printed with three decimals.
#[test]
fn load_in_fire_over_load_of_design() {
    let mix = ActionMix {
        permanent: 3.5,
        variable: 3.0,
        combination: 0.3,
        gamma_permanent: 1.35,
        gamma_variable: 1.5,
        xi: 1.0,
    };
    near("ηfi", reduction_factor(&mix).unwrap(), 0.477, 6e-4);
}

/// Loads per area on beams of 7 m at 3 m: with the total in fire q = 3.5 + 0.3 · 3.0 and a spacing of 3 m the guide gives
/// M 80.9 kNm and V 46.2 kN. Checked here against the ratio the product uses: they are ηfi times the design values of
/// 1.35 · 3.5 + 1.5 · 3.0 kN/m². 0.2 %.
#[test]
fn effects_follow_the_factor() {
    let design = (1.35 * 3.5 + 1.5 * 3.0) * 3.0;
    let mix = ActionMix {
        permanent: 3.5,
        variable: 3.0,
        combination: 0.3,
        gamma_permanent: 1.35,
        gamma_variable: 1.5,
        xi: 1.0,
    };
    let in_fire = design * reduction_factor(&mix).unwrap();
    near("M", in_fire * 49.0 / 8.0, 80.9, 0.2);
    near("V", in_fire * 7.0 / 2.0, 46.2, 0.1);
}
