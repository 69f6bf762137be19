#include <string>

#include "published/check_file.hpp"
#include "published/judge.hpp"
#include "test.hpp"

// The runner itself: a check that cannot be run, or a mark that is not true, must not pass.
namespace rainledger::published {
namespace {

const std::string kSources = "sources: {Own: 'own, for this test, 2026'}\n";

std::string check_with(const std::string& lines) {
    return kSources +
           "checks:\n"
           "  - id: one\n"
           "    source: Own\n"
           "    place: here\n"
           "    status: derived\n" +
           lines;
}

std::string problems_of(const std::string& lines) {
    const CheckFile file = read_check_file("test.yaml", check_with(lines));
    return judge(file, file.checks.front(), library_books).problems;
}

const std::string kRetention =
    "    operation: retention\n"
    "    inputs: {number: 80}\n";

}  // namespace

TEST_CASE("a check that holds has no problems") {
    CHECK(problems_of(kRetention + "    expected: 2.50 in\n") == "");
    CHECK(problems_of(kRetention + "    expected: 63.5 mm\n") == "");
}

TEST_CASE("a value that is not the printed one is reported") {
    CHECK(problems_of(kRetention + "    expected: 2.51 in\n") ==
          "does not reproduce: printed 2.51, ours 2.5\n");
}

TEST_CASE("a row of the wrong length, a missing or an unused input, a wrong unit are reported") {
    CHECK(problems_of("    operation: retention\n"
                      "    inputs: {number: 80, rain: 3 in}\n"
                      "    expected: 2.50 in\n") == "input 'rain' is not used\n");
    CHECK(problems_of("    operation: retention\n"
                      "    inputs: {number: 80 90}\n"
                      "    expected: 2.50 1.11 0.00 in\n") == "input 'number' is too short\n");
    CHECK(problems_of("    operation: retention\n"
                      "    inputs: {number: 80 90}\n"
                      "    expected: 2.50 in\n") == "input 'number' is longer than the result\n");
    CHECK(problems_of("    operation: runoff_depth\n"
                      "    inputs: {number: 80}\n"
                      "    expected: 2.50 in\n") == "input 'rain' is missing\n");
    CHECK(problems_of(kRetention + "    expected: 2.50 h\n") ==
          "'h' is not a unit of the result\n");
}

TEST_CASE("a false mark is reported") {
    const std::string marked = kRetention +
                               "    expected: 2.50 in\n"
                               "    reproduces: no\n"
                               "    why: to see it fail\n"
                               "    exact: 2.5000 in\n";
    CHECK(problems_of(marked) == "the mark is false, it reproduces: printed 2.50, ours 2.5\n");
}

TEST_CASE("`exact` and the source's own route are held to their digits") {
    const std::string marked = kRetention +
                               "    expected: 2.51 in\n"
                               "    reproduces: rounding\n"
                               "    why: to see it fail\n"
                               "    exact: 2.49 in\n"
                               "    as_rounded: {operation: retention, inputs: {number: 90}}\n";
    CHECK_THAT(problems_of(marked),
               Contains("differs from `exact`: printed 2.49, ours 2.5\n") &&
                   Contains("not even by the source's rounding: printed 2.51"));
}

TEST_CASE("a file without checks is refused") {
    CHECK_THROWS_WITH(read_check_file("test.yaml", kSources), "test.yaml: key 'checks' is missing");
    CHECK_THROWS_WITH(read_check_file("test.yaml", kSources + "checks: []\n"),
                      "test.yaml: has no checks");
}

TEST_CASE("unknown names and unused keys are refused") {
    CHECK_THROWS_WITH(read_check_file("test.yaml", check_with("    operation: guess\n"
                                                              "    inputs: {number: 80}\n"
                                                              "    expected: 1 in\n")),
                      "unknown operation 'guess'");
    CHECK_THROWS_WITH(
        read_check_file("test.yaml", check_with(kRetention + "    expected: 2.5 in\n"
                                                             "    expects: 2.5 in\n")),
        "test.yaml: one: key 'expects' is not used");
    CHECK_THROWS_WITH(
        read_check_file("test.yaml", kSources + check_with(kRetention + "    expected: 2.5 in\n")),
        "test.yaml: key 'sources' stands twice");
    CHECK_THROWS_WITH(
        read_check_file(
            "test.yaml",
            "sources: {Own: a, Other: b}\n" +
                check_with(kRetention + "    expected: 2.5 in\n").substr(kSources.size())),
        "test.yaml: source 'Other' is not used");
}

TEST_CASE("a printed number is held to half a unit of its last digit") {
    const Printed printed = parse_value_row("3.17 cm").numbers.front();
    CHECK(prints_as(3.1651, printed));
    CHECK(prints_as(3.1749, printed));
    CHECK_FALSE(prints_as(3.1649, printed));
    CHECK_FALSE(prints_as(3.1751, printed));
    const Printed whole = parse_value_row("2700 m3").numbers.front();
    CHECK(prints_as(2700.4, whole));
    CHECK_FALSE(prints_as(2700.6, whole));
}

}  // namespace rainledger::published
