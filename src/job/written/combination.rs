//! `[combination.NAME]`: factors on cases, and which members are taken out.

use super::assembly::names;
use super::fields::{Entry, Fields, Keys, Value, Written, named};
use super::{Reader, value};
use crate::job::nearest::remedy;
use crate::model::{Place, Purpose};
use toml::de::DeValue;

pub(crate) const KEYS: Keys = Keys {
    table: "combination",
    keys: &["purpose", "factors", "modulus", "without", "lose-each"],
};

/// A combination as written, its lists not multiplied out.
#[derive(Debug)]
pub(crate) struct Combination<'t> {
    pub(crate) name: Written<&'t str>,
    pub(crate) place: Place,
    pub(crate) purpose: Entry<Purpose>,
    /// By case, in the order written; a single factor is no list.
    pub(crate) factors: Vec<(Written<&'t str>, Written<Factors>)>,
    /// By material.
    pub(crate) modulus: Vec<(Written<&'t str>, f64)>,
    /// The members that are taken out.
    pub(crate) without: Entry<Vec<Written<&'t str>>>,
    /// The members of which each is taken out in a combination of its own.
    pub(crate) lose_each: Entry<Vec<Written<&'t str>>>,
    /// Whether its factors are whole: without them it cannot be multiplied out.
    pub(crate) sound: bool,
}

/// The factor of a case, or several of which each is tried.
#[derive(Debug)]
pub(crate) enum Factors {
    One(f64),
    Each(Vec<f64>),
}

impl<'t> Combination<'t> {
    pub(super) fn read(name: Written<&'t str>, table: &'t Value<'t>, r: &mut Reader<'t>) -> Self {
        let mut combination = Combination {
            name,
            place: table.span(),
            purpose: Entry::Wrong,
            factors: Vec::new(),
            modulus: Vec::new(),
            without: Entry::Wrong,
            lose_each: Entry::Wrong,
            sound: false,
        };
        let Some(mut fields) = Fields::of(table, KEYS, r) else {
            return combination;
        };
        combination.purpose = fields.entry("purpose", r, purpose);
        let factors = fields.get("factors").map(|value| {
            let help = "write a factor for each case: `factors = { dead = 1.35 }`";
            let named = named(value, "factors", help, r)?;
            let mut sound = true;
            let mut read = Vec::with_capacity(named.len());
            for (case, value) in named {
                match factor(value, r) {
                    Some(factors) => {
                        let place = value.span();
                        read.push((
                            case,
                            Written {
                                value: factors,
                                place,
                            },
                        ));
                    }
                    None => sound = false,
                }
            }
            combination.factors = read;
            sound.then_some(())
        });
        if let Some(value) = fields.get("modulus") {
            let help = "write a factor for each material: `modulus = { concrete-c40 = 0.33 }`";
            for (material, value) in named(value, "modulus", help, r).unwrap_or_default() {
                match value::number(value, r) {
                    Some(factor) if factor > 0.0 => combination.modulus.push((material, factor)),
                    Some(_) => {
                        let message = "the factor on a modulus must be more than 0";
                        r.problems.say(&value.span(), message, "");
                    }
                    None => {}
                }
            }
        }
        combination.without = fields.entry("without", r, names("member"));
        combination.lose_each = fields.entry("lose-each", r, names("member"));
        let lost = [&combination.without, &combination.lose_each];
        combination.sound = factors != Some(None) && !lost.into_iter().any(Entry::is_wrong);
        fields.finish(r);
        combination
    }
}

fn factor<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Factors> {
    let DeValue::Array(list) = value.get_ref() else {
        return value::number(value, r).map(Factors::One);
    };
    if list.is_empty() {
        let message = "this list of factors is empty";
        let help = "write the factors that are tried, such as `[0.0, 1.0]`";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    let mut factors: Vec<f64> = Vec::with_capacity(list.len());
    let mut sound = true;
    for value in list.iter() {
        match value::number(value, r) {
            Some(factor) => factors.push(factor + 0.0), // no −0
            None => sound = false,
        }
    }
    // Each choice names a combination, so none may stand twice; sorted, a long list stays cheap.
    let mut order: Vec<usize> = (0..factors.len()).collect();
    order.sort_by(|&a, &b| factors[a].total_cmp(&factors[b]).then(a.cmp(&b)));
    for two in order.windows(2) {
        if sound && factors[two[0]] == factors[two[1]] {
            let message = format!("the factor {} stands twice in this list", factors[two[0]]);
            let place = list.get(two[1]).map_or(value.span(), |value| value.span());
            r.problems.say(&place, message, "take one out");
            sound = false;
        }
    }
    sound.then_some(Factors::Each(factors))
}

fn purpose<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Purpose> {
    let text = value::text(value, r)?;
    let purpose = purpose_named(text);
    if purpose.is_none() {
        let message = format!("no purpose is called `{text}`");
        let help = remedy(text, ["service", "strength"], "a combination is for");
        r.problems.say(&value.span(), message, help);
    }
    purpose
}

/// The purpose of this name.
pub(crate) fn purpose_named(name: &str) -> Option<Purpose> {
    match name {
        "service" => Some(Purpose::Service),
        "strength" => Some(Purpose::Strength),
        _ => None,
    }
}
