//! Sections of one piece by their dimensions. A new one is one file here and one line in the list.

mod angle;
mod area;
mod bar;
mod channel;
mod designation;
mod h;
mod hollow;
mod rectangles;
mod round;
mod tee;
mod thread;
mod tube;

pub use angle::Angle;
pub use area::KnownArea;
pub use bar::Bar;
pub use channel::Channel;
pub use designation::ThreadError;
pub use h::HShape;
pub use hollow::HollowBox;
pub use round::Round;
pub use tee::Tee;
pub use thread::{StiffnessArea, Thread, ThreadForm};
pub use tube::{Inside, Tube};

use crate::quantity::{Area, Curve, Length};
use std::f64::consts::PI;
use std::ops::{Add, Mul, Sub};

/// A dimension at the segment's start and at its end, linear between; equal where it does not taper.
#[derive(Debug, Clone, Copy, PartialEq)]
#[allow(missing_docs)]
pub struct Along<Q> {
    pub start: Q,
    pub end: Q,
}

impl<Q> Along<Q>
where
    Q: Copy + PartialOrd + Default + Add<Output = Q> + Sub<Output = Q> + Mul<f64, Output = Q>,
{
    /// The same all along.
    pub fn uniform(value: Q) -> Self {
        Along {
            start: value,
            end: value,
        }
    }

    /// The dimension at a fraction of the segment's length.
    pub fn at(&self, s: f64) -> Q {
        if self.start == self.end {
            self.start
        } else {
            self.start * (1.0 - s) + self.end * s
        }
    }

    /// The dimension as a curve, of degree 0 where it does not taper.
    pub fn curve(&self) -> Curve<Q> {
        Curve::linear(self.start, self.end)
    }

    /// The larger of its ends.
    pub fn greatest(&self) -> Q {
        if self.end > self.start {
            self.end
        } else {
            self.start
        }
    }
}

impl Add for Along<Length> {
    type Output = Self;
    fn add(self, other: Self) -> Self {
        Along {
            start: self.start + other.start,
            end: self.end + other.end,
        }
    }
}

impl Sub for Along<Length> {
    type Output = Self;
    fn sub(self, other: Self) -> Self {
        Along {
            start: self.start - other.start,
            end: self.end - other.end,
        }
    }
}

impl Mul<f64> for Along<Length> {
    type Output = Self;
    fn mul(self, factor: f64) -> Self {
        Along {
            start: self.start * factor,
            end: self.end * factor,
        }
    }
}

/// The area of a rectangle whose sides both may taper.
impl Mul for Along<Length> {
    type Output = Curve<Area>;
    fn mul(self, other: Self) -> Curve<Area> {
        self.curve().times(&other.curve())
    }
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
#[allow(missing_docs)] // each variant is the key of `section` with its name
pub enum Section {
    Round(Round),
    Tube(Tube),
    Bar(Bar),
    Box(HollowBox),
    Area(KnownArea),
    Thread(Thread),
    H(HShape),
    Channel(Channel),
    Angle(Angle),
    Tee(Tee),
}

impl Section {
    fn shape(&self) -> &dyn Shape {
        match self {
            Section::Round(shape) => shape,
            Section::Tube(shape) => shape,
            Section::Bar(shape) => shape,
            Section::Box(shape) => shape,
            Section::Area(shape) => shape,
            Section::Thread(shape) => shape,
            Section::H(shape) => shape,
            Section::Channel(shape) => shape,
            Section::Angle(shape) => shape,
            Section::Tee(shape) => shape,
        }
    }
}

impl Shape for Section {
    fn area(&self) -> Curve<Area> {
        self.shape().area()
    }
    fn area_at(&self, s: f64) -> Area {
        self.shape().area_at(s)
    }
    fn gross_area(&self) -> Curve<Area> {
        self.shape().gross_area()
    }
    fn net_area(&self) -> Option<Curve<Area>> {
        self.shape().net_area()
    }
    fn gyration_at(&self, s: f64) -> Option<Length> {
        self.shape().gyration_at(s)
    }
    fn thickness(&self) -> Option<Length> {
        self.shape().thickness()
    }
    fn fault(&self) -> Option<String> {
        self.shape().fault()
    }
}

/// The area between a quarter circle and its two tangents, as a share of the radius squared: what
/// the fillet in a re-entrant corner adds.
const FILLET: f64 = 1.0 - PI / 4.0;

/// The root fillets that a rolled section has, all of one radius; none where it is given as sharp.
fn fillets(number: f64, root: Option<Along<Length>>) -> Option<Curve<Area>> {
    root.map(|radius| (radius * radius) * (number * FILLET))
}

/// The same at a fraction of the segment's length.
fn fillets_at(number: f64, root: Option<Along<Length>>, s: f64) -> Area {
    root.map_or(Area::default(), |root| {
        let radius = root.at(s);
        radius * radius * (number * FILLET)
    })
}

/// The larger of two lengths.
fn larger(a: Length, b: Length) -> Length {
    if b > a { b } else { a }
}

/// The smaller of two lengths.
fn smaller(a: Length, b: Length) -> Length {
    if b < a { b } else { a }
}

/// The first fault at the start or at the end, with the words that say where. Dimensions are linear
/// and so are the conditions on them: what holds at both ends holds between.
fn fault_at_ends(fault: impl Fn(f64) -> Option<&'static str>) -> Option<String> {
    [(0.0, "start"), (1.0, "end")]
        .into_iter()
        .find_map(|(s, end)| fault(s).map(|words| format!("at the segment's {end} {words}")))
}

/// A dimension that must be more than 0 at both ends.
fn not_positive(name: &str, dimension: &Along<Length>) -> Option<String> {
    let positive = |length: Length| length > Length::default();
    (!positive(dimension.start) || !positive(dimension.end))
        .then(|| format!("its {name} must be more than 0"))
}

/// A dimension that may run to 0 at one end, where the piece comes to a point or an edge.
fn no_taper<Q: PartialOrd + Default>(name: &str, dimension: &Along<Q>) -> Option<String> {
    let zero = Q::default();
    if !(dimension.start >= zero && dimension.end >= zero) {
        Some(format!("its {name} must not be negative"))
    } else if dimension.start == zero && dimension.end == zero {
        Some(format!("its {name} is 0 at both ends"))
    } else {
        None
    }
}

/// A root radius, which may be 0 for a sharp corner.
fn negative_root(root: &Option<Along<Length>>) -> Option<String> {
    let zero = Length::default();
    root.is_some_and(|root| !(root.start >= zero && root.end >= zero))
        .then(|| "its root radius must not be negative".to_owned())
}
