//! A job in SI base units, written again in inches and pounds.

use crate::common::factor;

/// Every quantity of a job in US units: each quoted number with a unit is converted.
pub(crate) fn in_us_units(job: &str) -> String {
    let mut twin = String::new();
    for (i, part) in job.split('"').enumerate() {
        if i > 0 {
            twin.push('"');
        }
        // Every second part stands between quotation marks.
        match (i % 2 == 1).then(|| converted(part)).flatten() {
            Some(converted) => twin.push_str(&converted),
            None => twin.push_str(part),
        }
    }
    twin
}

fn converted(literal: &str) -> Option<String> {
    const POUND: f64 = 0.453_592_37;
    const FOOT: f64 = 0.3048;
    let (number, unit) = literal.split_once(' ')?;
    let number: f64 = number.parse().ok()?;
    let (inch, pound_force, degree) = (factor("in"), factor("lbf"), factor("degF"));
    let (us, factor) = match unit {
        "m" => ("in", inch),
        "m2" => ("in2", inch * inch),
        "N" => ("lbf", pound_force),
        "N m" => ("lbf in", pound_force * inch),
        "N/m" => ("lbf/in", pound_force / inch),
        "Pa" => ("psi", factor("psi")),
        "kg" => ("lb", POUND),
        "kg/m3" => ("lb/ft3", POUND / FOOT.powi(3)),
        "/K" => ("/degF", 1.0 / degree),
        "K" => return Some(format!("{:+e} degF", number / degree)),
        "deg" => return None,
        other => panic!("no twin of the unit `{other}`"),
    };
    Some(format!("{:e} {us}", number / factor))
}
