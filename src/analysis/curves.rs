//! The heating of one member over time, for drawing. Each temperature comes from a march of its own, none from a family.

use crate::analysis::evaluate::{bare_piece, demand};
use crate::analysis::inputs::{Cover, Inputs};
use crate::analysis::outcome::Outcome;
use crate::heating::flux::HORIZON;
use crate::protection::requirement;
use crate::units::{Temperature, Time};

/// How many steps a curve has.
const STEPS: u32 = 60;

/// Temperatures in °C over minutes.
#[derive(Debug, Clone, PartialEq)]
pub struct Curves {
    /// The times in min, from 0.
    pub minutes: Vec<f64>,
    /// The gas.
    pub gas: Vec<f64>,
    /// The member without protection.
    pub bare: Vec<f64>,
    /// The member behind what is provided; none for coatings, whose tables give no temperatures.
    pub protected: Option<Vec<f64>>,
}

/// The curves of a member from the start of the fire past its period, or past the time at which bare steel gives way.
/// `None` where its section or fire is not known.
#[must_use]
pub fn curves(inputs: &Inputs, outcome: &Outcome) -> Option<Curves> {
    let exposed = outcome.section.as_ref()?;
    let (section, fire) = (inputs.section.as_ref()?, inputs.fire.as_deref()?);
    let geometry = section.geometry().ok()?;
    let period = inputs.period.map(Time::min);
    let bare_lasts = outcome.bare.and_then(|bare| bare.resistance).map(Time::min);
    let until = (1.25 * period.or(bare_lasts).unwrap_or(60.0)).clamp(10.0, HORIZON);
    let minutes: Vec<f64> = (0..=STEPS).map(|n| until * f64::from(n) / f64::from(STEPS)).collect();
    let along = |temperature: &dyn Fn(Time) -> Temperature| -> Vec<f64> {
        minutes
            .iter()
            .map(|time| temperature(Time::from_min(*time)).celsius())
            .collect()
    };
    let bare = bare_piece(inputs, fire, exposed);
    let piece = || {
        let Cover::Product(product) = &inputs.cover else {
            return None;
        };
        let provided = outcome.protected.as_ref()?.provided?;
        let limits = (outcome.critical.as_ref()?.protected, inputs.period?);
        let demand = demand(inputs, fire, exposed, geometry.kind, limits);
        requirement::heating(&product.product, &demand, provided)
    };
    Some(Curves {
        gas: along(&|time| fire.gas(time)),
        bare: along(&|time| bare.temperature_at(time)),
        protected: piece().map(|piece| along(&|time| piece.temperature_at(time))),
        minutes,
    })
}
