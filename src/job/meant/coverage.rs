//! Which of several actions of one case counts at a place: the narrowest.

use super::Meaning;
use crate::model::{Place, Segment, SegmentKind};

/// What an action covers, from wide to narrow.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub(super) enum On {
    /// Every member: it stands in the case.
    Case,
    /// This member.
    Member,
    /// A segment.
    Segment(usize),
    /// A layer of a segment.
    Layer(usize, usize),
}

impl On {
    /// 0 for the widest.
    fn width(self) -> u8 {
        match self {
            On::Case => 0,
            On::Member => 1,
            On::Segment(_) => 2,
            On::Layer(..) => 3,
        }
    }
}

/// An action of a case with what it covers.
#[derive(Debug, Clone)]
pub(super) struct Cover<V> {
    pub(super) case: usize,
    pub(super) on: On,
    pub(super) value: V,
    pub(super) place: Place,
}

/// The layers of a member in one row; a part known by its stiffness counts as one, a gap as none.
pub(super) struct Cells {
    /// The first of each segment, and the number of all.
    first: Vec<usize>,
}

impl Cells {
    pub(super) fn of(segments: &[Segment]) -> Self {
        let mut first = Vec::with_capacity(segments.len() + 1);
        let mut count = 0;
        first.push(count);
        for segment in segments {
            count += match &segment.kind {
                SegmentKind::Solid { layers, .. } => layers.len(),
                SegmentKind::Stiffness(_) => 1,
                SegmentKind::Gap(_) => 0,
            };
            first.push(count);
        }
        Cells { first }
    }

    fn count(&self) -> usize {
        self.first.last().copied().unwrap_or(0)
    }

    fn covered(&self, on: On) -> std::ops::Range<usize> {
        match on {
            On::Case | On::Member => 0..self.count(),
            On::Segment(segment) => self.first[segment]..self.first[segment + 1],
            On::Layer(segment, layer) => {
                let cell = self.first[segment] + layer;
                cell..cell + 1
            }
        }
    }

    /// Every segment and layer that an action covers.
    pub(super) fn each(&self, on: On) -> impl Iterator<Item = (usize, usize)> {
        let segments = match on {
            On::Case | On::Member => 0..self.first.len() - 1,
            On::Segment(segment) | On::Layer(segment, _) => segment..segment + 1,
        };
        let only = match on {
            On::Layer(_, layer) => Some(layer),
            _ => None,
        };
        segments.flat_map(move |segment| {
            let layers = self.first[segment + 1] - self.first[segment];
            let layers = only.map_or(0..layers, |layer| layer..layer + 1);
            layers.map(move |layer| (segment, layer))
        })
    }
}

/// Calls `place` with the action that counts, for each case and each layer that one covers. Two of
/// one width for one layer in one case are reported as two `what`.
pub(super) fn narrowest<V>(
    covers: &mut [Cover<V>],
    cells: &Cells,
    what: &str,
    meaning: &mut Meaning<'_, '_>,
    mut place: impl FnMut(&Cover<V>, usize, usize, &mut Meaning<'_, '_>),
) {
    covers.sort_by_key(|cover| (cover.case, cover.on.width())); // stable: file order within
    for of_case in covers.chunk_by(|a, b| a.case == b.case) {
        if let [only] = of_case {
            for (segment, layer) in cells.each(only.on) {
                place(only, segment, layer, meaning);
            }
            continue;
        }
        let mut best: Vec<Option<usize>> = vec![None; cells.count()];
        for (index, cover) in of_case.iter().enumerate() {
            let mut clash = None;
            for cell in &mut best[cells.covered(cover.on)] {
                if let Some(other) = cell.replace(index)
                    && of_case[other].on.width() == cover.on.width()
                {
                    clash = Some(other);
                }
            }
            if let Some(other) = clash {
                twice(&of_case[other], cover, what, meaning);
            }
        }
        for (segment, layer) in cells.each(On::Member) {
            if let Some(index) = best[cells.first[segment] + layer] {
                place(&of_case[index], segment, layer, meaning);
            }
        }
    }
}

fn twice<V>(first: &Cover<V>, second: &Cover<V>, what: &str, meaning: &mut Meaning<'_, '_>) {
    let (first, second) = if first.place.start <= second.place.start {
        (first, second)
    } else {
        (second, first)
    };
    let line = meaning.line(first.place.start);
    let case = meaning.job.cases.get(second.case);
    let of_case = case.map_or(String::new(), |case| {
        format!(" of the case `{}`", case.name.value)
    });
    let message = format!("two {what}{of_case} act on one place, the other in line {line}");
    let help = "keep one; the narrower of two wins only where they are of different width \
                (layer, segment, member, case)";
    meaning.r.problems.say(&second.place, message, help);
}
