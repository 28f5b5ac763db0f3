//! Tapers, line loads, weight, temperature pairs, pieces and layers against quadrature in many
//! digits, written by `tests/reference/quadrature.py` (mpmath) into `quadrature.json`.
//!
//! Each number is held to 1e-13 of the largest of its kind: lengths (the total elongation, its
//! parts, displacements) of a case among each other, forces likewise, and stresses within one
//! segment or layer. The place of an extreme stress is held to a millionth of the member's length.

mod common;

use common::{Values, only_member, solved};
use std::collections::BTreeMap;

const TOLERANCE: f64 = 1e-13;

#[derive(serde::Deserialize)]
struct Case {
    case: String,
    job: String,
    /// Values by address, as decimal text of 25 digits.
    expected: BTreeMap<String, String>,
}

/// What a number is compared among; `None` for the place of an extreme.
fn kind(address: &str) -> Option<&str> {
    let (on, quantity) = address.rsplit_once('.').expect("an address has parts");
    match quantity {
        "displacement" => Some("length"),
        "reaction" => Some("force"),
        _ if quantity.ends_with("_at") => None,
        _ if quantity.starts_with("elongation") => Some("length"),
        _ if quantity.starts_with("force") => Some("force"),
        _ if quantity.starts_with("stress") => Some(on),
        _ => panic!("no kind for `{address}`"),
    }
}

#[test]
fn results_agree_with_quadrature() {
    let cases: Vec<Case> =
        serde_json::from_str(include_str!("reference/quadrature.json")).expect("valid JSON");
    assert!(cases.len() >= 60);
    let mut faults = Vec::new();
    for case in &cases {
        faults.extend(compare(case));
    }
    let shown = faults
        .iter()
        .take(40)
        .cloned()
        .collect::<Vec<_>>()
        .join("\n");
    assert!(faults.is_empty(), "{} values differ\n{shown}", faults.len());
}

fn compare(case: &Case) -> Vec<String> {
    let result = solved(&case.case, &case.job);
    let length = only_member(&result)
        .stations
        .iter()
        .fold(0.0, |_, s| s.x.value);
    let values = Values::of(&result);
    let expected: Vec<(&str, f64)> = case
        .expected
        .iter()
        .map(|(address, text)| (address.as_str(), text.parse().expect("a number")))
        .collect();
    let mut largest: BTreeMap<&str, f64> = BTreeMap::new();
    for &(address, value) in &expected {
        if let Some(kind) = kind(address) {
            let size = largest.entry(kind).or_default();
            *size = size.max(f64::abs(value));
        }
    }
    let differs = |&(address, expected): &(&str, f64)| {
        let found = values.get(address);
        let allowed = kind(address).map_or(1e-6 * length, |kind| TOLERANCE * largest[kind]);
        let difference = (found - expected).abs();
        (difference > allowed || found.is_nan()).then(|| {
            let times = difference / allowed;
            format!(
                "{}: {address} = {found:e} for {expected:e}, {times:.1} x allowed",
                case.case
            )
        })
    };
    expected.iter().filter_map(differs).collect()
}
