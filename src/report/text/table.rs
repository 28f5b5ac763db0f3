//! Tables of the text report: two blanks between columns, one rule under the headings, numbers
//! with their points below one another and never broken.
//!
//! A table that is wider than the page goes on in a second one below, under the same identity
//! columns. Only what is still too wide then has its names broken, where names may be; and if not
//! even that helps, the line is longer than the page.

use super::Layout;
use super::column::{Column, Kind};
use super::words::{paint, split_at_column};
use comfy_table::{
    Cell, CellAlignment, ColumnConstraint, LineStyle, Table as Grid, TableStyle, Width,
};
use std::io::{self, Write};

/// Blanks between two columns.
const BETWEEN: usize = 2;
const STYLE: TableStyle = TableStyle::new().header_separator(LineStyle::none().fill('-'));

/// A table: what names its rows, and blocks of columns that belong together.
#[derive(Debug, Default)]
pub(super) struct Table {
    identity: Vec<Column>,
    blocks: Vec<Vec<Column>>,
}

impl Table {
    /// A table whose rows are named by these columns.
    pub(super) fn of(identity: impl IntoIterator<Item = Column>) -> Self {
        Table {
            identity: identity.into_iter().collect(),
            blocks: Vec::new(),
        }
    }

    /// Adds columns that stand side by side where the page is wide enough for them; one without
    /// any content is left out.
    pub(super) fn block(mut self, columns: impl IntoIterator<Item = Column>) -> Self {
        let filled = columns.into_iter().filter(|column| !column.is_empty());
        self.blocks.push(filled.collect());
        self
    }

    /// Writes it, in as many parts below one another as the page's width asks for.
    ///
    /// # Errors
    /// Those of `out`.
    pub(super) fn write(&self, out: &mut dyn Write, layout: &Layout) -> io::Result<()> {
        for (index, part) in self.parts(layout.width).iter().enumerate() {
            if index > 0 {
                writeln!(out)?;
            }
            write_part(out, part, layout)?;
        }
        Ok(())
    }

    /// The columns of each part, no wider than the page where that can be.
    fn parts(&self, page: usize) -> Vec<Vec<&Column>> {
        let identity: Vec<&Column> = self.identity.iter().collect();
        let mut parts = Vec::new();
        let mut part = identity.clone();
        for block in self.blocks.iter().filter(|block| !block.is_empty()) {
            let together: Vec<&Column> = part.iter().copied().chain(block).collect();
            if total(&together, Column::whole_width) <= page {
                part = together;
                continue;
            }
            if part.len() > identity.len() {
                parts.push(std::mem::replace(&mut part, identity.clone()));
            }
            for column in block {
                part.push(column);
                if part.len() > identity.len() + 1 && total(&part, Column::fair_width) > page {
                    part.pop();
                    parts.push(std::mem::replace(&mut part, identity.clone()));
                    part.push(column);
                }
            }
        }
        parts.push(part);
        parts
    }
}

/// The width of columns side by side.
fn total(columns: &[&Column], width: fn(&Column) -> usize) -> usize {
    sum(columns.iter().map(|column| width(column)))
}

fn sum(widths: impl ExactSizeIterator<Item = usize>) -> usize {
    let gaps = BETWEEN * widths.len().saturating_sub(1);
    widths.sum::<usize>() + gaps
}

/// Widths with which the columns fit the page: the widest names give way first, to a few lines
/// each, and to more only where that is not enough.
fn widths(columns: &[&Column], page: usize) -> Vec<usize> {
    let mut widths: Vec<usize> = columns.iter().map(|column| column.whole_width()).collect();
    for floor in [Column::fair_width, Column::least_width] {
        let floors: Vec<usize> = columns.iter().map(|column| floor(column)).collect();
        while sum(widths.iter().copied()) > page {
            let giving = widths
                .iter_mut()
                .zip(&floors)
                .filter(|(width, floor)| **width > **floor);
            match giving.max_by_key(|(width, _)| **width) {
                Some((width, _)) => *width -= 1,
                None => break,
            }
        }
    }
    widths
}

fn write_part(out: &mut dyn Write, columns: &[&Column], layout: &Layout) -> io::Result<()> {
    let widths = widths(columns, layout.width);
    let lines = columns.iter().map(|column| column.heading.lines().count());
    let deepest = lines.max().unwrap_or(0);
    let mut grid = Grid::new();
    grid.load_style(STYLE);
    grid.set_header(columns.iter().map(|column| {
        let above = deepest - column.heading.lines().count();
        "\n".repeat(above) + &column.heading
    }));
    let rows = columns.first().map_or(0, |column| column.cells.len());
    for row in 0..rows {
        let cells = columns.iter().zip(&widths);
        grid.add_row(cells.map(|(column, width)| Cell::new(column.cell(row, *width))));
    }
    for ((index, column), width) in columns.iter().enumerate().zip(&widths) {
        let padding = if index + 1 < columns.len() {
            BETWEEN
        } else {
            0
        };
        let Some(drawn) = grid.column_mut(index) else {
            continue;
        };
        drawn.set_padding((0, narrow(padding)));
        drawn.set_constraint(ColumnConstraint::Absolute(Width::Fixed(narrow(
            width + padding,
        ))));
        if column.kind == Kind::Number {
            drawn.set_cell_alignment(CellAlignment::Right);
        }
    }
    let whole = sum(widths.iter().copied());
    grid.set_width(narrow(whole));
    let verdicts = columns
        .iter()
        .position(|column| column.kind == Kind::Verdict);
    let painted = verdicts.filter(|_| layout.colour).map(|index| {
        let before = widths.iter().take(index);
        before.map(|width| width + BETWEEN).sum::<usize>()
    });
    for line in grid.lines() {
        let line = line.trim_end();
        match painted.and_then(|from| split_at_column(line, from)) {
            Some((head, tail)) => {
                let word = tail.split(' ').next().unwrap_or_default();
                let rest = tail.get(word.len()..).unwrap_or_default();
                writeln!(out, "{head}{}{rest}", paint(word, true))?;
            }
            None => writeln!(out, "{line}")?,
        }
    }
    Ok(())
}

/// Widths beyond what the table library counts in are cut; no page is that wide.
fn narrow(width: usize) -> u16 {
    u16::try_from(width).unwrap_or(u16::MAX)
}

#[cfg(test)]
mod tests {
    use super::*;
    use unicode_width::UnicodeWidthStr;

    fn page(width: usize) -> Layout {
        Layout {
            width,
            colour: false,
            digits: 4,
        }
    }

    fn drawn(table: &Table, layout: &Layout) -> String {
        let mut out = Vec::new();
        table.write(&mut out, layout).unwrap();
        String::from_utf8(out).unwrap()
    }

    fn two_blocks() -> Table {
        let numbers = |from: usize| (from..from + 2).map(|number| format!("{number}.50"));
        Table::of([Column::names("member", ["H4", "Ø 20 東"])])
            .block([
                Column::number("force", Some("kN"), numbers(1)),
                Column::number("stress", Some("MPa"), numbers(10)),
            ])
            .block([
                Column::number("gap", Some("mm"), numbers(100)),
                Column::number("none", None, ["", ""].map(str::to_owned)),
            ])
    }

    #[test]
    fn numbers_stand_on_the_right_under_their_heading_and_unit() {
        let expected = "
         force  stress     gap
member    [kN]   [MPa]    [mm]
------------------------------
H4        1.50   10.50  100.50
Ø 20 東   2.50   11.50  101.50
";
        let text = drawn(&two_blocks(), &page(80));
        assert_eq!(text, expected.trim_start_matches('\n'));
    }

    #[test]
    fn what_is_too_wide_goes_on_below_under_the_same_names() {
        let text = drawn(&two_blocks(), &page(25));
        let parts: Vec<&str> = text.split("\n\n").collect();
        assert_eq!(parts.len(), 2, "{text}");
        assert!(parts.iter().all(|part| part.contains("Ø 20 東")));
        assert!(parts[1].contains("101.50") && !parts[0].contains("101.50"));
    }

    #[test]
    fn no_number_is_ever_broken_however_narrow_the_page() {
        for width in 1..40 {
            let text = drawn(&two_blocks(), &page(width));
            for number in ["1.50", "2.50", "10.50", "11.50", "100.50", "101.50"] {
                assert!(text.contains(number), "{number} at width {width}:\n{text}");
            }
        }
    }

    #[test]
    fn names_are_broken_only_where_the_page_asks_for_it() {
        let names = ["service/live=0/wind=1/snow=0.5", "strength"];
        let forces = ["1.0", "2.0"].map(str::to_owned);
        let table = Table::of([Column::combinations(names)]).block([Column::number(
            "force",
            Some("kN"),
            forces,
        )]);
        let lines = |width| drawn(&table, &page(width)).lines().count();
        assert_eq!([lines(80), lines(24), lines(19)], [5, 6, 8]);
        let text = drawn(&table, &page(24));
        assert!(text.lines().all(|line| line.width() <= 24), "{text}");
        assert!(
            text.contains("service/live=0/      1.0\nwind=1/snow=0.5\n"),
            "{text}"
        );
        assert!(text.lines().all(|line| line == line.trim_end()));
    }

    #[test]
    fn a_part_that_cannot_be_broken_makes_the_line_longer() {
        let table = Table::of([Column::combinations(["construction-stage-4/wind=0.25"])]).block([
            Column::number("force", Some("kN"), ["-1234.5678".to_owned()]),
        ]);
        let text = drawn(&table, &page(12));
        assert!(
            text.ends_with("construction-stage-4/  -1234.5678\nwind=0.25\n"),
            "{text}"
        );
    }

    #[test]
    fn only_the_verdict_column_is_coloured() {
        let table = Table::of([Column::words("check", ["fail", "gap"])]).block([
            Column::verdicts(["pass", "fail"]),
            Column::names("source", ["a pass", "to fail"]),
        ]);
        let colour = Layout {
            colour: true,
            ..page(80)
        };
        let text = drawn(&table, &colour);
        assert!(
            text.contains("fail   \u{1b}[32mpass\u{1b}[0m     a pass\n"),
            "{text}"
        );
        assert!(
            text.contains("gap    \u{1b}[31mfail\u{1b}[0m     to fail\n"),
            "{text}"
        );
        assert!(!drawn(&table, &page(80)).contains('\u{1b}'));
    }
}
