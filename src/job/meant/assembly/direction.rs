//! Unit vectors, and which of them depend on others.

use crate::job::meant::Meaning;
use crate::job::written::Written;
use crate::job::written::assembly::direction::Direction;
use crate::job::written::assembly::entries::counted;
use crate::job::written::assembly::hold::AXES;
use crate::model::Spatial;

/// Of a unit vector less is nothing.
const NOTHING: f64 = 1e-9;

/// The unit vector along a vector, exact along an axis, and the vector's length; `None` where it
/// has none.
pub(super) fn unit(vector: Spatial<f64>) -> Option<(Spatial<f64>, f64)> {
    let largest = vector
        .iter()
        .fold(0.0, |most: f64, part| most.max(part.abs()));
    if largest == 0.0 {
        return None;
    }
    let scaled = vector.map(|part| part / largest);
    let length = dot(&scaled, &scaled).sqrt();
    Some((scaled.map(|part| part / length), largest * length))
}

/// The unit vector along an axis.
pub(super) fn axis(axis: usize) -> Spatial<f64> {
    let mut vector = [0.0; 3];
    vector[axis] = 1.0;
    vector
}

fn dot(a: &Spatial<f64>, b: &Spatial<f64>) -> f64 {
    a.iter().zip(b).map(|(a, b)| a * b).sum()
}

/// What directions span: as many unit vectors, at right angles.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Basis {
    vectors: [Spatial<f64>; 3],
    count: usize,
}

impl Basis {
    pub(super) fn of(directions: &[Spatial<f64>]) -> Self {
        let mut basis = Basis::default();
        for direction in directions {
            basis.add(direction);
        }
        basis
    }

    /// Takes a unit vector in; `false` where it depends on those that are in.
    pub(super) fn add(&mut self, direction: &Spatial<f64>) -> bool {
        if self.count == 3 {
            return false;
        }
        match unit(self.rest(direction)) {
            Some((vector, length)) if length > NOTHING => {
                self.vectors[self.count] = vector;
                self.count += 1;
                true
            }
            _ => false,
        }
    }

    /// Whether a vector has a part across all that is spanned.
    pub(super) fn misses(&self, vector: Spatial<f64>) -> bool {
        let Some((direction, _)) = unit(vector) else {
            return false;
        };
        let rest = self.rest(&direction);
        dot(&rest, &rest).sqrt() > NOTHING
    }

    /// What a vector has across all that is spanned.
    fn rest(&self, vector: &Spatial<f64>) -> Spatial<f64> {
        let mut rest = *vector;
        for known in &self.vectors[..self.count] {
            let part = dot(&rest, known);
            for (rest, known) in rest.iter_mut().zip(known) {
                *rest -= part * known;
            }
        }
        rest
    }
}

impl Meaning<'_, '_> {
    /// The unit vector of a direction; reports one that the job's coordinates do not have.
    pub(super) fn direction(&mut self, written: &Written<Direction>) -> Option<Spatial<f64>> {
        let coordinates = self.space.coordinates?;
        match written.value {
            Direction::Axis { axis: along, .. } if along >= coordinates => {
                let message = format!("a job in {} has no `{}`", counted(coordinates), AXES[along]);
                let help = format!("its directions are `{}`", AXES[..coordinates].join("`, `"));
                self.r.problems.say(&written.place, message, help);
                None
            }
            Direction::Axis {
                axis: along,
                negative,
            } => {
                let sign = if negative == Some(true) { -1.0 } else { 1.0 };
                Some(axis(along).map(|part| part * sign + 0.0)) // no −0
            }
            Direction::Parts(parts) => {
                let parts = self.spatial(&parts, &written.place)?;
                unit(parts).map(|(direction, _)| direction)
            }
        }
    }

    /// The unit vectors of directions of which none depends on the others; `None` where one is at
    /// fault.
    pub(super) fn directions(
        &mut self,
        written: &[Written<Direction>],
    ) -> Option<Vec<Spatial<f64>>> {
        let mut basis = Basis::default();
        let mut directions = Vec::with_capacity(written.len().min(3));
        let mut sound = true;
        for one in written {
            let Some(direction) = self.direction(one) else {
                sound = false;
                continue;
            };
            if basis.add(&direction) {
                directions.push(direction);
            } else {
                let message = "this direction adds nothing to those before it";
                let help = "take it out; a hold that answers in them answers in it too";
                self.r.problems.say(&one.place, message, help);
                sound = false;
            }
        }
        sound.then_some(directions)
    }
}
