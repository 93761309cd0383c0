//! A member with all that its findings are made from.

use std::sync::Arc;

use jiff::civil::Date;

use crate::analysis::design::{Design, MemberAt};
use crate::analysis::outcome::{Outcome, Verdict};
use crate::design::inherit::Inherited;
use crate::design::model::library::NamedProduct;
use crate::design::model::member::{MemberKeys, Period, Protection};
use crate::findings::finding::{Finding, Fix, FixEdit, Note, Place};
use crate::findings::insert;
use crate::findings::registry::Declaration;
use crate::protection::product::Kind;
use crate::protection::stock::BuildUp;
use crate::text::Span;
use crate::units::{DisplayUnits, Length, SectionFactor, Temperature, Time, significant};

/// The product that a member states, with what it states of it.
#[derive(Clone, Copy)]
pub(super) struct Stated<'a> {
    /// The member's statement, its own or inherited.
    pub stated: &'a Protection,
    /// The product's name.
    pub name: &'a str,
    /// The product.
    pub named: &'a NamedProduct,
    /// Whether it is a coating, whose thickness is a dry film.
    pub film: bool,
}

/// A member with all that its findings are made from.
pub(super) struct Context<'a> {
    pub design: &'a Design,
    pub at: MemberAt,
    pub outcome: &'a Outcome,
    /// The day of the check.
    pub on: Date,
    /// Its keys with those of its group and the defaults.
    pub keys: Inherited<'a>,
    pub mark: &'a str,
    pub units: DisplayUnits,
    /// The period, where one is wanted.
    pub period: Option<Time>,
    /// The product, where one is named and known.
    pub product: Option<Stated<'a>>,
    out: &'a mut Vec<Finding>,
}

impl<'a> Context<'a> {
    pub fn new(design: &'a Design, at: MemberAt, outcome: &'a Outcome, on: Date, out: &'a mut Vec<Finding>) -> Self {
        let member = design.member(at).value();
        let keys = design.inherited(member);
        let product = keys.get(|keys| &keys.protection).value().and_then(|stated| {
            let name = stated.product.as_ref()?;
            let named = design.product(&name.value)?.1.value();
            Some(Stated {
                stated,
                name: &name.value,
                named,
                film: named
                    .product
                    .as_ref()
                    .is_some_and(|product| product.kind == Kind::Coating),
            })
        });
        Self {
            design,
            at,
            outcome,
            on,
            keys,
            mark: member.mark.value().map_or("this member", String::as_str),
            units: design.units(),
            period: match keys.get(|keys| &keys.period).value() {
                Some(Period::Of(time)) => Some(*time),
                _ => None,
            },
            // Where no fire resistance is wanted, what protects it is not judged.
            product: product.filter(|_| outcome.verdict != Verdict::NoPeriod),
            out,
        }
    }

    /// The keys that the member states itself.
    pub fn own(&self) -> &'a MemberKeys {
        self.keys.member
    }

    /// Where the member states a key itself.
    pub fn own_span(&self, key: &str) -> Option<Span> {
        span_of(self.keys.member, key)
    }

    /// Adds a finding at a value of the member's own. Where the member has none, it stands at the mark, and a note
    /// points at the group or the defaults that the value comes from.
    pub fn add(&mut self, declaration: &'static Declaration, key: &'static str, own: Option<Span>, message: String) {
        let item = self.design.member(self.at);
        let member = item.value();
        let span = own
            .or_else(|| self.own_span(key))
            .or_else(|| member.mark.span())
            .unwrap_or(member.extent.0);
        let mut finding = Finding::new(declaration, self.place(span), message);
        finding.member = Some(self.at);
        finding.mark = member.mark.value().cloned();
        finding.key = Some(key.to_owned());
        if own.is_none() {
            finding.notes.extend(self.inherited(key));
        }
        self.out.push(finding);
    }

    /// Gives the finding last added a fix that replaces a value of the member's own. None changes the group or the
    /// defaults, for other members live by them.
    pub fn fix(&mut self, title: String, own: Span, text: String) {
        self.fixes(title, vec![(own, text)]);
    }

    /// The same of several values at once.
    pub fn fixes(&mut self, title: String, mut own: Vec<(Span, String)>) {
        own.sort_by_key(|(span, _)| *span);
        let edits: Vec<FixEdit> = own
            .into_iter()
            .map(|(span, text)| FixEdit {
                place: self.place(span),
                text,
            })
            .collect();
        let text = &self.design.files[self.at.file].text;
        if !edits.iter().any(|edit| insert::through_alias(text, edit.place.span)) {
            self.offer(title, edits);
        }
    }

    /// Gives it a fix that states a key in the member, which otherwise inherits it.
    pub fn state(&mut self, title: String, key: &str, value: &str) {
        if let Some((span, text)) = insert::key(self.design, self.at, key, value) {
            let path = Arc::clone(&self.design.files[self.at.file].path);
            let place = Place { path, span };
            self.offer(title, vec![FixEdit { place, text }]);
        }
    }

    fn offer(&mut self, title: String, edits: Vec<FixEdit>) {
        if let Some(finding) = self.out.last_mut() {
            finding.fixes.push(Fix {
                title,
                safe: false,
                edits,
            });
        }
    }

    fn place(&self, span: Span) -> Place {
        Place {
            path: Arc::clone(&self.design.files[self.at.file].path),
            span: self.design.member(self.at).place(span),
        }
    }

    /// Where a value that the member does not state itself comes from.
    fn inherited(&self, key: &str) -> Option<Note> {
        if self.own_span(key).is_some() {
            return None;
        }
        let called = called(key);
        let group = self.keys.get(|keys| &keys.group).value();
        if let Some((name, (file, item))) = group.and_then(|name| Some((name, self.design.group(name)?)))
            && let Some(span) = span_of(&item.value().keys, key)
        {
            return Some(Note {
                text: format!("the group `{name}` gives {} its `{called}`", self.mark),
                place: Some(Place {
                    path: Arc::clone(&self.design.files[file].path),
                    span: item.place(span),
                }),
            });
        }
        let span = span_of(self.keys.defaults?, key)?;
        Some(Note {
            text: format!("the defaults give {} its `{called}`", self.mark),
            place: Some(Place {
                path: Arc::clone(&self.design.files[0].path),
                span,
            }),
        })
    }

    /// A section factor with its effective thickness: `335 1/m (V/A 3 mm)`.
    pub fn factor(&self, value: SectionFactor) -> String {
        format!(
            "{} (V/A {})",
            self.units.section_factor(value),
            self.units.thickness(value.effective_thickness())
        )
    }

    /// A temperature in whole degrees.
    pub fn temperature(&self, value: Temperature) -> String {
        self.units.temperature(value)
    }

    /// A thickness, or a dry film.
    pub fn thickness(&self, value: Length, film: bool) -> String {
        if film {
            self.units.film(value)
        } else {
            self.units.thickness(value)
        }
    }

    /// A thickness that is needed, rounded up in the last place shown, so that what is shown serves.
    pub fn needed(&self, value: Length, film: bool) -> String {
        if film {
            self.units.needed_film(value)
        } else {
            self.units.needed_thickness(value)
        }
    }
}

impl Stated<'_> {
    /// Where the member states the thickness itself.
    pub fn thickness_span(&self, cx: &Context<'_>) -> Option<Span> {
        let value = if self.film {
            self.stated.dft.span()
        } else {
            self.stated.thickness.span()
        };
        value.filter(|_| !cx.own().protection.is_absent())
    }

    /// A build-up with its layers, where there are several: `35 mm (20 + 15)`.
    pub fn build_up(&self, cx: &Context<'_>, next: &BuildUp) -> String {
        let total = cx.thickness(next.total(), self.film);
        if next.layers.len() < 2 {
            return total;
        }
        let layers: Vec<String> = next
            .layers
            .iter()
            .map(|layer| cx.thickness(*layer, self.film))
            .collect();
        format!("{total} ({})", layers.join(" + "))
    }

    /// Offers a build-up instead of the stated thickness: in the member itself, with all that it inherits beside the
    /// thickness. A number of layers, which multiplies the thickness, changes with it.
    pub fn offer(&self, cx: &mut Context<'_>, next: &BuildUp) {
        let text = insert::build_up(&next.layers, |layer| {
            if self.film {
                significant(layer.um(), 0)
            } else {
                significant(layer.mm(), 3)
            }
        });
        let count = next.layers.len().to_string();
        let title = format!("use the next stock thickness, {}", self.build_up(cx, next));
        let layers = self.stated.layers.span();
        match (self.thickness_span(cx), layers) {
            (Some(span), None) => cx.fix(title, span, text),
            (Some(span), Some(layers)) => cx.fixes(title, vec![(span, text), (layers, count)]),
            (None, _) if cx.own().protection.is_absent() => {
                let key = if self.film { "dft" } else { "thickness" };
                let mut changed = vec![(key, text.as_str())];
                changed.extend(layers.map(|_| ("layers", count.as_str())));
                if let Some(value) = insert::protection(self.stated, &changed) {
                    cx.state(title, "protection", &value);
                }
            }
            (None, _) => {}
        }
    }
}

/// The member's key that holds a key of a finding.
fn called(key: &str) -> &str {
    match key {
        "thickness" | "form" | "reading" => "protection",
        "buckling length"
        | "buckling length minor"
        | "lateral length"
        | "moment shape"
        | "axial"
        | "bending"
        | "bending minor"
        | "shear"
        | "reduction" => "loading",
        other => other,
    }
}

/// Where a block of keys states one.
fn span_of(keys: &MemberKeys, key: &str) -> Option<Span> {
    match called(key) {
        "role" => keys.role.span(),
        "section" => keys.section.span(),
        "openings" => keys.openings.span(),
        "taper" => keys.taper.span(),
        "steel" => keys.steel.span(),
        "surface" => keys.surface.span(),
        "exposure" => keys.exposure.span(),
        "shielded by" => keys.shield.span(),
        "environment" => keys.environment.span(),
        "period" => keys.period.span(),
        "fire" => keys.fire.span(),
        "critical temperature" => keys.critical_temperature.span(),
        "loading" => keys.loading.span(),
        "protection" => keys.protection.span(),
        _ => None,
    }
}
