//! Fires, steel properties and steel temperatures against published and independently computed values.

use scorchline::heating::fire::{Fire, Growth, Parametric, ParametricInput};
use scorchline::heating::flux::{
    Bare, Conduction, Emissivity, Insulation, Protected, STEFAN_BOLTZMANN, moisture_delay,
};
use scorchline::heating::march::{Go, Heated, march};
use scorchline::heating::steel::{self, SpecificHeat};
use scorchline::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat as Heat, Temperature, Time};

fn close(found: f64, wanted: f64, tolerance: f64, what: &str) {
    assert!(
        (found - wanted).abs() <= tolerance,
        "{what}: found {found}, wanted {wanted} ± {tolerance}"
    );
}

fn gas(fire: &Fire, minutes: f64) -> f64 {
    fire.gas(Time::from_min(minutes)).celsius()
}

/// EN 1991-1-2:2002 (3.4), values of the formula as tabulated with it. Status: published formula, values computed.
#[test]
fn standard_fire() {
    for (t, wanted) in [
        (15.0, 738.561),
        (30.0, 841.796),
        (60.0, 945.340),
        (90.0, 1005.988),
        (120.0, 1049.040),
        (180.0, 1109.739),
        (240.0, 1152.817),
    ] {
        close(gas(&Fire::Standard, t), wanted, 1e-3, "standard");
    }
}

/// EN 1991-1-2:2002 (3.5), (3.6) and EN 1363-2:1999. Status: formulas from memory, values computed.
#[test]
fn other_nominal_fires() {
    let cases = [
        (Fire::External, [(5.0, 588.456), (10.0, 661.518), (30.0, 679.969)]),
        (Fire::Hydrocarbon, [(5.0, 947.707), (10.0, 1033.925), (30.0, 1097.659)]),
        (Fire::SlowHeating, [(5.0, 250.28), (10.0, 293.86), (20.0, 345.67)]),
    ];
    for (fire, values) in cases {
        for (t, wanted) in values {
            close(gas(&fire, t), wanted, 6e-3, &format!("{fire:?} at {t}"));
        }
    }
}

fn parametric(o: f64, b: f64, load: f64, growth: Growth) -> Parametric {
    // Floor and enclosure alike, so that the load per enclosure is the load given.
    Parametric::new(ParametricInput {
        opening_factor: o,
        fire_load: load,
        thermal_inertia: b,
        floor_area: 100.0,
        enclosure_area: 100.0,
        growth,
        height: None,
        roof_openings: false,
    })
    .unwrap()
}

/// EN 1991-1-2:2002 Annex A. Status: formulas from memory, values computed twice by hand-written scripts.
#[test]
fn parametric_fires() {
    let ventilated = parametric(0.04, 1160.0, 200.0, Growth::Medium);
    close(ventilated.gammas().0, 1.0, 1e-12, "Γ");
    close(ventilated.peak().0, 60.0, 1e-9, "tmax");
    close(ventilated.peak().1, 944.140, 1e-3, "θmax");
    let fire = Fire::Parametric(ventilated);
    for (t, wanted) in [
        (5.0, 559.811),
        (10.0, 699.809),
        (30.0, 840.976),
        (75.0, 819.140),
        (90.0, 694.140),
        (120.0, 444.140),
    ] {
        close(gas(&fire, t), wanted, 1e-3, "O 0.04");
    }
    let second = parametric(0.06, 1500.0, 150.0, Growth::Medium);
    close(second.gammas().0, 1.3456, 5e-5, "Γ");
    close(second.peak().0, 30.0, 1e-9, "tmax");
    close(second.peak().1, 883.624, 1e-3, "θmax");
    let fire = Fire::Parametric(second);
    close(gas(&fire, 45.0), 687.907, 1e-3, "O 0.06 at 45");
    close(gas(&fire, 90.0), 100.754, 1e-3, "O 0.06 at 90");
    let fuel = parametric(0.10, 1000.0, 60.0, Growth::Fast);
    close(fuel.gammas().0, 8.41, 5e-3, "Γ fuel controlled");
    close(fuel.gammas().1, 0.4644, 5e-5, "Γlim");
    close(fuel.peak().0, 15.0, 1e-9, "tlim");
    close(fuel.peak().1, 634.77, 6e-3, "θmax");
    close(gas(&Fire::Parametric(fuel), 20.0), 285.96, 6e-3, "cooling from tlim");
}

/// EN 1993-1-2:2005 3.4.1.2 and 3.4.1.1, 3.4.1.3. Status: formulas from memory, enthalpies computed.
#[test]
fn steel_properties() {
    for (t, c) in [
        (20.0, 439.802),
        (100.0, 487.620),
        (400.0, 605.880),
        (500.0, 666.500),
        (600.0, 760.217),
        (700.0, 1008.158),
        (735.0, 5000.0),
        (800.0, 803.261),
        (900.0, 650.0),
    ] {
        close(steel::specific_heat(t), c, 1e-3, "specific heat");
    }
    for (t, h) in [
        (100.0, 37.2070),
        (400.0, 201.3445),
        (600.0, 335.7378),
        (700.0, 419.1061),
        (735.0, 475.4278),
        (800.0, 561.6008),
        (900.0, 632.0638),
        (1200.0, 827.0638),
    ] {
        close(steel::enthalpy(t) / 1000.0, h, 1e-4, "enthalpy");
    }
    close(steel::conductivity(20.0), 53.334, 1e-9, "conductivity at 20");
    close(steel::conductivity(900.0), 27.3, 1e-12, "conductivity above 800");
    close(steel::elongation(20.0), 0.0, 1e-6, "elongation at 20");
    close(
        steel::elongation(800.0),
        0.011,
        1e-12,
        "elongation in the transformation",
    );
}

/// A published case: constant specific heat, fire with its own emissivity.
struct Plate {
    factor: f64,
    heat: f64,
    flux: fn(f64, f64) -> f64,
}

impl Heated for Plate {
    fn rate(&self, seconds: f64, celsius: f64) -> f64 {
        self.factor / steel::DENSITY * (self.flux)(seconds, celsius)
    }

    fn specific_heat(&self) -> SpecificHeat {
        SpecificHeat::Constant(self.heat)
    }

    fn kinks(&self) -> Vec<f64> {
        Vec::new()
    }
}

fn plate_at(plate: &Plate, seconds: f64) -> f64 {
    SpecificHeat::Constant(plate.heat).temperature(march(plate, seconds, |_| Go::On))
}

/// SFPE S.02 (2015), Case 1, as kept in the NIST Fire Dynamics Simulator verification guide: plate of 40 mm heated on
/// both faces. Status: published. Its figures fit a zero of 273.15 K, to 0.11 °C.
#[test]
fn sfpe_s02_case_1() {
    let plate = Plate {
        factor: 50.0,
        heat: 520.0,
        flux: |seconds, steel| {
            let gas = 20.0 + 345.0 * (8.0 * seconds / 60.0 + 1.0).log10();
            25.0 * (gas - steel) + 0.7 * STEFAN_BOLTZMANN * ((gas + 273.15).powi(4) - (steel + 273.15).powi(4))
        },
    };
    for (t, wanted) in [
        (300.0, 97.8),
        (600.0, 234.4),
        (900.0, 390.2),
        (1200.0, 539.7),
        (1500.0, 662.9),
        (1800.0, 751.9),
    ] {
        close(plate_at(&plate, t), wanted, 0.12, "case 1");
    }
}

/// SFPE S.02 (2015), Case 2 (as above): plate of 10 mm, one face under 50 kW/m² in gas of 20 °C. Status: published.
#[test]
fn sfpe_s02_case_2() {
    let plate = Plate {
        factor: 100.0,
        heat: 560.0,
        flux: |_, steel| 0.9 * 50_000.0 - 0.9 * STEFAN_BOLTZMANN * (steel + 273.15).powi(4) - 12.0 * (steel - 20.0),
    };
    for (t, wanted) in [
        (180.0, 195.0),
        (360.0, 347.3),
        (540.0, 466.2),
        (720.0, 547.5),
        (900.0, 596.6),
    ] {
        close(plate_at(&plate, t), wanted, 0.12, "case 2");
    }
}

/// CTE DB SI Anejo D (Spanish building code, consolidated 2025), D.2.3: its own c = 600 J/kgK and ε = 0.5 at 200 1/m.
/// Status: equation published, values computed with explicit steps of 1 s and the gas at their end, which lie up to
/// 0.47 °C above the converged ones.
#[test]
fn cte_db_si_anejo_d() {
    let plate = Plate {
        factor: 200.0,
        heat: 600.0,
        flux: |seconds, steel| {
            let gas = 20.0 + 345.0 * (8.0 * seconds / 60.0 + 1.0).log10();
            25.0 * (gas - steel) + 0.5 * STEFAN_BOLTZMANN * ((gas + 273.0).powi(4) - (steel + 273.0).powi(4))
        },
    };
    for (t, wanted) in [(900.0, 666.9), (1800.0, 829.5), (3600.0, 940.9)] {
        close(plate_at(&plate, t), wanted, 0.55, "CTE");
    }
}

fn bare(factor: f64) -> Bare<'static> {
    Bare {
        fire: &Fire::Standard,
        factor: SectionFactor::from_per_m(factor),
        shadow: 1.0,
        emissivity: Emissivity::Steel,
    }
}

/// EN 1993-1-2:2005 (4.25) under the standard fire at 15, 30 and 60 min. Status: computed, converged, by a stiff
/// solver and a fixed-step enthalpy integration.
#[test]
fn bare_temperatures() {
    let table = [
        (25.0, [230.61, 498.45, 776.97]),
        (50.0, [383.46, 690.30, 922.92]),
        (100.0, [564.52, 767.35, 937.99]),
        (150.0, [645.31, 814.52, 940.58]),
        (200.0, [681.78, 828.17, 941.82]),
        (300.0, [707.77, 834.68, 943.02]),
        (400.0, [716.27, 836.71, 943.61]),
    ];
    for (factor, values) in table {
        for (t, wanted) in [15.0, 30.0, 60.0].into_iter().zip(values) {
            let found = bare(factor).temperature_at(Time::from_min(t)).celsius();
            close(found, wanted, 0.06, &format!("bare {factor} at {t}"));
        }
    }
}

/// As above: minutes to 350, 500, 550 and 620 °C. Status: computed, converged.
#[test]
fn bare_times() {
    let table = [
        (50.0, [13.799, 19.530, 21.761, 25.386]),
        (100.0, [8.980, 12.898, 14.492, 17.196]),
        (200.0, [5.933, 8.721, 9.935, 12.143]),
        (300.0, [4.694, 7.040, 8.121, 10.205]),
    ];
    for (factor, values) in table {
        for (celsius, wanted) in [350.0, 500.0, 550.0, 620.0].into_iter().zip(values) {
            let found = bare(factor).time_to(Temperature::from_celsius(celsius)).unwrap().min();
            close(found, wanted, 2e-3, &format!("bare {factor} to {celsius}"));
        }
    }
}

fn insulation(conductivity: f64, density: f64, heat: f64) -> Insulation {
    Insulation {
        conduction: Conduction::Constant(Conductivity::from_w_mk(conductivity)),
        specific_heat: Heat::from_j_kgk(heat),
        density: Density::from_kg_m3(density),
        moisture_delay: None,
    }
}

/// EN 1993-1-2:2005 (4.27) under the standard fire at 30, 60, 90 and 120 min. Status: computed, converged.
#[test]
fn protected_temperatures() {
    let heavy = insulation(0.15, 600.0, 1100.0);
    let light = insulation(0.12, 300.0, 1200.0);
    let table = [
        (&heavy, 20.0, 60.0, [134.88, 261.40, 372.76, 468.25]),
        (&heavy, 20.0, 120.0, [213.60, 400.89, 543.53, 650.11]),
        (&heavy, 20.0, 200.0, [288.73, 515.71, 665.31, 738.01]),
        (&heavy, 20.0, 300.0, [354.26, 601.92, 732.54, 825.76]),
        (&light, 15.0, 60.0, [151.85, 286.84, 402.95, 500.30]),
        (&light, 15.0, 120.0, [246.49, 443.06, 585.24, 687.56]),
        (&light, 15.0, 200.0, [340.30, 569.98, 708.45, 766.69]),
        (&light, 15.0, 300.0, [424.59, 663.42, 756.67, 887.82]),
    ];
    for (material, thickness, factor, values) in table {
        let piece = Protected::new(
            &Fire::Standard,
            SectionFactor::from_per_m(factor),
            material,
            Length::from_mm(thickness),
        );
        for (t, wanted) in [30.0, 60.0, 90.0, 120.0].into_iter().zip(values) {
            let found = piece.temperature_at(Time::from_min(t)).celsius();
            close(found, wanted, 0.06, &format!("protected {factor} at {t}"));
        }
    }
}

/// Moisture delay p ρp dp²/(5 λp). Status: from memory.
#[test]
fn moisture() {
    let material = insulation(0.12, 550.0, 1200.0);
    close(moisture_delay(&material, 0.025, 4.0), 2.292, 5e-4, "tv");
}
