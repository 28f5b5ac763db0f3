//! Axial deformation of members, checked: from a job file to forces, stresses, elongations,
//! reactions, gaps and verdicts that carry their own proof.
pub mod catalogue;
pub mod check;
pub mod fuzzing;
pub mod job;
pub mod model;
pub mod proof;
pub mod quantity;
pub mod result;
pub mod solve;
