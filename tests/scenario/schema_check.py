"""Checks the JSON Schema against scenarios.

    schema_check.py PROGRAM FOLDER

PROGRAM prints the schema when run as `PROGRAM schema`, that of field tests as `PROGRAM schema
field_test`. Every scenario and field test (*.yaml) in FOLDER and below must conform to its own, and
each spoiled copy of the samples below must not. Exit status 1 if any does otherwise, or if there is
no scenario or no field test at all.
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

# Further storms that conform, in place of the sample's.
STORMS = """
- {design: {pattern: alternating_blocks, duration: 2 h, every: 5 min, peak_at: 0.375, return_period: 10 yr,
            statistics: county.csv}, resample: 15 min, multiply_by: 1.2}
- {design: {pattern: keifer_chu, duration: 2 h, every: 5 min,
            formula: {a: 96.6 in/h, b: -13.9, m: 0.97, n: 1, time: min}}}
- {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nrcs_II, interpolate: smooth}}
- {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0], [0.3, 0.1], [1, 1]]}}
- {design: {pattern: uniform, duration: 1 h, every: 5 min, depths: {5 min: 9.8 mm, 1 h: 32 mm}}}
- {record: {file: logger.csv, tip: 0.2 mm, count: running, tips: spread, every: 5 min, dry_spell: 6 h,
            threshold: 0.2 mm, event: largest, statistics: county.csv, zone: Europe/Madrid}}
- {record: {file: gauge.csv, kind: depth, unit: mm, stamp: end, event: 3}}
- {record: {file: gauge.csv, event: {from: 2031-06-14 13:00, to: 2031-06-14 18:00}}}
"""

# The number of such a storm, a path into it and the value put there; None takes the key out.
SPOILED_STORMS = [
    (0, ["steps"], {"every": "5 min", "depths": [1], "unit": "mm"}),
    (0, ["resample"], 15),
    (0, ["design", "pattern"], "chicago"),
    (0, ["design", "pattern"], "uniform"),
    (0, ["design", "duration"], None),
    (0, ["design", "every"], None),
    (0, ["design", "peak_at"], "37.5 %"),
    (0, ["design", "return_period"], "10 h"),
    (0, ["design", "statistics"], None),
    (0, ["design", "depth"], "62 mm"),
    (0, ["design", "curve"], "nrcs_II"),
    (0, ["design", "interpolate"], "smooth"),
    (1, ["design", "formula", "a"], "96.6 in"),
    (1, ["design", "formula", "b"], None),
    (1, ["design", "formula", "m"], 0),
    (1, ["design", "formula", "time"], "d"),
    (1, ["design", "formula"], None),
    (2, ["design", "curve"], "nrcs_IV"),
    (2, ["design", "curve"], None),
    (2, ["design", "peak_at"], 0.5),
    (2, ["design", "return_period"], "10 yr"),
    (2, ["design", "pattern"], "alternating_blocks"),
    (3, ["design", "curve"], [[0, 0], [1]]),
    (3, ["design", "curve"], [[0, 0], [1, 1.5]]),
    (4, ["design", "depths"], {}),
    (4, ["design", "depths"], {"5": "9.8 mm"}),
    (4, ["design", "depths"], {"5 min": 9.8}),
    (4, ["design", "pattern"], "keifer_chu"),
    (5, ["record", "file"], None),
    (5, ["record", "event"], None),
    (5, ["record", "event"], "biggest"),
    (5, ["record", "event"], 0),
    (5, ["record", "tip"], None),
    (5, ["record", "unit"], "mm"),
    (5, ["record", "at_least"], "10 mm"),
    (5, ["record", "gaps"], "dry"),
    (6, ["record", "tips"], "spread"),
    (7, ["record", "event", "to"], None),
    (7, ["record", "event", "from"], "13:00"),
]

# Maps of storms that conform, and that do not.
FROM_RECORD = {"file": "logger.csv", "tip": "0.2 mm", "at_least": "10 mm"}
STORM_MAPS = [({"from_record": FROM_RECORD}, True),
              ({"from_record": FROM_RECORD, "a": {"hyetograph": "a.csv"}}, False),
              ({"from_record": {**FROM_RECORD, "event": "largest"}}, False),
              ({"from_record": {"tip": "0.2 mm"}}, False),
              ({"a": {"from_record": FROM_RECORD}}, False)]

# A path into the sample and the value put there; None takes the key out.
SPOILED = [
    (["titel"], "a"),
    (["storms"], {"a": {"hyetograph": "a.csv"}}),
    (["storm"], None),
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


FIELD_TEST = """
title: Quarry Row, pit 3
readings: pit3.csv
ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}
laws: [horton, green_ampt, philip, kostiakov, modified_kostiakov]
steady_rate: {fixed: 32 mm/h}
ignore_first: 5 min
design_factor: 2
"""

SPOILED_FIELD_TESTS = [
    (["readings"], None),
    (["storm"], "pit3.csv"),
    (["ring"], "300 mm"),
    (["ring", "inner_diameter"], None),
    (["ring", "inner_diameter"], 300),
    (["ring", "diameter"], "300 mm"),
    (["laws"], "horton"),
    (["laws"], []),
    (["laws"], ["horton", "horton"]),
    (["laws"], ["curve_number"]),
    (["steady_rate"], {}),
    (["steady_rate"], {"use": "tail"}),
    (["steady_rate"], {"from": "fitted"}),
    (["steady_rate", "use"], "fitted"),
    (["steady_rate", "fixed"], "32 mm"),
    (["ignore_first"], 5),
    (["design_factor"], 0.5),
    (["design_factor"], "2 mm"),
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


def validator_of(words):
    text = subprocess.run(words, check=True, capture_output=True, text=True).stdout
    schema = json.loads(text)
    jsonschema.Draft202012Validator.check_schema(schema)
    return jsonschema.Draft202012Validator(schema)


def check_field_test(validator):
    sample = yaml.safe_load(FIELD_TEST)
    wrong = [f"the field test: {error.message}" for error in validator.iter_errors(sample)]
    for form in ({"use": "fitted"}, {"from": "tail"}):
        if not validator.is_valid({**sample, "steady_rate": form}):
            wrong.append(f"does not conform: steady_rate: {form}")
    for path, value in SPOILED_FIELD_TESTS:
        if validator.is_valid(spoiled(sample, path, value)):
            wrong.append(f"conforms although spoiled: field test, {'.'.join(path)}: {value}")
    return wrong


def main():
    program, folder = sys.argv[1:]
    validator = validator_of([program, "schema"])
    field_tests = validator_of([program, "schema", "field_test"])
    wrong = check_field_test(field_tests)

    sample = yaml.safe_load(SAMPLE)
    wrong += [f"the sample: {error.message}" for error in validator.iter_errors(sample)]
    for path, value in SPOILED:
        if validator.is_valid(spoiled(sample, path, value)):
            wrong.append(f"conforms although spoiled: {'.'.join(path)}: {value}")

    storms = yaml.safe_load(STORMS)
    for storm in storms:
        wrong += [f"{storm}: {error.message}" for error in validator.iter_errors({"storm": storm})]
    for number, path, value in SPOILED_STORMS:
        if validator.is_valid({"storm": spoiled(storms[number], path, value)}):
            wrong.append(f"conforms although spoiled: storm {number}, {'.'.join(path)}: {value}")
    for storms_by_name, conforms in STORM_MAPS:
        if validator.is_valid({"storms": storms_by_name}) != conforms:
            wrong.append(f"{'does not conform' if conforms else 'conforms'}: {storms_by_name}")

    counts = {"scenario": 0, "field test": 0}
    for path in sorted(pathlib.Path(folder).rglob("*.yaml")):
        document = yaml.safe_load(path.read_text(encoding="utf-8"))
        kind = "field test" if "readings" in document else "scenario"
        counts[kind] += 1
        wrong += [f"{path}: {error.json_path}: {error.message}" for error in
                  (field_tests if kind == "field test" else validator).iter_errors(document)]
    wrong += [f"no {kind} (*.yaml) in {folder}" for kind, count in counts.items() if count == 0]

    print("\n".join(wrong) if wrong else
          f"{counts['scenario']} scenarios and {counts['field test']} field tests conform")
    return 1 if wrong else 0


if __name__ == "__main__":
    sys.exit(main())
