//! The parts of a member: layers, gaps, supports and stations, and what stands on them.

use super::good::model;
use crate::model::{AreaUsed, LimitKind, SegmentKind, Side, SupportKind, Target};
use approx::assert_relative_eq;

#[test]
fn layers_supports_and_stations_of_the_design_are_read() {
    let model = model(
        r#"
[case.a]
[default]
material = "steel-s355"
[member.apron]
start = "fixed"
[[member.apron.segment]]
name = "tier 1"
length = "3.6 m"
layer = [
  { name = "concrete", section = { area = "0.352 m2" }, material = "concrete-c40" },
  { name = "bars", section = { area = "491 mm2" }, count = 16 },
]
[[member.apron.segment]]
name = "joint"
gap = "12 mm"
[[member.apron.segment]]
length = "2 m"
stiffness = "850 lbf/in"
limit = { force = "80 kN" }
[[member.apron.segment]]
name = "flat"
length = "1 m"
section = { bar = { width = ["60 mm", "50 mm"], depth = "12 mm" } }
holes = { diameter = "14 mm", number = 2, thickness = "12 mm" }
limit = [{ tension = "100 MPa" }, { tension = "0.5 yield", area = "gross", source = "contract 4.2" }]

[[member.apron.support]]
name = "kerb"
at = "end"
stop = "2.5 mm"
side = "start"
stiffness = "400 kN/mm"
limit = { reaction = "90 kN", gap = { min = "0.5 mm", max = "4 mm" } }
[[member.apron.support]]
at = "joint.end"
spring = "35 kN/mm"
[[member.apron.support]]
name = "anchor"
at = "1.25 m"
fixed = true
limit = { reaction = ["-40 kN", "60 kN"] }
[[member.apron.load]]
case = "a"
line = ["10 kN/m", "20 kN/m"]
from = "start"
to = "tier 1.end"
[[member.apron.load]]
case = "a"
support = "anchor"
movement = "-3 mm"
[[member.apron.load]]
case = "a"
on = "tier 1.bars"
strain = "-350 ue"
[[member.apron.load]]
case = "a"
misfit = "6.6 mm"
[member.apron.limit]
compression = 0
displacement = [{ at = "tier 1.end", limit = "length / 500" }]
"#,
    );
    let member = &model.members[0];
    let names: Vec<&str> = member.stations.iter().map(|s| &*s.name).collect();
    assert_eq!(
        names,
        ["start", "1.25 m", "tier 1.end", "joint.end", "3.end", "end"]
    );
    let pieces: Vec<(usize, f64, f64)> = member
        .pieces
        .iter()
        .map(|piece| (piece.segment, piece.from, piece.to))
        .collect();
    let at = 1.25 / 3.6;
    assert_eq!(
        pieces,
        [
            (0, 0.0, at),
            (0, at, 1.0),
            (1, 0.0, 1.0),
            (2, 0.0, 1.0),
            (3, 0.0, 1.0)
        ]
    );
    let supports: Vec<(&str, usize)> = member
        .supports
        .iter()
        .map(|support| (&*support.name, support.station))
        .collect();
    assert_eq!(
        supports,
        [("start", 0), ("kerb", 5), ("joint.end", 3), ("anchor", 1)]
    );
    assert!(matches!(
        member.supports[1].kind,
        SupportKind::Stop {
            side: Side::Start,
            ..
        }
    ));
    assert_eq!(member.actions.movements[0].support, 3);
    // 16 bars of 491 mm²
    let layers = member.segments[0].layers();
    assert_relative_eq!(
        layers[1].area.start().value,
        16.0 * 491e-6,
        max_relative = 1e-14
    );
    assert!(matches!(member.segments[1].kind, SegmentKind::Gap(_)));
    // (60 − 28) × 12 mm² at the start, (50 − 28) × 12 mm² at the end
    let net = member.segments[3].layers()[0].net.unwrap();
    assert_relative_eq!(net.start().value, 384e-6, max_relative = 1e-12);
    assert_relative_eq!(net.end().value, 264e-6, max_relative = 1e-12);
    // the line load at the cut, 10 + 10 × 1.25 / 3.6 kN/m
    let lines = &member.actions.lines;
    assert_eq!(lines.len(), 2);
    assert_relative_eq!(lines[0].end.value, 10e3 + 10e3 * at, max_relative = 1e-14);
    assert_eq!(lines[1].start, lines[0].end);
    assert_eq!(lines[1].end.value, 20e3);
    // 6.6 mm over 3.6 + 2 + 1 m, the gap left out: 1e-3 in each of four parts; the bars by themselves
    let strains = &member.actions.strains;
    assert_eq!(strains.len(), 5);
    assert_eq!((strains[0].segment, strains[0].layer), (0, 1));
    assert_relative_eq!(strains[4].strain.value, 1e-3, max_relative = 1e-14);
    let limits: Vec<(&str, Target)> = model
        .limits
        .iter()
        .map(|limit| (&*limit.on, limit.target))
        .collect();
    let segment = |segment| Target::Segment { member: 0, segment };
    let layer = |layer| Target::Layer {
        member: 0,
        segment: 0,
        layer,
    };
    assert_eq!(
        limits,
        [
            ("apron.3", segment(2)),
            ("apron.flat", segment(3)),
            ("apron.flat", segment(3)),
            (
                "apron.kerb",
                Target::Support {
                    member: 0,
                    support: 1
                }
            ),
            (
                "apron.kerb",
                Target::Support {
                    member: 0,
                    support: 1
                }
            ),
            (
                "apron.anchor",
                Target::Support {
                    member: 0,
                    support: 3
                }
            ),
            ("apron.tier 1.concrete", layer(0)),
            ("apron.tier 1.bars", layer(1)),
            ("apron.flat", segment(3)),
            (
                "apron.tier 1.end",
                Target::Station {
                    member: 0,
                    station: 2
                }
            ),
        ]
    );
    assert!(matches!(
        model.limits[1].kind,
        LimitKind::Tension {
            area: AreaUsed::Net,
            ..
        }
    ));
    assert!(matches!(
        model.limits[2].kind,
        LimitKind::Tension {
            area: AreaUsed::Gross,
            ..
        }
    ));
    let LimitKind::Displacement(bound) = model.limits[9].kind else {
        panic!("{:?}", model.limits[9]);
    };
    assert_relative_eq!(bound.upper.value, 6.612 / 500.0, max_relative = 1e-14);
    assert_eq!(bound.lower, -bound.upper);
}
