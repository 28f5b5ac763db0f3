//! Materials and sections: what the shipped tables in `materials/` hold, and how a section's
//! dimensions become areas.

mod entry;
mod library;
mod material;
pub mod section;

pub use library::{digest, files, ids, library};
pub use material::Material;
pub use section::{Section, Shape};
