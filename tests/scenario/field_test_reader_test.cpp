#include <string>
#include <utility>

#include "folder.hpp"
#include "rainledger/scenario/field_test_file.hpp"
#include "scenario/read_text.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Catch::Matchers::EndsWith;
using Catch::Matchers::StartsWith;

/// A folder with readings, into which field tests are written.
class FieldTests {
public:
    FieldTests() { folder_.write("pit3.csv", kReadings); }

    [[nodiscard]] std::optional<FieldTestFile> read(const std::string& yaml) const {
        Diagnostics diagnostics;
        auto file = read_field_test_text(folder_.path("pit.yaml"), yaml, diagnostics);
        CHECK(diagnostics.list().empty());
        return file;
    }
    /// Every diagnostic as the user sees it who works in the folder.
    [[nodiscard]] std::string problems(std::string yaml) const {
        Diagnostics diagnostics;
        const auto file =
            read_field_test_text(folder_.path("pit.yaml"), std::move(yaml), diagnostics);
        CHECK(file.has_value() == !diagnostics.has_errors());
        std::string out;
        for (const Diagnostic& diagnostic : diagnostics.list())
            out += render(diagnostic);
        const std::string inside = folder_.path() + "/";
        for (std::size_t at = out.find(inside); at != std::string::npos; at = out.find(inside))
            out.erase(at, inside.size());
        return out;
    }
    [[nodiscard]] const std::string& path() const { return folder_.path(); }

    static constexpr const char* kReadings = "time [min],drop [mm]\n5,12\n10,8.5\n";

private:
    testing::Folder folder_;
};

const std::string kNamed = "readings: pit3.csv\n";

}  // namespace

TEST_CASE("a field test is read as it is written") {
    const FieldTests tests;
    const auto file = tests.read(R"(title: Quarry Row, pit 3
readings: pit3.csv
ring: {inner_diameter: 30 cm, outer_diameter: 600 mm}
laws: [philip, horton]
steady_rate: {fixed: 32 mm/h}
ignore_first: 15 min
design_factor: 2
)");
    REQUIRE(file);
    CHECK(file->title == "Quarry Row, pit 3");
    CHECK(file->readings == "pit3.csv");
    CHECK(file->readings_path == tests.path() + "/pit3.csv");
    CHECK(file->readings_text == FieldTests::kReadings);
    REQUIRE(file->ring);
    CHECK(file->ring->inner_mm == 300.0);
    CHECK(file->ring->outer_mm == 600.0);
    CHECK(file->laws == std::vector<std::string>{"philip", "horton"});
    CHECK(file->steady == SteadyWish::fixed);
    CHECK(file->fixed_rate_mm_per_h == 32.0);
    CHECK(file->ignore_first_h == 0.25);
    CHECK(file->ignore_first.line == 6);
    CHECK(file->design_factor == 2.0);
}

TEST_CASE("what a field test does not say has its default") {
    const FieldTests tests;
    const auto file = tests.read(kNamed);
    REQUIRE(file);
    CHECK(file->title == "pit.yaml");
    CHECK_FALSE(file->ring);
    CHECK(file->laws.empty());
    CHECK(file->steady == SteadyWish::fitted);
    CHECK(file->ignore_first_h == 0.0);
    CHECK(file->ignore_first.line == 0);
    CHECK(file->design_factor == 1.0);
    const auto single = tests.read(kNamed + "ring: {inner_diameter: 300 mm}\n");
    REQUIRE(single);
    CHECK_FALSE(single->ring->outer_mm);
    CHECK(tests.read(kNamed + "steady_rate: {from: tail}\n")->steady == SteadyWish::tail);
    CHECK(tests.read(kNamed + "steady_rate: {use: fitted}\n")->steady == SteadyWish::fitted);
    CHECK(tests.read(kNamed + "steady_rate: {fixed: 0 mm/h}\n")->fixed_rate_mm_per_h == 0.0);
}

TEST_CASE("every mistake of a field test is told, in the order in which it stands") {
    const FieldTests tests;
    CHECK(tests.problems(R"(titel: Quarry Row
readings: pit3.csv
rings: {inner_diameter: 300 mm}
laws: [horton, green-ampt, horton, mezencev, curve_number]
steady_rate: {use: tail}
ignore_first: 15
design_factor: 0.5
)") == R"(pit.yaml:1:1: error: unknown key 'titel' in the field test
    titel: Quarry Row
    ^
    did you mean 'title'?
pit.yaml:3:1: error: unknown key 'rings' in the field test
    rings: {inner_diameter: 300 mm}
    ^
    here it is called 'ring'
pit.yaml:4:16: error: laws, entry 2: 'green-ampt' is not a choice here
    laws: [horton, green-ampt, horton, mezencev, curve_number]
                   ^
    did you mean 'green_ampt'?
pit.yaml:4:28: error: laws, entry 3: 'horton' stands in the list before
    laws: [horton, green-ampt, horton, mezencev, curve_number]
                               ^
    name each law once
pit.yaml:4:36: error: laws, entry 4: 'mezencev' is not a choice here
    laws: [horton, green-ampt, horton, mezencev, curve_number]
                                       ^
    here it is called 'modified_kostiakov'
pit.yaml:4:46: error: laws, entry 5: 'curve_number' is not a choice here
    laws: [horton, green-ampt, horton, mezencev, curve_number]
                                                 ^
    known here: horton, green_ampt, philip, kostiakov, modified_kostiakov
pit.yaml:5:20: error: use: 'tail' is not a choice here
    steady_rate: {use: tail}
                       ^
    write 'steady_rate: {use: fitted}', '{fixed: 32 mm/h}' or '{from: tail}'
pit.yaml:6:15: error: ignore_first: '15' has no unit
    ignore_first: 15
                  ^
    write a number with a unit, such as '15 min' (units: s, min, h, hr, d)
pit.yaml:7:16: error: design_factor: '0.5' is below 1
    design_factor: 0.5
                   ^
    it divides every rate: write 1 or more, such as 2
)");
}

TEST_CASE("a field test without readings says so") {
    const FieldTests tests;
    CHECK(tests.problems("title: Quarry Row\n") ==
          R"(pit.yaml:1:1: error: 'readings' is missing from the field test
    title: Quarry Row
    ^
    add 'readings: pit3.csv'
)");
    CHECK(tests.problems("readings: pit4.csv\n") ==
          R"(pit.yaml:1:11: error: cannot read 'pit4.csv': No such file or directory
    readings: pit4.csv
              ^
    file names are relative to the field test's folder
)");
    CHECK(tests.problems("readings:\n") == R"(pit.yaml:1:1: error: 'readings' is empty
    readings:
    ^
    write a file name, such as 'readings: pit3.csv'
)");
    CHECK(tests.problems("") == R"(pit.yaml: error: the field test is empty
    a field test names its readings, as in 'readings: pit3.csv'
)");
    CHECK(tests.problems(kNamed + "---\n" + kNamed) ==
          R"(pit.yaml:2:1: error: a second document begins here; a field test is one document
    ---
    ^
    give each field test a file of its own
)");
    CHECK_THAT(tests.problems("readings: \xFF\n"),
               StartsWith("pit.yaml:1:11: error: this is not UTF-8 text\n") &&
                   EndsWith("    save the field test as plain text in UTF-8\n"));
}

TEST_CASE("rings that cannot be are told") {
    const FieldTests tests;
    CHECK(tests.problems(kNamed + "ring: {inner_diameter: 600 mm, outer_diameter: 300 mm}\n") ==
          R"(pit.yaml:2:48: error: outer_diameter: '300 mm' is not above the inner one, '600 mm'
    ring: {inner_diameter: 600 mm, outer_diameter: 300 mm}
                                                   ^
    a single ring has an inner_diameter alone
)");
    CHECK(tests.problems(kNamed + "ring: {diameter: 300 mm, title: x, use: fitted}\n") ==
          R"(pit.yaml:2:8: error: unknown key 'diameter' in ring
    ring: {diameter: 300 mm, title: x, use: fitted}
           ^
    here it is called 'inner_diameter'
pit.yaml:2:26: error: unknown key 'title' in ring
    ring: {diameter: 300 mm, title: x, use: fitted}
                             ^
    it belongs to the top level of the field test
pit.yaml:2:36: error: unknown key 'use' in ring
    ring: {diameter: 300 mm, title: x, use: fitted}
                                       ^
    it belongs under 'steady_rate'
)");
    CHECK(tests.problems(kNamed + "inner_diameter: 300 mm\n") ==
          R"(pit.yaml:2:1: error: unknown key 'inner_diameter' in the field test
    inner_diameter: 300 mm
    ^
    it belongs under 'ring'
)");
    CHECK(tests.problems(kNamed + "ring: 300 mm\n") ==
          R"(pit.yaml:2:7: error: a map belongs here, not '300 mm'
    ring: 300 mm
          ^
    write 'ring: {inner_diameter: 300 mm, outer_diameter: 600 mm}', or the inner one alone
)");
    CHECK(tests.problems(kNamed + "ring: {outer_diameter: 600 mm}\n") ==
          R"(pit.yaml:2:1: error: 'inner_diameter' is missing from ring
    ring: {outer_diameter: 600 mm}
    ^
    add 'inner_diameter: 300 mm'
)");
    CHECK(tests.problems(kNamed + "ring: {inner_diameter: 0 mm, outer_diameter: 0.6 mm}\n") ==
          R"(pit.yaml:2:24: error: inner_diameter: '0 mm' is not above zero
    ring: {inner_diameter: 0 mm, outer_diameter: 0.6 mm}
                           ^
    write more than zero, such as '12.5 mm'
pit.yaml:2:46: error: outer_diameter: '0.6 mm' is under 1 mm
    ring: {inner_diameter: 0 mm, outer_diameter: 0.6 mm}
                                                 ^
    check the number and its unit
)");
    CHECK(tests.problems(kNamed + "ring: {inner_diameter: 30 m}\n") ==
          R"(pit.yaml:2:24: warning: inner_diameter is 30 m, above 3 m
    ring: {inner_diameter: 30 m}
                           ^
    check the unit
)");
}

TEST_CASE("a steady rate says one thing") {
    const FieldTests tests;
    const std::string example =
        "    write 'steady_rate: {use: fitted}', '{fixed: 32 mm/h}' or '{from: tail}'\n";
    CHECK(tests.problems(kNamed + "steady_rate: {use: fitted, fixed: 32 mm/h}\n") ==
          R"(pit.yaml:2:28: error: steady_rate takes one of 'use', 'fixed' or 'from', not several
    steady_rate: {use: fitted, fixed: 32 mm/h}
                               ^
)" + example);
    CHECK(tests.problems(kNamed + "steady_rate: {}\n") ==
          R"(pit.yaml:2:1: error: steady_rate says nothing
    steady_rate: {}
    ^
)" + example);
    CHECK(tests.problems(kNamed + "steady_rate: tail\n") ==
          R"(pit.yaml:2:14: error: a map belongs here, not 'tail'
    steady_rate: tail
                 ^
)" + example);
    CHECK(tests.problems(kNamed + "steady_rate: {value: 32 mm/h}\n") ==
          R"(pit.yaml:2:15: error: unknown key 'value' in steady_rate
    steady_rate: {value: 32 mm/h}
                  ^
    here it is called 'fixed'
)");
    CHECK(tests.problems(kNamed + "steady_rate: {fixed: -1 mm/h}\n") ==
          R"(pit.yaml:2:22: error: fixed: '-1 mm/h' is below zero
    steady_rate: {fixed: -1 mm/h}
                         ^
    write zero or more
)");
}

TEST_CASE("laws and the design factor are checked") {
    const FieldTests tests;
    CHECK(tests.problems(kNamed + "laws: []\n") == R"(pit.yaml:2:7: error: 'laws' holds no entries
    laws: []
          ^
    write 'laws: [horton, green_ampt]', or take the key out
)");
    CHECK(tests.problems(kNamed + "laws: horton\n") ==
          R"(pit.yaml:2:7: error: a list belongs here, not 'horton'
    laws: horton
          ^
    write 'laws: [horton, green_ampt]', or take the key out
)");
    CHECK(tests.problems(kNamed + "safety_factor: 2\n") ==
          R"(pit.yaml:2:1: error: unknown key 'safety_factor' in the field test
    safety_factor: 2
    ^
    here it is called 'design_factor'
)");
    CHECK(tests.problems(kNamed + "design_factor: 200\n") ==
          R"(pit.yaml:2:16: warning: design_factor is 200, above 20
    design_factor: 200
                   ^
    factors of 2 to 10 are common
)");
}

TEST_CASE("a scenario and a field test are told apart") {
    const FieldTests tests;
    CHECK(tests.problems("title: Lane\n" + kQuietStorm + "surfaces: {}\n") ==
          R"(pit.yaml:2:1: error: this is a scenario, not a field test
    storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}
    ^
    'rainledger losses' reads it
)");
    CHECK_THAT(tests.problems(kQuietStorm), Contains("    'rainledger storm' reads it\n"));
    CHECK(problems("title: Quarry Row\nreadings: pit3.csv\nring: {inner_diameter: 300 mm}\n") ==
          R"(lane.yaml:2:1: error: this is a field test, not a scenario
    readings: pit3.csv
    ^
    'rainledger fit' reads it
)");
}

TEST_CASE("the parts of a fit's file are told where they belong in a scenario") {
    CHECK(problems(with_losses("impervious") + "losses: impervious\ndraws: {law: horton}\n") ==
          R"(lane.yaml:6:1: error: unknown key 'losses' in the scenario
    losses: impervious
    ^
    it belongs to a surface
lane.yaml:7:1: error: unknown key 'draws' in the scenario
    draws: {law: horton}
    ^
    it is for what-if runs, not for losses: leave it out
)");
}

TEST_CASE("a field test that breaks off anywhere is read or refused") {
    const FieldTests tests;
    const std::string whole = R"({title: "Quarry \u0052ow", readings: pit3.csv,
ring: {inner_diameter: 300 mm, outer_diameter: 60 cm}, laws: [horton, philip],
steady_rate: {fixed: 32 mm/h}, ignore_first: 5 min, design_factor: 1e0}
)";
    CHECK(tests.problems(whole).empty());
    for (std::size_t length = 0; length + 2 < whole.size(); ++length) {
        INFO(length);
        CHECK_THAT(tests.problems(whole.substr(0, length)), Contains("error: "));
    }
}

TEST_CASE("a field test that cannot be read is told by its path") {
    Diagnostics diagnostics;
    CHECK_FALSE(read_field_test_file("nowhere/pit.yaml", diagnostics));
    REQUIRE(diagnostics.list().size() == 1);
    CHECK(render(diagnostics.list().front()) ==
          "nowhere/pit.yaml: error: cannot read the field test: No such file or directory\n");
    CHECK(diagnostics.list().front().trouble == Trouble::unreadable);
}

}  // namespace rainledger
