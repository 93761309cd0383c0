//! The parametric fire of EN 1991-1-2:2002 Annex A (from memory).

use std::hash::{Hash, Hasher};

use super::fire::FireError;
use crate::units::Length;

/// Growth rate of the fire, which sets the shortest heating phase tlim.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Growth {
    /// 25 min.
    Slow,
    /// 20 min.
    Medium,
    /// 15 min.
    Fast,
}

impl Growth {
    /// tlim in hours (A.10).
    const fn limit_h(self) -> f64 {
        match self {
            Self::Slow => 25.0 / 60.0,
            Self::Medium => 20.0 / 60.0,
            Self::Fast => 15.0 / 60.0,
        }
    }
}

/// What a parametric fire is made from.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ParametricInput {
    /// Opening factor O in m½.
    pub opening_factor: f64,
    /// Fire load qf,d per floor area in MJ/m², its δ factors included.
    pub fire_load: f64,
    /// Thermal inertia b in J/m²s½K.
    pub thermal_inertia: f64,
    /// Floor area Af in m².
    pub floor_area: f64,
    /// Enclosure area At in m².
    pub enclosure_area: f64,
    /// Growth rate.
    pub growth: Growth,
    /// Height of the compartment, if known.
    pub height: Option<Length>,
    /// Whether the roof has openings.
    pub roof_openings: bool,
}

/// A parametric fire.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Parametric {
    input: ParametricInput,
    /// qt,d, MJ per m² of enclosure.
    load: f64,
    /// Γ.
    gamma: f64,
    /// Γ or Γlim: by which the heating phase runs.
    heating_gamma: f64,
    /// End of heating in hours.
    end: f64,
    /// Highest gas temperature.
    top: f64,
    /// t*max and x of the cooling phase.
    star_max: f64,
    delay: f64,
}

/// A bound of Annex A that a fire lies outside of.
#[derive(Debug, Clone, PartialEq)]
pub struct Breach {
    /// What lies outside, with its value.
    pub what: String,
    /// The bound.
    pub bound: &'static str,
}

impl Parametric {
    /// Makes the fire.
    ///
    /// # Errors
    /// Any number that is not above zero, the factor k of (A.10) included: that of an opening factor of 0.2 m½, 50 MJ/m² and
    /// 100 J/m²s½K, all within the validity of Annex A, is -0.22, and steel in such a gas would never warm. Values outside the validity of Annex A are no error: see
    /// [`Parametric::outside_validity`].
    pub fn new(input: ParametricInput) -> Result<Self, FireError> {
        let numbers = [
            ("opening factor", input.opening_factor),
            ("fire load", input.fire_load),
            ("thermal inertia", input.thermal_inertia),
            ("floor area", input.floor_area),
            ("enclosure area", input.enclosure_area),
        ];
        if let Some((name, _)) = numbers.iter().find(|(_, value)| !(value.is_finite() && *value > 0.0)) {
            return Err(FireError::NotPositive(name));
        }
        let (o, b) = (input.opening_factor, input.thermal_inertia);
        let load = input.fire_load * input.floor_area / input.enclosure_area;
        let reference = (0.04_f64 / 1160.0).powi(2);
        let gamma = (o / b).powi(2) / reference;
        let limit = input.growth.limit_h();
        let by_load = 0.2e-3 * load / o;
        let fuel_controlled = by_load < limit;
        let heating_gamma = if fuel_controlled {
            // (A.9): O,lim from the limit time, with k of (A.10) where the openings are large and load and lining small.
            let limited = 0.1e-3 * load / limit;
            let k = if o > 0.04 && load < 75.0 && b < 1160.0 {
                1.0 + ((o - 0.04) / 0.04) * ((load - 75.0) / 75.0) * ((1160.0 - b) / 1160.0)
            } else {
                1.0
            };
            if k <= 0.0 {
                return Err(FireError::NeverWarms(k));
            }
            k * (limited / b).powi(2) / reference
        } else {
            gamma
        };
        let end = by_load.max(limit);
        let star_max = by_load * gamma;
        let delay = if fuel_controlled { limit * gamma / star_max } else { 1.0 };
        let top = heating(heating_gamma * end);
        Ok(Self {
            input,
            load,
            gamma,
            heating_gamma,
            end,
            top,
            star_max,
            delay,
        })
    }

    pub(super) fn gas_celsius(&self, minutes: f64) -> f64 {
        let hours = minutes / 60.0;
        if hours <= self.end {
            return heating(self.heating_gamma * hours);
        }
        let since = self.gamma * hours - self.star_max * self.delay;
        (self.top - self.slope() * since).max(20.0)
    }

    pub(super) fn gas_rate(&self, minutes: f64) -> f64 {
        let hours = minutes / 60.0;
        if hours <= self.end {
            return heating_slope(self.heating_gamma * hours) * self.heating_gamma / 60.0;
        }
        let cold = self.gas_celsius(minutes) <= 20.0;
        if cold { 0.0 } else { -self.slope() * self.gamma / 60.0 }
    }

    /// °C per unit of t* in the cooling phase (A.11).
    fn slope(&self) -> f64 {
        if self.star_max <= 0.5 {
            625.0
        } else if self.star_max < 2.0 {
            250.0 * (3.0 - self.star_max)
        } else {
            250.0
        }
    }

    pub(super) fn kinks(&self) -> Vec<f64> {
        let cold = self.end + (self.top - 20.0) / (self.slope() * self.gamma)
            - (self.gamma * self.end - self.star_max * self.delay).min(0.0) / self.gamma;
        vec![self.end * 60.0, cold * 60.0]
    }

    /// The end of the heating phase in minutes and the highest gas temperature in °C.
    #[must_use]
    pub const fn peak(&self) -> (f64, f64) {
        (self.end * 60.0, self.top)
    }

    /// Γ and the gamma of the heating phase (Γlim times k where the fire is fuel controlled).
    #[must_use]
    pub const fn gammas(&self) -> (f64, f64) {
        (self.gamma, self.heating_gamma)
    }

    /// The bounds of Annex A (1) to (5) that the fire lies outside of. The height bound is tested where it is stated.
    #[must_use]
    pub fn outside_validity(&self) -> Vec<Breach> {
        let input = &self.input;
        let mut breaches = Vec::new();
        let mut test = |inside: bool, what: String, bound: &'static str| {
            if !inside {
                breaches.push(Breach { what, bound });
            }
        };
        test(
            input.floor_area <= 500.0,
            format!("the floor area is {} m²", input.floor_area),
            "at most 500 m²",
        );
        test(
            (0.02..=0.20).contains(&input.opening_factor),
            format!("the opening factor is {} m½", input.opening_factor),
            "0.02 to 0.20 m½",
        );
        test(
            (100.0..=2200.0).contains(&input.thermal_inertia),
            format!("the thermal inertia is {} J/m²s½K", input.thermal_inertia),
            "100 to 2200 J/m²s½K",
        );
        test(
            (50.0..=1000.0).contains(&self.load),
            format!("the fire load per enclosure area is {:.1} MJ/m²", self.load),
            "50 to 1000 MJ/m²",
        );
        if let Some(height) = input.height {
            test(
                height.m() <= 4.0,
                format!("the compartment is {} m high", height.m()),
                "at most 4 m",
            );
        }
        test(
            !input.roof_openings,
            "the roof has openings".to_owned(),
            "no openings in the roof",
        );
        breaches
    }

    pub(super) fn hash_bits<H: Hasher>(&self, state: &mut H) {
        for number in [
            self.gamma,
            self.heating_gamma,
            self.end,
            self.top,
            self.star_max,
            self.delay,
        ] {
            number.to_bits().hash(state);
        }
    }
}

/// (A.1) with t* in hours.
fn heating(star: f64) -> f64 {
    20.0 + 1325.0 * (1.0 - 0.324 * (-0.2 * star).exp() - 0.204 * (-1.7 * star).exp() - 0.472 * (-19.0 * star).exp())
}

fn heating_slope(star: f64) -> f64 {
    1325.0
        * (0.324 * 0.2 * (-0.2 * star).exp() + 0.204 * 1.7 * (-1.7 * star).exp() + 0.472 * 19.0 * (-19.0 * star).exp())
}

#[cfg(test)]
mod tests {
    use super::*;

    fn fire(opening_factor: f64, load: f64, thermal_inertia: f64) -> Result<Parametric, FireError> {
        Parametric::new(ParametricInput {
            opening_factor,
            fire_load: 3.0 * load,
            thermal_inertia,
            floor_area: 100.0,
            enclosure_area: 300.0,
            growth: Growth::Fast,
            height: None,
            roof_openings: false,
        })
    }

    /// (A.10) by hand: 1 + (0.16/0.04)(-25/75)(1060/1160) = -0.218; 1 + (0.06/0.04)(-25/75)(160/1160) = 0.931.
    #[test]
    fn a_gas_that_would_never_warm_is_refused() {
        match fire(0.20, 50.0, 100.0) {
            Err(FireError::NeverWarms(k)) => assert!((k + 0.218).abs() < 5e-4, "{k}"),
            other => panic!("{other:?}"),
        }
        let warms = fire(0.10, 50.0, 1000.0).unwrap();
        let limited = (0.1e-3 * 50.0 / 0.25 / 1000.0_f64).powi(2) / (0.04_f64 / 1160.0).powi(2);
        assert!((warms.gammas().1 / limited - 0.931).abs() < 5e-4);
        assert!(warms.gas_celsius(5.0) > 20.0);
    }
}
