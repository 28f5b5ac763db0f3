//! Areas of threads against the tables of their standards, and designations against their series.

use approx::assert_relative_eq;
use lengthwise::catalogue::Shape;
use lengthwise::catalogue::section::{StiffnessArea, Thread};

const INCH: f64 = 0.0254;

fn thread(text: &str) -> Thread {
    Thread::parse(text).unwrap_or_else(|error| panic!("{text}: {error}; {}", error.help))
}

/// The tensile stress area in mm².
fn square_millimetres(text: &str) -> f64 {
    thread(text).tensile_stress_area().value * 1e6
}

/// The tensile stress area in in².
fn square_inches(text: &str) -> f64 {
    thread(text).tensile_stress_area().value / (INCH * INCH)
}

/// ISO 898-1, tables of nominal stress areas: three significant digits (M45, M52, M60 from memory).
#[test]
fn metric_stress_areas_are_those_of_iso_898_1() {
    let rows = [
        ("M6", 20.1, 0.05),
        ("M7", 28.9, 0.05),
        ("M8", 36.6, 0.05),
        ("M10", 58.0, 0.05),
        ("M12", 84.3, 0.05),
        ("M14", 115.0, 0.5),
        ("M16", 157.0, 0.5),
        ("M18", 192.0, 0.5),
        ("M20", 245.0, 0.5),
        ("M22", 303.0, 0.5),
        ("M24", 353.0, 0.5),
        ("M27", 459.0, 0.5),
        ("M30", 561.0, 0.5),
        ("M33", 694.0, 0.5),
        ("M36", 817.0, 0.5),
        ("M39", 976.0, 0.5),
        ("M42", 1120.9, 0.05),
        ("M45", 1310.0, 5.0),
        ("M48", 1473.2, 0.055),
        ("M52", 1760.0, 5.0),
        ("M56", 2030.0, 0.05),
        ("M60", 2360.0, 5.0),
        ("M64", 2676.0, 0.05),
    ];
    for (text, printed, half_digit) in rows {
        let area = square_millimetres(text);
        assert!(
            (area - printed).abs() <= half_digit,
            "{text}: {area} against {printed}"
        );
    }
}

/// ISO 898-1, table of fine-pitch threads, from memory.
#[test]
fn fine_metric_stress_areas_are_those_of_iso_898_1() {
    let rows = [
        ("M8x1", 39.2, 0.05),
        ("M10x1.25", 61.2, 0.05),
        ("M12x1.5", 88.1, 0.05),
        ("M16x1.5", 167.0, 0.5),
        ("M20x1.5", 272.0, 0.5),
        ("M24x2", 384.0, 0.5),
        ("M30x2", 621.0, 0.5),
        ("M36x3", 865.0, 0.5),
    ];
    for (text, printed, half_digit) in rows {
        let area = square_millimetres(text);
        assert!(
            (area - printed).abs() <= half_digit,
            "{text}: {area} against {printed}"
        );
    }
}

/// Stress areas printed with the Unified series, ASME B1.1 (UNC from 1-1/4 in up from memory): half
/// a unit of the last printed digit.
#[test]
fn unified_stress_areas_are_those_of_asme_b1_1() {
    let rows = [
        ("1/4-20 UNC", 0.0318, 4),
        ("5/16-18 UNC", 0.0524, 4),
        ("3/8-16 UNC", 0.0775, 4),
        ("7/16-14 UNC", 0.1063, 4),
        ("1/2-13 UNC", 0.1419, 4),
        ("9/16-12 UNC", 0.182, 3),
        ("5/8-11 UNC", 0.226, 3),
        ("3/4-10 UNC", 0.334, 3),
        ("7/8-9 UNC", 0.462, 3),
        ("1-8 UNC", 0.606, 3),
        ("1-1/8-7 UNC", 0.763, 3),
        ("1-1/4-7 UNC", 0.969, 3),
        ("1-3/8-6 UNC", 1.155, 3),
        ("1-1/2-6 UNC", 1.405, 3),
        ("1-3/4-5 UNC", 1.90, 2),
        ("2-4.5 UNC", 2.50, 2),
        ("2-1/4-4.5 UNC", 3.25, 2),
        ("2-1/2-4 UNC", 4.00, 2),
        ("2-3/4-4 UNC", 4.93, 2),
        ("3-4 UNC", 5.97, 2),
        ("3-1/4-4 UNC", 7.10, 2),
        ("3-1/2-4 UNC", 8.33, 2),
        ("3-3/4-4 UNC", 9.66, 2),
        ("4-4 UNC", 11.08, 2),
        ("1/4-28 UNF", 0.0364, 4),
        ("3/8-24 UNF", 0.0878, 4),
        ("7/16-20 UNF", 0.1187, 4),
        ("9/16-18 UNF", 0.203, 3),
        ("5/8-18 UNF", 0.256, 3),
        ("3/4-16 UNF", 0.373, 3),
        ("7/8-14 UNF", 0.509, 3),
        ("1-12 UNF", 0.663, 3),
        ("1-1/8-12 UNF", 0.856, 3),
        ("1-1/4-12 UNF", 1.073, 3),
        ("1-3/8-12 UNF", 1.315, 3),
        ("1-1/2-12 UNF", 1.581, 3),
        ("1-1/8-8 UN", 0.790, 3),
        ("1-1/4-8 UN", 1.000, 3),
        ("1-1/2-8 UN", 1.492, 3),
        ("2-8 UN", 2.77, 2),
        ("3-8 UN", 6.51, 2),
    ];
    for (text, printed, digits) in rows {
        let area = square_inches(text);
        let half_digit = 0.5 * 10f64.powi(-digits) * (1.0 + 1e-9);
        assert!(
            (area - printed).abs() <= half_digit,
            "{text}: {area} against {printed}"
        );
    }
    // Printed rounded down from 0.05807, 0.15995 and 1.23350: to a whole unit of the last digit.
    for (text, printed, digit) in [
        ("5/16-24 UNF", 0.0580, 1e-4),
        ("1/2-20 UNF", 0.1599, 1e-4),
        ("1-3/8-8 UN", 1.233, 1e-3),
    ] {
        let area = square_inches(text);
        assert!((0.0..digit).contains(&(area - printed)), "{text}: {area}");
    }
}

/// Areas at the root: ASME B1.1, section at the minor diameter at D − 2h_b, and d₃ of ISO 724 for
/// M12, M24 and M36; the inch values from memory.
#[test]
fn root_areas_are_those_of_the_tables() {
    for (text, printed) in [
        ("1/4-20 UNC", 0.0269),
        ("1/2-13 UNC", 0.1257),
        ("3/4-10 UNC", 0.302),
        ("1-8 UNC", 0.551),
        ("1-12 UNF", 0.625),
    ] {
        let area = thread(text).minor_area().value / (INCH * INCH);
        assert!((area - printed).abs() <= 0.0005, "{text}: {area}");
    }
    for (text, root) in [("M12", 9.8530), ("M24", 20.3194), ("M36", 31.0925)] {
        let diameter = (thread(text).minor_area().value * 4.0 / std::f64::consts::PI).sqrt();
        assert!((diameter * 1e3 - root).abs() <= 6e-5, "{text}: {diameter}");
    }
}

#[test]
fn stress_stands_on_the_stress_area_and_stiffness_on_the_area_chosen() {
    let mut m20 = thread("M20");
    let (nominal, tensile, minor) = (314.159, 244.79, 225.19); // π/4 of 20, 17.6545 and 16.9328 mm
    assert_relative_eq!(
        m20.gross_area().at(0.4).value * 1e6,
        nominal,
        max_relative = 1e-5
    );
    let net = m20.net_area().map(|area| area.at(0.4).value * 1e6);
    assert_relative_eq!(net.unwrap(), tensile, max_relative = 1e-4);
    for (chosen, area) in [
        (StiffnessArea::Tensile, tensile),
        (StiffnessArea::Nominal, nominal),
        (StiffnessArea::Minor, minor),
    ] {
        m20.stiffness_area = chosen;
        assert_relative_eq!(m20.area().at(0.5).value * 1e6, area, max_relative = 1e-4);
        assert_relative_eq!(m20.area_at(0.5).value * 1e6, area, max_relative = 1e-4);
    }
    assert_eq!(StiffnessArea::default(), StiffnessArea::Tensile);
    assert_relative_eq!(m20.thickness().unwrap().value, 0.020);
    assert_eq!(m20.fault(), None);
}

#[test]
fn spellings_of_one_thread_are_one_thread() {
    for (one, others) in [
        ("M24x2", &["M 24 × 2", "M24X2", "m24 x 2.0", " M24*2 "][..]),
        ("M24", &["M24x3", "M 24.0"]),
        (
            "1-1/4-7 UNC",
            &["1 1/4-7 UNC", "1 1/4 - 7 unc", "1.25-7UNC"],
        ),
        ("3/4-10 UNC", &["0.750-10 UNC", ".75-10 UNC"]),
        (
            "#10-24 UNC",
            &[
                "No. 10-24 UNC",
                "no 10-24 UNC",
                "# 10-24 UNC",
                "0.190-24 UNC",
            ],
        ),
    ] {
        for other in others {
            assert_eq!(thread(other), thread(one), "{other}");
        }
    }
}

#[test]
fn pitch_and_diameter_are_as_designated() {
    let coarse = thread("M24");
    assert_relative_eq!(coarse.nominal.value, 0.024);
    assert_relative_eq!(coarse.pitch.value, 0.003);
    let number = thread("#10-24 UNC"); // 0.190 in, ASME B1.1
    assert_relative_eq!(number.nominal.value, 0.190 * INCH, max_relative = 1e-15);
    assert_relative_eq!(number.pitch.value, INCH / 24.0, max_relative = 1e-15);
}

#[test]
fn what_the_series_do_not_hold_is_refused_with_the_nearest() {
    for (text, message, help) in [
        (
            "M24x2.5",
            "ISO 261 has no pitch of 2.5 mm for M24",
            "write M24 (pitch 3 mm), M24x2, M24x1.5 or M24x1",
        ),
        (
            "M23",
            "ISO 261 has no thread of 23 mm from M1.6 to M100",
            "near it are M20, M22, M24 and M25",
        ),
        (
            "M65",
            "M65 has no coarse pitch in ISO 261",
            "write M65x4, M65x3, M65x2 or M65x1.5",
        ),
        (
            "M120",
            "ISO 261 has no thread of 120 mm from M1.6 to M100",
            "near it are M95 and M100",
        ),
        (
            "3/4-12 UNC",
            "ASME B1.1 has no 12 threads per inch for 3/4 in its UNC series",
            "write 3/4-10 UNC or 3/4-16 UNF",
        ),
        (
            "11/16-11 UNC",
            "11/16 is no size of the UNC series of ASME B1.1",
            "near it are 9/16-12 UNC, 5/8-11 UNC, 3/4-10 UNC and 7/8-9 UNC",
        ),
        (
            "10-24 UNC",
            "10 in is no size of the UNC series",
            "write the number size as #10-24 UNC",
        ),
    ] {
        let error = Thread::parse(text).unwrap_err();
        assert_eq!(
            (error.message.as_str(), error.help.as_str()),
            (message, help)
        );
    }
}

#[test]
fn what_is_no_designation_is_refused() {
    let long = "M".repeat(1_000_000);
    for text in [
        "",
        "M",
        "Mx2",
        "M24x",
        "M24x2x1",
        "M-24",
        "Mnan",
        "Minf",
        "M1e1",
        "M0",
        "M24-6g",
        "24",
        "3/4",
        "3/4-10",
        "UNC",
        "-UNC",
        "3/4-UNC",
        "/4-10 UNC",
        "3/0-10 UNC",
        "#x-10 UNC",
        "3/4-10 BSW",
        "3/4-10 UNC-2A",
        "#99999999-24 UNC",
        "M24 é",
        long.as_str(),
    ] {
        let error = Thread::parse(text).unwrap_err();
        assert!(
            error.message.ends_with("is no designation of a thread"),
            "{error}"
        );
        assert!(error.message.len() < 200 && error.help.contains("M24x2"));
    }
}
