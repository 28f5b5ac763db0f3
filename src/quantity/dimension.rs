//! The kinds of quantity that a job and a report know.

use super::unit::Powers;
use super::{
    Angle, Area, Density, Expansion, Force, ForcePerLength, Length, Mass, MassPerLength, Moment,
    Ratio, Stress, TemperatureInterval, ThermodynamicTemperature, from_si,
};

/// What a value measures. It decides which units a literal may have and in which units a report
/// shows it.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Dimension {
    /// Length, displacement, clearance (m).
    Length,
    /// Area of a section (m²).
    Area,
    /// Force, rigidity EA (N).
    Force,
    /// Line load, stiffness of a spring (N/m).
    ForcePerLength,
    /// Moment (N m).
    Moment,
    /// Stress, modulus, strength (Pa).
    Stress,
    /// Mass per volume (kg/m³).
    Density,
    /// Mass per length (kg/m).
    MassPerLength,
    /// Mass (kg).
    Mass,
    /// Coefficient of linear expansion (1/K).
    Expansion,
    /// A reading of temperature (K above absolute zero).
    Temperature,
    /// A change of temperature (K), positive for heating.
    TemperatureChange,
    /// Angle (rad).
    Angle,
    /// Strain (1).
    Strain,
}

impl Dimension {
    /// Every dimension, in the order of the declaration.
    pub const ALL: [Dimension; 14] = [
        Dimension::Length,
        Dimension::Area,
        Dimension::Force,
        Dimension::ForcePerLength,
        Dimension::Moment,
        Dimension::Stress,
        Dimension::Density,
        Dimension::MassPerLength,
        Dimension::Mass,
        Dimension::Expansion,
        Dimension::Temperature,
        Dimension::TemperatureChange,
        Dimension::Angle,
        Dimension::Strain,
    ];

    /// Its name in a sentence, with the article: `a length`.
    pub fn name(self) -> &'static str {
        match self {
            Dimension::Length => "a length",
            Dimension::Area => "an area",
            Dimension::Force => "a force",
            Dimension::ForcePerLength => "a force per length",
            Dimension::Moment => "a moment",
            Dimension::Stress => "a stress",
            Dimension::Density => "a density",
            Dimension::MassPerLength => "a mass per length",
            Dimension::Mass => "a mass",
            Dimension::Expansion => "a coefficient of expansion",
            Dimension::Temperature => "a reading of temperature",
            Dimension::TemperatureChange => "a change of temperature",
            Dimension::Angle => "an angle",
            Dimension::Strain => "a strain",
        }
    }

    /// A literal of this dimension, for messages.
    pub fn example(self) -> &'static str {
        match self {
            Dimension::Length => "2.85 m",
            Dimension::Area => "5.61 cm2",
            Dimension::Force => "62 kN",
            Dimension::ForcePerLength => "35 kN/mm",
            Dimension::Moment => "4 kN m",
            Dimension::Stress => "345 MPa",
            Dimension::Density => "7850 kg/m3",
            Dimension::MassPerLength => "4.9 kg/m",
            Dimension::Mass => "320 kg",
            Dimension::Expansion => "12e-6 /K",
            Dimension::Temperature => "20 degC",
            Dimension::TemperatureChange => "+35 K",
            Dimension::Angle => "30 deg",
            Dimension::Strain => "-350 ue",
        }
    }

    /// The powers of the base quantities.
    pub(super) fn powers(self) -> Powers {
        match self {
            Dimension::Length => Powers::LENGTH,
            Dimension::Area => Powers::AREA,
            Dimension::Force => Powers::FORCE,
            Dimension::ForcePerLength => Powers::FORCE_PER_LENGTH,
            Dimension::Moment => Powers::MOMENT,
            Dimension::Stress => Powers::STRESS,
            Dimension::Density => Powers::DENSITY,
            Dimension::MassPerLength => Powers::MASS_PER_LENGTH,
            Dimension::Mass => Powers::MASS,
            Dimension::Expansion => Powers::EXPANSION,
            Dimension::Temperature | Dimension::TemperatureChange => Powers::TEMPERATURE,
            Dimension::Angle => Powers::ANGLE,
            Dimension::Strain => Powers::NONE,
        }
    }

    /// The units in which a literal of this dimension is commonly written, for messages.
    pub fn accepted(self) -> &'static str {
        match self {
            Dimension::Length => {
                "m mm cm um km in ft yd mil, or feet and inches as in `9 ft 4-1/2 in`"
            }
            Dimension::Area => "mm2 cm2 m2 in2 ft2",
            Dimension::Force => "N kN MN lbf kip kgf tf tonf-us",
            Dimension::ForcePerLength => "N/mm kN/mm N/m kN/m lbf/in kip/in lbf/ft kip/ft",
            Dimension::Moment => "N m, kN m, N mm, lbf ft, lbf in, kip ft, kip in",
            Dimension::Stress => {
                "Pa kPa MPa GPa psi ksi Msi bar, or a force per area as in `N/mm2`"
            }
            Dimension::Density => {
                "kg/m3 g/cm3 t/m3 lb/ft3 lb/in3 pcf, or a unit weight as in `24.5 kN/m3`"
            }
            Dimension::MassPerLength => "kg/m g/m t/m lb/ft lb/in",
            Dimension::Mass => "kg g t lb",
            Dimension::Expansion => "/K /degC /degF um/m/K in/in/degF",
            Dimension::Temperature => "K degC degF",
            Dimension::TemperatureChange => "K degC degF",
            Dimension::Angle => "deg rad",
            Dimension::Strain => "% ue microstrain mm/m in/in, or a bare number without quotes",
        }
    }
}

/// A quantity that a literal can say: its dimension, and its number in SI base units.
pub trait Measure: Copy {
    /// What it measures.
    const DIMENSION: Dimension;
    /// The quantity of this number in SI base units (m, N, Pa, K, rad, kg).
    fn from_si(si: f64) -> Self;
    /// Its number in SI base units.
    fn si(self) -> f64;
}

macro_rules! measures {
    ($($quantity:ty => $dimension:ident),* $(,)?) => {$(
        impl Measure for $quantity {
            const DIMENSION: Dimension = Dimension::$dimension;
            fn from_si(si: f64) -> Self {
                from_si(si)
            }
            fn si(self) -> f64 {
                self.value
            }
        }
    )*};
}

measures! {
    Length => Length,
    Area => Area,
    Force => Force,
    ForcePerLength => ForcePerLength,
    Moment => Moment,
    Stress => Stress,
    Density => Density,
    MassPerLength => MassPerLength,
    Mass => Mass,
    Expansion => Expansion,
    ThermodynamicTemperature => Temperature,
    TemperatureInterval => TemperatureChange,
    Angle => Angle,
    Ratio => Strain,
}
