//! Areas and radii of gyration of sections against published tables and hand formulas.

use approx::assert_relative_eq;
use lengthwise::catalogue::section::{
    Along, Angle, Bar, Channel, HShape, HollowBox, Inside, Round, Tee, Tube,
};
use lengthwise::catalogue::{Section, Shape};
use lengthwise::quantity::{Length, from_si};
use std::f64::consts::PI;

fn mm(value: f64) -> Along<Length> {
    Along::uniform(from_si(value / 1000.0))
}

fn inch(value: f64) -> Along<Length> {
    mm(25.4 * value)
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

/// Tables of European rolled sections (EN 10365) and of UK parallel-flange channels, from memory:
/// area in cm² and radius of gyration about the weak axis in cm.
#[test]
fn rolled_sections_have_their_published_areas_and_radii() {
    for (section, area, radius) in [
        (h(300.0, 150.0, 7.1, 10.7, 15.0), 53.81, 3.35), // IPE 300
        (h(190.0, 200.0, 6.5, 10.0, 18.0), 53.83, 4.98), // HE 200 A
        (h(300.0, 300.0, 11.0, 19.0, 27.0), 149.1, 7.58), // HE 300 B
        (channel(200.0, 75.0, 6.0, 12.5, 12.0), 29.9, 2.39), // PFC 200 x 75
    ] {
        assert_relative_eq!(
            section.area().at(0.5).value * 1e4,
            area,
            max_relative = 0.002
        );
        let gyration = section.gyration_at(0.5).unwrap().value * 100.0;
        assert_relative_eq!(gyration, radius, max_relative = 0.02);
    }
}

/// L 100 x 100 x 10 of EN 10056-1: 19.15 cm² with its toes rounded (radius 6 mm), which are left
/// square here; least radius 1.95 cm. From memory.
#[test]
fn an_angle_has_its_published_area_but_for_its_toes() {
    let angle = Section::Angle(Angle {
        depth: mm(100.0),
        width: mm(100.0),
        wall: mm(10.0),
        root: Some(mm(12.0)),
    });
    let toes = 2.0 * (1.0 - PI / 4.0) * 0.6 * 0.6;
    let area = angle.area().at(0.0).value * 1e4;
    assert_relative_eq!(area - toes, 19.15, max_relative = 0.001);
    assert_relative_eq!(
        angle.gyration_at(0.0).unwrap().value * 100.0,
        1.95,
        max_relative = 0.01
    );
}

/// Pipes of ASME B36.10M: outer diameter, wall, area, second moment, in inches; areas and moments
/// computed from the nominal dimensions and rounded to five decimals.
#[test]
fn pipes_have_the_areas_of_their_table() {
    for (outer, wall, area, moment) in [
        (0.840, 0.109, 0.25032, 0.01709),
        (1.315, 0.133, 0.49388, 0.08734),
        (1.900, 0.200, 1.06814, 0.39121),
        (2.375, 0.154, 1.07453, 0.66575),
        (3.500, 0.300, 3.01593, 3.89432),
        (4.500, 0.237, 3.17405, 7.23260),
        (6.625, 0.432, 8.40494, 40.49067),
        (8.625, 0.322, 8.39926, 72.48924),
        (10.750, 0.594, 18.95217, 245.18704),
        (12.750, 0.406, 15.74461, 300.20866),
    ] {
        let square_inch = 0.0254 * 0.0254;
        for inside in [
            Inside::Wall(inch(wall)),
            Inside::Inner(inch(outer - 2.0 * wall)),
        ] {
            let pipe = Section::Tube(Tube {
                outer: inch(outer),
                inside,
            });
            let found = pipe.area().start().value / square_inch;
            assert!((found - area).abs() <= 5.01e-6, "{outer}: {found}");
            let radius = pipe.gyration_at(0.0).unwrap().value / 0.0254;
            assert!(
                (radius * radius * found - moment).abs() <= 6e-6,
                "{outer}: {radius}"
            );
            assert_relative_eq!(
                pipe.thickness().unwrap().value / 0.0254,
                wall,
                max_relative = 1e-12
            );
        }
    }
}

/// Second moments of a shape by adding up squares of 0.5 mm, with the moment of each about its own
/// centre; m.
fn least_radius_by_squares(size: (f64, f64), inside: impl Fn(f64, f64) -> bool) -> f64 {
    const SIDE: f64 = 0.5;
    let across = |size: f64| (0..(size / SIDE) as usize).map(|i| (i as f64 + 0.5) * SIDE);
    let points: Vec<(f64, f64)> = across(size.0)
        .flat_map(|x| across(size.1).map(move |y| (x, y)))
        .filter(|&(x, y)| inside(x, y))
        .collect();
    let mean = |f: &dyn Fn(f64, f64) -> f64| {
        points.iter().map(|&(x, y)| f(x, y)).sum::<f64>() / points.len() as f64
    };
    let (x0, y0) = (mean(&|x, _| x), mean(&|_, y| y));
    let xx = mean(&|x, _| (x - x0).powi(2)) + SIDE * SIDE / 12.0;
    let yy = mean(&|_, y| (y - y0).powi(2)) + SIDE * SIDE / 12.0;
    let xy = mean(&|x, y| (x - x0) * (y - y0));
    (((xx + yy) / 2.0 - ((xx - yy) / 2.0).hypot(xy)).sqrt()) / 1000.0
}

#[test]
fn least_radii_of_sharp_shapes_are_those_of_their_squares() {
    let (depth, width, web, flange) = (120.0, 84.0, 6.0, 9.0);
    let shapes: [(Section, f64); 5] = [
        (
            Section::H(HShape {
                depth: mm(depth),
                width: mm(width),
                web: mm(web),
                flange: mm(flange),
                root: None,
            }),
            least_radius_by_squares((width, depth), |x, y| {
                y < flange || y > depth - flange || (x - width / 2.0).abs() < web / 2.0
            }),
        ),
        (
            Section::Channel(Channel {
                depth: mm(depth),
                width: mm(width),
                web: mm(web),
                flange: mm(flange),
                root: None,
            }),
            least_radius_by_squares((width, depth), |x, y| {
                y < flange || y > depth - flange || x < web
            }),
        ),
        (
            Section::Tee(Tee {
                depth: mm(depth),
                width: mm(width),
                web: mm(web),
                flange: mm(flange),
                root: None,
            }),
            least_radius_by_squares((width, depth), |x, y| {
                y < flange || (x - width / 2.0).abs() < web / 2.0
            }),
        ),
        (
            Section::Angle(Angle {
                depth: mm(depth),
                width: mm(width),
                wall: mm(flange),
                root: None,
            }),
            least_radius_by_squares((width, depth), |x, y| x < flange || y < flange),
        ),
        (
            Section::Box(HollowBox {
                width: mm(width),
                depth: mm(depth),
                wall: mm(flange),
            }),
            least_radius_by_squares((width, depth), |x, y| {
                x < flange || x > width - flange || y < flange || y > depth - flange
            }),
        ),
    ];
    for (section, radius) in shapes {
        let found = section.gyration_at(0.3).unwrap().value;
        assert_relative_eq!(found, radius, max_relative = 1e-10);
    }
}

/// A box of 100 x 200 x 10 mm: outer less inner rectangle; a flat of 80 x 12 mm; a round of 30 mm.
#[test]
fn simple_shapes_agree_with_hand_formulas() {
    let hollow = Section::Box(HollowBox {
        width: mm(100.0),
        depth: mm(200.0),
        wall: mm(10.0),
    });
    assert_relative_eq!(
        hollow.area().at(0.2).value * 1e6,
        5600.0,
        max_relative = 1e-14
    );
    let moment = (200.0 * 100f64.powi(3) - 180.0 * 80f64.powi(3)) / 12.0;
    let radius = hollow.gyration_at(0.2).unwrap().value * 1e3;
    assert_relative_eq!(radius, (moment / 5600.0).sqrt(), max_relative = 1e-14);

    let flat = Section::Bar(Bar {
        width: mm(80.0),
        depth: mm(12.0),
    });
    assert_relative_eq!(flat.area().at(0.2).value * 1e6, 960.0, max_relative = 1e-14);
    assert_relative_eq!(
        flat.gyration_at(0.2).unwrap().value * 1e3,
        (80.0 * 12f64.powi(3) / 12.0 / 960.0).sqrt(),
        max_relative = 1e-14
    );

    let round = Section::Round(Round { diameter: mm(30.0) });
    assert_relative_eq!(
        round.area().at(0.2).value * 1e6,
        706.858_347_057_703_5,
        max_relative = 1e-14
    );
    assert_relative_eq!(
        round.gyration_at(0.2).unwrap().value * 1e3,
        7.5,
        max_relative = 1e-14
    );

    // A tee is half of the H of twice its depth.
    let tee = Section::Tee(Tee {
        depth: mm(150.0),
        width: mm(150.0),
        web: mm(7.1),
        flange: mm(10.7),
        root: Some(mm(15.0)),
    });
    let whole = h(300.0, 150.0, 7.1, 10.7, 15.0);
    assert_relative_eq!(
        tee.area().at(0.0).value * 2.0,
        whole.area().at(0.0).value,
        max_relative = 1e-14
    );
}
