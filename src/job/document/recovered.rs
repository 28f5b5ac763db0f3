//! The tree of a table that `toml` has read.

use super::{Content, Entry, Key, Table, Value};
use toml::Spanned;
use toml::de::{DeArray, DeTable, DeValue};

/// The tree of a table that `toml` has read, or recovered from a text with faults.
pub(in crate::job) fn recovered<'t>(table: DeTable<'t>) -> Table<'t> {
    let mut entries: Vec<Entry<'t>> = table
        .into_iter()
        .map(|(key, value)| Entry {
            key: Key {
                place: key.span(),
                name: key.into_inner(),
            },
            value: self::value(value),
        })
        .collect();
    entries.sort_by_key(|entry| entry.key.place.start);
    let positions = None;
    Table { entries, positions }
}

fn value<'t>(value: Spanned<DeValue<'t>>) -> Value<'t> {
    let place = value.span();
    let content = match value.into_inner() {
        DeValue::String(text) => Content::String(text),
        DeValue::Integer(integer) => {
            Content::Number(super::whole(integer.as_str(), integer.radix()))
        }
        DeValue::Float(float) => Content::Number(super::float(float.as_str())),
        DeValue::Boolean(boolean) => Content::Boolean(boolean),
        DeValue::Datetime(datetime) => Content::Datetime(datetime),
        DeValue::Array(values) => Content::Array(array(values)),
        DeValue::Table(table) => Content::Table(recovered(table)),
    };
    Value { content, place }
}

fn array<'t>(values: DeArray<'t>) -> Vec<Value<'t>> {
    values.into_iter().map(value).collect()
}
