//! What must hold for any input at all: called by the fuzz targets, and with random inputs by the
//! tests.
//!
//! Each function panics where its invariant is broken; that is how a fuzzer learns of it.

use crate::quantity::{self, Area, Force, ForcePerLength, Length, Stress};
use crate::result::{Document, JobStatus, Residuals};

/// No text makes the literal reader panic, and what it reads is finite and within its tolerance.
///
/// # Panics
/// Where a literal reads as no number, or outside its own range.
pub fn literal(text: &str) {
    fn sound<Q: quantity::Measure>(text: &str) {
        if let Ok(read) = quantity::read::<Q>(text) {
            let (lower, nominal, upper) = (read.lower.si(), read.nominal.si(), read.upper.si());
            assert!(
                lower.is_finite() && upper.is_finite(),
                "not finite: {text:?}"
            );
            assert!(
                lower <= nominal && nominal <= upper,
                "outside its tolerance: {text:?}"
            );
        }
    }
    sound::<Length>(text);
    sound::<Area>(text);
    sound::<Force>(text);
    sound::<ForcePerLength>(text);
    sound::<Stress>(text);
    sound::<quantity::Density>(text);
    sound::<quantity::Expansion>(text);
    sound::<quantity::Angle>(text);
    sound::<quantity::Ratio>(text);
    if let Ok(change) = quantity::read_change(text) {
        assert!(change.nominal.value.is_finite(), "not finite: {text:?}");
    }
    if let Ok(reading) = quantity::read_reading(text) {
        assert!(
            reading.nominal.value >= 0.0,
            "below absolute zero: {text:?}"
        );
    }
    drop(quantity::read_stress_limit(text));
    drop(quantity::read_movement_bound(text));
}

/// Any bytes end in errors with a place, or in results that prove themselves.
///
/// # Panics
/// Where a job has neither.
pub fn job(bytes: &[u8]) {
    let result = crate::check_bytes("fuzz.toml", bytes).result;
    if result.status == JobStatus::Error {
        assert!(!result.errors.is_empty(), "an error without a word");
        assert!(
            result.errors.iter().all(|error| error.line.is_some()),
            "an error without a place"
        );
    }
    for combination in &result.combinations {
        assert!(
            combination.residuals.largest() <= Residuals::LIMIT,
            "unproven: {}",
            combination.name
        );
    }
    if let Err(number) = crate::report::all_finite(&result) {
        panic!("a result that is no number: {number}");
    }
}

/// Any text is refused as a results document, or is written again as it was read.
///
/// # Panics
/// Where a document does not survive writing and reading.
pub fn results(text: &str) {
    let Ok(document) = serde_json::from_str::<Document>(text) else {
        return;
    };
    let Ok(written) = serde_json::to_string(&document) else {
        return;
    };
    match serde_json::from_str::<Document>(&written) {
        Ok(again) => assert!(again == document, "changed on the way"),
        Err(error) => panic!("cannot read what was written: {error}"),
    }
}
