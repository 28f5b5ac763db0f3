//! From a model and one combination to forces, displacements and stresses.
//!
//! A member is loaded (`loading`), its pieces are told how they deform (`deformation`: PL/AE and
//! αΔTL), it is condensed to a `chain`, the states of its stops and joints are found
//! (`contact`), the chain is solved, and its segments are recovered (`recover`). No I/O, no
//! global state, one thread: the same input gives the same bits.

mod assembly;
mod chain;
mod contact;
mod deformation;
mod error;
mod loading;
mod placing;
mod quotient;
mod recover;
mod restraint;
mod roots;
mod system;
mod threshold;

pub use assembly::{AssemblySolution, FreeMotion, Motion, Mover, Moving, PreparedAssembly, Way};
pub use error::SolveError;
pub use threshold::Threshold;

use crate::model::{Combination, Member, Model, Name, SegmentKind, Side, SupportKind};
use crate::quantity::{Flexibility, Force, Length};
use crate::result::MemberResult;
use chain::{Chain, Hold, Link, NoSolution, Solved, States};
use contact::Pieces;
use deformation::{PieceDeformation, PieceStiffness};
use loading::{Layers, Loading};
use recover::Recovered;

/// A solved member, with what counts as zero in it.
#[derive(Debug, Clone)]
pub struct Solution {
    /// Its results.
    pub member: MemberResult,
    /// The combination's threshold on it.
    pub zero: Threshold,
    /// What nothing holds and nothing pushes, from station to station: set to where it moves least.
    pub free: Vec<(Name, Name)>,
    /// Supports, by index, that share a force in a way that nothing decides: rigid stops with one
    /// face. Their reactions are the split of least size.
    pub undecided: Vec<usize>,
}

/// A member's stiffness: what does not change from one combination to the next while these have no
/// factors on moduli.
pub struct Stiffness {
    layers: Layers,
    /// One for each piece; `None` for a gap.
    pieces: Vec<Option<PieceStiffness>>,
}

impl Stiffness {
    /// The stiffness of a member in a combination.
    pub fn of(model: &Model, member: &Member, combination: &Combination) -> Self {
        let layers = Layers::of(model, member, combination);
        let piece = |(index, piece): (usize, &crate::model::Piece)| match layers.of_piece(index) {
            [] => None,
            layers => Some(PieceStiffness::of(piece.length, layers)),
        };
        let pieces = member.pieces.iter().enumerate().map(piece).collect();
        Stiffness { layers, pieces }
    }
}

/// Solves one member under one combination.
///
/// # Errors
/// Where a load pushes what nothing holds, where rigid supports contradict each other, and where a
/// taper's point would have to carry force.
pub fn member(
    model: &Model,
    member: &Member,
    combination: &Combination,
) -> Result<Solution, SolveError> {
    member_of(
        model,
        member,
        combination,
        &Stiffness::of(model, member, combination),
        &mut Workspace::default(),
    )
}

/// [`member`], with its stiffness at hand and in a workspace that was used before.
///
/// # Errors
/// As [`member`].
pub fn member_of(
    model: &Model,
    member: &Member,
    combination: &Combination,
    stiffness: &Stiffness,
    workspace: &mut Workspace,
) -> Result<Solution, SolveError> {
    let Workspace {
        loading,
        prepared,
        settled,
        cold,
    } = workspace;
    loading.add_up(model, member, combination, &stiffness.layers);
    prepared.prepare(member, loading, stiffness)?;
    prepared
        .chain
        .settle(settled)
        .map_err(|reason| explain(member, reason))?;
    let undecided = prepared.chain.share_between_equals(settled);
    let Settled { solved, states, .. } = &*settled;
    let recovered = Recovered {
        model,
        member,
        loading,
        prepared,
        solved,
        states,
    };
    let mut result = recovered.result()?;
    result.restraint = restraint::share(member, prepared, settled, cold);
    let name = |station: usize| member.stations[station].name.clone();
    let free = solved
        .free
        .iter()
        .map(|&(first, last)| (name(first), name(last)))
        .collect();
    Ok(Solution {
        member: result,
        zero: prepared.chain.zero,
        free,
        undecided,
    })
}

/// The memory that solving needs on its way, so that a job of many combinations asks for it once.
/// What one combination leaves in it is of no matter to the next.
#[derive(Default)]
pub struct Workspace {
    loading: Loading,
    prepared: Prepared,
    settled: Settled,
    /// Without the temperature, for the share of restraint.
    cold: Settled,
}

/// A chain solved in the states of its stops and joints.
#[derive(Default)]
struct Settled {
    solved: Solved,
    states: States,
    pieces: Pieces,
}

/// A member's pieces and the chain that they condense to.
#[derive(Default)]
struct Prepared {
    /// One for each piece; `None` for a gap.
    pieces: Vec<Option<PieceDeformation>>,
    chain: Chain,
}

impl Prepared {
    /// A member condensed under its loading.
    fn of(member: &Member, loading: &Loading, stiffness: &Stiffness) -> Result<Self, SolveError> {
        let mut prepared = Prepared::default();
        prepared.prepare(member, loading, stiffness)?;
        Ok(prepared)
    }

    /// Condenses a member under its loading, in the place of what was condensed before.
    fn prepare(
        &mut self,
        member: &Member,
        loading: &Loading,
        stiffness: &Stiffness,
    ) -> Result<(), SolveError> {
        let chain = &mut self.chain;
        self.pieces.clear();
        chain.links.clear();
        for (index, piece) in member.pieces.iter().enumerate() {
            let segment = &member.segments[piece.segment];
            let pointed = |_| SolveError::PointLoaded {
                member: member.name.clone(),
                segment: segment.name.clone(),
            };
            match (&segment.kind, &stiffness.pieces[index]) {
                (SegmentKind::Gap(gap), _) => {
                    chain.links.push(joint(gap));
                    self.pieces.push(None);
                }
                (_, None) => return Err(pointed(quotient::Unbounded)),
                (_, Some(made)) => {
                    let layers = loading.layers.of_piece(index);
                    let piece = PieceDeformation::of(made, layers, loading.lines[index])
                        .map_err(pointed)?;
                    chain.links.push(link(&piece).map_err(pointed)?);
                    self.pieces.push(Some(piece));
                }
            }
        }
        chain.loads.clone_from(&loading.forces);
        chain.holds.clear();
        let holds = 0..member.supports.len();
        chain
            .holds
            .extend(holds.map(|support| hold(member, loading, support)));
        chain.holds.sort_by_key(|hold| hold.station);
        chain.zero = threshold(&chain.loads, &chain.links, &chain.holds);
        Ok(())
    }
}

/// A gap as a link: once closed it gives by its own stiffness, if it has one.
fn joint(gap: &crate::model::Gap) -> Link {
    let flexibility = gap.stiffness.map_or_else(Default::default, |stiffness| {
        let one: crate::quantity::Ratio = crate::quantity::from_si(1.0);
        one / stiffness
    });
    Link {
        flexibility,
        free: -gap.width,
        load: Force::default(),
        from_end: false,
        joint: true,
    }
}

/// A piece as a link.
fn link(piece: &PieceDeformation) -> Result<Link, quotient::Unbounded> {
    let free = piece.stretch(&piece.force_of_line())? + piece.thermal + piece.imposed;
    Ok(Link {
        flexibility: piece.flexibility,
        free,
        load: piece.load(),
        from_end: piece.from_end,
        joint: false,
    })
}

/// A support, its face where movement and clearance put it.
fn hold(member: &Member, loading: &Loading, support: usize) -> Hold {
    let movement = loading.movements[support];
    let station = member.supports[support].station;
    match member.supports[support].kind {
        SupportKind::Fixed => Hold {
            station,
            support,
            face: movement,
            stiffness: None,
            stop: None,
        },
        SupportKind::Spring(stiffness) => Hold {
            station,
            support,
            face: movement,
            stiffness: Some(stiffness),
            stop: None,
        },
        SupportKind::Stop {
            clearance,
            side,
            stiffness,
        } => {
            let face = match side {
                Side::End => movement + clearance,
                Side::Start => movement - clearance,
            };
            Hold {
                station,
                support,
                face,
                stiffness,
                stop: Some(side),
            }
        }
    }
}

/// What counts as zero, from the sizes of what comes together on the member.
fn threshold(forces: &[Force], links: &[Link], holds: &[Hold]) -> Threshold {
    let mut loads = Force::default();
    for force in forces {
        loads += force.abs();
    }
    let mut lengths = Length::default();
    for hold in holds {
        lengths += hold.face.abs();
    }
    let (mut free, mut flexibility) = (Length::default(), Flexibility::default());
    for link in links {
        loads += link.load.abs();
        free += link.free.abs();
        flexibility += link.flexibility;
    }
    let restrained = if flexibility.value > 0.0 {
        free / flexibility
    } else {
        Force::default()
    };
    Threshold::relative_to(loads + restrained, lengths + free + flexibility * loads)
}

impl Chain {
    /// Finds the states and solves.
    fn settle(&self, settled: &mut Settled) -> Result<(), NoSolution> {
        contact::find(self, &mut settled.states, &mut settled.pieces)?;
        self.solve_and_release(settled)
    }

    /// Solves in the states that were found, and lets go what bears with no force: an exact touch.
    fn solve_and_release(&self, settled: &mut Settled) -> Result<(), NoSolution> {
        let Settled { solved, states, .. } = settled;
        loop {
            self.solve(states, solved)?;
            if !self.release_touching(states, solved) {
                return Ok(());
            }
        }
    }

    /// Splits the reaction of a rigid stop evenly among all that stand at its face; gives the
    /// supports that share one.
    fn share_between_equals(&self, settled: &mut Settled) -> Vec<usize> {
        let Settled { solved, states, .. } = settled;
        let mut undecided = Vec::new();
        for bearing in 0..self.holds.len() {
            let hold = &self.holds[bearing];
            if hold.stop.is_none() || hold.stiffness.is_some() || !states.holds[bearing] {
                continue;
            }
            let equals: Vec<usize> = self
                .holds_in(hold.station, hold.station)
                .filter(|&other| {
                    let other = &self.holds[other];
                    let level = (other.face - hold.face).abs() <= self.zero.length;
                    level && other.stop == hold.stop && other.stiffness.is_none()
                })
                .collect();
            if equals.len() < 2 || undecided.contains(&hold.support) {
                continue;
            }
            let share = solved.reactions[bearing] / equals.len() as f64;
            for equal in equals {
                solved.reactions[equal] = share;
                states.holds[equal] = true;
                undecided.push(self.holds[equal].support);
            }
        }
        undecided
    }

    /// Whether any was let go; each round lets at least one go, so this ends.
    fn release_touching(&self, states: &mut States, solved: &Solved) -> bool {
        let mut released = false;
        for (index, hold) in self.holds.iter().enumerate() {
            let pushes = match hold.stop {
                Some(Side::End) => -solved.reactions[index],
                Some(Side::Start) => solved.reactions[index],
                None => continue,
            };
            if states.holds[index] && pushes <= self.zero.force {
                states.holds[index] = false;
                released = true;
            }
        }
        for (index, link) in self.links.iter().enumerate() {
            if link.joint && states.links[index] && -solved.after[index] <= self.zero.force {
                states.links[index] = false;
                released = true;
            }
        }
        released
    }
}

/// Puts a reason into the words of the member's stations.
fn explain(member: &Member, reason: NoSolution) -> SolveError {
    let name = |station: usize| member.stations[station].name.clone();
    match reason {
        NoSolution::Pushed { first, last, force } => {
            let whole = first == 0 && last + 1 == member.stations.len();
            SolveError::Pushed {
                member: member.name.clone(),
                part: if whole {
                    String::new()
                } else {
                    format!("between `{}` and `{}` ", name(first), name(last))
                },
                newtons: force.value.abs(),
                toward: if force > Force::default() {
                    "end"
                } else {
                    "start"
                },
            }
        }
        NoSolution::Contradiction { first, last } => SolveError::Contradiction {
            member: member.name.clone(),
            first: name(first),
            last: name(last),
        },
    }
}
