//! A member condensed to a chain: stations, the links between them, and what holds them.
//!
//! With the state of every stop and joint known, the chain is linear. What lies to the left of a
//! station answers there with a straight line between its displacement and its force; the line is
//! carried from start to end with sums of positive terms only, so nothing is lost when one
//! stiffness is 10⁹ times another, and the forces and displacements are read off on the way back.
//! A side that nothing holds answers with a force that does not depend on displacement: then N
//! comes from statics alone and no modulus enters it.

use super::placing;
use super::threshold::Threshold;
use crate::model::Side;
use crate::quantity::{Flexibility, Force, ForcePerLength, Length, Ratio};

/// A member as stations and links; one link fewer than stations.
#[derive(Default)]
pub(super) struct Chain {
    /// Force at each station, + toward the end.
    pub(super) loads: Vec<Force>,
    /// What lies between a station and the next.
    pub(super) links: Vec<Link>,
    /// What holds the stations, in rising order of station.
    pub(super) holds: Vec<Hold>,
    /// What counts as zero.
    pub(super) zero: Threshold,
}

/// What lies between two stations.
#[derive(Debug, Clone, Copy)]
pub(super) struct Link {
    /// Stretch per force; of a joint once it has closed.
    pub(super) flexibility: Flexibility,
    /// Stretch while the force at the anchored end is 0; of a closed joint minus its width.
    pub(super) free: Length,
    /// All of the line load on it, + toward the end.
    pub(super) load: Force,
    /// Whether `free` is measured with no force at its end, else at its start.
    pub(super) from_end: bool,
    /// Whether it is a joint that bears only once closed.
    pub(super) joint: bool,
}

/// A support, with its face in place.
#[derive(Debug, Clone, Copy)]
pub(super) struct Hold {
    pub(super) station: usize,
    /// Index into the member's supports.
    pub(super) support: usize,
    /// The displacement at which it begins to push: movement and clearance together.
    pub(super) face: Length,
    /// `None` for rigid.
    pub(super) stiffness: Option<ForcePerLength>,
    /// The direction that a stop blocks; `None` for one that also pulls.
    pub(super) stop: Option<Side>,
}

/// Which stops bear and which joints are closed; true as well for holds that always act.
#[derive(Debug, Clone, Default, PartialEq, Eq)]
pub(super) struct States {
    pub(super) holds: Vec<bool>,
    pub(super) links: Vec<bool>,
}

impl States {
    /// Whether one hold at the most acts and every joint is closed, so that statics alone gives N.
    pub(super) fn are_statics(&self) -> bool {
        self.holds.iter().filter(|&&acts| acts).count() < 2 && self.links.iter().all(|&shut| shut)
    }
}

/// Displacements and forces of a solved chain.
#[derive(Debug, Clone, Default)]
pub(super) struct Solved {
    pub(super) displacements: Vec<Length>,
    /// N just before each station; 0 at the start.
    pub(super) before: Vec<Force>,
    /// N just after each station; 0 at the end.
    pub(super) after: Vec<Force>,
    /// Reaction of every hold.
    pub(super) reactions: Vec<Force>,
    /// Groups of stations that nothing holds, first and last, whose displacement is free.
    pub(super) free: Vec<(usize, usize)>,
    /// What arrives at each station from its left, before its own load and holds.
    pub(super) arriving: Vec<Answer>,
}

/// Why a chain has no solution.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum NoSolution {
    /// This force pushes the stations from the first to the last, and nothing holds them.
    Pushed {
        first: usize,
        last: usize,
        force: Force,
    },
    /// Rigid holds at both ends of these stations are moved apart or together, and nothing
    /// between them can give.
    Contradiction { first: usize, last: usize },
}

/// How what lies to the left answers at a station.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum Answer {
    /// With this force at any displacement: nothing holds it.
    Free { force: Force },
    /// Displacement = rest + flexibility × force.
    Held {
        rest: Length,
        flexibility: Flexibility,
    },
}

impl Answer {
    /// A start that nothing holds.
    pub(super) fn nothing() -> Self {
        Answer::Free {
            force: Force::default(),
        }
    }

    /// A station held rigidly at this displacement.
    pub(super) fn rigid(at: Length) -> Self {
        Answer::Held {
            rest: at,
            flexibility: Flexibility::default(),
        }
    }

    /// Past a load at the station: N drops by it.
    pub(super) fn past_load(self, load: Force) -> Self {
        match self {
            Answer::Free { force } => Answer::Free {
                force: force - load,
            },
            Answer::Held { rest, flexibility } => Answer::Held {
                rest: rest + flexibility * load,
                flexibility,
            },
        }
    }

    /// Past a spring at the station, whose foot is at `face`.
    pub(super) fn past_spring(self, stiffness: ForcePerLength, face: Length) -> Self {
        match self {
            Answer::Free { force } => Answer::Held {
                rest: face - force / stiffness,
                flexibility: one() / stiffness,
            },
            Answer::Held { rest, flexibility } => {
                let grip: Ratio = stiffness * flexibility;
                let share = one() + grip;
                Answer::Held {
                    rest: (rest + grip * face) / share,
                    flexibility: flexibility / share,
                }
            }
        }
    }

    /// Past a link, an open joint excepted.
    pub(super) fn past_link(self, link: &Link) -> Self {
        match self {
            Answer::Free { force } => Answer::Free {
                force: force - link.load,
            },
            Answer::Held { rest, flexibility } => {
                let at_start = if link.from_end {
                    flexibility
                } else {
                    flexibility + link.flexibility
                };
                Answer::Held {
                    rest: rest + at_start * link.load + link.free,
                    flexibility: flexibility + link.flexibility,
                }
            }
        }
    }
}

impl Solved {
    /// Makes room for a chain of so many stations and holds, all at rest.
    fn clear(&mut self, stations: usize, holds: usize) {
        for forces in [&mut self.before, &mut self.after] {
            forces.clear();
            forces.resize(stations, Force::default());
        }
        self.displacements.clear();
        self.displacements.resize(stations, Length::default());
        self.reactions.clear();
        self.reactions.resize(holds, Force::default());
        self.free.clear();
        self.arriving.clear();
        self.arriving.resize(stations, Answer::nothing());
    }
}

fn one() -> Ratio {
    crate::quantity::from_si(1.0)
}

impl Link {
    /// Its stretch while N just after its start is `start`.
    pub(super) fn stretch(&self, start: Force) -> Length {
        let anchor = if self.from_end {
            start - self.load
        } else {
            start
        };
        self.free + self.flexibility * anchor
    }
}

impl Chain {
    /// Solves the chain with these states, in the place of what was solved before.
    pub(super) fn solve(&self, states: &States, solved: &mut Solved) -> Result<(), NoSolution> {
        let count = self.loads.len();
        solved.clear(count, self.holds.len());
        let mut first = 0;
        while first < count {
            let open = (first..count - 1).find(|&link| !states.links[link]);
            let last = open.unwrap_or(count - 1);
            let held = self.holds_in(first, last).any(|hold| states.holds[hold]);
            if held {
                self.solve_held(states, first, last, solved)?;
            } else {
                self.solve_free(first, last, solved)?;
                solved.free.push((first, last));
            }
            first = last + 1;
        }
        if !solved.free.is_empty() {
            placing::place(self, solved);
        }
        Ok(())
    }

    /// The holds of the stations from first to last.
    pub(super) fn holds_in(&self, first: usize, last: usize) -> std::ops::Range<usize> {
        let from = self.holds.partition_point(|hold| hold.station < first);
        let to = self.holds.partition_point(|hold| hold.station <= last);
        from..to
    }

    /// The holds of a station, the first of them or of a later station being `from`.
    fn holds_from(&self, from: usize, station: usize) -> std::ops::Range<usize> {
        let others = self.holds[from..].iter();
        let count = others.take_while(|hold| hold.station == station).count();
        from..from + count
    }

    /// The holds of a station, the last of them or of an earlier station being the one before `to`.
    fn holds_up_to(&self, to: usize, station: usize) -> std::ops::Range<usize> {
        let others = self.holds[..to].iter().rev();
        let count = others.take_while(|hold| hold.station == station).count();
        to - count..to
    }

    /// A group of stations that at least one hold acts on.
    fn solve_held(
        &self,
        states: &States,
        first: usize,
        last: usize,
        solved: &mut Solved,
    ) -> Result<(), NoSolution> {
        let own = self.holds_in(first, last);
        self.forward(states, (first, last), own.start, &mut solved.arriving);
        let mut after = Force::default();
        let mut later = own.end;
        for station in (first..=last).rev() {
            let holds = self.holds_up_to(later, station);
            later = holds.start;
            let arriving = solved.arriving[station];
            let mut answer = arriving.past_load(self.loads[station]);
            let mut springs = Vec::new();
            let mut rigid = None;
            for hold in holds.filter(|&hold| states.holds[hold]) {
                match self.holds[hold].stiffness {
                    Some(stiffness) => {
                        springs.push((hold, stiffness, answer));
                        answer = answer.past_spring(stiffness, self.holds[hold].face);
                    }
                    None => rigid = Some(hold),
                }
            }

            solved.after[station] = after;
            if let Some(hold) = rigid {
                let face = self.holds[hold].face;
                solved.displacements[station] = face;
                let load = self.loads[station];
                let before = self.force_at_rigid(arriving, face, after + load, (first, station))?;
                // The springs beside it answer by its displacement, and it takes the rest.
                let mut rest = before - load - after;
                for &(spring, stiffness, _) in &springs {
                    solved.reactions[spring] = stiffness * (self.holds[spring].face - face);
                    rest -= solved.reactions[spring];
                }
                solved.before[station] = before;
                solved.reactions[hold] = rest;
            } else {
                let mut force = after;
                solved.displacements[station] = match answer {
                    Answer::Held { rest, flexibility } => rest + flexibility * force,
                    // Nothing holds it from the left, so it follows what it hangs on at its right.
                    Answer::Free { .. } => {
                        solved.displacements[station + 1] - self.links[station].stretch(after)
                    }
                };
                for &(hold, stiffness, answer) in springs.iter().rev() {
                    let left = match answer {
                        Answer::Free { force } => force,
                        Answer::Held { rest, flexibility } => {
                            (force - stiffness * (rest - self.holds[hold].face))
                                / (one() + stiffness * flexibility)
                        }
                    };
                    solved.reactions[hold] = left - force;
                    force = left;
                }
                solved.before[station] = match arriving {
                    Answer::Free { force } => force,
                    Answer::Held { .. } => force + self.loads[station],
                };
            }
            if station > first {
                after = solved.before[station] + self.links[station - 1].load;
            }
        }
        Ok(())
    }

    /// N just before a rigid hold, from how the left answers at its face. Where something rigid
    /// answers, only one of the two is needed: the hold takes nothing and N is `passed_on`.
    fn force_at_rigid(
        &self,
        answer: Answer,
        face: Length,
        passed_on: Force,
        (first, station): (usize, usize),
    ) -> Result<Force, NoSolution> {
        match answer {
            Answer::Free { force } => Ok(force),
            Answer::Held { rest, flexibility } if flexibility > Flexibility::default() => {
                Ok((face - rest) / flexibility)
            }
            Answer::Held { rest, .. } if (face - rest).abs() <= self.zero.length => Ok(passed_on),
            Answer::Held { .. } => Err(NoSolution::Contradiction {
                first,
                last: station,
            }),
        }
    }

    /// Fills in what arrives at each station of a group, whose first hold is `next`.
    fn forward(
        &self,
        states: &States,
        (first, last): (usize, usize),
        mut next: usize,
        arriving: &mut [Answer],
    ) {
        let mut answer = Answer::nothing();
        for (station, arriving) in (first..=last).zip(&mut arriving[first..=last]) {
            *arriving = answer;
            answer = answer.past_load(self.loads[station]);
            let mut rigid = None;
            let holds = self.holds_from(next, station);
            next = holds.end;
            for hold in holds.filter(|&hold| states.holds[hold]) {
                match self.holds[hold].stiffness {
                    Some(stiffness) => {
                        answer = answer.past_spring(stiffness, self.holds[hold].face)
                    }
                    None => rigid = Some(self.holds[hold].face),
                }
            }
            if let Some(face) = rigid {
                answer = Answer::rigid(face);
            }
            if station < last {
                answer = answer.past_link(&self.links[station]);
            }
        }
    }

    /// A group that nothing holds: sound only while no load pushes it, and placed afterwards.
    fn solve_free(&self, first: usize, last: usize, solved: &mut Solved) -> Result<(), NoSolution> {
        let mut force = Force::default();
        for station in first..=last {
            solved.before[station] = force;
            force -= self.loads[station];
            if station == last {
                break;
            }
            solved.after[station] = force;
            let link = &self.links[station];
            solved.displacements[station + 1] = solved.displacements[station] + link.stretch(force);
            force -= link.load;
        }
        if force.abs() > self.zero.force {
            return Err(NoSolution::Pushed {
                first,
                last,
                force: -force,
            });
        }
        Ok(())
    }
}
