//! The materials of a job as its result shows them.

use crate::catalogue::Material;
use crate::result::{MaterialEntry, YieldRow};

/// A material as it was used.
pub(super) fn entry(material: &Material) -> MaterialEntry {
    MaterialEntry {
        id: material.id.clone(),
        modulus: material.modulus.value,
        expansion: material.expansion.map(|value| value.value),
        density: material.density.map(|value| value.value),
        yield_strength: match material.yield_strength[..] {
            [(None, strength)] => Some(strength.value),
            _ => None,
        },
        yield_by_thickness: match material.yield_strength[..] {
            [(None, _)] => Vec::new(),
            ref rows => rows
                .iter()
                .map(|&(thickness, strength)| YieldRow {
                    thickness: thickness.map(|t| t.value),
                    yield_strength: strength.value,
                })
                .collect(),
        },
        ultimate: material.ultimate.map(|value| value.value),
        proof: material.proof.map(|value| value.value),
        crushing: material.crushing.map(|value| value.value),
        family: material.family.clone(),
        source: material.source.clone(),
        like: material.like.clone(),
    }
}
