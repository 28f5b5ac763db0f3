//! Folders, links and files that cannot be read.

use super::{errors, program, status, text, tie};
use std::fs;
use tempfile::tempdir;

#[cfg(unix)]
#[test]
fn a_link_that_loops_is_passed_over_and_named() {
    use std::os::unix::fs::symlink;
    let folder = tempdir().unwrap();
    let inner = folder.path().join("inner");
    fs::create_dir(&inner).unwrap();
    fs::write(inner.join("job.toml"), tie("")).unwrap();
    symlink(folder.path(), inner.join("back")).unwrap();
    let output = program(&["check", text(folder.path()), "--brief"]);
    assert_eq!(status(&output), 0, "{}", errors(&output));
    assert!(
        errors(&output).contains("leads back to"),
        "{}",
        errors(&output)
    );
}

#[cfg(unix)]
#[test]
fn a_link_to_itself_is_an_error() {
    use std::os::unix::fs::symlink;
    let folder = tempdir().unwrap();
    let link = folder.path().join("job.toml");
    symlink(&link, &link).unwrap();
    let output = program(&["check", text(&link)]);
    assert!(matches!(status(&output), 2 | 3), "{}", errors(&output));
    assert!(errors(&output).contains("job.toml"), "{}", errors(&output));
}

/// Who may do anything is told nothing by rights; the check then says so of the file itself.
#[cfg(unix)]
#[test]
fn a_folder_without_rights_is_an_error() {
    use std::os::unix::fs::PermissionsExt;
    let folder = tempdir().unwrap();
    let closed = folder.path().join("closed");
    fs::create_dir(&closed).unwrap();
    fs::write(closed.join("job.toml"), tie("")).unwrap();
    fs::write(folder.path().join("open.toml"), tie("")).unwrap();
    fs::set_permissions(&closed, fs::Permissions::from_mode(0o000)).unwrap();
    let rights_count = fs::read_dir(&closed).is_err();
    let output = program(&["check", text(folder.path()), "--brief"]);
    fs::set_permissions(&closed, fs::Permissions::from_mode(0o755)).unwrap();
    if rights_count {
        assert_eq!(status(&output), 3, "{}", errors(&output));
        assert!(errors(&output).contains("closed"), "{}", errors(&output));
    } else {
        assert_eq!(status(&output), 0, "{}", errors(&output));
    }
    let told = String::from_utf8_lossy(&output.stdout).into_owned();
    assert!(
        told.contains("open.toml"),
        "the other job is checked all the same: {told}"
    );
}

#[test]
fn one_bad_file_stops_no_other() {
    let folder = tempdir().unwrap();
    fs::write(folder.path().join("a.toml"), "[member.m\n").unwrap();
    fs::write(
        folder.path().join("b.toml"),
        b"[member.m]\nnote = \"\xff\"\n",
    )
    .unwrap();
    fs::write(folder.path().join("c.toml"), tie("")).unwrap();
    let output = program(&["check", text(folder.path()), "--format", "json"]);
    assert_eq!(status(&output), 3);
    let document: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    let statuses: Vec<&str> = document["jobs"]
        .as_array()
        .unwrap()
        .iter()
        .map(|job| job["status"].as_str().unwrap())
        .collect();
    assert_eq!(statuses, ["error", "error", "unchecked"]);
    assert_eq!(document["counts"]["errors"], 2);
}
