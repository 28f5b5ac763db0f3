//! What a report warns of, each where its condition holds.

use super::{Observed, bending, doubtful, large};
use crate::catalogue::{Section, Shape};
use crate::model::{Layer, Member, Model, Place, Remark};
use crate::quantity::{Dimension, Force, Length, Stress, Style};
use crate::result::MemberResult;
use crate::solve::Threshold;
use std::collections::BTreeMap;

/// Slenderness L/r above which a member in compression is called slender (AISC 360-22, user note
/// to E2).
const SLENDER_IN_COMPRESSION: f64 = 200.0;

/// Slenderness above which a member that is only pulled is (user note to D1, which leaves rods and
/// hangers out).
const SLENDER_IN_TENSION: f64 = 300.0;

/// The result of a member in one combination.
pub(super) struct Solved<'a> {
    pub(super) member: &'a MemberResult,
    pub(super) combination: &'a str,
    zero: Threshold,
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
        remarks.extend(large::member(&look));
        remarks.extend(look.temperature());
        remarks.extend(bending::member(&look));
    }
    remarks.extend(large::assembly(model, observed, style));
    remarks.extend(bending::bodies(model, observed));
    remarks.extend(doubtful::limits(model));
    remarks
}

/// A member of the model in all combinations that have it.
pub(super) struct Look<'a> {
    pub(super) model: &'a Model,
    pub(super) member: &'a Member,
    index: usize,
    observed: &'a [Observed<'a>],
    pub(super) style: Style,
}

impl<'a> Look<'a> {
    pub(super) fn caution(&self, text: String, place: Option<Place>) -> Option<Remark> {
        let place = place.or_else(|| Some(self.member.place.clone()));
        Some(Remark {
            about: format!("member.{}", self.member.name),
            text,
            place,
            caution: true,
        })
    }

    /// The combinations that do not take it out.
    pub(super) fn combinations(&self) -> impl Iterator<Item = (&'a Observed<'a>, Solved<'a>)> {
        let (model, index) = (self.model, self.index);
        let solved = move |seen: &'a Observed<'a>| {
            let (member, zero) = seen.member(model, index)?;
            let solved = Solved {
                member,
                combination: seen.result.name.as_ref(),
                zero,
            };
            Some((seen, solved))
        };
        self.observed.iter().filter_map(solved)
    }

    fn results(&self) -> impl Iterator<Item = Solved<'a>> {
        self.combinations().map(|(_, solved)| solved)
    }

    /// The worst by `of` over all combinations, with the name of the combination.
    pub(super) fn worst<T: PartialOrd + Copy>(
        &self,
        of: impl Fn(&Observed, &Solved) -> Option<T>,
    ) -> Option<(T, &'a str)> {
        let mut worst: Option<(T, &str)> = None;
        for (seen, solved) in self.combinations() {
            if let Some(value) = of(seen, &solved)
                && worst.is_none_or(|(known, _)| value > known)
            {
                worst = Some((value, solved.combination));
            }
        }
        worst
    }

    fn greatest_compression(&self) -> Option<(Force, &str)> {
        self.worst(|_, solved| {
            let pushed = -solved.member.force_min;
            (pushed > solved.zero.force).then_some(pushed)
        })
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
                for solved in self.results() {
                    let name = solved.combination;
                    let result = &solved.member.segments[which];
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

    /// Temperatures outside the range for which a material's values hold: of each material the
    /// worst, with its place.
    fn temperature(&self) -> Vec<Remark> {
        let mut worst: BTreeMap<usize, Outside> = BTreeMap::new();
        let Some(datum) = self.member.datum else {
            return Vec::new();
        };
        for (seen, _) in self.combinations() {
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
}
