//! Which names may be given.

use super::Reader;
use crate::model::Place;

/// What names may not hold, since addresses and the names of combinations are made with it.
const FORBIDDEN: [char; 4] = ['.', ':', '/', '='];

/// Names that addresses need.
const RESERVED: &[&str] = &[
    "start",
    "end",
    "rest",
    "all",
    "x",
    "y",
    "z",
    "elongation",
    "displacement",
    "rotation",
    "reaction",
    "gap",
    "value",
    "utilisation",
];

/// Whether a case, a combination or a material may be called so; reports it if not.
pub(crate) fn is_good(name: &str, place: &Place, r: &mut Reader<'_>) -> bool {
    let fault = if name.is_empty() {
        "a name is empty".to_owned()
    } else if name.trim() != name {
        format!("the name `{name}` begins or ends with a blank")
    } else if let Some(letter) = name.chars().find(|c| FORBIDDEN.contains(c)) {
        format!("the name `{name}` holds `{letter}`, which addresses need")
    } else if name.chars().any(char::is_control) {
        "a name holds a control character".to_owned()
    } else {
        return true;
    };
    let help = "write a name without `.` `:` `/` `=` and without blanks at its ends";
    r.problems.say(place, fault, help);
    false
}

/// Words with which an address says which of all combinations it means.
const OF_ALL: &[&str] = &["max", "min", "abs"];

/// Whether a combination may be called so; reports it if not.
pub(crate) fn is_for_a_combination(name: &str, place: &Place, r: &mut Reader<'_>) -> bool {
    if !is_good(name, place, r) {
        return false;
    }
    let reserved = OF_ALL.contains(&name);
    if reserved {
        let message = format!("the name `{name}` is taken: addresses of results need it");
        r.problems.say(place, message, "write another name");
    }
    !reserved
}

/// Whether a member or a part of it may be called so; reports it if not.
pub(crate) fn is_for_a_part(name: &str, place: &Place, r: &mut Reader<'_>) -> bool {
    if !is_good(name, place, r) {
        return false;
    }
    let reserved =
        RESERVED.contains(&name) || name.starts_with("force_") || name.starts_with("stress_");
    if reserved {
        let message = format!("the name `{name}` is taken: addresses of results need it");
        r.problems.say(place, message, "write another name");
    }
    !reserved
}
