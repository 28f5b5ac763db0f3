//! Runs over folders with a checker that knows the job by its text.

use super::*;
use crate::quantity::from_si;
use crate::report::sample;
use crate::result::Document;
use std::fs;
use std::path::Path;
use tempfile::TempDir;

/// Finds in the text what the job is to come to.
fn stand_in(file: &str, bytes: &[u8]) -> JobRun {
    let text = String::from_utf8_lossy(bytes);
    let mut result = match text.trim_start_matches("[job]\n# ").trim_end() {
        "fails" => sample::failing(),
        "unchecked" => sample::unchecked(),
        "panics" => panic!("a job that the checker cannot bear"),
        "not finite" => {
            let mut result = sample::failing();
            result.combinations[0].residuals.energy = f64::NAN;
            result
        }
        "passes" => {
            let mut result = sample::failing();
            result.status = JobStatus::Pass;
            result.combinations[0].members[0].elongation = from_si(0.1 + 0.2);
            result
        }
        _ => sample::unreadable(),
    };
    result.file = file.to_owned();
    let drawn_errors = match result.status {
        JobStatus::Error => format!("drawn errors of {file}\n"),
        _ => String::new(),
    };
    JobRun {
        result,
        drawn_errors,
    }
}

/// A folder of jobs, each `[job]` and a word for the stand-in.
fn folder(jobs: &[(&str, &str)]) -> TempDir {
    let folder = tempfile::tempdir().unwrap();
    for (path, word) in jobs {
        let path = folder.path().join(path);
        fs::create_dir_all(path.parent().unwrap()).unwrap();
        fs::write(path, format!("[job]\n# {word}\n")).unwrap();
    }
    folder
}

struct Ended {
    status: Status,
    out: String,
    errors: String,
}

/// Runs `lengthwise check` with these arguments; `input` is its standard input.
fn check_with_input(arguments: &[&str], input: &str) -> Ended {
    use clap::Parser;
    let arguments = ["lengthwise", "check"].iter().chain(arguments);
    let parsed = crate::cli::Arguments::try_parse_from(arguments).unwrap();
    let crate::cli::Command::Check(arguments) = parsed.command;
    let (mut out, mut errors) = (Vec::new(), Vec::new());
    let mut console = Console {
        input: &mut input.as_bytes(),
        out: &mut out,
        errors: &mut errors,
        width: 80,
        colour: false,
    };
    let status = run(&arguments.plan().unwrap(), &mut console, stand_in);
    Ended {
        status,
        out: String::from_utf8(out).unwrap(),
        errors: String::from_utf8(errors).unwrap(),
    }
}

fn check(arguments: &[&str]) -> Ended {
    check_with_input(arguments, "")
}

fn text(path: &Path) -> &str {
    path.to_str().unwrap()
}

/// The verdicts of a brief, and the files' own names.
fn lines(ended: &Ended) -> Vec<(String, String)> {
    let lines = ended.out.lines().take_while(|line| !line.is_empty());
    lines
        .map(|line| {
            let mut words = line.split_whitespace();
            let verdict = words.next().unwrap().to_owned();
            let file = words.find(|word| word.ends_with(".toml")).unwrap();
            (verdict, file.rsplit('/').next().unwrap().to_owned())
        })
        .collect()
}

#[test]
fn the_status_is_the_gravest_that_occurred() {
    for (words, status) in [
        (&["passes"][..], Status::Holds),
        (&["unchecked", "passes"], Status::Holds),
        (&["passes", "fails", "unchecked"], Status::Fails),
        (&["broken", "fails"], Status::Unsolved),
    ] {
        let jobs: Vec<(String, &str)> = (0..)
            .map(|n| format!("{n}.toml"))
            .zip(words.iter().copied())
            .collect();
        let jobs: Vec<(&str, &str)> = jobs
            .iter()
            .map(|(path, word)| (path.as_str(), *word))
            .collect();
        let folder = folder(&jobs);
        assert_eq!(check(&[text(folder.path())]).status, status, "{words:?}");
    }
}

#[test]
fn a_job_without_checks_fails_where_checks_are_required() {
    let folder = folder(&[("a.toml", "unchecked")]);
    let ended = check(&[text(folder.path()), "--require-checks"]);
    assert_eq!(ended.status, Status::Fails);
}

#[test]
fn jobs_are_found_at_any_depth_in_order_and_hidden_ones_left_alone() {
    let folder = folder(&[
        ("b/2.toml", "passes"),
        ("b/1.toml", "fails"),
        ("a.toml", "unchecked"),
        (".hidden.toml", "fails"),
        (".git/c.toml", "fails"),
        ("notes.txt", "fails"),
    ]);
    let ended = check(&[text(folder.path()), "--brief"]);
    let expected = [
        ("unchecked", "a.toml"),
        ("fail", "1.toml"),
        ("pass", "2.toml"),
    ];
    let expected = expected.map(|(verdict, file)| (verdict.to_owned(), file.to_owned()));
    assert_eq!(lines(&ended), expected);
    assert!(ended.out.contains("\nLooked at 3 files, "), "{}", ended.out);
    assert_eq!(ended.errors, "");
}

#[test]
fn a_hidden_folder_that_is_named_is_looked_into() {
    let folder = folder(&[(".jobs/a.toml", "passes")]);
    let ended = check(&[text(&folder.path().join(".jobs")), "--brief"]);
    assert_eq!(lines(&ended).len(), 1);
}

#[test]
fn a_file_that_is_no_job_is_named_and_not_counted() {
    let folder = folder(&[("a.toml", "passes")]);
    fs::write(folder.path().join("tool.toml"), "[tool]\nmember_of = 1\n").unwrap();
    let ended = check(&[text(folder.path()), "--brief"]);
    assert_eq!(ended.status, Status::Holds);
    assert_eq!(lines(&ended).len(), 1);
    assert!(
        ended.errors.starts_with("passed over: "),
        "{}",
        ended.errors
    );
    assert!(
        ended.errors.contains("tool.toml: no job"),
        "{}",
        ended.errors
    );
}

#[test]
fn a_file_that_is_not_toml_may_be_meant_as_a_job_and_is_an_error() {
    let folder = folder(&[("a.toml", "passes")]);
    fs::write(folder.path().join("utf16.toml"), b"\xff\xfe[\0j\0").unwrap();
    fs::write(folder.path().join("broken.toml"), "title = \n").unwrap();
    let ended = check(&[text(folder.path()), "--brief"]);
    assert_eq!(ended.status, Status::Unsolved);
    assert_eq!(lines(&ended).len(), 3);
}

#[test]
fn a_folder_without_a_job_is_refused_before_any_work_or_once_that_is_known() {
    let empty = folder(&[("notes.txt", "passes")]);
    let jobs = folder(&[("a.toml", "passes")]);
    let ended = check(&[text(jobs.path()), text(empty.path())]);
    assert_eq!((ended.status, ended.out.as_str()), (Status::Refused, ""));
    assert!(ended.errors.contains("no job file in this folder"));

    fs::write(empty.path().join("tool.toml"), "[tool]\n").unwrap();
    let ended = check(&[text(empty.path()), "--format", "json"]);
    assert_eq!((ended.status, ended.out.as_str()), (Status::Refused, ""));
    assert!(ended.errors.contains("no job file in this folder"));
}

#[test]
fn each_file_is_checked_once_by_whatever_way_it_is_named() {
    let folder = folder(&[("a.toml", "passes"), ("b.toml", "passes")]);
    let a = folder.path().join("a.toml");
    let roundabout = folder
        .path()
        .join("../")
        .join(folder.path().file_name().unwrap());
    let ended = check(&[
        text(&a),
        text(folder.path()),
        text(&roundabout),
        text(&a),
        "--brief",
    ]);
    assert_eq!(lines(&ended).len(), 2, "{}", ended.out);
    assert_eq!((ended.status, ended.errors.as_str()), (Status::Holds, ""));
}

#[cfg(unix)]
#[test]
fn links_are_followed_and_those_that_loop_or_lead_nowhere_are_named() {
    use std::os::unix::fs::symlink;
    let elsewhere = folder(&[("c.toml", "passes")]);
    let folder = folder(&[("a.toml", "passes"), ("sub/b.toml", "passes")]);
    let at = |name: &str| folder.path().join(name);
    symlink(folder.path(), at("sub/loop")).unwrap();
    symlink(at("a.toml"), at("again.toml")).unwrap();
    symlink(elsewhere.path(), at("linked")).unwrap();
    symlink(at("nothing"), at("dead")).unwrap();
    let ended = check(&[text(folder.path()), "--brief"]);
    assert_eq!(ended.status, Status::Holds, "{}", ended.errors);
    assert_eq!(lines(&ended).len(), 3, "{}", ended.out);
    assert!(
        ended.errors.contains("loop: leads back to"),
        "{}",
        ended.errors
    );
    assert!(
        ended.errors.contains("dead: a link that leads nowhere"),
        "{}",
        ended.errors
    );

    // Called like a job, it may hide one.
    symlink(at("nothing"), at("dead.toml")).unwrap();
    assert_eq!(check(&[text(folder.path())]).status, Status::Unsolved);
}

#[test]
fn a_panic_in_one_job_is_its_error_and_ends_no_other() {
    let folder = folder(&[
        ("a.toml", "panics"),
        ("b.toml", "not finite"),
        ("c.toml", "fails"),
    ]);
    let ended = check(&[text(folder.path()), "--brief"]);
    assert_eq!(ended.status, Status::Unsolved);
    let verdicts: Vec<String> = lines(&ended)
        .into_iter()
        .map(|(verdict, _)| verdict)
        .collect();
    assert_eq!(verdicts, ["error", "error", "fail"]);
    assert!(
        ended
            .errors
            .contains("please report it: `energy` is not a finite number")
    );
}

#[test]
fn standard_input_is_a_job() {
    let ended = check_with_input(&["-", "-"], "[job]\n# fails\n");
    assert_eq!(ended.status, Status::Fails);
    assert!(
        ended.out.contains("\nfile         standard input\n"),
        "{}",
        ended.out
    );
    assert!(ended.out.contains("\nLooked at 1 file, "), "{}", ended.out);
}

#[test]
fn errors_are_drawn_beside_the_results_and_stand_within_json_too() {
    let folder = folder(&[("a.toml", "broken"), ("b.toml", "passes")]);
    let as_text = check(&[text(folder.path())]);
    assert!(as_text.errors.starts_with("drawn errors of "));
    assert!(!as_text.out.contains("drawn errors"));

    let json = check(&[text(folder.path()), "--format", "json"]);
    assert_eq!(json.errors, as_text.errors);
    let document: Document = serde_json::from_str(&json.out).unwrap();
    assert_eq!(document.jobs[0].errors.len(), 2);
    // sha256sum of the bytes `[job]`, line feed, `# passes`, line feed.
    let digest = document.jobs[1].digest.as_deref().unwrap();
    assert_eq!(
        digest,
        "sha256:883583b2e252e6f86f9bf74c8cea1bf645527fabcc1254a80006a1228c3f40bc"
    );
    let elongation = document.jobs[1].combinations[0].members[0].elongation;
    assert_eq!(elongation.value.to_bits(), (0.1_f64 + 0.2).to_bits());
}

#[test]
fn a_blank_line_parts_the_errors_of_two_jobs() {
    let folder = folder(&[
        ("a.toml", "broken"),
        ("b.toml", "passes"),
        ("c.toml", "broken"),
    ]);
    let ended = check(&[text(folder.path()), "--brief"]);
    let lines: Vec<&str> = ended.errors.lines().collect();
    assert_eq!(lines.len(), 3, "{}", ended.errors);
    assert!(lines[0].ends_with("a.toml") && lines[1].is_empty() && lines[2].ends_with("c.toml"));
}

#[test]
fn csv_has_one_header_for_all_jobs() {
    let folder = folder(&[("a.toml", "fails"), ("b.toml", "passes")]);
    let ended = check(&[text(folder.path()), "--format", "csv", "--table", "members"]);
    assert_eq!(ended.out.lines().count(), 1 + 2 + 2);
    assert_eq!(ended.out.matches("file,combination,member").count(), 1);
}

#[test]
fn an_output_holds_what_standard_output_would_have() {
    let folder = folder(&[("a.toml", "fails")]);
    let job = folder.path().join("a.toml");
    let report = folder.path().join("report.txt");
    let printed = check(&[text(&job)]);
    let written = check(&[text(&job), "--output", text(&report)]);
    assert_eq!(written.status, Status::Fails);
    assert_eq!(written.out, "");
    assert_eq!(fs::read_to_string(report).unwrap(), printed.out);
}

#[test]
fn an_output_over_an_input_is_refused_and_the_input_kept() {
    let folder = folder(&[("a.toml", "fails"), ("b.toml", "fails")]);
    let job = folder.path().join("b.toml");
    let before = fs::read(&job).unwrap();
    let ended = check(&[text(folder.path()), "--output", text(&job)]);
    assert_eq!((ended.status, ended.out.as_str()), (Status::Refused, ""));
    assert!(
        ended.errors.contains("would replace a job"),
        "{}",
        ended.errors
    );
    assert_eq!(fs::read(&job).unwrap(), before);
}

/// Takes so many bytes and then fails as a pipe that nobody reads, or a full disk.
struct Short(usize, io::ErrorKind);

impl Write for Short {
    fn write(&mut self, bytes: &[u8]) -> io::Result<usize> {
        let taken = bytes.len().min(self.0);
        self.0 -= taken;
        if taken == 0 {
            Err(self.1.into())
        } else {
            Ok(taken)
        }
    }

    fn flush(&mut self) -> io::Result<()> {
        Ok(())
    }
}

#[test]
fn a_closed_pipe_ends_quietly_and_a_full_disk_is_told() {
    let folder = folder(&[("a.toml", "fails"), ("b.toml", "fails")]);
    for (kind, status, told) in [
        (io::ErrorKind::BrokenPipe, Status::Fails, false),
        (io::ErrorKind::StorageFull, Status::Refused, true),
    ] {
        for form in [
            Form::Whole,
            Form::Brief,
            Form::Csv(csv::Table::Stations),
            Form::Json,
        ] {
            let plan = Plan {
                paths: vec![folder.path().to_owned()],
                form,
                output: None,
                digits: 4,
                require_checks: false,
            };
            let mut errors = Vec::new();
            let mut console = Console {
                input: &mut io::empty(),
                out: &mut Short(20, kind),
                errors: &mut errors,
                width: 80,
                colour: false,
            };
            assert_eq!(run(&plan, &mut console, stand_in), status, "{form:?}");
            assert_eq!(!errors.is_empty(), told, "{form:?}");
        }
    }
}
