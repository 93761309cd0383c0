//! What a member takes of steel and product, and what that costs. What is not known is `None`; nothing is assumed.

use crate::analysis::design::Design;
use crate::analysis::outcome::Outcome;
use crate::design::given::Given;
use crate::design::inherit::Inherited;
use crate::design::model::library::{NamedProduct, Rates};
use crate::design::model::member::Member;
use crate::protection::product::{Kind, Method};

/// Quantities of all the pieces of a member.
#[derive(Debug, Clone, Copy, Default, PartialEq)]
pub struct Quantities {
    /// Surface that the fire reaches, by the outline that the verdict rests on, in m².
    pub surface_m2: Option<f64>,
    /// Steel in kg.
    pub steel_mass_kg: Option<f64>,
    /// Coating in litres: dry volume / volume solids / (1 - loss).
    pub litres: Option<f64>,
    /// Coats of all pieces together; a coating only.
    pub coats: Option<u32>,
    /// Product in kg, where its density is known.
    pub product_mass_kg: Option<f64>,
    /// Whether a product is named.
    pub protected: bool,
    /// Cost of the steel in the currency of the basis.
    pub steel_cost: Option<f64>,
    /// Cost of the product.
    pub product_cost: Option<f64>,
    /// Carbon of the steel in kg of CO2 equivalent.
    pub steel_carbon_kg: Option<f64>,
    /// Carbon of the product.
    pub product_carbon_kg: Option<f64>,
    /// Whether the rates that the cost rests on are stated: those of the steel, and of the product where one is named.
    pub cost_rates: Rated,
    /// The same of carbon.
    pub carbon_rates: Rated,
    /// Whether the thickness is a dry film, shown in µm.
    pub film: bool,
}

/// Whether rates are stated, so that a figure that is lacking lacks by its amount alone.
#[derive(Debug, Clone, Copy, Default, PartialEq, Eq)]
pub struct Rated {
    /// Of steel.
    pub steel: bool,
    /// Of the product.
    pub product: bool,
}

impl Quantities {
    /// Steel and product together; unknown if either is.
    #[must_use]
    pub fn cost(&self) -> Option<f64> {
        together(self.protected, self.steel_cost, self.product_cost)
    }

    /// Steel and product together; unknown if either is.
    #[must_use]
    pub fn carbon(&self) -> Option<f64> {
        together(self.protected, self.steel_carbon_kg, self.product_carbon_kg)
    }
}

fn together(protected: bool, steel: Option<f64>, product: Option<f64>) -> Option<f64> {
    if protected { Some(steel? + product?) } else { steel }
}

/// How many pieces a member stands for; unknown where its count can't be read.
#[must_use]
pub fn count(keys: &Inherited<'_>) -> Option<u32> {
    match keys.get(|k| &k.count).given {
        Given::Value(count) => Some(count.value),
        Given::Absent => Some(1),
        Given::Unreadable(_) => None,
    }
}

/// The quantities of all pieces of a member.
#[must_use]
pub fn quantities(design: &Design, member: &Member, outcome: &Outcome) -> Quantities {
    let keys = design.inherited(member);
    let count = count(&keys);
    let basis = design.basis();
    let length = keys.get(|k| &k.length).value().map(|length| length.m());
    let total = length.zip(count).map(|(length, count)| length * f64::from(count));
    let section = outcome.section.as_ref();
    let surface_m2 = total
        .zip(section)
        .map(|(length, section)| length * section.heated_perimeter.m());
    let steel_mass_kg = total.zip(section).map(|(length, section)| length * section.mass_per_m);
    let protection = keys.get(|k| &k.protection);
    let stated = protection.value();
    let name = stated.and_then(|stated| stated.product.as_ref());
    let mut all = Quantities {
        surface_m2,
        steel_mass_kg,
        // What can't be read may name a product.
        protected: name.is_some() || protection.given.is_unreadable(),
        steel_cost: basis.steel_rate.zip(steel_mass_kg).map(|(rate, mass)| rate * mass),
        steel_carbon_kg: basis.carbon_rate.zip(steel_mass_kg).map(|(rate, mass)| rate * mass),
        cost_rates: Rated {
            steel: basis.steel_rate.is_some(),
            product: false,
        },
        carbon_rates: Rated {
            steel: basis.carbon_rate.is_some(),
            product: false,
        },
        ..Quantities::default()
    };
    let Some(named) = name
        .and_then(|name| design.product(&name.value))
        .map(|(_, item)| item.value())
    else {
        return all;
    };
    let state = outcome.protected.as_ref();
    let mm = state.and_then(|state| state.provided).map(|provided| provided.mm());
    // m² times mm are litres.
    let volume = surface_m2.zip(mm).map(|(surface, mm)| surface * mm);
    all.film = is_coating(named);
    if all.film {
        let coats = state.and_then(|state| state.layers).zip(count);
        all.coats = coats.and_then(|(coats, count)| coats.checked_mul(count));
        all.litres = volume.and_then(|volume| wet(named, volume, stated.and_then(|stated| stated.on_site)));
    }
    all.product_mass_kg = density(named)
        .zip(volume)
        .map(|(density, volume)| density * volume / 1000.0);
    let rates = &named.rates;
    let prices = [rates.per_m2, rates.per_m2_mm, rates.per_litre, rates.per_kg];
    all.cost_rates.product = prices.iter().any(Option::is_some);
    // The carbon of a product goes by its mass.
    all.carbon_rates.product = rates.carbon.is_some() && density(named).is_some();
    // Without a thickness that holds nothing is bought.
    all.product_cost = volume.and_then(|volume| price(rates, surface_m2, volume, &all));
    all.product_carbon_kg = rates
        .carbon
        .zip(all.product_mass_kg)
        .map(|(carbon, mass)| carbon * mass);
    all
}

fn is_coating(named: &NamedProduct) -> bool {
    named
        .product
        .as_ref()
        .is_some_and(|product| product.kind == Kind::Coating)
}

/// Litres as delivered for a dry volume. Where it is not said that it is applied on site, the loss of the shop counts.
fn wet(named: &NamedProduct, dry: f64, on_site: Option<bool>) -> Option<f64> {
    let solids = named.product.as_ref()?.volume_solids?;
    let loss = if on_site == Some(true) {
        named.rates.loss_site
    } else {
        named.rates.loss_shop
    };
    Some(dry / solids / (1.0 - loss.unwrap_or(0.0)))
}

/// Density in kg/m³, where the method rests on it.
fn density(named: &NamedProduct) -> Option<f64> {
    match &named.product.as_ref()?.method {
        Method::Properties(insulation) => Some(insulation.density.kg_m3()),
        _ => None,
    }
}

/// The sum of what the rates name; nothing without any, or where one can't be applied.
fn price(rates: &Rates, surface: Option<f64>, volume: f64, all: &Quantities) -> Option<f64> {
    let terms = [
        (rates.per_m2, surface),
        (rates.per_m2_mm, Some(volume)),
        (rates.per_litre, all.litres),
        (rates.per_kg, all.product_mass_kg),
    ];
    let stated = terms.into_iter().filter_map(|(rate, amount)| Some((rate?, amount)));
    let mut sum = None;
    for (rate, amount) in stated {
        *sum.get_or_insert(0.0) += rate * amount?;
    }
    sum
}
