//! The text report of results made by hand.

use super::*;
use crate::quantity::{Units, from_si};
use crate::report::sample;
use unicode_width::UnicodeWidthStr;

const PAGE: Layout = Layout {
    width: 80,
    colour: false,
    digits: 4,
};

fn whole(job: &JobResult, layout: &Layout) -> String {
    let mut out = Vec::new();
    write_job(&mut out, job, layout).unwrap();
    String::from_utf8(out).unwrap()
}

fn line(job: &JobResult) -> String {
    let mut out = Vec::new();
    write_line(&mut out, job, 22, &PAGE).unwrap();
    String::from_utf8(out).unwrap()
}

/// The lines of a report from one that begins with `from`, up to the next empty one.
fn block(text: &str, from: &str) -> String {
    let lines = text.lines().skip_while(|line| !line.starts_with(from));
    let lines: Vec<&str> = lines.take_while(|line| !line.is_empty()).collect();
    lines.join("\n")
}

#[test]
fn the_report_keeps_the_page_and_leaves_no_blanks_at_line_ends() {
    let jobs = [
        sample::failing(),
        sample::unchecked(),
        sample::unreadable(),
        sample::assembly::plane(),
        sample::assembly::space(),
    ];
    for job in jobs {
        let text = whole(&job, &PAGE);
        for line in text.lines() {
            assert!(line.width() <= 80, "too wide: {line}");
            assert_eq!(line, line.trim_end());
        }
        let has_results = !job.combinations.is_empty();
        assert_eq!(
            text.ends_with("a licensed engineer\ndecide.\n"),
            has_results
        );
        assert_eq!(
            text.contains("Signs: N and stress are + in tension"),
            has_results
        );
    }
}

#[test]
fn the_head_says_what_the_job_is_and_what_came_of_it() {
    let text = whole(&sample::failing(), &PAGE);
    let expected = "\
Linkspan 2, hanger and post
===========================
verdict      fail: 1 of 4 checks fails
reference    LS-31 rev B
file         linkspan/hanger.toml
datum        10.00 degC
prepared by  R. Aune
note         Loads as of the survey of the spring; the post is looked at as
             built.
";
    assert!(text.starts_with(expected), "{text}");
}

#[test]
fn a_stress_over_its_limit_or_near_it_is_warned_of_at_the_head() {
    let text = whole(&sample::failing(), &PAGE);
    let expected = "\
warning      hanger.lower thread at 2850 mm, combination strength/live=1.5:
             tension of 342.0 MPa against 300.0 MPa allowable, ratio 1.140
warning      hanger.shank at 2850 mm, combination strength/live=1.5: tension of
             290.0 MPa against 300.0 MPa allowable, ratio 0.967";
    assert_eq!(block(&text, "warning"), expected);

    let mut job = sample::failing();
    job.warnings[0].ratio = None;
    job.warnings[0].allowable = 0.0;
    let none = "tension of 342.0 MPa against 0 MPa allowable, where none is allowed";
    assert!(
        whole(&job, &PAGE)
            .replace("\n             ", " ")
            .contains(none)
    );
}

#[test]
fn segments_say_make_up_forces_and_stresses_with_their_layers() {
    let text = whole(&sample::failing(), &PAGE);
    let expected = "\
tier 1          2850               84.25   81.00    95.00  1250
tier 1.grout          grout       -40.00  -41.00
tier 1.bars           rod-steel   -40.00  -41.00
joint            150               84.25   81.00";
    assert!(text.contains(expected), "{text}");
    let elongation = "
              elongation         from  from misfit  elongation
              from force  temperature   and strain      in all    gap
segment             [mm]         [mm]         [mm]        [mm]   [mm]  bears
----------------------------------------------------------------------------
tier 1             1.080            0            0       1.080
joint              1.080            0            0       1.080  4.500  no
whole member       2.160            0            0       2.160
";
    assert!(text.contains(elongation), "{text}");
}

#[test]
fn supports_say_reaction_gap_and_whether_they_bear() {
    let text = whole(&sample::failing(), &PAGE);
    let expected = "\
support  at     kind         [kN]   [mm]  bears
-----------------------------------------------
base     start  spring      41.00
kerb     start  stop         0     2.300  no
cap      start  stop    undecided  0      yes";
    assert_eq!(
        block(&text, "support  at     kind         [kN]   [mm]"),
        expected
    );
}

#[test]
fn checks_say_demand_limit_utilisation_verdict_place_and_line() {
    let text = whole(&sample::failing(), &PAGE);
    for row in [
        "tension     hanger.lower thread  342.0    300.0    MPa         1.140  fail\n",
        "bears       post.cap                 yes      yes                     pass\n",
        "tension     hanger.lower thread  strength/live=1.5  2850  net     44\n",
    ] {
        assert!(text.contains(row), "{row}{text}");
    }
}

#[test]
fn a_failing_check_points_at_the_value_and_at_the_line_of_the_limit() {
    let text = whole(&sample::failing(), &PAGE);
    let expected = "\
- tension on hanger.lower thread at 2850 mm is 342.0 MPa in combination
  strength/live=1.5; the limit of 300.0 MPa is set in line 44: contract, clause
  4.2";
    assert_eq!(block(&text, "- tension"), expected);

    // The worst of several, and the one that no number tells.
    let mut job = sample::failing();
    let mut other = job.combinations[0].clone();
    other.name = "strength/live=1".into();
    job.combinations.push(other);
    job.governing[3].status = crate::result::Verdict::Fail;
    job.governing[3].demand = 0.0;
    let text = whole(&job, &PAGE).replace("\n  ", " ");
    assert!(text.contains(", the worst of 2 combinations that fail; the limit of 300.0 MPa"));
    assert!(
        text.contains("- bears on post.cap is no in combination strength/live=1.5; the limit is set in line 61\n"),
        "{text}"
    );
    assert!(!whole(&sample::unchecked(), &PAGE).contains("Failing checks"));
}

#[test]
fn limits_and_materials_say_where_they_come_from_below_their_tables() {
    let text = whole(&sample::failing(), &PAGE);
    assert_eq!(
        block(&text, "line 44"),
        "line 44, tension  contract, clause 4.2"
    );
    let expected = "\
rod-steel  mill certificate 4471 (like steel-s355)
grout      no source given";
    assert_eq!(block(&text, "rod-steel  mill"), expected);
}

#[test]
fn a_gap_says_which_of_its_limits_it_is_held_against() {
    let mut job = sample::failing();
    let check = &mut job.combinations[0].checks[2];
    check.check = "gap".into();
    check.details.insert("min".into(), 0.002.into());
    check.details.insert("max".into(), 0.006.into());
    let row = "gap max  hanger                 2.160    6.000  mm          0.360  pass\n";
    assert!(whole(&job, &PAGE).contains(row), "{}", whole(&job, &PAGE));
}

#[test]
fn what_rounding_leaves_is_0_beside_the_largest_of_its_kind() {
    let mut job = sample::failing();
    let member = &mut job.combinations[0].members[0];
    member.totals.reactions = from_si(3e-9);
    member.elongation_temperature = from_si(2e-18);
    member.stations[2].displacement = from_si(-4e-18);
    let text = whole(&job, &PAGE);
    assert!(text.contains("\nApplied forces sum to 84.25 kN, reactions to 0 kN.\n"));
    assert!(
        text.contains("\nwhole member       2.160            0 "),
        "{text}"
    );
    assert!(
        text.contains("\nend        3000         0         81.00\n"),
        "{text}"
    );

    // What is small and yet no rounding stays.
    job.combinations[0].members[0].stations[2].displacement = from_si(-4e-14);
    assert!(whole(&job, &PAGE).contains("-4.000e-11"));
}

#[test]
fn a_force_that_is_the_same_everywhere_is_said_once() {
    let mut job = sample::failing();
    let member = &mut job.combinations[0].members[0];
    member.force_min = member.force_max;
    assert!(whole(&job, &PAGE).contains("\nAxial force N: 84.25 kN throughout.\n"));
}

#[test]
fn a_share_of_restraint_is_given_where_it_says_something() {
    let said = |share| {
        let mut job = sample::unchecked();
        job.combinations[0].members[0].restraint = share;
        whole(&job, &PAGE).contains("Share of full restraint")
    };
    assert_eq!(
        [None, Some(0.0), Some(-0.02)].map(said),
        [false, false, true]
    );
}

#[test]
fn a_combination_says_its_purpose_and_factors_and_proves_itself() {
    let text = whole(&sample::failing(), &PAGE);
    let title = "Combination strength/live=1.5, for strength: 1.35 dead - 0.5 frost + 1.5 live\n";
    assert!(text.contains(title), "{text}");
    let proof =
        "Proof, by relative residuals: equilibrium 1.1e-16, compatibility 2.2e-16, energy\n0 (";
    assert!(text.contains(proof), "{text}");
    // In a job without cases the one combination has nothing to say of factors.
    assert!(whole(&sample::unchecked(), &PAGE).contains("\nCombination all\n"));
}

#[test]
fn cautions_and_notes_stand_with_their_place() {
    let text = whole(&sample::failing(), &PAGE);
    assert!(text.contains("- member.post (line 31): carries compression, and no buckling"));
    assert!(text.contains("- member.hanger: nominal values were used"));
}

#[test]
fn the_verdict_words_are_four() {
    let verdict = |job: &JobResult| block(&whole(job, &PAGE), "verdict");
    assert!(verdict(&sample::unchecked()).starts_with("verdict      unchecked: no limit"));
    assert!(verdict(&sample::unreadable()).starts_with("verdict      error: 2 errors"));
    assert!(whole(&sample::unreadable(), &PAGE).starts_with("Job without a result\n===="));
    let mut passing = sample::failing();
    passing.status = crate::result::JobStatus::Pass;
    assert!(verdict(&passing).starts_with("verdict      pass: all 4 checks hold"));
}

#[test]
fn us_units_and_digits_are_obeyed() {
    let mut job = sample::failing();
    job.units = Units::US;
    let layout = Layout { digits: 6, ..PAGE };
    let text = whole(&job, &layout);
    // 342 MPa at 6894.757293168 Pa a psi, 84.25 kN at 4448.2216152605 N a kip: exact definitions.
    assert!(text.contains("49.6029"), "{text}");
    assert!(text.contains("18.9402 kip"), "{text}");
    assert!(text.contains("datum        50.0000 degF"), "{text}");
    assert!(text.contains("1.14000"), "{text}");
}

#[test]
fn a_wide_page_holds_a_table_in_one() {
    let wide = Layout { width: 160, ..PAGE };
    let text = whole(&sample::failing(), &wide);
    let rows = text
        .lines()
        .filter(|line| line.starts_with("tension     hanger.shank"));
    assert_eq!(rows.count(), 2); // governing, and the combination's own
}

#[test]
fn a_brief_of_one_job_keeps_the_governing_checks_alone() {
    let mut out = Vec::new();
    write_brief(&mut out, &sample::failing(), &PAGE).unwrap();
    let text = String::from_utf8(out).unwrap();
    assert!(text.contains("Governing checks") && text.contains("Signs: "));
    assert!(!text.contains("Member ") && !text.contains("Materials"));
}

#[test]
fn a_brief_of_many_has_a_line_a_job() {
    assert_eq!(
        line(&sample::failing()),
        "fail        1.140  linkspan/hanger.toml    tension on hanger.lower thread, combination \
         strength/live=1.5\n"
    );
    assert_eq!(
        line(&sample::unchecked()),
        "unchecked          linkspan/trial.toml\n"
    );
    assert_eq!(
        line(&sample::unreadable()),
        "error              linkspan/broken.toml    2 errors, the first: the member `tie` has no \
         segment\n"
    );
}

#[test]
fn counts_say_what_was_looked_at() {
    let mut counts = Counts::default();
    counts.add(&sample::failing());
    counts.add(&sample::unreadable());
    let mut out = Vec::new();
    write_counts(&mut out, &counts, &PAGE).unwrap();
    assert_eq!(
        String::from_utf8(out).unwrap(),
        "Looked at 2 files, 2 members, 1 combination and 4 checks: 3 pass, 1 fail; 2\nerrors.\n"
    );
}

#[test]
fn an_assembly_says_first_what_holds_it_what_its_members_carry_and_how_it_moves() {
    let text = whole(&sample::assembly::plane(), &PAGE);
    let order = [
        "\nGoverning checks\n",
        "\nReactions over all combinations\n",
        "\nMember forces N over all combinations\n",
        "\nMovements over all combinations\n",
        "\nCombination service, for service: 1 dead\n",
        "\nReactions\n",
        "\nMember forces\n",
        "\nMovements\n",
        "\nMember H1\n",
    ];
    let places: Vec<usize> = order
        .iter()
        .map(|title| text.find(title).unwrap())
        .collect();
    assert!(places.is_sorted(), "{places:?}");
    let holds = "\
hold    point  kind         [kN]       [kN]   [mm]  bears
---------------------------------------------------------
hold.1  left   fixed           0      84.25
kerb    b      stop            0       0     3.100  no
rail    b      spring  undecided  undecided";
    assert_eq!(block(&text, "hold    point"), holds);
    let totals = "\
all applied forces        0   -84.25
all reactions             0    84.25";
    assert_eq!(block(&text, "all applied forces"), totals);
    let members = "\
member    state     [kN]   [kN]        [mm]      [mm]
-----------------------------------------------------
H1        taut     84.25  81.00       2.160
sway tie  slack     0      0          0        0.7500
H2        taut     84.25  81.00       2.160";
    assert_eq!(block(&text, "member    state"), members);
    assert!(
        text.contains("\nlug          0.5000        -2.100\n"),
        "{text}"
    );
    // 1 mrad is 0.0573 deg.
    assert!(
        text.contains("\nbeam        0.5000        -1.200  -0.05730\n"),
        "{text}"
    );
    assert!(text.contains("\nlug level  -2.100    mm\n"), "{text}");
    assert!(
        text.replace('\n', " ")
            .contains("rotations are right-handed")
    );
    assert!(!whole(&sample::failing(), &PAGE).contains("right-handed"));
}

#[test]
fn the_loss_that_governs_is_named_and_a_lost_member_has_no_rows() {
    let text = whole(&sample::assembly::plane(), &PAGE);
    let loss = "Of the losses, that of H2 governs (combination service/without=H2):";
    assert!(text.contains(loss), "{text}");
    let lost = text
        .split("\nCombination service/without=H2")
        .nth(1)
        .unwrap();
    assert!(lost.starts_with(", for service: 1 dead, without H2\n"));
    assert!(lost.contains("\nMember H1\n") && !lost.contains("\nMember H2\n"));
}

#[test]
fn the_ranges_say_which_combination_each_extreme_comes_from() {
    let text = whole(&sample::assembly::plane(), &PAGE);
    // The largest of the largest forces, and the least of the least.
    let force = "\
        largest                      least
result     [kN]  in combination       [kN]  in combination
----------------------------------------------------------
H1        144.0  service/without=H2  81.00  service
";
    assert!(text.contains(force), "{text}");
    // What one hold puts on a point is told of the hold alone, and what is nothing not at all.
    assert!(
        !text.contains("\nleft.reaction.y") && text.contains("\nhold.1.reaction.y"),
        "{text}"
    );
    assert!(!text.contains("left.displacement.x"), "{text}");
    assert!(
        text.contains("\nLeft out: 1 that is 0 in all of them.\n"),
        "{text}"
    );
    let mut single = sample::assembly::plane();
    single.combinations.truncate(1);
    assert!(!whole(&single, &PAGE).contains("over all combinations"));
}

#[test]
fn a_body_in_space_turns_about_three_axes() {
    let text = whole(&sample::assembly::space(), &PAGE);
    let rotation = "\
       displacement  displacement  displacement  rotation  rotation  rotation
            along x       along y       along z   about x   about y   about z
body           [mm]          [mm]          [mm]     [deg]     [deg]     [deg]
-----------------------------------------------------------------------------
plate         1.000        -2.000         3.000   0.05730   -0.1146         0
";
    assert!(text.contains(rotation), "{text}");
}
