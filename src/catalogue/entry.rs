//! An entry of the library as it is written: the keys of a job's `[material.ID]`.

use super::Material;
use crate::quantity::{LiteralError, read, read_reading};
use serde::Deserialize;

/// The keys of an entry, values not yet read.
#[derive(Debug, Deserialize)]
#[serde(rename_all = "kebab-case", deny_unknown_fields)]
pub(super) struct Entry {
    modulus: String,
    expansion: Option<String>,
    density: Option<String>,
    #[serde(rename = "yield")]
    yield_strength: Option<String>,
    #[serde(default)]
    yield_by_thickness: Vec<(String, String)>,
    ultimate: Option<String>,
    proof: Option<String>,
    crushing: Option<String>,
    range: Option<(String, String)>,
    family: Option<String>,
    note: Option<String>,
    source: Option<String>,
}

impl Entry {
    /// The material that the entry describes, or what is wrong with the first value that does not
    /// read.
    pub(super) fn material(self, id: &str) -> Result<Material, LiteralError> {
        let mut yield_strength = Vec::new();
        if let Some(text) = &self.yield_strength {
            yield_strength.push((None, read(text)?.nominal));
        }
        for (thickness, strength) in &self.yield_by_thickness {
            yield_strength.push((Some(read(thickness)?.nominal), read(strength)?.nominal));
        }
        let strength = |text: &Option<String>| {
            text.as_deref()
                .map(|text| Ok(read(text)?.nominal))
                .transpose()
        };
        Ok(Material {
            id: id.into(),
            like: None,
            modulus: read(&self.modulus)?.nominal,
            expansion: match &self.expansion {
                Some(text) => Some(read(text)?.nominal),
                None => None,
            },
            density: match &self.density {
                Some(text) => Some(read(text)?.nominal),
                None => None,
            },
            yield_strength,
            ultimate: strength(&self.ultimate)?,
            proof: strength(&self.proof)?,
            crushing: strength(&self.crushing)?,
            range: match &self.range {
                Some((low, high)) => {
                    Some((read_reading(low)?.nominal, read_reading(high)?.nominal))
                }
                None => None,
            },
            family: self.family,
            note: self.note,
            source: self.source,
        })
    }
}
