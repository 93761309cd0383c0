//! Reading one piece of a file, whose damage must not reach the others.

use crate::syntax::line::Lines;
use crate::syntax::parse::{Parsed, Surroundings, parse};
use crate::syntax::{ErrorKind, MAX_ERRORS, MAX_RECOVERED, Node, SyntaxError, Tree, Value, recover, words};
use crate::text::Span;

/// What a piece of a file is.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Form {
    /// An entry of a list, `- ..`; its tree's root is what stands behind the dash.
    Listed,
    /// An entry of a mapping one level down, `name: ..`; its tree's root is a mapping of that entry.
    Named,
    /// An entry of the top level; its tree's root is a mapping of that entry.
    Top,
}

impl Form {
    /// How many levels lie around the lists and mappings of the piece.
    pub(super) const fn depth(self) -> usize {
        match self {
            Self::Listed | Self::Named => 1,
            Self::Top => 0,
        }
    }

    /// Whether the parser read one block entry of this form to its end.
    fn fits(self, text: &str, parsed: &Parsed) -> bool {
        // An anchor or tag may stand before the entry, but on its line.
        let first = Lines::new(text, 0, text.len()).next();
        let begins = |root: &Node| first.is_some_and(|line| (root.span.start as usize) < line.to);
        let one = match parsed.root.as_ref().map(|root| &root.value) {
            Some(Value::Sequence(nodes)) => self == Self::Listed && nodes.len() == 1,
            Some(Value::Mapping(entries)) => self != Self::Listed && entries.len() == 1,
            _ => false,
        };
        parsed.stop.is_none() && parsed.block && one && parsed.root.as_ref().is_some_and(begins)
    }

    fn root(self, root: Option<Node>) -> Option<Node> {
        match (self, root.map(|node| (node.span, node.value))) {
            (Self::Listed, Some((_, Value::Sequence(mut nodes)))) if !nodes.is_empty() => Some(nodes.swap_remove(0)),
            (Self::Listed, _) | (_, None) => None,
            (_, Some((span, value))) => Some(crate::syntax::parse::node(span, value)),
        }
    }
}

/// Reads the text of one piece, with whatever blank lines and comments follow it. Spans count from its start.
#[must_use]
pub fn parse_item(text: &str, form: Form) -> Tree {
    read_piece(text, form, None)
}

pub(super) fn read_piece(text: &str, form: Form, mut shared: Option<&mut Surroundings>) -> Tree {
    let parsed = parse(text, form.depth(), true, shared.as_deref_mut());
    if form.fits(text, &parsed) && !parsed.cut {
        return Tree {
            broken: !parsed.errors.is_empty(),
            errors: parsed.errors,
            root: form.root(parsed.root),
        };
    }
    let limited = parsed.cut || parsed.errors.iter().any(|error| error.kind == ErrorKind::Limit);
    let stop = parsed.stop.as_ref().map(|(at, fault)| words::fault(text, *at, fault));
    let deep = stop.as_ref().is_some_and(|error| error.kind == ErrorKind::Limit);
    if limited || deep || text.len() > MAX_RECOVERED {
        let mut errors = parsed.errors;
        errors.extend(stop);
        if errors.is_empty() {
            let first = Lines::new(text, 0, text.len()).next();
            let span = first.map_or(Span::default(), |line| Span::new(line.from, line.to));
            errors.push(words::not_yaml(span, "an entry with a key or a dash is wanted here"));
        }
        return Tree {
            root: form.root(parsed.root),
            errors,
            broken: true,
        };
    }
    if let Some((at, _)) = &parsed.stop {
        let lenient = parse(text, form.depth(), false, shared.as_deref_mut());
        if form.fits(text, &lenient) && lenient.errors.is_empty() {
            return Tree {
                root: form.root(lenient.root),
                errors: vec![too_far_left(text, *at, form)],
                broken: false,
            };
        }
    }
    let mut own = Surroundings::default();
    let mut tree = recover::recover(text, form, shared.unwrap_or(&mut own));
    if tree.errors.is_empty() {
        // The pieces of the piece read well, the whole does not: what the parser said stands.
        let first = Lines::new(text, 0, text.len()).next().map_or(0, |line| line.from);
        let plain = || words::not_yaml(words::character(text, first), "the text breaks off being YAML 1.2 here");
        tree.errors.push(stop.unwrap_or_else(plain));
    }
    cap(&mut tree.errors);
    tree
}

/// Keeps the first errors, in the order of the text; a last one counts the rest.
pub(super) fn cap(errors: &mut Vec<SyntaxError>) {
    errors.sort_by_key(|error| error.span);
    errors.dedup();
    if errors.len() > MAX_ERRORS {
        let more = errors.len() - MAX_ERRORS;
        errors.truncate(MAX_ERRORS);
        let span = errors[MAX_ERRORS - 1].span;
        errors.push(words::not_yaml(
            span,
            format!("{more} more errors follow in this piece of the file"),
        ));
    }
}

/// A line of a flow collection or quoted text that is indented no deeper than the key before it. What is meant is
/// certain, but YAML 1.2 (section 7.4, and 8.1 for the depth) wants it indented.
fn too_far_left(text: &str, at: u32, form: Form) -> SyntaxError {
    let line = Lines::new(text, 0, text.len())
        .filter(|line| line.start <= at as usize)
        .last();
    let Some(line) = line else {
        return words::not_yaml(
            words::character(text, at as usize),
            "this must be indented deeper than its key",
        );
    };
    let span = Span::new(
        line.from,
        line.from + text[line.from..].chars().next().map_or(0, char::len_utf8),
    );
    let error = words::not_yaml(
        span,
        "this line belongs to the value above and must be indented deeper than the key of that value",
    );
    let lead = Span::new(line.start, line.from);
    for deeper in [2, 4, 6, 8, 12, 16] {
        let spaces = " ".repeat(line.indent + deeper);
        let mended = format!("{}{spaces}{}", &text[..line.start], &text[line.from..]);
        let parsed = parse(&mended, form.depth(), true, None);
        let past = parsed
            .stop
            .as_ref()
            .is_none_or(|(stop, _)| *stop as usize > line.from + deeper);
        if past {
            return error.repaired("indent it deeper", true, lead, spaces);
        }
    }
    error
}
