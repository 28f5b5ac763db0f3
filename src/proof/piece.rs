//! A piece integrated from the model and the forces that the result names at its ends.

use super::acting::{Acting, Local};
use super::quadrature::{Node, one_point, tapered, three_points, two_points};
use crate::model::SegmentKind;
use crate::quantity::{Energy, Force, ForcePerLength, Length, Ratio};

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

/// A piece with what acts along it, looked at once.
#[derive(Debug, Clone, Copy)]
pub(super) struct Piece {
    length: Length,
    /// The forces that the result names at its start and its end.
    start: Force,
    end: Force,
    line: Line,
    /// Stiffness and free strains at its two ends.
    ends: [Local; 2],
    /// Whether stiffness is the same all along, and free strains linear with it.
    uniform: bool,
    /// A joint has no strain.
    joint: bool,
    /// What its strain adds up to.
    pub(super) sums: Integrated,
}

/// The line load along a piece, self-weight included.
#[derive(Debug, Clone, Copy)]
enum Line {
    None,
    /// The same all along, as the weight of a piece without a taper is.
    Constant(ForcePerLength),
    /// At the start, the middle and the end: a line load is linear and an area quadratic, so that
    /// these tell it everywhere.
    Varying([ForcePerLength; 3]),
}

impl Line {
    fn of(acting: &Acting, piece: usize, uniform: bool) -> Self {
        if !acting.has_line(piece) {
            return Line::None;
        }
        let start = acting.line(piece, 0.0);
        // Over a constant area the weight is constant, and the rest of a line load linear.
        match (uniform, acting.line(piece, 1.0)) {
            (true, end) if end == start => Line::Constant(start),
            (true, end) => Line::Varying([start, (start + end) * 0.5, end]),
            (false, end) => Line::Varying([start, acting.line(piece, 0.5), end]),
        }
    }
}

impl Piece {
    /// A piece between the forces that the result names at its ends. `doubt` is a force below which
    /// N is no more than what other forces leave of each other; it counts among the sizes, so that
    /// such a remainder is not held against itself.
    pub(super) fn of(
        acting: &Acting,
        piece: usize,
        (start, end): (Force, Force),
        doubt: Force,
    ) -> Self {
        let uniform = acting.is_uniform(piece);
        let segment = &acting.member.segments[acting.member.pieces[piece].segment];
        let mut along = Piece {
            length: acting.member.pieces[piece].length,
            start,
            end,
            line: Line::of(acting, piece, uniform),
            ends: [0.0, 1.0].map(|s| acting.local(piece, s)),
            uniform,
            joint: matches!(segment.kind, SegmentKind::Gap(_)),
            sums: Integrated::default(),
        };
        along.sums = along.integrate(acting, piece, doubt);
        along
    }

    /// N at a fraction of the piece, carried from whichever end is weaker, so that it is exact at a
    /// tip.
    pub(super) fn force_at(&self, s: f64) -> Force {
        match &self.line {
            Line::None => self.start,
            _ if self.ends[1].rigidity < self.ends[0].rigidity => self.end + self.load_after(s),
            Line::Constant(line) => self.start - *line * (self.length * s),
            Line::Varying(line) => {
                let sum = line[0] + quadratic(line, 0.5 * s) * 4.0 + quadratic(line, s);
                self.start - sum * (self.length * (s / 6.0))
            }
        }
    }

    /// All of the line load from a fraction of the piece to its end: one that varies by Simpson's
    /// rule, exact for a quadratic.
    fn load_after(&self, s: f64) -> Force {
        match &self.line {
            Line::None => Force::default(),
            Line::Constant(line) => *line * (self.length * (1.0 - s)),
            Line::Varying(line) => {
                let sum = quadratic(line, s) + quadratic(line, 0.5 * (1.0 + s)) * 4.0 + line[2];
                sum * (self.length * ((1.0 - s) / 6.0))
            }
        }
    }

    /// The sum of the sizes of the line load.
    fn load_size(&self) -> Force {
        match &self.line {
            Line::None => Force::default(),
            Line::Constant(line) => line.abs() * self.length,
            Line::Varying(line) => {
                (line[0].abs() + line[1].abs() * 4.0 + line[2].abs()) * (self.length / 6.0)
            }
        }
    }

    /// Where to look at it so that `N²/EA` integrates exactly, or to rounding along a taper.
    fn nodes(&self) -> &'static [Node] {
        match (self.uniform, &self.line) {
            (true, Line::None) => one_point(),
            (true, Line::Constant(_)) => two_points(),
            (true, Line::Varying(_)) => three_points(),
            (false, _) => tapered(),
        }
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

    fn integrate(&self, acting: &Acting, piece: usize, doubt: Force) -> Integrated {
        let mut sum = Integrated {
            most: self.start.max(self.end),
            least: self.start.min(self.end),
            ..Integrated::default()
        };
        if self.joint {
            return sum;
        }
        sum.load = self.load_after(0.0);
        sum.load_size = self.load_size();
        for node in self.nodes() {
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
            sum.line_work += self.load_after(node.s) * (strain * dx);
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
