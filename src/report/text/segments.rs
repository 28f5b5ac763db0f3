//! The table of a member's segments with their layers: what they are, and what they carry.

use super::column::Column;
use super::member::Page;
use super::table::Table;
use crate::model::Name;
use crate::quantity::{Area, Force, Length, Measure, Stress};
use crate::result::{LayerResult, MemberResult, SegmentResult};
use std::iter;

/// A row: a segment, or one of its layers below it.
enum Row<'a> {
    Segment(&'a SegmentResult),
    Layer(&'a SegmentResult, &'a LayerResult),
}

impl<'a> Row<'a> {
    fn all(segments: &'a [SegmentResult]) -> Vec<Self> {
        let rows = segments.iter().flat_map(|segment| {
            let layers = segment.layers.iter();
            iter::once(Row::Segment(segment))
                .chain(layers.map(move |layer| Row::Layer(segment, layer)))
        });
        rows.collect()
    }

    fn name(&self) -> String {
        match self {
            Row::Segment(segment) => segment.name.to_string(),
            Row::Layer(segment, layer) => format!("{}.{}", segment.name, layer.name),
        }
    }

    fn material(&self) -> Option<&Name> {
        match self {
            Row::Segment(segment) => segment.material.as_ref(),
            Row::Layer(_, layer) => Some(&layer.material),
        }
    }

    /// What only a segment has; nothing for a layer.
    fn segment<T>(&self, of: impl Fn(&SegmentResult) -> Option<T>) -> Option<T> {
        match self {
            Row::Segment(segment) => of(segment),
            Row::Layer(..) => None,
        }
    }

    /// What both have.
    fn either<T>(
        &self,
        segment: impl Fn(&SegmentResult) -> T,
        layer: impl Fn(&LayerResult) -> T,
    ) -> T {
        match self {
            Row::Segment(of) => segment(of),
            Row::Layer(_, of) => layer(of),
        }
    }
}

/// The table of a member's segments.
pub(super) fn table(page: &Page, member: &MemberResult) -> Table {
    let rows = Row::all(&member.segments);
    let make_up = make_up(&rows, page).into_iter();
    Table::of([Column::names("segment", rows.iter().map(Row::name))])
        .block(make_up.chain(forces(&rows, page)))
        .block(stresses(&rows, page))
}

fn make_up(rows: &[Row], page: &Page) -> Vec<Column> {
    let length = page.along("length", rows, |row| {
        row.segment(|segment| Some(segment.to - segment.from))
    });
    let start = page.column("area", rows, 0.0, |row| row.segment(|of| of.area_start));
    let end = page.column("area", rows, 0.0, |row| row.segment(|of| of.area_end));
    let materials = rows
        .iter()
        .map(|row| row.material().map_or("", |name| name));
    let material = Column::names("material", materials);
    if start.shows_as(&end) {
        return vec![length, start, material];
    }
    let unit = page.style.unit(Area::DIMENSION);
    let (start, end) = (
        start.headed("area\nstart", unit),
        end.headed("area\nend", unit),
    );
    vec![length, start, end, material]
}

fn forces(rows: &[Row], page: &Page) -> Vec<Column> {
    let largest = |row: &Row| row.segment(largest_inside);
    let least = |row: &Row| row.segment(least_inside);
    vec![
        page.column("N start", rows, page.force, |row| {
            Some(row.either(|of| of.force_start, |of| of.force_start))
        }),
        page.column("N end", rows, page.force, |row| {
            Some(row.either(|of| of.force_end, |of| of.force_end))
        }),
        page.column("N\nlargest", rows, page.force, |row| {
            largest(row).map(|(force, _)| force)
        }),
        page.along("at", rows, |row| largest(row).map(|(_, at)| at)),
        page.column("N\nleast", rows, page.force, |row| {
            least(row).map(|(force, _)| force)
        }),
        page.along("at", rows, |row| least(row).map(|(_, at)| at)),
    ]
}

/// One column where the stress is the same all along every row, else the extremes with their
/// places.
fn stresses(rows: &[Row], page: &Page) -> Vec<Column> {
    let largest = page.column("stress", rows, page.stress, |row| {
        row.either(|of| of.stress_max, |of| of.stress_max)
    });
    let least = page.column("stress", rows, page.stress, |row| {
        row.either(|of| of.stress_min, |of| of.stress_min)
    });
    if largest.shows_as(&least) {
        return vec![largest];
    }
    let unit = page.style.unit(Stress::DIMENSION);
    vec![
        largest.headed("stress\nlargest", unit),
        page.along("at", rows, |row| {
            row.either(|of| of.stress_max_at, |of| of.stress_max_at)
        }),
        least.headed("stress\nleast", unit),
        page.along("at", rows, |row| {
            row.either(|of| of.stress_min_at, |of| of.stress_min_at)
        }),
    ]
}

/// The largest force of a segment with its place, where it is larger than at both ends.
fn largest_inside(segment: &SegmentResult) -> Option<(Force, Length)> {
    let inside = segment.force_max > segment.force_start && segment.force_max > segment.force_end;
    inside.then_some((segment.force_max, segment.force_max_at))
}

/// The least force of a segment with its place, where it is less than at both ends.
fn least_inside(segment: &SegmentResult) -> Option<(Force, Length)> {
    let inside = segment.force_min < segment.force_start && segment.force_min < segment.force_end;
    inside.then_some((segment.force_min, segment.force_min_at))
}
