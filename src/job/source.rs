//! The text of a job file, and where in it a place stands.

use super::{MOST_BYTES, Problem};
use crate::model::Place;
use std::borrow::Cow;
use std::sync::OnceLock;

/// A job file's text without its byte-order mark.
#[derive(Debug)]
pub struct Source {
    /// The path as it was given, or `-` for standard input.
    pub file: String,
    /// The text.
    pub text: String,
    /// The byte at which each line begins; found when the first place is asked for.
    starts: OnceLock<Vec<usize>>,
}

impl Source {
    /// A text with the name of its file; a byte-order mark at its head is passed over.
    pub fn new(file: impl Into<String>, text: impl Into<String>) -> Self {
        let mut text = text.into();
        if text.starts_with('\u{feff}') {
            text.drain(..'\u{feff}'.len_utf8());
        }
        Source {
            file: file.into(),
            text,
            starts: OnceLock::new(),
        }
    }

    /// The line and the column at which a place begins, both from 1; columns count characters.
    pub fn line_and_column(&self, place: &Place) -> (usize, usize) {
        let at = self.boundary(place.start);
        let line = self.line_index(at);
        let column = self.text[self.starts()[line]..at].chars().count();
        (line + 1, column + 1)
    }

    /// The line in which a place begins, without its line break, and the part of the place that
    /// lies in it, as bytes of the line. What is empty covers one character where there is one.
    pub fn line_around(&self, place: &Place) -> (&str, Place) {
        let start = self.boundary(place.start);
        let head = self.starts()[self.line_index(start)];
        let rest = &self.text[head..];
        let line = rest.split('\n').next().unwrap_or(rest);
        let line = line.strip_suffix('\r').unwrap_or(line);
        let from = (start - head).min(line.len());
        let mut to = (self.boundary(place.end).max(start) - head).min(line.len());
        if to <= from {
            to = from + line[from..].chars().next().map_or(0, char::len_utf8);
        }
        (line, from..to)
    }

    fn starts(&self) -> &[usize] {
        self.starts.get_or_init(|| {
            let breaks = self.text.bytes().enumerate().filter(|(_, b)| *b == b'\n');
            std::iter::once(0)
                .chain(breaks.map(|(at, _)| at + 1))
                .collect()
        })
    }

    fn line_index(&self, at: usize) -> usize {
        self.starts()
            .partition_point(|&start| start <= at)
            .saturating_sub(1)
    }

    /// The nearest boundary of a character at or before a byte.
    fn boundary(&self, at: usize) -> usize {
        let mut at = at.min(self.text.len());
        while !self.text.is_char_boundary(at) {
            at -= 1;
        }
        at
    }
}

/// The text of a file's bytes without its byte-order mark.
///
/// # Errors
/// More than [`MOST_BYTES`] bytes; bytes that are no UTF-8, with the encoding that they look like, and NUL bytes. The text of the
/// error's [`Source`] is what could be read, so that the place can be drawn.
pub fn decode(bytes: &[u8]) -> Result<Cow<'_, str>, Box<Undecoded>> {
    if bytes.len() > MOST_BYTES {
        return Err(Box::new(Undecoded {
            text: String::new(),
            problem: Problem::new(
                &(0..0),
                format!(
                    "the file is larger than {} MiB: no job is",
                    MOST_BYTES >> 20
                ),
                Some("look whether it is the file that you mean".to_owned()),
            ),
        }));
    }
    let utf16 = match bytes {
        [0xff, 0xfe, ..] => true,
        [0xfe, 0xff, ..] => true,
        [0, a, 0, b, ..] | [a, 0, b, 0, ..] => *a != 0 && *b != 0,
        _ => false,
    };
    if utf16 {
        return Err(Box::new(Undecoded {
            text: String::new(),
            problem: Problem::new(
                &(0..0),
                "the file is not UTF-8; it looks like UTF-16".to_owned(),
                Some("save it as UTF-8".to_owned()),
            ),
        }));
    }
    let bytes = bytes.strip_prefix(b"\xef\xbb\xbf").unwrap_or(bytes);
    let text = match std::str::from_utf8(bytes) {
        Ok(text) => text,
        Err(error) => {
            let at = error.valid_up_to();
            let length = error.error_len().unwrap_or(bytes.len() - at);
            let odd = bytes.get(at).copied().unwrap_or_default();
            // What an editor that saves in a Western code page writes for °, ±, ², µ and letters
            // with accents are single bytes from 0xA0 up; between 0x80 and 0x9F are its quotes.
            let looks = if odd >= 0xa0 {
                "; it looks like Latin-1 (ISO 8859-1 or Windows-1252)"
            } else {
                ""
            };
            let place = at..at + '\u{fffd}'.len_utf8() * usize::from(length > 0);
            return Err(Box::new(Undecoded {
                text: String::from_utf8_lossy(bytes).into_owned(),
                problem: Problem::new(
                    &place,
                    format!("the byte 0x{odd:02x} is not UTF-8{looks}"),
                    Some("save the file as UTF-8".to_owned()),
                ),
            }));
        }
    };
    if let Some(at) = text.find('\0') {
        return Err(Box::new(Undecoded {
            text: text.to_owned(),
            problem: Problem::new(
                &(at..at + 1),
                "a NUL byte stands in the text".to_owned(),
                Some("take it out; if the file is full of them, it is no text".to_owned()),
            ),
        }));
    }
    Ok(Cow::Borrowed(text))
}

/// Bytes that are no text.
#[derive(Debug)]
pub struct Undecoded {
    /// What could be read of it, for drawing the place.
    pub text: String,
    /// What is wrong, and where in that text.
    pub problem: Problem,
}
