//! Words and lines of the text report: verdicts, places, wrapped sentences.

use crate::result::{JobStatus, Verdict};
use std::borrow::Cow;
use std::io::{self, Write};
use unicode_width::{UnicodeWidthChar, UnicodeWidthStr};

/// Sentences have no more columns than this, however wide the page is.
const READABLE: usize = 100;

/// A verdict in the report's words.
pub(super) fn verdict(verdict: Verdict) -> &'static str {
    match verdict {
        Verdict::Pass => "pass",
        Verdict::Fail => "fail",
    }
}

/// The verdict on a job in the report's words.
pub(super) fn status(status: JobStatus) -> &'static str {
    match status {
        JobStatus::Pass => "pass",
        JobStatus::Fail => "fail",
        JobStatus::Unchecked => "unchecked",
        JobStatus::Error => "error",
    }
}

/// The verdict word in its colour; any other text as it is.
pub(super) fn paint(word: &str, colour: bool) -> Cow<'_, str> {
    let code = match word {
        "pass" => "32",
        "fail" | "error" => "31",
        "unchecked" | "warning" => "33",
        _ => return Cow::Borrowed(word),
    };
    if colour {
        Cow::Owned(format!("\u{1b}[{code}m{word}\u{1b}[0m"))
    } else {
        Cow::Borrowed(word)
    }
}

/// Text from a job without the control characters that would move a terminal's cursor.
pub(super) fn printable(text: &str) -> Cow<'_, str> {
    if text.chars().any(char::is_control) {
        Cow::Owned(text.replace(char::is_control, " "))
    } else {
        Cow::Borrowed(text)
    }
}

/// `1 member`, `2 members`.
pub(super) fn counted(count: usize, one: &str) -> String {
    let ending = if count == 1 { "" } else { "s" };
    format!("{count} {one}{ending}")
}

/// A title over a rule as wide as its longest line.
pub(super) fn title(out: &mut dyn Write, text: &str, rule: char, width: usize) -> io::Result<()> {
    let mut lines = Vec::new();
    wrapped(&mut lines, "", text, width)?;
    out.write_all(&lines)?;
    let lines = String::from_utf8_lossy(&lines);
    let longest = lines.lines().map(UnicodeWidthStr::width).max().unwrap_or(0);
    writeln!(out, "{}", rule.to_string().repeat(longest))
}

/// A sentence broken at blanks into lines of at most `width` columns, and no longer than is read
/// with ease. The first line begins with `lead`, the others with as many blanks; a word longer than
/// a line stands on one by itself, and a number stays with its unit.
pub(super) fn wrapped(out: &mut dyn Write, lead: &str, text: &str, width: usize) -> io::Result<()> {
    let width = width.min(READABLE);
    let indent = lead.width();
    let mut line = lead.to_owned();
    let mut used = indent;
    let mut begun = false;
    let text = printable(text);
    let mut words = text.split_whitespace().peekable();
    while let Some(word) = words.next() {
        let unit = words.next_if(|next| is_number(word) && is_unit(next));
        let length = word.width() + unit.map_or(0, |unit| 1 + unit.width());
        if begun && used + 1 + length > width {
            writeln!(out, "{}", line.trim_end())?;
            line = " ".repeat(indent);
            used = indent;
            begun = false;
        }
        if begun {
            line.push(' ');
            used += 1;
        }
        line.push_str(word);
        if let Some(unit) = unit {
            line.push(' ');
            line.push_str(unit);
        }
        used += length;
        begun = true;
    }
    writeln!(out, "{}", line.trim_end())
}

fn is_number(word: &str) -> bool {
    let word = word.trim_start_matches(['(', '+', '-']);
    let mut characters = word.chars();
    characters
        .next()
        .is_some_and(|first| first.is_ascii_digit())
        && characters.all(|character| matches!(character, '0'..='9' | '.' | 'e' | '-'))
}

/// Whether a word is a unit in which reports show quantities, a mark behind it aside.
fn is_unit(word: &str) -> bool {
    const UNITS: [&str; 20] = [
        "mm", "mm2", "kN", "kN/mm", "MPa", "kg", "kg/m", "K", "degC", "in", "in2", "kip", "kip/in",
        "ksi", "lb", "lb/ft", "degF", "ue", "deg", "rad",
    ];
    UNITS.contains(&word.trim_end_matches(['.', ',', ';', ':', ')']))
}

/// A line's part before a display column and from it on, if it reaches that far.
pub(super) fn split_at_column(line: &str, column: usize) -> Option<(&str, &str)> {
    let mut used = 0;
    for (index, character) in line.char_indices() {
        if used == column {
            return line.split_at_checked(index);
        }
        used += character.width().unwrap_or(0);
    }
    None
}

#[cfg(test)]
mod tests {
    use super::*;

    fn lines(lead: &str, text: &str, width: usize) -> String {
        let mut out = Vec::new();
        wrapped(&mut out, lead, text, width).unwrap();
        String::from_utf8(out).unwrap()
    }

    #[test]
    fn sentences_hang_under_their_lead() {
        assert_eq!(
            lines("note  ", "one two three", 14),
            "note  one two\n      three\n"
        );
    }

    #[test]
    fn a_long_word_stands_alone_and_is_not_cut() {
        assert_eq!(lines("", "a abcdefghijk b", 5), "a\nabcdefghijk\nb\n");
    }

    #[test]
    fn a_number_stays_with_its_unit() {
        assert_eq!(
            lines("", "gap (2.50 mm), 3 pipes", 9),
            "gap\n(2.50 mm),\n3 pipes\n"
        );
    }

    #[test]
    fn a_rule_is_as_wide_as_the_title_above_it() {
        let mut out = Vec::new();
        title(&mut out, "one two three", '=', 8).unwrap();
        assert_eq!(String::from_utf8(out).unwrap(), "one two\nthree\n=======\n");
    }

    #[test]
    fn control_characters_of_a_job_never_reach_the_terminal() {
        assert_eq!(printable("a\u{1b}[31mb\n"), "a [31mb ");
    }

    #[test]
    fn only_verdicts_are_painted_and_only_in_colour() {
        assert_eq!(paint("fail", false), "fail");
        assert_eq!(paint("fail", true), "\u{1b}[31mfail\u{1b}[0m");
        assert_eq!(paint("failing", true), "failing");
    }
}
