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
    let wishes = wishes(chain, solved, &groups);
    // From the left: the group before it stands where it will be.
    for (index, &(first, last)) in groups.iter().enumerate() {
        if first > 0 {
            let touching = solved.displacements[first - 1] - solved.displacements[first]
                + chain.links[first - 1].free;
            room[index].keep_above(Some(touching));
        }
        let by = room[index].nearest_to(wishes[index]);
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

/// Neighbouring free groups that would overlap where each wants to be, moved as one.
struct Together {
    /// How many groups.
    count: usize,
    /// The move of the first group at which the squares add up to least, and what counts for it.
    wish: Length,
    weight: f64,
    /// How far the last group stands beyond the first one's move while they touch.
    reach: Length,
}

/// The moves of all free groups at which the squares of the end displacements add up to least while
/// no two of them overlap: neighbours that would are pooled, their wishes weighted, until none do
/// (isotonic regression).
fn wishes(chain: &Chain, solved: &Solved, groups: &[(usize, usize)]) -> Vec<Length> {
    let mut pooled: Vec<Together> = Vec::with_capacity(groups.len());
    // Of each group, how far it must be moved beyond the one before it at the least.
    let mut beyond = Vec::with_capacity(groups.len());
    for (index, &(first, last)) in groups.iter().enumerate() {
        let (wish, weight) = wanted(chain, solved, (first, last));
        let follows = index > 0 && groups[index - 1].1 + 1 == first;
        let touching = follows.then(|| {
            solved.displacements[first - 1] - solved.displacements[first]
                + chain.links[first - 1].free
        });
        beyond.push(touching);
        let mut latest = Together {
            count: 1,
            wish,
            weight,
            reach: Length::default(),
        };
        let mut gap = touching;
        while let (Some(touching), Some(before)) = (gap, pooled.last()) {
            let offset = before.reach + touching;
            if latest.wish >= before.wish + offset {
                break;
            }
            let weight = before.weight + latest.weight;
            let wish =
                (before.wish * before.weight + (latest.wish - offset) * latest.weight) / weight;
            let count = before.count + latest.count;
            latest = Together {
                count,
                wish,
                weight,
                reach: offset + latest.reach,
            };
            pooled.pop();
            gap = beyond[index + 1 - count];
        }
        pooled.push(latest);
    }
    let mut wishes = Vec::with_capacity(groups.len());
    for together in pooled {
        let mut at = together.wish;
        for group in 0..together.count {
            if group > 0 {
                at += beyond[wishes.len()].unwrap_or_default();
            }
            wishes.push(at);
        }
    }
    wishes
}

/// What a group without an end of the member counts against those that have one: next to nothing.
const INNER: f64 = 1e-9;

/// The move of one group by itself at which its squares add up to least, and how many of the
/// member's ends count for it.
fn wanted(chain: &Chain, solved: &Solved, (first, last): (usize, usize)) -> (Length, f64) {
    let (at_first, at_last) = (solved.displacements[first], solved.displacements[last]);
    let (has_start, has_end) = (first == 0, last + 1 == chain.loads.len());
    match (has_start, has_end) {
        (true, false) => (-at_first, 1.0),
        (false, true) => (-at_last, 1.0),
        (true, true) => (-(at_first + at_last) * 0.5, 2.0),
        (false, false) => (-(at_first + at_last) * 0.5, INNER),
    }
}
