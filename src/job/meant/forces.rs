//! Line loads piece by piece, and what of a downward force acts along the axis.

use super::actions::Laying;
use super::assembly::Span;
use super::coverage::On;
use crate::catalogue::section::Along;
use crate::job::written::load::Load;
use crate::job::written::{ByCase, Entry};
use crate::model::{LineLoad, Member, SegmentKind};
use crate::quantity::{Angle, ForcePerLength};

/// How a line load is directed.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Line {
    /// Along the axis, + toward the end.
    Along,
    /// Downward.
    Down,
}

/// The parts of a unit force along the axis (+ toward the end) and across it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Sloped {
    pub(super) along: f64,
    pub(super) across: f64,
}

impl Sloped {
    /// Of a force along the axis.
    pub(super) const AXIS: Sloped = Sloped {
        along: 1.0,
        across: 0.0,
    };
}

impl Sloped {
    /// Of a downward force on an axis at this angle above level.
    pub(super) fn of(angle: Angle) -> Self {
        let rise = angle.value.sin();
        // cos(π/2) is not 0 in doubles; upright members carry nothing across.
        let across = if rise.abs() == 1.0 {
            0.0
        } else {
            angle.value.cos()
        };
        Sloped {
            along: -rise,
            across,
        }
    }
}

impl<'w, 't> Laying<'_, 'w, 't> {
    /// The parts of a unit weight; a member that does not say where down is, is reported.
    pub(super) fn slope(&mut self) -> Option<Sloped> {
        match self.span {
            Span::None => {}
            Span::Wrong => return None,
            Span::Given(reach) => return self.meaning.sloped(self.whole, &reach.direction),
        }
        let runs = self.whole.runs.or(&self.meaning.job.default.runs);
        match runs {
            Entry::Given(angle) => Some(Sloped::of(angle.value)),
            Entry::Wrong => None,
            Entry::Absent => {
                let message = format!(
                    "the member `{}` needs `runs`, since weight acts on it",
                    self.whole.name.value
                );
                let help = "add `runs = \"up\"`, \"down\", \"level\" or an angle above level, the \
                            direction from start to end";
                let problems = &mut self.meaning.r.problems;
                problems.missing("runs", self.whole.place, message, help);
                None
            }
        }
    }

    /// A line load over the whole member, a segment, or from one station to another.
    pub(super) fn lines(
        &mut self,
        load: &'w Load<'t>,
        line: &'w ByCase<'t, Along<ForcePerLength>>,
        direction: Line,
    ) {
        let values = self.by_case(load, line);
        let on = self.on(load);
        let slope = match direction {
            Line::Along => Some(Sloped::AXIS),
            Line::Down => self.slope(),
        };
        if let (Some(On::Layer(..)), Some(written)) = (on, load.on.given()) {
            let message = "a line load acts on all layers of a segment together";
            let help = "name the segment without the layer";
            self.meaning.r.problems.say(&written.place, message, help);
            return;
        }
        let (Some(on), Some(slope), Some(member)) = (on, slope, self.member) else {
            return;
        };
        let Some((from, to)) = self.stretch(load, on, member) else {
            return;
        };
        let ends = (member.stations[from].x, member.stations[to].x);
        for (case, written) in values {
            for piece in from..to {
                // Shares of the stretch, exact at its ends.
                let share = |station: usize| {
                    if station == from {
                        0.0
                    } else if station == to {
                        1.0
                    } else {
                        ((member.stations[station].x - ends.0) / (ends.1 - ends.0)).value
                    }
                };
                let start = written.value.at(share(piece));
                let end = written.value.at(share(piece + 1));
                self.actions.lines.push(LineLoad {
                    case,
                    piece,
                    start: start * slope.along,
                    end: end * slope.along,
                    across: [start * slope.across, end * slope.across],
                });
            }
        }
    }

    /// The stations between which a line load acts, none of it on a gap.
    fn stretch(&mut self, load: &'w Load<'t>, on: On, member: &Member) -> Option<(usize, usize)> {
        let (mut from, mut to) = match on {
            On::Segment(segment) => self.outline.ends_of(segment)?,
            _ => (0, member.stations.len() - 1),
        };
        if load.from.is_wrong() || load.to.is_wrong() {
            return None;
        }
        if let Entry::Given(written) = &load.from {
            from = self.outline.find(&written.value)?;
        }
        if let Entry::Given(written) = &load.to {
            to = self.outline.find(&written.value)?;
        }
        let problems = &mut self.meaning.r.problems;
        if from >= to {
            let written = load.from.given().or(load.to.given())?;
            let message = "this line load ends where it begins, or before";
            let help = "`from` must lie nearer to the member's start than `to`";
            problems.say(&written.place, message, help);
            return None;
        }
        let gap = member.pieces[from..to].iter().find(|piece| {
            let kind = &member.segments[piece.segment].kind;
            matches!(kind, SegmentKind::Gap(_))
        });
        if let Some(piece) = gap {
            let message = format!(
                "this line load covers the gap `{}`, which takes none",
                member.segments[piece.segment].name
            );
            let help = "write one load for each side, with `on`, or with `from` and `to`";
            problems.say(&load.place, message, help);
            return None;
        }
        Some((from, to))
    }
}
