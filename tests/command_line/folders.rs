//! Runs over folders: what is found, what is passed over, and what it all comes to.

use crate::{
    BROKEN, FAILS, PASSES, UNCHECKED, errors, folder, folder_of, lengthwise, printed, status, text,
};
use std::fs;

#[test]
fn a_folder_called_like_a_job_file_is_walked_into() {
    let folder = folder();
    fs::create_dir(folder.path().join("sub.toml")).unwrap();
    let output = lengthwise(&["check", text(folder.path()), "--brief"]);
    assert!(!errors(&output).contains("sub.toml"), "{}", errors(&output));
}

#[test]
fn one_bad_file_never_stops_the_others_and_each_has_its_line() {
    let folder = folder_of(&[
        ("a.toml", BROKEN),
        ("b.toml", FAILS),
        ("deep/er/c.toml", PASSES),
        ("deep/d.toml", UNCHECKED),
        ("e.toml", "this is no TOML"),
        (".hidden/f.toml", FAILS),
        ("tool.toml", "[tool]\nname = \"other\"\n"),
        ("notes.txt", "no job"),
    ]);
    let output = lengthwise(&["check", "--brief", text(folder.path())]);
    assert_eq!(status(&output), 3);
    let lines: Vec<&str> = printed(&output).lines().collect();
    let expected = [
        ("error", "a.toml", "2 errors, the first: "),
        ("fail", "b.toml", "elongation on tie, combination all"),
        ("unchecked", "deep/d.toml", ""),
        ("pass", "deep/er/c.toml", "on tie, combination all"),
        ("error", "e.toml", ""),
    ];
    for (line, (verdict, file, remark)) in lines.iter().zip(expected) {
        assert!(line.starts_with(&format!("{verdict} ")), "{line}");
        assert!(line.contains(file) && line.contains(remark), "{line}");
    }
    assert_eq!(lines.get(5), Some(&""), "one line a job, then the counts");
    let counts = lines[6..].join(" ");
    assert_eq!(
        counts,
        "Looked at 5 files, 3 members, 3 combinations and 4 checks: 3 pass, 1 fail; 1 job \
         unchecked; 3 errors."
    );
    let errors = errors(&output);
    assert!(errors.contains("tool.toml: no job: it has no `job`, `member` or `point` table"));
    assert!(
        !errors.contains("hidden") && !errors.contains("notes"),
        "{errors}"
    );
    let places = ["a.toml, line 2, ", "a.toml, line 4, ", "e.toml, line 1, "];
    let places = places.map(|place| errors.find(place).unwrap());
    assert!(
        places.is_sorted(),
        "errors stand in the order of files and lines: {errors}"
    );
}

#[test]
fn what_a_file_utilises_stands_in_one_column() {
    let folder = folder_of(&[("a.toml", PASSES), ("longer name.toml", FAILS)]);
    let output = lengthwise(&["check", "--brief", text(folder.path())]);
    let lines: Vec<&str> = printed(&output).lines().take(2).collect();
    for what in [" elongation on tie", text(folder.path())] {
        let columns: Vec<_> = lines.iter().map(|line| line.find(what)).collect();
        assert!(
            columns[0].is_some() && columns[0] == columns[1],
            "{lines:?}"
        );
    }
}

#[test]
fn a_file_named_twice_is_checked_once() {
    let folder = folder_of(&[("a.toml", PASSES), ("b.toml", FAILS)]);
    let a = folder.path().join("a.toml");
    let dotted = folder.path().join("./a.toml");
    let output = lengthwise(&[
        "check",
        "--brief",
        text(&a),
        text(&dotted),
        text(folder.path()),
    ]);
    assert!(
        printed(&output).contains("Looked at 2 files, "),
        "{}",
        printed(&output)
    );
}

#[cfg(unix)]
#[test]
fn a_link_to_nowhere_called_like_a_job_is_an_error_and_a_loop_is_told() {
    use std::os::unix::fs::symlink;
    let folder = folder_of(&[("a.toml", PASSES), ("sub/b.toml", PASSES)]);
    symlink(folder.path().join("gone"), folder.path().join("dead.toml")).unwrap();
    symlink(folder.path(), folder.path().join("sub/round")).unwrap();
    let output = lengthwise(&["check", "--brief", text(folder.path())]);
    assert_eq!(status(&output), 3, "it may hide a job");
    assert!(
        printed(&output).contains("Looked at 3 files, "),
        "{}",
        printed(&output)
    );
    let errors = errors(&output);
    assert!(errors.contains("dead.toml: cannot be read: "), "{errors}");
    assert!(errors.contains("round: leads back to "), "{errors}");
}

#[test]
fn whole_reports_of_a_folder_follow_one_another() {
    let folder = folder_of(&[("a.toml", PASSES), ("b.toml", BROKEN), ("c.toml", FAILS)]);
    let output = lengthwise(&["check", text(folder.path())]);
    let text = printed(&output);
    let verdicts: Vec<&str> = text
        .lines()
        .filter_map(|line| line.strip_prefix("verdict      ")?.split(':').next())
        .collect();
    assert_eq!(verdicts, ["pass", "error", "fail"]);
    assert_eq!(text.matches("Looked at 3 files, ").count(), 1);
}

#[test]
fn a_folder_beside_a_file_that_is_there_is_still_refused_without_a_job() {
    let folder = folder_of(&[("jobs/a.toml", PASSES), ("empty/notes.txt", "")]);
    let (jobs, empty) = (folder.path().join("jobs"), folder.path().join("empty"));
    let output = lengthwise(&["check", text(&jobs), text(&empty)]);
    assert_eq!(status(&output), 2);
    assert!(errors(&output).contains("empty: no job file in this folder"));
    assert!(fs::exists(&jobs).unwrap());
}
