//! The head of a report: what the job says of itself, its verdict, warnings, materials.

use super::column::Column;
use super::table::Table;
use super::words::{counted, paint, status, title, wrapped};
use super::{Layout, checks, number, optional, with_unit};
use crate::quantity::{
    Density, Dimension, Expansion, Measure, Stress, ThermodynamicTemperature, from_si,
};
use crate::result::{CheckResult, JobResult, JobStatus, Verdict, YieldRow};
use std::io::{self, Write};
use unicode_width::UnicodeWidthStr;

/// Columns of the labels at the head.
pub(super) const LABEL: usize = 13;

/// Writes title, verdict, what the job says of itself, and the warnings.
pub(super) fn write(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let untitled = match job.status {
        JobStatus::Error if job.combinations.is_empty() => "Job without a result",
        _ => "Untitled job",
    };
    let heading = job.title.as_deref().unwrap_or(untitled);
    title(out, heading, '=', layout.width)?;
    let word = status(job.status);
    writeln!(
        out,
        "{:LABEL$}{}: {}",
        "verdict",
        paint(word, layout.colour),
        reason(job)
    )?;
    let style = layout.style(job);
    let datum = job
        .datum
        .map(|kelvin| with_unit::<ThermodynamicTemperature>(&style, from_si(kelvin)));
    let labelled = [
        ("reference", job.reference.as_deref()),
        ("file", Some(job.file.as_str())),
        ("datum", datum.as_deref()),
        ("prepared by", job.prepared_by.as_deref()),
        ("checked by", job.checked_by.as_deref()),
        ("date", job.date.as_deref()),
        ("note", job.note.as_deref()),
    ];
    for (label, text) in labelled {
        if let Some(text) = text {
            wrapped(out, &format!("{label:LABEL$}"), text, layout.width)?;
        }
    }
    checks::write_warnings(out, job, layout)
}

/// What the verdict on the whole job rests on.
fn reason(job: &JobResult) -> String {
    let checks = || job.combinations.iter().flat_map(|each| &each.checks);
    let failed = checks().filter(|check: &&CheckResult| check.status == Verdict::Fail);
    match job.status {
        JobStatus::Pass => match checks().count() {
            1 => "the one check holds".to_owned(),
            made => format!("all {made} checks hold"),
        },
        JobStatus::Fail => {
            let (failed, made) = (failed.count(), checks().count());
            let verb = if failed == 1 { "fails" } else { "fail" };
            format!("{failed} of {} {verb}", counted(made, "check"))
        }
        JobStatus::Unchecked => "no limit was held in any combination".to_owned(),
        JobStatus::Error => format!(
            "{}, told on standard error",
            counted(job.errors_total, "error")
        ),
    }
}

/// Writes the materials with the values that were used.
pub(super) fn write_materials(
    out: &mut dyn Write,
    job: &JobResult,
    layout: &Layout,
) -> io::Result<()> {
    if job.materials.is_empty() {
        return Ok(());
    }
    writeln!(out)?;
    title(out, "Materials", '-', layout.width)?;
    let style = layout.style(job);
    let materials = &job.materials;
    let unit = |dimension| Some(style.unit(dimension));
    let stress = |heading: &str, of: fn(&crate::result::MaterialEntry) -> Option<f64>| {
        let cells = materials.iter().map(|material| {
            let value: Option<Stress> = of(material).map(from_si);
            optional(&style, value)
        });
        Column::number(heading, unit(Dimension::Stress), cells)
    };
    let expansion = materials.iter().map(|material| {
        let value: Option<Expansion> = material.expansion.map(from_si);
        optional(&style, value)
    });
    let density = materials.iter().map(|material| {
        let value: Option<Density> = material.density.map(from_si);
        optional(&style, value)
    });
    let modulus = materials
        .iter()
        .map(|material| number::<Stress>(&style, from_si(material.modulus)));
    let names = materials.iter().map(|material| &material.id);
    Table::of([Column::names("material", names)])
        .block([
            Column::number("modulus", unit(Stress::DIMENSION), modulus),
            Column::number("expansion", unit(Expansion::DIMENSION), expansion),
            Column::number("density", unit(Density::DIMENSION), density),
            stress("yield", |material| material.yield_strength),
            stress("ultimate", |material| material.ultimate),
            stress("proof", |material| material.proof),
            stress("crushing", |material| material.crushing),
        ])
        .write(out, layout)?;
    writeln!(out)?;
    write_material_sources(out, job, layout)
}

/// Writes where the values of each material come from.
fn write_material_sources(out: &mut dyn Write, job: &JobResult, layout: &Layout) -> io::Result<()> {
    let style = layout.style(job);
    title(out, "Sources of the materials", '-', layout.width)?;
    let widths = job.materials.iter().map(|material| material.id.width());
    let widest = widths.max().unwrap_or(0);
    for material in &job.materials {
        let source = material.source.as_deref().unwrap_or("no source given");
        let mut text = match &material.like {
            Some(like) => format!("{source} (like {like})"),
            None => source.to_owned(),
        };
        if !material.yield_by_thickness.is_empty() {
            let row = |row: &YieldRow| {
                let strength = style.quantity(Dimension::Stress, row.yield_strength);
                match row.thickness {
                    Some(up_to) => {
                        format!("{strength} to {}", style.quantity(Dimension::Length, up_to))
                    }
                    None => format!("{strength} beyond"),
                }
            };
            let rows: Vec<String> = material.yield_by_thickness.iter().map(row).collect();
            text += &format!("; yield by thickness {}", rows.join(", "));
        }
        let id = &material.id;
        let lead = format!("{id}{:1$}", "", widest - id.width() + 2);
        wrapped(out, &lead, &text, layout.width)?;
    }
    Ok(())
}
