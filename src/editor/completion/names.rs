//! Names that a design gives: groups, products, fires and marks; and those of findings.

use crate::analysis::design::MemberAt;
use crate::design::decode::fire::BUILT_IN;
use crate::design::keys::NameOf;
use crate::design::model::member::{MemberKeys, Period, SectionChoice};
use crate::editor::completion::item::{CompletionKind, Completions, Writer};
use crate::editor::completion::{Here, MOST};
use crate::units::significant;

impl Here<'_> {
    pub(super) fn names(&self, of: NameOf, writer: &Writer, found: &mut Completions) {
        match of {
            NameOf::Group => self.groups(writer, found),
            NameOf::Product => self.products(writer, found),
            NameOf::Fire => self.fires(writer, found),
            NameOf::Finding => self.findings(writer, found),
            // The mark of a member is its author's to choose.
            NameOf::Mark if self.key.is_some_and(|key| key.name == "mark") => {}
            NameOf::Mark => self.marks(writer, found),
            // Files are not looked for on the disk here.
            NameOf::File => {}
        }
    }

    fn groups(&self, writer: &Writer, found: &mut Completions) {
        let mut groups: Vec<_> = self.view.design.groups.iter().collect();
        groups.sort_by_key(|(_, place)| **place);
        for (name, (file, index)) in groups {
            let group = self.view.design.files[*file].groups[*index].value();
            let item = writer.name(name, CompletionKind::Group);
            found.items.push(item.with(summary(&group.keys), ""));
        }
    }

    fn fires(&self, writer: &Writer, found: &mut Completions) {
        let design = self.view.design;
        let mut own: Vec<&String> = design
            .fires
            .keys()
            .filter(|name| !BUILT_IN.iter().any(|(built_in, _)| built_in == name))
            .collect();
        own.sort_unstable();
        let built_in = BUILT_IN.iter().map(|(name, _)| (*name, "built in"));
        let own = own.into_iter().map(|name| (name.as_str(), "of this design"));
        for (name, detail) in own.chain(built_in).filter(|(name, _)| !self.is_beside(name)) {
            found
                .items
                .push(writer.name(name, CompletionKind::Fire).with(detail, ""));
        }
    }

    /// The marks of the design that are not named yet; one pass over its members.
    fn marks(&self, writer: &Writer, found: &mut Completions) {
        let design = self.view.design;
        let mut fitting: [Vec<(&str, MemberAt)>; 2] = [Vec::new(), Vec::new()];
        for at in design.members.iter().copied() {
            let Some(mark) = design.member(at).value().mark.value() else {
                continue;
            };
            if let Some(rank) = writer.fits(mark).filter(|_| self.member != Some(at)) {
                let fitting = &mut fitting[usize::from(rank)];
                // One more than is answered tells that there are more.
                if fitting.len() <= MOST && !self.is_beside(mark) {
                    fitting.push((mark, at));
                }
            }
        }
        for (mark, at) in fitting.into_iter().flatten().take(MOST + 1) {
            let keys = design.inherited(design.member(at).value());
            let role = keys.get(|keys| &keys.role).value().map(|role| role.word());
            let section = keys.get(|keys| &keys.section).value().and_then(designation);
            let detail: Vec<&str> = role.into_iter().chain(section).collect();
            let item = writer.name(mark, CompletionKind::Member);
            found.items.push(item.with(detail.join(", "), ""));
        }
    }
}

fn designation(choice: &SectionChoice) -> Option<&str> {
    match choice {
        SectionChoice::Designation(text) => Some(text),
        _ => None,
    }
}

/// What a group says, in few words.
fn summary(keys: &MemberKeys) -> String {
    let mut words = Vec::new();
    words.extend(keys.role.value().map(|role| role.word().to_owned()));
    words.extend(keys.section.value().and_then(designation).map(str::to_owned));
    if let Some(Period::Of(period)) = keys.period.value() {
        words.push(format!("{} min", significant(period.min(), 1)));
    }
    let product = keys.protection.value().and_then(|stated| stated.product.as_ref());
    words.extend(product.map(|name| name.value.clone()));
    words.join(", ")
}
