//! A member as a row of elements between its stations, each integrated by Gauss's rule: what it
//! yields for the force at its start, and what it grows without that force.

use super::assembly::{
    Assembly, GRAVITY, Inner, Kind, Member, Segment, Vector, between, dot, minus, plus, scaled,
};
use crate::common::chain::At;
use std::sync::OnceLock;

/// What lies between two stations.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Element {
    pub(crate) segment: usize,
    /// Stretch for the force at its start.
    pub(crate) flexibility: f64,
    /// Stretch from the loads along it, N being 0 at its start.
    pub(crate) by_load: f64,
    /// Stretch from temperature and misfit.
    pub(crate) growth: f64,
    /// All that acts along it, toward the end.
    pub(crate) load: f64,
    /// The width of a gap; none for others.
    pub(crate) gap: Option<f64>,
}

/// A member with what acts on it.
#[derive(Debug, Clone)]
pub(crate) struct Bar {
    pub(crate) elements: Vec<Element>,
    /// The force at each station, toward the end.
    pub(crate) station_force: Vec<f64>,
    pub(crate) axis: Vector,
    /// What its loads across the axis put on its two points, and forces at its ends.
    pub(crate) on_ends: [Vector; 2],
    /// Its weight by the lever rule on its two points, as a whole.
    pub(crate) lumps: [Vector; 2],
    /// The sum of all that acts on it.
    pub(crate) applied: Vector,
}

impl Bar {
    pub(crate) fn of(assembly: &Assembly, member: &Member) -> Self {
        let (axis, length) = assembly.axis(member);
        let down = assembly.down();
        let mut joints = vec![0.0];
        for segment in &member.segments {
            joints.push(joints[joints.len() - 1] + segment.length);
        }
        let place = |inner: &Inner| match inner.at {
            At::Joint(joint) => joints[joint],
            At::Distance(x) => x,
        };
        let mut stations = joints.clone();
        stations.extend(member.forces.iter().map(place));
        stations.sort_by(f64::total_cmp);
        stations.dedup();

        let mut bar = Bar {
            elements: Vec::new(),
            station_force: vec![0.0; stations.len()],
            axis,
            on_ends: [[0.0; 3]; 2],
            lumps: [[0.0; 3]; 2],
            applied: [0.0; 3],
        };
        // Down in a coordinate system of one axis has no part across.
        let across = minus(down, scaled(axis, dot(down, axis)));
        let weight = assembly.weight;
        for ends in stations.windows(2) {
            let index = joints
                .iter()
                .rposition(|&x| x <= ends[0])
                .expect("a segment");
            let run = Run {
                segment: &member.segments[index],
                joint: joints[index],
                ends: [ends[0], ends[1]],
                weight,
                share: dot(down, axis),
            };
            bar.elements.push(run.element(index));
            let [(sum, first), (own, own_first)] = run.downward();
            let lever = |sum: f64, first: f64| [sum - first / length, first / length];
            for (end, part) in lever(sum, first).into_iter().enumerate() {
                bar.on_ends[end] = plus(bar.on_ends[end], scaled(across, part));
            }
            for (end, part) in lever(own, own_first).into_iter().enumerate() {
                bar.lumps[end] = plus(bar.lumps[end], scaled(down, part));
            }
            let along = bar.elements[bar.elements.len() - 1].load;
            let both = plus(scaled(axis, along), scaled(across, sum));
            bar.applied = plus(bar.applied, both);
        }
        for inner in &member.forces {
            let x = place(inner);
            let (along, cross) = match inner.down {
                true => (inner.force * dot(down, axis), scaled(across, inner.force)),
                false => (inner.force, [0.0; 3]),
            };
            let station = stations.iter().position(|&s| s == x).expect("a station");
            bar.station_force[station] += along;
            let share = x / length;
            bar.on_ends[0] = plus(bar.on_ends[0], scaled(cross, 1.0 - share));
            bar.on_ends[1] = plus(bar.on_ends[1], scaled(cross, share));
            bar.applied = plus(bar.applied, plus(scaled(axis, along), cross));
        }
        bar
    }

    /// N at the start less N of the weightless bar: the part of the weight along the axis that the
    /// lever rule puts on the start.
    pub(crate) fn lumped_at_start(&self) -> f64 {
        dot(self.lumps[0], self.axis)
    }

    /// The growth from temperature and misfit.
    pub(crate) fn growth(&self) -> f64 {
        self.elements.iter().map(|e| e.growth).sum()
    }

    /// The stretch for a force at the start.
    pub(crate) fn stretch(&self, mut force: f64) -> f64 {
        let mut stretch = 0.0;
        for (e, element) in self.elements.iter().enumerate() {
            stretch += element.flexibility * force + element.by_load + element.growth;
            force -= element.load + self.station_force[e + 1];
        }
        stretch
    }

    /// The stretch at which a one-way member carries nothing between its ends.
    pub(crate) fn rest(&self) -> f64 {
        self.stretch(self.lumped_at_start())
    }
}

/// A part of a segment, with what acts along it.
struct Run<'s> {
    segment: &'s Segment,
    /// Where the segment begins.
    joint: f64,
    ends: [f64; 2],
    weight: f64,
    /// The share of a downward load that acts toward the end.
    share: f64,
}

impl Run<'_> {
    fn fraction(&self, x: f64) -> f64 {
        (x - self.joint) / self.segment.length
    }

    fn rigidity(&self, x: f64) -> f64 {
        let s = self.fraction(x);
        match &self.segment.kind {
            Kind::Solid(layers) => layers.iter().map(|l| l.modulus * l.section.area(s)).sum(),
            Kind::Part(stiffness) => stiffness * self.segment.length,
            Kind::Gap(_) => f64::INFINITY,
        }
    }

    /// Free strain: of layers the mean by their stiffness.
    fn strain(&self, x: f64) -> f64 {
        let s = self.fraction(x);
        let fit = self.segment.misfit / self.segment.length;
        let Kind::Solid(layers) = &self.segment.kind else {
            return fit;
        };
        let warming = between(self.segment.warming, s);
        let held = |l: &super::assembly::Layer| {
            l.modulus * l.section.area(s) * (l.expansion * warming + fit)
        };
        layers.iter().map(held).sum::<f64>() / self.rigidity(x)
    }

    fn own_weight(&self, x: f64) -> f64 {
        let s = self.fraction(x);
        let Kind::Solid(layers) = &self.segment.kind else {
            return 0.0;
        };
        let mass = |l: &super::assembly::Layer| l.density * l.section.area(s);
        self.weight * GRAVITY * layers.iter().map(mass).sum::<f64>()
    }

    fn line_down(&self, x: f64) -> f64 {
        between(self.segment.line_down, self.fraction(x)) + self.own_weight(x)
    }

    fn line(&self, x: f64) -> f64 {
        between(self.segment.line, self.fraction(x)) + self.share * self.line_down(x)
    }

    fn element(&self, segment: usize) -> Element {
        if let Kind::Gap(stiffness) = self.segment.kind {
            return Element {
                segment,
                flexibility: stiffness.map_or(0.0, |k| 1.0 / k),
                by_load: 0.0,
                growth: 0.0,
                load: 0.0,
                gap: Some(self.segment.length),
            };
        }
        let [a, b] = self.ends;
        let run_off = |x: f64| integral(a, x, |y| self.line(y));
        Element {
            segment,
            flexibility: integral(a, b, |x| 1.0 / self.rigidity(x)),
            by_load: -integral(a, b, |x| run_off(x) / self.rigidity(x)),
            growth: integral(a, b, |x| self.strain(x)),
            load: run_off(b),
            gap: None,
        }
    }

    /// The sum and the first moment about the member's start of all downward loads, and of its own
    /// weight alone.
    fn downward(&self) -> [(f64, f64); 2] {
        let [a, b] = self.ends;
        if matches!(self.segment.kind, Kind::Gap(_)) {
            return [(0.0, 0.0); 2];
        }
        let moments = |f: &dyn Fn(f64) -> f64| (integral(a, b, f), integral(a, b, |x| x * f(x)));
        [
            moments(&|x| self.line_down(x)),
            moments(&|x| self.own_weight(x)),
        ]
    }
}

/// Gauss's rule with 16 nodes: for a quotient whose denominator changes by no more than 3 over the
/// interval its error is below rounding.
pub(crate) fn integral(a: f64, b: f64, f: impl Fn(f64) -> f64) -> f64 {
    let half = (b - a) / 2.0;
    let sum: f64 = nodes()
        .iter()
        .map(|&(x, w)| w * f(a + half * (1.0 + x)))
        .sum();
    half * sum
}

/// Roots of the Legendre polynomial of degree 16 by Newton's method, and their weights.
fn nodes() -> &'static [(f64, f64)] {
    const DEGREE: usize = 16;
    static NODES: OnceLock<Vec<(f64, f64)>> = OnceLock::new();
    NODES.get_or_init(|| {
        let node = |i: usize| {
            let mut x = (std::f64::consts::PI * (i as f64 + 0.75) / (DEGREE as f64 + 0.5)).cos();
            let mut slope = 1.0;
            for _ in 0..10 {
                let (mut last, mut value) = (1.0, x);
                for k in 2..=DEGREE {
                    let k = k as f64;
                    (last, value) = (value, ((2.0 * k - 1.0) * x * value - (k - 1.0) * last) / k);
                }
                slope = DEGREE as f64 * (x * value - last) / (x * x - 1.0);
                x -= value / slope;
            }
            (x, 2.0 / ((1.0 - x * x) * slope * slope))
        };
        (0..DEGREE).map(node).collect()
    })
}
