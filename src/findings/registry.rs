//! The registry: every finding declared once, with its severity, clause and meaning.

use super::finding::Severity;
use super::finding::Severity::{Error, Hint, Information, Warning};

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
}

const fn declare(
    name: &'static str,
    severity: Severity,
    clause: &'static str,
    summary: &'static str,
    answer: &'static str,
) -> Declaration {
    Declaration {
        name,
        severity,
        clause,
        summary,
        answer,
    }
}

const YAML: &str = "YAML 1.2";
const FORMAT: &str = "format of the design file";
const PRACTICE: &str = "common practice";

/// Every finding.
pub static REGISTRY: &[Declaration] = &[
    declare(
        "unreadable-yaml",
        Error,
        YAML,
        "The text is not YAML 1.2.",
        "Repair the characters shown; the other members are checked meanwhile.",
    ),
    declare(
        "several-documents",
        Error,
        FORMAT,
        "The file holds more than one document.",
        "Keep one document a file.",
    ),
    declare(
        "unknown-key",
        Error,
        FORMAT,
        "A mapping has a key that it does not take.",
        "Correct the spelling or remove the key.",
    ),
    declare(
        "missing-key",
        Error,
        FORMAT,
        "A key is missing without which nothing can be said.",
        "Add the key to the member, its group or the defaults.",
    ),
    declare(
        "wrong-kind",
        Error,
        FORMAT,
        "A value is of another kind than its key wants.",
        "Write a value of the kind named.",
    ),
    declare(
        "wrong-unit",
        Error,
        FORMAT,
        "A unit measures something else, or is not known.",
        "Write the value in a unit of the kind named.",
    ),
    declare(
        "out-of-bounds",
        Error,
        FORMAT,
        "A value is outside what is physically possible.",
        "Correct the value.",
    ),
    declare(
        "duplicate-mark",
        Error,
        FORMAT,
        "A mark stands twice in the design.",
        "Give one of the members another mark, or use `count`.",
    ),
    declare(
        "unknown-section",
        Error,
        FORMAT,
        "No section table has the designation.",
        "Take one of the nearest, or give the shape as a mapping.",
    ),
    declare(
        "ambiguous-section",
        Error,
        FORMAT,
        "A designation fits several different sections.",
        "Write the one that is meant, or settle it by `basis`.",
    ),
    declare(
        "unknown-product",
        Error,
        FORMAT,
        "No library of the design has the product.",
        "Correct the name or add the library.",
    ),
    declare(
        "unknown-group",
        Error,
        FORMAT,
        "The design has no such group.",
        "Correct the name or add the group.",
    ),
    declare(
        "unknown-steel",
        Error,
        FORMAT,
        "The steel grade is not known.",
        "Correct it, or state `steel: {yield: ..}`.",
    ),
    declare(
        "unknown-fire",
        Error,
        FORMAT,
        "The design has no such fire.",
        "Correct the name or add the fire to the head file.",
    ),
    declare(
        "unknown-mark",
        Error,
        FORMAT,
        "No member carries the mark.",
        "Correct the mark.",
    ),
    declare(
        "unreadable-library",
        Error,
        FORMAT,
        "A file that is named can't be read, or is of another kind.",
        "Correct the path.",
    ),
    declare(
        "library-outside-workspace",
        Error,
        FORMAT,
        "A path leads out of the workspace.",
        "Bring the file into the workspace.",
    ),
    declare(
        "library-cycle",
        Error,
        FORMAT,
        "A path closes a cycle of files.",
        "Remove it.",
    ),
    declare(
        "part-not-listed",
        Error,
        FORMAT,
        "A part and its head do not name each other.",
        "List the part under `parts` and write `part of` in it.",
    ),
    declare(
        "method-not-supported",
        Error,
        FORMAT,
        "The method or its edition is not supported.",
        "Name a supported edition.",
    ),
    declare(
        "unused-product",
        Hint,
        FORMAT,
        "No member uses the product.",
        "Remove it if it is not wanted.",
    ),
    declare(
        "unused-group",
        Hint,
        FORMAT,
        "No member is of the group.",
        "Remove it if it is not wanted.",
    ),
    declare(
        "not-covered",
        Error,
        FORMAT,
        "The methods here do not cover the member; it is not verified.",
        "Verify it otherwise, or state what is covered.",
    ),
    declare(
        "too-slender-to-protect",
        Error,
        "EN 13381 assessments",
        "No assessed thickness of the product holds the section for the period.",
        "Take a heavier section, box it in, or another product.",
    ),
    declare(
        "bare-steel-fails",
        Error,
        "EN 1993-1-2 4.2.5.1",
        "The bare member reaches its critical temperature before the period.",
        "Protect it or take a heavier section.",
    ),
    declare(
        "protection-too-thin",
        Error,
        "EN 1993-1-2 4.2.5.2",
        "The thickness stated is less than the one needed.",
        "Take the next stock thickness.",
    ),
    declare(
        "reading-below-required",
        Warning,
        PRACTICE,
        "The measured dry film is below the one needed.",
        "Add coats or have the reading judged.",
    ),
    declare(
        "protection-over-thick",
        Hint,
        PRACTICE,
        "The thickness stated is past the next stock size.",
        "Take the next stock thickness, unless one size is wanted throughout.",
    ),
    declare(
        "protection-not-needed",
        Hint,
        PRACTICE,
        "The member would last its period bare.",
        "Consider whether the protection is wanted.",
    ),
    declare(
        "outside-assessed-range",
        Error,
        "EN 13381 assessments",
        "The member lies outside what was assessed, or the range is not stated.",
        "Take a product assessed for it.",
    ),
    declare(
        "fire-not-assessed",
        Error,
        "EN 13381 assessments",
        "The product was not assessed for the fire.",
        "Take a product assessed for it.",
    ),
    declare(
        "shape-not-assessed",
        Error,
        "EN 13381 assessments",
        "The product was not assessed for the shape.",
        "Take a product assessed for it.",
    ),
    declare(
        "coating-environment",
        Error,
        PRACTICE,
        "The coating may not serve in the member's environment.",
        "Take a coating for the environment.",
    ),
    declare(
        "too-many-coats",
        Warning,
        PRACTICE,
        "The film takes more than three coats.",
        "Consider a heavier section or a board.",
    ),
    declare(
        "evidence-expired",
        Warning,
        PRACTICE,
        "The evidence behind the product has expired.",
        "Get the current report.",
    ),
    declare(
        "critical-temperature-unknown",
        Error,
        "EN 1993-1-2 4.2.4",
        "The critical temperature is neither stated nor derivable.",
        "Give `loading` or a critical temperature.",
    ),
    declare(
        "critical-temperature-assumed",
        Warning,
        "EN 1993-1-2 4.2.4",
        "The named default of the basis is taken as critical temperature.",
        "Give the loading when it is known.",
    ),
    declare(
        "class-4-temperature",
        Warning,
        "EN 1993-1-2 4.2.3.6 (2)",
        "The section is class 4 in fire: 350 °C is taken.",
        "Take a stockier section if 350 °C is too low.",
    ),
    declare(
        "ambient-check-fails",
        Error,
        "EN 1993-1-2 4.2.3",
        "The load in fire exceeds the resistance at 20 °C.",
        "Take a stronger section.",
    ),
    declare(
        "critical-temperature-too-high",
        Error,
        "EN 1993-1-2 4.2.4",
        "The critical temperature stated is above the one that the loading gives.",
        "State the lower one, or correct the loading.",
    ),
    declare(
        "profile-board",
        Warning,
        PRACTICE,
        "A board follows the profile instead of boxing it in.",
        "Use the box form, unless the board is made for it.",
    ),
    declare(
        "section-factor-low",
        Information,
        "EN 1993-1-2 4.2.5.1 (5)",
        "The section factor is below 10 1/m, so 10 is used.",
        "Nothing needs doing.",
    ),
    declare(
        "fire-outside-validity",
        Warning,
        "EN 1991-1-2 Annex A",
        "The fire lies outside the validity of its formula, or is a test exposure.",
        "Take another fire or justify it.",
    ),
    declare(
        "galvanised-benefit-claimed",
        Information,
        "EN 1993-1-2 second generation",
        "The lower emissivity of a declared zinc coating is used.",
        "See that the declaration holds on site.",
    ),
    declare(
        "support-rating-lower",
        Error,
        PRACTICE,
        "A support does not last as long as what it carries.",
        "Raise the support's period and protection.",
    ),
    declare(
        "support-cycle",
        Error,
        PRACTICE,
        "Members support each other in a circle.",
        "Correct `supported by`.",
    ),
    declare(
        "bare-on-protected",
        Warning,
        PRACTICE,
        "A bare member rests on a protected one and draws heat into it.",
        "Run the protection on for 500 mm along the bare member.",
    ),
    declare(
        "shield-not-stated",
        Warning,
        PRACTICE,
        "Faces are said to be covered, but nothing sound covers them.",
        "State `shielded by`.",
    ),
    declare(
        "thin-steel",
        Hint,
        PRACTICE,
        "The steel is thin for its period: V/A under 3.5 mm.",
        "Consider a heavier section.",
    ),
    declare(
        "departure-without-reason",
        Error,
        PRACTICE,
        "A departure lacks its reason, or from an error who agreed and until when.",
        "Add `because`, `by` and `until`.",
    ),
    declare(
        "departure-expired",
        Error,
        PRACTICE,
        "A departure has run out.",
        "Agree it anew or answer the finding.",
    ),
    declare(
        "departure-outgrown",
        Error,
        PRACTICE,
        "The figures have worsened since the departure was agreed.",
        "Agree it anew or answer the finding.",
    ),
    declare(
        "departure-unused",
        Hint,
        PRACTICE,
        "A departure departs from nothing that was found.",
        "Remove it.",
    ),
];

/// The declaration of a finding.
#[must_use]
pub fn find(name: &str) -> Option<&'static Declaration> {
    REGISTRY.iter().find(|declaration| declaration.name == name)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_are_kebab_case_and_unique() {
        for (at, declaration) in REGISTRY.iter().enumerate() {
            let name = declaration.name;
            assert!(
                name.chars()
                    .all(|c| c.is_ascii_lowercase() || c == '-' || c.is_ascii_digit()),
                "{name}"
            );
            assert!(
                REGISTRY[..at].iter().all(|other| other.name != name),
                "{name} stands twice"
            );
            assert!(
                declaration.summary.ends_with('.') && declaration.answer.ends_with('.'),
                "{name}"
            );
        }
    }
}
