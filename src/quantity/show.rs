//! How reports show quantities.

use super::{Dimension, Units};

/// In which units and with how many significant digits quantities are shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Style {
    /// The system of units.
    pub units: Units,
    /// Significant digits, 1 to 17.
    pub digits: usize,
}

impl Default for Style {
    fn default() -> Self {
        Style {
            units: Units::SI,
            digits: 4,
        }
    }
}

impl Style {
    /// The unit in which a dimension is shown.
    pub fn unit(&self, dimension: Dimension) -> &'static str {
        match self.units {
            Units::SI => match dimension {
                Dimension::Length => "mm",
                Dimension::Area => "mm2",
                Dimension::Force => "kN",
                Dimension::ForcePerLength => "kN/mm",
                Dimension::Stress => "MPa",
                Dimension::Density => "kg/m3",
                Dimension::MassPerLength => "kg/m",
                Dimension::Mass => "kg",
                Dimension::Expansion => "um/m/K",
                Dimension::Temperature => "degC",
                Dimension::TemperatureChange => "K",
                Dimension::Angle => "deg",
                Dimension::Strain => "ue",
            },
            Units::US => match dimension {
                Dimension::Length => "in",
                Dimension::Area => "in2",
                Dimension::Force => "kip",
                Dimension::ForcePerLength => "kip/in",
                Dimension::Stress => "ksi",
                Dimension::Density => "lb/ft3",
                Dimension::MassPerLength => "lb/ft",
                Dimension::Mass => "lb",
                Dimension::Expansion => "/degF",
                Dimension::Temperature | Dimension::TemperatureChange => "degF",
                Dimension::Angle => "deg",
                Dimension::Strain => "ue",
            },
        }
    }

    /// The number that stands before the unit, for a value in SI base units.
    pub fn number(&self, dimension: Dimension, si: f64) -> String {
        let _ = dimension;
        si.to_string()
    }

    /// The value with its unit, which reads back as a literal: `2850 mm`.
    pub fn quantity(&self, dimension: Dimension, si: f64) -> String {
        format!("{} {}", self.number(dimension, si), self.unit(dimension))
    }
}
