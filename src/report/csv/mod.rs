//! CSV: one table of the results at a time, row by row, in SI.
//!
//! The file and the combination stand in the first columns and units in the header, so that the
//! rows of every job of a folder go together. Numbers have the text that JSON gives them; what does
//! not exist is an empty field.

mod columns;

use crate::result::{CombinationResult, JobResult, MemberResult};
use columns::{BODIES, CHECKS, Column, ENVELOPE, Field, GOVERNING, HOLDS, LAYERS, MEMBERS};
use columns::{POINTS, SEGMENTS, STATIONS, SUPPORTS, WATCHES};
use std::io::{self, Write};

/// A table that can be written.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
#[allow(missing_docs)] // the lists of the results with these names
pub enum Table {
    Members,
    Segments,
    Layers,
    Stations,
    Supports,
    Points,
    Bodies,
    Holds,
    Watches,
    Checks,
    Governing,
    Envelope,
}

impl Table {
    /// Every table with its name.
    pub const ALL: [(&'static str, Table); 12] = [
        ("members", Table::Members),
        ("segments", Table::Segments),
        ("layers", Table::Layers),
        ("stations", Table::Stations),
        ("supports", Table::Supports),
        ("points", Table::Points),
        ("bodies", Table::Bodies),
        ("holds", Table::Holds),
        ("watches", Table::Watches),
        ("checks", Table::Checks),
        ("governing", Table::Governing),
        ("envelope", Table::Envelope),
    ];
}

/// Writes the header of a table.
///
/// # Errors
/// Those of `out`.
pub fn write_header(out: &mut dyn Write, table: Table) -> io::Result<()> {
    let mut rows = Rows::of(table, out);
    match table {
        Table::Members => rows.header(&["file", "combination"], MEMBERS),
        Table::Segments => rows.header(&["file", "combination", "member"], SEGMENTS),
        Table::Layers => rows.header(&["file", "combination", "member", "segment"], LAYERS),
        Table::Stations => rows.header(&["file", "combination", "member"], STATIONS),
        Table::Supports => rows.header(&["file", "combination", "member"], SUPPORTS),
        Table::Points => rows.header(&["file", "combination"], POINTS),
        Table::Bodies => rows.header(&["file", "combination"], BODIES),
        Table::Holds => rows.header(&["file", "combination"], HOLDS),
        Table::Watches => rows.header(&["file", "combination"], WATCHES),
        Table::Checks => rows.header(&["file", "combination"], CHECKS),
        Table::Governing => rows.header(&["file"], GOVERNING),
        Table::Envelope => rows.header(&["file"], ENVELOPE),
    }?;
    rows.end()
}

/// Writes the rows of one job.
///
/// # Errors
/// Those of `out`.
pub fn write_job(out: &mut dyn Write, table: Table, job: &JobResult) -> io::Result<()> {
    let mut rows = Rows::of(table, out);
    let file = job.file.as_str();
    match table {
        Table::Governing => rows.rows(&[file], &job.governing, GOVERNING)?,
        Table::Envelope => rows.rows(&[file], &job.envelope, ENVELOPE)?,
        _ => {
            for combination in &job.combinations {
                rows.combination(file, combination)?;
            }
        }
    }
    rows.end()
}

/// Rows on their way out.
struct Rows<'a> {
    table: Table,
    out: csv::Writer<&'a mut dyn Write>,
    number: Vec<u8>,
}

impl<'a> Rows<'a> {
    fn of(table: Table, below: &'a mut dyn Write) -> Self {
        Rows {
            table,
            out: csv::Writer::from_writer(below),
            number: Vec::new(),
        }
    }

    /// Hands over what is still held.
    fn end(self) -> io::Result<()> {
        self.out.into_inner().map_err(|error| error.into_error())?;
        Ok(())
    }

    fn combination(&mut self, file: &str, combination: &CombinationResult) -> io::Result<()> {
        let of = [file, &*combination.name];
        match self.table {
            Table::Members => self.rows(&of, &combination.members, MEMBERS),
            Table::Points => self.rows(&of, &combination.points, POINTS),
            Table::Bodies => self.rows(&of, &combination.bodies, BODIES),
            Table::Holds => self.rows(&of, &combination.holds, HOLDS),
            Table::Watches => self.rows(&of, &combination.watches, WATCHES),
            Table::Checks => self.rows(&of, &combination.checks, CHECKS),
            _ => combination
                .members
                .iter()
                .try_for_each(|member| self.member(of, member)),
        }
    }

    fn member(&mut self, [file, combination]: [&str; 2], member: &MemberResult) -> io::Result<()> {
        let of = [file, combination, &*member.name];
        match self.table {
            Table::Stations => self.rows(&of, &member.stations, STATIONS),
            Table::Supports => self.rows(&of, &member.supports, SUPPORTS),
            Table::Layers => member.segments.iter().try_for_each(|segment| {
                let of = [file, combination, &*member.name, &*segment.name];
                self.rows(&of, &segment.layers, LAYERS)
            }),
            _ => self.rows(&of, &member.segments, SEGMENTS),
        }
    }

    fn header<R>(&mut self, of: &[&str], columns: &[Column<R>]) -> io::Result<()> {
        let headings = columns.iter().map(|(heading, _)| *heading);
        self.out.write_record(of.iter().copied().chain(headings))?;
        Ok(())
    }

    fn rows<R>(&mut self, of: &[&str], rows: &[R], columns: &[Column<R>]) -> io::Result<()> {
        for row in rows {
            for name in of {
                self.out.write_field(name)?;
            }
            for (_, field) in columns {
                self.field(field(row))?;
            }
            self.out.write_record(None::<&[u8]>)?;
        }
        Ok(())
    }

    fn field(&mut self, field: Field) -> io::Result<()> {
        match field {
            Field::Text(text) => self.out.write_field(text)?,
            Field::Number(Some(number)) => {
                self.number.clear();
                serde_json::to_writer(&mut self.number, &number)?;
                self.out.write_field(&self.number)?;
            }
            Field::Answer(Some(answer)) => self.out.write_field(answer.to_string())?,
            Field::Count(count) => self.out.write_field(count.to_string())?,
            Field::Number(None) | Field::Answer(None) => self.out.write_field("")?,
            Field::Details(details) if details.is_empty() => self.out.write_field("")?,
            Field::Details(details) => self.out.write_field(serde_json::to_string(details)?)?,
        }
        Ok(())
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::sample;

    fn written(table: Table, jobs: &[JobResult]) -> String {
        let mut out = Vec::new();
        write_header(&mut out, table).unwrap();
        jobs.iter()
            .for_each(|job| write_job(&mut out, table, job).unwrap());
        String::from_utf8(out).unwrap()
    }

    #[test]
    fn every_row_of_every_table_has_a_field_for_each_heading() {
        let jobs = [
            sample::failing(),
            sample::unchecked(),
            sample::unreadable(),
            sample::assembly::plane(),
            sample::assembly::space(),
        ];
        for (name, table) in Table::ALL {
            let text = written(table, &jobs);
            // The reader refuses rows of different lengths.
            let mut reader = csv::Reader::from_reader(text.as_bytes());
            let rows: Result<Vec<_>, _> = reader.records().collect();
            let rows = rows.unwrap().len();
            assert!(rows > 0, "{name} has no row");
            let headings = reader.headers().unwrap();
            assert_eq!(&headings[0], "file", "{name}");
        }
    }

    #[test]
    fn segments_have_units_in_the_header_and_si_in_the_fields() {
        let text = written(Table::Segments, &[sample::failing()]);
        let mut lines = text.lines();
        assert!(lines.next().unwrap().starts_with(
            "file,combination,member,segment,from [m],to [m],material,area_start [m2],"
        ));
        let first = "linkspan/hanger.toml,strength/live=1.5,hanger,shank,0.0,2.85,rod-steel,";
        assert!(lines.next().unwrap().starts_with(first));
    }

    #[test]
    fn what_does_not_exist_is_an_empty_field() {
        let text = written(Table::Supports, &[sample::failing()]);
        let cap = text.lines().find(|line| line.contains(",cap,")).unwrap();
        assert!(cap.ends_with(",stop,,0.0,true"), "{cap}");
    }

    #[test]
    fn names_with_commas_and_quotes_are_quoted() {
        let mut job = sample::failing();
        job.file = "a, \"b\".toml".into();
        let text = written(Table::Governing, &[job]);
        assert!(
            text.lines()
                .nth(1)
                .unwrap()
                .starts_with("\"a, \"\"b\"\".toml\",strength/live=1.5,tension,")
        );
    }

    #[test]
    fn an_assembly_has_a_column_for_each_coordinate_and_none_for_a_lost_member() {
        let job = sample::assembly::plane();
        let points = written(Table::Points, std::slice::from_ref(&job));
        let lug = points.lines().find(|line| line.contains(",lug,")).unwrap();
        assert!(lug.ends_with(",service,lug,0.0005,-0.0021,,,,"), "{lug}");
        let bodies = written(Table::Bodies, std::slice::from_ref(&job));
        assert!(
            bodies.contains(",service,beam,0.0005,-0.0012,,,,-0.001\n"),
            "{bodies}"
        );
        let holds = written(Table::Holds, std::slice::from_ref(&job));
        assert!(
            holds.contains(",kerb,b,stop,0.0,0.0,,0.0031,false\n"),
            "{holds}"
        );
        let members = written(Table::Members, std::slice::from_ref(&job));
        assert!(members.contains(",service,H2,") && !members.contains("without=H2,H2,"));
        let watches = written(Table::Watches, &[job]);
        assert!(
            watches.contains(",service,lug level,-0.0021,m\n"),
            "{watches}"
        );
    }

    #[test]
    fn layers_stand_under_their_segment() {
        let text = written(Table::Layers, &[sample::failing()]);
        assert_eq!(text.lines().count(), 3);
        assert!(text.contains(",post,tier 1,bars,rod-steel,-40000.0,"));
    }
}
