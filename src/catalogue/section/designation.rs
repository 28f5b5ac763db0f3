//! Designations of threads, looked up in the series of their standards.

use super::thread::{StiffnessArea, Thread, ThreadForm};
use crate::catalogue::library::THREADS;
use crate::quantity::from_si;
use serde::Deserialize;
use std::fmt::Display;
use std::sync::OnceLock;

/// Why a text is no thread of the series.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
#[error("{message}")]
pub struct ThreadError {
    /// What is wrong, one sentence without a full stop.
    pub message: String,
    /// What to write instead: the nearest of the series.
    pub help: String,
}

/// `threads.toml`.
#[derive(Debug, Deserialize)]
struct Series {
    metric: Metric,
    unified: Unified,
}

/// Diameters and pitches in millimetres.
#[derive(Debug, Deserialize)]
struct Metric {
    /// Diameter and pitch.
    coarse: Vec<(f64, f64)>,
    /// Diameter, then pitches.
    fine: Vec<Vec<f64>>,
}

/// Sizes and threads per inch.
#[derive(Debug, Deserialize)]
#[serde(rename_all = "UPPERCASE")]
struct Unified {
    unc: Vec<(String, f64)>,
    unf: Vec<(String, f64)>,
    un: Vec<(String, f64)>,
}

/// The series, read when the first thread is; empty only if the shipped file did not parse, which
/// the tests rule out.
fn series() -> &'static Series {
    static SERIES: OnceLock<Series> = OnceLock::new();
    SERIES.get_or_init(|| {
        toml::from_str(THREADS).unwrap_or(Series {
            metric: Metric {
                coarse: Vec::new(),
                fine: Vec::new(),
            },
            unified: Unified {
                unc: Vec::new(),
                unf: Vec::new(),
                un: Vec::new(),
            },
        })
    })
}

impl Thread {
    /// The thread with this designation, by ISO 261 or ASME B1.1, with its stiffness on the tensile
    /// stress area.
    ///
    /// `M24` has the coarse pitch, `M24x2` (also `×`, `X`, with spaces) a fine one. `3/4-10 UNC`,
    /// `1-1/4-7 UNC`, `1 1/4-8 UN`, `#10-24 UNC`, `No. 10-32 UNF` and decimal sizes are Unified.
    /// What the series do not hold is refused with the nearest that they do.
    pub fn parse(text: &str) -> Result<Thread, ThreadError> {
        let trimmed = text.trim();
        match trimmed.strip_prefix(['M', 'm']) {
            Some(rest) => metric(trimmed, rest),
            None => unified(trimmed),
        }
    }
}

fn metric(text: &str, rest: &str) -> Result<Thread, ThreadError> {
    let mut parts = rest.split(['x', 'X', '×', '*']).map(decimal);
    let (diameter, pitch) = match (parts.next(), parts.next(), parts.next()) {
        (Some(Some(diameter)), None, None) => (diameter, None),
        (Some(Some(diameter)), Some(Some(pitch)), None) => (diameter, Some(pitch)),
        _ => return Err(no_designation(text)),
    };
    let Metric { coarse, fine } = &series().metric;
    let coarse_pitch = coarse
        .iter()
        .find(|(d, _)| *d == diameter)
        .map(|&(_, pitch)| pitch);
    let fine_pitches = fine
        .iter()
        .find(|row| row.first() == Some(&diameter))
        .map_or(&[][..], |row| &row[1..]);
    let known = coarse_pitch.is_some() || !fine_pitches.is_empty();
    let found = match pitch {
        None => coarse_pitch,
        Some(pitch) => {
            (coarse_pitch == Some(pitch) || fine_pitches.contains(&pitch)).then_some(pitch)
        }
    };
    if let Some(pitch) = found {
        return Ok(Thread {
            nominal: from_si(diameter / 1000.0),
            pitch: from_si(pitch / 1000.0),
            form: ThreadForm::Metric,
            stiffness_area: StiffnessArea::default(),
        });
    }
    Err(if known {
        let coarse = coarse_pitch.map(|pitch| format!("M{diameter} (pitch {pitch} mm)"));
        let fine = fine_pitches
            .iter()
            .map(|pitch| format!("M{diameter}x{pitch}"));
        ThreadError {
            message: match pitch {
                Some(pitch) => format!("ISO 261 has no pitch of {pitch} mm for M{diameter}"),
                None => format!("M{diameter} has no coarse pitch in ISO 261"),
            },
            help: format!("write {}", either(coarse.into_iter().chain(fine))),
        }
    } else {
        let diameters = coarse
            .iter()
            .map(|&(d, _)| d)
            .chain(fine.iter().filter_map(|row| row.first().copied()));
        ThreadError {
            message: format!("ISO 261 has no thread of {diameter} mm from M1.6 to M100"),
            help: format!(
                "near it are {}",
                listed(nearest(diameters, diameter).map(|d| format!("M{d}")))
            ),
        }
    })
}

fn unified(text: &str) -> Result<Thread, ThreadError> {
    let Unified { unc, unf, un } = &series().unified;
    let upper = text.to_ascii_uppercase();
    let (rest, name, rows) = [("UNC", unc), ("UNF", unf), ("UN", un)]
        .into_iter()
        .find_map(|(name, rows)| upper.strip_suffix(name).map(|rest| (rest, name, rows)))
        .ok_or_else(|| no_designation(text))?;
    let (size, threads) = rest.rsplit_once('-').ok_or_else(|| no_designation(text))?;
    let threads = decimal(threads).ok_or_else(|| no_designation(text))?;
    let diameter = inches(size).ok_or_else(|| no_designation(text))?;

    let of_size = |(size, _): &&(String, f64)| inches(size) == Some(diameter);
    let row = rows.iter().find(of_size);
    if row.is_some_and(|&(_, n)| n == threads) {
        return Ok(Thread {
            nominal: from_si(diameter * 0.0254),
            pitch: from_si(0.0254 / threads),
            form: ThreadForm::Unified,
            stiffness_area: StiffnessArea::default(),
        });
    }
    let number_size = format!("#{}", size.trim());
    let others = [("UNC", unc), ("UNF", unf), ("UN", un)];
    Err(
        if rows
            .iter()
            .any(|(size, n)| *size == number_size && *n == threads)
        {
            ThreadError {
                message: format!("{} in is no size of the {name} series", size.trim()),
                help: format!("write the number size as {number_size}-{threads} {name}"),
            }
        } else if others
            .iter()
            .any(|(_, rows)| rows.iter().any(|row| of_size(&row)))
        {
            let right = others.iter().flat_map(|(name, rows)| {
                rows.iter()
                    .filter(of_size)
                    .map(move |row| designation(row, name))
            });
            ThreadError {
                message: format!(
                    "ASME B1.1 has no {threads} threads per inch for {} in its {name} series",
                    size.trim()
                ),
                help: format!("write {}", either(right)),
            }
        } else {
            let sizes = rows.iter().filter_map(|(size, _)| inches(size));
            let near = nearest(sizes, diameter).filter_map(|near| {
                rows.iter()
                    .find(|(size, _)| inches(size) == Some(near))
                    .map(|row| designation(row, name))
            });
            ThreadError {
                message: format!(
                    "{} is no size of the {name} series of ASME B1.1",
                    size.trim()
                ),
                help: format!("near it are {}", listed(near)),
            }
        },
    )
}

fn designation((size, threads): &(String, f64), name: &str) -> String {
    format!("{size}-{threads} {name}")
}

fn no_designation(text: &str) -> ThreadError {
    let shown = match text.char_indices().nth(40) {
        Some((end, _)) => format!("{}…", &text[..end]),
        None => text.to_owned(),
    };
    ThreadError {
        message: format!("\"{shown}\" is no designation of a thread"),
        help: "write one such as \"M24\", \"M24x2\", \"3/4-10 UNC\", \"1-1/4-8 UN\" or \
               \"#10-24 UNC\", without a tolerance class"
            .to_owned(),
    }
}

/// A plain decimal number above 0, as pitches and diameters are written.
fn decimal(text: &str) -> Option<f64> {
    let text = text.trim();
    let plain = text.len() <= 12
        && text
            .bytes()
            .all(|byte| byte.is_ascii_digit() || byte == b'.');
    plain
        .then(|| text.parse::<f64>().ok())
        .flatten()
        .filter(|&value| value > 0.0)
}

/// The diameter of a Unified size in inches: `3/4`, `1-1/4`, `1 1/4`, `0.750`, `#10`, `NO. 10`.
fn inches(size: &str) -> Option<f64> {
    let size = size.trim();
    let number = size
        .strip_prefix('#')
        .or_else(|| size.strip_prefix("NO."))
        .or_else(|| size.strip_prefix("NO"));
    if let Some(number) = number {
        // Number sizes step by 0.013 in from 0.060 in for No. 0; in thousandths so that decimal
        // sizes meet them.
        let number: u16 = number.trim().parse().ok()?;
        return (number <= 12).then(|| f64::from(60 + 13 * number) / 1000.0);
    }
    let (whole, part) = match size.split_once(['-', ' ']) {
        Some((whole, part)) => (decimal(whole)?, part),
        None if size.contains('/') => (0.0, size),
        None => return decimal(size),
    };
    let (above, below) = part.split_once('/')?;
    Some(whole + decimal(above)? / decimal(below)?)
}

/// Up to two values on either side, in rising order.
fn nearest(values: impl Iterator<Item = f64>, to: f64) -> impl Iterator<Item = f64> {
    let mut values: Vec<f64> = values.collect();
    values.sort_by(f64::total_cmp);
    values.dedup();
    let above = values.partition_point(|&value| value < to);
    let window = above.saturating_sub(2)..(above + 2).min(values.len());
    values.drain(window).collect::<Vec<_>>().into_iter()
}

/// `a, b or c`.
fn either(items: impl Iterator<Item = impl Display>) -> String {
    joined(items, " or ")
}

/// `a, b and c`.
fn listed(items: impl Iterator<Item = impl Display>) -> String {
    joined(items, " and ")
}

fn joined(items: impl Iterator<Item = impl Display>, last: &str) -> String {
    let items: Vec<String> = items.map(|item| item.to_string()).collect();
    match items.split_last() {
        Some((end, [])) => end.clone(),
        Some((end, before)) => format!("{}{last}{end}", before.join(", ")),
        None => String::new(),
    }
}
