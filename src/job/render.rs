//! How a located error is drawn.

use super::{Problem, Source};
use std::fmt::Write;
use unicode_width::UnicodeWidthChar;

/// As many problems are drawn; the rest is counted.
pub const DRAWN: usize = 50;
/// So many columns of the line of text are shown at the most.
const WIDTH: usize = 76;
/// So many columns before the place are kept when a long line is cut.
const BEFORE: usize = 24;
/// The text is indented by this.
const INDENT: &str = "    ";

/// One problem: where it is, what is wrong, the line with the place underlined, what to write
/// instead. Ends with a line break.
pub fn draw(problem: &Problem, source: &Source) -> String {
    let (line, column) = source.line_and_column(&problem.place);
    let mut out = format!(
        "{}, line {line}, column {column}: {}\n",
        source.file, problem.message
    );
    let (text, part) = source.line_around(&problem.place);
    if !text.trim().is_empty() {
        let near = near(text, part.start);
        let part = part.start - near.start..part.end.min(near.end) - near.start;
        let cells: Vec<Cell> = cells(&text[near.clone()], &part);
        let (from, to) = window(&cells);
        let cut = (
            from > 0 || near.start > 0,
            to < cells.len() || near.end < text.len(),
        );
        let mut shown = String::new();
        let mut marks = String::new();
        if cut.0 {
            shown.push('…');
            marks.push(' ');
        }
        for cell in &cells[from..to] {
            shown.push_str(&cell.text);
            let mark = if cell.marked { "~" } else { " " };
            marks.push_str(&mark.repeat(cell.width));
        }
        if cut.1 {
            shown.push('…');
        }
        if !cells.iter().any(|cell| cell.marked) {
            marks.push('~'); // a place at the end of the line
        }
        let _ = writeln!(out, "{INDENT}{}", shown.trim_end());
        let _ = writeln!(out, "{INDENT}{}", marks.trim_end());
    }
    if let Some(help) = &problem.help {
        let _ = writeln!(out, "{INDENT}Instead: {help}");
    }
    out
}

/// The first [`DRAWN`] problems with a blank line between, and the count of the rest.
pub fn draw_all(problems: &[Problem], source: &Source) -> String {
    let mut out = String::new();
    for (index, problem) in problems.iter().take(DRAWN).enumerate() {
        if index > 0 {
            out.push('\n');
        }
        out.push_str(&draw(problem, source));
    }
    if problems.len() > DRAWN {
        let rest = problems.len() - DRAWN;
        let _ = writeln!(out, "\n{}: {rest} more errors are not shown", source.file);
    }
    out
}

/// The part of a line around a byte of it that may come to be shown, so that the cost of drawing
/// does not hang on how long the line is.
fn near(line: &str, at: usize) -> std::ops::Range<usize> {
    let is_boundary = |end: &usize| line.is_char_boundary(*end);
    let from = (0..=at.saturating_sub(8 * WIDTH)).rev().find(is_boundary);
    let to = (line.len().min(at + 8 * WIDTH)..=line.len()).find(is_boundary);
    from.unwrap_or(0)..to.unwrap_or(line.len())
}

/// A character as it is shown.
struct Cell {
    text: String,
    width: usize,
    marked: bool,
}

fn cells(line: &str, part: &std::ops::Range<usize>) -> Vec<Cell> {
    let mut column = 0;
    line.char_indices()
        .map(|(at, character)| {
            let text = match character {
                '\t' => " ".repeat(4 - column % 4),
                c if c.is_control() => "\u{fffd}".to_owned(),
                c => c.to_string(),
            };
            let width = match character {
                '\t' => text.len(),
                c if c.is_control() => 1,
                c => c.width().unwrap_or(1),
            };
            column += width;
            Cell {
                text,
                width,
                marked: part.contains(&at),
            }
        })
        .collect()
}

/// Which cells are shown, so that the place is among them and the line stays narrow.
fn window(cells: &[Cell]) -> (usize, usize) {
    let total: usize = cells.iter().map(|cell| cell.width).sum();
    if total <= WIDTH {
        return (0, cells.len());
    }
    let marked = cells
        .iter()
        .position(|cell| cell.marked)
        .unwrap_or(cells.len());
    let mut from = marked;
    let mut width = 0;
    while from > 0 && width + cells[from - 1].width <= BEFORE {
        from -= 1;
        width += cells[from].width;
    }
    let mut to = marked;
    while to < cells.len() && width + cells[to].width <= WIDTH {
        width += cells[to].width;
        to += 1;
    }
    while from > 0 && width + cells[from - 1].width <= WIDTH {
        from -= 1;
        width += cells[from].width;
    }
    (from, to)
}
