//! Random systems of small whole numbers, so that ties, touches, dependent rows and mechanisms are
//! common.

use super::Sketch;
use crate::solve::system::Row;

/// SplitMix64 (Steele, Lea, Flood, "Fast splittable pseudorandom number generators", 2014).
pub(super) struct Draw(pub(super) u64);

impl Draw {
    pub(super) fn next(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e37_79b9_7f4a_7c15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
        z ^ (z >> 31)
    }

    pub(super) fn below(&mut self, count: usize) -> usize {
        (self.next() % count as u64) as usize
    }

    pub(super) fn whole(&mut self, most: i32) -> f64 {
        f64::from(self.below(2 * most as usize + 1) as i32 - most)
    }

    /// Between 0 and 1.
    pub(super) fn share(&mut self) -> f64 {
        (self.next() >> 11) as f64 / (1u64 << 53) as f64
    }

    fn row(&mut self, unknowns: usize) -> Row {
        let mut row = Row::new();
        for unknown in 0..unknowns {
            if self.below(3) != 0 {
                let b = self.whole(2);
                if b != 0.0 {
                    row.push((unknown, b));
                }
            }
        }
        row
    }

    pub(super) fn sketch(&mut self) -> Sketch {
        let unknowns = 1 + self.below(5);
        let mut sketch = Sketch::of(unknowns);
        let stiffness = |draw: &mut Draw| [1.0, 2.0, 5.0, 1e3][draw.below(4)];
        for _ in 0..self.below(6) {
            let (row, k) = (self.row(unknowns), stiffness(self));
            let rest = if self.below(2) == 0 {
                0.0
            } else {
                self.whole(4) / 4.0
            };
            sketch = sketch.elastic(row, k, rest);
        }
        for _ in 0..self.below(3) {
            let row = self.row(unknowns);
            let value = if self.below(3) != 0 {
                0.0
            } else {
                self.whole(2) / 2.0
            };
            sketch = sketch.rigid(row.clone(), value);
            if self.below(4) == 0 {
                sketch = sketch.rigid(row, value);
            }
        }
        for _ in 0..self.below(6) {
            let row = self.row(unknowns);
            let k = if self.below(2) == 0 {
                None
            } else {
                Some(stiffness(self))
            };
            let rest = [0.0, 0.0, 0.25, 1.0, -0.25][self.below(5)];
            sketch = sketch.one_way(row.clone(), k, rest);
            if self.below(5) == 0 {
                let turned = row.into_iter().map(|(u, b)| (u, -b)).collect();
                sketch = sketch.one_way(turned, k, -rest);
            }
        }
        for unknown in 0..unknowns {
            if self.below(2) == 0 {
                let force = self.whole(3);
                sketch = sketch.force(unknown, force);
            }
        }
        sketch.ready()
    }
}
