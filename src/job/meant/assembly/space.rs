//! Where points lie, and which way is up.

use super::span::Span;
use crate::job::meant::Meaning;
use crate::job::meant::forces::Sloped;
use crate::job::meant::members::Whole;
use crate::job::written::assembly::entries::{Entries, counted};
use crate::job::written::{Entry, Job, Reader};
use crate::model::{Place, Spatial};
use crate::quantity::{Angle, Length};

/// Angles whose sines differ by less say the same.
const SAME: f64 = 1e-9;

/// The space of a job's points.
pub(crate) struct Space {
    /// The number of coordinates; `None` where no point has sound ones.
    pub(super) coordinates: Option<usize>,
    /// Where each point of the file lies; `None` where that is at fault.
    pub(super) at: Vec<Option<Spatial<Length>>>,
    /// In one coordinate, which way is up; in more the coordinates tell.
    pub(in crate::job::meant) up: Up,
}

/// What a job in one coordinate says of up.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Up {
    Unsaid,
    /// It is at fault.
    Wrong,
    /// The angle above level of the direction in which x grows.
    Said(Angle),
}

impl Space {
    /// The points of a job, all with the number of coordinates of the first.
    pub(in crate::job::meant) fn of(job: &Job<'_>, r: &mut Reader<'_>) -> Self {
        let points = &job.assembly.points;
        let first = points
            .iter()
            .find_map(|point| Some((point, point.at.as_ref()?)));
        let Some((first, first_at)) = first else {
            return Space {
                coordinates: None,
                at: vec![None; points.len()],
                up: Up::Unsaid,
            };
        };
        let coordinates = first_at.value.count;
        let mut at = Vec::with_capacity(points.len());
        for point in points {
            let Some(written) = &point.at else {
                at.push(None);
                continue;
            };
            let fits = written.value.count == coordinates;
            if !fits {
                let message = format!(
                    "the point `{}` has {}, and `{}` has {}",
                    point.name.value,
                    counted(written.value.count),
                    first.name.value,
                    counted(coordinates)
                );
                let help = "write the same number of coordinates for all points of a job";
                r.problems.say(&written.place, message, help);
            }
            at.push(fits.then_some(written.value.values));
        }
        Space {
            coordinates: Some(coordinates),
            at,
            up: Up::Unsaid,
        }
    }

    /// The sine of the angle above level of a direction; 0 where nothing says it.
    pub(in crate::job::meant) fn rise(&self, direction: &Spatial<f64>) -> f64 {
        match self.coordinates {
            Some(1) => match self.up {
                Up::Said(angle) => direction[0] * angle.value.sin() + 0.0, // no −0
                Up::Unsaid | Up::Wrong => 0.0,
            },
            Some(2) => direction[1],
            _ => direction[2],
        }
    }

    /// The angle above level of a direction in one coordinate, where it is said.
    pub(in crate::job::meant) fn runs(&self, direction: &Spatial<f64>) -> Option<Angle> {
        match (self.coordinates, self.up) {
            (Some(1), Up::Said(angle)) => Some(angle * direction[0]),
            _ => None,
        }
    }

    /// The unit vector along which weight acts; 0 where nothing says it.
    pub(super) fn down(&self) -> Spatial<f64> {
        match self.coordinates {
            Some(1) => [0.0 - self.rise(&[1.0, 0.0, 0.0]), 0.0, 0.0],
            Some(2) => [0.0, -1.0, 0.0],
            _ => [0.0, 0.0, -1.0],
        }
    }
}

impl Meaning<'_, '_> {
    /// One entry for each coordinate; reports too many and too few.
    pub(super) fn spatial<Q: Copy>(
        &mut self,
        entries: &Entries<Q>,
        place: &Place,
    ) -> Option<Spatial<Q>> {
        let coordinates = self.space.coordinates?;
        if entries.count == coordinates {
            return Some(entries.values);
        }
        let message = format!(
            "here are entries for {}, and the points of this job have {}",
            counted(entries.count),
            counted(coordinates)
        );
        let help = "write one entry for each coordinate";
        self.r.problems.say(place, message, help);
        None
    }

    /// The parts of a unit weight along the axis of a member between points and across it. Reports
    /// where nothing says which way is up.
    pub(in crate::job::meant) fn sloped(
        &mut self,
        whole: &Whole<'_, '_>,
        direction: &Spatial<f64>,
    ) -> Option<Sloped> {
        let along = -self.space.rise(direction);
        let across = match (self.space.coordinates?, self.space.up) {
            (1, Up::Said(angle)) => return Some(Sloped::of(angle * direction[0])),
            (1, Up::Wrong) => return None,
            (1, Up::Unsaid) => {
                let message = format!(
                    "the member `{}` needs `runs`, since weight acts on it",
                    whole.name.value
                );
                self.needs_up(message, whole.place);
                return None;
            }
            (2, _) => direction[0].abs(),
            _ => direction[0].hypot(direction[1]),
        };
        Some(Sloped { along, across })
    }
}

/// What a job in one coordinate says of up: `runs` of `[default]` of the direction in which x grows,
/// that of a member of the direction from its start to its end. Reports where two disagree.
pub(in crate::job::meant) fn up(
    wholes: &[Whole<'_, '_>],
    spans: &[Span],
    meaning: &mut Meaning<'_, '_>,
) -> Up {
    if meaning.space.coordinates != Some(1) {
        return Up::Unsaid;
    }
    let mut said: Vec<(&Place, Angle)> = Vec::new();
    let mut wrong = false;
    let mut hear = |runs: &'_ Entry<Angle>, sign: f64| match runs {
        Entry::Given(runs) => Some(runs.value * sign),
        Entry::Wrong => {
            wrong = true;
            None
        }
        Entry::Absent => None,
    };
    let default = &meaning.job.default.runs;
    let of_default = hear(default, 1.0);
    said.extend(
        default
            .given()
            .zip(of_default)
            .map(|(runs, angle)| (&runs.place, angle)),
    );
    for (whole, span) in wholes.iter().zip(spans) {
        if let Span::Given(reach) = span
            && let Some(angle) = hear(whole.runs, reach.direction[0])
            && let Some(runs) = whole.runs.given()
        {
            said.push((&runs.place, angle));
        }
    }
    said.sort_by_key(|(place, _)| place.start);
    let Some(&(first, angle)) = said.first() else {
        return if wrong { Up::Wrong } else { Up::Unsaid };
    };
    for (place, other) in said {
        if (other.value.sin() - angle.value.sin()).abs() > SAME {
            let line = meaning.line(first.start);
            let message = format!("this and line {line} disagree on which way is up");
            let help = "`runs` in `[default]` is the direction in which x grows, `runs` in a member \
                        that from its start to its end";
            meaning.r.problems.say(place, message, help);
            wrong = true;
        }
    }
    if wrong { Up::Wrong } else { Up::Said(angle) }
}
