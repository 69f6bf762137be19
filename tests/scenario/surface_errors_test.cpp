#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("names of surfaces are checked") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  site: {area: 1 ha, losses: impervious}
  a.b: {area: 1 ha, losses: impervious}
  "": {area: 1 ha, losses: impervious}
  "c,d": {area: 1 ha, losses: impervious}
)") == R"(lane.yaml:3:3: error: a surface cannot be called 'site'
      site: {area: 1 ha, losses: impervious}
      ^
    site, storm, storms and table have meanings of their own
lane.yaml:4:3: error: surface name 'a.b' holds a dot, comma or newline
      a.b: {area: 1 ha, losses: impervious}
      ^
    names stand in tables and paths: use words, '-' and '_'
lane.yaml:5:3: error: a surface's name is empty
      "": {area: 1 ha, losses: impervious}
      ^
    names stand in tables and paths: use words, '-' and '_'
lane.yaml:6:3: error: surface name 'c,d' holds a dot, comma or newline
      "c,d": {area: 1 ha, losses: impervious}
      ^
    names stand in tables and paths: use words, '-' and '_'
)");
}

TEST_CASE("an area must be there and above zero") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {losses: impervious}
)") == R"(lane.yaml:3:3: error: 'area' is missing from surface 'lawn'
      lawn: {losses: impervious}
      ^
    add 'area: 0.42 ha'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 0 m2, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '0 m2' is not above zero
      lawn: {area: 0 m2, losses: impervious}
                   ^
    write more than zero, such as '0.42 ha'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: -1 ha, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '-1 ha' is not above zero
      lawn: {area: -1 ha, losses: impervious}
                   ^
    write more than zero, such as '0.42 ha'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 1e-9 m2, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '1e-9 m2' is too small to compute with
      lawn: {area: 1e-9 m2, losses: impervious}
                   ^
    check the number and its unit
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 1600, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '1600' has no unit
      lawn: {area: 1600, losses: impervious}
                   ^
    write a number with a unit, such as '0.42 ha' (units: m2, ha, km2, ft2, ac, mi2)
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 3 mm, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: 'mm' is not a unit of area
      lawn: {area: 3 mm, losses: impervious}
                   ^
    write a number with a unit, such as '0.42 ha' (units: m2, ha, km2, ft2, ac, mi2)
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 1e200 ha, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '1e200 ha' is too large to compute with
      lawn: {area: 1e200 ha, losses: impervious}
                   ^
    check the number and its unit
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn: {area: 1 ha, interception: nan mm, losses: impervious}
)") == R"(lane.yaml:3:36: error: interception: 'nan mm' is not a depth
      lawn: {area: 1 ha, interception: nan mm, losses: impervious}
                                       ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  lawn:
)") == R"(lane.yaml:3:3: error: 'lawn' is empty; a map belongs here
      lawn:
      ^
    write its area and losses below its name, such as '{area: 0.48 ha, losses: impervious}'
)");
}

TEST_CASE("stores are depths of zero or more") {
    CHECK(problems(with_surface(R"(    losses: impervious
    interception: -1 mm
    depression_storage: 3
    ponded_water: hold
)")) == R"(lane.yaml:6:19: error: interception: '-1 mm' is below zero
        interception: -1 mm
                      ^
    write zero or more
lane.yaml:7:25: error: depression_storage: '3' has no unit
        depression_storage: 3
                            ^
    write a number with a unit, such as '12.5 mm' (units: mm, cm, m, in, ft)
lane.yaml:8:19: error: ponded_water: 'hold' is not a choice here
        ponded_water: hold
                      ^
    did you mean 'held'?
)");
}

TEST_CASE("drains_to is a name") {
    CHECK(problems(with_surface(R"(    losses: impervious
    drains_to:
)")) == R"(lane.yaml:6:5: error: 'drains_to' is empty
        drains_to:
        ^
    write the name of an inlet or outfall, such as 'drains_to: CB-2'
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    drains_to: ""
)")) == R"(lane.yaml:6:16: error: 'drains_to' is empty
        drains_to: ""
                   ^
    write the name of an inlet or outfall, such as 'drains_to: CB-2'
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    drains_to: "CB-1, CB-2"
)")) == R"(lane.yaml:6:16: error: drains_to: 'CB-1, CB-2' holds a comma or newline
        drains_to: "CB-1, CB-2"
                   ^
    write the name of an inlet or outfall, such as 'drains_to: CB-2'
)");
    CHECK(problems(with_surface(R"(    losses: impervious
    drains_to: [CB-1]
)")) == R"(lane.yaml:6:16: error: 'drains_to' takes a single value, not a list
        drains_to: [CB-1]
                   ^
    write the name of an inlet or outfall, such as 'drains_to: CB-2'
)");
}

TEST_CASE("losses must be there and be one law") {
    CHECK(problems(with_surface(R"(    drains_to: CB-2
)")) == R"(lane.yaml:3:3: error: 'losses' is missing from surface 'lawn'
      lawn:
      ^
    add 'losses: impervious'
)");
    CHECK(problems(with_losses("horton")) == R"(lane.yaml:5:13: error: 'horton' needs its parameters
        losses: horton
                ^
    write 'losses: {horton: {...}}' with the parameters inside
)");
    CHECK(problems(with_losses("imperviuos")) ==
          R"(lane.yaml:5:13: error: losses: 'imperviuos' is not a kind of losses
        losses: imperviuos
                ^
    did you mean 'impervious'?
)");
    CHECK(problems(with_losses("paved")) ==
          R"(lane.yaml:5:13: error: losses: 'paved' is not a kind of losses
        losses: paved
                ^
    here it is called 'impervious'
)");
    CHECK(problems(with_losses("[horton]")) ==
          R"(lane.yaml:5:13: error: 'losses' takes a word or a map of one law, not a list
        losses: [horton]
                ^
    write 'losses: impervious', or one law with its parameters, such as 'constant_rate: {rate: 7.5 mm/h}'
)");
    CHECK(problems(with_losses("{}")) ==
          R"(lane.yaml:5:13: error: the losses of surface 'lawn' name no law
        losses: {}
                ^
    write 'losses: impervious', or one law with its parameters, such as 'constant_rate: {rate: 7.5 mm/h}'
)");
    CHECK(problems(with_losses("~")) == R"(lane.yaml:5:5: error: 'losses' is empty
        losses: ~
        ^
    write 'losses: impervious', or one law with its parameters, such as 'constant_rate: {rate: 7.5 mm/h}'
)");
    CHECK(problems(with_losses("{impervious: {}}")) ==
          R"(lane.yaml:5:14: error: 'impervious' takes no parameters
        losses: {impervious: {}}
                 ^
    write 'losses: impervious'
)");
    CHECK(problems(with_losses("{hortn: {}}")) ==
          R"(lane.yaml:5:14: error: unknown law 'hortn' in the losses of surface 'lawn'
        losses: {hortn: {}}
                 ^
    did you mean 'horton'?
)");
    CHECK(
        problems(with_losses("{philip: {sorptivity: 3 mm/h^0.5, steady_term: 2 mm/h}, phi_index: "
                             "{observed_excess: 4 mm}}")) ==
        R"(lane.yaml:5:69: error: the losses of surface 'lawn' name more than one law: 'philip' and 'phi_index'
    ...ses: {philip: {sorptivity: 3 mm/h^0.5, steady_term: 2 mm/h}, phi_index: {observed_excess: 4 mm}}
                                                                    ^
    keep one; a surface with two soils is two surfaces
)");
    CHECK(problems(with_losses("{horton: }")) ==
          R"(lane.yaml:5:14: error: 'horton' is empty; a map belongs here
        losses: {horton: }
                 ^
    write 'horton: {initial_capacity: 50 mm/h, final_capacity: 6 mm/h, decay: 4.14 1/h}'
)");
    CHECK(problems(with_losses("{philip: 3}")) ==
          R"(lane.yaml:5:22: error: a map belongs here, not '3'
        losses: {philip: 3}
                         ^
    write 'philip: {sorptivity: 12 mm/h^0.5, steady_term: 4 mm/h}'
)");
}

TEST_CASE("a curve number holds the stores already") {
    CHECK(problems(with_surface(R"(    losses: {curve_number: {number: 80}}
    interception: 1 mm
    depression_storage: 2 mm
    ponded_water: held
)")) == R"(lane.yaml:6:5: error: 'interception' does not go with a curve number
        interception: 1 mm
        ^
    its initial abstraction Ia stands for interception, depression storage and early infiltration: take it out
lane.yaml:7:5: error: 'depression_storage' does not go with a curve number
        depression_storage: 2 mm
        ^
    its initial abstraction Ia stands for interception, depression storage and early infiltration: take it out
lane.yaml:8:5: error: 'ponded_water' does not go with a curve number
        ponded_water: held
        ^
    its initial abstraction Ia stands for interception, depression storage and early infiltration: take it out
)");
}

TEST_CASE("run-on names other surfaces and shares of one") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: lwan}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious, runs_onto: nowhere}
)") == R"(lane.yaml:3:54: error: runs_onto: there is no surface 'lwan'
      verge: {area: 1 ha, losses: impervious, runs_onto: lwan}
                                                         ^
    did you mean 'lawn'?
lane.yaml:5:53: error: runs_onto: there is no surface 'nowhere'
      yard: {area: 1 ha, losses: impervious, runs_onto: nowhere}
                                                        ^
    name another surface of this scenario
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: verge}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious}
)") == R"(lane.yaml:3:54: error: surface 'verge' runs onto itself
      verge: {area: 1 ha, losses: impervious, runs_onto: verge}
                                                         ^
    name another surface, or take runs_onto out
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 60 %, yard: 60 %}}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious}
)") == R"(lane.yaml:3:43: error: the shares of runs_onto sum to more than one
      verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 60 %, yard: 60 %}}
                                              ^
    what they leave of the excess goes to drains_to
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 0, yard: 120 %}}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious, runs_onto: {lawn: 5 mm}}
)") == R"(lane.yaml:3:61: error: a share of '0' is not above 0 and up to 1
      verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 0, yard: 120 %}}
                                                                ^
    write a share above 0 and up to 1, such as '0.3' or '30 %'
lane.yaml:3:70: error: a share of '120 %' is not above 0 and up to 1
      verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 0, yard: 120 %}}
                                                                         ^
    write a share above 0 and up to 1, such as '0.3' or '30 %'
lane.yaml:5:60: error: '5 mm' is not a share
      yard: {area: 1 ha, losses: impervious, runs_onto: {lawn: 5 mm}}
                                                               ^
    write a share above 0 and up to 1, such as '0.3' or '30 %'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 0.3, lawn: 0.2}}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious, runs_onto: {}}
)") == R"(lane.yaml:3:66: error: 'lawn' is given twice in runs_onto
      verge: {area: 1 ha, losses: impervious, runs_onto: {lawn: 0.3, lawn: 0.2}}
                                                                     ^
    keep one of them; the other is on line 3
lane.yaml:5:53: error: 'runs_onto' names no surface
      yard: {area: 1 ha, losses: impervious, runs_onto: {}}
                                                        ^
    write a surface's name, or shares such as 'runs_onto: {verge: 30 %}'
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: [lawn]}
  lawn: {area: 1 ha, losses: impervious}
  yard: {area: 1 ha, losses: impervious, runs_onto: }
)") == R"(lane.yaml:3:54: error: 'runs_onto' takes a name or a map, not a list
      verge: {area: 1 ha, losses: impervious, runs_onto: [lawn]}
                                                         ^
    write a surface's name, or shares such as 'runs_onto: {verge: 30 %}'
lane.yaml:5:42: error: 'runs_onto' is empty
      yard: {area: 1 ha, losses: impervious, runs_onto: }
                                             ^
    write a surface's name, or shares such as 'runs_onto: {verge: 30 %}'
)");
}

TEST_CASE("run-on in a loop names the loop in order, each once") {
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: lawn}
  lawn: {area: 1 ha, losses: impervious, runs_onto: verge}
  yard: {area: 1 ha, losses: impervious}
)") == R"(lane.yaml:4:53: error: run-on goes round in a loop: verge -> lawn -> verge
      lawn: {area: 1 ha, losses: impervious, runs_onto: verge}
                                                        ^
    take one runs_onto out; water must come to a place drained to
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  verge: {area: 1 ha, losses: impervious, runs_onto: lawn}
  lawn: {area: 1 ha, losses: impervious, runs_onto: yard}
  yard: {area: 1 ha, losses: impervious, runs_onto: {verge: 0.5}}
)") == R"(lane.yaml:5:54: error: run-on goes round in a loop: verge -> lawn -> yard -> verge
      yard: {area: 1 ha, losses: impervious, runs_onto: {verge: 0.5}}
                                                         ^
    take one runs_onto out; water must come to a place drained to
)");
    CHECK(problems(R"(storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces:
  a: {area: 1 ha, losses: impervious, runs_onto: b}
  b: {area: 1 ha, losses: impervious, runs_onto: a}
  c: {area: 1 ha, losses: impervious, runs_onto: d}
  d: {area: 1 ha, losses: impervious, runs_onto: c}
)") == R"(lane.yaml:4:50: error: run-on goes round in a loop: a -> b -> a
      b: {area: 1 ha, losses: impervious, runs_onto: a}
                                                     ^
    take one runs_onto out; water must come to a place drained to
lane.yaml:6:50: error: run-on goes round in a loop: c -> d -> c
      d: {area: 1 ha, losses: impervious, runs_onto: c}
                                                     ^
    take one runs_onto out; water must come to a place drained to
)");
}

}  // namespace rainledger
