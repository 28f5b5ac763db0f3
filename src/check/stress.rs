//! Tension and compression: the largest stress of a segment's layer, by size.

use super::{Case, Finding, utilisation};
use crate::model::{AreaUsed, LimitKind, Target};
use crate::quantity::{Length, Stress};
use crate::result::Unit;

/// A stress and where it acts.
type Place = (Option<Stress>, Option<Length>);

pub(super) fn judge(case: &Case) -> Option<Finding> {
    let (limit, area, pulls) = match case.limit.kind {
        LimitKind::Tension { limit, area, .. } => (limit, area, true),
        LimitKind::Compression { limit, area, .. } => (limit, area, false),
        _ => return None,
    };
    let (stress, at) = extreme(case, area, pulls)?;
    let demand = if pulls { stress } else { -stress };
    let demand = demand.max(Stress::default());
    // What counts as no force is no stress on any area of the layer.
    let (_, zero) = case.member()?;
    let counts = demand * reference_area(case)? > zero.force;
    let demand = if counts { demand } else { Stress::default() };
    let (utilisation, status) = utilisation(demand.value, limit.value, counts);
    Some(Finding {
        at: Some(at.value),
        demand: demand.value,
        limit: limit.value,
        unit: Unit::Pascal,
        utilisation,
        status,
        details: serde_json::Map::new(),
    })
}

/// The largest stress of the limit's layer with its sign, on the area that the limit says.
fn extreme(case: &Case, area: AreaUsed, pulls: bool) -> Option<(Stress, Length)> {
    let (member, _) = case.member()?;
    let (most, least): (Place, Place) = match case.limit.target {
        Target::Segment { segment, .. } => {
            let s = &member.segments[segment];
            match area {
                AreaUsed::Net => (
                    (s.stress_max, s.stress_max_at),
                    (s.stress_min, s.stress_min_at),
                ),
                AreaUsed::Gross => (
                    (s.gross_stress_max, s.gross_stress_max_at),
                    (s.gross_stress_min, s.gross_stress_min_at),
                ),
            }
        }
        Target::Layer { segment, layer, .. } => {
            let l = &member.segments[segment].layers[layer];
            match area {
                AreaUsed::Net => (
                    (l.stress_max, l.stress_max_at),
                    (l.stress_min, l.stress_min_at),
                ),
                AreaUsed::Gross => (
                    (l.gross_stress_max, l.gross_stress_max_at),
                    (l.gross_stress_min, l.gross_stress_min_at),
                ),
            }
        }
        _ => return None,
    };
    match if pulls { most } else { least } {
        (Some(stress), Some(at)) => Some((stress, at)),
        _ => None,
    }
}

/// The larger end of a tapering layer: its point would make any rounding a stress.
fn reference_area(case: &Case) -> Option<crate::quantity::Area> {
    let (member, segment, layer) = match case.limit.target {
        Target::Segment { member, segment } => (member, segment, 0),
        Target::Layer {
            member,
            segment,
            layer,
        } => (member, segment, layer),
        _ => return None,
    };
    let layer = case.model.members[member].segments[segment]
        .layers()
        .get(layer)?;
    let area = layer.strength_area();
    Some(area.start().max(area.end()))
}
