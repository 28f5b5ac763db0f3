//! An assembly in one state as one dense linear system, and the enumeration of all its states.
//!
//! The unknowns are the displacements of points, the axial displacements of the stations inside
//! members, the axial force at the start of every element, the force of every hold in each of its
//! directions, and one multiplier for every equation of a stiff body. The equations are the
//! balance of points and stations, the stretch of elements and holds, and the equations of bodies.

use super::assembly::{Assembly, Hold, HoldKind, Vector, Way, dot, plus, scaled, size};
use super::elements::Bar;
use super::numbers::{refined, solved};
use super::stiff::Stiff;
use nalgebra::DVector;

/// What acts one way.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum Contact {
    Member(usize),
    /// The only gap of a member.
    Gap(usize),
    Stop(usize),
}

/// An assembly in one state.
pub(crate) struct State {
    pub(crate) displacement: Vec<Vector>,
    /// Of each member: N at the start of each element, and the displacement of each station along
    /// the axis.
    pub(crate) force: Vec<Vec<f64>>,
    pub(crate) station: Vec<Vec<f64>>,
    /// What each hold puts on its point.
    pub(crate) reaction: Vec<Vector>,
    /// Of each body.
    pub(crate) rotation: Vec<Vec<f64>>,
    /// What bears, is taut or closed, in the order of [`System::contacts`]; and what remains to that.
    pub(crate) acts: Vec<bool>,
    pub(crate) clearance: Vec<f64>,
}

pub(crate) enum Found {
    One(Box<State>),
    /// No state is in balance without a push of a tie or an overlap.
    None,
    /// Rounding decides: something touches, or the equations have no clear solution.
    Unclear,
}

/// Below this share of the largest force or length a contact touches.
const TOUCH: f64 = 1e-8;

pub(crate) struct System<'a> {
    pub(crate) assembly: &'a Assembly,
    pub(crate) bars: Vec<Bar>,
    pub(crate) contacts: Vec<Contact>,
    pub(super) stiff: Vec<Stiff>,
    pub(super) at: Layout,
    /// A force that stretches the softest part by 1 m: it brings all equations to one size.
    pub(super) unit: f64,
}

/// Where the unknowns stand.
pub(super) struct Layout {
    /// Of each member: its stations inside, then its forces.
    pub(super) members: Vec<usize>,
    pub(super) holds: Vec<usize>,
    pub(super) bodies: Vec<usize>,
    pub(super) count: usize,
}

impl<'a> System<'a> {
    pub(crate) fn of(assembly: &'a Assembly) -> Self {
        let bars: Vec<Bar> = assembly
            .members
            .iter()
            .map(|m| Bar::of(assembly, m))
            .collect();
        let stiff: Vec<Stiff> = assembly
            .bodies
            .iter()
            .map(|b| Stiff::of(assembly, b))
            .collect();
        let mut count = assembly.points.len() * assembly.coordinates;
        let mut next = |size: usize| {
            count += size;
            count - size
        };
        let at = Layout {
            members: bars
                .iter()
                .map(|b| next(2 * b.elements.len() - 1))
                .collect(),
            holds: assembly.holds.iter().map(|h| next(h.along.len())).collect(),
            bodies: stiff.iter().map(|s| next(s.equations.nrows())).collect(),
            count,
        };
        let mut contacts = Vec::new();
        for (i, member) in assembly.members.iter().enumerate() {
            if member.carries.is_some() {
                contacts.push(Contact::Member(i));
            }
            if bars[i].elements.iter().any(|e| e.gap.is_some()) {
                contacts.push(Contact::Gap(i));
            }
        }
        for (i, hold) in assembly.holds.iter().enumerate() {
            if matches!(hold.kind, HoldKind::Stop { .. }) {
                contacts.push(Contact::Stop(i));
            }
        }
        let softest = bars
            .iter()
            .flat_map(|b| &b.elements)
            .map(|e| e.flexibility)
            .fold(1e-12, f64::max);
        System {
            assembly,
            bars,
            contacts,
            stiff,
            at,
            unit: 1.0 / softest,
        }
    }

    /// The one state in balance, from all that are possible.
    pub(crate) fn enumerate(&self) -> Found {
        if self.stiff.iter().any(|s| !s.takes_its_loads) {
            return Found::None;
        }
        let mut found = None;
        for mask in 0..1u32 << self.contacts.len() {
            let acts: Vec<bool> = (0..self.contacts.len())
                .map(|c| mask >> c & 1 == 1)
                .collect();
            if self.is_clearly_wrong(&acts) {
                continue;
            }
            match self.state(&acts) {
                Some((_, clear)) if clear.abs() < TOUCH => return Found::Unclear,
                Some((state, clear)) if clear > 0.0 => {
                    assert!(found.is_none(), "two states\n{}", self.assembly.job());
                    found = Some(state);
                }
                _ => {}
            }
        }
        found.map_or(Found::None, |state| Found::One(Box::new(state)))
    }

    /// A state, and how clearly it holds: the least of all forces and openings as shares of the
    /// largest, negative where one is of the wrong sign. `None` where it has no single solution.
    pub(crate) fn state(&self, acts: &[bool]) -> Option<(State, f64)> {
        let (a, b) = self.equations(acts);
        let x = refined(&a, &b)?;
        let state = self.read(&x, acts);
        let clear = self.clearly(&state, acts);
        Some((state, clear))
    }

    /// Whether rounding cannot make this state the right one; seen without refinement.
    fn is_clearly_wrong(&self, acts: &[bool]) -> bool {
        let (a, b) = self.equations(acts);
        let Some(x) = solved(&a, &b) else {
            return true;
        };
        self.clearly(&self.read(&x, acts), acts) < -1e-4
    }

    pub(super) fn acts(&self, acts: &[bool], contact: Contact) -> bool {
        let index = self.contacts.iter().position(|&c| c == contact);
        index.is_none_or(|i| acts[i])
    }

    pub(super) fn point(&self, point: usize, axis: usize) -> usize {
        point * self.assembly.coordinates + axis
    }

    fn read(&self, x: &DVector<f64>, acts: &[bool]) -> State {
        let dim = self.assembly.coordinates;
        let displacement: Vec<Vector> = (0..self.assembly.points.len())
            .map(|p| std::array::from_fn(|axis| if axis < dim { x[p * dim + axis] } else { 0.0 }))
            .collect();
        let mut force = Vec::new();
        let mut station = Vec::new();
        for (i, bar) in self.bars.iter().enumerate() {
            let inside = bar.elements.len() - 1;
            let at = self.at.members[i];
            force.push(
                (0..=inside)
                    .map(|e| x[at + inside + e] * self.unit)
                    .collect(),
            );
            let [start, end] = self.assembly.members[i]
                .ends
                .map(|p| dot(displacement[p], bar.axis));
            let mut moved = vec![start];
            moved.extend((0..inside).map(|s| x[at + s]));
            moved.push(end);
            station.push(moved);
        }
        let reaction = |(hold, &at): (&Hold, &usize)| {
            directions(hold)
                .enumerate()
                .fold([0.0; 3], |sum, (d, direction)| {
                    plus(sum, scaled(direction, x[at + d] * self.unit))
                })
        };
        let rotation = |(i, stiff): (usize, &Stiff)| {
            let points = self.assembly.bodies[i].points.iter();
            let moved = points.flat_map(|&p| displacement[p][..dim].to_vec());
            let moved = DVector::from_iterator(stiff.equations.ncols(), moved);
            (&stiff.rotation * moved).iter().copied().collect()
        };
        let mut state = State {
            reaction: self
                .assembly
                .holds
                .iter()
                .zip(&self.at.holds)
                .map(reaction)
                .collect(),
            rotation: self.stiff.iter().enumerate().map(rotation).collect(),
            displacement,
            force,
            station,
            acts: acts.to_vec(),
            clearance: Vec::new(),
        };
        let clearance = |(&contact, &acts): (&Contact, &bool)| match acts {
            true => 0.0,
            false => self.opening(&state, contact),
        };
        let clearances = self.contacts.iter().zip(acts).map(clearance).collect();
        state.clearance = clearances;
        state
    }

    /// How far a contact is from acting, in a state in which it does not.
    fn opening(&self, state: &State, contact: Contact) -> f64 {
        match contact {
            Contact::Member(i) => {
                let stations = &state.station[i];
                let stretch = stations[stations.len() - 1] - stations[0];
                match self.assembly.members[i].carries {
                    Some(Way::Compression) => stretch - self.bars[i].rest(),
                    _ => self.bars[i].rest() - stretch,
                }
            }
            Contact::Gap(i) => {
                let e = self.gap_element(i);
                let width = self.bars[i].elements[e].gap.unwrap_or(0.0);
                width + state.station[i][e + 1] - state.station[i][e]
            }
            Contact::Stop(i) => {
                let hold = &self.assembly.holds[i];
                let HoldKind::Stop { clearance, .. } = hold.kind else {
                    return 0.0;
                };
                let direction = directions(hold).next().unwrap_or_default();
                clearance + dot(direction, hold.movement)
                    - dot(direction, state.displacement[hold.point])
            }
        }
    }

    /// The element of a member that is its gap.
    pub(crate) fn gap_element(&self, member: usize) -> usize {
        let elements = &self.bars[member].elements;
        elements
            .iter()
            .position(|e| e.gap.is_some())
            .expect("it has a gap")
    }

    /// The force of a contact that acts, positive where it is of the right sign.
    fn bearing(&self, state: &State, contact: Contact) -> f64 {
        match contact {
            Contact::Member(i) => {
                let between = state.force[i][0] - self.bars[i].lumped_at_start();
                match self.assembly.members[i].carries {
                    Some(Way::Compression) => -between,
                    _ => between,
                }
            }
            Contact::Gap(i) => -state.force[i][self.gap_element(i)],
            Contact::Stop(i) => {
                let direction = directions(&self.assembly.holds[i])
                    .next()
                    .unwrap_or_default();
                -dot(state.reaction[i], direction)
            }
        }
    }

    fn clearly(&self, state: &State, acts: &[bool]) -> f64 {
        let (length, force) = (self.largest_length(state), self.largest_force(state));
        let one = |(&contact, &acts): (&Contact, &bool)| match acts {
            true => self.bearing(state, contact) / force,
            false => self.opening(state, contact) / length,
        };
        self.contacts.iter().zip(acts).map(one).fold(1.0, f64::min)
    }

    /// The largest displacement, growth or opening.
    pub(crate) fn largest_length(&self, state: &State) -> f64 {
        let moved = state.displacement.iter().map(|&u| size(u));
        let stations = state.station.iter().flatten().copied();
        let growth = self.bars.iter().flat_map(|b| &b.elements).map(|e| e.growth);
        let open = state.clearance.iter().copied();
        let all = moved.chain(stations).chain(growth).chain(open);
        all.fold(1e-30, |most, v| most.max(v.abs()))
    }

    /// The largest force in a member or hold.
    pub(crate) fn largest_force(&self, state: &State) -> f64 {
        let holds = state.reaction.iter().map(|&r| size(r));
        let all = state.force.iter().flatten().copied().chain(holds);
        all.fold(1e-30, |most, v| most.max(v.abs()))
    }
}

/// The directions of a hold, of unit length.
pub(crate) fn directions(hold: &Hold) -> impl Iterator<Item = Vector> {
    hold.along.iter().map(|&d| scaled(d, 1.0 / size(d)))
}
