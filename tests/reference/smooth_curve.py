#!/usr/bin/python3
"""The smooth mass curve by SciPy's PchipInterpolator.

Prints tests/rain/smooth_curve_values.hpp; with `--check FILE` compares a file of that kind with
SciPy instead, within 1e-14.
"""

import re
import sys

from scipy.interpolate import PchipInterpolator

CURVES = {
    "kUnevenValues": ("the points of kUneven",
                      [0, 0.05, 0.2, 0.25, 0.45, 0.6, 0.625, 0.9, 1],
                      [0, 0.02, 0.1, 0.4, 0.4, 0.55, 0.8, 0.97, 1]),
    "kThreeValues": ("the points of kThree", [0, 0.3, 1], [0, 0.1, 1]),
    "kFlatEndsValues": ("the points of kFlatEnds", [0, 0.2, 0.5, 0.8, 1], [0, 0, 0.7, 1, 1]),
}
TIMES = [0.01 + 0.02 * i for i in range(50)]


def values_of(times, depths):
    return [float(value) for value in PchipInterpolator(times, depths)(TIMES)]


def header():
    lines = ["#pragma once", "", "#include <array>", "",
             "// Written by tests/reference/smooth_curve.py: SciPy's monotone cubic at 0.01, 0.03, ..., 0.99.",
             "namespace rainledger {"]
    for name, (what, times, depths) in CURVES.items():
        lines += ["", f"/// Through {what}.",
                  f"inline constexpr std::array<double, {len(TIMES)}> {name}{{"]
        lines += [f"    {value!r}," for value in values_of(times, depths)]
        lines.append("};")
    return "\n".join(lines + ["", "}  // namespace rainledger", ""])


def check(path):
    with open(path, encoding="utf-8") as file:
        text = file.read()
    worst = 0.0
    for name, (_, times, depths) in CURVES.items():
        found = re.search(name + r"\{(.*?)\}", text, re.DOTALL)
        if not found:
            sys.exit(f"{path} has no {name}")
        pinned = [float(number) for number in found.group(1).split(",") if number.strip()]
        expected = values_of(times, depths)
        if len(pinned) != len(expected):
            sys.exit(f"{path}: {name} holds {len(pinned)} values, not {len(expected)}")
        worst = max([worst] + [abs(a - b) for a, b in zip(pinned, expected)])
    if not worst <= 1e-14:
        sys.exit(f"{path} differs from SciPy by {worst}")
    print(f"{len(CURVES)} curves at {len(TIMES)} times, largest difference {worst:g}")


if __name__ == "__main__":
    if len(sys.argv) == 3 and sys.argv[1] == "--check":
        check(sys.argv[2])
    else:
        sys.stdout.write(header())
