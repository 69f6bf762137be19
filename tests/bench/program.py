"""Times whole runs of the program, alternating with what they are measured against, and prints
medians and ratios. Usage: program.py PROGRAM [RUNS]"""
import os
import pathlib
import statistics
import subprocess
import sys
import tempfile
import time

PLAIN_PYTHON = """
import csv, math, sys
rows = [(float(a), float(b)) for a, b in list(csv.reader(open(sys.argv[1])))[1:]]
K, S, F, last, excess, out = 10.9, 22.0, 0.0, 0.0, 0.0, []
for end, depth in rows:
    dt = (end - last) / 60.0; last = end; w = depth / dt if dt else 0.0
    f = K * (1 + S / F) if F > 0 else math.inf
    if w > K and F + depth > K * S / (w - K):
        Fp = max(F, K * S / (w - K)); left = dt - (Fp - F) / w; G = Fp + K * left
        for _ in range(30):
            N = Fp + S * math.log((S + G) / (S + Fp)) + K * left
            if abs(N - G) < 1e-12: break
            G = N
        out.append(depth - (G - F)); F = G
    else:
        F += depth; out.append(0.0)
csv.writer(open(sys.argv[2], 'w')).writerows([x] for x in out)
"""


def timed(command):
    start = time.perf_counter()
    process = subprocess.Popen(command, stdout=subprocess.DEVNULL)
    _, status, usage = os.wait4(process.pid, 0)
    if status != 0:
        raise SystemExit(f"{command} failed")
    return (time.perf_counter() - start) * 1e3, usage.ru_maxrss / 1024


def main():
    program = sys.argv[1]
    runs = int(sys.argv[2]) if len(sys.argv) > 2 else 21
    with tempfile.TemporaryDirectory() as folder:
        at = pathlib.Path(folder)
        rows = [f"{5 * i},{round(0.05 + 4 * 2.718 ** -(((i - 120) / 14) ** 2), 4)}" for i in range(1, 289)]
        (at / "rain.csv").write_text("end [min],depth [mm]\n" + "\n".join(rows) + "\n")
        # Row by row: a child's peak memory counts this process's own up to its start.
        with open(at / "million.csv", "w") as big:
            big.write("end [min],depth [mm]\n")
            for i in range(1, 1000001):
                big.write(f"{5 * i},{(i % 37) / 10}\n")
        laws = [
            "impervious",
            "{horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 1/h}}",
            "{green_ampt: {effective_conductivity: 10.9 mm/h, suction_deficit: 22 mm}}",
            "{curve_number: {number: 80}}",
        ]
        for name, file in (("day", "rain.csv"), ("million", "million.csv")):
            chosen = laws if name == "day" else laws[:1]
            text = f"storm: {{hyetograph: {file}}}\nsurfaces:\n" + "".join(
                f"  plot {i}: {{area: 1000 m2, losses: {law}}}\n" for i, law in enumerate(chosen))
            (at / f"{name}.yaml").write_text(text)
        (at / "plain.py").write_text(PLAIN_PYTHON)
        commands = {
            "start only (--version)": [program, "--version"],
            "288 steps, 4 surfaces, ledger and JSON": [
                program, "losses", str(at / "day.yaml"), "--quiet", "--ledger", str(at / "l.csv"),
                "--json", str(at / "r.json")],
            "plain Python script, 1 surface": [
                "/usr/bin/python3", str(at / "plain.py"), str(at / "rain.csv"), str(at / "o.csv")],
            "a million steps, 1 surface, summary": [
                program, "losses", str(at / "million.yaml"), "--quiet"],
        }
        times = {name: [] for name in commands}
        memory = {}
        for run in range(runs + 1):
            for name, command in commands.items():
                if "million" in name and run > 5:
                    continue
                ms, mib = timed(command)
                if run > 0:
                    times[name].append(ms)
                memory[name] = mib
        base = statistics.median(times["start only (--version)"])
        for name, values in times.items():
            median = statistics.median(values)
            print(f"{name}: {median:.2f} ms, {median / base:.2f} x start, peak {memory[name]:.0f} MiB")


if __name__ == "__main__":
    main()
