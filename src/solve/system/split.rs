//! Forces that nothing decides: rigid parts that could pull against each other.

use super::held::{Held, Part, Settled, self_stresses};
use super::prepared::Prepared;
use super::{Elastic, Loads, OneWay, System};
use crate::quantity::from_si;
use crate::solve::threshold::Threshold;

/// Parts whose force nothing decides, in order.
#[derive(Debug, Default)]
pub(super) struct Split {
    pub(super) undecided_rigid: Vec<usize>,
    pub(super) undecided_one_way: Vec<usize>,
}

/// Gives rigid parts that depend on each other the split of least size in which no one-way part
/// pushes; one-way parts that touch take their share in it. Forces and states are changed to it.
pub(super) fn split(
    system: &System,
    held: &Held,
    clearance: &[f64],
    settled: &mut Settled,
    acts: &mut [bool],
    loads: &Loads,
) -> Split {
    let touches = |part: &usize| {
        system.one_way[*part].stiffness.is_none() && !acts[*part] && clearance[*part] == 0.0
    };
    let touching: Vec<usize> = (0..system.one_way.len()).filter(touches).collect();
    let stresses = if touching.is_empty() {
        held.self_stresses()
    } else {
        let touching = touching.into_iter().map(Part::OneWay);
        self_stresses(
            system,
            held.rigid().iter().copied().chain(touching).collect(),
        )
    };
    if stresses.is_empty() {
        return Split::default();
    }
    let zero = loads.zero.force;
    share(settled, &stresses, loads);
    for (part, acts) in acts.iter_mut().enumerate() {
        if system.one_way[part].stiffness.is_none() {
            *acts = settled.one_way[part] > zero.value;
        }
    }
    let rigid = (0..system.rigid.len()).map(Part::Rigid);
    let one_way = (0..acts.len())
        .filter(|&part| acts[part] && system.one_way[part].stiffness.is_none())
        .map(Part::OneWay);
    let mut undecided = Split::default();
    for (part, _) in self_stresses(system, rigid.chain(one_way).collect())
        .into_iter()
        .flatten()
    {
        match part {
            Part::Rigid(index) => undecided.undecided_rigid.push(index),
            Part::OneWay(index) => undecided.undecided_one_way.push(index),
            Part::Elastic(_) => {}
        }
    }
    for list in [
        &mut undecided.undecided_rigid,
        &mut undecided.undecided_one_way,
    ] {
        list.sort_unstable();
        list.dedup();
    }
    undecided
}

/// Adds the self-stresses in the amounts that leave the sum of squares of the forces least.
fn share(settled: &mut Settled, stresses: &[Vec<(Part, f64)>], loads: &Loads) {
    let mut terms: Vec<(Part, usize, f64)> = Vec::new();
    for (index, stress) in stresses.iter().enumerate() {
        terms.extend(stress.iter().map(|&(part, force)| (part, index, force)));
    }
    terms.sort_by_key(|&(part, index, _)| (part, index));
    let zero = loads.zero.force.value;
    let mut amounts = System {
        places: vec![[0.0; 3]; stresses.len()],
        ..System::default()
    };
    let mut given = Loads {
        forces: vec![from_si(0.0); stresses.len()],
        zero: Threshold {
            force: from_si(zero),
            length: from_si(zero),
        },
        ..Loads::default()
    };
    for of_part in terms.chunk_by(|a, b| a.0 == b.0) {
        let part = of_part[0].0;
        let now = *settled.force(part);
        amounts.elastic.push(Elastic {
            row: of_part
                .iter()
                .map(|&(_, index, force)| (index, force))
                .collect(),
            stiffness: from_si(1.0),
        });
        given.elastic_rest.push(from_si(-now));
        if let Part::OneWay(_) = part {
            amounts.one_way.push(OneWay {
                row: of_part
                    .iter()
                    .map(|&(_, index, force)| (index, -force))
                    .collect(),
                stiffness: None,
            });
            given.one_way_rest.push(from_si(now));
        }
    }
    // The forces as they stand keep every sign, so that there is an answer.
    let Ok(standing) = Prepared::of(amounts).stand(&given) else {
        return;
    };
    for &(part, index, force) in &terms {
        *settled.force(part) += force * standing.settled.displacements[index].value();
    }
}
