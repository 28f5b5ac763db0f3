//! The range of every result over all combinations, where there are several.

use super::column::Column;
use super::table::Table;
use super::words::title;
use super::{Layout, checks, largest, settled};
use crate::model::Name;
use crate::quantity::Style;
use crate::result::{Envelope, JobResult, Unit};
use std::io::{self, Write};

/// A result by its address with its largest and its least value and where they come from.
struct Range<'a> {
    of: &'a str,
    unit: Unit,
    most: Option<f64>,
    most_in: Option<&'a Name>,
    least: Option<f64>,
    least_in: Option<&'a Name>,
}

impl<'a> Range<'a> {
    fn of(row: &'a Envelope) -> Self {
        Range {
            of: &row.result,
            unit: row.unit,
            most: row.max,
            most_in: row.max_in.as_ref(),
            least: row.min,
            least_in: row.min_in.as_ref(),
        }
    }
}

/// Writes the ranges of an assembly: reactions and forces of members first, then what moves.
pub(super) fn write(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let is_assembly = job.combinations.iter().any(|each| !each.points.is_empty());
    if !is_assembly || job.combinations.len() < 2 {
        return Ok(());
    }
    let style = layout.style(job);
    let (reactions, rest): (Vec<Range>, Vec<Range>) = ranges(&job.envelope)
        .into_iter()
        .partition(|range| range.unit == Unit::Newton && !range.of.ends_with(FORCE));
    let (forces, movements): (Vec<Range>, Vec<Range>) = rest
        .into_iter()
        .partition(|range| range.unit == Unit::Newton);
    for (heading, rows) in [
        ("Reactions over all combinations", reactions),
        ("Member forces N over all combinations", forces),
        ("Movements over all combinations", movements),
    ] {
        if rows.is_empty() {
            continue;
        }
        writeln!(out)?;
        title(out, heading, '-', layout.width)?;
        table(&rows, &style).write(out, layout)?;
    }
    Ok(())
}

const FORCE: &str = ".force_max";

/// The rows of the envelope; the largest and the least force of a member come together.
fn ranges(envelope: &[Envelope]) -> Vec<Range<'_>> {
    let mut ranges: Vec<Range> = Vec::with_capacity(envelope.len());
    for row in envelope {
        match ranges.last_mut() {
            Some(last) if is_least_of(&row.result, last.of) => {
                (last.least, last.least_in) = (row.min, row.min_in.as_ref());
            }
            _ => ranges.push(Range::of(row)),
        }
    }
    ranges
}

/// Whether an address is that of the least force of the member whose largest has the other.
fn is_least_of(address: &str, largest: &str) -> bool {
    let member = largest.strip_suffix(FORCE);
    member.is_some() && member == address.strip_suffix(".force_min")
}

fn table(rows: &[Range], style: &Style) -> Table {
    let scale = |unit: Unit| {
        let same = rows.iter().filter(move |row| row.unit == unit);
        largest(same.flat_map(|row| [row.most, row.least]).flatten())
    };
    let scales = [Unit::Newton, Unit::Metre, Unit::Radian].map(|unit| (unit, scale(unit)));
    let value = |value: Option<f64>, unit: Unit| match value {
        Some(value) => {
            let scale = scales.iter().find(|(known, _)| *known == unit);
            checks::value(
                style,
                unit,
                settled(value, scale.map_or(0.0, |scale| scale.1)),
            )
        }
        None => "undecided".to_owned(),
    };
    let name = |name: Option<&Name>| name.map_or(String::new(), |name| name.to_string());
    Table::of([Column::names(
        "result",
        rows.iter()
            .map(|row| row.of.strip_suffix(FORCE).unwrap_or(row.of)),
    )])
    .block([
        Column::number(
            "largest",
            None,
            rows.iter().map(|row| value(row.most, row.unit)),
        ),
        Column::combinations(rows.iter().map(|row| name(row.most_in))).headed_as("in combination"),
        Column::number(
            "least",
            None,
            rows.iter().map(|row| value(row.least, row.unit)),
        ),
        Column::combinations(rows.iter().map(|row| name(row.least_in))).headed_as("in combination"),
        Column::words("unit", rows.iter().map(|row| checks::unit(style, row.unit))),
    ])
}
