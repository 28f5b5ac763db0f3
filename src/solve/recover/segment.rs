//! The results of one segment.

use super::Recovered;
use super::range::Range;
use super::stress::{LayerOfPiece, LayerRange};
use crate::model::{Layer, Segment, SegmentKind};
use crate::quantity::{Curve, Force, Length, Ratio, from_si};
use crate::result::{LayerResult, SegmentResult};
use crate::solve::SolveError;
use crate::solve::deformation::{Elongation, PieceDeformation};
use crate::solve::loading::pieces_of;
use crate::solve::quotient::{Extreme, Unbounded, extremes};

/// What is gathered of a segment while its pieces are gone through.
struct Gathered<'a> {
    force: Range<Force>,
    elongation: Elongation,
    /// Of a gap: whether it bears.
    bears: Option<bool>,
    layers: &'a mut [LayerRange],
}

impl Recovered<'_> {
    /// The results of the segment with this index. `layers` is memory that is used anew.
    pub(super) fn segment(
        &self,
        index: usize,
        layers: &mut Vec<LayerRange>,
    ) -> Result<SegmentResult, SolveError> {
        let segment = &self.member.segments[index];
        let pieces = pieces_of(self.member, index);
        let (first, last) = (pieces.start, pieces.end - 1);
        layers.clear();
        layers.resize(segment.layers().len(), LayerRange::nothing());
        let mut gathered = Gathered {
            force: Range::NOTHING,
            elongation: Elongation::default(),
            bears: None,
            layers,
        };
        for piece in pieces {
            self.gather(segment, piece, &mut gathered)
                .map_err(|Unbounded| SolveError::PointLoaded {
                    member: self.member.name.clone(),
                    segment: segment.name.clone(),
                })?;
        }
        if let SegmentKind::Solid { layered: true, .. } = segment.kind {
            // A layer's forces at the segment's ends are those of its first and its last piece.
            for (which, layer) in gathered.layers.iter_mut().enumerate() {
                layer.force_start = self
                    .layer(first, which)
                    .map_or(layer.force_start, |layer| layer.force_at(0.0));
                layer.force_end = self
                    .layer(last, which)
                    .map_or(layer.force_end, |layer| layer.force_at(1.0));
            }
        }
        Ok(self.segment_result(segment, (first, last), &gathered))
    }

    /// A layer of a piece under the piece's axial force; `None` for a gap.
    fn layer(&self, piece: usize, which: usize) -> Option<LayerOfPiece<'_>> {
        let deformation = self.prepared.pieces[piece].as_ref()?;
        let force = deformation.force(self.solved.after[piece], self.solved.before[piece + 1]);
        Some(LayerOfPiece {
            deformation,
            layers: self.loading.layers.of_piece(piece),
            which,
            force,
        })
    }

    fn gather(
        &self,
        segment: &Segment,
        index: usize,
        gathered: &mut Gathered,
    ) -> Result<(), Unbounded> {
        let piece = &self.member.pieces[index];
        let (from, length) = (self.member.stations[index].x, piece.length);
        let (start, end) = (self.solved.after[index], self.solved.before[index + 1]);
        let Some(deformation) = &self.prepared.pieces[index] else {
            let same = Extreme {
                value: start,
                at: 0.0,
            };
            gathered.force.take((same, same), from, length);
            let displacements = &self.solved.displacements;
            gathered.elongation.force += displacements[index + 1] - displacements[index];
            gathered.bears = Some(self.states.links[index]);
            return Ok(());
        };
        let force = deformation.force(start, end);
        let one: Curve<Ratio> = Curve::constant(from_si(1.0));
        gathered.force.take(extremes(&force, &one)?, from, length);
        gathered.elongation.force += deformation.stretch(&force)?;
        gathered.elongation.temperature += deformation.thermal;
        gathered.elongation.misfit += deformation.imposed;
        let layers = self.loading.layers.of_piece(index);
        for (which, layer) in segment.layers().iter().enumerate() {
            let stressed = LayerOfPiece {
                deformation,
                layers,
                which,
                force,
            };
            stressed.gather(
                layer,
                (piece.from, piece.to),
                (from, length),
                &mut gathered.layers[which],
            )?;
        }
        Ok(())
    }

    fn segment_result(
        &self,
        segment: &Segment,
        (first, last): (usize, usize),
        gathered: &Gathered,
    ) -> SegmentResult {
        let rigidity = |piece: usize, of: fn(&PieceDeformation) -> Force| {
            self.prepared.pieces[piece].as_ref().map(of)
        };
        let single = match &segment.kind {
            SegmentKind::Solid {
                layers,
                layered: false,
            } => layers.first(),
            _ => None,
        };
        let (mut net, mut gross) = (Range::NOTHING, Range::NOTHING);
        for layer in gathered.layers.iter() {
            net.widen(&layer.net);
            gross.widen(&layer.gross);
        }
        let [(force_max, force_max_at), (force_min, force_min_at)] = gathered.force.placed();
        let [(stress_max, stress_max_at), (stress_min, stress_min_at)] = net.placed();
        let [
            (gross_stress_max, gross_stress_max_at),
            (gross_stress_min, gross_stress_min_at),
        ] = gross.placed();
        let elongation = gathered.elongation;
        SegmentResult {
            name: segment.name.clone(),
            from: segment.from,
            to: segment.to,
            material: single.map(|layer| self.model.materials[layer.material].id.clone()),
            area_start: single.map(|layer| layer.strength_area().start()),
            area_end: single.map(|layer| layer.strength_area().end()),
            rigidity_start: rigidity(first, |piece| piece.rigidity.start()),
            rigidity_end: rigidity(last, |piece| piece.rigidity.end()),
            force_start: self.solved.after[first],
            force_end: self.solved.before[last + 1],
            force_max: force_max.unwrap_or_default(),
            force_max_at: force_max_at.unwrap_or(segment.from),
            force_min: force_min.unwrap_or_default(),
            force_min_at: force_min_at.unwrap_or(segment.from),
            elongation: elongation.total(),
            elongation_force: elongation.force,
            elongation_temperature: elongation.temperature,
            elongation_misfit: elongation.misfit,
            stress_max,
            stress_max_at,
            stress_min,
            stress_min_at,
            gap: gap_left(segment, elongation, gathered.bears),
            bears: gathered.bears,
            gross_stress_max,
            gross_stress_max_at,
            gross_stress_min,
            gross_stress_min_at,
            layers: self.layer_results(segment, gathered.layers),
        }
    }

    fn layer_results(&self, segment: &Segment, gathered: &[LayerRange]) -> Vec<LayerResult> {
        let SegmentKind::Solid {
            layers,
            layered: true,
        } = &segment.kind
        else {
            return Vec::new();
        };
        let result = |(layer, range): (&Layer, &LayerRange)| {
            let [(stress_max, stress_max_at), (stress_min, stress_min_at)] = range.net.placed();
            let [
                (gross_stress_max, gross_stress_max_at),
                (gross_stress_min, gross_stress_min_at),
            ] = range.gross.placed();
            LayerResult {
                name: layer.name.clone(),
                material: self.model.materials[layer.material].id.clone(),
                force_start: range.force_start,
                force_end: range.force_end,
                stress_max,
                stress_max_at,
                stress_min,
                stress_min_at,
                gross_stress_max,
                gross_stress_max_at,
                gross_stress_min,
                gross_stress_min_at,
            }
        };
        layers.iter().zip(gathered).map(result).collect()
    }
}

/// What remains open of a gap; 0 once it bears.
fn gap_left(segment: &Segment, elongation: Elongation, bears: Option<bool>) -> Option<Length> {
    match (&segment.kind, bears) {
        (SegmentKind::Gap(_), Some(true)) => Some(Length::default()),
        (SegmentKind::Gap(gap), _) => Some((gap.width + elongation.force).max(Length::default())),
        _ => None,
    }
}
