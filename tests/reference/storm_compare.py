"""Compares `rainledger storm` with the reference on seeded random design storms and gauge records.

    storm_compare.py PROGRAM [--cases N] [--seed S] [--first I] [--keep DIR]

Depths of steps, windows, events and statistics to 1e-9 mm (and 1e-12 relative), edges to 1e-9 h or
to the millisecond, return periods to 1e-9 relative. One line per failing case with the arguments
that reproduce it; then the largest differences by family; the last line is "N passed, N failed".
Exit status 1 when anything failed.
"""

from datetime import datetime, timezone
from fractions import Fraction
import json
import subprocess
import sys

from mpmath import mpf, nstr

from case_runner import run_cases
from gauges import HOUR_MS, WINDOWS_MIN, event_rarity, interval_events, tip_events
from laws import real
from storm_cases import draw
from storms import depth_of, design, largest_window, resample

DEPTH_MM, RELATIVE = mpf("1e-9"), mpf("1e-12")
TIME_H = mpf("1e-9")
# A numerical integral of the intensity curve against the program's closed form.
QUADRATURE = mpf("1e-9")
PERIOD = mpf("1e-9")
FORMULA_MARKS_H = [Fraction(minutes, 60)
                   for minutes in (5, 10, 15, 30, 60, 120, 180, 360, 720, 1440)]


class Findings:
    """What differed in one case, and the largest differences of all by (family, figure)."""

    def __init__(self):
        self.largest = {}
        self.start_case("", RELATIVE)

    def start_case(self, family, relative):
        self.family, self.relative, self.failures = family, relative, []

    def check(self, figure, where, found, wanted, limit):
        if found is None:
            self.failures.append(f"{where} {figure}: none but {nstr(wanted, 17)}")
            return
        difference = abs(mpf(found) - wanted)
        key = (self.family, figure)
        self.largest[key] = max(self.largest.get(key, mpf(0)), difference)
        if not difference <= limit:
            self.failures.append(f"{where} {figure}: {found} but {nstr(wanted, 17)} "
                                 f"(off by {nstr(difference, 3)})")

    def depth(self, figure, where, found, wanted, scale=0):
        self.check(figure, where, found, wanted,
                   max(DEPTH_MM, self.relative * max(abs(wanted), scale)))

    def equal(self, what, found, wanted):
        if found != wanted:
            self.failures.append(f"{what}: {found} but {wanted}")


def run_program(program, folder, *arguments):
    command = [program, "storm", *arguments, "--json", "-", "--quiet"]
    done = subprocess.run(command, cwd=folder, capture_output=True, text=True, timeout=60)
    if done.returncode != 0:
        raise RuntimeError(f"exit status {done.returncode}: {done.stderr.strip()[:400]}")
    return json.loads(done.stdout)


def unix_ms(text):
    at = datetime.fromisoformat(text.replace("Z", "+00:00"))
    at = at if at.tzinfo else at.replace(tzinfo=timezone.utc)
    return round(at.timestamp() * 1000)


def compare_steps(findings, where, found, edges, depths):
    """Edges in h from the first one, and depths."""
    findings.equal(f"{where} steps", len(found), len(depths))
    total = sum(depths)
    for i, step in enumerate(found[:len(depths)]):
        for key, edge in (("start_h", edges[i]), ("end_h", edges[i + 1])):
            findings.check("edge", f"{where} step {i}", step[key], real(edge), TIME_H)
        findings.depth("step", f"{where} step {i}", step["depth_mm"], depths[i], total)
    findings.depth("total", where, sum(mpf(step["depth_mm"]) for step in found), total)


def compare_design(program, case, folder, findings):
    request = case["request"]
    if request["pattern"] == "keifer_chu":
        findings.start_case("design: keifer_chu", QUADRATURE)
    else:
        findings.start_case("design: " + request["pattern"], RELATIVE)
    storm = run_program(program, folder, "case.yaml", "--csv", "storm.csv")["storms"]["storm"]
    compare_written(program, folder, findings, storm["steps"])
    edges, depths = design(request)
    compare_held(findings, storm["rain"]["design"]["held"], request, edges, depths)
    if case["resample_h"]:
        edges, depths = resample(edges, depths, case["resample_h"])
    compare_steps(findings, "storm", storm["steps"], edges, depths)
    findings.depth("total", "storm", storm["rain"]["depth_mm"],
                   depth_of(request["source"], request["duration_h"]))
    for minutes, peak in storm["peaks"].items():
        findings.depth("window", f"{minutes} min", peak["depth_mm"],
                       largest_window(edges, depths, Fraction(int(minutes), 60)), sum(depths))


def compare_written(program, folder, findings, steps):
    """The file of steps is known for rain, gives the same depths to the last bit, and is written
    back to the same bytes."""
    storm, = run_program(program, folder, "storm.csv", "--csv", "again.csv")["storms"].values()
    findings.equal("depths read back", [step["depth_mm"] for step in storm["steps"]],
                   [step["depth_mm"] for step in steps])
    findings.equal("depths below zero", [step for step in steps if step["depth_mm"] < 0], [])
    findings.equal("file written back", (folder / "again.csv").read_bytes(),
                   (folder / "storm.csv").read_bytes())


def compare_held(findings, found, request, edges, depths):
    """The durations that are whole numbers of steps, their statistics and what the storm holds."""
    source = request["source"]
    marks = [h for h, _ in source[1]] if source[0] == "list" else FORMULA_MARKS_H
    marks = [h for h in marks if request["pattern"] == "alternating_blocks"
             and h <= request["duration_h"] and (h / request["every_h"]).denominator == 1]
    findings.equal("durations held", len(found), len(marks))
    for held, hours in zip(found, marks):
        where = f"held {held['duration_h']} h"
        findings.check("edge", where, held["duration_h"], real(hours), TIME_H)
        findings.depth("statistic", where, held["statistic_mm"], depth_of(source, hours))
        findings.depth("window", where, held["storm_mm"], largest_window(edges, depths, hours))


def compare_event(findings, where, found, wanted, table):
    for key, edge in (("starts", "from_ms"), ("ends", "to_ms")):
        findings.equal(f"{where} {key}", unix_ms(found[key]), wanted[edge])
    findings.depth("depth", where, found["depth_mm"], wanted["depth_mm"])
    for minutes in WINDOWS_MIN:
        findings.depth("window", f"{where} {minutes} min", found["peaks_mm"][str(minutes)],
                       wanted["peaks"][minutes])
    findings.depth("five days before", where, found["antecedent_5_day_mm"], wanted["before_mm"])
    findings.equal(f"{where} five days known", found["antecedent_known"], wanted["before_known"])
    findings.check("hours without data", where, found["without_data_h"],
                   mpf(wanted["no_data_ms"]) / 3_600_000, TIME_H)
    compare_rarity(findings, where, found["rarity"]["by_duration"], event_rarity(table, wanted))


def compare_rarity(findings, where, found, wanted):
    findings.equal(f"{where} durations", len(found), len(wanted))
    for got, (hours, depth, rarity) in zip(found, wanted):
        at = f"{where} {got['duration_h']} h"
        findings.check("edge", at, got["duration_h"], real(hours), TIME_H)
        findings.depth("window", at, got["depth_mm"], depth)
        for key, years in zip(("return_period_yr", "more_than_yr", "less_than_yr"), rarity):
            if years is None or got[key] is None:
                findings.equal(f"{at} {key}", got[key], years)
            else:
                findings.check("return period", at, got[key], years, PERIOD * years)


def compare_record(program, case, folder, findings):
    findings.start_case(case["family"], RELATIVE)
    arguments = ["record.csv", *case["arguments"]]
    found = run_program(program, folder, *arguments, "--events")
    wanted = (tip_events(case["tips"], case["offset_minutes"], case["rule"]) if "tips" in case
              else interval_events(case["steps"], case["rule"]))
    findings.equal("events", len(found["events"]), len(wanted))
    findings.depth("outside", "record", found["outside_mm"], mpf(0))
    for got, event in zip(found["events"], wanted):
        compare_event(findings, f"event {got['number']}", got, event, case["table"])
    number = 1 + max(range(len(wanted)), key=lambda i: len(wanted[i]["depths"]))
    storm, = run_program(program, folder, *arguments, "--event", str(number))["storms"].values()
    event = wanted[number - 1]
    compare_steps(findings, f"event {number}", storm["steps"],
                  [Fraction(edge - event["from_ms"], HOUR_MS)
                   for edge in event["edges_ms"]], event["depths"])


def compare_case(program, seed, index, folder, findings):
    """Draws a case, writes its files and compares it; returns its family."""
    case = draw(seed, index)
    findings.start_case(case["family"], RELATIVE)
    for name, text in case["files"].items():
        (folder / name).write_text(text, encoding="utf-8")
    compare = compare_design if case["family"] == "design" else compare_record
    try:
        compare(program, case, folder, findings)
    except (KeyError, TypeError, ValueError, RuntimeError) as error:
        findings.failures.append(repr(error))
    return findings.family


if __name__ == "__main__":
    sys.exit(run_cases(__doc__.splitlines()[0], Findings(), "mm, h, yr", compare_case))
