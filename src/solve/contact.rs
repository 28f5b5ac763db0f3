//! Which stops bear and which joints are closed, found without trying them.
//!
//! What lies to the left of a station answers its movement with a force that is a rising,
//! piecewise straight line. Every stop and joint adds one knot to it: the point at which it is just
//! touched. The line is carried from station to station with its knots; where it meets what the end
//! of the member asks for, each stop and joint whose knot has been passed has changed its state,
//! and no other. One pass finds any number of states, and none is tried.

use super::chain::{Answer, Chain, Hold, Link, NoSolution, States};
use crate::model::Side;
use crate::quantity::{Flexibility, Force, ForcePerLength, Length};

/// How many times the largest displacement that the actions can make a knot may lie off before it
/// is decided: no solution lies there, and in a long sprung chain such knots grow without end.
const FAR: f64 = 1e3;

/// Finds the states of all stops and joints of a chain, in the place of those found before.
pub(super) fn find(
    chain: &Chain,
    states: &mut States,
    pieces: &mut Pieces,
) -> Result<(), NoSolution> {
    // At the far left every stop that blocks movement toward the start bears, and every joint
    // is pressed shut.
    let bears = |hold: &Hold| hold.stop != Some(Side::End);
    states.holds.clear();
    states.holds.extend(chain.holds.iter().map(bears));
    states.links.clear();
    states.links.resize(chain.links.len(), true);
    let one_way = |hold: &Hold| hold.stop.is_some();
    if !chain.holds.iter().any(one_way) && !chain.links.iter().any(|link| link.joint) {
        return Ok(());
    }
    let mut line = Line::new(chain, states, pieces);
    let mut hold = 0;
    for station in 0..chain.loads.len() {
        line.past_load(chain.loads[station]);
        let mut fixed = None;
        while hold < chain.holds.len() && chain.holds[hold].station == station {
            match (chain.holds[hold].stop, chain.holds[hold].stiffness) {
                (None, None) => fixed = Some(chain.holds[hold].face),
                (None, Some(stiffness)) => line.past_spring(stiffness, chain.holds[hold].face),
                (Some(side), None) => line.past_rigid_stop(hold, side, station)?,
                (Some(side), Some(stiffness)) => line.past_elastic_stop(hold, side, stiffness),
            }
            hold += 1;
        }
        if let Some(face) = fixed {
            line.end_at_displacement(face, station)?;
            line.begin(Answer::rigid(face), station);
        }
        line.forget_far_knots();
        if let Some(link) = chain.links.get(station) {
            line.past_link(link);
            if link.joint {
                line.past_joint(station)?;
            }
        }
    }
    line.end_at_no_force()
}

/// What a knot is the touching of.
#[derive(Debug, Clone, Copy)]
enum Touch {
    Stop(usize),
    Joint(usize),
}

/// A point of the line at which a stop or a joint is just touched.
#[derive(Debug, Clone, Copy)]
struct Knot {
    displacement: Length,
    force: Force,
    touch: Touch,
}

/// What the line is made of: straight pieces in order, a knot between each and the next. Kept from
/// one line to the next for its memory alone.
#[derive(Debug, Clone, Default)]
pub(super) struct Pieces {
    straight: Vec<Answer>,
    knots: Vec<Knot>,
}

/// The rising line.
struct Line<'c> {
    chain: &'c Chain,
    straight: &'c mut Vec<Answer>,
    knots: &'c mut Vec<Knot>,
    /// The states before any knot is passed, changed as knots are.
    states: &'c mut States,
    /// The first station of the part that the line answers for.
    first: usize,
    far: Length,
}

impl<'c> Line<'c> {
    fn new(chain: &'c Chain, states: &'c mut States, pieces: &'c mut Pieces) -> Self {
        let mut line = Line {
            chain,
            straight: &mut pieces.straight,
            knots: &mut pieces.knots,
            states,
            first: 0,
            far: FAR * largest_displacement(chain),
        };
        line.begin(Answer::nothing(), 0);
        line
    }

    fn begin(&mut self, answer: Answer, station: usize) {
        self.straight.clear();
        self.straight.push(answer);
        self.knots.clear();
        self.first = station;
    }

    fn past_load(&mut self, load: Force) {
        if load != Force::default() {
            self.straight
                .iter_mut()
                .for_each(|straight| *straight = straight.past_load(load));
            self.knots.iter_mut().for_each(|knot| knot.force -= load);
        }
    }

    fn past_spring(&mut self, stiffness: ForcePerLength, face: Length) {
        self.straight
            .iter_mut()
            .for_each(|straight| *straight = straight.past_spring(stiffness, face));
        self.knots
            .iter_mut()
            .for_each(|knot| knot.force += stiffness * (knot.displacement - face));
    }

    fn past_link(&mut self, link: &Link) {
        self.straight
            .iter_mut()
            .for_each(|straight| *straight = straight.past_link(link));
        for knot in self.knots.iter_mut() {
            knot.displacement += link.stretch(knot.force);
            knot.force -= link.load;
        }
    }

    /// A stop that yields: a spring on one side of its knot.
    fn past_elastic_stop(&mut self, hold: usize, side: Side, stiffness: ForcePerLength) {
        let face = self.chain.holds[hold].face;
        let at = self.split_at_displacement(face, hold, side);
        let spring = |straight: &mut Answer| *straight = straight.past_spring(stiffness, face);
        let push = |knot: &mut Knot| knot.force += stiffness * (knot.displacement - face);
        match (side, at) {
            (Side::End, Split::Knot(at)) => {
                self.straight[at + 1..].iter_mut().for_each(spring);
                self.knots[at + 1..].iter_mut().for_each(push);
            }
            (Side::Start, Split::Knot(at)) => {
                self.straight[..=at].iter_mut().for_each(spring);
                self.knots[..at].iter_mut().for_each(push);
            }
            (Side::End, Split::AllBeyond) | (Side::Start, Split::AllBefore) => {
                self.states.holds[hold] = true;
                self.straight.iter_mut().for_each(spring);
                self.knots.iter_mut().for_each(push);
            }
            (Side::End, Split::AllBefore) | (Side::Start, Split::AllBeyond) => {
                self.states.holds[hold] = false;
            }
        }
    }

    /// A rigid stop: the line stands upright at its face, and what lies behind is out of reach.
    fn past_rigid_stop(
        &mut self,
        hold: usize,
        side: Side,
        station: usize,
    ) -> Result<(), NoSolution> {
        let face = self.chain.holds[hold].face;
        let upright = Answer::rigid(face);
        match (side, self.split_at_displacement(face, hold, side)) {
            (Side::End, Split::Knot(at)) => {
                self.knots.truncate(at + 1);
                self.straight.truncate(at + 1);
                self.straight.push(upright);
            }
            (Side::Start, Split::Knot(at)) => {
                self.pass_first(at);
                self.straight[0] = upright;
            }
            (Side::End, Split::AllBefore) | (Side::Start, Split::AllBeyond) => {
                self.states.holds[hold] = false;
            }
            (Side::End, Split::AllBeyond) | (Side::Start, Split::AllBefore) => {
                return Err(NoSolution::Contradiction {
                    first: self.first,
                    last: station,
                });
            }
        }
        Ok(())
    }

    /// A joint: no pull goes through, and once nothing does it may open as far as it likes. The
    /// link before it has already taken its width off the displacement.
    fn past_joint(&mut self, link: usize) -> Result<(), NoSolution> {
        let zero = self.chain.zero.force;
        // The first straight piece that reaches a force of 0.
        let reach = self.knots.partition_point(|knot| knot.force < -zero);
        let slack = match self.straight[reach] {
            Answer::Free { force } if force < -zero => return Ok(()), // never pulled, always closed
            Answer::Free { force } if force > zero => {
                return Err(NoSolution::Pushed {
                    first: self.first,
                    last: link,
                    force: -force,
                });
            }
            Answer::Free { .. } if reach == 0 => {
                // Loose to the left as well: it is open wherever that stands.
                self.states.links[link] = false;
                self.begin(Answer::nothing(), self.first);
                return Ok(());
            }
            Answer::Free { .. } => self.knots[reach - 1].displacement,
            Answer::Held { rest, .. } => rest,
        };
        self.knots.truncate(reach);
        self.straight.truncate(reach + 1);
        self.knots.push(Knot {
            displacement: slack,
            force: Force::default(),
            touch: Touch::Joint(link),
        });
        self.straight.push(Answer::nothing());
        Ok(())
    }

    /// Puts the knot of a stop where the line passes its face.
    fn split_at_displacement(&mut self, face: Length, hold: usize, side: Side) -> Split {
        let zero = self.chain.zero.length;
        let at = self.knots.partition_point(|knot| knot.displacement < face);
        let force = match self.straight[at] {
            Answer::Free { force } => force,
            Answer::Held { rest, flexibility } if flexibility.value > 0.0 => {
                (face - rest) / flexibility
            }
            // Upright: passed where a knot is on its far side, else the line ends before the face
            // or begins beyond it.
            Answer::Held { rest, .. } => {
                let (first, last) = (at == 0, at == self.knots.len());
                // All of it at the face is an exact touch: on the side where the stop is open.
                let touching = first && last && (rest - face).abs() <= zero;
                if touching && side == Side::Start || first && rest > face + zero {
                    return Split::AllBeyond;
                }
                if touching || last && rest < face - zero {
                    return Split::AllBefore;
                }
                let nearest = if first { at } else { at - 1 };
                self.knots[nearest].force
            }
        };
        self.knots.insert(
            at,
            Knot {
                displacement: face,
                force,
                touch: Touch::Stop(hold),
            },
        );
        self.straight.insert(at, self.straight[at]);
        Split::Knot(at)
    }

    /// The part up to here ends at a known displacement.
    fn end_at_displacement(&mut self, face: Length, station: usize) -> Result<(), NoSolution> {
        let zero = self.chain.zero.length;
        let upright = |answer: &Answer| match *answer {
            Answer::Held { rest, flexibility } if flexibility.value == 0.0 => Some(rest),
            _ => None,
        };
        let too_far = upright(&self.straight[0]).is_some_and(|rest| face < rest - zero);
        let too_near = self
            .straight
            .last()
            .and_then(upright)
            .is_some_and(|rest| face > rest + zero);
        if too_far || too_near {
            return Err(NoSolution::Contradiction {
                first: self.first,
                last: station,
            });
        }
        let passed = self.knots.partition_point(|knot| knot.displacement < face);
        self.pass_first(passed);
        Ok(())
    }

    /// The part up to the member's end has nothing beyond it.
    fn end_at_no_force(&mut self) -> Result<(), NoSolution> {
        let zero = self.chain.zero.force;
        let last = self.chain.loads.len() - 1;
        let pushed = |force: Force| NoSolution::Pushed {
            first: self.first,
            last,
            force: -force,
        };
        match (self.straight.first(), self.straight.last()) {
            (Some(&Answer::Free { force }), _) if force > zero => return Err(pushed(force)),
            (_, Some(&Answer::Free { force })) if force < -zero => return Err(pushed(force)),
            _ => {}
        }
        let passed = self.knots.partition_point(|knot| knot.force < -zero);
        let touching = self.knots[passed..]
            .iter()
            .take_while(|knot| knot.force <= zero)
            .count();
        // A knot at a force of 0 is an exact touch, which is no bearing on either side of it.
        for knot in &self.knots[passed..passed + touching] {
            release(self.states, knot.touch);
        }
        self.pass_first(passed);
        Ok(())
    }

    /// The first knots are passed: what they touch changes its state, and they go.
    fn pass_first(&mut self, count: usize) {
        for knot in self.knots.drain(..count) {
            match knot.touch {
                Touch::Stop(hold) => self.states.holds[hold] = !self.states.holds[hold],
                Touch::Joint(link) => self.states.links[link] = !self.states.links[link],
            }
        }
        self.straight.drain(..count);
    }

    /// Knots that no solution can reach are decided now.
    fn forget_far_knots(&mut self) {
        let passed = self
            .knots
            .iter()
            .take_while(|knot| knot.displacement < -self.far)
            .count();
        if passed > 0 {
            self.pass_first(passed);
        }
        while self
            .knots
            .last()
            .is_some_and(|knot| knot.displacement > self.far)
        {
            self.knots.pop();
            self.straight.pop();
        }
    }
}

/// How a displacement divides the line.
enum Split {
    /// At this knot, made for it.
    Knot(usize),
    /// All of the line lies before it.
    AllBefore,
    /// All of the line lies beyond it.
    AllBeyond,
}

fn release(states: &mut States, touch: Touch) {
    match touch {
        Touch::Stop(hold) => states.holds[hold] = false,
        Touch::Joint(link) => states.links[link] = false,
    }
}

/// More than any station of a solution moves: faces, free stretches, and all of the load through
/// all of the flexibility.
fn largest_displacement(chain: &Chain) -> Length {
    let mut loads = Force::default();
    for load in &chain.loads {
        loads += load.abs();
    }
    let (mut free, mut flexibility) = (Length::default(), Flexibility::default());
    for link in &chain.links {
        loads += link.load.abs();
        free += link.free.abs();
        flexibility += link.flexibility;
    }
    let (mut faces, mut softest) = (Length::default(), Length::default());
    for hold in &chain.holds {
        faces = faces.max(hold.face.abs());
        if let Some(stiffness) = hold.stiffness {
            softest = softest.max(loads / stiffness);
        }
    }
    faces + free + softest + flexibility * loads
}
