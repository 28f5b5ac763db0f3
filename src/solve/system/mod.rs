//! A linear elastic system with parts that act one way: from stiffness, loads and clearances to
//! displacements, forces and states.
//!
//! It knows neither points nor members: an assembly puts itself into unknowns (all of them lengths:
//! a rotation times a length of its body) and rows over them. Elastic parts answer with stiffness
//! times what is left of their stretch, rigid parts hold theirs to a value, one-way parts answer
//! only while stretched beyond their rest. The answer is the state of least potential energy, found
//! in finitely many steps, with free motions, undecided forces and contradictions told apart.

mod choice;
mod dense;
mod factor;
mod held;
mod lemke;
mod order;
mod prepared;
mod rigid;
mod singular;
mod sparse;
mod split;
mod tableau;
#[cfg(test)]
mod tests;
mod twofold;

pub(super) use prepared::Prepared;

use super::threshold::Threshold;
use crate::quantity::{Force, ForcePerLength, Length};

/// A direction over the unknowns: pairs of an unknown and its coefficient, each unknown once. The
/// stretch along it is the sum of coefficient times unknown.
pub(super) type Row = Vec<(usize, f64)>;

/// What does not change from one set of loads to the next.
#[derive(Debug, Clone, Default)]
pub(super) struct System {
    /// Where each unknown lies (m), for the order in which they are eliminated. One entry each.
    pub(super) places: Vec<[f64; 3]>,
    /// Parts that pull and push.
    pub(super) elastic: Vec<Elastic>,
    /// Parts that keep their stretch at a value.
    pub(super) rigid: Vec<Row>,
    /// Parts that only pull, once their stretch goes beyond their rest.
    pub(super) one_way: Vec<OneWay>,
    /// The displacements whose squares are least where a free motion may be chosen.
    pub(super) shown: Vec<Row>,
}

/// A part with force = stiffness × (stretch along its row − rest).
#[derive(Debug, Clone)]
pub(super) struct Elastic {
    pub(super) row: Row,
    /// More than 0.
    pub(super) stiffness: ForcePerLength,
}

/// A part with force = stiffness × (stretch along its row − rest) where that is positive, else 0.
#[derive(Debug, Clone)]
pub(super) struct OneWay {
    pub(super) row: Row,
    /// More than 0; rigid when `None`: its stretch never exceeds its rest.
    pub(super) stiffness: Option<ForcePerLength>,
}

/// What changes from one combination to the next.
#[derive(Debug, Clone, Default)]
pub(super) struct Loads {
    /// On every unknown, + along it.
    pub(super) forces: Vec<Force>,
    /// The stretch of every elastic part at which it carries nothing.
    pub(super) elastic_rest: Vec<Length>,
    /// The stretch that every rigid part keeps.
    pub(super) rigid_value: Vec<Length>,
    /// The stretch of every one-way part beyond which it pulls.
    pub(super) one_way_rest: Vec<Length>,
    /// What counts as zero.
    pub(super) zero: Threshold,
}

/// The state of least energy.
#[derive(Debug, Clone)]
pub(super) struct Answer {
    /// Every unknown, rounded.
    pub(super) displacements: Vec<Length>,
    /// The force in every elastic part, pulling positive; kept accurate where displacements are
    /// large beside the stretch.
    pub(super) elastic: Vec<Force>,
    /// The force in every rigid part, pulling positive: what it does to the system is this times
    /// its row, taken off. Of several that share a force in a way that nothing decides, the split
    /// of least size.
    pub(super) rigid: Vec<Force>,
    /// The force in every one-way part, 0 or more.
    pub(super) one_way: Vec<Force>,
    /// How far every one-way part is from acting, 0 or more; 0 where it acts.
    pub(super) clearance: Vec<Length>,
    /// Whether every one-way part acts. An exact touch does not.
    pub(super) acts: Vec<bool>,
    /// Motions that nothing resists and nothing pushes, as displacements of all unknowns; they were
    /// chosen such that the squares of what is shown are least, within the clearances.
    pub(super) free: Vec<FreeMotion>,
    /// Rigid parts whose force nothing decides.
    pub(super) undecided_rigid: Vec<usize>,
    /// One-way parts that are rigid and whose force nothing decides.
    pub(super) undecided_one_way: Vec<usize>,
    /// About how many times a rounding of the stiffness comes out larger in the displacements, when
    /// each unknown is measured by its own stiffness: over 10⁸ it is almost a mechanism.
    pub(super) condition: f64,
}

/// A motion that nothing resists in the state that was found.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct FreeMotion {
    /// The unknowns that move in it and their shares; the largest is 1 in size.
    pub(super) motion: Row,
    /// One-way parts that touch without force and so block it one way: the system is on the point
    /// of tipping.
    pub(super) touching: Vec<usize>,
}

/// Why there is no answer.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Failure {
    /// The loads do work on a motion that nothing resists.
    Pushed {
        /// The motion, along which the loads push: the unknowns that move in it and their shares; the
        /// largest is 1 in size.
        motion: Row,
        /// The work of the loads over that motion's size.
        force: Force,
    },
    /// These rigid parts cannot keep their values together.
    Contradiction {
        /// Indices of the rigid parts.
        rigid: Vec<usize>,
        /// Indices of the rigid one-way parts.
        one_way: Vec<usize>,
    },
}
