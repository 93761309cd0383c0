//! Every fix of every finding, made in the file and checked again: the finding is gone, no error is new, nothing else of
//! the file has changed. A finding that says it has a fix and has no case here fails.

mod cases;
mod design;

use std::collections::BTreeMap;

use scorchline::check::Checked;
use scorchline::findings::finding::{Finding, Fix, Severity};
use scorchline::findings::registry::REGISTRY;

use crate::cases::CASES;
use crate::design::{Files, check, files_of, in_block_style};

#[test]
fn every_finding_with_a_fix_has_a_case() {
    for declaration in REGISTRY {
        let offers = !declaration.fix.starts_with("None");
        let cases = CASES.iter().filter(|(name, _)| *name == declaration.name).count();
        assert_eq!(cases, usize::from(offers), "{}: {}", declaration.name, declaration.fix);
    }
    assert!(
        CASES
            .iter()
            .all(|(name, _)| REGISTRY.iter().any(|declaration| declaration.name == *name))
    );
}

#[test]
fn every_fix_answers_its_finding_and_breaks_nothing() {
    let mut wrong = Vec::new();
    let mut proved = 0;
    for (name, texts) in CASES {
        for text in *texts {
            for case in styles(text) {
                match prove(name, &case) {
                    Ok(fixes) => proved += fixes,
                    Err(why) => wrong.push(format!("{name}: {why}\nof {text}")),
                }
            }
        }
    }
    assert!(wrong.is_empty(), "{} wrong\n{}", wrong.len(), wrong.join("\n\n"));
    assert!(proved > 200, "only {proved} fixes were made");
}

/// A case as it is written and in block style, each in lines that end with LF and with CR LF.
fn styles(text: &str) -> Vec<Files> {
    let written = files_of(text);
    let mut styles = vec![written];
    styles.extend(in_block_style(text).map(|text| files_of(&text)));
    let crlf: Vec<Files> = styles
        .iter()
        .map(|files| {
            files
                .iter()
                .map(|(name, text)| (name.clone(), text.replace('\n', "\r\n")))
                .collect()
        })
        .collect();
    styles.extend(crlf);
    styles
}

/// Makes each fix of the finding's first occurrence by itself; how many there were.
fn prove(name: &str, files: &Files) -> Result<usize, String> {
    let before = check(files);
    let told = || format!("{:#?}", messages(&before));
    let found = before.findings.iter().find(|finding| finding.name() == name);
    let found = found.ok_or_else(|| format!("it is not found: {}", told()))?;
    if found.fixes.is_empty() {
        return Err(format!("it has no fix: {}", told()));
    }
    for fix in &found.fixes {
        one(&before, found, fix, files).map_err(|why| format!("`{}` {why}", fix.title))?;
    }
    Ok(found.fixes.len())
}

fn one(before: &Checked, found: &Finding, fix: &Fix, files: &Files) -> Result<(), String> {
    let fixed = made(before, found, fix, files)?;
    let after = check(&fixed);
    let told = || format!("{:#?} of\n{}", messages(&after), changed(files, &fixed));
    let count = |checked: &Checked| {
        checked
            .findings
            .iter()
            .filter(|other| other.name() == found.name())
            .count()
    };
    if count(&after) + 1 > count(before) {
        return Err(format!("leaves it: {}", told()));
    }
    let errors = |checked: &Checked| {
        let mut errors: BTreeMap<(&str, Option<String>), usize> = BTreeMap::new();
        for finding in checked
            .findings
            .iter()
            .filter(|finding| finding.severity == Severity::Error)
        {
            *errors.entry((finding.name(), finding.mark.clone())).or_default() += 1;
        }
        errors
    };
    let known = errors(before);
    for (error, count) in errors(&after) {
        if known.get(&error).copied().unwrap_or(0) < count {
            return Err(format!("brings {error:?}: {}", told()));
        }
    }
    // Members that the finding does not concern are what they were.
    for (at, outcome) in before.design.members.iter().zip(&before.outcomes) {
        let mark = before.design.member(*at).value().mark.value();
        let same = mark.and_then(|mark| Some((mark, after.design.marks.get(mark)?)));
        let Some((mark, place)) = same.filter(|(mark, _)| mark.starts_with('Z')) else {
            continue;
        };
        let order = after
            .design
            .members
            .binary_search(place)
            .map_err(|_| "loses a member".to_owned())?;
        if after.outcomes[order] != *outcome {
            return Err(format!("changes what is said of {mark}: {}", told()));
        }
    }
    Ok(())
}

/// The files after a fix, whose edits are held to what they may touch.
fn made(before: &Checked, found: &Finding, fix: &Fix, files: &Files) -> Result<Files, String> {
    let mut fixed = files.clone();
    if fix.edits.is_empty() {
        return Err("does nothing".to_owned());
    }
    for pair in fix.edits.windows(2) {
        if pair[0].place.span.end > pair[1].place.span.start {
            return Err("has edits that are not in order".to_owned());
        }
    }
    for edit in fix.edits.iter().rev() {
        let span = edit.place.span;
        if edit.place.path != found.place.path {
            return Err("touches another file".to_owned());
        }
        // A member's fix stays in the member, whatever it inherits.
        if let Some(at) = found.member {
            let item = before.design.member(at).piece.span;
            if span.start < item.start || span.end > item.end {
                return Err(format!("touches {span:?} outside its member at {item:?}"));
            }
        }
        let path = edit.place.path.to_str().unwrap();
        let (_, text) = fixed.iter_mut().find(|(name, _)| name == path).unwrap();
        let old = span.slice(text);
        // What is replaced is the text at fault, or one value; never whole lines.
        if old.contains('\n') {
            return Err(format!("replaces lines: {old:?}"));
        }
        let crlf = text.contains("\r\n");
        if edit.text.matches('\n').count() != edit.text.matches("\r\n").count() && crlf
            || !crlf && edit.text.contains('\r')
        {
            return Err(format!("mixes line ends: {:?}", edit.text));
        }
        text.replace_range(span.start as usize..span.end as usize, &edit.text);
    }
    Ok(fixed)
}

/// The lines of the head file that are not what they were.
fn changed(before: &Files, after: &Files) -> String {
    let before: Vec<&str> = before[0].1.lines().collect();
    let lines = after[0].1.lines().filter(|line| !before.contains(line));
    lines.collect::<Vec<_>>().join("\n")
}

/// What is found, without what nobody uses: the frame of the cases has more than each needs.
fn messages(checked: &Checked) -> Vec<String> {
    let findings = checked
        .findings
        .iter()
        .filter(|finding| !finding.name().starts_with("unused"));
    findings
        .map(|finding| format!("{}: {}", finding.name(), finding.message))
        .collect()
}
