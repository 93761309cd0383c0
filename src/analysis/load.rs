//! Assembling designs: head files with their parts and libraries, and the names that hold throughout.

use std::path::PathBuf;
use std::sync::Arc;

use rustc_hash::{FxHashMap, FxHashSet};

use crate::analysis::design::{Design, LinkKind, LinkTrouble, MemberAt};
use crate::analysis::files::{Files, ReadTrouble};
use crate::analysis::read::read;
use crate::analysis::reread::reread;
use crate::analysis::source::{FileKind, SourceFile};
use crate::design::decode::fire::BUILT_IN;

/// Files as they were read at the last load: what has not changed is not read again.
#[derive(Debug, Default)]
pub struct Kept(FxHashMap<PathBuf, Arc<SourceFile>>);

/// The files of a load: heads, parts and libraries name each other, and each is read once.
struct Sources<'a> {
    files: &'a dyn Files,
    kept: &'a Kept,
    known: FxHashMap<PathBuf, Result<Arc<SourceFile>, ReadTrouble>>,
}

impl Sources<'_> {
    fn get(&mut self, path: &PathBuf) -> Result<Arc<SourceFile>, ReadTrouble> {
        if let Some(known) = self.known.get(path) {
            return known.clone();
        }
        let source = self.files.read(path).map(|text| match self.kept.0.get(path) {
            Some(kept) if Arc::ptr_eq(&kept.text, &text) || kept.text == text => Arc::clone(kept),
            Some(kept) => Arc::new(reread(kept, text)),
            None => Arc::new(read(Arc::new(path.clone()), text)),
        });
        self.known.insert(path.clone(), source.clone());
        source
    }
}

/// A load: the designs, and the files that can't be read with their trouble.
pub type Loaded = (Vec<Arc<Design>>, Vec<(PathBuf, ReadTrouble)>);

/// Reads files and assembles every design among them. A part whose head lists it belongs to the head's design and is no
/// design of its own; its head is read even where it is not among the files, for a part says little without it. Files
/// that can't be read are answered with their trouble.
#[must_use]
pub fn load(files: &dyn Files, paths: &[PathBuf]) -> Loaded {
    load_again(files, paths, &mut Kept::default(), &[])
}

/// Loads again: of `older` designs those stay whose files are what they were.
pub fn load_again(files: &dyn Files, paths: &[PathBuf], kept: &mut Kept, older: &[Arc<Design>]) -> Loaded {
    let mut troubles = Vec::new();
    let mut sources = Vec::new();
    let mut known = Sources {
        files,
        kept,
        known: FxHashMap::default(),
    };
    for path in paths {
        match known.get(path) {
            Ok(source) => sources.push(source),
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
            && let Ok(source) = known.get(&head)
        {
            sources.push(source);
        }
    }
    let designs: Vec<Arc<Design>> = sources
        .iter()
        .map(|source| {
            let before = older.iter().find(|design| design.files[0].path == source.path);
            assemble(&mut known, Arc::clone(source), before)
        })
        .collect();
    let read = std::mem::take(&mut known.known);
    kept.0 = read
        .into_iter()
        .filter_map(|(path, source)| Some((path, source.ok()?)))
        .collect();
    let designs: Vec<Arc<Design>> = designs
        .into_iter()
        .filter(|design| design.files.iter().any(|file| asked.contains(&*file.path)))
        .collect();
    let taken: FxHashSet<Arc<PathBuf>> = designs
        .iter()
        .flat_map(|design| design.files.iter().skip(1).map(|file| Arc::clone(&file.path)))
        .collect();
    let (mut whole, others): (Vec<Arc<Design>>, Vec<Arc<Design>>) = designs
        .into_iter()
        .partition(|design| !taken.contains(&design.files[0].path));
    // Files that take each other in a circle would all be gone.
    let mut held: FxHashSet<Arc<PathBuf>> = FxHashSet::default();
    held.extend(
        whole
            .iter()
            .flat_map(|design| &design.files)
            .map(|file| Arc::clone(&file.path)),
    );
    for design in others {
        if !held.contains(&design.files[0].path) {
            held.extend(design.files.iter().map(|file| Arc::clone(&file.path)));
            whole.push(design);
        }
    }
    (whole, troubles)
}

/// Follows the parts and libraries of a head file.
fn assemble(sources: &mut Sources<'_>, head: Arc<SourceFile>, before: Option<&Arc<Design>>) -> Arc<Design> {
    let files = sources.files;
    let mut design = Design {
        files: vec![Arc::clone(&head)],
        members: Arc::default(),
        marks: Arc::default(),
        repeated: false,
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
            sources,
            &mut design,
            &head,
            &written.value,
            written.span,
            FileKind::Steelwork,
        ) {
            let back = part.head.part_of.value().map(|name| files.follow(&part.path, name));
            if back != Some(Ok(head.path.to_path_buf())) {
                design.troubles.push(LinkTrouble {
                    file: 0,
                    span: written.span,
                    written: written.value.clone(),
                    kind: LinkKind::PartNamesNoHead,
                });
            }
            design.files.push(part);
        }
    }
    if let (Some(name), Some(span)) = (head.head.part_of.value(), head.head.part_of.span())
        && let Some(other) = follow(sources, &mut design, &head, name, span, FileKind::Steelwork)
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
            sources,
            &mut design,
            &head,
            &written.value,
            written.span,
            FileKind::Protection,
        ) {
            design.files.push(library);
        }
    }
    if let Some(before) = before
        && before.troubles == design.troubles
        && before.files.len() == design.files.len()
        && before
            .files
            .iter()
            .zip(&design.files)
            .all(|(old, new)| Arc::ptr_eq(old, new))
    {
        return Arc::clone(before);
    }
    index(&mut design, before.map(Arc::as_ref));
    Arc::new(design)
}

fn follow(
    sources: &mut Sources<'_>,
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
    let path = match sources.files.follow(&from.path, written) {
        Ok(path) => path,
        Err(error) => return trouble(LinkKind::Path(error)),
    };
    if path == **from.path || design.files.iter().any(|file| **file.path == path) {
        return trouble(LinkKind::Cycle);
    }
    match sources.get(&path) {
        Ok(source) if source.kind == wanted => Some(source),
        Ok(_) => trouble(LinkKind::OtherKind(wanted)),
        Err(error) => trouble(LinkKind::Read(error)),
    }
}

/// Names, the first that carries each.
fn index(design: &mut Design, before: Option<&Design>) {
    let files = design.files.clone();
    for (file, source) in files.iter().enumerate() {
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
    if let Some(before) = before.filter(|before| marked_alike(before, design)) {
        design.members = Arc::clone(&before.members);
        design.marks = Arc::clone(&before.marks);
        design.repeated = before.repeated;
        return;
    }
    let mut members = Vec::new();
    let mut marks = FxHashMap::default();
    for (file, source) in files.iter().enumerate() {
        for (index, item) in source.members.iter().enumerate() {
            let at = MemberAt { file, index };
            members.push(at);
            if let Some(mark) = item.value().mark.value() {
                design.repeated |= marks.contains_key(mark);
                marks.entry(mark.clone()).or_insert(at);
            }
        }
    }
    design.members = Arc::new(members);
    design.marks = Arc::new(marks);
}

/// Whether every member carries the mark that the one in its place carried before.
fn marked_alike(before: &Design, design: &Design) -> bool {
    before.files.len() == design.files.len()
        && before.files.iter().zip(&design.files).all(|(old, new)| {
            Arc::ptr_eq(old, new)
                || old.members.len() == new.members.len()
                    && old.members.iter().zip(&new.members).all(|(old, new)| {
                        Arc::ptr_eq(&old.decoded, &new.decoded) || old.value().mark.value() == new.value().mark.value()
                    })
        })
}
