//! The arguments of `check`, and the plan that they come to.

use crate::report::csv;
use clap::{Args, ValueEnum};
use std::path::PathBuf;

/// Significant digits of a text report, unless the command line says otherwise.
const DIGITS: usize = 4;

/// Check job files, and folders of them
///
/// Solves every combination of every member, proves each result, holds it against the job's limits
/// and reports it. In a folder the job files are its .toml files at any depth, hidden ones left
/// alone; one bad file never stops the others.
#[derive(Debug, Args)]
#[command(after_help = crate::cli::EXIT_STATUS)]
pub(in crate::cli) struct CheckArguments {
    /// Job files and folders of them; - reads one job from standard input
    #[arg(required = true, value_name = "PATH")]
    paths: Vec<PathBuf>,

    /// How the results are written
    #[arg(
        long,
        value_enum,
        default_value = "table",
        hide_possible_values = false
    )]
    format: Format,

    /// Which table --format csv writes: members, segments, layers, stations, supports, points,
    /// bodies, holds, watches, checks, governing or envelope
    #[arg(long, value_name = "NAME", value_parser = table_by_name)]
    table: Option<csv::Table>,

    /// Write the results to this file, whole or not at all, in place of standard output
    #[arg(long, value_name = "FILE")]
    output: Option<PathBuf>,

    /// Governing checks alone; for several jobs one line a job, then the counts
    #[arg(long)]
    brief: bool,

    /// Significant digits of the tables, from 1 to 17; 4 unless this says otherwise
    #[arg(long, value_name = "N", value_parser = significant_digits)]
    digits: Option<usize>,

    /// A job in which nothing was checked counts as one that fails
    #[arg(long)]
    require_checks: bool,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, ValueEnum)]
enum Format {
    /// Text for people
    Table,
    /// Everything, in SI, in numbers that read back exactly
    Json,
    /// One table, in SI; --table says which
    Csv,
}

fn table_by_name(text: &str) -> Result<csv::Table, String> {
    let found = csv::Table::ALL.iter().find(|(name, _)| *name == text);
    found.map(|(_, table)| *table).ok_or_else(|| {
        let names = csv::Table::ALL.map(|(name, _)| name);
        format!("the tables are {}", names.join(", "))
    })
}

fn significant_digits(text: &str) -> Result<usize, String> {
    let digits = text.parse().ok().filter(|digits| (1..=17).contains(digits));
    digits.ok_or_else(|| "write a whole number from 1 to 17".to_owned())
}

/// What the arguments come to, free of contradictions.
#[derive(Debug)]
pub(in crate::cli) struct Plan {
    pub(super) paths: Vec<PathBuf>,
    pub(super) form: Form,
    pub(super) output: Option<PathBuf>,
    pub(super) digits: usize,
    pub(super) require_checks: bool,
}

/// How the results are written.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Form {
    Whole,
    Brief,
    Json,
    Csv(csv::Table),
}

impl CheckArguments {
    /// The plan of a run.
    ///
    /// # Errors
    /// Options that contradict one another.
    pub(in crate::cli) fn plan(&self) -> Result<Plan, String> {
        let form = match (self.format, self.table) {
            (Format::Table, None) if self.brief => Form::Brief,
            (Format::Table, None) => Form::Whole,
            (Format::Json, None) => Form::Json,
            (Format::Csv, Some(table)) => Form::Csv(table),
            (Format::Csv, None) => {
                let names = csv::Table::ALL.map(|(name, _)| name).join(", ");
                return Err(format!(
                    "--format csv writes one table: say which with --table NAME ({names})"
                ));
            }
            (Format::Table | Format::Json, Some(_)) => {
                return Err(
                    "--table says which table --format csv writes: it goes with \
                            --format csv alone"
                        .to_owned(),
                );
            }
        };
        let as_text = matches!(form, Form::Whole | Form::Brief);
        if self.brief && !as_text {
            return Err(
                "--brief shortens the text report: JSON and CSV are always whole".to_owned(),
            );
        }
        if self.digits.is_some() && !as_text {
            return Err(
                "--digits rounds the text report: numbers of JSON and CSV are exact".to_owned(),
            );
        }
        Ok(Plan {
            paths: self.paths.clone(),
            form,
            output: self.output.clone(),
            digits: self.digits.unwrap_or(DIGITS),
            require_checks: self.require_checks,
        })
    }
}
