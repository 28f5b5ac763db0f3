//! JSON, format 1: the document as the result types say it, in SI, every number in the shortest
//! text that reads back to the same double.

use crate::result::{Counts, Document, JobResult, Tool, UnitNames};
use sha2::{Digest, Sha256};
use std::fmt::Write as _;
use std::io::{self, Write};

/// The version of the format: names are added to it, never renamed.
pub const FORMAT: u32 = 1;

/// The document of a run from its jobs; `catalogue` is the [`digest`] of the built-in tables.
pub fn document(jobs: Vec<JobResult>, counts: Counts, catalogue: String) -> Document {
    Document {
        format: FORMAT,
        tool: Tool {
            name: env!("CARGO_PKG_NAME").to_owned(),
            version: env!("CARGO_PKG_VERSION").to_owned(),
            catalogue,
        },
        units: UnitNames::default(),
        jobs,
        counts,
    }
}

/// Writes a document on one line. Its numbers are finite: see [`super::all_finite`].
///
/// # Errors
/// Those of `out`.
pub fn write(out: &mut dyn Write, document: &Document) -> io::Result<()> {
    serde_json::to_writer(&mut *out, document)?;
    writeln!(out)
}

/// `sha256:` and the digest of some bytes in 64 hexadecimal digits.
pub fn digest(bytes: &[u8]) -> String {
    let mut text = String::with_capacity(71);
    text.push_str("sha256:");
    for byte in Sha256::digest(bytes) {
        // Writing to a string cannot fail.
        let _ = write!(text, "{byte:02x}");
    }
    text
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::report::sample;
    use serde_json::{Value, json};
    use std::collections::BTreeSet;

    fn written() -> (Document, String) {
        let jobs = vec![
            sample::failing(),
            sample::unchecked(),
            sample::unreadable(),
            sample::assembly::plane(),
            sample::assembly::space(),
        ];
        let mut counts = Counts::default();
        jobs.iter().for_each(|job| counts.add(job));
        let document = document(jobs, counts, digest(b""));
        let mut out = Vec::new();
        write(&mut out, &document).unwrap();
        (document, String::from_utf8(out).unwrap())
    }

    #[test]
    fn what_is_written_reads_back_to_the_same_document() {
        let (document, text) = written();
        let back: Document = serde_json::from_str(&text).unwrap();
        assert_eq!(back, document);
    }

    #[test]
    fn every_number_reads_back_to_the_same_bits() {
        let awkward = [0.1 + 0.2, 1e21, -0.0, 5e-324, 1.0 / 3.0, 62000.0, f64::MAX];
        for number in awkward {
            let mut job = sample::failing();
            job.datum = Some(number);
            let mut out = Vec::new();
            write(
                &mut out,
                &document(vec![job], Counts::default(), String::new()),
            )
            .unwrap();
            let text = String::from_utf8(out).unwrap();
            let digits = text.split("\"datum\":").nth(1).unwrap();
            let digits = digits.split(',').next().unwrap();
            // The standard library's reader is right to the last bit, and not the writer's own.
            assert_eq!(digits.parse::<f64>().unwrap().to_bits(), number.to_bits());
        }
    }

    #[test]
    fn what_does_not_exist_is_null() {
        let (_, text) = written();
        let document: Value = serde_json::from_str(&text).unwrap();
        let job = &document["jobs"][0];
        assert_eq!(job["checked_by"], Value::Null);
        let member = &job["combinations"][0]["members"][1];
        assert_eq!(member["segments"][1]["stress_max"], Value::Null);
        assert_eq!(member["segments"][0]["area_start"], Value::Null);
        assert_eq!(job["combinations"][0]["totals"], Value::Null);
    }

    /// The names that format 1 promises, from the page that describes it.
    #[test]
    fn the_names_are_those_of_format_1() {
        let (_, text) = written();
        let document: Value = serde_json::from_str(&text).unwrap();
        let job = &document["jobs"][0];
        let combination = &job["combinations"][0];
        let member = &combination["members"][1];
        let assembly = &document["jobs"][3]["combinations"][0];
        let promised = [
            (&document, "format tool units jobs counts"),
            (&document["tool"], "name version catalogue"),
            (
                &document["units"],
                "length force stress temperature angle stiffness",
            ),
            (
                &document["counts"],
                "files members combinations checks pass fail unchecked_jobs errors",
            ),
            (
                job,
                "file digest title reference prepared_by checked_by date datum units status \
                 errors warnings cautions notes materials combinations governing envelope",
            ),
            (
                &job["warnings"][0],
                "check on at combination stress allowable ratio status line",
            ),
            (
                &document["jobs"][2]["errors"][0],
                "message line column help combination",
            ),
            (&job["cautions"][0], "about text line"),
            (&job["notes"][0], "about text"),
            (&job["materials"][0], "id modulus expansion source like"),
            (
                combination,
                "name purpose factors without members points holds bodies watches totals \
                 residuals checks",
            ),
            (
                member,
                "name state slack_by restraint misfit_found totals elongation elongation_force \
                 elongation_temperature elongation_misfit force_max force_max_at force_min \
                 force_min_at segments stations supports",
            ),
            (&member["totals"], "applied reactions"),
            (
                &member["segments"][0],
                "name from to area_start area_end rigidity_start rigidity_end force_start \
                 force_end elongation elongation_force elongation_temperature elongation_misfit \
                 stress_max stress_max_at stress_min stress_min_at gap layers",
            ),
            (
                &member["segments"][0]["layers"][0],
                "name force_start force_end stress_max stress_min",
            ),
            (
                &member["stations"][0],
                "name x displacement force_before force_after",
            ),
            (&member["supports"][0], "name at kind reaction gap bears"),
            (
                &combination["residuals"],
                "equilibrium compatibility energy",
            ),
            (
                &combination["checks"][0],
                "check on at area demand limit unit utilisation status source details",
            ),
            (
                &job["governing"][0],
                "check on combination demand limit unit utilisation status",
            ),
            (&job["envelope"][0], "result unit max max_in min min_in"),
            (&assembly["points"][0], "name displacement reaction"),
            (&assembly["holds"][0], "name point kind reaction gap bears"),
            (&assembly["bodies"][0], "name displacement rotation"),
            (&assembly["watches"][0], "name value unit"),
            (&assembly["totals"], "applied reactions"),
        ];
        for (value, names) in promised {
            let written: BTreeSet<&str> = value
                .as_object()
                .unwrap()
                .keys()
                .map(String::as_str)
                .collect();
            for name in names.split_whitespace() {
                assert!(written.contains(name), "`{name}` is missing in {value}");
            }
        }
    }

    #[test]
    fn lists_have_an_entry_for_each_coordinate_and_a_plane_rotation_is_one_number() {
        let (_, text) = written();
        let document: Value = serde_json::from_str(&text).unwrap();
        let of = |job: usize| &document["jobs"][job]["combinations"][0];
        let (plane, space) = (of(3), of(4));
        assert_eq!(plane["points"][2]["displacement"], json!([0.0005, -0.0021]));
        assert_eq!(plane["points"][2]["reaction"], Value::Null);
        assert_eq!(plane["bodies"][0]["rotation"], json!(-0.001));
        assert_eq!(plane["holds"][2]["reaction"], Value::Null);
        assert_eq!(plane["totals"]["applied"], json!([0.0, -84250.0]));
        assert_eq!(space["bodies"][0]["rotation"], json!([0.001, -0.002, 0.0]));
        assert_eq!(space["holds"][0]["reaction"], json!([1e3, -2e3, 3e3]));
        let lost = &document["jobs"][3]["combinations"][2];
        assert_eq!(lost["without"], json!(["H2"]));
        assert_eq!(lost["members"].as_array().unwrap().len(), 2);
    }

    /// FIPS 180-2, appendix B.1: the digest of `abc`.
    #[test]
    fn the_digest_is_the_published_one() {
        assert_eq!(
            digest(b"abc"),
            "sha256:ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"
        );
    }

    #[test]
    fn counts_are_of_files_members_combinations_and_checks() {
        let (document, _) = written();
        // A member that some combinations take out is counted all the same.
        let expected = Counts {
            files: 5,
            members: 9,
            combinations: 6,
            checks: 15,
            pass: 9,
            fail: 6,
            unchecked_jobs: 1,
            errors: 2,
        };
        assert_eq!(document.counts, expected);
    }
}
