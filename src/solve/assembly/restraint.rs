//! How much force a free change of length can make, for what counts as zero.

use super::parts::{Building, Joint};
use super::unknowns::Unknowns;
use crate::quantity::{Flexibility, ForcePerLength, Ratio, from_si};

/// How stiffly the parts at each end of a part, itself apart, could at the most answer a change of
/// its length. With it the sizes of forces that come from free changes of length are those that
/// can arise: a stiff part among soft ones makes little force, however stiff it is.
pub(super) struct Restraint<'a> {
    unknowns: &'a Unknowns,
    /// Σ stiffness of elastic parts at each point that moves freely, body, and station.
    soft: Vec<ForcePerLength>,
    /// Whether something rigid stands there as well.
    rigid: Vec<bool>,
    /// The largest displacement per force among the parts.
    pub(super) softest: Flexibility,
}

impl<'a> Restraint<'a> {
    pub(super) fn of(building: &Building<'a>) -> Self {
        // The first unknown of what carries an end names it.
        let count = building.system.places.len();
        let mut restraint = Restraint {
            unknowns: building.unknowns,
            soft: vec![ForcePerLength::default(); count],
            rigid: vec![false; count],
            softest: Default::default(),
        };
        let system = &building.system;
        let elastic = system.elastic.iter().map(|part| Some(part.stiffness));
        let one_way = system.one_way.iter().map(|part| part.stiffness);
        let rigid = building.rigid.iter().map(|_| None);
        let ends = building.elastic.iter().chain(&building.one_way);
        for (stiffness, ends) in elastic
            .chain(one_way)
            .chain(rigid)
            .zip(ends.chain(&building.rigid))
        {
            restraint.add(stiffness, ends);
        }
        restraint
    }

    fn add(&mut self, stiffness: Option<ForcePerLength>, ends: &[Joint; 2]) {
        for end in ends {
            if let Some(at) = self.first_unknown(end) {
                match stiffness {
                    Some(stiffness) => self.soft[at] += stiffness,
                    None => self.rigid[at] = true,
                }
            }
        }
        if let Some(stiffness) = stiffness {
            let one: Ratio = from_si(1.0);
            let flexibility: Flexibility = one / stiffness;
            self.softest = self.softest.max(flexibility);
        }
    }

    fn first_unknown(&self, end: &Joint) -> Option<usize> {
        match end {
            Joint::Point(point) => Some(self.unknowns.carrier(*point)),
            Joint::Station(unknown) => Some(*unknown),
            Joint::Ground => None,
        }
    }

    /// The stiffness of a part in series with what is around its ends. A rigid part has no own, and
    /// what else is rigid beside it is left out: that may only make it impossible.
    pub(super) fn around(
        &self,
        stiffness: Option<ForcePerLength>,
        ends: &[Joint; 2],
    ) -> ForcePerLength {
        let mut flexibility = stiffness.map_or(0.0, |stiffness| 1.0 / stiffness.value);
        for end in ends {
            let Some(at) = self.first_unknown(end) else {
                continue;
            };
            match stiffness {
                Some(_) if self.rigid[at] => {}
                Some(own) => {
                    let others = (self.soft[at] - own).value.max(0.0);
                    flexibility += 1.0 / others;
                }
                None => flexibility += 1.0 / self.soft[at].value,
            }
        }
        if flexibility > 0.0 {
            from_si(1.0 / flexibility)
        } else {
            ForcePerLength::default()
        }
    }
}
