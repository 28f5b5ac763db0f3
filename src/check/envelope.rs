//! The range of every result over all combinations.

use super::Observed;
use crate::model::{Assembly, Hold, Model};
use crate::quantity::Force;
use crate::result::{CombinationResult, Envelope, MemberResult, Rotation, Unit};

const AXES: [&str; 3] = ["x", "y", "z"];

/// The member's elongation and force, every reaction and gap, the displacement of every point, the
/// rotation of every body and every watch: one row each by its address, with the combinations that
/// the largest and the least come from. A combination that takes a member out has no part in the
/// member's rows.
pub fn envelope(model: &Model, observed: &[Observed]) -> Vec<Envelope> {
    let mut rows = Rows {
        observed,
        rows: Vec::new(),
    };
    if observed.is_empty() {
        return rows.rows;
    }
    for member in 0..model.members.len() {
        rows.member(model, member);
    }
    if let Some(assembly) = &model.assembly {
        rows.points(assembly);
        rows.holds(assembly);
        rows.bodies(assembly);
    }
    for (at, watch) in model.watches.iter().enumerate() {
        let unit = if watch.of.is_rotation() {
            Unit::Radian
        } else {
            Unit::Metre
        };
        let value = |result: &CombinationResult| result.watches.get(at)?.value;
        rows.add(&[&watch.name, "value"], unit, value);
    }
    rows.rows
}

struct Rows<'a> {
    observed: &'a [Observed<'a>],
    rows: Vec<Envelope>,
}

impl Rows<'_> {
    fn member(&mut self, model: &Model, member: usize) {
        let observed = self.observed;
        let mut results = observed
            .iter()
            .filter_map(|seen| seen.member(model, member));
        let Some((first, _)) = results.next() else {
            return;
        };
        let mut add = |part: Option<&str>,
                       quantity: &str,
                       unit: Unit,
                       of: &dyn Fn(&MemberResult) -> Option<f64>| {
            let value = |seen: &Observed| of(seen.member(model, member)?.0);
            let address = match part {
                Some(part) => address(&[&first.name, part, quantity]),
                None => address(&[&first.name, quantity]),
            };
            self.rows.push(range(address, unit, observed, value));
        };
        add(None, "elongation", Unit::Metre, &|m| {
            Some(m.elongation.value)
        });
        add(None, "force_max", Unit::Newton, &|m| {
            Some(m.force_max.value)
        });
        add(None, "force_min", Unit::Newton, &|m| {
            Some(m.force_min.value)
        });
        for (at, segment) in first.segments.iter().enumerate() {
            if segment.gap.is_some() {
                add(Some(&segment.name), "gap", Unit::Metre, &|m| {
                    m.segments[at].gap.map(|gap| gap.value)
                });
            }
        }
        for (at, support) in first.supports.iter().enumerate() {
            add(Some(&support.name), "reaction", Unit::Newton, &|m| {
                m.supports[at].reaction.map(|reaction| reaction.value)
            });
            if support.gap.is_some() {
                add(Some(&support.name), "gap", Unit::Metre, &|m| {
                    m.supports[at].gap.map(|gap| gap.value)
                });
            }
        }
    }

    fn points(&mut self, assembly: &Assembly) {
        let mut answered = vec![[false; 3]; assembly.points.len()];
        for hold in &assembly.holds {
            for &point in &hold.points {
                for (axis, answered) in answered[point].iter_mut().enumerate() {
                    *answered |= answers(hold, axis);
                }
            }
        }
        for (at, point) in assembly.points.iter().enumerate() {
            for (axis, word) in coordinates(assembly) {
                let value = |result: &CombinationResult| {
                    let along = result.points.get(at)?.displacement.get(axis)?;
                    Some(along.value)
                };
                self.add(&[&point.name, "displacement", word], Unit::Metre, value);
            }
            for (axis, word) in coordinates(assembly).filter(|(axis, _)| answered[at][*axis]) {
                let value = |result: &CombinationResult| {
                    along(result.points.get(at)?.reaction.as_deref(), axis)
                };
                self.add(&[&point.name, "reaction", word], Unit::Newton, value);
            }
        }
    }

    fn holds(&mut self, assembly: &Assembly) {
        let mut row = 0;
        for hold in &assembly.holds {
            for &point in &hold.points {
                let point = &*assembly.points[point].name;
                let name: &[&str] = if hold.points.len() > 1 {
                    &[&hold.name, point]
                } else {
                    &[&hold.name]
                };
                for (axis, word) in coordinates(assembly).filter(|(axis, _)| answers(hold, *axis)) {
                    let value = |result: &CombinationResult| {
                        along(result.holds.get(row)?.reaction.as_deref(), axis)
                    };
                    self.add(&[name, &["reaction", word]].concat(), Unit::Newton, value);
                }
                if matches!(hold.kind, crate::model::HoldKind::Stop { .. }) {
                    let value =
                        |result: &CombinationResult| Some(result.holds.get(row)?.gap?.value);
                    self.add(&[name, &["gap"]].concat(), Unit::Metre, value);
                }
                row += 1;
            }
        }
    }

    fn bodies(&mut self, assembly: &Assembly) {
        for (at, body) in assembly.bodies.iter().enumerate() {
            if assembly.coordinates < 3 {
                let value = |result: &CombinationResult| match result.bodies.get(at)?.rotation {
                    Rotation::InPlane(angle) => Some(angle.value),
                    Rotation::Spatial(_) => None,
                };
                self.add(&[&body.name, "rotation"], Unit::Radian, value);
                continue;
            }
            for (axis, word) in coordinates(assembly) {
                let value = |result: &CombinationResult| {
                    Some(result.bodies.get(at)?.rotation.spatial()[axis].value)
                };
                self.add(&[&body.name, "rotation", word], Unit::Radian, value);
            }
        }
    }

    fn add(&mut self, words: &[&str], unit: Unit, of: impl Fn(&CombinationResult) -> Option<f64>) {
        let value = |seen: &Observed| of(seen.result);
        self.rows
            .push(range(address(words), unit, self.observed, value));
    }
}

/// The coordinates of the job with their words.
fn coordinates(assembly: &Assembly) -> impl Iterator<Item = (usize, &'static str)> {
    AXES.into_iter().enumerate().take(assembly.coordinates)
}

/// Whether a hold can put a force along a coordinate.
fn answers(hold: &Hold, axis: usize) -> bool {
    hold.kind
        .directions()
        .iter()
        .any(|along| along[axis] != 0.0)
}

fn along(reaction: Option<&[Force]>, axis: usize) -> Option<f64> {
    Some(reaction?.get(axis)?.value)
}

/// Names joined by the dots of an address.
fn address(words: &[&str]) -> String {
    words.join(".")
}

fn range(
    result: String,
    unit: Unit,
    observed: &[Observed],
    of: impl Fn(&Observed) -> Option<f64>,
) -> Envelope {
    let mut most: Option<(f64, usize)> = None;
    let mut least: Option<(f64, usize)> = None;
    for (index, seen) in observed.iter().enumerate() {
        let Some(value) = of(seen) else {
            continue;
        };
        if most.is_none_or(|(known, _)| value > known) {
            most = Some((value, index));
        }
        if least.is_none_or(|(known, _)| value < known) {
            least = Some((value, index));
        }
    }
    let name =
        |found: Option<(f64, usize)>| found.map(|(_, index)| observed[index].result.name.clone());
    Envelope {
        result,
        unit,
        max: most.map(|(value, _)| value),
        max_in: name(most),
        min: least.map(|(value, _)| value),
        min_in: name(least),
    }
}
