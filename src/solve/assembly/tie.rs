//! A member between points as parts of a system: runs of its pieces that pull and push, and the
//! gaps between them.
//!
//! A run is condensed exactly, everything inside it included: N at its start stretches it by
//! rest + N / stiffness, with sums of positive terms for the stiffness. What acts inside arrives at
//! its end. The stations beside a gap are unknowns of their own, along the member's axis.

use super::across::{Shares, across, lumped};
use super::space::times;
use crate::model::{Between, Carries, Combination, Member, Model, SegmentKind, Spatial};
use crate::quantity::{Flexibility, Force, ForcePerLength, Length, Ratio, from_si};
use crate::solve::chain::Chain;
use crate::solve::loading::Loading;
use crate::solve::{Prepared, SolveError, Stiffness};
use std::ops::Range;

/// A member of the assembly with its parts.
pub(super) struct Tie {
    /// Index into the model's members.
    pub(super) member: usize,
    pub(super) stiffness: Stiffness,
    /// From its start to its end.
    pub(super) spans: Vec<Span>,
}

/// What lies between two neighbouring unknowns of a member.
#[derive(Debug, Clone)]
pub(super) struct Span {
    /// The pieces that it holds.
    pub(super) pieces: Range<usize>,
    /// How it answers; rigid when `None`.
    pub(super) stiffness: Option<ForcePerLength>,
    pub(super) part: Part,
}

/// Where a span stands in the system.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum Part {
    /// An elastic part.
    Elastic(usize),
    /// A one-way part that is the whole member.
    OneWay(usize, Carries),
    /// A one-way part that is a gap.
    Gap(usize),
    /// In no row, since a body keeps the distance of its ends: it carries what its own rest asks
    /// for, and only so if it is one-way.
    Within(Option<Carries>),
    /// A gap whose width a body keeps.
    GapWithin,
}

/// A member of the assembly with what one combination puts on it.
pub(super) struct Loaded {
    pub(super) loading: Loading,
    pub(super) prepared: Prepared,
    /// One for each span.
    pub(super) spans: Vec<Condensed>,
    /// What goes to its two ends across its axis.
    pub(super) across: Shares,
}

/// What acts inside a span.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Condensed {
    /// Its stretch while the part carries nothing; of a gap minus its width.
    pub(super) rest: Length,
    /// N at its start less what the part carries.
    pub(super) offset: Force,
    /// By how much N has dropped at its end.
    pub(super) load: Force,
}

/// The pieces of each span of a member, gaps by themselves.
pub(super) fn spans(member: &Member) -> Vec<(Range<usize>, bool)> {
    let is_gap = |piece: usize| {
        let kind = &member.segments[member.pieces[piece].segment].kind;
        matches!(kind, SegmentKind::Gap(_))
    };
    let mut spans: Vec<(Range<usize>, bool)> = Vec::with_capacity(1);
    for piece in 0..member.pieces.len() {
        match spans.last_mut() {
            Some((run, false)) if !is_gap(piece) => run.end = piece + 1,
            _ => spans.push((piece..piece + 1, is_gap(piece))),
        }
    }
    spans
}

/// The stiffness of a run of pieces.
///
/// # Errors
/// Where a piece runs to a point: what a member hands from point to point goes through all of it.
pub(super) fn run_stiffness(
    member: &Member,
    stiffness: &Stiffness,
    pieces: Range<usize>,
) -> Result<ForcePerLength, SolveError> {
    let mut flexibility = Flexibility::default();
    for piece in pieces {
        match &stiffness.pieces[piece] {
            Some(made) if made.flexibility.value > 0.0 => flexibility += made.flexibility,
            _ => {
                return Err(SolveError::PointLoaded {
                    member: member.name.clone(),
                    segment: member.segments[member.pieces[piece].segment].name.clone(),
                });
            }
        }
    }
    let one: Ratio = from_si(1.0);
    Ok(one / flexibility)
}

impl Tie {
    /// What a combination puts on it.
    pub(super) fn load(
        &self,
        model: &Model,
        between: &Between,
        down: &Spatial<f64>,
        combination: &Combination,
    ) -> Result<Loaded, SolveError> {
        let member = &model.members[self.member];
        let mut loading = Loading::of(model, member, combination, &self.stiffness.layers);
        let prepared = Prepared::of(member, &mut loading, &self.stiffness)?;
        let across = across(model, member, between, down, combination, &loading);
        let mut spans: Vec<Condensed> = self
            .spans
            .iter()
            .map(|span| condensed(&prepared.chain, span.pieces.clone()))
            .collect();
        if member.carries.is_some()
            && let ([span], [part]) = (&mut spans[..], &self.spans[..])
        {
            // All of its weight is put on its ends, so that the part between carries none of it.
            span.offset = lumped(member, &loading);
            if let Some(stiffness) = part.stiffness {
                span.rest += span.offset / stiffness;
            }
        }
        Ok(Loaded {
            loading,
            prepared,
            spans,
            across,
        })
    }
}

/// A run of links with the loads between them, or a gap.
fn condensed(chain: &Chain, pieces: Range<usize>) -> Condensed {
    let mut condensed = Condensed::default();
    for piece in pieces.clone() {
        if piece > pieces.start {
            condensed.load += chain.loads[piece];
        }
        let link = &chain.links[piece];
        condensed.rest += if link.joint {
            link.free
        } else {
            link.stretch(-condensed.load)
        };
        condensed.load += link.load;
    }
    condensed
}

/// What acts on a tie along its axis, and what across: the force on each of its points.
pub(super) struct Ends {
    pub(super) start: Spatial<Force>,
    pub(super) end: Spatial<Force>,
}

impl Loaded {
    /// What the member puts on its two points beside what its parts carry, from loads at its ends
    /// and inside the spans beside them.
    pub(super) fn on_points(&self, direction: &Spatial<f64>) -> Ends {
        let loads = &self.prepared.chain.loads;
        let (first, last) = (&self.spans[0], &self.spans[self.spans.len() - 1]);
        let start = loads[0] + first.offset;
        let end = loads[loads.len() - 1] + last.load - last.offset;
        let at = |along: Force, across: &Spatial<Force>| {
            let along = times(along.value, direction);
            std::array::from_fn(|k| across[k] + from_si(along[k]))
        };
        Ends {
            start: at(start, &self.across.start),
            end: at(end, &self.across.end),
        }
    }

    /// The sizes of what acts inside and across, before anything cancels.
    pub(super) fn sizes(&self) -> Force {
        let chain = &self.prepared.chain;
        let inside = chain.links.iter().map(|link| link.load.abs());
        let forces = chain.loads.iter().map(|force| force.abs());
        inside
            .chain(forces)
            .fold(self.across.size, |sum, size| sum + size)
    }

    /// What acts at the station between a span and the next, along the axis.
    pub(super) fn between_spans(&self, tie: &Tie, span: usize) -> Force {
        let station = tie.spans[span].pieces.end;
        self.prepared.chain.loads[station] + self.spans[span].load
    }
}
