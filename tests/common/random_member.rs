//! Random members with up to six stops and gap segments.

use super::chain::{At, Chain, Hold, Kind, Random, Segment, Support};

/// A member with one to six stops and gap segments among up to seven segments, springs, fixed
/// supports, and everything that may act. A force stands at every station, so that no loose part is
/// in balance by itself.
pub(crate) fn member(random: &mut Random) -> Chain {
    let mut contacts = 1 + random.below(6);
    let mut chain = Chain::default();
    for _ in 0..1 + random.below(7) {
        let gap = contacts > 0 && random.chance(0.2);
        contacts -= usize::from(gap);
        chain.segments.push(segment(random, gap));
    }
    let mut stations: Vec<At> = (0..=chain.segments.len()).map(At::Joint).collect();
    let joints = chain.joints();
    for (i, segment) in chain.segments.iter().enumerate() {
        if matches!(segment.kind, Kind::Solid { .. }) && random.chance(0.3) {
            let x = joints[i] + segment.length * random.between(0.2, 0.8);
            stations.push(At::Distance(x));
        }
    }
    for _ in 0..contacts {
        let kind = Hold::Stop {
            clearance: if random.chance(0.1) {
                0.0
            } else {
                random.size(1e-5, 3e-3)
            },
            toward_end: random.chance(0.5),
            stiffness: random.chance(0.4).then(|| random.size(1e6, 1e9)),
        };
        support(random, &mut chain, &stations, kind);
    }
    for _ in 0..random.below(3) {
        support(random, &mut chain, &stations, Hold::Fixed);
    }
    for _ in 0..random.below(3) {
        let kind = Hold::Spring(random.size(1e6, 1e9));
        support(random, &mut chain, &stations, kind);
    }
    for at in stations {
        chain.forces.push((at, signed(random, 1e2, 1e5)));
    }
    chain
}

fn signed(random: &mut Random, low: f64, high: f64) -> f64 {
    let size = random.size(low, high);
    if random.chance(0.5) { size } else { -size }
}

fn segment(random: &mut Random, gap: bool) -> Segment {
    let mut segment = Segment {
        length: random.size(0.1, 3.0),
        kind: Kind::Part {
            stiffness: random.size(1e6, 1e9),
        },
        line: [0.0; 2],
        warming: [0.0; 2],
        misfit: 0.0,
    };
    if gap {
        segment.length = random.size(1e-5, 3e-3);
        segment.kind = Kind::Gap {
            stiffness: random.chance(0.4).then(|| random.size(1e6, 1e9)),
        };
    } else if random.chance(0.85) {
        let area = random.size(1e-4, 1e-2);
        segment.kind = Kind::Solid {
            area: [area; 2],
            modulus: random.between(10e9, 210e9),
            expansion: random.between(5e-6, 25e-6),
        };
        if random.chance(0.4) {
            segment.line = [signed(random, 1e2, 1e4), signed(random, 1e2, 1e4)];
        }
        if random.chance(0.5) {
            segment.warming = [random.between(-60.0, 60.0), random.between(-60.0, 60.0)];
        }
        if random.chance(0.3) {
            segment.misfit = signed(random, 1e-4, 2e-3);
        }
    }
    segment
}

/// Puts a support at one of the stations: at most two at one, and a fixed one alone.
fn support(random: &mut Random, chain: &mut Chain, stations: &[At], kind: Hold) {
    let at = stations[random.below(stations.len())];
    let others = chain.supports.iter().filter(|s| s.at == at);
    let blocked = if kind == Hold::Fixed { 1 } else { 2 };
    if others.clone().count() >= blocked || others.clone().any(|s| s.kind == Hold::Fixed) {
        return;
    }
    let movement = if random.chance(0.3) {
        signed(random, 1e-4, 2e-3)
    } else {
        0.0
    };
    chain.supports.push(Support { at, kind, movement });
}
