//! The registry: every finding, declared once in its own file.

use super::finding::Severity;
use super::{departures, design_intent, fire, reading};

/// What is known of a finding before any design is read.
#[derive(Debug, PartialEq, Eq)]
pub struct Declaration {
    /// Kebab-case; reads after "departure from".
    pub name: &'static str,
    /// How grave it is.
    pub severity: Severity,
    /// The clause, or "common practice".
    pub clause: &'static str,
    /// What is wrong, in one sentence.
    pub summary: &'static str,
    /// How to answer it.
    pub answer: &'static str,
    /// What fix there is, or why there is none.
    pub fix: &'static str,
    /// A text that has it: items of `members` in the frame of [`EXAMPLE_FRAME`], or whole files.
    pub before: &'static str,
    /// The same without it.
    pub after: &'static str,
}

/// Every finding, in the order of the phases.
pub static REGISTRY: &[&Declaration] = &[
    &reading::unreadable_yaml::DECLARATION,
    &reading::several_documents::DECLARATION,
    &reading::unknown_key::DECLARATION,
    &reading::missing_key::DECLARATION,
    &reading::wrong_kind::DECLARATION,
    &reading::wrong_unit::DECLARATION,
    &reading::out_of_bounds::DECLARATION,
    &reading::duplicate_mark::DECLARATION,
    &reading::unknown_section::DECLARATION,
    &reading::ambiguous_section::DECLARATION,
    &reading::unknown_product::DECLARATION,
    &reading::unknown_group::DECLARATION,
    &reading::unknown_steel::DECLARATION,
    &reading::unknown_fire::DECLARATION,
    &reading::unknown_mark::DECLARATION,
    &reading::unreadable_library::DECLARATION,
    &reading::library_outside_workspace::DECLARATION,
    &reading::library_cycle::DECLARATION,
    &reading::part_not_listed::DECLARATION,
    &reading::method_not_supported::DECLARATION,
    &reading::unused_product::DECLARATION,
    &reading::unused_group::DECLARATION,
    &reading::not_covered::DECLARATION,
    &fire::too_slender_to_protect::DECLARATION,
    &fire::bare_steel_fails::DECLARATION,
    &fire::protection_too_thin::DECLARATION,
    &fire::reading_below_required::DECLARATION,
    &fire::protection_over_thick::DECLARATION,
    &fire::protection_not_needed::DECLARATION,
    &fire::outside_assessed_range::DECLARATION,
    &fire::fire_not_assessed::DECLARATION,
    &fire::shape_not_assessed::DECLARATION,
    &fire::profile_board::DECLARATION,
    &fire::coating_environment::DECLARATION,
    &fire::too_many_coats::DECLARATION,
    &fire::evidence_expired::DECLARATION,
    &fire::critical_temperature_unknown::DECLARATION,
    &fire::critical_temperature_assumed::DECLARATION,
    &fire::critical_temperature_too_high::DECLARATION,
    &fire::critical_temperature_ignores_buckling::DECLARATION,
    &fire::class_4_temperature::DECLARATION,
    &fire::ambient_check_fails::DECLARATION,
    &fire::section_factor_low::DECLARATION,
    &fire::fire_outside_validity::DECLARATION,
    &fire::galvanised_benefit_claimed::DECLARATION,
    &design_intent::support_rating_lower::DECLARATION,
    &design_intent::support_cycle::DECLARATION,
    &design_intent::bare_on_protected::DECLARATION,
    &design_intent::shield_not_stated::DECLARATION,
    &design_intent::deck_contact_low::DECLARATION,
    &design_intent::deck_voids_unfilled::DECLARATION,
    &design_intent::thin_steel::DECLARATION,
    &departures::departure_without_reason::DECLARATION,
    &departures::departure_expired::DECLARATION,
    &departures::departure_outgrown::DECLARATION,
    &departures::departure_unused::DECLARATION,
];

/// What stands before the members of an example that is no whole file.
pub const EXAMPLE_FRAME: &str = "\
steelwork: 1
basis: { default critical temperature: 500 }
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 60 }
members:
";

/// The library of the examples.
pub const EXAMPLE_LIBRARY: &str = include_str!("example.protection.yaml");

/// The files of an example: names and texts, the head first. Where an example has several, a line such as
/// `# roof.steelwork.yaml` begins each that follows.
#[must_use]
pub fn example_files(example: &str) -> Vec<(String, String)> {
    let whole = example.starts_with("steelwork:");
    let mut files = vec![("frame.steelwork.yaml".to_owned(), String::new())];
    if !whole {
        files[0].1.push_str(EXAMPLE_FRAME);
    }
    for line in example.lines() {
        match line.strip_prefix("# ").filter(|name| name.ends_with(".yaml")) {
            Some(name) => files.push((name.to_owned(), String::new())),
            None => {
                if let Some((_, text)) = files.last_mut() {
                    text.push_str(if whole { "" } else { "  " });
                    text.push_str(line);
                    text.push('\n');
                }
            }
        }
    }
    files.push(("demo.protection.yaml".to_owned(), EXAMPLE_LIBRARY.to_owned()));
    files
}

/// The declaration of a finding.
#[must_use]
pub fn find(name: &str) -> Option<&'static Declaration> {
    REGISTRY.iter().copied().find(|declaration| declaration.name == name)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_are_kebab_case_and_unique() {
        for (at, declaration) in REGISTRY.iter().enumerate() {
            let name = declaration.name;
            let kebab = |c: char| c.is_ascii_lowercase() || c == '-' || c.is_ascii_digit();
            assert!(!name.is_empty() && name.chars().all(kebab), "{name}");
            assert!(
                REGISTRY[..at].iter().all(|other| other.name != name),
                "{name} stands twice"
            );
        }
    }

    #[test]
    fn texts_are_sentences() {
        for declaration in REGISTRY {
            for text in [declaration.summary, declaration.answer, declaration.fix] {
                let first = text.chars().next().unwrap();
                assert!(
                    first.is_uppercase() && text.ends_with('.'),
                    "{}: {text}",
                    declaration.name
                );
            }
            assert!(!declaration.clause.is_empty(), "{}", declaration.name);
            assert_ne!(declaration.before, declaration.after, "{}", declaration.name);
        }
    }
}
