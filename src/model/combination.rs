//! Load cases and their combinations.

use super::{Name, Place};

/// A load case: actions that come and go together.
#[derive(Debug, Clone, PartialEq)]
pub struct Case {
    /// Its name; empty in a job without cases.
    pub name: Name,
    /// Acts with factor 1 in every combination.
    pub always: bool,
    /// Its table.
    pub place: Place,
}

/// What a combination is for, and so which limits read it.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, serde::Serialize, serde::Deserialize)]
#[serde(rename_all = "lowercase")]
pub enum Purpose {
    /// Limits of movement, gap, rotation and slack.
    Service,
    /// Limits of stress, force, reaction and buckling.
    Strength,
}

/// One set of factors, solved by itself.
#[derive(Debug, Clone, PartialEq)]
pub struct Combination {
    /// Its name with the choices of its lists: `service/live=0`.
    pub name: Name,
    /// The name as written, without choices: what `in` of a limit may say for all of them.
    pub family: Name,
    /// What it is for; `None` is for everything.
    pub purpose: Option<Purpose>,
    /// The factor of every case of the model, 0 for one not named and 1 for an `always` case.
    pub factors: Vec<f64>,
    /// The cases that it names, and the `always` ones: what reports show of `factors`.
    pub shown: Vec<usize>,
    /// The factor on the modulus of every material of the model, 1 where none is written; empty
    /// when there is none at all.
    pub modulus: Vec<f64>,
    /// The members that are taken out, by their indices, rising.
    pub without: Vec<usize>,
    /// Its table, or the head of the file for the one called `all`.
    pub place: Place,
}

impl Combination {
    /// The factor on the modulus of the material with this index.
    pub fn modulus_factor(&self, material: usize) -> f64 {
        self.modulus.get(material).copied().unwrap_or(1.0)
    }

    /// Where the result of a member stands among those of this combination, which leaves out what
    /// it takes out.
    pub fn position(&self, member: usize) -> Option<usize> {
        match self.without.binary_search(&member) {
            Ok(_) => None,
            Err(before) => Some(member - before),
        }
    }
}
