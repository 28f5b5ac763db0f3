//! The text of a job as a tree of TOML values, each key and value with its place.
//!
//! Nearly every job is read the [direct](direct()) way: what the parser of `toml` sees goes straight into
//! the tree. As soon as a text is at fault, or merely unusual, `toml` reads the whole of it into its
//! own table, and the tree is [made of that](recovered()): it knows all faults of a text, and what
//! can be read of it all the same. Both ways make the same tree of the same text.

mod direct;
mod recovered;
#[cfg(test)]
pub(super) mod tests;

use crate::model::Place;
use std::borrow::Cow;
use std::collections::HashMap;
use std::fmt;
use toml::value::Datetime;

pub(super) use direct::direct;
pub(super) use recovered::recovered;

/// A value with its place: a table's is its header, or all of an inline one.
#[derive(Debug, Clone)]
pub(crate) struct Value<'t> {
    content: Content<'t>,
    place: Place,
}

/// What a value is.
#[derive(Debug, Clone)]
pub(crate) enum Content<'t> {
    /// A text without its quotes and escapes.
    String(Cow<'t, str>),
    /// A bare number, whole or not; infinite or NaN where it is written so, or cannot be held.
    Number(f64),
    Boolean(bool),
    Datetime(Datetime),
    Array(Vec<Value<'t>>),
    Table(Table<'t>),
}

/// The entries of a table in the order of the text; no key stands twice.
#[derive(Clone, Default)]
pub(crate) struct Table<'t> {
    entries: Vec<Entry<'t>>,
    /// Where each key stands among the entries, in a table of many.
    positions: Option<Box<Positions<'t>>>,
}

type Positions<'t> = HashMap<Cow<'t, str>, usize>;

/// In a table of fewer entries than this a key is found by looking through them.
const MANY: usize = 64;

/// One key of a table and its value.
#[derive(Debug, Clone)]
struct Entry<'t> {
    key: Key<'t>,
    value: Value<'t>,
}

/// A key with its place.
#[derive(Debug, Clone)]
pub(crate) struct Key<'t> {
    name: Cow<'t, str>,
    place: Place,
}

impl fmt::Debug for Table<'_> {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        f.debug_list().entries(&self.entries).finish()
    }
}

impl<'t> Value<'t> {
    /// What the value is.
    pub(crate) fn get_ref(&self) -> &Content<'t> {
        &self.content
    }

    /// Where the value stands.
    pub(crate) fn span(&self) -> Place {
        self.place.clone()
    }
}

impl Key<'_> {
    /// The key without its quotes and escapes.
    pub(crate) fn get_ref(&self) -> &str {
        &self.name
    }

    /// Where the key stands.
    pub(crate) fn span(&self) -> Place {
        self.place.clone()
    }
}

impl<'t> Content<'t> {
    /// This as a table, where it is one.
    pub(crate) fn as_table(&self) -> Option<&Table<'t>> {
        match self {
            Content::Table(table) => Some(table),
            _ => None,
        }
    }

    /// Whether this is a table.
    pub(crate) fn is_table(&self) -> bool {
        matches!(self, Content::Table(_))
    }

    /// Whether this is a list.
    pub(crate) fn is_array(&self) -> bool {
        matches!(self, Content::Array(_))
    }
}

impl<'t> Table<'t> {
    /// The table of these entries; none where many are given and a key stands twice among them.
    fn of(entries: Vec<Entry<'t>>) -> Option<Self> {
        if entries.len() < MANY {
            let positions = None;
            return Some(Table { entries, positions });
        }
        let names = entries.iter().map(|entry| entry.key.name.clone());
        let positions: Positions = names.zip(0..).collect();
        let differ = positions.len() == entries.len();
        differ.then(|| Table {
            entries,
            positions: Some(Box::new(positions)),
        })
    }

    /// Adds an entry whose key is not there.
    fn push(&mut self, entry: Entry<'t>) {
        if let Some(positions) = &mut self.positions {
            positions.insert(entry.key.name.clone(), self.entries.len());
        }
        self.entries.push(entry);
        if self.positions.is_none() && self.entries.len() == MANY {
            let names = self.entries.iter().map(|entry| entry.key.name.clone());
            self.positions = Some(Box::new(names.zip(0..).collect()));
        }
    }

    /// Where a key stands among the entries.
    fn position(&self, name: &str) -> Option<usize> {
        match &self.positions {
            Some(positions) => positions.get(name).copied(),
            None => position(&self.entries, name),
        }
    }

    /// The value of a key.
    pub(crate) fn get(&self, key: &str) -> Option<&Value<'t>> {
        self.get_key_value(key).map(|(_, value)| value)
    }

    /// A key and its value.
    pub(crate) fn get_key_value(&self, key: &str) -> Option<(&Key<'t>, &Value<'t>)> {
        let entry = &self.entries[self.position(key)?];
        Some((&entry.key, &entry.value))
    }

    /// Whether a key is there.
    pub(crate) fn contains_key(&self, key: &str) -> bool {
        self.get(key).is_some()
    }

    /// The keys, in the order of the text.
    pub(crate) fn keys(&self) -> impl Iterator<Item = &Key<'t>> {
        self.iter().map(|(key, _)| key)
    }

    /// The keys and their values, in the order of the text.
    pub(crate) fn iter(&self) -> impl ExactSizeIterator<Item = (&Key<'t>, &Value<'t>)> {
        self.entries.iter().map(|entry| (&entry.key, &entry.value))
    }

    /// How many keys there are.
    pub(crate) fn len(&self) -> usize {
        self.entries.len()
    }

    /// Whether there are none.
    pub(crate) fn is_empty(&self) -> bool {
        self.entries.is_empty()
    }
}

/// Where a key stands among others; one that was written of late is found first.
fn position(entries: &[Entry<'_>], name: &str) -> Option<usize> {
    entries.iter().rposition(|entry| entry.key.name == name)
}

/// A whole number by its digits, without a sign where the radix is not 10.
fn whole(digits: &str, radix: u32) -> f64 {
    let number = if radix == 10 {
        digits.parse().ok()
    } else {
        let number = i64::from_str_radix(digits, radix);
        number.ok().map(|number| number as f64)
    };
    number.unwrap_or(f64::NAN)
}

/// A number with a point or an exponent, an infinite one, or NaN.
fn float(text: &str) -> f64 {
    text.parse().unwrap_or(f64::NAN)
}
