//! From a system and its loads to the answer.
//!
//! States that were found before, or the base itself, are tried first: the energy is convex, so that
//! states whose signs all hold are the answer, whatever they were guessed from. Otherwise they are
//! searched for (`search`) and checked in the same way.

use super::choice::{amounts, tipping};
use super::held::{Held, Part, Settled, stretch};
use super::split::{Split, split};
use super::tableau::{Tableau, work};
use super::twofold::Twofold;
use super::{Answer, Failure, FreeMotion, Loads, OneWay, Row, System};
use crate::quantity::{Length, from_si};
use crate::solve::Threshold;

/// Sets of states whose factors are kept, beside the base.
const KEPT: usize = 8;

/// A system made ready for loads: what depends on it alone is done once.
#[derive(Debug, Clone)]
pub(in crate::solve) struct Prepared {
    pub(super) system: System,
    /// The base first, then states that were met.
    pub(super) states: Vec<Held>,
    /// The states that stood last.
    last: usize,
    /// The one to make room next.
    oldest: usize,
    pub(super) tableau: Option<Tableau>,
}

/// States that stand, and all in them that is decided.
#[derive(Debug)]
pub(super) struct Standing {
    pub(super) settled: Settled,
    clearance: Vec<f64>,
    /// Which of the kept states.
    held: usize,
}

/// What a set of states comes to.
pub(super) enum Verdict {
    Stands(Standing),
    /// All signs hold, but these act without a force.
    Touching(Standing, Vec<usize>),
    /// A part that pushes, or that is stretched without acting; one whose state must change.
    Falls(usize),
    /// A motion is pushed that nothing resists in these states.
    Pushed(Row),
    Contradiction(Vec<Part>),
}

impl Prepared {
    /// Factors the system in its base: all one-way parts act that are elastic, and of the rigid
    /// ones those without which something could move.
    pub(in crate::solve) fn of(system: System) -> Self {
        let elastic = |one_way: &super::OneWay| one_way.stiffness.is_some();
        let acts: Vec<bool> = system.one_way.iter().map(elastic).collect();
        let mut base = Held::of(&system, acts);
        let needed = base.needed(&system);
        if !needed.is_empty() {
            let mut acts = base.acts;
            for part in needed {
                acts[part] = true;
            }
            base = Held::of(&system, acts);
        }
        Prepared {
            system,
            states: vec![base],
            last: 0,
            oldest: 0,
            tableau: None,
        }
    }

    /// The state of least energy under `loads`.
    ///
    /// # Errors
    ///
    /// [`Failure::Pushed`] where the energy has no least, [`Failure::Contradiction`] where no
    /// displacements keep what the rigid parts ask for.
    pub(in crate::solve) fn solve(&mut self, loads: &Loads) -> Result<Answer, Failure> {
        let standing = self.stand(loads)?;
        Ok(self.answer(standing, loads))
    }

    /// The states that stand under `loads`.
    pub(super) fn stand(&mut self, loads: &Loads) -> Result<Standing, Failure> {
        let first = self.judge(self.last, loads);
        let base = match first {
            Verdict::Stands(standing) => return Ok(standing),
            Verdict::Touching(standing, touching) => {
                return Ok(self.let_go(standing, &touching, loads));
            }
            first if self.last == 0 => first,
            _ => self.judge(0, loads),
        };
        match base {
            Verdict::Stands(standing) => Ok(standing),
            Verdict::Touching(standing, touching) => Ok(self.let_go(standing, &touching, loads)),
            Verdict::Contradiction(parts) => Err(contradiction(&parts)),
            // In the base even the one-way parts that hold a motion hold it both ways.
            Verdict::Pushed(motion) => Err(pushed(motion, loads)),
            Verdict::Falls(_) => self.search(loads),
        }
    }

    /// Takes parts that touch without force out of the acting ones.
    pub(super) fn let_go(
        &mut self,
        standing: Standing,
        touching: &[usize],
        loads: &Loads,
    ) -> Standing {
        let mut acts = self.states[standing.held].acts.clone();
        for &part in touching {
            acts[part] = false;
        }
        let held = self.keep(acts);
        match self.judge(held, loads) {
            Verdict::Stands(released) => released,
            // Below the threshold both are right; then the one that stands is taken.
            _ => standing,
        }
    }

    /// The place of a set of states among those kept; factored when it is new.
    pub(super) fn keep(&mut self, acts: Vec<bool>) -> usize {
        match self.known(&acts) {
            Some(known) => known,
            None => self.keep_held(Held::of(&self.system, acts)),
        }
    }

    fn known(&self, acts: &[bool]) -> Option<usize> {
        self.states.iter().position(|held| held.acts == acts)
    }

    /// The same for a set that is factored already.
    pub(super) fn keep_held(&mut self, held: Held) -> usize {
        if let Some(known) = self.known(&held.acts) {
            return known;
        }
        if self.states.len() <= KEPT {
            self.states.push(held);
            return self.states.len() - 1;
        }
        self.oldest = self.oldest % KEPT + 1;
        self.states[self.oldest] = held;
        self.oldest
    }

    pub(super) fn judge(&mut self, index: usize, loads: &Loads) -> Verdict {
        let held = &self.states[index];
        let mut settled = match held.settle(&self.system, loads) {
            Ok(settled) => settled,
            Err(parts) => return Verdict::Contradiction(parts),
        };
        let zero = loads.zero.force.value;
        if held.is_pushed(loads) {
            return Verdict::Pushed(held.pushed_motion(loads));
        }
        let mut touching = Vec::new();
        let mut worst = (None, -zero);
        for (part, &force) in settled
            .one_way
            .iter()
            .enumerate()
            .filter(|(part, _)| held.acts[*part])
        {
            if force < worst.1 {
                worst = (Some(part), force);
            }
            if force <= zero {
                touching.push(part);
            }
        }
        if let (Some(part), _) = worst {
            return Verdict::Falls(part);
        }
        if !held.motions.is_empty() {
            match amounts(&self.system, held, &settled, loads) {
                Ok(moved) => settled.displacements = moved,
                Err(part) => return Verdict::Falls(part),
            }
        }
        let mut worst = (None, -loads.zero.length.value);
        let mut clearance = vec![0.0; self.system.one_way.len()];
        for (part, one_way) in self
            .system
            .one_way
            .iter()
            .enumerate()
            .filter(|(part, _)| !held.acts[*part])
        {
            let rest = loads.one_way_rest[part].value;
            let open = -stretch(&one_way.row, &settled.displacements)
                .plus(-rest)
                .value();
            if open < worst.1 {
                worst = (Some(part), open);
            }
            clearance[part] = if open > loads.zero.length.value {
                open
            } else {
                0.0
            };
        }
        if let (Some(part), _) = worst {
            return Verdict::Falls(part);
        }
        self.last = index;
        let standing = Standing {
            settled,
            clearance,
            held: index,
        };
        if touching.is_empty() {
            Verdict::Stands(standing)
        } else {
            Verdict::Touching(standing, touching)
        }
    }

    pub(super) fn answer(&self, standing: Standing, loads: &Loads) -> Answer {
        let held = &self.states[standing.held];
        let mut settled = standing.settled;
        let mut acts = held.acts.clone();
        let Split {
            undecided_rigid,
            undecided_one_way,
        } = split(
            &self.system,
            held,
            &standing.clearance,
            &mut settled,
            &mut acts,
            loads,
        );
        let free: Vec<FreeMotion> = if held.motions.is_empty() {
            Vec::new()
        } else {
            tipping(&self.system, held, &standing.clearance)
        };
        let forces = |values: Vec<f64>| values.into_iter().map(from_si).collect();
        Answer {
            displacements: settled
                .displacements
                .iter()
                .map(|u| from_si(u.value()))
                .collect(),
            elastic: forces(settled.elastic),
            rigid: forces(settled.rigid),
            one_way: settled
                .one_way
                .into_iter()
                .zip(&acts)
                .map(|(force, &acts)| from_si(if acts { force.max(0.0) } else { 0.0 }))
                .collect(),
            clearance: self.clearances(&standing.clearance, &acts, &settled.displacements, loads),
            acts,
            free,
            undecided_rigid,
            undecided_one_way,
            condition: held.condition(),
        }
    }
}

impl Prepared {
    /// How far every part is from acting. What counts as a touch for the states may be a clearance
    /// all the same, where a soft part lets the threshold be wide: it is told as it is, but for
    /// the rounding of what it is the difference of.
    fn clearances(
        &self,
        decided: &[f64],
        acts: &[bool],
        displacements: &[Twofold],
        loads: &Loads,
    ) -> Vec<Length> {
        let parts = self.system.one_way.iter().zip(&loads.one_way_rest);
        let clearance =
            |((part, &rest), (&decided, &acts)): ((&OneWay, &Length), (&f64, &bool))| {
                if acts || decided > 0.0 {
                    return from_si(decided);
                }
                let open = -stretch(&part.row, displacements).plus(-rest.value).value();
                let sizes = part.row.iter().map(|&(unknown, b)| {
                    let moved = displacements[unknown].value();
                    (b * moved).abs()
                });
                let size = rest.abs() + from_si(sizes.sum());
                let open: Length = from_si(open);
                if open > Threshold::beside(size) {
                    open
                } else {
                    Length::default()
                }
            };
        let decisions = decided.iter().zip(acts);
        parts.zip(decisions).map(clearance).collect()
    }
}

pub(super) fn pushed(motion: Row, loads: &Loads) -> Failure {
    Failure::Pushed {
        force: from_si(work(&motion, loads)),
        motion,
    }
}

pub(super) fn contradiction(parts: &[Part]) -> Failure {
    let (mut rigid, mut one_way) = (Vec::new(), Vec::new());
    for &part in parts {
        match part {
            Part::Rigid(index) => rigid.push(index),
            Part::OneWay(index) => one_way.push(index),
            Part::Elastic(_) => {}
        }
    }
    rigid.sort_unstable();
    one_way.sort_unstable();
    Failure::Contradiction { rigid, one_way }
}
