"""Seeded random scenarios for the comparison with the reference model.

A case is {"family", "yaml", "files": {name: text}}; the same seed and index give the same text.
Families of storms alternate; every case has several surfaces, of laws taken in turn and at random.

Instants that are ill-conditioned by nature (a pond that drains to within 1e-6 mm of empty when
the next burst comes, a crossing at a grazing slope) are not drawn: the reference reports the
smallest margin by which it decided anything, and a case below LEAST_MARGIN is drawn again. Exact
ties that the definitions settle (rain equal to a constant capacity, a store filled at a step's
edge) are drawn on purpose. Where a tie decides whether an instant exists at all, the numbers are
such that doubles carry the tie exactly (steps of 15 min, multiples of 0.25 mm).
"""

import random

LEAST_MARGIN = 2e-6
LAWS = ("horton", "green_ampt", "horton_clock", "philip", "green_ampt_limit", "constant_rate",
        "horton_recovery", "phi_index", "curve_number", "impervious")


def number(value):
    """A decimal text without exponent or a needless point."""
    return f"{value:.4f}".rstrip("0").rstrip(".")


def mapping(pairs):
    return "{" + ", ".join(f"{key}: {value}" for key, value in pairs) + "}"


def rate_text(rng, value):
    """A rate of about `value` mm/h, in one of several units."""
    unit, factor = rng.choice([("mm/h", 1), ("mm/h", 1), ("in/h", 25.4), ("cm/h", 10)])
    return f"{number(value / factor)} {unit}"


# Storms: each gives the text under `storm:` and the files beside the scenario.

def steps_storm(every_min, depths, unit="mm", kind="depths", extra=()):
    body = mapping([("every", f"{every_min} min"), (kind, "[" + ", ".join(depths) + "]"),
                    ("unit", unit)])
    return "".join(f"  {line}\n" for line in (f"steps: {body}", *extra)), {}


def csv_storm(rows):
    """rows: (start, end, depth) in minutes and mm, already as text."""
    text = "start [min],end [min],depth [mm]\n" + "".join(",".join(r) + "\n" for r in rows)
    return "  hyetograph: {file: rain.csv, gaps: dry}\n", {"rain.csv": text}


def burst(rng, steps, total):
    """Depths of a burst, peaked somewhere, summing to about `total` mm."""
    peak = rng.uniform(0.2, 0.8) * steps
    shape = [rng.uniform(0.3, 1) / (1 + abs(i + 0.5 - peak)) for i in range(steps)]
    return [total * s / sum(shape) for s in shape]


def tail(rng):
    """Perhaps dry time after the storm, perhaps a climate allowance."""
    extra = []
    if rng.random() < 0.4:
        extra.append(f"continue_for: {rng.choice(['1 h', '50 min', '2.5 h'])}")
    if rng.random() < 0.25:
        extra.append("multiply_by: 1.2")
    return extra


def double_burst(rng):
    every = rng.choice([5, 6, 10, 15])
    first, second = (burst(rng, rng.randint(4, 10), rng.uniform(8, 50)) for _ in range(2))
    dry = rng.randint(1, 4)
    if rng.random() < 0.5:
        depths = first + [0] * min(dry * 60 // every, 24) + second + [0] * rng.randint(0, 8)
        return steps_storm(every, [number(d) for d in depths], extra=tail(rng))
    rows, t = [], rng.choice([0, 0, 30, 97.5])
    for depth in first + [None] + second:
        end = t + (60 * dry if depth is None else every)
        if depth is not None:
            rows.append((number(t), number(end), number(depth)))
        t = end
    return csv_storm(rows)


def bell(rng):
    every = rng.choice([5, 6, 15])
    depths = burst(rng, rng.randint(18, 36), rng.uniform(15, 110))
    if rng.random() < 0.3:
        return steps_storm(every, [number(d / 25.4) for d in depths], "in", extra=tail(rng))
    return steps_storm(every, [number(d) for d in depths], extra=tail(rng))


def irregular(rng):
    t, rows = rng.choice([0, 0, 12, 45.25]), []
    for _ in range(rng.randint(12, 35)):
        end = t + rng.choice([1, 2.5, 4, 7, 11.3, 20, 45])
        depth = 0 if rng.random() < 0.15 else rng.expovariate(1) * (end - t) * 0.4
        rows.append((t, end, depth))
        t = end
    if rows[0][0] == 0 and rng.random() < 0.5:
        body = mapping([("ends", "[" + ", ".join(f"{number(e)} min" for _, e, _ in rows) + "]"),
                        ("depths", "[" + ", ".join(number(d) for _, _, d in rows) + "]"),
                        ("unit", "mm")])
        return f"  steps: {body}\n", {}
    return csv_storm([tuple(number(v) for v in row) for row in rows])


def draining(rng):
    """A sharp burst and a long weak tail, so that ponds drain under rain."""
    every = rng.choice([5, 10, 15])
    depths = burst(rng, rng.randint(3, 7), rng.uniform(10, 45))
    weak = [0, 0.02, 0.05, 0.1, 0.3]
    depths += [rng.choice(weak) * every / 5 for _ in range(rng.randint(12, 30))]
    return steps_storm(every, [number(d) for d in depths], extra=tail(rng))


# Surfaces.

def horton_keys(rng):
    final = rng.choice([0, rng.uniform(0.5, 30), rng.uniform(2, 12)])
    decay = rng.uniform(0.5, 20)
    decay_text = f"{number(decay / 60)} 1/min" if rng.random() < 0.3 else f"{number(decay)} 1/h"
    return [("initial_capacity", rate_text(rng, final + rng.uniform(20, 200))),
            ("final_capacity", rate_text(rng, final)), ("decay", decay_text)]


def green_ampt_keys(rng):
    keys = [("effective_conductivity", rate_text(rng, rng.choice([rng.uniform(0.3, 12),
                                                                  rng.uniform(0.3, 30)])))]
    if rng.random() < 0.5:
        return keys + [("suction_deficit", f"{number(rng.uniform(1, 150))} mm")]
    return keys + [("wetting_front_suction", f"{number(rng.uniform(20, 400))} mm"),
                   ("moisture_deficit", number(rng.uniform(0.02, 0.45)))]


def curve_number_keys(rng):
    keys = [("number", number(rng.choice([rng.randint(40, 99), rng.uniform(50, 99)])))]
    kind = rng.randrange(4)
    if kind == 1:
        keys.append(("initial_abstraction_ratio", number(rng.choice([0, 0.05, 0.1, 0.2]))))
    if kind == 2:
        keys += [("initial_abstraction_ratio", "0.05"), ("tabulated_ratio", "0.2")]
    if kind == 3:
        keys.append(("antecedent", rng.choice(["I", "III"])))
    return keys


def losses(rng, law):
    """The text after `losses:`."""
    if law == "impervious":
        return law
    if law.startswith("horton"):
        keys = horton_keys(rng)
        if law == "horton_clock":
            keys.append(("follows", "elapsed_time"))
        if law == "horton_recovery":
            keys.append(("recovery", f"{number(rng.choice([0.02, 0.3, 2]))} 1/h"))
        return "{horton: " + mapping(keys) + "}"
    if law.startswith("green_ampt"):
        keys = green_ampt_keys(rng)
        if law == "green_ampt_limit":
            keys.append(("storage_limit", f"{number(rng.uniform(2, 40))} mm"))
            if rng.random() < 0.7:
                keys.append(("barrier_rate", rate_text(rng, rng.uniform(0, 15))))
        return "{green_ampt: " + mapping(keys) + "}"
    if law == "philip":
        return "{philip: " + mapping([
            ("sorptivity", f"{number(rng.uniform(1, 40))} mm/h^0.5"),
            ("steady_term", rate_text(rng, rng.choice([0, rng.uniform(0.5, 15)])))]) + "}"
    if law == "constant_rate":
        keys = [("rate", rate_text(rng, rng.uniform(0.5, 30)))]
        if rng.random() < 0.6:
            keys.append(("initial_loss", f"{number(rng.uniform(0.5, 15))} mm"))
        return "{constant_rate: " + mapping(keys) + "}"
    if law == "phi_index":
        return "{phi_index: {observed_excess: %s mm}}" % number(rng.uniform(0.5, 5))
    return "{curve_number: " + mapping(curve_number_keys(rng)) + "}"


def surface_text(name, area, body, place=None, extra=()):
    lines = [f"  {name}:", f"    area: {area}"]
    if place:
        lines.append(f"    drains_to: {place}")
    lines += [f"    {line}" for line in extra] + [f"    losses: {body}"]
    return "\n".join(lines) + "\n"


def storage_lines(rng, law, deep):
    """Interception, depression storage and what becomes of it; none for a curve number."""
    lines = []
    if law == "curve_number":
        return lines
    if rng.random() < 0.5:
        lines.append(f"interception: {number(rng.uniform(0.2, 4))} mm")
    if deep or rng.random() < 0.6:
        store = rng.uniform(3, 9) if deep else rng.uniform(0.5, 6)
        lines.append(f"depression_storage: {number(store)} mm")
        if rng.random() < 0.3:
            lines.append("ponded_water: held")
    return lines


def area_text(rng):
    return rng.choice([f"{rng.randint(50, 4000)} m2", f"{number(rng.uniform(0.01, 0.8))} ha",
                       f"{number(rng.uniform(0.02, 1.5))} ac"])


def ordinary_surfaces(rng, index, deep):
    """Two soils, one of the law whose turn it is, and perhaps roofs shedding on them."""
    laws = [LAWS[index % len(LAWS)], rng.choice(LAWS)]
    text = ""
    for i, law in enumerate(laws):
        text += surface_text(f"soil_{i + 1}", area_text(rng), losses(rng, law),
                             rng.choice([None, "Millbrook"]), storage_lines(rng, law, deep))
    for i in range(rng.choice([0, 1, 1, 2])):
        to = rng.choice(["soil_1", mapping([("soil_1", "30 %"), ("soil_2", "45 %")]),
                         mapping([("soil_2", "0.625")])])
        if i == 1 and rng.random() < 0.5:
            to = "roof_1"
        lines = storage_lines(rng, "impervious", False) + [f"runs_onto: {to}"]
        text += surface_text(f"roof_{i + 1}", area_text(rng), "impervious",
                             rng.choice([None, "Millbrook"]), lines)
    return text


def chained(rng, index):
    """Soils shedding onto soils under a short storm (the reference has to cut it finely)."""
    depths = burst(rng, rng.randint(3, 5), rng.uniform(8, 50)) + [rng.choice([0, 0.4])]
    law = LAWS[index % len(LAWS)]
    lines = storage_lines(rng, law, False)
    lines.append("runs_onto: " + rng.choice(["swale", "{swale: 40 %}"]))
    giver = surface_text("slope", area_text(rng), losses(rng, law), None, lines)
    below = rng.choice(["horton", "green_ampt", "philip", "curve_number", "impervious"])
    receiver = surface_text("swale", area_text(rng), losses(rng, below), "Millbrook",
                            storage_lines(rng, below, True))
    return steps_storm(rng.choice([10, 15]), [number(d) for d in depths]), receiver + giver


# Ties settled by the definitions.

def tie_intensities(rng, tie):
    """mm/h, some exactly `tie`, at a step length doubles do not carry exactly as well."""
    rates = [rng.choice([tie, tie, 2 * tie, 6 * tie, 0]) for _ in range(rng.randint(6, 20))]
    return steps_storm(rng.choice([5, 6, 15]), [number(r) for r in rates], "mm/h", "intensities")


def tied_rates(rng, _):
    """Rain equal to a constant capacity, to fc, K or A, or to f0."""
    tie = rng.choice([4, 6, 7.5, 12])
    curve = [("decay", f"{rng.choice([2, 8, 60])} 1/h")]
    bodies = [
        ("flat", mapping([("initial_capacity", f"{tie} mm/h"), ("final_capacity", f"{tie} mm/h")]
                         + curve)),
        ("still", mapping([("initial_capacity", f"{tie} mm/h"), ("final_capacity", "1 mm/h"),
                           ("decay", "0 1/h")])),
        ("at_fc", mapping([("initial_capacity", f"{5 * tie} mm/h"),
                           ("final_capacity", f"{tie} mm/h")] + curve)),
        ("at_fc_clock", mapping([("initial_capacity", f"{5 * tie} mm/h"),
                                 ("final_capacity", f"{tie} mm/h"),
                                 ("follows", "elapsed_time")] + curve)),
        ("at_f0", mapping([("initial_capacity", f"{2 * tie} mm/h"), ("final_capacity", "1 mm/h")]
                          + curve)),
    ]
    bodies = [(name, "{horton: " + body + "}") for name, body in bodies]
    bodies += [
        ("no_suction", f"{{green_ampt: {{effective_conductivity: {tie} mm/h, "
                       "suction_deficit: 0 mm}}"),
        ("at_K", f"{{green_ampt: {{effective_conductivity: {tie} mm/h, suction_deficit: 20 mm}}}}"),
        ("at_A", f"{{philip: {{sorptivity: 6 mm/h^0.5, steady_term: {tie} mm/h}}}}"),
        ("uniform", f"{{constant_rate: {{rate: {tie} mm/h, initial_loss: 3 mm}}}}"),
        ("barrier", f"{{green_ampt: {{effective_conductivity: {tie} mm/h, suction_deficit: 20 mm, "
                    f"storage_limit: 8.1 mm, barrier_rate: {tie} mm/h}}}}"),
    ]
    rng.shuffle(bodies)
    text = ""
    for name, body in bodies[:6]:
        lines = ["depression_storage: 2.3 mm"] if rng.random() < 0.5 else []
        lines += ["ponded_water: held"] if lines and rng.random() < 0.5 else []
        text += surface_text(name, "100 m2", body, None, lines)
    return tie_intensities(rng, tie), text


def extremes(rng, index):
    """No rain, one step, laws at the ends of their ranges."""
    storm = rng.choice([
        lambda: steps_storm(15, ["0", "0", "0", "0"]),
        lambda: steps_storm(30, [number(rng.uniform(5, 40))]),
        lambda: bell(rng),
        lambda: draining(rng),
    ])()
    keep = ["depression_storage: 4 mm"] + rng.choice([[], ["ponded_water: held"]])
    text = surface_text("all_runs_off", "80 m2", "{curve_number: {number: 100}}")
    text += surface_text("no_conductivity", "80 m2", "{green_ampt: {effective_conductivity: "
                         "0 mm/h, suction_deficit: 30 mm}}", None, rng.choice([[], keep]))
    text += surface_text("no_suction", "80 m2", "{green_ampt: {effective_conductivity: 9 mm/h, "
                         "suction_deficit: 0 mm, storage_limit: 6.13 mm, barrier_rate: 2 mm/h}}",
                         None, rng.choice([[], keep]))
    limit = rng.choice([0, 0.53, 1.13, 1.57])
    text += surface_text("few_pores", "80 m2", "{green_ampt: {effective_conductivity: 9 mm/h, "
                         f"suction_deficit: 25 mm, storage_limit: {limit} mm, "
                         "barrier_rate: 3 mm/h}}", None, rng.choice([[], keep]))
    text += surface_text("no_sorptivity", "80 m2", "{philip: {sorptivity: 0 mm/h^0.5, "
                         "steady_term: 5 mm/h}}", None, keep)
    text += surface_text("sudden", "80 m2", "{horton: {initial_capacity: 180 mm/h, final_capacity: "
                         f"{rng.choice([0, 3])} mm/h, decay: {rng.choice([0.05, 300])} 1/h}}}}")
    text += surface_text("no_excess", "80 m2", "{phi_index: {observed_excess: 0 mm}}", None,
                         ["interception: 1 mm"])
    return storm, text


def full_at_an_edge(rng, index):
    """A store, an interception or an initial loss filled exactly at a step's edge."""
    wet = [rng.randint(2, 12) for _ in range(rng.randint(3, 8))]
    quarters = wet + [0] * rng.randint(1, 4) + [rng.randint(4, 30) for _ in range(4)]
    quarters += [0, 0]
    filled = number(sum(wet[:rng.choice([1, 2, len(wet)])]) / 4)
    store = [f"depression_storage: {filled} mm"]
    law = LAWS[index % len(LAWS)]
    text = surface_text("roof", "256 m2", "impervious", None, store)
    text += surface_text("held", "100 m2", "{green_ampt: {effective_conductivity: 0 mm/h, "
                         "suction_deficit: 30 mm}}", None, store + ["ponded_water: held"])
    soil = losses(rng, rng.choice(["horton", "green_ampt"]))
    text += surface_text("canopy", "100 m2", soil, None, [f"interception: {filled} mm"])
    text += surface_text("first_loss", "128 m2", "{constant_rate: {rate: 8 mm/h, initial_loss: "
                         f"{filled} mm}}}}", None, rng.choice([[], store]))
    if law != "phi_index":
        text += surface_text("soil", "512 m2", losses(rng, law), None,
                             storage_lines(rng, law, False))
        text += surface_text("yard", "256 m2", "impervious", None, store + ["runs_onto: soil"])
    return steps_storm(15, [number(q / 4) for q in quarters]), text


ORDINARY = {"double_burst": double_burst, "bell": bell, "irregular": irregular,
            "draining": draining}
SPECIAL = {"chained": chained, "tied_rates": tied_rates, "extremes": extremes,
           "full_at_an_edge": full_at_an_edge}
# Ordinary storms come round more often than the ties; 10 laws and 11 turns share no factor.
TURNS = ("double_burst", "bell", "tied_rates", "irregular", "draining", "extremes",
         "double_burst", "full_at_an_edge", "bell", "chained", "draining")


def draw(seed, index, attempt):
    """One scenario; `attempt` counts the draws that were too close to a knife's edge."""
    rng = random.Random(f"{seed}/{index}/{attempt}")
    family = TURNS[index % len(TURNS)]
    if family in SPECIAL:
        (storm, files), surfaces = SPECIAL[family](rng, index)
    else:
        storm, files = ORDINARY[family](rng)
        surfaces = ordinary_surfaces(rng, index, family == "draining" or rng.random() < 0.4)
    title = f"Quarry Row, {family.replace('_', ' ')} {index}"
    return {"family": family, "files": files,
            "yaml": f"title: {title}\nstorm:\n{storm}surfaces:\n{surfaces}"}
