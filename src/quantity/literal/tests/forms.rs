//! Every form that is read, and what it says.
//!
//! The values are the doubles nearest to the exact ones, computed with whole-number fractions from
//! the definitions (1 lb = 0.45359237 kg and 1 ft = 0.3048 m, international agreement of 1959;
//! g = 9.80665 m/s², CGPM 1901; 0 degC = 273.15 K), so they are compared without a tolerance.

use super::si;
use crate::quantity::Strength;
use crate::quantity::{
    Angle, Area, Density, Expansion, Force, ForcePerLength, Length, Literal, Mass, MassPerLength,
    Measure, MovementBound, Ratio, Stress, StressLimit, TemperatureInterval,
    ThermodynamicTemperature, read, read_movement_bound, read_stress_limit,
};

fn hold<Q: Measure>(cases: &[(&str, f64)]) {
    for &(text, value) in cases {
        assert_eq!(si::<Q>(text), value, "{text:?}");
    }
}

#[test]
fn numbers_with_a_unit() {
    hold::<Length>(&[
        ("2.85 m", 2.85),
        ("1_250 mm", 1.25),
        ("30mm", 0.03),
        ("  30 \t mm ", 0.03),
        ("30\u{a0}mm", 0.03),
        ("-1.5 mm", -0.0015),
        ("−1.5 mm", -0.0015),
        ("+1.5 mm", 0.0015),
        ("0.3 mm", 0.0003),
        ("3E2 mm", 0.3),
        ("3e+2 mm", 0.3),
        ("3e−2 m", 0.03),
        ("1 km", 1000.0),
        ("7 cm", 0.07),
        ("12 um", 12e-6),
        ("12 µm", 12e-6),
        ("12 μm", 12e-6),
        ("1 mil", 2.54e-5),
        ("1 yd", 0.9144),
        ("1 ft", 0.3048),
        ("0 mm", 0.0),
        ("0e99999 mm", 0.0),
    ]);
    assert!(si::<Length>("-0 mm").is_sign_positive());
    hold::<Force>(&[
        ("62 kN", 62e3),
        ("2 MN", 2e6),
        ("2 mN", 2e-3),
        ("1 lbf", 4.4482216152605),
        ("1 lb", 4.4482216152605),
        ("5.2 kip", 23130.7523993546),
        ("1 kgf", 9.80665),
        ("1 tf", 9806.65),
        ("1 tonf-us", 8896.443230521),
    ]);
    hold::<Area>(&[
        ("5.61 cm2", 5.61e-4),
        ("412 mm2", 412e-6),
        ("412 mm^2", 412e-6),
        ("412 mm²", 412e-6),
        ("0.442 in2", 0.00028516072),
        ("7 ft2", 0.65032128),
        ("3 m mm", 0.003),
    ]);
    hold::<Mass>(&[
        ("320 kg", 320.0),
        ("1 lb", 0.45359237),
        ("2 t", 2000.0),
        ("5 g", 0.005),
    ]);
}

#[test]
fn stresses() {
    hold::<Stress>(&[
        ("28.5e6 psi", 196500582855.2983),
        ("29000 ksi", 199947961501.88248),
        ("1 Msi", 6894757293.168362),
        ("1 psi", 6894.757293168362),
        ("1 lb/in2", 6894.757293168362),
        ("1 lbf/in^2", 6894.757293168362),
        ("210 GPa", 210e9),
        ("345 MPa", 345e6),
        ("345 N/mm2", 345e6),
        ("345 N/mm^2", 345e6),
        ("345 N/mm²", 345e6),
        ("345 N/mm/mm", 345e6),
        ("345 N/mm mm", 345e6),
        ("345 N mm^-2", 345e6),
        ("345 N·mm⁻²", 345e6),
        ("345 N*mm/mm3", 345e6),
        ("2 bar", 2e5),
        ("4 kPa", 4e3),
        ("5 Pa", 5.0),
        ("3 kgf/cm2", 294199.5),
    ]);
}

#[test]
fn feet_and_inches() {
    // 9.375 × 0.3048 m = 2.8575 m
    for text in [
        "9 ft 4-1/2 in",
        "9 ft 4 1/2 in",
        "9ft 4.5in",
        "9 ft-4-1/2 in",
        "9 ft - 4 1/2 in",
        "9'-4 1/2\"",
        "9'-4-1/2\"",
        "9' 4 1/2\"",
        "9' - 4 1/2\"",
        "9'4.5\"",
        "9′-4 1/2″",
        "9’-4 1/2”",
        "112 1/2\"",
        "112-1/2 in",
    ] {
        assert_eq!(si::<Length>(text), 2.8575, "{text:?}");
    }
    hold::<Length>(&[
        ("5/8 in", 0.015875),
        ("2/3 in", 0.016933333333333335),
        ("1-1/2 in", 0.0381),
        ("1 1/2 in", 0.0381),
        ("-1-1/2 in", -0.0381),
        ("-0'-6\"", -0.1524),
        ("9'", 2.7432),
        ("9.5 ft", 2.8956),
        ("6\"", 0.1524),
        ("6''", 0.1524),
    ]);
    hold::<Area>(&[("1/2 ft2", 0.04645152)]);
}

#[test]
fn compound_units() {
    hold::<Expansion>(&[
        ("12e-6 /K", 12e-6),
        ("12e-6 1/K", 12e-6),
        ("12e-6 K^-1", 12e-6),
        ("12e-6/K", 12e-6),
        ("12 um/m/K", 12e-6),
        ("12 µm/m/°C", 12e-6),
        ("12 um/m K", 12e-6),
        ("6.5e-6 /degF", 1.17e-5),
        ("6.5 um/m/degF", 1.17e-5),
        ("6.5e-6 in/in/°F", 1.17e-5),
    ]);
    hold::<ForcePerLength>(&[
        ("1.2 kip/ft", 17512.683524647637),
        ("850 lbf/in", 148857.80995950493),
        ("850 lb/in", 148857.80995950493),
        ("62.4 kip/in", 10927914.519380126),
        ("35 kN/mm", 35e6),
        ("35 kN / mm", 35e6),
    ]);
    hold::<MassPerLength>(&[("4.9 kg/m", 4.9), ("3.3 lb/ft", 4.910941013779528)]);
}

#[test]
fn densities_and_unit_weights() {
    hold::<Density>(&[
        ("7850 kg/m3", 7850.0),
        ("7.85 g/cm3", 7850.0),
        ("7.85 t/m³", 7850.0),
        ("490 lb/ft3", 7849.047053240469),
        ("490 pcf", 7849.047053240469),
        ("490 lbf/ft3", 7849.047053240469),
        ("0.2836 lb/in3", 7850.020975813605),
        ("24.5 kN/m3", 2498.3047217959243),
    ]);
}

#[test]
fn angles_and_strains() {
    hold::<Angle>(&[
        ("30 deg", std::f64::consts::FRAC_PI_6),
        ("90 deg", std::f64::consts::FRAC_PI_2),
        ("0.1°", 0.0017453292519943296),
        ("37 deg", 0.6457718232379019),
        ("0.2 rad", 0.2),
    ]);
    hold::<Ratio>(&[
        ("-350 ue", -350e-6),
        ("-350 µe", -350e-6),
        ("-350 με", -350e-6),
        ("350 microstrain", 350e-6),
        ("0.1 %", 0.001),
        ("0.3 mm/m", 0.0003),
        ("0.0003 in/in", 0.0003),
    ]);
}

#[test]
fn temperatures() {
    hold::<ThermodynamicTemperature>(&[
        ("20 degC", 293.15),
        ("20 °C", 293.15),
        ("21.1 degC", 294.25),
        ("-18 degC", 255.15),
        ("−18 degC", 255.15),
        ("68 degF", 293.15),
        ("98.6 °F", 310.15),
        ("77.3 degF", 298.31666666666666),
        ("-40 degF", 233.15),
        ("0 degF", 255.37222222222223),
        ("77 K", 77.0),
        ("0 K", 0.0),
        ("-273.15 degC", 0.0),
        ("-459.67 degF", 0.0),
    ]);
    hold::<TemperatureInterval>(&[
        ("+35 K", 35.0),
        ("-35 degC", -35.0),
        ("+65 degF", 36.111111111111114),
        ("-55 degF", -30.555555555555557),
        ("−55 °F", -30.555555555555557),
        ("+0 K", 0.0),
    ]);
}

fn range<Q: Measure>(text: &str) -> (f64, f64, f64) {
    match read::<Q>(text) {
        Ok(Literal {
            nominal,
            lower,
            upper,
            toleranced,
        }) => {
            assert!(toleranced, "{text:?}");
            (lower.si(), nominal.si(), upper.si())
        }
        Err(error) => panic!("{text:?}: {} ({})", error.message, error.help),
    }
}

#[test]
fn tolerances() {
    let near = |(a, b, c): (f64, f64, f64), (x, y, z): (f64, f64, f64), text: &str| {
        for (is, should) in [(a, x), (b, y), (c, z)] {
            assert!(
                (is - should).abs() <= should.abs() * 3e-16,
                "{text:?}: {is} {should}"
            );
        }
    };
    for text in [
        "2.85 m ± 3 mm",
        "2.85 m +/- 3 mm",
        "2.85 m±3mm",
        "2.85 m +/−3 mm",
    ] {
        near(range::<Length>(text), (2.847, 2.85, 2.853), text);
    }
    for text in [
        "12 mm +0.2/-0.1 mm",
        "12 mm + 0.2 / - 0.1 mm",
        "12 mm -0.1/+0.2 mm",
        "12 mm +0.2 mm/-0.1 mm",
        "12 mm +200 um/−0.1 mm",
    ] {
        near(range::<Length>(text), (0.0119, 0.012, 0.0122), text);
    }
    near(
        range::<Length>("12 mm +0.2/-0 mm"),
        (0.012, 0.012, 0.0122),
        "-0",
    );
    near(
        range::<Length>("12 mm +0.2/0 mm"),
        (0.012, 0.012, 0.0122),
        "0",
    );
    near(
        range::<Length>("-12 mm ± 5 %"),
        (-0.0126, -0.012, -0.0114),
        "%",
    );
    near(range::<Stress>("200 GPa ± 5 %"), (190e9, 200e9, 210e9), "%");
    near(
        range::<Stress>("200 GPa +5/-2 %"),
        (196e9, 200e9, 210e9),
        "%",
    );
    near(
        range::<Length>("9'-4 1/2\" ± 1/8\""),
        (2.8575 - 0.003175, 2.8575, 2.8575 + 0.003175),
        "marks",
    );
    near(
        range::<Length>("9 ft -1/8/+1/4 in"),
        (2.7432 - 0.003175, 2.7432, 2.7432 + 0.00635),
        "feet",
    );
    near(
        range::<ThermodynamicTemperature>("20 degC ± 9 degF"),
        (288.15, 293.15, 298.15),
        "a reading",
    );
    near(
        range::<TemperatureInterval>("+35 K ± 5 K"),
        (30.0, 35.0, 40.0),
        "a change",
    );
    near(
        range::<Density>("24.5 kN/m3 ± 10 kg/m3"),
        (2488.3047217959243, 2498.3047217959243, 2508.3047217959243),
        "density",
    );
    let none = read::<Length>("12 mm").unwrap();
    assert!(!none.toleranced && none.lower == none.nominal && none.upper == none.nominal);
}

#[test]
fn limits_as_a_share() {
    let share = |text: &str| match read_stress_limit(text) {
        Ok(StressLimit::Share { factor, strength }) => (factor, strength),
        other => panic!("{text:?}: {other:?}"),
    };
    assert_eq!(share("0.6 yield"), (0.6, Strength::Yield));
    assert_eq!(share("yield / 1.67"), (100.0 / 167.0, Strength::Yield));
    assert_eq!(share(" yield/1.0 "), (1.0, Strength::Yield));
    assert_eq!(share("0.75 ultimate"), (0.75, Strength::Ultimate));
    assert_eq!(share("0.45 crushing"), (0.45, Strength::Crushing));
    assert_eq!(share("0.7 proof"), (0.7, Strength::Proof));
    assert_eq!(share("2/3 yield"), (2.0 / 3.0, Strength::Yield));
    for (text, value) in [
        ("165 MPa", 165e6),
        ("0 MPa", 0.0),
        ("24 ksi ± 1 ksi", 165474175.03604066),
    ] {
        match read_stress_limit(text) {
            Ok(StressLimit::Stress(literal)) => assert_eq!(literal.nominal.si(), value),
            other => panic!("{text:?}: {other:?}"),
        }
    }
    for text in ["length / 500", "length/500"] {
        let share = MovementBound::Share { divisor: 500.0 };
        assert_eq!(read_movement_bound(text), Ok(share));
    }
    match read_movement_bound("1/8 in") {
        Ok(MovementBound::Length(literal)) => assert_eq!(literal.nominal.si(), 0.003175),
        other => panic!("{other:?}"),
    }
}
