//! What may be written at a cursor: keys, designations, names and words, as one types them.
//!
//! [`scan`] tells from the half-typed text where the cursor stands, the table of keys what fits there.

mod findings;
mod item;
mod keys;
mod names;
mod place;
mod products;
mod scan;
mod sections;
mod values;

pub use item::{Completion, CompletionKind, Completions};

use crate::analysis::design::MemberAt;
use crate::analysis::source::FileKind;
use crate::design::given::Given;
use crate::design::inherit::Inherited;
use crate::design::keys::protection::PROTECTION_FILE;
use crate::design::keys::steelwork::STEELWORK;
use crate::design::keys::{Key, Kind};
use crate::editor::view::{View, Within};
use crate::findings::finding::Finding;
use crate::syntax::item::Form;
use crate::text::Span;

use self::item::Writer;
use self::place::{Place, Slot, Stated, Step, fitting};
use self::scan::{Ground, Start};

/// The most items that are answered.
pub const MOST: usize = 100;

/// How far the beginning of what surrounds a cursor is looked for where no piece of the file holds it, in bytes.
const FAR: usize = 64 * 1024;

/// How far behind the cursor it is read there, in bytes: the next line that holds something tells what would take it in.
const NEAR: usize = 4 * 1024;

/// What may be written at an offset of a file. `findings` may be those of the whole design; those of the member at the
/// cursor come first where a departure names one.
#[must_use]
pub fn completion(view: &View<'_>, findings: &[Finding], offset: u32) -> Completions {
    let within = within(view, offset);
    let found = locate(view, within, offset).and_then(|place| {
        let here = Here::new(view, within, findings, place, offset)?;
        Some(here.complete())
    });
    let mut found = found.unwrap_or_default();
    if found.items.len() > MOST {
        found.items.truncate(MOST);
        found.incomplete = true;
    }
    for (rank, item) in found.items.iter_mut().enumerate() {
        item.sort = format!("{rank:03}");
    }
    found
}

/// What an offset lies in. The start of a line belongs to what begins there, not to what ends before it.
fn within(view: &View<'_>, offset: u32) -> Within {
    let within = view.within(offset);
    let text = view.text();
    let at = offset as usize;
    let behind = view.piece(within).is_some_and(|piece| piece.span.end == offset)
        && at.checked_sub(1).and_then(|at| text.as_bytes().get(at)) == Some(&b'\n')
        && at < text.len();
    if !behind {
        return within;
    }
    let entries = &view.source().entries;
    let next = entries.iter().position(|piece| piece.span.start == offset);
    next.map_or(Within::Nothing, Within::Entry)
}

/// Where the cursor stands.
fn locate(view: &View<'_>, within: Within, offset: u32) -> Option<Place> {
    let text = view.text();
    let offset = offset as usize;
    if !text.is_char_boundary(offset) {
        return None;
    }
    let (region, start) = match view.piece(within) {
        Some(piece) => {
            let from = piece.span.start as usize;
            let rest = text.get(from..)?;
            let begins_line = from == 0 || text.as_bytes().get(from - 1) == Some(&b'\n');
            let key = match within {
                Within::Member(_) => Some("members"),
                Within::Group(_) => Some("groups"),
                Within::Product(_) => Some("products"),
                Within::Entry(_) | Within::Nothing => None,
            };
            let block = begins_line && (piece.form != Form::Listed || rest.trim_start().starts_with('-'));
            let start = match (block, piece.form, key) {
                (true, _, key) => Start::Block(key),
                (false, Form::Listed, Some(key)) => Start::Brackets(key),
                (false, _, key) => Start::Braces(key),
            };
            (piece.span, start)
        }
        None => (around(text, offset)?, Start::Block(None)),
    };
    scan::place(Ground {
        text: region.slice(text),
        cursor: offset.checked_sub(region.start as usize)?,
        base: region.start,
        start,
        top: top_level(view),
    })
}

/// The lines from the last one before an offset that is not indented, to some behind the offset's own line.
fn around(text: &str, offset: usize) -> Option<Span> {
    let own = text.get(..offset)?.rfind('\n').map_or(0, |at| at + 1);
    let enough = (offset + NEAR).min(text.len());
    let end = memchr::memchr(b'\n', &text.as_bytes()[enough..]).map_or(text.len(), |at| enough + at + 1);
    let mut from = own;
    while from > 0 && own - from < FAR {
        let before = text[..from - 1].rfind('\n').map_or(0, |at| at + 1);
        from = before;
        if !text[before..].starts_with([' ', '#', '\r', '\n', '\t']) {
            break;
        }
    }
    Some(Span::new(from, end))
}

/// The keys that the file states at its top level.
fn top_level(view: &View<'_>) -> Vec<Stated> {
    let source = view.source();
    let entries = source.entries.iter().map(|piece| {
        let content = piece.span.slice(view.text());
        let key = content.split([':', '\n']).next().unwrap_or("");
        Stated {
            name: key.trim_matches([' ', '"', '\'', '\r', '\u{feff}']).to_owned(),
            value: String::new(),
            span: Span::new(
                piece.span.start as usize,
                piece.span.start as usize + key.trim_end().len(),
            ),
        }
    });
    let lists = [
        ("members", !source.members.is_empty()),
        ("groups", !source.groups.is_empty()),
        ("products", !source.products.is_empty()),
    ];
    let lists = lists.iter().filter(|(_, there)| *there).map(|(name, _)| Stated {
        name: (*name).to_owned(),
        value: String::new(),
        span: Span::default(),
    });
    entries.chain(lists).collect()
}

/// The cursor in its design.
struct Here<'a> {
    view: &'a View<'a>,
    findings: &'a [Finding],
    place: Place,
    writer: Writer,
    /// What may stand here.
    kinds: Vec<Kind>,
    /// The key that the cursor is at the value of.
    key: Option<&'static Key>,
    /// The member that the cursor is in.
    member: Option<MemberAt>,
    within: Within,
}

impl<'a> Here<'a> {
    fn new(view: &'a View<'a>, within: Within, findings: &'a [Finding], mut place: Place, offset: u32) -> Option<Self> {
        let root = match view.source().kind {
            FileKind::Steelwork => STEELWORK,
            FileKind::Protection => PROTECTION_FILE,
        };
        let (kinds, key) = fitting(root, &place.path);
        split_key(view.text(), &kinds, &mut place, offset);
        let typed = view.text().get(place.replaces.start as usize..offset as usize)?;
        let in_members = place.section() == Some("members") && place.path.len() > 1;
        let member = match within {
            Within::Member(index) if in_members => Some(MemberAt { file: view.file, index }),
            _ => None,
        };
        Some(Self {
            view,
            findings,
            writer: Writer::new(&place, typed),
            place,
            kinds,
            key,
            member,
            within,
        })
    }

    fn complete(&self) -> Completions {
        let mut found = Completions::default();
        if !matches!(self.place.slot, Slot::Key { .. }) {
            self.values(&mut found);
        }
        if self.place.slot != Slot::Value {
            self.keys(&mut found);
        }
        found
    }

    /// The keys that hold where the cursor stands: of a member with what it inherits, of a group with the defaults.
    fn inherited(&self) -> Option<Inherited<'a>> {
        let design = self.view.design;
        let defaults = &design.head().defaults;
        if let Some(at) = self.member {
            return Some(design.inherited(design.member(at).value()));
        }
        match (self.place.section()?, self.within) {
            ("groups", Within::Group(index)) => Some(Inherited {
                member: &self.view.source().groups.get(index)?.value().keys,
                group: None,
                defaults: Some(defaults),
            }),
            ("defaults", _) => Some(Inherited {
                member: defaults,
                group: None,
                defaults: None,
            }),
            _ => None,
        }
    }

    /// The member's mark, for messages.
    fn mark(&self) -> &'a str {
        let mark = self
            .member
            .and_then(|at| self.view.design.member(at).value().mark.value());
        mark.map_or("this member", String::as_str)
    }
}

/// Where a word that is being typed runs into the key behind it, only the word is replaced, and a comma parts them.
fn split_key(text: &str, kinds: &[Kind], place: &mut Place, offset: u32) {
    if place.slot != (Slot::Key { colon: true }) || !place.flow {
        return;
    }
    let rest = Span {
        start: offset,
        end: place.replaces.end,
    };
    let rest = rest.slice(text);
    let known = kinds
        .iter()
        .filter_map(Kind::map)
        .any(|table| Key::find(table, rest.trim()).is_some());
    if known && rest.starts_with(' ') {
        place.slot = Slot::Key { colon: false };
        place.replaces.end = offset;
        place.after = ",";
    }
}

/// The value of a key, where it is there and can be read.
fn value<'a, T>(
    keys: Option<&Inherited<'a>>,
    field: impl Fn(&'a crate::design::model::member::MemberKeys) -> &'a Given<T>,
) -> Option<&'a T> {
    keys.and_then(|keys| keys.get(field).value())
}

/// Whether a way leads to a member, or into one.
fn is_member(path: &[Step]) -> bool {
    matches!(path, [Step::Key(key), Step::Entry, ..] if key == "members")
}
