//! What a protection file says.

use std::sync::Arc;

use jiff::civil::Date;

use crate::design::model::member::{Environment, Extent};
use crate::protection::product::Product;
use crate::text::Spanned;

/// A product with the name that its file gives it.
#[derive(Debug, Clone, PartialEq)]
pub struct NamedProduct {
    /// The name.
    pub name: Spanned<String>,
    /// What it is, as far as the physics needs it; absent where its entry can't be read.
    pub product: Option<Arc<Product>>,
    /// The fires that it was assessed for, by name; standard unless stated.
    pub fires: Vec<Spanned<String>>,
    /// The environment a coating may serve in.
    pub environment: Option<Environment>,
    /// The evidence behind the data.
    pub evidence: Evidence,
    /// Prices and carbon.
    pub rates: Rates,
    /// The characters of the entry.
    pub extent: Extent,
}

impl NamedProduct {
    /// Whether it was assessed for a fire, by its name.
    #[must_use]
    pub fn serves_in(&self, fire: &str) -> bool {
        if self.fires.is_empty() {
            return fire == "standard";
        }
        self.fires.iter().any(|assessed| assessed.value == fire)
    }
}

/// The report that a product's data comes from.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Evidence {
    /// Its number.
    pub report: Option<String>,
    /// Date of issue.
    pub issued: Option<Date>,
    /// Date it expires.
    pub expires: Option<Spanned<Date>>,
}

/// Prices and carbon; absent ones are not claimed.
#[derive(Debug, Clone, Copy, PartialEq, Default)]
pub struct Rates {
    /// Per protected square metre.
    pub per_m2: Option<f64>,
    /// Per square metre and millimetre.
    pub per_m2_mm: Option<f64>,
    /// Per litre.
    pub per_litre: Option<f64>,
    /// Per kg.
    pub per_kg: Option<f64>,
    /// kg CO2e per kg.
    pub carbon: Option<f64>,
    /// Loss in the shop, as a share.
    pub loss_shop: Option<f64>,
    /// Loss on site, as a share.
    pub loss_site: Option<f64>,
}
