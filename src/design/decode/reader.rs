//! Reading single values of the tree by the kind that the key table gives them.

use jiff::civil::Date;

use crate::design::decode::typing::{decimal_comma, missing_colon, quantity_slip};
use crate::design::given::Given;
use crate::design::keys::{Key, Kind, Measure, nearest};
use crate::design::slip::{Slip, SlipKind};
use crate::syntax::{Entry, Node, Scalar, Value};
use crate::text::{Span, Spanned};
use crate::units::{parse_duration, parse_quantity};

/// The longest name or remark that is read, bytes: messages repeat them.
const LONGEST_TEXT: usize = 2000;
/// Entries of a mapping among which a misspelt key is looked for.
const MOST_KEYS: usize = 1000;

/// Collects what is wrong while values are read.
#[derive(Debug, Default)]
pub struct Reader {
    /// Everything found so far.
    pub slips: Vec<Slip>,
}

impl Reader {
    /// Calls `each` for every entry of a mapping whose key the table has; reports the rest.
    ///
    /// `owner` names the mapping in messages ("a member", "`protection`"). Answers whether the node is a mapping.
    pub fn entries(
        &mut self,
        node: &Node,
        table: &'static [Key],
        owner: &str,
        mut each: impl FnMut(&mut Self, &'static Key, &Entry),
    ) -> bool {
        let Value::Mapping(entries) = &node.value else {
            self.slip(
                SlipKind::WrongKind,
                node,
                format!("{owner} is a mapping of keys; {}", described(node)),
            );
            return false;
        };
        let mut seen: u64 = 0;
        for (at, entry) in entries.iter().enumerate() {
            let Value::Scalar(name) = &entry.key.value else {
                self.slip(
                    SlipKind::WrongKind,
                    &entry.key,
                    format!("a key of {owner} is a word; {}", described(&entry.key)),
                );
                continue;
            };
            let Some(index) = table.iter().position(|key| key.name == name.text) else {
                self.unknown_key(entries, at, name, table, owner);
                continue;
            };
            if seen >> index & 1 == 1 {
                self.twice(&entry.key, &name.text);
                continue;
            }
            seen |= 1 << index;
            each(self, &table[index], entry);
        }
        true
    }

    /// Reports the required keys that a mapping lacks.
    pub fn wanted(&mut self, node: &Node, table: &'static [Key], owner: &str) {
        for key in table.iter().filter(|key| key.required && node.get(key.name).is_none()) {
            self.missing(node.span, key.name, owner);
        }
    }

    /// Reports a missing key at the start of its mapping.
    pub fn missing(&mut self, span: Span, name: &'static str, owner: &str) {
        self.slips
            .push(Slip::new(SlipKind::MissingKey, span, format!("{owner} has no `{name}`")).at_key(name));
    }

    /// Reports something at a node.
    pub fn slip(&mut self, kind: SlipKind, node: &Node, message: impl Into<String>) {
        // Of what can't be read an error says why already.
        let slip = || Slip::new(kind, node.span, message);
        self.slips.extend((node.value != Value::Unreadable).then(slip));
    }

    /// Reports a key that stands twice in its mapping: keys of a YAML mapping are unique (YAML 1.2 section 3.2.1.1).
    pub fn twice(&mut self, key: &Node, name: &str) {
        self.slip(
            SlipKind::NotYaml,
            key,
            format!("`{name}` stands twice in this mapping; the first one holds"),
        );
    }

    fn unknown_key(&mut self, entries: &[Entry], at: usize, name: &Scalar, table: &'static [Key], owner: &str) {
        let entry = &entries[at];
        let span = entry.key.span;
        if name.text == "<<" {
            let text = "merge keys (`<<`) are not part of YAML 1.2; use `group` or `defaults` for what members share";
            self.slips.push(Slip::new(SlipKind::UnknownKey, span, text));
            return;
        }
        if let Some(slip) = decimal_comma(entries, at, name) {
            self.slips.push(slip);
            return;
        }
        if let Some(slip) = missing_colon(entry, name, table) {
            self.slips.push(slip);
            return;
        }
        let slip = match Key::nearest(table, &name.text) {
            Some(near) => {
                let text = format!("`{}` is no key of {owner}; perhaps `{near}`", name.text);
                let slip = Slip::new(SlipKind::UnknownKey, span, text);
                // A mapping with so many keys has no single one misspelt, and each would look at all others.
                let free = entries.len() <= MOST_KEYS && entries.iter().all(|e| !e.key.is_scalar(near));
                if free && !entry.key.through_alias {
                    slip.repair(format!("write `{near}`"), true, span, near)
                } else {
                    slip
                }
            }
            None => Slip::new(
                SlipKind::UnknownKey,
                span,
                format!("`{}` is no key of {owner}", name.text),
            ),
        };
        self.slips.push(slip);
    }

    /// A scalar's text, or a slip that says what is wanted.
    pub fn scalar<'a>(&mut self, node: &'a Node, key: &'static Key) -> Option<&'a Scalar> {
        match &node.value {
            Value::Scalar(scalar) => Some(scalar),
            _ => {
                self.wrong_kind(node, key);
                None
            }
        }
    }

    /// Reports that a value is of another kind than the key wants.
    pub fn wrong_kind(&mut self, node: &Node, key: &'static Key) {
        let text = || format!("`{}` wants {}; {}", key.name, key.kind.wanted(), described(node));
        let slip = || Slip::new(SlipKind::WrongKind, node.span, text()).at_key(key.name);
        self.slips.extend((node.value != Value::Unreadable).then(slip));
    }

    /// Text, kept as it is written.
    pub fn text(&mut self, node: &Node, key: &'static Key) -> Given<String> {
        match self.scalar(node, key) {
            Some(scalar) if scalar.text.len() > LONGEST_TEXT => {
                let message = format!(
                    "`{}` has {} bytes of text; at most {LONGEST_TEXT} are read",
                    key.name,
                    scalar.text.len()
                );
                self.slips
                    .push(Slip::new(SlipKind::OutOfBounds, node.span, message).at_key(key.name));
                Given::unreadable(node.span)
            }
            Some(scalar) => Given::new(scalar.text.clone(), node.span),
            None => Given::unreadable(node.span),
        }
    }

    /// A quantity in the base unit of its dimension.
    pub fn quantity(&mut self, node: &Node, key: &'static Key) -> Given<f64> {
        let Some(measure) = key.kind.measure() else {
            self.wrong_kind(node, key);
            return Given::unreadable(node.span);
        };
        self.measured(node, key, measure)
    }

    /// A quantity of a given measure, in its base unit.
    pub fn measured(&mut self, node: &Node, key: &'static Key, measure: Measure) -> Given<f64> {
        let Some(scalar) = self.scalar(node, key) else {
            return Given::unreadable(node.span);
        };
        match self.number(scalar, node, key, measure) {
            Some(value) => Given::new(value, node.span),
            None => Given::unreadable(node.span),
        }
    }

    fn number(&mut self, scalar: &Scalar, node: &Node, key: &'static Key, measure: Measure) -> Option<f64> {
        let text = &scalar.text;
        let wanted = Kind::Number(measure).wanted();
        match parse_quantity(text, measure.dimension, measure.unit) {
            Ok(value) => {
                let bound =
                    |limit: f64| parse_quantity(&format!("{limit}"), measure.dimension, measure.unit).unwrap_or(limit);
                if value < bound(measure.min) - 1e-9 || value > bound(measure.max) + 1e-9 {
                    let range = format!("{} to {} {}", measure.min, measure.max, measure.unit);
                    let message = format!(
                        "`{text}` can't be {} here: possible are {}",
                        measure.noun,
                        range.trim_end()
                    );
                    self.slips
                        .push(Slip::new(SlipKind::OutOfBounds, node.span, message).at_key(key.name));
                    return None;
                }
                Some(value)
            }
            Err(error) => {
                self.slips
                    .push(quantity_slip(&error, text, node, &wanted, measure.noun, measure.unit).at_key(key.name));
                None
            }
        }
    }

    /// A fire resistance period in minutes, 1 to 360.
    pub fn period(&mut self, node: &Node, key: &'static Key) -> Given<f64> {
        let Some(scalar) = self.scalar(node, key) else {
            return Given::unreadable(node.span);
        };
        match parse_duration(&scalar.text) {
            Ok(value) if (1.0..=360.0).contains(&value) => Given::new(value, node.span),
            Ok(_) => {
                let message = format!("`{}` can't be a period here: possible are 1 to 360 min", scalar.text);
                self.slips
                    .push(Slip::new(SlipKind::OutOfBounds, node.span, message).at_key(key.name));
                Given::unreadable(node.span)
            }
            Err(error) => {
                let slip = quantity_slip(&error, &scalar.text, node, "a period in min", "a period", "min");
                self.slips.push(slip.at_key(key.name));
                Given::unreadable(node.span)
            }
        }
    }

    /// A whole number within the key's bounds.
    pub fn whole(&mut self, node: &Node, key: &'static Key) -> Given<u32> {
        let Kind::Whole(min, max) = key.kind else {
            self.wrong_kind(node, key);
            return Given::unreadable(node.span);
        };
        let Some(scalar) = self.scalar(node, key) else {
            return Given::unreadable(node.span);
        };
        if let Ok(value) = scalar.text.trim().parse::<u32>()
            && (min..=max).contains(&value)
        {
            return Given::new(value, node.span);
        }
        let number = scalar.text.trim().parse::<f64>().is_ok();
        let kind = if number {
            SlipKind::OutOfBounds
        } else {
            SlipKind::WrongKind
        };
        let message = format!("`{}` wants {}, not `{}`", key.name, key.kind.wanted(), scalar.text);
        self.slips.push(Slip::new(kind, node.span, message).at_key(key.name));
        Given::unreadable(node.span)
    }

    /// yes or no, true or false.
    pub fn yes_no(&mut self, node: &Node, key: &'static Key) -> Given<bool> {
        if let Value::Scalar(scalar) = &node.value {
            match scalar.text.to_ascii_lowercase().as_str() {
                "yes" | "true" => return Given::new(true, node.span),
                "no" | "false" => return Given::new(false, node.span),
                _ => {}
            }
        }
        self.wrong_kind(node, key);
        Given::unreadable(node.span)
    }

    /// One of the key's words; the index into them.
    pub fn choice(&mut self, node: &Node, key: &'static Key) -> Given<usize> {
        self.word(node, key, key.kind.choices(), SlipKind::WrongKind)
    }

    /// One of `words`; a stranger is reported as `kind`, with the nearest word.
    pub fn word(
        &mut self,
        node: &Node,
        key: &'static Key,
        words: &'static [&'static str],
        kind: SlipKind,
    ) -> Given<usize> {
        let Some(scalar) = self.scalar(node, key) else {
            return Given::unreadable(node.span);
        };
        if let Some(index) = words.iter().position(|word| same_word(word, &scalar.text)) {
            return Given::new(index, node.span);
        }
        let near = nearest(&scalar.text, words.iter().copied());
        let mut message = format!(
            "`{}` wants {}, not `{}`",
            key.name,
            Kind::Choice(words).wanted(),
            scalar.text
        );
        if let Some(near) = near {
            message.push_str(&format!("; perhaps `{near}`"));
        }
        let mut slip = Slip::new(kind, node.span, message).at_key(key.name);
        if let (Some(near), false) = (near, node.through_alias) {
            slip = slip.repair(format!("write `{near}`"), false, node.span, near);
        }
        self.slips.push(slip);
        Given::unreadable(node.span)
    }

    /// A date.
    pub fn date(&mut self, node: &Node, key: &'static Key) -> Given<Date> {
        let Some(scalar) = self.scalar(node, key) else {
            return Given::unreadable(node.span);
        };
        match scalar.text.trim().parse::<Date>() {
            Ok(date) => Given::new(date, node.span),
            Err(_) => {
                let message = format!("`{}` wants {}, not `{}`", key.name, key.kind.wanted(), scalar.text);
                self.slips
                    .push(Slip::new(SlipKind::WrongKind, node.span, message).at_key(key.name));
                Given::unreadable(node.span)
            }
        }
    }

    /// The nodes of a list; a single value stands for a list of one.
    pub fn list<'a>(&mut self, node: &'a Node) -> &'a [Node] {
        match &node.value {
            Value::Sequence(nodes) => nodes,
            Value::Null => &[],
            _ => std::slice::from_ref(node),
        }
    }

    /// A list of names, as they are written.
    pub fn names(&mut self, node: &Node, key: &'static Key) -> Given<Vec<Spanned<String>>> {
        let mut names = Vec::new();
        let mut bad = false;
        for entry in self.list(node) {
            match self.text(entry, key) {
                Given::Value(name) => names.push(name),
                _ => bad = true,
            }
        }
        if bad && names.is_empty() {
            Given::unreadable(node.span)
        } else {
            Given::new(names, node.span)
        }
    }

    /// A list of exactly `N` numbers of the key's measure.
    pub fn tuple<const N: usize>(&mut self, node: &Node, key: &'static Key) -> Given<[f64; N]> {
        let nodes = match &node.value {
            Value::Sequence(nodes) if nodes.len() == N => nodes,
            _ => {
                self.wrong_kind(node, key);
                return Given::unreadable(node.span);
            }
        };
        let mut values = [0.0; N];
        for (value, entry) in values.iter_mut().zip(nodes) {
            let read = if key.kind == Kind::Tuple(&Kind::Period, N) {
                self.period(entry, key)
            } else {
                self.quantity(entry, key)
            };
            match read.value() {
                Some(read) => *value = *read,
                None => return Given::unreadable(node.span),
            }
        }
        Given::new(values, node.span)
    }
}

/// What a node is, for a message: "`x` is text", "here is a list".
pub fn described(node: &Node) -> String {
    match &node.value {
        Value::Null | Value::Unreadable => "here is nothing".to_owned(),
        Value::Scalar(scalar) => {
            let short: String = scalar.text.chars().take(40).collect();
            let dots = if short.len() < scalar.text.len() { ".." } else { "" };
            format!("here is `{short}{dots}`")
        }
        Value::Sequence(_) => "here is a list".to_owned(),
        Value::Mapping(_) => "here is a mapping".to_owned(),
    }
}

/// Words are compared without regard to case and to the kind of space between them.
pub fn same_word(word: &str, text: &str) -> bool {
    let plain = |c: char| {
        if c == '-' || c == '_' {
            ' '
        } else {
            c.to_ascii_lowercase()
        }
    };
    word.chars().map(plain).eq(text.trim().chars().map(plain))
}
