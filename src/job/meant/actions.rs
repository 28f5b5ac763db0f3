//! What acts on a member: loads and cases with their names resolved, laid on segments and layers.

use super::Meaning;
use super::assembly::{Span, takes};
use super::coverage::{Cells, Cover, On};
use super::forces::{Line, Sloped};
use super::heat::Heat;
use super::members::Whole;
use super::outline::Outline;
use super::supports::Held;
use crate::job::nearest::remedy;
use crate::job::written::load::{Action, Load};
use crate::job::written::segment::Kind;
use crate::job::written::{ByCase, Entry, Written};
use crate::model::{Actions, FreeStrain, Member, Movement, Name, PointForce};
use crate::quantity::{Length, Ratio, from_si};

/// Everything that acts on a member; `None` where that cannot be said. Of a member that is not
/// `sound` names are checked all the same, and that materials give what acts on them.
pub(super) fn actions<'w, 't>(
    whole: &Whole<'w, 't>,
    span: &Span,
    outline: &Outline<'w, 't>,
    held: &Held,
    member: &Member,
    sound: bool,
    meaning: &mut Meaning<'w, 't>,
) -> Option<Actions> {
    let mut laid = Laying {
        whole,
        span,
        outline,
        held,
        member: sound.then_some(member),
        cells: Cells::of(&member.segments),
        actions: Actions::default(),
        weights: Vec::new(),
        heats: Vec::new(),
        meaning,
    };
    laid.of_cases();
    for load in whole.loads.given().map_or(&[][..], |all| &all.value) {
        laid.load(load);
    }
    laid.lay_weights(member);
    laid.lay_heat(member);
    (sound && !whole.loads.is_wrong()).then_some(laid.actions)
}

/// Actions on their way onto a member.
pub(super) struct Laying<'a, 'w, 't> {
    pub(super) whole: &'a Whole<'w, 't>,
    pub(super) span: &'a Span,
    pub(super) outline: &'a Outline<'w, 't>,
    held: &'a Held,
    /// The member without its actions; `None` where something about it is at fault.
    pub(super) member: Option<&'a Member>,
    /// Its layers in one row.
    pub(super) cells: Cells,
    pub(super) actions: Actions,
    pub(super) weights: Vec<Cover<f64>>,
    pub(super) heats: Vec<Cover<Heat>>,
    pub(super) meaning: &'a mut Meaning<'w, 't>,
}

impl<'w, 't> Laying<'_, 'w, 't> {
    /// What cases say of every member.
    fn of_cases(&mut self) {
        let job = self.meaning.job;
        for (index, case) in job.cases.iter().enumerate() {
            let mut heat = |value, place: &crate::model::Place| {
                self.heats.push(Cover {
                    case: index,
                    on: On::Case,
                    value,
                    place: place.clone(),
                });
            };
            if let Entry::Given(change) = &case.change {
                heat(Heat::Change(change.value), &change.place);
            }
            if let Entry::Given(reading) = &case.reading {
                heat(Heat::Reading(reading.value), &reading.place);
            }
            if let Entry::Given(weight) = &case.weight {
                self.weights.push(Cover {
                    case: index,
                    on: On::Case,
                    value: weight.value,
                    place: weight.place.clone(),
                });
            }
        }
    }

    fn load(&mut self, load: &'w Load<'t>) {
        let Some(action) = &load.action else {
            return;
        };
        if !takes(self.whole, load, action, self.meaning) {
            return;
        }
        match action {
            Action::Force(force) => self.point_force(load, force, false),
            Action::Down(force) => self.point_force(load, force, true),
            Action::Line(line) => self.lines(load, line, Line::Along),
            Action::LineDown(line) => self.lines(load, line, Line::Down),
            Action::Weight(weight) => {
                let on = self.on(load);
                for (case, written) in self.by_case(load, weight) {
                    if let Some(on) = on {
                        let (value, place) = (written.value, written.place.clone());
                        self.weights.push(Cover {
                            case,
                            on,
                            value,
                            place,
                        });
                    }
                }
            }
            Action::Change(change) => {
                let on = self.on(load);
                for (case, written) in self.by_case(load, change) {
                    self.heat(case, on, Heat::Change(written.value), written);
                }
            }
            Action::Reading(reading) => {
                let on = self.on(load);
                for (case, written) in self.by_case(load, reading) {
                    self.heat(case, on, Heat::Reading(written.value), written);
                }
            }
            Action::Misfit(misfit) => self.misfit(load, misfit),
            Action::Strain(strain) => {
                let on = self.on(load);
                for (case, written) in self.by_case(load, strain) {
                    self.free_strain(case, on, written.value);
                }
            }
            Action::Movement(movement) => self.movement(load, movement),
        }
    }

    /// The value of a load for each case that it acts in.
    pub(super) fn by_case<T>(
        &mut self,
        load: &'w Load<'t>,
        values: &'w ByCase<'t, T>,
    ) -> Vec<(usize, &'w Written<T>)> {
        self.meaning.by_case(&load.case, &load.place, values)
    }

    /// What a load covers; `None` where the name of it is unknown, or a gap, which takes nothing.
    pub(super) fn on(&mut self, load: &'w Load<'t>) -> Option<On> {
        let written = match &load.on {
            Entry::Absent => return Some(On::Member),
            Entry::Wrong => return None,
            Entry::Given(written) => written,
        };
        let (segment, layer) = match written.value.split_once('.') {
            Some((segment, layer)) => (segment, Some(layer)),
            None => (written.value, None),
        };
        let problems = &mut self.meaning.r.problems;
        if self.outline.segments.is_empty() {
            return None;
        }
        let Some(index) = self.outline.names.find(segment) else {
            if !self.outline.segments.iter().any(|s| s.name.is_wrong()) {
                let message = format!("no segment of this member is called `{segment}`");
                let names = self.outline.names.texts();
                let help = remedy(segment, names, "its segments are");
                problems.unknown("member", &written.place, message, help);
            }
            return None;
        };
        if self.outline.is_gap(index) {
            let message = format!("`{segment}` is a gap, on which nothing acts");
            let help = "a gap has no material; take a segment beside it";
            problems.say(&written.place, message, help);
            return None;
        }
        let Some(layer) = layer else {
            return Some(On::Segment(index));
        };
        let names: Vec<Name> = match &self.outline.segments[index].kind {
            Kind::Solid {
                layers,
                layered: true,
            } => layers
                .iter()
                .enumerate()
                .map(|(index, layer)| match layer.name.given() {
                    Some(name) => Name::from(name.value),
                    None => Name::from((index + 1).to_string()),
                })
                .collect(),
            Kind::Wrong => return None,
            _ => Vec::new(),
        };
        let found = names.iter().position(|name| &**name == layer);
        if found.is_none() {
            let message = format!("no layer of the segment `{segment}` is called `{layer}`");
            let help = if names.is_empty() {
                Some(format!("it has no layers; write `{segment}`"))
            } else {
                remedy(layer, names.iter().map(|name| &**name), "its layers are")
            };
            problems.unknown("member", &written.place, message, help);
        }
        found.map(|layer| On::Layer(index, layer))
    }

    /// A strain of everything that is covered.
    fn free_strain(&mut self, case: usize, on: Option<On>, strain: Ratio) {
        let Some(on) = on else {
            return;
        };
        for (segment, layer) in self.cells.each(on) {
            self.actions.strains.push(FreeStrain {
                case,
                segment,
                layer,
                strain,
            });
        }
    }

    /// A misfit is spread over the length of what it acts on; gaps take no part.
    fn misfit(&mut self, load: &'w Load<'t>, misfit: &'w ByCase<'t, Length>) {
        let on = self.on(load);
        let values = self.by_case(load, misfit);
        let (Some(on), Some(_)) = (on, self.member) else {
            return;
        };
        let length: f64 = match on {
            On::Segment(segment) | On::Layer(segment, _) => self.outline.length_of(segment),
            On::Case | On::Member => (0..self.outline.segments.len())
                .filter(|&segment| !self.outline.is_gap(segment))
                .map(|segment| self.outline.length_of(segment))
                .sum(),
        };
        for (case, written) in values {
            if length > 0.0 {
                let strain = from_si(written.value.value / length);
                self.free_strain(case, Some(on), strain);
            } else {
                let message = "a misfit has nothing to act on in a member of gaps alone";
                self.meaning.r.problems.say(&written.place, message, "");
            }
        }
    }

    fn point_force(
        &mut self,
        load: &'w Load<'t>,
        force: &'w ByCase<'t, crate::quantity::Force>,
        down: bool,
    ) {
        let values = self.by_case(load, force);
        let slope = if down {
            self.slope()
        } else {
            Some(Sloped::AXIS)
        };
        let station = load.at.given().and_then(|at| self.outline.find(&at.value));
        let (Some(station), Some(slope), Some(_)) = (station, slope, self.member) else {
            return;
        };
        for (case, written) in values {
            self.actions.forces.push(PointForce {
                case,
                station,
                force: written.value * slope.along,
                across: written.value * slope.across,
            });
        }
    }

    fn movement(&mut self, load: &'w Load<'t>, movement: &'w ByCase<'t, Length>) {
        let values = self.by_case(load, movement);
        let support = match (&load.support, &load.at) {
            (Entry::Given(name), _) => self.held.named(name, self.meaning),
            (Entry::Absent, Entry::Given(at)) => {
                let station = self.outline.find(&at.value);
                station.and_then(|station| self.held.only_one_at(station, &at.place, self.meaning))
            }
            _ => None,
        };
        let Some(support) = support else {
            return;
        };
        for (case, written) in values {
            self.actions.movements.push(Movement {
                case,
                support,
                movement: written.value,
            });
        }
    }
}
