//! How much of a member's free expansion its supports keep back.

use super::Prepared;
use super::chain::{Chain, Link, Solved};
use super::deformation::PieceDeformation;
use super::loading::Loading;
use crate::model::Member;
use crate::quantity::{Curve, Flexibility, Force, Length};

/// Share of full restraint: the mean over the length of N less the N of the same combination
/// without its temperature, over that of the member held rigidly at both ends,
/// `−∫αΔT dx / ∫dx/EA`. `None` where nothing would expand, and where a point or an unsolvable
/// combination without temperature leaves it without sense.
pub(super) fn share(
    member: &Member,
    loading: &Loading,
    prepared: &Prepared,
    solved: &Solved,
) -> Option<f64> {
    let acts = |strain: &Curve<crate::quantity::Ratio>| {
        strain
            .coefficients()
            .iter()
            .any(|strain| strain.value != 0.0)
    };
    if !loading.layers.all.iter().any(|layer| acts(&layer.thermal)) {
        return None;
    }
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
    let (without, _) = cold(prepared).settle().ok()?;
    let mean = mean_force(member, prepared, solved) - mean_force(member, prepared, &without);
    // Adding 0 turns a negative zero into a plain one.
    Some((mean / held).value + 0.0)
}

/// The same chain with nothing of the temperature in its links.
fn cold(prepared: &Prepared) -> Chain {
    let cool = |(link, piece): (&Link, &Option<PieceDeformation>)| {
        let thermal = piece
            .as_ref()
            .map_or(Length::default(), |piece| piece.thermal);
        Link {
            free: link.free - thermal,
            ..*link
        }
    };
    Chain {
        loads: prepared.chain.loads.clone(),
        links: prepared
            .chain
            .links
            .iter()
            .zip(&prepared.pieces)
            .map(cool)
            .collect(),
        holds: prepared.chain.holds.clone(),
        zero: prepared.chain.zero,
    }
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
