//! Assembling designs: head files with their parts and libraries, and the names that hold throughout.

use std::path::{Path, PathBuf};
use std::sync::Arc;

use rustc_hash::{FxHashMap, FxHashSet};

use crate::analysis::design::{Design, LinkKind, LinkTrouble, MemberAt};
use crate::analysis::files::{Files, ReadTrouble};
use crate::analysis::read::read;
use crate::analysis::source::{FileKind, SourceFile};
use crate::design::decode::fire::BUILT_IN;

/// Reads files and assembles every design among them. A part whose head lists it belongs to the head's design and is no
/// design of its own; its head is read even where it is not among the files, for a part says little without it. Files
/// that can't be read are answered with their trouble.
#[must_use]
pub fn load(files: &dyn Files, paths: &[PathBuf]) -> (Vec<Design>, Vec<(PathBuf, ReadTrouble)>) {
    let mut troubles = Vec::new();
    let mut sources = Vec::new();
    for path in paths {
        match files.read(path) {
            Ok(text) => sources.push(Arc::new(read(Arc::new(path.clone()), text))),
            Err(trouble) => troubles.push((path.clone(), trouble)),
        }
    }
    let asked: FxHashSet<&PathBuf> = paths.iter().collect();
    let mut heads = FxHashSet::default();
    for part in 0..sources.len() {
        let source: &Arc<SourceFile> = &sources[part];
        let named = source.head.part_of.value();
        if let Some(Ok(head)) = named.map(|name| files.follow(&source.path, name))
            && !asked.contains(&head)
            && heads.insert(head.clone())
            && let Ok(text) = files.read(&head)
        {
            sources.push(Arc::new(read(Arc::new(head), text)));
        }
    }
    let designs: Vec<Design> = sources
        .iter()
        .map(|source| assemble(files, Arc::clone(source)))
        .collect();
    let designs: Vec<Design> = designs
        .into_iter()
        .filter(|design| design.files.iter().any(|file| asked.contains(&*file.path)))
        .collect();
    let taken: FxHashSet<Arc<PathBuf>> = designs
        .iter()
        .flat_map(|design| design.files.iter().skip(1).map(|file| Arc::clone(&file.path)))
        .collect();
    let (mut kept, others): (Vec<Design>, Vec<Design>) = designs
        .into_iter()
        .partition(|design| !taken.contains(&design.files[0].path));
    // Files that take each other in a circle would all be gone.
    let mut held: FxHashSet<Arc<PathBuf>> = FxHashSet::default();
    held.extend(
        kept.iter()
            .flat_map(|design| &design.files)
            .map(|file| Arc::clone(&file.path)),
    );
    for design in others {
        if !held.contains(&design.files[0].path) {
            held.extend(design.files.iter().map(|file| Arc::clone(&file.path)));
            kept.push(design);
        }
    }
    (kept, troubles)
}

/// Follows the parts and libraries of a head file.
fn assemble(files: &dyn Files, head: Arc<SourceFile>) -> Design {
    let mut design = Design {
        files: vec![Arc::clone(&head)],
        members: Vec::new(),
        marks: FxHashMap::default(),
        groups: FxHashMap::default(),
        products: FxHashMap::default(),
        fires: FxHashMap::default(),
        troubles: Vec::new(),
    };
    for (name, fire) in BUILT_IN {
        design.fires.insert((*name).to_owned(), Some(Arc::new(fire.clone())));
    }
    for named in &head.head.fires {
        design
            .fires
            .insert(named.name.value.clone(), named.fire.clone().map(Arc::new));
    }
    for written in &head.head.parts {
        if let Some(part) = follow(
            files,
            &mut design,
            &head,
            &written.value,
            written.span,
            FileKind::Steelwork,
        ) {
            let back = part.head.part_of.value().map(|name| files.follow(&part.path, name));
            let file = design.files.len();
            if back != Some(Ok(head.path.to_path_buf())) {
                design.troubles.push(LinkTrouble {
                    file: 0,
                    span: written.span,
                    written: written.value.clone(),
                    kind: LinkKind::PartNamesNoHead,
                });
            }
            design.files.push(part);
            debug_assert!(file > 0);
        }
    }
    if let (Some(name), Some(span)) = (head.head.part_of.value(), head.head.part_of.span())
        && let Some(other) = follow(files, &mut design, &head, name, span, FileKind::Steelwork)
    {
        let listed = other
            .head
            .parts
            .iter()
            .any(|part| files.follow(&other.path, &part.value).as_deref() == Ok(&**head.path));
        if !listed {
            design.troubles.push(LinkTrouble {
                file: 0,
                span,
                written: name.clone(),
                kind: LinkKind::HeadListsNoPart,
            });
        }
    }
    for written in &head.head.libraries {
        if let Some(library) = follow(
            files,
            &mut design,
            &head,
            &written.value,
            written.span,
            FileKind::Protection,
        ) {
            design.files.push(library);
        }
    }
    index(&mut design);
    design
}

fn follow(
    files: &dyn Files,
    design: &mut Design,
    from: &SourceFile,
    written: &str,
    span: crate::text::Span,
    wanted: FileKind,
) -> Option<Arc<SourceFile>> {
    let mut trouble = |kind| {
        design.troubles.push(LinkTrouble {
            file: 0,
            span,
            written: written.to_owned(),
            kind,
        });
        None
    };
    let path = match files.follow(&from.path, written) {
        Ok(path) => path,
        Err(error) => return trouble(LinkKind::Path(error)),
    };
    if same(&path, &from.path) || design.files.iter().any(|file| same(&file.path, &path)) {
        return trouble(LinkKind::Cycle);
    }
    match files.read(&path) {
        Ok(text) => {
            let source = read(Arc::new(path), text);
            if source.kind == wanted {
                Some(Arc::new(source))
            } else {
                trouble(LinkKind::OtherKind(wanted))
            }
        }
        Err(error) => trouble(LinkKind::Read(error)),
    }
}

fn same(a: &Path, b: &Path) -> bool {
    a == b
}

/// Names, the first that carries each.
fn index(design: &mut Design) {
    let files = design.files.clone();
    for (file, source) in files.iter().enumerate() {
        for (index, item) in source.members.iter().enumerate() {
            let at = MemberAt { file, index };
            design.members.push(at);
            if let Some(mark) = item.value().mark.value() {
                design.marks.entry(mark.clone()).or_insert(at);
            }
        }
        for (index, item) in source.groups.iter().enumerate() {
            design
                .groups
                .entry(item.value().name.value.clone())
                .or_insert((file, index));
        }
        for (index, item) in source.products.iter().enumerate() {
            design
                .products
                .entry(item.value().name.value.clone())
                .or_insert((file, index));
        }
    }
}
