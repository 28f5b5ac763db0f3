//! Every result proves itself: what is left over when a finished result is put back into the
//! equations of the member.
//!
//! The proof knows the model and the result and not the solver: it gathers the actions anew, takes
//! areas from the dimensions themselves, and integrates by its own quadrature. Each residual is
//! divided by the sum of the sizes of its terms before they cancel; where there are none it is 0.

mod acting;
mod piece;
mod quadrature;
mod residual;
mod support;

use crate::model::{Combination, Member, Model, SegmentKind};
use crate::quantity::{Energy, Force, Length};
use crate::result::{MemberResult, Residuals, SegmentResult};
use acting::Acting;
use piece::Piece;
use residual::{Residual, Size};

/// The share of a member's largest force below which N somewhere may be nothing but the rounding of
/// forces that cancel: ten powers above that rounding.
const DOUBT: f64 = 1e-6;

/// The residuals of one member's finished result.
///
/// * equilibrium: at every station, along every piece, and of the whole; layers against N.
/// * compatibility: integrated strains against displacements, elongations, supports and gaps, and
///   the state of every stop and joint.
/// * energy: the work of loads and reactions against `∫N (N/EA + e0) dx` (Clapeyron).
pub fn member(
    model: &Model,
    member: &Member,
    combination: &Combination,
    result: &MemberResult,
) -> Residuals {
    let acting = Acting::on(model, member, combination, result);
    let doubt = result.force_max.abs().max(result.force_min.abs()) * DOUBT;
    let piece = |index: usize| {
        let (start, end) = (
            result.stations[index].force_after,
            result.stations[index + 1].force_before,
        );
        let ends = (start.unwrap_or_default(), end.unwrap_or_default());
        Piece::of(&acting, index, ends, doubt)
    };
    let along: Vec<Piece> = (0..member.pieces.len()).map(piece).collect();
    let mut proof = Proof {
        acting,
        result,
        along: &along,
        equilibrium: Residual::default(),
        compatibility: Residual::default(),
    };
    proof.stations();
    proof.whole();
    proof.pieces();
    proof.segments();
    for (index, support) in result.supports.iter().enumerate() {
        proof.support(index, support);
    }
    let mut energy = Residual::default();
    energy.take(proof.energy());
    Residuals {
        equilibrium: proof.equilibrium.largest(),
        compatibility: proof.compatibility.largest(),
        energy: energy.largest(),
    }
}

struct Proof<'p> {
    acting: Acting<'p>,
    result: &'p MemberResult,
    along: &'p [Piece],
    equilibrium: Residual,
    compatibility: Residual,
}

impl Proof<'_> {
    /// N just before and just after a station, 0 outside the member.
    fn forces_at(&self, station: usize) -> (Force, Force) {
        let station = &self.result.stations[station];
        (
            station.force_before.unwrap_or_default(),
            station.force_after.unwrap_or_default(),
        )
    }

    fn displacement(&self, station: usize) -> Length {
        self.result.stations[station].displacement
    }

    /// N after − N before + load + reactions = 0 at every station.
    fn stations(&mut self) {
        for (station, at) in self.acting.stations.iter().enumerate() {
            let (before, after) = self.forces_at(station);
            let sizes = before.abs() + after.abs() + at.load_size + at.reaction_size;
            self.equilibrium
                .take((after - before + at.load + at.reaction).over(sizes));
        }
    }

    /// All loads against all reactions, and the totals that the result gives of them.
    fn whole(&mut self) {
        let (mut applied, mut size) = (Force::default(), Force::default());
        for at in &self.acting.stations {
            applied += at.load;
            size += at.load_size;
        }
        for piece in self.along {
            applied += piece.sums.load;
            size += piece.sums.load_size;
        }
        let (mut reactions, mut reaction_size) = (Force::default(), Force::default());
        for support in &self.result.supports {
            let reaction = support.reaction.unwrap_or_default();
            reactions += reaction;
            reaction_size += reaction.abs();
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
    fn pieces(&mut self) {
        for (index, Piece { sums: piece, .. }) in self.along.iter().enumerate() {
            let ((_, start), (end, _)) = (self.forces_at(index), self.forces_at(index + 1));
            let sizes = start.abs() + end.abs() + piece.load_size;
            self.equilibrium
                .take((end - start + piece.load).over(sizes));
            let (from, to) = (self.displacement(index), self.displacement(index + 1));
            let segment = &self.acting.member.segments[self.acting.member.pieces[index].segment];
            if !matches!(segment.kind, SegmentKind::Gap(_)) {
                let parts = piece.force + piece.thermal + piece.imposed;
                let sizes = from.abs() + to.abs() + piece.force_size + piece.free_size;
                self.compatibility.take((to - from - parts).over(sizes));
            }
        }
    }

    /// Every segment's forces and elongations against its pieces, and the member's against all.
    fn segments(&mut self) {
        let member = self.acting.member;
        let mut at = 0;
        let (mut force, mut thermal, mut imposed) =
            (Sum::default(), Sum::default(), Sum::default());
        for (segment, result) in member.segments.iter().zip(&self.result.segments) {
            let first = at;
            let (mut f, mut t, mut m) = (Sum::default(), Sum::default(), Sum::default());
            let (mut most, mut least, mut size) = (None::<Force>, None::<Force>, Force::default());
            while at < self.along.len()
                && std::ptr::eq(segment, &member.segments[member.pieces[at].segment])
            {
                let piece = &self.along[at].sums;
                if let SegmentKind::Gap(_) = segment.kind {
                    f.add(
                        self.displacement(at + 1) - self.displacement(at),
                        Length::default(),
                    );
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
        let ends = self.displacement(result.stations.len() - 1) - self.displacement(0);
        let sizes = force.size + thermal.size + imposed.size + result.elongation.abs();
        self.compatibility
            .take((result.elongation - ends).over(sizes));
        self.member_extremes();
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
        let here = at(after);
        if here == named {
            return here;
        }
        let before = at(after.saturating_sub(1));
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

    /// The work of loads and reactions against the internal work.
    fn energy(&self) -> f64 {
        let (mut balance, mut size) = (Energy::default(), Energy::default());
        let mut take = |work: Energy| {
            balance += work;
            size += work.abs();
        };
        for (station, at) in self.acting.stations.iter().enumerate() {
            take(at.load * self.displacement(station));
        }
        for (support, result) in self
            .acting
            .member
            .supports
            .iter()
            .zip(&self.result.supports)
        {
            take(result.reaction.unwrap_or_default() * self.displacement(support.station));
        }
        for (index, Piece { sums: piece, .. }) in self.along.iter().enumerate() {
            take(piece.load * self.displacement(index) + piece.line_work);
            let segment = &self.acting.member.segments[self.acting.member.pieces[index].segment];
            if let SegmentKind::Gap(_) = segment.kind {
                let (_, force) = self.forces_at(index);
                take(-(force * (self.displacement(index + 1) - self.displacement(index))));
            } else {
                take(-piece.elastic_work);
                take(-piece.free_work);
            }
        }
        balance.over(size)
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
