//! The converged march: steel enthalpy followed by an embedded Runge-Kutta pair of order 5(4).
//!
//! Enthalpy, not temperature, is the state: the specific heat peaks at 735 °C, and a step over the peak that is held to
//! a tolerance in temperature errs by more than a degree, while the enthalpy runs smoothly through it.

use std::cell::Cell;

use super::steel::SpecificHeat;

/// Largest error of a step, J/kg (about 0.01 °C where the specific heat is least).
const TOLERANCE: f64 = 5.0;
/// Largest change of enthalpy in a step, J/kg (at most some 45 °C).
const LONGEST: f64 = 20_000.0;
/// Smallest step, s: below it the step is taken whatever its error.
const SHORTEST: f64 = 1e-4;
/// First step, s.
const FIRST: f64 = 1.0;
/// By how much a stage at either end of a step is moved inside, s: at a corner of the fire the rate jumps, and the
/// stage has to see the side that its step lies on. The estimate of error hardly weighs the first stage, so a slope
/// from before the corner would pass unseen.
const INSIDE: f64 = 1e-7;
/// An enthalpy this near to the wanted one is it, J/kg: some 1e-5 s of heating, far within the error of a step.
const NEAR: f64 = 1e-3;
/// Halvings that find the top of a step in which the steel turns from warming to cooling.
const HALVINGS: usize = 16;

thread_local! {
    static MARCHES: Cell<u64> = const { Cell::new(0) };
}

/// How many marches this thread has run: tests count work by it.
#[must_use]
pub fn marches() -> u64 {
    MARCHES.with(Cell::get)
}

/// The rate of enthalpy of a heated piece of steel.
pub trait Heated {
    /// dH/dt in W/kg at a time in s, of steel at a temperature in °C.
    fn rate(&self, seconds: f64, celsius: f64) -> f64;

    /// The specific heat that turns enthalpy into temperature.
    fn specific_heat(&self) -> SpecificHeat;

    /// Times in s at which the rate has a corner, in order.
    fn kinks(&self) -> Vec<f64>;

    /// Temperatures in °C at which the rate has a corner or a jump, in order.
    fn landings(&self) -> &'static [f64] {
        &[600.0, 735.0, 900.0]
    }

    /// When the march begins, s: before it the steel stays as it is.
    fn start(&self) -> f64 {
        0.0
    }

    /// Enthalpy at the start, J/kg above 20 °C.
    fn start_enthalpy(&self) -> f64 {
        0.0
    }
}

/// A step of a march: time in s and enthalpy in J/kg at both ends. Within a step the steel is nowhere hotter than at
/// the hotter of its ends.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Step {
    /// Time at the start, s.
    pub from: f64,
    /// Enthalpy at the start, J/kg.
    pub enthalpy_from: f64,
    /// Time at the end, s.
    pub to: f64,
    /// Enthalpy at the end, J/kg.
    pub enthalpy_to: f64,
}

/// Whether a march goes on.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Go {
    /// To the next step.
    On,
    /// No further.
    Stop,
}

/// dH/dt at a time and an enthalpy; steel is not followed below 20 °C.
fn rate_at(piece: &impl Heated, heat: SpecificHeat, t: f64, h: f64) -> f64 {
    let rate = piece.rate(t, heat.temperature(h));
    if h <= 0.0 { rate.max(0.0) } else { rate }
}

/// Marches to `until` s, showing every step to `each`, which may stop it. Answers the enthalpy reached.
pub fn march(piece: &impl Heated, until: f64, mut each: impl FnMut(Step) -> Go) -> f64 {
    MARCHES.with(|count| count.set(count.get() + 1));
    let heat = piece.specific_heat();
    let landings: Vec<f64> = piece.landings().iter().map(|celsius| heat.enthalpy(*celsius)).collect();
    let mut kinks = piece.kinks();
    kinks.push(until);
    let mut t = piece.start().min(until);
    let mut h = piece.start_enthalpy();
    let mut size = FIRST;
    for kink in kinks {
        let end = kink.min(until);
        // Behind a corner the rate may be another: begin carefully.
        size = size.min(FIRST);
        while t < end {
            let rate = rate_at(piece, heat, t + INSIDE, h);
            if rate == 0.0 {
                // Held as it is, as behind protection that takes up the heat itself: on to where that ends.
                let to = release(|t| rate_at(piece, heat, t, h), t, end);
                let step = Step {
                    from: t,
                    enthalpy_from: h,
                    to,
                    enthalpy_to: h,
                };
                t = to;
                size = FIRST;
                if each(step) == Go::Stop {
                    return h;
                }
                continue;
            }
            size = size.min(LONGEST / rate.abs().max(1e-9));
            let mut landing = None;
            if let Some(target) = next_landing(&landings, h, rate) {
                let reach = (target - h) / rate;
                if reach > SHORTEST && reach < 1.5 * size {
                    size = size.min(reach);
                    landing = Some(target);
                }
            }
            let mut last = t + size >= end;
            if last {
                size = end - t;
            }
            let mut stride = pair(piece, heat, t, h, size, rate);
            let scale = stride.error / TOLERANCE;
            if scale > 1.0 && size > SHORTEST {
                size = (size * (0.9 * scale.powf(-0.2)).clamp(0.1, 0.9)).max(SHORTEST);
                continue;
            }
            let mut taken = size;
            if rate > 0.0 && stride.rate < 0.0 && size > SHORTEST {
                (taken, stride) = to_top(piece, heat, (t, h), (size, stride), rate);
                last = last && taken >= size;
            }
            let to = if last { end } else { t + taken };
            let step = Step {
                from: t,
                enthalpy_from: h,
                to,
                enthalpy_to: stride.enthalpy.max(0.0),
            };
            t = to;
            h = step.enthalpy_to;
            if each(step) == Go::Stop {
                return h;
            }
            // Behind a landing the rate may jump: begin carefully again.
            size = if landing.is_some_and(|target| (target - h).abs() < 500.0) {
                size.min(FIRST)
            } else {
                size * (0.9 * scale.max(1e-6).powf(-0.2)).clamp(0.5, 4.0)
            };
        }
    }
    h
}

/// When a rate that is zero ceases to be so between two corners of the fire, to 1 ms after; the end if it does not.
/// Searched to the very end: a short flare between two corners must not be overlooked.
fn release(rate: impl Fn(f64) -> f64, from: f64, end: f64) -> f64 {
    let inside = end - INSIDE;
    if inside <= from + INSIDE {
        return end;
    }
    let (mut before, mut reach) = (from, FIRST);
    loop {
        let t = (from + reach).min(inside);
        if rate(t) != 0.0 {
            let mut after = t;
            while after - before > 1e-3 {
                let middle = 0.5 * (before + after);
                if rate(middle) == 0.0 {
                    before = middle;
                } else {
                    after = middle;
                }
            }
            return after;
        }
        if t >= inside {
            return end;
        }
        before = t;
        reach *= 1.25;
    }
}

/// The part of a step up to just past its top, where the rate turns negative.
fn to_top(
    piece: &impl Heated,
    heat: SpecificHeat,
    (t, h): (f64, f64),
    (size, whole): (f64, Stride),
    rate: f64,
) -> (f64, Stride) {
    let (mut low, mut high, mut stride) = (0.0, size, whole);
    for _ in 0..HALVINGS {
        let middle = 0.5 * (low + high);
        let part = pair(piece, heat, t, h, middle, rate);
        if part.rate < 0.0 {
            (high, stride) = (middle, part);
        } else {
            low = middle;
        }
    }
    (high, stride)
}

/// The enthalpy at which the rate has its next corner, in the direction of the march.
fn next_landing(landings: &[f64], h: f64, rate: f64) -> Option<f64> {
    if rate > 0.0 {
        landings.iter().copied().find(|landing| *landing > h + 50.0)
    } else {
        landings.iter().rev().copied().find(|landing| *landing < h - 50.0)
    }
}

/// The time in s within a step at which the enthalpy is `wanted`, by steps of the same pair from its start.
#[must_use]
pub fn time_within(piece: &impl Heated, step: Step, wanted: f64) -> f64 {
    if step.enthalpy_to == wanted {
        return step.to;
    }
    let heat = piece.specific_heat();
    let rate = rate_at(piece, heat, step.from + INSIDE, step.enthalpy_from);
    let (mut low, mut high) = (0.0, step.to - step.from);
    let (mut h_low, mut h_high) = (step.enthalpy_from - wanted, step.enthalpy_to - wanted);
    for _ in 0..60 {
        if high - low < 1e-6 || h_low == h_high {
            break;
        }
        // A secant held inside the bracket.
        let share = (h_low / (h_low - h_high)).clamp(0.05, 0.95);
        let middle = low + share * (high - low);
        let h = pair(piece, heat, step.from, step.enthalpy_from, middle, rate).enthalpy - wanted;
        if h.abs() < NEAR {
            return step.from + middle;
        }
        if (h > 0.0) == (h_high > 0.0) {
            (high, h_high) = (middle, h);
        } else {
            (low, h_low) = (middle, h);
        }
    }
    step.from + if h_low.abs() < h_high.abs() { low } else { high }
}

/// The enthalpy within a step at a time in s, by a step of the same pair from its start.
#[must_use]
pub fn enthalpy_within(piece: &impl Heated, step: Step, time: f64) -> f64 {
    // Where the steel is held as it is, the rate that the pair would take is not the one that was marched.
    if time >= step.to || step.enthalpy_from == step.enthalpy_to {
        return step.enthalpy_to;
    }
    if time <= step.from {
        return step.enthalpy_from;
    }
    let heat = piece.specific_heat();
    let rate = rate_at(piece, heat, step.from + INSIDE, step.enthalpy_from);
    let stride = pair(piece, heat, step.from, step.enthalpy_from, time - step.from, rate);
    stride.enthalpy.max(0.0)
}

/// What a step of the pair comes to.
#[derive(Clone, Copy)]
struct Stride {
    /// Enthalpy at its end, of order 5, J/kg.
    enthalpy: f64,
    /// Difference to that of order 4, J/kg.
    error: f64,
    /// Rate at its end, W/kg.
    rate: f64,
}

/// One step of the pair of Dormand and Prince (J. Comp. Appl. Math. 6 (1980) 19, RK5(4)7M).
fn pair(piece: &impl Heated, heat: SpecificHeat, t: f64, h: f64, size: f64, k1: f64) -> Stride {
    let at = |share: f64, h: f64| rate_at(piece, heat, t + share * size, h);
    let k2 = at(0.2, h + size * 0.2 * k1);
    let k3 = at(0.3, h + size * (3.0 / 40.0 * k1 + 9.0 / 40.0 * k2));
    let k4 = at(0.8, h + size * (44.0 / 45.0 * k1 - 56.0 / 15.0 * k2 + 32.0 / 9.0 * k3));
    let k5 = at(
        8.0 / 9.0,
        h + size * (19372.0 / 6561.0 * k1 - 25360.0 / 2187.0 * k2 + 64448.0 / 6561.0 * k3 - 212.0 / 729.0 * k4),
    );
    let end = t + (size - INSIDE).max(0.0);
    let k6 = rate_at(
        piece,
        heat,
        end,
        h + size
            * (9017.0 / 3168.0 * k1 - 355.0 / 33.0 * k2 + 46732.0 / 5247.0 * k3 + 49.0 / 176.0 * k4
                - 5103.0 / 18656.0 * k5),
    );
    let next = h + size
        * (35.0 / 384.0 * k1 + 500.0 / 1113.0 * k3 + 125.0 / 192.0 * k4 - 2187.0 / 6784.0 * k5 + 11.0 / 84.0 * k6);
    let k7 = rate_at(piece, heat, end, next);
    let error = size
        * (71.0 / 57600.0 * k1 - 71.0 / 16695.0 * k3 + 71.0 / 1920.0 * k4 - 17253.0 / 339_200.0 * k5
            + 22.0 / 525.0 * k6
            - 1.0 / 40.0 * k7);
    Stride {
        enthalpy: next,
        error: error.abs(),
        rate: k7,
    }
}
