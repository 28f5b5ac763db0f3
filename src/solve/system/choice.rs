//! Where free motions come to rest, and what blocks them one way.

use super::held::{Held, Settled, stretch};
use super::prepared::Prepared;
use super::singular::free_directions;
use super::twofold::Twofold;
use super::{Elastic, FreeMotion, Loads, OneWay, Row, System};
use crate::quantity::from_si;
use crate::solve::threshold::Threshold;

/// What a motion may stretch a row beside the sum of its terms and still leave it alone.
const LEFT_ALONE: f64 = 1e-10;

/// How much each motion stretches a row: pairs of a motion and its stretch.
pub(super) struct Couplings {
    /// By unknown: the motions that move it, with its share.
    movers: Vec<Vec<(usize, f64)>>,
    sums: Vec<(f64, f64)>,
}

impl Couplings {
    pub(super) fn of(system: &System, motions: &[Row]) -> Self {
        let mut movers = vec![Vec::new(); system.places.len()];
        for (index, motion) in motions.iter().enumerate() {
            for &(unknown, share) in motion {
                movers[unknown].push((index, share));
            }
        }
        Couplings {
            movers,
            sums: vec![(0.0, 0.0); motions.len()],
        }
    }

    pub(super) fn with(&mut self, row: &[(usize, f64)]) -> Row {
        let mut touched: Vec<usize> = Vec::new();
        for &(unknown, b) in row {
            for &(motion, share) in &self.movers[unknown] {
                if self.sums[motion].1 == 0.0 {
                    touched.push(motion);
                }
                self.sums[motion].0 += b * share;
                self.sums[motion].1 += (b * share).abs();
            }
        }
        touched.sort_unstable();
        touched.dedup();
        let mut coupling = Row::new();
        for motion in touched {
            let (sum, size) = std::mem::take(&mut self.sums[motion]);
            if sum.abs() > LEFT_ALONE * size {
                coupling.push((motion, sum));
            }
        }
        coupling
    }
}

/// Displacements with each free motion at the amount that leaves the squares of what is shown
/// least, within the clearances of the parts that are open; or such a part for which no amount
/// leaves room.
pub(super) fn amounts(
    system: &System,
    held: &Held,
    settled: &Settled,
    loads: &Loads,
) -> Result<Vec<Twofold>, usize> {
    let mut displacements = settled.displacements.clone();
    let mut couplings = Couplings::of(system, &held.motions);
    let place = |motion: &Row| {
        motion
            .first()
            .map_or([0.0; 3], |entry| system.places[entry.0])
    };
    let mut chosen = System {
        places: held.motions.iter().map(place).collect(),
        ..System::default()
    };
    let length = loads.zero.length;
    let mut given = Loads {
        forces: vec![from_si(0.0); held.motions.len()],
        zero: Threshold {
            force: from_si(length.value),
            length,
        },
        ..Loads::default()
    };
    let mut show = |row: Row, now: f64| {
        if !row.is_empty() {
            chosen.elastic.push(Elastic {
                row,
                stiffness: from_si(1.0),
            });
            given.elastic_rest.push(from_si(-now));
        }
    };
    if system.shown.is_empty() {
        for motion in 0..held.motions.len() {
            show(vec![(motion, 1.0)], 0.0);
        }
    }
    for row in &system.shown {
        show(couplings.with(row), stretch(row, &displacements).value());
    }
    let mut blocks = Vec::new();
    for (part, one_way) in system.one_way.iter().enumerate() {
        if held.acts[part] {
            continue;
        }
        let row = couplings.with(&one_way.row);
        if !row.is_empty() {
            let rest = loads.one_way_rest[part].value;
            let open = -stretch(&one_way.row, &displacements).plus(-rest).value();
            chosen.one_way.push(OneWay {
                row,
                stiffness: None,
            });
            given.one_way_rest.push(from_si(open));
            blocks.push(part);
        }
    }
    match Prepared::of(chosen).stand(&given) {
        Ok(standing) => {
            for (motion, amount) in held.motions.iter().zip(standing.settled.displacements) {
                for &(unknown, share) in motion {
                    displacements[unknown] = displacements[unknown].plus_product(share, amount);
                }
            }
            Ok(displacements)
        }
        // The amounts are squares summed, so they are never pushed: no room is left.
        Err(super::Failure::Contradiction { one_way, .. }) => {
            let of = one_way
                .first()
                .or(Some(&0))
                .and_then(|&first| blocks.get(first));
            Err(of.copied().unwrap_or(0))
        }
        Err(super::Failure::Pushed { .. } | super::Failure::Unsettled { .. }) => {
            Err(blocks.first().copied().unwrap_or(0))
        }
    }
}

/// The free motions as they are told: each with the parts that touch and so block it one way. A
/// motion that is blocked both ways is none.
pub(super) fn tipping(system: &System, held: &Held, clearance: &[f64]) -> Vec<FreeMotion> {
    let motions = &held.motions;
    let mut couplings = Couplings::of(system, motions);
    let (mut touching, mut rows) = (Vec::new(), Vec::new());
    for (part, one_way) in system.one_way.iter().enumerate() {
        if !held.acts[part] && clearance[part] == 0.0 {
            let row = couplings.with(&one_way.row);
            if !row.is_empty() {
                touching.push(part);
                rows.push(row);
            }
        }
    }
    let mut blocked = vec![false; motions.len()];
    for &(motion, _) in rows.iter().flatten() {
        blocked[motion] = true;
    }
    let untouched = |motion: &Row| FreeMotion {
        motion: motion.clone(),
        touching: Vec::new(),
    };
    let mut told: Vec<FreeMotion> = motions
        .iter()
        .zip(&blocked)
        .filter(|(_, blocked)| !**blocked)
        .map(|(motion, _)| untouched(motion))
        .collect();
    if rows.is_empty() {
        return told;
    }
    // Only the motions that are blocked are mixed with each other.
    let mixed: Vec<usize> = (0..motions.len())
        .filter(|&motion| blocked[motion])
        .collect();
    for row in &mut rows {
        for entry in row {
            entry.0 = mixed.partition_point(|&motion| motion < entry.0);
        }
    }
    let all = |amounts: &[f64]| {
        let mut sum = vec![0.0; system.places.len()];
        for (&amount, &motion) in amounts.iter().zip(&mixed) {
            for &(unknown, share) in &motions[motion] {
                sum[unknown] += amount * share;
            }
        }
        super::held::largest_to_one(&sum)
    };
    let stretches = |row: &Row, amounts: &[f64]| {
        let (sum, size) = row
            .iter()
            .fold((0.0, 0.0_f64), |(sum, size), &(motion, b)| {
                let term = b * amounts[motion];
                (sum + term, size + term.abs())
            });
        if sum.abs() > LEFT_ALONE * size {
            sum
        } else {
            0.0
        }
    };
    let rows_but = |left_out: Option<usize>| {
        let kept = rows.iter().enumerate();
        kept.filter(move |(index, _)| Some(*index) != left_out)
            .map(|(_, row)| row.as_slice())
    };
    let unblocked = free_directions(mixed.len(), rows_but(None)).motions;
    told.extend(unblocked.iter().map(|amounts| untouched(&all(amounts))));
    let rank = mixed.len() - unblocked.len();
    // Motions that leave one touching part and keep all others touching.
    let mut leaving = Vec::new();
    for (index, row) in rows.iter().enumerate() {
        for mut amounts in free_directions(mixed.len(), rows_but(Some(index))).motions {
            let away = stretches(row, &amounts);
            if away != 0.0 {
                amounts
                    .iter_mut()
                    .for_each(|amount| *amount *= -away.signum());
                leaving.push(FreeMotion {
                    motion: all(&amounts),
                    touching: vec![touching[index]],
                });
                break;
            }
        }
    }
    if leaving.len() == rank {
        told.extend(leaving);
        return told;
    }
    // More parts touch than motions are left: each motion is looked at by itself.
    for place in 0..mixed.len() {
        let mut amounts = vec![0.0; mixed.len()];
        amounts[place] = 1.0;
        let along: Vec<f64> = rows.iter().map(|row| stretches(row, &amounts)).collect();
        let (mut forward, mut backward) = (false, false);
        for &along in &along {
            forward |= along > 0.0;
            backward |= along < 0.0;
        }
        if forward != backward {
            if forward {
                amounts[place] = -1.0;
            }
            let touches = touching.iter().zip(&along);
            told.push(FreeMotion {
                motion: all(&amounts),
                touching: touches
                    .filter(|(_, along)| **along != 0.0)
                    .map(|(&part, _)| part)
                    .collect(),
            });
        }
    }
    told
}
