//! Writing an assembly as a job file, each number such that it reads back to the same double.

use super::assembly::{
    Assembly, Hold, HoldKind, Kind, Layer, Member, Section, Segment, Vector, Way, unit,
};
use crate::common::chain::At;
use std::fmt::{Result, Write};

impl Assembly {
    /// The job file: one combination `intact`, and where members are lost `loss/without=m1` ….
    pub(crate) fn job(&self) -> String {
        let mut job = String::new();
        self.write(&mut job).expect("a string takes all");
        job
    }

    fn write(&self, job: &mut String) -> Result {
        if let Some(angle) = self.runs {
            writeln!(job, "[default]\nruns = \"{angle:e} deg\"")?;
        }
        let factors = "factors = { own = 1.0, acting = 1.0 }";
        let weight = self.weight;
        if weight == 0.0 {
            writeln!(job, "[case.own]")?;
        } else {
            writeln!(job, "[case.own]\nweight = {weight:?}")?;
        }
        writeln!(job, "[case.acting]\n[combination.intact]\n{factors}")?;
        if !self.lose_each.is_empty() {
            let lost: Vec<String> = self
                .lose_each
                .iter()
                .map(|m| format!("m{}", m + 1))
                .collect();
            writeln!(job, "[combination.loss]\n{factors}\nlose-each = {lost:?}")?;
        }
        writeln!(job, "[point]")?;
        for (i, &at) in (1..).zip(&self.points) {
            writeln!(job, "p{i} = {}", self.entries(at, "m"))?;
        }
        for (i, member) in (1..).zip(&self.members) {
            member.write_materials(i, job)?;
        }
        for (i, body) in (1..).zip(&self.bodies) {
            let points: Vec<String> = body.points.iter().map(|p| format!("p{}", p + 1)).collect();
            writeln!(job, "[body.b{i}]\npoints = {points:?}")?;
            if body.mass > 0.0 {
                writeln!(job, "mass = \"{:e} kg\"", body.mass)?;
            }
            if body.mass > 0.0 || body.force != [0.0; 3] {
                writeln!(job, "at = {}", self.entries(body.centre, "m"))?;
            }
        }
        for (i, member) in (1..).zip(&self.members) {
            member.write(i, job)?;
        }
        for (i, hold) in (1..).zip(&self.holds) {
            self.write_hold(i, hold, job)?;
        }
        self.write_loads(job)
    }

    /// A list of one entry a coordinate.
    fn entries(&self, vector: Vector, unit: &str) -> String {
        let entries = vector[..self.coordinates].iter();
        let entries: Vec<String> = entries.map(|v| format!("{v:e} {unit}")).collect();
        format!("{entries:?}")
    }

    /// A direction: an axis by its name, with its sign where that counts, else a list.
    fn direction(&self, direction: Vector, signed: bool) -> String {
        let axis = (0..self.coordinates).find(|&i| direction.map(f64::abs) == unit(i));
        match axis {
            Some(i) => {
                let sign = match (signed, direction[i] > 0.0) {
                    (false, _) => "",
                    (true, true) => "+",
                    (true, false) => "-",
                };
                format!("\"{sign}{}\"", ["x", "y", "z"][i])
            }
            None => format!("{:?}", &direction[..self.coordinates]),
        }
    }

    fn write_hold(&self, i: usize, hold: &Hold, job: &mut String) -> Result {
        writeln!(
            job,
            "[[hold]]\nname = \"h{i}\"\npoint = \"p{}\"",
            hold.point + 1
        )?;
        if hold.along.len() < self.coordinates || matches!(hold.kind, HoldKind::Stop { .. }) {
            let signed = matches!(hold.kind, HoldKind::Stop { .. });
            let written = |&direction: &Vector| self.direction(direction, signed);
            let directions: Vec<String> = hold.along.iter().map(written).collect();
            writeln!(job, "along = [{}]", directions.join(", "))?;
        }
        match hold.kind {
            HoldKind::Fixed => Ok(()),
            HoldKind::Spring(stiffness) => writeln!(job, "spring = \"{stiffness:e} N/m\""),
            HoldKind::Stop {
                clearance,
                stiffness,
            } => {
                writeln!(job, "stop = \"{clearance:e} m\"")?;
                stiffness.map_or(Ok(()), |k| writeln!(job, "stiffness = \"{k:e} N/m\""))
            }
        }
    }

    fn write_loads(&self, job: &mut String) -> Result {
        let head = "[[load]]\ncase = \"acting\"";
        for &(point, force) in &self.forces {
            let force = self.entries(force, "N");
            writeln!(job, "{head}\npoint = \"p{}\"\nforce = {force}", point + 1)?;
        }
        for (i, body) in (1..).zip(&self.bodies) {
            if body.force != [0.0; 3] {
                let force = self.entries(body.force, "N");
                writeln!(job, "{head}\nbody = \"b{i}\"\nforce = {force}")?;
            }
            if body.moment != [0.0; 3] {
                let moment = match self.coordinates {
                    2 => format!("\"{:e} N m\"", body.moment[2]),
                    _ => self.entries(body.moment, "N m"),
                };
                writeln!(job, "{head}\nbody = \"b{i}\"\nmoment = {moment}")?;
            }
        }
        for (i, hold) in (1..).zip(&self.holds) {
            if hold.movement != [0.0; 3] {
                let movement = self.entries(hold.movement, "m");
                writeln!(job, "{head}\nhold = \"h{i}\"\nmovement = {movement}")?;
            }
        }
        Ok(())
    }
}

impl Member {
    fn write_materials(&self, i: usize, job: &mut String) -> Result {
        for (s, segment) in (1..).zip(&self.segments) {
            let Kind::Solid(layers) = &segment.kind else {
                continue;
            };
            for (k, layer) in (1..).zip(layers) {
                let (modulus, expansion) = (layer.modulus, layer.expansion);
                let density = layer.density;
                writeln!(
                    job,
                    "[material.m{i}s{s}k{k}]\nmodulus = \"{modulus:e} Pa\"\nexpansion = \
                     \"{expansion:e} /K\"\ndensity = \"{density:e} kg/m3\"\nsource = \"a number \
                     of the test\""
                )?;
            }
        }
        Ok(())
    }

    fn write(&self, i: usize, job: &mut String) -> Result {
        let [a, b] = self.ends.map(|p| p + 1);
        writeln!(job, "[member.m{i}]\nbetween = [\"p{a}\", \"p{b}\"]")?;
        match self.carries {
            Some(Way::Tension) => writeln!(job, "carries = \"tension\"")?,
            Some(Way::Compression) => writeln!(job, "carries = \"compression\"")?,
            None => {}
        }
        for (s, segment) in self.segments.iter().enumerate() {
            segment.write(i, s + 1, self.rest == Some(s), job)?;
        }
        let head = format!("[[member.m{i}.load]]\ncase = \"acting\"");
        for inner in &self.forces {
            let key = if inner.down { "down" } else { "force" };
            let at = match inner.at {
                At::Joint(0) => "start".to_owned(),
                At::Joint(joint) if joint == self.segments.len() => "end".to_owned(),
                At::Joint(joint) => format!("s{joint}.end"),
                At::Distance(x) => format!("{x:e} m"),
            };
            writeln!(
                job,
                "{head}\nat = \"{at}\"\n{key} = \"{:e} N\"",
                inner.force
            )?;
        }
        for (s, segment) in (1..).zip(&self.segments) {
            let on = format!("{head}\non = \"s{s}\"");
            for (key, [a, b]) in [("line", segment.line), ("line-down", segment.line_down)] {
                if [a, b] != [0.0; 2] {
                    writeln!(job, "{on}\n{key} = [\"{a:e} N/m\", \"{b:e} N/m\"]")?;
                }
            }
            if segment.warming != [0.0; 2] {
                let [a, b] = segment.warming;
                writeln!(
                    job,
                    "{on}\ntemperature-change = [\"{a:+e} K\", \"{b:+e} K\"]"
                )?;
            }
            if segment.misfit != 0.0 {
                writeln!(job, "{on}\nmisfit = \"{:e} m\"", segment.misfit)?;
            }
        }
        Ok(())
    }
}

impl Segment {
    fn write(&self, i: usize, s: usize, rest: bool, job: &mut String) -> Result {
        writeln!(job, "[[member.m{i}.segment]]\nname = \"s{s}\"")?;
        match &self.kind {
            Kind::Gap(stiffness) => {
                writeln!(job, "gap = \"{:e} m\"", self.length)?;
                return stiffness.map_or(Ok(()), |k| writeln!(job, "stiffness = \"{k:e} N/m\""));
            }
            _ if rest => writeln!(job, "length = \"rest\"")?,
            _ => writeln!(job, "length = \"{:e} m\"", self.length)?,
        }
        match &self.kind {
            Kind::Solid(layers) => match layers.as_slice() {
                [layer] => {
                    let section = layer.section.written();
                    writeln!(job, "section = {section}\nmaterial = \"m{i}s{s}k1\"")
                }
                _ => {
                    let layer = |(k, layer): (usize, &Layer)| {
                        let section = layer.section.written();
                        format!("{{ section = {section}, material = \"m{i}s{s}k{k}\" }}")
                    };
                    let layers: Vec<String> = (1..).zip(layers).map(layer).collect();
                    writeln!(job, "layer = [{}]", layers.join(", "))
                }
            },
            Kind::Part(stiffness) => writeln!(job, "stiffness = \"{stiffness:e} N/m\""),
            Kind::Gap(_) => Ok(()),
        }
    }
}

impl Section {
    fn written(&self) -> String {
        let (key, unit, [a, b]) = match *self {
            Section::Area(pair) => ("area", "m2", pair),
            Section::Round(pair) => ("round", "m", pair),
        };
        format!("{{ {key} = [\"{a:e} {unit}\", \"{b:e} {unit}\"] }}")
    }
}
