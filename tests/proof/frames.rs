//! Random assemblies: ground, then points and bodies one after the other, each tied to what stands
//! by as many bars and holds as it has ways to move; then parts that act one way.

use crate::common::chain::Random;
use crate::hand::{Bar, Hand, Held, Stiff};
use lengthwise::model::{
    Assembly, Carries, ForceOnBody, ForceOnPoint, HoldKind, Model, MomentOnBody, MovementOfHold,
    WeightOfBody,
};
use lengthwise::quantity::from_si;

const NONE: [f64; 3] = [0.0; 3];
const AXES: [[f64; 3]; 3] = [[1.0, 0.0, 0.0], [0.0, 1.0, 0.0], [0.0, 0.0, 1.0]];

/// Bars shorter than this are not made.
const SHORT: f64 = 0.3;

struct Frame<'r> {
    random: &'r mut Random,
    hand: Hand,
    /// The body of every point.
    body_of: Vec<Option<usize>>,
}

/// A random assembly in so many coordinates.
pub(crate) fn frame(random: &mut Random, coordinates: usize) -> Model {
    let mut frame = Frame {
        random,
        hand: Hand {
            coordinates,
            down: [NONE, [0.0, -1.0, 0.0], [0.0, 0.0, -1.0]][coordinates - 1],
            points: Vec::new(),
            moves: Vec::new(),
            bars: Vec::new(),
            bodies: Vec::new(),
            holds: Vec::new(),
            applied: NONE,
        },
        body_of: Vec::new(),
    };
    for _ in 0..coordinates + 1 {
        let point = frame.point(None);
        let along = AXES[..coordinates].to_vec();
        let kind = if frame.random.chance(0.2) {
            HoldKind::Spring {
                along,
                stiffness: from_si(frame.random.size(1e7, 1e9)),
            }
        } else {
            HoldKind::Fixed { along }
        };
        frame.hold(point, kind);
    }
    for _ in 0..1 + frame.random.below(3) {
        if frame.random.chance(0.5) {
            let point = frame.point(None);
            frame.tie_down(&[point], coordinates);
        } else {
            frame.body();
        }
    }
    for _ in 0..frame.random.below(4) {
        frame.one_way();
    }
    let holds = frame.hand.holds.len();
    let (random, hand) = (frame.random, frame.hand);
    hand.made(|assembly| act(random, assembly, holds)).0
}

/// Loads on every point and body, and a movement of some holds.
fn act(random: &mut Random, assembly: &mut Assembly, holds: usize) {
    let coordinates = assembly.coordinates;
    let vector = |random: &mut Random, size: f64| -> [f64; 3] {
        std::array::from_fn(|axis| {
            if axis < coordinates {
                random.between(-size, size)
            } else {
                0.0
            }
        })
    };
    for point in coordinates + 1..assembly.points.len() {
        let force = vector(random, 2e4).map(from_si);
        assembly.actions.forces.push(ForceOnPoint {
            case: 0,
            point,
            force,
        });
    }
    for body in 0..assembly.bodies.len() {
        let force = vector(random, 3e4).map(from_si);
        assembly.actions.bodies.push(ForceOnBody {
            case: 0,
            body,
            force,
        });
        if coordinates > 1 {
            let moment = vector(random, 1e4);
            let moment = match coordinates {
                2 => [0.0, 0.0, moment[0]],
                _ => moment,
            };
            assembly.actions.moments.push(MomentOnBody {
                case: 0,
                body,
                moment: moment.map(from_si),
            });
            assembly.actions.weights.push(WeightOfBody {
                case: 0,
                body,
                number: 1.0,
            });
        }
    }
    for hold in 0..holds.min(coordinates + 1) {
        if random.chance(0.3) {
            assembly.actions.movements.push(MovementOfHold {
                case: 0,
                hold,
                movement: vector(random, 2e-3).map(from_si),
            });
        }
    }
}

impl Frame<'_> {
    fn place(&mut self) -> [f64; 3] {
        let coordinates = self.hand.coordinates;
        std::array::from_fn(|axis| {
            if axis < coordinates {
                self.random.between(-4.0, 4.0)
            } else {
                0.0
            }
        })
    }

    fn point(&mut self, body: Option<usize>) -> usize {
        let at = self.place();
        self.hand.points.push(at);
        self.hand.moves.push(NONE);
        self.body_of.push(body);
        self.hand.points.len() - 1
    }

    fn hold(&mut self, point: usize, kind: HoldKind) {
        let gap = matches!(kind, HoldKind::Stop { .. }).then_some(0.0);
        self.hand.holds.push(Held {
            points: vec![point],
            kind,
            reactions: vec![NONE],
            gap,
        });
    }

    fn direction(&mut self) -> [f64; 3] {
        let at = self.place();
        let size = at.iter().map(|entry| entry * entry).sum::<f64>().sqrt();
        at.map(|entry| entry / size)
    }

    fn body(&mut self) {
        let coordinates = self.hand.coordinates;
        let index = self.hand.bodies.len();
        let mut points: Vec<usize> = (0..2 + self.random.below(3))
            .map(|_| self.point(Some(index)))
            .collect();
        let ways = [1, 3, 6][coordinates - 1];
        let own = points.clone();
        // A point that an earlier body has makes a hinge.
        let shared = (0..self.body_of.len())
            .filter(|&point| self.body_of[point].is_some_and(|body| body < index))
            .find(|_| self.random.chance(0.3));
        points.extend(shared);
        let centre = self.place();
        self.hand.bodies.push(Stiff {
            points,
            mass: self.random.size(10.0, 2e3),
            centre,
            displacement: NONE,
            rotation: NONE,
        });
        self.tie_down(&own, ways);
    }

    /// Bars from these points to what stands already, or holds, as many as there are ways to move.
    fn tie_down(&mut self, points: &[usize], ways: usize) {
        let (mut done, more) = (0, self.random.below(2));
        while done < ways + more {
            let point = points[self.random.below(points.len())];
            if self.random.chance(0.15) {
                let along = vec![self.direction()];
                self.hold(point, HoldKind::Fixed { along });
                done += 1;
            } else if let Some(between) = self.between(point, points) {
                let bar = self.bar(between, None);
                self.hand.bars.push(bar);
                done += 1;
            }
        }
    }

    fn between(&mut self, point: usize, apart: &[usize]) -> Option<(usize, usize)> {
        let other = self.random.below(self.hand.points.len());
        let ends = if self.random.chance(0.5) {
            (point, other)
        } else {
            (other, point)
        };
        (!apart.contains(&other) && self.length(ends) > SHORT).then_some(ends)
    }

    fn length(&self, (start, end): (usize, usize)) -> f64 {
        let (a, b) = (self.hand.points[start], self.hand.points[end]);
        let squares = (0..3).map(|axis| (b[axis] - a[axis]).powi(2));
        squares.sum::<f64>().sqrt()
    }

    fn bar(&mut self, between: (usize, usize), carries: Option<Carries>) -> Bar {
        let length = self.length(between);
        let random = &mut *self.random;
        let cut = length * random.between(0.3, 0.7);
        let area = |random: &mut Random| random.size(1e-4, 3e-3);
        let solid = |random: &mut Random, length: f64| {
            let (a, b) = (area(random), area(random));
            let area = if random.chance(0.5) {
                format!("\"{a:e} m2\"")
            } else {
                format!("[\"{a:e} m2\", \"{b:e} m2\"]")
            };
            format!(
                "{{ length = \"{length:e} m\", section = {{ area = {area} }}, material = \"m\" }}"
            )
        };
        let segments = [solid(random, cut), solid(random, length - cut)].join(", ");
        let mut loads = Vec::new();
        if random.chance(0.5) {
            let change = random.between(-40.0, 40.0);
            loads.push(format!("{{ temperature-change = \"{change:+e} K\" }}"));
        }
        if random.chance(0.3) {
            let misfit = random.between(-1e-3, 1e-3);
            loads.push(format!("{{ misfit = \"{misfit:e} m\" }}"));
        }
        if carries.is_none() && random.chance(0.3) {
            let (a, b) = (random.between(-500.0, 500.0), random.between(-500.0, 500.0));
            let line = ["line", "line-down"][random.below(2)];
            loads.push(format!("{{ {line} = [\"{a:e} N/m\", \"{b:e} N/m\"] }}"));
        }
        Bar {
            carries,
            loads: loads.join(", "),
            weighs: self.hand.coordinates > 1 && self.random.chance(0.4),
            ..Bar::of(between, &segments)
        }
    }

    /// A tie, a strut, a bar with a joint in it, or a stop.
    fn one_way(&mut self) {
        let point = self.random.below(self.hand.points.len());
        let Some(between) = self.between(point, &[point]) else {
            return;
        };
        match self.random.below(4) {
            0 | 1 => {
                let way = [Carries::Tension, Carries::Compression][self.random.below(2)];
                let bar = self.bar(between, Some(way));
                self.hand.bars.push(bar);
            }
            2 => {
                let width = self.random.size(1e-5, 2e-3);
                let rest = self.length(between) - width;
                let area = self.random.size(1e-4, 3e-3);
                let segments = format!(
                    "{{ gap = \"{width:e} m\" }}, {{ length = \"{rest:e} m\", section = {{ area = \"{area:e} m2\" }}, material = \"m\" }}"
                );
                self.hand.bars.push(Bar::of(between, &segments));
            }
            _ => {
                let kind = HoldKind::Stop {
                    blocks: self.direction(),
                    clearance: from_si(self.random.size(1e-5, 2e-3)),
                    stiffness: self
                        .random
                        .chance(0.4)
                        .then(|| from_si(self.random.size(1e7, 1e9))),
                };
                self.hold(point, kind);
            }
        }
    }
}
