//! Changes to a member's protection that an editor offers beside the fixes of findings.

use crate::analysis::design::MemberAt;
use crate::analysis::evaluate::evaluate;
use crate::analysis::inputs::{Cover, Inputs, Names};
use crate::analysis::memo::Memo;
use crate::analysis::names::lookup_options;
use crate::analysis::outcome::{Outcome, Verdict};
use crate::design::model::member::Protection;
use crate::editor::actions::{Action, ActionKind, edits_in};
use crate::editor::view::{View, Within};
use crate::editor::write::{Page, append, held};
use crate::findings::finding::Finding;
use crate::findings::insert;
use crate::protection::product::Kind;
use crate::protection::stock::BuildUp;
use crate::syntax::Value;
use crate::text::Edit;
use crate::units::{DisplayUnits, significant};

/// What can be done about the protection of a member of the file.
pub(super) fn actions(view: &View<'_>, index: usize, here: &[(usize, &Finding)]) -> Vec<Action> {
    let at = MemberAt { file: view.file, index };
    let design = view.design;
    let member = design.member(at).value();
    let keys = design.inherited(member);
    let Some(stated) = keys.get(|keys| &keys.protection).value() else {
        return Vec::new();
    };
    let named = stated.product.as_ref().and_then(|name| design.product(&name.value));
    let kind = named.and_then(|(_, item)| Some(item.value().product.as_ref()?.kind));
    let (Some(kind), Some(outcome), false) = (kind, view.outcome(at), stated.unreadable || member.broken) else {
        return Vec::new();
    };
    let member = Covered {
        view,
        at,
        stated,
        own: !member.keys.protection.is_absent(),
        film: kind == Kind::Coating,
    };
    let box_form = if kind == Kind::Coating {
        None
    } else {
        member.box_form(outcome, here)
    };
    member.stock(outcome).into_iter().chain(box_form).collect()
}

/// A member with the protection that it states or inherits.
struct Covered<'a> {
    view: &'a View<'a>,
    at: MemberAt,
    stated: &'a Protection,
    /// Whether the statement is the member's own.
    own: bool,
    /// Whether its thickness is a dry film.
    film: bool,
}

impl Covered<'_> {
    /// Where no thickness is stated: states the next stock thickness, on which the verdict rests.
    fn stock(&self, outcome: &Outcome) -> Option<Action> {
        let state = outcome.protected.as_ref().filter(|state| !state.stated)?;
        let next = state.requirement.as_ref().ok()?.next.as_ref()?;
        if !self.stated.thickness.is_absent() || !self.stated.dft.is_absent() || !self.stated.layers.is_absent() {
            return None;
        }
        let key = if self.film { "dft" } else { "thickness" };
        let edits = self.set(key, &self.written(next))?;
        let what = if self.film { "film" } else { "thickness" };
        Some(self.action(
            format!("state the next stock {what}, {}", self.shown(next)),
            edits,
            Vec::new(),
        ))
    }

    /// Where the profile can't be protected as stated, or a board follows it: boxes it in, if the product then holds it.
    fn box_form(&self, outcome: &Outcome, here: &[(usize, &Finding)]) -> Option<Action> {
        let names = Names {
            design: self.view.design,
            options: lookup_options(self.view.design.basis()),
        };
        let mut inputs = Inputs::of(self.view.design.member(self.at).value(), &names);
        let Cover::Product(product) = &mut inputs.cover else {
            return None;
        };
        let mut own = here.iter().filter(|(_, finding)| finding.member == Some(self.at));
        let board = own.find(|(_, finding)| finding.name() == "profile-board");
        let fails = matches!(outcome.verdict, Verdict::Fails | Verdict::CannotBeProtected);
        // The fix of a board that follows the profile says the same.
        let told = board.is_some_and(|(_, finding)| !finding.fixes.is_empty());
        if product.boxed || told || !(fails || board.is_some()) {
            return None;
        }
        product.boxed = true;
        let boxed = evaluate(&inputs, &Memo::default());
        let next = boxed.protected.as_ref()?.requirement.as_ref().ok()?.next.as_ref()?;
        let title = if boxed.verdict == Verdict::Passes {
            "move to box form".to_owned()
        } else {
            format!("move to box form, which then needs {}", self.shown(next))
        };
        let answered = ["too-slender-to-protect", "protection-too-thin", "profile-board"];
        let answers = here
            .iter()
            .filter(|(_, finding)| finding.member == Some(self.at) && answered.contains(&finding.name()))
            .map(|(index, _)| *index);
        Some(self.action(title, self.set("form", "box")?, answers.collect()))
    }

    /// The edits that give the member's own protection a key. What it inherits is written into it, with the key; mappings
    /// are inherited whole.
    fn set(&self, key: &str, value: &str) -> Option<Vec<Edit>> {
        let within = Within::Member(self.at.index);
        if !self.own {
            let (span, text) = insert::key(self.view.design, self.at, "protection", &self.whole(key, value)?)?;
            return Some(vec![Edit { span, text }]);
        }
        let (tree, _) = self.view.tree(within)?;
        let node = tree
            .root
            .as_ref()?
            .get("protection")
            .filter(|node| !node.through_alias)?;
        let page = Page::of(self.view, within)?;
        let edit = match &node.value {
            Value::Scalar(_) => Edit {
                span: node.span,
                text: self.whole(key, value)?,
            },
            Value::Mapping(_) => match node.get(key) {
                Some(old) if old.through_alias => return None,
                Some(old) => Edit {
                    span: old.span,
                    text: value.to_owned(),
                },
                None => append(page, node, &[(key, value)])?,
            },
            _ => return None,
        };
        held(self.view, within, vec![edit])
    }

    /// All that is stated of the protection, in one mapping, with a key.
    fn whole(&self, key: &str, value: &str) -> Option<String> {
        insert::protection(self.stated, &[(key, value)])
    }

    fn written(&self, next: &BuildUp) -> String {
        insert::build_up(&next.layers, |layer| {
            if self.film {
                significant(layer.um(), 0)
            } else {
                significant(layer.mm(), 3)
            }
        })
    }

    fn shown(&self, next: &BuildUp) -> String {
        let units = if self.view.design.basis().imperial {
            DisplayUnits::Imperial
        } else {
            DisplayUnits::Metric
        };
        if self.film {
            units.film(next.total())
        } else {
            units.thickness(next.total())
        }
    }

    fn action(&self, title: String, edits: Vec<Edit>, answers: Vec<usize>) -> Action {
        Action {
            title,
            kind: if answers.is_empty() {
                ActionKind::Refactor
            } else {
                ActionKind::QuickFix
            },
            edits: edits_in(&self.view.source().path, edits),
            answers,
            preferred: false,
        }
    }
}
