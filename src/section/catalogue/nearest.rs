//! The rows whose designation is most like a text that names none.

use super::CatalogueRow;
use super::key::Key;

/// How many are named.
const MOST: usize = 5;

/// Texts longer than this are like no designation.
const LONGEST: usize = 32;

/// Every row in the two forms that a text is compared with.
pub(super) struct Candidates {
    forms: Vec<[Form; 2]>,
}

/// A designation squeezed, with a count of its characters by which most are ruled out without a comparison.
struct Form {
    text: Box<str>,
    counts: [u8; 37],
}

impl Form {
    fn of(text: String) -> Self {
        let mut counts = [0_u8; 37];
        for byte in text.bytes() {
            let slot = match byte {
                b'0'..=b'9' => byte - b'0',
                b'a'..=b'z' => byte - b'a' + 10,
                _ => 36,
            };
            let count = &mut counts[usize::from(slot)];
            *count = count.saturating_add(1);
        }
        Self {
            text: text.into(),
            counts,
        }
    }

    /// No fewer edits than this lie between the two.
    fn at_least(&self, other: &Self) -> usize {
        let (mut more, mut less) = (0_usize, 0_usize);
        for (a, b) in self.counts.iter().zip(&other.counts) {
            more += usize::from(a.saturating_sub(*b));
            less += usize::from(b.saturating_sub(*a));
        }
        more.max(less)
    }
}

/// A text as written, squeezed: lower case, without spaces.
pub(super) fn squeezed(text: &str) -> String {
    text.chars()
        .filter(|c| !c.is_whitespace() && !matches!(c, '-' | '_'))
        .flat_map(char::to_lowercase)
        .map(|c| match c {
            '×' | '*' => 'x',
            ',' => '.',
            other => other,
        })
        .collect()
}

/// A text with its letters first.
fn ordered(text: &str) -> String {
    Key::of(text).map_or_else(|| squeezed(text), |key| key.index().replace('|', ""))
}

impl Candidates {
    pub fn of(rows: &[CatalogueRow]) -> Self {
        let forms = rows
            .iter()
            .map(|row| {
                [
                    Form::of(squeezed(&row.designation)),
                    Form::of(ordered(&row.designation)),
                ]
            })
            .collect();
        Self { forms }
    }

    /// The rows nearest to a text by edits, then by letters and numbers; none if all are far from it.
    pub fn to(&self, text: &str, rows: &'static [CatalogueRow]) -> Vec<&'static CatalogueRow> {
        let wanted = [Form::of(squeezed(text)), Form::of(ordered(text))];
        let length = wanted[0].text.chars().count();
        if length == 0 || length > LONGEST {
            return Vec::new();
        }
        // More than half the text changed is another designation.
        let mut bound = length.div_ceil(2).min(5);
        let mut near: Vec<(usize, usize)> = Vec::new();
        for (n, forms) in self.forms.iter().enumerate() {
            let edits = forms
                .iter()
                .zip(&wanted)
                .filter(|(form, wanted)| form.at_least(wanted) <= bound)
                .map(|(form, wanted)| strsim::osa_distance(&form.text, &wanted.text))
                .min();
            if let Some(edits) = edits.filter(|edits| *edits <= bound) {
                near.push((edits, n));
                // Once enough are as near as this, farther ones are not wanted.
                if near.iter().filter(|(held, _)| *held < bound).count() >= MOST {
                    bound -= 1;
                    near.retain(|(held, _)| *held <= bound);
                }
            }
        }
        let key = Key::of(text);
        near.sort_by(|a, b| {
            let order = |(edits, n): (usize, usize)| (edits, unlike(key.as_ref(), &rows[n]), n);
            let ((ea, ua, na), (eb, ub, nb)) = (order(*a), order(*b));
            ea.cmp(&eb)
                .then(ua.0.cmp(&ub.0))
                .then(ua.1.total_cmp(&ub.1))
                .then(na.cmp(&nb))
        });
        near.into_iter().take(MOST).map(|(_, n)| &rows[n]).collect()
    }
}

/// Whether the letters differ, and how far the numbers lie apart.
fn unlike(key: Option<&Key>, row: &CatalogueRow) -> (bool, f64) {
    let (Some(key), Some(own)) = (key, Key::of(&row.designation)) else {
        return (true, f64::INFINITY);
    };
    let apart = key.numbers.iter().zip(&own.numbers).map(|(a, b)| (a - b).abs()).sum();
    (key.letters != own.letters, apart)
}
