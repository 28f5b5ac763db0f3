//! `[point]`: where members, bodies and holds meet.

use super::entries::{Entries, entries};
use crate::job::written::Reader;
use crate::job::written::fields::{Value, Written};
use crate::quantity::Length;

/// A point as written.
#[derive(Debug)]
pub(crate) struct Point<'t> {
    pub(crate) name: Written<&'t str>,
    /// Its coordinates; `None` where they are at fault.
    pub(crate) at: Option<Written<Entries<Length>>>,
}

impl<'t> Point<'t> {
    /// Even of a value at fault a point comes out: its name stands.
    pub(super) fn read(name: Written<&'t str>, value: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let at = entries(value, r).map(|at| Written {
            value: at,
            place: value.span(),
        });
        Point { name, at }
    }
}
