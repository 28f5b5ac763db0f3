//! Reading a Markdown page: its marked tables, its blocks, its links.

use std::fs;
use std::path::{Path, PathBuf};

/// A page of the repository.
pub(crate) struct Page {
    path: PathBuf,
    text: String,
}

/// A table below a mark `<!-- KIND: NAME -->`, or `<!-- KIND -->`.
pub(crate) struct Table<'p> {
    pub(crate) name: &'p str,
    pub(crate) heads: Vec<&'p str>,
    pub(crate) rows: Vec<Vec<&'p str>>,
}

/// A fenced block: the word after its fence, and its text.
pub(crate) struct Block<'p> {
    pub(crate) kind: &'p str,
    pub(crate) text: &'p str,
}

pub(crate) fn root() -> &'static Path {
    Path::new(env!("CARGO_MANIFEST_DIR"))
}

impl Page {
    pub(crate) fn read(path: &str) -> Self {
        let path = root().join(path);
        let text = fs::read_to_string(&path).unwrap();
        Page { path, text }
    }

    /// The tables that are marked as this kind.
    pub(crate) fn tables(&self, kind: &str) -> Vec<Table<'_>> {
        let mark = format!("<!-- {kind}");
        let parts = self.text.split(mark.as_str()).skip(1);
        let tables = parts.filter_map(|part| {
            let (name, below) = part.split_once("-->")?;
            let name = name.strip_prefix(':').or((name == " ").then_some(""))?;
            let mut lines = below.trim_start().lines();
            let heads = cells(lines.next()?);
            lines.next()?;
            let rows = lines.take_while(|line| line.starts_with('|')).map(cells);
            Some(Table {
                name: name.trim(),
                heads,
                rows: rows.collect(),
            })
        });
        let tables: Vec<_> = tables.collect();
        assert!(!tables.is_empty(), "no table is marked `{kind}`");
        tables
    }

    /// The fenced blocks in the order of the page.
    pub(crate) fn blocks(&self) -> Vec<Block<'_>> {
        let mut blocks = Vec::new();
        let mut rest = self.text.as_str();
        while let Some((_, after)) = rest.split_once("\n```") {
            let (kind, body) = after.split_once('\n').unwrap();
            // An empty block closes at once.
            let end = if body.starts_with("```") {
                0
            } else {
                body.find("\n```").unwrap() + 1
            };
            let (text, below) = body.split_at(end);
            blocks.push(Block { kind, text });
            rest = &below["```".len()..];
        }
        blocks
    }

    /// The blocks that stand below a heading, up to the next of its level.
    pub(crate) fn section(&self, heading: &str) -> Page {
        let (_, below) = self.text.split_once(&format!("\n## {heading}\n")).unwrap();
        let text = below.split("\n## ").next().unwrap();
        Page {
            path: self.path.clone(),
            text: format!("\n{text}"),
        }
    }

    /// Holds blocks, in the order of the page, against what the program prints now, or puts that in
    /// their place.
    pub(crate) fn hold(&self, shown: &[(&Block<'_>, String)]) {
        let mut text = self.text.clone();
        let mut differ = false;
        for (block, printed) in shown {
            if same(block.text, printed) {
                continue;
            }
            differ = true;
            // By its place, since two blocks may be alike.
            let at = block.text.as_ptr() as usize - self.text.as_ptr() as usize;
            let tail = self.text.len() - at;
            let at = text.len() - tail;
            text.replace_range(at..at + block.text.len(), printed);
        }
        if !differ {
            return;
        }
        if std::env::var_os("UPDATE_DOCUMENTS").is_some() {
            // At once, since other tests read the page meanwhile.
            let written = self.path.with_extension("written");
            fs::write(&written, text).unwrap();
            fs::rename(written, &self.path).unwrap();
        } else {
            panic!(
                "{} does not show what the program prints; run\n    UPDATE_DOCUMENTS=1 cargo test \
                 --test documentation\nand look at what it changed. Printed now:\n{}",
                self.path.display(),
                shown
                    .iter()
                    .map(|(_, printed)| printed.as_str())
                    .collect::<String>()
            );
        }
    }

    /// The targets of its links within the repository.
    pub(crate) fn links(&self) -> Vec<PathBuf> {
        let folder = self.path.parent().unwrap();
        let targets = self.text.split("](").skip(1);
        let targets = targets.filter_map(|rest| rest.split(')').next());
        let targets = targets.filter(|target| !target.contains("://") && !target.starts_with('#'));
        let files = targets.map(|target| target.split('#').next().unwrap());
        files.map(|file| folder.join(file)).collect()
    }
}

/// Whether a page shows what is printed. Residuals are rounding, whose digits say nothing: the
/// paragraph that holds them is compared by its words.
fn same(shown: &str, printed: &str) -> bool {
    fn words(paragraph: &str) -> Vec<&str> {
        let words = paragraph.split_whitespace();
        words
            .map(|word| match word.trim_end_matches(',').parse::<f64>() {
                Ok(number) if number.abs() < 1e-12 => "rounding",
                _ => word,
            })
            .collect()
    }
    let (shown, printed) = (shown.split("\n\n"), printed.split("\n\n"));
    shown.clone().count() == printed.clone().count()
        && shown.zip(printed).all(|(shown, printed)| {
            shown == printed
                || printed.to_lowercase().contains("residuals") && words(shown) == words(printed)
        })
}

/// The cells of a row, without the bars at its ends.
fn cells(line: &str) -> Vec<&str> {
    let inner = line
        .strip_prefix('|')
        .and_then(|line| line.strip_suffix('|'));
    inner.unwrap().split(" |").map(str::trim).collect()
}

/// The words of a cell that stand between backticks.
pub(crate) fn code(cell: &str) -> Vec<&str> {
    cell.split('`').skip(1).step_by(2).collect()
}

#[test]
fn links_lead_somewhere() {
    let pages = [
        "README.md",
        "DEVELOPERS.md",
        "CHANGELOG.md",
        "docs/job-file.md",
        "docs/results.md",
        "docs/mechanics.md",
        "examples/README.md",
    ];
    let mut seen = 0;
    for page in pages {
        for target in Page::read(page).links() {
            assert!(target.exists(), "{page} links to {}", target.display());
            seen += 1;
        }
    }
    assert!(seen > 10, "links are found");
}
