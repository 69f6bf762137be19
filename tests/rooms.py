"""Checks the house rules that a compiler does not: a room includes only rooms on lower floors, every
public header has its include guard, and no file outgrows its subject."""
import pathlib
import re
import sys

FLOORS = {
    "base": 0,
    "reference": 1,
    "rain": 2,
    "losses": 2,
    "ledger": 3,
    "flow": 4,
    "scenario": 5,
    "fieldtest": 6,
    "explore": 6,
    "review": 7,
    "report": 8,
    "chart": 9,
    "cli": 10,
}
MOST_LINES = 400

root = pathlib.Path(__file__).resolve().parent.parent
problems = []
files = [
    path
    for folder in ("include", "src", "tests")
    for path in sorted((root / folder).rglob("*"))
    if path.suffix in (".hpp", ".cpp")
]

for path in files:
    name = path.relative_to(root)
    text = path.read_text()
    lines = text.splitlines()
    if len(lines) > MOST_LINES:
        problems.append(f"{name}: {len(lines)} lines, at most {MOST_LINES}")
    if path.suffix == ".hpp" and "#pragma once" not in text:
        problems.append(f"{name}: no #pragma once")
    room = path.parent.name
    if room not in FLOORS or name.parts[0] == "tests":
        continue
    for number, line in enumerate(lines, 1):
        found = re.match(r'#include "(?:rainledger/)?(\w+)/', line)
        if not found or found.group(1) == room:
            continue
        other = found.group(1)
        if other not in FLOORS:
            problems.append(f"{name}:{number}: includes '{other}', which is no room")
        elif FLOORS[other] >= FLOORS[room]:
            problems.append(f"{name}:{number}: room '{room}' may not include room '{other}'")
        elif not line.startswith('#include "rainledger/'):
            problems.append(f"{name}:{number}: includes a private header of room '{other}'")

if not files:
    problems.append("no source files found")
for problem in problems:
    print(problem)
print(f"{len(files)} files, {len(problems)} problems")
sys.exit(1 if problems else 0)
