//! The tree straight from what the parser sees.

use super::{Content, Entry, Key, MANY, Table, Value, float, position, whole};
use crate::model::Place;
use std::borrow::Cow;
use std::vec::Drain;
use toml_parser::decoder::{Encoding, ScalarKind};
use toml_parser::parser::{EventReceiver, parse_document};
use toml_parser::{ErrorSink, ParseError, Raw, Source, Span};

/// What is nested deeper is left to `toml`, which knows where to stop.
const DEEPEST: usize = 16;

/// The tree of a text without faults. There is none where anything is wrong with the text, nor of
/// what is rare in jobs: keys with dots, a header after those of the tables in its own, deep
/// nesting.
pub(in crate::job) fn direct(text: &str) -> Option<Table<'_>> {
    let tokens = Source::new(text).lex().into_vec();
    let mut tree = Tree::new(text);
    let mut fault: Option<ParseError> = None;
    parse_document(&tokens, &mut tree, &mut fault);
    tree.close_header();
    (fault.is_none() && !tree.given_up).then_some(tree.root)
}

/// The tree as it grows.
struct Tree<'t> {
    text: &'t str,
    /// Whether the text has neither backslashes nor control characters but line feeds: what stands
    /// in quotes and comments then stands for itself.
    is_plain: bool,
    /// All tables that have been closed.
    root: Table<'t>,
    /// The header whose entries come, `None` above the first.
    header: Option<Header>,
    /// The keys of that header.
    path: Vec<Key<'t>>,
    /// Whether the keys that come are those of the header.
    in_header: bool,
    /// The inline tables and lists that stand open, from the outermost to the innermost.
    open: Vec<Open>,
    /// Keys without a value as yet, likewise.
    keys: Vec<Key<'t>>,
    /// The entries of the header's table, then those of the open inline tables.
    entries: Vec<Entry<'t>>,
    /// The values of the open lists.
    values: Vec<Value<'t>>,
    /// The text is not one for this way.
    given_up: bool,
}

/// `[member.H4]`, or `[[member.H4.segment]]`.
struct Header {
    place: Place,
    is_array: bool,
}

/// An inline table or list, the byte at which it begins, and the first of its entries or values.
struct Open {
    is_table: bool,
    start: usize,
    first: usize,
}

impl<'t> Tree<'t> {
    fn new(text: &'t str) -> Self {
        Tree {
            text,
            is_plain: is_plain(text),
            root: Table::default(),
            header: None,
            path: Vec::new(),
            in_header: false,
            open: Vec::new(),
            keys: Vec::with_capacity(8),
            entries: Vec::with_capacity(16),
            values: Vec::with_capacity(8),
            given_up: false,
        }
    }

    fn raw(&self, span: Span, encoding: Option<Encoding>) -> Raw<'t> {
        let text = self.text.get(span.start()..span.end());
        Raw::new_unchecked(text.unwrap_or_default(), encoding, span)
    }

    fn open_header(&mut self, span: Span, is_array: bool) {
        self.close_header();
        self.in_header = true;
        self.header = Some(Header {
            place: span.start()..span.end(),
            is_array,
        });
    }

    fn end_header(&mut self, span: Span) {
        self.in_header = false;
        if let Some(header) = &mut self.header {
            self.path.append(&mut self.keys);
            header.place.end = span.end();
        }
    }

    /// Puts the table of the header, whose entries are complete, where it belongs.
    fn close_header(&mut self) {
        if self.given_up {
            return; // the header may be of any depth
        }
        let Some(table) = Table::of(self.entries.drain(..).collect()) else {
            self.given_up = true;
            return;
        };
        match self.header.take() {
            None => self.root = table,
            Some(header) => {
                let added = self.root.add(header, self.path.drain(..), table);
                self.given_up |= added.is_none();
            }
        }
    }

    fn open(&mut self, span: Span, is_table: bool) -> bool {
        self.given_up |= self.open.len() == DEEPEST;
        if self.given_up {
            return false;
        }
        let first = if is_table {
            self.entries.len()
        } else {
            self.values.len()
        };
        self.open.push(Open {
            is_table,
            start: span.start(),
            first,
        });
        true
    }

    fn close(&mut self, span: Span) {
        let Some(open) = self.open.pop() else {
            return;
        };
        let content = if open.is_table {
            let Some(table) = Table::of(self.entries.drain(open.first..).collect()) else {
                self.given_up = true;
                return;
            };
            Content::Table(table)
        } else {
            Content::Array(self.values.drain(open.first..).collect())
        };
        self.put(Value {
            content,
            place: open.start..span.end(),
        });
    }

    /// Puts a complete value into the innermost list, or under its key in the innermost table.
    fn put(&mut self, value: Value<'t>) {
        let first = match self.open.last() {
            Some(open) if !open.is_table => return self.values.push(value),
            Some(open) => open.first,
            None => 0,
        };
        let Some(key) = self.keys.pop() else {
            self.given_up = true;
            return;
        };
        let table = &self.entries[first..];
        // Among many a key that stands twice is found when the table is complete.
        self.given_up |= table.len() < MANY && position(table, &key.name).is_some();
        if !self.given_up {
            self.entries.push(Entry { key, value });
        }
    }
}

impl EventReceiver for Tree<'_> {
    fn std_table_open(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.open_header(span, false);
    }

    fn std_table_close(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.end_header(span);
    }

    fn array_table_open(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.open_header(span, true);
    }

    fn array_table_close(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.end_header(span);
    }

    fn inline_table_open(&mut self, span: Span, _: &mut dyn ErrorSink) -> bool {
        self.open(span, true)
    }

    fn inline_table_close(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.close(span);
    }

    fn array_open(&mut self, span: Span, _: &mut dyn ErrorSink) -> bool {
        self.open(span, false)
    }

    fn array_close(&mut self, span: Span, _: &mut dyn ErrorSink) {
        self.close(span);
    }

    fn simple_key(&mut self, span: Span, encoding: Option<Encoding>, error: &mut dyn ErrorSink) {
        let raw = self.raw(span, encoding);
        let mut name = Cow::Borrowed(raw.as_str());
        if encoding.is_some() || !is_bare(&name) {
            raw.decode_key(&mut name, error);
        }
        let place = span.start()..span.end();
        self.keys.push(Key { name, place });
    }

    fn key_sep(&mut self, _: Span, _: &mut dyn ErrorSink) {
        self.given_up |= !self.in_header || self.keys.len() == DEEPEST;
    }

    fn scalar(&mut self, span: Span, encoding: Option<Encoding>, error: &mut dyn ErrorSink) {
        let raw = self.raw(span, encoding);
        let place = span.start()..span.end();
        if self.is_plain
            && encoding == Some(Encoding::BasicString)
            && let Some(text) = unquoted(raw.as_str())
        {
            let content = Content::String(Cow::Borrowed(text));
            return self.put(Value { content, place });
        }
        let mut text = Cow::Borrowed("");
        let content = match raw.decode_scalar(&mut text, error) {
            ScalarKind::String => Content::String(text),
            ScalarKind::Boolean(boolean) => Content::Boolean(boolean),
            ScalarKind::Float => Content::Number(float(&text)),
            ScalarKind::Integer(radix) => Content::Number(whole(&text, radix.value())),
            ScalarKind::DateTime => match text.parse() {
                Ok(datetime) => Content::Datetime(datetime),
                Err(_) => {
                    self.given_up = true;
                    return;
                }
            },
        };
        self.put(Value { content, place });
    }

    fn comment(&mut self, span: Span, error: &mut dyn ErrorSink) {
        if !self.is_plain {
            self.raw(span, None).decode_comment(error);
        }
    }

    fn newline(&mut self, span: Span, error: &mut dyn ErrorSink) {
        if !self.is_plain {
            self.raw(span, None).decode_newline(error);
        }
    }
}

impl<'t> Table<'t> {
    /// Puts a table where its header says, and makes those above it that are not there.
    fn add(
        &mut self,
        header: Header,
        mut path: Drain<'_, Key<'t>>,
        table: Table<'t>,
    ) -> Option<()> {
        let Header { place, is_array } = header;
        let key = path.next_back()?;
        let mut above = self;
        for key in path {
            above = above.below(key)?;
        }
        let value = Value {
            content: Content::Table(table),
            place: place.clone(),
        };
        match above.position(&key.name) {
            None if is_array => {
                let content = Content::Array(vec![value]);
                let value = Value { content, place };
                above.push(Entry { key, value });
                Some(())
            }
            None => {
                above.push(Entry { key, value });
                Some(())
            }
            Some(at) if is_array => match above.entries[at].under_a_header()? {
                Content::Array(tables) => {
                    tables.push(value);
                    Some(())
                }
                _ => None,
            },
            Some(_) => None,
        }
    }

    /// The table that a key on the way to another table stands for.
    fn below(&mut self, key: Key<'t>) -> Option<&mut Table<'t>> {
        let at = match self.position(&key.name) {
            Some(at) => at,
            None => {
                let value = Value {
                    content: Content::Table(Table::default()),
                    place: key.place.clone(),
                };
                self.push(Entry { key, value });
                self.entries.len() - 1
            }
        };
        match self.entries[at].under_a_header()? {
            Content::Table(table) => Some(table),
            Content::Array(tables) => match &mut tables.last_mut()?.content {
                Content::Table(table) => Some(table),
                _ => None,
            },
            _ => None,
        }
    }
}

impl<'t> Entry<'t> {
    /// What a header made, and others may add to: it begins no later than its name. What stands in
    /// brackets after the name is closed.
    fn under_a_header(&mut self) -> Option<&mut Content<'t>> {
        (self.value.place.start <= self.key.place.start).then_some(&mut self.value.content)
    }
}

/// Whether a text has neither backslashes nor control characters but line feeds. No byte ends the
/// search, since that way many are looked at at once.
fn is_plain(text: &str) -> bool {
    let fits = |byte: u8| (byte >= b' ' && byte != b'\\' && byte != 0x7f) || byte == b'\n';
    text.bytes().fold(true, |plain, byte| plain & fits(byte))
}

/// What stands between quotes.
fn unquoted(text: &str) -> Option<&str> {
    text.strip_prefix('"')?.strip_suffix('"')
}

/// Whether a key is one that needs no quotes.
fn is_bare(key: &str) -> bool {
    !key.is_empty() && key.bytes().all(|byte| BARE[usize::from(byte)])
}

/// The bytes of keys without quotes: letters, digits, `-` and `_`.
const BARE: [bool; 256] = {
    let mut bare = [false; 256];
    let mut byte: u8 = 0;
    while byte < 128 {
        bare[byte as usize] = byte.is_ascii_alphanumeric() || byte == b'-' || byte == b'_';
        byte += 1;
    }
    bare
};
