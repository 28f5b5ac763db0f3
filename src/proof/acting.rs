//! What a combination puts on a member, gathered anew from the model for the proof.

use crate::catalogue::Shape;
use crate::model::{Combination, Layer, Member, Model, Segment, SegmentKind};
use crate::quantity::{
    Area, Force, ForcePerLength, Length, Ratio, STANDARD_GRAVITY, Stress, TemperatureInterval,
    from_si,
};
use crate::result::MemberResult;

/// The factored actions, by station, piece, layer and support.
pub(super) struct Acting<'m> {
    model: &'m Model,
    pub(super) member: &'m Member,
    combination: &'m Combination,
    pub(super) stations: Vec<AtStation>,
    /// Line load at the two ends of each piece, self-weight left out; empty where there is none.
    lines: Vec<(ForcePerLength, ForcePerLength)>,
    /// For every layer of every segment: times self-weight, change of temperature at the segment's
    /// ends, imposed strain.
    layers: Vec<OnLayer>,
    first_layer: Vec<usize>,
    /// Of what each support is fixed to; empty where none moves.
    movements: Vec<Length>,
    /// Standard gravity along the axis, + toward the end.
    gravity: f64,
}

/// The forces that come together at a station, + toward the end, each with the sum of the sizes
/// that it is made of.
#[derive(Clone, Copy, Default)]
pub(super) struct AtStation {
    pub(super) load: Force,
    pub(super) load_size: Force,
    pub(super) reaction: Force,
    pub(super) reaction_size: Force,
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
    /// Gathers what the combination puts on the member, and the reactions that the result names.
    pub(super) fn on(
        model: &'m Model,
        member: &'m Member,
        combination: &'m Combination,
        result: &MemberResult,
    ) -> Self {
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
            stations: vec![AtStation::default(); member.stations.len()],
            lines: Vec::new(),
            layers: vec![OnLayer::default(); count],
            first_layer,
            movements: Vec::new(),
            gravity: -member.rise() * STANDARD_GRAVITY,
        };
        let factor = |case: usize| combination.factors[case];
        for force in &member.actions.forces {
            let factored = force.force * factor(force.case);
            let station = &mut acting.stations[force.station];
            station.load += factored;
            station.load_size += factored.abs();
        }
        if !member.actions.lines.is_empty() {
            acting.lines = vec![Default::default(); member.pieces.len()];
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
        for (support, result) in member.supports.iter().zip(&result.supports) {
            let reaction = result.reaction.unwrap_or_default();
            let station = &mut acting.stations[support.station];
            station.reaction += reaction;
            station.reaction_size += reaction.abs();
        }
        if !member.actions.movements.is_empty() {
            acting.movements = vec![Length::default(); member.supports.len()];
        }
        for movement in &member.actions.movements {
            acting.movements[movement.support] += movement.movement * factor(movement.case);
        }
        acting
    }

    /// How far what a support is fixed to has moved.
    pub(super) fn movement(&self, support: usize) -> Length {
        self.movements.get(support).copied().unwrap_or_default()
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

    /// The line load at the two ends of a piece, self-weight left out.
    fn written_line(&self, piece: usize) -> (ForcePerLength, ForcePerLength) {
        self.lines.get(piece).copied().unwrap_or_default()
    }

    /// The line load at a fraction of a piece, self-weight included, + toward the end.
    pub(super) fn line(&self, piece: usize, s: f64) -> ForcePerLength {
        let (start, end) = self.written_line(piece);
        let mut line = start * (1.0 - s) + end * s;
        let index = self.member.pieces[piece].segment;
        let segment = &self.member.segments[index];
        let along = self.gravity;
        let mut add =
            |per_length: f64, times: f64| line += from_si::<_, _>(per_length * along * times);
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
        line
    }

    /// Whether any line load acts on a piece.
    pub(super) fn has_line(&self, piece: usize) -> bool {
        let none = ForcePerLength::default();
        let index = self.member.pieces[piece].segment;
        let count = self.member.segments[index].layers().len().max(1);
        self.written_line(piece) != (none, none)
            || (0..count).any(|layer| self.layer(index, layer).weight != 0.0)
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
