//! The command line: arguments in, an exit status out; one file a command, no computation.

mod check;
mod input;
mod output;

use clap::error::ErrorKind;
use clap::{CommandFactory, Parser, Subcommand};
use std::ffi::OsString;
use std::io::{self, BufWriter, IsTerminal, Read, Write};
use std::process::ExitCode;

/// Columns of a report that no wide terminal shows.
const PAGE: usize = 80;

/// Checks the axial deformation of members: stretch, restraint force, gaps and stress.
#[derive(Debug, Parser)]
#[command(name = "lengthwise", version, arg_required_else_help = true)]
#[command(after_help = EXIT_STATUS)]
struct Arguments {
    #[command(subcommand)]
    command: Command,
}

#[derive(Debug, Subcommand)]
enum Command {
    Check(check::CheckArguments),
}

const EXIT_STATUS: &str = "\
Exit status:
  0  every check that was made holds
  1  a check fails
  2  the command line is wrong, a path does not exist, or an output cannot be written
  3  a job could not be read or solved";

/// What a run came to; of several the greatest counts.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Status {
    /// Every check that was made holds.
    Holds = 0,
    /// A check fails.
    Fails = 1,
    /// The command line is wrong, a path does not exist, or an output cannot be written.
    Refused = 2,
    /// A job could not be read or solved.
    Unsolved = 3,
}

impl From<Status> for ExitCode {
    fn from(status: Status) -> Self {
        ExitCode::from(status as u8)
    }
}

/// Where a command reads and writes; tests give it buffers.
struct Console<'a> {
    input: &'a mut dyn Read,
    out: &'a mut dyn Write,
    errors: &'a mut dyn Write,
    width: usize,
    colour: bool,
}

impl Console<'_> {
    /// A line on standard error. That it cannot be written is no reason to stop.
    fn complain(&mut self, text: &str) {
        let _ = self.out.flush();
        let _ = self.errors.write_all(text.as_bytes());
        if !text.ends_with('\n') {
            let _ = self.errors.write_all(b"\n");
        }
    }
}

/// Runs the program with its arguments, the program's own name first.
pub fn main(arguments: impl IntoIterator<Item = OsString>) -> Status {
    match Arguments::try_parse_from(arguments) {
        Ok(arguments) => run(&arguments),
        Err(message) => print_message(&message),
    }
}

fn run(arguments: &Arguments) -> Status {
    let stdout = io::stdout();
    let terminal = stdout.is_terminal();
    let mut console = Console {
        input: &mut io::stdin().lock(),
        out: &mut BufWriter::with_capacity(1 << 16, stdout.lock()),
        errors: &mut io::stderr().lock(),
        width: if terminal { page_width() } else { PAGE },
        colour: terminal && std::env::var_os("NO_COLOR").is_none_or(|value| value.is_empty()),
    };
    match &arguments.command {
        Command::Check(arguments) => match arguments.plan() {
            Ok(plan) => check::run(&plan, &mut console, crate::run::check_bytes),
            Err(contradiction) => print_message(&refusal("check", &contradiction)),
        },
    }
}

/// The columns of a wide terminal; a narrow or unknown one gets the page's.
fn page_width() -> usize {
    let width = terminal_size::terminal_size().map(|(width, _)| usize::from(width.0));
    width.unwrap_or(PAGE).max(PAGE)
}

/// Options that contradict one another, told like every other error of the command line.
fn refusal(command: &str, contradiction: &str) -> clap::Error {
    let mut root = Arguments::command();
    root.build();
    let kind = ErrorKind::ArgumentConflict;
    match root.find_subcommand_mut(command) {
        Some(command) => command.error(kind, contradiction),
        None => root.error(kind, contradiction),
    }
}

/// Help, version, or an error of the command line.
fn print_message(message: &clap::Error) -> Status {
    // A closed pipe is no reason for another status.
    let _ = message.print();
    if message.use_stderr() {
        Status::Refused
    } else {
        Status::Holds
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_definition_of_the_command_line_is_sound() {
        Arguments::command().debug_assert();
    }

    #[test]
    fn the_gravest_status_is_the_greatest() {
        assert!(Status::Unsolved > Status::Refused);
        assert!(Status::Refused > Status::Fails);
        assert!(Status::Fails > Status::Holds);
    }
}
