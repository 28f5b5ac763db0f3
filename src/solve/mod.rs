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
use crate::quantity::{Force, Length};
use crate::result::MemberResult;
use chain::{Chain, Hold, Link, NoSolution, Solved, States};
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
    )
}

/// [`member`], with its stiffness at hand.
///
/// # Errors
/// As [`member`].
pub fn member_of(
    model: &Model,
    member: &Member,
    combination: &Combination,
    stiffness: &Stiffness,
) -> Result<Solution, SolveError> {
    let mut loading = Loading::of(model, member, combination, &stiffness.layers);
    let prepared = Prepared::of(member, &mut loading, stiffness)?;
    let (mut solved, mut states) = prepared
        .chain
        .settle()
        .map_err(|reason| explain(member, reason))?;
    let undecided = prepared
        .chain
        .share_between_equals(&mut solved, &mut states);
    let recovered = Recovered {
        model,
        member,
        loading: &loading,
        prepared: &prepared,
        solved: &solved,
        states: &states,
    };
    let mut result = recovered.result()?;
    result.restraint = restraint::share(member, &loading, &prepared, &solved);
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

/// A member's pieces and the chain that they condense to.
struct Prepared {
    /// One for each piece; `None` for a gap.
    pieces: Vec<Option<PieceDeformation>>,
    chain: Chain,
}

impl Prepared {
    fn of(
        member: &Member,
        loading: &mut Loading,
        stiffness: &Stiffness,
    ) -> Result<Self, SolveError> {
        let mut pieces = Vec::with_capacity(member.pieces.len());
        let mut links = Vec::with_capacity(member.pieces.len());
        for (index, piece) in member.pieces.iter().enumerate() {
            let segment = &member.segments[piece.segment];
            let pointed = |_| SolveError::PointLoaded {
                member: member.name.clone(),
                segment: segment.name.clone(),
            };
            let (deformation, link) = match (&segment.kind, &stiffness.pieces[index]) {
                (SegmentKind::Gap(gap), _) => (None, joint(gap)),
                (_, None) => return Err(pointed(quotient::Unbounded)),
                (_, Some(made)) => {
                    let layers = loading.layers.of_piece(index);
                    let piece = PieceDeformation::of(made, layers, loading.lines[index])
                        .map_err(pointed)?;
                    let link = link(&piece).map_err(pointed)?;
                    (Some(piece), link)
                }
            };
            pieces.push(deformation);
            links.push(link);
        }
        let holds = holds(member, loading);
        let zero = threshold(&loading.forces, &links, &holds);
        Ok(Prepared {
            pieces,
            chain: Chain {
                loads: std::mem::take(&mut loading.forces),
                links,
                holds,
                zero,
            },
        })
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

/// The supports in order of station, each with its face where movement and clearance put it.
fn holds(member: &Member, loading: &Loading) -> Vec<Hold> {
    let hold = |support: usize| {
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
    };
    let mut holds: Vec<Hold> = (0..member.supports.len()).map(hold).collect();
    holds.sort_by_key(|hold| hold.station);
    holds
}

/// What counts as zero, from the sizes of what comes together on the member.
fn threshold(forces: &[Force], links: &[Link], holds: &[Hold]) -> Threshold {
    let loads = forces
        .iter()
        .fold(Force::default(), |sum, force| sum + force.abs())
        + links
            .iter()
            .fold(Force::default(), |sum, link| sum + link.load.abs());
    let faces = holds
        .iter()
        .fold(Length::default(), |sum, hold| sum + hold.face.abs());
    let free = links
        .iter()
        .fold(Length::default(), |sum, link| sum + link.free.abs());
    let flexibility = links.iter().fold(
        Default::default(),
        |sum: crate::quantity::Flexibility, link| sum + link.flexibility,
    );
    let restrained = if flexibility.value > 0.0 {
        free / flexibility
    } else {
        Force::default()
    };
    Threshold::relative_to(loads + restrained, faces + free + flexibility * loads)
}

impl Chain {
    /// Finds the states, solves, and lets go what bears with no force: an exact touch.
    fn settle(&self) -> Result<(Solved, States), NoSolution> {
        let mut states = contact::states(self)?;
        loop {
            let solved = self.solve(&states)?;
            if !self.release_touching(&mut states, &solved) {
                return Ok((solved, states));
            }
        }
    }

    /// Splits the reaction of a rigid stop evenly among all that stand at its face; gives the
    /// supports that share one.
    fn share_between_equals(&self, solved: &mut Solved, states: &mut States) -> Vec<usize> {
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
