"""Checks the JSON Schema against scenarios.

    schema_check.py PROGRAM FOLDER

PROGRAM prints the schema when run as `PROGRAM schema`. Every scenario (*.yaml) in FOLDER and below
must conform to it, and each spoiled copy of the sample below must not. Exit status 1 if any does
otherwise, or if there is no scenario at all.
"""

import copy
import json
import pathlib
import subprocess
import sys

import jsonschema
import yaml

SAMPLE = """
storm: {steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}, multiply_by: 1.2, continue_for: 2 h}
surfaces:
  verge:
    area: 1600 m2
    losses: {green_ampt: {effective_conductivity: 10.9 mm/h, suction_deficit: 22 mm}}
  lawn:
    area: .28ha
    interception: 1e0 mm
    losses: {horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/hr, decay: 4.14 1/h}}
    runs_onto: {verge: 30 %}
  yard:
    area: 0.1 ac
    losses: {curve_number: {number: 89, antecedent: II}}
  path:
    area: 100 m2
    losses: {philip: {sorptivity: 12 mm/h^0.5, steady_term: 4 um/s}}
    runs_onto: verge
  roof:
    area: 100 m2
    losses: impervious
  "quoted":
    area: 100 m2
    losses: {curve_number: {number: "89", initial_abstraction_ratio: "+.2"}}
"""

# A path into the sample and the value put there; None takes the key out.
SPOILED = [
    (["titel"], "a"),
    (["storms"], {"a": {"hyetograph": "a.csv"}}),
    (["storm"], None),
    (["surfaces"], None),
    (["surfaces"], {}),
    (["storm", "design"], {}),
    (["storm", "hyetograph"], "a.csv"),
    (["storm", "multiply_by"], -1),
    (["storm", "continue_for"], 2),
    (["storm", "steps", "every"], "5"),
    (["storm", "steps", "ends"], ["5 min", "10 min"]),
    (["storm", "steps", "unit"], None),
    (["storm", "steps", "depths"], [0.4, -1]),
    (["storm", "steps", "depths"], []),
    (["storm", "steps", "intensities"], [1, 2]),
    (["surfaces", "site"], {"area": "1 ha", "losses": "impervious"}),
    (["surfaces", "a.b"], {"area": "1 ha", "losses": "impervious"}),
    (["surfaces", "  "], {"area": "1 ha", "losses": "impervious"}),
    (["surfaces", "a\u202eb"], {"area": "1 ha", "losses": "impervious"}),
    (["title"], "a\x1b[31mb"),
    (["surfaces", "roof", "drains_to"], "CB-1, CB-2"),
    (["surfaces", "roof", "drains_to"], "CB\x07"),
    (["surfaces", "roof", "area"], None),
    (["surfaces", "roof", "area"], 100),
    (["surfaces", "roof", "area"], "100 mm"),
    (["surfaces", "roof", "area"], "-1 ha"),
    (["surfaces", "roof", "colour"], "grey"),
    (["surfaces", "roof", "losses"], "paved"),
    (["surfaces", "roof", "losses"], {}),
    (["surfaces", "roof", "ponded_water"], "hold"),
    (["surfaces", "lawn", "runs_onto"], {"verge": 1.5}),
    (["surfaces", "lawn", "losses", "horton", "k"], "4 1/h"),
    (["surfaces", "lawn", "losses", "horton", "decay"], None),
    (["surfaces", "lawn", "losses", "horton", "follows"], "clock"),
    (["surfaces", "lawn", "losses", "phi_index"], {"observed_excess": "4 mm"}),
    (["surfaces", "verge", "losses", "green_ampt", "barrier_rate"], "1 mm/h"),
    (["surfaces", "verge", "losses", "green_ampt", "moisture_deficit"], 1.2),
    (["surfaces", "verge", "losses", "green_ampt", "suction_deficit"], None),
    (["surfaces", "path", "losses", "philip", "steady_term"], "4 mm"),
    (["surfaces", "yard", "losses", "curve_number", "cn"], 80),
    (["surfaces", "yard", "losses", "curve_number", "number"], 0),
    (["surfaces", "yard", "losses", "curve_number", "number"], 101),
    (["surfaces", "yard", "losses", "curve_number", "number"], "89 %"),
    (["surfaces", "yard", "losses", "curve_number", "initial_abstraction_ratio"], 20),
    (["surfaces", "yard", "losses", "curve_number", "tabulated_ratio"], "-0.2"),
    (["surfaces", "yard", "losses", "curve_number", "antecedent"], "IV"),
]


def spoiled(sample, path, value):
    out = copy.deepcopy(sample)
    place = out
    for key in path[:-1]:
        place = place[key]
    if value is None:
        del place[path[-1]]
    else:
        place[path[-1]] = value
    return out


def main():
    program, folder = sys.argv[1:]
    text = subprocess.run([program, "schema"], check=True, capture_output=True, text=True).stdout
    schema = json.loads(text)
    jsonschema.Draft202012Validator.check_schema(schema)
    validator = jsonschema.Draft202012Validator(schema)
    wrong = []

    sample = yaml.safe_load(SAMPLE)
    wrong += [f"the sample: {error.message}" for error in validator.iter_errors(sample)]
    for path, value in SPOILED:
        if validator.is_valid(spoiled(sample, path, value)):
            wrong.append(f"conforms although spoiled: {'.'.join(path)}: {value}")

    scenarios = sorted(pathlib.Path(folder).rglob("*.yaml"))
    for path in scenarios:
        document = yaml.safe_load(path.read_text(encoding="utf-8"))
        wrong += [f"{path}: {error.json_path}: {error.message}"
                  for error in validator.iter_errors(document)]
    if not scenarios:
        wrong.append(f"no scenario (*.yaml) in {folder}")

    print("\n".join(wrong) if wrong else f"{len(scenarios)} scenarios conform")
    return 1 if wrong else 0


if __name__ == "__main__":
    sys.exit(main())
