//! How a member is held.

use super::Meaning;
use super::members::Whole;
use super::outline::{Outline, as_written};
use crate::job::nearest::remedy;
use crate::job::written::support::Support as WrittenSupport;
use crate::job::written::{Entry, Written};
use crate::model::{Name, Place, Support, SupportKind};

/// The supports of a member.
pub(super) struct Held {
    /// In the order of the file, `start` and `end` before the rest; `None` where one is at fault.
    pub(super) supports: Option<Vec<Support>>,
}

/// The supports of a member that is cut.
pub(super) fn supports<'w, 't>(
    whole: &Whole<'w, 't>,
    outline: &Outline<'w, 't>,
    meaning: &mut Meaning<'w, 't>,
) -> Held {
    let mut supports = Vec::new();
    let mut sound = !(whole.start.is_wrong() || whole.end.is_wrong() || whole.supports.is_wrong());
    let last = outline.ends_of(outline.segments.len().saturating_sub(1));
    let ends = [
        ("start", whole.start, Some(0)),
        ("end", whole.end, last.map(|(_, end)| end)),
    ];
    for (name, fixed, station) in ends {
        let Entry::Given(fixed) = fixed else {
            continue;
        };
        let name = Name::from(name);
        match station {
            Some(station) => supports.push(Support {
                name: name.clone(),
                place: fixed.place.clone(),
                station,
                at: name,
                kind: SupportKind::Fixed,
            }),
            None => sound = false,
        }
    }
    for written in whole.supports.given().map_or(&[][..], |all| &all.value) {
        match support(written, outline) {
            Some(support) => supports.push(support),
            None => sound = false,
        }
    }
    sound &= agree(&supports, meaning);
    Held {
        supports: sound.then_some(supports),
    }
}

fn support<'t>(written: &WrittenSupport<'t>, outline: &Outline<'_, 't>) -> Option<Support> {
    let station = &written.at.given()?.value;
    let at = as_written(station);
    let name = match &written.name {
        Entry::Given(name) => Name::from(name.value),
        Entry::Absent => at.clone(),
        Entry::Wrong => return None,
    };
    Some(Support {
        name,
        place: written.place.clone(),
        station: outline.find(station)?,
        at,
        kind: written.kind?,
    })
}

/// Whether supports at one station go together.
fn agree(supports: &[Support], meaning: &mut Meaning<'_, '_>) -> bool {
    let mut order: Vec<usize> = (0..supports.len()).collect();
    order.sort_by_key(|&index| supports[index].station); // stable: the order of the file within
    let mut agree = true;
    for at_one in order.chunk_by(|&a, &b| supports[a].station == supports[b].station) {
        let Some((&first, others)) = at_one.split_first() else {
            continue;
        };
        let fixed = at_one
            .iter()
            .find(|&&index| supports[index].kind == SupportKind::Fixed);
        let nameless = |index: usize| supports[index].name == supports[index].at;
        for &other in others {
            let support = &supports[other];
            if let Some(&fixed) = fixed {
                let line = meaning.line(
                    supports[if other == fixed { first } else { fixed }]
                        .place
                        .start,
                );
                let message = format!(
                    "two supports stand at `{}`, and one is fixed: the other (line {line}) never \
                     acts",
                    support.at
                );
                let help = "keep one of them; the key `start` or `end` is a support too";
                meaning.r.problems.say(&support.place, message, help);
                agree = false;
            } else if nameless(other)
                && let Some(&same) = at_one
                    .iter()
                    .find(|&&index| index < other && nameless(index))
            {
                let line = meaning.line(supports[same].place.start);
                let message = format!(
                    "two supports without a name stand at `{}`, the other in line {line}",
                    support.at
                );
                let help = "give one a `name`, so that reports can tell them apart";
                meaning.r.problems.say(&support.place, message, help);
                agree = false;
            }
        }
    }
    agree
}

impl Held {
    /// The support that a movement names; reports one that is not there.
    pub(super) fn named(
        &self,
        written: &Written<&str>,
        meaning: &mut Meaning<'_, '_>,
    ) -> Option<usize> {
        let supports = self.supports.as_ref()?;
        let found = supports
            .iter()
            .position(|support| &*support.name == written.value);
        if found.is_none() {
            let message = format!("no support of this member is called `{}`", written.value);
            let names = supports.iter().map(|support| &*support.name);
            let help = remedy(written.value, names, "its supports are");
            let problems = &mut meaning.r.problems;
            problems.unknown("member", &written.place, message, help);
        }
        found
    }

    /// The only support at a station; reports where there is none or more than one.
    pub(super) fn only_one_at(
        &self,
        station: usize,
        place: &Place,
        meaning: &mut Meaning<'_, '_>,
    ) -> Option<usize> {
        let supports = self.supports.as_ref()?;
        let mut there = (0..supports.len()).filter(|&index| supports[index].station == station);
        match (there.next(), there.next()) {
            (Some(one), None) => Some(one),
            (None, _) => {
                let message = "no support stands at this station, so nothing can move it";
                let help = "name a support with `support`, or take a station that has one";
                meaning.r.problems.say(place, message, help);
                None
            }
            (Some(_), Some(_)) => {
                let message = "more than one support stands at this station";
                let help = "say which moves: `support` with its name";
                meaning.r.problems.say(place, message, help);
                None
            }
        }
    }
}
