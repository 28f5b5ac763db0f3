//! Small assemblies whose answers are found by hand.

mod by_hand;
mod drawn;
mod one_sided;
mod words;
