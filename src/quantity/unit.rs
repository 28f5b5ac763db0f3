//! The units that literals may have, with their exact definitions.
//!
//! Sources: the metre, kilogram, newton, pascal and their prefixes are the SI's (SI brochure, 9th
//! edition). 1 yd = 0.9144 m and 1 lb = 0.453 592 37 kg are the international yard and pound
//! agreement of 1959. Standard gravity, 9.806 65 m/s², is that of the third CGPM (1901). All other
//! US units follow from these three, as in NIST SP 811 (2008), appendix B. 1 bar = 100 kPa.

use super::Dimension;
use super::exact::{Exact, Twofold};

/// The powers of the base quantities. The plane angle counts as one, so that a degree is no strain.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Powers {
    pub(super) length: i16,
    pub(super) mass: i16,
    pub(super) time: i16,
    pub(super) temperature: i16,
    pub(super) angle: i16,
}

impl Powers {
    const fn of(length: i16, mass: i16, time: i16) -> Self {
        Powers {
            length,
            mass,
            time,
            temperature: 0,
            angle: 0,
        }
    }

    pub(super) const NONE: Powers = Powers::of(0, 0, 0);
    pub(super) const LENGTH: Powers = Powers::of(1, 0, 0);
    pub(super) const AREA: Powers = Powers::of(2, 0, 0);
    pub(super) const VOLUME: Powers = Powers::of(3, 0, 0);
    pub(super) const MASS: Powers = Powers::of(0, 1, 0);
    pub(super) const MASS_PER_LENGTH: Powers = Powers::of(-1, 1, 0);
    pub(super) const DENSITY: Powers = Powers::of(-3, 1, 0);
    pub(super) const FORCE: Powers = Powers::of(1, 1, -2);
    pub(super) const FORCE_PER_LENGTH: Powers = Powers::of(0, 1, -2);
    pub(super) const MOMENT: Powers = Powers::of(2, 1, -2);
    pub(super) const STRESS: Powers = Powers::of(-1, 1, -2);
    pub(super) const UNIT_WEIGHT: Powers = Powers::of(-2, 1, -2);
    pub(super) const TEMPERATURE: Powers = Powers {
        temperature: 1,
        ..Powers::NONE
    };
    pub(super) const EXPANSION: Powers = Powers {
        temperature: -1,
        ..Powers::NONE
    };
    pub(super) const ANGLE: Powers = Powers {
        angle: 1,
        ..Powers::NONE
    };

    /// The powers of a product with `other` raised to `power`.
    pub(super) fn times(self, other: Powers, power: i16) -> Self {
        Powers {
            length: self.length + other.length * power,
            mass: self.mass + other.mass * power,
            time: self.time + other.time * power,
            temperature: self.temperature + other.temperature * power,
            angle: self.angle + other.angle * power,
        }
    }

    /// What they are the powers of, in a sentence, with the article.
    pub(super) fn kind(self) -> &'static str {
        match self {
            Powers::NONE => "a ratio",
            Powers::TEMPERATURE => "a temperature",
            Powers::VOLUME => "a volume",
            Powers::UNIT_WEIGHT => "a force per volume",
            _ => Dimension::ALL
                .into_iter()
                .find(|dimension| dimension.powers() == self)
                .map_or("a quantity of another kind", Dimension::name),
        }
    }

    /// The powers of the weight of a mass.
    pub(super) fn weight(self) -> Self {
        self.times(Powers::of(1, 0, -2), 1)
    }
}

/// A named unit: how many SI base units it is.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct Unit {
    pub(super) name: &'static str,
    pub(super) powers: Powers,
    pub(super) factor: Exact,
}

const fn unit(name: &'static str, powers: Powers, over: f64, under: f64) -> Unit {
    Unit {
        name,
        powers,
        factor: Exact::ratio(over, under),
    }
}

/// 0.453 592 37 kg × 9.806 65 m/s², times 1e13.
pub(super) const POUND_FORCE: f64 = 44_482_216_152_605.0;
/// 0.3048 m, cubed, times 1e12.
pub(super) const CUBIC_FOOT: f64 = 28_316_846_592.0;

/// π to 32 digits, as the sum of two doubles.
pub(super) const PI: Twofold = Twofold {
    high: std::f64::consts::PI,
    low: 1.224_646_799_147_353_2e-16,
};

/// The units, the most used first. `lb` has two meanings and stands apart.
pub(super) const UNITS: &[Unit] = &[
    unit("mm", Powers::LENGTH, 1.0, 1e3),
    unit("m", Powers::LENGTH, 1.0, 1.0),
    unit("kN", Powers::FORCE, 1e3, 1.0),
    unit("MPa", Powers::STRESS, 1e6, 1.0),
    unit("K", Powers::TEMPERATURE, 1.0, 1.0),
    unit("degC", Powers::TEMPERATURE, 1.0, 1.0),
    unit("degF", Powers::TEMPERATURE, 5.0, 9.0),
    unit("in", Powers::LENGTH, 254.0, 1e4),
    unit("ft", Powers::LENGTH, 3048.0, 1e4),
    unit("kip", Powers::FORCE, POUND_FORCE, 1e10),
    unit("ksi", Powers::STRESS, POUND_FORCE, 6_451_600.0),
    unit("N", Powers::FORCE, 1.0, 1.0),
    unit("GPa", Powers::STRESS, 1e9, 1.0),
    unit("kg", Powers::MASS, 1.0, 1.0),
    unit("cm", Powers::LENGTH, 1.0, 1e2),
    unit("um", Powers::LENGTH, 1.0, 1e6),
    unit("µm", Powers::LENGTH, 1.0, 1e6),
    unit("μm", Powers::LENGTH, 1.0, 1e6),
    unit("km", Powers::LENGTH, 1e3, 1.0),
    unit("yd", Powers::LENGTH, 9144.0, 1e4),
    unit("mil", Powers::LENGTH, 254.0, 1e7),
    unit("mN", Powers::FORCE, 1.0, 1e3),
    unit("MN", Powers::FORCE, 1e6, 1.0),
    unit("lbf", Powers::FORCE, POUND_FORCE, 1e13),
    unit("kgf", Powers::FORCE, 980_665.0, 1e5),
    unit("tf", Powers::FORCE, 980_665.0, 1e2),
    unit("tonf-us", Powers::FORCE, 2.0 * POUND_FORCE, 1e10),
    unit("Pa", Powers::STRESS, 1.0, 1.0),
    unit("kPa", Powers::STRESS, 1e3, 1.0),
    unit("bar", Powers::STRESS, 1e5, 1.0),
    // lbf over (0.0254 m)²; the denominator is 0.000 645 16 times the power of ten.
    unit("psi", Powers::STRESS, POUND_FORCE, 6_451_600_000.0),
    unit("Msi", Powers::STRESS, 10.0 * POUND_FORCE, 64_516.0),
    unit("g", Powers::MASS, 1.0, 1e3),
    unit("t", Powers::MASS, 1e3, 1.0),
    // lb over (0.3048 m)³.
    unit("pcf", Powers::DENSITY, 453_592_370_000.0, CUBIC_FOOT),
    unit("°C", Powers::TEMPERATURE, 1.0, 1.0),
    unit("°F", Powers::TEMPERATURE, 5.0, 9.0),
    unit("rad", Powers::ANGLE, 1.0, 1.0),
    DEGREE,
    Unit {
        name: "°",
        ..DEGREE
    },
    unit("%", Powers::NONE, 1.0, 1e2),
    unit("ue", Powers::NONE, 1.0, 1e6),
    unit("µe", Powers::NONE, 1.0, 1e6),
    unit("μe", Powers::NONE, 1.0, 1e6),
    unit("µε", Powers::NONE, 1.0, 1e6),
    unit("με", Powers::NONE, 1.0, 1e6),
    unit("microstrain", Powers::NONE, 1.0, 1e6),
];

const DEGREE: Unit = Unit {
    name: "deg",
    powers: Powers::ANGLE,
    factor: Exact {
        over: PI,
        under: Twofold::of(180.0),
    },
};

/// `lb` where a force is meant.
const POUND_AS_FORCE: Unit = unit("lb", Powers::FORCE, POUND_FORCE, 1e13);
/// `lb` where a mass is meant.
const POUND_AS_MASS: Unit = unit("lb", Powers::MASS, 45_359_237.0, 1e8);
/// The inch, for its mark.
pub(super) const INCH: Unit = unit("in", Powers::LENGTH, 254.0, 1e4);

/// What `lb` means in a field.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Pound {
    /// Pound-force: in a force, moment, stress, stiffness or line load.
    Force,
    /// Pound-mass: in a mass or density.
    Mass,
}

/// The unit of this name.
pub(super) fn named(name: &str, pound: Pound) -> Option<&'static Unit> {
    if name == "lb" {
        return Some(match pound {
            Pound::Force => &POUND_AS_FORCE,
            Pound::Mass => &POUND_AS_MASS,
        });
    }
    UNITS.iter().find(|unit| unit.name == name)
}

/// Spellings that are no units here but say which one is meant.
const SPELLINGS: &[(&str, &str)] = &[
    ("c", "degC"),
    ("celsius", "degC"),
    ("f", "degF"),
    ("fahrenheit", "degF"),
    ("kelvin", "K"),
    ("degk", "K"),
    ("degree", "deg"),
    ("degrees", "deg"),
    ("radian", "rad"),
    ("radians", "rad"),
    ("metre", "m"),
    ("metres", "m"),
    ("meter", "m"),
    ("meters", "m"),
    ("millimetre", "mm"),
    ("millimetres", "mm"),
    ("millimeter", "mm"),
    ("millimeters", "mm"),
    ("micron", "um"),
    ("microns", "um"),
    ("inch", "in"),
    ("inches", "in"),
    ("foot", "ft"),
    ("feet", "ft"),
    ("yard", "yd"),
    ("yards", "yd"),
    ("thou", "mil"),
    ("newton", "N"),
    ("newtons", "N"),
    ("kilonewton", "kN"),
    ("kilonewtons", "kN"),
    ("kp", "kgf"),
    ("kips", "kip"),
    ("k", "kip"),
    ("lbs", "lb"),
    ("pound", "lb"),
    ("pounds", "lb"),
    ("lbm", "lb"),
    ("tonne", "t"),
    ("tonnes", "t"),
    ("pascal", "Pa"),
    ("percent", "%"),
    ("ustrain", "ue"),
];

/// The unit that a misspelt name may mean: another case, a word for it, or one letter apart.
pub(super) fn nearest(name: &str) -> Option<&'static str> {
    let lower = name.to_lowercase();
    let names = || UNITS.iter().map(|unit| unit.name).chain(["lb"]);
    names()
        .find(|known| known.to_lowercase() == lower)
        .or_else(|| {
            let word = SPELLINGS.iter().find(|(word, _)| *word == lower);
            word.map(|&(_, meant)| meant)
        })
        .or_else(|| {
            // One letter apart says something only of names that have at least three.
            let long = name.chars().count() >= 3;
            names()
                .find(|known| long && known.len() >= 2 && one_apart(&lower, &known.to_lowercase()))
        })
}

/// Whether one letter put in, left out, changed, or two neighbours swapped make `a` into `b`.
pub(super) fn one_apart(a: &str, b: &str) -> bool {
    let (a, b): (Vec<char>, Vec<char>) = (a.chars().collect(), b.chars().collect());
    let same = a.iter().zip(&b).take_while(|(x, y)| x == y).count();
    let (a, b) = (&a[same..], &b[same..]);
    match (a, b) {
        ([_, a @ ..], [_, b @ ..]) if a == b => true,
        ([_, a @ ..], b) if a == b => true,
        (a, [_, b @ ..]) if a == b => true,
        ([x, y, a @ ..], [v, w, b @ ..]) => x == w && y == v && a == b,
        _ => false,
    }
}

#[cfg(test)]
mod tests {
    use super::{DEGREE, UNITS, nearest, one_apart};

    #[test]
    fn factors_are_fractions_of_whole_numbers_that_doubles_hold() {
        let whole = |number: f64| number.fract() == 0.0 && number.abs() <= 9_007_199_254_740_992.0;
        for unit in UNITS.iter().filter(|unit| unit.powers != DEGREE.powers) {
            let factor = unit.factor;
            assert!(
                whole(factor.over.high) && factor.over.low == 0.0,
                "{}",
                unit.name
            );
            assert!(
                whole(factor.under.high) && factor.under.low == 0.0,
                "{}",
                unit.name
            );
        }
    }

    #[test]
    fn no_name_stands_twice() {
        for (at, unit) in UNITS.iter().enumerate() {
            assert!(
                UNITS[..at].iter().all(|other| other.name != unit.name),
                "{}",
                unit.name
            );
        }
    }

    #[test]
    fn one_apart_is_one_letter() {
        for (a, b) in [
            ("yeild", "yield"),
            ("yiel", "yield"),
            ("yieldd", "yield"),
            ("yeeld", "yield"),
        ] {
            assert!(one_apart(a, b), "{a} {b}");
        }
        for (a, b) in [("yed", "yield"), ("dleiy", "yield"), ("", "ab")] {
            assert!(!one_apart(a, b), "{a} {b}");
        }
    }

    #[test]
    fn near_misses() {
        assert_eq!(nearest("Mpa"), Some("MPa"));
        assert_eq!(nearest("feet"), Some("ft"));
        assert_eq!(nearest("furlong"), None);
        assert_eq!(nearest("q"), None);
    }
}
