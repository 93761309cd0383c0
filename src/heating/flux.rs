//! Bare and protected steel in a fire (EN 1993-1-2:2005 4.2.5.1 (4.25), 4.2.5.2 (4.27); from memory).

use std::hash::{Hash, Hasher};

use super::fire::Fire;
use super::march::{Go, Heated, Step, march, time_within};
use super::steel::{DENSITY, SpecificHeat};
use crate::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat as HeatCapacity, Temperature, Time};

/// Stefan-Boltzmann constant in W/m²K⁴ as EN 1991-1-2:2002 3.1 (6) rounds it.
pub const STEFAN_BOLTZMANN: f64 = 5.67e-8;
/// The longest time for which resistances are looked for, min.
pub const HORIZON: f64 = 360.0;
/// The least section factor that is computed with, 1/m (EN 1993-1-2:2005 4.2.5.1 (5)).
pub const LEAST_FACTOR: f64 = 10.0;

/// Emissivity of the member's surface, the flames' being 1.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Emissivity {
    /// 0.7 (EN 1993-1-2:2005 2.2 (2); from memory).
    Steel,
    /// 0.35 up to 500 °C, 0.7 above (from memory of the second generation of EN 1993-1-2), for declared zinc coatings.
    Galvanised,
}

impl Emissivity {
    const fn at(self, celsius: f64) -> f64 {
        match self {
            Self::Galvanised if celsius <= 500.0 => 0.35,
            _ => 0.7,
        }
    }
}

/// Net heat flux in W/m² to a surface in gas (EN 1991-1-2:2002 (3.1) to (3.3), with 273 K as printed).
#[must_use]
pub fn net_flux(convection: f64, emissivity: f64, gas: f64, steel: f64) -> f64 {
    convection * (gas - steel) + emissivity * STEFAN_BOLTZMANN * ((gas + 273.0).powi(4) - (steel + 273.0).powi(4))
}

/// The factor to compute with: 10 1/m for anything below (EN 1993-1-2:2005 4.2.5.1 (5)).
#[must_use]
pub fn effective_factor(factor: SectionFactor) -> SectionFactor {
    SectionFactor::from_per_m(factor.per_m().max(LEAST_FACTOR))
}

/// A bare member: (4.25).
#[derive(Debug, Clone, Copy)]
pub struct Bare<'a> {
    /// The fire.
    pub fire: &'a Fire,
    /// Am/V.
    pub factor: SectionFactor,
    /// Correction factor for the shadow effect ksh.
    pub shadow: f64,
    /// Emissivity of the surface.
    pub emissivity: Emissivity,
}

impl Heated for Bare<'_> {
    fn rate(&self, seconds: f64, celsius: f64) -> f64 {
        let gas = self.fire.gas_celsius(seconds / 60.0);
        let flux = net_flux(self.fire.convection(), self.emissivity.at(celsius), gas, celsius);
        self.shadow * self.factor.per_m() / DENSITY * flux
    }

    fn specific_heat(&self) -> SpecificHeat {
        SpecificHeat::En1993
    }

    fn kinks(&self) -> Vec<f64> {
        self.fire.kinks().into_iter().map(|minutes| 60.0 * minutes).collect()
    }

    fn landings(&self) -> &'static [f64] {
        match self.emissivity {
            Emissivity::Steel => &[735.0],
            Emissivity::Galvanised => &[500.0, 735.0],
        }
    }
}

/// Thermal conductivity of a protection material.
#[derive(Debug, Clone, PartialEq)]
pub enum Conduction {
    /// One value.
    Constant(Conductivity),
    /// A table over the material's temperature, ascending; straight lines between, the ends held.
    Table(Vec<(Temperature, Conductivity)>),
}

impl Conduction {
    /// λp in W/mK at a temperature in °C.
    fn at(&self, celsius: f64) -> f64 {
        match self {
            Self::Constant(value) => value.w_mk(),
            Self::Table(rows) => {
                let after = rows.partition_point(|row| row.0.celsius() <= celsius);
                match (after.checked_sub(1).map(|at| rows[at]), rows.get(after)) {
                    (None, Some(first)) => first.1.w_mk(),
                    (Some(last), None) => last.1.w_mk(),
                    (Some(a), Some(b)) => {
                        let share = (celsius - a.0.celsius()) / (b.0.celsius() - a.0.celsius());
                        a.1.w_mk() + share * (b.1.w_mk() - a.1.w_mk())
                    }
                    (None, None) => 0.0,
                }
            }
        }
    }
}

/// A protection material by its thermal properties, without its thickness.
#[derive(Debug, Clone, PartialEq)]
pub struct Insulation {
    /// λp.
    pub conduction: Conduction,
    /// cp.
    pub specific_heat: HeatCapacity,
    /// ρp.
    pub density: Density,
    /// Moisture in % by mass whose delay is counted; `None` where the assessed conductivity holds it.
    pub moisture_delay: Option<f64>,
}

impl Insulation {
    /// λp in W/mK at a temperature of the material in °C.
    pub(super) fn conduction_at(&self, celsius: f64) -> f64 {
        self.conduction.at(celsius)
    }
}

impl Eq for Insulation {}

impl Hash for Insulation {
    fn hash<H: Hasher>(&self, state: &mut H) {
        match &self.conduction {
            Conduction::Constant(value) => value.bits().hash(state),
            Conduction::Table(rows) => rows.iter().for_each(|(t, c)| (t.bits(), c.bits()).hash(state)),
        }
        (
            self.specific_heat.bits(),
            self.density.bits(),
            self.moisture_delay.map(f64::to_bits),
        )
            .hash(state);
    }
}

/// A member behind protection: (4.27).
#[derive(Debug, Clone, Copy)]
pub struct Protected<'a> {
    fire: &'a Fire,
    insulation: &'a Insulation,
    factor: f64,
    thickness: f64,
    /// How long the steel is held at 100 °C, s.
    delay: f64,
}

impl<'a> Protected<'a> {
    /// Steel with the section factor Ap/V behind a thickness of protection.
    #[must_use]
    pub fn new(fire: &'a Fire, factor: SectionFactor, insulation: &'a Insulation, thickness: Length) -> Self {
        let thickness = thickness.m();
        let delay = insulation
            .moisture_delay
            .map_or(0.0, |percent| 60.0 * moisture_delay(insulation, thickness, percent));
        Self {
            fire,
            insulation,
            factor: factor.per_m(),
            thickness,
            delay,
        }
    }

    /// (4.27) as a rate of enthalpy, before it is held at zero.
    fn raw_rate(&self, seconds: f64, celsius: f64) -> f64 {
        let minutes = seconds / 60.0;
        let gas = self.fire.gas_celsius(minutes);
        let heat = SpecificHeat::En1993.at(celsius);
        let material = self.insulation;
        let phi =
            material.specific_heat.j_kgk() * material.density.kg_m3() * self.thickness * self.factor / (heat * DENSITY);
        // The material's own temperature is halfway between gas and steel.
        let conductivity = material.conduction.at(0.5 * (gas + celsius));
        let inflow = conductivity * self.factor * (gas - celsius) / (self.thickness * DENSITY * (1.0 + phi / 3.0));
        inflow - heat * ((phi / 10.0).exp() - 1.0) * self.fire.gas_rate(minutes) / 60.0
    }

    /// (4.27) as a rate of enthalpy, W/kg: not below zero while the gas heats, for the protection takes up that heat.
    fn rate(&self, seconds: f64, celsius: f64) -> f64 {
        let raw = self.raw_rate(seconds, celsius);
        let heating = self.fire.gas_rate(seconds / 60.0) > 0.0;
        if heating { raw.max(0.0) } else { raw }
    }

    /// The highest steel temperature up to a time. It is that at the time itself unless the fire cools.
    #[must_use]
    pub fn hottest_until(&self, time: Time) -> Temperature {
        celsius(self.top(time).1)
    }

    /// When the steel is hottest within 360 min, and how hot; for fires that never cool that is the end.
    #[must_use]
    pub fn peak(&self) -> (Time, Temperature) {
        let (seconds, h) = self.top(Time::from_min(HORIZON));
        (Time::from_s(seconds), celsius(h))
    }

    fn top(&self, time: Time) -> (f64, f64) {
        top(|each| self.run(time.s(), |_, step| each(step)))
    }

    /// Marches, holding the steel at 100 °C for the moisture delay; shows each step with what was marched.
    pub(super) fn run(&self, until: f64, mut each: impl FnMut(&Stage<'_>, Step) -> Go) {
        let mut stage = Stage {
            piece: self,
            start: 0.0,
            enthalpy: 0.0,
        };
        if self.delay <= 0.0 {
            march(&stage, until, |step| each(&stage, step));
            return;
        }
        let held = SpecificHeat::En1993.enthalpy(100.0);
        let mut reached = None;
        let mut stopped = false;
        march(&stage, until, |step| {
            let mut step = step;
            if step.enthalpy_to >= held {
                step.to = time_within(&stage, step, held);
                step.enthalpy_to = held;
                reached = Some(step.to);
            }
            stopped = each(&stage, step) == Go::Stop;
            if stopped || reached.is_some() { Go::Stop } else { Go::On }
        });
        let Some(reached) = reached.filter(|_| !stopped) else {
            return;
        };
        stage.start = (reached + self.delay).min(until);
        stage.enthalpy = held;
        let waiting = Step {
            from: reached,
            enthalpy_from: held,
            to: stage.start,
            enthalpy_to: held,
        };
        if each(&stage, waiting) == Go::On && stage.start < until {
            march(&stage, until, |step| each(&stage, step));
        }
    }

    /// The piece from the start of the fire, for what is asked of a kept march.
    #[must_use]
    pub const fn stage(&self) -> Stage<'_> {
        Stage {
            piece: self,
            start: 0.0,
            enthalpy: 0.0,
        }
    }

    /// The steel temperature at a time.
    #[must_use]
    pub fn temperature_at(&self, time: Time) -> Temperature {
        let mut last = 0.0;
        self.run(time.s(), |_, step| {
            last = step.enthalpy_to;
            Go::On
        });
        celsius(last)
    }

    /// The time at which the steel first reaches a temperature; `None` if not within 360 min.
    #[must_use]
    pub fn time_to(&self, temperature: Temperature) -> Option<Time> {
        let wanted = SpecificHeat::En1993.enthalpy(temperature.celsius());
        let mut found = None;
        self.run(60.0 * HORIZON, |stage, step| {
            if step.enthalpy_to >= wanted {
                found = Some(Time::from_s(time_within(stage, step, wanted)));
                return Go::Stop;
            }
            Go::On
        });
        found
    }
}

/// Protected steel from some moment on.
#[derive(Debug)]
pub struct Stage<'a> {
    piece: &'a Protected<'a>,
    start: f64,
    enthalpy: f64,
}

impl Heated for Stage<'_> {
    fn rate(&self, seconds: f64, celsius: f64) -> f64 {
        self.piece.rate(seconds, celsius)
    }

    fn specific_heat(&self) -> SpecificHeat {
        SpecificHeat::En1993
    }

    fn kinks(&self) -> Vec<f64> {
        let kinks = self.piece.fire.kinks().into_iter().map(|minutes| 60.0 * minutes);
        kinks.filter(|kink| *kink > self.start).collect()
    }

    fn start(&self) -> f64 {
        self.start
    }

    fn start_enthalpy(&self) -> f64 {
        self.enthalpy
    }
}

/// The moisture delay tv in minutes at 100 °C, p ρp dp² / (5 λp) (from memory); `thickness` in m, `percent` by mass.
#[must_use]
pub fn moisture_delay(insulation: &Insulation, thickness: f64, percent: f64) -> f64 {
    percent * insulation.density.kg_m3() * thickness * thickness / (5.0 * insulation.conduction.at(100.0))
}

impl Bare<'_> {
    /// Marches to a time in s, showing each step.
    pub(super) fn run(&self, until: f64, each: impl FnMut(Step) -> Go) {
        march(self, until, each);
    }

    /// The steel temperature at a time.
    #[must_use]
    pub fn temperature_at(&self, time: Time) -> Temperature {
        let h = march(self, time.s(), |_| Go::On);
        Temperature::from_celsius(SpecificHeat::En1993.temperature(h))
    }

    /// The time at which the steel first reaches a temperature; `None` if not within 360 min.
    #[must_use]
    pub fn time_to(&self, temperature: Temperature) -> Option<Time> {
        let wanted = SpecificHeat::En1993.enthalpy(temperature.celsius());
        let mut found = None;
        march(self, 60.0 * HORIZON, |step| {
            if step.enthalpy_to >= wanted {
                found = Some(Time::from_s(time_within(self, step, wanted)));
                return Go::Stop;
            }
            Go::On
        });
        found
    }

    /// The highest steel temperature up to a time. It is that at the time itself unless the fire cools.
    #[must_use]
    pub fn hottest_until(&self, time: Time) -> Temperature {
        celsius(self.top(time).1)
    }

    /// When the steel is hottest within 360 min, and how hot; for fires that never cool that is the end.
    #[must_use]
    pub fn peak(&self) -> (Time, Temperature) {
        let (seconds, h) = self.top(Time::from_min(HORIZON));
        (Time::from_s(seconds), celsius(h))
    }

    fn top(&self, time: Time) -> (f64, f64) {
        top(|each| self.run(time.s(), each))
    }
}

/// When the enthalpy of a march is highest, s, and how high, J/kg.
fn top(march: impl FnOnce(&mut dyn FnMut(Step) -> Go)) -> (f64, f64) {
    let mut top = (0.0, 0.0);
    march(&mut |step| {
        if step.enthalpy_to > top.1 {
            top = (step.to, step.enthalpy_to);
        }
        Go::On
    });
    top
}

/// The temperature of an enthalpy in J/kg.
fn celsius(enthalpy: f64) -> Temperature {
    Temperature::from_celsius(SpecificHeat::En1993.temperature(enthalpy))
}
