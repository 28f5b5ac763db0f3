//! Limits on holds and watches, and that a member carries.

use crate::job::meant::limits::{Laying, joined, signed, tables};
use crate::job::meant::members::Meant;
use crate::job::meant::reads::Common;
use crate::job::written::Written;
use crate::job::written::assembly::hold::Hold as WrittenHold;
use crate::job::written::assembly::watch::Watch as WrittenWatch;
use crate::job::written::limit::{Bound, Limits};
use crate::model::{Assembly, Hold, LimitKind, Name, Target, Watch, Watched};

impl<'t> Laying<'_, '_, 't> {
    /// `slack = false` on a member. Among the defaults it holds those that carry one way alone.
    pub(in crate::job::meant) fn carries(
        &mut self,
        member: usize,
        table: &Limits<'t>,
        common: &Common,
        meant: &Meant<'_, 't>,
    ) {
        let Some(slack) = table.slack.given() else {
            return;
        };
        let whole = &meant.whole;
        if whole.carries.given().is_some() {
            let on = meant.member.name.clone();
            self.push(
                LimitKind::Slack,
                Target::Member { member },
                on,
                common,
                &slack.place,
            );
        } else if whole.carries.is_absent() && whole.limits.is_written() {
            let message = format!(
                "the member `{}` carries both ways, and so is never slack",
                whole.name.value
            );
            let help =
                "take it out, or add `carries = \"tension\"` or \"compression\" to the member";
            self.meaning.r.problems.say(&slack.place, message, help);
        }
    }

    /// Limits on every point of every hold.
    pub(in crate::job::meant) fn of_holds(&mut self, assembly: Option<&Assembly>) {
        let job = self.meaning.job;
        let known = assembly.map_or(&[][..], |assembly| &assembly.holds);
        let all_known = known.len() == job.assembly.holds.len();
        for (index, written) in job.assembly.holds.iter().enumerate() {
            let hold = known.get(index).filter(|_| all_known);
            for table in tables(&written.limits) {
                let common = self.common(&table.names, &table.since, &table.source);
                if let (Some(common), Some(hold)) = (common, hold) {
                    self.on_hold(index, table, &common, written, hold);
                }
            }
        }
    }

    fn on_hold(
        &mut self,
        index: usize,
        table: &Limits<'t>,
        common: &Common,
        written: &WrittenHold<'t>,
        hold: &Hold,
    ) {
        let directions = hold.kind.directions().len();
        if let Some(reaction) = table.reaction.given()
            && directions > 1
            && matches!(reaction.value, Bound::Each(..))
        {
            let message = format!(
                "this hold answers in {directions} directions, and its reaction is held by its size"
            );
            let help = "write one value; a pair belongs to a hold along one direction";
            self.meaning.r.problems.say(&reaction.place, message, help);
            return;
        }
        let points = written.points.given().map_or(&[][..], |all| &all.value);
        for (point, named) in points.iter().enumerate() {
            let target = Target::Hold { hold: index, point };
            let on = || match points.len() {
                1 => hold.name.clone(),
                _ => joined(&hold.name, &Name::from(named.value)),
            };
            if let Some(reaction) = table.reaction.given() {
                let kind = LimitKind::Reaction(signed(reaction.value, |force| force));
                self.push(kind, target, on(), common, &reaction.place);
            }
            self.gap(table, target, &on, common);
        }
    }

    /// Limits of watched movements and rotations.
    pub(in crate::job::meant) fn of_watches(&mut self, watches: &[Option<Watch>]) {
        let job = self.meaning.job;
        for (index, (written, watch)) in job.assembly.watches.iter().zip(watches).enumerate() {
            if written.limit.is_absent() && written.rotation.is_absent() {
                continue;
            }
            let common = self.common(&written.names, &written.since, &written.source);
            if let (Some(common), Some(watch)) = (common, watch) {
                self.on_watch(index, &common, written, watch);
            }
        }
    }

    fn on_watch(
        &mut self,
        index: usize,
        common: &Common,
        written: &WrittenWatch<'t>,
        watch: &Watch,
    ) {
        let target = Target::Watch { watch: index };
        let is_a_size = match watch.of {
            Watched::Point { along, .. } => along.is_none(),
            Watched::Rotation { about, .. } => about.is_none(),
            Watched::Station { .. } => false,
        };
        if let Some(limit) = written.limit.given() {
            if is_a_size && self.is_a_pair(limit, "along") {
                return;
            }
            let kind = LimitKind::Watch(signed(limit.value, |length| length));
            self.push(kind, target, watch.name.clone(), common, &limit.place);
        }
        if let Some(limit) = written.rotation.given() {
            if is_a_size && self.is_a_pair(limit, "about") {
                return;
            }
            let kind = LimitKind::Rotation(signed(limit.value, |angle| angle));
            self.push(kind, target, watch.name.clone(), common, &limit.place);
        }
    }

    /// Reports a bound for each sign of what has none.
    fn is_a_pair<T>(&mut self, limit: &Written<Bound<T>>, key: &str) -> bool {
        let is_a_pair = matches!(limit.value, Bound::Each(..));
        if is_a_pair {
            let message = format!("without `{key}` the size is watched, which has no sign");
            let help = format!("write one value, or add `{key}`");
            self.meaning.r.problems.say(&limit.place, message, help);
        }
        is_a_pair
    }
}
