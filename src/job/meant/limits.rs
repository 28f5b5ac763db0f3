//! What is held: each limit laid on the things that it holds.

use super::Meaning;
use super::combinations::Combinations;
use super::members::Meant;
use super::own::Own;
use super::reads::Common;
use super::stress::allowed;
use crate::job::written::Entry;
use crate::job::written::limit::{Bound, Limits};
use crate::job::written::segment::Kind;
use crate::model::{
    AreaUsed, Assembly, Bounds, Limit, LimitKind, Member, Name, Place, Purpose, Reads, SegmentKind,
    Target, Watch,
};
use crate::quantity::{Force, Length, MovementBound, StressLimit};
use std::collections::HashSet;
use std::ops::Neg;

/// What limits stand on.
pub(super) struct Objects<'m, 'w, 't> {
    pub(super) meant: &'m [Meant<'w, 't>],
    pub(super) assembly: Option<&'m Assembly>,
    pub(super) watches: &'m [Option<Watch>],
}

/// All limits of a job in the order of the file.
pub(super) fn limits<'w, 't>(
    on: &Objects<'_, 'w, 't>,
    combinations: Option<&Combinations>,
    meaning: &mut Meaning<'w, 't>,
) -> Vec<Limit> {
    let mut laying = Laying {
        combinations,
        meaning,
        limits: Vec::new(),
        unread: HashSet::new(),
    };
    for (index, meant) in on.meant.iter().enumerate() {
        laying.of_member(index, meant);
    }
    laying.of_holds(on.assembly);
    laying.of_watches(on.watches);
    let mut limits = laying.limits;
    limits.sort_by_key(|limit| limit.place.start); // stable: members and segments in order within
    limits
}

/// Limits on their way onto members.
pub(super) struct Laying<'a, 'w, 't> {
    pub(super) combinations: Option<&'a Combinations>,
    pub(super) meaning: &'a mut Meaning<'w, 't>,
    limits: Vec<Limit>,
    /// Where limits begin that no combination reads and that have their caution.
    pub(super) unread: HashSet<usize>,
}

impl<'w, 't> Laying<'_, 'w, 't> {
    fn of_member(&mut self, index: usize, meant: &Meant<'w, 't>) {
        let of_member = meant.whole.limits.or(&self.meaning.job.default.limits);
        let member = &meant.member;
        for table in tables(of_member) {
            let common = self.common(&table.names, &table.since, &table.source);
            if let Some(common) = common {
                self.on_member(index, table, &common, meant, member);
                self.carries(index, table, &common, meant);
            }
        }
        for (at, segment) in meant.outline.segments.iter().enumerate() {
            for table in tables(&segment.limits) {
                let common = self.common(&table.names, &table.since, &table.source);
                if let Some(common) = common {
                    self.on_segment(index, at, table, &common, meant, member);
                }
            }
            let Kind::Solid { layers, .. } = &segment.kind else {
                continue;
            };
            for (number, layer) in layers.iter().enumerate() {
                for table in tables(&layer.limits) {
                    let common = self.common(&table.names, &table.since, &table.source);
                    if let Some(common) = common {
                        self.stresses(index, at, number, table, &common, member);
                    }
                }
            }
        }
        let supports = meant.whole.supports.given();
        for (number, support) in supports.iter().flat_map(|all| all.value.iter().enumerate()) {
            for table in tables(&support.limits) {
                let common = self.common(&table.names, &table.since, &table.source);
                if let Some(common) = common {
                    let written = supports.map_or(0, |all| all.value.len());
                    // Of a member with faults the supports may not be known.
                    let ends = member.supports.len().saturating_sub(written);
                    self.on_support(index, ends + number, table, &common, member);
                }
            }
        }
    }

    fn on_member(
        &mut self,
        index: usize,
        table: &Limits<'t>,
        common: &Common,
        meant: &Meant<'w, 't>,
        member: &Member,
    ) {
        let segments = meant.outline.segments;
        for (at, segment) in segments.iter().enumerate() {
            // What stands on the segment or the layer takes the place of the member's.
            let layers = member.segments[at].layers().len();
            for layer in 0..layers {
                let own = Own::of(segment, Some(layer));
                self.stresses_but(index, at, layer, table, common, member, own);
            }
        }
        if let Entry::Given(force) = &table.force {
            let kind = LimitKind::Force(force_limit(force.value));
            let has_own = |at: usize| Own::of(&segments[at], None).force;
            if (0..segments.len()).any(has_own) {
                for at in (0..segments.len()).filter(|&at| !has_own(at)) {
                    let target = Target::Segment {
                        member: index,
                        segment: at,
                    };
                    let on = joined(&member.name, &member.segments[at].name);
                    self.push(kind, target, on, common, &force.place);
                }
            } else {
                let target = Target::Member { member: index };
                self.push(kind, target, member.name.clone(), common, &force.place);
            }
        }
        if let Entry::Given(elongation) = &table.elongation {
            let kind = LimitKind::Elongation(movement_limit(elongation.value, member.length()));
            let target = Target::Member { member: index };
            self.push(kind, target, member.name.clone(), common, &elongation.place);
        }
        let displacements = table.displacement.given();
        for displacement in displacements.iter().flat_map(|all| &all.value) {
            let at = displacement.at.given();
            let Some(station) = at.and_then(|at| meant.outline.find(&at.value)) else {
                continue;
            };
            let limit = &displacement.limit;
            let kind = LimitKind::Displacement(movement_limit(limit.value, member.length()));
            let target = Target::Station {
                member: index,
                station,
            };
            let on = joined(&member.name, &member.stations[station].name);
            self.push(kind, target, on, common, &limit.place);
        }
    }

    fn on_segment(
        &mut self,
        index: usize,
        at: usize,
        table: &Limits<'t>,
        common: &Common,
        meant: &Meant<'w, 't>,
        member: &Member,
    ) {
        let segment = &member.segments[at];
        for layer in 0..segment.layers().len() {
            let own = Own::of_layer(&meant.outline.segments[at], layer);
            self.stresses_but(index, at, layer, table, common, member, own);
        }
        let target = Target::Segment {
            member: index,
            segment: at,
        };
        let on = || joined(&member.name, &segment.name);
        if let Entry::Given(force) = &table.force {
            let kind = LimitKind::Force(force_limit(force.value));
            self.push(kind, target, on(), common, &force.place);
        }
        if let Entry::Given(elongation) = &table.elongation {
            let kind = LimitKind::Elongation(movement_limit(elongation.value, segment.length));
            self.push(kind, target, on(), common, &elongation.place);
        }
        self.gap(table, target, &on, common);
    }

    fn on_support(
        &mut self,
        index: usize,
        at: usize,
        table: &Limits<'t>,
        common: &Common,
        member: &Member,
    ) {
        let Some(support) = member.supports.get(at) else {
            return;
        };
        let target = Target::Support {
            member: index,
            support: at,
        };
        let on = || joined(&member.name, &support.name);
        if let Entry::Given(reaction) = &table.reaction {
            let kind = LimitKind::Reaction(force_limit(reaction.value));
            self.push(kind, target, on(), common, &reaction.place);
        }
        self.gap(table, target, &on, common);
    }

    pub(super) fn gap(
        &mut self,
        table: &Limits<'t>,
        target: Target,
        on: &dyn Fn() -> Name,
        common: &Common,
    ) {
        if let Entry::Given(gap) = &table.gap {
            let (min, max) = gap.value;
            let kind = LimitKind::Gap { min, max };
            self.push(kind, target, on(), common, &gap.place);
        }
        if let Entry::Given(bears) = &table.bears {
            self.push(LimitKind::Bears, target, on(), common, &bears.place);
        }
    }

    fn stresses(
        &mut self,
        index: usize,
        at: usize,
        layer: usize,
        table: &Limits<'t>,
        common: &Common,
        member: &Member,
    ) {
        self.stresses_but(index, at, layer, table, common, member, Own::default());
    }

    /// The limits of stress in one layer, but for those that something narrower has of its own.
    #[allow(clippy::too_many_arguments)] // a place in three indices, and what stands there
    fn stresses_but(
        &mut self,
        index: usize,
        at: usize,
        layer: usize,
        table: &Limits<'t>,
        common: &Common,
        member: &Member,
        own: Own,
    ) {
        let segment = &member.segments[at];
        let SegmentKind::Solid { layers, layered } = &segment.kind else {
            return;
        };
        let Some(made) = layers.get(layer) else {
            return;
        };
        let area = match table.area.given() {
            Some(area) if area.value == AreaUsed::Gross => AreaUsed::Gross,
            _ if made.net.is_some() => AreaUsed::Net,
            _ => AreaUsed::Gross,
        };
        let (target, on) = if *layered {
            let target = Target::Layer {
                member: index,
                segment: at,
                layer,
            };
            let on = Name::from(format!("{}.{}.{}", member.name, segment.name, made.name));
            (target, on)
        } else {
            let target = Target::Segment {
                member: index,
                segment: at,
            };
            (target, joined(&member.name, &segment.name))
        };
        let mut lay = |written: &Entry<StressLimit>, is_tension: bool| {
            let Some(written) = written.given() else {
                return;
            };
            let allowed = allowed(written, made, &member.name, self.meaning);
            let Some((limit, share)) = allowed else {
                return;
            };
            let kind = if is_tension {
                LimitKind::Tension { limit, area, share }
            } else {
                LimitKind::Compression { limit, area, share }
            };
            self.push(kind, target, on.clone(), common, &written.place);
        };
        if !own.tension {
            lay(&table.tension, true);
        }
        if !own.compression {
            lay(&table.compression, false);
        }
    }

    pub(super) fn push(
        &mut self,
        kind: LimitKind,
        target: Target,
        on: Name,
        common: &Common,
        place: &Place,
    ) {
        let reads = match &common.only {
            Some(only) => Reads::Only(only.clone()),
            None => Reads::Purpose(purpose_of(&kind)),
        };
        self.caution_if_unread(&reads, &target, &on, place);
        self.limits.push(Limit {
            kind,
            target,
            on,
            reads,
            since: common.since,
            source: common.source.clone(),
            place: place.clone(),
        });
    }
}

pub(super) fn tables<'e, 't>(limits: &'e Entry<Vec<Limits<'t>>>) -> &'e [Limits<'t>] {
    limits.given().map_or(&[], |limits| &limits.value)
}

/// Which combinations read a limit that does not say: by its kind.
fn purpose_of(kind: &LimitKind) -> Purpose {
    match kind {
        LimitKind::Tension { .. }
        | LimitKind::Compression { .. }
        | LimitKind::Force(_)
        | LimitKind::Reaction(_) => Purpose::Strength,
        LimitKind::Elongation(_)
        | LimitKind::Displacement(_)
        | LimitKind::Gap { .. }
        | LimitKind::Bears
        | LimitKind::Slack
        | LimitKind::Watch(_)
        | LimitKind::Rotation(_) => Purpose::Service,
    }
}

pub(super) fn signed<Q: Copy + Neg<Output = Q>, T: Copy>(
    bound: Bound<T>,
    value: impl Fn(T) -> Q,
) -> Bounds<Q> {
    match bound {
        Bound::Size(size) => Bounds {
            lower: -value(size),
            upper: value(size),
        },
        Bound::Each(lower, upper) => Bounds {
            lower: value(lower),
            upper: value(upper),
        },
    }
}

fn force_limit(bound: Bound<Force>) -> Bounds<Force> {
    signed(bound, |force| force)
}

fn movement_limit(bound: Bound<MovementBound>, length: Length) -> Bounds<Length> {
    signed(bound, |bound| match bound {
        MovementBound::Length(literal) => literal.nominal,
        MovementBound::Share { divisor } => length / divisor,
    })
}

pub(super) fn joined(member: &Name, part: &Name) -> Name {
    let mut name = String::with_capacity(member.len() + 1 + part.len());
    name.push_str(member);
    name.push('.');
    name.push_str(part);
    Name::from(name)
}
