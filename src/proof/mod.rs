//! Every result proves itself: what is left over when a finished result is put back into the
//! equations of its member, or of points, bodies and members together.
//!
//! The proof knows the model and the result and not the solver: it gathers the actions anew, takes
//! areas from the dimensions themselves, and integrates by its own quadrature. Each residual is
//! divided by the sum of the sizes of its terms before they cancel; where there are none it is 0.

mod acting;
mod assembly;
mod member;
mod piece;
mod quadrature;
mod residual;
mod support;

pub use assembly::assembly;

use crate::model::{Combination, Member, Model};
use crate::result::{MemberResult, Residuals};
use acting::Acting;
use member::{HeldBy, Proof};
use residual::Residual;

/// The share of a member's largest force below which N somewhere may be nothing but the rounding of
/// forces that cancel: ten powers above that rounding.
const DOUBT: f64 = 1e-6;

/// The residuals of the finished result of one member with supports of its own.
///
/// * equilibrium: at every station, along every piece, and of the whole; layers against N.
/// * compatibility: integrated strains against displacements, elongations, supports and gaps, and
///   the state of every stop and joint.
/// * energy: the work of loads and reactions against `∫N (N/EA + e0) dx` (Clapeyron).
pub fn member(
    model: &Model,
    member: &Member,
    combination: &Combination,
    result: &MemberResult,
) -> Residuals {
    let acting = Acting::on(model, member, combination);
    let mut proof = Proof::of(acting, result, HeldBy::Supports);
    proof.take();
    let mut energy = Residual::default();
    energy.take(proof.work().and(proof.work_of_reactions()).left());
    Residuals {
        equilibrium: proof.equilibrium.largest(),
        compatibility: proof.compatibility.largest(),
        energy: energy.largest(),
    }
}
