"""Runs random cases one by one, prints those that failed and the largest differences of all."""

import argparse
import tempfile
from pathlib import Path

from mpmath import nstr


def run_case(arguments, index, findings, compare):
    """Whether the case passed; prints a line if not. `compare` returns what kind of case it was."""
    with tempfile.TemporaryDirectory() as scratch:
        folder = Path(scratch)
        if arguments.keep:
            folder = Path(arguments.keep) / f"case_{arguments.seed}_{index}"
            folder.mkdir(parents=True, exist_ok=True)
        kind = compare(arguments.program, arguments.seed, index, folder, findings)
    if findings.failures:
        more = len(findings.failures) - 1
        print(f"failed: {kind}: {findings.failures[0]}" + (f" and {more} more" if more else "")
              + f" [--seed {arguments.seed} --first {index} --cases 1]", flush=True)
    return not findings.failures


def print_largest(findings, units):
    print(f"largest differences ({units}):")
    for kind in sorted({kind for kind, _ in findings.largest}):
        parts = [f"{figure} {nstr(difference, 2)}"
                 for (of, figure), difference in findings.largest.items() if of == kind]
        print(f"  {kind}: " + ", ".join(parts))


def run_cases(title, findings, units, compare):
    """The exit status of a whole run by the command line's arguments."""
    parser = argparse.ArgumentParser(description=title)
    parser.add_argument("program")
    parser.add_argument("--cases", type=int, default=60)
    parser.add_argument("--seed", type=int, default=1)
    parser.add_argument("--first", type=int, default=0, help="index of the first case")
    parser.add_argument("--keep", help="a folder for the files of the cases")
    arguments = parser.parse_args()
    arguments.program = str(Path(arguments.program).resolve())
    print(f"seed {arguments.seed}, {arguments.cases} cases from {arguments.first}")
    indices = range(arguments.first, arguments.first + arguments.cases)
    passed = sum(run_case(arguments, index, findings, compare) for index in indices)
    print_largest(findings, units)
    print(f"{passed} passed, {arguments.cases - passed} failed")
    return 0 if passed == arguments.cases else 1
