#include <string>

#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("ten mistakes give ten located messages in one run") {
    const Outcome outcome = read_text_of_test(R"(titel: Quarry Row
storm:
  steps: {every: 5, depths: [0.4, -1], unit: mm}
surfaces:
  verge:
    area: 1600
    losses: {green_ampt: {ksat: 3 mm/h, suction_deficit: 20 mm}}
  lawn:
    area: 1 ha
    interception: -1 mm
    losses: {horton: {initial_capacity: 5 mm/h, final_capacity: 9 mm/h, decay: 4 1/h}}
    runs_onto: vrge
  yard:
    area: 1 ha
    interception: 2 mm
    losses: {curve_number: {number: 120}}
)");
    CHECK_FALSE(outcome.scenario);
    CHECK(outcome.errors == 10);
    std::string heads;
    for (std::size_t at = outcome.problems.find("lane.yaml:"); at != std::string::npos;
         at = outcome.problems.find("lane.yaml:", at + 1))
        heads += outcome.problems.substr(at, outcome.problems.find('\n', at) - at) + "\n";
    CHECK(heads == R"(lane.yaml:1:1: error: unknown key 'titel' in the scenario
lane.yaml:3:18: error: every: '5' has no unit
lane.yaml:3:35: error: depths, entry 2: '-1' is below zero
lane.yaml:6:11: error: area: '1600' has no unit
lane.yaml:7:27: error: unknown key 'ksat' in green_ampt
lane.yaml:10:19: error: interception: '-1 mm' is below zero
lane.yaml:11:65: error: final_capacity (9 mm/h) is above initial_capacity (5 mm/h)
lane.yaml:12:16: error: runs_onto: there is no surface 'vrge'
lane.yaml:15:5: error: 'interception' does not go with a curve number
lane.yaml:16:37: error: number: '120' is not above 0 and up to 100
)");
}

TEST_CASE("a long list of errors is cut short") {
    std::string depths = "[-1";
    for (int i = 0; i < 500; ++i)
        depths += ", -1";
    const Outcome outcome =
        read_text_of_test(with_storm("{steps: {every: 1 h, depths: " + depths + "], unit: mm}}"));
    CHECK(outcome.errors == 21);
    CHECK_THAT(outcome.problems,
               Contains("too many errors in 'depths'; the rest of it is not read"));
}

TEST_CASE("a long value is cut short in its message") {
    const std::string name(500, 'n');
    const std::string cut_name = "'" + std::string(60, 'n') + "...'";
    const std::string all = problems(
        kQuietStorm + "surfaces:\n  " + name + ":\n    losses: " + std::string(500, 'z') +
        "\n    runs_onto: " + std::string(500, 'r') + "\n    " + std::string(500, 'k') + ": 1\n");
    CHECK_THAT(all, Contains("error: 'area' is missing from surface " + cut_name + "\n"));
    CHECK_THAT(all, Contains("error: losses: '" + std::string(60, 'z') +
                             "...' is not a kind of losses\n"));
    CHECK_THAT(
        all, Contains("error: runs_onto: there is no surface '" + std::string(60, 'r') + "...'\n"));
    CHECK_THAT(all, Contains("error: unknown key '" + std::string(60, 'k') + "...' in surface " +
                             cut_name + "\n"));
    for (const char letter : {'n', 'z', 'r', 'k'})
        CHECK_THAT(all, !Contains(std::string(100, letter)));
}

TEST_CASE("a long loop names its first surfaces and its last") {
    std::string text = kQuietStorm + "surfaces:\n";
    for (int i = 0; i < 100; ++i)
        text += "  s" + std::to_string(i) + ": {area: 1 ha, losses: impervious, runs_onto: s" +
                std::to_string((i + 1) % 100) + "}\n";
    CHECK_THAT(problems(text),
               Contains("error: run-on goes round in a loop: s0 -> s1 -> s2 -> s3 -> s4 -> s5 -> "
                        "s6 -> s7 -> s8 -> s9 -> s10 -> s11 -> s12 -> s13 -> s14 -> s15 -> s16 -> "
                        "s17 -> s18 -> (80 more) -> s99 -> s0\n"));
}

TEST_CASE("a long line is not shown, its place is") {
    const std::string padding(5000, ' ');
    CHECK(problems(with_storm("{" + padding +
                              "dezign: {}, steps: {every: 1 h, depths: [1], unit: "
                              "mm}}")) ==
          "lane.yaml:1:5009: error: unknown key 'dezign' in the storm\n"
          "    did you mean 'design'?\n");
}

TEST_CASE("bytes that are no text are refused at their place") {
    const std::string hint = "    save the scenario as plain text in UTF-8\n";
    CHECK(problems(std::string("title: a\nb: \0 c\n", 16)) ==
          "lane.yaml:2:4: error: this is not UTF-8 text\n    b: ? c\n       ^\n" + hint);
    for (const char* bytes : {"\xff\xfe", "\xc3(", "\xc0\xaf", "\xe2\x82", "\xed\xa0\x80",
                              "\xe0\x80\x80", "\xf4\x90\x80\x80", "\xf0\x80\x80\x80", "\x80"})
        CHECK_THAT(problems(std::string("title: ") + bytes + "\n"),
                   Catch::Matchers::StartsWith("lane.yaml:1:8: error: this is not UTF-8 text"));
    CHECK(read_text_of_test("title: \xc3\xa9 \xe2\x82\xac \xf0\x9f\x8c\xa7\n" +
                            with_losses("impervious"))
              .scenario);
}

TEST_CASE("columns count bytes, and a byte-order mark is no column") {
    CHECK(problems("\xEF\xBB\xBF" + kQuietStorm +
                   "surfaces: {\xc3\xa9: {area: 1, losses: impervious}}\n") ==
          "lane.yaml:2:23: error: area: '1' has no unit\n"
          "    surfaces: {\xc3\xa9: {area: 1, losses: impervious}}\n"
          "                         ^\n"
          "    write a number with a unit, such as '0.42 ha' (units: m2, ha, km2, ft2, ac, mi2)\n");
}

TEST_CASE("an anchor used twice is read twice") {
    const Outcome outcome = read_text_of_test(
        kQuietStorm + "surfaces:\n  a: &kind {area: 1 ha, losses: impervious}\n  b: *kind\n");
    REQUIRE(outcome.scenario);
    CHECK(outcome.scenario->site.surfaces[1].name == "b");
    CHECK(outcome.scenario->places[1].surface.line == 4);
}

}  // namespace rainledger
