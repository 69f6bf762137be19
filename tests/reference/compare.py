"""Compares the program with the reference model on seeded random scenarios.

    compare.py PROGRAM [--cases N] [--seed S] [--first I] [--keep DIR]

Every account of every step (surfaces, places, site) to 1e-9 mm, capacities to 1e-9 relative,
every instant to 1e-8 h and its presence exactly, totals, figures and closure; wider limits hold in
the cases with run-on from a surface that infiltrates. A third of the other cases are reported with
--every as well. One line per
failing case with where, how much and the arguments that reproduce it; then the largest
differences seen per law and account; the last line is "N passed, N failed". Exit status 1 when
anything failed.
"""

import csv
import json
import subprocess
import sys

from mpmath import inf, mpf, nstr

from case_runner import run_cases
from cases import LEAST_MARGIN, draw
from march import ACCOUNTS
from reading import read_scenario, time_h
from reference import keep_ledger
from reporting import keep_ledger_every

EXACT = {"depth_mm": mpf("1e-9"), "capacity": mpf("1e-9"), "instant_h": mpf("1e-8"),
         "figure": mpf("1e-9")}
# Run-on from a giver that infiltrates is a row of mean rates: 2e-6 mm and 1 s by definition.
CUT = {"depth_mm": mpf("2e-6"), "capacity": mpf("1e-5"), "instant_h": mpf(1) / 3600,
       "figure": mpf("2e-5")}
CLOSURE_MM = 1e-9  # times the total rain where that is above 1 mm
MOST_DRAWS = 60
EVERY = ("7 min", "30 min", "2.5 min", "1 h")


class Findings:
    """What differed in one case, and the largest differences of all cases by (law, account)."""

    def __init__(self):
        self.largest = {}
        self.start_case(EXACT)

    def start_case(self, limits):
        self.limits, self.failures, self.where = limits, [], ""

    def check(self, law, account, where, found, wanted, limit):
        difference = abs(mpf(found) - wanted)
        key = (law if self.limits is EXACT else law + " (cut run-on)", account)
        self.largest[key] = max(self.largest.get(key, mpf(0)), difference)
        if not difference <= limit:
            self.failures.append(f"{self.where}{where} {account}: {found} but {nstr(wanted, 17)} "
                                 f"(off by {nstr(difference, 3)})")

    def require(self, holds, message):
        if not holds:
            self.failures.append(message)


def prepare(case, folder):
    """Writes the scenario and keeps its reference ledger; None where it must be drawn again."""
    (folder / "case.yaml").write_text(case["yaml"], encoding="utf-8")
    for name, text in case["files"].items():
        (folder / name).write_text(text, encoding="utf-8")
    scenario = read_scenario(folder / "case.yaml")
    try:
        ledger = keep_ledger(scenario)
    except ValueError:  # a phi index that no rate can match, or run-on too slow to settle
        return None
    return ledger if ledger["margin"] >= LEAST_MARGIN else None


def draw_case(seed, index, folder):
    for attempt in range(MOST_DRAWS):
        case = draw(seed, index, attempt)
        ledger = prepare(case, folder)
        if ledger is not None:
            return case, ledger
    raise RuntimeError(f"case {index} of seed {seed} stays ill-conditioned")


def run_program(program, folder, *options):
    """(rows of the ledger, JSON) or a message."""
    command = [program, "losses", "case.yaml", "--ledger", "l.csv", "--json", "r.json", "--quiet",
               *options]
    done = subprocess.run(command, cwd=folder, capture_output=True, text=True, timeout=60)
    if done.returncode != 0:
        return None, f"exit status {done.returncode}: {done.stderr.strip()[:400]}"
    with open(folder / "l.csv", encoding="utf-8", newline="") as file:
        rows = list(csv.DictReader(file))
    return (rows, json.loads((folder / "r.json").read_text(encoding="utf-8"))), None


def expected_row_keys(ledger):
    """(drains_to, surface, step) of every row, in the order of the file."""
    steps = range(1, len(ledger["edges_h"]))
    keys = [(None, name, step) for name in ledger["surfaces"] for step in steps]
    keys += [(place, "", step) for place in ledger["places"] for step in steps]
    return keys + [("", "", step) for step in steps]


def compare_capacity(findings, law, where, text, wanted):
    if wanted is None or wanted == inf:
        findings.require(text == "", f"{where} capacity: {text!r} but none")
    elif text == "":
        findings.failures.append(f"{where} capacity: none but {nstr(wanted, 17)}")
    else:
        findings.check(law, "capacity", where, text, wanted,
                       findings.limits["capacity"] * max(wanted, mpf("1e-6")))


def part_of(ledger, place, name):
    """(label, law, rows, capacities) that a row of the file belongs to."""
    if name:
        surface = ledger["surfaces"][name]
        return name, surface["law"], surface["rows"], surface["capacities"]
    part = ledger["places"][place] if place else ledger["site"]
    return place or "site", "place" if place else "site", part["rows"], None


def compare_rows(findings, ledger, rows):
    keys = expected_row_keys(ledger)
    found = [(None if r["surface"] else r["drains_to"], r["surface"], int(r["step"])) for r in rows]
    findings.require(found == keys, "the rows of the ledger are not those expected")
    if found != keys:
        return
    for row, (place, name, step) in zip(rows, keys):
        label, law, accounts, capacities = part_of(ledger, place, name)
        where = f"{label} step {step}"
        for account in ACCOUNTS:
            findings.check(law, account, where, row[account + "_mm"], accounts[account][step - 1],
                           findings.limits["depth_mm"])
        for edge, i in (("start_h", step - 1), ("end_h", step)):
            findings.check(law, edge, where, row[edge], ledger["edges_h"][i],
                           findings.limits["instant_h"])
        wanted = capacities[step - 1] if capacities else None
        compare_capacity(findings, law, where, row["capacity_mm_per_h"], wanted)


def compare_books(findings, ledger, rows):
    """The identity of the ledger on every row as written."""
    rain_mm = float(max(part["total"]["rain"] for part in ledger["surfaces"].values()))
    ponded_before = {}
    for row in rows:
        rain, run_on, loss, infiltrated, ponded, excess = (float(row[a + "_mm"]) for a in ACCOUNTS)
        owner = (row["drains_to"], row["surface"])
        change = ponded - ponded_before.get(owner, 0.0)
        ponded_before[owner] = ponded
        open_mm = abs(rain + run_on - loss - infiltrated - change - excess)
        findings.require(open_mm <= CLOSURE_MM * max(1.0, rain_mm),
                         f"{owner} step {row['step']} does not close: {open_mm} mm")


def compare_instant(findings, law, where, found, wanted):
    if (found is None) != (wanted is None):
        shown = "none" if wanted is None else nstr(wanted, 17)
        findings.failures.append(f"{where}: {found} but {shown}")
    elif found is not None:
        findings.check(law, "instant", where, found, wanted, findings.limits["instant_h"])


def compare_surface(findings, name, found, wanted):
    law = wanted["law"]
    for account in ACCOUNTS:
        findings.check(law, "total " + account, name, found[account + "_mm"],
                       wanted["total"][account], findings.limits["depth_mm"])
    ponding = found["ponding"]
    findings.require(len(ponding) == len(wanted["ponding"]),
                     f"{name} ponding: {ponding} but {len(wanted['ponding'])} intervals")
    for got, (start, end) in zip(ponding, wanted["ponding"]):
        compare_instant(findings, law, f"{name} ponding start", got["start_h"], start)
        compare_instant(findings, law, f"{name} ponding end", got["end_h"], end)
    compare_instant(findings, law, f"{name} runoff start", found["runoff_start_h"],
                    wanted["runoff_start"])
    compare_closure(findings, name, found, wanted)


def compare_closure(findings, name, found, wanted):
    limit = CLOSURE_MM * max(1.0, float(wanted["total"]["rain"]))
    findings.require(found["closure_mm"] <= limit, f"{name} closure: {found['closure_mm']} mm")


def compare_figure(findings, kind, where, found, wanted):
    if (found is None) != (wanted is None):
        findings.failures.append(f"{where}: {found} but {wanted}")
    elif found is not None:
        findings.check(kind, "figures", where, found, wanted,
                       findings.limits["figure"] * max(1, abs(wanted)))


def compare_area(findings, kind, name, found, wanted):
    total = wanted["total"]
    loss = total["rain"] + total["run_on"] - total["excess"]
    for key, value in (("rain_mm", total["rain"]), ("run_on_mm", total["run_on"]),
                       ("loss_mm", loss), ("excess_mm", total["excess"])):
        findings.check(kind, key, name, found[key], value, findings.limits["depth_mm"])
    for key, value in wanted["figures"].items():
        if isinstance(value, dict):
            for window, flow in value.items():
                compare_figure(findings, kind, f"{name} {key} {window}", found[key][window], flow)
        else:
            compare_figure(findings, kind, f"{name} {key}", found[key], value)
    compare_closure(findings, name, found, wanted)


def compare_case(program, seed, index, folder, findings):
    """The family of the case; what differs is left in `findings.failures`."""
    case, ledger = draw_case(seed, index, folder)
    findings.start_case(EXACT if ledger["exact"] else CUT)
    output, message = run_program(program, folder)
    if message:
        findings.failures.append(message)
        return case["family"]
    rows, report = output
    try:
        compare_rows(findings, ledger, rows)
        compare_books(findings, ledger, rows)
        compare_report(findings, ledger, report)
        if ledger["exact"] and index % 3 == 0:
            compare_every(program, index, folder, findings, ledger)
    except (KeyError, TypeError, ValueError) as error:
        findings.failures.append(f"the output is not as described: {error!r}")
    return case["family"]


def compare_every(program, index, folder, findings, ledger):
    """The same storm reported at another step: the rows, and nothing else, change."""
    every = EVERY[index // 3 % len(EVERY)]
    output, message = run_program(program, folder, "--every", every)
    if message:
        findings.failures.append(message)
        return
    wanted = keep_ledger_every(read_scenario(folder / "case.yaml"), time_h(every))
    findings.where = f"--every {every}: "
    compare_rows(findings, wanted, output[0])
    compare_report(findings, ledger, output[1])


def compare_report(findings, ledger, report):
    storm = report["storms"]["storm"]
    for name, wanted in ledger["surfaces"].items():
        compare_surface(findings, name, storm["surfaces"][name], wanted)
    for name, wanted in ledger["places"].items():
        compare_area(findings, "place", name, storm["drains_to"][name], wanted)
    compare_area(findings, "site", "site", storm["site"], ledger["site"])


if __name__ == "__main__":
    sys.exit(run_cases(__doc__.splitlines()[0], Findings(), "mm, mm/h, h", compare_case))
