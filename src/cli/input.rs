//! Which jobs a command was asked for: files, folders of them, standard input.

use std::collections::HashSet;
use std::fs::File;
use std::io::{self, Read};
use std::path::{Path, PathBuf};
use walkdir::{DirEntry, WalkDir};

/// A job file is not read beyond this.
const MOST_BYTES: u64 = crate::job::MOST_BYTES as u64;

/// Where one job comes from.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Source {
    /// Standard input.
    Standard,
    /// A file named on the command line.
    Named(PathBuf),
    /// A file found in a folder, with the folder's index.
    Found(PathBuf, usize),
    /// What cannot be read, and why.
    Unreadable(PathBuf, String),
}

impl Source {
    /// What messages and results call it.
    pub(super) fn name(&self) -> String {
        match self {
            Source::Standard => "-".to_owned(),
            Source::Named(path) | Source::Found(path, _) | Source::Unreadable(path, _) => {
                path.to_string_lossy().into_owned()
            }
        }
    }

    /// The file that it is, if it is one.
    pub(super) fn path(&self) -> Option<&Path> {
        match self {
            Source::Named(path) | Source::Found(path, _) => Some(path),
            Source::Standard | Source::Unreadable(..) => None,
        }
    }

    /// Its bytes, or why there are none.
    pub(super) fn read(&self, standard: &mut dyn Read) -> Result<Vec<u8>, String> {
        match self {
            Source::Unreadable(_, reason) => Err(reason.clone()),
            Source::Standard => read_up_to(standard, 0),
            Source::Named(path) | Source::Found(path, _) => {
                let mut file = File::open(path).map_err(|error| cannot_be_read(&error))?;
                let size = file.metadata().map_or(0, |data| data.len());
                read_up_to(&mut file, size)
            }
        }
    }
}

fn read_up_to(input: &mut dyn Read, expected: u64) -> Result<Vec<u8>, String> {
    let capacity = expected.min(MOST_BYTES) + 1;
    let mut bytes = Vec::with_capacity(usize::try_from(capacity).unwrap_or_default());
    input
        .take(MOST_BYTES + 1)
        .read_to_end(&mut bytes)
        .map_err(|error| cannot_be_read(&error))?;
    if bytes.len() as u64 > MOST_BYTES {
        return Err(format!(
            "is larger than {} MiB: no job is",
            MOST_BYTES >> 20
        ));
    }
    Ok(bytes)
}

fn is_missing(error: &io::Error) -> bool {
    use io::ErrorKind::{NotADirectory, NotFound};
    matches!(error.kind(), NotFound | NotADirectory)
}

fn cannot_be_read(error: &io::Error) -> String {
    format!("cannot be read: {error}")
}

/// What a command's paths stand for.
#[derive(Debug, Default)]
pub(super) struct Sources {
    /// The jobs in the order of the paths, those of a folder sorted, each file once.
    pub(super) jobs: Vec<Source>,
    /// The folders among the paths.
    pub(super) folders: Vec<PathBuf>,
    /// What was passed over and why, for standard error.
    pub(super) passed_over: Vec<String>,
}

impl Sources {
    /// Whether the paths were one file, or standard input.
    pub(super) fn is_one_job(&self) -> bool {
        self.folders.is_empty() && self.jobs.len() == 1
    }

    /// Finds the jobs behind the paths.
    ///
    /// # Errors
    /// Every path that does not exist, and every folder without a `.toml` file.
    pub(super) fn gather(paths: &[PathBuf]) -> Result<Self, Vec<String>> {
        let mut sources = Sources::default();
        let mut wrong = Vec::new();
        let mut linked = false;
        for path in paths {
            if path.as_os_str() == "-" {
                sources.jobs.push(Source::Standard);
                continue;
            }
            match std::fs::metadata(path) {
                Err(error) if is_missing(&error) => {
                    wrong.push(format!(
                        "{}: there is no such file or folder",
                        path.display()
                    ));
                }
                Err(error) => {
                    let reason = cannot_be_read(&error);
                    sources.jobs.push(Source::Unreadable(path.clone(), reason));
                }
                Ok(data) if data.is_dir() => {
                    let before = sources.jobs.len();
                    linked |= sources.walk(path);
                    if sources.jobs.len() == before {
                        wrong.push(no_job_in(path));
                    }
                }
                Ok(_) => sources.jobs.push(Source::Named(path.clone())),
            }
        }
        if !wrong.is_empty() {
            return Err(wrong);
        }
        if paths.len() > 1 || linked {
            keep_each_once(&mut sources.jobs);
        }
        Ok(sources)
    }

    /// Adds the `.toml` files of a folder; says whether it met a link.
    fn walk(&mut self, folder: &Path) -> bool {
        let index = self.folders.len();
        self.folders.push(folder.to_owned());
        let mut linked = false;
        let entries = WalkDir::new(folder).follow_links(true).sort_by_file_name();
        for entry in entries.into_iter().filter_entry(|entry| !is_hidden(entry)) {
            match entry {
                Ok(entry) => {
                    linked |= entry.path_is_symlink();
                    if is_job_file(entry.path()) && !entry.file_type().is_dir() {
                        self.jobs.push(Source::Found(entry.into_path(), index));
                    }
                }
                Err(error) => self.not_walked(folder, &error),
            }
        }
        linked
    }

    /// A link that leads back to a folder above it hides nothing. A link that leads nowhere hides a
    /// job only if it is called like one. Anything else may hide jobs.
    fn not_walked(&mut self, folder: &Path, error: &walkdir::Error) {
        let path = error.path().unwrap_or(folder);
        let missing = error.io_error().is_some_and(is_missing);
        if let Some(above) = error.loop_ancestor() {
            self.passed_over.push(format!(
                "{}: leads back to {}, whose jobs are checked once",
                path.display(),
                above.display()
            ));
        } else if missing && !is_job_file(path) {
            self.passed_over
                .push(format!("{}: a link that leads nowhere", path.display()));
        } else {
            let reason = error
                .io_error()
                .map_or_else(|| error.to_string(), cannot_be_read);
            self.jobs.push(Source::Unreadable(path.to_owned(), reason));
        }
    }
}

/// The complaint about a folder without a job.
pub(super) fn no_job_in(folder: &Path) -> String {
    format!("{}: no job file in this folder", folder.display())
}

fn is_job_file(path: &Path) -> bool {
    path.extension()
        .is_some_and(|extension| extension == "toml")
}

/// Hidden files and folders are left alone, unless the command line names them.
fn is_hidden(entry: &DirEntry) -> bool {
    entry.depth() > 0 && entry.file_name().as_encoded_bytes().starts_with(b".")
}

/// Drops what stands for a file that came before, whatever links led to it.
fn keep_each_once(jobs: &mut Vec<Source>) {
    let mut seen = HashSet::new();
    let mut standard = false;
    jobs.retain(|source| match source {
        Source::Standard => !std::mem::replace(&mut standard, true),
        Source::Named(path) | Source::Found(path, _) | Source::Unreadable(path, _) => {
            let whole = std::fs::canonicalize(path);
            seen.insert(whole.unwrap_or_else(|_| path.clone()))
        }
    });
}
