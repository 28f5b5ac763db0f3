//! Materials: the job's own with what `like` adds, and those of the library that are used.

use super::Meaning;
use super::lookup::Lookup;
use crate::catalogue::{self, Material};
use crate::job::nearest::remedy;
use crate::job::written::{Entry, Job, Reader, Written, material as written};
use crate::model::{Name, Remark};

/// All materials that a job can name.
pub(super) struct Materials<'w> {
    ids: Lookup<&'w str>,
    /// The job's own, in its order; `None` for one with a fault.
    own: Vec<Option<Material>>,
    /// Those that members use, each once.
    pub(super) used: Vec<Material>,
    /// Under which index each id was found.
    found: Vec<(&'w str, usize)>,
}

/// How far the job's own material has been followed.
enum State {
    Open,
    OnTheWay,
    Done(Option<Box<Material>>),
}

impl<'w> Materials<'w> {
    pub(super) fn of<'t>(job: &'w Job<'t>, r: &mut Reader<'t>, remarks: &mut Vec<Remark>) -> Self {
        let ids = Lookup::new(job.materials.iter().map(|own| own.id.value).collect());
        let mut states: Vec<State> = job.materials.iter().map(|_| State::Open).collect();
        for index in 0..job.materials.len() {
            follow(index, job, &ids, &mut states, r);
        }
        for own in &job.materials {
            if catalogue::library(own.id.value).is_some() {
                remarks.push(Remark {
                    about: format!("material.{}", own.id.value),
                    text: format!(
                        "the job's own `{0}` stands in place of the library's `{0}`",
                        own.id.value
                    ),
                    place: Some(own.id.place.clone()),
                    caution: false,
                });
            }
        }
        let own = states
            .into_iter()
            .map(|state| match state {
                State::Done(material) => material.map(|material| *material),
                State::Open | State::OnTheWay => None,
            })
            .collect();
        Materials {
            ids,
            own,
            used: Vec::new(),
            found: Vec::new(),
        }
    }

    /// Whether the job or the library has a material of this id.
    pub(super) fn knows(&self, id: &str) -> bool {
        self.ids.find(id).is_some() || catalogue::library(id).is_some()
    }

    /// The index among the used ones, where it is used.
    pub(super) fn index_of_used(&self, id: &str) -> Option<usize> {
        self.found
            .iter()
            .find(|(known, _)| *known == id)
            .map(|(_, index)| *index)
    }

    /// The remedy for an id that is not known.
    pub(super) fn remedy(&self, id: &str) -> Option<String> {
        unknown_help(id, &self.ids)
    }
}

impl<'w> Meaning<'w, '_> {
    /// The index of a material among those that members use. An unknown id is reported; `None` too
    /// for one of the job's own that has a fault.
    pub(super) fn material(&mut self, id: &Written<&'w str>) -> Option<usize> {
        if let Some(index) = self.materials.index_of_used(id.value) {
            return Some(index);
        }
        let material = match self.materials.ids.find(id.value) {
            Some(own) => self.materials.own[own].take()?,
            None => match catalogue::library(id.value) {
                Some(material) => material.clone(),
                None => {
                    let help = self.materials.remedy(id.value);
                    let message = format!("no material is called `{}`", id.value);
                    self.r
                        .problems
                        .unknown("material", &id.place, message, help);
                    return None;
                }
            },
        };
        let index = self.materials.used.len();
        self.materials.used.push(material);
        self.materials.found.push((id.value, index));
        Some(index)
    }
}

/// Resolves a material and all that it is like, from the far end of the chain back.
fn follow<'w, 't>(
    from: usize,
    job: &'w Job<'t>,
    ids: &Lookup<&'w str>,
    states: &mut [State],
    r: &mut Reader<'t>,
) {
    let mut chain = Vec::new();
    let mut next = Some(from);
    // What the last of the chain starts from: `Err` where that is at fault.
    let mut base: Result<Option<Material>, ()> = Ok(None);
    while let Some(index) = next {
        match &states[index] {
            State::Done(material) => {
                base = material.as_deref().cloned().map(Some).ok_or(());
                break;
            }
            State::OnTheWay => {
                circle(&chain, index, job, r);
                base = Err(());
                break;
            }
            State::Open => {}
        }
        states[index] = State::OnTheWay;
        chain.push(index);
        next = None;
        match &job.materials[index].like {
            Entry::Absent => {}
            Entry::Wrong => base = Err(()),
            Entry::Given(like) => match ids.find(like.value) {
                // An id of the library that the job takes for its own may start from that entry.
                Some(other) if other == index => match catalogue::library(like.value) {
                    Some(material) => base = Ok(Some(material.clone())),
                    None => next = Some(other),
                },
                Some(other) => next = Some(other),
                None => match catalogue::library(like.value) {
                    Some(material) => base = Ok(Some(material.clone())),
                    None => {
                        let message = format!("no material is called `{}`", like.value);
                        let help = unknown_help(like.value, ids);
                        r.problems.unknown("material", &like.place, message, help);
                        base = Err(());
                    }
                },
            },
        }
    }
    for index in chain.into_iter().rev() {
        let material = base
            .clone()
            .ok()
            .and_then(|base| made(&job.materials[index], base, r));
        base = material.clone().map(Some).ok_or(());
        states[index] = State::Done(material.map(Box::new));
    }
}

fn circle<'t>(chain: &[usize], back_to: usize, job: &Job<'t>, r: &mut Reader<'t>) {
    let at = chain.iter().position(|index| *index == back_to);
    let circle = &chain[at.unwrap_or(0)..];
    let names = circle
        .iter()
        .chain([&back_to])
        .map(|index| job.materials[*index].id.value);
    let message = format!("`like` leads in a circle: {}", arrows(names));
    if let Some(like) = job.materials[back_to].like.given() {
        let help = "let one of them start from a library entry, or give its values";
        r.problems.say(&like.place, message, help);
    }
}

/// The names of a circle; a long one is cut.
pub(super) fn arrows<'n>(names: impl Iterator<Item = &'n str>) -> String {
    let names: Vec<&str> = names.collect();
    if names.len() > 8 {
        let ends = [&names[..4], &["…"], &names[names.len() - 3..]].concat();
        return ends.join(" → ");
    }
    names.join(" → ")
}

/// A material with what it starts from; `None` where a value of it is at fault.
fn made<'t>(
    own: &written::Material<'t>,
    base: Option<Material>,
    r: &mut Reader<'t>,
) -> Option<Material> {
    let base = base.as_ref();
    let modulus = value(&own.modulus, base.map(|base| base.modulus))?;
    let Some(modulus) = modulus else {
        let message = format!("the material `{}` needs a `modulus`", own.id.value);
        let help = "add `modulus = \"205 GPa\"`, or `like` with the id of a material to start from";
        r.problems.missing("modulus", &own.place, message, help);
        return None;
    };
    let text = |entry: &Entry<&str>, base: Option<&String>| match entry {
        Entry::Given(written) => Some(written.value.to_owned()),
        _ => base.cloned(),
    };
    Some(Material {
        id: Name::from(own.id.value),
        like: own.like.given().map(|like| Name::from(like.value)),
        modulus,
        expansion: value(&own.expansion, base.and_then(|base| base.expansion))?,
        density: value(&own.density, base.and_then(|base| base.density))?,
        yield_strength: match &own.yield_strength {
            Entry::Given(written) => written.value.clone(),
            Entry::Absent => base.map_or_else(Vec::new, |base| base.yield_strength.clone()),
            Entry::Wrong => return None,
        },
        ultimate: value(&own.ultimate, base.and_then(|base| base.ultimate))?,
        proof: value(&own.proof, base.and_then(|base| base.proof))?,
        crushing: value(&own.crushing, base.and_then(|base| base.crushing))?,
        range: value(&own.range, base.and_then(|base| base.range))?,
        family: text(&own.family, base.and_then(|base| base.family.as_ref())),
        note: text(&own.note, base.and_then(|base| base.note.as_ref())),
        source: text(&own.source, base.and_then(|base| base.source.as_ref())),
    })
}

/// The own value, else that of the base; the outer `None` for one at fault.
fn value<T: Copy>(own: &Entry<T>, base: Option<T>) -> Option<Option<T>> {
    match own {
        Entry::Given(written) => Some(Some(written.value)),
        Entry::Absent => Some(base),
        Entry::Wrong => None,
    }
}

fn unknown_help(id: &str, own: &Lookup<&str>) -> Option<String> {
    let all = own.texts().chain(catalogue::ids().map(|id| id as &str));
    let all: Vec<&str> = all.collect();
    remedy(
        id,
        all,
        "write one of the library, or define `[material.…]`; there are",
    )
}
