//! Values that fit at a cursor.

use crate::design::keys::member::{ENVIRONMENTS, MEMBER};
use crate::design::keys::section::ShapeKeys;
use crate::design::keys::steelwork::METHODS;
use crate::design::keys::{Key, Kind};
use crate::editor::completion::Here;
use crate::editor::completion::item::{CompletionKind, Completions, Writer, escaped, scalar};
use crate::editor::completion::keys::{form, is_table};
use crate::editor::completion::place::Slot;
use crate::editor::write::line_break;

/// Periods that regulations ask for, in min.
const PERIODS: &[&str] = &["15", "30", "45", "60", "90", "120", "180", "240"];

impl Here<'_> {
    pub(super) fn values(&self, found: &mut Completions) {
        for kind in &self.kinds {
            self.of_kind(kind, &self.writer, found);
        }
    }

    fn of_kind(&self, kind: &Kind, writer: &Writer, found: &mut Completions) {
        match kind {
            Kind::OneOf(kinds) => kinds.iter().for_each(|kind| self.of_kind(kind, writer, found)),
            Kind::Choice(words) => found
                .items
                .extend(words.iter().filter(|word| !self.is_beside(word)).map(|word| {
                    let item = writer.name(word, CompletionKind::Word);
                    let (detail, documentation) = self.about(word);
                    item.with(detail, documentation)
                })),
            Kind::YesNo => {
                let words = ["yes", "no"];
                let doc = self.key.map_or("", |key| key.doc);
                found
                    .items
                    .extend(words.map(|word| writer.text(word, CompletionKind::Word, word).with("", doc)));
            }
            Kind::Name(of) => self.names(*of, writer, found),
            Kind::Designation => self.sections(writer, found),
            Kind::Period => found.items.extend(
                PERIODS
                    .iter()
                    .map(|period| writer.text(period, CompletionKind::Value, period).with("min", "")),
            ),
            Kind::Whole(least, most) if most - least < 5 => {
                let numbers = (*least..=*most).map(|number| number.to_string());
                found
                    .items
                    .extend(numbers.map(|number| writer.text(&number, CompletionKind::Value, &number)));
            }
            Kind::Text if self.key.is_some_and(|key| key.name == "method") => found
                .items
                .extend(METHODS.iter().map(|method| writer.name(method, CompletionKind::Word))),
            Kind::List(entry) => self.entry(entry, writer, found),
            Kind::Map(table) => self.mapping(table, writer, "", found),
            _ => {}
        }
    }

    /// An entry of a list that has to be begun: by a dash on a line of its own, by nothing behind its key.
    fn entry(&self, entry: &Kind, writer: &Writer, found: &mut Completions) {
        match (self.place.slot, entry) {
            (Slot::Either, entry) => self.of_kind(entry, &writer.listed(), found),
            (_, Kind::Map(table)) => self.mapping(table, writer, "[]", found),
            (_, entry) => self.of_kind(entry, writer, found),
        }
    }

    /// A whole mapping to fill in.
    fn mapping(&self, table: &'static [Key], writer: &Writer, brackets: &str, found: &mut Completions) {
        if self.place.heads {
            return;
        }
        let member = is_table(table, MEMBER) && self.place.section() == Some("members");
        let (open, close) = brackets.split_at(brackets.len() / 2);
        let (label, text) = if member {
            ("a new member".to_owned(), self.new_member(open.is_empty()))
        } else {
            let text = form(table);
            let first = table.first().map_or("", |key| key.name);
            (format!("{open}{{ {first}: .. }}{close}"), text)
        };
        let mut item = writer.snippet(&label, CompletionKind::Form, &format!("{open}{text}{close}"));
        if member {
            // Whatever is being typed there, a member it will be.
            item.filter = writer.filter("");
            item.detail = "mark, section and what neither group nor defaults may say".to_owned();
        }
        found.items.push(item);
    }

    /// A member in the style of the one before it.
    fn new_member(&self, may_block: bool) -> String {
        let design = self.view.design;
        let source = self.view.source();
        let cursor = self.place.replaces.start;
        let before = source.members.partition_point(|item| item.base() < cursor);
        let named = |item: &&crate::analysis::source::Item<_>| {
            let member: &crate::design::model::member::Member = item.value();
            member.mark.value().is_some()
        };
        let last = source.members[..before].iter().rev().take(3).find(named);
        let text = self.view.text();
        let braces = last.is_some_and(|item| {
            let content = item.piece.span.slice(text).trim_start();
            content.trim_start_matches(['-', ' ']).starts_with('{')
        });
        let line = text[..cursor as usize].rfind('\n').map_or(0, |at| at + 1);
        let lead = text[line..cursor as usize].trim_start_matches(' ');
        let mark = last
            .and_then(|item| item.value().mark.value())
            .and_then(|mark| self.next_mark(mark));
        let mut keys = vec![("mark", mark.map(|mark| escaped(&scalar(&mark))))];
        if design.groups.is_empty() {
            let defaults = &design.head().defaults;
            let absent = [
                ("role", defaults.role.is_absent()),
                ("steel", defaults.steel.is_absent()),
                ("period", defaults.period.is_absent()),
            ];
            keys.extend(
                absent
                    .into_iter()
                    .filter(|(_, absent)| *absent)
                    .map(|(name, _)| (name, None)),
            );
        } else {
            keys.push(("group", None));
        }
        keys.push(("section", None));
        let keys = keys.into_iter().enumerate().map(|(n, (key, value))| match value {
            Some(value) => format!("{key}: ${{{}:{value}}}", n + 1),
            None => format!("{key}: ${}", n + 1),
        });
        let keys: Vec<String> = keys.collect();
        if may_block && !braces && !self.place.flow && matches!(lead, "" | "- ") {
            keys.join(&format!("{}  ", line_break(text)))
        } else {
            format!("{{ {} }}", keys.join(", "))
        }
    }

    /// The next mark that is free, by the number that a mark ends with.
    fn next_mark(&self, mark: &str) -> Option<String> {
        let stem = mark.trim_end_matches(|c: char| c.is_ascii_digit());
        let number: u32 = mark[stem.len()..].parse().ok()?;
        let width = mark.len() - stem.len();
        (number.saturating_add(1)..number.saturating_add(1000))
            .map(|number| format!("{stem}{number:0width$}"))
            .find(|mark| !self.view.design.marks.contains_key(mark))
    }

    /// Whether an entry stands in the same list already.
    pub(super) fn is_beside(&self, name: &str) -> bool {
        let list = matches!(self.place.path.last(), Some(super::Step::Entry));
        list && self.place.beside.iter().any(|stated| stated.name == name)
    }

    /// What a word means.
    fn about(&self, word: &str) -> (String, String) {
        let doc = self.key.map_or("", |key| key.doc).to_owned();
        if self.key.is_some_and(|key| key.name == "shape") && self.place.value_beside("product").is_none() {
            let section =
                matches!(&*self.place.path, [.., super::Step::Key(above), super::Step::Key(_)] if above == "section");
            if let Some(shape) = ShapeKeys::find(word).filter(|_| section) {
                return (shape.wants.join(", "), shape.doc.to_owned());
            }
        }
        // The letters come first, then the words for them in the same order.
        let place = ENVIRONMENTS.iter().position(|known| *known == word);
        match (self.key.map(|key| key.name), place) {
            (Some("environment"), Some(at)) if at < 4 => (ENVIRONMENTS[at + 4].to_owned(), doc),
            (Some("environment"), Some(at)) => (ENVIRONMENTS[at - 4].to_owned(), doc),
            _ => (String::new(), doc),
        }
    }
}
