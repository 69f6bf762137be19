#!/usr/bin/env python3
"""Writes the demo logger record, or compares it: make_logger_demo.py FILE [--check].

A month of an invented tipping-bucket log at Tannery Lane. The storm of 14 June follows the
five-minute depths of the gauge on the roof; the others are shapes with their own depth and length.
"""

import random
import sys
from datetime import datetime, timedelta, timezone

TIP_MM = 0.2
SEED = 20310614

# Start, minutes, depth in mm, and where in its length a spell of rain is heaviest.
SPELLS = [
    ("2031-05-19 03:10", 410, 11.4, 0.55),
    ("2031-05-21 17:35", 55, 2.6, 0.30),
    ("2031-05-26 09:20", 760, 24.6, 0.40),
    ("2031-05-26 23:30", 150, 3.4, 0.50),
    ("2031-06-02 20:05", 70, 16.8, 0.25),
    ("2031-06-12 05:40", 240, 4.2, 0.60),
    ("2031-06-16 10:15", 320, 7.8, 0.50),
]
# Tenths of a mm in five minutes from 13:50 on 14 June, as the gauge on the roof read them.
STORM_START = "2031-06-14 13:50"
STORM = [2, 2, 4, 4, 10, 16, 32, 52, 74, 68, 54, 44, 32, 22, 18, 12, 10, 6, 4, 0, 8, 2, 2, 2]
# Dew and spray.
LONE = ["2031-05-24 05:12:40", "2031-06-06 04:58:13", "2031-06-09 05:03:51"]


def utc(text):
    form = "%Y-%m-%d %H:%M:%S" if text.count(":") == 2 else "%Y-%m-%d %H:%M"
    return datetime.strptime(text, form).replace(tzinfo=timezone.utc)


def share_fallen(x, peak):
    """Of a spell that swells to its peak and fades, the depth by the share x of its length."""
    return x * x / peak if x <= peak else 1.0 - (1.0 - x) ** 2 / (1.0 - peak)


def spell(rng, start, minutes, depth_mm, peak):
    count = round(depth_mm / TIP_MM)
    tips = []
    for k in range(count):
        share = (k + 0.5 + rng.uniform(-0.35, 0.35)) / count
        low, high = 0.0, 1.0
        for _ in range(40):
            middle = (low + high) / 2.0
            low, high = (middle, high) if share_fallen(middle, peak) < share else (low, middle)
        tips.append(utc(start) + timedelta(seconds=round(60 * minutes * low)))
    return tips


def storm(rng):
    tips = []
    for step, tenths in enumerate(STORM):
        count = tenths // 2
        for k in range(count):
            second = 300.0 * (step + (k + 0.5 + rng.uniform(-0.3, 0.3)) / count)
            tips.append(utc(STORM_START) + timedelta(seconds=round(second)))
    return tips


def log_text():
    rng = random.Random(SEED)
    tips = [utc(text) for text in LONE] + storm(rng)
    for start, minutes, depth_mm, peak in SPELLS:
        tips += spell(rng, start, minutes, depth_mm, peak)
    rows = [tip.strftime("%Y-%m-%dT%H:%M:%SZ") for tip in sorted(tips)]
    return (
        "# Tipping bucket on the roof at Tannery Lane, an invented record: a row per tip of 0.2 mm.\n"
        "time\n" + "\n".join(rows) + "\n"
    )


def main():
    path = sys.argv[1]
    if "--check" not in sys.argv[2:]:
        with open(path, "w", encoding="utf-8", newline="") as file:
            file.write(log_text())
        return 0
    with open(path, encoding="utf-8", newline="") as file:
        if file.read() == log_text():
            return 0
    print(f"{path} is not what {sys.argv[0]} writes", file=sys.stderr)
    return 1


if __name__ == "__main__":
    sys.exit(main())
