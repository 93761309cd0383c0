//! The code's own explicit marches, step by step, for checking by hand.
//!
//! EN 1993-1-2:2005 4.2.5.1 (4) allows steps up to 5 s for bare steel, 4.2.5.2 (2) up to 30 s for protected. The result
//! depends on the step; the product reports the converged one.

use super::fire::Fire;
use super::flux::{Bare, Insulation};
use super::march::Heated;
use super::steel::{DENSITY, SpecificHeat};
use crate::units::{Length, SectionFactor, Temperature, Time};

/// A row of an explicit march.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Row {
    /// Time.
    pub time: Time,
    /// Gas temperature at that time.
    pub gas: Temperature,
    /// Steel temperature at that time.
    pub steel: Temperature,
}

/// Bare steel by (4.25): the gas is taken at the end of each step.
#[must_use]
pub fn bare(piece: &Bare<'_>, until: Time, step: Time) -> Vec<Row> {
    let mut steel = 20.0;
    rows(piece.fire, until, step, |seconds, _| {
        let rate = piece.rate(seconds, steel);
        steel += rate * step.s() / SpecificHeat::En1993.at(steel);
        steel
    })
}

/// Protected steel by (4.27): the gas is taken at the end of each step, the increment held at zero while the gas heats.
#[must_use]
pub fn protected(
    fire: &Fire,
    factor: SectionFactor,
    insulation: &Insulation,
    thickness: Length,
    until: Time,
    step: Time,
) -> Vec<Row> {
    let mut steel = 20.0;
    let d = thickness.m();
    rows(fire, until, step, |seconds, before| {
        let gas = fire.gas_celsius(seconds / 60.0);
        let heat = SpecificHeat::En1993.at(steel);
        let phi = insulation.specific_heat.j_kgk() * insulation.density.kg_m3() * d * factor.per_m() / (heat * DENSITY);
        let inflow = insulation.conduction_at(0.5 * (gas + steel)) * factor.per_m() * (gas - steel)
            / (d * heat * DENSITY * (1.0 + phi / 3.0));
        let rise = gas - before;
        let increment = inflow * step.s() - ((phi / 10.0).exp() - 1.0) * rise;
        steel += if rise > 0.0 { increment.max(0.0) } else { increment };
        steel
    })
}

/// Rows at every step; `advance` takes the time at the end of the step in s and the gas temperature before it.
fn rows(fire: &Fire, until: Time, step: Time, mut advance: impl FnMut(f64, f64) -> f64) -> Vec<Row> {
    let count = (until.s() / step.s()).round() as usize;
    let mut gas = fire.gas_celsius(0.0);
    let row = |seconds: f64, gas: f64, steel: f64| Row {
        time: Time::from_s(seconds),
        gas: Temperature::from_celsius(gas),
        steel: Temperature::from_celsius(steel),
    };
    let mut rows = vec![row(0.0, gas, 20.0)];
    for n in 1..=count {
        let seconds = n as f64 * step.s();
        let steel = advance(seconds, gas);
        gas = fire.gas_celsius(seconds / 60.0);
        rows.push(row(seconds, gas, steel));
    }
    rows
}
