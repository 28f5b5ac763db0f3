//! What a combination puts on a member, gathered anew from the model for the proof.

use crate::catalogue::Shape;
use crate::model::{Combination, Layer, Member, Model, Segment, SegmentKind};
use crate::quantity::{
    Area, Force, ForcePerLength, Length, Ratio, STANDARD_GRAVITY, Stress, TemperatureInterval,
    from_si,
};

/// The factored actions, by station, piece, layer and support.
pub(super) struct Acting<'m> {
    model: &'m Model,
    pub(super) member: &'m Member,
    pub(super) combination: &'m Combination,
    /// Force at each station, and the sum of the sizes that it is made of.
    pub(super) forces: Vec<(Force, Force)>,
    /// Line load at the two ends of each piece, self-weight left out.
    lines: Vec<(ForcePerLength, ForcePerLength)>,
    /// For every layer of every segment: times self-weight, change of temperature at the segment's
    /// ends, imposed strain.
    layers: Vec<OnLayer>,
    first_layer: Vec<usize>,
    pub(super) movements: Vec<Length>,
}

#[derive(Clone, Copy, Default)]
struct OnLayer {
    weight: f64,
    warm_start: TemperatureInterval,
    warm_end: TemperatureInterval,
    imposed: Ratio,
}

/// Everything of a piece at one place along it.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct Local {
    /// EA.
    pub(super) rigidity: Force,
    /// Free strain from temperature.
    pub(super) thermal: Ratio,
    /// Free strain from misfit and imposed strain.
    pub(super) imposed: Ratio,
    /// The sum of the sizes of the free strains before they are weighed against each other.
    pub(super) free_size: Ratio,
}

impl<'m> Acting<'m> {
    pub(super) fn on(model: &'m Model, member: &'m Member, combination: &'m Combination) -> Self {
        let mut first_layer = Vec::with_capacity(member.segments.len());
        let mut count = 0;
        for segment in &member.segments {
            first_layer.push(count);
            count += segment.layers().len().max(1);
        }
        let mut acting = Acting {
            model,
            member,
            combination,
            forces: vec![Default::default(); member.stations.len()],
            lines: vec![Default::default(); member.pieces.len()],
            layers: vec![OnLayer::default(); count],
            first_layer,
            movements: vec![Length::default(); member.supports.len()],
        };
        let factor = |case: usize| combination.factors[case];
        for force in &member.actions.forces {
            let factored = force.force * factor(force.case);
            acting.forces[force.station].0 += factored;
            acting.forces[force.station].1 += factored.abs();
        }
        for line in &member.actions.lines {
            acting.lines[line.piece].0 += line.start * factor(line.case);
            acting.lines[line.piece].1 += line.end * factor(line.case);
        }
        for weight in &member.actions.weights {
            acting.layer_mut(weight.segment, weight.layer).weight +=
                weight.number * factor(weight.case);
        }
        for change in &member.actions.temperatures {
            let on = acting.layer_mut(change.segment, change.layer);
            on.warm_start += change.start * factor(change.case);
            on.warm_end += change.end * factor(change.case);
        }
        for strain in &member.actions.strains {
            acting.layer_mut(strain.segment, strain.layer).imposed +=
                strain.strain * factor(strain.case);
        }
        for movement in &member.actions.movements {
            acting.movements[movement.support] += movement.movement * factor(movement.case);
        }
        acting
    }

    fn layer_mut(&mut self, segment: usize, layer: usize) -> &mut OnLayer {
        &mut self.layers[self.first_layer[segment] + layer]
    }

    fn layer(&self, segment: usize, layer: usize) -> &OnLayer {
        &self.layers[self.first_layer[segment] + layer]
    }

    /// E of a layer in this combination.
    fn modulus(&self, layer: &Layer) -> Stress {
        self.model.materials[layer.material].modulus
            * self.combination.modulus_factor(layer.material)
    }

    /// The line load at a fraction of a piece, self-weight included, + toward the end.
    pub(super) fn line(&self, piece: usize, s: f64) -> ForcePerLength {
        let (start, end) = self.lines[piece];
        start * (1.0 - s) + end * s - self.weight(piece, s) * self.member.rise()
    }

    /// The self-weight per length at a fraction of a piece, whichever way the member runs.
    pub(super) fn weight(&self, piece: usize, s: f64) -> ForcePerLength {
        let index = self.member.pieces[piece].segment;
        let segment = &self.member.segments[index];
        let mut weight = ForcePerLength::default();
        let mut add = |per_length: f64, times: f64| {
            weight += from_si::<_, _>(per_length * STANDARD_GRAVITY * times);
        };
        match &segment.kind {
            SegmentKind::Solid { layers, .. } => {
                for (which, layer) in layers.iter().enumerate() {
                    let times = self.layer(index, which).weight;
                    let density = self.model.materials[layer.material].density;
                    match (layer.mass, density) {
                        _ if times == 0.0 => {}
                        (Some(mass), _) => add(mass.value, times),
                        (None, Some(density)) => {
                            let area = area_at(layer, self.fraction(piece, s));
                            add((density * area).value, times);
                        }
                        (None, None) => {}
                    }
                }
            }
            SegmentKind::Stiffness(part) => {
                if let Some(mass) = part.mass {
                    add(mass.value, self.layer(index, 0).weight);
                }
            }
            SegmentKind::Gap(_) => {}
        }
        weight
    }

    /// Whether the self-weight of a piece acts.
    pub(super) fn has_weight(&self, piece: usize) -> bool {
        let index = self.member.pieces[piece].segment;
        let count = self.member.segments[index].layers().len().max(1);
        (0..count).any(|layer| self.layer(index, layer).weight != 0.0)
    }

    /// Takes off everything that N would come from; free strains stay.
    pub(super) fn unload(&mut self) {
        self.forces.fill(Default::default());
        self.lines.fill(Default::default());
        for layer in &mut self.layers {
            layer.weight = 0.0;
        }
    }

    /// Whether any line load acts on a piece.
    pub(super) fn has_line(&self, piece: usize) -> bool {
        let none = ForcePerLength::default();
        self.lines[piece] != (none, none) || self.has_weight(piece)
    }

    /// The fraction of the segment's length at a fraction of the piece.
    fn fraction(&self, piece: usize, s: f64) -> f64 {
        let piece = &self.member.pieces[piece];
        piece.from + (piece.to - piece.from) * s
    }

    /// Stiffness and free strains at a fraction of a piece.
    pub(super) fn local(&self, piece: usize, s: f64) -> Local {
        let index = self.member.pieces[piece].segment;
        let segment = &self.member.segments[index];
        let t = self.fraction(piece, s);
        let warm = |layer: usize| {
            let on = self.layer(index, layer);
            on.warm_start * (1.0 - t) + on.warm_end * t
        };
        match &segment.kind {
            SegmentKind::Solid { layers, .. } => {
                let mut local = Local::default();
                let (mut thermal, mut imposed) = (Force::default(), Force::default());
                for (which, layer) in layers.iter().enumerate() {
                    let share = self.modulus(layer) * area_at(layer, t);
                    let expansion = self.model.materials[layer.material]
                        .expansion
                        .unwrap_or_default();
                    let (hot, cut) = (expansion * warm(which), self.layer(index, which).imposed);
                    local.rigidity += share;
                    thermal += share * hot;
                    imposed += share * cut;
                    local.free_size += hot.abs() + cut.abs();
                }
                local.thermal = thermal / local.rigidity;
                local.imposed = imposed / local.rigidity;
                local
            }
            SegmentKind::Stiffness(part) => {
                let (hot, cut) = (
                    part.expansion.unwrap_or_default() * warm(0),
                    self.layer(index, 0).imposed,
                );
                Local {
                    rigidity: part.stiffness * segment.length,
                    thermal: hot,
                    imposed: cut,
                    free_size: hot.abs() + cut.abs(),
                }
            }
            SegmentKind::Gap(_) => Local::default(),
        }
    }

    /// Whether stiffness is the same all along a piece.
    pub(super) fn is_uniform(&self, piece: usize) -> bool {
        let segment: &Segment = &self.member.segments[self.member.pieces[piece].segment];
        segment.layers().iter().all(|layer| {
            layer.area.degree() == 0 || {
                let first = layer.area.start();
                layer.area.coefficients().iter().all(|&area| area == first)
            }
        })
    }
}

/// The area of all pieces of a layer at a fraction of its segment: of a taper from its dimensions
/// there, and not from the curve that the solver integrates.
fn area_at(layer: &Layer, fraction: f64) -> Area {
    if layer.area.degree() == 0 {
        layer.area.start()
    } else {
        layer.section.area_at(fraction) * layer.count
    }
}
