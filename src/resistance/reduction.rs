//! Reduction factors of carbon steel at temperature (EN 1993-1-2:2005 Table 3.1; from memory, the row of ky also
//! published in CTE DB SI Anejo D, Table D.2).

/// Temperature in °C with ky, kp and kE.
const TABLE: [(f64, f64, f64, f64); 13] = [
    (20.0, 1.0, 1.0, 1.0),
    (100.0, 1.0, 1.0, 1.0),
    (200.0, 1.0, 0.807, 0.9),
    (300.0, 1.0, 0.613, 0.8),
    (400.0, 1.0, 0.42, 0.7),
    (500.0, 0.78, 0.36, 0.6),
    (600.0, 0.47, 0.18, 0.31),
    (700.0, 0.23, 0.075, 0.13),
    (800.0, 0.11, 0.05, 0.09),
    (900.0, 0.06, 0.0375, 0.0675),
    (1000.0, 0.04, 0.025, 0.045),
    (1100.0, 0.02, 0.0125, 0.0225),
    (1200.0, 0.0, 0.0, 0.0),
];

fn between(celsius: f64, column: fn(&(f64, f64, f64, f64)) -> f64) -> f64 {
    let after = TABLE.partition_point(|row| row.0 <= celsius);
    match (after.checked_sub(1).map(|at| &TABLE[at]), TABLE.get(after)) {
        (None, _) => column(&TABLE[0]),
        (Some(last), None) => column(last),
        (Some(a), Some(b)) => column(a) + (column(b) - column(a)) * (celsius - a.0) / (b.0 - a.0),
    }
}

/// ky,θ: effective yield strength over that at 20 °C.
#[must_use]
pub fn yield_factor(celsius: f64) -> f64 {
    between(celsius, |row| row.1)
}

/// kp,θ: proportional limit over the yield strength at 20 °C.
#[must_use]
pub fn proportional_factor(celsius: f64) -> f64 {
    between(celsius, |row| row.2)
}

/// kE,θ: slope of the linear elastic range over that at 20 °C.
#[must_use]
pub fn modulus_factor(celsius: f64) -> f64 {
    between(celsius, |row| row.3)
}
