//! Tables of checks, and the warnings at the head of a report.

use super::column::Column;
use super::table::Table;
use super::words::{counted, paint, title, verdict, wrapped};
use super::{Layout, largest, number, ratio, settled, with_unit};
use crate::model::{AreaUsed, Name};
use crate::quantity::{Dimension, Length, Measure, Style, from_si};
use crate::result::{CheckResult, Governing, JobResult, JobStatus, Unit, Verdict};
use std::collections::{BTreeMap, BTreeSet, HashMap};
use std::io::{self, Write};

/// What a row of either kind of check says.
struct Row<'a> {
    check: String,
    on: &'a Name,
    combination: Option<&'a Name>,
    at: Option<f64>,
    area: Option<AreaUsed>,
    demand: f64,
    limit: f64,
    unit: Unit,
    utilisation: Option<f64>,
    status: Verdict,
    line: usize,
}

impl<'a> Row<'a> {
    fn of(check: &'a CheckResult) -> Self {
        Row {
            check: named(check),
            on: &check.on,
            combination: None,
            at: check.at,
            area: check.area,
            demand: check.demand,
            limit: check.limit,
            unit: check.unit,
            utilisation: check.utilisation,
            status: check.status,
            line: check.line,
        }
    }

    fn governing(job: &JobResult, check: &'a Governing) -> Self {
        Row {
            check: governing_name(job, check),
            on: &check.on,
            combination: Some(&check.combination),
            at: check.at,
            area: check.area,
            demand: check.demand,
            limit: check.limit,
            unit: check.unit,
            utilisation: check.utilisation,
            status: check.status,
            line: check.line,
        }
    }
}

/// The check's name, and of a gap which of its two limits it is held against: `gap min`.
fn named(check: &CheckResult) -> String {
    let is = |bound: &&str| {
        let value = check.details.get(*bound).and_then(|value| value.as_f64());
        value == Some(check.limit)
    };
    match ["min", "max"].iter().find(|bound| is(bound)) {
        Some(bound) => format!("{} {bound}", check.check),
        None => check.check.to_string(),
    }
}

/// The same of a governing check. Only that of a gap is looked for among the checks, so that the
/// cost of a report stays in line with their number.
pub(super) fn governing_name(job: &JobResult, governing: &Governing) -> String {
    if &*governing.check != "gap" {
        return governing.check.to_string();
    }
    let of = |check: &&CheckResult| {
        check.check == governing.check
            && check.on == governing.on
            && check.line == governing.line
            && check.limit == governing.limit
    };
    let mut combinations = job.combinations.iter();
    let combination = combinations.find(|each| each.name == governing.combination);
    match combination.and_then(|each| each.checks.iter().find(of)) {
        Some(check) => named(check),
        None => governing.check.to_string(),
    }
}

/// Writes a line for every stress that the job warns of.
pub(super) fn write_warnings(
    out: &mut dyn Write,
    job: &JobResult,
    layout: &Layout,
) -> io::Result<()> {
    let style = layout.style(job);
    for warning in &job.warnings {
        let place = match warning.at {
            Some(at) => format!(
                "{} at {}",
                warning.on,
                with_unit::<Length>(&style, from_si(at))
            ),
            None => warning.on.to_string(),
        };
        let word = paint("warning", layout.colour);
        let ratio = match warning.ratio {
            Some(_) => format!("ratio {}", ratio(&style, warning.ratio)),
            None => "where none is allowed".to_owned(),
        };
        let text = format!(
            "{place}, combination {}: {} of {} against {} allowable, {ratio}",
            warning.combination,
            warning.check,
            style.quantity(Dimension::Stress, warning.stress),
            style.quantity(Dimension::Stress, warning.allowable),
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

/// Writes the largest utilisation of every check over all combinations, what is to be said of those
/// that fail, and where the limits come from.
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
    let rows = job.governing.iter();
    let rows: Vec<Row> = rows.map(|check| Row::governing(job, check)).collect();
    write_rows(out, &rows, &layout.style(job), layout)?;
    write_loss(out, job, layout)?;
    write_failing(out, job, layout)?;
    write_sources(out, job, layout)
}

/// Writes which of several losses of members governs.
fn write_loss(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let Some((loss, check)) = job.governing_loss() else {
        return Ok(());
    };
    let style = layout.style(job);
    let used = match check.utilisation {
        Some(used) => format!("utilisation {}, ", ratio(&style, Some(used))),
        None => String::new(),
    };
    let losses = match job.status {
        JobStatus::Error => "losses that were solved",
        _ => "losses",
    };
    let text = format!(
        "Of the {losses}, that of {} governs (combination {}): {} on {}, {used}{}.",
        loss.without.join(" and "),
        loss.name,
        named(check),
        check.on,
        verdict(check.status),
    );
    writeln!(out)?;
    wrapped(out, "", &text, layout.width)
}

/// Writes for every check that fails anywhere the value, the limit, and the line that set it.
fn write_failing(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let failing = |check: &&Governing| check.status == Verdict::Fail;
    let mut failing = job.governing.iter().filter(failing).peekable();
    if failing.peek().is_none() {
        return Ok(());
    }
    writeln!(out)?;
    title(out, "Failing checks", '-', layout.width)?;
    let times = failures(job);
    for check in failing {
        let times = times
            .get(&(&*check.check, &*check.on))
            .map_or(0, |&(_, times)| times);
        let text = failure(job, check, times, layout);
        wrapped(out, "- ", &text, layout.width)?;
    }
    Ok(())
}

/// For each check on each thing that fails, the last combination in which it does, by its index, and
/// in how many.
fn failures(job: &JobResult) -> HashMap<(&str, &str), (usize, usize)> {
    let mut failures = HashMap::new();
    for (index, combination) in job.combinations.iter().enumerate() {
        let checks = combination.checks.iter();
        for check in checks.filter(|check| check.status == Verdict::Fail) {
            let known = failures
                .entry((&*check.check, &*check.on))
                .or_insert((index, 1));
            if known.0 != index {
                *known = (index, known.1 + 1);
            }
        }
    }
    failures
}

/// `tension on stay.eye at 120 mm is 340 MPa in combination strength; the limit of 275 MPa is set in
/// line 48: brief 3.1`.
fn failure(job: &JobResult, check: &Governing, times: usize, layout: &Layout) -> String {
    let style = &layout.style(job);
    let mut text = format!("{} on {}", governing_name(job, check), check.on);
    if let Some(at) = check.at {
        text += &format!(" at {}", with_unit::<Length>(style, from_si(at)));
    }
    let shown = |si| match dimension(check.unit) {
        Some(dimension) => style.quantity(dimension, si),
        None => value(style, check.unit, si),
    };
    let limit = match check.unit {
        Unit::None => String::new(),
        _ => format!(" of {}", shown(check.limit)),
    };
    text += &format!(
        " is {} in combination {}",
        shown(check.demand),
        check.combination
    );
    if times > 1 {
        text += &format!(", the worst of {} that fail", counted(times, "combination"));
    }
    text += &format!("; the limit{limit} is set in line {}", check.line);
    if let Some(source) = &check.source {
        text += &format!(": {source}");
    }
    text
}

/// Writes what the job says of where its limits come from, by the lines that set them.
fn write_sources(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let checks = job.combinations.iter().flat_map(|each| &each.checks);
    // Limits with sources of their own may share a line: each is named with what it limits.
    let mut sources: BTreeMap<(usize, &Name), BTreeSet<&Name>> = BTreeMap::new();
    for check in checks {
        if let Some(source) = &check.source {
            sources
                .entry((check.line, source))
                .or_default()
                .insert(&check.check);
        }
    }
    if sources.is_empty() {
        return Ok(());
    }
    writeln!(out)?;
    title(out, "Sources of the limits", '-', layout.width)?;
    let lead = |line: usize, checks: &BTreeSet<&Name>| {
        let checks: Vec<&str> = checks.iter().map(|check| check.as_ref()).collect();
        format!("line {line}, {}", checks.join(", "))
    };
    let widest = sources
        .iter()
        .map(|((line, _), checks)| lead(*line, checks).len())
        .max();
    let widest = widest.unwrap_or(0);
    for ((line, source), checks) in sources {
        let lead = format!("{:widest$}  ", lead(line, &checks));
        wrapped(out, &lead, source, layout.width)?;
    }
    Ok(())
}

/// Writes the checks of one combination.
pub(super) fn write_checks(
    out: &mut dyn Write,
    checks: &[CheckResult],
    style: &Style,
    layout: &Layout,
) -> io::Result<()> {
    title(out, "Checks", '-', layout.width)?;
    let rows: Vec<Row> = checks.iter().map(Row::of).collect();
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
    // What rounding leaves is told by the largest value of the same unit in the table.
    let scales = [
        Unit::Pascal,
        Unit::Newton,
        Unit::Metre,
        Unit::Radian,
        Unit::None,
    ]
    .map(|unit| {
        let same = rows.iter().filter(|row| row.unit == unit);
        (unit, largest(same.flat_map(|row| [row.demand, row.limit])))
    });
    let scale = |unit: Unit| {
        let own = scales.iter().find(|(known, _)| *known == unit);
        own.map_or(0.0, |&(_, largest)| largest)
    };
    let demand = rows
        .iter()
        .map(|row| value(style, row.unit, settled(row.demand, scale(row.unit))));
    let limit = rows.iter().map(|row| value(style, row.unit, row.limit));
    let used = rows.iter().map(|row| ratio(style, row.utilisation));
    let at = Column::number("at", Some(style.unit(Length::DIMENSION)), at);
    Table::of([
        Column::words("check", rows.iter().map(|row| &row.check)),
        Column::names("on", rows.iter().map(|row| row.on)),
    ])
    .block([
        Column::number("demand", None, demand),
        Column::number("limit", None, limit),
        Column::words("unit", rows.iter().map(|row| unit(style, row.unit))),
        Column::number("utilisation", None, used),
        Column::verdicts(rows.iter().map(|row| verdict(row.status))),
    ])
    .block([
        Column::combinations(combination),
        at.without_idle_decimals(),
        Column::words("area", area),
        Column::number("line", None, rows.iter().map(|row| row.line.to_string())),
    ])
    .write(out, layout)
}

/// The dimension behind a unit; none for yes and no.
pub(super) fn dimension(unit: Unit) -> Option<Dimension> {
    match unit {
        Unit::Pascal => Some(Dimension::Stress),
        Unit::Newton => Some(Dimension::Force),
        Unit::Metre => Some(Dimension::Length),
        Unit::Radian => Some(Dimension::Angle),
        Unit::None => None,
    }
}

pub(super) fn value(style: &Style, unit: Unit, si: f64) -> String {
    match dimension(unit) {
        Some(dimension) => style.number(dimension, si),
        None if si == 0.0 => "no".to_owned(),
        None => "yes".to_owned(),
    }
}

pub(super) fn unit(style: &Style, unit: Unit) -> &'static str {
    dimension(unit).map_or("", |dimension| style.unit(dimension))
}
