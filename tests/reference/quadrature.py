#!/usr/bin/env python3
"""Writes quadrature.json: single members and their results by quadrature in many digits.

Run by hand where a case is added (`python3 tests/reference/quadrature.py`, needs mpmath); the tests
read the JSON alone. A case is a list of segments whose numbers are decimal texts, which go into the
job file as they are and into mpmath as they are, so that both stand for the same real number.

A member is fixed at its start, at its end or at both. Along it dN/dx = -q; N at the start follows
from the free end, or from a total elongation of zero between fixed ends. Elongations are integrals
of N/EA, of alpha dT and of the imposed strain, by mpmath's tanh-sinh quadrature with 80 digits in
work; the extreme stress is the extreme over the ends and the zeros of the derivative of the stress,
a quotient of polynomials. Results have 25 digits. Standard gravity is 9.80665 m/s2 (CGPM 1901).
"""

import json
from pathlib import Path

from mpmath import mp, mpf, pi, polyroots, quad

mp.dps = 80
GRAVITY = mpf("9.80665")


# Polynomials in x from the start of a segment, lowest power first.
def add(a, b):
    n = max(len(a), len(b))
    return [(a[i] if i < len(a) else 0) + (b[i] if i < len(b) else 0) for i in range(n)]


def times(a, b):
    product = [mpf(0)] * (len(a) + len(b) - 1)
    for i, p in enumerate(a):
        for j, q in enumerate(b):
            product[i + j] += p * q
    return product


def scaled(a, factor):
    return [factor * p for p in a]


def derivative(a):
    return [i * a[i] for i in range(1, len(a))] or [mpf(0)]


def integral(a):
    return [mpf(0)] + [p / (i + 1) for i, p in enumerate(a)]


def at(a, x):
    total = mpf(0)
    for p in reversed(a):
        total = total * x + p
    return total


def linear(value, length):
    """A text, or a pair of texts for the start and the end of a segment of that length."""
    first, last = value if isinstance(value, list) else (value, value)
    return [mpf(first), (mpf(last) - mpf(first)) / length]


def area(section, length):
    """Area of one piece."""
    (kind, fields), = section.items()
    if kind == "round":
        d = linear(fields, length)
        return scaled(times(d, d), pi / 4)
    if kind == "area":
        return linear(fields, length)
    dimension = {name: linear(value, length) for name, value in fields.items()}
    if kind == "bar":
        return times(dimension["width"], dimension["depth"])
    if kind == "tube":
        outer = dimension["outer"]
        inner = dimension.get("inner") or add(outer, scaled(dimension["wall"], -2))
        return scaled(add(times(outer, outer), scaled(times(inner, inner), -1)), pi / 4)
    if kind == "box":
        wall = scaled(dimension["wall"], -2)
        inside = times(add(dimension["width"], wall), add(dimension["depth"], wall))
        return add(times(dimension["width"], dimension["depth"]), scaled(inside, -1))
    if kind == "h":  # two flanges, a web between them, and four fillets of (1 - pi/4) r2
        flange, root = dimension["flange"], dimension["root"]
        web = times(dimension["web"], add(dimension["depth"], scaled(flange, -2)))
        fillets = scaled(times(root, root), 4 - pi)
        return add(add(scaled(times(dimension["width"], flange), 2), web), fillets)
    raise ValueError(kind)


def reduced(above, below, length):
    """A quotient without the factors that vanish at an end in both: a taper to a point."""
    def vanishes(a, x):
        size = max(abs(p) * length**i for i, p in enumerate(a))
        return abs(at(a, x)) <= size * mpf(10) ** -60

    def divided(a, x):
        quotient = [a[-1]]
        for p in a[-2:0:-1]:
            quotient.insert(0, quotient[0] * x + p)
        return quotient

    for x in (mpf(0), length):
        while vanishes(below, x):
            assert vanishes(above, x), "a point that carries force"
            if not any(above):
                return [mpf(0)], [mpf(1)]
            above, below = divided(above, x), divided(below, x)
    return above, below


class Layer:
    def __init__(self, make_up, length):
        self.name = make_up.get("name")
        self.area = scaled(area(make_up["section"], length), mpf(make_up.get("count", 1)))
        self.modulus = mpf(make_up["modulus"])
        self.expansion = mpf(make_up["expansion"])
        self.density = mpf(make_up["density"])
        self.rigidity = scaled(self.area, self.modulus)
        warming = linear(make_up.get("warming", "0"), length)
        self.thermal = scaled(warming, self.expansion)
        self.imposed = [mpf(make_up.get("strain", "0")) + mpf(make_up.get("misfit", "0")) / length]


def placed(values):
    """The first of some values in order, with its place where no other comes near it."""
    (value, place), *others = values
    size = max(abs(v) for v, _ in values)
    near = any(abs(v - value) <= mpf("1e-6") * size for v, x in others)
    return value, None if near else place


class Segment:
    def __init__(self, case, given):
        self.name = given["name"]
        self.length = mpf(given["length"])
        self.layered = "layers" in given
        make_ups = given["layers"] if self.layered else [given]
        self.layers = [Layer(make_up, self.length) for make_up in make_ups]
        self.rigidity, thermal, imposed = [mpf(0)], [mpf(0)], [mpf(0)]
        self.load = linear(given.get("line", "0"), self.length)
        for layer in self.layers:
            self.rigidity = add(self.rigidity, layer.rigidity)
            thermal = add(thermal, times(layer.rigidity, layer.thermal))
            imposed = add(imposed, times(layer.rigidity, layer.imposed))
            weight = GRAVITY * layer.density * mpf(case.get("weight", "0")) * rise(case)
            self.load = add(self.load, scaled(layer.area, -weight))
        self.thermal, self.imposed = thermal, imposed
        self.run_off = integral(self.load)

    def mean(self, above):
        """The integral of a polynomial over EA. The quadrature sees no part over which EA changes
        by more than a factor of four."""
        above, below = reduced(above, self.rigidity, self.length)
        cuts, part = [mpf(0)], self.length
        while cuts[-1] < self.length:
            end = min(cuts[-1] + part, self.length)
            ratio = at(below, end) / at(below, cuts[-1])
            if mpf(1) / 4 <= ratio <= 4:
                cuts.append(end)
                part *= 2
            else:
                part /= 2
        value, error = quad(lambda x: at(above, x) / at(below, x), cuts, error=True)
        assert error <= mpf(10) ** -40 * max(abs(value), mpf(10) ** -20), (self.name, error)
        return value

    def extremes(self, force):
        """Of each layer: the largest and the least stress with their places."""
        return [self.extremes_of(layer, force) for layer in self.layers]

    def extremes_of(self, layer, force):
        if not self.layered:  # the free strain of the only layer drops out: N / A
            above, below, free = force, layer.area, [mpf(0)]
            factor = mpf(1)
        else:
            above, below = add(add(force, self.thermal), self.imposed), self.rigidity
            free, factor = add(layer.thermal, layer.imposed), layer.modulus

        above, below = reduced(above, below, self.length)

        def stress(x):
            return factor * (at(above, x) / at(below, x) - at(free, x))

        slope = add(times(derivative(above), below), scaled(times(above, derivative(below)), -1))
        slope = add(slope, scaled(times(derivative(free), times(below, below)), -1))
        size = max(abs(p) * self.length**i for i, p in enumerate(slope))
        while len(slope) > 1 and abs(slope[-1]) * self.length ** (len(slope) - 1) <= size * mpf(10) ** -60:
            slope = slope[:-1]
        places = [mpf(0), self.length]
        if len(slope) > 1:
            for root in polyroots(slope[::-1], maxsteps=2000, extraprec=400):
                if abs(mp.im(root)) < mpf(10) ** -40 * self.length and 0 < mp.re(root) < self.length:
                    places.append(mp.re(root))
        values = sorted((stress(x), x) for x in places)
        return placed(values[::-1]), placed(values)


def rise(case):
    return {"down": mpf(-1), "up": mpf(1), "level": mpf(0)}[case.get("runs", "level")]


def results(case):
    """Addresses and values of everything that is compared."""
    segments = [Segment(case, given) for given in case["segments"]]
    ends = [mpf(given.get("force", "0")) for given in case["segments"]]
    # N at the start of each segment for N = 0 at the start of the member, free part of the rest.
    before, drop = [], mpf(0)
    for segment, force in zip(segments, ends):
        before.append(drop)
        drop -= at(segment.run_off, segment.length) + force
    before_end = drop + ends[-1]
    start = -drop
    free = [segment.mean(add(segment.thermal, segment.imposed)) for segment in segments]
    if case["fixed"] == "both":
        # A force on a fixed end goes into the support and nothing else.
        by_start = sum(segment.mean([mpf(1)]) for segment in segments)
        by_load = sum(
            segment.mean(add([n], scaled(segment.run_off, -1))) for segment, n in zip(segments, before)
        )
        start = -(by_load + sum(free)) / by_start
    elif case["fixed"] == "end":
        start = mpf(0)
    expected = {}
    totals = {"force": mpf(0), "temperature": mpf(0), "misfit": mpf(0)}
    moved = mpf(0)
    before_it = mpf(0)
    stations = []
    for segment, n in zip(segments, before):
        force = add([start + n], scaled(segment.run_off, -1))
        parts = {
            "force": segment.mean(force),
            "temperature": segment.mean(segment.thermal),
            "misfit": segment.mean(segment.imposed),
        }
        for kind, value in parts.items():
            expected[f"m.{segment.name}.elongation_{kind}"] = value
            totals[kind] += value
        moved += sum(parts.values())
        expected[f"m.{segment.name}.elongation"] = sum(parts.values())
        expected[f"m.{segment.name}.force_start"] = force[0]
        expected[f"m.{segment.name}.force_end"] = at(force, segment.length)
        for layer, (largest, least) in zip(segment.layers, segment.extremes(force)):
            on = f"m.{segment.name}.{layer.name}" if segment.layered else f"m.{segment.name}"
            for word, (value, place) in (("max", largest), ("min", least)):
                expected[f"{on}.stress_{word}"] = value
                if place is not None:
                    expected[f"{on}.stress_{word}_at"] = before_it + place
        before_it += segment.length
        stations.append(moved)
    for kind, value in totals.items():
        expected[f"m.elongation_{kind}"] = value
    expected["m.elongation"] = moved
    shift = -moved if case["fixed"] == "end" else mpf(0)
    for segment, value in zip(segments[:-1], stations[:-1]):
        expected[f"m.{segment.name}.end.displacement"] = value + shift
    if case["fixed"] == "start":
        expected["m.end.displacement"] = moved
    if case["fixed"] == "end":
        expected["m.start.displacement"] = shift
    if case["fixed"] != "end":
        expected["m.start.reaction"] = -start
    if case["fixed"] != "start":
        expected["m.end.reaction"] = start + before_end - ends[-1]
    return expected


# The job file of a case.
def literal(value, unit):
    texts = value if isinstance(value, list) else [value]
    quoted = [f'"{text} {unit}"' for text in texts]
    return "[" + ", ".join(quoted) + "]" if isinstance(value, list) else quoted[0]


def section_text(section):
    (kind, fields), = section.items()
    if kind in ("round", "area"):
        return f"{{ {kind} = {literal(fields, 'm2' if kind == 'area' else 'm')} }}"
    inside = ", ".join(f"{name} = {literal(value, 'm')}" for name, value in fields.items())
    return f"{{ {kind} = {{ {inside} }} }}"


def signed(value):
    sign = lambda text: text if text.startswith("-") else "+" + text
    return [sign(text) for text in value] if isinstance(value, list) else sign(value)


def job(case):
    materials, lines, loads = [], ["", "[member.m]"], []
    if case["fixed"] in ("start", "both"):
        lines.append('start = "fixed"')
    if case["fixed"] in ("end", "both"):
        lines.append('end = "fixed"')
    if "runs" in case:
        lines.append(f'runs = "{case["runs"]}"')

    def material(make_up):
        name = f"material-{len(materials) // 5 + 1}"
        materials.extend([
            f"[material.{name}]",
            f'modulus = "{make_up["modulus"]} Pa"',
            f'expansion = "{make_up["expansion"]} /K"',
            f'density = "{make_up["density"]} kg/m3"',
            'source = "a number of the test"',
        ])
        return name

    def acts(make_up, on):
        if "warming" in make_up:
            loads.append(f'{{ on = "{on}", temperature-change = {literal(signed(make_up["warming"]), "K")} }}')
        if "misfit" in make_up:
            loads.append(f'{{ on = "{on}", misfit = {literal(make_up["misfit"], "m")} }}')
        if "strain" in make_up:
            loads.append(f'{{ on = "{on}", strain = {make_up["strain"]} }}')

    for given in case["segments"]:
        name = given["name"]
        lines += ["[[member.m.segment]]", f'name = "{name}"', f'length = "{given["length"]} m"']
        if "layers" in given:
            rows = []
            for layer in given["layers"]:
                rows.append(
                    f'  {{ name = "{layer["name"]}", section = {section_text(layer["section"])}, '
                    f'material = "{material(layer)}", count = {layer.get("count", 1)} }},'
                )
                acts(layer, f"{name}.{layer['name']}")
            lines += ["layer = ["] + rows + ["]"]
        else:
            lines += [f"section = {section_text(given['section'])}", f'material = "{material(given)}"']
            if "count" in given:
                lines.append(f"count = {given['count']}")
            acts(given, name)
        if "line" in given:
            loads.append(f'{{ on = "{name}", line = {literal(given["line"], "N/m")} }}')
        if "force" in given:
            loads.append(f'{{ at = "{name}.end", force = "{given["force"]} N" }}')
    if "weight" in case:
        loads.append(f"{{ weight = {case['weight']} }}")
    for load in loads:
        lines += ["[[member.m.load]]"] + split_table(load)
    return "\n".join(materials + lines) + "\n"


def split_table(load):
    """The keys of an inline table on lines of their own; no comma stands inside these values but
    between the two texts of a pair."""
    keys = load.strip("{} ").replace('", "', '"\0"').split(", ")
    return [key.replace("\0", ", ") for key in keys]


def main():
    from cases import CASES

    rows = []
    for case in CASES:
        expected = results(case)
        rows.append({
            "case": case["case"],
            "job": job(case),
            "expected": {address: mp.nstr(value, 25, strip_zeros=False) for address, value in expected.items()},
        })
    path = Path(__file__).with_name("quadrature.json")
    path.write_text(json.dumps(rows, indent=1) + "\n")


if __name__ == "__main__":
    main()
