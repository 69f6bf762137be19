"""Checks the program against a general-purpose integration of the differential equations.

    ode_check.py PROGRAM [--cases N] [--seed S]

SciPy's DOP853 (Hairer, Norsett and Wanner, Solving Ordinary Differential Equations I, 1993; from
memory) integrates the infiltration and the ponded depth under random storms, event by event. No
curve is integrated or inverted by hand:

  Horton       dF/dt = f, and along the curve df/dF = -k (f - fc)/f, ponded or not
  Green-Ampt   dF/dt = K (1 + S/F) while ponded; F starts with the rain, so F = 0 is never ponded

The infiltrated depth of the whole storm has to agree to 1e-9 mm and the instants to 1e-7 h; the
last line is "N passed, N failed". Exit status 1 when anything failed.
"""

import argparse
import json
import random
import subprocess
import sys
import tempfile
from pathlib import Path

import numpy as np
from scipy.integrate import solve_ivp

DEPTH_MM = 1e-9
INSTANT_H = 1e-7
RTOL, ATOL = 1e-13, 1e-14


class Horton:
    def __init__(self, f0, fc, k):
        self.f0, self.fc, self.k = f0, fc, k
        self.start = [0.0, f0]

    def text(self):
        return (f"{{horton: {{initial_capacity: {self.f0} mm/h, final_capacity: {self.fc} mm/h, "
                f"decay: {self.k} 1/h}}}}")

    def capacity(self, y):
        return y[1]

    def rates(self, y, taken):
        return [taken, -self.k * (y[1] - self.fc) * taken / y[1]]

    def surplus(self, y, w):
        """Positive where the supply w exceeds capacity."""
        return w - y[1]


class GreenAmpt:
    def __init__(self, K, S):
        self.K, self.S = K, S
        self.start = [0.0]

    def text(self):
        return (f"{{green_ampt: {{effective_conductivity: {self.K} mm/h, "
                f"suction_deficit: {self.S} mm}}}}")

    def capacity(self, y):
        return self.K * (1 + self.S / y[0])

    def rates(self, y, taken):
        return [taken]

    def surplus(self, y, w):
        return y[0] * (w - self.K) - self.K * self.S


def integrate(rates, y, dt, events=None):
    return solve_ivp(lambda _, state: rates(state), (0, dt), y, method="DOP853", rtol=RTOL,
                     atol=ATOL, events=events)


def until(rates, y, dt, tests):
    """(time, state, which test) of the first root of the tests [(function, direction)].

    Dense output locates a root to fewer digits than the steps carry, so each root is polished by
    secant steps that integrate anew from the start.
    """
    events = []
    for function, direction in tests:
        def event(_, state, function=function):
            return function(state)
        event.terminal, event.direction = True, direction
        events.append(event)
    done = integrate(rates, y, dt, events)
    hits = [(t[0], i) for i, t in enumerate(done.t_events) if len(t)] if events else []
    if not hits:
        return dt, done.y[:, -1], None
    t, which = min(hits)
    return *polish(rates, y, t, tests[which][0]), which


def polish(rates, y, t, function):
    end = integrate(rates, y, t).y[:, -1]
    for _ in range(4):
        h = 1e-5
        slope = (function(end + h * np.array(rates(end))) - function(end)) / h
        t -= function(end) / slope
        end = integrate(rates, y, t).y[:, -1]
    return t, end


class Soil:
    """A soil with depression storage; the state is the law's own, then the ponded depth."""

    def __init__(self, law, store):
        self.law, self.store = law, store
        self.y = np.array(law.start + [0.0])
        self.ponding, self.open = [], None

    def mark(self, t, ponded):
        if ponded and self.open is None:
            self.open = t
        if not ponded and self.open is not None:
            self.ponding.append((self.open, t))
            self.open = None

    def step(self, start, end, w):
        t, ponded = start, self.y[-1] > 0 or self.law.surplus(self.y, w) > 0
        while end - t > 1e-14:
            self.mark(t, ponded)
            dt, ponded = self.move_ponded(w, end - t) if ponded else self.move_free(w, end - t)
            t += dt

    def move_free(self, w, span):
        def rates(y):
            return self.law.rates(y, w) + [0.0]
        dt, self.y, hit = until(rates, self.y, span, [(lambda y: self.law.surplus(y, w), 1)])
        return dt, hit is not None

    def move_ponded(self, w, span):
        """(time, whether still ponded)."""
        full = self.y[-1] >= self.store and self.law.surplus(self.y, w) >= -1e-9

        def rates(y):
            f = self.law.capacity(y)
            return self.law.rates(y, f) + [0.0 if full else w - f]

        tests = [] if full else [(lambda y: y[-1], -1), (lambda y: y[-1] - self.store, 1)]
        dt, self.y, hit = until(rates, self.y, span, tests)
        if hit is not None:
            self.y[-1] = (0.0, self.store)[hit]
        return dt, hit != 0 and (self.y[-1] > 0 or full)


def random_case(seed, index):
    """(law, store in mm, edges in minutes, depths in mm) as the decimals that the text carries."""
    rng = random.Random(f"{seed}/{index}")
    if index % 2:
        fc = round(rng.uniform(0.5, 15), 2)
        law = Horton(round(fc + rng.uniform(20, 150), 2), fc, round(rng.uniform(0.5, 12), 2))
    else:
        law = GreenAmpt(round(rng.uniform(0.5, 15), 2), round(rng.uniform(5, 120), 2))
    store = rng.choice([0, 0, 2.5, 5])
    edges, depths = [0], []
    for _ in range(rng.randint(6, 16)):
        minutes = rng.choice([5, 10, 15, 30])
        edges.append(edges[-1] + minutes)
        depths.append(rng.choice([0, round(rng.expovariate(1.5) * minutes * 0.7, 2)]))
    return law, store, edges, depths


def integrate_case(law, store, edges, depths):
    soil = Soil(law, store)
    for start, end, depth in zip(edges, edges[1:], depths):
        soil.step(start / 60, end / 60, depth / ((end - start) / 60))
    if soil.open is not None:
        soil.ponding.append((soil.open, None))
    return soil


def run_program(program, law, store, edges, depths):
    ends = ", ".join(f"{e} min" for e in edges[1:])
    text = (f"storm:\n  steps: {{ends: [{ends}], depths: {depths}, unit: mm}}\nsurfaces:\n"
            f"  lawn:\n    area: 1 ha\n    depression_storage: {store} mm\n"
            f"    losses: {law.text()}\n")
    with tempfile.TemporaryDirectory() as folder:
        scenario = Path(folder) / "case.yaml"
        scenario.write_text(text, encoding="utf-8")
        done = subprocess.run([program, "losses", scenario, "--json", "-", "--quiet"],
                              capture_output=True, text=True, timeout=60)
    if done.returncode != 0:
        raise RuntimeError(done.stderr.strip())
    surface = json.loads(done.stdout)["storms"]["storm"]["surfaces"]["lawn"]
    return surface["infiltrated_mm"], [(p["start_h"], p["end_h"]) for p in surface["ponding"]]


def instants_agree(found, wanted):
    if len(found) != len(wanted):
        return False
    pairs = [pair for f, w in zip(found, wanted) for pair in zip(f, w)]
    return all((a is None) == (b is None) and (a is None or abs(a - b) <= INSTANT_H)
               for a, b in pairs)


def main():
    parser = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    parser.add_argument("program")
    parser.add_argument("--cases", type=int, default=20)
    parser.add_argument("--seed", type=int, default=1)
    arguments = parser.parse_args()
    program = str(Path(arguments.program).resolve())
    print(f"seed {arguments.seed}, {arguments.cases} cases")
    passed, worst = 0, 0.0
    for index in range(arguments.cases):
        case = random_case(arguments.seed, index)
        soil = integrate_case(*case)
        depth, ponding = run_program(program, *case)
        difference = abs(depth - soil.y[0])
        worst = max(worst, difference)
        if difference <= DEPTH_MM and instants_agree(ponding, soil.ponding):
            passed += 1
        else:
            print(f"failed: case {index}: infiltrated {depth} but {soil.y[0]} (off by "
                  f"{difference:.2g} mm); ponding {ponding} but {soil.ponding}")
    print(f"largest difference {worst:.2g} mm")
    print(f"{passed} passed, {arguments.cases - passed} failed")
    return 0 if passed == arguments.cases else 1


if __name__ == "__main__":
    sys.exit(main())
