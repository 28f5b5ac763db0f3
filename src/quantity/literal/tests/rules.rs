//! The rules of signs, tolerances and shares: what breaks them is refused, where, in which words.

use super::{LENGTHS, hold, refused};
use crate::quantity::{
    Length, Ratio, TemperatureInterval, ThermodynamicTemperature, read_movement_bound,
    read_stress_limit,
};

#[test]
fn signs_of_temperatures() {
    refused::<TemperatureInterval>(
        "35 K",
        "35 K",
        "a change of temperature has its sign",
        "write `+35 K` for warmer or `-35 K` for cooler",
    );
    refused::<ThermodynamicTemperature>(
        "+20 degC",
        "+",
        "a reading of temperature has no `+`",
        "a change is given under `temperature-change`",
    );
    let below = "this reading is below absolute zero";
    let help = "-273.15 degC, -459.67 degF or more";
    refused::<ThermodynamicTemperature>("-273.16 degC", "-273.16 degC", below, help);
    refused::<ThermodynamicTemperature>("-459.68 degF", "-459.68 degF", below, help);
    refused::<ThermodynamicTemperature>("-5 K", "-5 K", below, help);
    refused::<ThermodynamicTemperature>("3 K ± 5 K", "3 K ± 5 K", below, help);
    refused::<ThermodynamicTemperature>(
        "3 K m/m",
        "K m/m",
        "a reading of temperature has no compound unit",
        "20 degC",
    );
    refused::<TemperatureInterval>(
        "35 mm",
        "mm",
        "`mm` is a length; a change of temperature is expected here",
        "+35 K",
    );
}

#[test]
fn tolerances() {
    let how = "`± 3 mm`, `+/- 3 mm`, `± 5 %` or `+0.2/-0.1 mm`";
    refused::<Length>(
        "12 mm ± -1 mm",
        "-",
        "what stands after `±` has no sign",
        how,
    );
    refused::<Length>(
        "12 mm ± 1",
        "12 mm ± 1",
        "a unit is missing after `12 mm ± 1`",
        LENGTHS,
    );
    refused::<Length>(
        "12 mm +0.2 mm",
        "+0.2 mm",
        "this tolerance lacks its other side",
        how,
    );
    refused::<Length>(
        "12 mm +0.2/+0.1 mm",
        "+0.2/+0.1 mm",
        "both sides of this tolerance lie on one side of the value",
        "write a value that lies within its range",
    );
    refused::<Length>(
        "12 mm +0.2/-0.1/-0.3 mm",
        "0.1",
        "this tolerance has more than two sides",
        how,
    );
    refused::<Length>("12 mm ± 1/-1 mm", "1", "this tolerance lacks its unit", how);
    refused::<Ratio>(
        "0.1 % ± 5 %",
        "5 %",
        "a tolerance of a strain is no share of it",
        "`± 20 ue`",
    );
    refused::<ThermodynamicTemperature>(
        "20 degC ± 5 %",
        "5 %",
        "a tolerance of a change of temperature is no share of it",
        "`± 3 K`",
    );
}

#[test]
fn shares() {
    let stress = |text: &str, part: &str, message: &str, help: &str| {
        hold(text, read_stress_limit(text), part, message, help);
    };
    stress(
        "0.6 yeild",
        "yeild",
        "`yeild` is no strength of a material",
        "did you mean `yield`?",
    );
    stress(
        "0.6 Yield",
        "Yield",
        "`Yield` is no strength of a material",
        "did you mean `yield`?",
    );
    stress(
        "strength / 2",
        "strength",
        "`strength` is no strength of a material",
        "0.6 yield",
    );
    stress(
        "yield",
        "",
        "`/` and a number are missing after this name",
        "yield / 1.67",
    );
    stress(
        "yield / 0",
        "/ 0",
        "the number of a share is more than 0",
        "0.6 yield",
    );
    stress(
        "0 yield",
        "0",
        "the number of a share is more than 0",
        "0.6 yield",
    );
    stress(
        "0.6 yield x",
        "x",
        "`x` after a share is not understood",
        "0.6 yield",
    );
    stress(
        "yield / x",
        "x",
        "a number is expected before `x`",
        "0.6 yield",
    );
    stress("165", "165", "a unit is missing after `165`", "0.6 yield");
    stress(
        "6 mm",
        "mm",
        "`mm` is a length; a stress is expected here",
        "0.6 yield",
    );
    let bound = |text: &str, part: &str, message: &str, help: &str| {
        hold(text, read_movement_bound(text), part, message, help);
    };
    bound(
        "L/500",
        "L/500",
        "`L/500` is no limit of a movement",
        "length / 500",
    );
    bound(
        "length / 0",
        "/ 0",
        "the number of a share is more than 0",
        "length / 500",
    );
    bound(
        "length",
        "",
        "`/` and a number are missing after this name",
        "length / 500",
    );
    bound(
        "6 kN",
        "kN",
        "`kN` is a force; a length is expected here",
        "length / 500",
    );
}
