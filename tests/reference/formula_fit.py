"""Intensity formulas fitted by scipy.optimize.least_squares, for tests/rain/formula_fit_test.cpp.

The same least squares on log intensity as include/rainledger/rain/formula_fit.hpp states, with all
three constants free in the search and nothing shared with the program: i = a / (t^m + b)^n, t in
minutes, i in mm/h, m or n free and the other 1.

    formula_fit.py                 prints the numbers that the test pins
    formula_fit.py --check FILE    finds them in the test again; exit status 1 if one is not there
"""
import re
import sys

import numpy as np
from scipy.optimize import least_squares

MINUTES = [5, 10, 15, 30, 60, 120, 180, 360, 720, 1440]

# Invented tables: the county's 10-year depths (mm), and two with scatter about a smooth curve.
TABLES = {
    "county, 10 years": (MINUTES, [12.5, 19, 23.5, 32.5, 41, 48, 52, 62, 74, 88]),
    "scattered, short": ([5, 10, 15, 20, 30, 45, 60, 90, 120],
                         [10.9, 16.2, 21.1, 23.4, 29.3, 33.1, 37.9, 41.0, 44.8]),
    "negative b": ([10, 15, 20, 30, 60, 120, 240, 1440],
                   [21.0, 22.8, 24.9, 27.9, 34.5, 43.1, 54.0, 98.0]),
}


def fit(minutes, depths, free):
    """The constants (a, b, m, n) and the root mean square of the log residuals."""
    t = np.array(minutes, float)
    log_i = np.log(np.array(depths) / (t / 60.0))

    def constants(x):
        power = np.exp(x[2])
        m, n = (power, 1.0) if free == "m" else (1.0, power)
        return x[0], np.exp(x[1]) - t[0] ** m, m, n

    def residuals(x):
        log_a, b, m, n = constants(x)
        return log_i - log_a + n * np.log(t**m + b)

    best = None
    for start_b in (0.5, 2.0, 10.0, 40.0):
        for start_power in (0.6, 0.8, 1.0):
            start = [np.log(1000.0), np.log(start_b * t[0] ** 0.8), np.log(start_power)]
            with np.errstate(all="ignore"):  # steps far out, which the search takes back
                found = least_squares(residuals, start, x_scale="jac", ftol=1e-15, xtol=1e-15,
                                      gtol=1e-15, max_nfev=20000)
            if best is None or found.cost < best.cost:
                best = found
    log_a, b, m, n = constants(best.x)
    return np.exp(log_a), b, m, n, np.sqrt(np.mean(residuals(best.x) ** 2))


def fits():
    for name, (minutes, depths) in TABLES.items():
        for free in "mn":
            a, b, m, n, rms = fit(minutes, depths, free)
            yield f"{name}, {free} free", (a, b, m if free == "m" else n, rms)


def pinned(path):
    """Every four numbers that close a braced list of the test."""
    with open(path, encoding="utf-8") as file:
        text = re.sub(r"\s", "", file.read())
    number = r"(-?[0-9.]+)"
    return [tuple(map(float, found)) for found in re.findall(",".join([number] * 4) + "}", text)]


def check(path):
    known = pinned(path)
    missing = [name for name, values in fits()
               if not any(np.allclose(values, row, rtol=1e-6, atol=0.0) for row in known)]
    for name in missing:
        print(f"{name}: not among the numbers of {path}")
    print(f"{2 * len(TABLES) - len(missing)} passed, {len(missing)} failed")
    return 1 if missing else 0


if __name__ == "__main__":
    if sys.argv[1:2] == ["--check"]:
        sys.exit(check(sys.argv[2]))
    for name, (a, b, exponent, rms) in fits():
        print(f"{name}: a {a:.8g} mm/h, b {b:.8g}, exponent {exponent:.8g}, rms {rms:.8g}")
