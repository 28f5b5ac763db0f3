//! One member put back into its equations: along its pieces, at its stations, over its segments.

use super::DOUBT;
use super::acting::Acting;
use super::piece::{Integrated, Piece};
use super::residual::{Residual, Size, Work};
use crate::model::{Member, SegmentKind};
use crate::quantity::{Force, Length};
use crate::result::{MemberResult, SegmentResult};

/// What holds a member, and so what its two ends can be measured against.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum HeldBy {
    /// Supports of its own.
    Supports,
    /// The two points that it reaches between, which carry whatever it puts on them.
    Points,
    /// Two points between which it hangs slack: it carries nothing, and the distance between them
    /// is not its own.
    PointsSlack,
}

fn reactions_by_station(member: &Member, result: &MemberResult) -> Vec<(Force, Force)> {
    let mut reactions = vec![(Force::default(), Force::default()); member.stations.len()];
    for (support, result) in member.supports.iter().zip(&result.supports) {
        let reaction = result.reaction.unwrap_or_default();
        reactions[support.station].0 += reaction;
        reactions[support.station].1 += reaction.abs();
    }
    reactions
}

/// The force that points must put on a member's two ends, which is what is left over there.
fn reactions_of_points(acting: &Acting, result: &MemberResult) -> Vec<(Force, Force)> {
    let last = result.stations.len() - 1;
    let mut reactions = vec![(Force::default(), Force::default()); last + 1];
    let start = result.stations[0].force_after.unwrap_or_default();
    let end = result.stations[last].force_before.unwrap_or_default();
    for (station, pull, load) in [
        (0, -start, acting.forces[0]),
        (last, end, acting.forces[last]),
    ] {
        reactions[station] = (pull - load.0, pull.abs() + load.1);
    }
    reactions
}

/// A member with its result, its actions and its integrals.
pub(super) struct Proof<'p> {
    pub(super) acting: Acting<'p>,
    pub(super) result: &'p MemberResult,
    pub(super) held_by: HeldBy,
    along: Vec<Piece>,
    pub(super) pieces: Vec<Integrated>,
    /// The reactions at each station, and the sum of their sizes.
    pub(super) reactions: Vec<(Force, Force)>,
    pub(super) equilibrium: Residual,
    pub(super) compatibility: Residual,
}

impl<'p> Proof<'p> {
    /// Integrates the member with the forces that its result names.
    pub(super) fn of(acting: Acting<'p>, result: &'p MemberResult, held_by: HeldBy) -> Self {
        let doubt = result.force_max.abs().max(result.force_min.abs()) * DOUBT;
        let along: Vec<Piece> = (0..acting.member.pieces.len())
            .map(|piece| {
                let (start, end) = (
                    result.stations[piece].force_after,
                    result.stations[piece + 1].force_before,
                );
                Piece::of(
                    &acting,
                    piece,
                    (start.unwrap_or_default(), end.unwrap_or_default()),
                )
            })
            .collect();
        let pieces = along
            .iter()
            .enumerate()
            .map(|(index, piece)| piece.integrate(&acting, index, doubt))
            .collect();
        let reactions = match held_by {
            HeldBy::Supports => reactions_by_station(acting.member, result),
            HeldBy::Points | HeldBy::PointsSlack => reactions_of_points(&acting, result),
        };
        Proof {
            acting,
            result,
            held_by,
            along,
            pieces,
            reactions,
            equilibrium: Residual::default(),
            compatibility: Residual::default(),
        }
    }

    /// Takes every leftover of forces and strains, those of its supports included.
    pub(super) fn take(&mut self) {
        let pieces = std::mem::take(&mut self.pieces);
        self.stations();
        self.whole(&pieces);
        self.along_pieces(&pieces);
        self.segments(&pieces);
        for (index, support) in self.result.supports.iter().enumerate() {
            self.support(index, support);
        }
        self.pieces = pieces;
    }

    /// N just before and just after a station, 0 outside the member.
    pub(super) fn forces_at(&self, station: usize) -> (Force, Force) {
        let station = &self.result.stations[station];
        (
            station.force_before.unwrap_or_default(),
            station.force_after.unwrap_or_default(),
        )
    }

    pub(super) fn displacement(&self, station: usize) -> Length {
        self.result.stations[station].displacement
    }

    /// N after − N before + load + reactions = 0 at every station.
    fn stations(&mut self) {
        for station in 0..self.reactions.len() {
            let (reaction, size) = self.reactions[station];
            let (before, after) = self.forces_at(station);
            let (load, load_size) = self.acting.forces[station];
            let sizes = before.abs() + after.abs() + load_size + size;
            self.equilibrium
                .take((after - before + load + reaction).over(sizes));
        }
    }

    /// All loads against all reactions, and the totals that the result gives of them.
    fn whole(&mut self, pieces: &[Integrated]) {
        let (mut applied, mut size) = (Force::default(), Force::default());
        for &(force, force_size) in &self.acting.forces {
            applied += force;
            size += force_size;
        }
        for piece in pieces {
            applied += piece.load;
            size += piece.load_size;
        }
        let (mut reactions, mut reaction_size) = (Force::default(), Force::default());
        for &(reaction, size) in &self.reactions {
            reactions += reaction;
            reaction_size += size;
        }
        let totals = &self.result.totals;
        self.equilibrium
            .take((applied + reactions).over(size + reaction_size));
        self.equilibrium
            .take((totals.applied - applied).over(totals.applied.abs() + size));
        self.equilibrium
            .take((totals.reactions - reactions).over(totals.reactions.abs() + reaction_size));
    }

    /// Along every piece: N falls by its line load, and its ends move apart by its strain.
    fn along_pieces(&mut self, pieces: &[Integrated]) {
        for (index, piece) in pieces.iter().enumerate() {
            let ((_, start), (end, _)) = (self.forces_at(index), self.forces_at(index + 1));
            let sizes = start.abs() + end.abs() + piece.load_size;
            self.equilibrium
                .take((end - start + piece.load).over(sizes));
            let (from, to) = (self.displacement(index), self.displacement(index + 1));
            let segment = &self.acting.member.segments[self.acting.member.pieces[index].segment];
            let strained = !matches!(segment.kind, SegmentKind::Gap(_));
            if strained && self.held_by != HeldBy::PointsSlack {
                let parts = piece.force + piece.thermal + piece.imposed;
                let sizes = from.abs() + to.abs() + piece.force_size + piece.free_size;
                self.compatibility.take((to - from - parts).over(sizes));
            }
        }
    }

    /// Every segment's forces and elongations against its pieces, and the member's against all.
    fn segments(&mut self, pieces: &[Integrated]) {
        let member = self.acting.member;
        let mut at = 0;
        let (mut force, mut thermal, mut imposed) =
            (Sum::default(), Sum::default(), Sum::default());
        for (segment, result) in member.segments.iter().zip(&self.result.segments) {
            let first = at;
            let (mut f, mut t, mut m) = (Sum::default(), Sum::default(), Sum::default());
            let (mut most, mut least, mut size) = (None::<Force>, None::<Force>, Force::default());
            while at < pieces.len()
                && std::ptr::eq(segment, &member.segments[member.pieces[at].segment])
            {
                let piece = &pieces[at];
                if let SegmentKind::Gap(_) = segment.kind {
                    let (from, to) = (self.displacement(at), self.displacement(at + 1));
                    f.add(to - from, self.size_of_ends(from, to));
                } else {
                    f.add(piece.force, piece.force_size);
                    t.add(piece.thermal, piece.free_size);
                    m.add(piece.imposed, piece.free_size);
                }
                most = Some(most.map_or(piece.most, |most| most.max(piece.most)));
                least = Some(least.map_or(piece.least, |least| least.min(piece.least)));
                size = size.max(piece.most.abs().max(piece.least.abs()) + piece.load_size);
                at += 1;
            }
            self.compatibility.take(f.against(result.elongation_force));
            self.compatibility
                .take(t.against(result.elongation_temperature));
            self.compatibility.take(m.against(result.elongation_misfit));
            let parts =
                result.elongation_force + result.elongation_temperature + result.elongation_misfit;
            let sizes = f.size + t.size + m.size + result.elongation.abs();
            self.compatibility
                .take((result.elongation - parts).over(sizes));
            let ((_, start), (end, _)) = (self.forces_at(first), self.forces_at(at));
            self.equilibrium
                .take((result.force_start - start).over(result.force_start.abs() + start.abs()));
            self.equilibrium
                .take((result.force_end - end).over(result.force_end.abs() + end.abs()));
            self.extremes(
                result,
                most.unwrap_or_default(),
                least.unwrap_or_default(),
                size,
            );
            if let SegmentKind::Gap(_) = segment.kind {
                self.joint(first, result);
            }
            self.layers(result);
            for (sum, part) in [(&mut force, f), (&mut thermal, t), (&mut imposed, m)] {
                sum.value += part.value;
                sum.size += part.size;
            }
        }
        let result = self.result;
        self.compatibility
            .take(force.against(result.elongation_force));
        self.compatibility
            .take(thermal.against(result.elongation_temperature));
        self.compatibility
            .take(imposed.against(result.elongation_misfit));
        let (from, to) = (
            self.displacement(0),
            self.displacement(result.stations.len() - 1),
        );
        let parts = force.size + thermal.size + imposed.size + result.elongation.abs();
        let sum =
            result.elongation_force + result.elongation_temperature + result.elongation_misfit;
        self.compatibility
            .take((result.elongation - sum).over(parts));
        if self.held_by != HeldBy::PointsSlack {
            let sizes = parts + self.size_of_ends(from, to);
            self.compatibility
                .take((result.elongation - (to - from)).over(sizes));
        }
        self.member_extremes();
    }

    /// What two displacements count for beside their difference: between points all of it may move
    /// far as one.
    fn size_of_ends(&self, from: Length, to: Length) -> Length {
        match self.held_by {
            HeldBy::Supports => Length::default(),
            HeldBy::Points | HeldBy::PointsSlack => from.abs() + to.abs(),
        }
    }

    /// The extremes of N of a segment against what the proof saw along it. Its places are the ends
    /// and the nodes, so that an extreme between them may only be larger. `size` is that of the
    /// terms which N is the sum of.
    fn extremes(&mut self, result: &SegmentResult, most: Force, least: Force, size: Force) {
        let under = (most - result.force_max).max(Force::default());
        let over = (result.force_min - least).max(Force::default());
        self.equilibrium.take(under.over(size));
        self.equilibrium.take(over.over(size));
        for (named, x) in [
            (result.force_max, result.force_max_at),
            (result.force_min, result.force_min_at),
        ] {
            let there = self.force_at(x, named);
            self.equilibrium
                .take((named - there).over(named.abs() + size));
        }
    }

    /// N at a place from the nearest station before it; of two at a cut the one nearer to `named`.
    fn force_at(&self, x: Length, named: Force) -> Force {
        let stations = &self.result.stations;
        let next = stations.partition_point(|station| station.x <= x);
        let after = next.saturating_sub(1).min(stations.len() - 2);
        let at = |piece: usize| {
            let length = self.acting.member.pieces[piece].length;
            let s = ((x - stations[piece].x) / length).value.clamp(0.0, 1.0);
            self.along[piece].force_at(s)
        };
        let (here, before) = (at(after), at(after.saturating_sub(1)));
        if (before - named).abs() < (here - named).abs() {
            before
        } else {
            here
        }
    }

    fn member_extremes(&mut self) {
        let segments = &self.result.segments;
        let most = segments
            .iter()
            .map(|s| s.force_max)
            .fold(None, |m: Option<Force>, f| Some(m.map_or(f, |m| m.max(f))));
        let least = segments
            .iter()
            .map(|s| s.force_min)
            .fold(None, |m: Option<Force>, f| Some(m.map_or(f, |m| m.min(f))));
        for (named, seen) in [
            (self.result.force_max, most),
            (self.result.force_min, least),
        ] {
            let seen = seen.unwrap_or_default();
            self.equilibrium
                .take((named - seen).over(named.abs() + seen.abs()));
        }
    }

    /// The layers of a segment carry N together.
    fn layers(&mut self, result: &SegmentResult) {
        if result.layers.is_empty() {
            return;
        }
        let layers = || result.layers.iter();
        let starts: Vec<Force> = layers().map(|layer| layer.force_start).collect();
        let ends: Vec<Force> = layers().map(|layer| layer.force_end).collect();
        for (whole, parts) in [(result.force_start, starts), (result.force_end, ends)] {
            let sum = parts.iter().fold(Force::default(), |sum, &part| sum + part);
            let size = parts
                .iter()
                .fold(whole.abs(), |size, part| size + part.abs());
            self.equilibrium.take((whole - sum).over(size));
        }
    }

    /// The work of its loads less its internal work (Clapeyron).
    pub(super) fn work(&self) -> Work {
        let mut work = Work::default();
        for (station, &(load, _)) in self.acting.forces.iter().enumerate() {
            work.take(load * self.displacement(station));
        }
        for (index, piece) in self.pieces.iter().enumerate() {
            work.take(piece.load * self.displacement(index) + piece.line_work);
            let segment = &self.acting.member.segments[self.acting.member.pieces[index].segment];
            if let SegmentKind::Gap(_) = segment.kind {
                let (_, force) = self.forces_at(index);
                work.take(-(force * (self.displacement(index + 1) - self.displacement(index))));
            } else {
                work.take(-piece.elastic_work);
                work.take(-piece.free_work);
            }
        }
        work
    }

    /// The work of its reactions.
    pub(super) fn work_of_reactions(&self) -> Work {
        let mut work = Work::default();
        for (station, &(reaction, size)) in self.reactions.iter().enumerate() {
            let displacement = self.displacement(station);
            work.add(reaction * displacement, size * displacement.abs());
        }
        work
    }
}

/// A sum of lengths with the sum of their sizes.
#[derive(Clone, Copy, Default)]
struct Sum {
    value: Length,
    size: Length,
}

impl Sum {
    fn add(&mut self, value: Length, size: Length) {
        self.value += value;
        self.size += size.max(value.abs());
    }

    fn against(&self, named: Length) -> f64 {
        (named - self.value).over(named.abs() + self.size)
    }
}
