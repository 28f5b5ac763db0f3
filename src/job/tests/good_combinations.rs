//! Cases, combinations, and which of them limits read.

use super::good::model;
use super::tie;
use crate::model::{Purpose, Reads};

#[test]
fn lists_multiply_out_in_the_order_written() {
    let model = model(
        &(tie("")
            + "[case.live]\n[case.wind]\n[combination.service]\nfactors = { wind = [1, 0], live = [0.5] }"),
    );
    let names: Vec<&str> = model.combinations.iter().map(|c| &*c.name).collect();
    assert_eq!(
        names,
        ["service/wind=1/live=0.5", "service/wind=0/live=0.5"]
    );
    // A combination that bears the name of a purpose has that purpose.
    assert_eq!(model.combinations[0].purpose, Some(Purpose::Service));
}

#[test]
fn a_job_without_cases_but_with_combinations_has_its_loads_in_each() {
    let text = tie("load = [{ at = \"end\", force = \"1 kN\" }]")
        + "[combination.short]\n[combination.long]\nmodulus = { steel-s355 = 0.5 }";
    let model = model(&text);
    assert_eq!(model.cases.len(), 1);
    assert!(model.cases[0].always && model.cases[0].name.is_empty());
    assert_eq!(model.combinations[0].factors, [1.0]);
    assert_eq!(model.combinations[0].modulus_factor(0), 1.0);
    assert_eq!(model.combinations[1].modulus_factor(0), 0.5);
}

#[test]
fn an_always_case_is_in_every_combination() {
    let text = tie("load = [{ at = \"end\", force = { fit = \"1 kN\", live = \"2 kN\" } }]")
        + "[case.fit]\nalways = true\n[case.live]\n[combination.x]\nfactors = { live = 2 }\n[combination.y]";
    let model = model(&text);
    assert_eq!(model.combinations[0].factors, [1.0, 2.0]);
    assert_eq!(model.combinations[0].shown, [0, 1]);
    assert_eq!(model.combinations[1].factors, [1.0, 0.0]);
    assert_eq!(model.combinations[1].shown, [0]);
}

#[test]
fn limits_that_no_combination_reads_get_a_caution() {
    let text = tie("limit = { elongation = \"2 mm\", tension = \"100 MPa\" }")
        + "[combination.strength]\npurpose = \"strength\"";
    let model = model(&text);
    assert_eq!(model.remarks.len(), 1);
    assert!(model.remarks[0].caution);
    assert_eq!(
        model.remarks[0].text,
        "no combination reads this limit on `tie`: there is none of the purpose \"service\", so it \
         is not checked"
    );
}

#[test]
fn in_takes_families_combinations_and_purposes() {
    let cases = "[case.live]\n[combination.service]\nfactors = { live = [0, 1] }\n[combination.b]\npurpose = \"strength\"\n[combination.c]\n";
    let reads = |names: &str| {
        let limit = format!("limit = {{ elongation = \"2 mm\", in = {names} }}");
        model(&(tie(&limit) + cases)).limits[0].reads.clone()
    };
    assert_eq!(reads("[\"service/live=1\"]"), Reads::Only(vec![1]));
    assert_eq!(reads("[\"b\", \"c\"]"), Reads::Only(vec![2, 3]));
    assert_eq!(reads("[\"service\"]"), Reads::Only(vec![0, 1, 3])); // c is for everything
    assert_eq!(reads("[\"strength\"]"), Reads::Only(vec![2, 3]));
}

#[test]
fn ten_thousand_combinations_are_ordinary() {
    let list = (0..100)
        .map(|i| i.to_string())
        .collect::<Vec<_>>()
        .join(", ");
    let text = tie("")
        + &format!(
            "[case.a]\n[case.b]\n[combination.x]\nfactors = {{ a = [{list}], b = [{list}] }}"
        );
    let model = model(&text);
    assert_eq!(model.combinations.len(), 10_000);
    assert_eq!(&*model.combinations[101].name, "x/a=1/b=1");
    assert_eq!(model.combinations[9_999].factors, [99.0, 99.0]);
}
