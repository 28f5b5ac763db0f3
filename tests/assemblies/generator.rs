//! Random assemblies: anchors, then points and bodies one after the other, each tied to what stands
//! already by as many members and holds as it has ways to move; on top of these what acts one way.

use super::assembly::{
    Assembly, Body, Hold, HoldKind, Inner, Kind, Layer, Member, Section, Segment, Vector, Way,
    minus, plus, scaled, size, unit,
};
use crate::common::chain::{At, Random};

/// No two points are nearer than this.
const APART: f64 = 0.4;

pub(crate) fn assembly(random: &mut Random, coordinates: usize) -> Assembly {
    let mut made = Assembly {
        coordinates,
        ..Assembly::default()
    };
    if coordinates == 1 && random.chance(0.7) {
        made.runs = Some([90.0, -90.0, 0.0, 30.0, -12.5][random.below(5)]);
    }
    if (coordinates > 1 || made.runs.is_some()) && random.chance(0.6) {
        made.weight = [1.0, 1.35][random.below(2)];
    }
    for _ in 0..coordinates + random.below(2) {
        let point = place(random, &mut made);
        let kind = match random.chance(0.15) {
            true => HoldKind::Spring(random.size(1e7, 1e9)),
            false => HoldKind::Fixed,
        };
        let along = made.every_direction();
        hold(random, &mut made, point, along, kind);
    }
    for _ in 0..1 + random.below(3) {
        match random.chance(0.55) {
            true => free_point(random, &mut made),
            false => body(random, &mut made),
        }
    }
    let one_way = [0, 1, 2, 2, 3, 3, 4, 5, 6, 8][random.below(10)];
    for _ in 0..one_way {
        contact(random, &mut made);
    }
    if made.members.is_empty() {
        // A job needs one.
        let between = member(random, &made, [0, made.points.len() - 1]);
        made.members.push(between);
    }
    if random.chance(0.2) {
        // One that was needed carries only one way: nothing may be left that holds.
        let member = random.below(made.members.len());
        if let Some(member) = made.members.get_mut(member)
            && contacts_in(member) == 0
        {
            one_way_only(random, member);
        }
    }
    made
}

/// How many of its parts act one way.
fn contacts_in(member: &Member) -> usize {
    let gaps = member
        .segments
        .iter()
        .filter(|s| matches!(s.kind, Kind::Gap(_)));
    gaps.count() + usize::from(member.carries.is_some())
}

/// A number of either sign.
fn signed(random: &mut Random, low: f64, high: f64) -> f64 {
    let size = random.size(low, high);
    if random.chance(0.5) { size } else { -size }
}

fn vector(random: &mut Random, coordinates: usize, low: f64, high: f64) -> Vector {
    std::array::from_fn(|axis| match axis < coordinates {
        true => signed(random, low, high),
        false => 0.0,
    })
}

/// A new point apart from all others.
fn place(random: &mut Random, made: &mut Assembly) -> usize {
    loop {
        let at = std::array::from_fn(|axis| match axis < made.coordinates {
            true => random.between(-4.0, 4.0),
            false => 0.0,
        });
        if made.points.iter().all(|&p| size(minus(p, at)) > APART) {
            made.points.push(at);
            return made.points.len() - 1;
        }
    }
}

fn hold(
    random: &mut Random,
    made: &mut Assembly,
    point: usize,
    along: Vec<Vector>,
    kind: HoldKind,
) {
    let movement = match random.chance(0.3) {
        // In a direction that it holds.
        true => {
            let direction = along[random.below(along.len())];
            scaled(direction, signed(random, 1e-5, 3e-3))
        }
        false => [0.0; 3],
    };
    made.holds.push(Hold {
        point,
        along,
        kind,
        movement,
    });
}

/// A direction of small whole numbers, or along an axis, of either sign.
fn direction(random: &mut Random, coordinates: usize) -> Vector {
    if coordinates == 1 || random.chance(0.5) {
        let sign = if random.chance(0.5) { 1.0 } else { -1.0 };
        return scaled(unit(random.below(coordinates)), sign);
    }
    let mut found = [0.0; 3];
    while size(found) == 0.0 {
        for entry in &mut found[..coordinates] {
            *entry = random.below(7) as f64 - 3.0;
        }
    }
    found
}

fn free_point(random: &mut Random, made: &mut Assembly) {
    let earlier = made.points.len();
    let point = place(random, made);
    let force = vector(random, made.coordinates, 1e3, 1e5);
    made.forces.push((point, force));
    for _ in 0..made.coordinates + random.below(2) {
        tie(random, made, point, earlier, false);
    }
}

/// A stiff body of new points and sometimes one that stands already.
fn body(random: &mut Random, made: &mut Assembly) {
    let dim = made.coordinates;
    let earlier = made.points.len();
    let number = match dim {
        1 => 1 + random.below(3),
        2 => 2 + random.below(3),
        _ => 3 + random.below(3),
    };
    let mut points: Vec<usize> = (0..number).map(|_| place(random, made)).collect();
    // In space two bodies that share a point with a third could share two with each other.
    let free: Vec<usize> = made
        .forces
        .iter()
        .map(|f| f.0)
        .filter(|&p| p < earlier)
        .collect();
    if !free.is_empty() && random.chance(0.3) {
        points.push(free[random.below(free.len())]);
    }
    // Any of them may be the first.
    let turn = random.below(points.len());
    points.rotate_left(turn);
    let mass = if random.chance(0.5) {
        random.size(50.0, 5e3)
    } else {
        0.0
    };
    let moment = match dim {
        1 => [0.0; 3],
        2 => [0.0, 0.0, signed(random, 1e3, 1e5)],
        _ => vector(random, 3, 1e3, 1e5),
    };
    let centre = points
        .iter()
        .fold([0.0; 3], |sum, &p| plus(sum, made.points[p]));
    made.bodies.push(Body {
        mass,
        centre: scaled(centre, random.between(0.7, 1.3) / points.len() as f64),
        force: vector(random, dim, 1e3, 1e5),
        moment,
        points: points.clone(),
    });
    let ways = [1, 3, 6][dim - 1];
    for i in 0..ways + random.below(2) {
        let point = points[i % points.len()];
        tie(random, made, point, earlier, true);
    }
    // Points that others may share or hang on.
    for point in points {
        if point >= earlier && random.chance(0.3) {
            let force = vector(random, dim, 1e3, 1e5);
            made.forces.push((point, force));
        }
    }
}

/// Something that keeps a point from moving one way: a member to an earlier point that does not move
/// with it, or a hold. Points of a body are held by springs only: rigid holds could share what
/// nothing decides.
fn tie(random: &mut Random, made: &mut Assembly, point: usize, earlier: usize, of_body: bool) {
    let together = |other: usize| {
        let mut bodies = made.bodies.iter();
        let mut members = made.members.iter();
        bodies.any(|b| b.points.contains(&point) && b.points.contains(&other))
            || members.any(|m| m.ends == [point, other])
    };
    let others: Vec<usize> = (0..earlier)
        .filter(|&p| p != point && !together(p))
        .collect();
    if others.is_empty() || random.chance(0.15) {
        let along = vec![direction(random, made.coordinates)];
        let rigid = !of_body && random.chance(0.4) && !made.holds.iter().any(|h| h.point == point);
        let kind = match rigid {
            true => HoldKind::Fixed,
            false => HoldKind::Spring(random.size(1e6, 1e8)),
        };
        hold(random, made, point, along, kind);
        return;
    }
    let other = others[random.below(others.len())];
    let two_way = member(random, made, [point, other]);
    made.members.push(two_way);
}

/// A part that acts one way: a tie or a strut, a gap in a new member, or a stop.
fn contact(random: &mut Random, made: &mut Assembly) {
    let point = random.below(made.points.len());
    let of_body = made.bodies.iter().any(|b| b.points.contains(&point));
    if random.chance(0.35) && (of_body || made.forces.iter().any(|f| f.0 == point)) {
        let kind = HoldKind::Stop {
            clearance: random.size(1e-5, 3e-3),
            stiffness: random.chance(0.5).then(|| random.size(1e6, 1e9)),
        };
        let along = vec![direction(random, made.coordinates)];
        return hold(random, made, point, along, kind);
    }
    let other = random.below(made.points.len());
    if other == point {
        return;
    }
    let mut new = member(random, made, [point, other]);
    // Between points that do not move it would touch exactly.
    new.segments[0].misfit = signed(random, 1e-5, 2e-3);
    match random.chance(0.3) {
        true => open(random, &mut new),
        false => one_way_only(random, &mut new),
    }
    made.members.push(new);
}

/// Takes out what a one-way member may not have.
fn one_way_only(random: &mut Random, member: &mut Member) {
    member.carries = Some(match random.chance(0.5) {
        true => Way::Tension,
        false => Way::Compression,
    });
    member.forces.clear();
    for segment in &mut member.segments {
        segment.line = [0.0; 2];
        segment.line_down = [0.0; 2];
    }
}

/// Puts a gap into a member, somewhere between, before or after its segments.
fn open(random: &mut Random, member: &mut Member) {
    let width = random.size(1e-5, 2e-3);
    let stiffness = random.chance(0.5).then(|| random.size(1e6, 1e9));
    let longest = (0..member.segments.len())
        .max_by(|&a, &b| {
            member.segments[a]
                .length
                .total_cmp(&member.segments[b].length)
        })
        .unwrap_or(0);
    member.segments[longest].length -= width;
    member.rest = Some(longest);
    let at = random.below(member.segments.len() + 1);
    if at <= longest {
        member.rest = Some(longest + 1);
    }
    let gap = Segment {
        kind: Kind::Gap(stiffness),
        ..Segment::plain(width, 1.0, 1.0)
    };
    member.segments.insert(at, gap);
    // Distances would have to move with it.
    member.forces.clear();
}

/// A two-way member with all that may act on it.
pub(crate) fn member(random: &mut Random, made: &Assembly, ends: [usize; 2]) -> Member {
    let mut new = Member {
        ends,
        ..Member::default()
    };
    let (_, length) = made.axis(&new);
    let number = 1 + random.below(3);
    let mut left = length;
    for i in 0..number {
        let share = match i + 1 == number {
            true => left,
            false => left * random.between(0.2, 0.6),
        };
        left -= share;
        let knows_down = made.coordinates > 1 || made.runs.is_some();
        new.segments.push(segment(random, share, knows_down));
    }
    new.rest = random.chance(0.7).then(|| random.below(number));
    if let Some(rest) = new.rest {
        // As it is read: the distance less the others.
        let others = new.segments.iter().enumerate().filter(|&(i, _)| i != rest);
        let others: f64 = others.map(|(_, s)| s.length).sum();
        new.segments[rest].length = length - others;
    }
    if random.chance(0.3) {
        let at = match random.chance(0.5) && number > 1 {
            true => At::Joint(1 + random.below(number - 1)),
            false => At::Distance(length * random.between(0.05, 0.95)),
        };
        new.forces.push(Inner {
            at,
            force: signed(random, 1e3, 5e4),
            down: (made.coordinates > 1 || made.runs.is_some()) && random.chance(0.4),
        });
    }
    new
}

fn pair(random: &mut Random, value: f64) -> [f64; 2] {
    match random.chance(0.4) {
        true => [value, value * random.between(0.6, 1.5)],
        false => [value; 2],
    }
}

fn segment(random: &mut Random, length: f64, knows_down: bool) -> Segment {
    let layer = |random: &mut Random| {
        let area = random.size(3e-4, 5e-3);
        let section = match random.chance(0.3) {
            true => Section::Round(pair(random, (area / std::f64::consts::FRAC_PI_4).sqrt())),
            false => Section::Area(pair(random, area)),
        };
        Layer {
            section,
            modulus: random.between(10e9, 210e9),
            expansion: random.between(5e-6, 25e-6),
            density: random.between(2e3, 8e3),
        }
    };
    let kind = match random.below(10) {
        0 => Kind::Part(random.size(5e6, 5e8)),
        1 | 2 => Kind::Solid((0..2 + random.below(2)).map(|_| layer(random)).collect()),
        _ => Kind::Solid(vec![layer(random)]),
    };
    let mut made = Segment {
        length,
        kind,
        ..Segment::plain(length, 1.0, 1.0)
    };
    if random.chance(0.25) {
        made.line = [signed(random, 1e2, 1e4), signed(random, 1e2, 1e4)];
    }
    if knows_down && random.chance(0.2) {
        made.line_down = [signed(random, 1e2, 1e4), signed(random, 1e2, 1e4)];
    }
    if random.chance(0.4) && matches!(made.kind, Kind::Solid(_)) {
        made.warming = [random.between(-40.0, 60.0), random.between(-40.0, 60.0)];
    }
    if random.chance(0.25) {
        made.misfit = signed(random, 1e-5, 3e-3);
    }
    made
}
