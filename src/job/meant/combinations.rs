//! Cases, and combinations with their lists multiplied out.

use super::lost::Lost;
use super::{Meaning, name};
use crate::job::nearest::remedy;
use crate::job::written::combination::{self as written, Factors, purpose_named};
use crate::job::written::{Entry, Job, Written};
use crate::model::{Case, Combination, Name, Purpose, Remark};
use std::ops::Range;

/// A job may have as many combinations, lists multiplied out.
const MOST: u128 = 100_000;
/// They may take out as many members, each counted in each.
const MOST_TAKEN_OUT: u128 = 10_000_000;

/// The cases of a job; a nameless one that is always on where it has none.
pub(super) fn cases(job: &Job<'_>) -> Vec<Case> {
    if job.cases.is_empty() {
        return vec![Case {
            name: Name::from(""),
            always: true,
            place: 0..0,
        }];
    }
    job.cases
        .iter()
        .map(|case| Case {
            name: name(&case.name),
            always: case.always,
            place: case.place.clone(),
        })
        .collect()
}

/// The combinations of a job.
pub(super) struct Combinations {
    pub(super) all: Vec<Combination>,
    /// For each as written: its name, its purpose, and which of all it became.
    pub(super) families: Vec<(Name, Option<Purpose>, Range<usize>)>,
}

impl Combinations {
    /// `None` where one is at fault.
    pub(super) fn of(cases: &[Case], meaning: &mut Meaning<'_, '_>) -> Option<Self> {
        let job = meaning.job;
        if job.combinations.is_empty() {
            let all = Name::from("all");
            return Some(Combinations {
                all: vec![Combination {
                    name: all.clone(),
                    family: all.clone(),
                    purpose: None,
                    factors: vec![1.0; cases.len()],
                    shown: shown(cases, |_| true),
                    modulus: Vec::new(),
                    without: Vec::new(),
                    place: 0..0,
                }],
                families: vec![(all, None, 0..1)],
            });
        }
        let mut sound = true;
        let mut lost = Vec::with_capacity(job.combinations.len());
        for combination in &job.combinations {
            sound &= combination.sound;
            for (case, _) in &combination.factors {
                sound &= factored_case(case, meaning).is_some();
            }
            for (material, _) in &combination.modulus {
                sound &= material_is_known(material, combination, meaning);
            }
            lost.extend(Lost::of(combination, meaning));
        }
        if !sound || lost.len() < job.combinations.len() || !few_enough(meaning) {
            return None;
        }
        let mut all = Vec::new();
        let mut families = Vec::with_capacity(job.combinations.len());
        for (combination, lost) in job.combinations.iter().zip(&lost) {
            let first = all.len();
            let family = name(&combination.name);
            let purpose = match &combination.purpose {
                Entry::Given(purpose) => {
                    let named = purpose_named(combination.name.value);
                    if named.is_some_and(|named| named != purpose.value) {
                        let name = combination.name.value;
                        let message = format!("a combination called `{name}` has that purpose");
                        let help = "call it otherwise, or leave its purpose out";
                        meaning.r.problems.say(&purpose.place, message, help);
                    }
                    Some(purpose.value)
                }
                Entry::Absent => purpose_named(combination.name.value),
                Entry::Wrong => return None,
            };
            multiply_out(
                combination,
                &family,
                purpose,
                lost,
                cases,
                meaning,
                &mut all,
            );
            families.push((family, purpose, first..all.len()));
        }
        Some(Combinations { all, families })
    }
}

/// The cases that a report shows for a combination.
fn shown(cases: &[Case], named: impl Fn(usize) -> bool) -> Vec<usize> {
    (0..cases.len())
        .filter(|&index| !cases[index].name.is_empty())
        .filter(|&index| cases[index].always || named(index))
        .collect()
}

/// The index of a case that a combination factors.
fn factored_case(case: &Written<&str>, meaning: &mut Meaning<'_, '_>) -> Option<usize> {
    let index = meaning.case(case)?;
    if meaning.job.cases.get(index).is_some_and(|case| case.always) {
        let message = format!(
            "the case `{}` acts always, with factor 1, and cannot be factored",
            case.value
        );
        let help = "take it out here, or take out `always` in the case";
        meaning.r.problems.say(&case.place, message, help);
        return None;
    }
    Some(index)
}

impl Meaning<'_, '_> {
    /// The index of a case; an unknown one is reported.
    pub(super) fn case(&mut self, case: &Written<&str>) -> Option<usize> {
        let cases = &self.job.cases;
        let found = cases
            .iter()
            .position(|known| known.name.value == case.value);
        if found.is_none() {
            let (message, help) = if cases.is_empty() {
                (
                    format!("this job has no cases, and so none called `{}`", case.value),
                    Some(format!("add `[case.{}]`, or name no case", case.value)),
                )
            } else {
                let names = cases.iter().map(|case| case.name.value);
                (
                    format!("no case is called `{}`", case.value),
                    remedy(case.value, names, "the cases are"),
                )
            };
            self.r.problems.unknown("case", &case.place, message, help);
        }
        found
    }
}

fn material_is_known(
    material: &Written<&str>,
    combination: &written::Combination<'_>,
    meaning: &mut Meaning<'_, '_>,
) -> bool {
    let id = material.value;
    if !meaning.materials.knows(id) {
        let help = meaning.materials.remedy(id);
        let message = format!("no material is called `{id}`");
        let problems = &mut meaning.r.problems;
        problems.unknown("material", &material.place, message, help);
        return false;
    }
    if meaning.materials.index_of_used(id).is_none() {
        meaning.remarks.push(Remark {
            about: format!("combination.{}", combination.name.value),
            text: format!("no member is made of `{id}`, so the factor on its modulus does nothing"),
            place: Some(material.place.clone()),
            caution: true,
        });
    }
    true
}

/// Whether the lists do not multiply out to more combinations than a job may have.
fn few_enough(meaning: &mut Meaning<'_, '_>) -> bool {
    let mut total = Some(0u128);
    let mut over = None;
    for combination in &meaning.job.combinations {
        let product = becomes(combination);
        total = total
            .zip(product)
            .and_then(|(total, product)| total.checked_add(product));
        if over.is_none() && total.is_none_or(|total| total > MOST) {
            over = Some(combination.name.place.clone());
        }
    }
    let Some(place) = over else {
        return few_taken_out(meaning);
    };
    let number = total.map_or_else(|| "more than 10^38".to_owned(), grouped);
    let message = format!(
        "the lists multiply out to {number} combinations; a job may have {}",
        grouped(MOST)
    );
    let help = "shorten the lists, or spread them over several jobs";
    meaning.r.problems.say(&place, message, help);
    false
}

/// Whether combinations do not take out more members than can be listed for each of them.
fn few_taken_out(meaning: &mut Meaning<'_, '_>) -> bool {
    let mut total = 0u128;
    for combination in &meaning.job.combinations {
        let Some(without) = combination.without.given() else {
            continue;
        };
        let many = becomes(combination).unwrap_or(MOST);
        total += many * without.value.len() as u128;
        if total > MOST_TAKEN_OUT {
            let message = format!(
                "combinations take out {} members, each counted in each; a job may have {}",
                grouped(total),
                grouped(MOST_TAKEN_OUT)
            );
            let help = "leave out of the job what most combinations take out";
            meaning.r.problems.say(&without.place, message, help);
            return false;
        }
    }
    true
}

/// How many combinations one becomes; `None` where that is beyond counting.
fn becomes(combination: &written::Combination<'_>) -> Option<u128> {
    let mut lists = combination
        .factors
        .iter()
        .map(|(_, factors)| &factors.value);
    let lost = combination.lose_each.given();
    let lost = lost.map_or(1, |lost| lost.value.len() as u128);
    lists.try_fold(lost, |product, factors| match factors {
        Factors::One(_) => Some(product),
        Factors::Each(list) => product.checked_mul(list.len() as u128),
    })
}

/// A whole number with a comma at every third digit.
fn grouped(number: u128) -> String {
    let digits = number.to_string();
    let mut out = String::with_capacity(digits.len() * 4 / 3);
    for (index, digit) in digits.chars().enumerate() {
        if index > 0 && (digits.len() - index).is_multiple_of(3) {
            out.push(',');
        }
        out.push(digit);
    }
    out
}

/// One of a list.
struct Choice {
    sets: Sets,
    /// What it adds to the name of the combination.
    named: String,
}

/// What a choice decides.
enum Sets {
    /// The factor of a case.
    Factor(usize, f64),
    /// The member that is taken out.
    Without(usize),
}

/// Adds every choice of a combination's lists, the last list turning fastest.
fn multiply_out(
    combination: &written::Combination<'_>,
    family: &Name,
    purpose: Option<Purpose>,
    lost: &Lost,
    cases: &[Case],
    meaning: &Meaning<'_, '_>,
    all: &mut Vec<Combination>,
) {
    let of_case = |case: &Written<&str>| {
        let mut known = meaning.job.cases.iter();
        known.position(|known| known.name.value == case.value)
    };
    let mut factors: Vec<f64> = cases
        .iter()
        .map(|case| if case.always { 1.0 } else { 0.0 })
        .collect();
    let mut named = vec![false; cases.len()];
    let mut lists: Vec<Vec<Choice>> = Vec::new();
    for (case, written) in &combination.factors {
        let Some(index) = of_case(case) else {
            continue; // an unknown one has been reported
        };
        named[index] = true;
        match &written.value {
            Factors::One(factor) => factors[index] = *factor,
            Factors::Each(list) => {
                let choice = |&factor: &f64| Choice {
                    sets: Sets::Factor(index, factor),
                    named: chosen(case.value, factor),
                };
                lists.push(list.iter().map(choice).collect());
            }
        }
    }
    if !lost.each.is_empty() {
        let choice = |&member: &usize| Choice {
            sets: Sets::Without(member),
            named: format!("/without={}", meaning.job.members[member].name.value),
        };
        lists.push(lost.each.iter().map(choice).collect());
    }
    let shown = shown(cases, |index| named[index]);
    let modulus = modulus(combination, meaning);
    let mut choice = vec![0; lists.len()];
    let mut text = String::with_capacity(64);
    loop {
        let mut without = lost.always.clone();
        let name = if lists.is_empty() {
            family.clone()
        } else {
            text.clear();
            text.push_str(family);
            for (list, &chosen) in lists.iter().zip(&choice) {
                let choice = &list[chosen];
                match choice.sets {
                    Sets::Factor(case, factor) => factors[case] = factor,
                    Sets::Without(member) => {
                        let at = without.partition_point(|&other| other < member);
                        without.insert(at, member);
                    }
                }
                text.push_str(&choice.named);
            }
            Name::from(text.as_str())
        };
        all.push(Combination {
            name,
            family: family.clone(),
            purpose,
            factors: factors.clone(),
            shown: shown.clone(),
            modulus: modulus.clone(),
            without,
            place: combination.place.clone(),
        });
        // On to the next choice, as an odometer turns.
        let mut turned = false;
        for (chosen, list) in choice.iter_mut().zip(&lists).rev() {
            *chosen += 1;
            if *chosen < list.len() {
                turned = true;
                break;
            }
            *chosen = 0;
        }
        if !turned {
            return;
        }
    }
}

/// What a choice adds to the name of its combination: `/live=0`, the factor as its shortest decimal.
fn chosen(case: &str, factor: f64) -> String {
    // Most factors are small whole numbers, which are written sooner as such.
    if factor.fract() == 0.0 && factor.abs() < 1e6 {
        format!("/{case}={}", factor as i64)
    } else {
        format!("/{case}={factor}")
    }
}

/// The factor on the modulus of every used material; empty where none is written.
fn modulus(combination: &written::Combination<'_>, meaning: &Meaning<'_, '_>) -> Vec<f64> {
    if combination.modulus.is_empty() {
        return Vec::new();
    }
    let mut factors = vec![1.0; meaning.materials.used.len()];
    for (material, factor) in &combination.modulus {
        if let Some(index) = meaning.materials.index_of_used(material.value) {
            factors[index] = *factor;
        }
    }
    factors
}
