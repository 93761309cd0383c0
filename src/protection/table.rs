//! Assessed tables of dry film by section factor and steel temperature, one a period, shape and number of sides.
//!
//! A blank means not attained. Between entries the value is interpolated or the next more onerous entry is taken; never
//! between periods. The table's edge holds on the safe side; on the unsafe side nothing is read.

use std::hash::{Hash, Hasher};

use crate::protection::product::ShapeClass;
use crate::units::{Length, SectionFactor, Temperature, Time};

/// An assessed table.
#[derive(Debug, Clone, PartialEq)]
pub struct Table {
    /// The period that it is for.
    pub period: Time,
    /// The shape that it is for.
    pub shape: ShapeClass,
    /// Sides exposed, 3 or 4.
    pub sides: u8,
    /// Steel temperatures of the columns, ascending.
    pub temperatures: Vec<Temperature>,
    /// Rows by section factor, ascending; each with a dry film a column, none where it is not attained.
    pub rows: Vec<(SectionFactor, Vec<Option<Length>>)>,
}

/// Why a table gives no film.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum NoFilm {
    /// The section factor is past what the table holds at this temperature.
    TooSlender,
    /// The critical temperature is below the first column.
    TooCold {
        /// The first column.
        least: Temperature,
    },
}

impl Table {
    /// The dry film for a section factor and a critical temperature.
    ///
    /// # Errors
    /// [`NoFilm`], on the unsafe side of the table.
    pub fn film(&self, factor: SectionFactor, limit: Temperature, interpolate: bool) -> Result<Length, NoFilm> {
        let (Some(first), Some(last)) = (self.temperatures.first(), self.temperatures.last()) else {
            return Err(NoFilm::TooSlender);
        };
        if limit.celsius() < first.celsius() {
            return Err(NoFilm::TooCold { least: *first });
        }
        let limit = limit.celsius().min(last.celsius());
        let column = self.temperatures.partition_point(|column| column.celsius() <= limit) - 1;
        let next_column = (column + 1).min(self.temperatures.len() - 1);
        let across = share(
            limit,
            self.temperatures[column].celsius(),
            self.temperatures[next_column].celsius(),
        );
        let row = self.rows.partition_point(|row| row.0.per_m() < factor.per_m());
        let Some((to, onerous)) = self.rows.get(row) else {
            return Err(NoFilm::TooSlender);
        };
        // A column at or below the limit is the more onerous one.
        let at = |cells: &[Option<Length>]| {
            let cold = cells.get(column).copied().flatten();
            let warm = cells.get(next_column).copied().flatten();
            match (cold, warm) {
                (Some(cold), Some(warm)) if interpolate => Some(mix(cold, warm, across)),
                (Some(cold), _) => Some(cold),
                (None, Some(_)) | (None, None) => None,
            }
        };
        let high = at(onerous).ok_or(NoFilm::TooSlender)?;
        if !interpolate || row == 0 {
            return Ok(high);
        }
        let (from, lighter) = &self.rows[row - 1];
        match at(lighter) {
            Some(low) => Ok(mix(low, high, share(factor.per_m(), from.per_m(), to.per_m()))),
            None => Ok(high),
        }
    }

    /// The largest section factor for which the table gives a film of at most `most`; `None` if none.
    #[must_use]
    pub fn largest_factor(&self, limit: Temperature, interpolate: bool, most: Option<Length>) -> Option<SectionFactor> {
        let fits = |factor: SectionFactor| {
            self.film(factor, limit, interpolate)
                .is_ok_and(|film| most.is_none_or(|most| film.mm() <= most.mm() + 1e-9))
        };
        let at = self.rows.iter().rposition(|row| fits(row.0))?;
        let largest = self.rows[at].0;
        let Some(next) = self.rows.get(at + 1).map(|row| row.0) else {
            return Some(largest);
        };
        // Between two rows an interpolated film may still fit.
        let (mut low, mut high) = (largest.per_m(), next.per_m());
        while high - low > 0.01 {
            let middle = 0.5 * (low + high);
            if fits(SectionFactor::from_per_m(middle)) {
                low = middle
            } else {
                high = middle
            }
        }
        Some(SectionFactor::from_per_m(low))
    }

    pub(super) fn hash_bits<H: Hasher>(&self, state: &mut H) {
        (self.period.bits(), self.shape, self.sides).hash(state);
        self.temperatures
            .iter()
            .for_each(|temperature| temperature.bits().hash(state));
        for (factor, cells) in &self.rows {
            factor.bits().hash(state);
            cells.iter().for_each(|cell| cell.map(Length::bits).hash(state));
        }
    }
}

fn share(value: f64, from: f64, to: f64) -> f64 {
    if to > from { (value - from) / (to - from) } else { 0.0 }
}

fn mix(a: Length, b: Length, share: f64) -> Length {
    Length::from_mm(a.mm() + (b.mm() - a.mm()) * share)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// The table of the format's own example, films in µm.
    fn table() -> Table {
        let row = |factor: f64, cells: [Option<f64>; 4]| {
            (
                SectionFactor::from_per_m(factor),
                cells.iter().map(|cell| cell.map(Length::from_um)).collect(),
            )
        };
        Table {
            period: Time::from_min(60.0),
            shape: ShapeClass::Open,
            sides: 3,
            temperatures: [450.0, 500.0, 550.0, 620.0].map(Temperature::from_celsius).to_vec(),
            rows: vec![
                row(60.0, [Some(420.0), Some(360.0), Some(310.0), Some(250.0)]),
                row(120.0, [Some(900.0), Some(740.0), Some(610.0), Some(470.0)]),
                row(200.0, [Some(1800.0), Some(1400.0), Some(1100.0), Some(830.0)]),
                row(280.0, [None, Some(2600.0), Some(1900.0), Some(1300.0)]),
            ],
        }
    }

    fn film(factor: f64, limit: f64, interpolate: bool) -> Result<f64, NoFilm> {
        let film = table().film(
            SectionFactor::from_per_m(factor),
            Temperature::from_celsius(limit),
            interpolate,
        );
        film.map(|film| (film.um() * 1000.0).round() / 1000.0)
    }

    #[test]
    fn takes_the_next_more_onerous_entry() {
        assert_eq!(film(120.0, 500.0, false), Ok(740.0));
        assert_eq!(film(121.0, 500.0, false), Ok(1400.0));
        assert_eq!(film(120.0, 549.0, false), Ok(740.0));
        assert_eq!(film(30.0, 700.0, false), Ok(250.0));
    }

    #[test]
    fn interpolates_where_it_is_allowed() {
        // By hand: at 160 1/m halfway between 740 and 1400; at 525 °C halfway between 740 and 610.
        assert_eq!(film(160.0, 500.0, true), Ok(1070.0));
        assert_eq!(film(120.0, 525.0, true), Ok(675.0));
        assert_eq!(film(60.0, 585.0, true), Ok(280.0));
    }

    #[test]
    fn nothing_is_read_on_the_unsafe_side() {
        assert_eq!(film(281.0, 550.0, true), Err(NoFilm::TooSlender));
        assert_eq!(film(240.0, 450.0, true), Err(NoFilm::TooSlender));
        // Between a blank and a film there is no film either.
        assert_eq!(film(240.0, 475.0, true), Err(NoFilm::TooSlender));
        let cold = NoFilm::TooCold {
            least: Temperature::from_celsius(450.0),
        };
        assert_eq!(film(60.0, 440.0, true), Err(cold));
    }

    #[test]
    fn finds_the_largest_factor() {
        let at = |limit: f64, interpolate: bool, most: Option<f64>| {
            let largest =
                table().largest_factor(Temperature::from_celsius(limit), interpolate, most.map(Length::from_um));
            largest.map(|factor| factor.per_m().round())
        };
        assert_eq!(at(550.0, false, None), Some(280.0));
        assert_eq!(at(460.0, false, None), Some(200.0));
        assert_eq!(at(550.0, false, Some(1200.0)), Some(200.0));
        assert_eq!(at(550.0, true, Some(1500.0)), Some(240.0));
        assert_eq!(at(400.0, true, None), None);
    }
}
