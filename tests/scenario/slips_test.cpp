#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a tab in the indentation is named") {
    CHECK(problems(R"(storm:
  hyetograph: a.csv
	multiply_by: 2
)") == R"(lane.yaml:3:1: error: this cannot be read as YAML: a tab stands here; YAML takes spaces only
     multiply_by: 2
    ^
    put spaces in place of the tabs before the text
)");
    CHECK(problems(R"(surfaces:
  lawn:
  	area: 1 ha
)") == R"(lane.yaml:3:3: error: this cannot be read as YAML: a tab stands here; YAML takes spaces only
       area: 1 ha
      ^
    put spaces in place of the tabs before the text
)");
}

TEST_CASE("a blank that is missing after a colon is named where it is missing") {
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn:
    area:0.48 ha
    losses: impervious
)") == R"(lane.yaml:5:11: error: this cannot be read as YAML: this colon follows nothing that can be a key
        losses: impervious
              ^
    on line 4: write a blank after the colon: 'area: 0.48 ha'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn:
    area:0.48 ha

    # a note
    losses: impervious
)") == R"(lane.yaml:7:5: error: this cannot be read as YAML: this line is not in line with the keys above it
        losses: impervious
        ^
    on line 4: write a blank after the colon: 'area: 0.48 ha'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn:
    area:0.48 ha
)") == R"(lane.yaml:4:5: error: a map belongs here, not 'area:0.48 ha'
        area:0.48 ha
        ^
    write a blank after the colon: 'area: 0.48 ha'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn: {area:0.48 ha, losses: impervious}
)") == R"(lane.yaml:3:10: error: unknown key 'area:0.48 ha' in surface 'lawn'
      lawn: {area:0.48 ha, losses: impervious}
             ^
    write a blank after the colon: 'area: 0.48 ha'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  verge: {area: 1 ha, losses: impervious}
  lawn: {area: 1 ha, losses: impervious, runs_onto: {verge:30 %}}
)") == R"(lane.yaml:4:54: error: 'verge:30 %' is empty
      lawn: {area: 1 ha, losses: impervious, runs_onto: {verge:30 %}}
                                                         ^
    write a blank after the colon: 'verge: 30 %'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn: {area: 1 ha, losses: impervious, aera:3 ha}
)") == R"(lane.yaml:3:42: error: unknown key 'aera:3 ha' in surface 'lawn'
      lawn: {area: 1 ha, losses: impervious, aera:3 ha}
                                             ^
    write a blank after the colon: 'aera: 3 ha'
)");
}

TEST_CASE("a colon that is missing is named where it is missing") {
    CHECK(problems(kQuietStorm + R"(surfaces
  lawn:
    area: 1 ha
)") == R"(lane.yaml:3:7: error: this cannot be read as YAML: this colon follows nothing that can be a key
      lawn:
          ^
    on line 2: is a colon missing after 'surfaces'?
)");
    CHECK(problems(R"(title: Storm: 10 year
)") == R"(lane.yaml:1:13: error: this cannot be read as YAML: this colon follows nothing that can be a key
    title: Storm: 10 year
                ^
    put the text after the first colon in quotes
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  - a
  b: 1
)") == R"(lane.yaml:4:3: error: this cannot be read as YAML: this line is not in line with the keys above it
      b: 1
      ^
    look at the indentation, colons, quotes and brackets here and just before
)");
}

TEST_CASE("commas within numbers are named as such") {
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn: {area: 4,800 m2, losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '4' has no unit
      lawn: {area: 4,800 m2, losses: impervious}
                   ^
    write a number with a unit, such as '0.42 ha' (units: m2, ha, km2, ft2, ac, mi2)
lane.yaml:3:18: error: unknown key '800 m2' in surface 'lawn'
      lawn: {area: 4,800 m2, losses: impervious}
                     ^
    commas separate entries: write a decimal point, and no mark for thousands
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  lawn: {area: "4,800 m2", losses: impervious}
)") == R"(lane.yaml:3:16: error: area: '4,800 m2' is not one number
      lawn: {area: "4,800 m2", losses: impervious}
                   ^
    write a decimal point, and no mark for thousands
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  verge: {area: 1 ha, losses: impervious}
  lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 0,3}}
)") == R"(lane.yaml:4:61: error: a share of '0' is not above 0 and up to 1
      lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 0,3}}
                                                                ^
    write a share above 0 and up to 1, such as '0.3' or '30 %'
lane.yaml:4:63: error: '3' is empty
      lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 0,3}}
                                                                  ^
    commas separate entries: write a decimal point, and no mark for thousands
)");
    CHECK(
        problems(with_storm(R"({steps: {every: 1 h, depths: [1,2, 3,5, 9,8, 1, 1], unit: mm}})")) ==
        R"(lane.yaml:1:37: warning: commas separate entries: 1,2 are two entries
    storm: {steps: {every: 1 h, depths: [1,2, 3,5, 9,8, 1, 1], unit: mm}}
                                        ^
    write 1.2 for a decimal
)");
    CHECK(problems(with_storm(
              R"({steps: {every: 1 h, intensities: [1, 4.5,6.5, 13,2, 1, 1], unit: mm/h}})")) ==
          R"(lane.yaml:1:42: warning: commas separate entries: 13,2 are two entries
    storm: {steps: {every: 1 h, intensities: [1, 4.5,6.5, 13,2, 1, 1], unit: mm/h}}
                                             ^
    write 13.2 for a decimal
)");
    CHECK(problems(with_storm(R"({steps: {every: 1 h, depths: [1,2,3,9,2,1], unit: mm}})")) ==
          R"()");
    CHECK(problems(with_storm(R"({steps: {every: 1 h, depths: [1.5,2.5, 9], unit: mm}})")) ==
          R"()");
    CHECK(problems(with_storm(R"({steps: {every: 1 h, depths: [1,2, # two hours
  3,9, 
  2,1], unit: mm}})")) == R"()");
    CHECK(problems(R"(storm:
  steps:
    every: 1 h
    unit: mm
    depths:
      - 1
      - 9,2
      - 3
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:7:9: error: depths, entry 2: '9,2' is not one number
          - 9,2
            ^
    write a decimal point, and no mark for thousands
)");
}

TEST_CASE("a percentage where a fraction belongs, and the other way round") {
    CHECK(problems(kQuietStorm + R"(surfaces:
  verge: {area: 1 ha, losses: impervious}
  lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 30}}
)") == R"(lane.yaml:4:61: error: a share of '30' is not above 0 and up to 1
      lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 30}}
                                                                ^
    did you mean '30 %'? write a share above 0 and up to 1, such as '0.3' or '30 %'
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  verge: {area: 1 ha, losses: impervious}
  lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 1.5}}
)") == R"(lane.yaml:4:61: error: a share of '1.5' is not above 0 and up to 1
      lawn: {area: 1 ha, losses: impervious, runs_onto: {verge: 1.5}}
                                                                ^
    write a share above 0 and up to 1, such as '0.3' or '30 %'
)");
    CHECK(
        problems(with_losses(
            R"({green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 20}})")) ==
        R"(lane.yaml:5:108: error: moisture_deficit: '20' is not between 0 and 1
    ...een_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 20}}
                                                                                                   ^
    write 0.20
)");
    CHECK(
        problems(with_losses(
            R"({green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 30 %}})")) ==
        R"(lane.yaml:5:108: error: moisture_deficit: '30 %' has a unit where a plain number belongs
    ...n_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 30 %}}
                                                                                                 ^
    write 0.30
)");
    CHECK(
        problems(with_losses(
            R"({green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 12.5 %}})")) ==
        R"(lane.yaml:5:108: error: moisture_deficit: '12.5 %' has a unit where a plain number belongs
    ...ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 12.5 %}}
                                                                                               ^
    write 0.125
)");
    CHECK(
        problems(with_losses(
            R"({green_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 200}})")) ==
        R"(lane.yaml:5:108: error: moisture_deficit: '200' is not between 0 and 1
    ...en_ampt: {effective_conductivity: 3 mm/h, wetting_front_suction: 110 mm, moisture_deficit: 200}}
                                                                                                  ^
    write a plain number from 0 to 1, such as 0.2
)");
}

TEST_CASE("units spelled in another way name the one that was meant") {
    CHECK(problems(with_storm(R"({steps: {every: 1 h, depths: [1], unit: inches}})")) ==
          R"(lane.yaml:1:48: error: unit: 'inches' is not a unit of depth
    storm: {steps: {every: 1 h, depths: [1], unit: inches}}
                                                   ^
    did you mean 'in'? (units: mm, cm, m, in, ft)
)");
    CHECK(problems(with_storm(R"({steps: {every: 0:10, depths: [1], unit: mm}})")) ==
          R"(lane.yaml:1:24: error: every: '0:10' is not a time
    storm: {steps: {every: 0:10, depths: [1], unit: mm}}
                           ^
    write '10 min'
)");
    CHECK(problems(with_losses(R"({constant_rate: {rate: 3 mm/hour}})")) ==
          R"(lane.yaml:5:36: error: rate: 'mm/hour' is not a unit of rate
        losses: {constant_rate: {rate: 3 mm/hour}}
                                       ^
    did you mean 'mm/h'? (units: mm/h, in/h, in/hr, cm/h, mm/min, um/s and the like)
)");
}

TEST_CASE("tags are refused, but those that say no more than the text") {
    CHECK(problems(kQuietStorm + R"(surfaces: !x
  lot: {area: !!str 1 ha, losses: !!binary impervious}
!y title: !!python/object:os.x a
)") == R"(lane.yaml:2:11: error: tags are not used here
    surfaces: !x
              ^
    take out the word that begins with '!'
lane.yaml:3:35: error: tags are not used here
      lot: {area: !!str 1 ha, losses: !!binary impervious}
                                      ^
    take out the word that begins with '!'
lane.yaml:4:1: error: tags are not used here
    !y title: !!python/object:os.x a
    ^
    take out the word that begins with '!'
lane.yaml:4:11: error: tags are not used here
    !y title: !!python/object:os.x a
              ^
    take out the word that begins with '!'
)");
    CHECK(problems(kQuietStorm + R"(title: !!str 'a'
surfaces: !!map {lot: {area: '1 ha', losses: ! impervious}}
)") == R"()");
}

TEST_CASE("of two laws an empty one is no second error") {
    CHECK(
        problems(with_losses(R"({horton: , phi_index: {observed_excess: 4 mm}})")) ==
        R"(lane.yaml:5:24: error: the losses of surface 'lawn' name more than one law: 'horton' and 'phi_index'
        losses: {horton: , phi_index: {observed_excess: 4 mm}}
                           ^
    keep one; a surface with two soils is two surfaces
)");
}

TEST_CASE("a curve number is judged as it is used") {
    CHECK(problems(with_losses(R"({curve_number: {number: 50, antecedent: I}})")) ==
          R"(lane.yaml:5:37: warning: a curve number of 50, 31 for antecedent condition I, under 40
        losses: {curve_number: {number: 50, antecedent: I}}
                                        ^
    the method answers poorly there: look for measured losses instead
lane.yaml:5:53: warning: a dry start: antecedent condition I lowers the number
        losses: {curve_number: {number: 50, antecedent: I}}
                                                        ^
    designs start at II unless a dry start can be shown
)");
    CHECK(problems(with_losses(R"({curve_number: {number: 39, antecedent: III}})")) == R"()");
}

}  // namespace rainledger
