"""The reference ledger at reporting steps other than the storm's own (`--every`).

The storm is cut at the reporting edges as well, marched, and its rows are gathered between them.
"""

from bisect import bisect_right

from laws import real
from march import ACCOUNTS
from reference import keep_ledger


def reporting_edges(edges, every):
    """From the first step's start, the last step shorter."""
    marks = [edges[0]]
    while marks[-1] < edges[-1]:
        marks.append(min(marks[-1] + every, edges[-1]))
    return marks


def cut_storm(scenario, marks):
    """The scenario with its steps cut at `marks` too."""
    edges, depths = scenario["edges_h"], scenario["depths_mm"]
    fine = sorted(set(edges) | set(marks))
    cut = []
    for a, b in zip(fine, fine[1:]):
        step = bisect_right(edges, a) - 1
        cut.append(depths[step] * (b - a) / (edges[step + 1] - edges[step]))
    return dict(scenario, edges_h=fine, depths_mm=cut, storm_steps=len(cut))


def gather(part, ends):
    """A part of a ledger with the rows up to each of `ends` (counts of fine steps) made one."""
    spans = list(zip([0] + ends, ends))
    rows = {name: [part["rows"][name][b - 1] if name == "ponded" else sum(part["rows"][name][a:b])
                   for a, b in spans] for name in ACCOUNTS}
    gathered = dict(part, rows=rows)
    if "capacities" in part:
        gathered["capacities"] = [part["capacities"][b - 1] for b in ends]
    return gathered


def keep_ledger_every(scenario, every):
    """The ledger of `scenario` at steps of `every` hours, a Fraction."""
    marks = reporting_edges(scenario["edges_h"], every)
    fine = cut_storm(scenario, marks)
    ledger = keep_ledger(fine)
    ends = [fine["edges_h"].index(mark) for mark in marks[1:]]
    return dict(ledger, edges_h=[real(mark) for mark in marks],
                surfaces={n: gather(p, ends) for n, p in ledger["surfaces"].items()},
                places={n: gather(p, ends) for n, p in ledger["places"].items()},
                site=gather(ledger["site"], ends))
