//! What nobody types by mistake: a finding or a plain error, never a crash.

use std::fs;
use std::process::Command;

use crate::support::{HEAD, check, names, run, text};

#[test]
fn hostile_input_is_a_finding() {
    let deep = format!("steelwork: 1\nmembers: {}\n", "[".repeat(100_000));
    let bomb: String = ["steelwork: 1\na: &a [x,x,x,x,x,x,x,x,x]\n".to_owned()]
        .into_iter()
        .chain(
            "abcdefgh"
                .chars()
                .zip("bcdefghi".chars())
                .map(|(from, to)| format!("{to}: &{to} [{}]\n", vec![format!("*{from}"); 9].join(","))),
        )
        .collect();
    let long = format!("{HEAD}  - mark: {}\n", "x".repeat(30_000_000));
    let utf16: Vec<u8> = std::iter::once(0xFEFF_u16)
        .chain(format!("{HEAD}  - {{ mark: B1, sectoin: IPE 300 }}\n").encode_utf16())
        .flat_map(u16::to_le_bytes)
        .collect();
    let cases: [(&[u8], &str); 9] = [
        (b"", "missing-key"),
        (
            b"\xEF\xBB\xBFsteelwork: 1\r\nmembers:\r\n  - mark: B1\r\n    sectoin: IPE 300\r\n",
            "unknown-key",
        ),
        (b"steelwork: 1\nmembers:\n  - mark: B\x001\n", "unreadable-yaml"),
        (deep.as_bytes(), "out-of-bounds"),
        (bomb.as_bytes(), "unknown-key"),
        (long.as_bytes(), "out-of-bounds"),
        (&utf16, "unknown-key"),
        (
            b"steelwork: 1\nmembers:\n  - { mark: B1, length: .nan }\n",
            "out-of-bounds",
        ),
        (
            b"steelwork: 1\nmembers:\n  - { mark: B1, section: { shape: flat, b: -5, t: 1e308 } }\n",
            "out-of-bounds",
        ),
    ];
    for (bytes, wanted) in cases {
        let (code, found, _) = check(bytes);
        assert_eq!(code, 1);
        assert!(found.iter().any(|name| name == wanted), "{wanted}: {found:?}");
    }
    let (code, _, _) = check(b"mark: \xFF\xFE\xFD");
    assert_eq!(code, 2, "bytes that are no text");
}

#[test]
fn hostile_input_is_shown_as_text() {
    let control = format!("{HEAD}  - {{ mark: B1, sectoin: \"\u{1b}[2J\u{202e}\" }}\n");
    let long = format!("{HEAD}  - {{ mark: B1, sectoin: {} }}\n", "x".repeat(1_000_000));
    let open = format!("{HEAD}  - {{ mark: B1, section: \"IPE 300");
    for bytes in [
        "",
        "\n",
        "a",
        "steelwork: 1\nmembers: [",
        &control,
        &long,
        &open,
        "- \u{7f}\u{9b}31m",
    ] {
        let folder = tempfile::tempdir().unwrap();
        fs::write(folder.path().join("a.steelwork.yaml"), bytes).unwrap();
        let output = run(folder.path(), &["check", "--color", "never"]);
        let shown = text(&output);
        assert_eq!(output.status.code(), Some(1), "{shown}");
        assert!(shown.contains("a.steelwork.yaml:") && shown.len() < 20_000, "{shown}");
        let steers = |c: char| (c.is_control() && c != '\n') || c == '\u{202e}';
        assert!(!shown.contains(steers), "{shown:?}");
    }
}

#[test]
fn what_is_no_file_or_no_text_is_told_and_ends_with_2() {
    let folder = tempfile::tempdir().unwrap();
    let at = |name: &str| folder.path().join(name);
    fs::write(
        at("good.steelwork.yaml"),
        format!("{HEAD}  - {{ mark: B1, sectoin: IPE 300 }}\n"),
    )
    .unwrap();
    fs::write(at("bad.steelwork.yaml"), b"mark: \xFF\xFE\xFD").unwrap();
    // The other files are checked nevertheless.
    let output = run(folder.path(), &["check", "--as", "json"]);
    assert_eq!(output.status.code(), Some(2));
    let json: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    assert_eq!(json["findings"][0]["path"], "good.steelwork.yaml");
    let told = String::from_utf8(output.stderr).unwrap();
    assert!(
        told.contains("bad.steelwork.yaml can't be read: byte 6 is not UTF-8"),
        "{told}"
    );
    for args in [
        &["check", "none.steelwork.yaml"][..],
        &["check", "bad.steelwork.yaml"],
        &["check", "--on", "tomorrow"],
        &["check", "--as", "sarif"],
        &["schedule", "--demo", "good.steelwork.yaml"],
        &["begin", "good.steelwork.yaml"],
        &["schedule", "--demo", "--out", "none/such.csv"],
        &["review", "a", "b"],
        &[],
    ] {
        let output = run(folder.path(), args);
        assert_eq!(output.status.code(), Some(2), "{args:?}");
        assert!(output.stdout.is_empty() && !output.stderr.is_empty(), "{args:?}");
    }
    let empty = tempfile::tempdir().unwrap();
    assert_eq!(
        run(empty.path(), &["check"]).status.code(),
        Some(2),
        "nothing to check is no success"
    );
}

#[cfg(unix)]
#[test]
fn devices_and_dangling_links_are_no_files() {
    let folder = tempfile::tempdir().unwrap();
    let output = run(folder.path(), &["check", "/dev/zero"]);
    assert_eq!(output.status.code(), Some(2));
    std::os::unix::fs::symlink("nowhere", folder.path().join("a.steelwork.yaml")).unwrap();
    std::os::unix::fs::symlink(".", folder.path().join("circle")).unwrap();
    let output = run(folder.path(), &["check"]);
    assert_eq!(output.status.code(), Some(2));
    assert!(String::from_utf8_lossy(&output.stderr).contains("a.steelwork.yaml"));
}

/// A reader may go away before all is written, as `head` does.
#[test]
fn a_closed_pipe_is_no_failure() {
    let mut child = Command::new(env!("CARGO_BIN_EXE_scorchline"))
        .args(["sections", "--as", "json"])
        .stdout(std::process::Stdio::piped())
        .stderr(std::process::Stdio::piped())
        .spawn()
        .unwrap();
    drop(child.stdout.take());
    let output = child.wait_with_output().unwrap();
    assert_eq!(output.status.code(), Some(0));
    assert!(output.stderr.is_empty(), "{}", String::from_utf8_lossy(&output.stderr));
}

#[test]
fn paths_stay_in_the_workspace() {
    let names = names(
        b"steelwork: 1\nlibraries: [../x.protection.yaml, /etc/passwd, none.protection.yaml, a.steelwork.yaml]\n",
    );
    let wanted = [
        "library-outside-workspace",
        "library-outside-workspace",
        "unreadable-library",
        "library-cycle",
    ];
    assert_eq!(names, wanted);
}

#[cfg(unix)]
#[test]
fn a_symlink_out_of_the_workspace_is_refused() {
    let outside = tempfile::tempdir().unwrap();
    let folder = tempfile::tempdir().unwrap();
    fs::write(outside.path().join("x.protection.yaml"), "protection: 1\n").unwrap();
    std::os::unix::fs::symlink(
        outside.path().join("x.protection.yaml"),
        folder.path().join("x.protection.yaml"),
    )
    .unwrap();
    fs::write(
        folder.path().join("a.steelwork.yaml"),
        "steelwork: 1\nlibraries: [x.protection.yaml]\n",
    )
    .unwrap();
    let output = run(folder.path(), &["check", "a.steelwork.yaml", "--as", "json"]);
    assert!(text(&output).contains("by a symlink"));
}
