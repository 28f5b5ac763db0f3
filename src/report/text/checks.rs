//! Tables of checks, and the warnings at the head of a report.

use super::table::{Column, Table};
use super::words::{paint, printable, title, verdict, wrapped};
use super::{Layout, number, ratio, with_unit};
use crate::model::{AreaUsed, Name};
use crate::quantity::{Dimension, Length, Measure, Style, from_si};
use crate::result::{CheckResult, Governing, JobResult, Unit, Verdict};
use std::io::{self, Write};

/// A stress this close under its limit is named at the head of the report.
const NEAR: f64 = 0.95;

/// What a row of either kind of check says.
struct Row<'a> {
    check: &'a Name,
    on: &'a Name,
    combination: Option<&'a Name>,
    at: Option<f64>,
    area: Option<AreaUsed>,
    demand: f64,
    limit: f64,
    unit: Unit,
    utilisation: Option<f64>,
    status: Verdict,
    source: Option<&'a Name>,
    line: usize,
}

impl<'a> From<&'a CheckResult> for Row<'a> {
    fn from(check: &'a CheckResult) -> Self {
        Row {
            check: &check.check,
            on: &check.on,
            combination: None,
            at: check.at,
            area: check.area,
            demand: check.demand,
            limit: check.limit,
            unit: check.unit,
            utilisation: check.utilisation,
            status: check.status,
            source: check.source.as_ref(),
            line: check.line,
        }
    }
}

impl<'a> From<&'a Governing> for Row<'a> {
    fn from(check: &'a Governing) -> Self {
        Row {
            check: &check.check,
            on: &check.on,
            combination: Some(&check.combination),
            at: check.at,
            area: check.area,
            demand: check.demand,
            limit: check.limit,
            unit: check.unit,
            utilisation: check.utilisation,
            status: check.status,
            source: check.source.as_ref(),
            line: check.line,
        }
    }
}

/// Writes a warning line for every stress over its limit or near it, once for each place.
pub(super) fn write_warnings(
    out: &mut dyn Write,
    job: &JobResult,
    layout: &Layout,
) -> io::Result<()> {
    let style = layout.style(job);
    for check in job.governing.iter().filter(|check| is_warned_of(check)) {
        let place = match check.at {
            Some(at) => format!(
                "{} at {}",
                check.on,
                with_unit::<Length>(&style, from_si(at))
            ),
            None => check.on.to_string(),
        };
        let word = paint("warning", layout.colour);
        let ratio = match check.utilisation {
            Some(_) => format!("ratio {}", ratio(&style, check.utilisation)),
            None => "where none is allowed".to_owned(),
        };
        let text = format!(
            "{place}, combination {}: {} of {} against {} allowable, {ratio}",
            check.combination,
            check.check,
            style.quantity(Dimension::Stress, check.demand),
            style.quantity(Dimension::Stress, check.limit),
        );
        write!(out, "{word}")?;
        wrapped_after_word(out, &text, layout)?;
    }
    Ok(())
}

/// The text after a word that is already written and may hold colour codes.
fn wrapped_after_word(out: &mut dyn Write, text: &str, layout: &Layout) -> io::Result<()> {
    const WORD: usize = "warning".len();
    let mut lines = Vec::new();
    wrapped(
        &mut lines,
        &" ".repeat(super::heading::LABEL),
        text,
        layout.width,
    )?;
    out.write_all(lines.get(WORD..).unwrap_or_default())
}

fn is_warned_of(check: &Governing) -> bool {
    matches!(&*check.check, "tension" | "compression")
        && (check.status == Verdict::Fail || check.utilisation.is_some_and(|used| used >= NEAR))
}

/// Writes the largest utilisation of every check over all combinations.
pub(super) fn write_governing(
    out: &mut dyn Write,
    job: &JobResult,
    layout: &Layout,
) -> io::Result<()> {
    if job.governing.is_empty() {
        return Ok(());
    }
    writeln!(out)?;
    title(out, "Governing checks", '-', layout.width)?;
    let rows: Vec<Row> = job.governing.iter().map(Row::from).collect();
    write_rows(out, &rows, &layout.style(job), layout)
}

/// Writes the checks of one combination.
pub(super) fn write_checks(
    out: &mut dyn Write,
    checks: &[CheckResult],
    style: &Style,
    layout: &Layout,
) -> io::Result<()> {
    title(out, "Checks", '-', layout.width)?;
    let rows: Vec<Row> = checks.iter().map(Row::from).collect();
    write_rows(out, &rows, style, layout)
}

fn write_rows(out: &mut dyn Write, rows: &[Row], style: &Style, layout: &Layout) -> io::Result<()> {
    let combination = rows
        .iter()
        .map(|row| row.combination.map_or("", |name| name));
    let at = rows.iter().map(|row| {
        let at = row.at.map(|at| number::<Length>(style, from_si(at)));
        at.unwrap_or_default()
    });
    let area = rows.iter().map(|row| match row.area {
        Some(AreaUsed::Gross) => "gross",
        Some(AreaUsed::Net) => "net",
        None => "",
    });
    let demand = rows.iter().map(|row| value(style, row.unit, row.demand));
    let limit = rows.iter().map(|row| value(style, row.unit, row.limit));
    let used = rows.iter().map(|row| ratio(style, row.utilisation));
    let source = rows
        .iter()
        .map(|row| printable(row.source.map_or("", |name| name)));
    Table::of([
        Column::text("check", rows.iter().map(|row| row.check)),
        Column::text("on", rows.iter().map(|row| row.on)),
    ])
    .block([
        Column::text("combination", combination),
        Column::number("demand", None, demand),
        Column::number("limit", None, limit),
        Column::text("unit", rows.iter().map(|row| unit(style, row.unit))),
        Column::number("utilisation", None, used),
        Column::verdicts(rows.iter().map(|row| verdict(row.status))),
    ])
    .block([
        Column::number("at", Some(style.unit(Length::DIMENSION)), at),
        Column::text("area", area),
        Column::number("line", None, rows.iter().map(|row| row.line.to_string())),
        Column::text("source", source),
    ])
    .write(out, layout)
}

/// The dimension behind a unit; none for yes and no.
pub(super) fn dimension(unit: Unit) -> Option<Dimension> {
    match unit {
        Unit::Pascal => Some(Dimension::Stress),
        Unit::Newton => Some(Dimension::Force),
        Unit::Metre => Some(Dimension::Length),
        Unit::None => None,
    }
}

fn value(style: &Style, unit: Unit, si: f64) -> String {
    match dimension(unit) {
        Some(dimension) => style.number(dimension, si),
        None if si == 0.0 => "no".to_owned(),
        None => "yes".to_owned(),
    }
}

fn unit(style: &Style, unit: Unit) -> &'static str {
    dimension(unit).map_or("", |dimension| style.unit(dimension))
}
