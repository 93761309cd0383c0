//! Totals of a product and of the whole. They sum what is known, and a caution says what is left out; without the rates
//! of every share no cost or carbon is claimed.

use std::path::{Path, PathBuf};

use serde::Serialize;

use super::quantities::{Quantities, Rated};
use super::row::Row;

/// Totals of a product.
#[derive(Debug, Clone, Default, PartialEq, Serialize)]
pub struct ProductTotal {
    /// Its name.
    pub product: String,
    /// The library that describes it, by the name of its file; none where no library does.
    pub library: Option<String>,
    /// Pieces that it protects.
    pub members: u32,
    /// Surface in m².
    pub surface_m2: f64,
    /// Coats of all pieces together; coatings only.
    pub coats: Option<u32>,
    /// Litres as delivered; coatings whose solids are stated.
    pub litres: Option<f64>,
    /// Product in kg, where its density is known.
    pub product_mass_kg: Option<f64>,
    /// Steel that it protects in kg.
    pub steel_mass_kg: f64,
    /// Cost of the product.
    pub cost: Option<f64>,
    /// Carbon of the product in kg of CO2 equivalent.
    pub carbon_kg: Option<f64>,
}

/// Totals of the whole.
#[derive(Debug, Clone, Default, PartialEq, Serialize)]
pub struct Totals {
    /// Rows.
    pub marks: u32,
    /// Pieces.
    pub members: u32,
    /// Steel in kg.
    pub steel_mass_kg: f64,
    /// Surface protected in m².
    pub surface_m2: f64,
    /// Product in kg, of the products whose density is known.
    pub product_mass_kg: Option<f64>,
    /// Cost of steel and products.
    pub cost: Option<f64>,
    /// Carbon of steel and products in kg of CO2 equivalent.
    pub carbon_kg: Option<f64>,
}

/// A sum of the known shares; unknown where none is.
fn known(shares: impl Iterator<Item = Option<f64>>) -> Option<f64> {
    shares
        .flatten()
        .fold(None, |sum, share| Some(sum.unwrap_or(0.0) + share))
}

/// A sum of the known shares, where all of them have their rates.
fn claimed(mut shares: impl Iterator<Item = (bool, Option<f64>)>) -> Option<f64> {
    let sum = shares.try_fold(None, |sum: Option<f64>, (rated, share)| match (rated, share) {
        (false, _) => Err(()),
        (true, None) => Ok(sum),
        (true, Some(share)) => Ok(Some(sum.unwrap_or(0.0) + share)),
    });
    sum.ok().flatten()
}

fn added(counts: impl Iterator<Item = Option<u32>>) -> u32 {
    counts.flatten().fold(0, u32::saturating_add)
}

/// Totals a product, in the order in which each first occurs.
pub(super) fn by_product(rows: &[Row]) -> Vec<ProductTotal> {
    // Two designs may call different products by one name.
    let mut places: rustc_hash::FxHashMap<(Option<&Path>, &str), usize> = rustc_hash::FxHashMap::default();
    let mut of: Vec<(&str, Vec<&Row>)> = Vec::new();
    for row in rows {
        let Some(product) = row.product.as_deref() else {
            continue;
        };
        let at = *places
            .entry((row.library.as_deref().map(PathBuf::as_path), product))
            .or_insert_with(|| {
                of.push((product, Vec::new()));
                of.len() - 1
            });
        of[at].1.push(row);
    }
    of.into_iter()
        .map(|(product, rows)| product_total(product, &rows))
        .collect()
}

fn product_total(product: &str, rows: &[&Row]) -> ProductTotal {
    let sums = || rows.iter().map(|row| &row.quantities);
    ProductTotal {
        product: product.to_owned(),
        library: rows.first().and_then(|row| {
            let name = row.library.as_ref()?.file_name()?;
            Some(name.to_string_lossy().into_owned())
        }),
        members: added(rows.iter().map(|row| row.count)),
        surface_m2: known(sums().map(|q| q.surface_m2)).unwrap_or(0.0),
        coats: sums().filter_map(|q| q.coats).reduce(u32::saturating_add),
        litres: known(sums().map(|q| q.litres)),
        product_mass_kg: known(sums().map(|q| q.product_mass_kg)),
        steel_mass_kg: known(sums().map(|q| q.steel_mass_kg)).unwrap_or(0.0),
        cost: claimed(sums().map(|q| (q.cost_rates.product, q.product_cost))),
        carbon_kg: claimed(sums().map(|q| (q.carbon_rates.product, q.product_carbon_kg))),
    }
}

/// A member's share of totals.
#[derive(Debug, Clone, Copy)]
pub struct Share<'a> {
    /// Pieces.
    pub count: Option<u32>,
    /// Whether a product is named.
    pub product: bool,
    /// What it takes.
    pub quantities: &'a Quantities,
}

/// Totals of all rows. Costs in several currencies are not added.
pub(super) fn totals(rows: &[Row], one_currency: bool) -> Totals {
    let totals = sum(rows.iter().map(|row| Share {
        count: row.count,
        product: row.product.is_some(),
        quantities: &row.quantities,
    }));
    Totals {
        cost: totals.cost.filter(|_| one_currency),
        ..totals
    }
}

/// Totals of members whose costs are in one currency.
pub fn sum<'a>(shares: impl Iterator<Item = Share<'a>> + Clone) -> Totals {
    let all = || shares.clone().map(|share| share.quantities);
    let protected = || {
        shares
            .clone()
            .filter(|share| share.product)
            .map(|share| share.quantities)
    };
    let rated = |q: &Quantities, rates: Rated| rates.steel && (rates.product || !q.protected);
    Totals {
        marks: u32::try_from(shares.clone().count()).unwrap_or(u32::MAX),
        members: added(shares.clone().map(|share| share.count)),
        steel_mass_kg: known(all().map(|q| q.steel_mass_kg)).unwrap_or(0.0),
        surface_m2: known(protected().map(|q| q.surface_m2)).unwrap_or(0.0),
        product_mass_kg: known(protected().map(|q| q.product_mass_kg)),
        cost: claimed(all().map(|q| (rated(q, q.cost_rates), q.cost()))),
        carbon_kg: claimed(all().map(|q| (rated(q, q.carbon_rates), q.carbon()))),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn row(cost: Option<f64>, rated: bool) -> Row {
        let rates = Rated {
            steel: true,
            product: rated,
        };
        Row {
            count: Some(2),
            product: Some("film".to_owned()),
            steel_mass_kg: Some(10.0),
            cost,
            quantities: Quantities {
                protected: true,
                product_cost: cost,
                surface_m2: cost,
                steel_mass_kg: Some(10.0),
                // Steel that costs nothing leaves the cost of the product.
                steel_cost: Some(0.0),
                cost_rates: rates,
                ..Quantities::default()
            },
            ..Row::default()
        }
    }

    #[test]
    fn without_rates_no_cost_is_claimed() {
        let all = [row(Some(3.0), true), row(Some(4.0), true)];
        assert_eq!(totals(&all, true).cost, Some(7.0));
        assert_eq!(totals(&all, false).cost, None);
        assert_eq!(by_product(&all)[0].cost, Some(7.0));
        let unpriced = [row(Some(3.0), true), row(None, false)];
        assert_eq!(
            (totals(&unpriced, true).cost, by_product(&unpriced)[0].cost),
            (None, None)
        );
    }

    #[test]
    fn what_is_unknown_is_left_out() {
        let partly = [row(Some(3.0), true), row(None, true)];
        let all = totals(&partly, true);
        assert_eq!((all.cost, all.members, all.steel_mass_kg), (Some(3.0), 4, 20.0));
        assert_eq!(by_product(&partly)[0].surface_m2, 3.0);
        assert_eq!(totals(&[], true).cost, None);
    }
}
