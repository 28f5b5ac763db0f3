//! A threaded rod or bolt by its nominal diameter and pitch.

use super::{Along, Shape};
use crate::quantity::{Area, Curve, Length};
use std::f64::consts::FRAC_PI_4;

/// The height of the fundamental triangle of a 60° thread, as a share of its pitch: √3 / 2.
const TRIANGLE: f64 = 0.866_025_403_784_438_6;

/// The standard that a thread is made to.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum ThreadForm {
    /// ISO metric, ISO 261.
    Metric,
    /// Unified inch, ASME B1.1.
    Unified,
}

/// The area of a thread that stiffness and weight stand on.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum StiffnessArea {
    /// The tensile stress area, between those at the pitch and at the root.
    #[default]
    Tensile,
    /// The area of the nominal diameter.
    Nominal,
    /// The area at the root.
    Minor,
}

/// A thread. It has two areas for stress: the nominal one is its gross area, and the tensile
/// stress area is its net area, on which a stress stands unless the limit says `gross`. Stiffness
/// and weight stand on a third choice, [`StiffnessArea`], the tensile stress area when left out.
///
/// | area | ISO metric | Unified |
/// | --- | --- | --- |
/// | nominal | π/4 d² | π/4 D² |
/// | tensile stress | π/4 ((d₂ + d₃)/2)², d₂ = d − 0.6495 P, d₃ = d − 1.2269 P (ISO 898-1) | π/4 (D − 0.9743/n)² (ASME B1.1) |
/// | minor | π/4 d₃² | π/4 (D − 1.2990/n)² (ASME B1.1, section at D − 2h_b) |
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Thread {
    /// Nominal diameter, d or D.
    pub nominal: Length,
    /// Pitch, P; 1/n inch in a Unified thread.
    pub pitch: Length,
    /// Its standard.
    pub form: ThreadForm,
    /// What its stiffness stands on.
    pub stiffness_area: StiffnessArea,
}

impl Thread {
    /// The area of the nominal diameter.
    pub fn nominal_area(&self) -> Area {
        circle(self.nominal)
    }

    /// The tensile stress area.
    pub fn tensile_stress_area(&self) -> Area {
        circle(match self.form {
            ThreadForm::Metric => {
                let pitch_diameter = self.nominal - self.pitch * (0.75 * TRIANGLE);
                (pitch_diameter + self.root_diameter()) / 2.0
            }
            ThreadForm::Unified => self.nominal - self.pitch * 0.9743,
        })
    }

    /// The area at the root.
    pub fn minor_area(&self) -> Area {
        circle(self.root_diameter())
    }

    /// d₃ of a metric thread, D − 2h_b of a Unified one.
    fn root_diameter(&self) -> Length {
        let depth = match self.form {
            ThreadForm::Metric => 17.0 / 12.0 * TRIANGLE,
            ThreadForm::Unified => 1.5 * TRIANGLE,
        };
        self.nominal - self.pitch * depth
    }

    fn chosen_area(&self) -> Area {
        match self.stiffness_area {
            StiffnessArea::Tensile => self.tensile_stress_area(),
            StiffnessArea::Nominal => self.nominal_area(),
            StiffnessArea::Minor => self.minor_area(),
        }
    }
}

fn circle(diameter: Length) -> Area {
    FRAC_PI_4 * (diameter * diameter)
}

impl Shape for Thread {
    fn area(&self) -> Curve<Area> {
        Curve::constant(self.chosen_area())
    }

    fn area_at(&self, _: f64) -> Area {
        self.chosen_area()
    }

    fn gross_area(&self) -> Curve<Area> {
        Curve::constant(self.nominal_area())
    }

    fn net_area(&self) -> Option<Curve<Area>> {
        Some(Curve::constant(self.tensile_stress_area()))
    }

    /// That of the round with the tensile stress area.
    fn gyration_at(&self, _: f64) -> Option<Length> {
        Some((self.tensile_stress_area() / (4.0 * std::f64::consts::PI)).sqrt())
    }

    fn thickness(&self) -> Option<Length> {
        Some(self.nominal)
    }

    fn fault(&self) -> Option<String> {
        super::not_positive("diameter", &Along::uniform(self.root_diameter()))
    }
}
