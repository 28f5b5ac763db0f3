//! The values of a load case by case.

use super::Meaning;
use crate::job::nearest::remedy;
use crate::job::written::{ByCase, Entry, Written};
use crate::model::Place;

impl<'t> Meaning<'_, 't> {
    /// The value of a load for each case that it acts in. Every load of a job with cases names
    /// one, and none of a job without.
    pub(super) fn by_case<'v, T>(
        &mut self,
        case: &Entry<&'t str>,
        load: &Place,
        values: &'v ByCase<'t, T>,
    ) -> Vec<(usize, &'v Written<T>)> {
        match (values, case) {
            (_, Entry::Wrong) => Vec::new(),
            (ByCase::One(value), Entry::Given(case)) => {
                let case = self.case(case);
                case.map(|case| (case, value)).into_iter().collect()
            }
            (ByCase::One(value), Entry::Absent) if self.job.cases.is_empty() => {
                vec![(0, value)]
            }
            (ByCase::One(_), Entry::Absent) => {
                let names = self.job.cases.iter().map(|case| case.name.value);
                let help = remedy("", names.clone(), "").map_or(String::new(), |_| {
                    let names: Vec<&str> = names.take(12).collect();
                    format!("add `case`; the cases are `{}`", names.join("`, `"))
                });
                let message = "in a job with cases each load names its case";
                self.r.problems.missing("case", load, message, help);
                Vec::new()
            }
            (ByCase::Each(_), Entry::Given(case)) => {
                let message = "this load names a case, and its value is a table by case";
                let problems = &mut self.r.problems;
                problems.say(&case.place, message, "keep one of them");
                Vec::new()
            }
            (ByCase::Each(each), Entry::Absent) => {
                let mut resolved = Vec::with_capacity(each.len());
                for (case, value) in each {
                    if let Some(case) = self.case(case) {
                        resolved.push((case, value));
                    }
                }
                resolved
            }
        }
    }
}
