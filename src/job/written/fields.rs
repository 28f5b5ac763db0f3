//! Reading one table key by key.

use super::Reader;
use super::later::later;
use crate::job::nearest::{nearest, remedy};
use crate::model::Place;
use toml::Spanned;
use toml::de::{DeArray, DeTable, DeValue};

/// A value with its place.
pub(crate) type Value<'t> = Spanned<DeValue<'t>>;

/// What a kind of table is called in messages, and the keys that it may have.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Keys {
    /// `segment`, `case`, `limit of a support`.
    pub(crate) table: &'static str,
    /// Every key that its reader asks for.
    pub(crate) keys: &'static [&'static str],
}

/// Something that was read, with the place of its value.
#[derive(Debug, Clone, PartialEq)]
pub(crate) struct Written<T> {
    pub(crate) value: T,
    pub(crate) place: Place,
}

/// What stands under a key.
#[derive(Debug, Clone, PartialEq)]
pub(crate) enum Entry<T> {
    /// The key is not there.
    Absent,
    /// The value is at fault, which has been reported: nothing may be concluded from it.
    Wrong,
    /// The value.
    Given(Written<T>),
}

impl<T> Entry<T> {
    /// The value, where there is a sound one.
    pub(crate) fn given(&self) -> Option<&Written<T>> {
        match self {
            Entry::Given(written) => Some(written),
            _ => None,
        }
    }

    /// Whether the key is not there.
    pub(crate) fn is_absent(&self) -> bool {
        matches!(self, Entry::Absent)
    }

    /// Whether the key is there, with a sound value or without.
    pub(crate) fn is_written(&self) -> bool {
        !self.is_absent()
    }

    /// Whether the value was at fault.
    pub(crate) fn is_wrong(&self) -> bool {
        matches!(self, Entry::Wrong)
    }

    /// This where it is written, else the other.
    pub(crate) fn or<'e>(&'e self, other: &'e Self) -> &'e Self {
        if self.is_absent() { other } else { self }
    }
}

/// One table, asked key by key. What nobody asked for is a misspelling.
pub(crate) struct Fields<'t> {
    table: &'t DeTable<'t>,
    /// The table: its header, or all of an inline one.
    pub(crate) place: Place,
    known: Keys,
    found: usize,
}

impl<'t> Fields<'t> {
    /// The table that a value is.
    pub(crate) fn of(value: &'t Value<'t>, known: Keys, r: &mut Reader<'t>) -> Option<Self> {
        match value.get_ref() {
            DeValue::Table(table) => Some(Self::new(table, value.span(), known)),
            other => {
                let article = article(known.table);
                r.problems.say(
                    &value.span(),
                    format!(
                        "{article} {} is a table, not {}",
                        known.table,
                        kind_of(other)
                    ),
                    format!("{}; {}", shape(known.table), listed(known.keys)),
                );
                None
            }
        }
    }

    /// A table at a place.
    pub(crate) fn new(table: &'t DeTable<'t>, place: Place, known: Keys) -> Self {
        Fields {
            table,
            place,
            known,
            found: 0,
        }
    }

    /// The value of a key.
    pub(crate) fn get(&mut self, key: &'static str) -> Option<&'t Value<'t>> {
        debug_assert!(self.known.keys.contains(&key), "{key} is not listed");
        if self.found == self.table.len() {
            return None; // all that is there has been asked for, each key once
        }
        let value = self.table.get(key);
        self.found += usize::from(value.is_some());
        value
    }

    /// The value of a key, read.
    pub(crate) fn entry<T>(
        &mut self,
        key: &'static str,
        r: &mut Reader<'t>,
        read: impl FnOnce(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
    ) -> Entry<T> {
        match self.get(key) {
            None => Entry::Absent,
            Some(value) => match read(value, r) {
                None => Entry::Wrong,
                Some(read) => Entry::Given(Written {
                    value: read,
                    place: value.span(),
                }),
            },
        }
    }

    /// The value of a key that must be there; its absence is reported, and `Wrong`.
    pub(crate) fn required<T>(
        &mut self,
        key: &'static str,
        example: &str,
        r: &mut Reader<'t>,
        read: impl FnOnce(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
    ) -> Entry<T> {
        let entry = self.entry(key, r, read);
        if entry.is_absent() {
            self.lacks(key, example, r);
            return Entry::Wrong;
        }
        entry
    }

    /// Reports that a key is missing.
    pub(crate) fn lacks(&self, key: &'static str, example: &str, r: &mut Reader<'t>) {
        let article = article(self.known.table);
        r.problems.missing(
            key,
            &self.place,
            format!("{article} {} needs `{key}`", self.known.table),
            format!("add `{key} = {example}`"),
        );
    }

    /// Whether a key is there; does not count as asking for it.
    pub(crate) fn has(&self, key: &str) -> bool {
        self.table.contains_key(key)
    }

    /// Where a key stands.
    pub(crate) fn key_place(&self, key: &str) -> Option<Place> {
        self.table.get_key_value(key).map(|(key, _)| key.span())
    }

    /// Reports each key that nobody asks for.
    pub(crate) fn finish(self, r: &mut Reader<'t>) {
        if self.found == self.table.len() {
            return;
        }
        for key in self.table.keys() {
            let name = key.get_ref().as_ref();
            if self.known.keys.contains(&name) {
                continue;
            }
            unknown_key(name, &key.span(), &self.place, self.known, r);
        }
    }
}

/// Reports a key that a table does not have.
pub(crate) fn unknown_key(
    name: &str,
    place: &Place,
    table: &Place,
    known: Keys,
    r: &mut Reader<'_>,
) {
    let keys = || known.keys.iter().copied();
    if let Some((message, help)) = later(known.table, name) {
        let stem = name.strip_suffix("-at").unwrap_or(name);
        r.problems.misspelt(table, keys().find(|key| *key == stem));
        r.problems.say(place, message, help);
        return;
    }
    r.problems.misspelt(table, nearest(name, keys()));
    let article = article(known.table);
    let help = match (known.table, name) {
        ("section", "count" | "net" | "holes" | "material" | "length") => {
            Some(format!("write `{name}` beside `section`, not in it"))
        }
        _ => remedy(
            name,
            keys(),
            &format!("the keys of {article} {} are", known.table),
        ),
    };
    let message = format!("{article} {} has no key `{name}`", known.table);
    r.problems.say(place, message, help);
}

/// The entries of a table whose keys are names, in the order of the file.
pub(crate) fn in_order<'t>(table: &'t DeTable<'t>) -> Vec<(Written<&'t str>, &'t Value<'t>)> {
    let mut entries: Vec<_> = table
        .iter()
        .map(|(key, value)| {
            let name = Written {
                value: key.get_ref().as_ref(),
                place: key.span(),
            };
            (name, value)
        })
        .collect();
    entries.sort_by_key(|(name, _)| name.place.start);
    entries
}

/// A table under a key whose own keys are names: `[case]`, `[member]`, `factors`.
pub(crate) fn named<'t>(
    value: &'t Value<'t>,
    what: &str,
    help: &str,
    r: &mut Reader<'t>,
) -> Option<Vec<(Written<&'t str>, &'t Value<'t>)>> {
    match value.get_ref() {
        DeValue::Table(table) => Some(in_order(table)),
        other => {
            let message = format!("`{what}` is a table by name, not {}", kind_of(other));
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// The tables of a list.
pub(crate) fn list<'t>(
    value: &'t Value<'t>,
    what: &str,
    r: &mut Reader<'t>,
) -> Option<&'t DeArray<'t>> {
    match value.get_ref() {
        DeValue::Array(list) => Some(list),
        other => {
            let message = format!("`{what}` is a list of tables, not {}", kind_of(other));
            let help = format!("write `{what} = [{{ … }}]`, or a header `[[… .{what}]]` for each");
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}

/// What a value is, with its article.
pub(crate) fn kind_of(value: &DeValue<'_>) -> &'static str {
    match value {
        DeValue::String(_) => "a text",
        DeValue::Integer(_) | DeValue::Float(_) => "a bare number",
        DeValue::Boolean(_) => "true or false",
        DeValue::Datetime(_) => "a date",
        DeValue::Array(_) => "a list",
        DeValue::Table(_) => "a table",
    }
}

/// `a` or `an`, as the word that follows asks for.
pub(crate) fn article(word: &str) -> &'static str {
    if word == "h" || word.starts_with(['a', 'e', 'i', 'o', 'u']) {
        "an"
    } else {
        "a"
    }
}

/// How a table is written.
fn shape(table: &str) -> &'static str {
    match table {
        "section" => "write it as in `{ round = \"30 mm\" }`",
        "limit of a displacement" => "write it as in `{ at = \"end\", limit = \"2 mm\" }`",
        "limit of a gap" => "write it as in `{ min = \"3 mm\" }`",
        "load" => "write it as in `{ at = \"end\", force = \"62 kN\" }`",
        "support" => "write it as in `{ at = \"end\", spring = \"35 kN/mm\" }`",
        "hold" => "write it as in `{ point = \"a\", along = [\"y\"] }`",
        "load of the job" => "write it as in `{ point = \"a\", force = [\"0 kN\", \"-25 kN\"] }`",
        "watch" => "write it as in `{ point = \"a\", along = \"y\", limit = \"4 mm\" }`",
        _ => "write its keys in { } or under a header",
    }
}

fn listed(keys: &[&str]) -> String {
    let mut list = String::from("it may have");
    for (index, key) in keys.iter().enumerate() {
        list.push_str(if index == 0 { " `" } else { ", `" });
        list.push_str(key);
        list.push('`');
    }
    list
}
