//! The plain inputs of a member's evaluation: what its verdict depends on, and nothing else.
//!
//! No span, no remark and no name that does not matter is in here, so that a comment or a moved line changes nothing.

use std::hash::{Hash, Hasher};
use std::sync::Arc;

use crate::analysis::design::Design;
use crate::analysis::exposure::{Reached, reached};
use crate::design::given::Given;
use crate::design::inherit::{Found, Inherited};
use crate::design::model::head::{Factors, Method};
use crate::design::model::member::{Effects, Load, Loading, Member, Period, Role, SectionChoice, Steel, Surface};
use crate::heating::fire::Fire;
use crate::protection::product::Product;
use crate::section::catalogue::{CatalogueRow, LookupOptions, row};
use crate::section::{Exposure, Geometry, Shape, ShapeError};
use crate::units::{Length, Temperature, Time};

/// A section ready to be computed with.
#[derive(Debug, Clone, PartialEq)]
pub struct SectionInput {
    /// The shape.
    pub shape: Shape,
    /// Nominal mass in kg/m, where a table states it.
    pub mass: Option<f64>,
    /// Its figures, where a table has them worked out.
    pub known: Option<&'static Geometry>,
}

impl SectionInput {
    /// The figures on which section factors rest.
    ///
    /// # Errors
    /// Where the dimensions make no shape.
    pub fn geometry(&self) -> Result<Geometry, ShapeError> {
        self.known.map_or_else(|| self.shape.geometry(), |known| Ok(*known))
    }
}

/// A product by content, with what the member states of it.
#[derive(Debug, Clone, PartialEq)]
pub struct ProductInput {
    /// Its content.
    pub product: Arc<Product>,
    /// Whether it was assessed for the member's fire.
    pub fire_assessed: bool,
    /// Whether it boxes the section in.
    pub boxed: bool,
    /// Stated thickness of each layer, all layers; a single dry film for coatings. Empty where none is stated.
    pub layers: Vec<Length>,
}

/// What protects the member.
#[derive(Debug, Clone, PartialEq)]
pub enum Cover {
    /// Nothing.
    Bare,
    /// A product.
    Product(ProductInput),
    /// A product that can't be read or is not known.
    Unknown,
}

/// The plain inputs of a member. Equal inputs have equal outcomes.
#[derive(Debug, Clone, PartialEq)]
pub struct Inputs {
    /// The method; `None` where an edition is named that is not supported.
    pub method: Option<Method>,
    /// Role.
    pub role: Option<Role>,
    /// Section; `None` where it is missing, unreadable, unknown or not covered.
    pub section: Option<SectionInput>,
    /// What the methods don't cover: the key, and what it says.
    pub not_covered: Vec<(&'static str, &'static str)>,
    /// Keys that are missing or can't be read, without which nothing is verified.
    pub unread: Vec<&'static str>,
    /// What the fire reaches.
    pub reached: Reached,
    /// Steel.
    pub steel: Option<Steel>,
    /// Whether yield strengths are read from EN 10025.
    pub yield_from_en10025: bool,
    /// Surface.
    pub surface: Surface,
    /// The period; `None` where none is wanted.
    pub period: Option<Time>,
    /// The fire; `None` where it is unknown.
    pub fire: Option<Arc<Fire>>,
    /// Stated critical temperature.
    pub stated: Option<Temperature>,
    /// Loading.
    pub loading: Option<Loading>,
    /// The named default of the basis.
    pub default_critical: Option<Temperature>,
    /// Partial factors.
    pub factors: Factors,
    /// Protection.
    pub cover: Cover,
}

/// What names mean in a design, shared by all its members.
#[derive(Debug, Clone)]
pub struct Names<'a> {
    /// The design.
    pub design: &'a Design,
    /// How designations are looked up.
    pub options: LookupOptions,
}

/// The row that a member's designation means, if it means one.
#[must_use]
pub fn row_of(choice: Option<&SectionChoice>, options: &LookupOptions) -> Option<&'static CatalogueRow> {
    match choice {
        Some(SectionChoice::Designation(text)) => row(text, options),
        _ => None,
    }
}

impl Inputs {
    /// The inputs of a member in its design.
    #[must_use]
    pub fn of(member: &Member, names: &Names<'_>) -> Self {
        let design = names.design;
        let keys = design.inherited(member);
        let basis = design.basis();
        let mut unread = Vec::new();
        let mut not_covered = Vec::new();
        if member.broken {
            unread.push("member");
        }
        if keys.are_strange() {
            unread.push("key");
        }
        if design.head().doubtful {
            unread.push("head");
        }
        let role = keys.get(|k| &k.role);
        let section = keys.get(|k| &k.section);
        let steel = keys.get(|k| &k.steel);
        let period = keys.get(|k| &k.period);
        need(&role, "role", &mut unread);
        need(&section, "section", &mut unread);
        need(&steel, "steel", &mut unread);
        need(&period, "period", &mut unread);
        note_unreadable(&keys, &mut unread);
        // What an unknown group would have said is not known, nor what a syntax error hides in one that is.
        let group = keys.get(|k| &k.group).value();
        if group.is_some_and(|name| design.group(name).is_none_or(|(_, item)| item.is_broken())) {
            unread.push("group");
        }
        let section = section_input(section.value(), names, &mut unread, &mut not_covered);
        if keys.get(|k| &k.openings).value().is_some() {
            not_covered.push(("openings", "web openings are read but not yet computed"));
        }
        if keys.get(|k| &k.taper).value().is_some() {
            not_covered.push(("taper", "haunches and tapers are read but not yet computed"));
        }
        let method = match &basis.method {
            Given::Absent => Some(Method::default()),
            given => given.value().copied(),
        };
        match method {
            None => unread.push("method"),
            Some(Method::En1993) => {}
            Some(Method::Asce29) => not_covered.push(("method", "ASCE 29-05 is read but not yet computed")),
            Some(Method::As4100) => not_covered.push(("method", "AS 4100:2020 is read but not yet computed")),
        }
        let exposure = keys.get(|k| &k.exposure).value().copied().unwrap_or(Exposure::AllRound);
        let fire_name = keys.get(|k| &k.fire).value().map_or("standard", String::as_str);
        let fire = design.fires.get(fire_name).cloned().flatten();
        if fire.is_none() {
            unread.push("fire");
        }
        let loading = keys.get(|k| &k.loading);
        Self {
            method,
            role: role.value().copied(),
            section,
            not_covered,
            unread,
            reached: reached(exposure, keys.get(|k| &k.shield).value().copied()),
            steel: steel.value().cloned(),
            yield_from_en10025: basis.yield_from_en10025,
            surface: keys.get(|k| &k.surface).value().copied().unwrap_or(Surface::Plain),
            period: match period.value() {
                Some(Period::Of(time)) => Some(*time),
                _ => None,
            },
            fire,
            stated: keys.get(|k| &k.critical_temperature).value().map(|stated| stated.value),
            loading: loading.value().map(|loading| (**loading).clone()),
            default_critical: basis.default_critical.value().copied(),
            factors: basis.factors,
            cover: cover(&keys, design, fire_name),
        }
    }

    /// Whether anything keeps the member from being verified before any physics.
    #[must_use]
    pub fn incomplete(&self) -> bool {
        !self.unread.is_empty() || !self.not_covered.is_empty()
    }
}

fn need<T>(found: &Found<'_, T>, key: &'static str, unread: &mut Vec<&'static str>) {
    if found.value().is_none() {
        unread.push(key);
    }
}

/// Optional keys whose value is there but can't be read: its author meant something, so no default may stand for it.
fn note_unreadable(keys: &Inherited<'_>, unread: &mut Vec<&'static str>) {
    let mut test = |unreadable: bool, key: &'static str| {
        if unreadable {
            unread.push(key);
        }
    };
    test(keys.get(|k| &k.openings).given.is_unreadable(), "openings");
    test(keys.get(|k| &k.taper).given.is_unreadable(), "taper");
    test(keys.get(|k| &k.surface).given.is_unreadable(), "surface");
    test(keys.get(|k| &k.exposure).given.is_unreadable(), "exposure");
    test(keys.get(|k| &k.shield).given.is_unreadable(), "shielded by");
    test(keys.get(|k| &k.fire).given.is_unreadable(), "fire");
    test(
        keys.get(|k| &k.critical_temperature).given.is_unreadable(),
        "critical temperature",
    );
    test(keys.get(|k| &k.loading).given.is_unreadable(), "loading");
    test(keys.get(|k| &k.protection).given.is_unreadable(), "protection");
    test(keys.get(|k| &k.group).given.is_unreadable(), "group");
}

fn section_input(
    choice: Option<&SectionChoice>,
    names: &Names<'_>,
    unread: &mut Vec<&'static str>,
    not_covered: &mut Vec<(&'static str, &'static str)>,
) -> Option<SectionInput> {
    match choice? {
        SectionChoice::Designation(_) => match row_of(choice, &names.options) {
            Some(row) => Some(SectionInput {
                shape: row.shape,
                mass: Some(row.mass.kg_m()),
                known: Some(row.geometry()),
            }),
            None => {
                unread.push("section");
                None
            }
        },
        SectionChoice::Shape(shape) => Some(SectionInput {
            shape: **shape,
            mass: None,
            known: None,
        }),
        SectionChoice::NotCovered(_) => {
            not_covered.push((
                "section",
                "this shape is read but its section factor is not yet computed",
            ));
            None
        }
    }
}

fn cover(keys: &Inherited<'_>, design: &Design, fire: &str) -> Cover {
    let found = keys.get(|k| &k.protection);
    let Some(stated) = found.value() else {
        return if found.given.is_unreadable() {
            Cover::Unknown
        } else {
            Cover::Bare
        };
    };
    if stated.unreadable {
        return Cover::Unknown;
    }
    let Some(name) = &stated.product else {
        return Cover::Bare;
    };
    let Some((_, item)) = design.product(&name.value) else {
        return Cover::Unknown;
    };
    let named = item.value();
    let Some(product) = named.product.as_ref().filter(|_| !item.is_broken()) else {
        return Cover::Unknown;
    };
    let fire_assessed = named.serves_in(fire);
    let layers = if product.kind == crate::protection::product::Kind::Coating {
        stated.dft.value().copied().into_iter().collect()
    } else {
        let thickness = stated.thickness.value().map_or(&[][..], Vec::as_slice);
        let count = stated.layers.value().copied().unwrap_or(1) as usize;
        match thickness {
            [each] => vec![*each; count],
            layers => layers.to_vec(),
        }
    };
    Cover::Product(ProductInput {
        boxed: stated
            .boxed
            .value()
            .copied()
            .unwrap_or_else(|| product.boxes_by_default()),
        product: Arc::clone(product),
        fire_assessed,
        layers,
    })
}

impl Eq for Inputs {}

impl Hash for Inputs {
    fn hash<H: Hasher>(&self, state: &mut H) {
        (
            self.role,
            &self.unread,
            &self.not_covered,
            self.yield_from_en10025,
            self.surface,
        )
            .hash(state);
        if let Some(section) = &self.section {
            section.shape.hash_bits(state);
        }
        std::mem::discriminant(&self.reached.exposure).hash(state);
        if let Exposure::Perimeter(length) = self.reached.exposure {
            length.bits().hash(state);
        }
        match &self.steel {
            Some(Steel::Grade(name)) => name.hash(state),
            Some(Steel::Yield(stress)) => stress.bits().hash(state),
            None => {}
        }
        self.period.map(Time::bits).hash(state);
        self.fire.hash(state);
        self.stated.map(Temperature::bits).hash(state);
        self.default_critical.map(Temperature::bits).hash(state);
        if let Some(loading) = &self.loading {
            hash_loading(loading, state);
        }
        if let Cover::Product(input) = &self.cover {
            Arc::as_ptr(&input.product).hash(state);
            (input.boxed, input.fire_assessed).hash(state);
            input.layers.iter().for_each(|layer| layer.bits().hash(state));
        }
    }
}

fn hash_loading<H: Hasher>(loading: &Loading, state: &mut H) {
    match &loading.load {
        Load::Utilisation(value) | Load::Ratio(value) => value.to_bits().hash(state),
        Load::Ambient { utilisation, .. } => utilisation.to_bits().hash(state),
        Load::Effects(Effects {
            axial, bending, shear, ..
        }) => {
            (axial.map(|force| force.bits()), bending.map(|moment| moment.bits())).hash(state);
            shear.map(|force| force.bits()).hash(state);
        }
    }
    loading.restraint.buckling_length.map(Length::bits).hash(state);
}
