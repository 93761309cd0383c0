//! Steel temperatures and thicknesses over a grid against the solver of `reference.rs`. Status: computed, by a second
//! method written for the purpose from EN 1991-1-2:2002 and EN 1993-1-2:2005 (4.25), (4.27).
//!
//! Tolerances are the product's promise: within 0.5 °C of the converged temperature, never more than 0.1 °C below it;
//! a thickness within 0.1 mm of the exact root.

use scorchline::heating::family::{Family, Needed};
use scorchline::heating::flux::{Bare, Conduction, Emissivity, Insulation, Protected};
use scorchline::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat, Temperature, Time};

use crate::reference::{Gas, Steel, history};

/// Step of the reference, s.
const STEP: f64 = 0.25;

fn fires() -> Vec<Gas> {
    vec![
        Gas::Standard,
        Gas::External,
        Gas::Hydrocarbon,
        Gas::Slow,
        Gas::Annex(0.04, 1160.0, 200.0, 20.0 / 60.0),
        Gas::Annex(0.06, 1500.0, 150.0, 20.0 / 60.0),
        Gas::Annex(0.10, 1000.0, 60.0, 15.0 / 60.0),
        Gas::Given(vec![(0.0, 20.0), (10.0, 540.0), (30.0, 830.0), (90.0, 610.0)]),
        // Two flares with a lull: the gas heats again after it cooled.
        Gas::Given(vec![
            (0.0, 20.0),
            (8.0, 700.0),
            (12.0, 100.0),
            (40.0, 120.0),
            (55.0, 950.0),
            (80.0, 60.0),
        ]),
        // A fire that smoulders before it grows.
        Gas::Given(vec![
            (0.0, 20.0),
            (25.0, 20.0),
            (28.0, 800.0),
            (31.0, 20.0),
            (120.0, 20.0),
        ]),
    ]
}

const PERIODS: [usize; 6] = [15, 30, 45, 60, 90, 120];

/// λ, ρ, c.
const MATERIALS: [(f64, f64, f64); 4] = [
    (0.12, 300.0, 1200.0),
    (0.15, 600.0, 1100.0),
    (0.20, 800.0, 1700.0),
    (0.20, 150.0, 1200.0),
];

fn insulation((conductivity, density, heat): (f64, f64, f64)) -> Insulation {
    Insulation {
        conduction: Conduction::Constant(Conductivity::from_w_mk(conductivity)),
        specific_heat: SpecificHeat::from_j_kgk(heat),
        density: Density::from_kg_m3(density),
        moisture_delay: None,
    }
}

/// Collects what lies outside, so that one run shows all of it.
#[derive(Default)]
struct Tally {
    cases: usize,
    above: f64,
    below: f64,
    outside: Vec<String>,
}

impl Tally {
    fn hold(&mut self, found: f64, wanted: f64, what: impl FnOnce() -> String) {
        let off = found - wanted;
        self.cases += 1;
        self.above = self.above.max(off);
        self.below = self.below.min(off);
        if !(-0.1..=0.5).contains(&off) {
            self.outside.push(format!("{}: {found:.3} against {wanted:.3}", what()));
        }
    }

    #[track_caller]
    fn end(self, least: usize) {
        println!("{} cases, {:+.4} to {:+.4} °C", self.cases, self.below, self.above);
        assert!(self.cases >= least, "only {} cases", self.cases);
        assert!(
            self.outside.is_empty(),
            "{} of {} cases outside, {:+.3} to {:+.3} °C:\n{}",
            self.outside.len(),
            self.cases,
            self.below,
            self.above,
            self.outside.iter().take(40).cloned().collect::<Vec<_>>().join("\n")
        );
    }
}

#[test]
fn halving_the_step_changes_nothing() {
    for gas in fires() {
        for steel in [
            Steel::Bare(300.0, false),
            Steel::Behind(200.0, 0.02, 0.15, 600.0, 1100.0),
        ] {
            let (coarse, fine) = (history(&gas, steel, 120, STEP), history(&gas, steel, 120, STEP / 4.0));
            for (minute, (a, b)) in coarse.iter().zip(&fine).enumerate() {
                assert!(
                    (a.0 - b.0).abs() < 0.03,
                    "{gas:?} {steel:?} at {minute}: {} {}",
                    a.0,
                    b.0
                );
            }
        }
    }
}

#[test]
fn bare_steel_over_the_grid() {
    let mut tally = Tally::default();
    for gas in fires() {
        let fire = gas.fire();
        for factor in [10.0, 25.0, 60.0, 110.0, 180.0, 270.0, 400.0] {
            for zinc in [false, true] {
                let rows = history(&gas, Steel::Bare(factor, zinc), 120, STEP);
                let piece = Bare {
                    fire: &fire,
                    factor: SectionFactor::from_per_m(factor / 0.8),
                    shadow: 0.8,
                    emissivity: if zinc {
                        Emissivity::Galvanised
                    } else {
                        Emissivity::Steel
                    },
                };
                for period in PERIODS {
                    let found = piece.temperature_at(Time::from_min(period as f64)).celsius();
                    tally.hold(found, rows[period].0, || {
                        format!("{gas:?} {factor} zinc {zinc} at {period}")
                    });
                }
            }
        }
    }
    tally.end(500);
}

#[test]
fn protected_steel_over_the_grid() {
    let mut tally = Tally::default();
    for gas in fires() {
        let fire = gas.fire();
        for factor in [50.0, 120.0, 200.0, 300.0] {
            for material in MATERIALS {
                for thickness in [12.0, 25.0, 50.0] {
                    let (conductivity, density, heat) = material;
                    let steel = Steel::Behind(factor, thickness / 1000.0, conductivity, density, heat);
                    let rows = history(&gas, steel, 120, STEP);
                    let material = insulation(material);
                    let piece = Protected::new(
                        &fire,
                        SectionFactor::from_per_m(factor),
                        &material,
                        Length::from_mm(thickness),
                    );
                    for period in PERIODS {
                        let time = Time::from_min(period as f64);
                        let name = || format!("{gas:?} {factor} {steel:?} at {period}");
                        tally.hold(piece.temperature_at(time).celsius(), rows[period].0, name);
                        tally.hold(piece.hottest_until(time).celsius(), rows[period].1, || {
                            format!("hottest {}", name())
                        });
                    }
                }
            }
        }
    }
    tally.end(1000);
}

#[test]
fn thicknesses_over_the_grid() {
    let mut roots = 0;
    let mut outside = Vec::new();
    for gas in fires() {
        let fire = gas.fire();
        for factor in [60.0, 140.0, 250.0] {
            for (conductivity, density, heat) in MATERIALS {
                for period in [30, 60, 90, 120] {
                    let family = Family::new(
                        fire.clone(),
                        SectionFactor::from_per_m(factor),
                        insulation((conductivity, density, heat)),
                        Time::from_min(period as f64),
                        (Length::from_mm(5.0), Length::from_mm(80.0)),
                    );
                    for limit in [350.0, 450.0, 550.0, 650.0] {
                        let Needed::Thickness(root) = family.needed(Temperature::from_celsius(limit)) else {
                            continue;
                        };
                        roots += 1;
                        let top = |d: f64| {
                            let steel = Steel::Behind(factor, d / 1000.0, conductivity, density, heat);
                            history(&gas, steel, period, STEP)[period].1
                        };
                        let (thin, thick) = (top(root.mm() - 0.1), top(root.mm() + 0.1));
                        if thin <= limit || thick > limit {
                            outside.push(format!(
                                "{gas:?} {factor} λ {conductivity} ρ {density} c {heat}, {period} min, {limit} °C: \
                                 {:.3} mm, 0.1 less {thin:.2} °C, 0.1 more {thick:.2} °C",
                                root.mm()
                            ));
                        }
                    }
                }
            }
        }
    }
    println!("{roots} roots");
    assert!(roots >= 500, "only {roots} roots");
    assert!(
        outside.is_empty(),
        "{} of {roots} outside:\n{}",
        outside.len(),
        outside.join("\n")
    );
}
