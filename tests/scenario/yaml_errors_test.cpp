#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("text that is not a scenario at all is said to be so") {
    CHECK(problems("") == R"(lane.yaml: error: the scenario is empty
    a scenario starts with 'storm:' and 'surfaces:', each a map of its own
)");
    CHECK(problems(R"(# only a comment
)") == R"(lane.yaml: error: the scenario is empty
    a scenario starts with 'storm:' and 'surfaces:', each a map of its own
)");
    CHECK(problems(R"(---
...
)") == R"(lane.yaml: error: the scenario is empty
    a scenario starts with 'storm:' and 'surfaces:', each a map of its own
)");
    CHECK(problems(R"(- a
- b
)") == R"(lane.yaml:1:1: error: a map belongs here, not a list
    - a
    ^
    a scenario starts with 'storm:' and 'surfaces:', each a map of its own
)");
    CHECK(problems(R"(rain
)") == R"(lane.yaml:1:1: error: a map belongs here, not 'rain'
    rain
    ^
    a scenario starts with 'storm:' and 'surfaces:', each a map of its own
)");
}

TEST_CASE("YAML that cannot be parsed is shown where it breaks") {
    CHECK(problems(R"(storm: [1,
)") == R"(lane.yaml:2:1: error: this cannot be read as YAML: a list opened with '[' is not closed
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(storm:
	steps: 1
)") == R"(lane.yaml:2:1: error: this cannot be read as YAML: a tab stands here; YAML takes spaces only
     steps: 1
    ^
    put spaces in place of the tabs before the text
)");
    CHECK(problems(R"(storm: 1
 steps: 2
)") == R"(lane.yaml:2:7: error: this cannot be read as YAML: this colon follows nothing that can be a key
     steps: 2
          ^
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(storm: 1: 2
)") == R"(lane.yaml:1:9: error: this cannot be read as YAML: this colon follows nothing that can be a key
    storm: 1: 2
            ^
    put the text after the first colon in quotes
)");
    CHECK(problems(R"(storm: *nowhere
)") == R"(lane.yaml:1:8: error: this cannot be read as YAML: '*' refers to a name that no '&' defines
    storm: *nowhere
           ^
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(storm: {a: 1}}
)") == R"(lane.yaml:1:14: error: this cannot be read as YAML: this closing bracket has no opening one
    storm: {a: 1}}
                 ^
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(storm: %
)") == R"(lane.yaml:1:8: error: this cannot be read as YAML: no value can begin with this character; put it in quotes
    storm: %
           ^
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(surfaces:
  - 1
 - 2
)") == R"(lane.yaml:3:2: error: this cannot be read as YAML: this line is not in line with the keys above it
     - 2
     ^
    look at the indentation, colons, quotes and brackets here and just before
)");
}

TEST_CASE("a second document is refused, and so is what cannot begin one") {
    CHECK(problems(R"(title: a
---
title: b
)") == R"(lane.yaml:2:1: error: a second document begins here; a scenario is one document
    ---
    ^
    give each scenario a file of its own
)");
    CHECK(problems(R"(, title: a
)") == R"(lane.yaml:1:1: error: this cannot be read as YAML: nothing of the kind can stand here
    , title: a
    ^
    look at the indentation, colons, quotes and brackets here and just before
)");
    CHECK(problems(R"(title: a
...
---
---
)") == R"(lane.yaml:3:1: error: a second document begins here; a scenario is one document
    ---
    ^
    give each scenario a file of its own
)");
}

TEST_CASE("keys are plain words, given once") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
title: a
title: b
)") == R"(lane.yaml:4:1: error: 'title' is given twice in the scenario
    title: b
    ^
    keep one of them; the other is on line 3
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
? [a]
: b
)") == R"(lane.yaml:3:3: error: a key in the scenario is not a plain word
    ? [a]
      ^
    write 'key: value', one to a line
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
? 
: b
)") == R"(lane.yaml:4:1: error: a key in the scenario is not a plain word
    : b
    ^
    write 'key: value', one to a line
)");
}

TEST_CASE("unknown keys name what was probably meant") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
titel: a
)") == R"(lane.yaml:3:1: error: unknown key 'titel' in the scenario
    titel: a
    ^
    did you mean 'title'?
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
catchments: {}
)") == R"(lane.yaml:2:1: error: unknown key 'catchments' in the scenario
    catchments: {}
    ^
    here it is called 'surfaces'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
idf: {}
)") == R"(lane.yaml:3:1: error: unknown key 'idf' in the scenario
    idf: {}
    ^
    known here: title, storm, storms, surfaces
)");
    CHECK(problems(R"(surfaces: {lot: {area: 1 ha, losses: impervious}}
rainfall: {}
)") == R"(lane.yaml:2:1: error: unknown key 'rainfall' in the scenario
    rainfall: {}
    ^
    here it is called 'storm'
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    outfall: CB-2
)")) == R"(lane.yaml:6:5: error: unknown key 'outfall' in surface 'lawn'
        outfall: CB-2
        ^
    here it is called 'drains_to'
)");
    CHECK(problems(with_surface(R"(    horton: {}
    losses: impervious
)")) == R"(lane.yaml:5:5: error: unknown key 'horton' in surface 'lawn'
        horton: {}
        ^
    it belongs under 'losses'
)");
    CHECK(problems(with_losses("{constant_rate: {rate: 3 mm/h, depression_storage: 2 mm}}")) ==
          R"(lane.yaml:5:44: error: unknown key 'depression_storage' in constant_rate
        losses: {constant_rate: {rate: 3 mm/h, depression_storage: 2 mm}}
                                               ^
    it belongs to a surface, beside its 'losses'
)");
    CHECK(problems(with_losses("{constant_rate: {rate: 3 mm/h, surfaces: 2}}")) ==
          R"(lane.yaml:5:44: error: unknown key 'surfaces' in constant_rate
        losses: {constant_rate: {rate: 3 mm/h, surfaces: 2}}
                                               ^
    it belongs to the top level of the scenario
)");
    CHECK(problems(with_losses("{horton: {f0: 50 mm/h, fc: 6 mm/h, k: 4.14 1/h}}")) ==
          R"(lane.yaml:5:23: error: unknown key 'f0' in horton
        losses: {horton: {f0: 50 mm/h, fc: 6 mm/h, k: 4.14 1/h}}
                          ^
    here it is called 'initial_capacity'
lane.yaml:5:36: error: unknown key 'fc' in horton
        losses: {horton: {f0: 50 mm/h, fc: 6 mm/h, k: 4.14 1/h}}
                                       ^
    here it is called 'final_capacity'
lane.yaml:5:48: error: unknown key 'k' in horton
        losses: {horton: {f0: 50 mm/h, fc: 6 mm/h, k: 4.14 1/h}}
                                                   ^
    here it is called 'decay'
)");
    CHECK(problems(with_losses("{green_ampt: {Ksat: 3 mm/h, psi: 110 mm, deficit: 0.2}}")) ==
          R"(lane.yaml:5:27: error: unknown key 'Ksat' in green_ampt
        losses: {green_ampt: {Ksat: 3 mm/h, psi: 110 mm, deficit: 0.2}}
                              ^
    here it is called 'effective_conductivity'
lane.yaml:5:41: error: unknown key 'psi' in green_ampt
        losses: {green_ampt: {Ksat: 3 mm/h, psi: 110 mm, deficit: 0.2}}
                                            ^
    here it is called 'wetting_front_suction'
lane.yaml:5:54: error: unknown key 'deficit' in green_ampt
        losses: {green_ampt: {Ksat: 3 mm/h, psi: 110 mm, deficit: 0.2}}
                                                         ^
    here it is called 'moisture_deficit'
)");
    CHECK(problems(with_losses("{green_ampt: {hydraulic-conductivity: 3 mm/h, suction: 110 mm, "
                               "moisture_deficit: 0.2}}")) ==
          R"(lane.yaml:5:27: error: unknown key 'hydraulic-conductivity' in green_ampt
        losses: {green_ampt: {hydraulic-conductivity: 3 mm/h, suction: 110 mm, moisture_deficit: 0.2...
                              ^
    here it is called 'effective_conductivity'
lane.yaml:5:59: error: unknown key 'suction' in green_ampt
    ...  losses: {green_ampt: {hydraulic-conductivity: 3 mm/h, suction: 110 mm, moisture_deficit: 0.2}}
                                                               ^
    here it is called 'wetting_front_suction'
)");
    CHECK(problems(with_losses("{curve_number: {CN: 80, lambda: 0.2, AMC: II}}")) ==
          R"(lane.yaml:5:29: error: unknown key 'CN' in curve_number
        losses: {curve_number: {CN: 80, lambda: 0.2, AMC: II}}
                                ^
    here it is called 'number'
lane.yaml:5:37: error: unknown key 'lambda' in curve_number
        losses: {curve_number: {CN: 80, lambda: 0.2, AMC: II}}
                                        ^
    here it is called 'initial_abstraction_ratio'
lane.yaml:5:50: error: unknown key 'AMC' in curve_number
        losses: {curve_number: {CN: 80, lambda: 0.2, AMC: II}}
                                                     ^
    here it is called 'antecedent'
)");
    CHECK(problems(with_losses("{cn: {number: 80}}")) ==
          R"(lane.yaml:5:14: error: unknown law 'cn' in the losses of surface 'lawn'
        losses: {cn: {number: 80}}
                 ^
    here it is called 'curve_number'
)");
}

TEST_CASE("values of the wrong kind say what belongs there") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: [lot]
)") == R"(lane.yaml:2:11: error: a map of surfaces belongs here, not a list
    surfaces: [lot]
              ^
    write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: impervious}'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: lot
)") == R"(lane.yaml:2:11: error: a map of surfaces belongs here, not 'lot'
    surfaces: lot
              ^
    write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: impervious}'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
)") == R"(lane.yaml:2:1: error: 'surfaces' is empty; a map of surfaces belongs here
    surfaces:
    ^
    write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: impervious}'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {}
)") == R"(lane.yaml:2:11: error: 'surfaces' names no surface
    surfaces: {}
              ^
    write 'surfaces:' with one name per surface, such as 'parking: {area: 0.48 ha, losses: impervious}'
)");
    CHECK(problems(R"(storm: rain.csv
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:8: error: a map belongs here, not 'rain.csv'
    storm: rain.csv
           ^
    write 'storm: {hyetograph: rain.csv}', or 'steps', 'design' or 'record' in its place
)");
    CHECK(problems(R"(storms: {}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:9: error: 'storms' names no storm
    storms: {}
            ^
    write 'storms:' with one name per storm, each with its own rain
)");
    CHECK(problems(R"(storms: [a]
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:9: error: a map of storms belongs here, not a list
    storms: [a]
            ^
    write 'storms:' with one name per storm, each with its own rain
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    interception: [1 mm]
)")) == R"(lane.yaml:6:19: error: 'interception' takes a single value, not a list
        interception: [1 mm]
                      ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    interception: {a: 1}
)")) == R"(lane.yaml:6:19: error: 'interception' takes a single value, not a map
        interception: {a: 1}
                      ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    interception:
)")) == R"(lane.yaml:6:5: error: 'interception' is empty
        interception:
        ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    interception: ~
)")) == R"(lane.yaml:6:5: error: 'interception' is empty
        interception: ~
        ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
title: [a]
)") == R"(lane.yaml:3:8: error: 'title' takes a single value, not a list
    title: [a]
           ^
    write a title, or take the key out
)");
}

}  // namespace rainledger
