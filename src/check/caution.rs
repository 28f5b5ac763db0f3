//! What a report warns of, each where its condition holds.

use crate::catalogue::{Section, Shape};
use crate::model::{Layer, Limit, LimitKind, Member, Model, Place, Remark, ShareFactor};
use crate::quantity::{Dimension, Force, Length, Stress, Style};
use crate::result::{CombinationResult, MemberResult};
use crate::solve::Threshold;
use std::collections::{BTreeMap, BTreeSet, HashSet};

/// Slenderness L/r above which a member in compression is called slender (AISC 360-22, user note
/// to E2).
const SLENDER_IN_COMPRESSION: f64 = 200.0;

/// Slenderness above which a member that is only pulled is (user note to D1, which leaves rods and
/// hangers out).
const SLENDER_IN_TENSION: f64 = 300.0;

/// A share of a strength below this holds a safety factor of allowable-stress design (0.6 yield,
/// 0.5 ultimate); resistance and partial factors lie above (0.75 is a resistance factor, 1/1.1 a
/// partial factor) and go with factored loads. Common practice.
const HOLDS_A_SAFETY_FACTOR: f64 = 0.7;

/// A movement of this share of the member's length is no small displacement any more.
const LARGE_MOVEMENT: f64 = 1.0 / 50.0;

/// A solved combination with what counts as zero in each of its members.
pub struct Observed<'a> {
    /// Its index in the model.
    pub index: usize,
    /// Its results.
    pub result: &'a CombinationResult,
    /// One threshold a member.
    pub zeros: &'a [Threshold],
}

/// A temperature that is off a material's range.
struct Outside {
    by: f64,
    reading: f64,
    segment: usize,
    layer: usize,
    combination: String,
}

/// All cautions that the results of a job call for, member by member.
pub fn cautions(model: &Model, observed: &[Observed]) -> Vec<Remark> {
    let style = Style {
        units: model.units,
        ..Style::default()
    };
    let mut remarks = Vec::new();
    for (index, member) in model.members.iter().enumerate() {
        let look = Look {
            model,
            member,
            index,
            observed,
            style,
        };
        remarks.extend(look.compression());
        remarks.extend(look.slenderness());
        remarks.extend(look.yielding());
        remarks.extend(look.movement());
        remarks.extend(look.temperature());
        remarks.extend(look.across());
    }
    // One literal may limit many segments: it is said once.
    let mut said = HashSet::new();
    for limit in &model.limits {
        if said.insert(limit.place.start) {
            remarks.extend(factored_share(model, limit));
            remarks.extend(counted_from_itself(model, limit));
        }
    }
    remarks
}

struct Look<'a> {
    model: &'a Model,
    member: &'a Member,
    index: usize,
    observed: &'a [Observed<'a>],
    style: Style,
}

impl Look<'_> {
    fn caution(&self, text: String, place: Option<Place>) -> Option<Remark> {
        let place = place.or_else(|| Some(self.member.place.clone()));
        Some(Remark {
            about: format!("member.{}", self.member.name),
            text,
            place,
            caution: true,
        })
    }

    fn results(&self) -> impl Iterator<Item = (&MemberResult, &str, Threshold)> {
        let index = self.index;
        self.observed.iter().map(move |seen| {
            (
                &seen.result.members[index],
                seen.result.name.as_ref(),
                seen.zeros[index],
            )
        })
    }

    /// The worst by `of` over all combinations, with the name of the combination.
    fn worst<T: PartialOrd + Copy>(
        &self,
        of: impl Fn(&MemberResult, Threshold) -> Option<T>,
    ) -> Option<(T, &str)> {
        let mut worst: Option<(T, &str)> = None;
        for (result, name, zero) in self.results() {
            if let Some(value) = of(result, zero)
                && worst.is_none_or(|(known, _)| value > known)
            {
                worst = Some((value, name));
            }
        }
        worst
    }

    fn greatest_compression(&self) -> Option<(Force, &str)> {
        self.worst(|result, zero| (-result.force_min > zero.force).then_some(-result.force_min))
    }

    fn compression(&self) -> Option<Remark> {
        let (force, combination) = self.greatest_compression()?;
        let force = self.style.quantity(Dimension::Force, force.value);
        self.caution(
            format!("compression of {force} in `{combination}`, and buckling is not checked here: check it by the governing code"),
            None,
        )
    }

    fn slenderness(&self) -> Option<Remark> {
        let single = self
            .member
            .segments
            .iter()
            .filter_map(|segment| match segment.layers() {
                [only] => Some(only),
                _ => None,
            });
        let pushed = self.greatest_compression().is_some();
        let rod = |layer: &Layer| {
            matches!(
                layer.section,
                Section::Round(_) | Section::Bar(_) | Section::Thread(_)
            )
        };
        let (limit, how) = if pushed {
            (
                SLENDER_IN_COMPRESSION,
                "in compression (AISC 360-22, user note to E2)",
            )
        } else {
            (
                SLENDER_IN_TENSION,
                "in tension (AISC 360-22, user note to D1)",
            )
        };
        let ends = |layer: &Layer| {
            [
                layer.section.gyration_at(0.0),
                layer.section.gyration_at(1.0),
            ]
        };
        let radii = single
            .filter(|layer| pushed || !rod(layer))
            .flat_map(ends)
            .flatten();
        let least = radii
            .filter(|radius| radius.value > 0.0)
            .reduce(Length::min)?;
        let slenderness = (self.member.length() / least).value;
        if slenderness <= limit {
            return None;
        }
        let radius = self.style.quantity(Dimension::Length, least.value);
        self.caution(
            format!(
                "slender: length over least radius of gyration ({radius}) is {slenderness:.0}, over {limit:.0} {how}"
            ),
            None,
        )
    }

    fn yielding(&self) -> Option<Remark> {
        let mut worst: Option<(f64, Stress, Stress, String, &str, Place)> = None;
        for (which, segment) in self.member.segments.iter().enumerate() {
            for (layer_index, layer) in segment.layers().iter().enumerate() {
                let material = &self.model.materials[layer.material];
                let Some(limit) = material.yield_at(layer.section.thickness()) else {
                    continue;
                };
                for (result, name, _) in self.results() {
                    let result = &result.segments[which];
                    let (most, least) = match result.layers.get(layer_index) {
                        Some(layer) => (layer.stress_max, layer.stress_min),
                        None => (result.stress_max, result.stress_min),
                    };
                    let (Some(most), Some(least)) = (most, least) else {
                        continue;
                    };
                    let stress = most.abs().max(least.abs());
                    let ratio = (stress / limit).value;
                    if ratio > 1.0 && worst.as_ref().is_none_or(|(known, ..)| ratio > *known) {
                        let on = match result.layers.get(layer_index) {
                            Some(layer) => format!("{}.{}", segment.name, layer.name),
                            None => segment.name.to_string(),
                        };
                        worst = Some((ratio, stress, limit, on, name, layer.place.clone()));
                    }
                }
            }
        }
        let (_, stress, limit, on, combination, place) = worst?;
        let stress = self.style.quantity(Dimension::Stress, stress.value);
        let limit = self.style.quantity(Dimension::Stress, limit.value);
        self.caution(
            format!("stress of {stress} in `{on}` is over the yield strength of {limit} in `{combination}`: the computation is elastic, so stretches there are too small and forces may share otherwise"),
            Some(place),
        )
    }

    fn movement(&self) -> Option<Remark> {
        let large = self.member.length() * LARGE_MOVEMENT;
        let (moved, combination) = self.worst(|result, _| {
            let stations = result
                .stations
                .iter()
                .map(|station| station.displacement.abs());
            stations
                .chain([result.elongation.abs()])
                .reduce(Length::max)
                .filter(|&moved| moved > large)
        })?;
        let moved = self.style.quantity(Dimension::Length, moved.value);
        self.caution(
            format!("movement of {moved} in `{combination}` is over 1/50 of the length: the computation is for small displacements"),
            None,
        )
    }

    /// Temperatures outside the range for which a material's values hold: of each material the
    /// worst, with its place.
    fn temperature(&self) -> Vec<Remark> {
        let mut worst: BTreeMap<usize, Outside> = BTreeMap::new();
        let Some(datum) = self.member.datum else {
            return Vec::new();
        };
        for seen in self.observed {
            let factors = &self.model.combinations[seen.index].factors;
            for (which, segment) in self.member.segments.iter().enumerate() {
                for (layer_index, layer) in segment.layers().iter().enumerate() {
                    let Some((least, most)) = self.model.materials[layer.material].range else {
                        continue;
                    };
                    let acting = self.member.actions.temperatures.iter();
                    let acting = acting.filter(|t| t.segment == which && t.layer == layer_index);
                    let (start, end) = acting.fold((0.0, 0.0), |(start, end), change| {
                        let factor = factors[change.case];
                        (
                            start + change.start.value * factor,
                            end + change.end.value * factor,
                        )
                    });
                    for reading in [datum.value + start, datum.value + end] {
                        let by = (reading - most.value).max(least.value - reading);
                        if by > 0.0 && worst.get(&layer.material).is_none_or(|known| by > known.by)
                        {
                            let combination = seen.result.name.to_string();
                            let at = Outside {
                                by,
                                reading,
                                segment: which,
                                layer: layer_index,
                                combination,
                            };
                            worst.insert(layer.material, at);
                        }
                    }
                }
            }
        }
        worst
            .into_iter()
            .filter_map(|(material, outside)| self.outside(material, &outside))
            .collect()
    }

    fn outside(&self, material: usize, outside: &Outside) -> Option<Remark> {
        let material = &self.model.materials[material];
        let (least, most) = material.range?;
        let show = |kelvin: f64| self.style.quantity(Dimension::Temperature, kelvin);
        let segment = &self.member.segments[outside.segment];
        let text = format!(
            "temperature of {} in `{}`, `{}` is outside the range of {} to {} for which the values of `{}` hold",
            show(outside.reading),
            segment.name,
            outside.combination,
            show(least.value),
            show(most.value),
            material.id,
        );
        self.caution(text, Some(segment.layers()[outside.layer].place.clone()))
    }

    /// Loads across a sloping or level member, which the axial computation leaves out.
    fn across(&self) -> Option<Remark> {
        let level = self.member.runs?.value.cos().abs();
        let actions = &self.member.actions;
        let factors_of = |case: usize| {
            self.observed
                .iter()
                .any(|seen| self.model.combinations[seen.index].factors[case] != 0.0)
        };
        // The cosine of a right angle is not quite 0 in double precision.
        let heavy = level > 1e-12
            && actions
                .weights
                .iter()
                .any(|weight| weight.number != 0.0 && factors_of(weight.case));
        let loaded = actions
            .forces
            .iter()
            .any(|force| force.across.value != 0.0 && factors_of(force.case))
            || actions.lines.iter().any(|line| {
                line.across.iter().any(|across| across.value != 0.0) && factors_of(line.case)
            });
        if !heavy && !loaded {
            return None;
        }
        self.caution(
            "weight acts across this member as well as along it: the part across, and the bending that it makes, is not carried by this computation".into(),
            None,
        )
    }
}

/// A share of a strength that already holds a safety factor, read with factored loads.
fn factored_share(model: &Model, limit: &Limit) -> Option<Remark> {
    let (LimitKind::Tension { share, .. } | LimitKind::Compression { share, .. }) = limit.kind
    else {
        return None;
    };
    let ShareFactor(share) = share?;
    if share >= HOLDS_A_SAFETY_FACTOR {
        return None;
    }
    let member = &model.members[limit.target.member()?];
    let acting = cases_on(member);
    let factored = |factors: &[f64]| acting.iter().any(|&case| factors[case].abs() > 1.0);
    let (_, combination) = model
        .combinations
        .iter()
        .enumerate()
        .find(|(index, combination)| {
            super::reads(limit, *index, combination) && factored(&combination.factors)
        })?;
    Some(Remark {
        about: format!("member.{}", member.name),
        text: format!(
            "the limit on {} is {share:.3} of a strength and so may hold a safety factor already, and `{}` has factored loads: safety may be counted twice",
            super::word(&limit.kind),
            combination.name,
        ),
        place: Some(limit.place.clone()),
        caution: true,
    })
}

/// The cases that put anything on a member.
fn cases_on(member: &Member) -> BTreeSet<usize> {
    let actions = &member.actions;
    let forces = actions.forces.iter().map(|action| action.case);
    let lines = actions.lines.iter().map(|action| action.case);
    let weights = actions.weights.iter().map(|action| action.case);
    let temperatures = actions.temperatures.iter().map(|action| action.case);
    let strains = actions.strains.iter().map(|action| action.case);
    let movements = actions.movements.iter().map(|action| action.case);
    forces
        .chain(lines)
        .chain(weights)
        .chain(temperatures)
        .chain(strains)
        .chain(movements)
        .collect()
}

/// A movement that no combination reads but the one that it is counted from.
fn counted_from_itself(model: &Model, limit: &Limit) -> Option<Remark> {
    let since = limit.since?;
    let mut reading = model
        .combinations
        .iter()
        .enumerate()
        .filter(|(index, combination)| super::reads(limit, *index, combination));
    if reading.any(|(index, _)| index != since) {
        return None;
    }
    let about = match limit.target.member() {
        Some(member) => format!("member.{}", model.members[member].name),
        None => limit.on.to_string(),
    };
    Some(Remark {
        about,
        text: format!(
            "no combination reads this limit on {} but `{}`, from which it is counted: nothing is checked by it",
            super::word(&limit.kind),
            model.combinations[since].name,
        ),
        place: Some(limit.place.clone()),
        caution: true,
    })
}
