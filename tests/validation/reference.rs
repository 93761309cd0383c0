//! A second solver for steel temperatures, sharing nothing with the product's: the steel temperature itself is the
//! state, followed by the midpoint rule at a small fixed step; the rise of the gas is taken as its difference over
//! the step, as EN 1993-1-2:2005 (4.27) writes it. Formulas of the gas and of steel are written out once more.
//!
//! Its own error is bounded by `halving_the_step_changes_nothing` in `heating_grid.rs`.

use scorchline::heating::fire::{Fire, Growth, Parametric, ParametricInput, Points};
use scorchline::units::{Temperature, Time};

/// A fire of the grid, written independently of the product's.
#[derive(Debug, Clone)]
pub enum Gas {
    Standard,
    External,
    Hydrocarbon,
    Slow,
    /// Opening factor, thermal inertia, load per enclosure, shortest heating phase in hours.
    Annex(f64, f64, f64, f64),
    Given(Vec<(f64, f64)>),
}

impl Gas {
    /// °C after so many minutes.
    pub fn at(&self, t: f64) -> f64 {
        let iso = |t: f64| 20.0 + 345.0 / 10f64.ln() * (8.0 * t).ln_1p();
        match self {
            Self::Standard => iso(t),
            Self::External => 680.0 - 660.0 * (0.687 * (-0.32 * t).exp() + 0.313 * (-3.8 * t).exp()),
            Self::Hydrocarbon => 1100.0 - 1080.0 * (0.325 * (-0.167 * t).exp() + 0.675 * (-2.5 * t).exp()),
            Self::Slow if t <= 21.0 => 20.0 + 154.0 * t.powf(0.25),
            Self::Slow => iso(t - 20.0),
            Self::Annex(o, b, q, limit) => annex(*o, *b, *q, *limit, t / 60.0),
            Self::Given(points) => {
                for pair in points.windows(2) {
                    let ((t0, c0), (t1, c1)) = (pair[0], pair[1]);
                    if t <= t1 {
                        return c0 + (c1 - c0) * ((t - t0) / (t1 - t0)).max(0.0);
                    }
                }
                points[points.len() - 1].1
            }
        }
    }

    fn convection(&self) -> f64 {
        match self {
            Self::Hydrocarbon => 50.0,
            Self::Annex(..) | Self::Given(_) => 35.0,
            _ => 25.0,
        }
    }

    /// The same fire as the product has it.
    pub fn fire(&self) -> Fire {
        match self {
            Self::Standard => Fire::Standard,
            Self::External => Fire::External,
            Self::Hydrocarbon => Fire::Hydrocarbon,
            Self::Slow => Fire::SlowHeating,
            Self::Annex(o, b, q, limit) => {
                let growth = match (limit * 60.0).round() as i32 {
                    15 => Growth::Fast,
                    20 => Growth::Medium,
                    _ => Growth::Slow,
                };
                let input = ParametricInput {
                    opening_factor: *o,
                    fire_load: 3.0 * q,
                    thermal_inertia: *b,
                    floor_area: 100.0,
                    enclosure_area: 300.0,
                    growth,
                    height: None,
                    roof_openings: false,
                };
                Fire::Parametric(Parametric::new(input).unwrap())
            }
            Self::Given(points) => {
                let points = points.iter();
                let points = points.map(|(t, c)| (Time::from_min(*t), Temperature::from_celsius(*c)));
                Fire::Points(Points::new(points.collect(), None).unwrap())
            }
        }
    }
}

/// EN 1991-1-2:2002 Annex A, hours.
fn annex(o: f64, b: f64, q: f64, limit: f64, hours: f64) -> f64 {
    let gamma = |o: f64| (o * 1160.0 / (b * 0.04)).powi(2);
    let hot =
        |x: f64| 1345.0 - 1325.0 * (0.324 * (-x / 5.0).exp() + 0.204 * (-1.7 * x).exp() + 0.472 * (-19.0 * x).exp());
    let by_load = 2e-4 * q / o;
    let (end, speed) = if by_load >= limit {
        (by_load, gamma(o))
    } else {
        let k = if o > 0.04 && q < 75.0 && b < 1160.0 {
            1.0 + (o / 0.04 - 1.0) * (q / 75.0 - 1.0) * (1.0 - b / 1160.0)
        } else {
            1.0
        };
        (limit, k * gamma(1e-4 * q / limit))
    };
    if hours <= end {
        return hot(speed * hours);
    }
    let star = by_load * gamma(o);
    let fall = match star {
        s if s <= 0.5 => 625.0,
        s if s < 2.0 => 250.0 * (3.0 - s),
        _ => 250.0,
    };
    (hot(speed * end) - fall * gamma(o) * (hours - end)).max(20.0)
}

/// EN 1993-1-2:2005 (3.2a) to (3.2d).
fn specific_heat(t: f64) -> f64 {
    match t {
        t if t < 600.0 => 425.0 + t * (0.773 + t * (-1.69e-3 + t * 2.22e-6)),
        t if t < 735.0 => 666.0 + 13002.0 / (738.0 - t),
        t if t < 900.0 => 545.0 + 17820.0 / (t - 731.0),
        _ => 650.0,
    }
}

/// Steel, bare or protected.
#[derive(Debug, Clone, Copy)]
pub enum Steel {
    /// ksh Am/V and whether galvanised.
    Bare(f64, bool),
    /// Ap/V, thickness in m, λ, ρ, c of the protection.
    Behind(f64, f64, f64, f64, f64),
}

impl Steel {
    /// °C per second; `rise` is that of the gas in °C per second.
    fn rate(self, gas: &Gas, hot: f64, rise: f64, t: f64) -> f64 {
        let c = specific_heat(t);
        match self {
            Self::Bare(factor, zinc) => {
                let emissivity = if zinc && t <= 500.0 { 0.35 } else { 0.7 };
                let (hot4, cold4) = ((hot + 273.0).powi(4), (t + 273.0).powi(4));
                let flux = gas.convection() * (hot - t) + emissivity * 5.67e-8 * (hot4 - cold4);
                factor * flux / (c * 7850.0)
            }
            Self::Behind(factor, d, conductivity, density, heat) => {
                let phi = heat * density * d * factor / (c * 7850.0);
                let flow = conductivity / d * factor * (hot - t) / (c * 7850.0 * (1.0 + phi / 3.0));
                let all = flow - (phi / 10.0).exp_m1() * rise;
                if rise > 0.0 { all.max(0.0) } else { all }
            }
        }
    }
}

/// Steel temperature and the highest so far, in °C, at every whole minute up to `minutes`.
pub fn history(gas: &Gas, steel: Steel, minutes: usize, step: f64) -> Vec<(f64, f64)> {
    let a_minute = (60.0 / step).round() as usize;
    let (mut t, mut top): (f64, f64) = (20.0, 20.0);
    let mut rows = vec![(t, top)];
    let mut before = gas.at(0.0);
    for n in 0..minutes * a_minute {
        let now = n as f64 / a_minute as f64;
        let (middle, after) = (gas.at(now + 0.5 / a_minute as f64), gas.at(now + 1.0 / a_minute as f64));
        let rise = (after - before) / step;
        let half = t + 0.5 * step * steel.rate(gas, before, rise, t);
        t += step * steel.rate(gas, middle, rise, half);
        top = top.max(t);
        before = after;
        if (n + 1) % a_minute == 0 {
            rows.push((t, top));
        }
    }
    rows
}
