"""Reference for design storms: statistics, formulas, patterns, resampling and sliding windows.

Times are Fractions of hours, depths are mpf in mm. A source of depth is ("depth", mm),
("list", [(h, mm), ...]) or ("formula", a, b, m, n, unit_h) with a in mm/h; a table is a dict of
`duration_h`, `years` and `depth_mm` (rows by duration). Each method from its publication:

- reduced variate: Gumbel, Statistics of Extremes, 1958;
- alternating blocks: Chow, Maidment and Mays, Applied Hydrology, 1988, section 14.4;
- Keifer and Chu, Synthetic storm pattern for drainage design, 1957: the intensities before and
  after the peak (Applied Hydrology, eqs. 14.4.11 and 14.4.12 for n = 1), integrated numerically;
- triangle: Yen and Chow, Design hyetographs for small drainage structures, 1980.
"""

from bisect import bisect_right
from fractions import Fraction
from math import ceil

from mpmath import log, mp, mpf
import numpy

from laws import real

mp.dps = max(mp.dps, 30)


def on_line(x, xs, ys):
    """`ys` at `x`, straight between neighbours; None outside `xs`."""
    if not xs[0] <= x <= xs[-1]:
        return None
    i = min(bisect_right(xs, x), len(xs) - 1) - 1 if len(xs) > 1 else 0
    if xs[i] == x or len(xs) == 1:
        return ys[i]
    return ys[i] + (ys[i + 1] - ys[i]) * (x - xs[i]) / (xs[i + 1] - xs[i])


def variate(years):
    return -log(-log(1 - 1 / mpf(years)))


def depths_of(table, years):
    """The list of one return period; None where the table does not say."""
    known = table["years"]
    if years in known:
        column = known.index(years)
        return [(h, row[column]) for h, row in zip(table["duration_h"], table["depth_mm"])]
    first = 1 if known[0] == 1 else 0
    if first == len(known) or not known[first] < years < known[-1]:
        return None
    marks = [variate(real(t)) for t in known[first:]]
    at = variate(real(years))
    return [(h, mp.exp(on_line(at, marks, [log(d) for d in row[first:]])))
            for h, row in zip(table["duration_h"], table["depth_mm"])]


def depth_of(source, h):
    """The depth that a source gives a duration."""
    if source[0] == "depth":
        return source[1]
    if source[0] == "list":
        hours, depths = zip(*source[1])
        if h in hours:
            return depths[hours.index(h)]
        found = on_line(log(real(h)), [log(real(x)) for x in hours], [log(d) for d in depths])
        return None if found is None else mp.exp(found)
    _, a, b, m, n, unit_h = source
    return a * real(h) / ((real(h) / real(unit_h)) ** m + b) ** n


def step_edges(duration, every):
    return [every * i for i in range(ceil(duration / every))] + [duration]


def uniform(request, edges):
    depth = depth_of(request["source"], request["duration_h"])
    return [depth * real((b - a) / request["duration_h"]) for a, b in zip(edges, edges[1:])]


def triangular(request, edges):
    depth, peak = depth_of(request["source"], request["duration_h"]), request["peak_at"]

    def fallen(share):
        if share <= peak:
            return share * share / peak if peak else Fraction(0)
        return 1 - (1 - share) ** 2 / (1 - peak)

    marks = [fallen(edge / request["duration_h"]) for edge in edges]
    return [depth * real(b - a) for a, b in zip(marks, marks[1:])]


def mass_curve(request, edges):
    depth = depth_of(request["source"], request["duration_h"])
    times, shares = zip(*request["points"])
    marks = [on_line(edge / request["duration_h"], times, shares) for edge in edges]
    return [depth * real(b - a) for a, b in zip(marks, marks[1:])]


def alternating_blocks(request, edges):
    """Blocks by size around the peak: right, left, right, ..., then the side that has room."""
    duration, every = request["duration_h"], request["every_h"]
    whole = duration // every
    curve = [mpf(0)] + [depth_of(request["source"], every * n) for n in range(1, whole + 1)]
    blocks = sorted((b - a for a, b in zip(curve, curve[1:])), reverse=True)
    peak = min(max(ceil(request["peak_at"] * duration / every) - 1, 0), whole - 1)
    placed = [None] * whole
    placed[peak] = blocks[0]
    left, right, go_right = peak - 1, peak + 1, True
    for block in blocks[1:]:
        if right < whole and (go_right or left < 0):
            placed[right] = block
            right += 1
        else:
            placed[left] = block
            left -= 1
        go_right = not go_right
    if len(edges) - 1 > whole:
        placed.append(depth_of(request["source"], duration) - curve[-1])
    return placed


NODES, WEIGHTS = numpy.polynomial.legendre.leggauss(24)
PANELS = 24
GRADED = 12  # t = T s^12 draws the quadrature's nodes towards the peak


def intensity_integral(formula, start, end):
    """Integral in mm of the instantaneous intensity from `start` to `end` h off the peak, of a
    branch that takes the whole of the time: a ((1 - m n) t^m + b) / (t^m + b)^(n + 1).
    """
    _, a, b, m, n, unit_h = formula
    a, b, m, n, unit_h, start, end = (float(x) for x in (a, b, m, n, unit_h, start, end))
    low, high = start ** (1 / GRADED), end ** (1 / GRADED)
    marks = numpy.linspace(low, high, PANELS + 1)
    half = (marks[1:] - marks[:-1])[:, None] / 2
    s = (marks[1:] + marks[:-1])[:, None] / 2 + half * NODES
    power = (s ** GRADED / unit_h) ** m
    intensity = a * ((1 - m * n) * power + b) / (power + b) ** (n + 1)
    return mpf(float((half * WEIGHTS * intensity * GRADED * s ** (GRADED - 1)).sum()))


def keifer_chu(request, edges):
    """Time before the peak is stretched by 1 / r, after it by 1 / (1 - r)."""
    peak_h, r = request["peak_at"] * request["duration_h"], request["peak_at"]

    def side(near, far, share):
        if far <= near or not share:
            return mpf(0)
        return real(share) * intensity_integral(request["source"], near / share, far / share)

    return [side(peak_h - min(b, peak_h), peak_h - min(a, peak_h), r)
            + side(max(a, peak_h) - peak_h, max(b, peak_h) - peak_h, 1 - r)
            for a, b in zip(edges, edges[1:])]


PATTERNS = {"uniform": uniform, "triangular": triangular, "mass_curve": mass_curve,
            "alternating_blocks": alternating_blocks, "keifer_chu": keifer_chu}


def design(request):
    """(edges, depths) of a design storm."""
    edges = step_edges(request["duration_h"], request["every_h"])
    return edges, PATTERNS[request["pattern"]](request, edges)


def fallen_at(edges, depths, times):
    """Depth by each instant, rain being even within steps and nothing outside them."""
    sums = [mpf(0)]
    for depth in depths:
        sums.append(sums[-1] + depth)
    result = []
    for time in times:
        i = bisect_right(edges, time) - 1
        if i < 0:
            result.append(mpf(0))
        elif i >= len(depths):
            result.append(sums[-1])
        else:
            result.append(sums[i] + depths[i] * real(Fraction(time - edges[i])
                                                      / (edges[i + 1] - edges[i])))
    return result


def resample(edges, depths, every):
    """Steps of `every` from the first edge; the last may reach beyond the rain."""
    count = ceil((edges[-1] - edges[0]) / every)
    marks = [edges[0] + every * i for i in range(count + 1)]
    fallen = fallen_at(edges, depths, marks)
    return marks, [b - a for a, b in zip(fallen, fallen[1:])]


def largest_window(edges, depths, window):
    """The largest depth in a window: it begins or ends on an edge."""
    starts = sorted(set(edges) | {edge - window for edge in edges})
    ends = [start + window for start in starts]
    return max(b - a for a, b in zip(fallen_at(edges, depths, starts),
                                     fallen_at(edges, depths, ends)))
