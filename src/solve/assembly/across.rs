//! What acts across a member between points: it goes to the two ends as from a bar that rests on
//! them.

use super::space::{dot, plus, size, times};
use crate::model::{Between, Combination, Member, Model, Spatial};
use crate::quantity::{Curve, Force, ForcePerLength, Length, Ratio, STANDARD_GRAVITY, from_si};
use crate::solve::loading::{Loading, pieces_of};

/// The forces that go to the two ends of a member.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Shares {
    pub(super) start: Spatial<Force>,
    pub(super) end: Spatial<Force>,
    /// Their sizes before anything cancels.
    pub(super) size: Force,
}

/// Forces that are parallel, shared between the two ends of a member by the lever rule.
#[derive(Debug, Clone, Copy, Default)]
struct Levered {
    start: Force,
    end: Force,
    size: Force,
}

impl Levered {
    /// A force at a distance from the start.
    fn point(&mut self, force: Force, at: Length, length: Length) {
        let share = (at / length).value;
        self.start += force * (1.0 - share);
        self.end += force * share;
        self.size += force.abs();
    }

    /// A force per length along a piece from `at` on.
    fn line(&mut self, line: &Curve<ForcePerLength>, at: Length, piece: Length, length: Length) {
        let (from, to): (Ratio, Ratio) = (at / length, (at + piece) / length);
        let one: Ratio = from_si(1.0);
        self.end += line.times(&Curve::linear(from, to)).mean() * piece;
        self.start += line.times(&Curve::linear(one - from, one - to)).mean() * piece;
        let size = |sum: ForcePerLength, each: &ForcePerLength| sum + each.abs();
        let coefficients = line.coefficients();
        let sum = coefficients.iter().fold(ForcePerLength::default(), size);
        self.size += sum / coefficients.len() as f64 * piece;
    }
}

/// What goes to the ends across the axis: the member's weight, and `down` and `line-down`.
pub(super) fn across(
    model: &Model,
    member: &Member,
    between: &Between,
    down: &Spatial<f64>,
    combination: &Combination,
    loading: &Loading,
) -> Shares {
    let direction = &between.direction;
    // An upright member has nothing across, and neither has one that knows no up and down.
    let across = plus(down, -dot(down, direction), direction);
    let share = size(&across);
    if between.rise.abs() == 1.0 || share <= 4.0 * f64::EPSILON {
        return Shares::default();
    }
    let length = member.length();
    // The weight is measured by all of it, `down` by its part across.
    let (mut weight, mut loads) = (Levered::default(), Levered::default());
    for action in &member.actions.weights {
        let times = action.number * combination.factors[action.case];
        if times == 0.0 {
            continue;
        }
        for piece in pieces_of(member, action.segment) {
            let acceleration = STANDARD_GRAVITY * times;
            let layers = &loading.layers;
            if let Some(line) = layers.weight(model, member, piece, action.layer, acceleration) {
                let at = member.stations[piece].x;
                weight.line(&line, at, member.pieces[piece].length, length);
            }
        }
    }
    for action in &member.actions.forces {
        let force = action.across * combination.factors[action.case];
        loads.point(force, member.stations[action.station].x, length);
    }
    for action in &member.actions.lines {
        let [start, end] = action.across;
        let line = Curve::linear(start, end) * combination.factors[action.case];
        let at = member.stations[action.piece].x;
        loads.line(&line, at, member.pieces[action.piece].length, length);
    }
    let unit = times(1.0 / share, &across);
    let at = |weight: Force, load: Force| -> Spatial<Force> {
        std::array::from_fn(|k| weight * across[k] + load * unit[k])
    };
    Shares {
        start: at(weight.start, loads.start),
        end: at(weight.end, loads.end),
        size: weight.size * share + loads.size,
    }
}

/// Of a one-way member's weight along its axis, the part at its start, + toward its end.
pub(super) fn lumped(member: &Member, loading: &Loading) -> Force {
    let length = member.length();
    let mut along = Levered::default();
    for (piece, line) in loading.lines.iter().enumerate() {
        along.line(
            line,
            member.stations[piece].x,
            member.pieces[piece].length,
            length,
        );
    }
    along.start
}
