//! `limit` on members, segments, layers, supports and holds.

use super::fields::{Entry, Fields, Keys, Value, Written, unknown_key};
use super::station::{Station, station};
use super::{Reader, value};
use crate::job::nearest::remedy;
use crate::model::AreaUsed;
use crate::quantity::{Force, Length, MovementBound, StressLimit};
use toml::de::DeValue;

const COMMON: [&str; 3] = ["in", "since", "source"];
pub(crate) const OF_MEMBER: Keys = Keys {
    table: "limit of a member",
    keys: &[
        "tension",
        "compression",
        "area",
        "force",
        "elongation",
        "displacement",
        "slack",
        "in",
        "since",
        "source",
    ],
};
pub(crate) const OF_SEGMENT: Keys = Keys {
    table: "limit of a segment",
    keys: &[
        "tension",
        "compression",
        "area",
        "force",
        "elongation",
        "in",
        "since",
        "source",
    ],
};
pub(crate) const OF_PART: Keys = Keys {
    table: "limit of a part known by its stiffness",
    keys: &["force", "elongation", "in", "since", "source"],
};
pub(crate) const OF_GAP: Keys = Keys {
    table: "limit of a gap",
    keys: &["gap", "bears", "force", "in", "source"],
};
pub(crate) const OF_LAYER: Keys = Keys {
    table: "limit of a layer",
    keys: &["tension", "compression", "area", "in", "source"],
};
pub(crate) const OF_SUPPORT: Keys = Keys {
    table: "limit of a support",
    keys: &["reaction", "in", "source"],
};
pub(crate) const OF_HOLD: Keys = Keys {
    table: "limit of a hold",
    keys: &["reaction", "in", "source"],
};
pub(crate) const OF_STOP: Keys = Keys {
    table: "limit of a stop",
    keys: &["reaction", "gap", "bears", "in", "source"],
};
pub(crate) const GAP: Keys = Keys {
    table: "limit of a gap's width",
    keys: &["min", "max"],
};
pub(crate) const DISPLACEMENT: Keys = Keys {
    table: "limit of a displacement",
    keys: &["at", "limit"],
};

/// What a limit stands on, and so which keys it may have.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Stands {
    Member,
    Segment,
    Part,
    Gap,
    Layer,
    Support,
    /// A hold without a stop.
    Hold,
    /// A stop, of a support or of a hold.
    Stop,
}

impl Stands {
    fn keys(self) -> Keys {
        match self {
            Stands::Member => OF_MEMBER,
            Stands::Segment => OF_SEGMENT,
            Stands::Part => OF_PART,
            Stands::Gap => OF_GAP,
            Stands::Layer => OF_LAYER,
            Stands::Support => OF_SUPPORT,
            Stands::Hold => OF_HOLD,
            Stands::Stop => OF_STOP,
        }
    }
}

/// One table of limits as written.
#[derive(Debug)]
pub(crate) struct Limits<'t> {
    pub(crate) tension: Entry<StressLimit>,
    pub(crate) compression: Entry<StressLimit>,
    pub(crate) force: Entry<Bound<Force>>,
    pub(crate) elongation: Entry<Bound<MovementBound>>,
    pub(crate) displacement: Entry<Vec<Displacement<'t>>>,
    pub(crate) slack: Entry<()>,
    pub(crate) reaction: Entry<Bound<Force>>,
    pub(crate) gap: Entry<(Option<Length>, Option<Length>)>,
    pub(crate) bears: Entry<()>,
    pub(crate) area: Entry<AreaUsed>,
    pub(crate) names: Entry<Vec<Written<&'t str>>>,
    pub(crate) since: Entry<&'t str>,
    pub(crate) source: Entry<&'t str>,
}

/// A size, or a bound for each sign.
#[derive(Debug, Clone, Copy)]
pub(crate) enum Bound<T> {
    Size(T),
    Each(T, T),
}

/// The displacement of one station.
#[derive(Debug)]
pub(crate) struct Displacement<'t> {
    pub(crate) at: Entry<Station<'t>>,
    pub(crate) limit: Written<Bound<MovementBound>>,
}

impl<'t> Limits<'t> {
    /// One table, or a list of tables.
    pub(super) fn read(
        value: &'t Value<'t>,
        stands: Stands,
        r: &mut Reader<'t>,
    ) -> Option<Vec<Self>> {
        let DeValue::Array(tables) = value.get_ref() else {
            return Limits::table(value, stands, r).map(|limits| vec![limits]);
        };
        let mut all = Vec::with_capacity(tables.len());
        for table in tables.iter() {
            all.extend(Limits::table(table, stands, r));
        }
        Some(all)
    }

    fn table(value: &'t Value<'t>, stands: Stands, r: &mut Reader<'t>) -> Option<Self> {
        let known = stands.keys();
        let mut fields = Fields::of(value, known, r)?;
        let mut limits = Limits {
            tension: Entry::Absent,
            compression: Entry::Absent,
            force: Entry::Absent,
            elongation: Entry::Absent,
            displacement: Entry::Absent,
            slack: Entry::Absent,
            reaction: Entry::Absent,
            gap: Entry::Absent,
            bears: Entry::Absent,
            area: Entry::Absent,
            names: fields.entry("in", r, names),
            since: Entry::Absent,
            source: fields.entry("source", r, value::text),
        };
        for &key in known.keys {
            match key {
                "tension" => limits.tension = fields.entry(key, r, value::stress_limit),
                "compression" => limits.compression = fields.entry(key, r, value::stress_limit),
                "force" => limits.force = fields.entry(key, r, force_bound),
                "elongation" => limits.elongation = fields.entry(key, r, movement_bound),
                "displacement" => limits.displacement = fields.entry(key, r, displacements),
                "slack" => limits.slack = fields.entry(key, r, slack),
                "reaction" => limits.reaction = fields.entry(key, r, force_bound),
                "gap" => limits.gap = fields.entry(key, r, gap),
                "bears" => limits.bears = fields.entry(key, r, bears),
                "area" => limits.area = fields.entry(key, r, area),
                "since" => limits.since = fields.entry(key, r, value::text),
                _ => {}
            }
        }
        let stress = limits.tension.is_written() || limits.compression.is_written();
        if limits.area.is_written() && !stress {
            let place = fields.key_place("area").unwrap_or_default();
            let message = "`area` stands beside `tension` or `compression`";
            r.problems.say(&place, message, "take it out");
        }
        let movement = limits.elongation.is_written() || limits.displacement.is_written();
        if limits.since.is_written() && !movement {
            let place = fields.key_place("since").unwrap_or_default();
            let message = "`since` stands beside `elongation` or `displacement`";
            r.problems.say(&place, message, "take it out");
        }
        if let Some(table) = value.get_ref().as_table()
            && table.keys().all(|key| {
                [&COMMON[..], &["area"]]
                    .concat()
                    .contains(&key.get_ref().as_ref())
            })
            && !(limits.area.is_written() || limits.since.is_written())
        {
            let message = "this limit holds nothing";
            let is_held = |key: &&str| !COMMON.contains(key) && *key != "area";
            let held: Vec<&str> = known.keys.iter().copied().filter(is_held).collect();
            let help = format!("add one of `{}`", held.join("`, `"));
            r.problems.missing("", &fields.place, message, help);
        }
        elsewhere(&fields, value, known, r);
        Some(limits)
    }
}

/// Reports keys that are not known here; where they are limits of something else, says of what.
fn elsewhere<'t>(fields: &Fields<'t>, value: &'t Value<'t>, known: Keys, r: &mut Reader<'t>) {
    let Some(table) = value.get_ref().as_table() else {
        return;
    };
    debug_assert_eq!(fields.place, value.span());
    for key in table.keys() {
        let name = key.get_ref().as_ref();
        if known.keys.contains(&name) {
            continue;
        }
        let of = match name {
            "tension" | "compression" | "area" => "a member, a segment or a layer of material",
            "force" | "elongation" => "a member or a segment",
            "displacement" => "a member",
            "since" => "an elongation or a displacement",
            "slack" => "a member",
            "reaction" => "a support or a hold",
            "gap" | "bears" => "a stop or a gap segment",
            _ => {
                unknown_key(name, &key.span(), &fields.place, known, r);
                continue;
            }
        };
        let message = format!("`{name}` is a limit of {of}; here is a {}", known.table);
        let help = "move it there, or take it out";
        r.problems.say(&key.span(), message, help);
    }
}

/// The names of combinations and purposes that `in` says.
pub(crate) fn names<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Vec<Written<&'t str>>> {
    let mut names = Vec::new();
    let mut add = |value: &'t Value<'t>, r: &mut Reader<'t>| {
        let name = value::text(value, r)?;
        let place = value.span();
        names.push(Written { value: name, place });
        Some(())
    };
    match value.get_ref() {
        DeValue::Array(list) if list.is_empty() => {
            let message = "`in` names nothing";
            let help = "name combinations or purposes, or leave it out";
            r.problems.say(&value.span(), message, help);
            return None;
        }
        DeValue::Array(list) => {
            let mut sound = true;
            for value in list.iter() {
                sound &= add(value, r).is_some();
            }
            if !sound {
                return None;
            }
        }
        _ => add(value, r)?,
    }
    Some(names)
}

/// A size, or a pair with a bound for each sign; `size` is the number whose sign counts.
pub(crate) fn bound<'t, T>(
    value: &'t Value<'t>,
    r: &mut Reader<'t>,
    read: impl Fn(&'t Value<'t>, &mut Reader<'t>) -> Option<T>,
    size: impl Fn(&T) -> f64,
) -> Option<Bound<T>> {
    if let DeValue::Array(_) = value.get_ref() {
        let [lower, upper] = value::pair(value, r)?;
        let (lower, upper) = (read(lower, r), read(upper, r));
        let (lower, upper) = (lower?, upper?);
        if size(&lower) > 0.0 || size(&upper) < 0.0 {
            let message = "a pair of limits holds each sign: the first must be 0 or less, the \
                           second 0 or more";
            let help = "write the negative one first, such as `[\"-2 mm\", \"5 mm\"]`";
            r.problems.say(&value.span(), message, help);
            return None;
        }
        return Some(Bound::Each(lower, upper));
    }
    let one = read(value, r)?;
    if size(&one) < 0.0 {
        let message = "a single limit holds the size, 0 or more";
        let help = "leave out the sign, or write a pair with a bound for each sign";
        r.problems.say(&value.span(), message, help);
        return None;
    }
    Some(Bound::Size(one))
}

fn force_bound<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Bound<Force>> {
    bound(value, r, value::quantity::<Force>, |force| force.value)
}

fn movement_bound<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Bound<MovementBound>> {
    bound(value, r, value::movement_bound, |bound| match bound {
        MovementBound::Length(literal) => literal.nominal.value,
        MovementBound::Share { divisor } => *divisor,
    })
}

fn displacements<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<Vec<Displacement<'t>>> {
    let one = |value: &'t Value<'t>, r: &mut Reader<'t>| {
        let mut fields = Fields::of(value, DISPLACEMENT, r)?;
        let at = fields.required("at", "\"end\"", r, station);
        let limit = fields.required("limit", "\"2 mm\"", r, movement_bound);
        fields.finish(r);
        match limit {
            Entry::Given(limit) => Some(Displacement { at, limit }),
            _ => None,
        }
    };
    match value.get_ref() {
        DeValue::Array(list) => Some(list.iter().filter_map(|value| one(value, r)).collect()),
        _ => one(value, r).map(|one| vec![one]),
    }
}

fn gap<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<(Option<Length>, Option<Length>)> {
    let mut fields = Fields::of(value, GAP, r)?;
    let min = fields.entry("min", r, value::not_negative("min"));
    let max = fields.entry("max", r, value::not_negative("max"));
    let place = fields.place.clone();
    fields.finish(r);
    if min.is_absent() && max.is_absent() {
        let message = "this limit of a gap holds nothing";
        let help = "write `{ min = \"3 mm\" }`, `{ max = \"20 mm\" }` or both";
        r.problems.missing("", &place, message, help);
    }
    if min.is_wrong() || max.is_wrong() {
        return None;
    }
    let (min, max) = (min.given().map(|w| w.value), max.given().map(|w| w.value));
    if let (Some(min), Some(max)) = (min, max)
        && min > max
    {
        let message = "the least width of this gap is more than the greatest";
        r.problems.say(&place, message, "exchange `min` and `max`");
        return None;
    }
    (min.is_some() || max.is_some()).then_some((min, max))
}

fn bears<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<()> {
    let bears = value::boolean(value, r)?;
    if !bears {
        let message = "`bears = false` is no limit";
        let help = "to keep it open write `gap = { min = … }`; else leave it out";
        r.problems.say(&value.span(), message, help);
    }
    bears.then_some(())
}

fn slack<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<()> {
    let slack = value::boolean(value, r)?;
    if slack {
        let message = "`slack = true` is no limit";
        let help = "write `slack = false` for a member that must carry; else leave it out";
        r.problems.say(&value.span(), message, help);
    }
    (!slack).then_some(())
}

fn area<'t>(value: &'t Value<'t>, r: &mut Reader<'t>) -> Option<AreaUsed> {
    match value::text(value, r)? {
        "gross" => Some(AreaUsed::Gross),
        "net" => Some(AreaUsed::Net),
        other => {
            let message =
                format!("a stress stands on the `gross` or the `net` area, not `{other}`");
            let help = remedy(other, ["gross", "net"], "write one of");
            r.problems.say(&value.span(), message, help);
            None
        }
    }
}
