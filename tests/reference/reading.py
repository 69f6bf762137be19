"""Reads a rainledger scenario for the reference model: exact numbers, no physics.

Every quantity is a Fraction of the text as written (minutes over 60, inches times 254/10), so that
no rounding enters before the model does. Only what the generated cases use is read: storms given
as steps or as a CSV file of elapsed times, and the keys of the loss laws. It trusts its input; the
program is the one that refuses bad scenarios.
"""

import re
from fractions import Fraction
from pathlib import Path

import yaml

INCH_MM = Fraction(254, 10)
DEPTH_MM = {"mm": Fraction(1), "cm": Fraction(10), "m": Fraction(1000), "in": INCH_MM,
            "ft": 12 * INCH_MM}
TIME_H = {"s": Fraction(1, 3600), "min": Fraction(1, 60), "h": Fraction(1), "hr": Fraction(1),
          "d": Fraction(24)}
AREA_M2 = {"m2": Fraction(1), "ha": Fraction(10000), "km2": Fraction(10**6),
           "ft2": Fraction(3048, 10000) ** 2, "ac": 43560 * Fraction(3048, 10000) ** 2}


def split_quantity(text):
    """The number and the unit of a text such as '12.5 mm'."""
    number, unit = re.fullmatch(r"\s*([-+0-9.eE]+)\s*(.*?)\s*", str(text)).groups()
    return Fraction(number), unit


def depth_mm(text):
    number, unit = split_quantity(text)
    return number * DEPTH_MM[unit]


def time_h(text):
    number, unit = split_quantity(text)
    return number * TIME_H[unit]


def area_m2(text):
    number, unit = split_quantity(text)
    return number * AREA_M2[unit]


def rate_factor(unit):
    """mm/h in one of `unit`."""
    depth, time = unit.split("/")
    return DEPTH_MM[depth] / TIME_H[time]


def rate_mm_per_h(text):
    number, unit = split_quantity(text)
    return number * rate_factor(unit)


def decay_per_h(text):
    number, unit = split_quantity(text)
    return number / TIME_H[unit.removeprefix("1/")]


def share_of(text):
    number, unit = split_quantity(text)
    return number / 100 if unit == "%" else number


def sorptivity(text):
    """(number, depth factor, time factor): the square root of time is left to the model."""
    number, unit = split_quantity(text)
    depth, time = unit.removesuffix("^0.5").split("/")
    return number * DEPTH_MM[depth], TIME_H[time]


def plain(text):
    return Fraction(str(text))


LAW_KEYS = {
    "green_ampt": {"effective_conductivity": rate_mm_per_h, "wetting_front_suction": depth_mm,
                   "moisture_deficit": plain, "suction_deficit": depth_mm,
                   "storage_limit": depth_mm, "barrier_rate": rate_mm_per_h},
    "horton": {"initial_capacity": rate_mm_per_h, "final_capacity": rate_mm_per_h,
               "decay": decay_per_h, "follows": str, "recovery": decay_per_h},
    "philip": {"sorptivity": sorptivity, "steady_term": rate_mm_per_h},
    "constant_rate": {"rate": rate_mm_per_h, "initial_loss": depth_mm},
    "phi_index": {"observed_excess": depth_mm},
    "curve_number": {"number": plain, "initial_abstraction_ratio": plain,
                     "tabulated_ratio": plain, "antecedent": str},
}


def read_losses(losses):
    """(name of the law, its parameters as Fractions or words)."""
    if losses == "impervious":
        return "impervious", {}
    (name, given), = losses.items()
    return name, {key: LAW_KEYS[name][key](value) for key, value in given.items()}


def read_runs_onto(given):
    if given is None:
        return {}
    if isinstance(given, str):
        return {given: Fraction(1)}
    return {name: share_of(share) for name, share in given.items()}


def read_surface(name, given):
    law, parameters = read_losses(given["losses"])
    return {
        "name": name,
        "area_m2": area_m2(given["area"]),
        "drains_to": given.get("drains_to", "outlet"),
        "interception_mm": depth_mm(given.get("interception", "0 mm")),
        "storage_mm": depth_mm(given.get("depression_storage", "0 mm")),
        "held": given.get("ponded_water", "infiltrates") == "held",
        "law": law,
        "parameters": parameters,
        "runs_onto": read_runs_onto(given.get("runs_onto")),
    }


def read_steps(given):
    """Edges (h) and depths (mm) of a storm written as `steps`."""
    values = [plain(v) for v in given.get("depths", given.get("intensities"))]
    if "every" in given:
        every = time_h(given["every"])
        edges = [every * i for i in range(len(values) + 1)]
    else:
        edges = [Fraction(0)] + [time_h(end) for end in given["ends"]]
    if "depths" in given:
        return edges, [v * DEPTH_MM[given["unit"]] for v in values]
    factor = rate_factor(given["unit"])
    return edges, [v * factor * (b - a) for v, a, b in zip(values, edges, edges[1:])]


def read_csv(path):
    """Edges and depths of a CSV file headed start [..],end [..],depth [..]; holes become dry."""
    lines = path.read_text(encoding="utf-8").split()
    units = re.findall(r"\[(.*?)\]", path.read_text(encoding="utf-8").splitlines()[0])
    rows = [line.split(",") for line in lines if re.match(r"[-0-9.]", line)]
    edges, depths = [], []
    for start, end, depth in rows:
        start_h, end_h = (plain(start) * TIME_H[units[0]], plain(end) * TIME_H[units[1]])
        if edges and start_h > edges[-1]:
            edges.append(start_h)
            depths.append(Fraction(0))
        if not edges:
            edges.append(start_h)
        edges.append(end_h)
        depths.append(plain(depth) * DEPTH_MM[units[2]])
    return edges, depths


def add_dry_time(edges, dry_h):
    """Edges with `dry_h` appended in steps of the last step's length, the last one shorter."""
    last = edges[-1] - edges[-2]
    stop = edges[-1] + dry_h
    while edges[-1] < stop:
        edges = edges + [min(edges[-1] + last, stop)]
    return edges


def read_scenario(path):
    """The scenario of a file as a dict: edges_h, depths_mm, storm_steps, surfaces."""
    return read_text(Path(path).read_text(encoding="utf-8"), Path(path).parent)


def read_text(text, folder=Path(".")):
    """The scenario of a text whose hyetograph files are in `folder`."""
    # The base loader leaves every scalar a text, so that 0.2 stays the decimal 0.2.
    given = yaml.load(text, Loader=yaml.BaseLoader)
    storm = given["storm"]
    if "steps" in storm:
        edges, depths = read_steps(storm["steps"])
    else:
        named = storm["hyetograph"]
        edges, depths = read_csv(folder / (named if isinstance(named, str) else named["file"]))
    depths = [d * plain(storm.get("multiply_by", "1")) for d in depths]
    storm_steps = len(depths)
    if "continue_for" in storm:
        edges = add_dry_time(edges, time_h(storm["continue_for"]))
        depths = depths + [Fraction(0)] * (len(edges) - 1 - storm_steps)
    surfaces = [read_surface(name, body) for name, body in given["surfaces"].items()]
    return {"edges_h": edges, "depths_mm": depths, "storm_steps": storm_steps,
            "surfaces": surfaces}
