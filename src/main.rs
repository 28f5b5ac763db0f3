//! The program `lengthwise`: hands over to the command line and ends with its exit status.

use std::process::ExitCode;

fn main() -> ExitCode {
    lengthwise::cli::main(std::env::args_os()).into()
}
