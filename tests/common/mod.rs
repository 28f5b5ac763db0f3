//! What the outside checks share: running a job, and reading a result by its address.
// Every test program compiles this module for itself and uses only a part of it.
#![allow(dead_code)]

pub(crate) mod chain;
pub(crate) mod random_member;

use lengthwise::result::{CombinationResult, JobResult, JobStatus, MemberResult};
use serde_json::Value;

/// The results of a job, errors included.
pub(crate) fn checked(name: &str, text: &str) -> JobResult {
    lengthwise::check_text(name, text)
}

/// The results of a job that must be readable and solvable.
pub(crate) fn solved(name: &str, text: &str) -> JobResult {
    let result = checked(name, text);
    assert!(
        result.status != JobStatus::Error,
        "{name} has errors: {:#?}\n{text}",
        result.errors
    );
    result
}

/// The only member of the only combination of a job.
pub(crate) fn only_member(result: &JobResult) -> &MemberResult {
    let [combination] = result.combinations.as_slice() else {
        panic!(
            "one combination expected, found {}",
            result.combinations.len()
        );
    };
    let [member] = combination.members.as_slice() else {
        panic!("one member expected, found {}", combination.members.len());
    };
    member
}

/// Reads values of a finished job by their addresses, `H4.shank.stress_max`, in SI. A combination
/// in front, `service:H4.elongation`, picks one where there are more.
pub(crate) struct Values {
    combinations: Vec<(String, Value)>,
}

impl Values {
    pub(crate) fn of(result: &JobResult) -> Self {
        let as_json = |combination: &CombinationResult| {
            let value = serde_json::to_value(combination).expect("results are plain data");
            (combination.name.to_string(), value)
        };
        Values {
            combinations: result.combinations.iter().map(as_json).collect(),
        }
    }

    /// The value at an address, or the quotient of two written `a / b`.
    pub(crate) fn get(&self, address: &str) -> f64 {
        match address.split_once(" / ") {
            Some((over, under)) => self.get(over) / self.get(under),
            None => self
                .find(address)
                .unwrap_or_else(|| panic!("no number at `{address}`")),
        }
    }

    fn find(&self, address: &str) -> Option<f64> {
        let (combination, path) = match address.split_once(':') {
            Some((name, path)) => {
                let named = self.combinations.iter().find(|(n, _)| n == name)?;
                (&named.1, path)
            }
            None => (&self.combinations.first()?.1, address),
        };
        let (name, rest) = path.split_once('.')?;
        let Some(member) = named(&combination["members"], name) else {
            return of_an_assembly(combination, name, rest);
        };
        let Some((part, quantity)) = rest.rsplit_once('.') else {
            return member[rest].as_f64();
        };
        ["segments", "supports", "stations"]
            .iter()
            .filter_map(|list| named(&member[list], part))
            .chain(layer(&member["segments"], part))
            .find_map(|found| found[quantity].as_f64())
    }
}

/// The value of a point, body, hold or watch: `displacement.y`, `rotation`, `gap`.
fn of_an_assembly(combination: &Value, name: &str, rest: &str) -> Option<f64> {
    let (quantity, axis) = rest.split_once('.').unwrap_or((rest, ""));
    let lists = ["points", "bodies", "holds", "watches"];
    let entries = lists
        .iter()
        .filter_map(|list| named(&combination[list], name));
    let value = entries
        .map(|entry| &entry[quantity])
        .find(|v| !v.is_null())?;
    match "xyz".find(axis) {
        Some(axis) if value.is_array() => value[axis].as_f64(),
        _ => value.as_f64(),
    }
}

fn named<'v>(list: &'v Value, name: &str) -> Option<&'v Value> {
    list.as_array()?.iter().find(|entry| entry["name"] == name)
}

/// The layer at `segment.layer`.
fn layer<'v>(segments: &'v Value, part: &str) -> Option<&'v Value> {
    let (segment, layer) = part.split_once('.')?;
    named(&named(segments, segment)?["layers"], layer)
}

/// Exact factors to SI, from the definitions of the inch (25.4 mm), the pound (0.45359237 kg) and
/// standard gravity (9.80665 m/s²); the degree Fahrenheit as an interval is 5/9 K.
pub(crate) fn factor(unit: &str) -> f64 {
    const INCH: f64 = 0.0254;
    const POUND_FORCE: f64 = 4.448_221_615_260_5;
    match unit {
        "1" | "m" | "N" | "Pa" => 1.0,
        "mm" => 1e-3,
        "in" => INCH,
        "kN" => 1e3,
        "lbf" => POUND_FORCE,
        "kip" => 1e3 * POUND_FORCE,
        "MPa" => 1e6,
        "psi" => POUND_FORCE / (INCH * INCH),
        "ksi" => 1e3 * POUND_FORCE / (INCH * INCH),
        "degF" => 5.0 / 9.0,
        other => panic!("no factor for the unit `{other}`"),
    }
}
