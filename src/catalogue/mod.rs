//! Materials and sections: what the shipped tables in `materials/` hold, and how a section's
//! dimensions become areas.

mod material;
pub mod section;

pub use material::{Material, Strength};
pub use section::{Section, Shape};
