//! Random members, and what is done to them: other actions, the start and the end exchanged, a
//! segment cut in two, other units.

use crate::common::chain::{At, Chain, Hold, Kind, Random, Segment, Support};
use crate::common::{factor, random_member};

/// The largest free growth of a segment: the size of a movement that restraint takes away.
pub(crate) fn free_growth(chain: &Chain) -> f64 {
    let growth = |segment: &Segment| {
        let expansion = match segment.kind {
            Kind::Solid { expansion, .. } => expansion,
            _ => 0.0,
        };
        let warming = segment.warming[0].abs().max(segment.warming[1].abs());
        expansion * warming * segment.length + segment.misfit.abs()
    };
    chain.segments.iter().map(growth).fold(0.0, f64::max)
}

/// A random member whose solid segments taper.
pub(crate) fn tapering(seed: u64) -> Chain {
    let mut random = Random(seed);
    let mut chain = random_member::member(&mut random);
    for segment in &mut chain.segments {
        if let Kind::Solid { area, .. } = &mut segment.kind {
            area[1] *= random.size(0.2, 5.0);
        }
    }
    chain
}

/// The same without stops and gap segments, held at its start.
pub(crate) fn without_contacts(seed: u64) -> Chain {
    let mut chain = tapering(seed);
    for segment in &mut chain.segments {
        if let Kind::Gap { .. } = segment.kind {
            segment.kind = Kind::Part { stiffness: 5e7 };
        }
    }
    chain
        .supports
        .retain(|s| matches!(s.kind, Hold::Spring(_)) && s.at != At::Joint(0));
    chain.supports.push(Support {
        at: At::Joint(0),
        kind: Hold::Fixed,
        movement: 1e-4,
    });
    chain
}

/// Every action times a number: forces, line loads, warmth, misfits, movements.
pub(crate) fn scale_actions(chain: &mut Chain, mut by: impl FnMut() -> f64) {
    for (_, force) in &mut chain.forces {
        *force *= by();
    }
    for segment in &mut chain.segments {
        let numbers = segment.line.iter_mut().chain(&mut segment.warming);
        numbers.for_each(|n| *n *= by());
        segment.misfit *= by();
    }
    for support in &mut chain.supports {
        support.movement *= by();
    }
}

/// The actions half-way between those of two members that are otherwise the same.
pub(crate) fn half_way(one: &Chain, other: &Chain) -> Chain {
    let mean = |a: f64, b: f64| f64::midpoint(a, b);
    let mut middle = one.clone();
    for (to, (_, b)) in middle.forces.iter_mut().zip(&other.forces) {
        to.1 = mean(to.1, *b);
    }
    for (to, b) in middle.segments.iter_mut().zip(&other.segments) {
        to.line = [mean(to.line[0], b.line[0]), mean(to.line[1], b.line[1])];
        to.warming = [
            mean(to.warming[0], b.warming[0]),
            mean(to.warming[1], b.warming[1]),
        ];
        to.misfit = mean(to.misfit, b.misfit);
    }
    for (to, b) in middle.supports.iter_mut().zip(&other.supports) {
        to.movement = mean(to.movement, b.movement);
    }
    middle
}

/// The member with its start and its end exchanged.
pub(crate) fn reversed(chain: &Chain) -> Chain {
    let count = chain.segments.len();
    let length = chain.joints()[count];
    let place = |at: At| match at {
        At::Joint(joint) => At::Joint(count - joint),
        At::Distance(x) => At::Distance(length - x),
    };
    let swap = |[a, b]: [f64; 2]| [b, a];
    let mut turned = chain.clone();
    turned.segments.reverse();
    for segment in &mut turned.segments {
        segment.line = swap(segment.line).map(|q| -q);
        segment.warming = swap(segment.warming);
        if let Kind::Solid { area, .. } = &mut segment.kind {
            *area = swap(*area);
        }
    }
    for support in &mut turned.supports {
        support.at = place(support.at);
        support.movement = -support.movement;
        if let Hold::Stop { toward_end, .. } = &mut support.kind {
            *toward_end = !*toward_end;
        }
    }
    for (at, force) in &mut turned.forces {
        (*at, *force) = (place(*at), -*force);
    }
    turned
}

/// The member with its segment cut in two, the first part this share of its length.
pub(crate) fn cut(chain: &Chain, index: usize, share: f64) -> Chain {
    let mut cut = chain.clone();
    let at = |[a, b]: [f64; 2]| a + (b - a) * share;
    let first = &mut cut.segments[index];
    let mut second = first.clone();
    first.length *= share;
    second.length -= first.length;
    (first.line[1], second.line[0]) = (at(second.line), at(second.line));
    (first.warming[1], second.warming[0]) = (at(second.warming), at(second.warming));
    (first.misfit, second.misfit) = (second.misfit * share, second.misfit * (1.0 - share));
    match (&mut first.kind, &mut second.kind) {
        (Kind::Solid { area: a, .. }, Kind::Solid { area: b, .. }) => {
            let middle = at(*a);
            (a[1], b[0]) = (middle, middle);
        }
        (Kind::Part { stiffness: a }, Kind::Part { stiffness: b }) => {
            (*a, *b) = (*a / share, *b / (1.0 - share));
        }
        _ => unreachable!("a gap segment is not cut"),
    }
    cut.segments.insert(index + 1, second);
    let place = |at: &mut At| {
        if let At::Joint(joint) = at {
            *joint += usize::from(*joint > index);
        }
    };
    cut.supports.iter_mut().for_each(|s| place(&mut s.at));
    cut.forces.iter_mut().for_each(|f| place(&mut f.0));
    cut
}

/// A tapered hanger with two thrust springs, a stop and everything that acts, in US literals or in
/// the SI literals of the same quantities by the exact definitions.
pub(crate) fn hanger(seed: u64, us: bool) -> String {
    let mut random = Random(seed);
    let mut sized =
        |low: usize, high: usize, part: f64, us_unit: &str, si_unit: &str, factor: f64| {
            let value = (low + random.below(high - low)) as f64 * part;
            match us {
                true => format!("{value} {us_unit}"),
                false => format!("{:e} {si_unit}", value * factor),
            }
        };
    let [inch, pound, psi, degree] = ["in", "lbf", "psi", "degF"].map(factor);
    let modulus = sized(10_000, 31_000, 1.0, "ksi", "Pa", 1e3 * psi);
    let expansion = sized(40, 130, 1e-7, "/degF", "/K", 1.0 / degree);
    let density = sized(
        100,
        500,
        1.0,
        "lb/ft3",
        "kg/m3",
        0.453_592_37 / (12.0 * inch).powi(3),
    );
    let mut inches = |low, high| sized(low, high, 1.0 / 16.0, "in", "m", inch);
    let (length, collar) = (inches(200, 2_000), inches(100, 900));
    let (top, foot, width) = (inches(8, 40), inches(8, 40), inches(8, 40));
    let (clearance, short) = (inches(1, 4), inches(1, 4));
    let force = sized(100, 20_000, 1.0, "lbf", "N", pound);
    let line = sized(1, 40, 1.0, "lbf/ft", "N/m", pound / (12.0 * inch));
    let spring = sized(1_000, 90_000, 1.0, "lbf/in", "N/m", pound / inch);
    let warmer = sized(1, 120, 1.0, "degF", "K", degree);
    let reading = match us {
        true => "-40 degF".into(), // the same reading on both scales
        false => "233.15 K".to_string(),
    };
    format!(
        r#"
[job]
datum = "{reading}"
[material.bar]
modulus = "{modulus}"
expansion = "{expansion}"
density = "{density}"
source = "a number of the test"
[member.m]
start = "fixed"
runs = "down"
segment = [
  {{ name = "rod", length = "{length}", section = {{ round = ["{top}", "{foot}"] }}, material = "bar" }},
  {{ name = "collar", length = "{collar}", section = {{ bar = {{ width = "{width}", depth = "{top}" }} }}, material = "bar" }},
]
support = [
  {{ at = "rod.end", spring = "{spring}" }},
  {{ at = "end", stop = "{clearance}" }},
]
load = [
  {{ at = "end", force = "{force}" }},
  {{ on = "collar", line = "{line}" }},
  {{ weight = 1.0 }},
  {{ temperature-change = "+{warmer}" }},
  {{ on = "rod", misfit = "-{short}" }},
]
"#
    )
}
