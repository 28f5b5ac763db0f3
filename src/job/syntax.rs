//! Faults of the syntax, in words that tell what to write instead.

use super::Problem;
use crate::model::Place;
use std::cell::OnceCell;

const QUOTES: &str = "write texts and values with a unit in quotes, such as \"2.85 m\"";
const LINE: &str = "write `key = value`, one on each line";
const HEADER: &str = "write a header as `[member.H4]`, one of a list as `[[member.H4.segment]]`";
const CLOSE: &str = "close every [ with ] and every { with }, with commas between";
const UNQUOTED: &str = "this stands without quotes";
const BACKSLASH: &str = "a backslash begins a sign that is none";
const ESCAPES: &str = "write two backslashes for one, or put the text in single quotes";
const NO_NUMBER: &str = "this is no number";
const NUMBER: &str =
    "write a bare number as `1.5` or `1.5e3`; a value with a unit stands in quotes";
const NO_DATE: &str = "this is no date";
const DATE: &str = "write a date as 2026-11-30, and any other text in quotes";
const DEEP: &str = "lists, tables or keys are nested too deep here";
const SHALLOW: &str = "no value of a job is nested more than six deep";

/// The parser goes as deep, and does not say where a key with dots went deeper.
const DEEPEST: usize = 80;

/// What the parser says begins so, what we say, and the remedy.
const WORDS: &[(&str, &str, &str)] = &[
    ("string values must be quoted", UNQUOTED, QUOTES),
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
    ("missing escaped value", BACKSLASH, ESCAPES),
    ("too few unicode value digits", BACKSLASH, ESCAPES),
    ("invalid value", "no value can be made of this", QUOTES),
    ("missing value", "the value is missing here", LINE),
    ("unclosed table", "this header is not closed", HEADER),
    ("unclosed array table", "this header is not closed", HEADER),
    ("unclosed array", "this list is not closed", CLOSE),
    ("unclosed inline table", "this table is not closed", CLOSE),
    ("missing comma", "a comma is missing here", CLOSE),
    ("extra comma", "here is one comma too many", CLOSE),
    ("extra `,`", "here is one comma too many", CLOSE),
    (
        "unexpected `=` in array",
        "a list holds values without keys",
        "write `{ key = value }` for a table in a list",
    ),
    ("key with no value", "this key has no value", LINE),
    ("missing assignment", "this key has no value", LINE),
    ("missing key", "a key is missing here", LINE),
    (
        "unquoted keys cannot be empty",
        "a key is missing here",
        LINE,
    ),
    (
        "invalid unquoted key",
        "this key holds a letter that only a key in quotes may hold",
        "write the key in quotes: `[member.\"H 4\"]`",
    ),
    (
        "keys cannot be multi-line",
        "a key stands on one line",
        "write it with one quote on each side",
    ),
    (
        "unexpected key or value",
        "something stands where the line should end",
        LINE,
    ),
    ("extra `=`", "here is one `=` too many", LINE),
    ("extra assignment", "here is one `=` too many", LINE),
    (
        "cannot extend",
        "a key with dots adds to what is closed already",
        "write all keys of a table in one place",
    ),
    (
        "unexpected leading zero",
        "a number begins with a 0 too many",
        "leave the 0 out",
    ),
    (
        "`_` may only go between digits",
        "a `_` stands at the edge of a number",
        "write `1_250`, with digits on both sides",
    ),
    ("unexpected sign", "a number has one sign too many", NUMBER),
    (
        "redundant numeric sign",
        "a number has one sign too many",
        NUMBER,
    ),
    (
        "integers with a radix",
        "a number in another base has no sign",
        NUMBER,
    ),
    (
        "radix must be lowercase",
        "the letter of a base is a small one",
        NUMBER,
    ),
    (
        "redundant integer number prefix",
        "a number has one `0x`, `0o` or `0b` too many",
        NUMBER,
    ),
    ("invalid date", NO_DATE, DATE),
    ("invalid time", NO_DATE, DATE),
    ("invalid integer", NO_NUMBER, NUMBER),
    ("invalid float", NO_NUMBER, NUMBER),
    ("invalid mantissa", NO_NUMBER, NUMBER),
    ("invalid fraction", NO_NUMBER, NUMBER),
    ("invalid exponent", NO_NUMBER, NUMBER),
    ("invalid hexadecimal", NO_NUMBER, NUMBER),
    ("invalid octal", NO_NUMBER, NUMBER),
    ("invalid binary", NO_NUMBER, NUMBER),
    (
        "carriage return",
        "a carriage return stands alone",
        "end lines with a line feed, or with both",
    ),
    (
        "invalid comment character",
        "a comment holds a control character",
        "take it out",
    ),
    ("recursion limit", DEEP, SHALLOW),
    ("cannot recurse further", DEEP, SHALLOW),
];

/// The faults of the syntax as problems of the job. What follows in a line after its first fault is
/// not told, since one missing mark makes several; but for values without quotes, of which each
/// stands for itself.
pub(super) fn problems(errors: &[toml::de::Error], text: &str) -> Vec<Problem> {
    let deep = OnceCell::new();
    let mut problems: Vec<Problem> = errors
        .iter()
        .map(|error| problem(error, text, &deep))
        .collect();
    problems.sort_by_key(|problem| (problem.place.start, problem.message.ends_with(TWICE)));
    let mut kept: Vec<Problem> = Vec::with_capacity(problems.len());
    let mut line_end = 0; // of the last that is kept
    for next in problems {
        match kept.last_mut() {
            Some(last) if next.place.start <= line_end => {
                if last.message.ends_with(TWICE) {
                    *last = next; // a header at fault is no second one
                } else if next.message == UNQUOTED {
                    kept.push(next);
                }
            }
            _ => {
                let rest = &text[next.place.start..];
                line_end = next.place.start + rest.find('\n').unwrap_or(rest.len());
                kept.push(next);
            }
        }
    }
    kept
}

/// A fault of the syntax as a problem of the job.
fn problem(error: &toml::de::Error, text: &str, deep: &OnceCell<Place>) -> Problem {
    let deep = || deep.get_or_init(|| dotted(text)).clone();
    let place = error.span().unwrap_or_else(deep);
    let start = floor(text, place.start);
    let place = start..floor(text, place.end).max(start);
    let at_fault = text.get(place.clone()).unwrap_or_default();
    let is_header = line_before(text, start).trim_start().starts_with('[');
    let what = error.message();
    if what.starts_with("duplicate key") {
        let help = if is_header {
            "keep one header; in a list each table has its own in double brackets, as in \
             `[[member.H4.segment]]`"
        } else {
            "keep one of them"
        };
        return Problem::new(
            &place,
            format!("`{at_fault}`{TWICE}"),
            Some(help.to_owned()),
        );
    }
    if let Some(quotes) = what.starts_with("invalid multi-line").then(|| quotes(what)) {
        // The parser notices at the end of the text, far from where it began.
        let place = text[..start]
            .rfind(quotes)
            .map_or(place, |at| at..at + quotes.len());
        let (message, help) = NOT_CLOSED;
        return Problem::new(&place, message.to_owned(), Some(help.to_owned()));
    }
    let (message, help) = match at_fault.chars().next() {
        None if what.starts_with("string values") => ("the value is missing here", LINE),
        Some('“' | '”' | '„' | '‘' | '’' | '«' | '»') => (
            "these are typographic quotes",
            "write straight ones, such as \"2.85 m\"",
        ),
        Some(':') if what.starts_with("invalid unquoted key") => ("here is a colon", LINE),
        Some(c) if c.is_control() && !c.is_whitespace() => {
            ("here is a control character", "take it out")
        }
        _ if is_header && what.starts_with("unquoted keys") => ("a name is missing here", HEADER),
        _ => match WORDS.iter().find(|(begins, ..)| what.starts_with(begins)) {
            Some((_, message, help)) => (*message, *help),
            None => {
                let help = if unquoted(text, start) { QUOTES } else { LINE };
                let message = format!("the text is no TOML here: {what}");
                return Problem::new(&place, message, Some(help.to_owned()));
            }
        },
    };
    Problem::new(&place, message.to_owned(), Some(help.to_owned()))
}

/// How a message about a second one ends.
const TWICE: &str = " is written twice";

/// The message and the remedy for a text of several lines without an end.
const NOT_CLOSED: (&str, &str) = (
    "this text of several lines is not closed",
    "close it with the three quotes that it began with",
);

/// The quotes that open a text of several lines of which the parser speaks.
fn quotes(what: &str) -> &'static str {
    if what.contains("literal") {
        "'''"
    } else {
        "\"\"\""
    }
}

/// The line in which a byte stands, up to it; of a long line only the last part.
fn line_before(text: &str, at: usize) -> &str {
    let from = floor(text, at.saturating_sub(LINE_LOOKED_AT));
    text[from..at].rsplit('\n').next().unwrap_or("")
}

/// As many bytes of a line are looked at, so that many faults of a long line cost no more.
const LINE_LOOKED_AT: usize = 200;

/// The only fault that is told of the syntax of a large text.
pub(super) fn of_large(error: &toml::de::Error, text: &str) -> Problem {
    let mut problem = problem(error, text, &OnceCell::new());
    let help = problem.help.unwrap_or_default();
    problem.help = Some(format!(
        "{help}; in a file as large as this only one fault of the syntax is told"
    ));
    problem
}

/// The first key of so many dots that the parser gave it up.
fn dotted(text: &str) -> Place {
    let mut at = 0;
    for line in text.split_inclusive('\n') {
        let keys = line.split('=').next().unwrap_or(line).trim_end();
        if keys.matches('.').count() + 1 >= DEEPEST {
            return at..at + keys.len();
        }
        at += line.len();
    }
    0..0
}

/// Whether the place lies in a value without quotes.
fn unquoted(text: &str, at: usize) -> bool {
    let line = line_before(text, at);
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
