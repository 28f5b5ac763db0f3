//! The tables that ship with the program, built into it.

use super::Material;
use super::entry::Entry;
use sha2::{Digest, Sha256};
use std::sync::OnceLock;

macro_rules! shipped {
    ($($file:literal),* $(,)?) => {
        &[$(($file, include_str!(concat!("../../materials/", $file)))),*]
    };
}

/// Names and texts, in the order in which the library is listed.
static FILES: &[(&str, &str)] = shipped![
    "steel.toml",
    "stainless.toml",
    "bolts.toml",
    "reinforcement.toml",
    "concrete.toml",
    "aluminium.toml",
    "copper.toml",
    "cast-iron.toml",
    "titanium-nickel-magnesium.toml",
    "timber.toml",
    "plastics-composites-glass.toml",
    "threads.toml",
];

/// The series of threads.
pub(super) const THREADS: &str = include_str!("../../materials/threads.toml");

/// What stands before the id of an entry.
const HEADER: &str = "\n[material.";

/// An entry of the library, which is not read before a job asks for it.
struct Shelf {
    id: &'static str,
    text: &'static str,
    material: OnceLock<Option<Material>>,
}

/// Where every entry stands. Found by its header alone, since a job needs a material or two of the
/// many.
fn shelves() -> &'static [Shelf] {
    static SHELVES: OnceLock<Vec<Shelf>> = OnceLock::new();
    SHELVES.get_or_init(|| {
        FILES
            .iter()
            .flat_map(|(_, text)| text.split(HEADER).skip(1))
            .filter_map(|entry| entry.split_once("]\n"))
            .map(|(id, text)| Shelf {
                id,
                text,
                material: OnceLock::new(),
            })
            .collect()
    })
}

/// The material of the library with this id; `None` where there is none.
pub fn library(id: &str) -> Option<&'static Material> {
    let shelf = shelves().iter().find(|shelf| shelf.id == id)?;
    shelf
        .material
        .get_or_init(|| {
            let entry: Entry = toml::from_str(shelf.text).ok()?;
            entry.material(shelf.id).ok()
        })
        .as_ref()
}

/// The ids of the library, by family.
pub fn ids() -> impl Iterator<Item = &'static str> {
    shelves().iter().map(|shelf| shelf.id)
}

/// The shipped files, their names and their text, in a fixed order.
pub fn files() -> &'static [(&'static str, &'static str)] {
    FILES
}

/// What identifies the shipped values: `sha256:` and the digest of the bytes of all files, in the
/// order of [`files`].
pub fn digest() -> String {
    let mut digest = Sha256::new();
    for (_, text) in FILES {
        digest.update(text);
    }
    let mut text = String::from("sha256:");
    for byte in digest.finalize() {
        for digit in [byte >> 4, byte & 15] {
            text.extend(char::from_digit(digit.into(), 16));
        }
    }
    text
}
