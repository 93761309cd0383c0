//! What must hold of the thickness that a member needs, whatever the product and the demand.

use proptest::prelude::*;
use scorchline::heating::fire::Fire;
use scorchline::heating::flux::{Conduction, Insulation};
use scorchline::protection::product::{Assessed, Kind, Method, Product, ShapeClass};
use scorchline::protection::refusal::Refusal;
use scorchline::protection::requirement::{Demand, Fresh, performance, requirement};
use scorchline::protection::table::Table;
use scorchline::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat, Temperature, Time};

fn mm(value: f64) -> Length {
    Length::from_mm(value)
}

/// A board in stock sizes, or a spray in whole millimetres.
fn by_properties(board: bool) -> Product {
    let (conductivity, heat, density) = if board {
        (0.17, 1050.0, 600.0)
    } else {
        (0.12, 1200.0, 300.0)
    };
    Product {
        kind: if board { Kind::Board } else { Kind::Spray },
        method: Method::Properties(Insulation {
            conduction: Conduction::Constant(Conductivity::from_w_mk(conductivity)),
            specific_heat: SpecificHeat::from_j_kgk(heat),
            density: Density::from_kg_m3(density),
            moisture_delay: None,
        }),
        assessed: Assessed {
            factor: Some((SectionFactor::from_per_m(40.0), SectionFactor::from_per_m(320.0))),
            thickness: Some((mm(12.0), mm(60.0))),
            temperature: Some((Temperature::from_celsius(350.0), Temperature::from_celsius(700.0))),
            period: Some((Time::from_min(30.0), Time::from_min(180.0))),
            shapes: vec![ShapeClass::Open],
            beam: true,
            column: true,
        },
        stock: if board {
            [12.0, 15.0, 20.0, 25.0].map(mm).to_vec()
        } else {
            Vec::new()
        },
        round_to: None,
        most_layers: 2,
        most_per_coat: None,
        volume_solids: None,
    }
}

fn table(period: f64, films: [[Option<f64>; 3]; 3]) -> Table {
    let rows = [60.0, 120.0, 200.0].into_iter().zip(films);
    Table {
        period: Time::from_min(period),
        shape: ShapeClass::Open,
        sides: 4,
        temperatures: [450.0, 550.0, 650.0].map(Temperature::from_celsius).to_vec(),
        rows: rows
            .map(|(factor, films)| {
                let films = films.into_iter().map(|film| film.map(Length::from_um)).collect();
                (SectionFactor::from_per_m(factor), films)
            })
            .collect(),
    }
}

/// A coating of invented figures.
fn by_tables(interpolate: bool) -> Product {
    let row = |a: f64, b: f64, c: f64| [Some(a), Some(b), Some(c)];
    let tables = vec![
        table(
            30.0,
            [
                row(260.0, 220.0, 200.0),
                row(380.0, 310.0, 250.0),
                row(560.0, 430.0, 330.0),
            ],
        ),
        table(
            60.0,
            [
                row(560.0, 400.0, 300.0),
                row(1100.0, 760.0, 540.0),
                row(2050.0, 1420.0, 1000.0),
            ],
        ),
        table(
            90.0,
            [
                row(1050.0, 740.0, 540.0),
                row(2150.0, 1500.0, 1070.0),
                [None, Some(2900.0), Some(2030.0)],
            ],
        ),
    ];
    Product {
        kind: Kind::Coating,
        method: Method::Tables { tables, interpolate },
        assessed: Assessed {
            thickness: Some((mm(0.25), mm(2.5))),
            ..Assessed::default()
        },
        stock: Vec::new(),
        round_to: None,
        most_layers: 1,
        most_per_coat: None,
        volume_solids: None,
    }
}

fn demand(factor: f64, limit: f64, period: f64) -> Demand<'static> {
    Demand {
        fire: &Fire::Standard,
        factor: SectionFactor::from_per_m(factor),
        limit: Temperature::from_celsius(limit),
        period: Time::from_min(period),
        shape: ShapeClass::Open,
        sides: 4,
        beam: false,
    }
}

/// The thickness needed in mm; endless where no thickness holds, none where nothing may be claimed.
fn needed(product: &Product, demand: &Demand<'_>) -> Option<f64> {
    match requirement(product, demand, &Fresh) {
        Ok(needed) => Some(needed.exact.mm()),
        Err(Refusal::TooSlender { .. }) => Some(f64::INFINITY),
        Err(_) => None,
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 128, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn what_is_needed_put_back_lasts_for_the_period(
        factor in 20.0..330.0_f64, limit in 340.0..720.0_f64, period in 20.0..190.0_f64, board: bool,
    ) {
        let (product, demand) = (by_properties(board), demand(factor, limit, period));
        if let Ok(needed) = requirement(&product, &demand, &Fresh) {
            prop_assert!(factor <= 320.0 && limit >= 350.0 && period <= 180.0);
            let back = performance(&product, &demand, needed.exact, &Fresh);
            prop_assert!(back.at_period.unwrap().celsius() <= limit + 0.1, "{back:?} {needed:?}");
            prop_assert!(back.resistance.unwrap().min() >= period - 0.05, "{back:?} {needed:?}");
            // Some thinner would not do, unless the least assessed does.
            if needed.exact.mm() > 12.2 {
                let thinner = performance(&product, &demand, mm(needed.exact.mm() - 0.2), &Fresh);
                prop_assert!(thinner.resistance.unwrap().min() < period.max(30.0), "{thinner:?} {needed:?}");
            }
            if let Some(next) = needed.next {
                prop_assert!(next.total().mm() >= needed.exact.mm() - 1e-9 && next.total().mm() <= 60.0 + 1e-9);
            }
        }
    }

    #[test]
    fn a_film_read_and_put_back_lasts_for_the_period(
        factor in 30.0..220.0_f64, limit in 430.0..700.0_f64, period in 15.0..100.0_f64, interpolate: bool,
    ) {
        let (product, demand) = (by_tables(interpolate), demand(factor, limit, period));
        if let Ok(needed) = requirement(&product, &demand, &Fresh) {
            prop_assert!(factor <= 200.0 && limit >= 450.0 && period <= 90.0);
            prop_assert!((0.25..=2.5).contains(&needed.exact.mm()));
            let back = performance(&product, &demand, needed.exact, &Fresh);
            prop_assert!(back.resistance.unwrap().min() >= period, "{back:?} {needed:?}");
            if needed.exact.mm() > 0.25 {
                let thinner = performance(&product, &demand, mm(needed.exact.mm() - 0.001), &Fresh);
                prop_assert!(thinner.resistance.is_none_or(|lasts| lasts.min() < period), "{thinner:?}");
            }
        }
    }

    /// Of a lighter section, a lower temperature or a longer period no less is needed.
    #[test]
    fn no_harder_demand_needs_less(
        factor in 40.0..220.0_f64, limit in 450.0..700.0_f64, period in 30.0..120.0_f64,
        lighter in 0.0..60.0_f64, colder in 0.0..100.0_f64, longer in 0.0..60.0_f64, which in 0..4_usize,
    ) {
        let product = [by_properties(true), by_properties(false), by_tables(false), by_tables(true)][which].clone();
        let easy = needed(&product, &demand(factor, limit, period));
        for harder in [
            demand(factor + lighter, limit, period),
            demand(factor, limit - colder, period),
            demand(factor, limit, period + longer),
        ] {
            if let (Some(less), Some(more)) = (easy, needed(&product, &harder)) {
                prop_assert!(more >= less - 0.02, "{less} {more} {harder:?}");
            }
        }
    }
}
