//! Reduction factors of carbon steel at temperature, EN 1993-1-2:2005 Table 3.1, linear between its rows.
//!
//! Source: memory; the row of ky from 400 to 1000 °C and √(ky/kE) also published in CTE DB SI Anejo D, Table D.2.
//! Valid from 20 to 1200 °C; below 20 °C the factors are those of 20 °C, above 1200 °C they are zero.

use crate::units::Temperature;

/// A row of the table.
struct Row {
    celsius: f64,
    yielding: f64,
    proportional: f64,
    modulus: f64,
}

const fn row(celsius: f64, yielding: f64, proportional: f64, modulus: f64) -> Row {
    Row {
        celsius,
        yielding,
        proportional,
        modulus,
    }
}

const TABLE: [Row; 13] = [
    row(20.0, 1.0, 1.0, 1.0),
    row(100.0, 1.0, 1.0, 1.0),
    row(200.0, 1.0, 0.807, 0.9),
    row(300.0, 1.0, 0.613, 0.8),
    row(400.0, 1.0, 0.42, 0.7),
    row(500.0, 0.78, 0.36, 0.6),
    row(600.0, 0.47, 0.18, 0.31),
    row(700.0, 0.23, 0.075, 0.13),
    row(800.0, 0.11, 0.05, 0.09),
    row(900.0, 0.06, 0.0375, 0.0675),
    row(1000.0, 0.04, 0.025, 0.045),
    row(1100.0, 0.02, 0.0125, 0.0225),
    row(1200.0, 0.0, 0.0, 0.0),
];

fn between(temperature: Temperature, column: fn(&Row) -> f64) -> f64 {
    let celsius = temperature.celsius();
    let after = TABLE.partition_point(|row| row.celsius <= celsius);
    match (after.checked_sub(1).map(|at| &TABLE[at]), TABLE.get(after)) {
        (None, _) => column(&TABLE[0]),
        (Some(last), None) => column(last),
        (Some(a), Some(b)) => {
            let share = (celsius - a.celsius) / (b.celsius - a.celsius);
            column(a) + (column(b) - column(a)) * share
        }
    }
}

/// ky,θ: effective yield strength over the yield strength at 20 °C.
#[must_use]
pub fn yield_factor(temperature: Temperature) -> f64 {
    between(temperature, |row| row.yielding)
}

/// kp,θ: proportional limit over the yield strength at 20 °C.
#[must_use]
pub fn proportional_factor(temperature: Temperature) -> f64 {
    between(temperature, |row| row.proportional)
}

/// kE,θ: slope of the linear elastic range over that at 20 °C.
#[must_use]
pub fn modulus_factor(temperature: Temperature) -> f64 {
    between(temperature, |row| row.modulus)
}

/// The highest temperature at which ky,θ is still `factor`: 400 °C for 1, 1200 °C for 0; none outside 0 to 1.
#[must_use]
pub fn inverse_ky(factor: f64) -> Option<Temperature> {
    if !(0.0..=1.0).contains(&factor) {
        return None;
    }
    let pair = TABLE
        .windows(2)
        .find(|pair| pair[0].yielding >= factor && pair[1].yielding < factor);
    Some(Temperature::from_celsius(pair.map_or(1200.0, |pair| {
        let share = (pair[0].yielding - factor) / (pair[0].yielding - pair[1].yielding);
        pair[0].celsius + share * (pair[1].celsius - pair[0].celsius)
    })))
}

#[cfg(test)]
mod tests {
    use super::*;

    fn at(celsius: f64) -> Temperature {
        Temperature::from_celsius(celsius)
    }

    /// Table 3.1 (memory); halfway values computed.
    #[test]
    fn linear_between_rows_and_held_outside() {
        assert_eq!(yield_factor(at(-10.0)), 1.0);
        assert!((yield_factor(at(550.0)) - 0.625).abs() < 1e-12);
        assert!((proportional_factor(at(150.0)) - 0.9035).abs() < 1e-12);
        assert!((modulus_factor(at(650.0)) - 0.22).abs() < 1e-12);
        assert_eq!(yield_factor(at(1300.0)), 0.0);
    }

    #[test]
    fn inverse_is_the_inverse() {
        for factor in [0.9, 0.8, 0.5, 0.23, 0.1, 0.05, 0.001] {
            let back = inverse_ky(factor).map(yield_factor);
            assert!((back.unwrap() - factor).abs() < 1e-12, "{factor}");
        }
        assert_eq!(inverse_ky(1.0), Some(at(400.0)));
        assert_eq!(inverse_ky(0.0), Some(at(1200.0)));
        assert_eq!(inverse_ky(1.01), None);
        assert_eq!(inverse_ky(f64::NAN), None);
    }
}
