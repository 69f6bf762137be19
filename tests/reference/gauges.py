"""Reference for gauge records: tips to steps, events without a threshold, and return periods.

Instants are whole milliseconds since 1970-01-01 00:00 UTC, depths mpf in mm.
"""

from fractions import Fraction
from math import ceil, floor

from mpmath import exp, log, mpf

from laws import real
from storms import depth_of, depths_of, fallen_at, largest_window, variate

HOUR_MS = 3_600_000
DAY_MS = 24 * HOUR_MS
WINDOWS_MIN = (5, 10, 15, 30, 60, 1440)
ANTECEDENT_MS = 5 * DAY_MS
SAME = mpf("1e-12")  # relative; sums of tips in decimal units meet tabulated depths only so nearly


def group(pieces, dry_spell_ms):
    """Rain parted where `dry_spell_ms` or more lie between a piece's end and the next one's start.
    A piece is (start, end, depth).
    """
    events = [[pieces[0]]]
    for before, piece in zip(pieces, pieces[1:]):
        if piece[0] - before[1] >= dry_spell_ms:
            events.append([])
        events[-1].append(piece)
    return events


def spread(tips, every_ms, dry_spell_ms):
    """The stretch (start, end, depth) over which each tip of an event is spread."""
    instants = sorted({at for at, _ in tips})
    depth = {at: sum(d for t, d in tips if t == at) for at in instants}
    gaps = [b - a for a, b in zip(instants, instants[1:])]
    first = min(gaps[0] if gaps else every_ms, dry_spell_ms)
    return [(at - gap, at, depth[at]) for at, gap in zip(instants, [first] + gaps)]


def tip_steps(tips, offset_minutes, every_ms, spread_over_ms=None):
    """(edges, depths) of an event's tips (instant, depth): in steps, or spread with the dry spell
    as the longest time of a tip."""
    face = offset_minutes * 60_000
    midnight = (tips[0][0] + face - 1) // DAY_MS * DAY_MS - face  # before the tip, not at it
    pieces = spread(tips, every_ms, spread_over_ms) if spread_over_ms else None
    from_step = (floor(Fraction(pieces[0][0] - midnight, every_ms)) if pieces
                 else ceil(Fraction(tips[0][0] - midnight, every_ms)) - 1)
    to_step = ceil(Fraction(tips[-1][0] - midnight, every_ms))
    edges = [midnight + i * every_ms for i in range(from_step, to_step + 1)]
    if pieces is None:
        return edges, [sum((d for at, d in tips if a < at <= b), mpf(0))
                       for a, b in zip(edges, edges[1:])]
    return edges, [sum((d * real(Fraction(max(0, min(b, q) - max(a, p)), q - p))
                        for p, q, d in pieces), mpf(0)) for a, b in zip(edges, edges[1:])]


def figures(edges_ms, depths):
    edges = [Fraction(edge, HOUR_MS) for edge in edges_ms]
    return {"from_ms": edges_ms[0], "to_ms": edges_ms[-1], "edges_ms": edges_ms,
            "depths": depths, "depth_mm": sum(depths, mpf(0)),
            "peaks": {m: largest_window(edges, depths, Fraction(m, 60)) for m in WINDOWS_MIN}}


def tip_events(tips, offset_minutes, rule):
    """Events of (instant, depth) in order; `rule` has dry_spell_ms, every_ms and spread."""
    events = []
    for pieces in group([(at, at, depth) for at, depth in tips], rule["dry_spell_ms"]):
        own = [(at, depth) for at, _, depth in pieces]
        event = figures(*tip_steps(own, offset_minutes, rule["every_ms"],
                                   rule["dry_spell_ms"] if rule["spread"] else None))
        begin = event["from_ms"]
        event["before_mm"] = sum((d for at, d in tips if at < own[0][0]
                                  and begin - ANTECEDENT_MS < at <= begin), mpf(0))
        event["before_known"] = tips[0][0] <= begin - ANTECEDENT_MS
        event["no_data_ms"] = 0
        events.append(event)
    return events


def interval_events(steps, rule):
    """Events of steps (start, end, depth), the depth of a hole being None."""
    events = []
    edges = [steps[0][0]] + [step[1] for step in steps]
    depths = [step[2] or mpf(0) for step in steps]
    for pieces in group([step for step in steps if step[2]], rule["dry_spell_ms"]):
        first, last = edges.index(pieces[0][0]), edges.index(pieces[-1][1])
        event = figures(edges[first:last + 1], depths[first:last])
        begin = event["from_ms"]
        before, by = fallen_at(edges, depths, (begin - ANTECEDENT_MS, begin))
        event["before_mm"] = by - before
        event["before_known"] = edges[0] <= begin - ANTECEDENT_MS
        event["no_data_ms"] = sum(b - a for a, b, d in steps[first:last] if d is None)
        events.append(event)
    return events


def rarity(table, hours, depth):
    """(years, more_than, less_than), by the straight line in log depth against the variate."""
    known = table["years"]
    columns = [depth_of(("list", depths_of(table, years)), hours) for years in known]
    same = [abs(column - depth) <= SAME * column for column in columns]
    reached = sum(column <= depth or equal for column, equal in zip(columns, same))
    more = known[reached - 1] if reached else None
    if reached == len(known):
        return (more, None, None) if same[-1] else (None, more, None)
    if more is None:
        return None, None, known[0]
    if same[reached - 1]:
        return more, None, None
    if more == 1:
        return None, more, known[reached]
    low, high = variate(real(more)), variate(real(known[reached]))
    a, b = log(columns[reached - 1]), log(columns[reached])
    reduced = low + (high - low) * (log(depth) - a) / (b - a)
    return 1 / (1 - exp(-exp(-reduced))), None, None


def event_rarity(table, event):
    """[(hours, depth, rarity)] for the durations no longer than the event, and the shortest."""
    edges = [Fraction(edge, HOUR_MS) for edge in event["edges_ms"]]
    length = edges[-1] - edges[0]
    hours = [h for i, h in enumerate(table["duration_h"]) if i == 0 or h <= length]
    depths = [largest_window(edges, event["depths"], h) for h in hours]
    return [(h, d, rarity(table, h, d)) for h, d in zip(hours, depths)]
