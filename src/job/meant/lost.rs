//! The members that combinations take out.

use super::Meaning;
use super::names::Root;
use crate::job::written::combination as written;
use crate::job::written::{Entry, Written};
use std::collections::HashMap;

/// The members that a combination takes out.
pub(super) struct Lost {
    /// From all that it becomes, rising.
    pub(super) always: Vec<usize>,
    /// One from each, in the order written.
    pub(super) each: Vec<usize>,
}

impl Lost {
    /// `None` where a name is at fault.
    pub(super) fn of<'t>(
        combination: &written::Combination<'t>,
        meaning: &mut Meaning<'_, 't>,
    ) -> Option<Self> {
        let mut named: HashMap<usize, &str> = HashMap::new();
        let mut sound = true;
        let mut resolve = |names: &Entry<Vec<Written<&'t str>>>, key: &'static str| {
            let names = names.given().map_or(&[][..], |names| &names.value);
            let mut members = Vec::with_capacity(names.len());
            for name in names {
                let Some(member) = meaning.find(Root::Member, name) else {
                    sound = false;
                    continue;
                };
                if let Some(first) = named.insert(member, key) {
                    let message = if first == key {
                        format!("the member `{}` stands twice in `{key}`", name.value)
                    } else {
                        format!(
                            "the member `{}` stands in `{first}` and in `{key}`",
                            name.value
                        )
                    };
                    meaning.r.problems.say(&name.place, message, "take one out");
                    sound = false;
                }
                members.push(member);
            }
            members
        };
        let mut always = resolve(&combination.without, "without");
        let each = resolve(&combination.lose_each, "lose-each");
        always.sort_unstable();
        sound.then_some(Lost { always, each })
    }
}
