//! A mark stands twice in the design.

use crate::analysis::design::Design;
use crate::findings::finding::{Finding, Note, Place, Severity};
use crate::findings::registry::Declaration;
use std::sync::Arc;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "duplicate-mark",
    severity: Severity::Error,
    clause: "format of the design file",
    summary: "A mark stands twice in the design.",
    answer: "Give one of the members another mark, or use `count` for equal ones.",
    fix: "None: which of the members keeps the mark is the author's to say.",
    before: r"- { mark: B1, section: IPE 300 }
- { mark: B1, section: IPE 330 }",
    after: r"- { mark: B1, section: IPE 300 }
- { mark: B2, section: IPE 330 }",
};

/// Members after the first that carry a mark.
pub(super) fn check(design: &Design, out: &mut Vec<Finding>) {
    let place = |at: crate::analysis::design::MemberAt, span| Place {
        path: Arc::clone(&design.files[at.file].path),
        span: design.member(at).place(span),
    };
    for at in design.members.iter() {
        let mark = &design.member(*at).value().mark;
        if let (Some(name), Some(span)) = (mark.value(), mark.span())
            && let Some(first) = design.marks.get(name).filter(|first| *first != at)
        {
            let message = format!("the mark {name} stands twice in the design");
            let mut finding = Finding::new(&DECLARATION, place(*at, span), message);
            finding.member = Some(*at);
            finding.mark = Some(name.clone());
            finding.key = Some("mark".to_owned());
            let other = design.member(*first).value().mark.span().unwrap_or_default();
            finding.notes.push(Note {
                text: format!("{name} stands here first"),
                place: Some(place(*first, other)),
            });
            out.push(finding);
        }
    }
}
