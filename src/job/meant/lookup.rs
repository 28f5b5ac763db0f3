//! Finding a name among many.

use std::borrow::Borrow;
use std::collections::HashMap;
use std::hash::Hash;

/// As many names are looked through one by one; more are hashed.
const FEW: usize = 16;

/// Names with their places in a list.
pub(super) struct Lookup<N> {
    names: Vec<N>,
    hashed: Option<HashMap<N, usize>>,
}

impl<N: Borrow<str> + Hash + Eq + Clone> Lookup<N> {
    /// Of two equal names the first counts.
    pub(super) fn new(names: Vec<N>) -> Self {
        let hashed = (names.len() > FEW).then(|| {
            let entries = names.iter().enumerate().rev();
            entries.map(|(index, name)| (name.clone(), index)).collect()
        });
        Lookup { names, hashed }
    }

    /// The index of a name.
    pub(super) fn find(&self, name: &str) -> Option<usize> {
        match &self.hashed {
            Some(hashed) => hashed.get(name).copied(),
            None => self.names.iter().position(|known| known.borrow() == name),
        }
    }

    /// All names, in order.
    pub(super) fn names(&self) -> &[N] {
        &self.names
    }

    /// All names as texts, for remedies.
    pub(super) fn texts(&self) -> impl Iterator<Item = &str> + Clone {
        self.names.iter().map(Borrow::borrow)
    }

    /// Every name that stands a second time, by its index.
    pub(super) fn repeated(&self) -> impl Iterator<Item = usize> {
        let is_repeated = |&index: &usize| {
            let first = self.names.get(index).map(|name| self.find(name.borrow()));
            first != Some(Some(index))
        };
        (0..self.names.len()).filter(is_repeated)
    }
}
