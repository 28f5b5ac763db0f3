//! What one combination puts on one member: the factored actions of its cases, brought to the
//! stations, pieces and layers that they act on.

use crate::model::{Combination, Member, Model, SegmentKind};
use crate::quantity::{
    Area, Curve, Force, ForcePerLength, Length, MassPerLength, Ratio, STANDARD_GRAVITY, Stress,
    TemperatureInterval, from_si,
};
use std::ops::Range;
use std::rc::Rc;

/// All actions of a combination on one member, factored and added up.
pub(super) struct Loading {
    /// Force at each station, + toward the end.
    pub(super) forces: Vec<Force>,
    /// Line load along each piece, self-weight included, + toward the end.
    pub(super) lines: Vec<Curve<ForcePerLength>>,
    /// The layers of all pieces with their free strains.
    pub(super) layers: Layers,
    /// Movement of what each support is fixed to.
    pub(super) movements: Vec<Length>,
}

/// One layer along one piece.
#[derive(Clone, Copy)]
pub(super) struct LayerLoading {
    /// Modulus in this combination.
    pub(super) modulus: Stress,
    /// Area of all pieces side by side. A part known by its stiffness k counts as a bar of unit
    /// modulus whose area gives EA = k L.
    pub(super) area: Curve<Area>,
    /// Free strain from temperature.
    pub(super) thermal: Curve<Ratio>,
    /// Free strain from misfit and imposed strain.
    pub(super) imposed: Ratio,
}

/// The layers of all pieces, piece by piece; a part known by its stiffness has one, a gap none.
#[derive(Clone)]
pub(super) struct Layers {
    pub(super) all: Vec<LayerLoading>,
    of_piece: Rc<[Range<usize>]>,
}

impl Layers {
    /// The layers with their stiffness in this combination, nothing acting on them.
    pub(super) fn of(model: &Model, member: &Member, combination: &Combination) -> Self {
        let no_strain = Curve::constant(Ratio::default());
        let mut all = Vec::with_capacity(member.pieces.len());
        let mut of_piece = Vec::with_capacity(member.pieces.len());
        for piece in &member.pieces {
            let first = all.len();
            let segment = &member.segments[piece.segment];
            match &segment.kind {
                SegmentKind::Solid { layers, .. } => {
                    all.extend(layers.iter().map(|layer| LayerLoading {
                        modulus: model.materials[layer.material].modulus
                            * combination.modulus_factor(layer.material),
                        area: layer.area.part(piece.from, piece.to),
                        thermal: no_strain,
                        imposed: Ratio::default(),
                    }));
                }
                SegmentKind::Stiffness(part) => {
                    let unit: Stress = from_si(1.0);
                    all.push(LayerLoading {
                        modulus: unit,
                        area: Curve::constant(part.stiffness * segment.length / unit),
                        thermal: no_strain,
                        imposed: Ratio::default(),
                    });
                }
                SegmentKind::Gap(_) => {}
            }
            of_piece.push(first..all.len());
        }
        Layers {
            all,
            of_piece: of_piece.into(),
        }
    }

    /// The layers of a piece; none for a gap.
    pub(super) fn of_piece(&self, piece: usize) -> &[LayerLoading] {
        &self.all[self.of_piece[piece].clone()]
    }

    /// Mass per length (given, or density times area) of a layer along a piece, times an
    /// acceleration; `None` where it has no mass.
    pub(super) fn weight(
        &self,
        model: &Model,
        member: &Member,
        piece: usize,
        layer: usize,
        acceleration: f64,
    ) -> Option<Curve<ForcePerLength>> {
        let per_length =
            |mass: MassPerLength| -> ForcePerLength { from_si(mass.value * acceleration) };
        match &member.segments[member.pieces[piece].segment].kind {
            SegmentKind::Solid { layers, .. } => {
                let made = &layers[layer];
                match (made.mass, model.materials[made.material].density) {
                    (Some(mass), _) => Some(Curve::constant(per_length(mass))),
                    (None, Some(density)) => {
                        let area = &self.of_piece(piece)[layer].area;
                        Some(area.map(|area| per_length(density * area)))
                    }
                    (None, None) => None,
                }
            }
            SegmentKind::Stiffness(part) => Some(Curve::constant(per_length(part.mass?))),
            SegmentKind::Gap(_) => None,
        }
    }
}

impl LayerLoading {
    /// EA.
    pub(super) fn rigidity(&self) -> Curve<Force> {
        self.area.map(|area| self.modulus * area)
    }

    /// All of its free strain.
    pub(super) fn free_strain(&self) -> Curve<Ratio> {
        self.thermal + Curve::constant(self.imposed)
    }
}

impl Loading {
    /// Adds up what `combination` puts on `member`, whose unloaded layers are `made`.
    pub(super) fn of(
        model: &Model,
        member: &Member,
        combination: &Combination,
        made: &Layers,
    ) -> Self {
        let mut loading = Loading {
            forces: vec![Force::default(); member.stations.len()],
            lines: vec![Curve::constant(ForcePerLength::default()); member.pieces.len()],
            layers: made.clone(),
            movements: vec![Length::default(); member.supports.len()],
        };
        let factor = |case: usize| combination.factors[case];
        let actions = &member.actions;
        for action in &actions.forces {
            loading.forces[action.station] += action.force * factor(action.case);
        }
        for action in &actions.lines {
            let line = Curve::linear(action.start, action.end) * factor(action.case);
            loading.lines[action.piece] = loading.lines[action.piece] + line;
        }
        for action in &actions.weights {
            let times = action.number * factor(action.case);
            if times != 0.0 {
                loading.add_weight(model, member, action.segment, action.layer, times);
            }
        }
        for action in &actions.temperatures {
            let times = factor(action.case);
            if times != 0.0 {
                let change = Curve::linear(action.start, action.end) * times;
                loading.add_temperature(model, member, action.segment, action.layer, &change);
            }
        }
        for action in &actions.strains {
            let strain = action.strain * factor(action.case);
            for piece in pieces_of(member, action.segment) {
                let at = loading.layers.of_piece[piece].start + action.layer;
                loading.layers.all[at].imposed += strain;
            }
        }
        for action in &actions.movements {
            loading.movements[action.support] += action.movement * factor(action.case);
        }
        loading
    }

    fn add_weight(
        &mut self,
        model: &Model,
        member: &Member,
        segment: usize,
        layer: usize,
        times: f64,
    ) {
        // On a member that rises, weight acts toward the start.
        let along = -member.rise() * STANDARD_GRAVITY * times;
        for piece in pieces_of(member, segment) {
            if let Some(weight) = self.layers.weight(model, member, piece, layer, along) {
                self.lines[piece] = self.lines[piece] + weight;
            }
        }
    }

    fn add_temperature(
        &mut self,
        model: &Model,
        member: &Member,
        segment: usize,
        layer: usize,
        change: &Curve<TemperatureInterval>,
    ) {
        let expansion = match &member.segments[segment].kind {
            SegmentKind::Solid { layers, .. } => model.materials[layers[layer].material].expansion,
            SegmentKind::Stiffness(part) => part.expansion,
            SegmentKind::Gap(_) => None,
        };
        let Some(expansion) = expansion else { return };
        for piece in pieces_of(member, segment) {
            let at = self.layers.of_piece[piece].start + layer;
            let cut = &member.pieces[piece];
            let strain = change
                .part(cut.from, cut.to)
                .map(|change| expansion * change);
            self.layers.all[at].thermal = self.layers.all[at].thermal + strain;
        }
    }
}

/// The pieces that a segment is cut into.
pub(super) fn pieces_of(member: &Member, segment: usize) -> Range<usize> {
    let first = member
        .pieces
        .partition_point(|piece| piece.segment < segment);
    let last = member
        .pieces
        .partition_point(|piece| piece.segment <= segment);
    first..last
}
