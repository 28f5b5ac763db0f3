//! A piece integrated from the model and the forces that the result names at its ends.

use super::acting::Acting;
use super::quadrature::{tapered, uniform};
use crate::quantity::{Energy, Force, Length, Ratio};

/// What a piece's strain adds up to, with the sizes of what was added.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Integrated {
    /// `∫ q dx`, + toward the end.
    pub(super) load: Force,
    /// `∫ |q| dx`.
    pub(super) load_size: Force,
    /// `∫ N/EA dx`.
    pub(super) force: Length,
    /// `∫ |N|/EA dx`.
    pub(super) force_size: Length,
    /// `∫ αΔT dx`.
    pub(super) thermal: Length,
    /// Misfit and imposed strain, `∫ dx`.
    pub(super) imposed: Length,
    /// `∫` of the sizes of free strains.
    pub(super) free_size: Length,
    /// `∫ N²/EA dx`.
    pub(super) elastic_work: Energy,
    /// `∫ N e0 dx`.
    pub(super) free_work: Energy,
    /// The work of the line load on the piece's stretch beyond the movement of its start.
    pub(super) line_work: Energy,
    /// The largest N at its ends and nodes.
    pub(super) most: Force,
    /// The least N at its ends and nodes.
    pub(super) least: Force,
}

impl Integrated {
    /// `doubt` is a force below which N is no more than what other forces leave of each other; it
    /// counts among the sizes, so that such a remainder is not held against itself.
    pub(super) fn over(
        acting: &Acting,
        piece: usize,
        (start, end): (Force, Force),
        doubt: Force,
    ) -> Self {
        let length = acting.member.pieces[piece].length;
        let mut sum = Integrated {
            most: start.max(end),
            least: start.min(end),
            ..Integrated::default()
        };
        if acting.member.segments[acting.member.pieces[piece].segment]
            .layers()
            .is_empty()
            && acting.local(piece, 0.5).rigidity == Force::default()
        {
            return sum; // a gap has no strain to integrate
        }
        let has_line = acting.has_line(piece);
        if has_line {
            sum.load = rest_of_line(acting, piece, 0.0);
            sum.load_size = size_of_line(acting, piece);
        }
        let nodes = if acting.is_uniform(piece) {
            uniform()
        } else {
            tapered()
        };
        for node in nodes {
            let local = acting.local(piece, node.s);
            if local.rigidity == Force::default() {
                continue; // so near to a tip that its area is lost in rounding
            }
            let force = if has_line {
                force_at(acting, piece, node.s, start, end)
            } else {
                start
            };
            let (elastic, free): (Ratio, Ratio) =
                (force / local.rigidity, local.thermal + local.imposed);
            let dx = length * node.weight;
            sum.force += elastic * dx;
            sum.force_size += (elastic.abs() + doubt / local.rigidity) * dx;
            sum.thermal += local.thermal * dx;
            sum.imposed += local.imposed * dx;
            sum.free_size += local.free_size * dx;
            sum.elastic_work += force * (elastic * dx);
            sum.free_work += force * (free * dx);
            if has_line {
                sum.line_work += rest_of_line(acting, piece, node.s) * ((elastic + free) * dx);
            }
            sum.most = sum.most.max(force);
            sum.least = sum.least.min(force);
        }
        sum
    }
}

/// N at a fraction of a piece, carried from whichever end is weaker, so that it is exact at a tip.
pub(super) fn force_at(acting: &Acting, piece: usize, s: f64, start: Force, end: Force) -> Force {
    if !acting.has_line(piece) {
        return start;
    }
    if acting.local(piece, 1.0).rigidity < acting.local(piece, 0.0).rigidity {
        end + rest_of_line(acting, piece, s)
    } else {
        let length = acting.member.pieces[piece].length;
        let (q0, q1, q2) = (
            acting.line(piece, 0.0),
            acting.line(piece, 0.5 * s),
            acting.line(piece, s),
        );
        start - (q0 + q1 * 4.0 + q2) * (length * (s / 6.0))
    }
}

/// The line load from a fraction of the piece to its end: Simpson's rule, exact since a line load
/// is linear and an area quadratic.
fn rest_of_line(acting: &Acting, piece: usize, s: f64) -> Force {
    let length = acting.member.pieces[piece].length;
    let (q0, q1, q2) = (
        acting.line(piece, s),
        acting.line(piece, 0.5 * (1.0 + s)),
        acting.line(piece, 1.0),
    );
    (q0 + q1 * 4.0 + q2) * (length * ((1.0 - s) / 6.0))
}

/// A bound on `∫ |q| dx` of the right order: by the same rule on the sizes.
fn size_of_line(acting: &Acting, piece: usize) -> Force {
    let length = acting.member.pieces[piece].length;
    let q = |s: f64| acting.line(piece, s).abs();
    (q(0.0) + q(0.5) * 4.0 + q(1.0)) * (length / 6.0)
}
