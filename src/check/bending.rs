//! Cautions about what acts across a member, and so bends it, which is not computed here.

use super::Observed;
use super::caution::Look;
use crate::model::{Between, Body, Combination, Member, Model, Remark, SegmentKind};
use crate::quantity::{Dimension, Force, Length, STANDARD_GRAVITY, from_si};
use std::collections::BTreeSet;

/// What acts across a member in some combination.
pub(super) fn member(look: &Look) -> Option<Remark> {
    match &look.member.between {
        Some(between) => between_points(look, between),
        None => single(look),
    }
}

/// Bodies whose weight acts along the one coordinate only in part.
pub(super) fn bodies(model: &Model, observed: &[Observed]) -> Vec<Remark> {
    let Some(assembly) = &model.assembly else {
        return Vec::new();
    };
    if assembly.coordinates > 1 || assembly.down[0].abs() == 1.0 {
        return Vec::new();
    }
    let acts = |case: usize| {
        let mut factors = observed
            .iter()
            .map(|seen| model.combinations[seen.index].factors[case]);
        factors.any(|factor| factor != 0.0)
    };
    let weights = assembly.actions.weights.iter();
    let weights = weights.filter(|weight| weight.number != 0.0 && acts(weight.case));
    let heavy: BTreeSet<usize> = weights.map(|weight| weight.body).collect();
    let caution = |at: usize| {
        let body: &Body = &assembly.bodies[at];
        Remark {
            about: format!("body.{}", body.name),
            text: "its weight acts across x as well as along it: the part across is not carried by this computation".into(),
            place: Some(body.place.clone()),
            caution: true,
        }
    };
    heavy.into_iter().map(caution).collect()
}

/// Loads across a sloping or level member with supports of its own, which the axial computation
/// leaves out.
fn single(look: &Look) -> Option<Remark> {
    let level = look.member.runs?.value.cos().abs();
    if !is_heavy_across(look, level) && !is_loaded_across(look) {
        return None;
    }
    look.caution(NOT_CARRIED.into(), None)
}

const NOT_CARRIED: &str = "weight acts across this member as well as along it: the part across, and the bending that it makes, is not carried by this computation";

/// Whether a weight acts on a member of which this share of it is across.
fn is_heavy_across(look: &Look, share: f64) -> bool {
    let weights = &look.member.actions.weights;
    // The cosine of a right angle is not quite 0 in double precision.
    share > 1e-12
        && weights
            .iter()
            .any(|weight| weight.number != 0.0 && acts(look, weight.case))
}

fn is_loaded_across(look: &Look) -> bool {
    let actions = &look.member.actions;
    let forces = actions.forces.iter();
    let mut forces = forces.filter(|force| force.across.value != 0.0);
    let lines = actions.lines.iter();
    let mut lines = lines.filter(|line| line.across.iter().any(|across| across.value != 0.0));
    forces.any(|force| acts(look, force.case)) || lines.any(|line| acts(look, line.case))
}

/// Whether a case acts in a combination that has the member.
fn acts(look: &Look, case: usize) -> bool {
    let factor = |seen: &Observed| look.model.combinations[seen.index].factors[case];
    look.combinations().any(|(seen, _)| factor(seen) != 0.0)
}

/// What acts across a member between points goes to its two ends, as from a beam on two supports,
/// and bends it between them.
fn between_points(look: &Look, between: &Between) -> Option<Remark> {
    let assembly = look.model.assembly.as_ref()?;
    let share = share_across(between, assembly.down);
    if assembly.coordinates == 1 {
        let level = (1.0 - between.rise * between.rise).max(0.0).sqrt();
        if !is_heavy_across(look, level) && !is_loaded_across(look) {
            return None;
        }
        return look.caution(NOT_CARRIED.into(), None);
    }
    let ((moment, force), combination) = look.worst(|seen, _| {
        let combination = &look.model.combinations[seen.index];
        let bent = bent_by(look.model, look.member, combination, share);
        (bent.0 > 0.0).then_some(bent)
    })?;
    let force = look.style.quantity(Dimension::Force, force);
    look.caution(
        format!(
            "weight or loads of {force} in `{combination}` act across it: they go to its two ends, and bend it by up to about {} between them (as a beam on two supports), which no check here looks at",
            look.style.quantity(Dimension::Moment, moment),
        ),
        None,
    )
}

/// The share of a weight that acts across the axis, from what is left of `down` beside it.
fn share_across(between: &Between, down: [f64; 3]) -> f64 {
    if between.rise.abs() == 1.0 {
        return 0.0;
    }
    let along: f64 = (0..3)
        .map(|axis| down[axis] * between.direction[axis])
        .sum();
    let across = (0..3).map(|axis| down[axis] - along * between.direction[axis]);
    across.map(|part| part * part).sum::<f64>().sqrt()
}

/// The largest moment (N m) of what acts across, and its sum (N): of weight as if spread evenly,
/// w L²/8; of each other load its own largest, so that the sum is not less than the real one.
fn bent_by(model: &Model, member: &Member, combination: &Combination, share: f64) -> (f64, f64) {
    let factor = |case: usize| combination.factors[case];
    let length = member.length();
    let weights = member.actions.weights.iter().map(|weight| {
        let times = weight.number * factor(weight.case) * share;
        weight_of(model, member, weight.segment, weight.layer) * times
    });
    let weight = weights.sum::<Force>().abs();
    let mut moment = (weight * length).value / 8.0;
    let mut force = weight.value;
    let mut add = |load: Force, at: Length| {
        let load = load.abs();
        moment += (load * at * (length - at) / length).value;
        force += load.value;
    };
    for load in &member.actions.forces {
        add(
            load.across * factor(load.case),
            member.stations[load.station].x,
        );
    }
    for load in &member.actions.lines {
        let piece = &member.pieces[load.piece];
        let middle = member.stations[load.piece].x + piece.length / 2.0;
        let [start, end] = load.across;
        let greatest = start.abs().max(end.abs());
        add(greatest * piece.length * factor(load.case), middle);
    }
    (moment, force)
}

/// The weight of a layer, or of a part known by its stiffness.
fn weight_of(model: &Model, member: &Member, segment: usize, layer: usize) -> Force {
    let segment = &member.segments[segment];
    let per_length = match &segment.kind {
        SegmentKind::Solid { layers, .. } => {
            let layer = &layers[layer];
            let density = model.materials[layer.material].density;
            let by_volume = density.map(|density| density * layer.area.mean());
            layer.mass.or(by_volume)
        }
        SegmentKind::Stiffness(part) => part.mass,
        SegmentKind::Gap(_) => None,
    };
    let mass = per_length.map_or(0.0, |per_length| (per_length * segment.length).value);
    from_si(mass * STANDARD_GRAVITY)
}
