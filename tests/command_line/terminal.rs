//! What only a terminal sees.

use crate::{FAILS, folder, lengthwise, stated, text};
use std::process::{Command, Stdio};

#[test]
fn nothing_but_a_terminal_is_coloured() {
    let folder = folder();
    let job = folder.path().join("job.toml");
    let output = lengthwise(&["check", text(&job)]);
    assert!(!output.stdout.contains(&0x1b));
}

/// What the program shows on a terminal of so many columns, by the `script` of util-linux; nothing
/// where that is not installed.
#[cfg(target_os = "linux")]
fn on_a_terminal(columns: usize, arguments: &str, environment: &[(&str, &str)]) -> Option<String> {
    let run = format!(
        "stty rows 40 cols {columns}; exec '{}' check {arguments}",
        env!("CARGO_BIN_EXE_lengthwise")
    );
    let output = Command::new("script")
        .args(["-qec", &run, "/dev/null"])
        .env_remove("NO_COLOR")
        .env("SHELL", "/bin/sh")
        .envs(environment.iter().copied())
        .stdin(Stdio::null())
        .output()
        .ok()?;
    Some(
        String::from_utf8(output.stdout)
            .unwrap()
            .replace("\r\n", "\n"),
    )
}

#[cfg(target_os = "linux")]
#[test]
fn a_terminal_shows_verdicts_in_colour_unless_told_not_to() {
    let (_folder, path) = stated(FAILS);
    let path = format!("'{}'", text(&path));
    let Some(coloured) = on_a_terminal(80, &path, &[]) else {
        eprintln!("not tried: `script` is not installed");
        return;
    };
    assert!(
        coloured.contains("verdict      \u{1b}[31mfail\u{1b}[0m: 1 of 2"),
        "{coloured}"
    );
    let plain = on_a_terminal(80, &path, &[("NO_COLOR", "1")]).unwrap();
    assert!(plain.contains("verdict      fail: 1 of 2"), "{plain}");
    assert!(!plain.contains('\u{1b}'));
    // An empty one asks for nothing (no-color.org).
    let empty = on_a_terminal(80, &path, &[("NO_COLOR", "")]).unwrap();
    assert_eq!(empty, coloured);
}

#[cfg(target_os = "linux")]
#[test]
fn a_wide_terminal_gets_wide_tables_and_a_narrow_one_those_of_the_page() {
    let (_folder, path) = stated(FAILS);
    let path = format!("'{}'", text(&path));
    let longest = |report: String| {
        report
            .lines()
            .map(|line| line.chars().count())
            .max()
            .unwrap()
    };
    let plain = [("NO_COLOR", "1")];
    let Some(page) = on_a_terminal(80, &path, &plain) else {
        eprintln!("not tried: `script` is not installed");
        return;
    };
    assert_eq!(on_a_terminal(40, &path, &plain).as_ref(), Some(&page));
    let wide = on_a_terminal(132, &path, &plain).unwrap();
    assert!(wide.lines().count() < page.lines().count());
    let wide = longest(wide);
    assert!((81..=132).contains(&wide), "{wide}");
}
