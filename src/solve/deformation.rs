//! How a piece deforms: PL/AE and αΔTL, with everything that may vary along it.

use super::loading::LayerLoading;
use super::quotient::{Quotient, Unbounded};
use crate::quantity::{Curve, Flexibility, Force, ForcePerLength, Length, Ratio};

/// A piece of a segment before anything acts on it.
#[derive(Clone, Copy)]
pub(super) struct PieceStiffness {
    length: Length,
    /// EA = Σ E A over the layers.
    rigidity: Curve<Force>,
    /// `∫ dx / EA`: L/AE, for any taper; 0 for a piece that runs to a point, which no force reaches.
    pub(super) flexibility: Flexibility,
}

impl PieceStiffness {
    pub(super) fn of(length: Length, layers: &[LayerLoading]) -> Self {
        let rigidity = layers[1..]
            .iter()
            .fold(layers[0].rigidity(), |sum, layer| sum + layer.rigidity());
        let one: Curve<Ratio> = Curve::constant(crate::quantity::from_si(1.0));
        let flexibility = Quotient::new(one, rigidity).map_or_else(
            |_| Flexibility::default(),
            |quotient| length * quotient.integral(),
        );
        PieceStiffness {
            length,
            rigidity,
            flexibility,
        }
    }
}

/// A piece of a segment in one combination, ready to be stretched.
pub(super) struct PieceDeformation {
    length: Length,
    /// EA = Σ E A over the layers.
    pub(super) rigidity: Curve<Force>,
    /// As in [`PieceStiffness`].
    pub(super) flexibility: Flexibility,
    /// Line load along it, + toward the end.
    line: Curve<ForcePerLength>,
    /// Whether N is carried from the end of the piece instead of its start: from where it is
    /// weaker, so that a tip's N is exactly the zero that it has to be.
    pub(super) from_end: bool,
    /// Free elongation from temperature.
    pub(super) thermal: Length,
    /// Free elongation from misfit and imposed strain.
    pub(super) imposed: Length,
}

/// The parts of a change of length.
#[derive(Debug, Clone, Copy, Default, PartialEq)]
pub(super) struct Elongation {
    pub(super) force: Length,
    pub(super) temperature: Length,
    pub(super) misfit: Length,
}

impl Elongation {
    pub(super) fn total(&self) -> Length {
        self.force + self.temperature + self.misfit
    }
}

impl PieceDeformation {
    /// Fails where the piece runs to a point whose free strain is not bounded there.
    pub(super) fn of(
        made: &PieceStiffness,
        layers: &[LayerLoading],
        line: Curve<ForcePerLength>,
    ) -> Result<Self, Unbounded> {
        let PieceStiffness {
            length,
            rigidity,
            flexibility,
        } = *made;
        let mean = |strain: &dyn Fn(&LayerLoading) -> Curve<Ratio>| -> Result<Ratio, Unbounded> {
            match layers {
                [only] => Ok(strain(only).mean()),
                _ => stiffness_weighted(layers, &rigidity, strain).map(|strain| strain.integral()),
            }
        };
        Ok(PieceDeformation {
            length,
            from_end: rigidity.end() < rigidity.start(),
            thermal: length * mean(&|layer| layer.thermal)?,
            imposed: length * mean(&|layer| Curve::constant(layer.imposed))?,
            rigidity,
            flexibility,
            line,
        })
    }

    /// Whether an end of the piece is a point, which neither stiffness nor force reaches.
    pub(super) fn runs_to_a_point(&self) -> bool {
        self.rigidity.start() == Force::default() || self.rigidity.end() == Force::default()
    }

    /// All of the line load.
    pub(super) fn load(&self) -> Force {
        self.line.mean() * self.length
    }

    /// N along the piece between the forces at its ends, which differ by its line load:
    /// dN/dx = −q. It is carried from the weaker end; the other end keeps its own value, so that no
    /// rounding of the sum shows there.
    pub(super) fn force(&self, start: Force, end: Force) -> Curve<Force> {
        let q = self.line.coefficients();
        if q.iter().all(|&q| q == ForcePerLength::default()) {
            return Curve::constant(if self.from_end { end } else { start });
        }
        let n = q.len();
        let step = self.length / n as f64;
        let mut values = [start; 9];
        values[n] = end;
        if self.from_end {
            for i in (1..n).rev() {
                values[i] = values[i + 1] + q[i] * step;
            }
        } else {
            for i in 0..n - 1 {
                values[i + 1] = values[i] - q[i] * step;
            }
        }
        Curve::from_coefficients(&values[..=n])
    }

    /// N along the piece while nothing pulls at the end that it is carried from.
    pub(super) fn force_of_line(&self) -> Curve<Force> {
        let load = self.load();
        if self.from_end {
            self.force(load, Force::default())
        } else {
            self.force(Force::default(), -load)
        }
    }

    /// `∫ N dx / EA`: PL/AE, for any taper and line load.
    pub(super) fn stretch(&self, force: &Curve<Force>) -> Result<Length, Unbounded> {
        Ok(self.length * Quotient::new(*force, self.rigidity)?.integral())
    }
}

/// Σ E A e / EA: the free strain of bonded layers.
fn stiffness_weighted(
    layers: &[LayerLoading],
    rigidity: &Curve<Force>,
    strain: &dyn Fn(&LayerLoading) -> Curve<Ratio>,
) -> Result<Quotient<Force, Force>, Unbounded> {
    let weighted = layers.iter().fold(
        Curve::constant(Force::default()),
        |sum: Curve<Force>, layer| sum + layer.rigidity().times(&strain(layer)),
    );
    Quotient::new(weighted, *rigidity)
}

/// The elastic strain of a layer times EA of all: ε − e_k = (N + Σ EA (e − e_k)) / EA. Written with
/// differences of free strains, so that layers that expand alike leave no rounding behind.
pub(super) fn strain_times_rigidity(
    layers: &[LayerLoading],
    which: usize,
    force: &Curve<Force>,
) -> Curve<Force> {
    let own = layers[which].free_strain();
    let others = layers
        .iter()
        .enumerate()
        .filter(|&(other, _)| other != which);
    others.fold(*force, |sum, (_, other)| {
        sum + other.rigidity().times(&(other.free_strain() - own))
    })
}
