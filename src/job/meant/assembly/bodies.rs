//! Stiff bodies.

use crate::job::meant::{Meaning, name};
use crate::job::written::assembly::body::Body as WrittenBody;
use crate::model::Body;

/// The bodies in the order of the file; `None` for one that is at fault.
pub(super) fn bodies<'t>(meaning: &mut Meaning<'_, 't>) -> Vec<Option<Body>> {
    let written = &meaning.job.assembly.bodies;
    written
        .iter()
        .map(|written| body(written, meaning))
        .collect()
}

fn body<'t>(written: &WrittenBody<'t>, meaning: &mut Meaning<'_, 't>) -> Option<Body> {
    let points = written.points.given();
    let points = points.and_then(|points| meaning.points(&points.value, "this body"));
    let centre = written.at.given();
    let centre = centre.and_then(|at| meaning.spatial(&at.value, &at.place));
    if written.mass.is_written() && written.at.is_absent() {
        let message = format!(
            "the body `{}` has a mass, and nothing says where",
            written.name.value
        );
        needs_centre(written, message, meaning);
    }
    if written.mass.is_wrong() || written.at.is_written() && centre.is_none() {
        return None;
    }
    Some(Body {
        name: name(&written.name),
        place: written.place.clone(),
        points: points?,
        mass: written.mass.given().map(|mass| mass.value),
        centre,
    })
}

/// Reports that something acts at a centre of mass that is not written.
pub(super) fn needs_centre(
    written: &WrittenBody<'_>,
    message: String,
    meaning: &mut Meaning<'_, '_>,
) {
    let help = "add `at` to the body: its centre of mass, one entry for each coordinate";
    meaning
        .r
        .problems
        .missing("at", &written.place, message, help);
}
