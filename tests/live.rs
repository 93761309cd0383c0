//! Checking again after a change: it finds what a fresh check finds, and works out no more than the change asks for.

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};
use std::sync::{Arc, Mutex};

use jiff::civil::date;
use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::check::run;
use scorchline::check::session::{Session, Workspace};
use scorchline::findings::finding::Finding;
use scorchline::scenario::FILES;

/// Files in memory.
#[derive(Default)]
struct Texts(Mutex<BTreeMap<PathBuf, Arc<str>>>);

impl Texts {
    fn scenario() -> Self {
        let texts = Self::default();
        for (name, text) in FILES {
            texts.put(name, text);
        }
        texts
    }

    fn put(&self, name: &str, text: &str) {
        self.0.lock().unwrap().insert(PathBuf::from(name), Arc::from(text));
    }

    fn text(&self, name: &str) -> String {
        self.0.lock().unwrap()[Path::new(name)].to_string()
    }

    /// Replaces what must stand there once.
    fn change(&self, name: &str, old: &str, new: &str) {
        let text = self.text(name);
        assert_eq!(text.matches(old).count(), 1, "{old:?} in {name}");
        self.put(name, &text.replace(old, new));
    }

    fn paths(&self) -> Vec<PathBuf> {
        self.0.lock().unwrap().keys().cloned().collect()
    }
}

impl Files for Texts {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        let path = PathBuf::from(relative);
        let known = self.0.lock().unwrap().contains_key(&path);
        if known { Ok(path) } else { Err(PathTrouble::Missing) }
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let text = self.0.lock().unwrap().get(path).cloned();
        text.ok_or_else(|| ReadTrouble::System("missing".to_owned()))
    }
}

fn check(session: &mut Session, texts: &Texts) -> Workspace {
    session
        .check(texts, &texts.paths(), date(2026, 12, 1), &|| false)
        .unwrap()
}

/// How many members a change makes the session work out.
fn evaluated(session: &mut Session, texts: &Texts, change: impl FnOnce()) -> u64 {
    check(session, texts);
    let before = session.evaluated();
    change();
    check(session, texts);
    session.evaluated() - before
}

/// Findings in an order of their own, for comparison.
fn sorted(mut findings: Vec<Finding>) -> Vec<Finding> {
    findings.sort_by_key(|finding| {
        let place = &finding.place;
        (
            place.path.clone(),
            place.span,
            finding.name(),
            finding.message.clone(),
            finding.mark.clone(),
        )
    });
    findings
}

#[track_caller]
fn same_as_fresh(workspace: &Workspace, texts: &Texts) {
    let (fresh, _) = run(texts, &texts.paths(), date(2026, 12, 1), &Memo::default());
    assert_eq!(workspace.designs.len(), fresh.len());
    for (live, fresh) in workspace.designs.iter().zip(fresh) {
        assert_eq!(live.outcomes, fresh.outcomes);
        let files = 0..live.design.files.len();
        let findings = files.flat_map(|file| live.findings(file)).collect();
        let (ours, theirs) = (sorted(findings), sorted(fresh.findings));
        for (ours, theirs) in ours.iter().zip(&theirs) {
            assert_eq!(ours, theirs);
        }
        assert_eq!(ours.len(), theirs.len());
        let agreed = (0..live.outcomes.len())
            .flat_map(|order| live.settled(order).1)
            .collect();
        assert_eq!(sorted(agreed), sorted(fresh.agreed));
    }
}

const HEAD: &str = FILES[0].0;

/// The line of a text that holds something, with its break.
fn line_with(text: &str, what: &str) -> String {
    format!("{}\n", text.lines().find(|line| line.contains(what)).unwrap())
}

#[test]
fn a_comment_works_nothing_out() {
    let (texts, mut session) = (Texts::scenario(), Session::default());
    let head = texts.text(HEAD);
    let member = head
        .lines()
        .filter(|line| line.contains("mark:"))
        .nth(3)
        .unwrap()
        .to_owned();
    let count = evaluated(&mut session, &texts, || {
        texts.change(HEAD, &member, &format!("{member} # checked"))
    });
    assert_eq!(count, 0);
    let count = evaluated(&mut session, &texts, || {
        texts.put(HEAD, &format!("# a line above all\n{}", texts.text(HEAD)))
    });
    assert_eq!(count, 0);
    same_as_fresh(&check(&mut session, &texts), &texts);
}

#[test]
fn one_member_changed_is_one_worked_out() {
    let (texts, mut session) = (frame(40), Session::default());
    let count = evaluated(&mut session, &texts, || {
        texts.change("a.steelwork.yaml", "utilisation: 0.517", "utilisation: 0.43")
    });
    assert_eq!(count, 1);
    same_as_fresh(&check(&mut session, &texts), &texts);
    let undone = evaluated(&mut session, &texts, || {
        texts.change("a.steelwork.yaml", "utilisation: 0.43", "utilisation: 0.517")
    });
    assert_eq!(undone, 0);
}

#[test]
fn moved_members_and_a_second_file_with_the_same_work_nothing_out() {
    let (texts, mut session) = (frame(40), Session::default());
    let moved = evaluated(&mut session, &texts, || {
        let text = texts.text("a.steelwork.yaml");
        let line = line_with(&text, "mark: B7,");
        texts.put("a.steelwork.yaml", &format!("{}{line}", text.replace(&line, "")));
    });
    assert_eq!(moved, 0);
    same_as_fresh(&check(&mut session, &texts), &texts);
    let second = evaluated(&mut session, &texts, || {
        texts.put("b.steelwork.yaml", &texts.text("a.steelwork.yaml"))
    });
    assert_eq!(second, 0);
    same_as_fresh(&check(&mut session, &texts), &texts);
}

#[test]
fn a_library_edit_works_its_users_out() {
    let (texts, mut session) = (frame(40), Session::default());
    let users = texts.text("a.steelwork.yaml").matches("product: grey board").count() as u64;
    assert!(users > 3 && users < 30);
    let remark = evaluated(&mut session, &texts, || {
        texts.change("p.protection.yaml", "grey board:", "grey board: # as delivered")
    });
    assert_eq!(remark, 0);
    let data = evaluated(&mut session, &texts, || {
        texts.change("p.protection.yaml", "0.19 W/mK", "0.21 W/mK")
    });
    assert_eq!(data, users);
    same_as_fresh(&check(&mut session, &texts), &texts);
}

#[test]
fn a_group_edit_works_its_members_out() {
    let (texts, mut session) = (frame(40), Session::default());
    let count = evaluated(&mut session, &texts, || {
        texts.change("a.steelwork.yaml", "upper: { period: 60", "upper: { period: 90")
    });
    assert_eq!(count, 20);
    same_as_fresh(&check(&mut session, &texts), &texts);
}

/// A frame of members in two groups, each with a load of its own, every third one protected by boards.
fn frame(members: usize) -> Texts {
    let texts = Texts::default();
    let mut text = "steelwork: 1\nlibraries: [p.protection.yaml]\ngroups:\n  upper: { period: 60, steel: S355 }\n  lower: { period: 30, steel: S275 }\nmembers:\n".to_owned();
    for n in 0..members {
        let group = if n % 2 == 0 { "upper" } else { "lower" };
        let product = match n % 3 {
            0 => "protection: { product: grey board }",
            1 => "protection: { product: white spray }",
            _ => "protection: none",
        };
        text.push_str(&format!(
            "  - {{ mark: B{n}, group: {group}, role: beam, section: IPE 300, loading: {{ utilisation: 0.{} }}, {product} }}\n",
            510 + n
        ));
    }
    texts.put("a.steelwork.yaml", &text);
    texts.put("p.protection.yaml", include_str!("live.protection.yaml"));
    texts
}

struct Random(u64);

impl Random {
    fn below(&mut self, most: usize) -> usize {
        self.0 ^= self.0 << 13;
        self.0 ^= self.0 >> 7;
        self.0 ^= self.0 << 17;
        (self.0 % most.max(1) as u64) as usize
    }
}

/// What is typed, taken out or put in by the random walk.
const SNIPPETS: [&str; 24] = [
    "0",
    "9",
    "x",
    " ",
    "\n",
    "\n  - mark: Z1\n",
    ":",
    "{",
    "}",
    "#",
    "'",
    "\t",
    "IPE 100",
    "period: 240",
    "supported by: [C1]",
    "- ",
    "é",
    "梁",
    "😀",
    "&a ",
    "*a",
    "\r\n",
    "group: ",
    "unprotected",
];

#[test]
fn any_walk_of_edits_ends_where_a_fresh_check_ends() {
    for seed in [7, 77, 777, 1000, 1001] {
        let mut random = Random(seed);
        let (texts, mut session) = (Texts::scenario(), Session::default());
        let mut past: Vec<(String, String)> = Vec::new();
        for step in 0..700 {
            let name = FILES[random.below(FILES.len())].0;
            let text = texts.text(name);
            if let (true, Some((name, before))) = (random.below(3) == 0, past.pop()) {
                texts.put(&name, &before);
            } else {
                let cut = |at: usize| {
                    (0..=at.min(text.len()))
                        .rev()
                        .find(|at| text.is_char_boundary(*at))
                        .unwrap()
                };
                let from = cut(random.below(text.len()));
                let to = cut(from + [0, 0, 0, 1, 1, 2, 30][random.below(7)]).max(from);
                let mut new = text.clone();
                new.replace_range(from..to, SNIPPETS[random.below(SNIPPETS.len())]);
                past.push((name.to_owned(), text));
                texts.put(name, &new);
            }
            let workspace = check(&mut session, &texts);
            if step % 2 == 0 {
                same_as_fresh(&workspace, &texts);
            }
        }
    }
}

#[test]
fn what_is_between_members_moves_with_them() {
    let text = "steelwork: 1
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
members: [ # here
  { mark: A, section: IPE 300 }, { mark: B, section: IPE 300, supported by: [Z] }, { mark: A, section: IPE 300 } ]
";
    let changes = [
        ("[ # here", "[ # there"),
        ("{ mark: A, section: IPE 300 }, {", "{ mark: A, section: IPE 300 } ,{"),
        ("  { mark: A, section: IPE 300 }, {", "{ mark: A, section: IPE 300 }, {"),
    ];
    for (old, new) in changes {
        let (texts, mut session) = (Texts::default(), Session::default());
        texts.put("a.steelwork.yaml", text);
        same_as_fresh(&check(&mut session, &texts), &texts);
        texts.change("a.steelwork.yaml", old, new);
        same_as_fresh(&check(&mut session, &texts), &texts);
    }
    // An item with an alias is read anew at each change, wherever the change is: here behind all of them.
    let block = "steelwork: 1
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
members:
  - { mark: A, section: IPE 300, note: &n text }
  - { mark: B, section: IPE 300, note: *n }
  - { mark: C, section: IPE 300, supported by: [Z] }
# end
";
    for (old, new) in [("# end", "# the end"), ("# end\n", ""), ("text }", "texts }")] {
        let (texts, mut session) = (Texts::default(), Session::default());
        texts.put("a.steelwork.yaml", block);
        same_as_fresh(&check(&mut session, &texts), &texts);
        texts.change("a.steelwork.yaml", old, new);
        same_as_fresh(&check(&mut session, &texts), &texts);
    }
}
