//! Código Técnico de la Edificación, Documento Básico SI, Anejo D (consolidated 2025). Status: published.

use scorchline::resistance::critical::CLASS_4;
use scorchline::resistance::reduction::{modulus_factor, yield_factor};
use scorchline::units::Temperature;

use crate::support::near;

/// Table D.2, ky. Exact.
#[test]
fn table_d_2_yield() {
    for (t, ky) in [
        (400.0, 1.0),
        (500.0, 0.78),
        (600.0, 0.47),
        (700.0, 0.23),
        (800.0, 0.11),
        (900.0, 0.06),
        (1000.0, 0.04),
    ] {
        near("ky", yield_factor(Temperature::from_celsius(t)), ky, 1e-12);
    }
}

/// Table D.2, the factor on slenderness √(ky/kE). Printed with two decimals, some of them truncated: 0.0101.
#[test]
fn table_d_2_slenderness() {
    for (t, root) in [
        (200.0, 1.05),
        (300.0, 1.11),
        (400.0, 1.19),
        (500.0, 1.14),
        (600.0, 1.23),
        (700.0, 1.33),
    ] {
        let t = Temperature::from_celsius(t);
        near("√(ky/kE)", (yield_factor(t) / modulus_factor(t)).sqrt(), root, 0.0101);
    }
}

/// Anejo D: class 4 sections other than in tension members have a critical temperature of 350 °C.
#[test]
fn class_4() {
    assert_eq!(CLASS_4, 350.0);
}
