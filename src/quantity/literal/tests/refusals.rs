//! Numbers and units that are refused: where, and in which words.

use super::{LENGTHS, refused};
use crate::quantity::{
    Angle, Area, Density, Force, Length, Mass, MassPerLength, Ratio, Stress,
    ThermodynamicTemperature, read,
};

const NUMBERS: &str = "a number is written as `2.85`, `1_250`, `28.5e6`, `5/8` or `1-1/2`";

#[test]
fn what_is_no_number() {
    refused::<Length>(
        "",
        "",
        "nothing is written here, where a length is expected",
        LENGTHS,
    );
    refused::<Length>(
        "  ",
        "  ",
        "nothing is written here, where a length is expected",
        LENGTHS,
    );
    refused::<Length>(
        "nan m",
        "nan",
        "`nan` is no number that can be computed with",
        NUMBERS,
    );
    refused::<Length>(
        "-inf m",
        "inf",
        "`inf` is no number that can be computed with",
        NUMBERS,
    );
    refused::<Length>(
        ".5 m",
        ".5",
        "a digit is missing before the decimal point of `.5`",
        NUMBERS,
    );
    refused::<Length>(
        "5. m",
        "5.",
        "a digit is missing after the decimal point of `5.`",
        NUMBERS,
    );
    refused::<Length>(
        "1,250 mm",
        "1,250",
        "a comma is not read in a number",
        "`1_250`",
    );
    let underscore = "an underscore stands only between two digits";
    refused::<Length>("1__250 mm", "_", underscore, NUMBERS);
    refused::<Length>("1250_ mm", "_", underscore, NUMBERS);
    refused::<Length>("_1250 mm", "_1250", underscore, NUMBERS);
    refused::<Length>("1_.5 mm", "_", underscore, NUMBERS);
    refused::<Length>("kN", "kN", "a number is expected before `kN`", NUMBERS);
    refused::<Length>("-", "", "a number is missing here", NUMBERS);
    refused::<Length>(
        "\0",
        "\0",
        "a number is expected before `\u{fffd}`",
        NUMBERS,
    );
}

#[test]
fn what_is_out_of_range() {
    let range = "between 1e-150 and 1e150";
    refused::<Length>(
        "1e400 m",
        "1e400",
        "`1e400` is too large or too small",
        range,
    );
    refused::<Length>(
        "1e-400 m",
        "1e-400",
        "`1e-400` is too large or too small",
        range,
    );
    refused::<Length>(
        "5e-324 m",
        "5e-324",
        "`5e-324` is too large or too small",
        range,
    );
    refused::<Length>(
        "1e999999999999 m",
        "1e999999999999",
        "`1e999999999999` is too large or too small",
        range,
    );
    let range = "between 1e-100 and 1e100";
    refused::<Stress>(
        "1e99 GPa",
        "1e99 GPa",
        "`1e99 GPa` is too large or too small",
        range,
    );
    // A unit that overflows makes neither a zero nor a NaN.
    for number in ["1", "0"] {
        let text = format!("{number} {}m/{}m", "mm9 ".repeat(19), "m9 ".repeat(19));
        let error = read::<Ratio>(&text).expect_err(&text);
        assert!(
            error.message.ends_with("is too large or too small"),
            "{}",
            error.message
        );
    }
    let digits = "9".repeat(1_000_000);
    refused::<Length>(
        &digits,
        &digits,
        "this text of 1000000 bytes is no value with a unit",
        LENGTHS,
    );
}

#[test]
fn fractions_and_feet() {
    refused::<Length>("1/0 in", "1/0", "this fraction divides by zero", "`5/8`");
    refused::<Length>(
        "1 9/8 in",
        "9/8",
        "the fraction `9/8` after a whole number is not less than 1",
        "`1-1/2`",
    );
    refused::<Length>(
        "1/2.5 in",
        "2.5",
        "the lower part of a fraction is a whole number",
        "`5/8`",
    );
    let how = "as in `9 ft 4-1/2 in`";
    refused::<Length>(
        "9.5 ft 4 in",
        "9.5",
        "feet before inches are a whole number",
        how,
    );
    refused::<Length>(
        "9 ft 12 in",
        "12",
        "the inches after feet are less than 12",
        how,
    );
    let lacks = "after feet and a number the inches lack their unit";
    refused::<Length>("9'-4 1/2", "", lacks, how);
    refused::<Length>("9 ft 4 mm", "mm", lacks, how);
}

#[test]
fn units_of_the_wrong_kind_name_both() {
    refused::<Length>(
        "62 kN",
        "kN",
        "`kN` is a force; a length is expected here",
        LENGTHS,
    );
    refused::<Area>(
        "30 mm",
        "mm",
        "`mm` is a length; an area is expected here",
        "5.61 cm2",
    );
    refused::<Stress>(
        "1 kN m",
        "kN m",
        "`kN m` is a moment; a stress is expected here",
        "345 MPa",
    );
    refused::<Force>(
        "6\"",
        "\"",
        "`\"` is a length; a force is expected here",
        "62 kN",
    );
    refused::<Force>(
        "5 t",
        "t",
        "`t` is a mass; a force is expected here",
        "write `kgf`, `tf` (metric ton-force) or `kN`",
    );
    refused::<Stress>(
        "5 kg/cm2",
        "kg/cm2",
        "`kg/cm2` is a quantity of another kind; a stress is expected here",
        "write `kgf`",
    );
    refused::<Mass>(
        "5 kN",
        "kN",
        "`kN` is a force; a mass is expected here",
        "320 kg",
    );
    refused::<MassPerLength>(
        "5 kN/m",
        "kN/m",
        "`kN/m` is a force per length; a mass per length is expected here",
        "4.9 kg/m",
    );
    refused::<Density>(
        "5 lb",
        "lb",
        "`lb` is a mass; a density is expected here",
        "7850 kg/m3",
    );
    refused::<Ratio>(
        "1 deg",
        "deg",
        "`deg` is an angle; a strain is expected here",
        "ue",
    );
    refused::<Angle>(
        "5 %",
        "%",
        "`%` is a ratio; an angle is expected here",
        "30 deg",
    );
    refused::<Length>(
        "2.85 m ± 3 kN",
        "kN",
        "`kN` is a force; a length is expected here",
        LENGTHS,
    );
}

#[test]
fn names_that_are_no_units() {
    let near = |meant: &str| format!("did you mean `{meant}`?");
    for (text, part, meant) in [
        ("345 Mpa", "Mpa", "MPa"),
        ("345 mpa", "mpa", "MPa"),
        ("345 MPA", "MPA", "MPa"),
        ("345 KSI", "KSI", "ksi"),
        ("345 mbar", "mbar", "bar"),
        ("345 N/MM2", "MM", "mm"),
    ] {
        let message = format!("`{part}` is no known unit");
        refused::<Stress>(text, part, &message, &near(meant));
    }
    refused::<Force>("62 kn", "kn", "`kn` is no known unit", &near("kN"));
    refused::<Force>("62 kips", "kips", "`kips` is no known unit", &near("kip"));
    refused::<Force>("62 lbs", "lbs", "`lbs` is no known unit", &near("lb"));
    refused::<Length>(
        "6 inches",
        "inches",
        "`inches` is no known unit",
        &near("in"),
    );
    refused::<ThermodynamicTemperature>("20 deg C", "C", "`C` is no known unit", &near("degC"));
    refused::<ThermodynamicTemperature>("20 F", "F", "`F` is no known unit", &near("degF"));
    refused::<Length>(
        "3 furlongs",
        "furlongs",
        "`furlongs` is no known unit",
        LENGTHS,
    );
    refused::<Force>(
        "62 tonf",
        "tonf",
        "`tonf` is ambiguous: the ton is metric, short (US) or long",
        "write `tf` for the metric ton-force (9.80665 kN), `tonf-us`",
    );
    refused::<Mass>(
        "2 tons",
        "tons",
        "`tons` is ambiguous: the ton is metric, short (US) or long",
        "write `t` (1000 kg)",
    );
    refused::<Stress>(
        "0.6 yield",
        "yield",
        "a share of a strength (`yield`) is read only in the limit of a stress",
        "345 MPa",
    );
    refused::<Stress>(
        "yield / 1.67",
        "yield",
        "a share of a strength (`yield`) is read only in the limit of a stress",
        "345 MPa",
    );
    refused::<Force>(
        "length / 500",
        "length",
        "a share of a length is read only in the limit of a movement, as `length / 500`",
        "62 kN",
    );
}

#[test]
fn units_that_are_missing_or_go_on() {
    refused::<Length>("2.85", "2.85", "a unit is missing after `2.85`", LENGTHS);
    refused::<Length>(
        "2.85 ± 3 mm",
        "±",
        "a unit is missing after `2.85`",
        LENGTHS,
    );
    refused::<Stress>("5 N/", "5 N/", "a unit is missing after `5 N/`", "345 MPa");
    refused::<Length>("1e5.5 m", ".5", "`.5` is no unit", LENGTHS);
    refused::<Length>("2 (m)", "(m)", "`(m)` is no unit", LENGTHS);
    refused::<Length>(
        "4 in.",
        ".",
        "`.` after the unit is not understood",
        "without a full stop",
    );
    refused::<Length>(
        "3 m 20 cm",
        "20",
        "`20` after the unit is not understood",
        "nothing else stands there but a tolerance",
    );
    refused::<Length>(
        "3 m\n",
        "\n",
        "`\u{fffd}` after the unit is not understood",
        "tolerance",
    );
    refused::<Area>("3 m^", "^", "a power is missing here", "`mm2`");
    refused::<Area>("3 m22", "22", "a power of a unit has one digit", "`mm2`");
}
