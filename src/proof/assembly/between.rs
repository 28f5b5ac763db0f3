//! A member between two points: what it puts on them, and what their movement asks of it.

use super::space::{along, difference, size_along, toward};
use crate::model::{Between, Carries, Combination, LineLoad, Member, Model, Spatial};
use crate::proof::acting::Acting;
use crate::proof::member::{HeldBy, Proof};
use crate::proof::piece::Piece;
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
        let down = model.assembly.as_ref().map_or([0.0; 3], |a| a.down);
        let across = difference(
            down,
            toward(&between.direction, along(&between.direction, &down)),
        );
        let weights = lever_of_weight(&acting);
        let mut lever = weights.map(|weight| toward(&across, weight));
        let slack = member.carries.is_some() && result.state == MemberState::Slack;
        let ends = moves.map(|by| along(&between.direction, by));
        let end_sizes = moves.map(|by| size_along(&between.direction, by));
        let mut decided = Residual::default();
        // What is left of the weight along the axis when the lever rule has put its share on the
        // start, and the stretch that this makes.
        let lumped = weights[0] * -member.rise();
        let by_weight = if slack {
            let stretch = stretch_by_weight(&acting, lumped);
            lever = weights.map(|weight| toward(&down, weight));
            acting.unload();
            stretch
        } else {
            add_across(&acting, &across, &mut lever);
            (Length::default(), Length::default())
        };
        let held_by = if slack {
            HeldBy::PointsSlack
        } else {
            HeldBy::Points
        };
        let mut proof = Proof::of(acting, result, held_by);
        proof.take();
        for (station, (end, size)) in [0, result.stations.len() - 1]
            .into_iter()
            .zip(ends.into_iter().zip(end_sizes))
        {
            let named = proof.displacement(station);
            let sizes = named.abs() + size + slight;
            proof.compatibility.take((named - end).over(sizes));
        }

        let (free, free_size) = proof.pieces.iter().fold(
            (Length::default(), Length::default()),
            |(free, size), piece| (free + piece.thermal + piece.imposed, size + piece.free_size),
        );
        let end_size = end_sizes[0] + end_sizes[1];
        let apart = ends[1] - ends[0];
        match (member.carries, result.state) {
            (None, MemberState::Taut) => decided.take(unsaid(result.slack_by)),
            (Some(way), MemberState::Slack) => {
                let loose = free + by_weight.0 - apart;
                let loose = match way {
                    Carries::Tension => loose,
                    Carries::Compression => -loose,
                };
                let sizes = free_size + by_weight.1 + end_size;
                let named = result.slack_by.unwrap_or_default();
                decided.take((loose - named).over(sizes + named.abs()));
                decided.take(named.min(Length::default()).over(sizes));
                proof.slack_stations();
            }
            (Some(Carries::Tension), MemberState::Taut)
            | (Some(Carries::Compression), MemberState::Bearing) => {
                decided.take(unsaid(result.slack_by));
                let start = result.stations[0].force_after.unwrap_or_default();
                let between = start - lumped;
                let against = match member.carries {
                    Some(Carries::Tension) => -between,
                    _ => between,
                };
                proof.equilibrium.take(
                    against
                        .max(Force::default())
                        .over(start.abs() + lumped.abs()),
                );
            }
            _ => decided.take(f64::INFINITY),
        }
        proof.compatibility.take(decided.largest());

        let stretch = result.elongation.abs() + free_size;
        let flexibility = proof
            .pieces
            .iter()
            .fold(Flexibility::default(), |sum, piece| sum + piece.flexibility);
        let elastic = if flexibility == Flexibility::default() {
            Force::default()
        } else {
            (end_size + stretch) / flexibility
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

/// A distance from being taut that is given where there is none never passes.
fn unsaid(slack_by: Option<Length>) -> f64 {
    if slack_by.is_some() {
        f64::INFINITY
    } else {
        0.0
    }
}

impl Proof<'_> {
    /// The stations of a slack member lie as it hangs from its start, or as it stands on its end.
    fn slack_stations(&mut self) {
        let last = self.result.stations.len() - 1;
        let (start, end) = (self.displacement(0), self.displacement(last));
        let pieces = || self.pieces.iter();
        let whole = pieces().fold(Length::default(), |sum, piece| {
            sum + piece.thermal + piece.imposed
        });
        let size = pieces().fold(start.abs() + end.abs(), |sum, piece| sum + piece.free_size);
        let mut free = Length::default();
        let mut left = Residual::default();
        for station in 1..last {
            let piece = &self.pieces[station - 1];
            free += piece.thermal + piece.imposed;
            let named = self.displacement(station);
            let (hung, stood) = (named - (start + free), named - (end - (whole - free)));
            left.take(hung.abs().min(stood.abs()).over(size + named.abs()));
        }
        self.compatibility.take(left.largest());
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
        let (start, end) = across_at_ends(line);
        let ends = lever_of_line(member, line.piece, |s| start * (1.0 - s) + end * s);
        add(ends, factors[line.case]);
    }
}

/// A line load's part across the axis at its two ends, which goes as its part along it.
fn across_at_ends(line: &LineLoad) -> (ForcePerLength, ForcePerLength) {
    let greatest = if line.start.abs() > line.end.abs() {
        line.start
    } else {
        line.end
    };
    if greatest == ForcePerLength::default() {
        (line.across, line.across)
    } else {
        let at = |along: ForcePerLength| line.across * (along / greatest).value;
        (at(line.start), at(line.end))
    }
}

/// `∫ N/EA dx` of a member that only its own weight stresses, its lumps on its ends holding it, and
/// the sum of the sizes.
fn stretch_by_weight(acting: &Acting, lump: Force) -> (Length, Length) {
    let mut force = lump;
    let (mut stretch, mut size) = (Length::default(), Length::default());
    for piece in 0..acting.member.pieces.len() {
        if !acting.has_weight(piece) && force == Force::default() {
            continue;
        }
        let load = Piece::of(acting, piece, (force, force)).load();
        let after = force - load;
        let along = Piece::of(acting, piece, (force, after));
        let integrated = along.integrate(acting, piece, lump.abs() * crate::proof::DOUBT);
        stretch += integrated.force;
        size += integrated.force_size;
        force = after;
    }
    (stretch, size)
}
