"""Compares the pictures of the documentation with what the program draws: docs_pictures.py PROGRAM

docs/pictures/make.sh draws them anew. By the same version of gnuplot a picture must be the same but
for the last digit of its numbers; by another one at least all its words must be.
"""

import re
import subprocess
import sys
import tempfile
from pathlib import Path

PICTURES = Path(__file__).resolve().parent.parent / "docs" / "pictures"
GNUPLOT = re.compile(r"<desc>(.*?)</desc>")
WORDS = re.compile(r"<(?:text|title)>(.*?)</(?:text|title)>", re.DOTALL)
NUMBER = re.compile(r"(-?\d+\.\d+)")
LAST_DIGIT = 0.011  # gnuplot writes places to a hundredth


def same_but_for_last_digits(a, b):
    a_parts, b_parts = NUMBER.split(a), NUMBER.split(b)
    if len(a_parts) != len(b_parts) or a_parts[::2] != b_parts[::2]:
        return False
    pairs = zip(a_parts[1::2], b_parts[1::2])
    return all(abs(float(x) - float(y)) <= LAST_DIGIT for x, y in pairs)


def fault(kept, drawn):
    """What is wrong with a kept picture, or None."""
    kept_by, drawn_by = GNUPLOT.search(kept), GNUPLOT.search(drawn)
    if not kept_by or not drawn_by:
        return "no gnuplot version in it"
    if WORDS.findall(kept) != WORDS.findall(drawn):
        return "other words"
    if kept_by[1] != drawn_by[1]:
        print(f"drawn by {drawn_by[1].strip()}, kept by {kept_by[1].strip()}: words compared alone")
        return None
    return None if same_but_for_last_digits(kept, drawn) else "other lines"


def main():
    if len(sys.argv) != 2:
        sys.exit("usage: docs_pictures.py PROGRAM")
    with tempfile.TemporaryDirectory() as folder:
        subprocess.run(["bash", PICTURES / "make.sh", sys.argv[1], folder], check=True)
        drawn = {path.name: path.read_text(encoding="utf-8") for path in Path(folder).iterdir()}
    kept = {path.name: path.read_text(encoding="utf-8") for path in PICTURES.glob("*.svg")}
    faults = {name: "not drawn by make.sh" for name in kept.keys() - drawn.keys()}
    faults |= {name: "not kept" for name in drawn.keys() - kept.keys()}
    for name in kept.keys() & drawn.keys():
        faults |= {name: what} if (what := fault(kept[name], drawn[name])) else {}
    for name, what in sorted(faults.items()):
        print(f"docs/pictures/{name}: {what}; run docs/pictures/make.sh {sys.argv[1]}")
    print(f"{len(kept)} pictures, {len(faults)} at fault")
    sys.exit(1 if faults or not kept else 0)


if __name__ == "__main__":
    main()
