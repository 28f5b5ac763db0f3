//! `lengthwise check PATH…`: checks job files, and folders of them.

mod arguments;
#[cfg(test)]
mod tests;

pub(super) use arguments::CheckArguments;

use super::input::{self, Source, Sources};
use super::output::Output;
use super::{Console, Status};
use crate::catalogue;
use crate::report::text::{self, Layout};
use crate::report::{all_finite, csv, json};
use crate::result::{Counts, ErrorEntry, JobResult, JobStatus};
use crate::run::JobRun;
use arguments::{Form, Plan};
use std::io::{self, Read, Write};
use std::panic::{AssertUnwindSafe, catch_unwind};
use unicode_width::UnicodeWidthStr;

/// Why a file of a folder is passed over.
const NO_JOB: &str = "no job: it has no `job`, `member` or `point` table";

/// What checks one job: its name and its bytes in, its result out.
type Checker = fn(&str, &[u8]) -> JobRun;

/// Carries a plan out.
pub(super) fn run(plan: &Plan, console: &mut Console, check: Checker) -> Status {
    let (sources, output) = match prepare(plan) {
        Ok(prepared) => prepared,
        Err(refusals) => {
            for refusal in refusals {
                console.complain(&format!("error: {refusal}"));
            }
            return Status::Refused;
        }
    };
    for passed_over in &sources.passed_over {
        console.complain(&format!("passed over: {passed_over}"));
    }
    let Some(output) = output else {
        let mut run = Run::new(plan, &sources, console.out, console.width, console.colour);
        let ended = run.all(&sources, console.input, console.errors, check);
        let status = run.status;
        return match ended.and_then(|()| console.out.flush()) {
            Ok(()) => status,
            Err(error) if error.kind() == io::ErrorKind::BrokenPipe => status,
            Err(error) => {
                console.complain(&format!(
                    "error: standard output cannot be written: {error}"
                ));
                status.max(Status::Refused)
            }
        };
    };
    let mut text = Vec::new();
    let mut run = Run::new(plan, &sources, &mut text, super::PAGE, false);
    let ended = run.all(&sources, console.input, console.errors, check);
    let (status, jobs) = (run.status, run.counts.files);
    let written = match ended {
        Ok(()) if jobs == 0 => Ok(()),
        Ok(()) => output.write(&text),
        Err(error) => Err(error.to_string()),
    };
    match written {
        Ok(()) => status,
        Err(refusal) => {
            console.complain(&format!("error: {refusal}"));
            status.max(Status::Refused)
        }
    }
}

/// Finds what there is to check and where it goes, and refuses before any work.
fn prepare(plan: &Plan) -> Result<(Sources, Option<Output>), Vec<String>> {
    let output = plan.output.as_deref().map(Output::at).transpose();
    let sources = Sources::gather(&plan.paths);
    let (output, sources) = match (output, sources) {
        (Ok(output), Ok(sources)) => (output, sources),
        (output, sources) => {
            let mut refusals = sources.err().unwrap_or_default();
            refusals.extend(output.err());
            return Err(refusals);
        }
    };
    if let Some(output) = &output {
        let mut inputs = sources.jobs.iter().filter_map(Source::path);
        if let Some(input) = inputs.find(|input| output.is(input)) {
            return Err(vec![format!(
                "{}: the output would replace a job that is checked; give it another name",
                input.display()
            )]);
        }
    }
    Ok((sources, output))
}

/// A run under way.
struct Run<'a> {
    form: Form,
    one_job: bool,
    require_checks: bool,
    file_width: usize,
    layout: Layout,
    out: &'a mut dyn Write,
    /// Jobs that the document will hold.
    kept: Vec<JobResult>,
    counts: Counts,
    status: Status,
}

impl<'a> Run<'a> {
    fn new(
        plan: &Plan,
        sources: &Sources,
        out: &'a mut dyn Write,
        width: usize,
        colour: bool,
    ) -> Self {
        let jobs = sources.jobs.iter();
        let names = jobs.map(|source| called(source, plan.form).width());
        Run {
            form: plan.form,
            one_job: sources.is_one_job(),
            require_checks: plan.require_checks,
            file_width: names.max().unwrap_or(0),
            layout: Layout {
                width,
                colour,
                digits: plan.digits,
            },
            out,
            kept: Vec::new(),
            counts: Counts::default(),
            status: Status::Holds,
        }
    }

    /// Checks job after job, each reported before the next is read.
    fn all(
        &mut self,
        sources: &Sources,
        input: &mut dyn Read,
        errors: &mut dyn Write,
        check: Checker,
    ) -> io::Result<()> {
        // Whether a folder holds a job, once a file of it has been looked at.
        let mut holds_job: Vec<Option<bool>> = vec![None; sources.folders.len()];
        for source in &sources.jobs {
            let name = called(source, self.form);
            let bytes = source.read(input);
            let mut job = match &bytes {
                Ok(bytes) => guarded(&name, bytes, check),
                Err(reason) => fault(&name, reason),
            };
            if let Source::Found(_, folder) = source {
                let failed = job.result.status == JobStatus::Error;
                let is_job = !failed || !bytes.as_deref().is_ok_and(is_no_job);
                if let Some(holds_job) = holds_job.get_mut(*folder) {
                    *holds_job = Some(is_job || *holds_job == Some(true));
                }
                if !is_job {
                    self.tell(errors, &format!("passed over: {name}: {NO_JOB}\n"))?;
                    continue;
                }
            }
            if self.form == Form::Json {
                job.result.digest = bytes.ok().map(|bytes| json::digest(&bytes));
            }
            if !job.drawn_errors.is_empty() {
                if self.counts.errors > 0 {
                    self.tell(errors, "\n")?;
                }
                self.tell(errors, &job.drawn_errors)?;
            }
            self.counts.add(&job.result);
            self.status = self.status.max(self.status_of(&job.result));
            self.job(job.result)?;
        }
        for (folder, holds_job) in sources.folders.iter().zip(&holds_job) {
            if *holds_job == Some(false) {
                self.tell(errors, &format!("error: {}\n", input::no_job_in(folder)))?;
                self.status = self.status.max(Status::Refused);
            }
        }
        self.end()
    }

    /// Something for standard error, after the results before it. That it cannot be written there
    /// is no reason to stop.
    fn tell(&mut self, errors: &mut dyn Write, text: &str) -> io::Result<()> {
        self.out.flush()?;
        let _ = errors.write_all(text.as_bytes());
        Ok(())
    }

    fn status_of(&self, job: &JobResult) -> Status {
        match job.status {
            JobStatus::Pass => Status::Holds,
            JobStatus::Unchecked if !self.require_checks => Status::Holds,
            JobStatus::Unchecked | JobStatus::Fail => Status::Fails,
            JobStatus::Error => Status::Unsolved,
        }
    }

    fn job(&mut self, job: JobResult) -> io::Result<()> {
        let first = self.counts.files == 1;
        match self.form {
            Form::Json => self.kept.push(job),
            Form::Csv(table) => {
                if first {
                    csv::write_header(self.out, table)?;
                }
                csv::write_job(self.out, table, &job)?;
            }
            Form::Brief if self.one_job => text::write_brief(self.out, &job, &self.layout)?,
            Form::Brief => text::write_line(self.out, &job, self.file_width, &self.layout)?,
            Form::Whole => {
                if !first {
                    self.out.write_all(b"\n\n")?;
                }
                text::write_job(self.out, &job, &self.layout)?;
            }
        }
        Ok(())
    }

    /// What stands after the last job; nothing where there was none.
    fn end(&mut self) -> io::Result<()> {
        if self.counts.files == 0 {
            return Ok(());
        }
        match self.form {
            Form::Csv(_) => Ok(()),
            Form::Json => {
                let jobs = std::mem::take(&mut self.kept);
                let document = json::document(jobs, self.counts, catalogue::digest());
                json::write(self.out, &document)
            }
            Form::Whole | Form::Brief => {
                writeln!(self.out)?;
                text::write_counts(self.out, &self.counts, &self.layout)
            }
        }
    }
}

/// What results and errors call a job: by its path, and for a reader standard input by these words.
fn called(source: &Source, form: Form) -> String {
    match (source, form) {
        (Source::Standard, Form::Whole | Form::Brief) => "standard input".to_owned(),
        _ => source.name(),
    }
}

/// Checks one job; a fault of the program ends that job alone, and a number that is not finite
/// leaves it in no format.
fn guarded(name: &str, bytes: &[u8], check: Checker) -> JobRun {
    let Ok(run) = catch_unwind(AssertUnwindSafe(|| check(name, bytes))) else {
        return fault(
            name,
            "a fault of this program stopped the check, please report it",
        );
    };
    match all_finite(&run.result) {
        Ok(()) => run,
        Err(number) => fault(
            name,
            &format!("a fault of this program, please report it: {number}"),
        ),
    }
}

/// A job of which there is nothing to say but this.
fn fault(name: &str, message: &str) -> JobRun {
    let error = ErrorEntry {
        message: message.to_owned(),
        line: None,
        column: None,
        help: None,
        combination: None,
    };
    JobRun {
        result: JobResult::unreadable(name, error),
        drawn_errors: format!("error: {name}: {message}\n"),
    }
}

/// Whether a file is sound TOML and yet has nothing of a job. One that is not sound may have been
/// meant as one.
fn is_no_job(bytes: &[u8]) -> bool {
    let text = std::str::from_utf8(bytes).ok();
    let table = text.and_then(|text| toml::de::DeTable::parse(text).ok());
    table.is_some_and(|table| {
        let names = ["job", "member", "point"];
        !names.iter().any(|name| table.get_ref().contains_key(*name))
    })
}
