//! Motions that nothing resists, in words: which body or point can move how.

use super::space::{cross, dot, plus, size, times};
use super::unknowns::Unknowns;
use crate::model::{Assembly, Model, Place, Spatial};
use crate::quantity::{Dimension, Length, Style, from_si};
use crate::solve::system::Row;

/// A motion of some of the bodies and points of an assembly.
#[derive(Debug, Clone, PartialEq)]
pub struct Motion {
    /// What moves in it, bodies before points.
    pub movers: Vec<Mover>,
    /// How all of them move, where they keep their distances.
    pub together: Option<Way>,
}

/// What moves.
#[derive(Debug, Clone, PartialEq)]
pub struct Mover {
    /// What it is.
    pub what: Moving,
    /// How it moves by itself.
    pub way: Way,
}

/// A thing that moves, by its index in the model or in its assembly.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
#[allow(missing_docs)]
pub enum Moving {
    Body(usize),
    Point(usize),
    /// A part of a member between two open gaps.
    Member(usize),
}

/// How a thing moves.
#[derive(Debug, Clone, PartialEq)]
pub enum Way {
    /// Along a direction, a unit vector.
    Along(Spatial<f64>),
    /// About an axis.
    About {
        /// Its direction, a unit vector.
        axis: Spatial<f64>,
        /// A place on it.
        through: Spatial<Length>,
        /// The first and the last of the points on it, by their indices.
        points: Vec<usize>,
        /// Whether it moves along the axis as well.
        along: bool,
    },
}

/// A velocity as of a stiff body: that of a place, and the rotation.
#[derive(Debug, Clone, Copy)]
struct Twist {
    at: Spatial<f64>,
    velocity: Spatial<f64>,
    rotation: Spatial<f64>,
}

/// Shares of the largest movement below this are rounding.
const ROUNDING: f64 = 1e-6;

/// How many names a sentence holds.
const NAMES: usize = 4;

impl Twist {
    fn velocity_of(&self, place: &Spatial<f64>) -> Spatial<f64> {
        let arm = plus(place, -1.0, &self.at);
        plus(&self.velocity, 1.0, &cross(&self.rotation, &arm))
    }

    /// The motion in words' terms; `points` are looked through for some that stay where they are,
    /// and `length` is that over which a rotation counts.
    fn way(&self, assembly: &Assembly, points: impl Iterator<Item = usize>, length: f64) -> Way {
        let turning = size(&self.rotation);
        let moving = size(&self.velocity);
        if turning * length <= ROUNDING * moving.max(turning * length).max(f64::MIN_POSITIVE) {
            return Way::Along(upward(&times(
                1.0 / moving.max(f64::MIN_POSITIVE),
                &self.velocity,
            )));
        }
        let axis = times(1.0 / turning, &self.rotation);
        let pitch = dot(&axis, &self.velocity);
        let aside = plus(&self.velocity, -pitch, &axis);
        let through = plus(&self.at, 1.0 / turning, &cross(&axis, &aside));
        let on_axis = |&point: &usize| {
            let place = assembly.points[point].at.map(|entry| entry.value);
            let away = plus(&place, -1.0, &through);
            size(&cross(&axis, &away)) <= ROUNDING * length.max(size(&away))
        };
        let mut on: Vec<usize> = points.filter(on_axis).collect();
        if assembly.coordinates < 3 {
            on.truncate(1);
        } else if on.len() > 2 {
            on.drain(1..on.len() - 1);
        }
        Way::About {
            axis: upward(&axis),
            through: through.map(from_si),
            points: on,
            along: pitch.abs() > ROUNDING * (turning * length).max(moving),
        }
    }
}

/// The one of a direction and its opposite whose last entry that is not 0 is positive.
fn upward(direction: &Spatial<f64>) -> Spatial<f64> {
    let tidy = direction.map(|entry| if entry.abs() < ROUNDING { 0.0 } else { entry });
    match tidy.iter().rev().find(|entry| **entry != 0.0) {
        Some(&last) if last < 0.0 => tidy.map(|entry| if entry == 0.0 { 0.0 } else { -entry }),
        _ => tidy,
    }
}

impl Motion {
    /// From a motion of the unknowns. `member_of` tells whose a station's unknown is.
    pub(super) fn of(
        assembly: &Assembly,
        unknowns: &Unknowns,
        row: &Row,
        member_of: impl Fn(usize) -> usize,
    ) -> Self {
        let mut twists: Vec<(Moving, Twist, f64)> = Vec::new();
        let mut row = row.clone();
        row.retain(|(_, share)| share.abs() > ROUNDING);
        row.sort_unstable_by_key(|&(unknown, _)| unknown);
        let things = row.chunk_by(|a, b| unknowns.owner(a.0) == unknowns.owner(b.0));
        for shares in things {
            let Some(what) = unknowns.owner(shares[0].0) else {
                continue;
            };
            let [velocity, rotation] = unknowns.velocity(what, shares);
            let (at, length) = match what {
                Moving::Body(body) => {
                    let carriage = &unknowns.bodies[body];
                    (carriage.reference, carriage.size.value)
                }
                Moving::Point(point) | Moving::Member(point) => (assembly.points[point].at, 0.0),
            };
            let twist = Twist {
                at: at.map(|entry| entry.value),
                velocity,
                rotation,
            };
            twists.push((what, twist, length));
        }
        let together = common(assembly, &twists);
        let mut movers: Vec<Mover> = twists
            .into_iter()
            .map(|(what, twist, length)| {
                let own: &[usize] = match what {
                    Moving::Body(body) => &assembly.bodies[body].points,
                    _ => &[],
                };
                // Its own points first, then any other.
                let others = (0..assembly.points.len()).filter(|point| !own.contains(point));
                let points = own.iter().copied().chain(others);
                let way = twist.way(assembly, points, length);
                Mover { what, way }
            })
            .collect();
        for &(unknown, _) in row.iter().filter(|(unknown, _)| *unknown >= unknowns.count) {
            let what = Moving::Member(member_of(unknown));
            if !movers.iter().any(|mover| mover.what == what) {
                movers.push(Mover {
                    what,
                    way: Way::Along([0.0; 3]),
                });
            }
        }
        Motion { movers, together }
    }

    /// What moves and how, such as "body `deck` can turn about the line through `a` and `b`".
    pub fn words(&self, model: &Model, style: Style) -> String {
        let Some(assembly) = &model.assembly else {
            return String::new();
        };
        let things: Vec<&Mover> = self
            .movers
            .iter()
            .filter(|mover| !matches!(mover.what, Moving::Member(_)))
            .collect();
        match (&things[..], &self.together) {
            ([], _) => {
                let inside = self.movers.iter().map(|mover| match mover.what {
                    Moving::Member(member) => format!("`{}`", model.members[member].name),
                    _ => String::new(),
                });
                let names: Vec<String> = inside.collect();
                format!(
                    "a part between the gaps of member {} can move along it",
                    list(&names)
                )
            }
            ([alone], _) => format!(
                "{} can {}",
                named(assembly, &[alone]),
                alone.way.words(assembly, style)
            ),
            (several, Some(way)) => format!(
                "{} together can {}",
                named(assembly, several),
                way.words(assembly, style)
            ),
            (several, None) => {
                let each = several.iter().take(NAMES).map(|mover| {
                    format!(
                        "{} can {}",
                        named(assembly, &[mover]),
                        mover.way.words(assembly, style)
                    )
                });
                let mut each: Vec<String> = each.collect();
                if several.len() > NAMES {
                    each.push(format!("{} more with them", several.len() - NAMES));
                }
                format!("{} at the same time", list(&each))
            }
        }
    }

    /// What it is about, as a remark says it.
    pub fn about(&self, model: &Model) -> String {
        match (&self.movers[..], &model.assembly) {
            ([mover], Some(assembly)) => match mover.what {
                Moving::Body(body) => format!("body.{}", assembly.bodies[body].name),
                Moving::Point(point) => format!("point.{}", assembly.points[point].name),
                Moving::Member(member) => format!("member.{}", model.members[member].name),
            },
            _ => "job".to_owned(),
        }
    }

    /// Where it stands in the file: what moves, if that is one thing.
    pub fn place<'m>(&self, model: &'m Model) -> Option<&'m Place> {
        let assembly = model.assembly.as_ref()?;
        match &self.movers[..] {
            [mover] => Some(match mover.what {
                Moving::Body(body) => &assembly.bodies[body].place,
                Moving::Point(point) => &assembly.points[point].place,
                Moving::Member(member) => &model.members[member].place,
            }),
            _ => None,
        }
    }
}

/// The one motion that all of them share, if there is one.
fn common(assembly: &Assembly, twists: &[(Moving, Twist, f64)]) -> Option<Way> {
    let (_, first, length) = twists.first()?;
    if twists.len() < 2 {
        return None;
    }
    // The farthest that any of them lies from the first counts for a rotation.
    let away = |twist: &Twist| size(&plus(&twist.at, -1.0, &first.at));
    let reach = twists.iter().fold(*length, |most, (_, twist, length)| {
        most.max(away(twist) + length)
    });
    let alike = |a: &Spatial<f64>, b: &Spatial<f64>, times: f64| {
        size(&plus(a, -1.0, b)) * times <= ROUNDING * 10.0
    };
    let shares = |(what, twist, _): &(Moving, Twist, f64)| {
        let turns =
            matches!(what, Moving::Point(_)) || alike(&twist.rotation, &first.rotation, reach);
        turns && alike(&twist.velocity, &first.velocity_of(&twist.at), 1.0)
    };
    let all = 0..assembly.points.len();
    twists
        .iter()
        .all(shares)
        .then(|| first.way(assembly, all, reach))
}

impl Way {
    fn words(&self, assembly: &Assembly, style: Style) -> String {
        match self {
            Way::Along(direction) => format!("move along {}", direction_words(assembly, direction)),
            Way::About {
                axis,
                through,
                points,
                along,
            } => {
                let name = |point: usize| format!("`{}`", assembly.points[point].name);
                let place = || {
                    let entries = through[..assembly.coordinates].iter();
                    let entries: Vec<String> = entries
                        .map(|entry| style.quantity(Dimension::Length, tidy(entry.value)))
                        .collect();
                    format!("({})", entries.join(", "))
                };
                let axis_words = || direction_words(assembly, axis);
                let about = match points[..] {
                    [first, .., last] => {
                        format!("the line through {} and {}", name(first), name(last))
                    }
                    [only] if assembly.coordinates == 2 => name(only),
                    [only] => format!("an axis along {} through {}", axis_words(), name(only)),
                    [] if assembly.coordinates == 2 => place(),
                    [] => format!("an axis along {} through {}", axis_words(), place()),
                };
                let also = if *along {
                    " while it moves along that"
                } else {
                    ""
                };
                format!("turn about {about}{also}")
            }
        }
    }
}

/// `x`, or its entries.
fn direction_words(assembly: &Assembly, direction: &Spatial<f64>) -> String {
    let named = ["x", "y", "z"];
    match direction
        .iter()
        .position(|entry| entry.abs() > 1.0 - ROUNDING)
    {
        Some(k) => named[k].to_owned(),
        None => {
            let entries = direction[..assembly.coordinates].iter();
            let entries: Vec<String> = entries
                .map(|entry| format!("{:.3}", tidy(*entry)))
                .collect();
            format!("({})", entries.join(", "))
        }
    }
}

/// Without rounding near 0.
fn tidy(value: f64) -> f64 {
    if value.abs() < 1e-9 { 0.0 } else { value }
}

/// "bodies `deck` and `rail` and point `lug`".
fn named(assembly: &Assembly, movers: &[&Mover]) -> String {
    let mut parts = Vec::with_capacity(2);
    let mut group = |one: &str, many: &str, names: Vec<String>| match &names[..] {
        [] => {}
        [only] => parts.push(format!("{one} {only}")),
        _ => parts.push(format!("{many} {}", list(&names))),
    };
    let of = |name: &dyn Fn(Moving) -> Option<String>| {
        movers.iter().filter_map(|mover| name(mover.what)).collect()
    };
    let bodies = of(&|what| match what {
        Moving::Body(body) => Some(format!("`{}`", assembly.bodies[body].name)),
        _ => None,
    });
    let points = of(&|what| match what {
        Moving::Point(point) => Some(format!("`{}`", assembly.points[point].name)),
        _ => None,
    });
    group("body", "bodies", bodies);
    group("point", "points", points);
    parts.join(" and ")
}

/// "a, b and c", of many only the first few.
pub(super) fn list(names: &[String]) -> String {
    match names {
        [] => String::new(),
        [only] => only.clone(),
        [few @ .., last] if names.len() <= NAMES + 1 => format!("{} and {last}", few.join(", ")),
        many => format!(
            "{} and {} more",
            many[..NAMES].join(", "),
            names.len() - NAMES
        ),
    }
}
