"""Runs the examples of the documentation: docs_examples.py PROGRAM [ROOT]

Every ```yaml block with a `surfaces:` key in README.md, docs/*.md and docs/methods/*.md must run. A
block whose first line is `# FILE.yaml` is known by that name on its page (without surfaces, `storm`
must take it), and a ```csv block whose first line is `# FILE.csv` is saved beside it. In a ```text
block that begins with `$ rainledger losses FILE ...`, the same with `storm` or `fit`, or `$ rainledger
lookup ...` the lines must follow each other as in the real output; a line `...` stands for any number
of lines left out. FILE is a block of the page, or a file of scenarios/.
"""

import re
import shlex
import shutil
import subprocess
import sys
import tempfile
from pathlib import Path

FENCE = re.compile(r"^```(\w+)[ \t]*\n(.*?)^```[ \t]*$", re.MULTILINE | re.DOTALL)
NAMED = re.compile(r"# (\S+\.(?:yaml|csv))\s*\n")
COMMAND = re.compile(r"\$ rainledger (losses|storm|fit) (\S+\.(?:yaml|csv))(.*)\n")
LOOKUP = re.compile(r"\$ rainledger (lookup)(.*)\n")
SURFACES = re.compile(r"^surfaces:", re.MULTILINE)
NUMBER = re.compile(r"(-?\d+(?:\.\d+)?(?:e[-+]?\d+)?)")
MANY_DIGITS = 10
LAST_DIGITS = 1e-9  # relative: compilers may differ in the last bit of a full-precision number


def same_line(shown, real):
    """Equal but for blanks at the end and the last digits of full-precision numbers."""
    shown_parts, real_parts = NUMBER.split(shown.rstrip()), NUMBER.split(real.rstrip())
    if len(shown_parts) != len(real_parts):
        return False
    for index, (a, b) in enumerate(zip(shown_parts, real_parts)):
        if a == b:
            continue
        full = index % 2 == 1 and sum(c.isdigit() for c in a) >= MANY_DIGITS
        if not full or abs(float(a) - float(b)) > LAST_DIGITS * abs(float(b)):
            return False
    return True


def chunks(shown):
    """Runs of lines that must stand together: [(may lines be left out before it, lines)]."""
    found, skipped, lines = [], False, []
    for line in shown:
        if line.strip() != "...":
            lines.append(line)
            continue
        if lines:
            found.append((skipped, lines))
        skipped, lines = True, []
    if lines:
        found.append((skipped, lines))
    return found


def agreeing(lines, real):
    """How many of `lines` the start of `real` repeats."""
    pairs = list(zip(lines, real))
    return next((n for n, pair in enumerate(pairs) if not same_line(*pair)), len(pairs))


def first_line_missing(shown, real):
    """The first shown line that the real output does not hold in its place, or None."""
    at = 0
    for skipped, lines in chunks(shown):
        starts = range(at, len(real) + 1) if skipped else [at]
        most = 0
        for start in starts:
            most = max(most, agreeing(lines, real[start:]))
            if most == len(lines):
                at = start + most
                break
        else:
            return lines[most]
    if shown[-1].strip() != "..." and at < len(real):
        return f"(the end; the output goes on: {real[at]})"
    return None


def run(program, folder, verb, *words):
    command = [program, verb, *words]
    return subprocess.run(command, cwd=folder, capture_output=True, text=True, timeout=60)


def check_scenario(program, folder, name):
    verb = "losses" if SURFACES.search((folder / name).read_text(encoding="utf-8")) else "storm"
    ended = run(program, folder, verb, name)
    return None if ended.returncode == 0 else f"status {ended.returncode}\n{ended.stderr}"


def check_output(program, folder, block):
    command = COMMAND.match(block)
    if command and not (folder / command[2]).exists():
        return f"no block of this page is named {command[2]}"
    verb, *words = (command or LOOKUP.match(block)).groups()
    ended = run(program, folder, verb, *shlex.split(" ".join(words)))
    if ended.returncode != 0:
        return f"status {ended.returncode}\n{ended.stderr}"
    missing = first_line_missing(block.splitlines()[1:], ended.stdout.splitlines())
    return None if missing is None else f"not in the output, or not there: {missing}"


def write_files(blocks, folder):
    """Saves a page's scenarios and rain files; returns the scenarios' names and lines."""
    scenarios = []
    for kind, text, line in blocks:
        named = NAMED.match(text)
        if kind == "csv" and named:
            (folder / named[1]).write_text(text, encoding="utf-8")
        elif kind == "yaml" and (named or SURFACES.search(text)):
            name = named[1] if named else f"line_{line}.yaml"
            if (folder / name).exists():
                sys.exit(f"line {line}: {name} stands on its page twice")
            (folder / name).write_text(text, encoding="utf-8")
            scenarios.append((name, line))
    return scenarios


def check_page(program, root, page):
    """Yields (line, what, fault or None) for every example of a page."""
    text = page.read_text(encoding="utf-8")
    blocks = [(m[1], m[2], text.count("\n", 0, m.start()) + 1) for m in FENCE.finditer(text)]
    with tempfile.TemporaryDirectory() as temporary:
        folder = Path(temporary)
        if (root / "scenarios").exists():
            shutil.copytree(root / "scenarios", folder / "scenarios")
        for name, line in write_files(blocks, folder):
            yield line, name, check_scenario(program, folder, name)
        for kind, block, line in blocks:
            if kind == "text" and (COMMAND.match(block) or LOOKUP.match(block)):
                what = block.splitlines()[0]
                yield line, what, check_output(program, folder, block)


def pages(root):
    found = [root / "README.md", *sorted((root / "docs").glob("*.md"))]
    found += sorted((root / "docs" / "methods").glob("*.md"))
    return [page for page in found if page.exists()]


def main():
    if len(sys.argv) not in (2, 3):
        sys.exit("usage: docs_examples.py PROGRAM [ROOT]")
    program = str(Path(sys.argv[1]).resolve())
    root = Path(sys.argv[2]) if len(sys.argv) == 3 else Path(__file__).resolve().parent.parent
    passed = failed = 0
    for page in pages(root):
        for line, what, fault in check_page(program, root, page):
            if fault is None:
                passed += 1
            else:
                failed += 1
                print(f"{page.relative_to(root)}:{line}: {what}: {fault}")
    print(f"{passed} passed, {failed} failed")
    if passed + failed == 0:
        print("no example was found")
    sys.exit(1 if failed or passed == 0 else 0)


if __name__ == "__main__":
    main()
