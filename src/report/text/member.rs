//! One member in one combination: its segments, supports and stations.

use super::column::Column;
use super::table::Table;
use super::words::{title, wrapped};
use super::{Layout, assembly, largest, optional, segments, settled, with_unit};
use crate::quantity::{Force, Length, Measure, Style, from_si};
use crate::result::{MemberResult, MemberState, SegmentResult, SupportResult, SupportWord};
use std::io::{self, Write};

/// Writes the tables and totals of a member, of an assembly or by itself.
pub(super) fn write(
    out: &mut dyn Write,
    member: &MemberResult,
    assembly: Option<&assembly::Page>,
    style: &Style,
    layout: &Layout,
) -> io::Result<()> {
    let mut page = Page::of(member, style);
    if let Some(assembly) = assembly {
        // What cancels in a member was as large as what goes through the whole.
        page.force = page.force.max(assembly.force);
        page.movement = page.movement.max(assembly.movement);
    }
    title(out, &format!("Member {}", member.name), '-', layout.width)?;
    for sentence in page.sentences(member) {
        wrapped(out, "", &sentence, layout.width)?;
    }
    writeln!(out)?;
    segments::table(&page, member).write(out, layout)?;
    writeln!(out)?;
    page.elongations(member).write(out, layout)?;
    writeln!(out)?;
    page.stations(member).write(out, layout)?;
    if !member.supports.is_empty() {
        writeln!(out)?;
        page.supports(&member.supports).write(out, layout)?;
    }
    Ok(())
}

/// How the quantities of one member are shown: the style, and the largest of each kind, beside
/// which what rounding leaves is shown as 0.
pub(super) struct Page<'a> {
    pub(super) style: &'a Style,
    /// N, reactions and sums of forces.
    pub(super) force: f64,
    /// Elongations, their parts, displacements and gaps.
    pub(super) movement: f64,
    /// Stresses of segments and layers.
    pub(super) stress: f64,
    /// Lengths and places along the member.
    pub(super) length: f64,
}

impl<'a> Page<'a> {
    fn of(member: &MemberResult, style: &'a Style) -> Self {
        let segments = || member.segments.iter();
        let layers = || segments().flat_map(|segment| &segment.layers);
        let forces = segments().flat_map(|of| [of.force_max.value, of.force_min.value]);
        let of_layers = layers().flat_map(|of| [of.force_start.value, of.force_end.value]);
        let reactions = member
            .supports
            .iter()
            .filter_map(|support| support.reaction);
        let elongations = segments().flat_map(parts).chain([
            member.elongation,
            member.elongation_force,
            member.elongation_temperature,
            member.elongation_misfit,
        ]);
        let displacements = member.stations.iter().map(|station| station.displacement);
        let gaps = segments().filter_map(|segment| segment.gap);
        let gaps = gaps.chain(member.supports.iter().filter_map(|support| support.gap));
        let stresses = segments().flat_map(|of| [of.stress_max, of.stress_min]);
        let stresses = stresses.chain(layers().flat_map(|of| [of.stress_max, of.stress_min]));
        Page {
            style,
            force: largest(
                forces
                    .chain(of_layers)
                    .chain(reactions.map(|force| force.value)),
            ),
            movement: largest(
                elongations
                    .chain(displacements)
                    .chain(gaps)
                    .map(|of| of.value),
            ),
            stress: largest(stresses.flatten().map(|stress| stress.value)),
            length: largest(member.stations.iter().map(|station| station.x.value)),
        }
    }

    /// A column of quantities; a row without one stays empty, and what is nothing beside `largest`
    /// is 0.
    pub(super) fn column<R, Q: Measure>(
        &self,
        heading: &str,
        rows: &[R],
        largest: f64,
        of: impl Fn(&R) -> Option<Q>,
    ) -> Column {
        let cells = rows.iter().map(|row| match of(row) {
            Some(quantity) => self
                .style
                .number(Q::DIMENSION, settled(quantity.si(), largest)),
            None => String::new(),
        });
        Column::number(heading, Some(self.style.unit(Q::DIMENSION)), cells)
    }

    /// A column of lengths or places along the member.
    pub(super) fn along<R>(
        &self,
        heading: &str,
        rows: &[R],
        of: impl Fn(&R) -> Option<Length>,
    ) -> Column {
        let column = self.column(heading, rows, self.length, of);
        column.without_idle_decimals()
    }

    fn force(&self, force: Force) -> String {
        let force = settled(force.value, self.force);
        with_unit::<Force>(self.style, from_si(force))
    }

    /// What is said of the member as a whole.
    fn sentences(&self, member: &MemberResult) -> Vec<String> {
        let show = |length: Length| with_unit(self.style, length);
        let (most, least) = (self.force(member.force_max), self.force(member.force_min));
        let mut sentences = vec![
            if most == least {
                format!("Axial force N: {most} throughout.")
            } else {
                format!(
                    "Axial force N: largest {most} at {}, least {least} at {}.",
                    show(member.force_max_at),
                    show(member.force_min_at),
                )
            },
            format!(
                "Applied forces sum to {}, reactions to {}.",
                self.force(member.totals.applied),
                self.force(member.totals.reactions),
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
        // A member on one support has a share of exactly 0, which says nothing.
        if let Some(share) = member.restraint.filter(|share| *share != 0.0) {
            let share = super::ratio(self.style, Some(share));
            sentences.push(format!(
                "Share of full restraint against temperature: {share} (0 free to move, 1 held \
                 rigidly at both ends)."
            ));
        }
        if member
            .supports
            .iter()
            .any(|support| support.reaction.is_none())
        {
            sentences.push(
                "Undecided: rigid supports share a force in a way that nothing decides.".to_owned(),
            );
        }
        sentences
    }

    /// How the segments stretch, and the member in all.
    fn elongations(&self, member: &MemberResult) -> Table {
        let segments = member.segments.iter();
        let names = segments.clone().map(|segment| &*segment.name);
        let whole = [
            member.elongation_force,
            member.elongation_temperature,
            member.elongation_misfit,
            member.elongation,
        ];
        let rows: Vec<[Length; 4]> = segments.clone().map(parts).chain([whole]).collect();
        let part = |heading, index: usize| {
            self.column(heading, &rows, self.movement, move |row: &[Length; 4]| {
                row.get(index).copied()
            })
        };
        let gap = segments.clone().map(|of| of.gap).chain([None]);
        let gap: Vec<Option<Length>> = gap.collect();
        let bears = segments.map(|segment| yes_or_no(segment.bears));
        Table::of([Column::names("segment", names.chain(["whole member"]))]).block([
            part("elongation\nfrom force", 0),
            part("from\ntemperature", 1),
            part("from misfit\nand strain", 2),
            part("elongation\nin all", 3),
            self.column("gap", &gap, self.movement, |gap| *gap),
            Column::words("bears", bears.chain([""])),
        ])
    }

    fn stations(&self, member: &MemberResult) -> Table {
        let rows = &member.stations;
        let names = rows.iter().map(|station| &station.name);
        Table::of([Column::names("station", names)]).block([
            self.along("at", rows, |station| Some(station.x)),
            self.column("displacement", rows, self.movement, |station| {
                Some(station.displacement)
            }),
            self.column("N before", rows, self.force, |station| station.force_before),
            self.column("N after", rows, self.force, |station| station.force_after),
        ])
    }

    fn supports(&self, rows: &[SupportResult]) -> Table {
        let kind = rows.iter().map(|support| match support.kind {
            SupportWord::Fixed => "fixed",
            SupportWord::Spring => "spring",
            SupportWord::Stop => "stop",
        });
        let reaction = rows.iter().map(|support| match support.reaction {
            Some(reaction) => {
                let reaction: Force = from_si(settled(reaction.value, self.force));
                optional(self.style, Some(reaction))
            }
            None => "undecided".to_owned(),
        });
        let names = rows.iter().map(|support| &support.name);
        Table::of([Column::names("support", names)]).block([
            Column::names("at", rows.iter().map(|support| &support.at)),
            Column::words("kind", kind),
            Column::number(
                "reaction",
                Some(self.style.unit(Force::DIMENSION)),
                reaction,
            ),
            self.column("gap", rows, self.movement, |support| support.gap),
            Column::words("bears", rows.iter().map(|support| yes_or_no(support.bears))),
        ])
    }
}

/// The parts of a segment's elongation, and their sum.
fn parts(segment: &SegmentResult) -> [Length; 4] {
    [
        segment.elongation_force,
        segment.elongation_temperature,
        segment.elongation_misfit,
        segment.elongation,
    ]
}

fn yes_or_no(answer: Option<bool>) -> &'static str {
    match answer {
        Some(true) => "yes",
        Some(false) => "no",
        None => "",
    }
}
