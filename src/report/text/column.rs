//! One column of a table: its heading, its cells, how narrow it may get.

use super::words::printable;
use unicode_width::UnicodeWidthStr;

/// A text may be broken into so many lines before a table goes on below instead.
const FEW: usize = 2;

/// Where the cells of a column may be broken over several lines.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Breaks {
    /// Nowhere: numbers, units, verdicts, single words.
    Never,
    /// At blanks, and after the dots of an address, but never within a number.
    Names,
    /// After the `/` between the choices of a combination.
    Combinations,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Kind {
    Text,
    Number,
    Verdict,
}

/// One column: its heading, its unit, a cell for each row.
#[derive(Debug, Clone)]
pub(super) struct Column {
    pub(super) heading: String,
    pub(super) cells: Vec<String>,
    pub(super) kind: Kind,
    breaks: Breaks,
}

impl Column {
    /// Words that are never broken.
    pub(super) fn words<T: AsRef<str>>(heading: &str, cells: impl IntoIterator<Item = T>) -> Self {
        Self::text(heading, cells, Breaks::Never)
    }

    /// Names of things in the job.
    pub(super) fn names<T: AsRef<str>>(heading: &str, cells: impl IntoIterator<Item = T>) -> Self {
        Self::text(heading, cells, Breaks::Names)
    }

    /// Names of combinations.
    pub(super) fn combinations<T: AsRef<str>>(cells: impl IntoIterator<Item = T>) -> Self {
        Self::text("combination", cells, Breaks::Combinations)
    }

    fn text<T: AsRef<str>>(
        heading: &str,
        cells: impl IntoIterator<Item = T>,
        breaks: Breaks,
    ) -> Self {
        let cells = cells
            .into_iter()
            .map(|cell| printable(cell.as_ref()).into_owned());
        Column {
            heading: heading.to_owned(),
            cells: cells.collect(),
            kind: Kind::Text,
            breaks,
        }
    }

    /// Numbers of one unit (none for a ratio), their decimal points below one another.
    pub(super) fn number(
        heading: &str,
        unit: Option<&str>,
        cells: impl IntoIterator<Item = String>,
    ) -> Self {
        let heading = match unit {
            Some(unit) => format!("{heading}\n[{unit}]"),
            None => heading.to_owned(),
        };
        let mut cells: Vec<String> = cells.into_iter().collect();
        align_points(&mut cells);
        Column {
            heading,
            cells,
            kind: Kind::Number,
            breaks: Breaks::Never,
        }
    }

    /// Verdict words, which are coloured where the page is.
    pub(super) fn verdicts(cells: impl IntoIterator<Item = &'static str>) -> Self {
        Column {
            kind: Kind::Verdict,
            ..Self::words("verdict", cells)
        }
    }

    /// The same numbers under another heading.
    pub(super) fn headed(mut self, heading: &str, unit: &str) -> Self {
        self.heading = format!("{heading}\n[{unit}]");
        self
    }

    /// The same cells under another heading.
    pub(super) fn headed_as(mut self, heading: &str) -> Self {
        self.heading = heading.to_owned();
        self
    }

    /// The same numbers without decimals where all of them have only zeros there: lengths and
    /// places, which a job mostly gives in whole units.
    pub(super) fn without_idle_decimals(mut self) -> Self {
        let fraction = |cell: &String| {
            cell.trim_end()
                .split_once('.')
                .map(|(_, digits)| digits.to_owned())
        };
        let idle = |digits: String| digits.bytes().all(|digit| digit == b'0');
        if self.cells.iter().filter_map(fraction).all(idle) {
            for cell in &mut self.cells {
                let whole = cell.split('.').next().unwrap_or_default().trim_end();
                cell.truncate(whole.len());
            }
        }
        self
    }

    /// Whether no row has anything to say in it.
    pub(super) fn is_empty(&self) -> bool {
        self.cells.iter().all(|cell| cell.trim().is_empty())
    }

    /// Whether it shows the same as another, row by row.
    pub(super) fn shows_as(&self, other: &Column) -> bool {
        let mut pairs = self.cells.iter().zip(&other.cells);
        pairs.all(|(one, two)| one.trim() == two.trim())
    }

    /// The width in which nothing is broken.
    pub(super) fn whole_width(&self) -> usize {
        self.widest(|cell| cell.width())
    }

    /// The width in which no text has more than a few lines.
    pub(super) fn fair_width(&self) -> usize {
        if self.breaks == Breaks::Never {
            return self.whole_width();
        }
        let least = self.least_width();
        let fair = |cell: &str| {
            let mut widths = least..=cell.width().max(least);
            widths.find(|&width| self.breaks.lines(cell, width).len() <= FEW)
        };
        self.widest(|cell| fair(cell).unwrap_or(least))
    }

    /// The width of the widest part that cannot be broken.
    pub(super) fn least_width(&self) -> usize {
        self.widest(|cell| {
            let pieces = self.breaks.pieces(cell).into_iter();
            pieces
                .map(|piece| piece.trim_end().width())
                .max()
                .unwrap_or(0)
        })
    }

    /// The widest of the heading and the cells.
    fn widest(&self, of: impl Fn(&str) -> usize) -> usize {
        let headings = self.heading.lines().map(UnicodeWidthStr::width);
        let cells = self.cells.iter().map(|cell| of(cell));
        headings.chain(cells).max().unwrap_or(0)
    }

    /// A cell in lines of at most `width` columns where its parts allow that.
    pub(super) fn cell(&self, row: usize, width: usize) -> String {
        let cell = self.cells.get(row).map_or("", String::as_str);
        if cell.width() <= width {
            return cell.to_owned();
        }
        self.breaks.lines(cell, width).join("\n")
    }
}

impl Breaks {
    /// The parts of a text between which a line may end; blanks stay with the part before.
    fn pieces(self, text: &str) -> Vec<&str> {
        let may_end_after = |index: usize, character: char| match self {
            Breaks::Never => false,
            Breaks::Combinations => character == '/',
            Breaks::Names if character == '.' => {
                let digit = |byte: Option<&u8>| byte.is_some_and(u8::is_ascii_digit);
                let bytes = text.as_bytes();
                let before = index.checked_sub(1).and_then(|index| bytes.get(index));
                // An axis at the end stays with its quantity.
                let is_axis = bytes.len() == index + 2;
                !(is_axis || digit(before) && digit(bytes.get(index + 1)))
            }
            Breaks::Names => character == ' ',
        };
        let mut pieces = Vec::new();
        let mut from = 0;
        for (index, character) in text.char_indices() {
            let to = index + character.len_utf8();
            if to < text.len() && may_end_after(index, character) {
                pieces.extend(text.get(from..to));
                from = to;
            }
        }
        pieces.extend(text.get(from..));
        pieces
    }

    fn lines(self, text: &str, width: usize) -> Vec<String> {
        let mut lines: Vec<String> = Vec::new();
        for piece in self.pieces(text) {
            match lines.last_mut() {
                Some(line) if line.width() + piece.trim_end().width() <= width => {
                    line.push_str(piece);
                }
                _ => lines.push(piece.to_owned()),
            }
        }
        for line in &mut lines {
            line.truncate(line.trim_end().len());
        }
        lines
    }
}

/// Pads numbers on their right until their decimal points stand below one another when they are
/// aligned on the right; words among them stay as they are.
fn align_points(cells: &mut [String]) {
    let behind = |cell: &String| {
        let is_number = cell
            .bytes()
            .last()
            .is_some_and(|byte| byte.is_ascii_digit());
        is_number.then(|| cell.len() - cell.find(['.', 'e']).unwrap_or(cell.len()))
    };
    let deepest = cells.iter().filter_map(behind).max().unwrap_or(0);
    for cell in cells {
        if let Some(own) = behind(cell) {
            cell.push_str(&" ".repeat(deepest - own));
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn decimal_points_stand_below_one_another() {
        let numbers = ["19420", "0.4848", "-61.89", "1.000e-7", "yes", ""];
        let column = Column::number("N", None, numbers.map(str::to_owned));
        // Aligned on the right, each has its point, or its end, seven columns from there.
        let from_right =
            |cell: &String| cell.len() - cell.find('.').unwrap_or(cell.trim_end().len());
        let points: Vec<usize> = column.cells.iter().take(4).map(from_right).collect();
        assert_eq!(points, [7; 4]);
        assert_eq!(column.cells[4..], ["yes", ""]);
    }

    #[test]
    fn whole_lengths_have_no_decimals_and_others_keep_theirs() {
        let shown = |numbers: [&str; 3]| {
            let column = Column::number("at", Some("mm"), numbers.map(str::to_owned));
            let cells = column.without_idle_decimals().cells;
            cells
                .iter()
                .map(|cell| cell.trim_end().to_owned())
                .collect::<Vec<_>>()
        };
        assert_eq!(shown(["2850", "150.0", "0"]), ["2850", "150", "0"]);
        assert_eq!(
            shown(["2850", "150.5", "60.00"]),
            ["2850", "150.5", "60.00"]
        );
    }

    #[test]
    fn texts_are_broken_only_where_their_kind_allows() {
        let pieces = |breaks: Breaks, text| breaks.pieces(text).join("|");
        let combination = "service 2/wind=1.5/snow=0";
        assert_eq!(
            pieces(Breaks::Combinations, combination),
            "service 2/|wind=1.5/|snow=0"
        );
        assert_eq!(
            pieces(Breaks::Names, "H4.lower thread.1.25 m"),
            "H4.|lower |thread.|1.25 |m"
        );
        assert_eq!(
            pieces(Breaks::Names, "anchor.reaction.y"),
            "anchor.|reaction.y"
        );
        assert_eq!(pieces(Breaks::Never, "concrete c40/50"), "concrete c40/50");
    }

    #[test]
    fn a_fair_width_asks_for_two_lines_and_a_least_one_for_as_many_as_it_takes() {
        let column = Column::combinations(["strength/rub-bow=1.5/rub-stern=0/sun=1"]);
        assert_eq!(column.whole_width(), 38);
        assert_eq!(column.fair_width(), "strength/rub-bow=1.5/".len());
        assert_eq!(column.least_width(), "rub-stern=0/".len());
        assert_eq!(
            column.cell(0, 12),
            "strength/\nrub-bow=1.5/\nrub-stern=0/\nsun=1"
        );
        assert_eq!(
            column.cell(0, 3),
            column.cell(0, 12),
            "no part is ever broken"
        );
    }
}
