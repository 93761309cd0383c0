//! What a file's members, and each group's, come to: shown above the file and above each group.

use rustc_hash::FxHashMap;

use crate::analysis::design::MemberAt;
use crate::analysis::outcome::Verdict;
use crate::analysis::source::FileKind;
use crate::editor::symbols::outcomes_of;
use crate::editor::view::View;
use crate::report::schedule::quantities::{Quantities, count, quantities};
use crate::report::schedule::totals::{Share, Totals, sum};
use crate::text::Span;
use crate::units::{DisplayUnits, significant};

/// A line above a part of the text.
#[derive(Debug, Clone, PartialEq)]
pub struct Lens {
    /// What it stands above: the first character of the file, or a group's name.
    pub span: Span,
    /// The group; `None` of the file.
    pub group: Option<String>,
    /// The line.
    pub title: String,
    /// What it sums.
    pub sums: Sums,
}

/// Sums over members.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Sums {
    /// Marks, pieces, steel, protected surface, cost. They sum what is known.
    pub totals: Totals,
    /// Whether the steel of some member is not known.
    pub steel_incomplete: bool,
    /// Whether the surface of some protected member is not known.
    pub surface_incomplete: bool,
    /// Whether the cost of some member is not known.
    pub cost_incomplete: bool,
    /// Marks that fail.
    pub fail: usize,
    /// Marks whose product holds them in no thickness.
    pub cannot_be_protected: usize,
    /// Marks that are not verified.
    pub not_verified: usize,
}

/// A member's part in the sums.
#[derive(Clone, Copy)]
struct Part {
    count: Option<u32>,
    product: bool,
    quantities: Quantities,
    verdict: Verdict,
}

/// The lenses of a file: one of its own members, and one for each group of the members throughout the design that name
/// it. A protection file has none. One pass over the design.
#[must_use]
pub fn lenses(view: &View<'_>) -> Vec<Lens> {
    let (design, source) = (view.design, view.source());
    if source.kind != FileKind::Steelwork {
        return Vec::new();
    }
    let mut of_file: Vec<Part> = Vec::new();
    let mut of_group: FxHashMap<&str, Vec<Part>> = FxHashMap::default();
    for item in &source.groups {
        of_group.insert(&item.value().name.value, Vec::new());
    }
    let here = outcomes_of(design, view.outcomes, view.file).len();
    of_file.reserve(here);
    for (at, outcome) in design.members.iter().zip(view.outcomes) {
        let MemberAt { file, .. } = *at;
        let member = design.member(*at).value();
        let keys = design.inherited(member);
        let group = keys.get(|keys| &keys.group).value().map(String::as_str);
        let group = group.and_then(|name| of_group.get_mut(name));
        if file != view.file && group.is_none() {
            continue;
        }
        let part = || Part {
            count: count(&keys),
            product: keys
                .get(|keys| &keys.protection)
                .value()
                .is_some_and(|stated| stated.product.is_some()),
            quantities: quantities(design, member, outcome),
            verdict: outcome.verdict,
        };
        match (file == view.file, group) {
            (true, Some(group)) => {
                let part = part();
                of_file.push(part);
                group.push(part);
            }
            (true, None) => of_file.push(part()),
            (false, Some(group)) => group.push(part()),
            (false, None) => {}
        }
    }
    let basis = design.basis();
    let words = Words {
        units: if basis.imperial {
            DisplayUnits::Imperial
        } else {
            DisplayUnits::Metric
        },
        currency: basis.currency.as_deref(),
    };
    let lens = |span: Span, group: Option<&String>, parts: &[Part]| {
        let sums = sums(parts);
        Lens {
            span,
            group: group.cloned(),
            title: words.title(&sums),
            sums,
        }
    };
    let mut lenses = Vec::new();
    if !source.members.is_empty() {
        let first = view.text().chars().next().map_or(0, char::len_utf8);
        lenses.push(lens(Span::new(0, first), None, &of_file));
    }
    for item in &source.groups {
        let name = &item.value().name;
        let parts = of_group.get(name.value.as_str()).map_or(&[][..], Vec::as_slice);
        lenses.push(lens(item.place(name.span), Some(&name.value), parts));
    }
    lenses
}

fn sums(parts: &[Part]) -> Sums {
    let shares = parts.iter().map(|part| Share {
        count: part.count,
        product: part.product,
        quantities: &part.quantities,
    });
    let marks = |verdict| parts.iter().filter(|part| part.verdict == verdict).count();
    Sums {
        totals: sum(shares),
        steel_incomplete: parts.iter().any(|part| part.quantities.steel_mass_kg.is_none()),
        surface_incomplete: parts
            .iter()
            .any(|part| part.quantities.protected && (!part.product || part.quantities.surface_m2.is_none())),
        cost_incomplete: parts.iter().any(|part| part.quantities.cost().is_none()),
        fail: marks(Verdict::Fails),
        cannot_be_protected: marks(Verdict::CannotBeProtected),
        not_verified: marks(Verdict::NotVerified),
    }
}

/// The units and the currency of a title.
struct Words<'a> {
    units: DisplayUnits,
    currency: Option<&'a str>,
}

impl Words<'_> {
    /// `12 marks, 36 members, 14.2 t, 310 m² protected, EUR 52,300, 2 fail`. What is not known of all is `at least`.
    fn title(&self, sums: &Sums) -> String {
        let totals = &sums.totals;
        if totals.marks == 0 {
            return "no members".to_owned();
        }
        let plural = |n: u32| if n == 1 { "" } else { "s" };
        let at_least = |incomplete: bool| if incomplete { "at least " } else { "" };
        let mut parts = vec![
            format!("{} mark{}", totals.marks, plural(totals.marks)),
            format!("{} member{}", totals.members, plural(totals.members)),
        ];
        if totals.steel_mass_kg > 0.0 {
            parts.push(format!(
                "{}{}",
                at_least(sums.steel_incomplete),
                self.mass(totals.steel_mass_kg)
            ));
        }
        if totals.surface_m2 > 0.0 {
            let surface = self.surface(totals.surface_m2);
            parts.push(format!("{}{surface} protected", at_least(sums.surface_incomplete)));
        }
        if let Some(cost) = totals.cost {
            let currency = self
                .currency
                .map_or_else(String::new, |currency| format!("{currency} "));
            parts.push(format!(
                "{}{currency}{}",
                at_least(sums.cost_incomplete),
                thousands(cost)
            ));
        }
        let counts = [
            (sums.fail, if sums.fail == 1 { "fails" } else { "fail" }),
            (sums.cannot_be_protected, "cannot be protected"),
            (sums.not_verified, "not verified"),
        ];
        parts.extend(
            counts
                .into_iter()
                .filter(|(n, _)| *n > 0)
                .map(|(n, words)| format!("{n} {words}")),
        );
        parts.join(", ")
    }

    fn mass(&self, kg: f64) -> String {
        match self.units {
            DisplayUnits::Metric if kg < 1000.0 => format!("{} kg", significant(kg, 0)),
            DisplayUnits::Metric => format!("{} t", significant(kg / 1000.0, 1)),
            // The international pound, exactly 0.45359237 kg.
            DisplayUnits::Imperial => format!("{} lb", thousands(kg / 0.453_592_37)),
        }
    }

    fn surface(&self, m2: f64) -> String {
        match self.units {
            DisplayUnits::Metric => format!("{} m²", significant(m2, usize::from(m2 < 10.0))),
            // The international foot, exactly 0.3048 m.
            DisplayUnits::Imperial => format!("{} ft²", thousands(m2 / (0.3048 * 0.3048))),
        }
    }
}

/// A whole number with commas between thousands.
fn thousands(value: f64) -> String {
    let digits = format!("{value:.0}");
    let mut out = String::new();
    for (n, digit) in digits.chars().enumerate() {
        if n > 0 && (digits.len() - n).is_multiple_of(3) && !out.ends_with('-') {
            out.push(',');
        }
        out.push(digit);
    }
    out
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn thousands_are_set_apart() {
        assert_eq!(thousands(999.4), "999");
        assert_eq!(thousands(1000.0), "1,000");
        assert_eq!(thousands(1_234_567.0), "1,234,567");
        assert_eq!(thousands(-123_456.0), "-123,456");
    }

    #[test]
    fn what_is_not_known_is_not_claimed() {
        let words = Words {
            units: DisplayUnits::Metric,
            currency: Some("EUR"),
        };
        assert_eq!(words.title(&Sums::default()), "no members");
        let sums = Sums {
            totals: Totals {
                marks: 3,
                members: 12,
                steel_mass_kg: 2_340.0,
                surface_m2: 87.6,
                cost: Some(12_345.0),
                ..Totals::default()
            },
            steel_incomplete: true,
            fail: 1,
            not_verified: 2,
            ..Sums::default()
        };
        assert_eq!(
            words.title(&sums),
            "3 marks, 12 members, at least 2.3 t, 88 m² protected, EUR 12,345, 1 fails, 2 not verified"
        );
    }
}
