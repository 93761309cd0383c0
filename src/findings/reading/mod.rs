//! Findings of reading: what is no YAML, what the format does not know, and paths that lead nowhere.

pub mod ambiguous_section;
pub mod duplicate_mark;
pub mod library_cycle;
pub mod library_outside_workspace;
pub mod method_not_supported;
pub mod missing_key;
pub mod not_covered;
pub mod out_of_bounds;
pub mod part_not_listed;
pub mod several_documents;
pub mod unknown_fire;
pub mod unknown_group;
pub mod unknown_key;
pub mod unknown_mark;
pub mod unknown_product;
pub mod unknown_section;
pub mod unknown_steel;
pub mod unreadable_library;
pub mod unreadable_yaml;
pub mod unused_group;
pub mod unused_product;
pub mod wrong_kind;
pub mod wrong_unit;

use std::path::PathBuf;
use std::sync::Arc;

use crate::analysis::design::{Design, LinkKind, MemberAt};
use crate::analysis::files::PathTrouble;
use crate::analysis::names::{self, Sections};
use crate::analysis::source::{Decoded, Item, SourceFile};
use crate::design::model::member::MemberKeys;
use crate::design::slip::{Edit, Slip, SlipKind};
use crate::findings::context::Context;
use crate::findings::finding::{Finding, Fix, FixEdit, Note, Place};
use crate::findings::insert;
use crate::findings::registry::Declaration;
use crate::findings::uses::Uses;
use crate::syntax::{ErrorKind, SyntaxError};

/// What is declared here: slips of the files, which nobody can agree to leave.
pub static SLIPS: &[&Declaration] = &[
    &unreadable_yaml::DECLARATION,
    &several_documents::DECLARATION,
    &unknown_key::DECLARATION,
    &missing_key::DECLARATION,
    &wrong_kind::DECLARATION,
    &wrong_unit::DECLARATION,
    &out_of_bounds::DECLARATION,
    &duplicate_mark::DECLARATION,
    &unknown_section::DECLARATION,
    &ambiguous_section::DECLARATION,
    &unknown_product::DECLARATION,
    &unknown_group::DECLARATION,
    &unknown_steel::DECLARATION,
    &unknown_fire::DECLARATION,
    &unknown_mark::DECLARATION,
    &unreadable_library::DECLARATION,
    &library_outside_workspace::DECLARATION,
    &library_cycle::DECLARATION,
    &part_not_listed::DECLARATION,
    &method_not_supported::DECLARATION,
    &unused_product::DECLARATION,
    &unused_group::DECLARATION,
    &not_covered::DECLARATION,
];

/// Whether a finding is a slip of a file.
#[must_use]
pub fn is_slip(finding: &Finding) -> bool {
    is_declared_slip(finding.declaration)
}

/// Whether a declaration is one of slips.
#[must_use]
pub fn is_declared_slip(declaration: &Declaration) -> bool {
    SLIPS.iter().any(|slip| std::ptr::eq(*slip, declaration))
}

/// The declaration of a slip's finding.
const fn declared(kind: SlipKind) -> &'static Declaration {
    match kind {
        SlipKind::UnknownKey => &unknown_key::DECLARATION,
        SlipKind::MissingKey => &missing_key::DECLARATION,
        SlipKind::WrongKind => &wrong_kind::DECLARATION,
        SlipKind::WrongUnit => &wrong_unit::DECLARATION,
        SlipKind::OutOfBounds => &out_of_bounds::DECLARATION,
        SlipKind::NotYaml => &unreadable_yaml::DECLARATION,
        SlipKind::DuplicateMark => &duplicate_mark::DECLARATION,
        SlipKind::UnknownSection => &unknown_section::DECLARATION,
        SlipKind::AmbiguousSection => &ambiguous_section::DECLARATION,
        SlipKind::UnknownProduct => &unknown_product::DECLARATION,
        SlipKind::UnknownGroup => &unknown_group::DECLARATION,
        SlipKind::UnknownSteel => &unknown_steel::DECLARATION,
        SlipKind::UnknownFire => &unknown_fire::DECLARATION,
        SlipKind::UnknownMark => &unknown_mark::DECLARATION,
        SlipKind::MethodNotSupported => &method_not_supported::DECLARATION,
    }
}

fn slip_finding(file: &SourceFile, slip: Slip, owner: Owner<'_>) -> Finding {
    let place = |span| Place {
        path: Arc::clone(&file.path),
        span,
    };
    let mut finding = Finding::new(declared(slip.kind), place(slip.span), slip.message);
    owner.own(&mut finding);
    finding.key = slip.key.map(std::borrow::Cow::into_owned);
    finding.notes = slip
        .remarks
        .into_iter()
        .map(|remark| Note {
            text: remark.text,
            place: remark.span.map(place),
        })
        .collect();
    let names = matches!(
        slip.kind,
        SlipKind::UnknownGroup | SlipKind::UnknownFire | SlipKind::UnknownProduct
    );
    finding.fixes = slip
        .repairs
        .into_iter()
        .filter(|repair| {
            let alias = |edit: &Edit| insert::through_alias(&file.text, edit.span);
            !repair.edits.iter().any(alias)
        })
        .map(|repair| Fix {
            title: repair.title,
            safe: repair.safe,
            edits: repair
                .edits
                .into_iter()
                .map(|edit| FixEdit {
                    place: place(edit.span),
                    // A name of the author's choice may need quotes.
                    text: if names { insert::scalar(&edit.text) } else { edit.text },
                })
                .collect(),
        })
        .collect();
    finding
}

fn syntax_finding(path: &Arc<PathBuf>, error: SyntaxError, owner: Owner<'_>) -> Finding {
    let declaration = match error.kind {
        ErrorKind::SeveralDocuments => &several_documents::DECLARATION,
        ErrorKind::Limit => &out_of_bounds::DECLARATION,
        ErrorKind::NotYaml => &unreadable_yaml::DECLARATION,
    };
    let place = |span| Place {
        path: Arc::clone(path),
        span,
    };
    let mut finding = Finding::new(declaration, place(error.span), error.message);
    owner.own(&mut finding);
    if let Some(repair) = error.repair {
        let edits = repair.edits.into_iter().map(|edit| FixEdit {
            place: place(edit.span),
            text: edit.text,
        });
        finding.fixes.push(Fix {
            title: repair.title,
            safe: repair.safe,
            edits: edits.collect(),
        });
    }
    finding
}

/// The member that a slip is in, if it is in one.
#[derive(Clone, Copy, Default)]
struct Owner<'a>(Option<(MemberAt, Option<&'a str>)>);

impl Owner<'_> {
    fn own(self, finding: &mut Finding) {
        if let Some((at, mark)) = self.0 {
            finding.member = Some(at);
            finding.mark = mark.map(str::to_owned);
        }
    }
}

fn item_findings<T>(file: &SourceFile, item: &Item<T>, owner: Owner<'_>, out: &mut Vec<Finding>) {
    let Decoded { slips, errors, .. } = &*item.decoded;
    out.extend(
        errors
            .iter()
            .map(|error| syntax_finding(&file.path, error.clone().shifted(item.base()), owner)),
    );
    out.extend(
        slips
            .iter()
            .map(|slip| slip_finding(file, slip.clone().shifted(item.base()), owner)),
    );
}

/// What is wrong with the names of an item.
fn name_findings(
    design: &Design,
    (file, keys, base): (&SourceFile, &MemberKeys, u32),
    sections: &mut Sections,
    owner: Owner<'_>,
    out: &mut Vec<Finding>,
) {
    let mut slips = Vec::new();
    names::check(keys, design, sections, &mut slips);
    out.extend(
        slips
            .into_iter()
            .map(|slip| slip_finding(file, slip.shifted(base), owner)),
    );
}

/// The slips of one member.
pub fn item(design: &Design, at: MemberAt, sections: &mut Sections, out: &mut Vec<Finding>) {
    let (file, item) = (&design.files[at.file], design.member(at));
    let owner = Owner(Some((at, item.value().mark.value().map(String::as_str))));
    item_findings(file, item, owner, out);
    name_findings(design, (file, &item.value().keys, item.base()), sections, owner, out);
}

/// The slips outside the members, and what is wrong between files.
pub fn outside(design: &Design, sections: &mut Sections, out: &mut Vec<Finding>) {
    let none = Owner::default();
    for (index, file) in design.files.iter().enumerate() {
        let path = &file.path;
        out.extend(
            file.errors
                .iter()
                .map(|error| syntax_finding(path, error.clone(), none)),
        );
        out.extend(file.slips.iter().map(|slip| slip_finding(file, slip.clone(), none)));
        if file.head.part_of.value().is_some() && index > 0 {
            for key in &file.head.head_only {
                let message = format!(
                    "`{}` belongs to the head file; a part carries members and groups",
                    key.value
                );
                let place = Place {
                    path: Arc::clone(path),
                    span: key.span,
                };
                out.push(Finding::new(&unknown_key::DECLARATION, place, message));
            }
        }
        name_findings(design, (file, &file.head.defaults, 0), sections, none, out);
        for item in &file.groups {
            item_findings(file, item, none, out);
            name_findings(design, (file, &item.value().keys, item.base()), sections, none, out);
        }
        for item in &file.products {
            item_findings(file, item, none, out);
        }
    }
    links(design, out);
}

fn links(design: &Design, out: &mut Vec<Finding>) {
    for trouble in &design.troubles {
        let written = &trouble.written;
        let (declaration, message) = match &trouble.kind {
            LinkKind::Path(PathTrouble::Outside(how)) => (
                &library_outside_workspace::DECLARATION,
                format!("`{written}` leads out of the workspace {how}"),
            ),
            LinkKind::Path(PathTrouble::Missing) => (
                &unreadable_library::DECLARATION,
                format!("there is no file `{written}`"),
            ),
            LinkKind::Path(PathTrouble::Unreadable(why)) => (
                &unreadable_library::DECLARATION,
                format!("`{written}` can't be read: {why}"),
            ),
            LinkKind::Read(why) => (
                &unreadable_library::DECLARATION,
                format!("`{written}` can't be read: {why}"),
            ),
            LinkKind::Cycle => (
                &library_cycle::DECLARATION,
                format!("`{written}` closes a cycle of files"),
            ),
            LinkKind::OtherKind(_) => (
                &unreadable_library::DECLARATION,
                format!("`{written}` is a file of another kind than is wanted here"),
            ),
            LinkKind::PartNamesNoHead => (
                &part_not_listed::DECLARATION,
                format!("`{written}` does not name this file by `part of`"),
            ),
            LinkKind::HeadListsNoPart => (
                &part_not_listed::DECLARATION,
                format!("`{written}` does not list this file under `parts`"),
            ),
            LinkKind::TwoHeads(other) => (
                &part_not_listed::DECLARATION,
                format!("`{written}` belongs to `{other}` too"),
            ),
        };
        let place = Place {
            path: Arc::clone(&design.files[trouble.file].path),
            span: trouble.span,
        };
        out.push(Finding::new(declaration, place, message));
    }
}

/// What a member lacks or the methods do not reach.
pub(super) fn member(cx: &mut Context<'_>) {
    missing_key::check(cx);
    not_covered::check(cx);
}

/// Marks that stand twice or nowhere, and what nobody uses.
pub(super) fn design(design: &Design, uses: &Uses, out: &mut Vec<Finding>) {
    if design.repeated {
        duplicate_mark::check(design, out);
    }
    unknown_mark::check(design, uses.any_linked(), out);
    unused_group::check(design, uses, out);
    unused_product::check(design, uses, out);
}
