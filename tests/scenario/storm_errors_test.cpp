#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a scenario has one storm or storms by name") {
    CHECK(problems(R"(surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:1: error: the scenario has no storm
    surfaces: {lot: {area: 1 ha, losses: impervious}}
    ^
    write 'storm: {hyetograph: rain.csv}', or 'steps', 'design' or 'record' in its place
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
storms: {a: {steps: {every: 1 h, depths: [1], unit: mm}}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:2:1: error: a scenario takes one of 'storm' or 'storms', not both
    storms: {a: {steps: {every: 1 h, depths: [1], unit: mm}}}
    ^
    move the single storm under 'storms:' with a name of its own
)");
    CHECK(
        problems(
            R"(storms: {a.b: {steps: {every: 1 h, depths: [1], unit: mm}}, "": {steps: {every: 1 h, depths: [1], unit: mm}}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:10: error: storm name 'a.b' holds a dot, comma or newline
    storms: {a.b: {steps: {every: 1 h, depths: [1], unit: mm}}, "": {steps: {every: 1 h, depths: [1]...
             ^
    names stand in tables and paths: use words, '-' and '_'
lane.yaml:1:61: error: a storm's name is empty
    ...: {steps: {every: 1 h, depths: [1], unit: mm}}, "": {steps: {every: 1 h, depths: [1], unit: mm}}...
                                                       ^
    names stand in tables and paths: use words, '-' and '_'
)");
}

TEST_CASE("a storm has one form of rain") {
    CHECK(problems(with_storm("{}")) == R"(lane.yaml:1:1: error: the storm has no rain
    storm: {}
    ^
    add 'hyetograph: rain.csv', 'steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}', 'design: {...}' or 'record: {...}'
)");
    CHECK(problems(with_storm("{multiply_by: 1}")) == R"(lane.yaml:1:1: error: the storm has no rain
    storm: {multiply_by: 1}
    ^
    add 'hyetograph: rain.csv', 'steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}', 'design: {...}' or 'record: {...}'
)");
    CHECK(
        problems(with_storm("{hyetograph: a.csv, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
        R"(lane.yaml:1:28: error: the storm takes one of 'hyetograph', 'steps', 'design' or 'record', not several
    storm: {hyetograph: a.csv, steps: {every: 1 h, depths: [1], unit: mm}}
                               ^
    keep the one that holds its rain
)");
    CHECK(problems(with_storm("{rainstorm: {}}")) == R"(lane.yaml:1:1: error: the storm has no rain
    storm: {rainstorm: {}}
    ^
    add 'hyetograph: rain.csv', 'steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}', 'design: {...}' or 'record: {...}'
lane.yaml:1:9: error: unknown key 'rainstorm' in the storm
    storm: {rainstorm: {}}
            ^
    known here: hyetograph, steps, design, record, resample, multiply_by, continue_for
)");
}

TEST_CASE("steps say every or ends, depths or intensities, and one unit") {
    CHECK(problems(with_storm("{steps: {depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:9: error: steps needs 'every' or 'ends'
    storm: {steps: {depths: [1], unit: mm}}
            ^
    write 'every: 5 min' for equal steps, or 'ends: [5 min, 12 min]'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, ends: [1 h], depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:29: error: steps takes one of 'every' or 'ends', not both
    storm: {steps: {every: 1 h, ends: [1 h], depths: [1], unit: mm}}
                                ^
    write 'every: 5 min' for equal steps, or 'ends: [5 min, 12 min]'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, unit: mm}}")) ==
          R"(lane.yaml:1:9: error: steps needs 'depths' or 'intensities'
    storm: {steps: {every: 1 h, unit: mm}}
            ^
    write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1], intensities: [1], unit: mm}}")) ==
          R"(lane.yaml:1:42: error: steps takes one of 'depths' or 'intensities', not both
    storm: {steps: {every: 1 h, depths: [1], intensities: [1], unit: mm}}
                                             ^
    write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1]}}")) ==
          R"(lane.yaml:1:9: error: 'unit' is missing from steps
    storm: {steps: {every: 1 h, depths: [1]}}
            ^
    add 'unit: mm'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1], unit: mm/h}}")) ==
          R"(lane.yaml:1:48: error: unit: 'mm/h' is not a unit of depth
    storm: {steps: {every: 1 h, depths: [1], unit: mm/h}}
                                                   ^
    for numbers in mm/h write 'intensities' in place of 'depths'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, intensities: [1], unit: mm}}")) ==
          R"(lane.yaml:1:53: error: unit: 'mm' is not a unit of intensity
    storm: {steps: {every: 1 h, intensities: [1], unit: mm}}
                                                        ^
    for numbers in mm write 'depths' in place of 'intensities'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1], unit: furlong}}")) ==
          R"(lane.yaml:1:48: error: unit: 'furlong' is not a unit of depth
    storm: {steps: {every: 1 h, depths: [1], unit: furlong}}
                                                   ^
    units: mm, cm, m, in, ft
)");
    CHECK(problems(with_storm("{steps: [1, 2]}")) ==
          R"(lane.yaml:1:16: error: a map belongs here, not a list
    storm: {steps: [1, 2]}
                   ^
    write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'
)");
}

TEST_CASE("the numbers of steps are checked one by one") {
    CHECK(problems(with_storm(
              "{steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}")) ==
          R"(lane.yaml:1:41: error: depths, entry 2: '-0.5' is below zero
    storm: {steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}
                                            ^
    write a plain number of zero or more; 'unit' says the unit once
lane.yaml:1:47: error: depths, entry 3: 'nan' is not a number
    storm: {steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}
                                                  ^
    write a plain number of zero or more; 'unit' says the unit once
lane.yaml:1:52: error: depths, entry 4: '2 mm' has a unit where a plain number belongs
    storm: {steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}
                                                       ^
    write a plain number of zero or more; 'unit' says the unit once
lane.yaml:1:58: error: 'depths, entry 5' is empty
    storm: {steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}
                                                             ^
    write a plain number of zero or more; 'unit' says the unit once
lane.yaml:1:61: error: 'depths, entry 6' takes a single value, not a list
    storm: {steps: {every: 1 h, depths: [1, -0.5, nan, 2 mm, ~, [3]], unit: mm}}
                                                                ^
    write a plain number of zero or more; 'unit' says the unit once
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [], unit: mm}}")) ==
          R"(lane.yaml:1:37: error: 'depths' holds no entries
    storm: {steps: {every: 1 h, depths: [], unit: mm}}
                                        ^
    write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: 3, unit: mm}}")) ==
          R"(lane.yaml:1:37: error: a list belongs here, not '3'
    storm: {steps: {every: 1 h, depths: 3, unit: mm}}
                                        ^
    write 'steps: {every: 5 min, depths: [0.4, 1.1, 2.6], unit: mm}'
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1e13], unit: mm}}")) ==
          R"(lane.yaml:1:38: error: depths, entry 1: '1e13' is too large to compute with
    storm: {steps: {every: 1 h, depths: [1e13], unit: mm}}
                                         ^
    write a plain number of zero or more; 'unit' says the unit once
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1, 1e12], unit: ft}}")) ==
          R"(lane.yaml:1:41: error: depths, entry 2: too large to compute with
    storm: {steps: {every: 1 h, depths: [1, 1e12], unit: ft}}
                                            ^
    write a plain number of zero or more; 'unit' says the unit once
)");
    CHECK(problems(with_storm("{steps: {every: 1 h, depths: [1, -1]}}")) ==
          R"(lane.yaml:1:9: error: 'unit' is missing from steps
    storm: {steps: {every: 1 h, depths: [1, -1]}}
            ^
    add 'unit: mm'
lane.yaml:1:41: error: depths, entry 2: '-1' is below zero
    storm: {steps: {every: 1 h, depths: [1, -1]}}
                                            ^
    write a plain number of zero or more; 'unit' says the unit once
)");
}

TEST_CASE("the times of steps rise from zero") {
    CHECK(problems(with_storm("{steps: {every: 5, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:24: error: every: '5' has no unit
    storm: {steps: {every: 5, depths: [1], unit: mm}}
                           ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
)");
    CHECK(problems(with_storm("{steps: {every: 0 min, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:24: error: every: '0 min' is not above zero
    storm: {steps: {every: 0 min, depths: [1], unit: mm}}
                           ^
    write more than zero, such as '15 min'
)");
    CHECK(problems(with_storm("{steps: {every: 0.0001 s, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:24: error: every: a step shorter than 1 ms cannot be computed
    storm: {steps: {every: 0.0001 s, depths: [1], unit: mm}}
                           ^
    check the number and its unit
)");
    CHECK(problems(with_storm("{steps: {ends: [0 min, 5 min], depths: [1, 2], unit: mm}}")) ==
          R"(lane.yaml:1:24: error: ends, entry 1: '0 min' is not above zero
    storm: {steps: {ends: [0 min, 5 min], depths: [1, 2], unit: mm}}
                           ^
    write more than zero, such as '15 min'
)");
    CHECK(
        problems(with_storm(
            "{steps: {ends: [5 min, 12 min, 12 min, 10 min], depths: [1, 2, 3, 4], unit: mm}}")) ==
        R"(lane.yaml:1:39: error: ends, entry 3: '12 min' is not after the end before it
    storm: {steps: {ends: [5 min, 12 min, 12 min, 10 min], depths: [1, 2, 3, 4], unit: mm}}
                                          ^
    ends count from the storm's start and rise from one to the next
lane.yaml:1:47: error: ends, entry 4: '10 min' is not after the end before it
    storm: {steps: {ends: [5 min, 12 min, 12 min, 10 min], depths: [1, 2, 3, 4], unit: mm}}
                                                  ^
    ends count from the storm's start and rise from one to the next
)");
    CHECK(problems(with_storm("{steps: {ends: [5 min, 12 min], depths: [1, 2, 3], unit: mm}}")) ==
          R"(lane.yaml:1:48: error: 'ends' holds 2 entries and 'depths' 3
    storm: {steps: {ends: [5 min, 12 min], depths: [1, 2, 3], unit: mm}}
                                                   ^
    write one number for each step
)");
}

TEST_CASE("factors and dry time are checked") {
    CHECK(problems(with_storm("{multiply_by: -1, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:22: error: multiply_by: '-1' is below zero
    storm: {multiply_by: -1, steps: {every: 1 h, depths: [1], unit: mm}}
                         ^
    write a plain number of zero or more, such as 1.2
)");
    CHECK(problems(with_storm("{multiply_by: 20 %, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:22: error: multiply_by: '20 %' has a unit where a plain number belongs
    storm: {multiply_by: 20 %, steps: {every: 1 h, depths: [1], unit: mm}}
                         ^
    write a plain number of zero or more, such as 1.2
)");
    CHECK(problems(with_storm("{multiply_by: 20, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:22: warning: multiply_by is 20, above 3
    storm: {multiply_by: 20, steps: {every: 1 h, depths: [1], unit: mm}}
                         ^
    an allowance of 20 % is written 1.2
)");
    CHECK(problems(with_storm("{continue_for: 0 h, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:23: error: continue_for: '0 h' is not above zero
    storm: {continue_for: 0 h, steps: {every: 1 h, depths: [1], unit: mm}}
                          ^
    write more than zero, such as '15 min'
)");
    CHECK(problems(with_storm("{continue_for: 2, steps: {every: 1 h, depths: [1], unit: mm}}")) ==
          R"(lane.yaml:1:23: error: continue_for: '2' has no unit
    storm: {continue_for: 2, steps: {every: 1 h, depths: [1], unit: mm}}
                          ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
)");
    CHECK(
        problems(
            with_storm("{continue_for: 1e9 h, steps: {every: 1 min, depths: [1], unit: mm}}")) ==
        R"(lane.yaml:1:23: error: continue_for: 1e9 h would append more than a million steps as long as the last
    storm: {continue_for: 1e9 h, steps: {every: 1 min, depths: [1], unit: mm}}
                          ^
    shorten it; draining takes hours, seldom days
)");
}

TEST_CASE("a hyetograph file is named and described") {
    CHECK(problems(with_storm("{hyetograph: no_such_rain.csv}")) ==
          R"(lane.yaml:1:21: error: cannot read 'no_such_rain.csv': No such file or directory
    storm: {hyetograph: no_such_rain.csv}
                        ^
    file names are relative to the scenario's folder
)");
    CHECK(problems(with_storm(R"({hyetograph: ""})")) ==
          R"(lane.yaml:1:21: error: the file name is empty
    storm: {hyetograph: ""}
                        ^
    write a file name, such as 'hyetograph: rain.csv'
)");
    CHECK(problems(with_storm("{hyetograph: [a]}")) ==
          R"(lane.yaml:1:21: error: 'hyetograph' takes a single value, not a list
    storm: {hyetograph: [a]}
                        ^
    write a file name, such as 'hyetograph: rain.csv'
)");
    CHECK(problems(with_storm("{hyetograph: {unit: mm}}")) ==
          R"(lane.yaml:1:9: error: 'file' is missing from hyetograph
    storm: {hyetograph: {unit: mm}}
            ^
    add 'file: rain.csv'
)");
    CHECK(
        problems(with_storm(
            "{hyetograph: {file: no_such_rain.csv, unit: furlong, time_unit: mm, kind: total, "
            "stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , column: P}}")) ==
        R"(lane.yaml:1:28: error: cannot read 'no_such_rain.csv': No such file or directory
    storm: {hyetograph: {file: no_such_rain.csv, unit: furlong, time_unit: mm, kind: total, stamp: m...
                               ^
    file names are relative to the scenario's folder
lane.yaml:1:52: error: unit: 'furlong' is not a unit here
    ...rm: {hyetograph: {file: no_such_rain.csv, unit: furlong, time_unit: mm, kind: total, stamp: midd...
                                                       ^
    write a unit such as 'mm', 'in', 'mm/h' or 'in/h'
lane.yaml:1:72: error: time_unit: 'mm' is not a unit here
    ...le: no_such_rain.csv, unit: furlong, time_unit: mm, kind: total, stamp: middle, every: 5, zone: ...
                                                       ^
    write a unit such as 's', 'min' or 'h'
lane.yaml:1:82: error: kind: 'total' is not a choice here
    ...h_rain.csv, unit: furlong, time_unit: mm, kind: total, stamp: middle, every: 5, zone: Middle/Now...
                                                       ^
    known here: depth, intensity, cumulative
lane.yaml:1:96: error: stamp: 'middle' is not a choice here
    ...it: furlong, time_unit: mm, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: we...
                                                       ^
    known here: start, end
lane.yaml:1:111: error: every: '5' has no unit
    ...me_unit: mm, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , c...
                                                       ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
lane.yaml:1:120: error: zone: 'Middle/Nowhere' is not in the time zone database
    ...mm, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , column: P}...
                                                       ^
    write a zone by its place, such as 'Europe/Madrid'
lane.yaml:1:142: error: gaps: 'wet' is not a choice here
    ...m, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , column: P}}
                                                                            ^
    write 'dry'
lane.yaml:1:147: error: 'missing' is empty
    ...m, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , column: P}}
                                                                                 ^
    write the text that marks a missing value, such as -999
lane.yaml:1:158: error: unknown key 'column' in hyetograph
    ...m, kind: total, stamp: middle, every: 5, zone: Middle/Nowhere, gaps: wet, missing: , column: P}}
                                                                                            ^
    here it is called 'rain'
)");
    CHECK(
        problems(with_storm("{hyetograph: {file: no_such_rain.csv, unit: mm, kind: intensity}}")) ==
        R"(lane.yaml:1:28: error: cannot read 'no_such_rain.csv': No such file or directory
    storm: {hyetograph: {file: no_such_rain.csv, unit: mm, kind: intensity}}
                               ^
    file names are relative to the scenario's folder
lane.yaml:1:52: error: unit: 'mm' does not go with 'kind: intensity'
    storm: {hyetograph: {file: no_such_rain.csv, unit: mm, kind: intensity}}
                                                       ^
    an intensity takes a unit such as 'mm/h'
)");
    CHECK(problems(with_storm("{hyetograph: {file: no_such_rain.csv, unit: mm/h, kind: depth}}")) ==
          R"(lane.yaml:1:28: error: cannot read 'no_such_rain.csv': No such file or directory
    storm: {hyetograph: {file: no_such_rain.csv, unit: mm/h, kind: depth}}
                               ^
    file names are relative to the scenario's folder
lane.yaml:1:52: error: unit: 'mm/h' does not go with 'kind: depth'
    storm: {hyetograph: {file: no_such_rain.csv, unit: mm/h, kind: depth}}
                                                       ^
    a depth takes a unit such as 'mm'
)");
}

}  // namespace rainledger
