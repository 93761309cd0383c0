//! The thickness that keeps steel below a temperature for a period, found from families of marches.
//!
//! A family is one fire, section factor, material and period over a range of thicknesses. Members of a frame share few
//! families; each member then costs a look-up and one or two marches that polish the root.

use super::fire::Fire;
use super::flux::{Insulation, Protected};
use super::steel::SpecificHeat;
use crate::units::{Length, SectionFactor, Temperature, Time};

/// Thicknesses of a family, spaced evenly over the logarithm.
const NODES: usize = 16;
/// A root is polished until its thickness is this exact, m (0.005 mm).
const EXACT: f64 = 5e-6;

/// The largest section factor looked for, 1/m.
const LARGEST: f64 = 2000.0;

/// What thickness is needed.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Needed {
    /// This, exactly (within 0.02 mm, and never less than the root by more).
    Thickness(Length),
    /// The thinnest of the range is more than enough, and so is every thicker one.
    Thinnest,
    /// The thickest of the range does not hold; the temperature that the steel reaches behind it.
    NotAttained(Temperature),
}

/// One fire, section factor, material and period over a range of thicknesses.
#[derive(Debug)]
pub struct Family {
    fire: Fire,
    factor: SectionFactor,
    insulation: Insulation,
    period: Time,
    /// ln d (m) and the highest enthalpy (J/kg) up to the period, thickness rising and enthalpy falling.
    nodes: Vec<(f64, f64)>,
}

impl Family {
    /// Marches a family between two thicknesses, the thinner first; both above zero.
    #[must_use]
    pub fn new(
        fire: Fire,
        factor: SectionFactor,
        insulation: Insulation,
        period: Time,
        range: (Length, Length),
    ) -> Self {
        let (from, to) = (range.0.m().ln(), range.1.m().max(range.0.m()).ln());
        let mut family = Self {
            fire,
            factor,
            insulation,
            period,
            nodes: Vec::with_capacity(NODES),
        };
        let count = if to > from { NODES } else { 1 };
        for n in 0..count {
            let ln_d = from + (to - from) * n as f64 / (count.max(2) - 1) as f64;
            let h = family.enthalpy(ln_d.exp());
            family.nodes.push((ln_d, h));
        }
        family
    }

    /// The highest enthalpy up to the period behind a thickness in m.
    fn enthalpy(&self, thickness: f64) -> f64 {
        let piece = Protected::new(&self.fire, self.factor, &self.insulation, Length::from_m(thickness));
        SpecificHeat::En1993.enthalpy(piece.hottest_until(self.period).celsius())
    }

    /// The thickness that keeps the steel at or below `limit` up to the period.
    #[must_use]
    pub fn needed(&self, limit: Temperature) -> Needed {
        let wanted = SpecificHeat::En1993.enthalpy(limit.celsius());
        // Behind a thick, heavy protection (4.27) gives its stored heat back while the gas cools, and steel can be hotter
        // behind more of it. So the thickness is the one from which on every thicker node of the range holds.
        let Some(fails) = self.nodes.iter().rposition(|node| node.1 > wanted) else {
            return Needed::Thinnest;
        };
        let after = fails + 1;
        if after == self.nodes.len() {
            return Needed::NotAttained(Temperature::from_celsius(
                SpecificHeat::En1993.temperature(self.nodes[fails].1),
            ));
        }
        let (mut thin, mut thick) = (self.nodes[after - 1], self.nodes[after]);
        let mut guess = self.seed(after, wanted);
        // A secant on ln d over the enthalpy, held inside the bracket.
        for _ in 0..40 {
            let h = self.enthalpy(guess.exp());
            let slope = (thick.1 - thin.1) / (thick.0 - thin.0);
            if h > wanted {
                thin = (guess, h);
            } else {
                thick = (guess, h);
            }
            let step = (wanted - h) / slope;
            if (step * guess.exp()).abs() < EXACT || (thick.0.exp() - thin.0.exp()) < EXACT {
                // The last secant step is far below what is asked for; the thicker side is the safe one.
                let d = (guess + step).clamp(thin.0, thick.0).exp();
                return Needed::Thickness(Length::from_m(d));
            }
            let next = guess + step;
            let inside = next > thin.0 && next < thick.0;
            guess = if inside { next } else { 0.5 * (thin.0 + thick.0) };
        }
        Needed::Thickness(Length::from_m(thick.0.exp()))
    }

    /// ln d where the enthalpy is `wanted`, by the parabola through three nodes about it, held between two of them.
    fn seed(&self, after: usize, wanted: f64) -> f64 {
        let low = after.saturating_sub(2);
        let nodes = &self.nodes[low..(low + 4).min(self.nodes.len())];
        let (from, to) = (self.nodes[after - 1].0, self.nodes[after].0);
        // Lagrange's interpolation of ln d over the enthalpy.
        let mut sum = 0.0;
        for (i, a) in nodes.iter().enumerate() {
            let weight: f64 = nodes
                .iter()
                .enumerate()
                .filter(|(j, _)| *j != i)
                .map(|(_, b)| {
                    if a.1 == b.1 {
                        f64::NAN
                    } else {
                        (wanted - b.1) / (a.1 - b.1)
                    }
                })
                .product();
            sum += weight * a.0;
        }
        if sum.is_finite() {
            sum.clamp(from, to)
        } else {
            0.5 * (from + to)
        }
    }
}

/// The largest section factor up to which steel stays at or below `limit` up to the period behind a thickness; `None`
/// where not even 1 1/m does. Looked for up to 2000 1/m.
///
/// The temperature is not monotonic in the factor: behind heavy protection the term of (4.27) for the heat stored grows
/// faster than the inflow, and very slender steel comes out cool again. That is beyond what the equation was made for, so
/// factors are tried from below, a tenth more each time, and the first that fails ends the search.
#[must_use]
pub fn largest_factor(
    fire: &Fire,
    insulation: &Insulation,
    thickness: Length,
    period: Time,
    limit: Temperature,
) -> Option<SectionFactor> {
    let holds = |factor: f64| {
        let piece = Protected::new(fire, SectionFactor::from_per_m(factor), insulation, thickness);
        piece.hottest_until(period).celsius() <= limit.celsius()
    };
    let mut low = 1.0;
    if !holds(low) {
        return None;
    }
    let mut high = 10.0;
    while holds(high) {
        if high >= LARGEST {
            return Some(SectionFactor::from_per_m(LARGEST));
        }
        low = high;
        high = (1.1 * high).min(LARGEST);
    }
    while high - low > 0.05 {
        let middle: f64 = 0.5 * (low + high);
        if holds(middle) { low = middle } else { high = middle }
    }
    Some(SectionFactor::from_per_m(low))
}
