//! Published cases, entered as job files in `tests/published/`, whose heads name their sources.
//!
//! Each value is compared twice: with the number as the source prints it, to half a unit of its
//! last digit, and with the ten digits of a recomputation by other means, to 1e-9. Signs are those
//! of this program: tension, growth and forces toward the end are positive, a reaction is what the
//! support puts on the member. Where a source prints sizes, the sign is added here.

mod common;

use common::{Values, factor, solved};

/// How the source came to the digits that it prints.
enum Print {
    /// Rounded to the nearest.
    Rounded,
    /// Cut off after the last digit.
    CutOff,
    /// Computed from an intermediate value that the source had rounded: half a unit of that, carried
    /// through to this value (in its printed unit), comes on top.
    Carried(f64),
}
use Print::{Carried, CutOff, Rounded};

/// One published value.
struct Value {
    address: &'static str,
    printed: &'static str,
    unit: &'static str,
    print: Print,
    recomputed: f64,
}

const fn value(
    address: &'static str,
    printed: &'static str,
    unit: &'static str,
    recomputed: f64,
) -> Value {
    Value {
        address,
        printed,
        unit,
        print: Rounded,
        recomputed,
    }
}

impl Value {
    const fn print(mut self, print: Print) -> Self {
        self.print = print;
        self
    }

    /// The printed number, and one unit of its last digit.
    fn as_printed(&self) -> (f64, f64) {
        let plain = self.printed.replace(' ', "");
        let (mantissa, exponent) = plain.split_once('e').unwrap_or((&plain, "0"));
        let exponent: i32 = exponent.parse().expect("a whole exponent");
        let decimals = mantissa.split_once('.').map_or(0, |(_, d)| d.len()) as i32;
        (
            plain.parse().expect("a number"),
            10f64.powi(exponent - decimals),
        )
    }

    fn compare(&self, file: &str, values: &Values) {
        let found = values.get(self.address) / factor(self.unit);
        let (printed, digit) = self.as_printed();
        let rounding = printed.abs() * 1e-12; // of the decimal digits themselves
        let agrees = match self.print {
            Rounded => (found - printed).abs() <= digit / 2.0 + rounding,
            CutOff => (0.0..digit).contains(&(found.abs() - printed.abs() + rounding)),
            Carried(more) => (found - printed).abs() <= digit / 2.0 + more,
        };
        let (address, unit) = (self.address, self.unit);
        assert!(
            agrees,
            "{file}: {address} = {found} {unit}, published {printed}"
        );
        assert!(
            (found - self.recomputed).abs() <= 1e-9 * self.recomputed.abs(),
            "{file}: {address} = {found} {unit}, recomputed {}",
            self.recomputed
        );
    }
}

fn check(file: &str, text: &str, expected: &[Value]) {
    let values = Values::of(&solved(file, text));
    for value in expected {
        value.compare(file, &values);
    }
}

/// One test for each job file.
macro_rules! published {
    ($($name:ident $file:literal { $($value:expr),+ $(,)? })+) => { $(
        #[test]
        fn $name() {
            check($file, include_str!(concat!("published/", $file)), &[$($value),+]);
        }
    )+ };
}

published! {
    p01_timber "p01.toml" { value("timber.elongation", "3.75", "mm", 3.75) }

    p02_steps_of_force "p02.toml" { value("bar.elongation", "1.0", "mm", 1.0) }

    p03_square_steps "p03.toml" { value("bar.elongation", "0.99", "mm", 0.988_888_888_9) }

    // Printed from memory; a public copy has 0.0031 m, 0.0011 m and 4.2 mm.
    p04_rod_inside_a_tube "p04.toml" {
        value("rod.elongation", "0.003056", "m", 0.003_055_774_907),
        value("B.displacement.x", "0.001143", "m", 0.001_142_857_143),
        value("C.displacement.x", "4.20", "mm", 4.198_632_05),
    }

    // Printed cut off, not rounded.
    p05_round_taper "p05.toml" {
        value("rod.elongation", "0.01515", "mm", 0.015_157_613_63).print(CutOff),
    }

    p06_flat_taper "p06.toml" { value("flat.elongation", "0.76", "mm", 0.760_181_940_5) }

    p07_round_taper_in_inches "p07.toml" {
        value("rod.elongation", "0.0022", "in", 0.002_182_696_362),
    }

    p08_shank_and_cone "p08.toml" { value("rod.elongation", "1.27", "mm", 1.273_239_545) }

    p09_load_and_weight "p09.toml" { value("rod.elongation", "54.33", "mm", 54.331_728_12) }

    // The source prints the formula alone; this is its value for the numbers of the file.
    p10_cone_by_its_weight "p10.toml" {
        value("cone.elongation", "0.001875", "mm", 0.001_875),
    }

    p11_two_forces_between_fixed_ends "p11.toml" {
        value("bar.start.reaction", "8.44", "kN", 8.4375),
        value("bar.end.reaction", "21.56", "kN", 21.5625),
        value("bar.AC.stress_min", "-17.19", "MPa", -17.188_733_85),
        value("bar.CD.stress_min", "-78.3", "MPa", -78.304_232),
        value("bar.DB.stress_max", "43.93", "MPa", 43.926_764_29),
        value("bar.AC.elongation", "-0.024", "mm", -0.023_634_509_05),
        value("bar.CD.elongation", "-0.059", "mm", -0.058_728_174),
        value("bar.DB.elongation", "0.082", "mm", 0.082_362_683_05),
    }

    // The concrete stress is printed from 12.7 kip: half of its last digit over 36 in2 comes on top.
    p12_two_materials_in_a_row "p12.toml" {
        value("column.end.reaction", "12.3", "kip", 12.332_577_68),
        value("column.start.reaction", "12.7", "kip", 12.667_422_32),
        value("column.tube.stress_max", "2.24", "ksi", 2.243_189_37),
        value("column.post.stress_min", "-0.353", "ksi", -0.351_872_842_3)
            .print(Carried(0.05 / 36.0)),
    }

    // One public copy pairs the data of the thin rod with the answers of the thick one.
    p13_gap_at_the_wall_thick_rod "p13-thick.toml" {
        value("rod.start.reaction", "-16.0", "kN", -15.951_327_21),
        value("rod.wall.reaction", "-4.05", "kN", -4.048_672_789),
    }
    p13_gap_at_the_wall_thin_rod "p13-thin.toml" {
        value("rod.start.reaction", "-16.61", "kN", -16.605_825_68),
        value("rod.wall.reaction", "-3.39", "kN", -3.394_174_319),
    }

    p14_rails "p14.toml" {
        value("tight.rail.stress_min", "-93.6", "MPa", -93.6),
        value("jointed.rail.stress_min", "-43.6", "MPa", -43.6),
    }

    p15_free_growth_then_a_wall "p15.toml" {
        value("rod.elongation_temperature", "1.68", "mm", 1.68),
        value("rod.shaft.stress_min", "-34", "MPa", -34.0),
    }

    p16_tube_with_clearance "p16.toml" {
        value("tube.joint.reaction", "-104 328", "N", -104_328.0),
        value("tube.wall.stress_min", "-347.76", "MPa", -347.76),
    }

    p17_ends_that_yield "p17.toml" {
        value("rigid:rod.shaft.stress_max", "156", "MPa", 156.0),
        value("rigid:rod.force_max", "110 269.9", "N", 110_269.902_1),
        value("giving:rod.shaft.stress_max", "108", "MPa", 108.0),
        value("giving:rod.force_max", "76 340.7", "N", 76_340.701_48),
    }

    p18_aluminium_and_steel_warmed "p18.toml" {
        value("bar.start.reaction", "12 735.48", "N", 12_735.483_87),
        value("bar.end.reaction", "-12 735.48", "N", -12_735.483_87),
    }

    // The loads are printed from 60.95 N/mm2: half of its last digit on 5340.7 mm2 is 0.0267 kN.
    p19_tubes_side_by_side "p19.toml" {
        value("strut.pair.outer.stress_min", "-60.95", "MPa", -60.952_956_93),
        value("strut.pair.inner.stress_min", "-121.9", "MPa", -121.905_913_9),
        value("strut.pair.outer.force_start", "-325.515", "kN", -325.531_914_9)
            .print(Carried(0.0267)),
        value("strut.pair.inner.force_start", "-574.485", "kN", -574.468_085_1)
            .print(Carried(0.0267)),
        value("strut.elongation", "-0.0853", "mm", -0.085_334_139_7),
    }

    p20_reinforced_column "p20.toml" {
        value("column.shaft.bars.force_start", "-14.2", "kip", -14.167_077_42),
        value("column.shaft.concrete.force_start", "-55.8", "kip", -55.832_922_58),
        value("column.shaft.bars.stress_min", "-12.0", "ksi", -12.025_388_8),
        value("column.shaft.concrete.stress_min", "-1.60", "ksi", -1.603_385_173),
    }

    p21_three_strips_heated "p21.toml" {
        value("bar.strip.faces.stress_min", "-30.0", "MPa", -30.0),
        value("bar.strip.core.stress_max", "20.0", "MPa", 20.0),
        value("bar.elongation", "1.06", "mm", 1.06),
    }

    // The movement at 4 m is printed from those of the two members: half of their last digits, two
    // thirds and one third of 0.005 mm, comes on top.
    p22_beam_on_two_members "p22.toml" {
        value("one.displacement.y", "-7.07", "mm", -7.073_553_026),
        value("two.displacement.y", "-8.73", "mm", -8.730_785_45),
        value("edge.displacement.y", "-7.62", "mm", -7.625_963_834).print(Carried(0.005)),
    }

    p23_bar_on_two_links "p23.toml" {
        value("AB.force_max", "-60", "kN", -60.0),
        value("CD.force_max", "90", "kN", 90.0),
        value("B.displacement.y", "0.514", "mm", 0.514_285_714_3),
        value("D.displacement.y", "-0.300", "mm", -0.3),
        value("E.displacement.y", "-1.928", "mm", -1.928_571_429).print(CutOff),
    }

    p24_lever_on_two_rods "p24.toml" {
        value("DF.force_max", "7.50", "kip", 7.5),
        value("CE.force_max", "2.50", "kip", 2.5),
        value("A.displacement.y", "-0.0432", "in", -0.043_242_097_75),
    }

    // The rise that leaves all to the steel is the force of a copper rod over its loss by 1 K.
    p25_three_rods_loaded_then_heated "p25.toml" {
        value("cold:middle.force_max", "100", "kN", 100.0),
        value("cold:west.force_max", "50", "kN", 50.0),
        value("cold:east.elongation", "1.0", "mm", 1.0),
        value("cold:west.force_max / kelvin:west.force_max", "-333.33", "1", -333.333_333_3),
        value("warm:middle.force_max", "112", "kN", 112.0),
        value("warm:east.force_max", "44", "kN", 44.0),
        value("warm:low.displacement.y", "-1.6", "mm", -1.6),
    }

    p26_bar_on_a_pin_heated "p26.toml" {
        value("steel.rod.stress_max", "35.51", "MPa", 35.506_849_32),
        value("copper.rod.stress_min", "-47.34", "MPa", -47.342_465_75),
    }

    // The diameter of the file is the recomputed one; the source prints 11.65 mm.
    p27_bar_on_four_wires "p27.toml" {
        value("A.force_max", "4", "kN", 4.0),
        value("D.force_max", "16", "kN", 16.0),
        value("D.wire.stress_max", "150", "MPa", 150.0),
    }

    p28_plate_on_four_pillars "p28.toml" {
        value("A.force_min", "-5", "kN", -5.0),
        value("B.force_min", "-3", "kN", -3.0),
        value("C.force_min", "-5", "kN", -5.0),
        value("D.force_min", "-7", "kN", -7.0),
    }

    p29_load_on_three_wires_heated "p29.toml" {
        value("middle.wire.stress_max", "19 695", "psi", 19_695.483_87),
        value("east.wire.stress_max", "10 152", "psi", 10_152.258_06),
    }

    p30_two_loads_one_way "p30.toml" {
        value("bar.start.reaction", "-900", "lbf", -900.0),
        value("bar.end.reaction", "-600", "lbf", -600.0),
    }

    // The force of a bolt is printed from memory.
    p31_castings_drawn_together "p31.toml" {
        value("EF.rod.stress_min", "-10.53", "ksi", -10.533_168_86),
        value("CD.force_max", "9.31", "kip", 9.306_822_912),
        value("GH.force_max", "9.31", "kip", 9.306_822_912),
    }

    p32_bolt_through_a_tube "p32.toml" {
        value("bolt.shank.stress_max", "107.91", "MPa", 107.913_669_1),
        value("tube.wall.stress_min", "-55.25", "MPa", -55.251_798_56),
    }

    // Both printed cut off, not rounded.
    p33_bolt_in_a_tube_heated "p33.toml" {
        value("tube.wall.stress_min", "-14.117", "MPa", -14.117_647_06).print(CutOff),
        value("rod.shank.stress_max", "31.76", "MPa", 31.764_705_88).print(CutOff),
    }

    p34_cylinder_clamped_by_bolts "p34.toml" {
        value("cylinder.wall.stress_min", "-2400", "psi", -2400.0),
    }

    // The heating is printed from the stretch rounded to 0.01204 in: half of its last digit over
    // 5 in of 6.5e-6 /degF comes on top. Unrounded it is 0.85 x 85 ksi / (30,000 ksi x 6.5e-6 /degF).
    p35_bolt_stretch_and_heating "p35.toml" {
        value("tightened.elongation", "0.01204", "in", 0.012_041_666_67),
        value("tightened.elongation / heated.elongation", "370.46", "1", 370.512_820_5)
            .print(Carried(5e-6 / (5.0 * 6.5e-6))),
    }

    p47_bar_on_a_spring "p47.toml" {
        value("bar.end.displacement", "2.4975e-5", "m", 2.497_502_498e-5),
        value("bar.start.reaction", "-24.975", "kN", -24.975_024_98),
        value("bar.spring.reaction", "-0.025", "kN", -0.024_975_024_98),
    }

    // The stresses are printed from 0.22 mm: half of its last digit, 0.005 mm, over 200 mm of
    // 70 GPa and 300 mm of 200 GPa comes on top.
    p48_load_and_warmth_between_walls "p48.toml" {
        value("rod.first.end.displacement", "0.22", "mm", 0.220_304_932_7),
        value("rod.first.stress_max", "12.60", "MPa", 12.706_726_46)
            .print(Carried(70e3 * 0.005 / 200.0)),
        value("rod.second.stress_min", "-240.27", "MPa", -240.469_955_2)
            .print(Carried(200e3 * 0.005 / 300.0)),
    }

    p49_bar_that_closes_a_gap "p49.toml" {
        value("bar.near.end.displacement", "1.5", "mm", 1.5),
        value("bar.end.displacement", "1.2", "mm", 1.2),
        value("bar.start.reaction", "-50", "kN", -50.0),
        value("bar.wall.reaction", "-10", "kN", -10.0),
    }

    p50_rod_between_springs "p50.toml" {
        value("rod.force_min", "-18.7", "lbf", -18.692_848_89),
        value("rod.elongation", "0.0374", "in", 0.037_385_697_78),
    }

    p51_plastic_bar_in_two_diameters "p51.toml" {
        value("bar.force_min", "-51.8", "kN", -51.781_483_56),
        value("bar.thin.stress_min", "-26.4", "MPa", -26.372_093_02),
        value("bar.thin.end.displacement", "-0.314", "mm", -0.313_953_488_4),
    }
}
