//! What thickness a member needs of a product, and what a given thickness does.

use std::sync::Arc;

use crate::heating::family::{Family, Needed};
use crate::heating::fire::Fire;
use crate::heating::flux::{HORIZON, Insulation, Protected};
use crate::heating::history::History;
use crate::protection::product::{Kind, Method, Product, ShapeClass};
use crate::protection::refusal::{Outside, Refusal};
use crate::protection::stock::{BuildUp, next_stock};
use crate::protection::table::{NoFilm, Table};
use crate::units::{Length, SectionFactor, Temperature, Time};

/// What is asked of a product.
#[derive(Debug, Clone, Copy)]
pub struct Demand<'a> {
    /// The fire.
    pub fire: &'a Fire,
    /// Ap/V of the casing.
    pub factor: SectionFactor,
    /// Critical temperature.
    pub limit: Temperature,
    /// Period.
    pub period: Time,
    /// Shape of the section.
    pub shape: ShapeClass,
    /// Sides exposed, 3 or 4.
    pub sides: u8,
    /// Whether the role reads as beam; as column otherwise.
    pub beam: bool,
}

/// The thickness needed.
#[derive(Debug, Clone, PartialEq)]
pub struct Requirement {
    /// The exact root of boards and sprays, the film of a coating, never below the least assessed thickness.
    pub exact: Length,
    /// The next build-up of stock; `None` where no assessed build-up reaches it.
    pub next: Option<BuildUp>,
    /// Ranges that the product does not state, so that the result can't be verified.
    pub unstated: Vec<&'static str>,
}

/// Where families of marches come from: a memo, or made anew.
pub trait Families {
    /// The family of a fire, section factor, material and period over a range of thicknesses.
    fn family(&self, demand: &Demand<'_>, insulation: &Insulation, range: (Length, Length)) -> Arc<Family>;

    /// The march of a piece behind a thickness, whose fire and factor are the demand's.
    fn history(
        &self,
        piece: &Protected<'_>,
        insulation: &Insulation,
        demand: &Demand<'_>,
        thickness: Length,
    ) -> Arc<History>;
}

/// Families made anew for every question.
#[derive(Debug, Clone, Copy, Default)]
pub struct Fresh;

impl Families for Fresh {
    fn family(&self, demand: &Demand<'_>, insulation: &Insulation, range: (Length, Length)) -> Arc<Family> {
        Arc::new(Family::new(
            demand.fire.clone(),
            demand.factor,
            insulation.clone(),
            demand.period,
            range,
        ))
    }

    fn history(&self, piece: &Protected<'_>, _: &Insulation, _: &Demand<'_>, _: Length) -> Arc<History> {
        Arc::new(History::of_protected(piece))
    }
}

/// The thickness that a member needs of a product.
///
/// # Errors
/// [`Refusal`], where the product can't hold the member or nothing may be claimed.
pub fn requirement(product: &Product, demand: &Demand<'_>, families: &impl Families) -> Result<Requirement, Refusal> {
    allowed(product, demand)?;
    match &product.method {
        Method::Properties(insulation) => by_properties(product, insulation, demand, families),
        Method::Tables { tables, interpolate } => by_tables(product, tables, *interpolate, demand),
        Method::Regression(_) => Err(Refusal::NotCovered(
            "the regression of EN 13381-4 is read but not yet computed; nothing is claimed",
        )),
    }
}

/// Shape and orientation.
fn allowed(product: &Product, demand: &Demand<'_>) -> Result<(), Refusal> {
    let assessed = &product.assessed;
    if matches!(product.method, Method::Tables { .. }) {
        return Ok(());
    }
    let shape = if assessed.shapes.is_empty() {
        demand.shape == ShapeClass::Open
    } else {
        assessed.shapes.contains(&demand.shape)
    };
    if !shape {
        return Err(Refusal::ShapeNotAssessed(demand.shape));
    }
    let stated = assessed.beam || assessed.column;
    if stated && demand.beam && !assessed.beam {
        return Err(Refusal::OrientationNotAssessed("beam"));
    }
    if stated && !demand.beam && !assessed.column {
        return Err(Refusal::OrientationNotAssessed("column"));
    }
    Ok(())
}

/// The demand moved to the edge of the assessed range on the safe side.
fn held_to_range<'a>(product: &Product, demand: &Demand<'a>) -> Result<(Demand<'a>, Vec<&'static str>), Refusal> {
    let assessed = &product.assessed;
    let mut held = *demand;
    let mut unstated = Vec::new();
    match assessed.factor {
        None => unstated.push("section factor"),
        Some((_, most)) if demand.factor.per_m() > most.per_m() + 1e-9 => {
            return Err(Refusal::TooSlender { reached: None });
        }
        Some((least, _)) => held.factor = SectionFactor::from_per_m(demand.factor.per_m().max(least.per_m())),
    }
    match assessed.temperature {
        None => unstated.push("steel temperature"),
        Some((least, most)) if demand.limit.celsius() < least.celsius() - 1e-9 => {
            return Err(Refusal::Outside(Outside::CriticalTemperature {
                of_member: demand.limit,
                least,
                most: Some(most),
            }));
        }
        Some((_, most)) => held.limit = Temperature::from_celsius(demand.limit.celsius().min(most.celsius())),
    }
    match assessed.period {
        None => unstated.push("period"),
        Some((least, most)) if demand.period.min() > most.min() + 1e-9 => {
            return Err(Refusal::Outside(Outside::Period {
                wanted: demand.period,
                least: Some(least),
                most,
            }));
        }
        Some((least, _)) => held.period = Time::from_min(demand.period.min().max(least.min())),
    }
    Ok((held, unstated))
}

/// The thinnest and thickest that may be claimed, and whether the product states a range at all.
#[must_use]
pub fn thickness_range(product: &Product) -> (Length, Length, bool) {
    let most = product.assessed.thickness.map(|range| range.1);
    let thickest = if product.stock.is_empty() {
        most
    } else {
        let top =
            product.stock.iter().map(|layer| layer.mm()).fold(0.0, f64::max) * f64::from(product.most_layers.max(1));
        let top = most.map_or(top, |most| top.min(most.mm()));
        // The thickest build-up of stock inside the range.
        (0..=200).rev().map(|n| top * f64::from(n) / 200.0).find_map(|needed| {
            next_stock(product, Length::from_mm(needed.max(1e-3)), Some(Length::from_mm(top))).map(|up| up.total())
        })
    };
    let least = product.assessed.thickness.map(|range| range.0);
    let least = least.or_else(|| product.stock.first().copied());
    let stated = product.assessed.thickness.is_some();
    (
        least.unwrap_or(Length::from_mm(1.0)),
        thickest.unwrap_or(Length::from_mm(150.0)),
        stated,
    )
}

fn by_properties(
    product: &Product,
    insulation: &Insulation,
    demand: &Demand<'_>,
    families: &impl Families,
) -> Result<Requirement, Refusal> {
    let (held, mut unstated) = held_to_range(product, demand)?;
    let (least, most, stated) = thickness_range(product);
    if !stated {
        unstated.push("thickness");
    }
    let family = families.family(&held, insulation, (least, most));
    let exact = match family.needed(held.limit) {
        Needed::Thickness(exact) => exact,
        Needed::Thinnest => least,
        Needed::NotAttained(reached) => return Err(Refusal::TooSlender { reached: Some(reached) }),
    };
    let next = next_stock(product, exact, Some(most));
    Ok(Requirement { exact, next, unstated })
}

/// The tables of a shape and number of sides, shortest period first.
fn tables_for<'a>(tables: &'a [Table], demand: &Demand<'_>) -> Vec<&'a Table> {
    let mut fitting: Vec<&Table> = tables
        .iter()
        .filter(|table| table.shape == demand.shape && table.sides == demand.sides)
        .collect();
    fitting.sort_by(|a, b| a.period.min().total_cmp(&b.period.min()));
    fitting
}

fn by_tables(
    product: &Product,
    tables: &[Table],
    interpolate: bool,
    demand: &Demand<'_>,
) -> Result<Requirement, Refusal> {
    if !tables.iter().any(|table| table.shape == demand.shape) {
        return Err(Refusal::ShapeNotAssessed(demand.shape));
    }
    let fitting = tables_for(tables, demand);
    let Some(longest) = fitting.last() else {
        return Err(Refusal::Outside(Outside::Sides {
            of_member: demand.sides,
            assessed: if demand.sides == 3 { 4 } else { 3 },
            shape: demand.shape,
        }));
    };
    let Some(table) = fitting
        .iter()
        .find(|table| table.period.min() >= demand.period.min() - 1e-9)
    else {
        return Err(Refusal::Outside(Outside::Period {
            wanted: demand.period,
            least: None,
            most: longest.period,
        }));
    };
    let film = table
        .film(demand.factor, demand.limit, interpolate)
        .map_err(|none| match none {
            NoFilm::TooSlender => Refusal::TooSlender { reached: None },
            NoFilm::TooCold { least } => Refusal::Outside(Outside::CriticalTemperature {
                of_member: demand.limit,
                least,
                most: None,
            }),
        })?;
    let (least, most) = match product.assessed.thickness {
        Some((least, most)) => (least.mm(), Some(most)),
        None => (0.0, None),
    };
    if most.is_some_and(|most| film.mm() > most.mm() + 1e-9) {
        return Err(Refusal::TooSlender { reached: None });
    }
    let exact = Length::from_mm(film.mm().max(least));
    Ok(Requirement {
        exact,
        next: next_stock(product, exact, most),
        unstated: Vec::new(),
    })
}

/// The largest section factor that the product holds for the demand's period and temperature; `None` where it holds
/// none. Costs some twenty marches.
#[must_use]
pub fn largest_factor(product: &Product, demand: &Demand<'_>) -> Option<SectionFactor> {
    match &product.method {
        Method::Properties(insulation) => {
            let lightest = Demand {
                factor: SectionFactor::from_per_m(0.0),
                ..*demand
            };
            let (held, _) = held_to_range(product, &lightest).ok()?;
            let (_, most, _) = thickness_range(product);
            let largest = crate::heating::family::largest_factor(held.fire, insulation, most, held.period, held.limit)?;
            let edge = product.assessed.factor.map_or(f64::INFINITY, |range| range.1.per_m());
            Some(SectionFactor::from_per_m(largest.per_m().min(edge)))
        }
        Method::Tables { tables, interpolate } => {
            let fitting = tables_for(tables, demand);
            let table = fitting
                .iter()
                .find(|table| table.period.min() >= demand.period.min() - 1e-9)?;
            table.largest_factor(
                demand.limit,
                *interpolate,
                product.assessed.thickness.map(|range| range.1),
            )
        }
        Method::Regression(_) => None,
    }
}

/// What a build-up of a given total thickness does for a member.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Performance {
    /// Steel temperature at the period; none for coatings, whose tables do not give it.
    pub at_period: Option<Temperature>,
    /// Fire resistance, never past the longest assessed period; none where none is attained.
    pub resistance: Option<Time>,
}

fn behind<'a>(
    product: &Product,
    insulation: &'a Insulation,
    demand: &Demand<'a>,
    provided: Length,
) -> (Demand<'a>, Protected<'a>) {
    let held = held_to_range(product, demand).map_or(*demand, |(held, _)| held);
    (held, Protected::new(held.fire, held.factor, insulation, provided))
}

/// The steel behind a thickness; none for products whose assessment gives no temperatures.
#[must_use]
pub fn heating<'a>(product: &'a Product, demand: &Demand<'a>, provided: Length) -> Option<Protected<'a>> {
    match &product.method {
        Method::Properties(insulation) if provided.mm() > 0.0 => Some(behind(product, insulation, demand, provided).1),
        _ => None,
    }
}

/// What a thickness provides, within the assessed range.
#[must_use]
pub fn performance(product: &Product, demand: &Demand<'_>, provided: Length, families: &impl Families) -> Performance {
    match &product.method {
        Method::Properties(insulation) => {
            let (held, piece) = behind(product, insulation, demand, provided);
            let history = families.history(&piece, insulation, &held, provided);
            let at_period = Some(history.temperature_at(&piece.stage(), demand.period));
            let longest = product.assessed.period.map_or(HORIZON, |range| range.1.min());
            let reached = history.time_to(&piece.stage(), held.limit).map_or(HORIZON, Time::min);
            Performance {
                at_period,
                resistance: Some(Time::from_min(reached.min(longest))),
            }
        }
        Method::Tables { tables, interpolate } => {
            let holds = |table: &&&Table| {
                let film = table.film(demand.factor, demand.limit, *interpolate);
                film.is_ok_and(|film| film.mm() <= provided.mm() + 1e-9)
            };
            let fitting = tables_for(tables, demand);
            let longest = fitting.iter().rev().find(holds).map(|table| table.period);
            Performance {
                at_period: None,
                resistance: longest,
            }
        }
        Method::Regression(_) => Performance {
            at_period: None,
            resistance: None,
        },
    }
}

/// Whether a total thickness lies outside what was assessed; the range, if so.
#[must_use]
pub fn outside_thickness(product: &Product, total: Length) -> Option<(Length, Length)> {
    let (least, most) = product.assessed.thickness?;
    let outside = total.mm() < least.mm() - 1e-9 || total.mm() > most.mm() + 1e-9;
    outside.then_some((least, most))
}

impl Product {
    /// Whether the product is a board, which boxes the section in unless stated.
    #[must_use]
    pub fn boxes_by_default(&self) -> bool {
        self.kind == Kind::Board
    }
}
