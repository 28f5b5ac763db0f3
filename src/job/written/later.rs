//! Keys of the job file that this version does not read yet. They are refused by name, so that
//! nobody believes that they were taken into account.

/// The table in which it stands (`""` for any), the key, and what it is about.
const LATER: &[(&str, &str, &str)] = &[
    ("material", "thermal-strain", "laws of temperature"),
    ("material", "modulus-at", "laws of temperature"),
    ("material", "yield-at", "laws of temperature"),
    ("material", "ultimate-at", "laws of temperature"),
    (
        "load",
        "preload",
        "a force at assembly; a known misfit is `misfit`",
    ),
    (
        "load",
        "turns",
        "nut turns; write them as a `misfit` of −number × pitch",
    ),
    (
        "load",
        "take-up",
        "turnbuckles; write them as a `misfit` of −turns × the sum of the pitches",
    ),
    (
        "section",
        "pipe",
        "pipes by designation; write `tube` with its dimensions",
    ),
    (
        "section",
        "rebar",
        "bars by designation; write `round` or `area`",
    ),
    ("section", "strand", "strands by designation; write `area`"),
    ("section", "rope", "ropes; write `area`"),
    ("section", "stock", "stock sizes; write `round` or `bar`"),
    ("limit of a member", "strength", "clauses of standards"),
    ("limit of a member", "buckling", "buckling checks"),
    ("limit of a segment", "strength", "clauses of standards"),
    ("limit of a segment", "buckling", "buckling checks"),
    ("segment", "column", "columns of buckling checks"),
    ("member", "column", "columns of buckling checks"),
];

/// The message and the help for a key of a later version.
pub(crate) fn later(table: &str, key: &str) -> Option<(String, String)> {
    LATER
        .iter()
        .find(|(of, name, _)| *of == table && *name == key)
        .map(|(_, _, about)| refusal(key, about))
}

/// The refusal of something that a later version reads.
pub(crate) fn refusal(key: &str, about: &str) -> (String, String) {
    let (about, instead) = about.split_once("; ").unwrap_or((about, ""));
    let help = if instead.is_empty() {
        "take it out; nothing else stands for it yet".to_owned()
    } else {
        instead.to_owned()
    };
    (
        format!("`{key}` ({about}) is not read by this version"),
        help,
    )
}
