//! A piece integrated from the model and the forces that the result names at its ends.

use super::acting::{Acting, Local};
use super::quadrature::{tapered, uniform};
use crate::model::SegmentKind;
use crate::quantity::{Energy, Flexibility, Force, ForcePerLength, Length, Ratio};

/// What a piece's strain adds up to, with the sizes of what was added.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Integrated {
    /// `∫ q dx`, + toward the end.
    pub(super) load: Force,
    /// `∫ |q| dx`.
    pub(super) load_size: Force,
    /// `∫ N/EA dx`.
    pub(super) force: Length,
    /// `∫ dx/EA`.
    pub(super) flexibility: Flexibility,
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

/// A piece with what acts along it, looked at once.
#[derive(Debug, Clone, Copy)]
pub(super) struct Piece {
    length: Length,
    /// The forces that the result names at its start and its end.
    start: Force,
    end: Force,
    /// The line load at its start, its middle and its end: a line load is linear and an area
    /// quadratic, so that these tell it everywhere. `None` where there is none.
    line: Option<[ForcePerLength; 3]>,
    /// Stiffness and free strains at its two ends.
    ends: [Local; 2],
    /// Whether stiffness is the same all along, and free strains linear with it.
    uniform: bool,
    /// A joint has no strain.
    joint: bool,
}

impl Piece {
    pub(super) fn of(acting: &Acting, piece: usize, (start, end): (Force, Force)) -> Self {
        let uniform = acting.is_uniform(piece);
        let line = acting.has_line(piece).then(|| {
            let (start, end) = (acting.line(piece, 0.0), acting.line(piece, 1.0));
            // Over a constant area the weight is constant, and the rest of a line load linear.
            let middle = if uniform {
                (start + end) * 0.5
            } else {
                acting.line(piece, 0.5)
            };
            [start, middle, end]
        });
        let segment = &acting.member.segments[acting.member.pieces[piece].segment];
        Piece {
            length: acting.member.pieces[piece].length,
            start,
            end,
            line,
            ends: [0.0, 1.0].map(|s| acting.local(piece, s)),
            uniform,
            joint: matches!(segment.kind, SegmentKind::Gap(_)),
        }
    }

    /// N at a fraction of the piece, carried from whichever end is weaker, so that it is exact at a
    /// tip.
    pub(super) fn force_at(&self, s: f64) -> Force {
        match &self.line {
            None => self.start,
            Some(line) if self.ends[1].rigidity < self.ends[0].rigidity => {
                self.end + self.rest_of(line, s)
            }
            Some(line) => {
                let sum = line[0] + quadratic(line, 0.5 * s) * 4.0 + quadratic(line, s);
                self.start - sum * (self.length * (s / 6.0))
            }
        }
    }

    /// All of the line load, + toward the end.
    pub(super) fn load(&self) -> Force {
        self.line
            .map_or(Force::default(), |line| self.rest_of(&line, 0.0))
    }

    /// The line load from a fraction of the piece to its end: Simpson's rule, exact for a quadratic.
    fn rest_of(&self, line: &[ForcePerLength; 3], s: f64) -> Force {
        let sum = quadratic(line, s) + quadratic(line, 0.5 * (1.0 + s)) * 4.0 + line[2];
        sum * (self.length * ((1.0 - s) / 6.0))
    }

    /// Stiffness and free strains at a fraction of a uniform piece.
    fn between_ends(&self, s: f64) -> Local {
        let [start, end] = &self.ends;
        let linear = |a: Ratio, b: Ratio| a * (1.0 - s) + b * s;
        Local {
            rigidity: start.rigidity,
            thermal: linear(start.thermal, end.thermal),
            imposed: linear(start.imposed, end.imposed),
            free_size: start.free_size.max(end.free_size),
        }
    }

    /// What its strain adds up to. `doubt` is a force below which N is no more than what other
    /// forces leave of each other; it counts among the sizes, so that such a remainder is not held
    /// against itself.
    pub(super) fn integrate(&self, acting: &Acting, piece: usize, doubt: Force) -> Integrated {
        let mut sum = Integrated {
            most: self.start.max(self.end),
            least: self.start.min(self.end),
            ..Integrated::default()
        };
        if self.joint {
            return sum;
        }
        if let Some(line) = &self.line {
            sum.load = self.rest_of(line, 0.0);
            let sizes = line.map(|q| q.abs());
            sum.load_size = (sizes[0] + sizes[1] * 4.0 + sizes[2]) * (self.length / 6.0);
        }
        if self.uniform && self.line.is_none() {
            sum.add(self.start, &self.between_ends(0.5), self.length, doubt);
            return sum;
        }
        for node in if self.uniform { uniform() } else { tapered() } {
            let local = if self.uniform {
                self.between_ends(node.s)
            } else {
                acting.local(piece, node.s)
            };
            if local.rigidity == Force::default() {
                continue; // so near to a tip that its area is lost in rounding
            }
            let force = self.force_at(node.s);
            let dx = self.length * node.weight;
            let strain = sum.add(force, &local, dx, doubt);
            if let Some(line) = &self.line {
                sum.line_work += self.rest_of(line, node.s) * (strain * dx);
            }
            sum.most = sum.most.max(force);
            sum.least = sum.least.min(force);
        }
        sum
    }
}

impl Integrated {
    /// Adds a length over which N and strain are these; gives the strain.
    fn add(&mut self, force: Force, local: &Local, dx: Length, doubt: Force) -> Ratio {
        let (elastic, free): (Ratio, Ratio) =
            (force / local.rigidity, local.thermal + local.imposed);
        self.flexibility += dx / local.rigidity;
        self.force += elastic * dx;
        self.force_size += (elastic.abs() + doubt / local.rigidity) * dx;
        self.thermal += local.thermal * dx;
        self.imposed += local.imposed * dx;
        self.free_size += local.free_size * dx;
        self.elastic_work += force * (elastic * dx);
        self.free_work += force * (free * dx);
        elastic + free
    }
}

/// The quadratic through three values at 0, 1/2 and 1.
fn quadratic(values: &[ForcePerLength; 3], s: f64) -> ForcePerLength {
    let [start, middle, end] = *values;
    start * ((1.0 - s) * (1.0 - 2.0 * s))
        + middle * (4.0 * s * (1.0 - s))
        + end * (s * (2.0 * s - 1.0))
}
