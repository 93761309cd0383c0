//! A march kept step by step, for the many members that differ in their loads only: a temperature at a time and the time
//! to a temperature are then found in one step of it, as the march itself would find them.

use super::flux::{Bare, HORIZON, Protected};
use super::march::{Go, Heated, Step, enthalpy_within, time_within};
use super::steel::SpecificHeat;
use crate::units::{Temperature, Time};

/// The steps of a march to 360 min.
#[derive(Debug, Clone, PartialEq)]
pub struct History(Vec<Step>);

impl History {
    /// The march of a bare member.
    #[must_use]
    pub fn of_bare(piece: &Bare<'_>) -> Self {
        let mut steps = Vec::new();
        piece.run(60.0 * HORIZON, |step| {
            steps.push(step);
            Go::On
        });
        Self(steps)
    }

    /// The march of a member behind protection.
    #[must_use]
    pub fn of_protected(piece: &Protected<'_>) -> Self {
        let mut steps = Vec::new();
        piece.run(60.0 * HORIZON, |_, step| {
            steps.push(step);
            Go::On
        });
        Self(steps)
    }

    /// The steel temperature of the piece at a time, up to 360 min.
    #[must_use]
    pub fn temperature_at(&self, piece: &impl Heated, time: Time) -> Temperature {
        let step = self.0.partition_point(|step| step.to < time.s());
        let enthalpy = match (self.0.get(step), self.0.last()) {
            (Some(step), _) => enthalpy_within(piece, *step, time.s()),
            (None, Some(last)) => last.enthalpy_to,
            (None, None) => 0.0,
        };
        Temperature::from_celsius(SpecificHeat::En1993.temperature(enthalpy))
    }

    /// The time at which the steel first reaches a temperature; `None` if not within 360 min.
    #[must_use]
    pub fn time_to(&self, piece: &impl Heated, temperature: Temperature) -> Option<Time> {
        let wanted = SpecificHeat::En1993.enthalpy(temperature.celsius());
        let step = self.0.iter().find(|step| step.enthalpy_to >= wanted)?;
        Some(Time::from_s(time_within(piece, *step, wanted)))
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::heating::fire::{Fire, Points};
    use crate::heating::flux::{Conduction, Emissivity, Insulation};
    use crate::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat as HeatCapacity};

    fn insulation(moisture_delay: Option<f64>) -> Insulation {
        Insulation {
            conduction: Conduction::Constant(Conductivity::from_w_mk(0.15)),
            specific_heat: HeatCapacity::from_j_kgk(1000.0),
            density: Density::from_kg_m3(700.0),
            moisture_delay,
        }
    }

    #[test]
    fn a_kept_march_tells_what_a_march_tells() {
        let points = [(0.0, 20.0), (20.0, 900.0), (60.0, 300.0), (61.0, 1100.0), (90.0, 20.0)];
        let points = points.map(|(t, c)| (Time::from_min(t), Temperature::from_celsius(c)));
        let flare = Fire::Points(Points::new(points.to_vec(), None).unwrap());
        for fire in [&Fire::Standard, &Fire::Hydrocarbon, &flare] {
            for factor in [40.0, 120.0, 300.0].map(SectionFactor::from_per_m) {
                let bare = Bare {
                    fire,
                    factor,
                    shadow: 1.0,
                    emissivity: Emissivity::Galvanised,
                };
                let kept = History::of_bare(&bare);
                for minutes in [1.0, 7.3, 20.0, 33.0, 60.5, 89.0, 200.0] {
                    let time = Time::from_min(minutes);
                    let (a, b) = (kept.temperature_at(&bare, time), bare.temperature_at(time));
                    assert!(
                        (a.celsius() - b.celsius()).abs() < 0.02,
                        "{minutes} min: {} {}",
                        a.celsius(),
                        b.celsius()
                    );
                }
                for celsius in [99.0, 400.0, 550.0, 735.0, 800.0] {
                    let temperature = Temperature::from_celsius(celsius);
                    assert_eq!(kept.time_to(&bare, temperature), bare.time_to(temperature));
                }
                for insulation in [insulation(None), insulation(Some(4.0))] {
                    let piece = Protected::new(fire, factor, &insulation, Length::from_mm(22.0));
                    let (kept, stage) = (History::of_protected(&piece), piece.stage());
                    for minutes in [1.0, 15.0, 25.0, 26.0, 27.5, 47.0, 60.5, 118.0, 301.0] {
                        let time = Time::from_min(minutes);
                        let (a, b) = (kept.temperature_at(&stage, time), piece.temperature_at(time));
                        assert!(
                            (a.celsius() - b.celsius()).abs() < 0.02,
                            "{minutes} min: {} {}",
                            a.celsius(),
                            b.celsius()
                        );
                    }
                    for celsius in [99.0, 100.0, 300.0, 550.0, 700.0] {
                        let temperature = Temperature::from_celsius(celsius);
                        assert_eq!(kept.time_to(&stage, temperature), piece.time_to(temperature));
                    }
                }
            }
        }
    }
}
