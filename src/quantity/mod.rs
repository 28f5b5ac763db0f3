//! Quantities with their dimensions, how they are written, and how they are shown.
//!
//! Everything between the literal coming in and the number going out is a [`uom`] quantity in SI
//! base units, so that a length handed over where a force is expected does not compile:
//!
//! ```compile_fail
//! use lengthwise::quantity::{Area, Force, Length, Stress};
//! fn stress(force: Force, area: Area) -> Stress { force / area }
//! let length: Length = lengthwise::quantity::from_si(2.0);
//! let area: Area = lengthwise::quantity::from_si(1.0e-4);
//! stress(length, area); // a length is no force
//! ```

mod curve;
mod dimension;
mod exact;
mod literal;
mod show;
mod unit;

pub use curve::Curve;
pub use dimension::{Dimension, Measure};
pub use literal::{
    Literal, LiteralError, MovementBound, Strength, StressLimit, read, read_change,
    read_movement_bound, read_reading, read_stress_limit,
};
pub use show::Style;
use std::marker::PhantomData;
use uom::si::{ISQ, Quantity, SI};
use uom::typenum::{N1, N2, P1, P2, Z0};

pub use uom::si::f64::{
    Angle, Area, Energy, Force, Length, Mass, Ratio, TemperatureInterval, ThermodynamicTemperature,
};

/// Stress, modulus, strength (Pa).
pub type Stress = uom::si::f64::Pressure;
/// Moment (N m).
pub type Moment = uom::si::f64::Torque;
/// Density (kg/m³).
pub type Density = uom::si::f64::MassDensity;
/// Mass per length (kg/m).
pub type MassPerLength = uom::si::f64::LinearMassDensity;
/// Coefficient of linear expansion (1/K).
pub type Expansion = uom::si::f64::TemperatureCoefficient;
/// Force per length (N/m): a line load, or the stiffness of a spring.
pub type ForcePerLength = Quantity<ISQ<Z0, P1, N2, Z0, Z0, Z0, Z0>, SI<f64>, f64>;
/// Length per force (m/N): the flexibility of a piece, `∫dx / EA`.
pub type Flexibility = Quantity<ISQ<Z0, N1, P2, Z0, Z0, Z0, Z0>, SI<f64>, f64>;

/// Standard gravity, m/s² (CGPM 1901, resolution 2).
pub const STANDARD_GRAVITY: f64 = 9.80665;

/// A quantity from its number in SI base units (m, N, Pa, K, rad, kg).
pub fn from_si<D, K>(value: f64) -> Quantity<D, SI<f64>, f64>
where
    D: uom::si::Dimension<Kind = K> + ?Sized,
    K: ?Sized,
{
    Quantity {
        dimension: PhantomData,
        units: PhantomData,
        value,
    }
}

/// The system in which reports show quantities; the computation is in SI throughout.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default, serde::Serialize, serde::Deserialize)]
pub enum Units {
    /// mm, kN, MPa, °C.
    #[default]
    SI,
    /// in, kip, ksi, °F.
    US,
}
