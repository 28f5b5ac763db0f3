//! The stress of one layer along one piece.

use super::range::Range;
use crate::model::Layer;
use crate::quantity::{Area, Curve, Force, Length, Ratio, Stress, from_si};
use crate::solve::deformation::{PieceDeformation, strain_times_rigidity};
use crate::solve::loading::LayerLoading;
use crate::solve::quotient::{Extremes, Unbounded, extremes};

/// What is gathered of a layer while the pieces of its segment are gone through.
#[derive(Clone, Copy)]
pub(super) struct LayerRange {
    /// Stress on the area that the checks use: net where there is one.
    pub(super) net: Range<Stress>,
    /// Stress on the gross area.
    pub(super) gross: Range<Stress>,
    pub(super) force_start: Force,
    pub(super) force_end: Force,
}

impl LayerRange {
    pub(super) fn nothing() -> Self {
        LayerRange {
            net: Range::NOTHING,
            gross: Range::NOTHING,
            force_start: Force::default(),
            force_end: Force::default(),
        }
    }
}

/// One layer of a piece under the piece's axial force.
pub(super) struct LayerOfPiece<'a> {
    pub(super) deformation: &'a PieceDeformation,
    pub(super) layers: &'a [LayerLoading],
    pub(super) which: usize,
    /// N along the piece, of all layers together.
    pub(super) force: Curve<Force>,
}

impl LayerOfPiece<'_> {
    /// The extremes of the layer's force over the area A′ that its stress stands on: N / A′ of a
    /// single layer, else E (ε − e0) A / A′.
    fn extremes_over(&self, area: &Curve<Area>) -> Result<Extremes<Stress>, Unbounded> {
        if self.layers.len() == 1 {
            return extremes(&self.force, area);
        }
        let own = &self.layers[self.which];
        let strain = strain_times_rigidity(self.layers, self.which, &self.force);
        let rigidity = &self.deformation.rigidity;
        let unit: Area = from_si(1.0);
        let stiffness: Curve<Ratio> = rigidity.map(|rigidity| rigidity / (own.modulus * unit));
        if *area == own.area {
            // The area cancels: stress is E times strain, also where the layer runs to a point.
            return extremes(&strain, &stiffness.map(|ratio| unit * ratio));
        }
        let share: Curve<Ratio> = own.area.map(|area| area / unit);
        extremes(&strain.times(&share), &area.times(&stiffness))
    }

    /// Takes the stresses into what is gathered of the layer. `cut` is the piece's part of the
    /// segment, `x` the distance of its start from the member's.
    pub(super) fn gather(
        &self,
        layer: &Layer,
        cut: (f64, f64),
        (x, length): (Length, Length),
        gathered: &mut LayerRange,
    ) -> Result<(), Unbounded> {
        let gross = self.extremes_over(&layer.gross.part(cut.0, cut.1))?;
        gathered.gross.take(gross, x, length);
        match &layer.net {
            Some(net) => {
                let net = self.extremes_over(&net.part(cut.0, cut.1))?;
                gathered.net.take(net, x, length);
            }
            None => gathered.net.take(gross, x, length),
        }
        Ok(())
    }

    /// The force in the layer at a fraction of the piece.
    pub(super) fn force_at(&self, s: f64) -> Force {
        if self.layers.len() == 1 {
            return self.force.at(s);
        }
        let strain = strain_times_rigidity(self.layers, self.which, &self.force);
        let rigidity = &self.deformation.rigidity;
        let own = self.layers[self.which].rigidity().at(s);
        if own == Force::default() {
            own
        } else {
            strain.at(s) * (own / rigidity.at(s)).value
        }
    }
}
