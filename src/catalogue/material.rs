//! A material as a member uses it.

use crate::quantity::{Density, Expansion, Length, Stress, ThermodynamicTemperature};
use std::sync::Arc;

/// A material with what is known of it; what is not known is `None` and an error where it is needed.
#[derive(Debug, Clone, PartialEq)]
pub struct Material {
    /// Its id in the job or in the library.
    pub id: Arc<str>,
    /// The library entry or the job's own that it starts from.
    pub like: Option<Arc<str>>,
    /// Modulus of elasticity.
    pub modulus: Stress,
    /// Coefficient of linear expansion.
    pub expansion: Option<Expansion>,
    /// Density.
    pub density: Option<Density>,
    /// Yield strength at any thickness, or by thickness: up to this one, rows in rising order.
    pub yield_strength: Vec<(Option<Length>, Stress)>,
    /// Ultimate tensile strength.
    pub ultimate: Option<Stress>,
    /// Proof strength.
    pub proof: Option<Stress>,
    /// Crushing strength.
    pub crushing: Option<Stress>,
    /// The readings between which the values hold.
    pub range: Option<(ThermodynamicTemperature, ThermodynamicTemperature)>,
    /// `steel`, `aluminium`, `concrete` …
    pub family: Option<String>,
    /// What is worth knowing.
    pub note: Option<String>,
    /// Where the values come from.
    pub source: Option<String>,
}

impl Material {
    /// The yield strength at a thickness; where that is not known, the lowest of the table. `None`
    /// where the material gives none, or none for so great a thickness.
    pub fn yield_at(&self, thickness: Option<Length>) -> Option<Stress> {
        let Some(thickness) = thickness else {
            return self
                .yield_strength
                .iter()
                .map(|&(_, strength)| strength)
                .reduce(Stress::min);
        };
        let row = self
            .yield_strength
            .iter()
            .find(|(up_to, _)| up_to.is_none_or(|up_to| thickness <= up_to));
        row.map(|&(_, strength)| strength)
    }
}
