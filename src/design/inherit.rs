//! Where a member's value comes from: the member, its group, the defaults, or the built-in default.

use crate::design::given::Given;
use crate::design::model::member::MemberKeys;

/// Whose value it is. Precedence is in this order.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Origin {
    /// The member's own.
    Member,
    /// Its group's.
    Group,
    /// The defaults of the design.
    Defaults,
    /// No file states it.
    BuiltIn,
}

/// The three places in which a member's keys may stand.
#[derive(Debug, Clone, Copy)]
pub struct Inherited<'a> {
    /// The member's own keys.
    pub member: &'a MemberKeys,
    /// Those of its group, if it names one that exists.
    pub group: Option<&'a MemberKeys>,
    /// Those of the defaults.
    pub defaults: Option<&'a MemberKeys>,
}

/// A key's value and whose it is.
#[derive(Debug, Clone, Copy)]
pub struct Found<'a, T> {
    /// The value; absent only where no file states it.
    pub given: &'a Given<T>,
    /// Whose it is.
    pub origin: Origin,
}

impl<'a> Inherited<'a> {
    /// Whether a key that is not known, or one that stands twice, stands in any of the three.
    #[must_use]
    pub fn are_strange(&self) -> bool {
        let above = [self.group, self.defaults];
        self.member.strange || above.into_iter().flatten().any(|keys| keys.strange)
    }

    /// The first of member, group and defaults that has the key. A value that can't be read hides those beneath it:
    /// its author meant something else than they say. Mappings are replaced whole.
    pub fn get<T>(&self, field: impl Fn(&'a MemberKeys) -> &'a Given<T>) -> Found<'a, T> {
        let own = field(self.member);
        if !own.is_absent() {
            return Found {
                given: own,
                origin: Origin::Member,
            };
        }
        if let Some(given) = self.group.map(&field).filter(|given| !given.is_absent()) {
            return Found {
                given,
                origin: Origin::Group,
            };
        }
        if let Some(given) = self.defaults.map(&field).filter(|given| !given.is_absent()) {
            return Found {
                given,
                origin: Origin::Defaults,
            };
        }
        Found {
            given: own,
            origin: Origin::BuiltIn,
        }
    }
}

impl<'a, T> Found<'a, T> {
    /// The value, if it is stated and can be read.
    #[must_use]
    pub fn value(&self) -> Option<&'a T> {
        self.given.value()
    }
}
