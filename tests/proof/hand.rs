//! Assemblies that are put together by hand: points move as a test says, and each member is that of
//! a job of its own whose two ends are moved with its points.

use lengthwise::model::{
    Assembly, Between, Body, Carries, Case, Combination, Hold, HoldKind, Model, Point, Spatial,
};
use lengthwise::quantity::{Force, Length, from_si};
use lengthwise::result::{
    AssemblyTotals, BodyResult, CombinationResult, HoldResult, MemberResult, MemberState,
    PointResult, Residuals, Rotation, SupportWord,
};
use lengthwise::{job, proof, solve};

/// A member between two points.
pub(crate) struct Bar {
    pub(crate) between: (usize, usize),
    pub(crate) carries: Option<Carries>,
    /// How far it is from being taut.
    pub(crate) slack_by: Option<f64>,
    /// Its segments as a job writes them.
    pub(crate) segments: String,
    /// Its loads but weight.
    pub(crate) loads: String,
    pub(crate) weighs: bool,
}

impl Bar {
    pub(crate) fn of(between: (usize, usize), segments: &str) -> Self {
        Bar {
            between,
            carries: None,
            slack_by: None,
            segments: segments.into(),
            loads: String::new(),
            weighs: false,
        }
    }
}

/// A row of a hold: its points' reactions in turn, and for a stop its gap.
pub(crate) struct Held {
    pub(crate) points: Vec<usize>,
    pub(crate) kind: HoldKind,
    pub(crate) reactions: Vec<[f64; 3]>,
    pub(crate) gap: Option<f64>,
}

impl Held {
    /// Fixed in these directions.
    pub(crate) fn fixed(point: usize, along: &[[f64; 3]], reaction: [f64; 3]) -> Self {
        Held {
            points: vec![point],
            kind: HoldKind::Fixed {
                along: along.to_vec(),
            },
            reactions: vec![reaction],
            gap: None,
        }
    }
}

/// A body with its mass and centre, its first point's displacement and its rotation.
pub(crate) struct Stiff {
    pub(crate) points: Vec<usize>,
    pub(crate) mass: f64,
    pub(crate) centre: [f64; 3],
    pub(crate) displacement: [f64; 3],
    pub(crate) rotation: [f64; 3],
}

/// An assembly with its result.
pub(crate) struct Hand {
    pub(crate) coordinates: usize,
    pub(crate) down: [f64; 3],
    pub(crate) points: Vec<[f64; 3]>,
    pub(crate) moves: Vec<[f64; 3]>,
    pub(crate) bars: Vec<Bar>,
    pub(crate) bodies: Vec<Stiff>,
    pub(crate) holds: Vec<Held>,
    pub(crate) applied: [f64; 3],
}

const MATERIAL: &str = "[material.m]\nmodulus = \"200 GPa\"\nexpansion = \"12e-6 /K\"\n\
                        density = \"7850 kg/m3\"\nsource = \"a number of the test\"\n";

fn spatial<Q: Copy>(entries: [f64; 3], of: impl Fn(f64) -> Q) -> Spatial<Q> {
    entries.map(of)
}

fn dot(a: [f64; 3], b: [f64; 3]) -> f64 {
    a[0] * b[0] + a[1] * b[1] + a[2] * b[2]
}

impl Hand {
    fn between(&self, bar: &Bar) -> Between {
        let (start, end) = bar.between;
        let (a, b) = (self.points[start], self.points[end]);
        let apart = [b[0] - a[0], b[1] - a[1], b[2] - a[2]];
        let length = dot(apart, apart).sqrt();
        let direction = apart.map(|entry| entry / length);
        Between {
            start,
            end,
            direction,
            rise: -dot(direction, self.down),
        }
    }

    /// The member of a bar in a job of its own, with its result.
    fn member(&self, index: usize, bar: &Bar) -> (Model, MemberResult) {
        let between = self.between(bar);
        let ends = [between.start, between.end].map(|p| dot(between.direction, self.moves[p]));
        let job = |weighs: bool, held: bool| {
            let mut text = format!("{MATERIAL}[member.b{index}]\nstart = \"fixed\"\n");
            if held {
                text += "end = \"fixed\"\n";
            }
            let angle = between.rise.clamp(-1.0, 1.0).asin().to_degrees();
            text += &format!("runs = \"{angle:e} deg\"\nsegment = [{}]\n", bar.segments);
            let mut loads = vec![format!(
                "{{ support = \"start\", movement = \"{:e} m\" }}",
                ends[0]
            )];
            if held {
                loads.push(format!(
                    "{{ support = \"end\", movement = \"{:e} m\" }}",
                    ends[1]
                ));
            }
            if weighs {
                loads.push("{ weight = 1.0 }".into());
            }
            if !bar.loads.is_empty() {
                loads.push(bar.loads.clone());
            }
            text += &format!("load = [{}]\n", loads.join(", "));
            job::read(&text).unwrap_or_else(|problems| panic!("{problems:#?}\n{text}"))
        };
        let slack = bar.slack_by.is_some();
        let solved = job(bar.weighs && !slack, !slack);
        let mut result = solve::member(&solved, &solved.members[0], &solved.combinations[0])
            .expect("a member that is held")
            .member;
        result.supports.clear();
        if let Some(slack_by) = bar.slack_by {
            result.state = MemberState::Slack;
            result.slack_by = Some(from_si(slack_by));
            let last = result.stations.len() - 1;
            result.stations[last].displacement = from_si(ends[1]);
        } else if bar.carries == Some(Carries::Compression) {
            result.state = MemberState::Bearing;
        }
        let mut model = job(bar.weighs, true);
        let member = &mut model.members[0];
        member.supports.clear();
        member.actions.movements.clear();
        member.between = Some(between);
        member.carries = bar.carries;
        (model, result)
    }

    /// The model and the result; `act` adds what acts on points, bodies and holds, all of it in
    /// case 0.
    pub(crate) fn made(&self, act: impl FnOnce(&mut Assembly)) -> (Model, CombinationResult) {
        let entries = |of: [f64; 3]| of[..self.coordinates].to_vec();
        let lengths = |of| -> Vec<Length> { entries(of).into_iter().map(from_si).collect() };
        let forces = |of| -> Vec<Force> { entries(of).into_iter().map(from_si).collect() };
        let (models, members): (Vec<Model>, Vec<MemberResult>) = (self.bars.iter().enumerate())
            .map(|(index, bar)| self.member(index, bar))
            .unzip();
        let mut model = job::read(&format!(
            "{MATERIAL}[member.none]\nstart = \"fixed\"\n\
             segment = [{{ length = \"1 m\", section = {{ area = \"1 cm2\" }}, material = \"m\" }}]"
        ))
        .expect("a sound job");
        model.members = models
            .into_iter()
            .flat_map(|each| {
                model.materials.clone_from(&each.materials);
                each.members
            })
            .collect();
        let mut assembly = Assembly {
            coordinates: self.coordinates,
            down: self.down,
            ..Assembly::default()
        };
        for (index, &at) in self.points.iter().enumerate() {
            assembly.points.push(Point {
                name: format!("p{index}").into(),
                place: 0..0,
                at: spatial(at, from_si),
            });
        }
        let mut bodies = Vec::new();
        for (index, body) in self.bodies.iter().enumerate() {
            let name = format!("body{index}");
            assembly.bodies.push(Body {
                name: name.as_str().into(),
                place: 0..0,
                points: body.points.clone(),
                mass: (body.mass > 0.0).then(|| from_si(body.mass)),
                centre: Some(spatial(body.centre, from_si)),
            });
            let rotation = match self.coordinates {
                3 => Rotation::Spatial(spatial(body.rotation, from_si)),
                _ => Rotation::InPlane(from_si(body.rotation[2])),
            };
            bodies.push(BodyResult {
                name: name.into(),
                displacement: lengths(body.displacement),
                rotation,
            });
        }
        let (mut holds, mut reactions) = (Vec::new(), [0.0; 3]);
        let mut at_points = vec![None::<[f64; 3]>; self.points.len()];
        for (index, held) in self.holds.iter().enumerate() {
            assembly.holds.push(Hold {
                name: format!("hold.{}", index + 1).into(),
                place: 0..0,
                points: held.points.clone(),
                kind: held.kind.clone(),
            });
            for (&point, &reaction) in held.points.iter().zip(&held.reactions) {
                let sum = at_points[point].get_or_insert_default();
                for axis in 0..3 {
                    sum[axis] += reaction[axis];
                    reactions[axis] += reaction[axis];
                }
                holds.push(HoldResult {
                    name: format!("hold.{}", index + 1).into(),
                    point: format!("p{point}").into(),
                    kind: match held.kind {
                        HoldKind::Fixed { .. } => SupportWord::Fixed,
                        HoldKind::Spring { .. } => SupportWord::Spring,
                        HoldKind::Stop { .. } => SupportWord::Stop,
                    },
                    reaction: Some(forces(reaction)),
                    gap: held.gap.map(from_si),
                    bears: held.gap.map(|gap| gap == 0.0),
                });
            }
        }
        act(&mut assembly);
        model.assembly = Some(assembly);
        let result = CombinationResult {
            name: "all".into(),
            purpose: None,
            factors: Default::default(),
            without: Vec::new(),
            members,
            points: (self.moves.iter().zip(at_points).enumerate())
                .map(|(index, (&by, reaction))| PointResult {
                    name: format!("p{index}").into(),
                    displacement: lengths(by),
                    reaction: reaction.map(forces),
                })
                .collect(),
            holds,
            bodies,
            watches: Vec::new(),
            totals: Some(AssemblyTotals {
                applied: forces(self.applied),
                reactions: forces(reactions),
            }),
            residuals: Residuals::default(),
            checks: Vec::new(),
        };
        let case: &Case = &model.cases[0];
        assert!(case.always, "{case:?}");
        (model, result)
    }
}

/// The residuals of an assembly in the only combination of its model.
pub(crate) fn residuals(model: &Model, result: &CombinationResult) -> Residuals {
    let combination: &Combination = &model.combinations[0];
    proof::assembly(model, combination, result)
}
