//! The largest and the least force of segments and members, and how layers share it.

use super::member::Proof;
use super::residual::Size;
use crate::quantity::{Force, Length};
use crate::result::SegmentResult;

impl Proof<'_> {
    /// The extremes of N of a segment against what the proof saw along it. Its places are the ends
    /// and the nodes, so that an extreme between them may only be larger. `size` is that of the
    /// terms which N is the sum of.
    pub(super) fn extremes(
        &mut self,
        result: &SegmentResult,
        most: Force,
        least: Force,
        size: Force,
    ) {
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

    pub(super) fn member_extremes(&mut self) {
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
    pub(super) fn layers(&mut self, result: &SegmentResult) {
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
}
