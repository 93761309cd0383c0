//! From a cursor in half-typed text to what may be written there: by indentation, braces and brackets alone, for the
//! text of a line that is being typed is seldom YAML.

mod block;
mod flow;
mod lines;

use crate::editor::completion::place::{Place, Slot, Stated, Step};
use crate::text::Span;

/// A text to be searched for what its cursor stands in.
pub(super) struct Ground<'a> {
    /// The text: a piece of a file.
    pub text: &'a str,
    /// Offset of the cursor in it.
    pub cursor: usize,
    /// Where the piece stands in the file.
    pub base: u32,
    /// How it begins.
    pub start: Start,
    /// The keys of the file's top level.
    pub top: Vec<Stated>,
}

/// How a piece begins.
pub(super) enum Start {
    /// With a line of a block, beneath this key of the top level.
    Block(Option<&'static str>),
    /// Within brackets, beneath this key of the top level.
    Brackets(&'static str),
    /// Within braces, beneath this key of the top level, if any.
    Braces(Option<&'static str>),
}

/// Where the cursor stands; `None` where nothing fits.
pub(super) fn place(ground: Ground<'_>) -> Option<Place> {
    let mut scan = Scan {
        text: ground.text,
        cursor: ground.cursor,
        levels: Vec::new(),
        root: Vec::new(),
        beside: vec![ground.top],
        found: None,
        closed: false,
        scalar: None,
    };
    let base = ground.base;
    match ground.start {
        Start::Block(key) => {
            let mut top = Level::map(0, 0);
            top.key = key.map(str::to_owned);
            scan.levels.push(top);
            scan.block(0);
        }
        Start::Brackets(key) => {
            scan.root.push(Step::Key(key.to_owned()));
            let id = scan.container();
            scan.flow(0, None, flow::Frame::brackets(id));
        }
        Start::Braces(key) => {
            scan.root.extend(key.map(|key| Step::Key(key.to_owned())));
            let id = if key.is_some() { scan.container() } else { 0 };
            scan.flow(0, None, flow::Frame::braces(id));
        }
    }
    let Found { mut place, container } = scan.found?;
    let cursor = Span::new(0, ground.cursor).end;
    let mut beside = container.map_or_else(Vec::new, |id| std::mem::take(&mut scan.beside[id]));
    // Of the top level the spans are those of the file.
    let shift = if container == Some(0) { base } else { 0 };
    beside.retain(|stated| !stated.span.touches(cursor + shift) || stated.span.is_empty());
    place.beside = beside;
    place.replaces = place.replaces.shift(base);
    Some(place)
}

/// A block that is open.
struct Level {
    /// Column of its keys or dashes.
    indent: usize,
    list: bool,
    /// What stands in it, by index in [`Scan::beside`].
    container: usize,
    /// The key whose value follows.
    key: Option<String>,
    /// Whether that key has a value already, or the list's last entry.
    filled: bool,
}

impl Level {
    const fn map(indent: usize, container: usize) -> Self {
        Self {
            indent,
            list: false,
            container,
            key: None,
            filled: false,
        }
    }
}

struct Found {
    place: Place,
    container: Option<usize>,
}

struct Scan<'a> {
    text: &'a str,
    cursor: usize,
    levels: Vec<Level>,
    /// The way to what the piece stands in.
    root: Vec<Step>,
    /// What stands in each mapping and list.
    beside: Vec<Vec<Stated>>,
    found: Option<Found>,
    /// Whether the cursor was met where nothing fits.
    closed: bool,
    /// The column that lines of a block scalar lie beyond.
    scalar: Option<usize>,
}

impl Scan<'_> {
    fn container(&mut self) -> usize {
        self.beside.push(Vec::new());
        self.beside.len() - 1
    }

    fn met(&self) -> bool {
        self.found.is_some() || self.closed
    }

    /// The way to the node that the first `count` levels lead to.
    fn path(&self, count: usize) -> Vec<Step> {
        let steps = self.levels.iter().take(count).filter_map(|level| match &level.key {
            Some(key) => Some(Step::Key(key.clone())),
            None => level.list.then_some(Step::Entry),
        });
        self.root.iter().cloned().chain(steps).collect()
    }

    fn find(&mut self, path: Vec<Step>, slot: Slot, replaces: (usize, usize), container: Option<usize>) {
        if self.met() {
            return;
        }
        self.found = Some(Found {
            place: Place {
                path,
                slot,
                replaces: Span::new(replaces.0, replaces.1),
                beside: Vec::new(),
                flow: false,
                before: "",
                after: "",
                heads: false,
            },
            container,
        });
    }

    /// Changes the place that was just found.
    fn also(&mut self, change: impl FnOnce(&mut Place)) {
        if let Some(found) = &mut self.found {
            change(&mut found.place);
        }
    }

    fn state(&mut self, container: usize, name: String, span: (usize, usize)) {
        if container == 0 {
            // What stands at the top level is known already.
            return;
        }
        self.beside[container].push(Stated {
            name,
            value: String::new(),
            span: Span::new(span.0, span.1),
        });
    }
}
