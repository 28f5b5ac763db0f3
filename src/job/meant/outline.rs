//! Where things are along a member: its segments end to end, its stations, its pieces.

use super::Meaning;
use super::lookup::Lookup;
use crate::job::nearest::remedy;
use crate::job::written::segment::{Extent, Kind, Segment as WrittenSegment};
use crate::job::written::station::Station as WrittenStation;
use crate::job::written::{Entry, Written};
use crate::model::{Name, Piece, Place, Station};
use crate::quantity::{Length, from_si};

/// A distance within this share of a member's length of another station is that station.
const SAME: f64 = 1e-9;

/// The segments of a member end to end.
pub(super) struct Outline<'w, 't> {
    pub(super) segments: &'w [WrittenSegment<'t>],
    pub(super) names: Lookup<Name>,
    /// Where segments begin and end, one more than there are; `None` where a length is at fault.
    pub(super) bounds: Option<Vec<f64>>,
    /// The length of the segment that takes the rest, in metres.
    rest: Option<f64>,
    /// Where, beyond the bounds, the member is cut: rising, and how each was written.
    cuts: Vec<(f64, &'t str)>,
    /// The station of each bound.
    station_of_bound: Vec<usize>,
    /// The distance of every station.
    xs: Vec<f64>,
}

/// A place along a member that is there.
#[derive(Debug, Clone, Copy, PartialEq)]
enum Spot {
    Bound(usize),
    Inside(f64),
}

impl<'w, 't> Outline<'w, 't> {
    pub(super) fn of(segments: &'w [WrittenSegment<'t>], rest: Option<f64>) -> Self {
        let names = segments
            .iter()
            .enumerate()
            .map(|(index, segment)| match segment.name.given() {
                Some(written) => Name::from(written.value),
                None => Name::from((index + 1).to_string()),
            })
            .collect();
        let mut bounds = Vec::with_capacity(segments.len() + 1);
        let mut x = 0.0;
        bounds.push(x);
        for segment in segments {
            let Some(length) = length_in(segment, rest) else {
                break;
            };
            x += length;
            bounds.push(x);
        }
        Outline {
            segments,
            names: Lookup::new(names),
            bounds: (bounds.len() == segments.len() + 1).then_some(bounds),
            rest,
            cuts: Vec::new(),
            station_of_bound: Vec::new(),
            xs: Vec::new(),
        }
    }

    /// The length of the member.
    pub(super) fn length(&self) -> Option<f64> {
        self.bounds.as_ref()?.last().copied()
    }

    /// The length of a segment as it was written, or what is left for it.
    pub(super) fn length_of(&self, segment: usize) -> f64 {
        let segment = self.segments.get(segment);
        let length = segment.and_then(|segment| length_in(segment, self.rest));
        length.unwrap_or(0.0)
    }

    pub(super) fn is_gap(&self, segment: usize) -> bool {
        let segment = self.segments.get(segment);
        segment.is_some_and(|segment| matches!(segment.kind, Kind::Gap { .. }))
    }

    /// Takes note of a station at which something stands; reports one that is not there.
    pub(super) fn cut(
        &mut self,
        station: &Entry<WrittenStation<'t>>,
        meaning: &mut Meaning<'_, 't>,
    ) {
        let Some(written) = station.given() else {
            return;
        };
        match self.spot(&written.value) {
            Ok(Spot::Inside(x)) => {
                if let WrittenStation::Distance(_, text) = written.value {
                    self.cuts.push((x, text));
                }
            }
            Ok(Spot::Bound(_)) => {}
            Err(fault) => self.report(fault, written, meaning),
        }
    }

    fn report(
        &self,
        fault: Fault<'t>,
        written: &Written<WrittenStation<'t>>,
        meaning: &mut Meaning<'_, 't>,
    ) {
        let place = &written.place;
        let problems = &mut meaning.r.problems;
        match fault {
            Fault::NoSegment(_) if self.segments.iter().any(|s| s.name.is_wrong()) => {}
            Fault::NoSegment(name) => {
                let message = format!("no segment of this member is called `{name}`");
                let help = remedy(name, self.names.texts(), "its segments are");
                problems.unknown("member", place, message, help);
            }
            Fault::Outside(length) => {
                let length = (length * 1e9).round() / 1e9;
                let message =
                    format!("this station lies outside the member, which is {length} m long");
                let help = "distances count from the member's start";
                problems.say(place, message, help);
            }
            Fault::InGap(segment) => {
                let message = format!(
                    "this station lies inside the gap `{}`, where there is no material",
                    self.names.names()[segment]
                );
                problems.say(place, message, "take a station at one of its ends");
            }
            Fault::Unknown => {}
        }
    }

    fn spot(&self, station: &WrittenStation<'t>) -> Result<Spot, Fault<'t>> {
        let find = |name: &'t str| self.names.find(name).ok_or(Fault::NoSegment(name));
        match *station {
            WrittenStation::Start => Ok(Spot::Bound(0)),
            WrittenStation::End => Ok(Spot::Bound(self.segments.len())),
            WrittenStation::StartOf(name) => find(name).map(Spot::Bound),
            WrittenStation::EndOf(name) => find(name).map(|index| Spot::Bound(index + 1)),
            WrittenStation::Distance(x, _) => {
                let bounds = self.bounds.as_ref().ok_or(Fault::Unknown)?;
                let length = bounds.last().copied().unwrap_or_default();
                let x = x.value;
                let same = SAME * length;
                let above = bounds.partition_point(|bound| *bound < x);
                let near = [above.checked_sub(1), Some(above)]
                    .into_iter()
                    .flatten()
                    .filter(|&index| index < bounds.len())
                    .min_by(|&a, &b| (bounds[a] - x).abs().total_cmp(&(bounds[b] - x).abs()));
                match near {
                    Some(index) if (bounds[index] - x).abs() <= same => Ok(Spot::Bound(index)),
                    _ if x < 0.0 || x > length => Err(Fault::Outside(length)),
                    _ if self.is_gap(above - 1) => Err(Fault::InGap(above - 1)),
                    _ => Ok(Spot::Inside(x)),
                }
            }
        }
    }

    /// Cuts the member: its stations and the pieces between them.
    pub(super) fn stations(&mut self) -> Option<(Vec<Station>, Vec<Piece>)> {
        let bounds = self.bounds.as_ref()?;
        let length = bounds.last().copied()?;
        self.cuts.sort_by(|a, b| a.0.total_cmp(&b.0));
        self.cuts
            .dedup_by(|later, kept| later.0 - kept.0 <= SAME * length);
        let many = self.segments.len() + self.cuts.len() + 1;
        let mut stations = Vec::with_capacity(many);
        let mut pieces = Vec::with_capacity(many);
        self.station_of_bound = Vec::with_capacity(bounds.len());
        let mut cuts = self.cuts.iter().peekable();
        let station = |name: &str, x: f64| Station {
            name: Name::from(name),
            x: from_si(x),
        };
        self.station_of_bound.push(0);
        stations.push(station("start", 0.0));
        for (segment, ends) in bounds.windows(2).enumerate() {
            let (from, to) = (ends[0], ends[1]);
            let long = self.length_of(segment);
            let mut last = 0.0;
            let mut piece = |upto: f64| {
                pieces.push(Piece {
                    segment,
                    from: last,
                    to: upto,
                    length: from_si((upto - last) * long),
                });
                last = upto;
            };
            while let Some((x, text)) = cuts.next_if(|(x, _)| *x < to) {
                piece((x - from) / long);
                stations.push(station(text, *x));
            }
            piece(1.0);
            self.station_of_bound.push(stations.len());
            if segment + 1 == self.segments.len() {
                stations.push(station("end", to));
            } else {
                let mut name = String::with_capacity(self.names.names()[segment].len() + 4);
                name.push_str(&self.names.names()[segment]);
                name.push_str(".end");
                stations.push(station(&name, to));
            }
        }
        self.xs = stations.iter().map(|station| station.x.value).collect();
        Some((stations, pieces))
    }

    /// The index of a station, once the member is cut.
    pub(super) fn find(&self, station: &WrittenStation<'t>) -> Option<usize> {
        match self.spot(station).ok()? {
            Spot::Bound(index) => self.station_of_bound.get(index).copied(),
            Spot::Inside(x) => {
                let above = self.xs.partition_point(|station| *station < x);
                [above.checked_sub(1), Some(above)]
                    .into_iter()
                    .flatten()
                    .filter(|&index| index < self.xs.len())
                    .min_by(|&a, &b| (self.xs[a] - x).abs().total_cmp(&(self.xs[b] - x).abs()))
            }
        }
    }

    /// The stations at a segment's ends, once the member is cut.
    pub(super) fn ends_of(&self, segment: usize) -> Option<(usize, usize)> {
        let start = self.station_of_bound.get(segment)?;
        let end = self.station_of_bound.get(segment + 1)?;
        Some((*start, *end))
    }

    /// The distance of a bound.
    pub(super) fn bound(&self, index: usize) -> Length {
        let bounds = self.bounds.as_ref();
        from_si(
            bounds
                .and_then(|b| b.get(index))
                .copied()
                .unwrap_or_default(),
        )
    }
}

/// The length of a segment in metres; `None` where it is at fault.
fn length_in(segment: &WrittenSegment<'_>, rest: Option<f64>) -> Option<f64> {
    match segment.length.given()?.value {
        Extent::Length(length) => Some(length.value),
        Extent::Rest => rest,
    }
}

/// Why a station is not there.
enum Fault<'t> {
    NoSegment(&'t str),
    Outside(f64),
    InGap(usize),
    /// A length is at fault.
    Unknown,
}

/// How a station was written, for names.
pub(super) fn as_written(station: &WrittenStation<'_>) -> Name {
    match station {
        WrittenStation::Start => Name::from("start"),
        WrittenStation::End => Name::from("end"),
        WrittenStation::StartOf(segment) => Name::from(format!("{segment}.start")),
        WrittenStation::EndOf(segment) => Name::from(format!("{segment}.end")),
        WrittenStation::Distance(_, text) => Name::from(*text),
    }
}

/// A place that stands for a whole entry: the name where there is one.
pub(super) fn place_of<'e>(name: &'e Entry<&str>, table: &'e Place) -> &'e Place {
    name.given().map_or(table, |written| &written.place)
}
