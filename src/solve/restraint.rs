//! How much of a member's free expansion its supports keep back.

use super::{Prepared, Settled, contact};
use crate::model::Member;
use crate::quantity::{Flexibility, Force, Length};

/// Share of full restraint: the mean over the length of N less the N of the same combination
/// without its temperature, over that of the member held rigidly at both ends,
/// `−∫αΔT dx / ∫dx/EA`. `None` where nothing would expand, and where a point or an unsolvable
/// combination without temperature leaves it without sense.
///
/// The temperature is taken out of the prepared chain, and `cold` is filled with what is left.
pub(super) fn share(
    member: &Member,
    prepared: &mut Prepared,
    warm: &Settled,
    cold: &mut Settled,
) -> Option<f64> {
    let (mut expansion, mut size) = (Length::default(), Length::default());
    let mut flexibility = Flexibility::default();
    for (link, piece) in prepared.chain.links.iter_mut().zip(&prepared.pieces) {
        // A gap has no piece: it neither expands nor gives.
        let Some(piece) = piece else { continue };
        if piece.runs_to_a_point() {
            return None;
        }
        expansion += piece.thermal;
        size += piece.thermal.abs();
        flexibility += piece.flexibility;
        link.free -= piece.thermal;
    }
    if expansion.abs() <= size * 1e-14 {
        return None;
    }
    let chain = &prepared.chain;
    contact::find(chain, &mut cold.states, &mut cold.pieces).ok()?;
    if cold.states == warm.states && warm.states.are_statics() {
        return Some(0.0); // temperature makes no N
    }
    chain.solve_and_release(cold).ok()?;
    // Along a piece both forces fall by the same line load: they differ alike all along it.
    let mut mean = Force::default();
    for (index, piece) in member.pieces.iter().enumerate() {
        let kept_back = warm.solved.after[index] - cold.solved.after[index];
        mean += kept_back * (piece.length / member.length()).value;
    }
    let held = -(expansion / flexibility);
    // Adding 0 turns a negative zero into a plain one.
    Some((mean / held).value + 0.0)
}
