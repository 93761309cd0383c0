//! No member carries the mark.

use crate::analysis::design::{Design, MemberAt};
use crate::design::keys::nearest;
use crate::design::model::member::MemberKeys;
use crate::findings::finding::{Finding, Fix, FixEdit, Place, Severity};
use crate::findings::insert;
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

/// Marks under `supported by` and `steadies` that no member carries: of members, and once of groups and defaults.
pub(super) fn check(design: &Design, linked: bool, out: &mut Vec<Finding>) {
    let mut search = Search { design, sought: 0, out };
    let members = if linked { design.members.as_slice() } else { &[] };
    for at in members {
        let item = design.member(*at);
        let mark = item.value().mark.value().map(String::as_str);
        let who = mark.unwrap_or("this member");
        search.block(&item.value().keys, who, Some((*at, mark)), at.file, item.base());
    }
    let mut groups: Vec<(usize, usize)> = design.groups.values().copied().collect();
    groups.sort_unstable();
    for (file, index) in groups {
        let item = &design.files[file].groups[index];
        let who = format!("each member of the group `{}`", item.value().name.value);
        search.block(&item.value().keys, &who, None, file, item.base());
    }
    search.block(&design.head().defaults, "each member by default", None, 0, 0);
}

struct Search<'a> {
    design: &'a Design,
    sought: usize,
    out: &'a mut Vec<Finding>,
}

impl Search<'_> {
    /// The strange marks of one block of keys, whose text begins at `base` in its file.
    fn block(
        &mut self,
        keys: &MemberKeys,
        who: &str,
        member: Option<(MemberAt, Option<&str>)>,
        file: usize,
        base: u32,
    ) {
        let file = &self.design.files[file];
        let mark = member.and_then(|(_, mark)| mark);
        let marks = &self.design.marks;
        let lists = [
            ("supported by", "is said to be supported by", &keys.supported_by),
            ("steadies", "is said to steady", &keys.steadies),
        ];
        for (key, does, given) in lists {
            for name in given.value().into_iter().flatten() {
                if marks.contains_key(&name.value) {
                    continue;
                }
                // In the order of the file, so that of equally near marks always the same is named.
                let known = |at: &MemberAt| self.design.member(*at).value().mark.value().map(String::as_str);
                let others = self.design.members.iter().filter_map(known);
                let others = others.filter(|known| mark.is_none_or(|mark| mark != *known));
                let near = (self.sought < SOUGHT).then(|| nearest(&name.value, others)).flatten();
                self.sought += 1;
                let perhaps = near.map_or_else(String::new, |near| format!("; perhaps {near}"));
                let message = format!("{who} {does} {}, but no member carries that mark{perhaps}", name.value);
                let place = Place {
                    path: Arc::clone(&file.path),
                    span: name.span.shift(base),
                };
                let near = near.filter(|_| !insert::through_alias(&file.text, place.span));
                let mut finding = Finding::new(&DECLARATION, place.clone(), message);
                finding.member = member.map(|(at, _)| at);
                finding.mark = mark.map(str::to_owned);
                finding.key = Some(key.to_owned());
                finding.fixes.extend(near.map(|near| Fix {
                    title: format!("write `{near}`"),
                    safe: false,
                    edits: vec![FixEdit {
                        place,
                        text: insert::scalar(near),
                    }],
                }));
                self.out.push(finding);
            }
        }
    }
}
