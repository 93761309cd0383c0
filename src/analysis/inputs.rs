//! The plain inputs of a member's evaluation: what its verdict depends on, and nothing else.
//!
//! No span, no name that does not matter and no remark is in here, so that a comment or a moved line changes nothing.

use std::hash::{Hash, Hasher};
use std::sync::Arc;

use crate::analysis::design::Design;
use crate::analysis::exposure::{Reached, reached};
use crate::analysis::outcome::Gap;
use crate::design::given::Given;
use crate::design::inherit::{Found, Inherited};
use crate::design::model::head::{Factors, Method};
use crate::design::model::member::{
    Loading, Member, Period, Protection, Role, SectionChoice, Steel, Surface,
};
use crate::heating::fire::Fire;
use crate::section::catalogue::{CatalogueRow, Lookup, LookupOptions, find};
use crate::section::{Exposure, Shape};
use crate::units::{Length, Temperature, Time};

/// A section ready to be computed with.
#[derive(Debug, Clone)]
pub struct SectionInput {
    /// Designation as the tables write it, or the shape's word.
    pub name: Arc<str>,
    /// The shape.
    pub shape: Shape,
    /// The row of the tables, for designations.
    pub row: Option<&'static CatalogueRow>,
}

/// A product by content, with what its name is needed for.
#[derive(Debug, Clone)]
pub struct ProductInput {
    /// Its content.
    pub product: Arc<crate::protection::product::Product>,
    /// Whether it was assessed for the member's fire.
    pub fire_assessed: bool,
    /// Whether it boxes the section in.
    pub boxed: bool,
    /// Stated thickness of each layer; empty where the file states none.
    pub layers: Vec<Length>,
    /// Number of equal layers, where stated.
    pub count: Option<u32>,
    /// Stated dry film.
    pub film: Option<Length>,
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
    /// Section; `None` where it is missing, unreadable or unknown.
    pub section: Option<SectionInput>,
    /// What the methods don't cover, each with its key.
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
