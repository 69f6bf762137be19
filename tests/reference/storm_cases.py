"""Seeded random storms: each as the files that the program reads and as exact numbers."""

from datetime import datetime, timedelta
from decimal import Decimal
from fractions import Fraction
import random

from mpmath import mpf

from laws import real
from storms import depths_of

MM = {"mm": Fraction(1), "cm": Fraction(10), "in": Fraction("25.4")}
HOURS = {"s": Fraction(1, 3600), "min": Fraction(1, 60), "h": Fraction(1), "d": Fraction(24)}
EPOCH = datetime(1970, 1, 1)
DURATIONS_MIN = (5, 10, 15, 30, 60, 120, 180, 360, 720, 1440, 2880, 10080, 43200)
YEARS = (1, 2, 5, 10, 20, 25, 50, 100, 200, 500, 1000)


def draw(seed, index):
    """A case: `family`, `files` by name and what the reference needs."""
    rng = random.Random(f"{seed} {index}")
    family = rng.choice(("design", "design", "design", "tips", "tips", "intervals"))
    case = {"design": design_case, "tips": tip_case, "intervals": interval_case}[family](rng)
    return dict(case, family=family)


def time_text(rng, hours):
    """A duration in one of the units in which it is a short number."""
    units = [unit for unit, size in HOURS.items()
             if (hours / size * 1000).denominator == 1 and hours / size < 100_000]
    unit = rng.choice(units)
    return f"{decimal(hours / HOURS[unit])} {unit}"


def decimal(number):
    number = Fraction(number)
    return format(Decimal(number.numerator) / number.denominator, "f")


def table(rng, smallest=Fraction(1, 10)):
    """Rainfall statistics as CSV and as numbers, in whole `smallest` of a unit, depths rising or
    staying both ways."""
    durations = sorted(rng.sample(DURATIONS_MIN, rng.randint(2, 10)))
    years = sorted(rng.sample(YEARS, rng.randint(1, 6)))
    unit = rng.choice(("mm", "in"))
    grid, above = [], [0] * len(years)
    depth = rng.randint(20, 120)
    for _ in durations:
        row, left = [], 0
        for column in range(len(years)):
            left = max(left + rng.choice((0, rng.randint(1, 60))), above[column], depth)
            row.append(left)
        above = row
        depth = row[0] + rng.choice((0, rng.randint(1, 90)))
        grid.append(row)
    values = [[n * smallest for n in row] for row in grid]
    lines = ["duration," + ",".join(f"{y} yr [{unit}]" for y in years)]
    lines += [time_text(rng, Fraction(d, 60)) + "," + ",".join(decimal(v) for v in row)
              for d, row in zip(durations, values)]
    return {"text": "\n".join(lines) + "\n", "duration_h": [Fraction(d, 60) for d in durations],
            "years": years, "depth_mm": [[real(v * MM[unit]) for v in row] for row in values]}


def draw_years(rng, years):
    if len(years) < 2 or rng.random() < 0.4:
        return Fraction(rng.choice(years))
    i = rng.randrange(1 if years[0] == 1 and len(years) > 2 else 0, len(years) - 1)
    if years[i] == 1:
        return Fraction(1)
    share = rng.choice((Fraction(1, 1000), Fraction(rng.randint(1, 99), 100), Fraction(999, 1000)))
    return years[i] + (years[i + 1] - years[i]) * share


def formula(rng):
    """Whose depth rises with duration: m n <= 1 and b >= 0; b > 0 where it is steep."""
    form = rng.choice(("m", "n", "both"))
    m = Fraction(rng.randint(30, 100), 100) if form != "n" else Fraction(1)
    n = Fraction(rng.randint(30, 100), 100) if form != "m" else Fraction(1)
    b = Fraction(rng.randint(1, 200), 10)
    if m * n < Fraction(8, 10) and rng.random() < 0.2:
        b = Fraction(0)
    a, unit, time = Fraction(rng.randint(100, 20_000), 10), rng.choice(("mm", "in")), "min"
    if unit == "in":
        a /= 25
    text = (f"{{a: {decimal(a)} {unit}/h, b: {decimal(b)}, m: {decimal(m)}, n: {decimal(n)}, "
            f"time: {time}}}")
    return text, ("formula", *(real(x) for x in (a * MM[unit], b, m, n)), HOURS[time])


def draw_times(rng, shortest, longest):
    """(duration, step) in h between two durations, mostly with a step that divides it."""
    duration = min(longest, max(shortest, Fraction(rng.randint(1, 3000), 60)))
    if rng.random() < 0.3:
        duration = rng.choice((shortest, longest))
    if rng.random() < 0.7:
        every = duration / rng.choice((1, 2, 3, 4, 6, 8, 12, 24, 60))
    else:
        every = duration * Fraction(rng.randint(20, 990), 1000)
    every = Fraction(max(1, round(every * 60_000)), 60_000)
    return duration, min(duration, max(every, shortest))


def points(rng):
    inner = rng.randint(0, 6)
    times = [0] + sorted(rng.sample(range(1, 100), inner)) + [100]
    shares = [0] + sorted(rng.randint(0, 100) for _ in range(inner)) + [100]
    return [(Fraction(t, 100), Fraction(s, 100)) for t, s in zip(times, shares)]


def draw_source(rng, pattern, files):
    """(keys of the scenario, source, shortest and longest duration in h)."""
    kinds = {"keifer_chu": ("formula",), "alternating_blocks": ("statistics", "depths", "formula")}
    kind = rng.choice(kinds.get(pattern, ("statistics", "depths", "formula", "depth")))
    if kind == "depth":
        depth, unit = Fraction(rng.randint(1, 3000), 10), rng.choice(list(MM))
        return (f"depth: {decimal(depth)} {unit}", ("depth", real(depth * MM[unit])),
                Fraction(1, 60), Fraction(720))
    if kind == "formula":
        text, source = formula(rng)
        return f"formula: {text}", source, Fraction(1, 60), Fraction(720)
    given = table(rng)
    if kind == "statistics":
        files["county.csv"] = given["text"]
        years = draw_years(rng, given["years"])
        rows = depths_of(given, years)
        text = f"statistics: county.csv, return_period: {decimal(years)} yr"
    else:
        rows = [(h, row[0]) for h, row in zip(given["duration_h"], given["depth_mm"])]
        tenths = [(h, round(d * 10)) for h, d in rows]
        rows = [(h, mpf(n) / 10) for h, n in tenths]
        text = "depths: {" + ", ".join(f"{time_text(rng, h)}: {decimal(Fraction(n, 10))} mm"
                                       for h, n in tenths) + "}"
    return text, ("list", rows), given["duration_h"][0], given["duration_h"][-1]


def design_case(rng):
    pattern = rng.choice(("uniform", "triangular", "alternating_blocks", "alternating_blocks",
                          "keifer_chu", "mass_curve"))
    files = {}
    text, source, shortest, longest = draw_source(rng, pattern, files)
    duration, every = draw_times(rng, shortest, longest)
    peak_at = Fraction(rng.choice((0, 1000, 500, 375, rng.randint(0, 1000))), 1000)
    request = {"pattern": pattern, "source": source, "duration_h": duration, "every_h": every,
               "peak_at": peak_at, "points": points(rng)}
    keys = [f"pattern: {pattern}", f"duration: {time_text(rng, duration)}",
            f"every: {time_text(rng, every)}", text]
    if pattern == "mass_curve":
        keys.append("curve: [" + ", ".join(f"[{decimal(t)}, {decimal(s)}]"
                                           for t, s in request["points"]) + "]")
    elif pattern != "uniform":
        keys.append(f"peak_at: {decimal(peak_at)}")
    yaml = "storm:\n  design: {" + ", ".join(keys) + "}\n"
    resampled = None
    if rng.random() < 0.3:
        resampled = min(duration, Fraction(max(1, round(every * rng.randint(20, 400) * 600)),
                                           60_000))
        yaml += f"  resample: {time_text(rng, resampled)}\n"
    files["case.yaml"] = yaml
    return {"files": files, "request": request, "resample_h": resampled}


def stamp(at_ms, offset_minutes, with_zone):
    at = EPOCH + timedelta(milliseconds=at_ms, minutes=offset_minutes)
    sign, minutes = "-" if offset_minutes < 0 else "+", abs(offset_minutes)
    return at.isoformat() + (f"{sign}{minutes // 60:02}:{minutes % 60:02}" if with_zone else "")


def start_ms(rng):
    """A midnight of UTC or any second."""
    day = rng.randint(18_000, 30_000) * 86_400_000
    return day + rng.choice((0, rng.randint(0, 86_399) * 1000))


def tip_case(rng):
    """A tip log: bursts and dry times, equal instants, instants on edges, dry times just as long
    as what parts events; the offset of the gauge's clock or none."""
    every_min = rng.choice((1, 2, 5, 7, 10, 15, 45, 60, 420, 1440))
    dry_h = rng.choice((1, 3, 6, 12))
    with_zone = rng.random() < 0.5
    offset = rng.choice((0, 60, -300, 345)) if with_zone else 0
    tip = Fraction(rng.choice((1, 2, 5)), 10)
    at, instants = start_ms(rng), []
    for _ in range(rng.randint(1, 80)):
        instants.append(at)
        gap = rng.choice((0, rng.randint(1, 300), rng.randint(1, 300), rng.randint(1, 4000),
                          every_min * 60, rng.choice((0, 0, dry_h * 3600, dry_h * 3600 - 1,
                                                      rng.randint(1, 200_000)))))
        at += gap * 1000
        if rng.random() < 0.1:  # on to the next edge
            at += -at % (every_min * 60_000)
    counts = [rng.randint(1, 4) for _ in instants] if rng.random() < 0.3 else None
    rows = ["time,tips"] if counts else ["time"]
    for i, instant in enumerate(instants):
        rows.append(stamp(instant, offset, with_zone) + (f",{counts[i]}" if counts else ""))
    tips = [(t, real(tip * (counts[i] if counts else 1))) for i, t in enumerate(instants)]
    spreading = rng.random() < 0.4
    given = table(rng, Fraction(1, 50))
    arguments = ["--tip", f"{decimal(tip)} mm", "--every", f"{every_min} min",
                 "--dry-spell", f"{dry_h} h", "--statistics", "county.csv"]
    return {"files": {"record.csv": "\n".join(rows) + "\n", "county.csv": given["text"]},
            "arguments": arguments + (["--spread-tips"] if spreading else []), "table": given,
            "tips": tips, "offset_minutes": offset, "with_zone": with_zone,
            "rule": {"dry_spell_ms": dry_h * 3_600_000, "every_ms": every_min * 60_000,
                     "spread": spreading}}


def interval_case(rng):
    """Interval data with wet and dry runs and empty cells, which are holes."""
    every_ms = rng.choice((1, 5, 15, 60)) * 60_000
    dry_h = rng.choice((1, 3, 6))
    at, steps = start_ms(rng), []
    while len(steps) < 2 or len(steps) < 60 and rng.random() < 0.97:
        kind = rng.choice(("wet", "wet", "dry", "hole"))
        run = rng.randint(1, 8) if kind == "wet" else rng.choice(
            (rng.randint(1, 5), dry_h * 3_600_000 // every_ms, rng.randint(1, 400)))
        for _ in range(run):
            depth = {"wet": Fraction(rng.randint(1, 60), 10), "dry": Fraction(0)}.get(kind)
            steps.append((at, at + every_ms, depth))
            at += every_ms
    if not any(depth for _, _, depth in steps):
        steps.append((at, at + every_ms, Fraction(1)))
    rows = ["start,depth [mm]"] + [stamp(a, 0, True) + "," + ("" if d is None else decimal(d))
                                  for a, _, d in steps]
    given = table(rng, Fraction(1, 20))
    return {"files": {"record.csv": "\n".join(rows) + "\n", "county.csv": given["text"]},
            "arguments": ["--dry-spell", f"{dry_h} h", "--statistics", "county.csv"],
            "table": given, "with_zone": True, "offset_minutes": 0,
            "steps": [(a, b, None if d is None else real(d)) for a, b, d in steps],
            "rule": {"dry_spell_ms": dry_h * 3_600_000}}
