//! Keys that fit at a cursor.

use crate::design::keys::member::{DEPARTURE, LOADING, MEMBER};
use crate::design::keys::section::{SECTION, ShapeKeys};
use crate::design::keys::steelwork::{HEAD_ONLY, STEELWORK};
use crate::design::keys::{Key, Kind, Measure};
use crate::editor::completion::item::{Completion, CompletionKind, Completions};
use crate::editor::completion::place::Slot;
use crate::editor::completion::{Here, is_member};
use crate::editor::write::line_break;

/// Ways to state a load, which exclude each other; what is in none of them states effects or refines them.
const WAYS: &[&[&str]] = &[
    &["utilisation"],
    &[
        "ambient utilisation",
        "reduction",
        "permanent",
        "variable",
        "combination factor",
    ],
    &["load ratio"],
    &["axial", "bending", "bending minor", "shear"],
];

impl Here<'_> {
    pub(super) fn keys(&self, found: &mut Completions) {
        // At the dashes of a list a whole entry is offered, not one of its keys.
        if self.place.before == "- " {
            return;
        }
        for kind in &self.kinds {
            match kind {
                Kind::Map(table) => self.keys_of(table, found),
                // A single entry stands for a list of one.
                Kind::List(entry) if self.place.slot != Slot::Either => {
                    if let Some(table) = entry.map() {
                        self.keys_of(table, found);
                    }
                }
                Kind::Named(kind) => self.new_name(kind, found),
                _ => {}
            }
        }
    }

    fn keys_of(&self, table: &'static [Key], found: &mut Completions) {
        let mut keys: Vec<&'static Key> = table.iter().filter(|key| self.takes(table, key)).collect();
        let wanted = |key: &Key| key.required && !(is_table(table, MEMBER) && self.is_inherited(key.name));
        keys.sort_by_key(|key| !wanted(key));
        found.items.extend(keys.into_iter().map(|key| self.key(key)));
    }

    /// Whether a key fits, what stands beside it given.
    fn takes(&self, table: &'static [Key], key: &Key) -> bool {
        let beside = |name: &str| self.place.beside.iter().any(|stated| stated.name == name);
        if beside(key.name) {
            return false;
        }
        if is_table(table, STEELWORK) {
            return !(beside("part of") && HEAD_ONLY.contains(&key.name));
        }
        if is_table(table, MEMBER) {
            let group = self.place.section() == Some("groups");
            return is_member(&self.place.path)
                || !(matches!(key.name, "mark" | "departures") || group && key.name == "group");
        }
        if is_table(table, SECTION) {
            let shape = self.place.value_beside("shape").and_then(ShapeKeys::find);
            return shape.is_none_or(|shape| shape.takes(key.name));
        }
        if is_table(table, LOADING) {
            let way = WAYS.iter().find(|way| way.iter().any(|name| beside(name)));
            let own = WAYS.iter().find(|way| way.contains(&key.name));
            return way.is_none() || own.is_none() || way == own;
        }
        true
    }

    /// Whether a member need not state a key, for its group or the defaults do.
    fn is_inherited(&self, name: &str) -> bool {
        let Some(keys) = self.inherited() else { return false };
        let above = [keys.group, keys.defaults];
        above.into_iter().flatten().any(|keys| match name {
            "role" => !keys.role.is_absent(),
            "section" => !keys.section.is_absent(),
            "steel" => !keys.steel.is_absent(),
            "period" => !keys.period.is_absent(),
            _ => false,
        })
    }

    fn key(&self, key: &'static Key) -> Completion {
        let value = self.value_form(key);
        let item = match self.place.slot {
            Slot::Key { colon: true } => self.writer.text(key.name, CompletionKind::Key, key.name),
            _ if self.place.heads => self
                .writer
                .text(key.name, CompletionKind::Key, &format!("{}:", key.name)),
            _ => self
                .writer
                .snippet(key.name, CompletionKind::Key, &format!("{}:{value}", key.name)),
        };
        let mut documentation = format!("{}\n\n{}", key.doc, sentence(&key.kind.wanted()));
        if let Some(bounds) = key.kind.measure().and_then(bounds) {
            documentation.push_str(&bounds);
        }
        if key.required {
            documentation.push_str("\n\nWanted.");
        }
        item.with(short(&key.kind), documentation)
    }

    /// What follows the colon of a key, with places to fill in.
    fn value_form(&self, key: &'static Key) -> String {
        let block = !self.place.flow && self.place.path.is_empty();
        let lines = line_break(self.view.text());
        match (&key.kind, key.name) {
            (Kind::List(Kind::Map(_)), _) if block => format!("{lines}  - mark: $1"),
            (Kind::Named(_), _) if block => format!("{lines}  ${{1:name}}: {{ $2 }}"),
            (Kind::Map(_), _) if block => format!("{lines}  $1"),
            (_, "period") if !matches!(key.kind, Kind::Tuple(..)) => " ${1:60}".to_owned(),
            (Kind::Whole(least, _), _) => format!(" ${{1:{least}}}"),
            (Kind::Map(table), _) => format!(" {}", form(table)),
            (Kind::List(Kind::Map(table)), _) => format!(" [{}]", form(table)),
            (Kind::List(_) | Kind::Tuple(..), _) => " [$1]".to_owned(),
            (Kind::Named(_) | Kind::Numbered(..), _) => " { $1 }".to_owned(),
            _ => " $1".to_owned(),
        }
    }

    /// A new group, product or fire.
    fn new_name(&self, kind: &Kind, found: &mut Completions) {
        if self.place.slot == (Slot::Key { colon: true }) || self.place.heads {
            return;
        }
        let (Some(table), Some(what)) = (kind.map(), self.place.key()) else {
            return;
        };
        let what = what.trim_end_matches('s');
        let text = format!("${{1:name}}: {}", form(table).replace("$2", "$3").replace("$1", "$2"));
        let mut item = self
            .writer
            .snippet(&format!("a new {what}"), CompletionKind::Form, &text);
        // Whatever its name will be.
        item.filter = self.writer.filter("");
        found.items.push(item);
    }
}

/// A mapping in braces with the keys that it can't be without, or the first that it may have.
pub(super) fn form(table: &'static [Key]) -> String {
    let departure = is_table(table, DEPARTURE);
    let mut keys: Vec<&Key> = table
        .iter()
        .filter(|key| key.required || departure && key.name == "because")
        .collect();
    if is_table(table, MEMBER) || keys.is_empty() {
        keys.clear();
        return "{ $1 }".to_owned();
    }
    let mut place = 0;
    let keys = keys.into_iter().map(|key| {
        place += 1;
        let value = match &key.kind {
            Kind::Text => format!("\"${place}\""),
            Kind::YesNo => format!("${{{place}:yes}}"),
            Kind::List(_) => format!("[${place}]"),
            _ => format!("${place}"),
        };
        format!("{}: {value}", key.name)
    });
    format!("{{ {} }}", keys.collect::<Vec<_>>().join(", "))
}

/// What a value is, in few words.
fn short(kind: &Kind) -> String {
    match kind {
        Kind::Choice(words) if words.len() > 3 => format!("{}, {}, ..", words[0], words[1]),
        Kind::OneOf(kinds) => {
            let measure = kind.measure().filter(|measure| !measure.unit.is_empty());
            match (measure, kinds.first()) {
                (Some(measure), _) => format!("{} in {}", measure.noun, measure.unit),
                (None, Some(first)) => short(first),
                (None, None) => String::new(),
            }
        }
        Kind::Period => "a period in min".to_owned(),
        Kind::Map(_) => "a mapping".to_owned(),
        Kind::List(Kind::Map(_)) => "a list of mappings".to_owned(),
        other => other.wanted(),
    }
}

fn bounds(measure: Measure) -> Option<String> {
    let unit = if measure.unit.is_empty() {
        String::new()
    } else {
        format!(" {}", measure.unit)
    };
    (measure.max < 1e5).then(|| format!(" From {} to {}{unit}.", measure.min, measure.max))
}

fn sentence(text: &str) -> String {
    let mut chars = text.chars();
    let first = chars.next().map(char::to_uppercase);
    let rest = chars.as_str();
    first.map_or_else(String::new, |first| format!("{}{rest}.", first.collect::<String>()))
}

/// Whether a table is that of certain keys.
pub(super) fn is_table(table: &[Key], other: &[Key]) -> bool {
    table.len() == other.len() && table.iter().zip(other).all(|(a, b)| a.name == b.name)
}
