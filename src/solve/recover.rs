//! From a solved chain back to the job's own segments: N, stress and elongation along each.

use super::chain::{Solved, States};
use super::deformation::{Elongation, PieceDeformation, layer_strain};
use super::loading::{LayerLoading, Loading, pieces_of};
use super::quotient::{Extreme, Quotient};
use super::{Prepared, SolveError};
use crate::model::{Layer, Member, Model, Segment, SegmentKind, SupportKind};
use crate::quantity::{Area, Curve, Force, Length, Ratio, Stress, from_si};
use crate::result::{
    LayerResult, MemberResult, MemberState, MemberTotals, SegmentResult, StationResult,
    SupportResult, SupportWord,
};

/// The finished results of a member.
pub(super) fn member(
    model: &Model,
    member: &Member,
    loading: &Loading,
    prepared: &Prepared,
    solved: &Solved,
    states: &States,
) -> Result<MemberResult, SolveError> {
    let mut segments = Vec::with_capacity(member.segments.len());
    for index in 0..member.segments.len() {
        segments.push(segment(
            model, member, index, loading, prepared, solved, states,
        )?);
    }
    let reactions = solved
        .reactions
        .iter()
        .fold(Force::default(), |sum, &reaction| sum + reaction);
    let loads = loading
        .forces
        .iter()
        .fold(Force::default(), |sum, &force| sum + force);
    let lines = prepared
        .chain
        .links
        .iter()
        .fold(Force::default(), |sum, link| sum + link.load);
    let sum = |part: fn(&SegmentResult) -> Length| {
        segments
            .iter()
            .fold(Length::default(), |sum, s| sum + part(s))
    };
    let most = strictly(&segments, |a, b| a.force_max > b.force_max);
    let least = strictly(&segments, |a, b| a.force_min < b.force_min);
    let result = MemberResult {
        name: member.name.clone(),
        state: MemberState::Taut,
        slack_by: None,
        restraint: None,
        misfit_found: None,
        totals: MemberTotals {
            applied: loads + lines,
            reactions,
        },
        elongation: sum(|s| s.elongation),
        elongation_force: sum(|s| s.elongation_force),
        elongation_temperature: sum(|s| s.elongation_temperature),
        elongation_misfit: sum(|s| s.elongation_misfit),
        force_max: most.force_max,
        force_max_at: most.force_max_at,
        force_min: least.force_min,
        force_min_at: least.force_min_at,
        stations: stations(member, solved),
        supports: supports(member, prepared, solved, states),
        segments,
    };
    if finite(&result) {
        Ok(result)
    } else {
        Err(SolveError::OutOfRange {
            member: member.name.clone(),
        })
    }
}

/// The first segment that no other beats. A member has at least one.
fn strictly(
    segments: &[SegmentResult],
    beats: impl Fn(&SegmentResult, &SegmentResult) -> bool,
) -> &SegmentResult {
    segments[1..].iter().fold(
        &segments[0],
        |best, s| if beats(s, best) { s } else { best },
    )
}

/// Whether every sum is a number: what feeds them is then as well.
fn finite(result: &MemberResult) -> bool {
    let stresses = result
        .segments
        .iter()
        .flat_map(|s| [s.stress_max, s.stress_min])
        .flatten();
    let displacements = result.stations.iter().map(|s| s.displacement.value);
    [
        result.elongation.value,
        result.force_max.value,
        result.force_min.value,
        result.totals.reactions.value,
    ]
    .into_iter()
    .chain(stresses.map(|stress| stress.value))
    .chain(displacements)
    .all(f64::is_finite)
}

/// An extreme and its distance from the member's start.
#[derive(Clone, Copy)]
struct Located<T> {
    value: T,
    x: Length,
}

/// The larger and the smaller of what has been seen; of equal ones the first.
#[derive(Clone, Copy)]
struct Range<T> {
    most: Option<Located<T>>,
    least: Option<Located<T>>,
}

impl<T: PartialOrd + Copy> Range<T> {
    const NOTHING: Self = Range {
        most: None,
        least: None,
    };

    fn take(&mut self, (most, least): (Extreme<T>, Extreme<T>), from: Length, length: Length) {
        let located = |extreme: Extreme<T>| Located {
            value: extreme.value,
            x: from + length * extreme.at,
        };
        if self.most.is_none_or(|known| most.value > known.value) {
            self.most = Some(located(most));
        }
        if self.least.is_none_or(|known| least.value < known.value) {
            self.least = Some(located(least));
        }
    }

    fn values(&self) -> [Option<T>; 2] {
        [self.most.map(|m| m.value), self.least.map(|m| m.value)]
    }

    fn places(&self) -> [Option<Length>; 2] {
        [self.most.map(|m| m.x), self.least.map(|m| m.x)]
    }
}

/// What is gathered of a layer while its pieces are gone through.
#[derive(Clone, Copy)]
struct LayerRange {
    net: Range<Stress>,
    gross: Range<Stress>,
    force_start: Force,
    force_end: Force,
}

fn segment(
    model: &Model,
    member: &Member,
    index: usize,
    loading: &Loading,
    prepared: &Prepared,
    solved: &Solved,
    states: &States,
) -> Result<SegmentResult, SolveError> {
    let segment = &member.segments[index];
    let pieces = pieces_of(member, index);
    let (first, last) = (pieces.start, pieces.end - 1);
    let empty = LayerRange {
        net: Range::NOTHING,
        gross: Range::NOTHING,
        force_start: Force::default(),
        force_end: Force::default(),
    };
    let mut layers = vec![empty; segment.layers().len()];
    let mut force: Range<Force> = Range::NOTHING;
    let mut elongation = Elongation::default();
    let mut bears = None;
    for piece in pieces {
        let from = member.stations[piece].x;
        let length = member.pieces[piece].length;
        let (start, end) = (solved.after[piece], solved.before[piece + 1]);
        let Some(deformation) = &prepared.pieces[piece] else {
            force.take(
                (
                    Extreme {
                        value: start,
                        at: 0.0,
                    },
                    Extreme {
                        value: start,
                        at: 0.0,
                    },
                ),
                from,
                length,
            );
            elongation.force += solved.displacements[piece + 1] - solved.displacements[piece];
            bears = Some(states.links[piece]);
            continue;
        };
        let along = deformation.force(start, end);
        let pointed = |_| SolveError::PointLoaded {
            member: member.name.clone(),
            segment: segment.name.clone(),
        };
        let over_one =
            Quotient::new(along, Curve::constant(from_si::<_, _>(1.0))).map_err(pointed)?;
        let _: &Quotient<Force, Ratio> = &over_one;
        force.take(over_one.extremes(), from, length);
        elongation.force += deformation.stretch(&along).map_err(pointed)?;
        elongation.temperature += deformation.thermal;
        elongation.misfit += deformation.imposed;
        for (which, layer) in segment.layers().iter().enumerate() {
            let stresses = Stresses {
                deformation,
                layers: loading.layers.of_piece(piece),
                which,
                force: along,
            };
            let cut = (member.pieces[piece].from, member.pieces[piece].to);
            let gathered = &mut layers[which];
            stresses
                .gather(layer, cut, from, length, gathered)
                .map_err(pointed)?;
            if piece == first {
                gathered.force_start = stresses.force_at(0.0);
            }
            if piece == last {
                gathered.force_end = stresses.force_at(1.0);
            }
        }
    }
    let rigidity =
        |piece: usize, of: fn(&PieceDeformation) -> Force| prepared.pieces[piece].as_ref().map(of);
    let single = match &segment.kind {
        SegmentKind::Solid {
            layers,
            layered: false,
        } => layers.first(),
        _ => None,
    };
    let all = layers
        .iter()
        .fold((Range::NOTHING, Range::NOTHING), |(net, gross), layer| {
            (wider(net, layer.net), wider(gross, layer.gross))
        });
    let zero = Located {
        value: Force::default(),
        x: segment.from,
    };
    let (most, least) = (force.most.unwrap_or(zero), force.least.unwrap_or(zero));
    let ([stress_max, stress_min], [stress_max_at, stress_min_at]) =
        (all.0.values(), all.0.places());
    let ([gross_stress_max, gross_stress_min], [gross_stress_max_at, gross_stress_min_at]) =
        (all.1.values(), all.1.places());
    Ok(SegmentResult {
        name: segment.name.clone(),
        from: segment.from,
        to: segment.to,
        material: single.map(|layer| model.materials[layer.material].id.clone()),
        area_start: single.map(|layer| layer.strength_area().start()),
        area_end: single.map(|layer| layer.strength_area().end()),
        rigidity_start: rigidity(first, |piece| piece.rigidity.start()),
        rigidity_end: rigidity(last, |piece| piece.rigidity.end()),
        force_start: solved.after[first],
        force_end: solved.before[last + 1],
        force_max: most.value,
        force_max_at: most.x,
        force_min: least.value,
        force_min_at: least.x,
        elongation: elongation.total(),
        elongation_force: elongation.force,
        elongation_temperature: elongation.temperature,
        elongation_misfit: elongation.misfit,
        stress_max,
        stress_max_at,
        stress_min,
        stress_min_at,
        gap: gap_left(segment, elongation, bears),
        bears,
        gross_stress_max,
        gross_stress_max_at,
        gross_stress_min,
        gross_stress_min_at,
        layers: layer_results(model, segment, &layers),
    })
}

/// What remains open of a gap; 0 once it bears.
fn gap_left(segment: &Segment, elongation: Elongation, bears: Option<bool>) -> Option<Length> {
    match (&segment.kind, bears) {
        (SegmentKind::Gap(_), Some(true)) => Some(Length::default()),
        (SegmentKind::Gap(gap), _) => Some((gap.width + elongation.force).max(Length::default())),
        _ => None,
    }
}

fn wider<T: PartialOrd + Copy>(known: Range<T>, other: Range<T>) -> Range<T> {
    let pick =
        |a: Option<Located<T>>, b: Option<Located<T>>, beats: fn(&T, &T) -> bool| match (a, b) {
            (Some(a), Some(b)) => Some(if beats(&b.value, &a.value) { b } else { a }),
            (a, b) => a.or(b),
        };
    Range {
        most: pick(known.most, other.most, |b, a| b > a),
        least: pick(known.least, other.least, |b, a| b < a),
    }
}

fn layer_results(model: &Model, segment: &Segment, gathered: &[LayerRange]) -> Vec<LayerResult> {
    let SegmentKind::Solid {
        layers,
        layered: true,
    } = &segment.kind
    else {
        return Vec::new();
    };
    let result = |(layer, range): (&Layer, &LayerRange)| {
        let ([stress_max, stress_min], [stress_max_at, stress_min_at]) =
            (range.net.values(), range.net.places());
        let ([gross_stress_max, gross_stress_min], [gross_stress_max_at, gross_stress_min_at]) =
            (range.gross.values(), range.gross.places());
        LayerResult {
            name: layer.name.clone(),
            material: model.materials[layer.material].id.clone(),
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

/// The stress of one layer along one piece.
struct Stresses<'a> {
    deformation: &'a PieceDeformation,
    layers: &'a [LayerLoading],
    which: usize,
    force: Curve<Force>,
}

impl Stresses<'_> {
    /// The layer's force over the area A′ that its stress stands on: N / A′ of a single layer, else
    /// E (ε − e0) A / A′.
    fn over(
        &self,
        area: &Curve<Area>,
    ) -> Result<Quotient<Force, Area>, super::quotient::Unbounded> {
        if self.layers.len() == 1 {
            return Quotient::new(self.force, *area);
        }
        let own = &self.layers[self.which];
        let (strain, rigidity) = layer_strain(
            self.layers,
            self.which,
            &self.force,
            &self.deformation.rigidity,
        );
        let modulus = own.modulus;
        if *area == own.area {
            // The area cancels: stress is E times strain, also where the layer runs to a point.
            let unit: Area = from_si(1.0);
            let over: Curve<Area> =
                rigidity.map(|rigidity| unit * (rigidity / (modulus * unit)).value);
            return Quotient::new(strain, over);
        }
        let unit: Area = from_si(1.0);
        let shares: Curve<Ratio> = own.area.map(|area| area / unit);
        let over: Curve<Ratio> = rigidity.map(|rigidity| rigidity / (modulus * unit));
        Quotient::new(strain.times(&shares), area.times(&over))
    }

    fn gather(
        &self,
        layer: &Layer,
        (from, to): (f64, f64),
        x: Length,
        length: Length,
        gathered: &mut LayerRange,
    ) -> Result<(), super::quotient::Unbounded> {
        let gross = self.over(&layer.gross.part(from, to))?.extremes();
        gathered.gross.take(gross, x, length);
        match &layer.net {
            Some(net) => gathered
                .net
                .take(self.over(&net.part(from, to))?.extremes(), x, length),
            None => gathered.net.take(gross, x, length),
        }
        Ok(())
    }

    /// The force in the layer at a fraction of the piece.
    fn force_at(&self, s: f64) -> Force {
        if self.layers.len() == 1 {
            return self.force.at(s);
        }
        let own = &self.layers[self.which];
        let (strain, rigidity) = layer_strain(
            self.layers,
            self.which,
            &self.force,
            &self.deformation.rigidity,
        );
        let share = own.rigidity().at(s);
        if share == Force::default() {
            share
        } else {
            strain.at(s) * (share / rigidity.at(s)).value
        }
    }
}

fn stations(member: &Member, solved: &Solved) -> Vec<StationResult> {
    let last = member.stations.len() - 1;
    let result = |(index, station): (usize, &crate::model::Station)| StationResult {
        name: station.name.clone(),
        x: station.x,
        displacement: solved.displacements[index],
        force_before: (index > 0).then(|| solved.before[index]),
        force_after: (index < last).then(|| solved.after[index]),
    };
    member.stations.iter().enumerate().map(result).collect()
}

fn supports(
    member: &Member,
    prepared: &Prepared,
    solved: &Solved,
    states: &States,
) -> Vec<SupportResult> {
    let mut results: Vec<SupportResult> = member
        .supports
        .iter()
        .map(|support| SupportResult {
            name: support.name.clone(),
            at: support.at.clone(),
            kind: match support.kind {
                SupportKind::Fixed => SupportWord::Fixed,
                SupportKind::Spring(_) => SupportWord::Spring,
                SupportKind::Stop { .. } => SupportWord::Stop,
            },
            reaction: None,
            gap: None,
            bears: None,
        })
        .collect();
    for (index, hold) in prepared.chain.holds.iter().enumerate() {
        let result = &mut results[hold.support];
        result.reaction = Some(solved.reactions[index]);
        if let Some(side) = hold.stop {
            let clearance = match side {
                crate::model::Side::End => hold.face - solved.displacements[hold.station],
                crate::model::Side::Start => solved.displacements[hold.station] - hold.face,
            };
            let bears = states.holds[index];
            result.bears = Some(bears);
            result.gap = Some(if bears {
                Length::default()
            } else {
                clearance.max(Length::default())
            });
        }
    }
    results
}
