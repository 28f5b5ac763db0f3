//! A job as meant: names resolved, materials found, stations cut, actions laid on what they act on.
//! Everything here reads the job as written; where something of it is at fault, whatever depends on
//! it is left out in silence, since the fault itself has been reported.

mod actions;
mod combinations;
mod coverage;
mod forces;
mod heat;
mod layers;
mod limits;
mod lookup;
mod materials;
mod members;
mod outline;
mod points;
mod reads;
mod stress;
mod supports;

use super::written::{Entry, Job, Reader, Written};
use crate::model::{Heading, Model, Name, Remark};
use crate::quantity::Units;
use materials::Materials;

/// What all parts of this phase share.
struct Meaning<'w, 't> {
    job: &'w Job<'t>,
    r: &'w mut Reader<'t>,
    remarks: Vec<Remark>,
    materials: Materials<'w>,
}

impl<'t> Meaning<'_, 't> {
    /// The number of the line in which a place begins, for messages that name two places.
    fn line(&self, at: usize) -> usize {
        let head = self.r.text.get(..at).unwrap_or(self.r.text);
        1 + head.bytes().filter(|byte| *byte == b'\n').count()
    }
}

/// The model of a job; `None` where something is at fault, which the reader's problems tell.
pub(super) fn model<'t>(job: &Job<'t>, r: &mut Reader<'t>) -> Option<Model> {
    let mut remarks = Vec::new();
    let materials = Materials::of(job, r, &mut remarks);
    let mut meaning = Meaning {
        job,
        r,
        remarks,
        materials,
    };
    let cases = combinations::cases(job);
    let meant = members::members(&mut meaning);
    let combinations = combinations::Combinations::of(&cases, &mut meaning);
    let limits = limits::limits(&meant, combinations.as_ref(), &mut meaning);
    if !meaning.r.problems.is_empty() {
        return None;
    }
    let Meaning {
        r,
        remarks,
        materials,
        ..
    } = meaning;
    r.tolerances.sort_by_key(|place| place.start);
    r.tolerances.dedup();
    let heading = job.heading.as_ref();
    Some(Model {
        units: heading
            .and_then(|heading| heading.units.given())
            .map_or(Units::SI, |units| units.value),
        datum: heading
            .and_then(|heading| heading.datum.given())
            .map(|datum| datum.value),
        heading: heading.map_or_else(Heading::default, |heading| Heading {
            title: owned(&heading.title),
            reference: owned(&heading.reference),
            prepared_by: owned(&heading.prepared_by),
            checked_by: owned(&heading.checked_by),
            date: owned(&heading.date),
            note: owned(&heading.note),
        }),
        cases,
        combinations: combinations?.all,
        materials: materials.used,
        members: meant
            .into_iter()
            .map(|meant| meant.sound.then_some(meant.member))
            .collect::<Option<_>>()?,
        assembly: None,
        watches: Vec::new(),
        limits,
        tolerances: std::mem::take(&mut r.tolerances),
        remarks,
    })
}

fn owned<T: AsRef<str>>(entry: &Entry<T>) -> Option<String> {
    entry
        .given()
        .map(|written| written.value.as_ref().to_owned())
}

/// The name as results share it.
fn name(written: &Written<&str>) -> Name {
    Name::from(written.value)
}
