//! What is said of combinations that cannot be solved, do not prove themselves, or leave something
//! open.

use super::solving::Said;
use crate::job::Problem;
use crate::model::{Combination, Member, Model, Name, Place, Remark};
use crate::quantity::{Dimension, Style};
use crate::result::Residuals;
use crate::solve::{AssemblySolution, Solution, SolveError};

/// Above this an assembly is almost a mechanism: more than half of the digits are lost.
const ALMOST_A_MECHANISM: f64 = 1e8;

/// So many free motions of a combination are put into words.
const MOTIONS: usize = 12;

/// A combination that has no solution, at the table that it is about.
pub(super) fn unsolved(
    error: &SolveError,
    model: &Model,
    combination: &Combination,
    style: Style,
) -> Problem {
    let name = &combination.name;
    let (message, help) = match error {
        SolveError::Pushed {
            member,
            part,
            newtons,
            toward,
        } => (
            format!(
                "in `{name}` nothing holds member `{member}` {part}against {} toward its {toward}: it would slide away",
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
                "in `{name}` the movements of the supports of member `{member}` at `{first}` contradict each other",
            ),
            "mend the movements, or give one of the supports a stiffness",
        ),
        SolveError::Contradiction { .. } => (
            format!("in `{name}`: {error}"),
            "give one of them, or what lies between, a stiffness, or mend the movements",
        ),
        SolveError::PointLoaded { .. } => (
            format!("in `{name}`: {error}"),
            "end the taper at a small dimension instead, or take the load off the point",
        ),
        SolveError::Unstable { motion } => (
            format!(
                "in `{name}` {}, and the loads push that way: nothing would stop it",
                motion.words(model, style)
            ),
            "hold it against that motion, tie it with a member, or balance the loads",
        ),
        SolveError::HoldsContradict {
            holds,
            bodies,
            members,
        } => (
            format!(
                "in `{name}` the movements of {} contradict each other: nothing between them can give way",
                contradicting(holds, bodies, members)
            ),
            "mend the movements, or make one of the holds a `spring` (a stop: with `stiffness`)",
        ),
        SolveError::Unsettled { parts } => (
            format!(
                "in `{name}` the states (taut or slack, bearing or open) of {parts} one-way members and stops hang on each other and were not found"
            ),
            "give rigid stops among them a `stiffness`, or check the parts of the assembly in jobs of their own",
        ),
        SolveError::OutOfRange { .. } | SolveError::PointOutOfRange { .. } => (
            format!("in `{name}`: {error}"),
            "look for a value that is too large or too small by many powers of ten",
        ),
    };
    let place = place_of(error, model).unwrap_or(&combination.place);
    let mut problem = Problem::new(place, message, Some(help.to_owned()));
    problem.combination = Some(name.clone());
    problem
}

/// "holds `a` and `b` and body `deck`".
fn contradicting(holds: &[Name], bodies: &[Name], members: &[Name]) -> String {
    let groups = [
        ("hold", "holds", holds),
        ("body", "bodies", bodies),
        ("member", "members", members),
    ];
    let said = groups.into_iter().filter(|(_, _, names)| !names.is_empty());
    let said = said.map(|(one, many, names)| {
        let word = if names.len() == 1 { one } else { many };
        format!(
            "{word} {}",
            list(names.iter().map(|name| format!("`{name}`")))
        )
    });
    list(said)
}

/// "a, b and c".
fn list(names: impl Iterator<Item = String>) -> String {
    let names: Vec<String> = names.collect();
    match &names[..] {
        [few @ .., last] if !few.is_empty() => format!("{} and {last}", few.join(", ")),
        _ => names.concat(),
    }
}

/// The table that an error is about; `None` where that is the combination's own.
fn place_of<'m>(error: &SolveError, model: &'m Model) -> Option<&'m Place> {
    let assembly = model.assembly.as_ref();
    match error {
        SolveError::Pushed { member, .. }
        | SolveError::Contradiction { member, .. }
        | SolveError::PointLoaded { member, .. }
        | SolveError::OutOfRange { member } => {
            let found = model.members.iter().find(|known| known.name == *member);
            found.map(|member| &member.place)
        }
        SolveError::Unstable { motion } => motion.place(model),
        SolveError::Unsettled { .. } => None,
        SolveError::HoldsContradict { holds, .. } => {
            let first = holds.first()?;
            let found = assembly?.holds.iter().find(|hold| hold.name == *first);
            found.map(|hold| &hold.place)
        }
        SolveError::PointOutOfRange { point } => {
            let found = assembly?.points.iter().find(|known| known.name == *point);
            found.map(|point| &point.place)
        }
    }
}

/// A result that does not close.
pub(super) fn unproven(
    whose: &str,
    residuals: Residuals,
    combination: &Combination,
    place: &Place,
) -> Problem {
    let message = format!(
        "in `{}` the result of {whose} does not prove itself: residuals of equilibrium {:.1e}, compatibility {:.1e}, energy {:.1e}, where {:.0e} is allowed",
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

fn said(about: String, what: String, text: String, caution: bool) -> Said {
    Said {
        what,
        remark: Remark {
            about,
            text,
            place: None,
            caution,
        },
    }
}

/// What a solved member leaves open: reactions that nothing decides, and what nothing holds and
/// nothing pushes.
pub(super) fn of_member<'a>(
    member: &'a Member,
    combination: &'a str,
    solution: &'a Solution,
) -> impl Iterator<Item = Said> + 'a {
    let about = || format!("member.{}", member.name);
    let names: Vec<String> = solution
        .undecided
        .iter()
        .map(|&support| format!("`{}`", member.supports[support].name))
        .collect();
    let undecided = (!names.is_empty()).then(|| {
        let shared = names.join(" and ");
        let text = format!(
            "in `{combination}` nothing decides how the rigid stops {shared} share their force: give one of them a `stiffness`"
        );
        said(about(), shared, text, false)
    });
    let free = solution.free.iter().map(move |(from, to)| {
        let part = if from == to {
            format!("at `{from}`")
        } else {
            format!("from `{from}` to `{to}`")
        };
        let text = format!(
            "in `{combination}` nothing holds it along its axis {part} and nothing pushes it there: it is set to where the member's ends move least"
        );
        said(about(), part, text, false)
    });
    undecided.into_iter().chain(free)
}

/// What a solved assembly leaves open: reactions that nothing decides, free motions, and whether it
/// is on the point of tipping or almost a mechanism.
pub(super) fn of_assembly(
    model: &Model,
    combination: &Combination,
    solution: &AssemblySolution,
    style: Style,
) -> Vec<Said> {
    let name = &combination.name;
    let mut all = Vec::new();
    if let Some(&first) = solution.undecided.first() {
        let mut holds: Vec<String> = solution
            .undecided
            .iter()
            .map(|&row| {
                format!(
                    "`{}` at `{}`",
                    solution.holds[row].name, solution.holds[row].point
                )
            })
            .collect();
        holds.dedup();
        let shared = list(holds.into_iter());
        let text = format!(
            "in `{name}` nothing decides how the rigid holds {shared} share their reactions: make one of them a `spring`, or give a stop a `stiffness`"
        );
        let hold = solution.holds[first].name.trim_start_matches("hold.");
        all.push(said(format!("hold.{hold}"), shared, text, false));
    }
    for free in solution.free.iter().take(MOTIONS) {
        let words = free.motion.words(model, style);
        let about = free.motion.about(model);
        if free.touching.is_empty() {
            let text = format!(
                "in `{name}` {words}: nothing holds it and nothing pushes it, so it is set to where the points move least"
            );
            all.push(said(about, words, text, false));
        } else {
            let touching = list(free.touching.iter().map(|name| format!("`{name}`")));
            let text = format!(
                "in `{name}` it is on the point of tipping: {words}, and one way only {touching} stops that, which touches without force"
            );
            all.push(said(about, words, text, true));
        }
    }
    if solution.free.len() > MOTIONS {
        let more = solution.free.len() - MOTIONS;
        let text = format!(
            "in `{name}` {more} more motions are free and not pushed: they are set to where the points move least"
        );
        all.push(said(
            "job".into(),
            format!("{more} more motions"),
            text,
            false,
        ));
    }
    if solution.condition > ALMOST_A_MECHANISM {
        let text = format!(
            "in `{name}` the assembly is almost a mechanism: a rounding of its stiffness comes out about {:.0e} times larger in its movements",
            solution.condition
        );
        all.push(said("job".into(), "almost a mechanism".into(), text, true));
    }
    all
}
