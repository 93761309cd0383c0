//! A cold check of many members beside reading the same file into values by serde_yaml, in one run: time and peak memory
//! of each, taken in a process of its own. `cargo bench --bench cold_check -- 100000`; with `write FOLDER 10000` it only
//! writes the frame, for the benchmark of the server.

mod frame;

use std::path::{Path, PathBuf};
use std::process::Command;
use std::sync::Arc;
use std::time::Instant;

use scorchline::analysis::files::{Files, PathTrouble, ReadTrouble};
use scorchline::analysis::memo::Memo;
use scorchline::analysis::outcome::Verdict;
use scorchline::check::run;

/// The two files in memory.
struct Held(Arc<str>, Arc<str>);

impl Files for Held {
    fn follow(&self, _: &Path, relative: &str) -> Result<PathBuf, PathTrouble> {
        Ok(PathBuf::from(relative))
    }

    fn read(&self, path: &Path) -> Result<Arc<str>, ReadTrouble> {
        let library = path.ends_with("frame.protection.yaml");
        Ok(Arc::clone(if library { &self.1 } else { &self.0 }))
    }
}

/// What one measurement gave: seconds, MiB before, and MiB at the most.
struct Taken {
    seconds: f64,
    before: f64,
    peak: f64,
}

/// The most memory that this process has taken, in MiB; where the system does not tell, it is not measured.
fn peak() -> f64 {
    let status = std::fs::read_to_string("/proc/self/status").unwrap_or_default();
    let line = status.lines().find_map(|line| line.strip_prefix("VmHWM:"));
    let kib = line.and_then(|line| line.split_whitespace().next()?.parse::<f64>().ok());
    kib.map_or(f64::NAN, |kib| kib / 1024.0)
}

fn check(members: usize) -> Taken {
    let (text, library) = frame::frame(members);
    let files = Held(Arc::from(text), Arc::from(library));
    let before = peak();
    let (start, memo) = (Instant::now(), Memo::default());
    let (checked, troubles) = run(
        &files,
        &[PathBuf::from("frame.steelwork.yaml")],
        jiff::civil::date(2026, 12, 1),
        &memo,
    );
    let seconds = start.elapsed().as_secs_f64();
    let taken = Taken {
        seconds,
        before,
        peak: peak(),
    };
    assert!(troubles.is_empty());
    assert_eq!(checked[0].outcomes.len(), members);
    let distinct = memo.evaluated();
    assert!(distinct as usize > members / 10 * 9, "{distinct} distinct members");
    let verdict = |wanted| {
        checked[0]
            .outcomes
            .iter()
            .filter(|outcome| outcome.verdict == wanted)
            .count()
    };
    let (passes, slender) = (verdict(Verdict::Passes), verdict(Verdict::CannotBeProtected));
    assert_eq!(verdict(Verdict::NotVerified), 0);
    assert!(passes > members / 2);
    let mut names = std::collections::BTreeMap::<&str, usize>::new();
    for finding in &checked[0].findings {
        *names.entry(finding.declaration.name).or_default() += 1;
    }
    // Of the frame's own design, none of reading.
    let expected = ["protection-not-needed", "protection-too-thin"];
    assert!(names.keys().all(|name| expected.contains(name)), "{names:?}");
    // A board whose thickness is worked out, and one of 15 mm for 120 min.
    assert_eq!(checked[0].outcomes[0].verdict, Verdict::Passes);
    assert_eq!(checked[0].outcomes[7].verdict, Verdict::Fails);
    eprintln!(
        "  {distinct} distinct members worked out; {passes} pass, {slender} can't be protected, {} findings",
        checked[0].findings.len()
    );
    taken
}

fn values(members: usize) -> Taken {
    let (text, _) = frame::frame(members);
    let before = peak();
    let start = Instant::now();
    let value: serde_yaml::Value = serde_yaml::from_str(&text).expect("the frame is YAML");
    let seconds = start.elapsed().as_secs_f64();
    let list = value["members"].as_sequence().map_or(0, Vec::len);
    assert_eq!(list, members);
    Taken {
        seconds,
        before,
        peak: peak(),
    }
}

/// Takes a measurement in a process of its own, so that neither sees the other's memory.
fn apart(what: &str, members: usize) -> Taken {
    let exe = std::env::current_exe().expect("the benchmark knows where it is");
    let output = Command::new(exe)
        .args([what, &members.to_string()])
        .stderr(std::process::Stdio::inherit())
        .output()
        .expect("the benchmark starts itself");
    assert!(output.status.success(), "{what} failed");
    let text = String::from_utf8_lossy(&output.stdout).into_owned();
    let mut numbers = text
        .split_whitespace()
        .map(|number| number.parse::<f64>().expect("a number"));
    let mut next = || numbers.next().expect("three numbers");
    Taken {
        seconds: next(),
        before: next(),
        peak: next(),
    }
}

fn main() {
    let arguments: Vec<String> = std::env::args()
        .skip(1)
        .filter(|argument| argument != "--bench")
        .collect();
    let number = |at: usize| arguments.get(at).and_then(|text| text.parse::<usize>().ok());
    let one = match arguments.first().map(String::as_str) {
        Some("check") => Some(check(number(1).unwrap_or(100_000))),
        Some("values") => Some(values(number(1).unwrap_or(100_000))),
        _ => None,
    };
    if let (Some("write"), Some(folder)) = (arguments.first().map(String::as_str), arguments.get(1)) {
        let (text, library) = frame::frame(number(2).unwrap_or(10_000));
        std::fs::create_dir_all(folder).expect("the folder can be made");
        for (name, text) in [("frame.steelwork.yaml", text), ("frame.protection.yaml", library)] {
            std::fs::write(Path::new(folder).join(name), text).expect("the file can be written");
        }
        return;
    }
    if let Some(taken) = one {
        println!("{} {} {}", taken.seconds, taken.before, taken.peak);
        return;
    }
    let members = number(0).unwrap_or(100_000);
    let size = frame::frame(members).0.len();
    println!("{members} members, {:.1} MB", size as f64 / 1e6);
    let ours = apart("check", members);
    let theirs = apart("values", members);
    let line = |name: &str, taken: &Taken| {
        println!(
            "{name:<34} {:>7.2} s  {:>7.0} MiB ({:.0} of them the text)",
            taken.seconds, taken.peak, taken.before
        );
    };
    line("scorchline: read, compute, check", &ours);
    line("serde_yaml: read into values", &theirs);
    println!(
        "ratio {:.2} in time, {:.2} in memory",
        ours.seconds / theirs.seconds,
        ours.peak / theirs.peak
    );
}
