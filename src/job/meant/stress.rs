//! The limit of a stress, where it is a share of a strength.

use super::Meaning;
use crate::catalogue::Shape;
use crate::job::written::Written;
use crate::model::{Layer, Remark, ShareFactor};
use crate::quantity::Strength;
use crate::quantity::{Length, Stress, StressLimit};

/// A thickness may exceed that of a row by this share and still be in it: the rounding of units.
const ROUNDING: f64 = 1e-12;

/// The stress that a limit allows in a layer, and the factor where it is a share. A strength that
/// is not given is reported at the limit.
pub(super) fn allowed(
    limit: &Written<StressLimit>,
    layer: &Layer,
    member: &str,
    meaning: &mut Meaning<'_, '_>,
) -> Option<(Stress, Option<ShareFactor>)> {
    let (factor, strength) = match limit.value {
        StressLimit::Stress(literal) => return Some((literal.nominal, None)),
        StressLimit::Share { factor, strength } => (factor, strength),
    };
    let material = &meaning.materials.used[layer.material];
    let id = material.id.clone();
    let value = match strength {
        Strength::Ultimate => material.ultimate,
        Strength::Proof => material.proof,
        Strength::Crushing => material.crushing,
        Strength::Yield => match row(&material.yield_strength, layer.section.thickness()) {
            Row::Found(value) => Some(value),
            Row::Lowest(value) => {
                let about = format!("member.{member}");
                let text = format!(
                    "the thickness of `{}` is not known, so the lowest yield strength of `{id}` \
                     is used",
                    layer.name
                );
                let place = Some(layer.place.clone());
                let remark = Remark {
                    about,
                    text,
                    place,
                    caution: false,
                };
                if meaning.remarks.last() != Some(&remark) {
                    meaning.remarks.push(remark);
                }
                Some(value)
            }
            Row::Beyond { thickness, last } => {
                let message = format!(
                    "`{id}` gives no yield strength for a thickness of {} mm, that of `{}`; its \
                     last row is {} mm",
                    millimetres(thickness),
                    layer.name,
                    millimetres(last)
                );
                let help = "write the limit as a stress, or a material of the job's own with a \
                            row for it";
                meaning.r.problems.say(&limit.place, message, help);
                return None;
            }
            Row::None => None,
        },
    };
    let Some(value) = value else {
        let word = word(strength);
        let message =
            format!("this is a share of the {word} strength of `{id}`, which is not given");
        let help = format!("add `{word}` in `[material.{id}]`, or write the limit as a stress");
        meaning.r.problems.say(&limit.place, message, help);
        return None;
    };
    Some((value * factor, Some(ShareFactor(factor))))
}

/// What a table of yield strengths says for a thickness.
enum Row {
    Found(Stress),
    Lowest(Stress),
    Beyond { thickness: Length, last: Length },
    None,
}

fn row(table: &[(Option<Length>, Stress)], thickness: Option<Length>) -> Row {
    let mut strengths = table.iter().map(|(_, strength)| *strength);
    let Some(first) = strengths.next() else {
        return Row::None;
    };
    let last = match table.last() {
        Some((Some(last), _)) => *last,
        _ => return Row::Found(first), // one value for any thickness
    };
    let Some(thickness) = thickness else {
        let lowest = strengths.fold(first, |low, next| if next < low { next } else { low });
        return Row::Lowest(lowest);
    };
    table
        .iter()
        .find(|(upto, _)| upto.is_none_or(|upto| thickness <= upto * (1.0 + ROUNDING)))
        .map_or(Row::Beyond { thickness, last }, |(_, strength)| {
            Row::Found(*strength)
        })
}

/// A length in millimetres to a thousandth, for a message.
fn millimetres(length: Length) -> f64 {
    (length.value * 1e6).round() / 1e3
}

fn word(strength: Strength) -> &'static str {
    match strength {
        Strength::Yield => "yield",
        Strength::Ultimate => "ultimate",
        Strength::Proof => "proof",
        Strength::Crushing => "crushing",
    }
}
