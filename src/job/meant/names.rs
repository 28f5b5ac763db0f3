//! The names of members, points, bodies and holds: finding one, and that no two are alike.

use super::Meaning;
use super::lookup::Lookup;
use crate::job::nearest::remedy;
use crate::job::written::{Job, Written};
use std::collections::HashMap;

/// What bears a name that others say.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Root {
    Member,
    Point,
    Body,
    Hold,
}

impl Root {
    fn key(self) -> &'static str {
        match self {
            Root::Member => "member",
            Root::Point => "point",
            Root::Body => "body",
            Root::Hold => "hold",
        }
    }

    fn several(self) -> &'static str {
        match self {
            Root::Member => "members",
            Root::Point => "points",
            Root::Body => "bodies",
            Root::Hold => "holds with a name",
        }
    }
}

/// So many names are looked through for the nearest in one job: a file that is nothing but unknown
/// names would take hours otherwise.
const LOOKED_THROUGH: usize = 1_000_000;

/// The names of a job by what bears them.
pub(super) struct Names<'t> {
    members: Lookup<&'t str>,
    points: Lookup<&'t str>,
    bodies: Lookup<&'t str>,
    holds: Lookup<&'t str>,
    /// Which hold each of these names belongs to, since a hold may have none.
    held_by: Vec<usize>,
    /// How many names may still be looked through for the nearest.
    left: usize,
}

impl<'t> Names<'t> {
    pub(super) fn of(job: &Job<'t>) -> Self {
        let assembly = &job.assembly;
        let holds = assembly.holds.iter().enumerate();
        let holds = holds.filter_map(|(index, hold)| Some((index, hold.name.given()?.value)));
        let (held_by, holds) = holds.unzip();
        Names {
            members: Lookup::new(job.members.iter().map(|member| member.name.value).collect()),
            points: Lookup::new(
                assembly
                    .points
                    .iter()
                    .map(|point| point.name.value)
                    .collect(),
            ),
            bodies: Lookup::new(assembly.bodies.iter().map(|body| body.name.value).collect()),
            holds: Lookup::new(holds),
            held_by,
            left: LOOKED_THROUGH,
        }
    }
}

impl Meaning<'_, '_> {
    /// The index of what bears a name in the job's list of its kind; reports a name that none of
    /// them bears.
    pub(super) fn find(&mut self, root: Root, written: &Written<&str>) -> Option<usize> {
        let names = &mut self.names;
        let lookup = match root {
            Root::Member => &names.members,
            Root::Point => &names.points,
            Root::Body => &names.bodies,
            Root::Hold => &names.holds,
        };
        if let Some(index) = lookup.find(written.value) {
            return match root {
                Root::Hold => names.held_by.get(index).copied(),
                _ => Some(index),
            };
        }
        let (key, several, name) = (root.key(), root.several(), written.value);
        let many = lookup.names().len();
        let (message, help) = if many == 0 {
            let message = format!("this job has no {several}, and so none called `{name}`");
            let help = match root {
                Root::Hold => "give the hold that is meant a `name`".to_owned(),
                Root::Point => {
                    format!("add it to `[point]`, as in `{name} = [\"4.2 m\", \"3 m\"]`")
                }
                Root::Member | Root::Body => format!("add `[{key}.{name}]`"),
            };
            (message, Some(help))
        } else {
            let looks = names.left >= many;
            names.left = names.left.saturating_sub(many);
            let help = looks.then(|| remedy(name, lookup.texts(), &format!("the {several} are")));
            (format!("no {key} is called `{name}`"), help.flatten())
        };
        self.r.problems.unknown(key, &written.place, message, help);
        None
    }
}

/// Members, points, bodies, holds and watches share one set of names.
pub(super) fn differ(meaning: &mut Meaning<'_, '_>) {
    let job = meaning.job;
    let assembly = &job.assembly;
    let holds = assembly.holds.iter();
    let holds = holds.filter_map(|hold| Some((hold.name.given()?, "hold")));
    let watches = assembly.watches.iter();
    let watches = watches.filter_map(|watch| Some((watch.name.given()?, "watch")));
    let points = assembly.points.iter().map(|point| (&point.name, "point"));
    let bodies = assembly.bodies.iter().map(|body| (&body.name, "body"));
    let mut all: Vec<(&Written<&str>, &str)> = points.chain(bodies).collect();
    all.extend(holds.chain(watches));
    if all.is_empty() {
        return; // those of members alone differ, since they are keys of one table
    }
    all.extend(job.members.iter().map(|member| (&member.name, "member")));
    all.sort_by_key(|(name, _)| name.place.start);
    let mut first: HashMap<&str, (usize, &str)> = HashMap::with_capacity(all.len());
    for (name, kind) in all {
        let known = *first.entry(name.value).or_insert((name.place.start, kind));
        if known == (name.place.start, kind) {
            continue;
        }
        let (at, other) = known;
        let line = meaning.line(at);
        let message = format!(
            "a {kind} is called `{}`, and so is a {other} in line {line}",
            name.value
        );
        let help = "give one another name; members, points, bodies, holds and watches share one \
                    set of names";
        meaning.r.problems.say(&name.place, message, help);
    }
}
