//! Which combinations a limit reads: `in`, `since`, or by its purpose.

use super::combinations::Combinations;
use super::limits::Laying;
use crate::job::nearest::remedy;
use crate::job::written::combination::purpose_named;
use crate::job::written::{Entry, Written};
use crate::model::{Name, Place, Purpose, Reads, Remark, Target};

/// What all limits of one table have in common.
pub(super) struct Common {
    /// The combinations that `in` names; by purpose where it is left out.
    pub(super) only: Option<Vec<usize>>,
    pub(super) since: Option<usize>,
    pub(super) source: Option<Name>,
}

impl<'t> Laying<'_, '_, 't> {
    /// What `in`, `since` and `source` of a limit say; `None` where one is at fault.
    pub(super) fn common(
        &mut self,
        names: &Entry<Vec<Written<&'t str>>>,
        since: &Entry<&'t str>,
        source: &Entry<&'t str>,
    ) -> Option<Common> {
        let Some(combinations) = self.combinations else {
            // They are at fault; what else is wrong with the limit is looked for all the same.
            return Some(Common {
                only: None,
                since: None,
                source: None,
            });
        };
        let mut sound = !(names.is_wrong() || since.is_wrong());
        let only = names.given().map(|names| {
            let mut only = Vec::new();
            for name in &names.value {
                let known = only.len();
                covered(name.value, combinations, &mut only);
                if only.len() == known && purpose_named(name.value).is_none() {
                    sound = false;
                    self.unknown(name, combinations, " nor a purpose");
                }
            }
            only.sort_unstable();
            only.dedup();
            only
        });
        let since = since.given().and_then(|since| {
            let index = self.one(since, combinations);
            sound &= index.is_some();
            index
        });
        sound.then(|| Common {
            only,
            since,
            source: source.given().map(|source| Name::from(source.value)),
        })
    }

    /// The one combination that `since` names.
    fn one(&mut self, since: &Written<&str>, combinations: &Combinations) -> Option<usize> {
        let mut all = combinations.all.iter();
        if let Some(index) = all.position(|combination| &*combination.name == since.value) {
            return Some(index);
        }
        let family = combinations
            .families
            .iter()
            .find(|(name, ..)| &**name == since.value);
        match family {
            Some((_, _, range)) if range.len() == 1 => Some(range.start),
            Some((_, _, range)) => {
                let message = format!(
                    "`{}` stands for {} combinations, and `since` takes one",
                    since.value,
                    range.len()
                );
                let first = &combinations.all[range.start].name;
                let help = format!("name one of them, such as \"{first}\"");
                self.meaning.r.problems.say(&since.place, message, help);
                None
            }
            None => {
                self.unknown(since, combinations, "");
                None
            }
        }
    }

    fn unknown(&mut self, name: &Written<&str>, combinations: &Combinations, nor: &str) {
        let message = format!("`{}` is no combination{nor}", name.value);
        let families = combinations.families.iter().map(|(name, ..)| &**name);
        let is_none = |purpose: &&str| families.clone().all(|family| family != *purpose);
        let purposes = ["service", "strength"].into_iter().filter(is_none);
        // A purpose is taken by `in` alone.
        let purposes = purposes.take(if nor.is_empty() { 0 } else { 2 });
        let names = families.clone().chain(purposes);
        let help = remedy(name.value, names, "write one of");
        let problems = &mut self.meaning.r.problems;
        problems.unknown("combination", &name.place, message, help);
    }

    /// A limit that no combination reads gets a caution, once for all that it holds.
    pub(super) fn caution_if_unread(
        &mut self,
        reads: &Reads,
        target: &Target,
        on: &Name,
        place: &Place,
    ) {
        let Some(combinations) = self.combinations else {
            return;
        };
        let is_read = match reads {
            Reads::Only(only) => !only.is_empty(),
            Reads::Purpose(wanted) => combinations
                .families
                .iter()
                .any(|(_, purpose, _)| purpose.is_none_or(|purpose| purpose == *wanted)),
        };
        if is_read || !self.unread.insert(place.start) {
            return;
        }
        let purpose = match reads {
            Reads::Only(_) => "that `in` names",
            Reads::Purpose(Purpose::Service) => "of the purpose \"service\"",
            Reads::Purpose(Purpose::Strength) => "of the purpose \"strength\"",
        };
        self.meaning.remarks.push(Remark {
            about: about(target, on),
            text: format!(
                "no combination reads this limit on `{on}`: there is none {purpose}, so it is \
                 not checked"
            ),
            place: Some(place.clone()),
            caution: true,
        });
    }
}

/// The table that a limit belongs to: `member.H4`, `hold.guide`, `hold.2`.
fn about(target: &Target, on: &str) -> String {
    let root = match target {
        Target::Hold { .. } => "hold",
        Target::Watch { .. } => "watch",
        _ => "member",
    };
    // What has no name of its own is called by its number, `hold.2`.
    let numbered = on.strip_prefix(root).and_then(|on| on.strip_prefix('.'));
    let name = numbered.unwrap_or(on).split('.').next().unwrap_or(on);
    format!("{root}.{name}")
}

/// Adds the combinations that a name of `in` covers: one, all of a family, or all of a purpose.
fn covered(name: &str, combinations: &Combinations, only: &mut Vec<usize>) {
    let purpose = purpose_named(name);
    for (family, of, range) in &combinations.families {
        if &**family == name || purpose.is_some() && (of.is_none() || *of == purpose) {
            only.extend(range.clone());
        } else if name.starts_with(&**family) && name.contains('/') {
            let of_family = range.clone();
            only.extend(of_family.filter(|&index| &*combinations.all[index].name == name));
        }
    }
}
