//! The shipped materials against the tables that they come from, typed again here as numbers.

use approx::assert_relative_eq;
use lengthwise::catalogue::{Material, digest, files, ids, library};
use std::collections::{BTreeMap, BTreeSet};

/// 1 ksi in Pa: 1000 lbf of 4.448 221 615 260 5 N on a square inch.
const KSI: f64 = 4_448.221_615_260_5 / (0.0254 * 0.0254);
/// 1 lb/in³ in kg/m³.
const POUND_PER_CUBIC_INCH: f64 = 0.453_592_37 / (0.0254 * 0.0254 * 0.0254);
/// Unit weight of steel in US practice, 490 lb/ft³, in kg/m³.
const STEEL_490: f64 = 490.0 * 0.453_592_37 / (0.3048 * 0.3048 * 0.3048);
/// 1e-6 /°F in 1/K.
const MICRO_PER_DEGF: f64 = 1.8e-6;

fn material(id: &str) -> &'static Material {
    library(id).unwrap_or_else(|| panic!("{id} is not in the library or does not read"))
}

fn equal(id: &str, what: &str, found: Option<f64>, expected: Option<f64>) {
    match (found, expected) {
        (Some(found), Some(expected)) => assert!(
            (found - expected).abs() <= 1e-12 * expected.abs(),
            "{what} of {id}: {found} against {expected}"
        ),
        _ => assert_eq!(found, expected, "{what} of {id}"),
    }
}

/// Modulus, expansion and density, SI base units; then the yield strength of the thinnest row and
/// the ultimate strength.
fn holds(id: &str, elastic: [f64; 3], yield_strength: Option<f64>, ultimate: Option<f64>) {
    let material = material(id);
    equal(
        id,
        "modulus",
        Some(material.modulus.value),
        Some(elastic[0]),
    );
    equal(
        id,
        "expansion",
        material.expansion.map(|a| a.value),
        Some(elastic[1]),
    );
    equal(
        id,
        "density",
        material.density.map(|d| d.value),
        Some(elastic[2]),
    );
    let thinnest = material
        .yield_strength
        .first()
        .map(|(_, strength)| strength.value);
    equal(id, "yield", thinnest, yield_strength);
    equal(id, "ultimate", material.ultimate.map(|s| s.value), ultimate);
}

/// GPa, 1e-6/K, kg/m³, MPa; 0 where the source gives no strength.
#[test]
fn materials_in_si_units_have_the_values_of_their_sources() {
    for (id, modulus, expansion, density, yield_strength, ultimate) in [
        // EN 1993-1-1 table 3.1 and 3.2.6, density EN 1991-1-1 table A.4
        ("steel-s235", 210.0, 12.0, 7850.0, 235.0, 360.0),
        ("steel-s275", 210.0, 12.0, 7850.0, 275.0, 430.0),
        ("steel-s355", 210.0, 12.0, 7850.0, 355.0, 490.0),
        ("steel-s450", 210.0, 12.0, 7850.0, 440.0, 550.0),
        ("steel-s460n", 210.0, 12.0, 7850.0, 460.0, 540.0),
        // ISO 898-1 table 3 (modulus, expansion, density from memory; 4.6, 5.6 and 12.9 all of it)
        ("bolt-4-6", 205.0, 12.0, 7850.0, 240.0, 400.0),
        ("bolt-5-6", 205.0, 12.0, 7850.0, 300.0, 500.0),
        ("bolt-8-8", 205.0, 12.0, 7850.0, 640.0, 800.0),
        ("bolt-10-9", 205.0, 12.0, 7850.0, 940.0, 1040.0),
        ("bolt-12-9", 205.0, 12.0, 7850.0, 1100.0, 1220.0),
        // EN 1993-1-4 table 2.1, EN 10088-1, from memory
        ("stainless-1-4301", 200.0, 16.0, 7900.0, 210.0, 520.0),
        ("stainless-1-4401", 200.0, 16.0, 8000.0, 220.0, 520.0),
        ("stainless-1-4462", 200.0, 13.0, 7800.0, 460.0, 640.0),
        // EN 1999-1-1 tables 3.2a, 3.2b and 3.2.5 (strengths from memory)
        ("aluminium-6061-t6", 70.0, 23.0, 2700.0, 240.0, 260.0),
        ("aluminium-6082-t6", 70.0, 23.0, 2700.0, 250.0, 290.0),
        // EN 1992-1-1 3.2.7 and annex C, EN 10138-3, from memory
        ("rebar-b500", 200.0, 10.0, 7850.0, 500.0, 540.0),
        ("rebar-b500c", 200.0, 10.0, 7850.0, 500.0, 575.0),
        ("strand-y1860s7", 195.0, 12.0, 7810.0, 1600.0, 1860.0),
        // EN 1561, EN 1563, from memory; the modulus of the first within 103 to 118
        ("cast-iron-gjl-250", 110.0, 11.7, 7200.0, 0.0, 250.0),
        ("cast-iron-gjs-400-15", 169.0, 12.5, 7100.0, 250.0, 400.0),
        // EN 338 table 1, EN 14080 table 5, EN 1991-1-5 table C.1 (from memory)
        ("timber-c24", 11.0, 5.0, 420.0, 0.0, 14.0),
        ("timber-gl24h", 11.5, 5.0, 420.0, 0.0, 19.2),
        // Product data and common values, from memory, within the ranges that the notes state
        ("glass-soda-lime", 70.0, 9.0, 2500.0, 0.0, 45.0),
        ("hdpe-pe100", 1.0, 180.0, 955.0, 23.0, 0.0),
        ("pvc-u", 3.0, 70.0, 1400.0, 45.0, 0.0),
        ("gfrp-pultruded-e23", 23.0, 10.0, 1850.0, 0.0, 240.0),
        ("cfrp-ud", 140.0, 0.1, 1575.0, 0.0, 1500.0),
    ] {
        let strength = |value: f64| (value > 0.0).then_some(value * 1e6);
        holds(
            id,
            [modulus * 1e9, expansion * 1e-6, density],
            strength(yield_strength),
            strength(ultimate),
        );
    }
}

/// 1000 ksi, 1e-6/°F, kg/m³, ksi.
#[test]
fn materials_in_us_units_have_the_values_of_their_sources() {
    let metal = POUND_PER_CUBIC_INCH;
    for (id, modulus, expansion, density, yield_strength, ultimate) in [
        // ASTM standards as in AISC Manual tables 2-4 to 2-6
        ("steel-a36", 29.0, 6.5, STEEL_490, 36.0, 58.0),
        ("steel-a992", 29.0, 6.5, STEEL_490, 50.0, 65.0),
        ("steel-a572-50", 29.0, 6.5, STEEL_490, 50.0, 65.0),
        ("steel-a53-b", 29.0, 6.5, STEEL_490, 35.0, 60.0),
        ("bolt-a325", 29.0, 6.5, STEEL_490, 92.0, 120.0),
        ("bolt-a490", 29.0, 6.5, STEEL_490, 130.0, 150.0),
        // ASTM A193 table 2, A615, A416, from memory
        ("stud-a193-b7", 29.7, 6.5, STEEL_490, 105.0, 125.0),
        ("rebar-a615-60", 29.0, 6.5, STEEL_490, 60.0, 80.0),
        ("strand-a416-270", 28.5, 6.5, STEEL_490, 243.0, 270.0),
        // Tables of average properties of a mechanics textbook
        ("stainless-304", 28.0, 9.6, 0.284 * metal, 30.0, 75.0),
        ("aluminium-2014-t6", 10.6, 12.8, 0.101 * metal, 60.0, 68.0),
        ("brass-c83400", 14.6, 9.8, 8740.0, 11.4, 35.0),
        ("bronze-c86100", 15.2, 12.2, 8830.0, 50.0, 95.0),
        ("cast-iron-a48-20", 10.0, 6.7, 0.260 * metal, 0.0, 26.0),
        ("cast-iron-malleable", 24.0, 6.7, 7300.0, 33.0, 40.0),
        // MIL-HDBK-5J tables 3.6.2.0(b1) and 3.7.6.0(b1)
        (
            "aluminium-6061-t6-sheet",
            9.9,
            13.0,
            0.098 * metal,
            35.0,
            42.0,
        ),
        ("aluminium-7075-t6", 10.3, 12.9, 0.101 * metal, 68.0, 77.0),
    ] {
        let strength = |value: f64| (value > 0.0).then_some(value * KSI);
        holds(
            id,
            [modulus * 1e3 * KSI, expansion * MICRO_PER_DEGF, density],
            strength(yield_strength),
            strength(ultimate),
        );
    }
}

/// Mixed units: MIL-HDBK-5J, Copper Development Association, ASTM F1684 (mostly from memory).
#[test]
fn materials_in_mixed_units_have_the_values_of_their_sources() {
    let metal = POUND_PER_CUBIC_INCH;
    let mpa = |value: f64| Some(value * 1e6);
    let ksi = |value: f64| Some(value * KSI);
    holds(
        "titanium-6al-4v",
        [16.9e3 * KSI, 8.6e-6, 0.160 * metal],
        ksi(120.0),
        ksi(130.0),
    );
    holds(
        "magnesium-az31b-h24",
        [6.5e3 * KSI, 26e-6, 0.0639 * metal],
        ksi(29.0),
        ksi(39.0),
    );
    holds(
        "copper-c11000",
        [17.0e3 * KSI, 17e-6, 8910.0],
        mpa(69.0),
        mpa(220.0),
    );
    holds(
        "copper-c11000-h04",
        [17.0e3 * KSI, 17e-6, 8910.0],
        mpa(310.0),
        mpa(345.0),
    );
    holds(
        "brass-c36000",
        [14.0e3 * KSI, 20.5e-6, 8500.0],
        mpa(310.0),
        mpa(400.0),
    );
    holds(
        "bronze-c93200",
        [14.5e3 * KSI, 18e-6, 8930.0],
        ksi(18.0),
        ksi(35.0),
    );
    holds(
        "invar-36",
        [20.5e3 * KSI, 1.3e-6, 8055.0],
        mpa(240.0),
        mpa(450.0),
    );
}

/// EN 1993-1-1 table 3.1; the steps of EN 10025-2 and -3; ISO 898-1 table 3: up to mm, MPa.
#[test]
fn yield_strengths_step_down_with_thickness_as_tabled() {
    for (id, rows) in [
        ("steel-s235", &[(40.0, 235.0), (80.0, 215.0)][..]),
        ("steel-s275", &[(40.0, 275.0), (80.0, 255.0)]),
        ("steel-s355", &[(40.0, 355.0), (80.0, 335.0)]),
        ("steel-s450", &[(40.0, 440.0), (80.0, 410.0)]),
        ("steel-s460n", &[(40.0, 460.0), (80.0, 430.0)]),
        (
            "steel-s275-en10025",
            &[(16.0, 275.0), (40.0, 265.0), (63.0, 255.0), (80.0, 245.0)],
        ),
        (
            "steel-s355-en10025",
            &[(16.0, 355.0), (40.0, 345.0), (63.0, 335.0), (80.0, 325.0)],
        ),
        (
            "steel-s460n-en10025",
            &[
                (16.0, 460.0),
                (40.0, 440.0),
                (63.0, 430.0),
                (80.0, 410.0),
                (100.0, 400.0),
                (150.0, 385.0),
            ],
        ),
        ("bolt-8-8", &[(16.0, 640.0), (39.0, 660.0)]),
        ("aluminium-6082-t6", &[(5.0, 250.0), (15.0, 260.0)]),
    ] {
        let found = &material(id).yield_strength;
        assert_eq!(found.len(), rows.len(), "{id}");
        for ((thickness, strength), &(up_to, tabled)) in found.iter().zip(rows) {
            assert_relative_eq!(thickness.unwrap().value * 1e3, up_to, max_relative = 1e-12);
            assert_relative_eq!(strength.value / 1e6, tabled, max_relative = 1e-12);
        }
    }
}

/// Proof strengths: ISO 898-1 table 3 for d ≤ 16 mm, MPa; ASTM F3125, ksi (from memory).
#[test]
fn bolts_have_the_proof_strengths_of_their_standards() {
    for (id, proof) in [
        ("bolt-4-6", 225e6),
        ("bolt-5-6", 280e6),
        ("bolt-8-8", 580e6),
        ("bolt-10-9", 830e6),
        ("bolt-12-9", 970e6),
        ("bolt-a325", 85.0 * KSI),
        ("bolt-a490", 120.0 * KSI),
    ] {
        equal(
            id,
            "proof",
            material(id).proof.map(|s| s.value),
            Some(proof),
        );
    }
}

/// EN 1992-1-1 table 3.1: fck in MPa and E_cm in GPa as printed (from memory), which is
/// 22 (f_cm / 10)^0.3 to the nearest whole one.
#[test]
fn concretes_by_strength_class_have_the_modulus_and_strength_of_the_table() {
    for (id, strength, modulus) in [
        ("concrete-c12", 12.0, 27.0),
        ("concrete-c16", 16.0, 29.0),
        ("concrete-c20", 20.0, 30.0),
        ("concrete-c25", 25.0, 31.0),
        ("concrete-c30", 30.0, 33.0),
        ("concrete-c35", 35.0, 34.0),
        ("concrete-c40", 40.0, 35.0),
        ("concrete-c45", 45.0, 36.0),
        ("concrete-c50", 50.0, 37.0),
        ("concrete-c55", 55.0, 38.0),
        ("concrete-c60", 60.0, 39.0),
        ("concrete-c70", 70.0, 41.0),
        ("concrete-c80", 80.0, 42.0),
        ("concrete-c90", 90.0, 44.0),
    ] {
        let concrete = material(id);
        // Plain concrete of 24 kN/m³ (EN 1991-1-1 table A.1) under standard gravity.
        holds(id, [modulus * 1e9, 10e-6, 24_000.0 / 9.80665], None, None);
        equal(
            id,
            "crushing",
            concrete.crushing.map(|s| s.value),
            Some(strength * 1e6),
        );
        let formula = 22.0 * ((strength + 8.0) / 10.0_f64).powf(0.3);
        assert!((formula - modulus).abs() <= 0.5, "{id}: {formula}");
    }
}

/// ACI 318-19 19.2.2.1: 57 000 √f'c, psi, to half a ksi.
#[test]
fn concretes_by_psi_have_the_modulus_of_aci_318() {
    for (id, strength) in [
        ("concrete-3000psi", 3000.0_f64),
        ("concrete-4000psi", 4000.0),
        ("concrete-5000psi", 5000.0),
        ("concrete-6000psi", 6000.0),
        ("concrete-8000psi", 8000.0),
    ] {
        let concrete = material(id);
        let modulus = concrete.modulus.value / KSI;
        assert!(
            (modulus - 57.0 * strength.sqrt()).abs() <= 0.5,
            "{id}: {modulus}"
        );
        equal(
            id,
            "crushing",
            concrete.crushing.map(|s| s.value),
            Some(strength / 1e3 * KSI),
        );
    }
}

#[test]
fn every_entry_reads_and_has_a_source_and_a_family() {
    let families = BTreeSet::from([
        "steel",
        "stainless steel",
        "reinforcement",
        "prestressing steel",
        "steel rope",
        "aluminium",
        "concrete",
        "copper",
        "cast iron",
        "titanium",
        "nickel",
        "magnesium",
        "timber",
        "glass",
        "plastic",
        "composite",
    ]);
    let mut seen = BTreeSet::new();
    for id in ids() {
        assert!(seen.insert(id), "{id} stands twice");
        let material = material(id);
        assert_eq!(&*material.id, id);
        assert!(!id.contains(['.', ':', '/', '=', '"', ' ']), "{id}");
        assert!(
            material.source.as_ref().is_some_and(|text| text.len() > 8),
            "{id}"
        );
        let family = material.family.as_deref().unwrap_or_default();
        assert!(families.contains(family), "{id}: family {family:?}");
        // From plastic to steel; a slip of a unit falls out of it.
        assert!((0.5e9..=220e9).contains(&material.modulus.value), "{id}");
        let expansion = material.expansion.map(|a| a.value);
        assert!(expansion.is_some_and(|a| (0.0..=2e-4).contains(&a)), "{id}");
        assert_eq!(material.density.is_none(), family == "steel rope", "{id}");
        let strengths = [material.ultimate, material.crushing];
        assert!(
            family == "steel rope"
                || !material.yield_strength.is_empty()
                || strengths.iter().any(Option::is_some),
            "{id} has no strength"
        );
        let thicknesses: Vec<_> = material.yield_strength.iter().map(|row| row.0).collect();
        assert!(thicknesses.is_sorted(), "{id}");
        if let Some((low, high)) = material.range {
            assert!(low < high, "{id}");
        }
    }
    assert!(seen.len() >= 48, "{} materials", seen.len());
}

/// The library finds entries by their headers; the files read as a whole must hold the same ones.
#[test]
fn the_files_are_toml_and_hold_what_the_library_lists() {
    let listed: BTreeSet<String> = ids().map(str::to_owned).collect();
    let mut written = BTreeSet::new();
    for (name, text) in files() {
        let table: toml::Table = text
            .parse()
            .unwrap_or_else(|error| panic!("{name}: {error}"));
        if let Some(materials) = table.get("material").and_then(toml::Value::as_table) {
            assert_eq!(table.len(), 1, "{name}");
            written.extend(materials.keys().cloned());
        }
    }
    assert_eq!(listed, written);
}

/// Every file of the folder is built in and counts in the digest.
#[test]
fn the_digest_is_over_all_files_of_the_folder() {
    use sha2::{Digest, Sha256};
    let folder = concat!(env!("CARGO_MANIFEST_DIR"), "/materials");
    let on_disk: BTreeMap<String, String> = std::fs::read_dir(folder)
        .unwrap()
        .map(|entry| entry.unwrap())
        .map(|entry| {
            let name = entry.file_name().into_string().unwrap();
            (name, std::fs::read_to_string(entry.path()).unwrap())
        })
        .collect();
    let shipped: BTreeMap<String, String> = files()
        .iter()
        .map(|&(name, text)| (name.to_owned(), text.to_owned()))
        .collect();
    assert_eq!(on_disk, shipped);

    let all: String = files().iter().map(|(_, text)| *text).collect();
    let expected: String = Sha256::digest(all)
        .iter()
        .map(|byte| format!("{byte:02x}"))
        .collect();
    assert_eq!(digest(), format!("sha256:{expected}"));
}

#[test]
fn an_unknown_id_is_none() {
    for id in [
        "",
        "steel",
        "steel-s355 ",
        "steel-s355]",
        "STEEL-S355",
        "material.steel-s355",
    ] {
        assert!(library(id).is_none(), "{id:?}");
    }
}
