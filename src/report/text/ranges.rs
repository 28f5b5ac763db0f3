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

    /// Whether it is 0 in every combination, what rounding leaves beside `scale` counted as that.
    fn is_nothing_beside(&self, scale: f64) -> bool {
        let is_nothing = |value: Option<f64>| value.is_some_and(|si| settled(si, scale) == 0.0);
        is_nothing(self.most) && is_nothing(self.least)
    }
}

/// Writes the ranges of an assembly: reactions and forces of members first, then what moves.
pub(super) fn write(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let is_assembly = job.combinations.iter().any(|each| !each.points.is_empty());
    if !is_assembly || job.combinations.len() < 2 {
        return Ok(());
    }
    let style = layout.style(job);
    let held_once = held_once(job);
    let ranges = ranges(&job.envelope).into_iter();
    let told = |range: &Range| !held_once.contains(point_of_reaction(range.of));
    let kinds = ranges.filter(told).map(|range| (kind(&range), range));
    let mut tables: [Vec<Range>; 4] = Default::default();
    for (kind, range) in kinds {
        tables[kind as usize].push(range);
    }
    let headings = [
        "Reactions over all combinations",
        "Member forces N over all combinations",
        "Movements over all combinations",
        "Rotations over all combinations",
    ];
    for (heading, mut rows) in headings.into_iter().zip(tables) {
        let all = rows.len();
        let scale = largest(rows.iter().flat_map(|row| [row.most, row.least]).flatten());
        rows.retain(|row| !row.is_nothing_beside(scale));
        let left_out = all - rows.len();
        if rows.is_empty() {
            continue;
        }
        writeln!(out)?;
        title(out, heading, '-', layout.width)?;
        table(&rows, scale, &style).write(out, layout)?;
        if left_out > 0 {
            let text = format!("Left out: {} 0 in all of them.", counted_are(left_out));
            wrapped(out, "", &text, layout.width)?;
        }
    }
    Ok(())
}

/// `1 that is`, `2 that are`.
fn counted_are(count: usize) -> String {
    let verb = if count == 1 { "is" } else { "are" };
    format!("{count} that {verb}")
}

const FORCE: &str = ".force_max";

/// The tables in their order.
#[derive(Clone, Copy)]
enum Kind {
    Reaction,
    Force,
    Movement,
    Rotation,
}

fn kind(range: &Range) -> Kind {
    match range.unit {
        Unit::Newton if range.of.ends_with(FORCE) => Kind::Force,
        Unit::Newton => Kind::Reaction,
        Unit::Radian => Kind::Rotation,
        _ => Kind::Movement,
    }
}

/// Points on which one hold alone acts: its reaction is that of the point, and is told once.
fn held_once(job: &JobResult) -> HashSet<&str> {
    let holds = job.combinations.first().map_or(&[][..], |each| &each.holds);
    let mut times: HashMap<&str, usize> = HashMap::new();
    for hold in holds {
        *times.entry(&hold.point).or_default() += 1;
    }
    let once = times.into_iter().filter(|(_, times)| *times == 1);
    once.map(|(point, _)| point).collect()
}

/// The point of `a.reaction.x`; of any other address nothing that is a point's name.
fn point_of_reaction(address: &str) -> &str {
    let point = address
        .rsplit_once('.')
        .and_then(|(reaction, _)| reaction.strip_suffix(".reaction"));
    point.unwrap_or_default()
}

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

/// A table of ranges of one unit.
fn table(rows: &[Range], scale: f64, style: &Style) -> Table {
    let unit = rows.first().map_or(Unit::None, |row| row.unit);
    let value = |value: Option<f64>| match value {
        Some(value) => checks::value(style, unit, settled(value, scale)),
        None => "undecided".to_owned(),
    };
    let name = |name: Option<&Name>| name.map_or(String::new(), |name| name.to_string());
    let shown_in = Some(checks::unit(style, unit));
    let address = |row: &Range| row.of.strip_suffix(FORCE).unwrap_or(row.of).to_owned();
    let most_in = rows.iter().map(|row| name(row.most_in));
    let least_in = rows.iter().map(|row| name(row.least_in));
    Table::of([Column::names("result", rows.iter().map(address))]).block([
        Column::number("largest", shown_in, rows.iter().map(|row| value(row.most))),
        Column::combinations(most_in).headed_as("in combination"),
        Column::number("least", shown_in, rows.iter().map(|row| value(row.least))),
        Column::combinations(least_in).headed_as("in combination"),
    ])
}
