//! One member in one combination: its segments, supports and stations.

use super::table::{Column, Table};
use super::words::{title, wrapped};
use super::{Layout, number, optional, with_unit};
use crate::quantity::{Area, Force, Length, Measure, Stress, Style};
use crate::result::{
    LayerResult, MemberResult, MemberState, SegmentResult, SupportResult, SupportWord,
};
use std::io::{self, Write};
use std::iter;

/// Writes the tables and totals of a member.
pub(super) fn write(
    out: &mut dyn Write,
    member: &MemberResult,
    style: &Style,
    layout: &Layout,
) -> io::Result<()> {
    title(out, &format!("Member {}", member.name), '-', layout.width)?;
    for sentence in sentences(member, style) {
        wrapped(out, "", &sentence, layout.width)?;
    }
    writeln!(out)?;
    segments(member, style).write(out, layout)?;
    writeln!(out)?;
    elongations(member, style).write(out, layout)?;
    writeln!(out)?;
    stations(member, style).write(out, layout)?;
    if !member.supports.is_empty() {
        writeln!(out)?;
        supports(&member.supports, style).write(out, layout)?;
    }
    Ok(())
}

/// What is said of the member as a whole.
fn sentences(member: &MemberResult, style: &Style) -> Vec<String> {
    let show = |length: Length| with_unit(style, length);
    let mut sentences = vec![
        format!(
            "Axial force N: largest {} at {}, least {} at {}.",
            with_unit(style, member.force_max),
            show(member.force_max_at),
            with_unit(style, member.force_min),
            show(member.force_min_at),
        ),
        format!(
            "Applied forces sum to {}, reactions to {}.",
            with_unit(style, member.totals.applied),
            with_unit(style, member.totals.reactions),
        ),
    ];
    if member.state == MemberState::Slack {
        sentences.push(match member.slack_by {
            Some(distance) => format!("Slack: {} from carrying.", show(distance)),
            None => "Slack.".to_owned(),
        });
    }
    if let Some(misfit) = member.misfit_found {
        sentences.push(format!(
            "Its preload stands for a misfit of {}.",
            show(misfit)
        ));
    }
    if let Some(share) = member.restraint {
        let share = super::ratio(style, Some(share));
        sentences.push(format!(
            "Share of full restraint against temperature: {share}."
        ));
    }
    sentences
}

/// A row of the segments' table: a segment, or one of its layers below it.
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

    fn material(&self) -> &str {
        match self {
            Row::Segment(segment) => segment.material.as_deref().unwrap_or(""),
            Row::Layer(_, layer) => &layer.material,
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

/// The segments with their layers: what they are, and what they carry.
fn segments(member: &MemberResult, style: &Style) -> Table {
    let rows = Row::all(&member.segments);
    Table::of([Column::text("segment", rows.iter().map(Row::name))])
        .block(
            make_up(&rows, style)
                .into_iter()
                .chain(forces(&rows, style)),
        )
        .block(stresses(&rows, style))
}

fn make_up(rows: &[Row], style: &Style) -> Vec<Column> {
    let length = column("length", rows, style, |row| {
        row.segment(|segment| Some(segment.to - segment.from))
    });
    let start = column("area", rows, style, |row| row.segment(|of| of.area_start));
    let end = column("area", rows, style, |row| row.segment(|of| of.area_end));
    let material = Column::text("material", rows.iter().map(Row::material));
    if start.shows_as(&end) {
        return vec![length, start, material];
    }
    let unit = style.unit(Area::DIMENSION);
    let (start, end) = (
        start.headed("area\nstart", unit),
        end.headed("area\nend", unit),
    );
    vec![length, start, end, material]
}

fn forces(rows: &[Row], style: &Style) -> Vec<Column> {
    let largest = |row: &Row| row.segment(largest_inside);
    let least = |row: &Row| row.segment(least_inside);
    vec![
        column("N start", rows, style, |row| {
            Some(row.either(|of| of.force_start, |of| of.force_start))
        }),
        column("N end", rows, style, |row| {
            Some(row.either(|of| of.force_end, |of| of.force_end))
        }),
        column("N\nlargest", rows, style, |row| {
            largest(row).map(|(force, _)| force)
        }),
        column("at", rows, style, |row| largest(row).map(|(_, at)| at)),
        column("N\nleast", rows, style, |row| {
            least(row).map(|(force, _)| force)
        }),
        column("at", rows, style, |row| least(row).map(|(_, at)| at)),
    ]
}

/// One column where the stress is the same all along every row, else the extremes with their
/// places.
fn stresses(rows: &[Row], style: &Style) -> Vec<Column> {
    let largest = column("stress", rows, style, |row| {
        row.either(|of| of.stress_max, |of| of.stress_max)
    });
    let least = column("stress", rows, style, |row| {
        row.either(|of| of.stress_min, |of| of.stress_min)
    });
    if largest.shows_as(&least) {
        return vec![largest];
    }
    let unit = style.unit(Stress::DIMENSION);
    vec![
        largest.headed("stress\nlargest", unit),
        column("at", rows, style, |row| {
            row.either(|of| of.stress_max_at, |of| of.stress_max_at)
        }),
        least.headed("stress\nleast", unit),
        column("at", rows, style, |row| {
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

/// How the segments stretch, and the member in all.
fn elongations(member: &MemberResult, style: &Style) -> Table {
    let segments = &member.segments;
    let names = segments
        .iter()
        .map(|segment| &*segment.name)
        .chain(["whole member"]);
    let summed = |heading, part: fn(&SegmentResult) -> Length, sum: Length| {
        let lengths = segments.iter().map(part).chain([sum]);
        let cells = lengths.map(|length| number(style, length));
        Column::number(heading, Some(style.unit(Length::DIMENSION)), cells)
    };
    let gap = segments.iter().map(|segment| optional(style, segment.gap));
    let bears = segments.iter().map(|segment| yes_or_no(segment.bears));
    Table::of([Column::text("segment", names)]).block([
        summed(
            "elongation\nfrom force",
            |of| of.elongation_force,
            member.elongation_force,
        ),
        summed(
            "from\ntemperature",
            |of| of.elongation_temperature,
            member.elongation_temperature,
        ),
        summed(
            "from misfit\nand strain",
            |of| of.elongation_misfit,
            member.elongation_misfit,
        ),
        summed("elongation\nin all", |of| of.elongation, member.elongation),
        Column::number(
            "gap",
            Some(style.unit(Length::DIMENSION)),
            gap.chain([String::new()]),
        ),
        Column::text("bears", bears.chain([""])),
    ])
}

fn stations(member: &MemberResult, style: &Style) -> Table {
    let rows = &member.stations;
    Table::of([Column::text(
        "station",
        rows.iter().map(|station| &station.name),
    )])
    .block([
        column("at", rows, style, |station| Some(station.x)),
        column("displacement", rows, style, |station| {
            Some(station.displacement)
        }),
        column("N before", rows, style, |station| station.force_before),
        column("N after", rows, style, |station| station.force_after),
    ])
}

fn supports(rows: &[SupportResult], style: &Style) -> Table {
    let kind = rows.iter().map(|support| match support.kind {
        SupportWord::Fixed => "fixed",
        SupportWord::Spring => "spring",
        SupportWord::Stop => "stop",
    });
    let reaction = rows.iter().map(|support| match support.reaction {
        Some(reaction) => number(style, reaction),
        None => "undecided".to_owned(),
    });
    Table::of([Column::text(
        "support",
        rows.iter().map(|support| &support.name),
    )])
    .block([
        Column::text("at", rows.iter().map(|support| &support.at)),
        Column::text("kind", kind),
        Column::number("reaction", Some(style.unit(Force::DIMENSION)), reaction),
        column("gap", rows, style, |support| support.gap),
        Column::text("bears", rows.iter().map(|support| yes_or_no(support.bears))),
    ])
}

fn yes_or_no(answer: Option<bool>) -> &'static str {
    match answer {
        Some(true) => "yes",
        Some(false) => "no",
        None => "",
    }
}

/// A column of quantities; a row without one stays empty.
fn column<R, Q: Measure>(
    heading: &str,
    rows: &[R],
    style: &Style,
    of: impl Fn(&R) -> Option<Q>,
) -> Column {
    let cells = rows.iter().map(|row| optional(style, of(row)));
    Column::number(heading, Some(style.unit(Q::DIMENSION)), cells)
}
