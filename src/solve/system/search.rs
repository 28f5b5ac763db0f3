//! The search for states: by steps of whole sets, then along Lemke's path.

use super::descent::{self, LEFT_ALONE, Position, descend, stretches};
use super::prepared::{Prepared, Standing, Verdict, contradiction, pushed};
use super::tableau::{Found, Tableau};
use super::{Failure, Loads};

/// So many parts in question are the most that the exact method takes on: the table is dense.
const MOST: usize = 3_000;

/// So many states are mended part by part.
const MENDED: usize = 200;

impl Prepared {
    /// Finds the states where the base does not stand.
    pub(super) fn search(&mut self, loads: &Loads) -> Result<Standing, Failure> {
        match descend(&self.system, &self.states[0], loads) {
            descent::End::At(held) => {
                let held = self.keep_held(*held);
                match self.judge(held, loads) {
                    Verdict::Stands(standing) => return Ok(standing),
                    Verdict::Touching(standing, touching) => {
                        return Ok(self.let_go(standing, &touching, loads));
                    }
                    _ => {}
                }
            }
            descent::End::Motion(motion) => return Err(pushed(motion, loads)),
            descent::End::Nowhere => {}
        }
        // The table is out of the way while states are tried.
        let mut tableau = self.tableau.take().unwrap_or_default();
        let found = self.search_exactly(&mut tableau, loads);
        self.tableau = Some(tableau);
        found
    }

    /// Along Lemke's path over the parts in question; those are added whose signs do not hold then.
    pub(super) fn search_exactly(
        &mut self,
        tableau: &mut Tableau,
        loads: &Loads,
    ) -> Result<Standing, Failure> {
        let base = &self.states[0];
        let settled = base
            .settle(&self.system, loads)
            .map_err(|parts| contradiction(&parts))?;
        let one_way = &self.system.one_way;
        let mut question = Position::of(&self.system, base, settled.clone(), loads).falling(
            &self.system,
            &base.acts,
            loads,
        );
        // What keeps a sign must be asked for it, or a contradiction would prove nothing.
        let asked = |&part: &usize| base.acts[part] && one_way[part].stiffness.is_none();
        question.extend((0..one_way.len()).filter(asked));
        loop {
            let parts = tableau.with(&question);
            if parts > MOST {
                return Err(Failure::Unsettled { parts });
            }
            let base = &self.states[0];
            tableau.take_in(&self.system, base, &question);
            let acts = match tableau.states(&self.system, base, &settled, loads) {
                Found::Contradiction(parts) => return Err(contradiction(&parts)),
                Found::Motion(motion) => {
                    question = self.stopping(&base.acts, &motion);
                    if tableau.holds(&question) {
                        return Err(pushed(motion, loads));
                    }
                    continue;
                }
                Found::Nothing => return Err(Failure::Unsettled { parts }),
                Found::States(acts) => acts,
            };
            let index = self.keep(acts.clone());
            question = match self.judge(index, loads) {
                Verdict::Stands(standing) => return Ok(standing),
                Verdict::Touching(standing, touching) => {
                    return Ok(self.let_go(standing, &touching, loads));
                }
                Verdict::Pushed(motion) => self.stopping(&acts, &motion),
                Verdict::Contradiction(_) => Vec::new(),
                Verdict::Falls(part) => {
                    let held = &self.states[index];
                    let settled = held
                        .settle(&self.system, loads)
                        .map_err(|parts| contradiction(&parts))?;
                    let mut falling = Position::of(&self.system, held, settled, loads).falling(
                        &self.system,
                        &acts,
                        loads,
                    );
                    falling.push(part);
                    falling
                }
            };
            if tableau.holds(&question) {
                return self.mend(acts, loads);
            }
        }
    }

    /// Changes over part by part what rounding has left wrong.
    fn mend(&mut self, mut acts: Vec<bool>, loads: &Loads) -> Result<Standing, Failure> {
        let mut last = Failure::Unsettled { parts: acts.len() };
        for _ in 0..MENDED.min(2 + 2 * acts.len()) {
            let held = self.keep(acts.clone());
            match self.judge(held, loads) {
                Verdict::Stands(standing) => return Ok(standing),
                Verdict::Touching(standing, touching) => {
                    return Ok(self.let_go(standing, &touching, loads));
                }
                Verdict::Falls(part) => acts[part] = !acts[part],
                Verdict::Contradiction(parts) => {
                    last = contradiction(&parts);
                    break;
                }
                Verdict::Pushed(motion) => {
                    let along = stretches(&self.system, &motion);
                    let most = self
                        .stopping(&acts, &motion)
                        .into_iter()
                        .max_by(|&a, &b| along[a].total_cmp(&along[b]));
                    last = pushed(motion, loads);
                    match most {
                        Some(part) => acts[part] = true,
                        None => break,
                    }
                }
            }
        }
        Err(last)
    }

    /// The open parts that a motion stretches.
    fn stopping(&self, acts: &[bool], motion: &[(usize, f64)]) -> Vec<usize> {
        let along = stretches(&self.system, motion);
        (0..acts.len())
            .filter(|&part| !acts[part] && along[part] > LEFT_ALONE)
            .collect()
    }
}
