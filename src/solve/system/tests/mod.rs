//! The system against what proves an answer, against enumeration, and in its extremes.

mod by_hand;
mod certificate;
mod draw;
mod enumeration;
mod extremes;

use super::{Elastic, Loads, OneWay, Row, System};
use crate::quantity::from_si;
use crate::solve::threshold::Threshold;

/// Parts and loads put down side by side, in SI numbers.
#[derive(Debug, Clone, Default)]
struct Sketch {
    system: System,
    loads: Loads,
}

impl Sketch {
    fn of(unknowns: usize) -> Self {
        let mut sketch = Sketch::default();
        sketch.system.places = (0..unknowns).map(|u| [u as f64, 0.0, 0.0]).collect();
        sketch.system.shown = (0..unknowns).map(|u| vec![(u, 1.0)]).collect();
        sketch.loads.forces = vec![from_si(0.0); unknowns];
        sketch
    }

    fn force(mut self, unknown: usize, force: f64) -> Self {
        self.loads.forces[unknown].value += force;
        self
    }

    fn elastic(mut self, row: Row, stiffness: f64, rest: f64) -> Self {
        self.system.elastic.push(Elastic {
            row,
            stiffness: from_si(stiffness),
        });
        self.loads.elastic_rest.push(from_si(rest));
        self
    }

    fn rigid(mut self, row: Row, value: f64) -> Self {
        self.system.rigid.push(row);
        self.loads.rigid_value.push(from_si(value));
        self
    }

    fn one_way(mut self, row: Row, stiffness: Option<f64>, rest: f64) -> Self {
        self.system.one_way.push(OneWay {
            row,
            stiffness: stiffness.map(from_si),
        });
        self.loads.one_way_rest.push(from_si(rest));
        self
    }

    /// Zero is what rounding leaves of the sizes that come together.
    fn ready(mut self) -> Self {
        let loads = &mut self.loads;
        let forces: f64 = loads.forces.iter().map(|f| f.value.abs()).sum();
        let rests = loads.elastic_rest.iter().zip(&self.system.elastic);
        let fixed: f64 = rests
            .map(|(r, e)| (r.value * e.stiffness.value).abs())
            .sum();
        let one_way = loads.one_way_rest.iter().zip(&self.system.one_way);
        let slack: f64 = one_way
            .map(|(r, o)| (r.value * o.stiffness.map_or(1.0, |k| k.value)).abs())
            .sum();
        let values: f64 = loads.rigid_value.iter().map(|v| v.value.abs()).sum();
        let rests: f64 = loads
            .elastic_rest
            .iter()
            .chain(&loads.one_way_rest)
            .map(|r| r.value.abs())
            .sum();
        let softest = self
            .system
            .elastic
            .iter()
            .map(|e| e.stiffness.value)
            .chain(
                self.system
                    .one_way
                    .iter()
                    .filter_map(|o| o.stiffness.map(|k| k.value)),
            )
            .fold(f64::INFINITY, f64::min)
            .min(1e3);
        loads.zero = Threshold {
            force: from_si(1e-12 * (forces + fixed + slack + values)),
            length: from_si(1e-12 * (values + rests + forces / softest)),
        };
        self
    }
}
