//! Members that carry one way: what is taut pulls, what bears pushes, and what is slack is as far from
//! it as its points are.

use super::between::Ends;
use crate::model::Carries;
use crate::proof::DOUBT;
use crate::proof::acting::Acting;
use crate::proof::member::Proof;
use crate::proof::piece::Piece;
use crate::proof::residual::{Residual, Size};
use crate::quantity::{Force, Length};
use crate::result::MemberState;

impl Proof<'_> {
    /// Whether the member's state is one that it may have, and the sign of its force or its distance
    /// from being taut says the same. `lump` is what of its weight the lever rule puts on its start,
    /// along its axis; `by_weight` the stretch that its weight would make, with its size.
    pub(super) fn state(&mut self, ends: &Ends, lump: Force, by_weight: (Length, Length)) {
        let carries = self.acting.member.carries;
        match (carries, self.result.state) {
            (Some(way), MemberState::Slack) => {
                self.distance_from_taut(way, ends, by_weight);
                self.slack_stations();
                return;
            }
            (None, MemberState::Taut) => {}
            (Some(Carries::Tension), MemberState::Taut)
            | (Some(Carries::Compression), MemberState::Bearing) => {
                let start = self.result.stations[0].force_after.unwrap_or_default();
                let between = start - lump;
                let wrong = if carries == Some(Carries::Tension) {
                    -between
                } else {
                    between
                };
                let sizes = start.abs() + lump.abs();
                self.equilibrium
                    .take(wrong.max(Force::default()).over(sizes));
            }
            _ => self.compatibility.take(f64::INFINITY),
        }
        if self.result.slack_by.is_some() {
            self.compatibility.take(f64::INFINITY);
        }
    }

    fn distance_from_taut(
        &mut self,
        way: Carries,
        ends: &Ends,
        (by_weight, weight_size): (Length, Length),
    ) {
        let (free, free_size) = self.free();
        let apart = ends.moves[1] - ends.moves[0];
        let loose = match way {
            Carries::Tension => free + by_weight - apart,
            Carries::Compression => apart - free - by_weight,
        };
        let sizes = free_size + weight_size + ends.sizes[0] + ends.sizes[1];
        let named = self.result.slack_by.unwrap_or_default();
        self.compatibility
            .take((loose - named).over(sizes + named.abs()));
        let overlap = named.min(Length::default());
        self.compatibility.take(overlap.over(sizes));
    }

    /// What the member would change its length by itself, and the sum of the sizes.
    fn free(&self) -> (Length, Length) {
        let none = (Length::default(), Length::default());
        self.pieces.iter().fold(none, |(free, size), piece| {
            (free + piece.thermal + piece.imposed, size + piece.free_size)
        })
    }

    /// The stations of a slack member lie as it hangs from its start, or as it stands on its end.
    fn slack_stations(&mut self) {
        let last = self.result.stations.len() - 1;
        let (start, end) = (self.displacement(0), self.displacement(last));
        let (whole, free_size) = self.free();
        let size = start.abs() + end.abs() + free_size;
        let (mut free, mut left) = (Length::default(), Residual::default());
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

/// `∫ N/EA dx` of a member that only its own weight stresses, its lumps on its ends holding it, and
/// the sum of the sizes.
pub(super) fn stretch_by_weight(acting: &Acting, lump: Force) -> (Length, Length) {
    let mut force = lump;
    let (mut stretch, mut size) = (Length::default(), Length::default());
    for piece in 0..acting.member.pieces.len() {
        if !acting.has_weight(piece) && force == Force::default() {
            continue;
        }
        let load = Piece::of(acting, piece, (force, force)).load();
        let after = force - load;
        let along = Piece::of(acting, piece, (force, after));
        let integrated = along.integrate(acting, piece, lump.abs() * DOUBT);
        stretch += integrated.force;
        size += integrated.force_size;
        force = after;
    }
    (stretch, size)
}
