#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a ratio of 0.05 asks which ratio the number was tabulated for") {
    CHECK(
        problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 0.05}}")) ==
        R"(lane.yaml:5:68: warning: a ratio of 0.05 without the ratio that the number was tabulated for
        losses: {curve_number: {number: 80, initial_abstraction_ratio: 0.05}}
                                                                       ^
    published tables are for 0.2: add 'tabulated_ratio: 0.2' to convert the number, or 'tabulated_ratio: 0.05' to say that it needs none
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 0.05, "
                               "tabulated_ratio: 0.05}}")) == R"()");
    CHECK(problems(with_losses("{curve_number: {number: 80, initial_abstraction_ratio: 0.05, "
                               "tabulated_ratio: 0.2}}")) == R"()");
}

TEST_CASE("implausible parameters are warned of and run") {
    CHECK(problems(with_losses("{horton: {initial_capacity: 5000 mm/h, final_capacity: 2000 mm/h, "
                               "decay: 2 1/min}}")) ==
          R"(lane.yaml:5:41: warning: initial_capacity is 5000 mm/h, above any soil (2000 mm/h)
        losses: {horton: {initial_capacity: 5000 mm/h, final_capacity: 2000 mm/h, decay: 2 1/min}}
                                            ^
    check the number and its unit
lane.yaml:5:86: warning: decay is 2 1/min, above 100 1/h
        losses: {horton: {initial_capacity: 5000 mm/h, final_capacity: 2000 mm/h, decay: 2 1/min}}
                                                                                         ^
    is it per minute? write it as it was published, such as '0.069 1/min'
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 m/h, "
                               "wetting_front_suction: 3 m, moisture_deficit: 0.7}}")) ==
          R"(lane.yaml:5:51: warning: effective_conductivity is 3 m/h, above any soil (2000 mm/h)
    ...  losses: {green_ampt: {effective_conductivity: 3 m/h, wetting_front_suction: 3 m, moisture_defi...
                                                       ^
    check the number and its unit
lane.yaml:5:81: warning: wetting_front_suction is 3 m, above 2000 mm
    ...{green_ampt: {effective_conductivity: 3 m/h, wetting_front_suction: 3 m, moisture_deficit: 0.7}}
                                                                           ^
    check the number and its unit
lane.yaml:5:104: warning: moisture_deficit is 0.7, above 0.6
    ...{green_ampt: {effective_conductivity: 3 m/h, wetting_front_suction: 3 m, moisture_deficit: 0.7}}
                                                                                                  ^
    a deficit is at most the porosity, about 0.5
lane.yaml:5:104: warning: a dry start: a moisture deficit of 0.7 is drier than field capacity in every texture class finer than loamy sand
    ...{green_ampt: {effective_conductivity: 3 m/h, wetting_front_suction: 3 m, moisture_deficit: 0.7}}
                                                                                                  ^
    porosity less 33 kPa water content, Rawls, Brakensiek and Saxton 1982, Trans. ASAE 25 (from memory)
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, "
                               "wetting_front_suction: 0.5 mm, moisture_deficit: 0.2}}")) ==
          R"(lane.yaml:5:82: warning: wetting_front_suction is 0.5 mm, under 1 mm
    ...en_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 0.5 mm, moisture_deficit: 0.2}}
                                                                        ^
    is it in another unit? Soils stand between 10 and 2000 mm
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, suction_deficit: 2.5 "
                               "m, storage_limit: 60 mm, barrier_rate: 2100 mm/h}}")) ==
          R"(lane.yaml:5:76: warning: suction_deficit is 2.5 m, above 2000 mm
    ...ffective_conductivity: 3 mm/h, suction_deficit: 2.5 m, storage_limit: 60 mm, barrier_rate: 2100 ...
                                                       ^
    check the number and its unit
lane.yaml:5:119: warning: barrier_rate is 2100 mm/h, above any soil (2000 mm/h)
    ...ve_conductivity: 3 mm/h, suction_deficit: 2.5 m, storage_limit: 60 mm, barrier_rate: 2100 mm/h}}
                                                                                            ^
    check the number and its unit
)");
    CHECK(problems(with_losses("{constant_rate: {rate: 80 in/h}}")) ==
          R"(lane.yaml:5:36: warning: rate is 80 in/h, above any soil (2000 mm/h)
        losses: {constant_rate: {rate: 80 in/h}}
                                       ^
    check the number and its unit
)");
    CHECK(problems(with_losses("{philip: {sorptivity: 3 mm/h^0.5, steady_term: 3000 mm/h}}")) ==
          R"(lane.yaml:5:60: warning: steady_term is 3000 mm/h, above any soil (2000 mm/h)
        losses: {philip: {sorptivity: 3 mm/h^0.5, steady_term: 3000 mm/h}}
                                                               ^
    check the number and its unit
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    interception: 26 mm
    depression_storage: 101 mm
)")) == R"(lane.yaml:6:19: warning: interception is 26 mm, above 25 mm
        interception: 26 mm
                      ^
    check the number and its unit
lane.yaml:7:25: warning: depression_storage is 101 mm, above 100 mm
        depression_storage: 101 mm
                            ^
    check the number and its unit
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 101 km2, losses: impervious}
)") == R"(lane.yaml:3:16: warning: area is 101 km2, above 100 km2
      lawn: {area: 101 km2, losses: impervious}
                   ^
    check the number and its unit
)");
    CHECK(problems(with_losses("{curve_number: {number: 39}}")) ==
          R"(lane.yaml:5:37: warning: a curve number of 39, under 40
        losses: {curve_number: {number: 39}}
                                        ^
    the method answers poorly there: look for measured losses instead
)");
}

TEST_CASE("a dry start is said to be one") {
    CHECK(
        problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: "
                             "110 mm, moisture_deficit: 0.3}}")) ==
        R"(lane.yaml:5:108: warning: a dry start: a moisture deficit of 0.3 is drier than field capacity in every texture class finer than loamy sand
    ...en_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 0.3}}
                                                                                                  ^
    porosity less 33 kPa water content, Rawls, Brakensiek and Saxton 1982, Trans. ASAE 25 (from memory)
)");
    CHECK(problems(with_losses("{green_ampt: {effective_conductivity: 3 mm/h, "
                               "wetting_front_suction: 110 mm, moisture_deficit: 0.25}}")) ==
          R"()");
    CHECK(problems(with_losses("{curve_number: {number: 80, antecedent: I}}")) ==
          R"(lane.yaml:5:53: warning: a dry start: antecedent condition I lowers the number
        losses: {curve_number: {number: 80, antecedent: I}}
                                                        ^
    designs start at II unless a dry start can be shown
)");
    CHECK(problems(with_losses("{curve_number: {number: 80, antecedent: III}}")) == R"()");
}

TEST_CASE("implausible rain is warned of and runs") {
    CHECK(problems(with_storm("{steps: {every: 1 min, depths: [40, 1], unit: mm}}")) ==
          R"(lane.yaml:1:1: warning: the largest intensity is 2400 mm/h, above 2000 mm/h
    storm: {steps: {every: 1 min, depths: [40, 1], unit: mm}}
    ^
    check the unit of the rain and the length of its steps
)");
    CHECK(problems(with_storm("{steps: {every: 2 h, depths: [1, 2001], unit: mm}}")) ==
          R"(lane.yaml:1:1: warning: the depth is 2002 mm, above 2000 mm
    storm: {steps: {every: 2 h, depths: [1, 2001], unit: mm}}
    ^
    check the unit of the rain, and that it is not cumulative
)");
}

TEST_CASE("a curve number in a storm under six hours") {
    CHECK(problems(R"(storms:
  long: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
  brief: {continue_for: 9 h, steps: {every: 10 min, depths: [1, 3, 1], unit: mm}}
  half: {steps: {every: 1.5 h, depths: [1, 3], unit: mm}}
surfaces:
  lawn: {area: 1 ha, losses: {curve_number: {number: 80}}}
)") == R"(lane.yaml:6:31: warning: surface 'lawn' has a curve number in a storm under 6 h: 'brief' (30 min), 'half' (3 h)
      lawn: {area: 1 ha, losses: {curve_number: {number: 80}}}
                                  ^
    the method was drawn from daily totals and says little about rates within a short storm
)");
}

TEST_CASE("run-on at more than twice the receiver's area") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 100 m2, losses: impervious}
  lot: {area: 100 m2, losses: impervious, runs_onto: verge}
  roof: {area: 101 m2, losses: impervious, runs_onto: verge}
)") == R"(lane.yaml:3:3: warning: surface 'verge' takes run-on from 2.01 times its own area, over 2:1
      verge: {area: 100 m2, losses: impervious}
      ^
    run-on is spread evenly here; in the field much of it would cross in a few paths
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 100 m2, losses: impervious}
  lot: {area: 200 m2, losses: impervious, runs_onto: verge}
)") == R"()");
}

TEST_CASE("a burst without the rain before it, where losses would meet it") {
    CHECK(problems(R"(storm: {steps: {every: 3 h, depths: [5, 10], unit: mm}}
surfaces:
  lawn: {area: 1 ha, losses: {constant_rate: {rate: 3 mm/h}}}
)") == R"(lane.yaml:1:1: warning: a burst without the rain before it: the first wet step has half the peak intensity or more
    storm: {steps: {every: 3 h, depths: [5, 10], unit: mm}}
    ^
    full initial losses meet the burst; give the whole storm, or start with smaller losses
)");
    CHECK(problems(R"(storms: {b: {steps: {every: 3 h, depths: [0, 10, 1], unit: mm}}}
surfaces:
  lot: {area: 1 ha, depression_storage: 1 mm, losses: impervious}
)") == R"(lane.yaml:1:10: warning: a burst without the rain before it: the first wet step of storm 'b' has half the peak intensity or more
    storms: {b: {steps: {every: 3 h, depths: [0, 10, 1], unit: mm}}}
             ^
    full initial losses meet the burst; give the whole storm, or start with smaller losses
)");
    CHECK(problems(R"(storm: {steps: {every: 3 h, depths: [5, 10], unit: mm}}
surfaces:
  lot: {area: 1 ha, losses: impervious}
)") == R"()");
    CHECK(problems(R"(storm: {steps: {every: 3 h, depths: [0, 10, 0], unit: mm}}
surfaces:
  lawn: {area: 1 ha, losses: {constant_rate: {rate: 3 mm/h}}}
)") == R"()");
    CHECK(problems(R"(storm: {steps: {every: 3 h, depths: [4.9, 10], unit: mm}}
surfaces:
  lawn: {area: 1 ha, losses: {constant_rate: {rate: 3 mm/h}}}
)") == R"()");
}

TEST_CASE("keys that change nothing, or likely mean another") {
    CHECK(problems(with_surface(R"(    losses: impervious
    ponded_water: held
)")) == R"(lane.yaml:6:5: warning: ponded_water changes nothing without depression_storage
        ponded_water: held
        ^
    add 'depression_storage: 4 mm', or take ponded_water out
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious}
  lot: {area: 1 ha, losses: impervious, drains_to: verge}
)") == R"(lane.yaml:4:3: warning: surface 'lot' drains to a place called like the surface 'verge'
      lot: {area: 1 ha, losses: impervious, drains_to: verge}
      ^
    to send its excess onto that surface write 'runs_onto: verge'
)");
}

}  // namespace rainledger
