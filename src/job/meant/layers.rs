//! What segments are made of: layers with their areas, parts, gaps.

use super::Meaning;
use super::lookup::Lookup;
use crate::catalogue::Shape;
use crate::job::written::Entry;
use crate::job::written::segment::{Kind, Layer as WrittenLayer, Segment as WrittenSegment};
use crate::model::{Gap, Layer, Name, Part, Place, SegmentKind};
use crate::quantity::{Area, Curve};

/// As many steps are looked at for whether a net area stays within its gross one.
const STEPS: u8 = 32;

impl<'w, 't> Meaning<'w, 't> {
    /// What a segment is made of; `None` where something about it is at fault.
    pub(super) fn kind(
        &mut self,
        written: &'w WrittenSegment<'t>,
        segment: &Name,
    ) -> Option<SegmentKind> {
        match &written.kind {
            Kind::Wrong => None,
            Kind::Solid { layers, layered } => {
                let names = self.layer_names(layers, *layered, segment);
                let made: Vec<Option<Layer>> = layers
                    .iter()
                    .zip(names.into_iter().flatten())
                    .map(|(layer, name)| self.layer(layer, name))
                    .collect();
                let layers = made.into_iter().collect::<Option<Vec<_>>>()?;
                (!layers.is_empty()).then_some(SegmentKind::Solid {
                    layers,
                    layered: *layered,
                })
            }
            Kind::Part {
                stiffness,
                expansion,
                mass,
            } => {
                if expansion.is_wrong() || mass.is_wrong() {
                    return None;
                }
                Some(SegmentKind::Stiffness(Part {
                    stiffness: stiffness.given()?.value,
                    expansion: expansion.given().map(|written| written.value),
                    mass: mass.given().map(|written| written.value),
                }))
            }
            Kind::Gap { stiffness } => {
                if stiffness.is_wrong() {
                    return None;
                }
                Some(SegmentKind::Gap(Gap {
                    width: written.own_length()?,
                    stiffness: stiffness.given().map(|written| written.value),
                }))
            }
        }
    }

    /// The names of the layers: as written, or their numbers. `None` where two are equal.
    fn layer_names(
        &mut self,
        layers: &[WrittenLayer<'t>],
        layered: bool,
        segment: &Name,
    ) -> Option<Vec<Name>> {
        if !layered {
            return Some(vec![segment.clone()]);
        }
        let names: Vec<Name> = layers
            .iter()
            .enumerate()
            .map(|(index, layer)| match layer.name.given() {
                Some(written) => Name::from(written.value),
                None => Name::from((index + 1).to_string()),
            })
            .collect();
        let lookup = Lookup::new(names.clone());
        let mut sound = true;
        for index in lookup.repeated() {
            let layer = &layers[index];
            let place = layer.name.given().map_or(&layer.place, |name| &name.place);
            let message = format!(
                "two layers of the segment `{segment}` are called `{}`",
                names[index]
            );
            self.r.problems.say(place, message, "give one another name");
            sound = false;
        }
        sound.then_some(names)
    }

    fn layer(&mut self, written: &'w WrittenLayer<'t>, name: Name) -> Option<Layer> {
        let job = self.job;
        let material = match written.material.or(&job.default.material) {
            Entry::Given(id) => self.material(id),
            Entry::Wrong => None,
            Entry::Absent => {
                let message = "no material is given here";
                let help = "add `material = \"steel-s355\"`, or give one to all in `[default]`";
                self.r
                    .problems
                    .missing("material", &written.place, message, help);
                None
            }
        };
        let section = &written.section.given()?.value;
        if written.count.is_wrong() || written.mass.is_wrong() {
            return None;
        }
        let count = written.count.given().map_or(1.0, |count| count.value);
        let gross = section.gross_area() * count;
        let own_net = section.net_area().map(|net| net * count);
        let net = match (&written.net, &written.holes) {
            (Entry::Wrong, _) | (_, Entry::Wrong) => return None,
            (Entry::Given(net), _) => {
                let curve = net.value.curve();
                self.within(&curve, &gross, &net.place)?;
                Some(curve)
            }
            (_, Entry::Given(holes)) => {
                let lost = holes.value.diameter * holes.value.thickness;
                let left = own_net.unwrap_or(gross) - lost * (holes.value.number * count);
                self.leaves_area(&left, &holes.place)?;
                Some(left)
            }
            _ => own_net,
        };
        Some(Layer {
            name,
            place: written.place.clone(),
            section: section.clone(),
            material: material?,
            count,
            area: section.area() * count,
            net,
            gross,
            mass: written.mass.given().map(|mass| mass.value),
        })
    }

    /// Whether a net area is nowhere more than the gross one.
    fn within(&mut self, net: &Curve<Area>, gross: &Curve<Area>, place: &Place) -> Option<()> {
        let within = steps().all(|s| net.at(s) <= gross.at(s) * (1.0 + 1e-12));
        if !within {
            let message = "the net area is more than the gross area of all pieces";
            let help = "write the area that is left for stress, of all pieces together";
            self.r.problems.say(place, message, help);
        }
        within.then_some(())
    }

    /// Whether holes leave something everywhere.
    fn leaves_area(&mut self, left: &Curve<Area>, place: &Place) -> Option<()> {
        let leaves = steps().all(|s| left.at(s) > Area::default());
        if !leaves {
            let message = "the holes leave no area";
            let help = "`diameter`, `number` and `thickness` are those of one piece";
            self.r.problems.say(place, message, help);
        }
        leaves.then_some(())
    }
}

fn steps() -> impl Iterator<Item = f64> {
    (0..=STEPS).map(|step| f64::from(step) / f64::from(STEPS))
}
