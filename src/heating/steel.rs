//! Thermal properties of carbon steel (EN 1993-1-2:2005 3.2.2 and 3.4.1; from memory, high confidence).

use std::sync::OnceLock;

/// Density ρa in kg/m³, held constant (3.2.2).
pub const DENSITY: f64 = 7850.0;
/// Temperature at which the steel starts, °C.
pub const AMBIENT: f64 = 20.0;
/// The highest steel temperature that is followed, °C; no fire here comes near it.
const HIGHEST: f64 = 1600.0;
/// Spacing of the table of temperatures over enthalpy, J/kg. Its error is below 0.001 °C.
const SPACING: f64 = 200.0;

/// Specific heat as an argument of the solvers: published cases take it constant.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum SpecificHeat {
    /// EN 1993-1-2:2005 3.4.1.2 (1).
    En1993,
    /// A constant, J/kgK.
    Constant(f64),
}

impl SpecificHeat {
    /// The specific heat in J/kgK at a steel temperature in °C.
    #[must_use]
    pub fn at(self, celsius: f64) -> f64 {
        match self {
            Self::En1993 => specific_heat(celsius),
            Self::Constant(c) => c,
        }
    }

    /// Enthalpy above 20 °C in J/kg.
    #[must_use]
    pub fn enthalpy(self, celsius: f64) -> f64 {
        match self {
            Self::En1993 => enthalpy(celsius),
            Self::Constant(c) => c * (celsius - AMBIENT),
        }
    }

    /// The temperature in °C of an enthalpy in J/kg; held between 20 °C and 1600 °C.
    #[must_use]
    pub fn temperature(self, enthalpy: f64) -> f64 {
        match self {
            Self::En1993 => temperature(enthalpy),
            Self::Constant(c) => AMBIENT + enthalpy / c,
        }
    }
}

/// ca in J/kgK (3.2a) to (3.2d), 20 to 1200 °C; 650 above.
#[must_use]
pub fn specific_heat(celsius: f64) -> f64 {
    let t = celsius.max(AMBIENT);
    if t < 600.0 {
        425.0 + 0.773 * t - 1.69e-3 * t * t + 2.22e-6 * t * t * t
    } else if t < 735.0 {
        666.0 + 13002.0 / (738.0 - t)
    } else if t < 900.0 {
        545.0 + 17820.0 / (t - 731.0)
    } else {
        650.0
    }
}

/// The integral of the specific heat from 20 °C, J/kg, in closed form.
#[must_use]
pub fn enthalpy(celsius: f64) -> f64 {
    let poly = |t: f64| 425.0 * t + 0.773 / 2.0 * t * t - 1.69e-3 / 3.0 * t.powi(3) + 2.22e-6 / 4.0 * t.powi(4);
    let t = celsius;
    let mut sum = poly(t.min(600.0)) - poly(AMBIENT);
    if t > 600.0 {
        let to = t.min(735.0);
        sum += 666.0 * (to - 600.0) + 13002.0 * (138.0 / (738.0 - to)).ln();
    }
    if t > 735.0 {
        let to = t.min(900.0);
        sum += 545.0 * (to - 735.0) + 17820.0 * ((to - 731.0) / 4.0).ln();
    }
    if t > 900.0 {
        sum += 650.0 * (t - 900.0);
    }
    sum
}

/// The inverse of [`enthalpy`], from a table.
#[must_use]
pub fn temperature(enthalpy: f64) -> f64 {
    static TABLE: OnceLock<Vec<f64>> = OnceLock::new();
    let table = TABLE.get_or_init(inverse_table);
    let at = (enthalpy / SPACING).clamp(0.0, (table.len() - 2) as f64);
    let index = at as usize;
    let share = at - index as f64;
    table[index] + (table[index + 1] - table[index]) * share
}

fn inverse_table() -> Vec<f64> {
    let steps = (enthalpy(HIGHEST) / SPACING) as usize + 2;
    let mut celsius = AMBIENT;
    (0..steps)
        .map(|step| {
            let wanted = step as f64 * SPACING;
            let (mut low, mut high) = (celsius, (celsius + 2.0 * SPACING / 400.0).min(HIGHEST + 5.0));
            while high - low > 1e-9 {
                let middle = 0.5 * (low + high);
                if enthalpy(middle) < wanted {
                    low = middle
                } else {
                    high = middle
                }
            }
            celsius = low;
            low
        })
        .collect()
}

/// λa in W/mK (3.3a), (3.3b), 20 to 1200 °C.
#[must_use]
pub fn conductivity(celsius: f64) -> f64 {
    if celsius < 800.0 {
        54.0 - 3.33e-2 * celsius
    } else {
        27.3
    }
}

/// Relative thermal elongation (3.1a) to (3.1d), 20 to 1200 °C.
#[must_use]
pub fn elongation(celsius: f64) -> f64 {
    let t = celsius;
    if t < 750.0 {
        1.2e-5 * t + 0.4e-8 * t * t - 2.416e-4
    } else if t <= 860.0 {
        1.1e-2
    } else {
        2e-5 * t - 6.2e-3
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_table_inverts_the_integral() {
        let mut celsius = 20.0;
        while celsius < 1300.0 {
            let back = temperature(enthalpy(celsius));
            assert!((back - celsius).abs() < 1e-3, "{celsius}: {back}");
            celsius += 0.37;
        }
    }

    #[test]
    fn the_integral_is_that_of_the_specific_heat() {
        let mut sum = 0.0;
        let step = 1e-3;
        let mut celsius = 20.0;
        while celsius < 1200.0 - step / 2.0 {
            sum += step * specific_heat(celsius + step / 2.0);
            celsius += step;
        }
        assert!((sum - enthalpy(1200.0)).abs() < 2.0, "{sum}");
    }
}
