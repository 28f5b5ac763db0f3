//! Motions that nothing resists and nothing pushes.

use super::motion::Motion;
use super::parts::{OneSided, Parts};
use super::unknowns::Unknowns;
use crate::model::{Assembly, Model};
use crate::solve::system::{self, Row};
use std::collections::BTreeMap;

/// A motion that nothing resists and nothing pushes.
#[derive(Debug, Clone, PartialEq)]
pub struct FreeMotion {
    /// What moves how.
    pub motion: Motion,
    /// What touches without force and so blocks it one way: `H4`, `kerb`. Where there is any, the
    /// assembly is on the point of tipping.
    pub touching: Vec<crate::model::Name>,
}

/// So many are brought to terms that read easily; more are left as they were found.
const FEW: usize = 64;

/// A motion of the unknowns in terms of the assembly.
pub(super) fn motion(
    model: &Model,
    assembly: &Assembly,
    unknowns: &Unknowns,
    parts: &Parts,
    row: &Row,
) -> Motion {
    let member_of = |unknown: usize| {
        let mut beyond = unknown - unknowns.count;
        let tie = parts.ties.iter().find(|tie| {
            let stations = tie.spans.len() - 1;
            let inside = beyond < stations;
            beyond = beyond.saturating_sub(stations);
            inside
        });
        tie.map_or(model.members.len().saturating_sub(1), |tie| tie.member)
    };
    Motion::of(assembly, unknowns, row, member_of)
}

/// All free motions: those that may go both ways as simple as they can be, then those that
/// something blocks one way.
pub(super) fn motions(
    model: &Model,
    assembly: &Assembly,
    unknowns: &Unknowns,
    parts: &Parts,
    free: &[system::FreeMotion],
) -> Vec<FreeMotion> {
    if free.is_empty() {
        return Vec::new();
    }
    let name = |&part: &usize| match parts.one_way[part] {
        OneSided::Stop(held) => assembly.holds[parts.held[held].hold].name.clone(),
        OneSided::Member(member) => model.members[member].name.clone(),
    };
    let both_ways = free.iter().filter(|each| each.touching.is_empty());
    let rows = simplified(both_ways.map(|each| &each.motion));
    let loose = rows.iter().map(|row| FreeMotion {
        motion: motion(model, assembly, unknowns, parts, row),
        touching: Vec::new(),
    });
    let tipping = free.iter().filter(|each| !each.touching.is_empty());
    let tipping = tipping.map(|each| FreeMotion {
        motion: motion(model, assembly, unknowns, parts, &each.motion),
        touching: each.touching.iter().map(name).collect(),
    });
    loose.chain(tipping).collect()
}

/// Motions that together are the same, each with an unknown of its own, the first ones first: a
/// body that may move any way moves along x, along y, and turns.
fn simplified<'a>(motions: impl Iterator<Item = &'a Row>) -> Vec<Row> {
    let mut rows: Vec<BTreeMap<usize, f64>> =
        motions.map(|row| row.iter().copied().collect()).collect();
    if rows.len() > 1 && rows.len() <= FEW {
        let mut columns: Vec<usize> = rows.iter().flat_map(|row| row.keys().copied()).collect();
        columns.sort_unstable();
        columns.dedup();
        let mut done = 0;
        for column in columns {
            let entry = |row: &BTreeMap<usize, f64>| row.get(&column).copied().unwrap_or(0.0);
            let largest = (done..rows.len())
                .max_by(|&a, &b| entry(&rows[a]).abs().total_cmp(&entry(&rows[b]).abs()));
            let Some(pivot) = largest.filter(|&row| entry(&rows[row]).abs() > PIVOT) else {
                continue;
            };
            rows.swap(done, pivot);
            let leading = rows[done].clone();
            let by = entry(&leading);
            for (at, row) in rows.iter_mut().enumerate() {
                let share = entry(row) / by;
                if at != done && share != 0.0 {
                    for (&unknown, &value) in &leading {
                        *row.entry(unknown).or_default() -= share * value;
                    }
                    row.retain(|_, value| value.abs() > ROUNDING);
                }
            }
            done += 1;
        }
    }
    let scaled = |row: BTreeMap<usize, f64>| {
        let largest = row
            .values()
            .fold(0.0_f64, |most, value| most.max(value.abs()));
        row.into_iter()
            .map(|(unknown, value)| (unknown, value / largest))
            .collect()
    };
    rows.into_iter()
        .filter(|row| !row.is_empty())
        .map(scaled)
        .collect()
}

/// A share below this is no way to tell motions apart by.
const PIVOT: f64 = 1e-3;

/// A share below this is rounding.
const ROUNDING: f64 = 1e-9;
