//! One job from its bytes to its finished result: read, solve, prove, check.

use crate::check::{self, Observed};
use crate::job::{self, Problem, Source};
use crate::model::{Combination, Member, Model, Name, Place, Remark};
use crate::proof;
use crate::quantity::{Dimension, Style};
use crate::result::{
    Caution, CombinationResult, ErrorEntry, JobResult, JobStatus, MaterialEntry, Note, Residuals,
    Verdict, YieldRow,
};
use crate::solve::{self, Solution, SolveError, Stiffness, Threshold};

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
    let mut solved = Solved::default();
    let plain = model
        .combinations
        .iter()
        .find(|combination| combination.modulus.is_empty());
    let stiffness = plain.map(|plain| {
        let of = |member| Stiffness::of(model, member, plain);
        model.members.iter().map(of).collect::<Vec<_>>()
    });
    for index in 0..model.combinations.len() {
        solved.combination(model, index, stiffness.as_deref(), style);
    }
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
        materials: model.materials.iter().map(material_entry).collect(),
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

/// What the combinations came to; one that cannot be solved is a problem and has no result.
#[derive(Default)]
struct Solved {
    /// The index of each result in the model's combinations.
    indices: Vec<usize>,
    results: Vec<CombinationResult>,
    zeros: Vec<Vec<Threshold>>,
    assembly_zeros: Vec<Threshold>,
    problems: Vec<Problem>,
    remarks: Vec<Remark>,
}

impl Solved {
    /// `stiffness` is that of the members in combinations without factors on moduli.
    fn combination(
        &mut self,
        model: &Model,
        index: usize,
        stiffness: Option<&[Stiffness]>,
        style: Style,
    ) {
        let combination = &model.combinations[index];
        let (mut members, mut zeros) = (
            Vec::with_capacity(model.members.len()),
            Vec::with_capacity(model.members.len()),
        );
        let mut residuals = Residuals::default();
        let problems = self.problems.len();
        for (at, member) in model.members.iter().enumerate() {
            let place = &member.place;
            let solution = match stiffness {
                Some(stiffness) if combination.modulus.is_empty() => {
                    solve::member_of(model, member, combination, &stiffness[at])
                }
                _ => solve::member(model, member, combination),
            };
            match solution {
                Ok(mut solution) => {
                    let own = proof::member(model, member, combination, &solution.member);
                    if !own.prove() {
                        self.problems
                            .push(unproven(member.name.as_ref(), own, combination, place));
                    }
                    residuals = residuals.worse(own);
                    self.leave_undecided(member, &combination.name, &mut solution);
                    self.note_free(member.name.as_ref(), &combination.name, &solution.free);
                    members.push(solution.member);
                    zeros.push(solution.zero);
                }
                Err(error) => self
                    .problems
                    .push(unsolved(&error, combination, place, style)),
            }
        }
        if self.problems.len() > problems {
            return;
        }
        let factor = |&case: &usize| (model.cases[case].name.clone(), combination.factors[case]);
        self.indices.push(index);
        self.zeros.push(zeros);
        self.assembly_zeros.push(Threshold::default());
        let mut result = CombinationResult {
            name: combination.name.clone(),
            purpose: combination.purpose,
            factors: combination.shown.iter().map(factor).collect(),
            without: Vec::new(),
            members,
            points: Vec::new(),
            holds: Vec::new(),
            bodies: Vec::new(),
            watches: Vec::new(),
            totals: None,
            residuals,
            checks: Vec::new(),
        };
        result.watches = check::watches(model, combination, &result);
        self.results.push(result);
    }

    /// Takes back the reactions of rigid stops that share a force in a way that nothing decides,
    /// once the proof has had their split of least size.
    fn leave_undecided(&mut self, member: &Member, combination: &str, solution: &mut Solution) {
        for &support in &solution.undecided {
            solution.member.supports[support].reaction = None;
        }
        let names: Vec<String> = solution
            .undecided
            .iter()
            .map(|&support| format!("`{}`", member.supports[support].name))
            .collect();
        if names.is_empty() {
            return;
        }
        let about = format!("member.{}", member.name);
        let shared = names.join(" and ");
        if !self
            .remarks
            .iter()
            .any(|remark| remark.about == about && remark.text.contains(&shared))
        {
            self.remarks.push(Remark {
                about,
                text: format!(
                    "in `{combination}` nothing decides how the rigid stops {shared} share their force: give one of them a `stiffness`"
                ),
                place: None,
                caution: false,
            });
        }
    }

    /// Says what nothing holds and nothing pushes, each free part of a member once.
    fn note_free(&mut self, member: &str, combination: &str, free: &[(Name, Name)]) {
        for (from, to) in free {
            let part = if from == to {
                format!("at `{from}`")
            } else {
                format!("from `{from}` to `{to}`")
            };
            let about = format!("member.{member}");
            let known = |remark: &Remark| remark.about == about && remark.text.contains(&part);
            if self.remarks.iter().any(known) {
                continue;
            }
            self.remarks.push(Remark {
                about,
                text: format!(
                    "in `{combination}` nothing holds it along its axis {part} and nothing pushes it there: it is set to where the member's ends move least"
                ),
                place: None,
                caution: false,
            });
        }
    }
}

/// A combination that has no solution.
fn unsolved(error: &SolveError, combination: &Combination, place: &Place, style: Style) -> Problem {
    let (message, help) = match error {
        SolveError::Pushed {
            member,
            part,
            newtons,
            toward,
        } => (
            format!(
                "in `{}` nothing holds member `{member}` {part}against {} toward its {toward}: it would slide away",
                combination.name,
                style.quantity(Dimension::Force, *newtons),
            ),
            "hold it with a support that works in that direction, or balance the load",
        ),
        SolveError::Contradiction {
            member,
            first,
            last,
        } if first == last => (
            format!(
                "in `{}` the movements of the supports of member `{member}` at `{first}` contradict each other",
                combination.name
            ),
            "mend the movements, or give one of the supports a stiffness",
        ),
        SolveError::Contradiction { .. } => (
            format!("in `{}`: {error}", combination.name),
            "give one of them, or what lies between, a stiffness, or mend the movements",
        ),
        SolveError::PointLoaded { .. } => (
            format!("in `{}`: {error}", combination.name),
            "end the taper at a small dimension instead, or take the load off the point",
        ),
        SolveError::OutOfRange { .. } => (
            format!("in `{}`: {error}", combination.name),
            "look for a value that is too large or too small by many powers of ten",
        ),
    };
    let mut problem = Problem::new(place, message, Some(help.to_owned()));
    problem.combination = Some(combination.name.clone());
    problem
}

/// A result that does not close.
fn unproven(
    member: &str,
    residuals: Residuals,
    combination: &Combination,
    place: &Place,
) -> Problem {
    let message = format!(
        "in `{}` the result of member `{member}` does not prove itself: residuals of equilibrium {:.1e}, compatibility {:.1e}, energy {:.1e}, where {:.0e} is allowed",
        combination.name,
        residuals.equilibrium,
        residuals.compatibility,
        residuals.energy,
        Residuals::LIMIT,
    );
    let help = "look for stiffnesses or lengths that differ by very many powers of ten".to_owned();
    let mut problem = Problem::new(place, message, Some(help));
    problem.combination = Some(combination.name.clone());
    problem
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

fn material_entry(material: &crate::catalogue::Material) -> MaterialEntry {
    MaterialEntry {
        id: material.id.clone(),
        modulus: material.modulus.value,
        expansion: material.expansion.map(|value| value.value),
        density: material.density.map(|value| value.value),
        yield_strength: match material.yield_strength[..] {
            [(None, strength)] => Some(strength.value),
            _ => None,
        },
        yield_by_thickness: match material.yield_strength[..] {
            [(None, _)] => Vec::new(),
            ref rows => rows
                .iter()
                .map(|&(thickness, strength)| YieldRow {
                    thickness: thickness.map(|t| t.value),
                    yield_strength: strength.value,
                })
                .collect(),
        },
        ultimate: material.ultimate.map(|value| value.value),
        proof: material.proof.map(|value| value.value),
        crushing: material.crushing.map(|value| value.value),
        family: material.family.clone(),
        source: material.source.clone(),
        like: material.like.clone(),
    }
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
