//! Sound jobs, damaged in every way that comes to mind: each must end in errors with a place, or in
//! finite results that prove themselves.
//!
//! The damage is drawn from a generator with a fixed seed, so that a run is like every other.

#![allow(clippy::unwrap_used)] // of what the tests themselves read

use lengthwise::fuzzing;
use lengthwise::result::JobStatus;
use std::collections::BTreeMap;
use std::fs;
use std::ops::Range;
use std::panic::{AssertUnwindSafe, catch_unwind};
use std::path::Path;
use std::time::{Duration, Instant};

/// Of each job as many damaged ones are tried.
const OF_EACH: u64 = 500;
/// None may take longer; a sound job takes well under a millisecond.
const LONGEST: Duration = Duration::from_secs(2);

/// Numbers that a job may hold in place of its own.
const NUMBERS: &[&str] = &[
    "0",
    "-1",
    "1",
    "1e308",
    "-1e308",
    "1e-320",
    "5e-324",
    "1e400",
    "nan",
    "inf",
    "-inf",
    "-0.0",
    "1e15",
    "1e-15",
    "1e9",
    "0.1",
    "999999999999999999999",
    "1/3",
    "1/0",
    "2 ± 3",
    "1e",
];

/// Units that may stand in place of a job's own.
const UNITS: &[&str] = &[
    "mm", "m", "cm", "km", "in", "ft", "kN", "N", "MN", "kip", "lbf", "lb", "t", "tf", "kgf",
    "MPa", "GPa", "ksi", "psi", "N/mm2", "kN/mm", "lbf/in", "kN/m", "kg/m3", "kg/m", "/K", "/degF",
    "K", "degC", "degF", "deg", "rad", "%", "ue", "mm2", "cm2", "yield", "ultimate", "mN", "kN m",
];

/// Values that may stand in place of a whole value.
const VALUES: &[&str] = &[
    "true",
    "false",
    "\"\"",
    "[]",
    "{}",
    "[[]]",
    "[{}]",
    "1979-05-27",
    "\"fixed\"",
    "\"end\"",
    "\"start\"",
    "\"up\"",
    "\"level\"",
    "\"0 m\"",
    "\"-3 kN\"",
    "\"1e308 m\"",
    "\"1e-320 m\"",
    "0",
    "1",
    "-1",
    "1e308",
    "nan",
    "[0, 0]",
    "[1, 1, 1]",
    "[\"1 mm\", \"0 mm\"]",
    "[\"1 kN\", \"-1 kN\"]",
    "\"length / 1e-320\"",
    "\"length / 1e308\"",
    "\"1e308 yield\"",
    "{ dead = \"1 kN\" }",
    "\"+1e300 K\"",
    "\"0 K\"",
    "[0.0, 1.0]",
    "\"1e-300 MPa\"",
    "\"1e300 MPa\"",
    "\"1e-12 mm\"",
    "\"1e12 m\"",
];

/// A stream of numbers that looks random: splitmix64, of Steele, Lea and Flood (2014).
struct Draw(u64);

impl Draw {
    fn next(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e37_79b9_7f4a_7c15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
        z ^ (z >> 31)
    }

    /// A number below `end`, which is more than 0.
    fn below(&mut self, end: usize) -> usize {
        (self.next() % end as u64) as usize
    }

    fn one<'a, T>(&mut self, of: &'a [T]) -> &'a T {
        &of[self.below(of.len())]
    }
}

/// The stretches of a text that a kind of damage may hit.
struct Parts {
    lines: Vec<Range<usize>>,
    numbers: Vec<Range<usize>>,
    units: Vec<Range<usize>>,
    values: Vec<Range<usize>>,
    keys: Vec<Range<usize>>,
}

impl Parts {
    fn of(text: &str) -> Self {
        let mut parts = Parts {
            lines: Vec::new(),
            numbers: Vec::new(),
            units: Vec::new(),
            values: Vec::new(),
            keys: Vec::new(),
        };
        let mut at = 0;
        for line in text.split_inclusive('\n') {
            let here = at..at + line.len();
            at = here.end;
            let body = line.trim_end();
            if body.is_empty() || body.starts_with('#') {
                continue;
            }
            parts.lines.push(here.clone());
            if let Some((key, value)) = body.split_once('=') {
                parts
                    .keys
                    .push(here.start..here.start + key.trim_end().len());
                let from = here.start + body.len() - value.trim_start().len();
                parts.values.push(from..here.start + body.len());
            }
            parts.quoted(body, here.start);
        }
        parts
    }

    /// The numbers of a line, the units after them, and its texts.
    fn quoted(&mut self, line: &str, start: usize) {
        let is_number = |c: char| c.is_ascii_digit() || c == '.' || c == '_';
        let mut rest = line.char_indices().peekable();
        let mut quote = None;
        while let Some((at, c)) = rest.next() {
            if c == '"' {
                match quote.take() {
                    None => quote = Some(at),
                    Some(open) => self.values.push(start + open..start + at + 1),
                }
            }
            let fresh = !line[..at].ends_with(|c: char| c.is_alphanumeric());
            if c.is_ascii_digit() && fresh {
                let mut end = at + 1;
                while rest.next_if(|(_, c)| is_number(*c)).is_some() {
                    end += 1;
                }
                self.numbers.push(start + at..start + end);
                if let Some(unit) = line[end..].strip_prefix(' ') {
                    let long = unit.find(['"', ' ']).unwrap_or(unit.len());
                    self.units.push(start + end + 1..start + end + 1 + long);
                }
            }
        }
    }
}

/// A job damaged once to three times.
fn damaged(text: &str, draw: &mut Draw) -> Vec<u8> {
    let mut text = text.to_owned();
    for _ in 0..=draw.below(3) {
        let parts = Parts::of(&text);
        let kind = draw.below(12);
        if kind < 2 {
            let mut bytes = text.into_bytes();
            hit_bytes(&mut bytes, draw);
            match String::from_utf8(bytes) {
                Ok(still) => text = still,
                Err(broken) => return broken.into_bytes(),
            }
            continue;
        }
        let (place, put): (&Vec<_>, String) = match kind {
            2..=5 => (&parts.numbers, (*draw.one(NUMBERS)).to_owned()),
            6 => (&parts.units, (*draw.one(UNITS)).to_owned()),
            7 | 8 => (&parts.values, (*draw.one(VALUES)).to_owned()),
            9 => (&parts.values, some(&text, &parts.values, draw)),
            10 => (&parts.keys, some(&text, &parts.keys, draw)),
            _ => (&parts.lines, some(&text, &parts.lines, draw)),
        };
        if place.is_empty() {
            continue;
        }
        let place = draw.one(place).clone();
        match draw.below(8) {
            0 => drop(text.drain(place)),
            1 => text.insert_str(place.start, &put),
            _ => text.replace_range(place, &put),
        }
    }
    text.into_bytes()
}

fn some(text: &str, places: &[Range<usize>], draw: &mut Draw) -> String {
    if places.is_empty() {
        return String::new();
    }
    text[draw.one(places).clone()].to_owned()
}

/// Bytes taken out, doubled, swapped or put in place of others.
fn hit_bytes(bytes: &mut Vec<u8>, draw: &mut Draw) {
    let at = draw.below(bytes.len() + 1);
    let end = (at + 1 + draw.below(8)).min(bytes.len());
    match draw.below(5) {
        0 => drop(bytes.drain(at..end)),
        1 => {
            let again = bytes[at..end].to_vec();
            bytes.splice(at..at, again);
        }
        2 if at + 1 < bytes.len() => bytes.swap(at, at + 1),
        3 => bytes.truncate(at),
        _ => {
            let put = *draw.one(b"\0\xff\"'[]{}=.,#\n\r\t -+e09zZ\xc2\xb0");
            bytes.splice(at..end, [put]);
        }
    }
}

/// All jobs of the examples and of the published cases, by name.
fn jobs() -> BTreeMap<String, String> {
    let root = Path::new(env!("CARGO_MANIFEST_DIR"));
    let mut jobs = BTreeMap::new();
    for folder in ["examples", "tests/published"] {
        for entry in fs::read_dir(root.join(folder)).unwrap() {
            let path = entry.unwrap().path();
            if path
                .extension()
                .is_some_and(|extension| extension == "toml")
            {
                let name = path.file_name().unwrap().to_string_lossy().into_owned();
                jobs.insert(name, fs::read_to_string(&path).unwrap());
            }
        }
    }
    jobs
}

/// Why a job broke its promise, if it did.
fn broken(bytes: &[u8]) -> Option<String> {
    let begin = Instant::now();
    let outcome = catch_unwind(AssertUnwindSafe(|| fuzzing::job(bytes)));
    let took = begin.elapsed();
    match outcome {
        Err(panic) => Some(match panic.downcast_ref::<String>() {
            Some(text) => text.clone(),
            None => (*panic.downcast_ref::<&str>().unwrap_or(&"panicked")).to_owned(),
        }),
        Ok(()) if took > LONGEST => Some(format!("took {took:?}")),
        Ok(()) => None,
    }
}

#[test]
fn damaged_jobs_end_in_errors_or_in_proven_results() {
    let jobs = jobs();
    assert!(jobs.len() >= 40, "only {} jobs to damage", jobs.len());
    let of_each: u64 = std::env::var("MUTANTS").map_or(OF_EACH, |many| many.parse().unwrap());
    let (mut tried, mut looked_at, mut solved) = (0, 0, 0);
    let mut failures: BTreeMap<String, (usize, String)> = BTreeMap::new();
    for (number, (name, text)) in jobs.iter().enumerate() {
        let mut draw = Draw(number as u64);
        for _ in 0..of_each {
            let mutant = damaged(text, &mut draw);
            tried += 1;
            if tried % 10 == 0 {
                let result = lengthwise::check_bytes("job.toml", &mutant).result;
                looked_at += 1;
                solved += usize::from(result.status != JobStatus::Error);
            }
            if let Some(why) = broken(&mutant) {
                let shown = format!("{name}\n{}", String::from_utf8_lossy(&mutant));
                failures.entry(why).or_insert((0, shown)).0 += 1;
            }
        }
    }
    assert!(tried >= 20_000, "only {tried} were tried");
    // Damage that no job survives would try the reader alone, and damage that all survive nothing.
    // Few jobs of assemblies survive any: each name in them is said in several places.
    let of_a_hundred = 100 * solved / looked_at;
    assert!(
        (5..=60).contains(&of_a_hundred),
        "{of_a_hundred} % are solved"
    );
    let told: Vec<String> = failures
        .into_iter()
        .take(12)
        .map(|(why, (many, shown))| format!("{many} times: {why}\nfirst in {shown}"))
        .collect();
    assert!(told.is_empty(), "{}", told.join("\n────\n"));
}
