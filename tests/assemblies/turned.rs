//! An assembly turned as a whole about the origin.

use super::assembly::{Assembly, Vector, cross, dot, plus, scaled, size};
use super::outcome::Outcome;
use crate::common::chain::Random;

/// A turn about an axis by an angle.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Turn {
    axis: Vector,
    angle: f64,
}

impl Turn {
    /// Rodrigues' formula.
    fn of(self, v: Vector) -> Vector {
        let (sine, cosine) = self.angle.sin_cos();
        let along = scaled(self.axis, dot(self.axis, v) * (1.0 - cosine));
        plus(
            plus(scaled(v, cosine), scaled(cross(self.axis, v), sine)),
            along,
        )
    }
}

/// The assembly turned by an arbitrary angle, in space about an arbitrary axis.
pub(crate) fn turned(random: &mut Random, assembly: &Assembly) -> (Assembly, Turn) {
    let axis = match assembly.coordinates {
        2 => [0.0, 0.0, 1.0],
        _ => {
            let any = [0; 3].map(|_| random.between(-1.0, 1.0));
            scaled(any, 1.0 / size(any))
        }
    };
    let turn = Turn {
        axis,
        angle: random.between(-3.0, 3.0),
    };
    let mut other = assembly.clone();
    let vectors = other
        .points
        .iter_mut()
        .chain(other.forces.iter_mut().map(|(_, f)| f));
    let vectors = vectors.chain(
        other
            .bodies
            .iter_mut()
            .flat_map(|b| [&mut b.centre, &mut b.force, &mut b.moment]),
    );
    for vector in vectors {
        *vector = turn.of(*vector);
    }
    for hold in &mut other.holds {
        hold.movement = turn.of(hold.movement);
        // Holds in every direction are the same however they are turned.
        if hold.along.len() < assembly.coordinates {
            hold.along = hold.along.iter().map(|&d| turn.of(d)).collect();
        }
    }
    (other, turn)
}

/// What the turned assembly must give.
pub(crate) fn turned_outcome(outcome: &Outcome, turn: Turn) -> Outcome {
    let mut other = outcome.clone();
    for vector in other.displacement.iter_mut().chain(&mut other.reaction) {
        let whole = std::array::from_fn(|axis| vector.get(axis).copied().unwrap_or(0.0));
        let turned = turn.of(whole);
        for (entry, turned) in vector.iter_mut().zip(turned) {
            *entry = turned;
        }
    }
    for rotation in &mut other.rotation {
        *rotation = turn.of(*rotation);
    }
    other
}
