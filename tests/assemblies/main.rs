//! Outside checks of assemblies: against dense arithmetic and the enumeration of all states, a
//! general convex minimiser, theorems, and solutions known exactly.

#[path = "../common/mod.rs"]
mod common;

mod assembly;
mod dense;
mod elements;
mod energy;
mod equations;
mod generator;
mod job;
mod knife_edges;
mod motions;
mod numbers;
mod outcome;
mod random;
mod second_opinion;
mod spread;
mod stiff;
mod theorems;
mod turned;
mod twin;
