//! Findings that a departure may name.

use crate::editor::completion::Here;
use crate::editor::completion::item::{CompletionKind, Completions, Writer};
use crate::findings::reading::is_declared_slip;
use crate::findings::registry::{Declaration, REGISTRY};

impl Here<'_> {
    /// Findings of this member first, with what they say; then all others.
    pub(super) fn findings(&self, writer: &Writer, found: &mut Completions) {
        let agreed = |declaration: &Declaration| {
            let member = self.member.map(|at| self.view.design.member(at).value());
            let own = self.place.replaces;
            let departures = member.map_or(&[][..], |member| &member.departures);
            let base = self.member.map_or(0, |at| self.view.design.member(at).base());
            departures.iter().any(|departure| {
                let here = departure.from.span.shift(base);
                departure.from.value == declaration.name && !(here.start <= own.end && own.start <= here.end)
            })
        };
        let mut open: Vec<(&'static Declaration, &str)> = Vec::new();
        let own = self
            .findings
            .iter()
            .filter(|finding| finding.member.is_some() && finding.member == self.member);
        for finding in own {
            let known = open.iter().any(|(known, _)| std::ptr::eq(*known, finding.declaration));
            if !known && may_depart(finding.declaration) {
                open.push((finding.declaration, &finding.message));
            }
        }
        open.sort_by_key(|(declaration, _)| declaration.severity);
        let rest = REGISTRY.iter().copied().filter(|declaration| {
            may_depart(declaration) && !open.iter().any(|(known, _)| std::ptr::eq(*known, *declaration))
        });
        let rest: Vec<_> = rest.map(|declaration| (declaration, "")).collect();
        for (declaration, message) in open.into_iter().chain(rest) {
            if agreed(declaration) {
                continue;
            }
            let detail = if message.is_empty() {
                declaration.severity.word().to_owned()
            } else {
                format!("{}, found here", declaration.severity.word())
            };
            let said = if message.is_empty() {
                String::new()
            } else {
                format!("{message}\n\n")
            };
            let documentation = format!("{said}{}\n\n{}", declaration.summary, declaration.clause);
            let item = writer.text(declaration.name, CompletionKind::Finding, declaration.name);
            found.items.push(item.with(detail, documentation));
        }
    }
}

/// Whether a departure may be agreed on: not from slips of the file, nor from what is wrong with departures.
fn may_depart(declaration: &Declaration) -> bool {
    !is_declared_slip(declaration) && !declaration.name.starts_with("departure-")
}
