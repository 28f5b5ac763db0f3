//! Every state of the stops and gap segments of a member, tried one after another.
//!
//! For each state one linear system stands for the whole member: balance at every station,
//! stretch of every element, answer of every support, with displacements, axial forces and
//! reactions as unknowns. It is solved by LU factors and refined with residuals in doubled precision.

use crate::common::chain::{Chain, Hold, Kind};
use nalgebra::{DMatrix, DVector};

/// A member in one state.
pub(crate) struct State {
    /// Of stations, in order.
    pub(crate) displacement: Vec<f64>,
    /// Axial force before and after each station, 0 outside the member.
    pub(crate) force_before: Vec<f64>,
    pub(crate) force_after: Vec<f64>,
    /// Of supports, in order.
    pub(crate) reaction: Vec<f64>,
    /// What remains open of a support that is a stop, and of a segment that is a gap; else 0.
    pub(crate) support_gap: Vec<f64>,
    pub(crate) joint_gap: Vec<f64>,
    /// Which bear: the supports, then the segments.
    pub(crate) bears: Vec<bool>,
    /// What adds up to the stretch of the solid elements: their parts from force, load and growth.
    pub(crate) stretch_parts: Vec<f64>,
}

/// What the enumeration finds.
pub(crate) enum Found {
    One(Box<State>),
    /// No state is in balance without a pull or an overlap.
    None,
    /// A stop touches so nearly that rounding decides.
    Touching,
}

/// Below this share of the largest force or displacement a contact touches.
const TOUCH: f64 = 1e-9;

pub(crate) fn enumerate(chain: &Chain) -> Found {
    let system = System::of(chain);
    let stop = |i: &usize| matches!(chain.supports[*i].kind, Hold::Stop { .. });
    let gap = |i: &usize| matches!(chain.segments[*i].kind, Kind::Gap { .. });
    let supports = chain.supports.len();
    let contacts: Vec<usize> = (0..supports)
        .filter(stop)
        .chain((0..chain.segments.len()).filter(gap).map(|i| supports + i))
        .collect();
    let mut found = None;
    for mask in 0..1u32 << contacts.len() {
        let mut bears = vec![false; supports + chain.segments.len()];
        for (bit, &contact) in contacts.iter().enumerate() {
            bears[contact] = mask >> bit & 1 == 1;
        }
        if system.is_loose_or_overdetermined(&bears) {
            continue;
        }
        let (state, slack) = system.solve(bears, &contacts);
        if slack.abs() < TOUCH {
            return Found::Touching;
        }
        if slack > 0.0 {
            assert!(found.is_none(), "two states in balance\n{}", chain.job());
            found = Some(state);
        }
    }
    found.map_or(Found::None, |state| Found::One(Box::new(state)))
}

/// A part of a segment between two stations.
struct Element {
    segment: usize,
    length: f64,
    /// Line load at its ends.
    line: [f64; 2],
    /// Free growth from temperature and misfit.
    growth: f64,
}

struct System<'c> {
    chain: &'c Chain,
    elements: Vec<Element>,
    /// Station of each support, force at each station.
    support_station: Vec<usize>,
    force: Vec<f64>,
}

impl<'c> System<'c> {
    fn of(chain: &'c Chain) -> Self {
        let joints = chain.joints();
        let mut stations = joints.clone();
        stations.extend(chain.forces.iter().map(|&(at, _)| chain.x(at)));
        stations.extend(chain.supports.iter().map(|s| chain.x(s.at)));
        stations.sort_by(f64::total_cmp);
        stations.dedup();
        let station = |x: f64| stations.iter().position(|&s| s == x).expect("a station");
        let mut force = vec![0.0; stations.len()];
        for &(at, value) in &chain.forces {
            force[station(chain.x(at))] += value;
        }
        let elements = stations.windows(2).map(|ends| {
            let segment = joints
                .iter()
                .rposition(|&x| x <= ends[0])
                .expect("a segment");
            element(chain, segment, ends[0] - joints[segment], ends[1] - ends[0])
        });
        System {
            chain,
            elements: elements.collect(),
            support_station: chain
                .supports
                .iter()
                .map(|s| station(chain.x(s.at)))
                .collect(),
            force,
        }
    }

    fn joint_bears(&self, bears: &[bool], segment: usize) -> bool {
        bears[self.chain.supports.len() + segment]
    }

    /// Whether a part of the member is held by nothing (a force stands at every station, so it
    /// cannot be in balance), or rigid supports and closed rigid joints leave nothing to give.
    fn is_loose_or_overdetermined(&self, bears: &[bool]) -> bool {
        let (mut held, mut rigid) = (0, 0);
        for station in 0..self.force.len() {
            for (i, support) in self.chain.supports.iter().enumerate() {
                if self.support_station[i] == station {
                    let (acts, is_rigid) = match support.kind {
                        Hold::Fixed => (true, true),
                        Hold::Spring(_) => (true, false),
                        Hold::Stop { stiffness, .. } => (bears[i], stiffness.is_none()),
                    };
                    held += usize::from(acts);
                    rigid += usize::from(acts && is_rigid);
                }
            }
            if rigid > 1 {
                return true;
            }
            let next = self.elements.get(station);
            let (joined, stiff) =
                match next.map(|e| (e.segment, self.chain.segments[e.segment].kind)) {
                    Some((segment, Kind::Gap { stiffness })) => {
                        let closed = self.joint_bears(bears, segment);
                        (closed, closed && stiffness.is_none())
                    }
                    Some(_) => (true, false),
                    None => (false, false),
                };
            if !joined && held == 0 {
                return true;
            }
            held = if joined { held } else { 0 };
            rigid = if stiff { rigid } else { 0 };
        }
        false
    }

    /// The state with these contacts bearing, and how clearly it holds: the least of all pushes and
    /// openings as shares of the largest force and displacement, negative where one pulls or overlaps.
    fn solve(&self, bears: Vec<bool>, contacts: &[usize]) -> (State, f64) {
        let (stations, elements) = (self.force.len(), self.elements.len());
        let supports = self.chain.supports.len();
        let size = stations + elements + supports;
        let unit = self.force_unit();
        let mut a = DMatrix::zeros(size, size);
        let mut b = DVector::zeros(size);

        // Balance at each station: N after − N before + reactions + force = 0.
        for station in 0..stations {
            b[station] = -self.force[station] / unit;
        }
        for (e, element) in self.elements.iter().enumerate() {
            let run_off = element.length * (element.line[0] + element.line[1]) / 2.0;
            a[(e, stations + e)] = 1.0;
            a[(e + 1, stations + e)] = -1.0;
            b[e + 1] -= run_off / unit;
            // Stretch: flexibility · N at its start + free part = difference of displacements.
            let row = stations + e;
            let (flexibility, free) = self.stretch(element);
            match self.chain.segments[element.segment].kind {
                Kind::Gap { .. } if !self.joint_bears(&bears, element.segment) => {
                    a[(row, row)] = 1.0
                }
                _ => {
                    a[(row, row)] = flexibility * unit;
                    a[(row, e)] = 1.0;
                    a[(row, e + 1)] = -1.0;
                    b[row] = -free;
                }
            }
        }
        for (i, support) in self.chain.supports.iter().enumerate() {
            let (row, station) = (stations + elements + i, self.support_station[i]);
            a[(station, row)] = 1.0;
            // Answer: flexibility · reaction + displacement = where it stands.
            let (acts, flexibility, stands) = match support.kind {
                Hold::Fixed => (true, 0.0, 0.0),
                Hold::Spring(stiffness) => (true, 1.0 / stiffness, 0.0),
                Hold::Stop {
                    clearance,
                    toward_end,
                    stiffness,
                } => {
                    let stands = if toward_end { clearance } else { -clearance };
                    (bears[i], stiffness.map_or(0.0, |k| 1.0 / k), stands)
                }
            };
            if acts {
                a[(row, row)] = flexibility * unit;
                a[(row, station)] = 1.0;
                b[row] = stands + support.movement;
            } else {
                a[(row, row)] = 1.0;
            }
        }
        let x = refined(&a, &b);
        let state = self.state(bears, &x, unit);
        let slack = self.slack(&state, contacts);
        (state, slack)
    }

    /// Flexibility of an element for the force at its start, and its growth without that force.
    fn stretch(&self, element: &Element) -> (f64, f64) {
        let [q0, q1] = element.line;
        let length = element.length;
        match self.chain.segments[element.segment].kind {
            Kind::Solid { area, modulus, .. } => {
                let rigidity = modulus * area[0];
                let by_line = -length * length * (q0 / 3.0 + q1 / 6.0) / rigidity;
                (length / rigidity, by_line + element.growth)
            }
            Kind::Part { stiffness } => (1.0 / stiffness, 0.0),
            Kind::Gap { stiffness } => (stiffness.map_or(0.0, |k| 1.0 / k), -length),
        }
    }

    /// A force that stretches the softest part by 1 m: it brings all equations to one size.
    fn force_unit(&self) -> f64 {
        let softest = self
            .elements
            .iter()
            .map(|e| self.stretch(e).0)
            .fold(1e-12, f64::max);
        1.0 / softest
    }

    fn state(&self, bears: Vec<bool>, x: &DVector<f64>, unit: f64) -> State {
        let (stations, elements) = (self.force.len(), self.elements.len());
        let displacement: Vec<f64> = x.rows(0, stations).iter().copied().collect();
        let mut force_before = vec![0.0; stations];
        let mut force_after = vec![0.0; stations];
        for (e, element) in self.elements.iter().enumerate() {
            force_after[e] = x[stations + e] * unit;
            let run_off = element.length * (element.line[0] + element.line[1]) / 2.0;
            force_before[e + 1] = force_after[e] - run_off;
        }
        let reactions = x.rows(stations + elements, self.chain.supports.len());
        let support_gap = self.chain.supports.iter().enumerate().map(|(i, support)| {
            let moved = displacement[self.support_station[i]] - support.movement;
            match support.kind {
                Hold::Stop { .. } if bears[i] => 0.0,
                Hold::Stop {
                    clearance,
                    toward_end: true,
                    ..
                } => clearance - moved,
                Hold::Stop { clearance, .. } => clearance + moved,
                _ => 0.0,
            }
        });
        let mut joint_gap = vec![0.0; self.chain.segments.len()];
        for (e, element) in self.elements.iter().enumerate() {
            let is_gap = matches!(self.chain.segments[element.segment].kind, Kind::Gap { .. });
            if is_gap && !self.joint_bears(&bears, element.segment) {
                joint_gap[element.segment] = element.length + displacement[e + 1] - displacement[e];
            }
        }
        State {
            support_gap: support_gap.collect(),
            joint_gap,
            reaction: reactions.iter().map(|r| r * unit).collect(),
            stretch_parts: self.stretch_parts(&force_after),
            displacement,
            force_before,
            force_after,
            bears,
        }
    }

    fn stretch_parts(&self, force_after: &[f64]) -> Vec<f64> {
        let parts = |(element, force): (&Element, &f64)| {
            let (flexibility, free) = self.stretch(element);
            match self.chain.segments[element.segment].kind {
                Kind::Gap { .. } => [0.0; 3],
                _ => [flexibility * force, free - element.growth, element.growth],
            }
        };
        self.elements
            .iter()
            .zip(force_after)
            .flat_map(parts)
            .collect()
    }

    fn slack(&self, state: &State, contacts: &[usize]) -> f64 {
        let largest = |values: &[f64]| values.iter().fold(1e-30f64, |m, v| m.max(v.abs()));
        let force = largest(&state.force_before).max(largest(&state.reaction));
        let length = largest(&state.displacement).max(largest(&state.stretch_parts));
        let supports = self.chain.supports.len();
        let one = |&contact: &usize| match contact.checked_sub(supports) {
            None if !state.bears[contact] => state.support_gap[contact] / length,
            None => match self.chain.supports[contact].kind {
                Hold::Stop {
                    toward_end: true, ..
                } => -state.reaction[contact] / force,
                _ => state.reaction[contact] / force,
            },
            Some(segment) if !state.bears[contact] => state.joint_gap[segment] / length,
            Some(segment) => {
                let e = self.elements.iter().position(|e| e.segment == segment);
                -state.force_after[e.expect("a gap is one element")] / force
            }
        };
        contacts.iter().map(one).fold(1.0, f64::min)
    }
}

/// A part of a segment: `from` its start on, over a length.
fn element(chain: &Chain, index: usize, from: f64, length: f64) -> Element {
    let segment = &chain.segments[index];
    let at = |pair: [f64; 2], x: f64| pair[0] + (pair[1] - pair[0]) * (x / segment.length);
    let warming = at(segment.warming, from + length / 2.0);
    let growth = match segment.kind {
        Kind::Solid { expansion, .. } => {
            expansion * warming * length + segment.misfit * (length / segment.length)
        }
        _ => 0.0,
    };
    Element {
        segment: index,
        length,
        line: [at(segment.line, from), at(segment.line, from + length)],
        growth,
    }
}

/// LU solution, refined until the residual, formed in doubled precision, is at rounding.
fn refined(a: &DMatrix<f64>, b: &DVector<f64>) -> DVector<f64> {
    let factors = a.clone().lu();
    let mut x = factors
        .solve(b)
        .expect("loose and overdetermined states are left out");
    for _ in 0..3 {
        let residual = DVector::from_fn(b.len(), |row, _| {
            let products = (0..b.len()).map(|column| (-a[(row, column)], x[column]));
            doubled_sum(b[row], products)
        });
        x += factors.solve(&residual).expect("the same factors");
    }
    x
}

/// `first + Σ a·b` with the rounding of every step kept (Dekker's and Knuth's error-free forms).
fn doubled_sum(first: f64, products: impl Iterator<Item = (f64, f64)>) -> f64 {
    let (mut sum, mut rest) = (first, 0.0);
    for (a, b) in products {
        let product = a * b;
        rest += a.mul_add(b, -product);
        let next = sum + product;
        let back = next - sum;
        rest += (sum - (next - back)) + (product - back);
        sum = next;
    }
    sum + rest
}
