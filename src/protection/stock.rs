//! From a thickness that is needed to one that can be bought.

use crate::protection::product::{Kind, Product};
use crate::units::Length;

/// A build-up of layers, or a film of coats.
#[derive(Debug, Clone, PartialEq)]
pub struct BuildUp {
    /// Thickness of each layer, outermost last; a single film for coatings.
    pub layers: Vec<Length>,
}

impl BuildUp {
    /// All layers together.
    #[must_use]
    pub fn total(&self) -> Length {
        Length::from_mm(self.layers.iter().map(|layer| layer.mm()).sum())
    }
}

/// The step in mm to which thicknesses without stock are rounded up: 1 mm, 50 µm for films, unless the product says.
fn step(product: &Product) -> f64 {
    let default = if product.kind == Kind::Coating { 0.05 } else { 1.0 };
    product.round_to.map_or(default, Length::mm).max(1e-3)
}

/// The thinnest build-up that is at least `needed` and at most `most`: the fewest layers of stock first, or rounded up
/// where there is no stock. `None` where nothing reaches it.
#[must_use]
pub fn next_stock(product: &Product, needed: Length, most: Option<Length>) -> Option<BuildUp> {
    let fits = |total: f64| most.is_none_or(|most| total <= most.mm() + 1e-9);
    let needed = needed.mm();
    if product.stock.is_empty() {
        let step = step(product);
        let total = ((needed / step - 1e-9).ceil() * step).max(step);
        // Where the step passes the end of the range, the end itself still serves.
        let total = if fits(total) {
            total
        } else {
            most.map_or(total, Length::mm)
        };
        return (total + 1e-9 >= needed).then(|| BuildUp {
            layers: vec![Length::from_mm(total)],
        });
    }
    let mut best: Option<BuildUp> = None;
    combinations(&product.stock, product.most_layers.max(1), &mut |layers| {
        let total: f64 = layers.iter().map(|layer| layer.mm()).sum();
        let better = best.as_ref().is_none_or(|best| {
            total < best.total().mm() - 1e-9
                || ((total - best.total().mm()).abs() <= 1e-9 && layers.len() < best.layers.len())
        });
        if total + 1e-9 >= needed && fits(total) && better {
            best = Some(BuildUp {
                layers: layers.to_vec(),
            });
        }
    });
    best
}

/// Every way to lay up to `most` layers of stock, thicker ones inside.
fn combinations(stock: &[Length], most: u32, each: &mut impl FnMut(&[Length])) {
    fn go(stock: &[Length], from: usize, left: u32, layers: &mut Vec<Length>, each: &mut impl FnMut(&[Length])) {
        if !layers.is_empty() {
            each(layers);
        }
        if left == 0 {
            return;
        }
        for at in (0..=from).rev() {
            layers.push(stock[at]);
            go(stock, at, left - 1, layers, each);
            layers.pop();
        }
    }
    // More than four layers are laid of one thickness only, so that the search stays short.
    if most <= 4 && stock.len() <= 16 {
        go(stock, stock.len() - 1, most, &mut Vec::new(), each);
        return;
    }
    for layer in stock {
        for count in 1..=most {
            each(&vec![*layer; count as usize]);
        }
    }
}

/// Coats of a coating for a dry film: the film over the greatest of one coat, rounded up.
#[must_use]
pub fn coats(product: &Product, film: Length) -> Option<u32> {
    let most = product.most_per_coat?.mm();
    Some((film.mm() / most - 1e-9).ceil().max(1.0) as u32)
}
