//! Sections whose dimensions taper: the area as a curve, and dimensions that make no section.

use approx::assert_relative_eq;
use lengthwise::catalogue::section::{
    Along, Angle, Bar, Channel, HShape, HollowBox, Inside, KnownArea, Round, Tee, Thread, Tube,
};
use lengthwise::catalogue::{Section, Shape};
use lengthwise::quantity::{Length, from_si};
use std::f64::consts::PI;

fn mm(value: f64) -> Along<Length> {
    taper(value, value)
}

fn taper(start: f64, end: f64) -> Along<Length> {
    Along {
        start: from_si(start / 1000.0),
        end: from_si(end / 1000.0),
    }
}

fn h(depth: f64, width: f64, web: f64, flange: f64, root: f64) -> Section {
    Section::H(HShape {
        depth: mm(depth),
        width: mm(width),
        web: mm(web),
        flange: mm(flange),
        root: Some(mm(root)),
    })
}

fn channel(depth: f64, width: f64, web: f64, flange: f64, root: f64) -> Section {
    Section::Channel(Channel {
        depth: mm(depth),
        width: mm(width),
        web: mm(web),
        flange: mm(flange),
        root: Some(mm(root)),
    })
}

/// One of each kind, every dimension tapering by itself.
fn tapering() -> Vec<Section> {
    let root = Some(taper(6.0, 3.0));
    vec![
        Section::Round(Round {
            diameter: taper(40.0, 24.0),
        }),
        Section::Tube(Tube {
            outer: taper(60.0, 90.0),
            inside: Inside::Wall(taper(5.0, 2.0)),
        }),
        Section::Tube(Tube {
            outer: taper(60.0, 90.0),
            inside: Inside::Inner(taper(59.0, 20.0)),
        }),
        Section::Bar(Bar {
            width: taper(10.0, 70.0),
            depth: taper(30.0, 12.0),
        }),
        Section::Box(HollowBox {
            width: taper(80.0, 60.0),
            depth: taper(50.0, 90.0),
            wall: taper(3.0, 5.0),
        }),
        Section::Area(KnownArea {
            area: Along {
                start: from_si(3.0e-4),
                end: from_si(1.0e-4),
            },
            gyration: None,
        }),
        Section::H(HShape {
            depth: taper(200.0, 260.0),
            width: taper(120.0, 100.0),
            web: taper(6.0, 7.0),
            flange: taper(9.0, 12.0),
            root,
        }),
        Section::Channel(Channel {
            depth: taper(200.0, 260.0),
            width: taper(120.0, 100.0),
            web: taper(6.0, 7.0),
            flange: taper(9.0, 12.0),
            root,
        }),
        Section::Angle(Angle {
            depth: taper(90.0, 60.0),
            width: taper(60.0, 80.0),
            wall: taper(8.0, 5.0),
            root,
        }),
        Section::Tee(Tee {
            depth: taper(100.0, 130.0),
            width: taper(120.0, 100.0),
            web: taper(6.0, 7.0),
            flange: taper(9.0, 12.0),
            root,
        }),
        Section::Thread(Thread::parse("M24").expect("M24 is in the series")),
    ]
}

#[test]
fn the_curve_of_an_area_is_the_area_of_the_dimensions_everywhere() {
    for section in tapering() {
        assert_eq!(section.fault(), None, "{section:?}");
        let curve = section.area();
        assert!(curve.coefficients().iter().all(|area| area.value > 0.0));
        for step in 0..=64 {
            let s = f64::from(step) / 64.0;
            assert_relative_eq!(
                curve.at(s).value,
                section.area_at(s).value,
                max_relative = 1e-15
            );
        }
    }
}

#[test]
fn no_digit_is_lost_near_a_point_or_in_a_thin_wall() {
    let cone = Round {
        diameter: taper(0.0, 40.0),
    };
    let wedge = Bar {
        width: taper(40.0, 0.0),
        depth: mm(25.0),
    };
    for exponent in 1..=14 {
        let s = 10f64.powi(-exponent);
        let area = PI / 4.0 * (0.04 * s).powi(2);
        assert_relative_eq!(cone.area().at(s).value, area, max_relative = 1e-15);
        assert_relative_eq!(cone.area_at(s).value, area, max_relative = 1e-15);
        // A power of two, so that the distance from the point is exact.
        let left = 2f64.powi(-3 * exponent);
        let area = 0.04 * left * 0.025;
        assert_relative_eq!(
            wedge.area().at(1.0 - left).value,
            area,
            max_relative = 1e-15
        );
    }
    // The squares of diameters that differ by 2e-12 have no digit of the wall left.
    let foil = Tube {
        outer: mm(1000.0),
        inside: Inside::Wall(mm(1e-9)),
    };
    let area = PI * 1e-12 * (1.0 - 1e-12);
    assert_relative_eq!(foil.area().start().value, area, max_relative = 1e-15);
    assert_relative_eq!(foil.area_at(0.5).value, area, max_relative = 1e-15);
}

#[test]
fn thickness_is_the_greatest_along_the_segment() {
    let thickness = [
        40.0,
        5.0,
        35.0,
        25.384_615,
        5.0,
        f64::NAN,
        12.0,
        12.0,
        8.0,
        12.0,
        24.0,
    ];
    for (section, expected) in tapering().iter().zip(thickness) {
        match section.thickness() {
            Some(found) => assert_relative_eq!(found.value * 1e3, expected, max_relative = 1e-7),
            None => assert!(expected.is_nan(), "{section:?}"),
        }
    }
}

#[test]
fn dimensions_that_make_no_section_are_named() {
    let tube = |outer, inside| Section::Tube(Tube { outer, inside });
    let root = |radius| {
        Section::H(HShape {
            depth: mm(100.0),
            width: mm(60.0),
            web: mm(6.0),
            flange: mm(8.0),
            root: Some(mm(radius)),
        })
    };
    for (section, words) in [
        (
            Section::Round(Round {
                diameter: taper(0.0, 0.0),
            }),
            "diameter is 0 at both ends",
        ),
        (
            Section::Round(Round {
                diameter: taper(10.0, -1.0),
            }),
            "diameter must not be negative",
        ),
        (
            tube(mm(50.0), Inside::Wall(taper(10.0, 25.0))),
            "at the segment's end its walls fill",
        ),
        (
            tube(taper(20.0, 50.0), Inside::Wall(mm(10.0))),
            "at the segment's start its walls fill",
        ),
        (tube(mm(50.0), Inside::Inner(mm(50.0))), "it has no wall"),
        (
            tube(mm(50.0), Inside::Wall(mm(0.0))),
            "wall must be more than 0",
        ),
        (
            Section::Bar(Bar {
                width: mm(5.0),
                depth: mm(-5.0),
            }),
            "depth must not be negative",
        ),
        (
            Section::Box(HollowBox {
                width: mm(80.0),
                depth: mm(20.0),
                wall: taper(9.0, 11.0),
            }),
            "at the segment's end its walls fill",
        ),
        (
            Section::Area(KnownArea {
                area: Along::uniform(from_si(-1.0)),
                gyration: None,
            }),
            "area must not be negative",
        ),
        (
            Section::Area(KnownArea {
                area: Along::uniform(from_si(1.0)),
                gyration: Some(mm(0.0)),
            }),
            "radius of gyration must be more than 0",
        ),
        (h(100.0, 60.0, 6.0, 50.0, 0.0), "its flanges fill the depth"),
        (h(100.0, 60.0, 61.0, 8.0, 0.0), "its web is thicker"),
        (root(-1.0), "root radius must not be negative"),
        (root(28.0), "fillets reach beyond the edges"),
        (root(43.0), "fillets do not fit between"),
        (
            channel(100.0, 60.0, 6.0, 50.0, 0.0),
            "its flanges fill the depth",
        ),
        (
            channel(300.0, 60.0, 6.0, 8.0, 55.0),
            "fillets reach beyond the edges",
        ),
        (
            Section::Angle(Angle {
                depth: mm(60.0),
                width: mm(10.0),
                wall: mm(10.0),
                root: None,
            }),
            "wall is as thick as a leg",
        ),
        (
            Section::Tee(Tee {
                depth: mm(60.0),
                width: mm(50.0),
                web: mm(6.0),
                flange: mm(60.0),
                root: None,
            }),
            "its flange fills the depth",
        ),
    ] {
        let fault = section.fault().unwrap_or_default();
        assert!(fault.contains(words), "{section:?}: {fault:?}");
    }
    // A point at one end is none.
    for sound in [
        Section::Round(Round {
            diameter: taper(0.0, 10.0),
        }),
        Section::Bar(Bar {
            width: taper(10.0, 0.0),
            depth: mm(5.0),
        }),
        root(0.0),
        root(27.0),
    ] {
        assert_eq!(sound.fault(), None);
    }
}
