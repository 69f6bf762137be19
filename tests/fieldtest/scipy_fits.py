"""Fits invented infiltration tests with SciPy, in formulas written anew, for law_fits_test.cpp.

Without an argument: checks that scipy_fits.hpp holds what SciPy gives here. With --write: prints
that file, to be laid out by clang-format.
"""
import pathlib
import sys

import numpy as np
from scipy.optimize import least_squares
from scipy.special import lambertw

HEADER = pathlib.Path(__file__).with_name("scipy_fits.hpp")


def horton(p, t):
    f0, fc, k = p
    return fc * t + (f0 - fc) / k * (1.0 - np.exp(-k * t))


def green_ampt(p, t):
    K, S = p
    return S * (-1.0 - lambertw(-np.exp(-1.0 - K * t / S), -1).real)


def philip(p, t):
    return p[0] * np.sqrt(t) + p[1] * t


def kostiakov(p, t):
    return p[0] * t ** p[1]


def modified_kostiakov(p, t):
    return p[0] * t ** p[1] + p[2] * t


LAWS = {
    "horton": (horton, [120.0, 25.0, 3.0], 3),
    "green_ampt": (green_ampt, [12.0, 60.0], 2),
    "philip": (philip, [30.0, 10.0], 2),
    "kostiakov": (kostiakov, [40.0, 0.6], 2),
    "modified_kostiakov": (modified_kostiakov, [25.0, 0.5, 12.0], 3),
}
MINUTES = np.array([2.0, 5, 10, 15, 20, 30, 45, 60, 80, 100, 120, 150])
SEEDS = [3, 8, 21]
ERROR_MM = 0.4


def observed(law, seed, intervals):
    """Depths read to 0.1 mm: cumulative ones with errors of their own, or those of intervals."""
    model, truth, _ = LAWS[law]
    depths = model(truth, MINUTES / 60.0)
    if intervals:
        depths = np.diff(np.concatenate([[0.0], depths]))
    errors = np.random.default_rng(seed).normal(0.0, ERROR_MM, depths.size)
    return np.round(depths + errors, 1)


def fit(law, depths, intervals):
    model, truth, _ = LAWS[law]
    hours = MINUTES / 60.0

    def residuals(p):
        values = model(p, hours)
        if intervals:
            values = np.diff(np.concatenate([[0.0], values]))
        return values - depths

    found = None
    for factor in (1.0, 0.5, 2.0):
        answer = least_squares(residuals, np.array(truth) * factor, jac="3-point",
                               bounds=(0.0, np.inf), x_scale=np.array(truth), xtol=1e-15,
                               ftol=1e-15, gtol=1e-15)
        if found is None or answer.cost < found.cost:
            found = answer
    variance = 2.0 * found.cost / (depths.size - len(truth))
    covariance = variance * np.linalg.inv(found.jac.T @ found.jac)
    return found.x, np.sqrt(np.diag(covariance)), 2.0 * found.cost


def cases():
    for law in LAWS:
        for seed in SEEDS:
            for intervals in (False, True):
                depths = observed(law, seed, intervals)
                yield law, intervals, depths, *fit(law, depths, intervals)


def numbers(values):
    return "{" + ", ".join(repr(float(v)) for v in values) + "}"


def header():
    lines = [
        "#pragma once",
        "",
        "#include <array>",
        "#include <vector>",
        "",
        '#include "rainledger/fieldtest/law_fits.hpp"',
        "",
        "// Invented tests and what SciPy's least squares makes of them. Written by scipy_fits.py.",
        "namespace rainledger {",
        "",
        "struct SciPyFit {",
        "    FieldLaw law;",
        "    bool intervals;  ///< `depths_mm` are of the intervals, not cumulative",
        "    std::vector<double> depths_mm;",
        "    std::vector<double> parameters;  ///< as LawFit reports them",
        "    std::vector<double> errors;",
        "    double residual_sum;",
        "};",
        "",
        f"inline constexpr std::array kSciPyMinutes{numbers(MINUTES)};",
        "",
        "inline std::vector<SciPyFit> scipy_fits() {",
        "    return {",
    ]
    for law, intervals, depths, parameters, errors, total in cases():
        lines += [
            f"        {{FieldLaw::{law},",
            f"         {'true' if intervals else 'false'},",
            f"         {numbers(depths)},",
            f"         {numbers(parameters)},",
            f"         {numbers(errors)},",
            f"         {float(total)!r}}},",
        ]
    lines += ["    };", "}", "", "}  // namespace rainledger", ""]
    return "\n".join(lines)


def numbers_in(text):
    """Every number of the header's table, in order."""
    table = text[text.index("scipy_fits()"):]
    for mark in "{},;()":
        table = table.replace(mark, " ")
    found = []
    for word in table.split():
        try:
            found.append(float(word))
        except ValueError:
            continue
    return np.array(found)


if __name__ == "__main__":
    if sys.argv[1:] == ["--write"]:
        print(header(), end="")
        sys.exit(0)
    held = numbers_in(HEADER.read_text())
    ours = numbers_in(header())
    if held.size != ours.size or held.size == 0:
        print(f"{HEADER.name} holds {held.size} numbers, SciPy gives {ours.size}")
        sys.exit(1)
    worst = np.max(np.abs(held - ours) / np.maximum(np.abs(ours), 1e-9))
    print(f"{held.size} numbers, the worst differs by {worst:.1e} of itself")
    sys.exit(1 if worst > 1e-6 else 0)
