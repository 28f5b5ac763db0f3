//! How much of a member's free expansion its supports keep back.

use super::Prepared;
use super::chain::Solved;
use super::deformation::PieceDeformation;
use super::loading::Loading;
use crate::model::{Combination, Member, Model};
use crate::quantity::{Curve, Flexibility, Force, Length};

/// Share of full restraint: the mean over the length of N less the N of the same combination
/// without its temperature, over that of the member held rigidly at both ends,
/// `−∫αΔT dx / ∫dx/EA`. `None` where nothing would expand, and where a point or an unsolvable
/// combination without temperature leaves it without sense.
pub(super) fn share(
    model: &Model,
    member: &Member,
    combination: &Combination,
    loading: &Loading,
    prepared: &Prepared,
    solved: &Solved,
) -> Option<f64> {
    let pieces = || prepared.pieces.iter().flatten();
    let acts = loading.layers.iter().any(|layer| {
        layer
            .thermal
            .coefficients()
            .iter()
            .any(|strain| strain.value != 0.0)
    });
    let expansion = pieces().fold(Length::default(), |sum, piece| sum + piece.thermal);
    let size = pieces().fold(Length::default(), |sum, piece| sum + piece.thermal.abs());
    if !acts || expansion.abs() <= size * 1e-14 {
        return None;
    }
    if pieces().any(PieceDeformation::runs_to_a_point) {
        return None;
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

    let cold = Loading::of(model, member, combination, false);
    let cold = Prepared::of(member, &cold).ok()?;
    let (without, _) = cold.chain.settle().ok()?;
    let mean = mean_force(member, prepared, solved) - mean_force(member, &cold, &without);
    // Adding 0 turns a negative zero into a plain one.
    Some((mean / held).value + 0.0)
}

/// `∫N dx / L`.
fn mean_force(member: &Member, prepared: &Prepared, solved: &Solved) -> Force {
    let total = member.length();
    let mut mean = Force::default();
    for (index, (piece, deformation)) in member.pieces.iter().zip(&prepared.pieces).enumerate() {
        let force = match deformation {
            Some(deformation) => deformation.force(solved.after[index], solved.before[index + 1]),
            None => Curve::constant(solved.after[index]),
        };
        mean += force.mean() * (piece.length / total).value;
    }
    mean
}
