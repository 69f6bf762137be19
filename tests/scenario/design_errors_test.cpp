#include <string>

#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a design says its pattern, duration, step and depth") {
    const StormRoom room;
    CHECK(room.design_problems("") == R"(lane.yaml:1:9: error: 'pattern' is missing from design
    storm: {design: {}}
            ^
    add 'pattern: alternating_blocks'
lane.yaml:1:9: error: 'duration' is missing from design
    storm: {design: {}}
            ^
    add 'duration: 15 min'
lane.yaml:1:9: error: 'every' is missing from design
    storm: {design: {}}
            ^
    add 'every: 5 min'
lane.yaml:1:9: error: design has no depth of rain
    storm: {design: {}}
            ^
    add 'statistics: county_rain.csv' with 'return_period: 10 yr', or 'depth: 62 mm', or 'depths: {5 min: 9.8 mm, 1 h: 41 mm}', or 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, time: min}'
)");
    CHECK(room.design_problems(
              "pattern: alternating_block, duration: 24, every: 0.0001 s, depth: 62") ==
          R"(lane.yaml:1:27: error: pattern: 'alternating_block' is not a choice here
    storm: {design: {pattern: alternating_block, duration: 24, every: 0.0001 s, depth: 62}}
                              ^
    did you mean 'alternating_blocks'?
lane.yaml:1:56: error: duration: '24' has no unit
    storm: {design: {pattern: alternating_block, duration: 24, every: 0.0001 s, depth: 62}}
                                                           ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
lane.yaml:1:67: error: every: a step shorter than 1 ms cannot be computed
    storm: {design: {pattern: alternating_block, duration: 24, every: 0.0001 s, depth: 62}}
                                                                      ^
    check the number and its unit
lane.yaml:1:84: error: depth: '62' has no unit
    storm: {design: {pattern: alternating_block, duration: 24, every: 0.0001 s, depth: 62}}
                                                                                       ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(room.design_problems(
              "shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1") ==
          R"(lane.yaml:1:18: error: unknown key 'shape' in design
    storm: {design: {shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1}}
                     ^
    here it is called 'pattern'
lane.yaml:1:37: error: unknown key 'length' in design
    storm: {design: {shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1}}
                                        ^
    here it is called 'duration'
lane.yaml:1:50: error: unknown key 'dt' in design
    storm: {design: {shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1}}
                                                     ^
    here it is called 'every'
lane.yaml:1:62: error: unknown key 'total_depth' in design
    storm: {design: {shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1}}
                                                                 ^
    here it is called 'depth'
lane.yaml:1:81: error: unknown key 'chance' in design
    storm: {design: {shape: triangular, length: 2 h, dt: 15 min, total_depth: 3 mm, chance: 1}}
                                                                                    ^
    known here: pattern, duration, every, peak_at, curve, interpolate, return_period, statistics, depth, depths, formula
)");
    CHECK(room.problems(R"(storm: {design: 10 yr}
)") == R"(lane.yaml:1:17: error: a map belongs here, not '10 yr'
    storm: {design: 10 yr}
                    ^
    write 'design: {pattern: alternating_blocks, duration: 2 h, every: 5 min, return_period: 10 yr, statistics: county_rain.csv}'
)");
}

TEST_CASE("a design has one source of depth") {
    const StormRoom room;
    CHECK(
        room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                             "county.csv, depth: 5 mm, formula: {}") ==
        R"(lane.yaml:1:90: error: design takes one of 'statistics', 'depth', 'depths' or 'formula', not several
    ...ttern: uniform, duration: 2 h, every: 15 min, statistics: county.csv, depth: 5 mm, formula: {}}}
                                                                             ^
    keep the one that the storm is to follow
)");
    CHECK(
        room.design_problems(
            "pattern: alternating_blocks, duration: 2 h, every: 15 min, depth: 62 mm") ==
        R"(lane.yaml:1:77: error: alternating_blocks needs the depths of many durations, not one depth
    storm: {design: {pattern: alternating_blocks, duration: 2 h, every: 15 min, depth: 62 mm}}
                                                                                ^
    give 'statistics', 'depths' or 'formula'; a depth alone goes with uniform, triangular or mass_curve
)");
    CHECK(room.design_problems("pattern: keifer_chu, duration: 2 h, every: 15 min, statistics: "
                               "county.csv, return_period: 10 yr") ==
          R"(lane.yaml:1:69: error: keifer_chu needs an intensity formula, not 'statistics'
    ...attern: keifer_chu, duration: 2 h, every: 15 min, statistics: county.csv, return_period: 10 yr}}
                                                         ^
    give 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, time: min}'; 'rainledger storm TABLE.csv --fit-formula' fits one to a table
)");
}

TEST_CASE("keys of one pattern do not go with another") {
    const StormRoom room;
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, peak_at: 0.3, "
                               "depth: 62 mm, curve: nrcs_II, interpolate: smooth") ==
          R"(lane.yaml:1:66: error: 'peak_at' does not go with 'pattern: uniform'
    ...pattern: uniform, duration: 2 h, every: 15 min, peak_at: 0.3, depth: 62 mm, curve: nrcs_II, inte...
                                                       ^
    rain that never changes has no peak: take it out
lane.yaml:1:94: error: 'curve' does not go with 'pattern: uniform'
    ... duration: 2 h, every: 15 min, peak_at: 0.3, depth: 62 mm, curve: nrcs_II, interpolate: smooth}}
                                                                  ^
    take it out, or write 'pattern: mass_curve'
lane.yaml:1:110: error: 'interpolate' does not go with 'pattern: uniform'
    ... duration: 2 h, every: 15 min, peak_at: 0.3, depth: 62 mm, curve: nrcs_II, interpolate: smooth}}
                                                                                  ^
    it says how a mass curve runs between its points: take it out
)");
    CHECK(room.design_problems("pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, "
                               "curve: nrcs_II, peak_at: 0.5") ==
          R"(lane.yaml:1:100: error: 'peak_at' does not go with 'pattern: mass_curve'
    ...pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nrcs_II, peak_at: 0.5}}
                                                                                         ^
    the curve says where the peak is: take it out
)");
    CHECK(room.design_problems(
              "pattern: triangular, duration: 2 h, every: 15 min, depth: 62 mm, peak_at: 37.5 %") ==
          R"(lane.yaml:1:92: error: peak_at: '37.5 %' has a unit where a plain number belongs
    ...rm: {design: {pattern: triangular, duration: 2 h, every: 15 min, depth: 62 mm, peak_at: 37.5 %}}
                                                                                               ^
    write 0.375
)");
    CHECK(room.design_problems("pattern: triangular, duration: 2 h, every: 15 min, depth: 62 mm, "
                               "multiply_by: 1.2, tip: 0.2 mm") ==
          R"(lane.yaml:1:83: error: unknown key 'multiply_by' in design
    ...pattern: triangular, duration: 2 h, every: 15 min, depth: 62 mm, multiply_by: 1.2, tip: 0.2 mm}}
                                                                        ^
    it belongs to the storm
lane.yaml:1:101: error: unknown key 'tip' in design
    ...pattern: triangular, duration: 2 h, every: 15 min, depth: 62 mm, multiply_by: 1.2, tip: 0.2 mm}}
                                                                                          ^
    known here: pattern, duration, every, peak_at, curve, interpolate, return_period, statistics, depth, depths, formula
)");
}

TEST_CASE("a table of statistics needs a return period that it holds") {
    const StormRoom room;
    CHECK(room.design_problems(
              "pattern: uniform, duration: 2 h, every: 15 min, statistics: county.csv") ==
          R"(lane.yaml:1:78: error: the table holds several return periods, and none is chosen
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, statistics: county.csv}}
                                                                                 ^
    with 'return_period' choose one of 2 yr, 10 yr, 100 yr, or one between them
)");
    CHECK(
        room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                             "county.csv, return_period: 200 yr") ==
        R"(lane.yaml:1:105: error: a return period of 200 yr lies outside the table, which goes from 2 yr to 100 yr
    ...{pattern: uniform, duration: 2 h, every: 15 min, statistics: county.csv, return_period: 200 yr}}
                                                                                               ^
    choose one of 2 yr, 10 yr, 100 yr, or one between them
)");
    CHECK(
        room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                             "county.csv, return_period: 1 yr") ==
        R"(lane.yaml:1:105: error: a return period of 1 yr lies outside the table, which goes from 2 yr to 100 yr
    ...: {pattern: uniform, duration: 2 h, every: 15 min, statistics: county.csv, return_period: 1 yr}}
                                                                                                 ^
    choose one of 2 yr, 10 yr, 100 yr, or one between them
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                               "county.csv, return_period: 10") ==
          R"(lane.yaml:1:105: error: return_period: '10' has no unit
    ...gn: {pattern: uniform, duration: 2 h, every: 15 min, statistics: county.csv, return_period: 10}}
                                                                                                   ^
    write a number with a unit, such as '10 yr' (units: yr)
)");
    CHECK(room.design_problems(
              "pattern: uniform, duration: 2 h, every: 15 min, idf: county.csv, ari: 10 yr") ==
          R"(lane.yaml:1:66: error: unknown key 'idf' in design
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, idf: county.csv, ari: 10 yr}}
                                                                     ^
    here it is called 'statistics'
lane.yaml:1:83: error: unknown key 'ari' in design
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, idf: county.csv, ari: 10 yr}}
                                                                                      ^
    here it is called 'return_period'
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                               "list.csv, return_period: 10 yr") ==
          R"(lane.yaml:1:103: error: the table holds no return periods to choose from
    ...n: {pattern: uniform, duration: 2 h, every: 15 min, statistics: list.csv, return_period: 10 yr}}
                                                                                                ^
    leave the return period out
)");
    CHECK(
        room.design_problems(
            "pattern: uniform, duration: 2 h, every: 15 min, depth: 62 mm, return_period: 10 yr") ==
        R"(lane.yaml:1:80: error: 'return_period' picks a column of 'statistics'; it does not go with 'depth'
    ...: {design: {pattern: uniform, duration: 2 h, every: 15 min, depth: 62 mm, return_period: 10 yr}}
                                                                                 ^
    take it out: a title can say how rare the storm is
)");
}

TEST_CASE("a table of statistics is read with its own errors, once for all storms") {
    const StormRoom room;
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, statistics: "
                               "nowhere.csv, return_period: 10 yr") ==
          R"(lane.yaml:1:78: error: cannot read 'nowhere.csv': No such file or directory
    ...{pattern: uniform, duration: 2 h, every: 15 min, statistics: nowhere.csv, return_period: 10 yr}}
                                                                    ^
    file names are relative to the scenario's folder
)");
    CHECK(
        room.design_problems(
            R"(pattern: uniform, duration: 2 h, every: 15 min, statistics: "", return_period: 10 yr)") ==
        R"(lane.yaml:1:78: error: the file name is empty
    ...{design: {pattern: uniform, duration: 2 h, every: 15 min, statistics: "", return_period: 10 yr}}
                                                                             ^
    write a file name, such as 'statistics: county_rain.csv'
)");
    CHECK(room.problems(R"(storms:
  a: {design: {pattern: uniform, duration: 1 h, every: 5 min, statistics: falling.csv, return_period: 2 yr}}
  b: {design: {pattern: uniform, duration: 1 h, every: 5 min, statistics: falling.csv, return_period: 10 yr}}
)") == R"(falling.csv:3:10: error: depth falls with return period: 11 mm for 10 yr is less than 27.1 mm for 2 yr
    1 h,27.1,11
             ^
    rarer rain is deeper; check both values
falling.csv:3:10: error: depth falls with duration: 11 mm over 1 h is less rain than 12.5 mm over 5 min
    1 h,27.1,11
             ^
    a longer duration holds the shorter one; check both values
)");
}

TEST_CASE("durations and steps that the depths do not reach are refused where they stand") {
    const StormRoom room;
    CHECK(
        room.design_problems("pattern: alternating_blocks, duration: 48 h, every: 1 h, statistics: "
                             "county.csv, return_period: 10 yr") ==
        R"(lane.yaml:1:57: error: there is no depth for 2 d: the depths known here go from 5 min to 24 h
    ...design: {pattern: alternating_blocks, duration: 48 h, every: 1 h, statistics: county.csv, return...
                                                       ^
    choose a duration of no more than 24 h, add the depth to the table, or use a formula fitted to it, as 'rainledger storm TABLE --fit-formula' prints
)");
    CHECK(
        room.design_problems("pattern: alternating_blocks, duration: 2 h, every: 1 min, "
                             "statistics: county.csv, return_period: 10 yr") ==
        R"(lane.yaml:1:69: error: there is no depth for 1 min: the depths known here go from 5 min to 24 h
    ...tern: alternating_blocks, duration: 2 h, every: 1 min, statistics: county.csv, return_period: 10...
                                                       ^
    choose a step no shorter than 5 min, add the depth to the table, or use a formula fitted to it, as 'rainledger storm TABLE --fit-formula' prints
)");
    CHECK(
        room.design_problems("pattern: uniform, duration: 1 min, every: 1 min, depths: {5 min: 9.8 "
                             "mm, 10 min: 15 mm}") ==
        R"(lane.yaml:1:46: error: there is no depth for 1 min: the depths known here go from 5 min to 10 min
    storm: {design: {pattern: uniform, duration: 1 min, every: 1 min, depths: {5 min: 9.8 mm, 10 min...
                                                 ^
    choose a step no shorter than 5 min, add the depth to the table, or use a formula fitted to it, as 'rainledger storm TABLE --fit-formula' prints
)");
    CHECK(
        room.design_problems("pattern: triangular, duration: 10 min, every: 20 min, depth: 3 mm") ==
        R"(lane.yaml:1:64: error: the step of 20 min is longer than the storm of 10 min
    storm: {design: {pattern: triangular, duration: 10 min, every: 20 min, depth: 3 mm}}
                                                                   ^
    give a step that divides the duration
)");
    CHECK(room.design_problems("pattern: triangular, duration: 12 d, every: 1 s, depth: 3 mm") ==
          R"(lane.yaml:1:62: error: a storm of 12 d has more than a million steps of 1 s
    storm: {design: {pattern: triangular, duration: 12 d, every: 1 s, depth: 3 mm}}
                                                                 ^
    give a longer step
)");
    CHECK(room.design_problems("pattern: uniform, duration: 5 min, every: 10 min, formula: {a: 36 "
                               "mm/h, b: 0.2, time: h}") ==
          R"(lane.yaml:1:60: error: the step of 10 min is longer than the storm of 5 min
    ...ign: {pattern: uniform, duration: 5 min, every: 10 min, formula: {a: 36 mm/h, b: 0.2, time: h}}}
                                                       ^
    give a step that divides the duration
)");
    CHECK(
        room.design_problems("pattern: uniform, duration: 5 min, every: 1 min, formula: {a: 36 "
                             "mm/h, b: -0.2, time: h}") ==
        R"(lane.yaml:1:76: error: the formula gives no intensity at 5 min: t^m + b is not above zero there
    ...ign: {pattern: uniform, duration: 5 min, every: 1 min, formula: {a: 36 mm/h, b: -0.2, time: h}}}
                                                                       ^
    choose a longer step, or check b = -0.2
)");
    CHECK(
        room.design_problems("pattern: keifer_chu, duration: 2 h, every: 10 min, formula: {a: 36 "
                             "mm/h, b: 0, time: h}") ==
        R"(lane.yaml:1:78: error: with b of zero and m times n of 1 or more the formula's depth does not vanish with the duration, so that rain would fall in no time at the peak
    ...sign: {pattern: keifer_chu, duration: 2 h, every: 10 min, formula: {a: 36 mm/h, b: 0, time: h}}}
                                                                          ^
    fit the formula with b above zero
)");
}

TEST_CASE("steps that lose something are warned of") {
    const StormRoom room;
    CHECK(
        room.design_problems("pattern: alternating_blocks, duration: 10 min, every: 4 min, depths: "
                             "{4 min: 9.8 mm, 10 min: 15 mm}") ==
        R"(lane.yaml:1:72: warning: the step of 4 min does not divide the duration of 10 min; the last step is 2 min long
    ...rn: alternating_blocks, duration: 10 min, every: 4 min, depths: {4 min: 9.8 mm, 10 min: 15 mm}}}
                                                        ^
)");
    CHECK(
        room.design_problems("pattern: triangular, duration: 20 min, every: 10 min, depths: {4 "
                             "min: 9.8 mm, 20 min: 15 mm}") ==
        R"(lane.yaml:1:64: warning: the step of 10 min is longer than the shortest tabulated duration, 4 min, whose intensity the storm cannot show
    ... {pattern: triangular, duration: 20 min, every: 10 min, depths: {4 min: 9.8 mm, 20 min: 15 mm}}}
                                                       ^
)");
}

}  // namespace rainledger
