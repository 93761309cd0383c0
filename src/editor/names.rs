//! Marks, groups, products and fires: where a design gives each its name, and where it calls it by it.

use crate::analysis::design::{Design, FileIndex};
use crate::analysis::source::{Item, SourceFile};
use crate::design::decode::fire::BUILT_IN;
use crate::design::given::Given;
use crate::design::keys::NameOf;
use crate::design::model::head::Group;
use crate::design::model::library::NamedProduct;
use crate::design::model::member::{Member, MemberKeys};
use crate::editor::view::{View, Within};
use crate::findings::insert::through_alias;
use crate::text::{Span, Spanned};

/// A name where it stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Occurrence<'a> {
    /// What it names: a mark, a group, a product or a fire.
    pub of: NameOf,
    /// The name, quotes resolved.
    pub name: &'a str,
    /// Its characters in the file, quotes included.
    pub span: Span,
    /// Whether the name is given here; it is used here otherwise.
    pub declares: bool,
}

impl Occurrence<'_> {
    /// Whether the name stands there by an alias only, so that its characters are elsewhere.
    #[must_use]
    pub fn is_alias(&self, text: &str) -> bool {
        through_alias(text, self.span)
    }
}

/// The name at an offset.
#[must_use]
pub fn at<'a>(view: &View<'a>, offset: u32) -> Option<Occurrence<'a>> {
    let source = view.source();
    let mut found = None;
    let mut test = |occurrence: Occurrence<'a>| {
        if occurrence.span.touches(offset) && !occurrence.span.is_empty() {
            found = Some(occurrence);
        }
    };
    match view.within(offset) {
        Within::Member(index) => in_member(&source.members[index], &mut test),
        Within::Group(index) => in_group(&source.groups[index], &mut test),
        Within::Product(index) => in_product(&source.products[index], &mut test),
        Within::Entry(_) | Within::Nothing => in_head(source, &mut test),
    }
    found
}

/// Calls `visit` for every name in a design, in the order of its files, with the file.
pub fn each<'a>(design: &'a Design, mut visit: impl FnMut(FileIndex, Occurrence<'a>)) {
    for (file, source) in design.files.iter().enumerate() {
        let mut visit = |occurrence| visit(file, occurrence);
        in_head(source, &mut visit);
        source.groups.iter().for_each(|item| in_group(item, &mut visit));
        source.members.iter().for_each(|item| in_member(item, &mut visit));
        source.products.iter().for_each(|item| in_product(item, &mut visit));
    }
}

/// Whether a fire is known without being described.
#[must_use]
pub fn is_built_in(of: NameOf, name: &str) -> bool {
    of == NameOf::Fire && BUILT_IN.iter().any(|(built_in, _)| *built_in == name)
}

fn in_head<'a>(source: &'a SourceFile, visit: &mut impl FnMut(Occurrence<'a>)) {
    for fire in &source.head.fires {
        visit(occurrence(NameOf::Fire, &fire.name, 0, true));
    }
    in_keys(&source.head.defaults, 0, visit);
}

fn in_group<'a>(item: &'a Item<Group>, visit: &mut impl FnMut(Occurrence<'a>)) {
    let group = item.value();
    visit(occurrence(NameOf::Group, &group.name, item.base(), true));
    in_keys(&group.keys, item.base(), visit);
}

fn in_member<'a>(item: &'a Item<Member>, visit: &mut impl FnMut(Occurrence<'a>)) {
    let member = item.value();
    if let Given::Value(mark) = &member.mark {
        visit(occurrence(NameOf::Mark, mark, item.base(), true));
    }
    in_keys(&member.keys, item.base(), visit);
}

fn in_product<'a>(item: &'a Item<NamedProduct>, visit: &mut impl FnMut(Occurrence<'a>)) {
    let product = item.value();
    visit(occurrence(NameOf::Product, &product.name, item.base(), true));
    for fire in &product.fires {
        visit(occurrence(NameOf::Fire, fire, item.base(), false));
    }
}

fn in_keys<'a>(keys: &'a MemberKeys, base: u32, visit: &mut impl FnMut(Occurrence<'a>)) {
    for (of, given) in [(NameOf::Group, &keys.group), (NameOf::Fire, &keys.fire)] {
        if let Given::Value(name) = given {
            visit(occurrence(of, name, base, false));
        }
    }
    if let Some(name) = keys.protection.value().and_then(|stated| stated.product.as_ref()) {
        visit(occurrence(NameOf::Product, name, base, false));
    }
    let marks = [&keys.supported_by, &keys.steadies];
    for mark in marks.into_iter().filter_map(Given::value).flatten() {
        visit(occurrence(NameOf::Mark, mark, base, false));
    }
}

fn occurrence(of: NameOf, name: &Spanned<String>, base: u32, declares: bool) -> Occurrence<'_> {
    Occurrence {
        of,
        name: &name.value,
        span: name.span.shift(base),
        declares,
    }
}
