//! Faults of the syntax, in words that tell what to write instead.

use super::Problem;

const QUOTES: &str = "write texts and values with a unit in quotes, such as \"2.85 m\"";
const LINE: &str = "write `key = value`, one on each line";
const HEADER: &str = "write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`";
const CLOSE: &str = "close every [ with ] and every { with }, with commas between";

/// What the parser says begins so, what we say, and the remedy.
const WORDS: &[(&str, &str, &str)] = &[
    (
        "string values must be quoted",
        "this stands without quotes",
        QUOTES,
    ),
    (
        "invalid boolean",
        "this is neither true nor false, and a text stands in quotes",
        QUOTES,
    ),
    (
        "invalid basic string",
        "this text is not closed",
        "close the quotes on the same line",
    ),
    (
        "invalid literal string",
        "this text is not closed",
        "close the quotes on the same line",
    ),
    ("unclosed table", "this header is not closed", HEADER),
    ("unclosed array table", "this header is not closed", HEADER),
    ("unclosed array", "this list is not closed", CLOSE),
    ("unclosed inline table", "this table is not closed", CLOSE),
    ("key with no value", "this key has no value", LINE),
    (
        "unquoted keys cannot be empty",
        "a key is missing here",
        LINE,
    ),
    (
        "unexpected key or value",
        "something stands where the line should end",
        LINE,
    ),
    ("extra `=`", "here is one `=` too many", LINE),
    ("extra `,`", "here is one comma too many", CLOSE),
    (
        "recursion limit",
        "lists and tables are nested too deep here",
        "no key of a job needs so many",
    ),
];

/// A fault of the syntax as a problem of the job.
pub(super) fn problem(error: &toml::de::Error, text: &str) -> Problem {
    let place = error.span().unwrap_or(0..0);
    let start = floor(text, place.start);
    let place = start..floor(text, place.end).max(start);
    let what = error.message();
    if what.starts_with("duplicate key") {
        let key = text.get(place.clone()).unwrap_or_default();
        let message = format!("`{key}` is written twice");
        return Problem::new(&place, message, Some("keep one of them".to_owned()));
    }
    let (message, help) = match WORDS.iter().find(|(begins, ..)| what.starts_with(begins)) {
        Some((_, message, help)) => ((*message).to_owned(), *help),
        None => {
            let help = if unquoted(text, start) { QUOTES } else { LINE };
            (format!("the text is no TOML here: {what}"), help)
        }
    };
    Problem::new(&place, message, Some(help.to_owned()))
}

/// Whether the place lies in a value without quotes.
fn unquoted(text: &str, at: usize) -> bool {
    let line = text[..at].rsplit('\n').next().unwrap_or("");
    let here = text[at..].chars().next();
    line.split_once('=').is_some_and(|(_, value)| {
        let first = value.trim_start().chars().next().or(here);
        first.is_some_and(char::is_alphanumeric)
    })
}

/// The nearest boundary of a character at or before a byte.
fn floor(text: &str, at: usize) -> usize {
    let mut at = at.min(text.len());
    while !text.is_char_boundary(at) {
        at -= 1;
    }
    at
}
