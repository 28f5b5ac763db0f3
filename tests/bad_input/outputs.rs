//! Outputs that cannot be written, and jobs that read but have no solution.

use super::{errors, program, said, status, text, tie};
use std::fs;
use tempfile::tempdir;

#[test]
fn an_output_is_whole_or_not_there() {
    let folder = tempdir().unwrap();
    let job = folder.path().join("job.toml");
    fs::write(&job, tie("")).unwrap();
    let before = fs::read(&job).unwrap();
    for (output, reason) in [
        (
            folder.path().join("none/report.json"),
            "folder does not exist",
        ),
        (folder.path().to_owned(), "it is a folder"),
        (job.clone(), "would replace a job"),
    ] {
        let run = program(&[
            "check",
            text(&job),
            "--format",
            "json",
            "--output",
            text(&output),
        ]);
        assert_eq!(status(&run), 2, "{}", errors(&run));
        assert!(errors(&run).contains(reason), "{}", errors(&run));
        assert!(run.stdout.is_empty());
    }
    assert_eq!(fs::read(&job).unwrap(), before);
    assert_eq!(
        fs::read_dir(folder.path()).unwrap().count(),
        1,
        "nothing is left lying about"
    );
}

#[test]
fn a_report_of_errors_is_written_whole() {
    let folder = tempdir().unwrap();
    let job = folder.path().join("job.toml");
    let report = folder.path().join("report.json");
    fs::write(&job, tie("x = 1")).unwrap();
    let run = program(&[
        "check",
        text(&job),
        "--format",
        "json",
        "--output",
        text(&report),
    ]);
    assert_eq!(status(&run), 3);
    let document: serde_json::Value = serde_json::from_slice(&fs::read(&report).unwrap()).unwrap();
    assert_eq!(document["jobs"][0]["errors"][0]["line"], 4);
}

#[test]
fn a_free_member_that_a_load_pushes_is_named_with_its_direction() {
    let job = tie("load = [{ at = \"end\", force = \"3 kN\" }]").replace("start = \"fixed\"\n", "");
    let said = said(job);
    assert_eq!(
        said,
        "1:1 in `all` nothing holds member `tie` against 3.000 kN toward its end: it would slide \
         away | hold it with a support that works in that direction, or balance the load"
    );
}

#[test]
fn fixed_supports_that_are_moved_apart_with_nothing_between_are_an_error() {
    let job = r#"[member.tie]
end = "fixed"
segment = [
  { name = "a", length = "1 m", section = { round = "20 mm" }, material = "steel-s355" },
  { gap = "1 mm" },
]
support = [{ name = "k", at = "a.end", fixed = true }]
load = [{ movement = "-3 mm", at = "end" }]
"#;
    let said = said(job);
    assert!(
        said.starts_with("1:1 in `all`: the supports of member `tie`"),
        "{said}"
    );
    assert!(said.contains("contradict each other"), "{said}");
}
