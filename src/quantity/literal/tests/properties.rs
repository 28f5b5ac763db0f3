//! What holds for every text and every number.

use super::si;
use crate::quantity::{
    Angle, Area, Density, Expansion, Force, ForcePerLength, Length, Mass, MassPerLength, Ratio,
    Stress, TemperatureInterval, ThermodynamicTemperature, read, read_movement_bound,
    read_stress_limit,
};
use crate::quantity::{LiteralError, Measure};
use proptest::prelude::*;

/// A refusal underlines a part of the text and says something; a value is a number in order.
fn sound<Q: Measure>(text: &str) -> Result<(), TestCaseError> {
    match read::<Q>(text) {
        Ok(literal) => {
            let (low, is, high) = (literal.lower.si(), literal.nominal.si(), literal.upper.si());
            prop_assert!(low.is_finite() && high.is_finite() && low <= is && is <= high);
            Ok(())
        }
        Err(error) => located(&error, text),
    }
}

fn located(error: &LiteralError, text: &str) -> Result<(), TestCaseError> {
    prop_assert!(
        text.get(error.at.clone()).is_some(),
        "{:?} is no part of {:?} ({})",
        error.at,
        text,
        error.message
    );
    prop_assert!(!error.message.is_empty() && !error.help.is_empty());
    prop_assert!(error.message.len() < 700 && error.help.len() < 900);
    Ok(())
}

fn sound_as_anything(text: &str) -> Result<(), TestCaseError> {
    sound::<Length>(text)?;
    sound::<Area>(text)?;
    sound::<Force>(text)?;
    sound::<ForcePerLength>(text)?;
    sound::<Stress>(text)?;
    sound::<Density>(text)?;
    sound::<MassPerLength>(text)?;
    sound::<Mass>(text)?;
    sound::<Expansion>(text)?;
    sound::<ThermodynamicTemperature>(text)?;
    sound::<TemperatureInterval>(text)?;
    sound::<Angle>(text)?;
    sound::<Ratio>(text)?;
    if let Err(error) = read_stress_limit(text) {
        located(&error, text)?;
    }
    if let Err(error) = read_movement_bound(text) {
        located(&error, text)?;
    }
    Ok(())
}

/// Texts of the pieces that literals are made of, in any order.
fn pieces() -> impl Strategy<Value = String> {
    let piece = prop::sample::select(vec![
        "1", "0", "25", "2.5", "e", "e9", "e-400", "_", ".", ",", "+", "-", "−", "±", "+/-", "/",
        " ", "\u{a0}", "*", "·", "^", "^-", "²", "⁻", "%", "'", "\"", "′", "″", "''", "ft", "in",
        "mm", "mm9", "m9", "kN", "lb", "t", "tonf", "degC", "°F", "K", "ue", "µ", "deg", "yield",
        "length", "psi", "kg/m3", "nan", "inf", "\0", "\n", "東",
    ]);
    prop::collection::vec(piece, 0..14).prop_map(|pieces| pieces.concat())
}

proptest! {
    #[test]
    fn no_text_panics(text in any::<String>()) {
        sound_as_anything(&text)?;
    }

    #[test]
    fn no_sequence_of_pieces_panics(text in pieces()) {
        sound_as_anything(&text)?;
    }

    /// The standard library rounds decimal texts rightly; a unit that is a decimal fraction only
    /// changes the digits and moves the point, so its answer must be ours to the last bit.
    #[test]
    fn decimal_units_are_rounded_once(digits in 1u64..1_000_000_000_000_000, power in -12i32..12) {
        let exact = |factor: u128, shift: i32| -> f64 {
            let digits = u128::from(digits) * factor;
            format!("{digits}e{}", power + shift).parse().unwrap()
        };
        prop_assert_eq!(si::<Length>(&format!("{digits}e{power} mm")), exact(1, -3));
        prop_assert_eq!(si::<Length>(&format!("{digits}e{power} in")), exact(254, -4));
        prop_assert_eq!(si::<Length>(&format!("{digits}e{power} ft")), exact(3048, -4));
        prop_assert_eq!(si::<Force>(&format!("{digits}e{power} lbf")), exact(44_482_216_152_605, -13));
        prop_assert_eq!(si::<Mass>(&format!("{digits}e{power} lb")), exact(45_359_237, -8));
        prop_assert_eq!(si::<Stress>(&format!("{digits}e{power} N/mm2")), exact(1, 6));
    }

    /// Numbers that are longer than 19 digits are read too.
    #[test]
    fn long_numbers_are_close(digits in "[1-9][0-9]{18,60}", point in 1usize..18) {
        let (head, tail) = digits.split_at(point);
        let text = format!("{head}.{tail}");
        let value: f64 = text.parse().unwrap();
        let read = si::<Length>(&format!("{text} m"));
        prop_assert!((read - value).abs() <= value * 2.3e-16);
    }
}
