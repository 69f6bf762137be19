"""The reference ledger: an independent model of what rainledger must report, in mpmath.

Written from the definitions of the ledger and the published laws alone, with other root finders
and more digits than the program, so that an error is not shared. Usage as a program:

    reference.py SCENARIO      prints the totals and the instants of each surface
"""

import sys
from bisect import bisect_left, bisect_right

from mpmath import inf, mpf, nstr

from curve_number import march_curve_number
from laws import make_law, real
from march import ACCOUNTS, March, phi_rate
from reading import read_scenario

SAME_INSTANT_H = mpf(10) ** -30
WINDOWS_MIN = (5, 10, 15, 30)
# Laws whose excess is constant between events, so that run-on from them is exact as it is.
STEADY_GIVERS = ("impervious", "constant_rate", "phi_index")
PARTS = 8  # of a step of any other giver, and of a part that is made finer
LEAST_REFINEMENTS, MOST_REFINEMENTS = 4, 9
SETTLED_MM = mpf("1e-9")


def giving_order(surfaces):
    """Surfaces, givers before those they run onto."""
    ordered, names = [], {s["name"]: s for s in surfaces}

    def visit(surface):
        if surface in ordered:
            return
        for giver in surfaces:
            if surface["name"] in giver["runs_onto"]:
                visit(giver)
        ordered.append(names[surface["name"]])

    for surface in surfaces:
        visit(surface)
    return ordered


def arriving(surface, results):
    """Per giver of `surface`: (start instants, mm/h over the receiver in each piece)."""
    streams = []
    for giver, result in results.values():
        share = giver["runs_onto"].get(surface["name"])
        if share is None:
            continue
        scale = real(share * giver["area_m2"] / surface["area_m2"])
        streams.append(([start for start, _, _ in result["outflow"]],
                        [scale * e / (end - start) for start, end, e in result["outflow"]]))
    return streams


def pieces_of(edges, depths, streams):
    """Pieces of constant rain and run-on: the steps cut at the givers' events."""
    pieces = []
    for step, (start, end, depth) in enumerate(zip(edges, edges[1:], depths)):
        cuts = sorted(t for starts, _ in streams for t in starts if start < t < end)
        marks = [start]
        for cut in cuts + [end]:
            if cut - marks[-1] > SAME_INSTANT_H:
                marks.append(cut)
        marks[-1] = end
        for a, b in zip(marks, marks[1:]):
            middle = (a + b) / 2
            run_on = sum((rates[bisect_right(starts, middle) - 1] for starts, rates in streams),
                         mpf(0))
            pieces.append({"start": a, "end": b, "step": step, "rain": depth / (end - start),
                           "run_on": run_on})
    return pieces


def cut(pieces, marks):
    """The pieces, cut at `marks` (sorted) as well."""
    fine = []
    for piece in pieces:
        inside = marks[bisect_right(marks, piece["start"] + SAME_INSTANT_H):
                       bisect_left(marks, piece["end"] - SAME_INSTANT_H)]
        ends = [piece["start"], *inside, piece["end"]]
        fine += [dict(piece, start=a, end=b) for a, b in zip(ends, ends[1:])]
    return fine


def parts_of(start, end, count):
    return [start + (end - start) * i / count for i in range(1, count)]


def refine(marks, events):
    """`marks` with the intervals at and beside each event in eight parts."""
    added = set()
    for t in events:
        at = bisect_right(marks, t) - 1
        for i in range(max(at - 1, 0), min(at + 2, len(marks) - 1)):
            added.update(parts_of(marks[i], marks[i + 1], PARTS))
    return sorted(added.union(marks))


def surface_law(surface, pieces, steps):
    if surface["law"] != "phi_index":
        return make_law(surface["law"], surface["parameters"])
    law = make_law("impervious", {})
    law.rate = phi_rate(surface, pieces, steps)
    return law


def keep_surface(surface, pieces, steps):
    """The ledger of one surface: rows of accounts, capacities, ponding, runoff start."""
    if surface["law"] == "curve_number":
        return march_curve_number(surface, pieces, steps)
    march = March(surface, surface_law(surface, pieces, steps), steps).run(pieces)
    # Nobody means a roof that sheds water by ponding.
    ponding = [] if surface["law"] == "impervious" else march.ponding
    return {"rows": march.rows, "capacities": march.capacities, "ponding": ponding,
            "runoff_start": march.runoff_start, "outflow": march.outflow, "margin": march.margin,
            "events": march.events()}


def weigh(members, area, steps, leaves):
    """Area-weighted rows of some surfaces. `leaves(surface)` is the share of the excess that
    leaves them as a whole; what stays among them, or goes elsewhere, comes off the run-on."""
    rows = {name: [mpf(0)] * steps for name in ACCOUNTS}
    for surface, result in members:
        weight = real(surface["area_m2"]) / area
        kept = 1 - leaves(surface)
        for step in range(steps):
            for name in ACCOUNTS:
                rows[name][step] += weight * result["rows"][name][step]
            passed_on = weight * kept * result["rows"]["excess"][step]
            rows["excess"][step] -= passed_on
            rows["run_on"][step] -= passed_on
    return rows


def totals_of(rows):
    return {name: rows[name][-1] if name == "ponded" else sum(rows[name]) for name in ACCOUNTS}


def worst_mean(edges, excess, window):
    """Largest mean rate over a window sliding over the step means, dry outside the record."""
    mass = [mpf(0)]
    for depth in excess:
        mass.append(mass[-1] + depth)

    def passed(t):
        if t <= edges[0] or t >= edges[-1]:
            return mass[0] if t <= edges[0] else mass[-1]
        i = bisect_right(edges, t) - 1
        return mass[i] + (mass[i + 1] - mass[i]) * (t - edges[i]) / (edges[i + 1] - edges[i])

    # The mass curve is a broken line, so the worst window has an end on one of its corners.
    return max(max(passed(t + window) - passed(t), passed(t) - passed(t - window))
               for t in edges) / window


def figures_of(rows, edges, area, storm_steps):
    excess = rows["excess"]
    rain = sum(rows["rain"])
    return {
        "excess_volume_m3": sum(excess) * area / 1000,
        "volumetric_runoff_coefficient": sum(excess) / rain if rain > 0 else None,
        "peak_excess_mm_per_h": max(excess[i] / (edges[i + 1] - edges[i])
                                    for i in range(storm_steps)),
        # 1 mm/h over 1 m2 is 1 L/h.
        "worst_flow_l_per_s": {str(m): worst_mean(edges, excess, mpf(m) / 60) * area / 3600
                               for m in WINDOWS_MIN},
    }


def keep_ledger(scenario):
    """{"surfaces": {name: ...}, "places": {name: ...}, "site": ..., "margin": ..., "exact": ...}

    `exact` is false where a giver is not impervious. Where the excess of one varies in time, it is
    handed over as mean rates of parts of each step. Volumes being exact, that matters only where
    something happens to a receiver, so the parts there are made finer until nothing moves.
    """
    edges = [real(e) for e in scenario["edges_h"]]
    marks = sorted(edges + [t for a, b in zip(edges, edges[1:]) for t in parts_of(a, b, PARTS)])
    ledger = keep_cut_ledger(scenario, marks)
    if all(s["law"] in STEADY_GIVERS for s in scenario["surfaces"] if s["runs_onto"]):
        return ledger
    margin = ledger["margin"]
    for refinement in range(1, MOST_REFINEMENTS + 1):
        marks = refine(marks, [t for s in ledger["surfaces"].values() for t in s["events"]])
        finer = keep_cut_ledger(scenario, marks)
        moved = largest_move(ledger, finer)
        # Each cut brings decisions closer to its edges; the coarse margin is the telling one.
        ledger = dict(finer, margin=margin)
        if refinement >= LEAST_REFINEMENTS and moved <= SETTLED_MM:
            return ledger
    raise ValueError("run-on does not settle")


def largest_move(one, other):
    return max(abs(a - b) for name, surface in one["surfaces"].items() for account in ACCOUNTS
               for a, b in zip(surface["rows"][account],
                               other["surfaces"][name]["rows"][account]))


def keep_cut_ledger(scenario, marks):
    edges = [real(e) for e in scenario["edges_h"]]
    depths = [real(d) for d in scenario["depths_mm"]]
    steps = len(depths)
    results = {}
    for surface in giving_order(scenario["surfaces"]):
        pieces = pieces_of(edges, depths, arriving(surface, results))
        if surface["runs_onto"] and surface["law"] not in STEADY_GIVERS:
            pieces = cut(pieces, marks)
        results[surface["name"]] = (surface, keep_surface(surface, pieces, steps))

    def area_ledger(members, leaves):
        area = sum(real(s["area_m2"]) for s, _ in members)
        rows = weigh(members, area, steps, leaves)
        return {"area_m2": area, "rows": rows, "total": totals_of(rows),
                "figures": figures_of(rows, edges, area, scenario["storm_steps"])}

    def reaching(surface):
        return 1 - sum((real(s) for s in surface["runs_onto"].values()), mpf(0))

    in_order = [results[s["name"]] for s in scenario["surfaces"]]
    places = {}
    for surface, result in in_order:
        places.setdefault(surface["drains_to"], []).append((surface, result))
    ledger = {"places": {name: area_ledger(m, reaching) for name, m in places.items()},
              "site": area_ledger(in_order, reaching), "edges_h": edges,
              "surfaces": {s["name"]: dict(r, total=totals_of(r["rows"]), law=s["law"])
                           for s, r in in_order},
              "margin": min([r["margin"] for _, r in in_order] + [inf]),
              "exact": all(s["law"] == "impervious" for s, _ in in_order if s["runs_onto"])}
    return ledger


def show(value):
    return "-" if value is None else nstr(value, 15)


def main():
    for name, surface in keep_ledger(read_scenario(sys.argv[1]))["surfaces"].items():
        print(name, surface["law"])
        for account, total in surface["total"].items():
            print(f"  {account:<13}{show(total)} mm")
        for start, end in surface["ponding"]:
            print(f"  ponded       {show(start)} to {show(end)} h")
        print(f"  runoff start {show(surface['runoff_start'])} h")


if __name__ == "__main__":
    main()
