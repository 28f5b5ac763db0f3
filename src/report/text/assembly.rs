//! An assembly in one combination: what holds it, what its members carry, how it moves.

use super::column::Column;
use super::table::Table;
use super::words::title;
use super::{Layout, largest, settled};
use crate::quantity::{Angle, Force, Length, Measure, Style, from_si};
use crate::result::{
    AssemblyTotals, BodyResult, CombinationResult, HoldResult, MemberResult, MemberState,
    PointResult, Rotation, SupportWord, Unit, WatchResult,
};
use std::io::{self, Write};

const AXES: [&str; 3] = ["x", "y", "z"];

/// Writes what an engineer looks for first: reactions, forces of members, movements.
pub(super) fn write(out: &mut dyn Write, page: &Page, layout: &Layout) -> io::Result<()> {
    let combination = page.combination;
    let mut tables = |heading: &str, tables: Vec<Table>| {
        if tables.is_empty() {
            return Ok(());
        }
        writeln!(out)?;
        title(out, heading, '-', layout.width)?;
        for (index, table) in tables.iter().enumerate() {
            if index > 0 {
                writeln!(out)?;
            }
            table.write(out, layout)?;
        }
        Ok(())
    };
    let holds = [page.holds(&combination.holds), page.totals(combination)];
    tables("Reactions", holds.into_iter().flatten().collect())?;
    tables(
        "Member forces",
        page.members(&combination.members).into_iter().collect(),
    )?;
    let movements = [
        page.points(&combination.points),
        page.bodies(&combination.bodies),
        page.watches(&combination.watches),
    ];
    tables("Movements", movements.into_iter().flatten().collect())
}

/// How the quantities of an assembly are shown: the style, and the largest of each kind, beside
/// which what rounding leaves is shown as 0.
pub(super) struct Page<'a> {
    combination: &'a CombinationResult,
    style: &'a Style,
    coordinates: usize,
    pub(super) force: f64,
    pub(super) movement: f64,
    rotation: f64,
}

impl<'a> Page<'a> {
    pub(super) fn of(combination: &'a CombinationResult, style: &'a Style) -> Self {
        let members = || combination.members.iter();
        let forces = members().flat_map(|of| [of.force_max.value, of.force_min.value]);
        let holds = combination.holds.iter();
        let reactions = holds.filter_map(|hold| hold.reaction.as_ref()).flatten();
        let points = combination.points.iter();
        let displacements = points.flat_map(|point| &point.displacement);
        let elongations = members().map(|member| member.elongation.value);
        let bodies = combination.bodies.iter();
        let rotations = bodies.flat_map(|body| body.rotation.spatial());
        let coordinates = combination.points.first();
        Page {
            combination,
            style,
            coordinates: coordinates.map_or(0, |point| point.displacement.len()),
            force: largest(forces.chain(reactions.map(|force| force.value))),
            movement: largest(displacements.map(|of| of.value).chain(elongations)),
            rotation: largest(rotations.map(|angle| angle.value)),
        }
    }

    fn number<Q: Measure>(&self, quantity: Q, largest: f64) -> String {
        self.style
            .number(Q::DIMENSION, settled(quantity.si(), largest))
    }

    fn column<R, Q: Measure>(
        &self,
        heading: &str,
        rows: &[R],
        largest: f64,
        of: impl Fn(&R) -> Option<Q>,
    ) -> Column {
        let cells = rows.iter().map(|row| match of(row) {
            Some(quantity) => self.number(quantity, largest),
            None => String::new(),
        });
        Column::number(heading, Some(self.style.unit(Q::DIMENSION)), cells)
    }

    /// A column for each coordinate, headed `what` along x, y, z; `missing` stands where a row has
    /// nothing.
    fn along<R, Q: Measure>(
        &self,
        what: &str,
        rows: &[R],
        largest: f64,
        missing: &str,
        of: impl for<'r> Fn(&'r R) -> Option<&'r [Q]>,
    ) -> Vec<Column> {
        let unit = self.style.unit(Q::DIMENSION);
        let axes = AXES.iter().enumerate().take(self.coordinates);
        let column = |(axis, word): (usize, &&str)| {
            let cells = rows.iter().map(|row| match of(row) {
                Some(parts) => match parts.get(axis) {
                    Some(&part) => self.number(part, largest),
                    None => String::new(),
                },
                None => missing.to_owned(),
            });
            Column::number(&format!("{what}\nalong {word}"), Some(unit), cells)
        };
        axes.map(column).collect()
    }

    fn holds(&self, rows: &[HoldResult]) -> Option<Table> {
        if rows.is_empty() {
            return None;
        }
        let kind = rows.iter().map(|hold| match hold.kind {
            SupportWord::Fixed => "fixed",
            SupportWord::Spring => "spring",
            SupportWord::Stop => "stop",
        });
        let reactions = self.along("reaction", rows, self.force, "undecided", |hold| {
            hold.reaction.as_deref()
        });
        let bears = rows.iter().map(|hold| match hold.bears {
            Some(true) => "yes",
            Some(false) => "no",
            None => "",
        });
        let identity = [
            Column::names("hold", rows.iter().map(|hold| &hold.name)),
            Column::names("point", rows.iter().map(|hold| &hold.point)),
            Column::words("kind", kind),
        ];
        let stops = [
            self.column("gap", rows, self.movement, |hold| hold.gap),
            Column::words("bears", bears),
        ];
        Some(Table::of(identity).block(reactions.into_iter().chain(stops)))
    }

    /// All that acts beside all that holds.
    fn totals(&self, combination: &CombinationResult) -> Option<Table> {
        let AssemblyTotals { applied, reactions } = combination.totals.as_ref()?;
        let rows = [applied, reactions];
        let largest = largest(rows.iter().copied().flatten().map(|force| force.value));
        let columns = self.along("total", &rows, largest.max(self.force), "", |row| {
            Some(row.as_slice())
        });
        let names = ["all applied forces", "all reactions"];
        Some(Table::of([Column::words("sum of", names)]).block(columns))
    }

    fn members(&self, rows: &[MemberResult]) -> Option<Table> {
        if rows.is_empty() {
            return None;
        }
        let start = |of: &MemberResult| Some(of.segments.first()?.force_start);
        let end = |of: &MemberResult| Some(of.segments.last()?.force_end);
        let inside = |of: &MemberResult, force: Force, beyond: fn(Force, Force) -> bool| {
            let ends = start(of).into_iter().chain(end(of));
            let beyond = ends
                .into_iter()
                .all(|at_end| beyond(force, at_end) && self.tells_apart(force, at_end));
            beyond.then_some(force)
        };
        Some(
            Table::of([
                Column::names("member", rows.iter().map(|member| &member.name)),
                Column::words("state", rows.iter().map(|member| self.state(member))),
            ])
            .block([
                self.column("N start", rows, self.force, start),
                self.column("N end", rows, self.force, end),
                self.column("N largest\ninside", rows, self.force, |of| {
                    inside(of, of.force_max, |force, at_end| force > at_end)
                }),
                self.column("N least\ninside", rows, self.force, |of| {
                    inside(of, of.force_min, |force, at_end| force < at_end)
                }),
                self.column("elongation", rows, self.movement, |of| Some(of.elongation)),
                self.column("slack by", rows, 0.0, |of| of.slack_by),
            ]),
        )
    }

    /// Whether two forces differ by more than what rounding leaves.
    fn tells_apart(&self, one: Force, other: Force) -> bool {
        settled((one - other).value, self.force) != 0.0
    }

    /// What a member does, in the words of its forces.
    fn state(&self, member: &MemberResult) -> &'static str {
        let (most, least) = (
            settled(member.force_max.value, self.force),
            settled(member.force_min.value, self.force),
        );
        match member.state {
            MemberState::Slack => "slack",
            MemberState::Bearing => "bearing",
            MemberState::Taut if least < 0.0 && most > 0.0 => "both ways",
            MemberState::Taut if least < 0.0 => "compressed",
            MemberState::Taut if most > 0.0 => "taut",
            MemberState::Taut => "no force",
        }
    }

    fn points(&self, rows: &[PointResult]) -> Option<Table> {
        let columns = self.along("displacement", rows, self.movement, "", |point| {
            Some(&point.displacement)
        });
        let names = rows.iter().map(|point| &point.name);
        (!rows.is_empty()).then(|| Table::of([Column::names("point", names)]).block(columns))
    }

    fn bodies(&self, rows: &[BodyResult]) -> Option<Table> {
        if rows.is_empty() {
            return None;
        }
        let movements = self.along("displacement", rows, self.movement, "", |body| {
            Some(&body.displacement)
        });
        let turns = |heading: &str, of: fn(&BodyResult) -> Angle| {
            self.column(heading, rows, self.rotation, |body| Some(of(body)))
        };
        let turns = if rows
            .iter()
            .any(|body| matches!(body.rotation, Rotation::Spatial(_)))
        {
            vec![
                turns("rotation\nabout x", |body| body.rotation.spatial()[0]),
                turns("rotation\nabout y", |body| body.rotation.spatial()[1]),
                turns("rotation\nabout z", |body| body.rotation.spatial()[2]),
            ]
        } else if self.coordinates > 1 {
            vec![turns("rotation", |body| body.rotation.spatial()[2])]
        } else {
            Vec::new()
        };
        let names = rows.iter().map(|body| &body.name);
        Some(
            Table::of([Column::names("body", names)])
                .block(movements)
                .block(turns),
        )
    }

    fn watches(&self, rows: &[WatchResult]) -> Option<Table> {
        if rows.is_empty() {
            return None;
        }
        let value = rows.iter().map(|watch| match (watch.value, watch.unit) {
            (None, _) => "lost".to_owned(),
            (Some(value), Unit::Radian) => self.number::<Angle>(from_si(value), self.rotation),
            (Some(value), _) => self.number::<Length>(from_si(value), self.movement),
        });
        let unit = rows.iter().map(|watch| match watch.unit {
            Unit::Radian => self.style.unit(Angle::DIMENSION),
            _ => self.style.unit(Length::DIMENSION),
        });
        Some(
            Table::of([Column::names("watch", rows.iter().map(|watch| &watch.name))]).block([
                Column::number("value", None, value),
                Column::words("unit", unit),
            ]),
        )
    }
}
