//! What is wrong with a job file, and where.

use crate::model::{Name, Place};

/// One fault of a job file, with its place and what to write instead.
#[derive(Debug, Clone, PartialEq)]
pub struct Problem {
    /// What it is about: a range of bytes of the text.
    pub place: Place,
    /// What is wrong, in one sentence without a full stop.
    pub message: String,
    /// What to write instead, where that can be said.
    pub help: Option<String>,
    /// The combination that it belongs to, for one that cannot be solved.
    pub combination: Option<Name>,
}

impl Problem {
    /// A problem at a place, with its remedy.
    ///
    /// Names of the job in the sentences are cut where they are very long, and control characters
    /// in them replaced, since a message ends on a terminal.
    pub fn new(place: &Place, message: String, help: Option<String>) -> Self {
        Problem {
            place: place.clone(),
            message: legible(message),
            help: help.map(legible),
            combination: None,
        }
    }
}

/// A name in a message may have as many bytes, and a message outside of names.
const NAME: usize = 64;
const SENTENCE: usize = 800;

/// A sentence that fits on a screen.
fn legible(sentence: String) -> String {
    let has_control = sentence.chars().any(char::is_control);
    if sentence.len() <= NAME && !has_control {
        return sentence;
    }
    let mut out = String::with_capacity(sentence.len().min(SENTENCE));
    for (index, part) in sentence.split('`').enumerate() {
        if index > 0 {
            out.push('`');
        }
        let (room, is_name) = (SENTENCE - out.len().min(SENTENCE), index % 2 == 1);
        let room = if is_name { room.min(NAME) } else { room };
        let cut = part.len() > room;
        let end = (0..=room.min(part.len()))
            .rev()
            .find(|&end| part.is_char_boundary(end));
        let kept = &part[..end.unwrap_or(0)];
        out.extend(
            kept.chars()
                .map(|c| if c.is_control() { '\u{fffd}' } else { c }),
        );
        if cut {
            out.push('…');
        }
        if out.len() >= SENTENCE {
            break;
        }
    }
    out
}

/// What a finding rests on, and so whether a fault of the syntax elsewhere may have caused it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum RestsOn {
    /// The value itself.
    Itself,
    /// This key is missing in the table that stands at the place; `""` for one of several.
    Lacks(&'static str),
    /// Nothing of this name is in tables of this root (`case`, `material`, `member` …).
    Tables(&'static str),
}

/// With more faults of the syntax than this a text is no job yet, and they alone are told.
const MANY: usize = 200;

/// The findings of a run, in the order in which they were made.
#[derive(Debug, Default)]
pub(crate) struct Problems {
    found: Vec<(Problem, RestsOn)>,
    /// Unknown keys: the table, and the key that is meant.
    misspelt: Vec<(Place, &'static str)>,
    /// The roots whose tables are there but cannot be read.
    lost: Vec<&'static str>,
}

impl Problems {
    /// Something wrong with what stands at the place.
    pub(crate) fn say(&mut self, place: &Place, message: impl Into<String>, help: impl Into<Help>) {
        self.push(place, message.into(), help.into(), RestsOn::Itself);
    }

    /// A key that the table at the place lacks, `""` for one of several. Left out where the table
    /// has a misspelling of it.
    pub(crate) fn missing(
        &mut self,
        key: &'static str,
        place: &Place,
        message: impl Into<String>,
        help: impl Into<Help>,
    ) {
        self.push(place, message.into(), help.into(), RestsOn::Lacks(key));
    }

    /// Takes note of a key that the table at the place does not have, and of the one that is meant
    /// by it in all likelihood.
    pub(crate) fn misspelt(&mut self, table: &Place, meant: Option<&'static str>) {
        self.misspelt.push((table.clone(), meant.unwrap_or("")));
    }

    /// Takes note that nothing can be said about which tables this root has.
    pub(crate) fn lost(&mut self, root: &'static str) {
        self.lost.push(root);
    }

    /// A name that no table of this root defines.
    pub(crate) fn unknown(
        &mut self,
        root: &'static str,
        place: &Place,
        message: impl Into<String>,
        help: impl Into<Help>,
    ) {
        self.push(place, message.into(), help.into(), RestsOn::Tables(root));
    }

    fn push(&mut self, place: &Place, message: String, help: Help, rests_on: RestsOn) {
        self.found
            .push((Problem::new(place, message, help.0), rests_on));
    }

    /// Whether nothing was found.
    pub(crate) fn is_empty(&self) -> bool {
        self.found.is_empty()
    }

    /// All findings with those of the syntax, in the order of the text, each once. What the syntax
    /// may have caused is left out.
    pub(crate) fn with_syntax(self, syntax: Vec<Problem>, text: &str) -> Vec<Problem> {
        if syntax.len() > MANY {
            return sorted(syntax);
        }
        let broken: Vec<Broken> = syntax.iter().map(|p| Broken::at(&p.place, text)).collect();
        let (misspelt, lost) = (&self.misspelt, &self.lost);
        let own = self.found.into_iter().filter(|(problem, rests_on)| {
            !is_misspelt(misspelt, &problem.place, *rests_on)
                && !matches!(rests_on, RestsOn::Tables(root) if lost.contains(root))
                && !broken
                    .iter()
                    .any(|broken| broken.may_cause(&problem.place, *rests_on, text))
        });
        sorted(own.map(|(problem, _)| problem).chain(syntax).collect())
    }
}

/// In the order of the text, each once.
fn sorted(mut all: Vec<Problem>) -> Vec<Problem> {
    all.sort_by(|a, b| {
        (a.place.start, a.place.end, &a.message).cmp(&(b.place.start, b.place.end, &b.message))
    });
    all.dedup_by(|a, b| a.place == b.place && a.message == b.message);
    all
}

/// Keys that a table may also take from `[default]` or `[job]`.
const SHARED: [&str; 3] = ["material", "runs", "datum"];

/// Whether what is missing is there under a misspelt key.
fn is_misspelt(misspelt: &[(Place, &'static str)], place: &Place, rests_on: RestsOn) -> bool {
    let RestsOn::Lacks(key) = rests_on else {
        return false;
    };
    misspelt.iter().any(|(table, meant)| {
        let same = table == place && (key.is_empty() || *meant == key);
        same || SHARED.contains(&key) && *meant == key
    })
}

/// The optional remedy of a problem.
pub(crate) struct Help(Option<String>);

impl From<&str> for Help {
    fn from(text: &str) -> Self {
        Help((!text.is_empty()).then(|| text.to_owned()))
    }
}

impl From<String> for Help {
    fn from(text: String) -> Self {
        Help((!text.is_empty()).then_some(text))
    }
}

impl From<Option<String>> for Help {
    fn from(text: Option<String>) -> Self {
        Help(text)
    }
}

/// The surroundings of a fault of the syntax.
struct Broken<'t> {
    /// The lines that it touches.
    lines: Place,
    /// The block of lines from the header above it to the next one.
    block: Place,
    /// The first name of the block's header, `""` above the first one; `None` where the header
    /// itself is at fault.
    root: Option<&'t str>,
}

impl<'t> Broken<'t> {
    fn at(place: &Place, text: &'t str) -> Self {
        let lines = lines_of(place, text);
        let is_header = |line: &str| line.trim_start().starts_with('[');
        let mut block = lines.clone();
        let mut root = None;
        if !is_header(&text[lines.clone()]) {
            block.start = 0;
            root = Some("");
            let mut end = lines.start;
            while end > 0 {
                let start = text[..end - 1].rfind('\n').map_or(0, |at| at + 1);
                let line = &text[start..end];
                if is_header(line) {
                    block.start = start;
                    let name = line.trim_start().trim_start_matches('[').trim_start();
                    root = name.split(['.', ']', ' ']).next();
                    break;
                }
                end = start;
            }
        }
        while block.end < text.len() {
            let end = lines_of(&(block.end + 1..block.end + 1), text).end;
            if is_header(&text[(block.end + 1).min(end)..end]) {
                break;
            }
            block.end = end;
        }
        Broken { lines, block, root }
    }

    fn may_cause(&self, place: &Place, rests_on: RestsOn, text: &str) -> bool {
        let lines = lines_of(place, text);
        if self.root.is_none() && self.block.contains(&place.start) {
            return true; // without its header nobody knows what this table is
        }
        if lines.start <= self.lines.end && self.lines.start <= lines.end {
            return true;
        }
        match rests_on {
            RestsOn::Itself => false,
            RestsOn::Lacks(_) => self.block.contains(&place.start) || self.root.is_none(),
            RestsOn::Tables(root) => self
                .root
                .is_none_or(|broken| broken.is_empty() || broken == root),
        }
    }
}

/// From the head of the first line of a place to the end of its last, without the line break.
fn lines_of(place: &Place, text: &str) -> Place {
    let mut start = place.start.min(text.len());
    while !text.is_char_boundary(start) {
        start -= 1;
    }
    let mut end = place.end.clamp(start, text.len());
    while !text.is_char_boundary(end) {
        end += 1;
    }
    let head = text[..start].rfind('\n').map_or(0, |at| at + 1);
    let tail = text[end..].find('\n').map_or(text.len(), |at| end + at);
    head..tail
}
