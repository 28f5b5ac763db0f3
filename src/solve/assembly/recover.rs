//! A solved member between points, recovered along itself with the same code as any other.

use super::space::dot;
use super::tie::{Loaded, Part, Span, Tie};
use super::unknowns::Unknowns;
use crate::model::{Between, Carries, Member, Model, SegmentKind};
use crate::quantity::{Curve, Force, ForcePerLength, Length};
use crate::result::{MemberResult, MemberState};
use crate::solve::chain::{Chain, Solved, States};
use crate::solve::recover::Recovered;
use crate::solve::system::Answer;
use crate::solve::{Prepared, SolveError};

/// A tie with the answer that it is recovered from.
pub(super) struct Answered<'a> {
    pub(super) model: &'a Model,
    pub(super) unknowns: &'a Unknowns,
    pub(super) tie: &'a Tie,
    pub(super) between: &'a Between,
    pub(super) answer: &'a Answer,
    /// The unknown of the first station beside a gap.
    pub(super) first_station: usize,
}

/// How the part of a one-way member stands.
enum Carrying {
    /// With N between its ends.
    Yes(Force),
    /// This far from being taut.
    No(Length),
}

impl Answered<'_> {
    fn member(&self) -> &Member {
        &self.model.members[self.tie.member]
    }

    /// The member's results, its share of restraint left out.
    pub(super) fn result(&self, loaded: Loaded) -> Result<MemberResult, SolveError> {
        match (self.member().carries, &self.tie.spans[..]) {
            (Some(carries), [span]) => match self.carrying(carries, span, &loaded) {
                Carrying::Yes(force) => {
                    let forces = [force + loaded.spans[0].offset];
                    let mut result = self.walk(&loaded, &forces)?;
                    if carries == Carries::Compression {
                        result.state = MemberState::Bearing;
                    }
                    Ok(result)
                }
                Carrying::No(slack_by) => self.slack(loaded, slack_by),
            },
            (_, spans) => {
                let force = |(at, (span, inside)): (usize, (&Span, &super::tie::Condensed))| {
                    match span.part {
                        Part::Elastic(part) => self
                            .beside_gap(at, &loaded)
                            .unwrap_or(self.answer.elastic[part]),
                        Part::Gap(part) => -self.answer.one_way[part],
                        Part::Within(_) => span
                            .stiffness
                            .map_or(Force::default(), |stiffness| stiffness * -inside.rest),
                        Part::OneWay(..) | Part::GapWithin => Force::default(),
                    }
                };
                let forces: Vec<Force> = spans
                    .iter()
                    .zip(&loaded.spans)
                    .enumerate()
                    .map(force)
                    .collect();
                self.walk(&loaded, &forces)
            }
        }
    }

    /// N at the start of a run beside a gap, from what the gap carries and what acts between: an
    /// open one carries nothing, and the run then exactly what acts on it.
    fn beside_gap(&self, at: usize, loaded: &Loaded) -> Option<Force> {
        let carried = |at: usize| match self.tie.spans.get(at)?.part {
            Part::Gap(part) => Some(-self.answer.one_way[part]),
            _ => None,
        };
        let pieces = &self.tie.spans[at].pieces;
        let loads = &loaded.prepared.chain.loads;
        if let Some(before) = at.checked_sub(1).and_then(carried) {
            return Some(before - loads[pieces.start]);
        }
        let after = carried(at + 1)?;
        Some(after + loads[pieces.end] + loaded.spans[at].load)
    }

    fn carrying(&self, carries: Carries, span: &Span, loaded: &Loaded) -> Carrying {
        let sign = match carries {
            Carries::Tension => 1.0,
            Carries::Compression => -1.0,
        };
        match span.part {
            Part::OneWay(part, _) if self.answer.acts[part] => {
                Carrying::Yes(self.answer.one_way[part] * sign)
            }
            Part::OneWay(part, _) => Carrying::No(self.answer.clearance[part]),
            _ => {
                let rest = loaded.spans[0].rest;
                let pull = span.stiffness.map_or(Force::default(), |k| k * -rest);
                if pull * sign > Force::default() {
                    Carrying::Yes(pull)
                } else {
                    Carrying::No((rest * sign).max(Length::default()))
                }
            }
        }
    }

    /// The displacement of a point along the axis.
    fn along(&self, point: usize) -> Length {
        let moved = &self.unknowns.points[point];
        let displacement = self
            .unknowns
            .displacement(moved, &self.answer.displacements);
        let along = dot(
            &displacement.map(|entry| entry.value),
            &self.between.direction,
        );
        crate::quantity::from_si(along)
    }

    /// From N just after the start of each span along all of the member.
    fn walk(&self, loaded: &Loaded, forces: &[Force]) -> Result<MemberResult, SolveError> {
        let chain = &loaded.prepared.chain;
        let last = chain.loads.len() - 1;
        let mut solved = Solved {
            displacements: vec![Length::default(); last + 1],
            before: vec![Force::default(); last + 1],
            after: vec![Force::default(); last + 1],
            reactions: Vec::with_capacity(2),
            ..Solved::default()
        };
        let mut states = States {
            holds: Vec::new(),
            links: vec![true; last],
        };
        solved.displacements[0] = self.along(self.between.start);
        for (at, (span, &force)) in self.tie.spans.iter().zip(forces).enumerate() {
            walk_span(chain, span, force, &mut solved);
            match span.part {
                Part::Gap(part) => states.links[span.pieces.start] = self.answer.acts[part],
                Part::GapWithin => states.links[span.pieces.start] = false,
                _ => {}
            }
            // The far end is where its point or its own unknown is.
            let end = span.pieces.end;
            solved.displacements[end] = if end == last {
                self.along(self.between.end)
            } else {
                self.answer.displacements[self.first_station + at]
            };
        }
        // What its two points put on it.
        solved.reactions.push(-(solved.after[0] + chain.loads[0]));
        solved
            .reactions
            .push(solved.before[last] - chain.loads[last]);
        Recovered {
            model: self.model,
            member: self.member(),
            loading: &loaded.loading,
            prepared: &loaded.prepared,
            solved: &solved,
            states: &states,
        }
        .result()
    }

    /// A member that carries nothing, not even its own weight, which its points carry.
    fn slack(&self, mut loaded: Loaded, slack_by: Length) -> Result<MemberResult, SolveError> {
        let nothing = Curve::constant(ForcePerLength::default());
        loaded.loading.lines.fill(nothing);
        loaded.loading.forces = vec![Force::default(); loaded.prepared.chain.loads.len()];
        let member = self.member();
        loaded.prepared = Prepared::of(member, &loaded.loading, &self.tie.stiffness)?;
        let mut result = self.walk(&loaded, &[Force::default()])?;
        result.state = MemberState::Slack;
        result.slack_by = Some(slack_by);
        for (made, segment) in member.segments.iter().zip(&mut result.segments) {
            if let SegmentKind::Solid { layered: true, .. } = made.kind {
                leave_stresses(segment);
            }
        }
        Ok(result)
    }
}

/// N and displacements from the start of a span to its end, whose displacement is left out.
fn walk_span(chain: &Chain, span: &Span, start: Force, solved: &mut Solved) {
    let mut force = start;
    for piece in span.pieces.clone() {
        if piece > span.pieces.start {
            force = solved.before[piece] - chain.loads[piece];
        }
        solved.after[piece] = force;
        let link = &chain.links[piece];
        solved.before[piece + 1] = force - link.load;
        solved.displacements[piece + 1] = solved.displacements[piece] + link.stretch(force);
    }
}

/// Takes out what stresses bonded layers would have among themselves.
fn leave_stresses(segment: &mut crate::result::SegmentResult) {
    (segment.stress_max, segment.stress_max_at) = (None, None);
    (segment.stress_min, segment.stress_min_at) = (None, None);
    (segment.gross_stress_max, segment.gross_stress_max_at) = (None, None);
    (segment.gross_stress_min, segment.gross_stress_min_at) = (None, None);
    for layer in &mut segment.layers {
        (layer.force_start, layer.force_end) = (Force::default(), Force::default());
        (layer.stress_max, layer.stress_max_at) = (None, None);
        (layer.stress_min, layer.stress_min_at) = (None, None);
        (layer.gross_stress_max, layer.gross_stress_max_at) = (None, None);
        (layer.gross_stress_min, layer.gross_stress_min_at) = (None, None);
    }
}
