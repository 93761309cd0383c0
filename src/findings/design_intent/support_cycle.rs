//! Members support each other in a circle.

use crate::analysis::design::{Design, MemberAt};
use crate::findings::finding::{Finding, Place, Severity};
use crate::findings::registry::Declaration;
use rustc_hash::FxHashSet;

/// What is known of it before any design is read.
pub static DECLARATION: Declaration = Declaration {
    name: "support-cycle",
    severity: Severity::Error,
    clause: "common practice",
    summary: "Members support each other in a circle.",
    answer: "Correct `supported by`.",
    fix: "None: which of the supports is wrong is the author's to say.",
    before: r"- { mark: B1, section: IPE 300, supported by: [B2] }
- { mark: B2, section: IPE 300, supported by: [B1] }",
    after: r"- { mark: B1, section: IPE 300, supported by: [B2] }
- { mark: B2, section: IPE 300 }",
};

/// Circles of support, each reported once, by a depth-first walk without recursion.
pub(super) fn check(design: &Design, out: &mut Vec<Finding>) {
    let mut done: FxHashSet<MemberAt> = FxHashSet::default();
    for start in &design.members {
        let mut path: Vec<(MemberAt, usize)> = vec![(*start, 0)];
        let mut on_path: FxHashSet<MemberAt> = FxHashSet::from_iter([*start]);
        while let Some((at, next)) = path.last_mut() {
            let here = *at;
            let supports = &design.member(here).value().keys.supported_by;
            let name = supports.value().and_then(|names| names.get(*next));
            let Some(name) = name.filter(|_| !done.contains(&here)) else {
                done.insert(here);
                on_path.remove(&here);
                path.pop();
                continue;
            };
            *next += 1;
            let Some(to) = design.marks.get(&name.value).copied() else {
                continue;
            };
            if on_path.contains(&to) {
                let from = path.iter().position(|(at, _)| *at == to).unwrap_or(0);
                let circle: Vec<MemberAt> = path[from..].iter().map(|(at, _)| *at).collect();
                out.push(closed(
                    design,
                    &circle,
                    &name.value,
                    super::place(design, here, name.span),
                ));
            } else if !done.contains(&to) {
                on_path.insert(to);
                path.push((to, 0));
            }
        }
    }
}

/// The finding at the mark that closes a circle. Of a long one, the first few are named.
fn closed(design: &Design, circle: &[MemberAt], name: &str, place: Place) -> Finding {
    let marks: Vec<&str> = circle
        .iter()
        .take(6)
        .map(|at| design.member(*at).value().mark.value().map_or("?", String::as_str))
        .collect();
    let message = match (marks.as_slice(), circle.len()) {
        ([only], _) => format!("{only} is said to support itself"),
        ([all @ .., last], n) if n == marks.len() => {
            format!(
                "{} and {last} support each other in a circle, which {name} closes",
                all.join(", ")
            )
        }
        (some, n) => format!(
            "{} and {} more support each other in a circle, which {name} closes",
            some.join(", "),
            n - some.len()
        ),
    };
    let mut finding = Finding::new(&DECLARATION, place, message);
    let last = circle.last().and_then(|at| design.member(*at).value().mark.value());
    finding.mark = last.cloned();
    finding.key = Some("supported by".to_owned());
    finding
}
