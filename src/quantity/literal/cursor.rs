//! The place in a literal up to which it has been read.

use std::ops::Range;

/// The sign before a number.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Sign {
    Plus,
    Minus,
}

/// What is left of a literal. Copying it is looking ahead.
#[derive(Debug, Clone, Copy)]
pub(super) struct Cursor<'t> {
    pub(super) text: &'t str,
    pub(super) rest: &'t str,
}

impl<'t> Cursor<'t> {
    pub(super) fn new(text: &'t str) -> Self {
        Cursor { text, rest: text }
    }

    /// How many bytes have been read.
    pub(super) fn at(&self) -> usize {
        self.text.len() - self.rest.len()
    }

    /// What was read since `start`.
    pub(super) fn since(&self, start: usize) -> &'t str {
        self.text.get(start..self.at()).unwrap_or("")
    }

    /// The next byte.
    pub(super) fn peek(&self) -> Option<u8> {
        self.rest.as_bytes().first().copied()
    }

    /// Whether a digit comes next.
    pub(super) fn on_digit(&self) -> bool {
        self.peek().is_some_and(|byte| byte.is_ascii_digit())
    }

    /// Whether nothing is left.
    pub(super) fn is_done(&self) -> bool {
        self.rest.is_empty()
    }

    /// Reads `what` if it comes next.
    pub(super) fn take(&mut self, what: &str) -> bool {
        match self.rest.strip_prefix(what) {
            Some(rest) => {
                self.rest = rest;
                true
            }
            None => false,
        }
    }

    /// Reads the first of these that comes next.
    pub(super) fn take_any(&mut self, what: &[&str]) -> bool {
        what.iter().any(|mark| self.take(mark))
    }

    /// Reads over blanks, the unbreakable and the narrow ones of typesetting among them; whether
    /// there was one.
    pub(super) fn blanks(&mut self) -> bool {
        if !matches!(self.peek(), Some(b' ' | b'\t' | 0x80..)) {
            return false;
        }
        let before = self.rest.len();
        self.rest = self
            .rest
            .trim_start_matches([' ', '\t', '\u{a0}', '\u{2009}', '\u{202f}']);
        self.rest.len() < before
    }

    /// Reads a sign if one comes next.
    pub(super) fn sign(&mut self) -> Option<Sign> {
        if self.take("+") {
            Some(Sign::Plus)
        } else if self.take("-") || self.take("−") {
            Some(Sign::Minus)
        } else {
            None
        }
    }

    /// The bytes of the word that comes next, for an error: up to a blank, 32 characters at the
    /// most; empty at the end.
    pub(super) fn word_at(&self) -> Range<usize> {
        let length = self
            .rest
            .char_indices()
            .take(32)
            .take_while(|&(_, c)| !c.is_whitespace())
            .map(|(at, c)| at + c.len_utf8())
            .last();
        // A blank that is none of ours (a line break) is a fault by itself.
        let length = length.or_else(|| self.rest.chars().next().map(char::len_utf8));
        self.at()..self.at() + length.unwrap_or(0)
    }

    /// The text of a range for a message, control characters made visible.
    pub(super) fn quote(&self, at: &Range<usize>) -> String {
        let text = self.text.get(at.clone()).unwrap_or("");
        text.chars()
            .map(|c| if c.is_control() { '\u{fffd}' } else { c })
            .collect()
    }
}
