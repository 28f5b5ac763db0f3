//! An assembly as a system: its members, holds and hinges as elastic, rigid and one-way parts.

use super::restraint::Restraint;
use super::tie::{Part, Span, Tie, run_stiffness, spans};
use super::unknowns::{Hinge, Unknowns};
use crate::model::{
    Assembly, Between, Carries, Combination, HoldKind, Model, SegmentKind, Spatial,
};
use crate::quantity::{Flexibility, ForcePerLength};
use crate::solve::system::{Elastic, OneWay, Row, System};
use crate::solve::{SolveError, Stiffness};

/// What does not change between combinations that take the same members out and have the same
/// factors on moduli.
pub(super) struct Parts {
    /// How many unknowns there are with those of stations beside gaps.
    pub(super) unknowns: usize,
    pub(super) ties: Vec<Tie>,
    /// One for each point of each hold.
    pub(super) held: Vec<Held>,
    /// What each rigid part is.
    pub(super) rigid: Vec<Rigid>,
    /// What each one-way part is.
    pub(super) one_way: Vec<OneSided>,
    /// How much force the rest of an elastic part may make of each length: see [`Restraint`].
    pub(super) elastic_restraint: Vec<ForcePerLength>,
    /// The same of one-way parts.
    pub(super) one_way_restraint: Vec<ForcePerLength>,
    /// The same of rigid parts.
    pub(super) rigid_restraint: Vec<ForcePerLength>,
    /// The largest displacement per force among the parts.
    pub(super) softest: Flexibility,
}

/// One point of a hold.
#[derive(Debug, Clone, Copy)]
pub(super) struct Held {
    pub(super) hold: usize,
    pub(super) point: usize,
    /// The part of its first direction, in the list of its kind; the others follow.
    pub(super) first: usize,
}

/// What a rigid part is.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum Rigid {
    /// A direction of a point that is held, by its index in [`Parts::held`].
    Held(usize),
    /// One coordinate of a point that two bodies share.
    Hinge(Hinge),
}

/// What a one-way part is.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) enum OneSided {
    /// A stop, by its index in [`Parts::held`].
    Stop(usize),
    /// A member, or a gap in one, by its index in the model.
    Member(usize),
}

/// What a part is fastened to at one of its ends.
#[derive(Debug, Clone, Copy)]
pub(super) enum Joint {
    Point(usize),
    /// A station of a member, by its unknown.
    Station(usize),
    Ground,
}

impl Parts {
    pub(super) fn of(
        model: &Model,
        assembly: &Assembly,
        unknowns: &Unknowns,
        combination: &Combination,
    ) -> Result<(Self, System), Vec<SolveError>> {
        let mut building = Building::begin(assembly, unknowns);
        let mut errors = Vec::new();
        for (index, member) in model.members.iter().enumerate() {
            if let Some(between) = &member.between
                && combination.without.binary_search(&index).is_err()
            {
                let stiffness = Stiffness::of(model, member, combination);
                if let Err(error) = building.tie(model, index, between, stiffness) {
                    errors.push(error);
                }
            }
        }
        if !errors.is_empty() {
            return Err(errors);
        }
        building.holds();
        building.hinges();
        building.shown();
        Ok(building.finish())
    }
}

pub(super) struct Building<'a> {
    assembly: &'a Assembly,
    pub(super) unknowns: &'a Unknowns,
    pub(super) system: System,
    parts: Parts,
    /// The ends of every part, for what restrains it.
    pub(super) elastic: Vec<[Joint; 2]>,
    pub(super) one_way: Vec<[Joint; 2]>,
    pub(super) rigid: Vec<[Joint; 2]>,
}

impl<'a> Building<'a> {
    fn begin(assembly: &'a Assembly, unknowns: &'a Unknowns) -> Self {
        Building {
            assembly,
            unknowns,
            system: System {
                places: unknowns.places.clone(),
                ..System::default()
            },
            parts: Parts {
                unknowns: 0,
                ties: Vec::new(),
                held: Vec::new(),
                rigid: Vec::new(),
                one_way: Vec::new(),
                elastic_restraint: Vec::new(),
                one_way_restraint: Vec::new(),
                rigid_restraint: Vec::new(),
                softest: Default::default(),
            },
            elastic: Vec::new(),
            one_way: Vec::new(),
            rigid: Vec::new(),
        }
    }

    /// `sign` times the stretch from one end to the other along a direction; empty where a body
    /// keeps their distance.
    fn row(&self, direction: &Spatial<f64>, [from, to]: [Joint; 2], sign: f64) -> Row {
        let mut row = Row::new();
        if let (Joint::Point(a), Joint::Point(b)) = (from, to)
            && self.unknowns.carried_together(a, b)
        {
            return row;
        }
        for (end, sign) in [(from, -sign), (to, sign)] {
            match end {
                Joint::Point(point) => {
                    let moved = &self.unknowns.points[point];
                    self.unknowns.put(&mut row, moved, direction, sign);
                }
                Joint::Station(unknown) => row.push((unknown, sign)),
                Joint::Ground => {}
            }
        }
        row
    }

    fn add_elastic(&mut self, row: Row, stiffness: ForcePerLength, ends: [Joint; 2]) -> usize {
        self.system.elastic.push(Elastic { row, stiffness });
        self.elastic.push(ends);
        self.elastic.len() - 1
    }

    fn add_one_way(
        &mut self,
        row: Row,
        stiffness: Option<ForcePerLength>,
        ends: [Joint; 2],
        is: OneSided,
    ) -> usize {
        self.system.one_way.push(OneWay { row, stiffness });
        self.parts.one_way.push(is);
        self.one_way.push(ends);
        self.one_way.len() - 1
    }

    fn add_rigid(&mut self, row: Row, ends: [Joint; 2], is: Rigid) -> usize {
        self.system.rigid.push(row);
        self.parts.rigid.push(is);
        self.rigid.push(ends);
        self.rigid.len() - 1
    }

    /// A member: its runs, its gaps, and the unknowns of the stations between them.
    fn tie(
        &mut self,
        model: &Model,
        index: usize,
        between: &Between,
        made: Stiffness,
    ) -> Result<(), SolveError> {
        let member = &model.members[index];
        let cut = spans(member);
        let last = cut.len() - 1;
        let mut from = Joint::Point(between.start);
        let mut put = Vec::with_capacity(cut.len());
        for (at, (pieces, is_gap)) in cut.into_iter().enumerate() {
            let to = if at == last {
                Joint::Point(between.end)
            } else {
                let reached = (member.stations[pieces.end].x / member.length()).value;
                self.station(between, reached)
            };
            let ends = [from, to];
            let stiffness = if is_gap {
                match &member.segments[member.pieces[pieces.start].segment].kind {
                    SegmentKind::Gap(gap) => gap.stiffness,
                    _ => None,
                }
            } else {
                Some(run_stiffness(member, &made, pieces.clone())?)
            };
            // What only pushes pulls along the reversed row.
            let pushes = is_gap || member.carries == Some(Carries::Compression);
            let row = self.row(&between.direction, ends, if pushes { -1.0 } else { 1.0 });
            let is = OneSided::Member(index);
            let part = match (is_gap, member.carries, stiffness) {
                (true, ..) if row.is_empty() => Part::GapWithin,
                (true, ..) => Part::Gap(self.add_one_way(row, stiffness, ends, is)),
                (_, carries, _) if row.is_empty() => Part::Within(carries),
                (_, Some(carries), _) => {
                    Part::OneWay(self.add_one_way(row, stiffness, ends, is), carries)
                }
                (_, None, Some(stiffness)) => Part::Elastic(self.add_elastic(row, stiffness, ends)),
                (_, None, None) => Part::GapWithin,
            };
            put.push(Span {
                pieces,
                stiffness,
                part,
            });
            from = to;
        }
        self.parts.ties.push(Tie {
            member: index,
            stiffness: made,
            spans: put,
        });
        Ok(())
    }

    /// A new unknown for a station of a member, at this share of its length.
    fn station(&mut self, between: &Between, share: f64) -> Joint {
        let places = &mut self.system.places;
        let [start, end] =
            [between.start, between.end].map(|point| &self.assembly.points[point].at);
        places.push(std::array::from_fn(|k| {
            (start[k] + (end[k] - start[k]) * share).value
        }));
        Joint::Station(places.len() - 1)
    }

    fn holds(&mut self) {
        for (index, hold) in self.assembly.holds.iter().enumerate() {
            for &point in &hold.points {
                let ends = [Joint::Ground, Joint::Point(point)];
                let held = self.parts.held.len();
                let first = match hold.kind {
                    HoldKind::Fixed { .. } => self.rigid.len(),
                    HoldKind::Spring { .. } => self.elastic.len(),
                    HoldKind::Stop { .. } => self.one_way.len(),
                };
                for direction in hold.kind.directions() {
                    let row = self.row(direction, ends, 1.0);
                    match hold.kind {
                        HoldKind::Fixed { .. } => self.add_rigid(row, ends, Rigid::Held(held)),
                        HoldKind::Spring { stiffness, .. } => {
                            self.add_elastic(row, stiffness, ends)
                        }
                        HoldKind::Stop { stiffness, .. } => {
                            self.add_one_way(row, stiffness, ends, OneSided::Stop(held))
                        }
                    };
                }
                self.parts.held.push(Held {
                    hold: index,
                    point,
                    first,
                });
            }
        }
    }

    /// A point of several bodies moves with the first; the others are hinged to it.
    fn hinges(&mut self) {
        for &hinge in &self.unknowns.hinges {
            let at = &self.assembly.points[hinge.point].at;
            let other = self.unknowns.moved_with(hinge.body, at);
            for k in 0..self.unknowns.coordinates {
                let mut direction = [0.0; 3];
                direction[k] = 1.0;
                let mut row = Row::new();
                let moved = &self.unknowns.points[hinge.point];
                self.unknowns.put(&mut row, moved, &direction, 1.0);
                self.unknowns.put(&mut row, &other, &direction, -1.0);
                let ends = [Joint::Ground, Joint::Point(hinge.point)];
                self.add_rigid(row, ends, Rigid::Hinge(hinge));
            }
        }
    }

    /// The displacements of all points, and what else may be chosen: a rotation that moves no
    /// point, and, next to nothing beside those, a part of a member between two open gaps.
    fn shown(&mut self) {
        let mut shown = Vec::with_capacity(self.unknowns.points.len() * self.unknowns.coordinates);
        for moved in &self.unknowns.points {
            for k in 0..self.unknowns.coordinates {
                let mut direction = [0.0; 3];
                direction[k] = 1.0;
                let mut row = Row::new();
                self.unknowns.put(&mut row, moved, &direction, 1.0);
                shown.push(row);
            }
        }
        shown.extend(self.unknowns.idle().map(|unknown| vec![(unknown, 1.0)]));
        let stations = self.unknowns.count..self.system.places.len();
        shown.extend(stations.map(|unknown| vec![(unknown, INNER)]));
        self.system.shown = shown;
    }

    fn finish(mut self) -> (Parts, System) {
        let restraint = Restraint::of(&self);
        let stiffness = |part: &Elastic| Some(part.stiffness);
        let one_way = |part: &OneWay| part.stiffness;
        let system = &self.system;
        let of = |stiffness: Vec<Option<ForcePerLength>>, ends: &[[Joint; 2]]| {
            let pairs = stiffness.into_iter().zip(ends);
            pairs
                .map(|(k, ends)| restraint.around(k, ends))
                .collect::<Vec<_>>()
        };
        let elastic = of(
            system.elastic.iter().map(stiffness).collect(),
            &self.elastic,
        );
        let sided = of(system.one_way.iter().map(one_way).collect(), &self.one_way);
        let rigid = of(vec![None; self.rigid.len()], &self.rigid);
        let softest = restraint.softest;
        self.parts.elastic_restraint = elastic;
        self.parts.one_way_restraint = sided;
        self.parts.rigid_restraint = rigid;
        self.parts.softest = softest;
        self.parts.unknowns = self.system.places.len();
        (self.parts, self.system)
    }
}

/// What a displacement between two open gaps counts beside those of points.
const INNER: f64 = 1e-4;
