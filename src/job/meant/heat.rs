//! Weights and temperatures laid on layers, the narrowest of each case at each place.

use super::Meaning;
use super::actions::Laying;
use super::coverage::{Cells, Cover, On, narrowest};
use crate::catalogue::section::Along;
use crate::job::written::Written;
use crate::model::{Member, SegmentKind, Temperatures, Weight};
use crate::quantity::{TemperatureInterval, ThermodynamicTemperature, from_si};

/// What a load of a case says of temperature.
#[derive(Debug, Clone, Copy)]
pub(super) enum Heat {
    Change(Along<TemperatureInterval>),
    Reading(Along<ThermodynamicTemperature>),
}

impl Laying<'_, '_, '_> {
    /// Takes note of a temperature.
    pub(super) fn heat<T>(
        &mut self,
        case: usize,
        on: Option<On>,
        value: Heat,
        written: &Written<T>,
    ) {
        if let Some(on) = on {
            let place = written.place.clone();
            self.heats.push(Cover {
                case,
                on,
                value,
                place,
            });
        }
    }

    /// Weights, the narrowest at each place. What has neither density nor mass is reported.
    pub(super) fn lay_weights(&mut self, member: &Member, cells: &Cells) {
        let mut covers = std::mem::take(&mut self.weights);
        let mut laid = Vec::new();
        narrowest(
            &mut covers,
            cells,
            "weights",
            self.meaning,
            |cover, segment, layer, meaning| {
                if cover.value == 0.0 {
                    return;
                }
                let weighs = match &member.segments[segment].kind {
                    SegmentKind::Solid { layers, .. } => {
                        let layer = &layers[layer];
                        let material = &meaning.materials.used[layer.material];
                        if layer.mass.is_none() && material.density.is_none() {
                            let message = format!(
                                "weight needs the density of `{}`, which is not given",
                                material.id
                            );
                            let help = format!(
                                "add `density` in `[material.{}]`, or `mass` to the segment",
                                material.id
                            );
                            meaning.r.problems.say(&cover.place, message, help);
                        }
                        true
                    }
                    SegmentKind::Stiffness(part) => part.mass.is_some(),
                    SegmentKind::Gap(_) => false,
                };
                if weighs {
                    laid.push(Weight {
                        case: cover.case,
                        segment,
                        layer,
                        number: cover.value,
                    });
                }
            },
        );
        if !laid.is_empty() {
            self.slope();
        }
        self.actions.weights = laid;
    }

    /// Temperatures, the narrowest at each place, readings as their difference from the datum.
    pub(super) fn lay_heat(&mut self, member: &Member, cells: &Cells) {
        let mut covers = std::mem::take(&mut self.heats);
        let datum_is_wrong = self.datum_is_wrong();
        let length = self.outline.length().unwrap_or(1.0);
        let mut laid = Vec::new();
        let what = "temperatures";
        narrowest(
            &mut covers,
            cells,
            what,
            self.meaning,
            |cover, segment, layer, meaning| {
                let Some(change) = change_of(cover, member, datum_is_wrong, meaning) else {
                    return;
                };
                let part = match cover.on {
                    On::Case | On::Member => {
                        let segment = &member.segments[segment];
                        Along {
                            start: change.at(segment.from.value / length),
                            end: change.at(segment.to.value / length),
                        }
                    }
                    On::Segment(_) | On::Layer(..) => change,
                };
                if !expands(cover, member, segment, layer, &part, meaning) {
                    return;
                }
                laid.push(Temperatures {
                    case: cover.case,
                    segment,
                    layer,
                    start: part.start,
                    end: part.end,
                });
            },
        );
        self.actions.temperatures = laid;
    }

    fn datum_is_wrong(&self) -> bool {
        let heading = self.meaning.job.heading.as_ref();
        self.whole.datum.is_wrong() || heading.is_some_and(|heading| heading.datum.is_wrong())
    }
}

/// The change that a cover means; a reading without a datum is reported.
fn change_of(
    cover: &Cover<Heat>,
    member: &Member,
    datum_is_wrong: bool,
    meaning: &mut Meaning<'_, '_>,
) -> Option<Along<TemperatureInterval>> {
    let reading = match cover.value {
        Heat::Change(change) => return Some(change),
        Heat::Reading(reading) => reading,
    };
    let Some(datum) = member.datum else {
        if !datum_is_wrong {
            let message = "a reading of temperature needs a datum";
            let help = "add `datum = \"10 degC\"` to `[job]`, the temperature at which lengths \
                        are as drawn, or write a `temperature-change`";
            meaning
                .r
                .problems
                .missing("datum", &cover.place, message, help);
        }
        return None;
    };
    Some(Along {
        start: from_si(reading.start.value - datum.value),
        end: from_si(reading.end.value - datum.value),
    })
}

/// Whether a layer answers a change of temperature; a material that does not say how much is
/// reported.
fn expands(
    cover: &Cover<Heat>,
    member: &Member,
    segment: usize,
    layer: usize,
    change: &Along<TemperatureInterval>,
    meaning: &mut Meaning<'_, '_>,
) -> bool {
    match &member.segments[segment].kind {
        SegmentKind::Solid { layers, .. } => {
            let material = &meaning.materials.used[layers[layer].material];
            let none = TemperatureInterval::default();
            if material.expansion.is_none() && !(change.start == none && change.end == none) {
                let message = format!(
                    "a temperature needs the expansion of `{}`, which is not given",
                    material.id
                );
                let help = format!("add `expansion` in `[material.{}]`", material.id);
                meaning.r.problems.say(&cover.place, message, help);
            }
            true
        }
        SegmentKind::Stiffness(part) => part.expansion.is_some(),
        SegmentKind::Gap(_) => false,
    }
}
