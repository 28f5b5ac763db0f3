//! How much of a member's free expansion its supports keep back.

use super::chain::Solved;
use super::deformation::PieceDeformation;
use super::{Prepared, Settled};
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
    solved: &Solved,
    cold: &mut Settled,
) -> Option<f64> {
    let pieces = || prepared.pieces.iter().flatten();
    let expansion = pieces().fold(Length::default(), |sum, piece| sum + piece.thermal);
    let size = pieces().fold(Length::default(), |sum, piece| sum + piece.thermal.abs());
    if expansion.abs() <= size * 1e-14 || pieces().any(PieceDeformation::runs_to_a_point) {
        return None;
    }
    if prepared.chain.holds.len() < 2 {
        return Some(0.0); // statics alone gives N: temperature makes none
    }
    let flexibility = prepared
        .chain
        .links
        .iter()
        .fold(Flexibility::default(), |sum, link| {
            if link.joint {
                sum
            } else {
                sum + link.flexibility
            }
        });
    let held = -(expansion / flexibility);
    let pieces = prepared.pieces.iter();
    for (link, piece) in prepared.chain.links.iter_mut().zip(pieces) {
        link.free -= piece
            .as_ref()
            .map_or(Length::default(), |piece| piece.thermal);
    }
    prepared.chain.settle(cold).ok()?;
    // Along a piece both forces fall by the same line load: they differ alike all along it.
    let mut mean = Force::default();
    for (index, piece) in member.pieces.iter().enumerate() {
        let kept_back = solved.after[index] - cold.solved.after[index];
        mean += kept_back * (piece.length / member.length()).value;
    }
    // Adding 0 turns a negative zero into a plain one.
    Some((mean / held).value + 0.0)
}
