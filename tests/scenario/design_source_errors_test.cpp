#include <string>

#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("patterns are found by their other names") {
    const StormRoom room;
    CHECK(room.design_problems("pattern: chicago, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'chicago' is not a choice here
    storm: {design: {pattern: chicago, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    here it is called 'keifer_chu'
)");
    CHECK(
        room.design_problems("pattern: rectangular, duration: 2 h, every: 15 min, depth: 62 mm") ==
        R"(lane.yaml:1:27: error: pattern: 'rectangular' is not a choice here
    storm: {design: {pattern: rectangular, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    here it is called 'uniform'
)");
    CHECK(room.design_problems("pattern: scs_ii, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'scs_ii' is a curve of the pattern mass_curve
    storm: {design: {pattern: scs_ii, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: nrcs_II'
)");
    CHECK(room.design_problems("pattern: Type-IA, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'Type-IA' is a curve of the pattern mass_curve
    storm: {design: {pattern: Type-IA, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: nrcs_IA'
)");
    CHECK(room.design_problems("pattern: nrcs_2, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'nrcs_2' is a curve of the pattern mass_curve
    storm: {design: {pattern: nrcs_2, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: nrcs_II'
)");
    CHECK(room.design_problems("pattern: SCS, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'SCS' is a curve of the pattern mass_curve
    storm: {design: {pattern: SCS, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: nrcs_II', or nrcs_I, nrcs_IA, nrcs_III
)");
    CHECK(
        room.design_problems(
            "pattern: SCS type III 24-hr, duration: 2 h, every: 15 min, depth: 62 mm") ==
        R"(lane.yaml:1:27: error: pattern: 'SCS type III 24-hr' is a curve of the pattern mass_curve
    storm: {design: {pattern: SCS type III 24-hr, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: nrcs_III'
)");
    CHECK(room.design_problems("pattern: huff, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'huff' is a curve of the pattern mass_curve
    storm: {design: {pattern: huff, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: huff_1', or huff_2, huff_3, huff_4
)");
    CHECK(room.design_problems("pattern: huff_q2, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'huff_q2' is a curve of the pattern mass_curve
    storm: {design: {pattern: huff_q2, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'pattern: mass_curve' with 'curve: huff_2'
)");
    CHECK(room.design_problems("pattern: type, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'type' is not a choice here
    storm: {design: {pattern: type, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    known here: uniform, triangular, alternating_blocks, keifer_chu, mass_curve
)");
    CHECK(room.design_problems("pattern: type_x, duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: pattern: 'type_x' is not a choice here
    storm: {design: {pattern: type_x, duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    known here: uniform, triangular, alternating_blocks, keifer_chu, mass_curve
)");
    CHECK(room.design_problems("pattern: [uniform], duration: 2 h, every: 15 min, depth: 62 mm") ==
          R"(lane.yaml:1:27: error: 'pattern' takes a single value, not a list
    storm: {design: {pattern: [uniform], duration: 2 h, every: 15 min, depth: 62 mm}}
                              ^
    write 'uniform' or 'triangular' or 'alternating_blocks' or 'keifer_chu' or 'mass_curve'
)");
}

TEST_CASE("listed depths rise with their durations") {
    const StormRoom room;
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, depths: {5 min: "
                               "9.8 mm, 10 min: 15 mm, 10 min: 16 mm, 600 s: 17 mm, 20 min: 12 mm, "
                               "30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, -1 h: 30 mm}") ==
          R"(lane.yaml:1:105: error: '10 min' is given twice in depths
    ... 15 min, depths: {5 min: 9.8 mm, 10 min: 15 mm, 10 min: 16 mm, 600 s: 17 mm, 20 min: 12 mm, 30: ...
                                                       ^
    keep one of them; the other is on line 1
lane.yaml:1:120: error: depths: '600 s' is no longer than the duration before
    ...: {5 min: 9.8 mm, 10 min: 15 mm, 10 min: 16 mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: ...
                                                       ^
    list the durations from the shortest to the longest, each once
lane.yaml:1:142: error: depths, 20 min: '12 mm' is less than in the shorter duration before
    ...in: 15 mm, 10 min: 16 mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min:...
                                                       ^
    more time holds no less rain: check both depths and their units
lane.yaml:1:149: error: depths: '30' has no unit
    ...mm, 10 min: 16 mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, ...
                                                       ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
lane.yaml:1:168: error: depths, 40 min: '20' has no unit
    ... mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, -1 h: 30 mm}}}
                                                            ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
lane.yaml:1:172: error: a key in depths is not a plain word
    ... mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, -1 h: 30 mm}}}
                                                                ^
    write 'key: value', one to a line
lane.yaml:1:191: error: depths, 50 min: '0 mm' is not above zero
    ... mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, -1 h: 30 mm}}}
                                                                                   ^
    write more than zero, such as '12.5 mm'
lane.yaml:1:197: error: depths: '-1 h' is not above zero
    ... mm, 600 s: 17 mm, 20 min: 12 mm, 30: 20 mm, 40 min: 20, [a]: 3 mm, 50 min: 0 mm, -1 h: 30 mm}}}
                                                                                         ^
    write more than zero, such as '15 min'
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, depths: {}") ==
          R"(lane.yaml:1:74: error: 'depths' holds no entries
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, depths: {}}}
                                                                             ^
    write 'depths: {5 min: 9.8 mm, 1 h: 41 mm}', rising
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, depths: [5, 6]") ==
          R"(lane.yaml:1:74: error: a map of durations to depths belongs here, not a list
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, depths: [5, 6]}}
                                                                             ^
    write 'depths: {5 min: 9.8 mm, 1 h: 41 mm}', rising
)");
}

TEST_CASE("the constants of a formula are checked") {
    const StormRoom room;
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, "
                               "m: 0, n: -1, time: d, c: 3}") ==
          R"(lane.yaml:1:66: error: 'b' is missing from formula
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                         ^
    add 'b: 13.9'
lane.yaml:1:79: error: a: '36' has no unit
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                                      ^
    write a number with a unit, such as '3.4 mm/h' (units: mm/h, in/h, in/hr, cm/h, mm/min, um/s and the like)
lane.yaml:1:86: error: m: '0' is not above zero
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                                             ^
    write a plain number above zero, such as 0.97
lane.yaml:1:92: error: n: '-1' is below zero
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                                                   ^
    write a plain number above zero, such as 0.97
lane.yaml:1:102: error: time: 'd' is not a choice here
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                                                             ^
    known here: s, min, h
lane.yaml:1:105: error: unknown key 'c' in formula
    ... {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36, m: 0, n: -1, time: d, c: 3}}}
                                                                                                ^
    known here: a, b, m, n, time
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 0 "
                               "mm/h, b: x, units: min}") ==
          R"(lane.yaml:1:79: error: a: '0 mm/h' is not above zero
    ...esign: {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 0 mm/h, b: x, units: min}}}
                                                                            ^
    write more than zero, such as '3.4 mm/h'
lane.yaml:1:90: error: b: 'x' is not a number
    ...esign: {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 0 mm/h, b: x, units: min}}}
                                                                                       ^
    write a plain number, such as 13.9
lane.yaml:1:93: error: unknown key 'units' in formula
    ...esign: {pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 0 mm/h, b: x, units: min}}}
                                                                                          ^
    here it is called 'time'
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, formula: {a: 36 "
                               "mm/h, b: -1e13, m: 1e13, time: min}") ==
          R"(lane.yaml:1:91: error: b: '-1e13' is too large to compute with
    ...rn: uniform, duration: 2 h, every: 15 min, formula: {a: 36 mm/h, b: -1e13, m: 1e13, time: min}}}
                                                                           ^
    write a plain number, such as 13.9
lane.yaml:1:101: error: m: '1e13' is too large to compute with
    ...rn: uniform, duration: 2 h, every: 15 min, formula: {a: 36 mm/h, b: -1e13, m: 1e13, time: min}}}
                                                                                     ^
    write a plain number above zero, such as 0.97
)");
    CHECK(room.design_problems("pattern: uniform, duration: 2 h, every: 15 min, formula: 96.6") ==
          R"(lane.yaml:1:75: error: a map belongs here, not '96.6'
    storm: {design: {pattern: uniform, duration: 2 h, every: 15 min, formula: 96.6}}
                                                                              ^
    write 'formula: {a: 96.6 in/h, b: 13.9, m: 0.97, n: 1, time: min}' for a / (t^m + b)^n
)");
}

TEST_CASE("a mass curve is named or runs from [0, 0] to [1, 1]") {
    const StormRoom room;
    CHECK(
        room.design_problems("pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm") ==
        R"(lane.yaml:1:9: error: 'curve' is missing from design
    storm: {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm}}
            ^
    add 'curve: nrcs_II'
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nrcs_2") ==
          R"(lane.yaml:1:91: error: curve: 'nrcs_2' is not a curve here
    ...orm: {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nrcs_2}}
                                                                                               ^
    write 'curve: nrcs_II'
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nothing") ==
          R"(lane.yaml:1:91: error: curve: 'nothing' is not a curve here
    ...rm: {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: nothing}}
                                                                                              ^
    known here: nrcs_I, nrcs_IA, nrcs_II, nrcs_III, huff_1, huff_2, huff_3, huff_4
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: {a: b}") ==
          R"(lane.yaml:1:91: error: 'curve' takes a name or a list of points, not a map
    ...orm: {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: {a: b}}}
                                                                                               ^
    write a name such as 'curve: nrcs_II', or points as shares of the duration and the depth: 'curve: [[0, 0], [0.25, 0.1], [1, 1]]'
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: []") ==
          R"(lane.yaml:1:91: error: 'curve' holds no entries
    storm: {design: {pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: []}}
                                                                                              ^
    write a name such as 'curve: nrcs_II', or points as shares of the duration and the depth: 'curve: [[0, 0], [0.25, 0.1], [1, 1]]'
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0.1], "
              "[0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]") ==
          R"(lane.yaml:1:92: error: curve, entry 1: a mass curve begins at [0, 0]
    ...ion: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0...
                                                       ^
    points run from [0, 0] to [1, 1], times rising, depths not falling
lane.yaml:1:114: error: curve, entry 3: the time is not after that of the point before
    ...in, depth: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1,...
                                                       ^
    points run from [0, 0] to [1, 1], times rising, depths not falling
lane.yaml:1:126: error: curve, entry 4: the depth falls; a mass curve only rises
    ...h: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]}}
                                                           ^
    points run from [0, 0] to [1, 1], times rising, depths not falling
lane.yaml:1:138: error: curve, entry 5: a point has two numbers, not 1
    ...h: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]}}
                                                                       ^
    write a time and a depth as shares, such as [0.25, 0.1]
lane.yaml:1:145: error: a point of two numbers belongs here, not '3'
    ...h: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]}}
                                                                              ^
    write a time and a depth as shares, such as [0.25, 0.1]
lane.yaml:1:149: error: curve, entry 7: '50 %' has a unit where a plain number belongs
    ...h: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]}}
                                                                                  ^
    write 0.50
lane.yaml:1:155: error: curve, entry 7: 'x' is not a number
    ...h: 62 mm, curve: [[0, 0.1], [0.5, 0.3], [0.4, 0.5], [0.6, 0.2], [0.7], 3, [50 %, x], [1, 0.9]]}}
                                                                                        ^
    write a plain number from 0 to 1, such as 0.2
)");
    CHECK(room.design_problems("pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, "
                               "curve: [[0, 0], [0.5, 0.3], [1, 0.9]], interpolate: linar") ==
          R"(lane.yaml:1:91: error: curve: the last point is not [1, 1]
    ...tion: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0], [0.5, 0.3], [1, 0.9]], interpolate: lin...
                                                       ^
    at the end of the duration all of the depth has fallen: add [1, 1]
lane.yaml:1:136: error: interpolate: 'linar' is not a choice here
    ...: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0], [0.5, 0.3], [1, 0.9]], interpolate: linar}}
                                                                                                ^
    did you mean 'linear'?
)");
    CHECK(room.design_problems("pattern: mass_curve, duration: 24 h, every: 15 min, depth: 62 mm, "
                               "curve: [[0, 0], [0.5, 0.3], [1, 1]], interpolate: spline") ==
          R"(lane.yaml:1:134: error: interpolate: 'spline' is not a choice here
    ...n: 24 h, every: 15 min, depth: 62 mm, curve: [[0, 0], [0.5, 0.3], [1, 1]], interpolate: spline}}
                                                                                               ^
    here it is called 'smooth'
)");
}

TEST_CASE("a published curve has its own durations") {
    const StormRoom room;
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 6 h, every: 15 min, depth: 62 mm, curve: nrcs_II") ==
          R"(lane.yaml:1:49: warning: the curve nrcs_II was made for storms of 24 h, not 6 h
    storm: {design: {pattern: mass_curve, duration: 6 h, every: 15 min, depth: 62 mm, curve: nrcs_II...
                                                    ^
    shortened or stretched it keeps its shares, not the intensities that it was drawn from: take a duration that it was made for, or another pattern
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 12 h, every: 15 min, depth: 62 mm, curve: huff_1") ==
          R"(lane.yaml:1:49: warning: the curve huff_1 was made for storms of up to 6 h, not 12 h
    storm: {design: {pattern: mass_curve, duration: 12 h, every: 15 min, depth: 62 mm, curve: huff_1...
                                                    ^
    shortened or stretched it keeps its shares, not the intensities that it was drawn from: take a duration that it was made for, or another pattern
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 4 h, every: 15 min, depth: 62 mm, curve: huff_2") ==
          R"(lane.yaml:1:49: warning: the curve huff_2 was made for storms of 6 h to 12 h, not 4 h
    storm: {design: {pattern: mass_curve, duration: 4 h, every: 15 min, depth: 62 mm, curve: huff_2}...
                                                    ^
    shortened or stretched it keeps its shares, not the intensities that it was drawn from: take a duration that it was made for, or another pattern
)");
    CHECK(room.design_problems(
              "pattern: mass_curve, duration: 12 h, every: 15 min, depth: 62 mm, curve: huff_4") ==
          R"(lane.yaml:1:49: warning: the curve huff_4 was made for storms of over 24 h, not 12 h
    storm: {design: {pattern: mass_curve, duration: 12 h, every: 15 min, depth: 62 mm, curve: huff_4...
                                                    ^
    shortened or stretched it keeps its shares, not the intensities that it was drawn from: take a duration that it was made for, or another pattern
)");
}

}  // namespace rainledger
