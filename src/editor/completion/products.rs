//! Protection products: those that can protect the member at the cursor first, with the thickness that it needs of them.

use crate::analysis::evaluate::demand_at;
use crate::analysis::inputs::{Inputs, Names};
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::{Critical, ExposedSection};
use crate::design::model::library::NamedProduct;
use crate::design::model::member::Environment;
use crate::editor::completion::Here;
use crate::editor::completion::item::{CompletionKind, Completions, Writer};
use crate::protection::product::{Kind, Product};
use crate::protection::refusal::Refusal;
use crate::protection::requirement::{Fresh, requirement};
use crate::units::{Length, SectionFactor, significant};

/// How many products are judged at once: a march through a fire takes its time.
const JUDGED: usize = 32;

/// A product judged for the member.
enum Judged {
    /// It holds the member: the thickness needed, and what to buy.
    Holds(Length, Length),
    /// Nothing can be said; why, if it is not plain.
    Unknown(String),
    /// It does not; why.
    Fails(String),
}

/// The member at the cursor, as far as a thickness depends on it.
struct Asked {
    inputs: Inputs,
    section: ExposedSection,
    critical: Critical,
    environment: Option<Environment>,
    fire: String,
    /// How the protection follows the section, where the member says.
    boxed: Option<bool>,
}

impl Here<'_> {
    pub(super) fn products(&self, writer: &Writer, found: &mut Completions) {
        let design = self.view.design;
        let mut products: Vec<_> = design.products.iter().collect();
        products.sort_by_key(|(name, place)| (writer.fits(name).unwrap_or(u8::MAX), **place));
        found.incomplete |= products.len() > JUDGED;
        let asked = self.asked();
        let mut judged: Vec<(&String, &NamedProduct, Judged)> = products
            .into_iter()
            .enumerate()
            .map(|(nth, (name, (file, index)))| {
                let item = &design.files[*file].products[*index];
                let named = item.value();
                let verdict = match (&asked, named.product.as_deref().filter(|_| !item.is_broken())) {
                    (_, None) => Judged::Fails("its entry can't be read".to_owned()),
                    (Err(why), Some(_)) => Judged::Unknown(why.clone()),
                    (Ok(_), Some(_)) if nth >= JUDGED => {
                        Judged::Unknown("What is needed of it is told when more of its name is typed.".to_owned())
                    }
                    (Ok(asked), Some(product)) => self.judge(asked, named, product),
                };
                (name, named, verdict)
            })
            .collect();
        judged.sort_by_key(|(_, _, verdict)| match verdict {
            Judged::Holds(..) => 0,
            Judged::Unknown(_) => 1,
            Judged::Fails(_) => 2,
        });
        for (name, named, verdict) in judged {
            let film = named
                .product
                .as_ref()
                .is_some_and(|product| product.kind == Kind::Coating);
            let shown = |thickness: Length| {
                if film {
                    self.units().film(thickness)
                } else {
                    self.units().thickness(thickness)
                }
            };
            let kind = named.product.as_ref().map_or("", |product| product.kind.word());
            let (detail, more) = match verdict {
                Judged::Holds(needed, next) => (
                    format!("{kind}, needs {}", shown(next)),
                    format!(
                        "{} needs {} of it; {} is the next that can be had.",
                        self.mark(),
                        shown(needed),
                        shown(next)
                    ),
                ),
                Judged::Unknown(why) => (kind.to_owned(), why),
                Judged::Fails(why) => (why.clone(), format!("It can't protect {}: {why}.", self.mark())),
            };
            let mut documentation = more;
            if let Some(product) = &named.product {
                documentation.push_str(&assessed(product));
            }
            let item = writer.name(name, CompletionKind::Product);
            found.items.push(item.with(detail, documentation));
        }
    }

    /// What the member asks of a product; why nothing can be asked. Empty outside members.
    fn asked(&self) -> Result<Asked, String> {
        let design = self.view.design;
        let Some((at, keys)) = self.member.zip(self.inherited()) else {
            return Err(String::new());
        };
        let names = Names {
            design,
            options: lookup_options(design.basis()),
        };
        let inputs = Inputs::of(design.member(at).value(), &names);
        let unknown = |what: &str| format!("What {} needs is not known: {what}.", self.mark());
        if inputs.period.is_none() {
            return Err(unknown("it has no fire resistance period"));
        }
        if let Some((_, why)) = inputs.not_covered.first() {
            return Err(unknown(why));
        }
        let outcome = self.view.outcome(at).ok_or_else(String::new)?;
        let section = outcome
            .section
            .clone()
            .ok_or_else(|| unknown("its section is not known"))?;
        let critical = outcome
            .critical
            .clone()
            .ok_or_else(|| unknown("its critical temperature is not known"))?;
        if critical.contradicted_by().is_some() {
            return Err(unknown("its loading contradicts its critical temperature"));
        }
        let form = match self.place.value_beside("form") {
            Some("box") => Some(true),
            Some("profile") => Some(false),
            _ => None,
        };
        Ok(Asked {
            inputs,
            section,
            critical,
            environment: keys.get(|keys| &keys.environment).value().copied(),
            fire: keys
                .get(|keys| &keys.fire)
                .value()
                .map_or_else(|| "standard".to_owned(), Clone::clone),
            boxed: form,
        })
    }

    fn judge(&self, asked: &Asked, named: &NamedProduct, product: &Product) -> Judged {
        if !named.serves_in(&asked.fire) {
            return Judged::Fails(Refusal::FireNotAssessed.words(self.units()));
        }
        if let Some(why) = unfit(asked, named, product) {
            return Judged::Fails(why);
        }
        let boxed = asked.boxed.unwrap_or_else(|| product.boxes_by_default());
        let factor = if boxed {
            asked.section.box_factor
        } else {
            Some(asked.section.bare_factor)
        };
        let Some(factor) = factor else {
            return Judged::Fails("the box of this section is not known".to_owned());
        };
        let Some(demand) = demand_at(&asked.inputs, factor, asked.critical.protected) else {
            return Judged::Unknown(String::new());
        };
        match requirement(product, &demand, &Fresh) {
            Ok(needed) => match (needed.next, needed.unstated.first()) {
                (_, Some(what)) => Judged::Fails(format!("the {what} that it was assessed for is not stated")),
                (None, _) => Judged::Fails("no build-up of its stock holds it".to_owned()),
                (Some(next), None) => Judged::Holds(needed.exact, next.total()),
            },
            Err(refusal @ Refusal::TooSlender { .. }) => Judged::Fails(format!(
                "{}: {}",
                refusal.words(self.units()),
                self.slender(factor, asked)
            )),
            Err(refusal) => Judged::Fails(refusal.words(self.units())),
        }
    }

    fn slender(&self, factor: SectionFactor, asked: &Asked) -> String {
        let period = asked.inputs.period.map_or(0.0, crate::units::Time::min);
        format!(
            "{} for {} min",
            self.units().section_factor(factor),
            significant(period, 1)
        )
    }
}

/// Why a coating may not serve where the member stands.
fn unfit(asked: &Asked, named: &NamedProduct, product: &Product) -> Option<String> {
    let wanted = asked.environment.filter(|_| product.kind == Kind::Coating)?;
    match named.environment {
        Some(serves) if serves > wanted => Some(format!("serves in {} at most", serves.words())),
        None if wanted < Environment::Z2 => Some("states no environment that it serves in".to_owned()),
        _ => None,
    }
}

/// What a product was assessed for.
fn assessed(product: &Product) -> String {
    let range = |what: &str, unit: &str, ends: Option<(f64, f64)>| {
        ends.map(|(least, most)| format!("{what} {} to {} {unit}", significant(least, 2), significant(most, 2)))
    };
    let assessed = &product.assessed;
    let film = product.kind == Kind::Coating;
    let thickness = assessed.thickness.map(|(least, most)| {
        if film {
            (least.um(), most.um())
        } else {
            (least.mm(), most.mm())
        }
    });
    let parts = [
        range(
            "section factor",
            "1/m",
            assessed.factor.map(|(a, b)| (a.per_m(), b.per_m())),
        ),
        range("thickness", if film { "µm" } else { "mm" }, thickness),
        range(
            "steel temperature",
            "°C",
            assessed.temperature.map(|(a, b)| (a.celsius(), b.celsius())),
        ),
        range("period", "min", assessed.period.map(|(a, b)| (a.min(), b.min()))),
    ];
    let parts: Vec<String> = parts.into_iter().flatten().collect();
    if parts.is_empty() {
        return String::new();
    }
    format!("\n\nAssessed: {}.", parts.join(", "))
}
