//! A job as meant: names resolved, materials found, stations cut, actions laid on what they act on.
//! Everything here reads the job as written; where something of it is at fault, whatever depends on
//! it is left out in silence, since the fault itself has been reported.

mod actions;
mod assembly;
mod by_case;
mod combinations;
mod coverage;
mod forces;
mod heat;
mod layers;
mod lengths;
mod limits;
mod lookup;
mod lost;
mod materials;
mod members;
mod names;
mod outline;
mod own;
mod points;
mod reads;
mod stress;
mod supports;

use super::written::{Entry, Job, Reader, Written};
use crate::model::{Heading, Model, Name, Remark};
use crate::quantity::Units;
use assembly::{Space, Stations};
use materials::Materials;
use names::Names;
use std::cell::OnceCell;

/// What all parts of this phase share.
struct Meaning<'w, 't> {
    job: &'w Job<'t>,
    r: &'w mut Reader<'t>,
    remarks: Vec<Remark>,
    materials: Materials<'w>,
    names: Names<'t>,
    /// Where points lie, and which way is up.
    space: Space,
    /// The stations that watches name.
    watched: Stations<'w, 't>,
    /// Where each line of the text begins; found when the first message names one.
    lines: OnceCell<Vec<usize>>,
}

impl Meaning<'_, '_> {
    /// The number of the line in which a place begins, for messages that name two places.
    fn line(&self, at: usize) -> usize {
        let lines = self.lines.get_or_init(|| {
            let breaks = self.r.text.match_indices('\n');
            std::iter::once(0)
                .chain(breaks.map(|(at, _)| at + 1))
                .collect()
        });
        lines.partition_point(|&start| start <= at)
    }
}

/// The model of a job; `None` where something is at fault, which the reader's problems tell.
pub(super) fn model<'t>(job: &Job<'t>, r: &mut Reader<'t>) -> Option<Model> {
    let mut remarks = Vec::new();
    let materials = Materials::of(job, r, &mut remarks);
    let space = Space::of(job, r);
    let mut meaning = Meaning {
        job,
        r,
        remarks,
        materials,
        names: Names::of(job),
        space,
        watched: assembly::stations(job),
        lines: OnceCell::new(),
    };
    names::differ(&mut meaning);
    let cases = combinations::cases(job);
    let meant = members::members(&mut meaning);
    let combinations = combinations::Combinations::of(&cases, &mut meaning);
    let assembly = assembly::assembly(&meant, &mut meaning);
    let watches = assembly::watches(&meant, &mut meaning);
    let objects = limits::Objects {
        meant: &meant,
        assembly: assembly.as_ref(),
        watches: &watches,
    };
    let limits = limits::limits(&objects, combinations.as_ref(), &mut meaning);
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
        assembly,
        watches: watches.into_iter().collect::<Option<_>>()?,
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
