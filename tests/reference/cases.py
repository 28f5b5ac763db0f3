"""The cases of quadrature.py: numbers as decimal texts in SI units (m, N, Pa, kg/m3, K)."""

STEEL = {"modulus": "2.05e11", "expansion": "1.2e-5", "density": "7850"}
BRONZE = {"modulus": "1.1e11", "expansion": "1.8e-5", "density": "8800"}
TIMBER = {"modulus": "1.15e10", "expansion": "4.5e-6", "density": "430"}
CONCRETE = {"modulus": "3.3e10", "expansion": "1e-5", "density": "2400"}

# The small end of a taper from 0.08 m: 1 : 1, 1 : 1.0000001, 1 : 1.001, 1 : 1.5, 1 : 4, 1 : 1000.
SIZES = {
    "1": "0.08",
    "1.0000001": "0.080000008",
    "1.001": "0.08008",
    "1.5": "0.12",
    "4": "0.32",
    "1000": "80",
}


def segment(name, length, section, material=STEEL, **acts):
    return {"name": name, "length": length, "section": section, **material, **acts}


def shapes(first, last):
    """The sections of one dimension that runs from `first` to `last`, others constant or with it."""
    return {
        "round": {"round": [first, last]},
        "flat": {"bar": {"width": [first, last], "depth": "0.015"}},
        "bar": {"bar": {"width": [first, last], "depth": [last, first]}},
        "box": {"box": {"width": [first, last], "depth": [first, last], "wall": "0.006"}},
        "tube": {"tube": {"outer": [first, last], "wall": "0.005"}},
        "area": {"area": [first, last]},
    }


CASES = []


def case(name, segments, fixed="start", **more):
    CASES.append({"case": name, "segments": segments, "fixed": fixed, **more})


# A force alone, each shape by each ratio, both ways round.
for ratio, size in SIZES.items():
    for shape, section in shapes("0.08", size).items():
        case(f"{shape} 1 : {ratio} under a force", [segment("a", "1.7", section, force="41000")])
for ratio in ("1.0000001", "1.5", "1000"):
    for shape, section in shapes(SIZES[ratio], "0.08").items():
        case(f"{shape} {ratio} : 1 under a force", [segment("a", "2.3", section, force="-36500")])

# Everything at once: varying line load, weight, a temperature pair, a misfit, a force, pieces.
for ratio, size in SIZES.items():
    for shape, section in shapes(size, "0.08").items():
        everything = segment(
            "a", "3.1", section, force="15200", line=["1300", "-2900"], warming=["-35", "62.5"],
            misfit="-0.0011", count=3,
        )
        case(f"{shape} {ratio} : 1 under everything", [everything], runs="down", weight="1.35")
        if ratio != "1000":
            case(f"{shape} {ratio} : 1 between fixed ends", [everything], "both", runs="up", weight="1")

# To a point, where weight, or a line load that goes to zero with the section, runs out to nothing.
case("cone hung from its base", [segment("a", "3", {"round": ["0.6", "0"]}, CONCRETE)], runs="down", weight="1")
case("cone standing on its base", [segment("a", "3", {"round": ["0.6", "0"]}, CONCRETE)], runs="up", weight="1.2")
case("cone on its point's side", [segment("a", "4.5", {"round": ["0", "0.9"]}, TIMBER)], "end", runs="up", weight="1")
case("wedge by its weight", [segment("a", "2.2", {"bar": {"width": ["0.4", "0"], "depth": "0.12"}}, TIMBER)], runs="down", weight="1")
case(
    "wedge with a vanishing line load",
    [segment("a", "2.2", {"bar": {"width": ["0.4", "0"], "depth": "0.12"}}, TIMBER, line=["900", "0"], warming=["12", "-7"])],
)
case(
    "shank with a pointed foot",
    [
        segment("shank", "2.5", {"round": "0.3"}, CONCRETE, line=["-4000", "-7500"]),
        segment("foot", "0.8", {"round": ["0.3", "0"]}, CONCRETE, warming="15"),
    ],
    runs="down",
    weight="1",
)

# Tapers of other shapes.
case(
    "h tapering in depth and flange",
    [segment("a", "5.4", {"h": {"depth": ["0.6", "0.25"], "width": "0.18", "web": "0.009", "flange": ["0.02", "0.012"], "root": "0.015"}}, force="-260000")],
    runs="up", weight="1.35",
)
case(
    "h tapering in every dimension between fixed ends",
    [segment("a", "4.8", {"h": {"depth": ["0.3", "0.5"], "width": ["0.15", "0.2"], "web": ["0.008", "0.012"], "flange": ["0.012", "0.02"], "root": ["0.01", "0.02"]}}, line=["-9000", "2500"], warming=["40", "-25"])],
    "both",
)
case(
    "tube whose bore tapers",
    [segment("a", "1.25", {"tube": {"outer": "0.12", "inner": ["0.05", "0.11"]}}, BRONZE, force="88000", warming=["5", "95"])],
)
case(
    "box whose wall tapers",
    [segment("a", "2.75", {"box": {"width": "0.2", "depth": "0.14", "wall": ["0.012", "0.005"]}}, force="-310000", line="12500")],
)
case(
    "stress with its extreme inside",
    [segment("a", "6", {"round": ["0.05", "0.09"]}, force="30000", line=["-20000", "14000"])],
)

# Layers.
PAIR = [
    {"name": "core", "section": {"round": ["0.06", "0.05"]}, **STEEL, "warming": ["20", "45"]},
    {"name": "sleeve", "section": {"tube": {"outer": ["0.1", "0.08"], "inner": ["0.06", "0.05"]}}, **BRONZE, "warming": ["55", "10"], "misfit": "-0.0004"},
]
case("two layers free to grow", [{"name": "a", "length": "1.4", "layers": PAIR}])
case("two layers under a force", [{"name": "a", "length": "1.4", "layers": PAIR, "force": "97000"}], runs="down", weight="1")
case("two layers between fixed ends", [{"name": "a", "length": "1.4", "layers": PAIR, "line": ["15000", "-40000"]}], "both", runs="down", weight="1")
COLUMN = [
    {"name": "concrete", "section": {"bar": {"width": ["0.6", "0.45"], "depth": "0.5"}}, **CONCRETE, "strain": "-3.5e-4"},
    {"name": "bars", "section": {"round": "0.025"}, **STEEL, "count": 12, "warming": ["18", "-4"]},
]
case("reinforced column that shrinks", [{"name": "a", "length": "3.6", "layers": COLUMN, "force": "-2400000"}], runs="up", weight="1.35")
case(
    "layered taper 1 : 1000",
    [{"name": "a", "length": "2", "layers": [
        {"name": "inside", "section": {"round": ["0.01", "10"]}, **STEEL, "warming": ["10", "30"]},
        {"name": "outside", "section": {"bar": {"width": ["0.02", "0.03"], "depth": "0.02"}}, **BRONZE, "warming": ["-10", "5"]},
    ], "force": "5000"}],
)
case(
    "layered taper 1 : 1.0000001",
    [{"name": "a", "length": "2", "layers": [
        {"name": "inside", "section": {"round": ["0.05", "0.050000005"]}, **STEEL, "warming": ["10", "30"]},
        {"name": "outside", "section": {"bar": {"width": ["0.02", "0.020000002"], "depth": "0.02"}}, **BRONZE, "strain": "1.5e-4"},
    ], "force": "5000"}],
    "both",
)

# Chains.
case(
    "mast of three tapers",
    [
        segment("foot", "6", {"tube": {"outer": ["0.5", "0.38"], "wall": "0.012"}}, force="-18000", line="-350"),
        segment("middle", "5.5", {"tube": {"outer": ["0.38", "0.27"], "wall": ["0.01", "0.008"]}}, force="-9500", warming=["30", "22"]),
        segment("top", "4", {"round": ["0.12", "0.06"]}, force="-2200", line=["-120", "-40"]),
    ],
    runs="up", weight="1.35",
)
case(
    "restrained line of unlike parts",
    [
        segment("one", "2", {"area": ["0.002", "0.0035"]}, STEEL, warming=["70", "40"], force="52000"),
        segment("two", "0.0035", {"round": ["0.05", "0.0500001"]}, BRONZE, misfit="0.0002", force="-81000"),
        segment("three", "11", {"bar": {"width": ["0.3", "0.1"], "depth": ["0.1", "0.2"]}}, TIMBER, line=["700", "-1100"], warming="-15"),
    ],
    "both",
)
