//! The range of every result over all combinations, where there are several.

use super::column::Column;
use super::table::Table;
use super::words::{title, wrapped};
use super::{Layout, checks, largest, settled};
use crate::model::Name;
use crate::quantity::Style;
use crate::result::{Envelope, JobResult, Unit};
use std::collections::{HashMap, HashSet};
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
    let said_by_hold = points_of_one_hold(job);
    let is_said = |range: &Range| {
        let point = range.of.rsplit_once(REACTION).map(|(point, _)| point);
        point.is_some_and(|point| said_by_hold.contains(point))
    };
    let mut ranges = ranges(&job.envelope);
    ranges.retain(|range| !is_said(range));
    let (reactions, rest): (Vec<Range>, Vec<Range>) = ranges
        .into_iter()
        .partition(|range| range.unit == Unit::Newton && !range.of.ends_with(FORCE));
    let (forces, movements): (Vec<Range>, Vec<Range>) = rest
        .into_iter()
        .partition(|range| range.unit == Unit::Newton);
    let mut left_out = 0;
    for (heading, mut rows) in [
        ("Reactions over all combinations", reactions),
        ("Member forces N over all combinations", forces),
        ("Movements over all combinations", movements),
    ] {
        let scales = Scales::of(&rows);
        let all = rows.len();
        rows.retain(|row| !scales.is_nothing(row));
        left_out += all - rows.len();
        if rows.is_empty() {
            continue;
        }
        writeln!(out)?;
        title(out, heading, '-', layout.width)?;
        table(&rows, &scales, &style).write(out, layout)?;
    }
    if left_out > 0 {
        let text = format!(
            "Left out: {left_out} that are 0 in every combination. The CSV table `envelope` holds them all."
        );
        writeln!(out)?;
        wrapped(out, "", &text, layout.width)?;
    }
    Ok(())
}

/// The points that one hold holds: what all holds together put on them is what that one does, and
/// its own rows say it.
fn points_of_one_hold(job: &JobResult) -> HashSet<&str> {
    let mut times: HashMap<&str, usize> = HashMap::new();
    let first = job.combinations.first();
    for hold in first.iter().flat_map(|combination| &combination.holds) {
        *times.entry(&hold.point).or_default() += 1;
    }
    let once = times.into_iter().filter(|&(_, times)| times == 1);
    once.map(|(point, _)| point).collect()
}

/// The largest size of each unit in a table, beside which rounding shows as 0.
struct Scales([(Unit, f64); 3]);

impl Scales {
    fn of(rows: &[Range]) -> Self {
        let scale = |unit: Unit| {
            let same = rows.iter().filter(move |row| row.unit == unit);
            largest(same.flat_map(|row| [row.most, row.least]).flatten())
        };
        Scales([Unit::Newton, Unit::Metre, Unit::Radian].map(|unit| (unit, scale(unit))))
    }

    fn settled(&self, value: f64, unit: Unit) -> f64 {
        let scale = self.0.iter().find(|(known, _)| *known == unit);
        settled(value, scale.map_or(0.0, |scale| scale.1))
    }

    /// Whether a row is 0 in every combination.
    fn is_nothing(&self, row: &Range) -> bool {
        [row.most, row.least]
            .iter()
            .all(|value| value.is_some_and(|value| self.settled(value, row.unit) == 0.0))
    }
}

/// Of a watch.
const VALUE: &str = ".value";
const REACTION: &str = ".reaction.";
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

/// An address without the quantity that its table's heading names.
fn shown(address: &str) -> &str {
    let of_member = address.strip_suffix(FORCE);
    of_member
        .or_else(|| address.strip_suffix(VALUE))
        .unwrap_or(address)
}

fn table(rows: &[Range], scales: &Scales, style: &Style) -> Table {
    let value = |value: Option<f64>, unit: Unit| match value {
        Some(value) => checks::value(style, unit, scales.settled(value, unit)),
        None => "undecided".to_owned(),
    };
    let name = |name: Option<&Name>| name.map_or(String::new(), |name| name.to_string());
    Table::of([Column::names(
        "result",
        rows.iter().map(|row| shown(row.of)),
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
