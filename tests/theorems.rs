//! Theorems that hold of every member, as properties of random ones. They need no outside value:
//! superposition, reversal, cutting, change of units and scaling follow from the linear equations of
//! a bar, and that a station never moves against a force raised there from the convexity of the
//! potential energy (contacts included).

mod common;
#[path = "theorems/members.rs"]
mod members;

use common::chain::{Chain, Hold, Kind, Random, Segment};
use common::{checked, only_member, solved};
use lengthwise::quantity::Force;
use lengthwise::result::{JobStatus, MemberResult};
use members::{
    cut, free_growth, half_way, hanger, reversed, scale_actions, tapering, without_contacts,
};
use proptest::prelude::*;
use proptest::test_runner::TestCaseError;

/// What is compared: by station its place, displacement and the force before and after it; by
/// support its reaction; and which contacts bear.
#[derive(Debug, Clone, PartialEq)]
struct Outcome {
    stations: Vec<[f64; 4]>,
    reactions: Vec<f64>,
    bears: Vec<Option<bool>>,
}

impl Outcome {
    fn of(member: &MemberResult) -> Self {
        let force = |f: Option<Force>| f.map_or(0.0, |f| f.value);
        let stations = member.stations.iter().map(|s| {
            let (before, after) = (force(s.force_before), force(s.force_after));
            [s.x.value, s.displacement.value, before, after]
        });
        let supports = member.supports.iter();
        // Equal rigid stops share in a way that nothing decides: their reactions are none.
        Outcome {
            stations: stations.collect(),
            reactions: supports.clone().map(|s| force(s.reaction)).collect(),
            bears: supports
                .map(|s| s.bears)
                .chain(member.segments.iter().map(|s| s.bears))
                .collect(),
        }
    }

    /// The outcome of a member that can be solved; `None` where a force pushes a loose part.
    fn try_of(chain: &Chain) -> Option<Self> {
        let result = checked("theorem.toml", &chain.job());
        (result.status != JobStatus::Error).then(|| Self::of(only_member(&result)))
    }

    /// Every number through a function of the same number of another outcome.
    fn with(&self, other: &Self, f: impl Fn(f64, f64) -> f64) -> Self {
        let pairs = self.stations.iter().zip(&other.stations);
        let reactions = self.reactions.iter().zip(&other.reactions);
        Outcome {
            stations: pairs
                .map(|(a, b)| [a[0], f(a[1], b[1]), f(a[2], b[2]), f(a[3], b[3])])
                .collect(),
            reactions: reactions.map(|(a, b)| f(*a, *b)).collect(),
            bears: self.bears.clone(),
        }
    }

    /// The same, each kind of number to 1e-11 of the largest of its kind.
    fn assert_near(&self, other: &Self, chain: &Chain) {
        assert_eq!(self.stations.len(), other.stations.len());
        assert_eq!(self.bears, other.bears, "{}", chain.job());
        let largest =
            |values: &mut dyn Iterator<Item = f64>| values.map(f64::abs).fold(0.0, f64::max);
        let length = largest(&mut other.stations.iter().map(|s| s[1])).max(free_growth(chain));
        let force = largest(&mut other.stations.iter().flat_map(|s| [s[2], s[3]]))
            .max(largest(&mut other.reactions.iter().copied()));
        let chain_length = chain.joints()[chain.segments.len()];
        let near = |a: f64, b: f64, scale: f64| {
            assert!(
                (a - b).abs() <= 1e-11 * scale,
                "{a:e} against {b:e}\n{}",
                chain.job()
            );
        };
        for (a, b) in self.stations.iter().zip(&other.stations) {
            near(a[0], b[0], chain_length);
            near(a[1], b[1], length);
            near(a[2], b[2], force);
            near(a[3], b[3], force);
        }
        for (a, b) in self.reactions.iter().zip(&other.reactions) {
            near(*a, *b, force);
        }
    }
}

/// The outcome as seen from the other end.
fn seen_from_the_end(outcome: &Outcome, supports: usize, length: f64) -> Outcome {
    let mut stations: Vec<_> = outcome.stations.clone();
    stations.reverse();
    let (of_supports, of_segments) = outcome.bears.split_at(supports);
    Outcome {
        stations: stations
            .iter()
            .map(|s| [length - s[0], -s[1], s[3], s[2]])
            .collect(),
        reactions: outcome.reactions.iter().map(|r| -r).collect(),
        bears: of_supports
            .iter()
            .chain(of_segments.iter().rev())
            .copied()
            .collect(),
    }
}

/// The outcome; members that cannot be solved are passed over, of which proptest allows only so many.
fn solvable(chain: &Chain) -> Result<Outcome, TestCaseError> {
    Outcome::try_of(chain).ok_or_else(|| TestCaseError::reject("a force pushes a loose part"))
}

/// The outcomes of two members that can be solved both or neither.
fn both(one: &Chain, other: &Chain) -> Result<(Outcome, Outcome), TestCaseError> {
    let second = Outcome::try_of(other);
    prop_assert_eq!(
        Outcome::try_of(one).is_some(),
        second.is_some(),
        "{}",
        one.job()
    );
    Ok((solvable(one)?, solvable(other)?))
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 300, failure_persistence: None, ..ProptestConfig::default() })]

    /// Superposition where no state changes: half-way between two sets of actions in which the same
    /// contacts bear, the same bear, and every result is the mean.
    #[test]
    fn actions_superpose_while_no_state_changes(seed: u64) {
        let one = tapering(seed);
        let mut random = Random(!seed);
        let mut other = one.clone();
        scale_actions(&mut other, || random.between(0.5, 1.3));
        let (a, b) = (solvable(&one)?, solvable(&other)?);
        prop_assume!(a.bears == b.bears);
        let middle = half_way(&one, &other);
        let found = Outcome::try_of(&middle).expect("solved on both sides of it");
        found.assert_near(&a.with(&b, f64::midpoint), &one);
    }

    #[test]
    fn actions_superpose_without_contacts(seed: u64) {
        let whole = without_contacts(seed);
        let mut random = Random(!seed);
        let (mut part, mut rest) = (whole.clone(), whole.clone());
        let mut shares = Vec::new();
        scale_actions(&mut part, || {
            shares.push(random.between(-1.0, 2.0));
            shares[shares.len() - 1]
        });
        let mut left = shares.iter().map(|share| 1.0 - share);
        scale_actions(&mut rest, || left.next().expect("as many as before"));
        let [whole_found, a, b] = [&whole, &part, &rest]
            .map(|chain| Outcome::try_of(chain).expect("it is held"));
        a.with(&b, |a, b| a + b).assert_near(&whole_found, &whole);
    }

    #[test]
    fn a_member_reversed_is_the_same_member(seed: u64) {
        let chain = tapering(seed);
        let turned = reversed(&chain);
        let (found, back) = both(&chain, &turned)?;
        let length = chain.joints()[chain.segments.len()];
        seen_from_the_end(&back, chain.supports.len(), length).assert_near(&found, &chain);
    }

    #[test]
    fn a_segment_cut_in_two_is_the_same_segment(seed: u64, share in 0.01..0.99f64) {
        let chain = tapering(seed);
        let whole = |s: &Segment| !matches!(s.kind, Kind::Gap { .. });
        prop_assume!(chain.segments.iter().any(whole));
        let index = chain.segments.iter().position(whole).unwrap_or_default();
        let at = chain.joints()[index] + chain.segments[index].length * share;
        let (found, mut parts) = both(&chain, &cut(&chain, index, share))?;
        let nearest = |s: &[f64; 4]| (s[0] - at).abs() < 1e-9 * at;
        let new = parts.stations.iter().position(nearest).expect("the cut is a station");
        parts.stations.remove(new);
        parts.bears.remove(chain.supports.len() + index);
        parts.assert_near(&found, &chain);
    }

    /// To 1e-12 of the largest of a kind: the factors are those of the definitions.
    #[test]
    fn a_job_in_us_units_is_its_si_twin(seed: u64) {
        let [us, si] = [true, false].map(|us| {
            let result = solved("twin.toml", &hanger(seed, us));
            let member = only_member(&result);
            let segments = member.segments.iter().flat_map(|s| [s.stress_max, s.stress_min]);
            let stresses: Vec<f64> = segments.map(|s| s.expect("a stress").value).collect();
            (Outcome::of(member), stresses)
        });
        let column = |o: &Outcome, i: usize| o.stations.iter().map(|s| s[i]).collect::<Vec<_>>();
        let near = |a: Vec<f64>, b: Vec<f64>| {
            let scale = b.iter().fold(0.0f64, |m, v| m.max(v.abs()));
            a.iter().zip(&b).all(|(a, b)| (a - b).abs() <= 1e-12 * scale)
        };
        for i in 0..4 {
            prop_assert!(near(column(&us.0, i), column(&si.0, i)), "{:?}\n{:?}", us, si);
        }
        prop_assert!(near(us.1, si.1));
        prop_assert_eq!(us.0.bears, si.0.bears);
    }

    /// All actions and the clearances of stops times one number: all results times that number, and
    /// the same stops bear.
    #[test]
    fn results_scale_with_actions_and_clearances(seed: u64, times in 0.01..100.0f64) {
        let mut chain = tapering(seed);
        for segment in &mut chain.segments {
            if let Kind::Gap { .. } = segment.kind {
                segment.kind = Kind::Part { stiffness: 5e7 };
            }
        }
        let mut scaled = chain.clone();
        scale_actions(&mut scaled, || times);
        for support in &mut scaled.supports {
            if let Hold::Stop { clearance, .. } = &mut support.kind {
                *clearance *= times;
            }
        }
        let (found, more) = both(&chain, &scaled)?;
        more.with(&more, |value, _| value / times).assert_near(&found, &chain);
    }

    /// Whatever bears before and after.
    #[test]
    fn a_station_never_moves_against_a_force_raised_there(seed: u64, more in 1.0..1e6f64) {
        let chain = tapering(seed);
        let mut random = Random(!seed);
        let which = random.below(chain.forces.len());
        let mut raised = chain.clone();
        raised.forces[which].1 += more;
        let x = chain.x(chain.forces[which].0);
        let (before, after) = (solvable(&chain)?, solvable(&raised)?);
        let moved = |outcome: &Outcome| {
            let at = |s: &&[f64; 4]| (s[0] - x).abs() <= 1e-12 * x;
            outcome.stations.iter().find(at).expect("a force makes a station")[1]
        };
        let largest = before.stations.iter().fold(0.0f64, |m, s| m.max(s[1].abs()));
        prop_assert!(moved(&after) >= moved(&before) - 1e-12 * largest, "{}", chain.job());
    }
}
