//! Gas temperatures over time (EN 1991-1-2:2002 3.2 and Annex A; EN 1363-2:1999).

use std::fmt;
use std::hash::{Hash, Hasher};

pub use super::parametric::{Growth, Parametric, ParametricInput};
use crate::units::{Temperature, Time};

/// A fire: the gas temperature as a function of time.
#[derive(Debug, Clone, PartialEq)]
pub enum Fire {
    /// Standard temperature-time curve, ISO 834 (EN 1991-1-2:2002 (3.4)).
    Standard,
    /// External fire curve (EN 1991-1-2:2002 (3.5); from memory).
    External,
    /// Hydrocarbon curve (EN 1991-1-2:2002 (3.6); from memory).
    Hydrocarbon,
    /// Slow heating curve (EN 1363-2:1999; from memory). A test exposure, not a design fire.
    SlowHeating,
    /// Parametric fire (EN 1991-1-2:2002 Annex A; from memory).
    Parametric(Parametric),
    /// Straight lines between given points, the last value held.
    Points(Points),
}

/// Why a fire can't be so.
#[derive(Debug, Clone, PartialEq)]
pub enum FireError {
    /// Fewer than two points.
    TooFewPoints,
    /// The times of the points do not increase; the index of the first that does not.
    TimesNotIncreasing(usize),
    /// A number is not finite or not positive; its name.
    NotPositive(&'static str),
    /// The factor k of a parametric fire, by which its heating is slowed, is not above zero: its gas would never warm.
    NeverWarms(f64),
}

impl fmt::Display for FireError {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::TooFewPoints => write!(f, "it needs at least two points"),
            Self::TimesNotIncreasing(at) => {
                write!(f, "the time of point {} does not come after the one before", at + 1)
            }
            Self::NotPositive(name) => write!(f, "its {name} must be above zero"),
            Self::NeverWarms(k) => write!(
                f,
                "by so low a fire load, so large openings and so light a lining together, k of EN 1991-1-2 Annex A (A.10) \
                 is {k:.2}, and the gas would never warm"
            ),
        }
    }
}

impl std::error::Error for FireError {}

/// Gas temperatures at given times.
#[derive(Debug, Clone, PartialEq)]
pub struct Points {
    /// Minutes and °C, times increasing.
    points: Vec<(f64, f64)>,
    convection: f64,
}

/// Coefficient of heat transfer by convection of natural fires, W/m²K (EN 1991-1-2:2002 3.3.1.1 (3); from memory).
pub const NATURAL_CONVECTION: f64 = 35.0;

impl Points {
    /// A fire of points: time and temperature. `convection` in W/m²K, 35 unless given.
    ///
    /// # Errors
    /// Fewer than two points, times that do not increase, or numbers that are not finite.
    pub fn new(points: Vec<(Time, Temperature)>, convection: Option<f64>) -> Result<Self, FireError> {
        let convection = convection.unwrap_or(NATURAL_CONVECTION);
        if !(convection.is_finite() && convection > 0.0) {
            return Err(FireError::NotPositive("convection"));
        }
        if points.len() < 2 {
            return Err(FireError::TooFewPoints);
        }
        let points: Vec<(f64, f64)> = points.iter().map(|(time, gas)| (time.min(), gas.celsius())).collect();
        let late = points.windows(2).position(|pair| {
            let rises = pair[1].0 > pair[0].0;
            !rises || pair.iter().any(|point| !point.0.is_finite() || !point.1.is_finite())
        });
        match late {
            Some(at) => Err(FireError::TimesNotIncreasing(at + 1)),
            None if points[0].0 < 0.0 => Err(FireError::TimesNotIncreasing(0)),
            None => Ok(Self { points, convection }),
        }
    }

    fn gas(&self, minutes: f64) -> f64 {
        let after = self.points.partition_point(|point| point.0 <= minutes);
        match (after.checked_sub(1).map(|at| self.points[at]), self.points.get(after)) {
            (None, Some(first)) => first.1,
            (Some(last), None) => last.1,
            (Some(a), Some(b)) => a.1 + (b.1 - a.1) * (minutes - a.0) / (b.0 - a.0),
            (None, None) => 20.0,
        }
    }

    fn rate(&self, minutes: f64) -> f64 {
        let after = self.points.partition_point(|point| point.0 <= minutes);
        match (after.checked_sub(1).map(|at| self.points[at]), self.points.get(after)) {
            (Some(a), Some(b)) => (b.1 - a.1) / (b.0 - a.0),
            _ => 0.0,
        }
    }
}

impl Fire {
    /// The gas temperature.
    #[must_use]
    pub fn gas(&self, time: Time) -> Temperature {
        Temperature::from_celsius(self.gas_celsius(time.min()))
    }

    /// Gas temperature in °C after so many minutes; that of the start for negative times.
    pub(super) fn gas_celsius(&self, minutes: f64) -> f64 {
        let t = minutes.max(0.0);
        match self {
            Self::Standard => 20.0 + 345.0 * (8.0 * t + 1.0).log10(),
            Self::External => 20.0 + 660.0 * (1.0 - 0.687 * (-0.32 * t).exp() - 0.313 * (-3.8 * t).exp()),
            Self::Hydrocarbon => 20.0 + 1080.0 * (1.0 - 0.325 * (-0.167 * t).exp() - 0.675 * (-2.5 * t).exp()),
            Self::SlowHeating => slow_heating(t),
            Self::Parametric(fire) => fire.gas_celsius(t),
            Self::Points(points) => points.gas(t),
        }
    }

    /// Rate of the gas temperature in °C per minute.
    pub(super) fn gas_rate(&self, minutes: f64) -> f64 {
        let t = minutes.max(0.0);
        let log10_rate = |t: f64| 345.0 * 8.0 / ((8.0 * t + 1.0) * std::f64::consts::LN_10);
        match self {
            Self::Standard => log10_rate(t),
            Self::External => 660.0 * (0.687 * 0.32 * (-0.32 * t).exp() + 0.313 * 3.8 * (-3.8 * t).exp()),
            Self::Hydrocarbon => 1080.0 * (0.325 * 0.167 * (-0.167 * t).exp() + 0.675 * 2.5 * (-2.5 * t).exp()),
            // The curve starts vertically; the first second stands for it.
            Self::SlowHeating if t <= SLOW_END => 38.5 * t.max(1.0 / 60.0).powf(-0.75),
            Self::SlowHeating if t <= SLOW_JOINED => {
                (slow_heating(SLOW_JOINED) - slow_heating(SLOW_END)) / (SLOW_JOINED - SLOW_END)
            }
            Self::SlowHeating => log10_rate(t - 20.0),
            Self::Parametric(fire) => fire.gas_rate(t),
            Self::Points(points) => points.rate(t),
        }
    }

    /// Coefficient of heat transfer by convection in W/m²K.
    #[must_use]
    pub fn convection(&self) -> f64 {
        match self {
            Self::Standard | Self::External | Self::SlowHeating => 25.0,
            Self::Hydrocarbon => 50.0,
            Self::Parametric(_) => NATURAL_CONVECTION,
            Self::Points(points) => points.convection,
        }
    }

    /// Whether it is a nominal fire action, for which (4.26a) has its own shadow factor.
    #[must_use]
    pub const fn is_nominal(&self) -> bool {
        matches!(
            self,
            Self::Standard | Self::External | Self::Hydrocarbon | Self::SlowHeating
        )
    }

    /// Whether the gas ever cools.
    #[must_use]
    pub fn cools(&self) -> bool {
        match self {
            Self::Parametric(_) => true,
            Self::Points(points) => points.points.windows(2).any(|pair| pair[1].1 < pair[0].1),
            _ => false,
        }
    }

    /// Minutes at which the curve has a corner; a march lands on each.
    pub(super) fn kinks(&self) -> Vec<f64> {
        match self {
            Self::SlowHeating => vec![SLOW_END, SLOW_JOINED],
            Self::Parametric(fire) => fire.kinks(),
            Self::Points(points) => points.points.iter().map(|point| point.0).filter(|t| *t > 0.0).collect(),
            _ => Vec::new(),
        }
    }
}

/// Where the slow heating curve goes over to the standard one, min.
const SLOW_END: f64 = 21.0;
/// The two branches miss each other by 0.44 °C there. (4.27) counts a fall of the gas, however short, so it is taken
/// as a straight line over these 60 ms.
const SLOW_JOINED: f64 = SLOW_END + 1e-3;

fn slow_heating(t: f64) -> f64 {
    let late = |t: f64| 20.0 + 345.0 * (8.0 * (t - 20.0) + 1.0).log10();
    let early = |t: f64| 20.0 + 154.0 * t.sqrt().sqrt();
    if t <= SLOW_END {
        early(t)
    } else if t >= SLOW_JOINED {
        late(t)
    } else {
        let share = (t - SLOW_END) / (SLOW_JOINED - SLOW_END);
        early(SLOW_END) + share * (late(SLOW_JOINED) - early(SLOW_END))
    }
}

impl Eq for Fire {}

impl Hash for Fire {
    fn hash<H: Hasher>(&self, state: &mut H) {
        std::mem::discriminant(self).hash(state);
        match self {
            Self::Parametric(fire) => fire.hash_bits(state),
            Self::Points(points) => {
                points.convection.to_bits().hash(state);
                for (time, gas) in &points.points {
                    (time.to_bits(), gas.to_bits()).hash(state);
                }
            }
            _ => {}
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn rates_are_the_slopes_of_the_curves() {
        let points = vec![(0.0, 20.0), (10.0, 540.0), (30.0, 830.0), (90.0, 610.0)];
        let points = points
            .into_iter()
            .map(|(t, c)| (Time::from_min(t), Temperature::from_celsius(c)))
            .collect();
        let fires = [
            Fire::Standard,
            Fire::External,
            Fire::Hydrocarbon,
            Fire::SlowHeating,
            Fire::Points(Points::new(points, None).unwrap()),
        ];
        for fire in fires {
            for t in [0.5, 3.0, 12.0, 25.0, 70.0, 200.0] {
                let slope = (fire.gas_celsius(t + 1e-4) - fire.gas_celsius(t - 1e-4)) / 2e-4;
                assert!(
                    (slope - fire.gas_rate(t)).abs() < 1e-3 * slope.abs().max(1.0),
                    "{fire:?} at {t}"
                );
            }
        }
    }

    #[test]
    fn points_must_advance() {
        let points = |pairs: &[(f64, f64)]| {
            Points::new(
                pairs
                    .iter()
                    .map(|(t, c)| (Time::from_min(*t), Temperature::from_celsius(*c)))
                    .collect(),
                None,
            )
        };
        assert_eq!(points(&[(0.0, 20.0)]), Err(FireError::TooFewPoints));
        assert_eq!(
            points(&[(0.0, 20.0), (0.0, 30.0)]),
            Err(FireError::TimesNotIncreasing(1))
        );
        assert!(points(&[(0.0, 20.0), (5.0, f64::NAN)]).is_err());
        let held = points(&[(0.0, 20.0), (10.0, 520.0)]).unwrap();
        assert_eq!((held.gas(5.0), held.gas(99.0)), (270.0, 520.0));
    }
}
