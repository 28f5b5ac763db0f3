//! A member by its plain numbers (SI), written out as a job file. Numbers are written so that they
//! read back to the same double, and stations as joints (`s3.end`) or distances from the start.

use std::fmt::Write;

/// A member: segments in order, supports, and what acts.
#[derive(Debug, Clone, Default)]
pub(crate) struct Chain {
    pub(crate) segments: Vec<Segment>,
    pub(crate) supports: Vec<Support>,
    /// Forces at stations, + toward the end.
    pub(crate) forces: Vec<(At, f64)>,
}

#[derive(Debug, Clone)]
pub(crate) struct Segment {
    pub(crate) length: f64,
    pub(crate) kind: Kind,
    /// Line load at its start and its end.
    pub(crate) line: [f64; 2],
    /// Change of temperature at its start and its end.
    pub(crate) warming: [f64; 2],
    pub(crate) misfit: f64,
}

#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Kind {
    /// Area at the start and the end, modulus, coefficient of expansion.
    Solid {
        area: [f64; 2],
        modulus: f64,
        expansion: f64,
    },
    /// A part known by its stiffness.
    Part { stiffness: f64 },
    /// A joint; rigid once closed where no stiffness is given.
    Gap { stiffness: Option<f64> },
}

#[derive(Debug, Clone)]
pub(crate) struct Support {
    pub(crate) at: At,
    pub(crate) kind: Hold,
    /// Movement of what it is fixed to.
    pub(crate) movement: f64,
}

#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum Hold {
    Fixed,
    Spring(f64),
    Stop {
        clearance: f64,
        /// Blocks movement toward the end; else toward the start.
        toward_end: bool,
        stiffness: Option<f64>,
    },
}

/// A station: a joint between segments (0 is the start), or a distance from the start that lies
/// inside a segment.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(crate) enum At {
    Joint(usize),
    Distance(f64),
}

impl Chain {
    /// The distance of every joint from the start.
    pub(crate) fn joints(&self) -> Vec<f64> {
        let mut joints = vec![0.0];
        for segment in &self.segments {
            joints.push(joints[joints.len() - 1] + segment.length);
        }
        joints
    }

    pub(crate) fn x(&self, at: At) -> f64 {
        match at {
            At::Joint(joint) => self.joints()[joint],
            At::Distance(x) => x,
        }
    }

    fn station(&self, at: At) -> String {
        match at {
            At::Joint(0) => "start".into(),
            At::Joint(joint) if joint == self.segments.len() => "end".into(),
            At::Joint(joint) => format!("s{joint}.end"),
            At::Distance(x) => format!("{x:e} m"),
        }
    }

    /// The job file: member `m`, segments `s1 s2 …`, supports `k1 k2 …` in their order.
    pub(crate) fn job(&self) -> String {
        let mut job = String::new();
        self.write(&mut job).expect("a string takes all");
        job
    }

    fn write(&self, job: &mut String) -> std::fmt::Result {
        for (i, segment) in (1..).zip(&self.segments) {
            if let Kind::Solid {
                modulus, expansion, ..
            } = segment.kind
            {
                writeln!(
                    job,
                    "[material.steel{i}]\nmodulus = \"{modulus:e} Pa\"\nexpansion = \"{expansion:e} /K\"\n\
                     source = \"a number of the test\""
                )?;
            }
        }
        writeln!(job, "[member.m]")?;
        for (i, segment) in (1..).zip(&self.segments) {
            writeln!(job, "[[member.m.segment]]\nname = \"s{i}\"")?;
            let length = segment.length;
            match segment.kind {
                Kind::Solid { area: [a, b], .. } => writeln!(
                    job,
                    "length = \"{length:e} m\"\nmaterial = \"steel{i}\"\n\
                     section = {{ area = [\"{a:e} m2\", \"{b:e} m2\"] }}"
                )?,
                Kind::Part { stiffness } => writeln!(
                    job,
                    "length = \"{length:e} m\"\nstiffness = \"{stiffness:e} N/m\""
                )?,
                Kind::Gap { stiffness } => {
                    writeln!(job, "gap = \"{length:e} m\"")?;
                    if let Some(stiffness) = stiffness {
                        writeln!(job, "stiffness = \"{stiffness:e} N/m\"")?;
                    }
                }
            }
        }
        for (i, support) in (1..).zip(&self.supports) {
            let at = self.station(support.at);
            writeln!(job, "[[member.m.support]]\nname = \"k{i}\"\nat = \"{at}\"")?;
            match support.kind {
                Hold::Fixed => writeln!(job, "fixed = true")?,
                Hold::Spring(stiffness) => writeln!(job, "spring = \"{stiffness:e} N/m\"")?,
                Hold::Stop {
                    clearance,
                    toward_end,
                    stiffness,
                } => {
                    let side = if toward_end { "end" } else { "start" };
                    writeln!(job, "stop = \"{clearance:e} m\"\nside = \"{side}\"")?;
                    if let Some(stiffness) = stiffness {
                        writeln!(job, "stiffness = \"{stiffness:e} N/m\"")?;
                    }
                }
            }
        }
        self.write_loads(job)
    }

    fn write_loads(&self, job: &mut String) -> std::fmt::Result {
        for &(at, force) in &self.forces {
            let at = self.station(at);
            writeln!(
                job,
                "[[member.m.load]]\nat = \"{at}\"\nforce = \"{force:e} N\""
            )?;
        }
        for (i, segment) in (1..).zip(&self.segments) {
            if segment.line != [0.0; 2] {
                let [a, b] = segment.line;
                writeln!(
                    job,
                    "[[member.m.load]]\non = \"s{i}\"\nline = [\"{a:e} N/m\", \"{b:e} N/m\"]"
                )?;
            }
            if segment.warming != [0.0; 2] {
                let [a, b] = segment.warming;
                writeln!(
                    job,
                    "[[member.m.load]]\non = \"s{i}\"\n\
                     temperature-change = [\"{a:+e} K\", \"{b:+e} K\"]"
                )?;
            }
            if segment.misfit != 0.0 {
                writeln!(
                    job,
                    "[[member.m.load]]\non = \"s{i}\"\nmisfit = \"{:e} m\"",
                    segment.misfit
                )?;
            }
        }
        for (i, support) in (1..).zip(&self.supports) {
            if support.movement != 0.0 {
                writeln!(
                    job,
                    "[[member.m.load]]\nsupport = \"k{i}\"\nmovement = \"{:e} m\"",
                    support.movement
                )?;
            }
        }
        Ok(())
    }
}

/// A small generator of random numbers (splitmix64; Steele, Lea and Flood 2014), so that a run can
/// be repeated on any machine.
pub(crate) struct Random(pub(crate) u64);

impl Random {
    pub(crate) fn bits(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9E37_79B9_7F4A_7C15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xBF58_476D_1CE4_E5B9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94D0_49BB_1331_11EB);
        z ^ (z >> 31)
    }

    /// Even between two numbers.
    pub(crate) fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * ((self.bits() >> 11) as f64 / (1u64 << 53) as f64)
    }

    /// Even by its logarithm between two positive numbers.
    pub(crate) fn size(&mut self, low: f64, high: f64) -> f64 {
        self.between(low.ln(), high.ln()).exp()
    }

    /// A whole number below `count`.
    pub(crate) fn below(&mut self, count: usize) -> usize {
        (self.bits() % count as u64) as usize
    }

    /// True with this chance.
    pub(crate) fn chance(&mut self, chance: f64) -> bool {
        self.between(0.0, 1.0) < chance
    }
}
