//! Members: what `like` and `[default]` add, and how the parts of a member come together.

use super::actions::actions;
use super::assembly::{self, Span};
use super::lengths::rest;
use super::lookup::Lookup;
use super::materials::arrows;
use super::names::Root;
use super::outline::{Outline, place_of};
use super::points::points;
use super::supports::{self, Held};
use super::{Meaning, name};
use crate::job::written::limit::Limits;
use crate::job::written::load::Load;
use crate::job::written::member::Member as WrittenMember;
use crate::job::written::segment::Segment as WrittenSegment;
use crate::job::written::support::Support as WrittenSupport;
use crate::job::written::{Entry, Written};
use crate::model::{Actions, Between, Carries, Member, Name, Place, Segment, SegmentKind};
use crate::quantity::from_si;
use crate::quantity::{Angle, ThermodynamicTemperature};

/// A member with the keys that it takes over by `like`.
#[derive(Clone, Copy)]
pub(super) struct Whole<'w, 't> {
    pub(super) name: &'w Written<&'t str>,
    pub(super) place: &'w Place,
    /// The member as it stands itself, without what it takes over.
    pub(super) own: &'w WrittenMember<'t>,
    pub(super) start: &'w Entry<()>,
    pub(super) end: &'w Entry<()>,
    pub(super) runs: &'w Entry<Angle>,
    pub(super) datum: &'w Entry<ThermodynamicTemperature>,
    pub(super) between: &'w Entry<[Written<&'t str>; 2]>,
    pub(super) carries: &'w Entry<Carries>,
    pub(super) segments: &'w Entry<Vec<WrittenSegment<'t>>>,
    pub(super) supports: &'w Entry<Vec<WrittenSupport<'t>>>,
    pub(super) loads: &'w Entry<Vec<Load<'t>>>,
    pub(super) limits: &'w Entry<Vec<Limits<'t>>>,
}

/// A member as meant.
pub(super) struct Meant<'w, 't> {
    pub(super) whole: Whole<'w, 't>,
    pub(super) outline: Outline<'w, 't>,
    /// What is known of it. Where something is at fault it lacks that: a segment its layers, the
    /// whole its stations or supports.
    pub(super) member: Member,
    /// Whether nothing about it is at fault.
    pub(super) sound: bool,
}

/// All members of a job whose `like` leads somewhere.
pub(super) fn members<'w, 't>(meaning: &mut Meaning<'w, 't>) -> Vec<Meant<'w, 't>> {
    let job = meaning.job;
    let mut wholes: Vec<State<'w, 't>> = job.members.iter().map(|_| State::Open).collect();
    for index in 0..job.members.len() {
        follow(index, &mut wholes, meaning);
    }
    let wholes: Vec<Whole<'w, 't>> = wholes
        .into_iter()
        .filter_map(|state| match state {
            State::Done(whole) => whole,
            State::Open | State::OnTheWay => None,
        })
        .collect();
    let spans: Vec<Span> = wholes
        .iter()
        .map(|whole| assembly::span(whole, meaning))
        .collect();
    meaning.space.up = assembly::up(&wholes, &spans, meaning);
    wholes
        .into_iter()
        .zip(&spans)
        .map(|(whole, span)| meant(whole, span, meaning))
        .collect()
}

/// How far a member's `like` has been followed.
#[derive(Clone, Copy)]
enum State<'w, 't> {
    Open,
    OnTheWay,
    Done(Option<Whole<'w, 't>>),
}

/// Follows `like` to the far end of the chain and comes back with what each member takes over.
fn follow<'w, 't>(from: usize, states: &mut [State<'w, 't>], meaning: &mut Meaning<'w, 't>) {
    let job = meaning.job;
    let mut chain: Vec<usize> = Vec::new();
    let mut next = Some(from);
    let mut base: Result<Option<Whole<'w, 't>>, ()> = Ok(None);
    while let Some(index) = next {
        match states[index] {
            State::Done(whole) => {
                base = whole.map(Some).ok_or(());
                break;
            }
            State::OnTheWay => {
                let at = chain.iter().position(|member| *member == index);
                let circle = chain[at.unwrap_or(0)..].iter().chain([&index]);
                let circle = arrows(circle.map(|member| job.members[*member].name.value));
                if let Some(like) = job.members[index].like.given() {
                    let message = format!("`like` leads in a circle: {circle}");
                    let help = "write the keys of one of these members out";
                    meaning.r.problems.say(&like.place, message, help);
                }
                base = Err(());
                break;
            }
            State::Open => {}
        }
        states[index] = State::OnTheWay;
        chain.push(index);
        next = None;
        match &job.members[index].like {
            Entry::Absent => {}
            Entry::Wrong => base = Err(()),
            Entry::Given(like) => {
                next = meaning.find(Root::Member, like);
                if next.is_none() {
                    base = Err(());
                }
            }
        }
    }
    for index in chain.into_iter().rev() {
        let whole = base.ok().map(|base| whole(&job.members[index], base));
        base = whole.map(Some).ok_or(());
        states[index] = State::Done(whole);
    }
}

fn whole<'w, 't>(own: &'w WrittenMember<'t>, base: Option<Whole<'w, 't>>) -> Whole<'w, 't> {
    fn either<'w, T>(own: &'w Entry<T>, base: Option<&'w Entry<T>>) -> &'w Entry<T> {
        base.map_or(own, |base| own.or(base))
    }
    Whole {
        name: &own.name,
        place: &own.place,
        own,
        start: either(&own.start, base.map(|base| base.start)),
        end: either(&own.end, base.map(|base| base.end)),
        runs: either(&own.runs, base.map(|base| base.runs)),
        datum: either(&own.datum, base.map(|base| base.datum)),
        between: either(&own.between, base.map(|base| base.between)),
        carries: either(&own.carries, base.map(|base| base.carries)),
        segments: either(&own.segments, base.map(|base| base.segments)),
        supports: either(&own.supports, base.map(|base| base.supports)),
        loads: either(&own.loads, base.map(|base| base.loads)),
        limits: either(&own.limits, base.map(|base| base.limits)),
    }
}

/// One member: its outline, then what it is made of, how it is held, and what acts on it.
fn meant<'w, 't>(
    whole: Whole<'w, 't>,
    span: &Span,
    meaning: &mut Meaning<'w, 't>,
) -> Meant<'w, 't> {
    let written: &'w [WrittenSegment<'t>] = match whole.segments {
        Entry::Given(segments) => &segments.value,
        _ => &[],
    };
    if written.is_empty() && !whole.segments.is_wrong() {
        let message = format!("the member `{}` needs a segment", whole.name.value);
        let help = "add `segment = [{ length = …, section = …, material = … }]`, or `like` with \
                    the name of another member";
        meaning
            .r
            .problems
            .missing("segment", whole.place, message, help);
    }
    let rest = rest(&whole, written, span, meaning);
    let mut outline = Outline::of(written, rest);
    assembly::has_no_gaps(&whole, &outline, meaning);
    names_differ(&whole, &outline, meaning);
    let kinds: Vec<Option<SegmentKind>> = written
        .iter()
        .zip(outline.names.names())
        .map(|(segment, name)| meaning.kind(segment, name))
        .collect();
    if !written.is_empty() {
        cuts(&whole, &mut outline, meaning);
    }
    let cut = outline.stations();
    let held = supports::supports(&whole, &outline, meaning);
    let mut sound = !written.is_empty() && cut.is_some() && held.supports.is_some();
    sound &= *span != Span::Wrong && !whole.carries.is_wrong();
    let segments = kinds.into_iter().enumerate().map(|(index, kind)| {
        sound &= kind.is_some();
        Segment {
            name: outline.names.names()[index].clone(),
            place: written[index].place.clone(),
            from: outline.bound(index),
            to: outline.bound(index + 1),
            length: from_si(outline.length_of(index)),
            kind: kind.unwrap_or(NOTHING),
        }
    });
    let segments = segments.collect();
    let mut member = member(&whole, span, segments, cut, &held, meaning);
    let actions = actions(&whole, span, &outline, &held, &member, sound, meaning);
    sound &= actions.is_some();
    member.actions = actions.unwrap_or_default();
    if sound {
        points(&member, meaning);
    }
    Meant {
        whole,
        outline,
        member,
        sound,
    }
}

/// What stands for a make-up that is at fault: no layer, so that nothing can be missing in one.
const NOTHING: SegmentKind = SegmentKind::Solid {
    layers: Vec::new(),
    layered: true,
};

/// What is known of a member on which nothing acts yet.
fn member<'w, 't>(
    whole: &Whole<'w, 't>,
    span: &Span,
    segments: Vec<Segment>,
    cut: Option<(Vec<crate::model::Station>, Vec<crate::model::Piece>)>,
    held: &Held,
    meaning: &Meaning<'w, 't>,
) -> Member {
    let (stations, pieces) = cut.unwrap_or_default();
    let job = meaning.job;
    let (runs, between) = match span {
        Span::Given(reach) => {
            let between = Between {
                start: reach.start,
                end: reach.end,
                direction: reach.direction,
                rise: meaning.space.rise(&reach.direction),
            };
            (meaning.space.runs(&reach.direction), Some(between))
        }
        Span::None | Span::Wrong => {
            let runs = whole.runs.or(&job.default.runs).given();
            (runs.map(|runs| runs.value), None)
        }
    };
    let job_datum = job
        .heading
        .as_ref()
        .and_then(|heading| heading.datum.given());
    Member {
        name: name(whole.name),
        place: whole.place.clone(),
        runs,
        datum: whole.datum.given().or(job_datum).map(|datum| datum.value),
        between,
        carries: whole.carries.given().map(|carries| carries.value),
        segments,
        stations,
        pieces,
        supports: held.supports.clone().unwrap_or_default(),
        actions: Actions::default(),
    }
}

/// Segments and supports of a member share one set of names.
fn names_differ<'w, 't>(
    whole: &Whole<'w, 't>,
    outline: &Outline<'w, 't>,
    meaning: &mut Meaning<'w, 't>,
) {
    let supports: &[WrittenSupport<'t>] = whole
        .supports
        .given()
        .map_or(&[], |supports| &supports.value);
    let segments = outline.names.names();
    let mut places: Vec<&Place> = outline
        .segments
        .iter()
        .map(|segment| place_of(&segment.name, &segment.place))
        .collect();
    let mut names: Vec<Name> = segments.to_vec();
    for support in supports {
        if let Some(name) = support.name.given() {
            names.push(Name::from(name.value));
            places.push(&name.place);
        }
    }
    let lookup = Lookup::new(names);
    for index in lookup.repeated() {
        let message = format!(
            "two parts of the member `{}` are called `{}`",
            whole.name.value,
            lookup.names()[index]
        );
        let help = "give one another name; segments without a name are called 1, 2, 3 …";
        meaning.r.problems.say(places[index], message, help);
    }
}

/// Takes note of every station at which something stands or is asked for.
fn cuts<'w, 't>(
    whole: &Whole<'w, 't>,
    outline: &mut Outline<'w, 't>,
    meaning: &mut Meaning<'w, 't>,
) {
    for support in whole.supports.given().map_or(&[][..], |all| &all.value) {
        outline.cut(&support.at, meaning);
    }
    for load in whole.loads.given().map_or(&[][..], |all| &all.value) {
        for station in [&load.at, &load.from, &load.to] {
            outline.cut(station, meaning);
        }
    }
    let watched = meaning.watched.remove(whole.name.value);
    for station in watched.into_iter().flatten() {
        outline.cut(station, meaning);
    }
    let limits = whole.limits.or(&meaning.job.default.limits);
    for limits in limits.given().map_or(&[][..], |all| &all.value) {
        for displacement in limits
            .displacement
            .given()
            .map_or(&[][..], |all| &all.value)
        {
            outline.cut(&displacement.at, meaning);
        }
    }
}
