//! The text report, whole and brief.

mod assembly;
mod brief;
mod checks;
mod column;
mod heading;
mod member;
mod ranges;
mod segments;
mod table;
mod words;

#[cfg(test)]
mod tests;

pub use brief::{write_brief, write_line};

use crate::model::Purpose;
use crate::quantity::{Measure, Style};
use crate::result::{CombinationResult, Counts, JobResult, Residuals};
use std::io::{self, Write};
use words::{counted, printable, title, wrapped};

/// How a text report is laid out.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Layout {
    /// Columns of the page.
    pub width: usize,
    /// Whether verdicts are coloured.
    pub colour: bool,
    /// Significant digits, 1 to 17.
    pub digits: usize,
}

impl Layout {
    /// How the quantities of a job are shown in it.
    fn style(&self, job: &JobResult) -> Style {
        Style {
            units: job.units,
            digits: self.digits,
        }
    }
}

/// What plus and minus mean in every report, and what its words stand for.
const SIGNS: &str = "N and stress are + in tension, elongation + for growth, displacements and \
     forces + toward the member's end. A reaction is the force that the support puts on the \
     member. A gap is the clearance that remains: + open, 0 bearing. Places (at) are distances \
     from the member's start. Utilisation is demand over limit by size; for a least gap (gap min) \
     it is what has closed over what may close.";

/// What is added to that where the job has points.
const SIGNS_OF_POINTS: &str = "Displacements of points and reactions of holds are + along +x, +y and \
     +z (up is +y in two coordinates, +z in three); rotations are right-handed, in two coordinates \
     + anticlockwise. The displacement of a body is that of its first \
     point. A member between points \
     has its own signs along its axis, from its first point to its second.";

/// What rounding leaves of numbers that cancel: a number smaller than this share of the largest of
/// its kind beside it is shown as 0. JSON and CSV keep it.
const NOISE: f64 = 1e-12;

/// What a result is for.
const CLOSING: &str = "For use by a qualified engineer: the governing code and a licensed engineer \
     decide.";

/// Writes the whole report of one job.
///
/// # Errors
/// Those of `out`.
pub fn write_job(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    heading::write(out, job, layout)?;
    checks::write_governing(out, job, layout)?;
    ranges::write(out, job, layout)?;
    heading::write_materials(out, job, layout)?;
    for combination in &job.combinations {
        write_combination(out, job, combination, layout)?;
    }
    write_remarks(out, job, layout)?;
    write_foot(out, job, layout)
}

/// Writes how much was looked at and what came of it.
///
/// # Errors
/// Those of `out`.
pub fn write_counts(out: &mut dyn Write, counts: &Counts, layout: &Layout) -> io::Result<()> {
    let mut text = format!(
        "Looked at {}, {}, {} and {}: {} pass, {} fail",
        counted(counts.files, "file"),
        counted(counts.members, "member"),
        counted(counts.combinations, "combination"),
        counted(counts.checks, "check"),
        counts.pass,
        counts.fail,
    );
    if counts.unchecked_jobs > 0 {
        text += &format!("; {} unchecked", counted(counts.unchecked_jobs, "job"));
    }
    if counts.errors > 0 {
        text += &format!("; {}", counted(counts.errors, "error"));
    }
    text.push('.');
    wrapped(out, "", &text, layout.width)
}

fn write_combination(
    out: &mut dyn Write,
    job: &JobResult,
    combination: &CombinationResult,
    layout: &Layout,
) -> io::Result<()> {
    writeln!(out)?;
    title(out, &combination_title(combination), '=', layout.width)?;
    let style = layout.style(job);
    let assembly =
        (!combination.points.is_empty()).then(|| assembly::Page::of(combination, &style));
    if let Some(assembly) = &assembly {
        assembly::write(out, assembly, layout)?;
    }
    for member in &combination.members {
        writeln!(out)?;
        member::write(out, member, assembly.as_ref(), &style, layout)?;
    }
    if !combination.checks.is_empty() {
        writeln!(out)?;
        checks::write_checks(out, &combination.checks, &style, layout)?;
    }
    writeln!(out)?;
    wrapped(out, "", &residuals(&combination.residuals), layout.width)
}

/// `Combination strength, for strength: dead 1.35, live 1.5`.
fn combination_title(combination: &CombinationResult) -> String {
    let mut text = format!("Combination {}", combination.name);
    match combination.purpose {
        Some(Purpose::Service) => text += ", for service",
        Some(Purpose::Strength) => text += ", for strength",
        None => {}
    }
    let factors = combination
        .factors
        .iter()
        .filter(|(case, _)| !case.is_empty());
    let factors: Vec<String> = factors
        .map(|(case, factor)| format!("{factor} {case}"))
        .collect();
    if !factors.is_empty() {
        text += ": ";
        text += &factors.join(" + ").replace("+ -", "- ");
    }
    if !combination.without.is_empty() {
        text += ", without ";
        text += &combination.without.join(", ");
    }
    text
}

fn residuals(residuals: &Residuals) -> String {
    let shown = |residual: f64| match residual {
        0.0 => "0".to_owned(),
        _ => format!("{residual:.1e}"),
    };
    format!(
        "Proof, by relative residuals: equilibrium {}, compatibility {}, energy {} (more than \
         {:.0e} is an error).",
        shown(residuals.equilibrium),
        shown(residuals.compatibility),
        shown(residuals.energy),
        Residuals::LIMIT,
    )
}

fn write_remarks(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    if !job.cautions.is_empty() {
        writeln!(out)?;
        title(out, "Cautions", '=', layout.width)?;
    }
    for caution in &job.cautions {
        let about = printable(&caution.about);
        let text = match caution.line {
            Some(line) => format!("{about} (line {line}): {}", caution.text),
            None => format!("{about}: {}", caution.text),
        };
        wrapped(out, "- ", &text, layout.width)?;
    }
    if !job.notes.is_empty() {
        writeln!(out)?;
        title(out, "Notes", '=', layout.width)?;
    }
    for note in &job.notes {
        let text = format!("{}: {}", printable(&note.about), note.text);
        wrapped(out, "- ", &text, layout.width)?;
    }
    Ok(())
}

/// What its numbers mean and what they are for; nothing below a report that has none.
fn write_foot(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    if job.combinations.is_empty() {
        return Ok(());
    }
    writeln!(out)?;
    let has_points = |combination: &CombinationResult| !combination.points.is_empty();
    if job.combinations.iter().any(has_points) {
        let signs = format!("{SIGNS} {SIGNS_OF_POINTS}");
        wrapped(out, "Signs: ", &signs, layout.width)?;
    } else {
        wrapped(out, "Signs: ", SIGNS, layout.width)?;
    }
    wrapped(out, "", CLOSING, layout.width)
}

/// A number, or 0 where it is nothing but rounding beside the largest of its kind.
fn settled(si: f64, largest: f64) -> f64 {
    if si.abs() < NOISE * largest { 0.0 } else { si }
}

/// The largest size among numbers; 0 where there is none.
fn largest(numbers: impl IntoIterator<Item = f64>) -> f64 {
    let sizes = numbers.into_iter().map(f64::abs);
    sizes.fold(0.0, f64::max)
}

/// The number of a quantity in the report's unit.
fn number<Q: Measure>(style: &Style, quantity: Q) -> String {
    style.number(Q::DIMENSION, quantity.si())
}

/// The same, or nothing for what does not exist.
fn optional<Q: Measure>(style: &Style, quantity: Option<Q>) -> String {
    quantity.map_or_else(String::new, |quantity| number(style, quantity))
}

/// A quantity with its unit, for sentences.
fn with_unit<Q: Measure>(style: &Style, quantity: Q) -> String {
    style.quantity(Q::DIMENSION, quantity.si())
}

/// A ratio such as a utilisation, with one decimal fewer than the report has digits.
fn ratio(style: &Style, value: Option<f64>) -> String {
    let decimals = style.digits.saturating_sub(1);
    match value {
        None => String::new(),
        Some(value) if value.abs() < 1e6 => format!("{value:.decimals$}"),
        Some(value) => format!("{value:.decimals$e}"),
    }
}
