//! Where a report goes: standard output, or a file that is written whole or not at all.

use std::fs::{self, File, Metadata, OpenOptions};
use std::io::{self, Write};
use std::path::{Path, PathBuf};
use tempfile::Builder;

/// Links from link to link that are followed before it is taken for a loop, as the system does.
const MOST_LINKS: usize = 40;

/// A file that a report will be written to.
#[derive(Debug)]
pub(super) struct Output {
    /// As the command line gave it, for messages.
    asked: PathBuf,
    /// The file itself, links followed.
    target: PathBuf,
    folder: PathBuf,
}

impl Output {
    /// Makes sure, before any work, that there is a place to write to.
    ///
    /// # Errors
    /// Says what is wrong with the path.
    pub(super) fn at(path: &Path) -> Result<Self, String> {
        let wrong = |what: &str| format!("{}: {what}", path.display());
        let target = follow(path).map_err(|error| wrong(&cannot_be_written(&error)))?;
        let parent = target
            .parent()
            .filter(|parent| !parent.as_os_str().is_empty());
        let folder = parent.unwrap_or(Path::new(".")).to_owned();
        if !folder.is_dir() {
            return Err(wrong("cannot be written: its folder does not exist"));
        }
        match fs::metadata(&target) {
            Ok(data) if data.is_dir() => return Err(wrong("cannot be written: it is a folder")),
            Ok(data) if data.is_file() && data.permissions().readonly() => {
                return Err(wrong("cannot be written: it is write-protected"));
            }
            Err(error) if error.kind() != io::ErrorKind::NotFound => {
                return Err(wrong(&cannot_be_written(&error)));
            }
            _ => {}
        }
        Ok(Output {
            asked: path.to_owned(),
            target,
            folder,
        })
    }

    /// Whether it is this file. A device or a pipe is not, even when it is read too.
    pub(super) fn is(&self, input: &Path) -> bool {
        let same = |a: &Path, b: &Path| {
            let whole = fs::canonicalize(a).ok().zip(fs::canonicalize(b).ok());
            whole.is_some_and(|(a, b)| a == b)
        };
        self.target.is_file() && same(&self.target, input)
    }

    /// Writes the whole text: beside the target first, then in its place at once. Permissions of an
    /// existing file are kept; a device or a pipe is written straight.
    ///
    /// # Errors
    /// Says what went wrong; the file is then as it was.
    pub(super) fn write(&self, text: &[u8]) -> Result<(), String> {
        let written = match fs::metadata(&self.target) {
            Ok(data) if !data.is_file() => write_straight(&self.target, text),
            Ok(data) => self.replace(text, Some(&data)),
            Err(_) => self.replace(text, None),
        };
        written.map_err(|error| format!("{}: {}", self.asked.display(), cannot_be_written(&error)))
    }

    fn replace(&self, text: &[u8], existing: Option<&Metadata>) -> io::Result<()> {
        let mut builder = Builder::new();
        builder.prefix(".lengthwise-");
        // The rights that the system gives to any new file, in place of a private one's.
        #[cfg(unix)]
        builder.permissions(std::os::unix::fs::PermissionsExt::from_mode(0o666));
        let mut file = builder.tempfile_in(&self.folder)?;
        file.write_all(text)?;
        if let Some(existing) = existing {
            file.as_file().set_permissions(existing.permissions())?;
        }
        file.as_file().sync_all()?;
        file.persist(&self.target).map_err(|error| error.error)?;
        Ok(())
    }
}

fn write_straight(target: &Path, text: &[u8]) -> io::Result<()> {
    let mut file: File = OpenOptions::new().write(true).open(target)?;
    file.write_all(text)?;
    file.flush()
}

fn cannot_be_written(error: &io::Error) -> String {
    format!("cannot be written: {error}")
}

/// The file at the end of a chain of links, which need not exist.
fn follow(path: &Path) -> io::Result<PathBuf> {
    let mut target = path.to_owned();
    for _ in 0..MOST_LINKS {
        match fs::symlink_metadata(&target) {
            Ok(data) if data.is_symlink() => {
                let next = fs::read_link(&target)?;
                target.pop();
                target.push(next);
            }
            Ok(_) => return Ok(target),
            Err(error) if error.kind() == io::ErrorKind::NotFound => return Ok(target),
            Err(error) => return Err(error),
        }
    }
    Err(io::Error::other("its links lead round in a circle"))
}

#[cfg(test)]
mod tests {
    use super::*;
    #[cfg(unix)]
    use std::os::unix::fs::{PermissionsExt, symlink};

    fn names(folder: &Path) -> Vec<String> {
        let entries = fs::read_dir(folder).unwrap();
        let names = entries.map(|entry| entry.unwrap().file_name().into_string().unwrap());
        names.collect()
    }

    #[test]
    fn a_new_file_holds_the_text_and_nothing_stays_beside_it() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("report.txt");
        Output::at(&path).unwrap().write(b"whole").unwrap();
        assert_eq!(fs::read(&path).unwrap(), b"whole");
        assert_eq!(names(folder.path()), ["report.txt"]);
    }

    #[cfg(unix)]
    #[test]
    fn permissions_of_an_existing_file_are_kept() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("report.txt");
        fs::write(&path, "old").unwrap();
        fs::set_permissions(&path, PermissionsExt::from_mode(0o640)).unwrap();
        Output::at(&path).unwrap().write(b"new").unwrap();
        let mode = fs::metadata(&path).unwrap().permissions().mode();
        assert_eq!(mode & 0o777, 0o640);
        assert_eq!(fs::read(&path).unwrap(), b"new");
    }

    #[cfg(unix)]
    #[test]
    fn a_link_is_followed_and_stays_a_link_even_to_a_file_that_is_not_there_yet() {
        let folder = tempfile::tempdir().unwrap();
        let link = folder.path().join("latest.txt");
        symlink("report.txt", &link).unwrap();
        for text in ["first", "second"] {
            Output::at(&link).unwrap().write(text.as_bytes()).unwrap();
            assert!(fs::symlink_metadata(&link).unwrap().is_symlink());
            let report = fs::read_to_string(folder.path().join("report.txt"));
            assert_eq!(report.unwrap(), text);
        }
    }

    #[cfg(unix)]
    #[test]
    fn links_in_a_circle_are_refused() {
        let folder = tempfile::tempdir().unwrap();
        let path = folder.path().join("a");
        symlink("a", &path).unwrap();
        let refusal = Output::at(&path).unwrap_err();
        assert!(refusal.contains("circle"), "{refusal}");
    }

    #[test]
    fn a_missing_folder_and_a_folder_in_its_place_are_refused_before_any_work() {
        let folder = tempfile::tempdir().unwrap();
        let missing = Output::at(&folder.path().join("none/report.txt")).unwrap_err();
        assert!(missing.ends_with("its folder does not exist"), "{missing}");
        let occupied = Output::at(folder.path()).unwrap_err();
        assert!(occupied.ends_with("it is a folder"), "{occupied}");
    }

    #[cfg(unix)]
    #[test]
    fn a_device_is_written_straight_and_a_full_one_is_told() {
        Output::at(Path::new("/dev/null"))
            .unwrap()
            .write(b"text")
            .unwrap();
        assert!(!fs::metadata("/dev/null").unwrap().is_file());
        let full = Output::at(Path::new("/dev/full")).unwrap().write(b"text");
        assert!(
            full.unwrap_err()
                .starts_with("/dev/full: cannot be written")
        );
    }
}
