//! The columns of every table: heading with unit, and what a row has in it.

use crate::model::AreaUsed;
use crate::quantity::{Force, Measure};
use crate::result::{
    BodyResult, CheckResult, Envelope, Governing, HoldResult, LayerResult, MemberResult,
    MemberState, PointResult, Rotation, SegmentResult, StationResult, SupportResult, SupportWord,
    Unit, Verdict, WatchResult,
};
use serde_json::{Map, Value};

/// What stands in one column of one row.
pub(super) enum Field<'a> {
    Text(&'a str),
    Number(Option<f64>),
    Answer(Option<bool>),
    Count(usize),
    Details(&'a Map<String, Value>),
}

/// A heading with its unit, and the field of a row.
pub(super) type Column<R> = (&'static str, for<'a> fn(&'a R) -> Field<'a>);

pub(super) const MEMBERS: &[Column<MemberResult>] = &[
    ("member", |row| Field::Text(&row.name)),
    ("state", |row| Field::Text(state(row.state))),
    ("slack_by [m]", |row| optional(row.slack_by)),
    ("restraint", |row| Field::Number(row.restraint)),
    ("misfit_found [m]", |row| optional(row.misfit_found)),
    ("applied [N]", |row| number(row.totals.applied)),
    ("reactions [N]", |row| number(row.totals.reactions)),
    ("elongation [m]", |row| number(row.elongation)),
    ("elongation_force [m]", |row| number(row.elongation_force)),
    ("elongation_temperature [m]", |row| {
        number(row.elongation_temperature)
    }),
    ("elongation_misfit [m]", |row| number(row.elongation_misfit)),
    ("force_max [N]", |row| number(row.force_max)),
    ("force_max_at [m]", |row| number(row.force_max_at)),
    ("force_min [N]", |row| number(row.force_min)),
    ("force_min_at [m]", |row| number(row.force_min_at)),
];

pub(super) const SEGMENTS: &[Column<SegmentResult>] = &[
    ("segment", |row| Field::Text(&row.name)),
    ("from [m]", |row| number(row.from)),
    ("to [m]", |row| number(row.to)),
    ("material", |row| {
        Field::Text(row.material.as_deref().unwrap_or(""))
    }),
    ("area_start [m2]", |row| optional(row.area_start)),
    ("area_end [m2]", |row| optional(row.area_end)),
    ("rigidity_start [N]", |row| optional(row.rigidity_start)),
    ("rigidity_end [N]", |row| optional(row.rigidity_end)),
    ("force_start [N]", |row| number(row.force_start)),
    ("force_end [N]", |row| number(row.force_end)),
    ("force_max [N]", |row| number(row.force_max)),
    ("force_max_at [m]", |row| number(row.force_max_at)),
    ("force_min [N]", |row| number(row.force_min)),
    ("force_min_at [m]", |row| number(row.force_min_at)),
    ("elongation [m]", |row| number(row.elongation)),
    ("elongation_force [m]", |row| number(row.elongation_force)),
    ("elongation_temperature [m]", |row| {
        number(row.elongation_temperature)
    }),
    ("elongation_misfit [m]", |row| number(row.elongation_misfit)),
    ("stress_max [Pa]", |row| optional(row.stress_max)),
    ("stress_max_at [m]", |row| optional(row.stress_max_at)),
    ("stress_min [Pa]", |row| optional(row.stress_min)),
    ("stress_min_at [m]", |row| optional(row.stress_min_at)),
    ("gross_stress_max [Pa]", |row| {
        optional(row.gross_stress_max)
    }),
    ("gross_stress_max_at [m]", |row| {
        optional(row.gross_stress_max_at)
    }),
    ("gross_stress_min [Pa]", |row| {
        optional(row.gross_stress_min)
    }),
    ("gross_stress_min_at [m]", |row| {
        optional(row.gross_stress_min_at)
    }),
    ("gap [m]", |row| optional(row.gap)),
    ("bears", |row| Field::Answer(row.bears)),
];

pub(super) const LAYERS: &[Column<LayerResult>] = &[
    ("layer", |row| Field::Text(&row.name)),
    ("material", |row| Field::Text(&row.material)),
    ("force_start [N]", |row| number(row.force_start)),
    ("force_end [N]", |row| number(row.force_end)),
    ("stress_max [Pa]", |row| optional(row.stress_max)),
    ("stress_max_at [m]", |row| optional(row.stress_max_at)),
    ("stress_min [Pa]", |row| optional(row.stress_min)),
    ("stress_min_at [m]", |row| optional(row.stress_min_at)),
    ("gross_stress_max [Pa]", |row| {
        optional(row.gross_stress_max)
    }),
    ("gross_stress_max_at [m]", |row| {
        optional(row.gross_stress_max_at)
    }),
    ("gross_stress_min [Pa]", |row| {
        optional(row.gross_stress_min)
    }),
    ("gross_stress_min_at [m]", |row| {
        optional(row.gross_stress_min_at)
    }),
];

pub(super) const STATIONS: &[Column<StationResult>] = &[
    ("station", |row| Field::Text(&row.name)),
    ("x [m]", |row| number(row.x)),
    ("displacement [m]", |row| number(row.displacement)),
    ("force_before [N]", |row| optional(row.force_before)),
    ("force_after [N]", |row| optional(row.force_after)),
];

pub(super) const SUPPORTS: &[Column<SupportResult>] = &[
    ("support", |row| Field::Text(&row.name)),
    ("at", |row| Field::Text(&row.at)),
    ("kind", |row| Field::Text(kind(row.kind))),
    ("reaction [N]", |row| optional(row.reaction)),
    ("gap [m]", |row| optional(row.gap)),
    ("bears", |row| Field::Answer(row.bears)),
];

// Of an assembly in fewer than three coordinates the fields of the others stay empty.
pub(super) const POINTS: &[Column<PointResult>] = &[
    ("point", |row| Field::Text(&row.name)),
    ("displacement_x [m]", |row| along(&row.displacement, 0)),
    ("displacement_y [m]", |row| along(&row.displacement, 1)),
    ("displacement_z [m]", |row| along(&row.displacement, 2)),
    ("reaction_x [N]", |row| reaction(row.reaction.as_deref(), 0)),
    ("reaction_y [N]", |row| reaction(row.reaction.as_deref(), 1)),
    ("reaction_z [N]", |row| reaction(row.reaction.as_deref(), 2)),
];

pub(super) const HOLDS: &[Column<HoldResult>] = &[
    ("hold", |row| Field::Text(&row.name)),
    ("point", |row| Field::Text(&row.point)),
    ("kind", |row| Field::Text(kind(row.kind))),
    ("reaction_x [N]", |row| reaction(row.reaction.as_deref(), 0)),
    ("reaction_y [N]", |row| reaction(row.reaction.as_deref(), 1)),
    ("reaction_z [N]", |row| reaction(row.reaction.as_deref(), 2)),
    ("gap [m]", |row| optional(row.gap)),
    ("bears", |row| Field::Answer(row.bears)),
];

pub(super) const BODIES: &[Column<BodyResult>] = &[
    ("body", |row| Field::Text(&row.name)),
    ("displacement_x [m]", |row| along(&row.displacement, 0)),
    ("displacement_y [m]", |row| along(&row.displacement, 1)),
    ("displacement_z [m]", |row| along(&row.displacement, 2)),
    ("rotation_x [rad]", |row| rotation(row, 0)),
    ("rotation_y [rad]", |row| rotation(row, 1)),
    ("rotation_z [rad]", |row| rotation(row, 2)),
];

// A value is in the unit that its row names.
pub(super) const WATCHES: &[Column<WatchResult>] = &[
    ("watch", |row| Field::Text(&row.name)),
    ("value", |row| Field::Number(row.value)),
    ("unit", |row| Field::Text(unit(row.unit))),
];

// Demand and limit are in the unit that their row names.
pub(super) const CHECKS: &[Column<CheckResult>] = &[
    ("check", |row| Field::Text(&row.check)),
    ("on", |row| Field::Text(&row.on)),
    ("at [m]", |row| Field::Number(row.at)),
    ("area", |row| Field::Text(area(row.area))),
    ("demand", |row| Field::Number(Some(row.demand))),
    ("limit", |row| Field::Number(Some(row.limit))),
    ("unit", |row| Field::Text(unit(row.unit))),
    ("utilisation", |row| Field::Number(row.utilisation)),
    ("status", |row| Field::Text(verdict(row.status))),
    ("source", |row| {
        Field::Text(row.source.as_deref().unwrap_or(""))
    }),
    ("details", |row| Field::Details(&row.details)),
    ("line", |row| Field::Count(row.line)),
];

pub(super) const GOVERNING: &[Column<Governing>] = &[
    ("combination", |row| Field::Text(&row.combination)),
    ("check", |row| Field::Text(&row.check)),
    ("on", |row| Field::Text(&row.on)),
    ("at [m]", |row| Field::Number(row.at)),
    ("area", |row| Field::Text(area(row.area))),
    ("demand", |row| Field::Number(Some(row.demand))),
    ("limit", |row| Field::Number(Some(row.limit))),
    ("unit", |row| Field::Text(unit(row.unit))),
    ("utilisation", |row| Field::Number(row.utilisation)),
    ("status", |row| Field::Text(verdict(row.status))),
    ("source", |row| {
        Field::Text(row.source.as_deref().unwrap_or(""))
    }),
    ("line", |row| Field::Count(row.line)),
];

pub(super) const ENVELOPE: &[Column<Envelope>] = &[
    ("result", |row| Field::Text(&row.result)),
    ("unit", |row| Field::Text(unit(row.unit))),
    ("max", |row| Field::Number(row.max)),
    ("max_in", |row| {
        Field::Text(row.max_in.as_deref().unwrap_or(""))
    }),
    ("min", |row| Field::Number(row.min)),
    ("min_in", |row| {
        Field::Text(row.min_in.as_deref().unwrap_or(""))
    }),
];

fn number<'a, Q: Measure>(quantity: Q) -> Field<'a> {
    Field::Number(Some(quantity.si()))
}

fn optional<'a, Q: Measure>(quantity: Option<Q>) -> Field<'a> {
    Field::Number(quantity.map(Q::si))
}

fn along<'a, Q: Measure>(parts: &[Q], axis: usize) -> Field<'a> {
    optional(parts.get(axis).copied())
}

fn reaction<'a>(parts: Option<&[Force]>, axis: usize) -> Field<'a> {
    along(parts.unwrap_or_default(), axis)
}

/// In fewer than three coordinates a body turns about z alone.
fn rotation(body: &BodyResult, axis: usize) -> Field<'_> {
    match body.rotation {
        Rotation::Spatial(angles) => number(angles[axis]),
        Rotation::InPlane(angle) => optional((axis == 2).then_some(angle)),
    }
}

// The words of the JSON.

fn state(state: MemberState) -> &'static str {
    match state {
        MemberState::Taut => "taut",
        MemberState::Bearing => "bearing",
        MemberState::Slack => "slack",
    }
}

fn kind(kind: SupportWord) -> &'static str {
    match kind {
        SupportWord::Fixed => "fixed",
        SupportWord::Spring => "spring",
        SupportWord::Stop => "stop",
    }
}

fn area(area: Option<AreaUsed>) -> &'static str {
    match area {
        Some(AreaUsed::Gross) => "gross",
        Some(AreaUsed::Net) => "net",
        None => "",
    }
}

fn unit(unit: Unit) -> &'static str {
    match unit {
        Unit::Pascal => "Pa",
        Unit::Newton => "N",
        Unit::Metre => "m",
        Unit::Radian => "rad",
        Unit::None => "1",
    }
}

fn verdict(verdict: Verdict) -> &'static str {
    match verdict {
        Verdict::Pass => "pass",
        Verdict::Fail => "fail",
    }
}
