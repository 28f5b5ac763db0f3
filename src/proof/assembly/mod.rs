//! Points, bodies, holds and the members between points, put back into their equations together.

mod between;
mod body;
mod hinges;
mod hold;
mod loads;
mod one_way;
mod space;

use super::residual::{Residual, Size, Work};
use crate::model::{Assembly, Combination, Model, Spatial};
use crate::quantity::{Energy, Force, Length, Moment};
use crate::result::{CombinationResult, Residuals};
use between::Looked;
use loads::{Loads, Sized};
use space::{difference, moment, size, sum, work, work_of_moment};

/// The share at which terms that may merely have cancelled count among the sizes: stiffness times
/// displacement beside the forces that it leaves, the movement of a whole beside that of its parts.
/// Forces that are nothing but the rounding of such terms so stay 10⁻¹² beside them, and a force is
/// still held to its own size where it is only a ten-thousandth of them.
const SHARE: f64 = 1e-4;

/// The residuals of everything between points: the members there, points, bodies and holds of one
/// combination. 0 in a job without points; members with supports of their own prove themselves by
/// [`super::member`].
///
/// * equilibrium: along every member, at every free point, of every body in force and moment about
///   its middle (bodies that share points need some forces between them under which all of them
///   rest), and of the whole; reactions against the directions of their holds; no tie pushes, no
///   stop pulls; totals.
/// * compatibility: integrated strains against the movement of the members' points, points against
///   their bodies, holds and stops, and the distance of a slack member from being taut.
/// * energy: the work of all loads and reactions against the internal work of all members
///   (Clapeyron).
///
/// Reactions that nothing decides are looked at as they stand in the result, so that they must be
/// the ones that close; a result that lacks a part is not proven. The cost grows with the number of
/// parts alone, bodies that share points apart, whose forces are found by sparse elimination.
pub fn assembly(model: &Model, combination: &Combination, result: &CombinationResult) -> Residuals {
    let Some(assembly) = &model.assembly else {
        return Residuals::default();
    };
    if !is_whole(model, assembly, combination, result) {
        return Residuals {
            equilibrium: f64::INFINITY,
            compatibility: f64::INFINITY,
            energy: f64::INFINITY,
        };
    }
    let mut together = Together::of(assembly, combination, result);
    together.members(model, combination);
    together.reactions();
    together.weigh();
    together.holds();
    together.bodies_move();
    together.free_points();
    together.bodies_rest();
    together.rests_as_a_whole();
    together.totals();
    let mut energy = Residual::default();
    energy.take(together.energy().left());
    Residuals {
        equilibrium: together.equilibrium.largest(),
        compatibility: together.compatibility.largest(),
        energy: energy.largest(),
    }
}

/// Whether the result has every part, with an entry for every coordinate.
fn is_whole(
    model: &Model,
    assembly: &Assembly,
    combination: &Combination,
    result: &CombinationResult,
) -> bool {
    let entries = assembly.coordinates;
    let held: usize = assembly.holds.iter().map(|hold| hold.points.len()).sum();
    let full = |list: &Option<Vec<Force>>| list.as_ref().is_none_or(|list| list.len() == entries);
    result.members.len() + combination.without.len() == model.members.len()
        && result.points.len() == assembly.points.len()
        && result.bodies.len() == assembly.bodies.len()
        && result.holds.len() == held
        && result
            .points
            .iter()
            .all(|point| point.displacement.len() == entries && full(&point.reaction))
        && result
            .bodies
            .iter()
            .all(|body| body.displacement.len() == entries)
        && result.holds.iter().all(|hold| full(&hold.reaction))
        && result.totals.as_ref().is_some_and(|totals| {
            totals.applied.len() == entries && totals.reactions.len() == entries
        })
}

/// The entries of a list, and 0 for the coordinates that a job does not have.
fn spatial<Q: Copy + Default>(list: &[Q]) -> Spatial<Q> {
    std::array::from_fn(|axis| list.get(axis).copied().unwrap_or_default())
}

/// What meets at a point.
#[derive(Debug, Clone, Copy, Default)]
struct AtPoint {
    /// Loads that act there from outside, those of members by the lever rule among them.
    load: Sized,
    /// What its holds put on it.
    reaction: Sized,
    /// What its members put on it along their axes.
    pull: Sized,
    /// Stiffness times displacement of its members and springs.
    elastic: Force,
    /// The size against which forces there are held.
    size: Force,
    held: bool,
}

impl AtPoint {
    fn force(&self) -> Spatial<Force> {
        sum(sum(self.load.force, self.reaction.force), self.pull.force)
    }

    fn sizes(&self) -> Force {
        self.load.size + self.reaction.size + self.pull.size
    }
}

/// An assembly with its result and what it leaves over.
struct Together<'p> {
    assembly: &'p Assembly,
    result: &'p CombinationResult,
    loads: Loads,
    points: Vec<AtPoint>,
    /// How every point moves.
    moves: Vec<Spatial<Length>>,
    /// The share of the largest movement that counts beside every other.
    slight_move: Length,
    /// The same of forces.
    slight_force: Force,
    /// The loads along members, each at the point where its member starts.
    carried: Vec<(usize, Sized)>,
    /// Work of members and bodies.
    work: Work,
    equilibrium: Residual,
    compatibility: Residual,
}

impl<'p> Together<'p> {
    fn of(
        assembly: &'p Assembly,
        combination: &Combination,
        result: &'p CombinationResult,
    ) -> Self {
        let loads = Loads::on(assembly, combination);
        let at_point = |&load: &Sized| AtPoint {
            load,
            ..AtPoint::default()
        };
        let moves: Vec<_> = result
            .points
            .iter()
            .map(|point| spatial(&point.displacement))
            .collect();
        let bodies = result.bodies.iter().map(|body| spatial(&body.displacement));
        let largest = moves
            .iter()
            .copied()
            .chain(bodies)
            .fold(Length::default(), |most, by| most.max(size(&by)));
        Together {
            assembly,
            result,
            points: loads.points.iter().map(at_point).collect(),
            loads,
            moves,
            slight_move: largest * SHARE,
            slight_force: Force::default(),
            carried: Vec::new(),
            work: Work::default(),
            equilibrium: Residual::default(),
            compatibility: Residual::default(),
        }
    }

    /// Every member by itself, and what it puts on its points.
    fn members(&mut self, model: &Model, combination: &Combination) {
        for (index, member) in model.members.iter().enumerate() {
            let (Some(between), Some(position)) = (&member.between, combination.position(index))
            else {
                continue;
            };
            let moves = [&self.moves[between.start], &self.moves[between.end]];
            let looked = Looked::at(
                model,
                combination,
                (member, between),
                &self.result.members[position],
                (moves, self.slight_move),
            );
            for end in 0..2 {
                let point = &mut self.points[looked.points[end]];
                point.load.add(looked.lever[end]);
                point.pull.force = sum(point.pull.force, looked.pull[end]);
                point.pull.size += looked.size;
                point.elastic += looked.elastic;
            }
            let carried = Sized {
                force: looked.carried,
                size: looked.load_size,
            };
            self.carried.push((between.start, carried));
            self.work = self.work.and(looked.work);
            self.work
                .add(Energy::default(), looked.elastic * looked.stretch * SHARE);
            self.equilibrium.take(looked.equilibrium.largest());
            self.compatibility.take(looked.compatibility.largest());
        }
    }

    /// Finds the size against which forces are held at every point.
    fn weigh(&mut self) {
        let bodies = self.loads.bodies.iter().map(|body| body.force.size);
        let points = self.points.iter().map(AtPoint::sizes);
        let largest = points.chain(bodies).fold(Force::default(), Force::max);
        self.slight_force = largest * SHARE;
        for point in &mut self.points {
            point.size = point.sizes() + point.elastic * SHARE + self.slight_force;
        }
    }

    /// All that meets at a point which no body carries must cancel.
    fn free_points(&mut self) {
        let mut free = vec![true; self.points.len()];
        for &point in self.assembly.bodies.iter().flat_map(|body| &body.points) {
            free[point] = false;
        }
        for (point, free) in self.points.iter().zip(free) {
            if free {
                self.equilibrium.take(size(&point.force()).over(point.size));
            }
        }
    }

    /// All loads against all reactions, in force and in moment about the middle of all points.
    fn rests_as_a_whole(&mut self) {
        let at = |point: usize| self.assembly.points[point].at;
        let middle = body::middle(self.assembly.points.iter().map(|point| point.at));
        let (mut force, mut turning) = (Spatial::<Force>::default(), Spatial::<Moment>::default());
        let (mut sizes, mut reach) = (self.slight_force, Length::default());
        let mut turning_size = Moment::default();
        let mut take = |place: Spatial<Length>, acting: Spatial<Force>, acting_size: Force| {
            let arm = difference(place, middle);
            force = sum(force, acting);
            turning = sum(turning, moment(&arm, &acting));
            sizes += acting_size;
            reach = reach.max(size(&arm));
        };
        for (index, point) in self.points.iter().enumerate() {
            let acting = sum(point.load.force, point.reaction.force);
            let mut acting_size = point.load.size + point.reaction.size;
            if point.held {
                acting_size += point.elastic * SHARE;
            }
            take(at(index), acting, acting_size);
        }
        for (start, carried) in &self.carried {
            take(at(*start), carried.force, carried.size);
        }
        for (body, on) in self.assembly.bodies.iter().zip(&self.loads.bodies) {
            take(body.centre.unwrap_or(middle), on.force.force, on.force.size);
        }
        for on in &self.loads.bodies {
            turning = sum(turning, on.moment);
            turning_size += on.moment_size;
        }
        self.equilibrium.take(size(&force).over(sizes));
        if self.assembly.coordinates > 1 {
            let sizes = body::moment_of(reach, sizes) + turning_size;
            self.equilibrium.take(size(&turning).over(sizes));
        }
    }

    /// The totals that the result gives against the loads and the reactions.
    fn totals(&mut self) {
        let Some(totals) = &self.result.totals else {
            return;
        };
        let (mut applied, mut reactions) = (Sized::default(), Sized::default());
        let mut take = |load: &Sized| {
            applied.force = sum(applied.force, load.force);
            applied.size += load.size;
        };
        self.points.iter().for_each(|point| take(&point.load));
        self.carried.iter().for_each(|(_, carried)| take(carried));
        self.loads.bodies.iter().for_each(|body| take(&body.force));
        for point in &self.points {
            reactions.force = sum(reactions.force, point.reaction.force);
            reactions.size += point.reaction.size;
        }
        for (named, found) in [
            (spatial(&totals.applied), applied),
            (spatial(&totals.reactions), reactions),
        ] {
            self.equilibrium
                .take(size(&difference(named, found.force)).over(size(&named) + found.size));
        }
    }

    /// The work of everything from outside less the internal work.
    fn energy(&self) -> Work {
        let mut all = self.work;
        for (point, by) in self.points.iter().zip(&self.moves) {
            let (done, sizes) = work(&sum(point.load.force, point.reaction.force), by);
            all.add(done, sizes + point.size * size(by));
        }
        let bodies = self.assembly.bodies.iter().zip(&self.loads.bodies);
        for ((body, on), result) in bodies.zip(&self.result.bodies) {
            let rotation = result.rotation.spatial();
            let by = self.moved(body, &spatial(&result.displacement), &rotation);
            let (done, sizes) = work(&on.force.force, &by);
            all.add(done, sizes);
            let (done, sizes) = work_of_moment(&on.moment, &rotation);
            all.add(done, sizes);
        }
        all
    }
}
