//! No member carries the mark.

use crate::analysis::design::Design;
use crate::design::keys::nearest;
use crate::findings::finding::{Finding, Fix, FixEdit, Place, Severity};
use crate::findings::registry::Declaration;
use std::sync::Arc;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "unknown-mark",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "No member carries the mark.",
    answer: "Correct the mark.",
    fix: "Writes the nearest mark, where one is near.",
    before: r"- { mark: B1, section: IPE 300, supported by: [C9] }
- { mark: C1, role: column, section: HE 200 B }",
    after: r"- { mark: B1, section: IPE 300, supported by: [C1] }
- { mark: C1, role: column, section: HE 200 B }",
};

/// Unknown marks for which the nearest is sought: each costs a pass over all marks.
const SOUGHT: usize = 20;

/// Marks under `supported by` and `steadies` that no member carries.
pub(super) fn check(design: &Design, out: &mut Vec<Finding>) {
    let mut sought = 0;
    for at in &design.members {
        let item = design.member(*at);
        let member = item.value();
        let mark = member.mark.value().map_or("this member", String::as_str);
        let keys = [
            ("supported by", "is said to be supported by", &member.keys.supported_by),
            ("steadies", "is said to steady", &member.keys.steadies),
        ];
        for (key, does, given) in keys {
            for name in given.value().into_iter().flatten() {
                if design.marks.contains_key(&name.value) {
                    continue;
                }
                let near = (sought < SOUGHT)
                    .then(|| {
                        nearest(
                            &name.value,
                            design.marks.keys().map(String::as_str).filter(|known| *known != mark),
                        )
                    })
                    .flatten();
                sought += 1;
                let perhaps = near.map_or_else(String::new, |near| format!("; perhaps {near}"));
                let message = format!("{mark} {does} {}, but no member carries that mark{perhaps}", name.value);
                let place = Place {
                    path: Arc::clone(&design.files[at.file].path),
                    span: item.place(name.span),
                };
                let mut finding = Finding::new(&DECLARATION, place.clone(), message);
                finding.mark = member.mark.value().cloned();
                finding.key = Some(key.to_owned());
                finding.fixes.extend(near.map(|near| Fix {
                    title: format!("write `{near}`"),
                    safe: false,
                    edits: vec![FixEdit {
                        place,
                        text: near.to_owned(),
                    }],
                }));
                out.push(finding);
            }
        }
    }
}
