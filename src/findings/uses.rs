//! How often members use what a design names: groups, products, and each other as supports. Kept beside a design and
//! brought up to date member by member, it spares a pass over the design at each change.

use rustc_hash::FxHashMap;

use crate::analysis::design::Design;
use crate::design::model::member::Member;

/// How often names are used.
#[derive(Debug, Clone, Default, PartialEq, Eq)]
pub struct Uses {
    groups: FxHashMap<String, usize>,
    products: FxHashMap<String, usize>,
    supports: FxHashMap<String, usize>,
    /// Members that are said to rest on others or to steady them.
    linked: usize,
}

impl Uses {
    /// Counts all members of a design.
    #[must_use]
    pub fn of(design: &Design) -> Self {
        let mut uses = Self::default();
        for at in design.members.iter() {
            uses.add(design, design.member(*at).value());
        }
        uses
    }

    /// Counts a member in.
    pub fn add(&mut self, design: &Design, member: &Member) {
        self.each(design, member, count);
        self.linked += usize::from(is_linked(design, member));
    }

    /// Counts a member out that was counted in.
    pub fn remove(&mut self, design: &Design, member: &Member) {
        self.each(design, member, discount);
        self.linked -= usize::from(is_linked(design, member));
    }

    /// Counts every name that a member uses, its own or inherited.
    fn each(&mut self, design: &Design, member: &Member, count: fn(&mut FxHashMap<String, usize>, &String)) {
        let keys = design.inherited(member);
        if let Some(name) = keys.get(|keys| &keys.group).value() {
            count(&mut self.groups, name);
        }
        let stated = keys.get(|keys| &keys.protection).value();
        if let Some(product) = stated.and_then(|stated| stated.product.as_ref()) {
            count(&mut self.products, &product.value);
        }
        for name in keys.get(|keys| &keys.supported_by).value().into_iter().flatten() {
            count(&mut self.supports, &name.value);
        }
    }

    /// Whether any member is of a group.
    #[must_use]
    pub fn group(&self, name: &str) -> bool {
        self.groups.contains_key(name)
    }

    /// Whether any member uses a product.
    #[must_use]
    pub fn product(&self, name: &str) -> bool {
        self.products.contains_key(name)
    }

    /// Whether any member is said to rest on the one of this mark.
    #[must_use]
    pub fn support(&self, mark: &str) -> bool {
        self.supports.contains_key(mark)
    }

    /// Whether any member is said to rest on others or to steady them.
    #[must_use]
    pub const fn any_linked(&self) -> bool {
        self.linked > 0
    }

    /// Whether the same groups and products are used, however often.
    #[must_use]
    pub fn alike(&self, other: &Self) -> bool {
        let same = |a: &FxHashMap<String, usize>, b: &FxHashMap<String, usize>| {
            a.len() == b.len() && a.keys().all(|name| b.contains_key(name))
        };
        same(&self.groups, &other.groups) && same(&self.products, &other.products)
    }
}

/// Whether a member is said to rest on others or to steady them, by its own words or inherited ones.
#[must_use]
pub fn is_linked(design: &Design, member: &Member) -> bool {
    let keys = design.inherited(member);
    let supported = keys.get(|keys| &keys.supported_by);
    !supported.given.is_absent() || !keys.get(|keys| &keys.steadies).given.is_absent()
}

fn count(uses: &mut FxHashMap<String, usize>, name: &String) {
    // Most names are known, and a known one costs no copy.
    match uses.get_mut(name) {
        Some(known) => *known += 1,
        None => {
            uses.insert(name.clone(), 1);
        }
    }
}

fn discount(uses: &mut FxHashMap<String, usize>, name: &String) {
    match uses.get_mut(name) {
        Some(known) if *known > 1 => *known -= 1,
        _ => {
            uses.remove(name);
        }
    }
}
