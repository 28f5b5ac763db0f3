//! The motion of a stiff part: a velocity and a rotation, and the axis that it turns about.

use super::motion::{Moving, Way};
use super::space::{cross, dot, plus, size, times};
use crate::model::{Assembly, Spatial};
use crate::quantity::from_si;

/// Shares of the largest movement below this are rounding.
pub(super) const ROUNDING: f64 = 1e-6;

/// A velocity as of a stiff body: that of a place, and the rotation.
#[derive(Debug, Clone, Copy)]
pub(super) struct Twist {
    pub(super) at: Spatial<f64>,
    pub(super) velocity: Spatial<f64>,
    pub(super) rotation: Spatial<f64>,
}

impl Twist {
    fn velocity_of(&self, place: &Spatial<f64>) -> Spatial<f64> {
        let arm = plus(place, -1.0, &self.at);
        plus(&self.velocity, 1.0, &cross(&self.rotation, &arm))
    }

    /// The motion in words' terms; `points` are looked through for some that stay where they are,
    /// and `length` is that over which a rotation counts.
    pub(super) fn way(
        &self,
        assembly: &Assembly,
        points: impl Iterator<Item = usize>,
        length: f64,
    ) -> Way {
        let turning = size(&self.rotation);
        let moving = size(&self.velocity);
        if turning * length <= ROUNDING * moving.max(turning * length).max(f64::MIN_POSITIVE) {
            return Way::Along(upward(&times(
                1.0 / moving.max(f64::MIN_POSITIVE),
                &self.velocity,
            )));
        }
        let axis = times(1.0 / turning, &self.rotation);
        let pitch = dot(&axis, &self.velocity);
        let aside = plus(&self.velocity, -pitch, &axis);
        let through = plus(&self.at, 1.0 / turning, &cross(&axis, &aside));
        let on_axis = |&point: &usize| {
            let place = assembly.points[point].at.map(|entry| entry.value);
            let away = plus(&place, -1.0, &through);
            size(&cross(&axis, &away)) <= ROUNDING * length.max(size(&away))
        };
        let mut on: Vec<usize> = points.filter(on_axis).collect();
        if assembly.coordinates < 3 {
            on.truncate(1);
        } else if on.len() > 2 {
            on.drain(1..on.len() - 1);
        }
        Way::About {
            axis: upward(&axis),
            through: through.map(from_si),
            points: on,
            along: pitch.abs() > ROUNDING * (turning * length).max(moving),
        }
    }
}

/// The one of a direction and its opposite whose last entry that is not 0 is positive.
fn upward(direction: &Spatial<f64>) -> Spatial<f64> {
    let tidy = direction.map(|entry| if entry.abs() < ROUNDING { 0.0 } else { entry });
    match tidy.iter().rev().find(|entry| **entry != 0.0) {
        Some(&last) if last < 0.0 => tidy.map(|entry| if entry == 0.0 { 0.0 } else { -entry }),
        _ => tidy,
    }
}

/// The one motion that all of them share, if there is one.
pub(super) fn common(assembly: &Assembly, twists: &[(Moving, Twist, f64)]) -> Option<Way> {
    let (what, first, length) = twists.first()?;
    if twists.len() < 2 {
        return None;
    }
    // A point has no rotation of its own: it is that of the others about it.
    let first = &match what {
        Moving::Body(_) => *first,
        _ => about(assembly, first, twists),
    };
    // The farthest that any of them lies from the first counts for a rotation.
    let away = |twist: &Twist| size(&plus(&twist.at, -1.0, &first.at));
    let reach = twists.iter().fold(*length, |most, (_, twist, length)| {
        most.max(away(twist) + length)
    });
    let alike = |a: &Spatial<f64>, b: &Spatial<f64>, times: f64| {
        size(&plus(a, -1.0, b)) * times <= ROUNDING * 10.0
    };
    let shares = |(what, twist, _): &(Moving, Twist, f64)| {
        let turns =
            matches!(what, Moving::Point(_)) || alike(&twist.rotation, &first.rotation, reach);
        turns && alike(&twist.velocity, &first.velocity_of(&twist.at), 1.0)
    };
    let all = 0..assembly.points.len();
    twists
        .iter()
        .all(shares)
        .then(|| first.way(assembly, all, reach))
}

/// The twist of a point with the rotation that comes nearest to how the others move about it.
fn about(assembly: &Assembly, first: &Twist, twists: &[(Moving, Twist, f64)]) -> Twist {
    // The normal equations of least squares, Σ (r² − r rᵀ) ω = Σ r × v.
    let (mut matrix, mut right) = ([[0.0; 3]; 3], [0.0; 3]);
    let mut reach = 0.0;
    for (_, other, _) in twists {
        let arm = plus(&other.at, -1.0, &first.at);
        let ahead = plus(&other.velocity, -1.0, &first.velocity);
        let square = dot(&arm, &arm);
        for (k, row) in matrix.iter_mut().enumerate() {
            *row = plus(row, -arm[k], &arm);
            row[k] += square;
        }
        right = plus(&right, 1.0, &cross(&arm, &ahead));
        reach += square;
    }
    let [a, b, c] = matrix;
    let volume = dot(&a, &cross(&b, &c));
    let rotation = match assembly.coordinates {
        3 if volume.abs() > ROUNDING * reach.powi(3) => {
            let over = |a: &Spatial<f64>, b: &Spatial<f64>, c: &Spatial<f64>| {
                dot(a, &cross(b, c)) / volume
            };
            [
                over(&right, &b, &c),
                over(&a, &right, &c),
                over(&a, &b, &right),
            ]
        }
        // Points in one line say nothing about a rotation about it.
        3 => [0.0; 3],
        _ => times(1.0 / reach.max(f64::MIN_POSITIVE), &right),
    };
    Twist { rotation, ..*first }
}
