//! Findings between members: marks, supports and names that nobody uses. Linear in the size of the design.

use std::sync::Arc;

use rustc_hash::{FxHashMap, FxHashSet};

use super::finding::{Finding, Note, Place};
use crate::analysis::design::{Design, MemberAt};
use crate::analysis::outcome::{Outcome, Verdict};
use crate::design::model::member::Period;
use crate::text::Span;

fn place(design: &Design, at: MemberAt, span: Span) -> Place {
    Place {
        path: Arc::clone(&design.files[at.file].path),
        span: design.member(at).place(span),
    }
}

/// Every finding between members; outcomes in the order of the design's members.
pub fn design(design: &Design, outcomes: &[Arc<Outcome>], out: &mut Vec<Finding>) {
    duplicates(design, out);
    unused(design, out);
    let index: FxHashMap<MemberAt, usize> = design.members.iter().enumerate().map(|(n, at)| (*at, n)).collect();
    supports(design, outcomes, &index, out);
    cycles(design, out);
}

fn duplicates(design: &Design, out: &mut Vec<Finding>) {
    for at in &design.members {
        let mark = &design.member(*at).value().mark;
        if let (Some(name), Some(span)) = (mark.value(), mark.span())
            && let Some(first) = design.marks.get(name).filter(|first| *first != at)
        {
            let message = format!("the mark {name} stands twice in the design");
            if let Some(mut finding) = Finding::new("duplicate-mark", place(design, *at, span), message) {
                finding.mark = Some(name.clone());
                let other = design.member(*first).value().mark.span().unwrap_or_default();
                finding.notes.push(Note {
                    text: "it stands here first".to_owned(),
                    place: Some(place(design, *first, other)),
                });
                out.push(finding);
            }
        }
    }
}

fn unused(design: &Design, out: &mut Vec<Finding>) {
    let mut groups: FxHashSet<&str> = FxHashSet::default();
    let mut products: FxHashSet<&str> = FxHashSet::default();
    for at in &design.members {
        let member = design.member(*at).value();
        let keys = design.inherited(member);
        groups.extend(keys.get(|k| &k.group).value().map(String::as_str));
        products.extend(
            keys.get(|k| &k.protection)
                .value()
                .and_then(|p| p.product.as_ref())
                .map(|p| p.value.as_str()),
        );
    }
    for file in &design.files {
        let at = |item_base: u32, span: Span| Place {
            path: Arc::clone(&file.path),
            span: span.shift(item_base),
        };
        for item in file
            .groups
            .iter()
            .filter(|item| !groups.contains(item.value().name.value.as_str()))
        {
            let name = &item.value().name;
            let message = format!("no member is of the group `{}`", name.value);
            out.extend(Finding::new("unused-group", at(item.base, name.span), message));
        }
        for item in file
            .products
            .iter()
            .filter(|item| !products.contains(item.value().name.value.as_str()))
        {
            let name = &item.value().name;
            let message = format!("no member uses the product `{}`", name.value);
            out.extend(Finding::new("unused-product", at(item.base, name.span), message));
        }
    }
}

fn supports(design: &Design, outcomes: &[Arc<Outcome>], index: &FxHashMap<MemberAt, usize>, out: &mut Vec<Finding>) {
    for (n, at) in design.members.iter().enumerate() {
        let member = design.member(*at).value();
        let keys = design.inherited(member);
        let mark = member.mark.value().cloned().unwrap_or_default();
        let period = match keys.get(|k| &k.period).value() {
            Some(Period::Of(time)) => Some(time.min()),
            _ => None,
        };
        let named = [
            ("supported by", &member.keys.supported_by),
            ("steadies", &member.keys.steadies),
        ];
        for (key, given) in named {
            for name in given.value().into_iter().flatten() {
                let Some(other) = design.marks.get(&name.value) else {
                    let message = format!(
                        "{mark} is said to be held to `{}` (`{key}`), but no member carries that mark",
                        name.value
                    );
                    if let Some(mut finding) = Finding::new("unknown-mark", place(design, *at, name.span), message) {
                        finding.mark = Some(mark.clone());
                        finding.key = Some(key.to_owned());
                        out.push(finding);
                    }
                    continue;
                };
                if key != "supported by" {
                    continue;
                }
                let Some(support) = index.get(other).map(|n| &outcomes[*n]) else {
                    continue;
                };
                let mut add = |finding: &str, message: String| {
                    if let Some(mut finding) = Finding::new(finding, place(design, *at, name.span), message) {
                        finding.mark = Some(mark.clone());
                        finding.key = Some(key.to_owned());
                        out.push(finding);
                    }
                };
                if let Some(period) = period {
                    support_rating(design, *other, support, &mark, &name.value, period, &mut add);
                }
                if outcomes[n].protected.is_none() && outcomes[n].bare.is_some() && support.protected.is_some() {
                    let message = format!(
                        "{mark} is bare and rests on {}, which is protected: run the protection on for 500 mm along {mark}",
                        name.value
                    );
                    add("bare-on-protected", message);
                }
            }
        }
    }
}

fn support_rating(
    design: &Design,
    other: MemberAt,
    support: &Outcome,
    mark: &str,
    name: &str,
    period: f64,
    add: &mut impl FnMut(&str, String),
) {
    let member = design.member(other).value();
    let own = match design.inherited(member).get(|k| &k.period).value() {
        Some(Period::Of(time)) => time.min(),
        _ => 0.0,
    };
    let reached = match (&support.protected, support.bare) {
        (Some(state), _) => state.resistance.map(|time| time.min()),
        (None, Some(bare)) => Some(bare.resistance.map_or(360.0, |time| time.min())),
        _ => None,
    };
    // A support that is verified for its own period lasts at least so long.
    let lasts = match support.verdict {
        Verdict::Passes => reached.unwrap_or(own).max(own),
        Verdict::Fails => reached.unwrap_or(0.0),
        _ => return,
    };
    if lasts + 1e-6 < period {
        add(
            "support-rating-lower",
            format!("{mark} must last {period:.0} min, but {name}, which supports it, lasts {lasts:.0} min"),
        );
    }
}

/// Circles of support, each reported once, by a depth-first walk without recursion.
fn cycles(design: &Design, out: &mut Vec<Finding>) {
    let mut done: FxHashSet<MemberAt> = FxHashSet::default();
    for start in &design.members {
        let mut path: Vec<(MemberAt, usize)> = vec![(*start, 0)];
        let mut on_path: FxHashSet<MemberAt> = FxHashSet::from_iter([*start]);
        while let Some((at, next)) = path.last_mut() {
            let here = *at;
            if done.contains(&here) {
                on_path.remove(&here);
                path.pop();
                continue;
            }
            let names = design
                .member(here)
                .value()
                .keys
                .supported_by
                .value()
                .map_or(&[][..], Vec::as_slice);
            let Some(name) = names.get(*next) else {
                done.insert(here);
                on_path.remove(&here);
                path.pop();
                continue;
            };
            *next += 1;
            let Some(to) = design.marks.get(&name.value).copied() else {
                continue;
            };
            if on_path.contains(&to) {
                let message = format!("`{}` closes a circle of members that support each other", name.value);
                out.extend(Finding::new("support-cycle", place(design, here, name.span), message));
            } else if !done.contains(&to) {
                on_path.insert(to);
                path.push((to, 0));
            }
        }
    }
}
