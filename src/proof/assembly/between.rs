//! A member between two points: what it puts on them, and what their movement asks of it.

use super::one_way::stretch_by_weight;
use super::space::{along, difference, size_along, toward};
use crate::model::{Between, Combination, Member, Model, Spatial};
use crate::proof::acting::Acting;
use crate::proof::member::{HeldBy, Proof};
use crate::proof::residual::{Residual, Size, Work};
use crate::quantity::{Flexibility, Force, ForcePerLength, Length};
use crate::result::{MemberResult, MemberState};

/// A member that has been looked at, as its two points see it.
pub(super) struct Looked {
    /// Its points, start and end.
    pub(super) points: [usize; 2],
    /// What it puts on them along its axis: N at its ends with the loads that stand there.
    pub(super) pull: [Spatial<Force>; 2],
    /// What of its loads goes to them by the lever rule: the part across its axis, and all of the
    /// weight of a slack member.
    pub(super) lever: [Spatial<Force>; 2],
    /// All of its loads that act through N.
    pub(super) carried: Spatial<Force>,
    /// The sum of the sizes of these loads.
    pub(super) load_size: Force,
    /// The size of the forces along it at its ends.
    pub(super) size: Force,
    /// Its end stiffness times what its ends move and what it would change its length by itself:
    /// the size of the terms that its force is left over from.
    pub(super) elastic: Force,
    /// The work of the loads along it less its internal work.
    pub(super) work: Work,
    /// Its change of length and the free part of it, by size.
    pub(super) stretch: Length,
    pub(super) equilibrium: Residual,
    pub(super) compatibility: Residual,
}

impl Looked {
    /// Puts the member back into its equations, with its ends at points that move like this;
    /// `slight` counts beside these movements.
    pub(super) fn at(
        model: &Model,
        combination: &Combination,
        (member, between): (&Member, &Between),
        result: &MemberResult,
        (moves, slight): ([&Spatial<Length>; 2], Length),
    ) -> Self {
        let mut acting = Acting::on(model, member, combination);
        let axis = &between.direction;
        let down = model.assembly.as_ref().map_or([0.0; 3], |a| a.down);
        let across = difference(down, toward(axis, along(axis, &down)));
        let weights = lever_of_weight(&acting);
        let lump = weights[0] * -member.rise();
        let slack = member.carries.is_some() && result.state == MemberState::Slack;
        let (lever, by_weight, held_by) = if slack {
            let stretch = stretch_by_weight(&acting, lump);
            acting.unload();
            let lever = weights.map(|weight| toward(&down, weight));
            (lever, stretch, HeldBy::PointsSlack)
        } else {
            let mut lever = weights.map(|weight| toward(&across, weight));
            add_across(&acting, &across, &mut lever);
            (lever, Default::default(), HeldBy::Points)
        };
        let mut proof = Proof::of(acting, result, held_by);
        proof.take();
        let ends = Ends {
            moves: moves.map(|by| along(axis, by)),
            sizes: moves.map(|by| size_along(axis, by) + slight),
        };
        proof.ends(&ends);
        proof.state(&ends, lump, by_weight);

        let free_size = proof
            .pieces
            .iter()
            .fold(Length::default(), |size, piece| size + piece.free_size);
        let stretch = result.elongation.abs() + free_size;
        let flexibility = proof
            .pieces
            .iter()
            .fold(Flexibility::default(), |sum, piece| sum + piece.flexibility);
        let elastic = if flexibility == Flexibility::default() {
            Force::default()
        } else {
            (ends.sizes[0] + ends.sizes[1] + stretch) / flexibility
        };
        let last = proof.reactions.len() - 1;
        let (start, end) = (proof.reactions[0], proof.reactions[last]);
        let mut carried = (Force::default(), Force::default());
        for &(load, size) in &proof.acting.forces {
            carried = (carried.0 + load, carried.1 + size);
        }
        for piece in &proof.pieces {
            carried = (carried.0 + piece.load, carried.1 + piece.load_size);
        }
        Looked {
            points: [between.start, between.end],
            pull: [-start.0, -end.0].map(|pull| toward(&between.direction, pull)),
            lever,
            carried: toward(&between.direction, carried.0),
            load_size: carried.1,
            size: start.1.max(end.1),
            elastic,
            work: proof.work(),
            stretch,
            equilibrium: proof.equilibrium,
            compatibility: proof.compatibility,
        }
    }
}

/// How the two ends of a member move along its axis.
pub(super) struct Ends {
    pub(super) moves: [Length; 2],
    /// The sizes that these are to be held against.
    pub(super) sizes: [Length; 2],
}

impl Proof<'_> {
    /// The stations at a member's ends move as its points do.
    fn ends(&mut self, ends: &Ends) {
        let last = self.result.stations.len() - 1;
        for (end, station) in [0, last].into_iter().enumerate() {
            let named = self.displacement(station);
            let sizes = named.abs() + ends.sizes[end];
            self.compatibility
                .take((named - ends.moves[end]).over(sizes));
        }
    }
}

/// What goes to the start and the end of a member by the lever rule, of a line load on a piece: its
/// product with the lever is a cubic at most, which Simpson's rule integrates exactly.
fn lever_of_line(
    member: &Member,
    piece: usize,
    line: impl Fn(f64) -> ForcePerLength,
) -> [Force; 2] {
    let (from, length) = (member.stations[piece].x, member.pieces[piece].length);
    let mut ends = [Force::default(); 2];
    for (s, weight) in [(0.0, 1.0), (0.5, 4.0), (1.0, 1.0)] {
        let force = line(s) * length * (weight / 6.0);
        let share = ((from + length * s) / member.length()).value;
        ends[0] += force * (1.0 - share);
        ends[1] += force * share;
    }
    ends
}

fn lever_of_weight(acting: &Acting) -> [Force; 2] {
    let mut ends = [Force::default(); 2];
    for piece in 0..acting.member.pieces.len() {
        if acting.has_weight(piece) {
            let of = lever_of_line(acting.member, piece, |s| acting.weight(piece, s));
            ends = [ends[0] + of[0], ends[1] + of[1]];
        }
    }
    ends
}

/// Adds the parts of point and line loads across the axis, at the member's ends.
fn add_across(acting: &Acting, across: &Spatial<f64>, lever: &mut [Spatial<Force>; 2]) {
    let member = acting.member;
    let level = across.iter().map(|share| share * share).sum::<f64>().sqrt();
    if level == 0.0 {
        return;
    }
    let direction = across.map(|share| share / level);
    let mut add = |ends: [Force; 2], factor: f64| {
        for (at, force) in lever.iter_mut().zip(ends) {
            for (entry, share) in at.iter_mut().zip(direction) {
                *entry += force * (share * factor);
            }
        }
    };
    let factors = &acting.combination.factors;
    for force in &member.actions.forces {
        let share = (member.stations[force.station].x / member.length()).value;
        let ends = [force.across * (1.0 - share), force.across * share];
        add(ends, factors[force.case]);
    }
    for line in &member.actions.lines {
        let [start, end] = line.across;
        let ends = lever_of_line(member, line.piece, |s| start * (1.0 - s) + end * s);
        add(ends, factors[line.case]);
    }
}
