//! Who carries whom: the marks under `supported by`, the members' own and inherited ones.

use std::sync::Arc;

use crate::analysis::design::{Design, MemberAt};
use crate::design::inherit::Origin;
use crate::findings::finding::{Finding, Note, Place};
use crate::findings::registry::Declaration;
use crate::text::Spanned;

/// That one member carries another. Members are numbered in the order of the design.
#[derive(Clone, Copy)]
pub(super) struct Link<'a> {
    /// What is carried.
    pub from: usize,
    /// What carries it.
    pub to: usize,
    /// The mark of what carries it, as it is written.
    name: &'a Spanned<String>,
    origin: Origin,
}

/// Every link of a design, those of a member side by side.
pub(super) struct Links<'a> {
    design: &'a Design,
    list: Vec<Link<'a>>,
    /// Where the links of each member begin, and where the last ones end.
    first: Vec<usize>,
}

impl<'a> Links<'a> {
    pub fn of(design: &'a Design) -> Self {
        let mut list = Vec::new();
        let mut first = vec![0];
        for (from, at) in design.members.iter().enumerate() {
            let found = design
                .inherited(design.member(*at).value())
                .get(|keys| &keys.supported_by);
            for name in found.value().into_iter().flatten() {
                let to = design.marks.get(&name.value);
                let to = to.and_then(|at| design.members.binary_search(at).ok());
                list.extend(to.map(|to| Link {
                    from,
                    to,
                    name,
                    origin: found.origin,
                }));
            }
            first.push(list.len());
        }
        Self { design, list, first }
    }

    pub fn all(&self) -> &[Link<'a>] {
        &self.list
    }

    /// What carries a member.
    pub fn under(&self, member: usize) -> &[Link<'a>] {
        &self.list[self.first[member]..self.first[member + 1]]
    }

    /// How many members there are.
    pub fn members(&self) -> usize {
        self.first.len() - 1
    }

    pub fn at(&self, member: usize) -> MemberAt {
        self.design.members[member]
    }

    pub fn mark(&self, member: usize) -> &'a str {
        let mark = &self.design.member(self.at(member)).value().mark;
        mark.value().map_or("this member", String::as_str)
    }

    /// A finding at the mark of what carries the member. Where the member inherits that, it stands at the member's own
    /// mark, and a note points at the group or the defaults.
    pub fn finding(&self, link: Link<'_>, declaration: &'static Declaration, message: String) -> Finding {
        let at = self.at(link.from);
        let item = self.design.member(at);
        let member = item.value();
        let own = link.origin == Origin::Member;
        let span = if own {
            link.name.span
        } else {
            member.mark.span().unwrap_or(member.extent.0)
        };
        let place = Place {
            path: Arc::clone(&self.design.files[at.file].path),
            span: item.place(span),
        };
        let mut finding = Finding::new(declaration, place, message);
        finding.member = Some(at);
        finding.mark = member.mark.value().cloned();
        finding.key = Some("supported by".to_owned());
        finding.notes.extend(self.inherited(link));
        finding
    }

    fn inherited(&self, link: Link<'_>) -> Option<Note> {
        let mark = self.mark(link.from);
        let (by, file, span) = match link.origin {
            Origin::Group => {
                let member = self.design.member(self.at(link.from)).value();
                let group = self.design.inherited(member).get(|keys| &keys.group).value()?;
                let (file, item) = self.design.group(group)?;
                (format!("the group `{group}` gives"), file, item.place(link.name.span))
            }
            Origin::Defaults => ("the defaults give".to_owned(), 0, link.name.span),
            Origin::Member | Origin::BuiltIn => return None,
        };
        Some(Note {
            text: format!("{by} {mark} its `supported by`"),
            place: Some(Place {
                path: Arc::clone(&self.design.files[file].path),
                span,
            }),
        })
    }
}
