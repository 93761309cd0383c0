//! Reading a file: split, parse, decode. Items are read in parallel, each by its own text.

use std::path::PathBuf;
use std::sync::Arc;

use rayon::prelude::*;
use rustc_hash::FxHashMap;

use crate::analysis::source::{Decoded, FileKind, Item, SourceFile};
use crate::design::decode::head;
use crate::design::decode::library;
use crate::design::decode::member::{self, Owner};
use crate::design::decode::reader::Reader;
use crate::design::keys::Key;
use crate::design::keys::protection::PROTECTION_FILE;
use crate::design::keys::steelwork::STEELWORK;
use crate::design::model::head::{Group, Head};
use crate::design::model::library::NamedProduct;
use crate::design::model::member::{Extent, Member, MemberKeys};
use crate::design::slip::{Slip, SlipKind};
use crate::syntax::outline::{ListSection, Piece, TopEntry, outline};
use crate::syntax::{Entry, Node, Scalar, Style, Tree, Value};
use crate::text::{Span, Spanned};

/// What the name of a file says of its kind: `*.protection.yaml` or `.yml`, `*.steelwork.yaml` or `.yml`.
#[must_use]
pub fn kind_by_name(path: &std::path::Path) -> Option<FileKind> {
    let name = path.file_name()?.to_str()?.to_ascii_lowercase();
    let stem = name.strip_suffix(".yaml").or_else(|| name.strip_suffix(".yml"))?;
    if stem.ends_with(".steelwork") {
        Some(FileKind::Steelwork)
    } else if stem.ends_with(".protection") {
        Some(FileKind::Protection)
    } else {
        None
    }
}

/// Reads a file's text. The kind follows from the name, or else from the first key that tells.
#[must_use]
pub fn read(path: Arc<PathBuf>, text: Arc<str>) -> SourceFile {
    read_beside(path, text, None)
}

/// Reads a file's text, taking over what was read of equal pieces of an older text.
pub(super) fn read_beside(path: Arc<PathBuf>, text: Arc<str>, older: Option<&SourceFile>) -> SourceFile {
    let outline = outline(&text);
    let known = Known {
        members: known(older, |file| &file.members),
        groups: known(older, |file| &file.groups),
        products: known(older, |file| &file.products),
    };
    let kind = kind_by_name(&path).unwrap_or_else(|| {
        let protection = outline.entries.iter().any(|entry| tells_protection(entry, &text));
        if protection {
            FileKind::Protection
        } else {
            FileKind::Steelwork
        }
    });
    let mut file = SourceFile {
        path,
        text: Arc::clone(&text),
        kind,
        entries: Vec::new(),
        head: Head::default(),
        groups: Vec::new(),
        members: Vec::new(),
        products: Vec::new(),
        slips: Vec::new(),
        errors: Vec::new(),
        steady: None,
    };
    let mut top = Top {
        file: &mut file,
        known,
        seen: Vec::new(),
        last_key: None,
    };
    top.file.head.doubtful = !outline.errors.is_empty();
    top.file.errors = outline.errors;
    if let Some(other) = outline.other {
        top.file.head.doubtful = true;
        let message = "a design file is a mapping of keys such as `steelwork: 1` and `members:`";
        let span = first_line(other.span, &text);
        top.file.slips.push(Slip::new(SlipKind::WrongKind, span, message));
    }
    for entry in &outline.entries {
        match entry {
            TopEntry::Head(piece) => top.piece(&text, piece),
            TopEntry::List(list) => top.list(&text, list),
        }
    }
    top.finish();
    if !outline.steady || file.kind != FileKind::Steelwork {
        file.steady = None;
    }
    file
}

/// Items of an older text by fingerprint.
type Older<'a, T> = FxHashMap<u64, (&'a str, &'a Item<T>)>;

/// What was read of an older text.
struct Known<'a> {
    members: Older<'a, Member>,
    groups: Older<'a, Group>,
    products: Older<'a, NamedProduct>,
}

fn known<'a, T>(older: Option<&'a SourceFile>, items: impl Fn(&'a SourceFile) -> &'a [Item<T>]) -> Older<'a, T> {
    let Some(file) = older else { return Older::default() };
    let known = |item: &'a Item<T>| {
        let text = item.piece.span.slice(&file.text);
        (item.piece.fingerprint(&file.text), (text, item))
    };
    items(file).iter().map(known).collect()
}

/// The item of a piece, read before or decoded now.
fn item_of<T>(
    text: &str,
    piece: &Piece,
    known: &Older<'_, T>,
    decode: impl FnOnce(Tree) -> Option<Decoded<T>>,
) -> Option<Item<T>> {
    let same = (!known.is_empty())
        .then(|| known.get(&piece.fingerprint(text)))
        .flatten();
    // A fingerprint may deceive; the text does not, where it alone tells the tree.
    if let Some((older, item)) = same
        && piece.is_plain()
        && item.piece.is_plain()
        && *older == piece.span.slice(text)
    {
        return Some(Item {
            piece: piece.clone(),
            decoded: Arc::clone(&item.decoded),
        });
    }
    Some(Item {
        piece: piece.clone(),
        decoded: Arc::new(decode(piece.tree(text))?),
    })
}

/// Whether a top-level entry is one of a protection file.
fn tells_protection(entry: &TopEntry, text: &str) -> bool {
    match entry {
        TopEntry::Head(piece) => piece.span.slice(text).trim_start().starts_with("protection:"),
        TopEntry::List(list) => list.key == "products",
    }
}

struct Top<'a> {
    file: &'a mut SourceFile,
    known: Known<'a>,
    seen: Vec<String>,
    last_key: Option<Span>,
}

impl Top<'_> {
    fn table(&self) -> &'static [Key] {
        match self.file.kind {
            FileKind::Steelwork => STEELWORK,
            FileKind::Protection => PROTECTION_FILE,
        }
    }

    /// Reads an entry in one piece.
    fn piece(&mut self, text: &str, piece: &Piece) {
        let base = piece.span.start;
        let tree = piece.tree(text);
        self.file.entries.push(piece.clone());
        self.file.head.doubtful |= tree.broken || !tree.errors.is_empty();
        self.file
            .errors
            .extend(tree.errors.into_iter().map(|error| error.shifted(base)));
        if let Some(Value::Mapping(entries)) = tree.root.map(|node| node.value) {
            entries.into_iter().for_each(|entry| self.entry(entry, base));
        }
    }

    /// Reads a list item by item.
    fn list(&mut self, text: &str, list: &ListSection) {
        if Key::find(self.table(), &list.key).is_none() {
            let key = scalar(&list.key, list.key_span);
            let value = Node {
                span: list.key_span,
                value: Value::Unreadable,
                through_alias: false,
            };
            return self.entry(Entry { key, value }, 0);
        }
        self.file.head.doubtful |= list.broken;
        if self.repeated(&list.key, list.key_span) {
            return;
        }
        match list.key.as_str() {
            "members" => {
                let read = |piece: &Piece| item_of(text, piece, &self.known.members, |tree| Some(member_item(tree)));
                self.file.members = list.items.par_iter().filter_map(read).collect();
                self.file.steady = Some(list.key_span);
            }
            "groups" => {
                let read = |piece: &Piece| item_of(text, piece, &self.known.groups, |tree| named_item(tree, group));
                self.file.groups = list.items.iter().filter_map(read).collect();
            }
            _ => {
                let read = |piece: &Piece| item_of(text, piece, &self.known.products, |tree| named_item(tree, product));
                self.file.products = list.items.iter().filter_map(read).collect();
            }
        }
    }

    fn repeated(&mut self, key: &str, span: Span) -> bool {
        self.last_key = Some(span);
        if self.seen.iter().any(|seen| seen == key) {
            self.file.head.doubtful = true;
            let message = format!("`{key}` stands twice at the top level; the first one holds");
            self.file.slips.push(Slip::new(SlipKind::NotYaml, span, message));
            return true;
        }
        self.seen.push(key.to_owned());
        false
    }

    /// Takes a top-level entry that was parsed whole; its spans count from `base`.
    fn entry(&mut self, entry: Entry, base: u32) {
        let mut reader = Reader::default();
        let name = match &entry.key.value {
            Value::Scalar(name) => name.text.clone(),
            _ => String::new(),
        };
        if let Some(key) = Key::find(self.table(), &name) {
            if self.repeated(&name, entry.key.span.shift(base)) {
                return;
            }
            match key.name {
                // Of the right form they are lists; what comes here is nothing or something else.
                "members" | "groups" | "products" => {
                    if entry.value.value != Value::Null {
                        reader.wrong_kind(&entry.value, key);
                    }
                }
                "protection" => {
                    reader.whole(&entry.value, key);
                    self.file.head.version_at = Some(entry.key.span.shift(base));
                }
                "note" => {}
                _ => {
                    let mut shifted = entry;
                    shift_entry(&mut shifted, base);
                    head::entry(&mut reader, &mut self.file.head, key, &shifted);
                    self.file.head.doubtful |= key.name == "basis" && !reader.slips.is_empty();
                    self.file.slips.append(&mut reader.slips);
                    return;
                }
            }
        } else {
            self.file.head.doubtful = true;
            let node = Node {
                span: entry.key.span,
                value: Value::Mapping(vec![entry]),
                through_alias: false,
            };
            let owner = match self.file.kind {
                FileKind::Steelwork => "a steelwork file",
                FileKind::Protection => "a protection file",
            };
            reader.entries(&node, self.table(), owner, |_, _, _| {});
        }
        self.file
            .slips
            .extend(reader.slips.into_iter().map(|slip| slip.shifted(base)));
    }

    /// What the file as a whole lacks.
    fn finish(&mut self) {
        let key = match self.file.kind {
            FileKind::Steelwork => "steelwork",
            FileKind::Protection => "protection",
        };
        if self.file.head.version_at.is_none() && self.file.errors.is_empty() {
            let span = Span::new(0, self.file.text.chars().next().map_or(0, char::len_utf8));
            let message = format!(
                "the file has no `{key}: 1`, which says what kind of file it is and which version of the format"
            );
            self.file
                .slips
                .push(Slip::new(SlipKind::MissingKey, span, message).at_key(key));
        }
    }
}

fn scalar(text: &str, span: Span) -> Node {
    Node {
        span,
        value: Value::Scalar(Scalar {
            text: text.to_owned(),
            style: Style::Plain,
        }),
        through_alias: false,
    }
}

fn first_line(span: Span, text: &str) -> Span {
    let line = span.slice(text).split(['\n', '\r']).next().unwrap_or("");
    Span {
        start: span.start,
        end: span.start + Span::new(0, line.len()).end,
    }
}

/// Decodes an entry of `members`.
#[must_use]
pub fn member_item(tree: Tree) -> Decoded<Member> {
    let mut reader = Reader::default();
    let value = match &tree.root {
        Some(node) => member::member(&mut reader, node, tree.broken),
        None => Member {
            broken: true,
            ..Member::default()
        },
    };
    Decoded {
        value,
        slips: reader.slips,
        errors: tree.errors,
    }
}

fn group(reader: &mut Reader, name: Spanned<String>, value: &Node, extent: Span) -> Group {
    let keys: MemberKeys = member::shared_keys(reader, value, Owner::Group);
    Group {
        name,
        keys,
        extent: Extent(extent),
    }
}

fn product(reader: &mut Reader, name: Spanned<String>, value: &Node, extent: Span) -> NamedProduct {
    library::product(reader, name, value, extent)
}

type DecodeNamed<T> = fn(&mut Reader, Spanned<String>, &Node, Span) -> T;

/// Decodes an item that is a mapping of one name.
fn named_item<T>(tree: Tree, decode: DecodeNamed<T>) -> Option<Decoded<T>> {
    let mut reader = Reader::default();
    let mut errors = tree.errors;
    let value = match tree.root.map(|node| node.value) {
        Some(Value::Mapping(mut entries)) if !entries.is_empty() => named(&mut reader, entries.swap_remove(0), decode),
        _ => None,
    };
    let value = match value {
        Some(value) => value,
        None if errors.is_empty() && reader.slips.is_empty() => return None,
        None => {
            // Nothing of the entry can be named, but what is wrong with it must not be lost.
            let name = Spanned {
                value: String::new(),
                span: Span::default(),
            };
            let null = Node {
                span: Span::default(),
                value: Value::Null,
                through_alias: true,
            };
            decode(&mut Reader::default(), name, &null, Span::default())
        }
    };
    errors.truncate(1);
    Some(Decoded {
        value,
        slips: reader.slips,
        errors,
    })
}

fn named<T>(reader: &mut Reader, entry: Entry, decode: DecodeNamed<T>) -> Option<T> {
    let Value::Scalar(name) = &entry.key.value else {
        reader.slip(
            SlipKind::WrongKind,
            &entry.key,
            "the name of a group or product is a word",
        );
        return None;
    };
    let extent = entry.key.span.join(entry.value.span);
    let name = Spanned {
        value: name.text.clone(),
        span: entry.key.span,
    };
    Some(decode(reader, name, &entry.value, extent))
}

fn shift_entry(entry: &mut Entry, by: u32) {
    if by > 0 {
        entry.key.shift(by);
        entry.value.shift(by);
    }
}
