//! Where a resistance that falls with temperature meets the load.

use crate::resistance::critical::Unverified;
use crate::units::Temperature;

/// The temperature of the reference state, °C.
const COLD: f64 = 20.0;
/// Where steel of EN 1993-1-2:2005 Table 3.1 has lost all strength, °C.
const SPENT: f64 = 1200.0;

/// The highest temperature at which `resistance` carries `load` (both in the same unit), to 1e-6 °C from below.
///
/// `resistance` must not rise with temperature.
///
/// # Errors
/// [`Unverified::FailsCold`] where the load exceeds the resistance at 20 °C.
pub(super) fn meets(
    load: f64,
    clause: &str,
    resistance: impl Fn(Temperature) -> f64,
) -> Result<Temperature, Unverified> {
    let carries = |celsius: f64| resistance(Temperature::from_celsius(celsius)) >= load;
    if !carries(COLD) {
        return Err(Unverified::FailsCold {
            utilisation: load / resistance(Temperature::from_celsius(COLD)),
            clause: clause.to_owned(),
        });
    }
    if carries(SPENT) {
        return Ok(Temperature::from_celsius(SPENT));
    }
    let (mut low, mut high) = (COLD, SPENT);
    while high - low > 1e-6 {
        let middle = f64::midpoint(low, high);
        if carries(middle) {
            low = middle;
        } else {
            high = middle;
        }
    }
    Ok(Temperature::from_celsius(low))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn finds_the_crossing() {
        let falling = |t: Temperature| 1200.0 - t.celsius();
        let found = meets(400.0, "a clause", falling).unwrap();
        assert!((found.celsius() - 800.0).abs() < 2e-6);
        assert_eq!(
            meets(2360.0, "a clause", falling),
            Err(Unverified::FailsCold {
                utilisation: 2.0,
                clause: "a clause".to_owned()
            })
        );
    }
}
