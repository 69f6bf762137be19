#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("names of surfaces and places hold nothing that acts instead of being shown") {
    CHECK(problems(kQuietStorm + R"(surfaces:
  "a\e[31mb": {area: 1 ha, losses: impervious}
  "c\u202ed": {area: 1 ha, losses: impervious, drains_to: "CB\x7f"}
)") == R"(lane.yaml:3:3: error: surface name 'a?[31mb' holds a character that is not shown
      "a\e[31mb": {area: 1 ha, losses: impervious}
      ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
lane.yaml:4:3: error: surface name 'c?d' holds a character that is not shown
      "c\u202ed": {area: 1 ha, losses: impervious, drains_to: "CB\x7f"}
      ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
lane.yaml:4:59: error: drains_to: 'CB?' holds a character that is not shown
      "c\u202ed": {area: 1 ha, losses: impervious, drains_to: "CB\x7f"}
                                                              ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
)");
    CHECK(problems(kQuietStorm + R"(surfaces:
  "a\x85b": {area: 1 ha, losses: impervious, drains_to: "CB\u2067"}
)") == R"(lane.yaml:3:3: error: surface name 'a?b' holds a character that is not shown
      "a\x85b": {area: 1 ha, losses: impervious, drains_to: "CB\u2067"}
      ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
lane.yaml:3:57: error: drains_to: 'CB?' holds a character that is not shown
      "a\x85b": {area: 1 ha, losses: impervious, drains_to: "CB\u2067"}
                                                            ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
)");
}

TEST_CASE("names are more than blanks") {
    CHECK(problems(kQuietStorm + R"(surfaces:
  "  ": {area: 1 ha, losses: impervious}
  lot: {area: 1 ha, losses: impervious, drains_to: " "}
)") == R"(lane.yaml:3:3: error: a surface's name is empty
      "  ": {area: 1 ha, losses: impervious}
      ^
    names stand in tables and paths: use words, '-' and '_'
lane.yaml:4:52: error: 'drains_to' is empty
      lot: {area: 1 ha, losses: impervious, drains_to: " "}
                                                       ^
    write the name of an inlet or outfall, such as 'drains_to: CB-2'
)");
}

TEST_CASE("titles and names of storms likewise") {
    CHECK(problems(R"(title: "x\u2028y"
storms:
  "a\tb": {steps: {every: 6 h, depths: [1], unit: mm}}
  " ": {steps: {every: 6 h, depths: [1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"(lane.yaml:1:8: error: title: 'x?y' holds a character that is not shown
    title: "x\u2028y"
           ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
lane.yaml:3:3: error: storm name 'a?b' holds a character that is not shown
      "a\tb": {steps: {every: 6 h, depths: [1], unit: mm}}
      ^
    control characters, line ends and marks of writing direction cannot stand in it: write it anew on one line
lane.yaml:4:3: error: a storm's name is empty
      " ": {steps: {every: 6 h, depths: [1], unit: mm}}
      ^
    names stand in tables and paths: use words, '-' and '_'
)");
    CHECK(problems(R"(title: "Se\u00f1al 10\u00a0mm"
storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
surfaces: {lot: {area: 1 ha, losses: impervious}}
)") == R"()");
}

}  // namespace rainledger
