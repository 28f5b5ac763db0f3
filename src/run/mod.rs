//! One job from its bytes to its finished result: read, solve, prove, check.

mod materials;
mod solving;
#[cfg(test)]
mod tests;
mod words;

use crate::check::{self, Observed};
use crate::job::{self, Problem, Source};
use crate::model::{Model, Remark};
use crate::quantity::Style;
use crate::result::{Caution, ErrorEntry, JobResult, JobStatus, Note, Verdict};

/// How many errors a result holds; the rest are counted.
const ERRORS_KEPT: usize = 1000;

/// What checking one job came to.
#[derive(Debug, Clone, PartialEq)]
pub struct JobRun {
    /// The finished result; its digest is left to the report that prints one.
    pub result: JobResult,
    /// Its errors drawn as text, each at its place in the file; empty where there are none.
    pub drawn_errors: String,
}

/// Reads, solves, proves and checks the job in `bytes`; `file` is what messages call it.
///
/// Never fails as a whole: what is wrong with the job stands in the result's errors.
pub fn check_bytes(file: &str, bytes: &[u8]) -> JobRun {
    match job::decode(bytes) {
        Ok(text) => run(file, &text),
        Err(undecoded) => {
            let source = Source::new(file, undecoded.text);
            unread(file, &source, &[undecoded.problem])
        }
    }
}

/// The finished result of the job in `text`; see [`check_bytes`].
pub fn check_text(file: &str, text: &str) -> JobResult {
    run(file, text).result
}

fn run(file: &str, text: &str) -> JobRun {
    let source = Source::new(file, text);
    match job::read(&source.text) {
        Ok(model) => solve_and_check(&source, &model),
        Err(problems) => unread(file, &source, &problems),
    }
}

/// A job that could not be read.
fn unread(file: &str, source: &Source, problems: &[Problem]) -> JobRun {
    let mut result = JobResult::empty(file);
    let drawn_errors = put_errors(&mut result, source, problems);
    JobRun {
        result,
        drawn_errors,
    }
}

/// Enters problems into a result that then is an error, and draws them.
fn put_errors(result: &mut JobResult, source: &Source, problems: &[Problem]) -> String {
    result.status = JobStatus::Error;
    result.errors_total = problems.len();
    let entry = |problem: &Problem| {
        let (line, column) = source.line_and_column(&problem.place);
        ErrorEntry {
            message: problem.message.clone(),
            line: Some(line),
            column: Some(column),
            help: problem.help.clone(),
            combination: problem.combination.clone(),
        }
    };
    result.errors = problems.iter().take(ERRORS_KEPT).map(entry).collect();
    job::render::draw_all(problems, source)
}

fn solve_and_check(source: &Source, model: &Model) -> JobRun {
    let style = Style {
        units: model.units,
        ..Style::default()
    };
    let mut solved = solving::combinations(model, style);
    let line_of = |place: &crate::model::Place| source.line_and_column(place).0;
    let lines = lines_of(
        &source.text,
        model.limits.iter().map(|limit| limit.place.start),
    );
    let observed: Vec<Observed> = (0..solved.results.len())
        .map(|at| Observed {
            index: solved.indices[at],
            result: &solved.results[at],
            zeros: &solved.zeros[at],
            assembly: solved.assembly_zeros[at],
        })
        .collect();
    let checks: Vec<_> = (0..observed.len())
        .map(|at| check::combination(model, &observed, at, &lines))
        .collect();
    let envelope = check::envelope(model, &observed);
    let mut remarks = check::cautions(model, &observed);
    remarks.extend(model.remarks.iter().cloned());
    remarks.extend(tolerances(model));
    remarks.append(&mut solved.remarks);
    for (result, checks) in solved.results.iter_mut().zip(checks) {
        result.checks = checks;
    }

    let governing = check::governing(&solved.results);
    let heading = &model.heading;
    let mut result = JobResult {
        title: heading.title.clone(),
        reference: heading.reference.clone(),
        prepared_by: heading.prepared_by.clone(),
        checked_by: heading.checked_by.clone(),
        date: heading.date.clone(),
        note: heading.note.clone(),
        datum: model.datum.map(|datum| datum.value),
        units: model.units,
        warnings: check::warnings(&governing),
        governing,
        envelope,
        materials: model.materials.iter().map(materials::entry).collect(),
        ..JobResult::empty(&source.file)
    };
    for remark in remarks {
        if remark.caution {
            let line = remark.place.as_ref().map(line_of);
            result.cautions.push(Caution {
                about: remark.about,
                text: remark.text,
                line,
            });
        } else {
            result.notes.push(Note {
                about: remark.about,
                text: remark.text,
            });
        }
    }
    result.combinations = solved.results;
    result.status = status(&result);
    let drawn_errors = if solved.problems.is_empty() {
        String::new()
    } else {
        put_errors(&mut result, source, &solved.problems)
    };
    JobRun {
        result,
        drawn_errors,
    }
}

/// The line of each place. Places mostly come in the order of the text, so that it is counted
/// through once.
fn lines_of(text: &str, places: impl Iterator<Item = usize>) -> Vec<usize> {
    let (mut at, mut line) = (0, 1);
    let line_at = |place: usize| {
        let place = place.min(text.len());
        if place < at {
            (at, line) = (0, 1);
        }
        line += text.as_bytes()[at..place]
            .iter()
            .filter(|&&byte| byte == b'\n')
            .count();
        at = place;
        line
    };
    places.map(line_at).collect()
}

/// Where tolerances are written, that the nominal values were used.
fn tolerances(model: &Model) -> Option<Remark> {
    let first = model.tolerances.first()?;
    let text = match model.tolerances.len() {
        1 => "one value bears a tolerance: its nominal value was used".to_owned(),
        count => format!("{count} values bear tolerances: their nominal values were used"),
    };
    Some(Remark {
        about: "job".into(),
        text,
        place: Some(first.clone()),
        caution: false,
    })
}

fn status(result: &JobResult) -> JobStatus {
    let mut checks = result
        .combinations
        .iter()
        .flat_map(|combination| &combination.checks)
        .peekable();
    if checks.peek().is_none() {
        JobStatus::Unchecked
    } else if checks.any(|check| check.status == Verdict::Fail) {
        JobStatus::Fail
    } else {
        JobStatus::Pass
    }
}
