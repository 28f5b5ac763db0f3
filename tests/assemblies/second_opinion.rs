//! A general convex minimiser as a second opinion: the position of least potential energy, found
//! by an interior-point method that knows nothing of members or states.

use super::assembly::{Assembly, Body, Hold, HoldKind, Member, Segment, Vector, Way, minus, size};
use super::dense::{Found, System};
use super::energy::{Energy, Row};
use super::generator;
use crate::common::chain::Random;
use crate::common::{checked, solved};
use clarabel::algebra::CscMatrix;
use clarabel::solver::{
    DefaultSettings, DefaultSolver, IPSolver, NonnegativeConeT, SolverStatus, ZeroConeT,
};
use lengthwise::result::{CombinationResult, JobStatus, MemberState};

/// To this share of the largest displacement.
const NEAR: f64 = 1e-6;

/// Entries of a sparse matrix.
#[derive(Default)]
struct Entries {
    rows: Vec<usize>,
    columns: Vec<usize>,
    values: Vec<f64>,
}

impl Entries {
    fn add(&mut self, row: usize, column: usize, value: f64) {
        self.rows.push(row);
        self.columns.push(column);
        self.values.push(value);
    }

    fn add_row(&mut self, row: usize, entries: &Row) {
        for &(column, value) in entries {
            self.add(row, column, value);
        }
    }

    fn matrix(self, rows: usize, columns: usize) -> CscMatrix<f64> {
        CscMatrix::new_from_triplets(rows, columns, self.rows, self.columns, self.values)
    }
}

/// The displacements of all points (m) in which the energy is least. Inside, lengths are mm and
/// forces kN, so that numbers are of one size.
fn minimised(energy: &Energy) -> Option<Vec<f64>> {
    const MM: f64 = 1e3;
    const KN_PER_MM: f64 = 1e-6;
    let count = energy.loads.len();
    let soft = energy
        .terms
        .iter()
        .filter(|t| t.one_way && t.stiffness.is_some())
        .count();
    let mut hessian = Entries::default();
    let mut linear: Vec<f64> = energy.loads.iter().map(|f| -f * 1e-3).collect();
    linear.resize(count + soft, 0.0);
    // Equations first, then inequalities.
    let (mut rows, mut right) = (Entries::default(), Vec::new());
    for term in energy
        .terms
        .iter()
        .filter(|t| t.stiffness.is_none() && !t.one_way)
    {
        rows.add_row(right.len(), &term.row);
        right.push(term.rest * MM);
    }
    for equation in &energy.equations {
        rows.add_row(right.len(), equation);
        right.push(0.0);
    }
    let equations = right.len();
    let mut beyond = count;
    for term in &energy.terms {
        match (term.stiffness, term.one_way) {
            (Some(stiffness), false) => {
                let k = stiffness * KN_PER_MM;
                for &(i, a) in &term.row {
                    linear[i] -= k * term.rest * MM * a;
                    for &(j, b) in term.row.iter().filter(|&&(j, _)| j >= i) {
                        hessian.add(i, j, k * a * b);
                    }
                }
            }
            (Some(stiffness), true) => {
                // Stretch less what is beyond ≤ rest, and what is beyond ≥ 0.
                hessian.add(beyond, beyond, stiffness * KN_PER_MM);
                rows.add_row(right.len(), &term.row);
                rows.add(right.len(), beyond, -1.0);
                right.push(term.rest * MM);
                rows.add(right.len(), beyond, -1.0);
                right.push(0.0);
                beyond += 1;
            }
            (None, true) => {
                rows.add_row(right.len(), &term.row);
                right.push(term.rest * MM);
            }
            (None, false) => {}
        }
    }
    let settings = DefaultSettings {
        verbose: false,
        max_iter: 500,
        tol_gap_abs: 1e-13,
        tol_gap_rel: 1e-13,
        tol_feas: 1e-13,
        iterative_refinement_reltol: 1e-15,
        iterative_refinement_abstol: 1e-15,
        iterative_refinement_max_iter: 30,
        ..DefaultSettings::default()
    };
    let cones = [
        ZeroConeT(equations),
        NonnegativeConeT(right.len() - equations),
    ];
    let hessian = hessian.matrix(count + soft, count + soft);
    let rows = rows.matrix(right.len(), count + soft);
    let mut solver =
        DefaultSolver::new(&hessian, &linear, &rows, &right, &cones, settings).expect("a problem");
    solver.solve();
    let solved = matches!(
        solver.solution.status,
        SolverStatus::Solved | SolverStatus::AlmostSolved | SolverStatus::InsufficientProgress
    );
    solved.then(|| solver.solution.x[..count].iter().map(|u| u / MM).collect())
}

/// Displacements to a millionth of the largest, and the states wherever they are clear at that.
fn compare(assembly: &Assembly, found: &CombinationResult) -> usize {
    let energy = Energy::of(assembly).expect("no gaps inside members");
    let expected = minimised(&energy).expect("a minimum");
    let largest = expected.iter().fold(1e-6f64, |m, u| m.max(u.abs()));
    let moved = found.points.iter().flat_map(|p| &p.displacement);
    for (found, expected) in moved.zip(&expected) {
        assert!(
            (found.value - expected).abs() <= NEAR * largest,
            "{:e} against {expected:e} of {largest:e}\n{}",
            found.value,
            assembly.job()
        );
    }
    let members = found.members.iter().map(|m| m.state != MemberState::Slack);
    let mut holds = Vec::new();
    for (hold, row) in assembly.holds.iter().zip(&found.holds) {
        holds.extend(hold.along.iter().map(|_| row.bears.unwrap_or(true)));
    }
    let mut decided = 0;
    for (term, acts) in energy.terms.iter().zip(members.chain(holds)) {
        let stretch: f64 = term.row.iter().map(|&(i, c)| c * expected[i]).sum();
        let beyond = stretch - term.rest;
        let decides = match term.stiffness {
            Some(_) => term.one_way && beyond.abs() > 10.0 * NEAR * largest,
            // A rigid stop is never beyond its rest: only that it is open can be seen.
            None => term.one_way && beyond < -10.0 * NEAR * largest,
        };
        if decides {
            assert_eq!(acts, beyond > 0.0, "{beyond:e}\n{}", assembly.job());
            decided += 1;
        }
    }
    decided
}

#[test]
fn a_convex_minimiser_finds_the_same_states() {
    let mut random = Random(11);
    let (mut compared, mut decided) = (0, 0);
    for number in 0..300 {
        let assembly = generator::assembly(&mut random, 1 + number % 3);
        if Energy::of(&assembly).is_none() {
            continue;
        }
        let result = checked("random.toml", &assembly.job());
        if result.status == JobStatus::Error {
            continue;
        }
        decided += compare(&assembly, &result.combinations[0]);
        compared += 1;
    }
    assert!(compared >= 120 && decided >= 150, "{compared}, {decided}");
}

/// The two opinions of the tests agree with each other too.
#[test]
fn the_minimiser_and_the_enumeration_agree() {
    let mut random = Random(14);
    let mut compared = 0;
    for number in 0..200 {
        let assembly = generator::assembly(&mut random, 1 + number % 3);
        let Some(energy) = Energy::of(&assembly) else {
            continue;
        };
        let Found::One(state) = System::of(&assembly).enumerate() else {
            continue;
        };
        let expected = minimised(&energy).expect("a minimum");
        let largest = expected.iter().fold(1e-6f64, |m, u| m.max(u.abs()));
        let dim = assembly.coordinates;
        let moved = state.displacement.iter().flat_map(|u| &u[..dim]);
        for (found, expected) in moved.zip(&expected) {
            assert!(
                (found - expected).abs() <= NEAR * largest,
                "{found:e} against {expected:e} of {largest:e}\n{}",
                assembly.job()
            );
        }
        compared += 1;
    }
    assert!(compared >= 90, "{compared}");
}

/// A one-way member whose free length differs from the drawing.
fn one_way(random: &mut Random, points: &[Vector], ends: [usize; 2]) -> Member {
    let length = size(minus(points[ends[1]], points[ends[0]]));
    let mut segment = Segment::plain(length, random.size(1e-4, 1e-3), 200e9);
    segment.misfit = random.between(-1e-3, 1e-3);
    Member {
        ends,
        carries: Some(match random.chance(0.7) {
            true => Way::Tension,
            false => Way::Compression,
        }),
        segments: vec![segment],
        rest: Some(0),
        forces: Vec::new(),
    }
}

fn held(point: usize, along: Vec<Vector>, kind: HoldKind) -> Hold {
    Hold {
        point,
        along,
        kind,
        movement: [0.0; 3],
    }
}

/// A platform on a thousand hangers and props, a fan of fifty at each of its points, each a little
/// too long or too short.
#[test]
fn a_thousand_hangers_of_one_platform() {
    let mut random = Random(12);
    let mut platform = Assembly {
        coordinates: 3,
        ..Assembly::default()
    };
    let every = platform.every_direction();
    let points: Vec<usize> = (0..20).collect();
    let place = |i: usize| [(i % 5) as f64, (i / 5) as f64, 0.0];
    platform.points = points.iter().map(|&i| place(i)).collect();
    for &low in &points {
        for _ in 0..50 {
            let aside = [0; 2].map(|_| random.between(-0.5, 0.5));
            let [x, y, _] = place(low);
            let high = platform.points.len();
            platform.points.push([x + aside[0], y + aside[1], 3.0]);
            platform
                .holds
                .push(held(high, every.clone(), HoldKind::Fixed));
            let hanger = one_way(&mut random, &platform.points, [low, high]);
            platform.members.push(hanger);
        }
    }
    platform.bodies.push(Body {
        centre: [1.7, 1.2, 0.0],
        force: [1e5, 0.0, -4e6],
        points,
        ..Body::default()
    });
    let result = solved("platform.toml", &platform.job());
    let decided = compare(&platform, &result.combinations[0]);
    assert!(decided >= 950, "{decided}");
}

/// A net of points on soft grounds, with a thousand one-way bars between neighbours.
#[test]
fn a_net_of_a_thousand_one_way_bars() {
    const SIDE: usize = 17;
    let mut random = Random(13);
    let mut net = Assembly {
        coordinates: 2,
        ..Assembly::default()
    };
    for i in 0..SIDE * SIDE {
        let (column, row) = ((i % SIDE) as f64, (i / SIDE) as f64);
        net.points.push([
            column + random.between(-0.2, 0.2),
            row + random.between(-0.2, 0.2),
            0.0,
        ]);
        net.holds.push(held(
            i,
            net.every_direction(),
            HoldKind::Spring(random.size(1e6, 1e7)),
        ));
        net.forces.push((
            i,
            [random.between(-1e4, 1e4), random.between(-1e4, 1e4), 0.0],
        ));
    }
    for i in 0..SIDE * SIDE {
        let (right, up) = (i % SIDE + 1 < SIDE, i / SIDE + 1 < SIDE);
        for (there, other) in [(right, i + 1), (up, i + SIDE), (right && up, i + SIDE + 1)] {
            if there {
                let bar = one_way(&mut random, &net.points, [i, other]);
                net.members.push(bar);
            }
        }
    }
    // The other diagonals, until there are a thousand.
    for i in (0..SIDE * (SIDE - 1)).filter(|i| i % SIDE > 0) {
        if net.members.len() < 1_000 {
            let bar = one_way(&mut random, &net.points, [i, i + SIDE - 1]);
            net.members.push(bar);
        }
    }
    assert_eq!(net.members.len(), 1_000);
    let result = solved("net.toml", &net.job());
    let decided = compare(&net, &result.combinations[0]);
    assert!(decided >= 950, "{decided}");
}
