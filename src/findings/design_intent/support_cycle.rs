//! Members support each other in a circle.

use super::links::{Link, Links};
use crate::findings::finding::{Finding, Severity};
use crate::findings::registry::Declaration;

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

/// How many members of a circle are named.
const NAMED: usize = 6;

/// Where the walk stands with a member.
#[derive(Clone, Copy, PartialEq)]
enum State {
    New,
    /// On the path, so many members below where it began.
    OnPath(usize),
    Done,
}

/// Circles of support, one for each link that closes one, by a depth-first walk without recursion.
pub(super) fn check(links: &Links<'_>, out: &mut Vec<Finding>) {
    let mut state = vec![State::New; links.members()];
    let mut path: Vec<(usize, usize)> = Vec::new();
    for start in 0..links.members() {
        if state[start] != State::New {
            continue;
        }
        state[start] = State::OnPath(0);
        path.push((start, 0));
        while let Some((here, next)) = path.last_mut() {
            let Some(link) = links.under(*here).get(*next).copied() else {
                state[*here] = State::Done;
                path.pop();
                continue;
            };
            *next += 1;
            match state[link.to] {
                State::Done => {}
                State::OnPath(from) => out.push(closed(links, &path[from..], link)),
                State::New => {
                    state[link.to] = State::OnPath(path.len());
                    path.push((link.to, 0));
                }
            }
        }
    }
}

/// The finding at the mark that closes a circle. Of a long one, the first few are named.
fn closed(links: &Links<'_>, circle: &[(usize, usize)], link: Link<'_>) -> Finding {
    let marks: Vec<&str> = circle
        .iter()
        .take(NAMED)
        .map(|(member, _)| links.mark(*member))
        .collect();
    let name = links.mark(link.to);
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
    links.finding(link, &DECLARATION, message)
}
