//! Where a group of stations stands that nothing holds and nothing pushes.

use super::chain::{Chain, Solved};
use crate::model::Side;
use crate::quantity::Length;

/// Moves every free group to where the squares of the displacements of the member's ends that it
/// has (else of its own ends) add up to least, as far as open stops and joints leave room.
pub(super) fn place(chain: &Chain, solved: &mut Solved) {
    let groups = std::mem::take(&mut solved.free);
    let mut room: Vec<Room> = groups
        .iter()
        .map(|&group| between_stops(chain, solved, group))
        .collect();
    // From the right: a group may move toward the end as far as the next one lets it.
    for (index, &(_, last)) in groups.iter().enumerate().rev() {
        if last + 1 < chain.loads.len() {
            let next = match groups.get(index + 1) {
                Some(&(first, _)) if first == last + 1 => room[index + 1].most,
                _ => Some(Length::default()),
            };
            let touching = solved.displacements[last + 1]
                - solved.displacements[last]
                - chain.links[last].free;
            room[index].keep_below(next.map(|next| next + touching));
        }
    }
    // From the left: the group before it stands where it will be.
    for (index, &(first, last)) in groups.iter().enumerate() {
        if first > 0 {
            let touching = solved.displacements[first - 1] - solved.displacements[first]
                + chain.links[first - 1].free;
            room[index].keep_above(Some(touching));
        }
        let by = room[index].nearest_to(wanted(chain, solved, (first, last)));
        for displacement in &mut solved.displacements[first..=last] {
            *displacement += by;
        }
    }
    solved.free = groups;
}

/// How far a group may be moved, + toward the end.
struct Room {
    least: Option<Length>,
    most: Option<Length>,
}

impl Room {
    fn keep_above(&mut self, bound: Option<Length>) {
        if let Some(bound) = bound {
            self.least = Some(self.least.map_or(bound, |least| least.max(bound)));
        }
    }

    fn keep_below(&mut self, bound: Option<Length>) {
        if let Some(bound) = bound {
            self.most = Some(self.most.map_or(bound, |most| most.min(bound)));
        }
    }

    fn nearest_to(&self, wanted: Length) -> Length {
        let below = self.most.map_or(wanted, |most| wanted.min(most));
        self.least.map_or(below, |least| below.max(least))
    }
}

fn between_stops(chain: &Chain, solved: &Solved, (first, last): (usize, usize)) -> Room {
    let mut room = Room {
        least: None,
        most: None,
    };
    for hold in &chain.holds[chain.holds_in(first, last)] {
        let clearance = hold.face - solved.displacements[hold.station];
        match hold.stop {
            Some(Side::End) => room.keep_below(Some(clearance)),
            Some(Side::Start) => room.keep_above(Some(clearance)),
            None => {}
        }
    }
    room
}

/// The move after which the squares of the end displacements add up to least.
fn wanted(chain: &Chain, solved: &Solved, (first, last): (usize, usize)) -> Length {
    let (at_first, at_last) = (solved.displacements[first], solved.displacements[last]);
    let (has_start, has_end) = (first == 0, last + 1 == chain.loads.len());
    match (has_start, has_end) {
        (true, false) => -at_first,
        (false, true) => -at_last,
        _ => -(at_first + at_last) * 0.5,
    }
}
