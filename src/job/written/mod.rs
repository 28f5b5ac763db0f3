//! A job as written: each key and value with its place, read table by table. What is wrong with a
//! value by itself is found here; what values mean together is the next phase.

pub(crate) mod assembly;
pub(crate) mod case;
pub(crate) mod combination;
pub(crate) mod fields;
pub(crate) mod heading;
mod later;
pub(crate) mod limit;
pub(crate) mod load;
pub(crate) mod material;
pub(crate) mod member;
mod name;
pub(crate) mod section;
pub(crate) mod segment;
pub(crate) mod station;
pub(crate) mod support;
mod value;

pub(crate) use fields::{Entry, Written};
pub(crate) use load::ByCase;

use super::problem::Problems;
use crate::model::Place;
use crate::quantity::Literal;
use fields::{Fields, Keys, Value, named};
use toml::de::DeTable;

pub(crate) const KEYS: Keys = Keys {
    table: "job file",
    keys: &[
        "job",
        "case",
        "combination",
        "material",
        "default",
        "member",
        "point",
        "body",
        "hold",
        "load",
        "watch",
    ],
};

/// Every kind of table with the keys that its reader asks for. Tables whose keys are names
/// (`case`, `combination`, `material`, `member`, `point`, factors, values by case) are not among
/// them.
pub(super) const TABLES: &[Keys] = &[
    KEYS,
    heading::KEYS,
    case::KEYS,
    combination::KEYS,
    material::KEYS,
    member::DEFAULT,
    member::KEYS,
    segment::KEYS,
    segment::LAYER,
    segment::HOLES,
    section::KEYS,
    section::TUBE,
    section::BAR,
    section::BOX,
    section::H,
    section::CHANNEL,
    section::ANGLE,
    section::TEE,
    support::KEYS,
    load::KEYS,
    assembly::body::KEYS,
    assembly::hold::KEYS,
    assembly::load::KEYS,
    assembly::watch::KEYS,
    limit::OF_MEMBER,
    limit::OF_SEGMENT,
    limit::OF_PART,
    limit::OF_GAP,
    limit::OF_LAYER,
    limit::OF_SUPPORT,
    limit::OF_HOLD,
    limit::OF_STOP,
    limit::GAP,
    limit::DISPLACEMENT,
];

/// What the reading gathers on its way.
pub(crate) struct Reader<'t> {
    /// The text of the file.
    pub(crate) text: &'t str,
    pub(crate) problems: Problems,
    /// The places of literals with a tolerance.
    pub(crate) tolerances: Vec<Place>,
}

impl<'t> Reader<'t> {
    pub(crate) fn new(text: &'t str) -> Self {
        Reader {
            text,
            problems: Problems::default(),
            tolerances: Vec::new(),
        }
    }

    /// The nominal value of a literal; keeps the place of one with a tolerance.
    pub(crate) fn noted<Q: Copy>(&mut self, literal: &Literal<Q>, value: &Value<'_>) -> Q {
        if literal.toleranced {
            self.tolerances.push(value.span());
        }
        literal.nominal
    }
}

/// A whole job as written; lists are in the order of the file.
#[derive(Debug)]
pub(crate) struct Job<'t> {
    pub(crate) heading: Option<heading::Heading<'t>>,
    pub(crate) cases: Vec<case::Case<'t>>,
    pub(crate) combinations: Vec<combination::Combination<'t>>,
    pub(crate) materials: Vec<material::Material<'t>>,
    pub(crate) default: member::Default<'t>,
    pub(crate) members: Vec<member::Member<'t>>,
    pub(crate) assembly: assembly::Assembly<'t>,
}

impl<'t> Job<'t> {
    pub(crate) fn read(table: &'t DeTable<'t>, r: &mut Reader<'t>) -> Self {
        let mut fields = Fields::new(table, 0..0, KEYS);
        let heading = fields
            .get("job")
            .and_then(|value| heading::Heading::read(value, r));
        let assembly = assembly::Assembly::read(&mut fields, r);
        let mut job = Job {
            assembly,
            heading,
            cases: Vec::new(),
            combinations: Vec::new(),
            materials: Vec::new(),
            default: fields
                .get("default")
                .map_or_else(member::Default::none, |value| {
                    member::Default::read(value, r)
                }),
            members: Vec::new(),
        };
        for (name, value) in tables(&mut fields, "case", r) {
            name::is_good(name.value, &name.place, r);
            job.cases.push(case::Case::read(name, value, r));
        }
        for (name, value) in tables(&mut fields, "combination", r) {
            name::is_for_a_combination(name.value, &name.place, r);
            let combination = combination::Combination::read(name, value, r);
            job.combinations.push(combination);
        }
        for (id, value) in tables(&mut fields, "material", r) {
            name::is_good(id.value, &id.place, r);
            job.materials.push(material::Material::read(id, value, r));
        }
        let members = tables(&mut fields, "member", r);
        let is_a_table = |member: &Value<'_>| member.get_ref().is_table();
        if members.is_empty() && table.get("member").is_none_or(is_a_table) {
            let help = "add one: `[member.tie]`";
            r.problems
                .missing("", &(0..0), "a job needs a member", help);
        }
        for (name, value) in members {
            name::is_for_a_part(name.value, &name.place, r);
            job.members.push(member::Member::read(name, value, r));
        }
        fields.finish(r);
        job
    }
}

/// The tables by name under a key of the file.
fn tables<'t>(
    fields: &mut Fields<'t>,
    key: &'static str,
    r: &mut Reader<'t>,
) -> Vec<(Written<&'t str>, &'t Value<'t>)> {
    let Some(value) = fields.get(key) else {
        return Vec::new();
    };
    let help = match key {
        "point" => {
            "write a line for each below `[point]`, as in `a = [\"4.2 m\", \"3 m\"]`".to_owned()
        }
        _ => "write a header for each name: `[".to_owned() + key + ".NAME]`",
    };
    let tables = named(value, key, &help, r);
    if tables.is_none() {
        r.problems.lost(key);
    }
    tables.unwrap_or_default()
}
