//! Sections of one piece by their dimensions. A new one is one file here and one line in the list.

use crate::quantity::{Area, Curve, Length};

/// A dimension at the segment's start and at its end, linear between; equal where it does not taper.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Along<Q> {
    pub start: Q,
    pub end: Q,
}

/// What every section can tell of itself.
pub trait Shape {
    /// Area along the segment that stiffness and weight stand on.
    fn area(&self) -> Curve<Area>;
    /// The same at a fraction of the segment's length, from the dimensions there.
    fn area_at(&self, s: f64) -> Area;
    /// Area for gross stress, where it is another than `area` (a thread's nominal area).
    fn gross_area(&self) -> Curve<Area> {
        self.area()
    }
    /// Area for stress, where the section itself has a smaller one than its gross area (a thread's
    /// tensile stress area).
    fn net_area(&self) -> Option<Curve<Area>> {
        None
    }
    /// Least radius of gyration at a fraction of the segment's length, where dimensions tell.
    fn gyration_at(&self, s: f64) -> Option<Length>;
    /// The greatest thickness along the segment, by which strengths are tabled; `None` where only
    /// the area is known.
    fn thickness(&self) -> Option<Length>;
    /// What is wrong with the dimensions, in words, such as walls that fill the inside.
    fn fault(&self) -> Option<String>;
}

/// A section of one piece.
#[derive(Debug, Clone, PartialEq)]
pub enum Section {}
