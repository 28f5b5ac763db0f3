//! States found by steps in which whole sets of one-way parts change over.
//!
//! Each step solves the system with the parts that act now, then lets go of all that push and takes
//! in all that overlap. Where every one-way part is elastic this is Newton's method on a convex
//! energy that is quadratic between the changes: the step ends where the energy along it is least,
//! so that the energy falls from step to step and no set comes back. Beside rigid one-way parts the
//! steps are taken whole; once a set comes back, one part changes over at a time. Nothing rests on
//! how the states were found: they are the answer when all signs hold.

use super::held::{Held, Settled, stretch};
use super::tableau::work;
use super::{Loads, Row, System};
use std::collections::HashSet;

/// Most searches end within ten steps; one that takes more than these is left to the exact method.
const STEPS: usize = 60;

/// What a motion of size 1 may stretch a part and still leave it alone.
pub(super) const LEFT_ALONE: f64 = 1e-9;

/// Where the steps end.
pub(super) enum End {
    /// In states whose signs hold, as far as they are decided without the choice of free motions.
    At(Box<Held>),
    /// On a motion along which the loads push and that nothing stops.
    Motion(Row),
    /// Nowhere: the states are left to the exact method.
    Nowhere,
}

/// Steps from the base, which does not stand under `loads`.
pub(super) fn descend(system: &System, base: &Held, loads: &Loads) -> End {
    let Ok(settled) = base.settle(system, loads) else {
        return End::Nowhere;
    };
    let mut now = Position::of(system, base, settled, loads);
    let mut acts = base.acts.clone();
    for part in now.falling(system, &acts, loads) {
        acts[part] = !acts[part];
    }
    let elastic = system.one_way.iter().all(|part| part.stiffness.is_some());
    let mut seen = HashSet::new();
    for _ in 0..STEPS {
        let held = Held::of(system, acts.clone());
        let Ok(settled) = held.settle(system, loads) else {
            return End::Nowhere;
        };
        if held.is_pushed(loads) {
            let motion = held.pushed_motion(loads);
            let along = stretches(system, &motion);
            let stops = |part: &usize| !acts[*part] && along[*part] > LEFT_ALONE;
            let stops: Vec<usize> = (0..acts.len()).filter(stops).collect();
            if stops.is_empty() {
                return End::Motion(motion);
            }
            if elastic && now.move_along(system, &along, work(&motion, loads)) {
                for part in now.falling(system, &acts, loads) {
                    acts[part] = !acts[part];
                }
            } else {
                stops.into_iter().for_each(|part| acts[part] = true);
            }
            continue;
        }
        let next = Position::of(system, &held, settled, loads);
        let mut falling = next.falling(system, &acts, loads);
        if !held.motions.is_empty() {
            // What is open depends on where the free motions come to rest.
            falling.retain(|&part| acts[part]);
        }
        if falling.is_empty() {
            return End::At(Box::new(held));
        }
        if elastic {
            now.step_to(system, &acts, next);
            falling = now.falling(system, &acts, loads);
        } else if !seen.insert(acts.clone()) {
            falling.truncate(1);
        }
        if falling.is_empty() {
            return End::Nowhere;
        }
        for part in falling {
            acts[part] = !acts[part];
        }
    }
    End::Nowhere
}

/// How much a motion stretches each one-way part.
pub(super) fn stretches(system: &System, motion: &[(usize, f64)]) -> Vec<f64> {
    let mut moved = vec![0.0; system.places.len()];
    for &(unknown, share) in motion {
        moved[unknown] = share;
    }
    let along = |row: &Row| row.iter().map(|&(unknown, b)| b * moved[unknown]).sum();
    system.one_way.iter().map(|part| along(&part.row)).collect()
}

/// How far parts are stretched beyond their rest (m).
pub(super) struct Position {
    elastic: Vec<f64>,
    /// Of a rigid part that acts: its force (N), which has the same sign.
    one_way: Vec<f64>,
}

impl Position {
    pub(super) fn of(system: &System, held: &Held, settled: Settled, loads: &Loads) -> Self {
        let mut elastic = settled.elastic;
        for (force, part) in elastic.iter_mut().zip(&system.elastic) {
            *force /= part.stiffness.value;
        }
        let mut one_way = settled.one_way;
        for (index, (beyond, part)) in one_way.iter_mut().zip(&system.one_way).enumerate() {
            if !held.acts[index] {
                let rest = loads.one_way_rest[index].value;
                *beyond = stretch(&part.row, &settled.displacements)
                    .plus(-rest)
                    .value();
            } else if let Some(stiffness) = part.stiffness {
                *beyond /= stiffness.value;
            }
        }
        Position { elastic, one_way }
    }

    /// The parts that push though they act, or overlap though they are open; in order.
    pub(super) fn falling(&self, system: &System, acts: &[bool], loads: &Loads) -> Vec<usize> {
        let falls = |part: &usize| {
            let beyond = self.one_way[*part];
            if acts[*part] {
                let stiffness = system.one_way[*part].stiffness.map_or(1.0, |k| k.value);
                beyond * stiffness < -loads.zero.force.value
            } else {
                beyond > loads.zero.length.value
            }
        };
        (0..acts.len()).filter(falls).collect()
    }

    /// Goes toward the state of least energy with these parts acting, as far as the energy falls.
    fn step_to(&mut self, system: &System, acts: &[bool], next: Position) {
        // In `next` the forces of what acts there balance the loads: the work of the loads on the
        // way is theirs.
        let (mut slope, mut rate) = (0.0, 0.0);
        for (part, (now, next)) in system
            .elastic
            .iter()
            .zip(self.elastic.iter().zip(&next.elastic))
        {
            let share = part.stiffness.value * (next - now) * (next - now);
            slope -= share;
            rate += share;
        }
        let along: Vec<f64> = next
            .one_way
            .iter()
            .zip(&self.one_way)
            .map(|(next, now)| next - now)
            .collect();
        for (index, part) in system.one_way.iter().enumerate() {
            if acts[index] {
                let stiffness = part.stiffness.map_or(0.0, |k| k.value);
                slope -= stiffness * next.one_way[index] * along[index];
            }
        }
        let share = self.least(system, &along, slope, rate).unwrap_or(1.0);
        for (now, next) in self.elastic.iter_mut().zip(&next.elastic) {
            *now += share * (next - *now);
        }
        for (now, along) in self.one_way.iter_mut().zip(along) {
            *now += share * along;
        }
    }

    /// Goes along a motion that stretches nothing else but open parts, until these stop it. Says
    /// whether they do.
    fn move_along(&mut self, system: &System, along: &[f64], work: f64) -> bool {
        let Some(share) = self.least(system, along, -work, 0.0) else {
            return false;
        };
        for (now, along) in self.one_way.iter_mut().zip(along) {
            *now += share * along;
        }
        true
    }

    /// How many times `along` the energy is least. Its slope there is `slope` at first and grows at
    /// `rate`, beside what one-way parts add while they are stretched.
    fn least(&self, system: &System, along: &[f64], slope: f64, rate: f64) -> Option<f64> {
        let (mut slope, mut rate) = (slope, rate);
        let mut bends = Vec::new();
        for (index, part) in system.one_way.iter().enumerate() {
            let (now, along) = (self.one_way[index], along[index]);
            let stiffness = part.stiffness.map_or(0.0, |k| k.value);
            let share = stiffness * along * along;
            if share == 0.0 {
                continue;
            }
            let acts = now > 0.0 || (now == 0.0 && along > 0.0);
            if acts {
                slope += stiffness * now * along;
                rate += share;
            }
            let at = -now / along;
            if at > 0.0 {
                bends.push((at, if acts { -share } else { share }));
            }
        }
        if slope >= 0.0 {
            return None;
        }
        bends.sort_unstable_by(|a, b| a.0.total_cmp(&b.0));
        let mut from = 0.0;
        for (at, change) in bends {
            let there = slope + rate * (at - from);
            if there >= 0.0 {
                break;
            }
            (slope, from) = (there, at);
            rate = (rate + change).max(0.0);
        }
        (rate > 0.0).then(|| from - slope / rate)
    }
}
