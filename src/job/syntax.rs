//! Faults of the syntax, in words that tell what to write instead.

use super::Problem;

/// A fault of the syntax as a problem of the job.
pub(super) fn problem(error: &toml::de::Error, text: &str) -> Problem {
    let place = error.span().unwrap_or(0..0);
    let place = place.start.min(text.len())..place.end.min(text.len());
    let what = error.message();
    let help = if what.starts_with("duplicate key") {
        let written = text.get(place.clone()).unwrap_or_default();
        return Problem::new(
            &place,
            format!("`{written}` is written twice"),
            Some("keep one of them".to_owned()),
        );
    } else if what.contains("string values must be quoted") || unquoted(text, place.start) {
        "write texts and values with a unit in quotes, such as \"2.85 m\""
    } else if what.contains("string") {
        "close the quotes on the same line"
    } else if what.contains("array") || what.contains("inline table") {
        "close every [ with ] and every { with }, with commas between"
    } else if what.contains("table") || what.contains("header") {
        "write a header as `[member.H4]`, a header of a list as `[[member.H4.segment]]`"
    } else {
        "write `key = value`, one on each line"
    };
    let message = format!("the text is no TOML here: {what}");
    Problem::new(&place, message, Some(help.to_owned()))
}

/// Whether the line up to the place ends in a value without quotes.
fn unquoted(text: &str, at: usize) -> bool {
    let line = text[..floor(text, at)].rsplit('\n').next().unwrap_or("");
    line.split_once('=').is_some_and(|(_, value)| {
        value
            .trim_start()
            .starts_with(|c: char| c.is_alphanumeric())
    })
}

fn floor(text: &str, at: usize) -> usize {
    let mut at = at.min(text.len());
    while !text.is_char_boundary(at) {
        at -= 1;
    }
    at
}
