//! Assemblies drawn for tests: members from a job's text, points and all else put beside them.

use crate::model::{
    Assembly, Between, Body, Carries, ForceOnBody, ForceOnPoint, Hold, HoldKind, Model,
    MomentOnBody, MovementOfHold, Name, Point, Spatial, WeightOfBody,
};
use crate::quantity::{Length, Style, from_si};
use crate::result::{CombinationResult, Residuals};
use crate::solve::{AssemblySolution, PreparedAssembly, SolveError};

/// A model whose members have no supports, with an assembly around them.
pub(super) struct Drawn {
    pub(super) model: Model,
    pub(super) assembly: Assembly,
}

pub(super) const X: Spatial<f64> = [1.0, 0.0, 0.0];
pub(super) const Y: Spatial<f64> = [0.0, 1.0, 0.0];
pub(super) const Z: Spatial<f64> = [0.0, 0.0, 1.0];

/// A member known by its stiffness.
pub(super) fn bar(name: &str, length: &str, stiffness: &str, more: &str) -> String {
    format!(
        "[member.{name}]\nruns = \"level\"\nsegment = [{{ length = \"{length}\", stiffness = \"{stiffness}\" }}]\n{more}\n"
    )
}

pub(super) fn drawn(coordinates: usize, text: &str) -> Drawn {
    let model = match crate::job::read(text) {
        Ok(model) => model,
        Err(problems) => panic!("{problems:#?}"),
    };
    let mut down = [0.0; 3];
    if coordinates > 1 {
        down[coordinates - 1] = -1.0;
    }
    Drawn {
        model,
        assembly: Assembly {
            coordinates,
            down,
            ..Assembly::default()
        },
    }
}

impl Drawn {
    pub(super) fn point(mut self, name: &str, at: Spatial<f64>) -> Self {
        self.assembly.points.push(Point {
            name: name.into(),
            place: 0..0,
            at: at.map(from_si),
        });
        self
    }

    pub(super) fn find(&self, point: &str) -> usize {
        let found = self.assembly.points.iter().position(|p| &*p.name == point);
        found.expect("a point that was drawn")
    }

    pub(super) fn body(mut self, name: &str, points: &[&str]) -> Self {
        let points = points.iter().map(|point| self.find(point)).collect();
        self.assembly.bodies.push(Body {
            name: name.into(),
            place: 1..1,
            points,
            mass: None,
            centre: None,
        });
        self
    }

    pub(super) fn mass(mut self, mass: f64, centre: Spatial<f64>) -> Self {
        let index = self.assembly.bodies.len() - 1;
        let body = &mut self.assembly.bodies[index];
        body.mass = Some(from_si(mass));
        body.centre = Some(centre.map(from_si));
        self.assembly.actions.weights.push(WeightOfBody {
            case: 0,
            body: index,
            number: 1.0,
        });
        self
    }

    /// Puts a member between two points.
    pub(super) fn tie(mut self, member: &str, start: &str, end: &str) -> Self {
        let (start, end) = (self.find(start), self.find(end));
        let [from, to] = [start, end].map(|point| self.assembly.points[point].at);
        let apart: Spatial<Length> = std::array::from_fn(|k| to[k] - from[k]);
        let length = apart
            .iter()
            .map(|entry| entry.value.powi(2))
            .sum::<f64>()
            .sqrt();
        let direction = apart.map(|entry| entry.value / length);
        let up: f64 = (0..3).map(|k| -self.assembly.down[k] * direction[k]).sum();
        let mut members = self.model.members.iter_mut();
        let member = members
            .find(|m| &*m.name == member)
            .expect("a member of the text");
        assert!(
            (member.length().value - length).abs() <= 1e-9 * length,
            "length of {}",
            member.name
        );
        member.runs = None;
        member.between = Some(Between {
            start,
            end,
            direction,
            rise: up,
        });
        self
    }

    pub(super) fn carries(mut self, member: &str, carries: Carries) -> Self {
        let mut members = self.model.members.iter_mut();
        let member = members
            .find(|m| &*m.name == member)
            .expect("a member of the text");
        member.carries = Some(carries);
        self
    }

    pub(super) fn hold(mut self, name: &str, points: &[&str], kind: HoldKind) -> Self {
        let points = points.iter().map(|point| self.find(point)).collect();
        self.assembly.holds.push(Hold {
            name: name.into(),
            place: 2..2,
            points,
            kind,
        });
        self
    }

    pub(super) fn fixed(self, point: &str, along: &[Spatial<f64>]) -> Self {
        let kind = HoldKind::Fixed {
            along: along.to_vec(),
        };
        self.hold(&format!("{point} hold"), &[point], kind)
    }

    pub(super) fn stop(self, point: &str, blocks: Spatial<f64>, clearance: f64) -> Self {
        let kind = HoldKind::Stop {
            blocks,
            clearance: from_si(clearance),
            stiffness: None,
        };
        self.hold(&format!("{point} stop"), &[point], kind)
    }

    pub(super) fn force(mut self, point: &str, force: Spatial<f64>) -> Self {
        let point = self.find(point);
        self.assembly.actions.forces.push(ForceOnPoint {
            case: 0,
            point,
            force: force.map(from_si),
        });
        self
    }

    /// On the body that was drawn last.
    pub(super) fn moment(mut self, moment: Spatial<f64>) -> Self {
        let body = self.assembly.bodies.len() - 1;
        self.assembly.actions.moments.push(MomentOnBody {
            case: 0,
            body,
            moment: moment.map(from_si),
        });
        self
    }

    /// On the body that was drawn last, whose centre this becomes.
    pub(super) fn body_force(mut self, force: Spatial<f64>, centre: Spatial<f64>) -> Self {
        let body = self.assembly.bodies.len() - 1;
        self.assembly.bodies[body].centre = Some(centre.map(from_si));
        self.assembly.actions.bodies.push(ForceOnBody {
            case: 0,
            body,
            force: force.map(from_si),
        });
        self
    }

    /// Of the hold that was drawn last.
    pub(super) fn movement(mut self, movement: Spatial<f64>) -> Self {
        let hold = self.assembly.holds.len() - 1;
        self.assembly.actions.movements.push(MovementOfHold {
            case: 0,
            hold,
            movement: movement.map(from_si),
        });
        self
    }

    pub(super) fn model(&self) -> Model {
        let mut model = self.model.clone();
        model.assembly = Some(self.assembly.clone());
        model
    }

    pub(super) fn try_solve(&self) -> Result<AssemblySolution, Vec<SolveError>> {
        let model = self.model();
        let mut prepared = PreparedAssembly::of(&model).expect("there are points");
        prepared.solve(&model.combinations[0])
    }

    /// The solution, which must prove itself.
    pub(super) fn solve(&self) -> AssemblySolution {
        match self.try_solve() {
            Ok(solution) => {
                let residuals = self.residuals(&solution);
                assert!(residuals.prove(), "{residuals:?}");
                solution
            }
            Err(errors) => panic!("{errors:?}"),
        }
    }

    fn residuals(&self, solution: &AssemblySolution) -> Residuals {
        let model = self.model();
        let combination = &model.combinations[0];
        let members = solution.members.iter();
        let result = CombinationResult {
            name: combination.name.clone(),
            purpose: None,
            factors: Default::default(),
            without: Vec::new(),
            members: members.map(|(_, member)| member.clone()).collect(),
            points: solution.points.clone(),
            holds: solution.holds.clone(),
            bodies: solution.bodies.clone(),
            watches: Vec::new(),
            totals: Some(solution.totals.clone()),
            residuals: Residuals::default(),
            checks: Vec::new(),
        };
        crate::proof::assembly(&model, combination, &result)
    }

    /// The words of the motion that is pushed.
    pub(super) fn pushed(&self) -> String {
        match self.try_solve() {
            Err(errors) => match &errors[..] {
                [SolveError::Unstable { motion }] => motion.words(&self.model(), Style::default()),
                other => panic!("{other:?}"),
            },
            Ok(solution) => panic!("it stands: {:?}", solution.points),
        }
    }

    /// The words of the free motions.
    pub(super) fn free(&self) -> Vec<String> {
        let solution = self.solve();
        let words = solution.free.iter().map(|free| {
            let words = free.motion.words(&self.model(), Style::default());
            match &free.touching[..] {
                [] => words,
                touching => format!("{words}; {}", names(touching)),
            }
        });
        words.collect()
    }
}

fn names(names: &[Name]) -> String {
    names
        .iter()
        .map(|name| &**name)
        .collect::<Vec<_>>()
        .join(", ")
}

/// What a test reads of a solution.
impl AssemblySolution {
    pub(super) fn force(&self, member: &str) -> f64 {
        let found = self.members.iter().find(|(_, m)| &*m.name == member);
        found.expect("a member").1.segments[0].force_start.value
    }

    pub(super) fn displacement(&self, point: &str) -> Vec<f64> {
        let found = self
            .points
            .iter()
            .find(|p| &*p.name == point)
            .expect("a point");
        found.displacement.iter().map(|entry| entry.value).collect()
    }

    pub(super) fn reaction(&self, point: &str) -> Vec<f64> {
        let found = self
            .points
            .iter()
            .find(|p| &*p.name == point)
            .expect("a point");
        let reaction = found.reaction.as_ref().expect("a reaction");
        reaction.iter().map(|entry| entry.value).collect()
    }
}

#[track_caller]
pub(super) fn close(found: f64, expected: f64, size: f64) {
    let apart = (found - expected).abs();
    assert!(apart <= 1e-12 * size, "{found} instead of {expected}");
}

#[track_caller]
pub(super) fn all_close(found: &[f64], expected: &[f64], size: f64) {
    assert_eq!(found.len(), expected.len());
    for (&found, &expected) in found.iter().zip(expected) {
        close(found, expected, size);
    }
}
