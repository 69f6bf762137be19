#include "cli/fit_inputs.hpp"
#include "cli/fit_options.hpp"
#include "scenario/words.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

/// What is wrong with the words, whatever the input is.
std::string problem_of(const std::vector<std::string>& words) {
    std::string problem;
    const auto options = read_fit_options(words, problem);
    CHECK(options.has_value() == problem.empty());
    return problem;
}

/// What a whole run says is wrong with them.
std::string complaint(const FitFolder& tests, const std::vector<std::string>& words) {
    const Outcome outcome = tests.fit(words);
    CHECK(outcome.status == 2);
    CHECK(outcome.out.empty());
    const std::string lead = "rainledger fit: ";
    const std::string end = "\nSee 'rainledger fit --help'.\n";
    REQUIRE(outcome.err.starts_with(lead));
    REQUIRE(outcome.err.ends_with(end));
    return outcome.err.substr(lead.size(), outcome.err.size() - lead.size() - end.size());
}

}  // namespace

TEST_CASE("every option of fit is read") {
    std::string problem;
    const std::vector<std::string> words{
        "pit.csv", "--csv",   "o.csv",  "--json",       "o.json",          "--yaml",
        "o.yaml",  "--law",   "philip", "--chart",      "o.svg",           "--units",
        "in",      "--quiet", "--ring", "12 in, 24 in", "--design-factor", "2.5"};
    const auto options = read_fit_options(words, problem);
    INFO(problem);
    REQUIRE(options);
    CHECK(options->input == "pit.csv");
    CHECK(options->csv == "o.csv");
    CHECK(options->json == "o.json");
    CHECK(options->yaml == "o.yaml");
    CHECK(options->law == FieldLaw::philip);
    CHECK(options->chart == "o.svg");
    CHECK(options->units == DisplayUnits::inches);
    CHECK(options->quiet);
    REQUIRE(options->rings);
    CHECK_THAT(options->rings->inner_diameter_mm, WithinRel(304.8, 1e-15));
    CHECK_THAT(*options->rings->outer_diameter_mm, WithinRel(609.6, 1e-15));
    CHECK(options->design_factor == 2.5);
    CHECK(options->outputs().size() == 4);
}

TEST_CASE("what is wrong with the words after fit is said in one line") {
    CHECK(problem_of({}) == "no test given; write 'rainledger fit TEST'");
    CHECK(problem_of({"a.csv", "--ring", "300", "mm"}) ==
          "one test at a time; 'mm' is one word too many (write a diameter as one word: --ring "
          "'300 mm')");
    CHECK(problem_of({"a.yaml", "b.yaml"}) == "one test at a time; 'b.yaml' is one word too many");
    CHECK(problem_of({"a", "--laws", "horton"}) ==
          "unknown option '--laws'; did you mean '--law'?");
    CHECK(problem_of({"a", "--law", "horton"}) ==
          "--law goes with --yaml FILE.yaml, whose law it names");
    CHECK(problem_of({"a", "--yaml", "b", "--law", "green-ampt"}) ==
          "--law: 'green-ampt' is not known; did you mean 'green_ampt'?");
    CHECK(problem_of({"a", "--yaml", "b", "--law", "curve_number"}) ==
          "--law: 'curve_number' is not known; known here: horton, green_ampt, philip");
    CHECK(problem_of({"a", "--yaml", "b", "--law", "kostiakov"}) ==
          "--law: scenarios do not know kostiakov, which is fitted for comparison; write horton, "
          "green_ampt or philip");
    CHECK(problem_of({"a", "--ring", "300"}) ==
          "--ring: '300' has no unit; write '300 mm', or '300 mm, 600 mm' for an inner and an "
          "outer ring");
    CHECK(problem_of({"a", "--ring", "600 mm, 300 mm"}) ==
          "--ring: the outer ring is no wider than the inner one");
    CHECK(problem_of({"a", "--ring", "0 mm"}) ==
          "--ring: '0 mm' is no diameter of a ring; check the unit");
    CHECK(problem_of({"a", "--ring", "300 km"}) ==
          "--ring: 'km' is not a unit of depth; write '300 mm', or '300 mm, 600 mm' for an inner "
          "and an outer ring");
    for (const char* const wrong : {"0.5", "two", "nan", "2 mm", "1e9"})
        CHECK(problem_of({"a", "--design-factor", wrong}) ==
              std::string("--design-factor: '") + wrong +
                  "' is no factor; it divides every rate: write 1 or more, such as 2");
    CHECK(problem_of({"a", "--units", "cm"}) == "--units: 'cm' is not known; write mm or in");
    CHECK(problem_of({"a", "--csv", "-"}) ==
          "--csv: the readings go to a file, not to '-'; for standard output write --csv "
          "/dev/stdout");
    CHECK(problem_of({"a", "--yaml", "-"}) ==
          "--yaml: the losses go to a file, not to '-'; for standard output write --yaml "
          "/dev/stdout");
    CHECK(problem_of({"a", "--chart", "b.gif"}) ==
          "--chart: the ending of 'b.gif' is none of .svg, .png, .pdf and .txt; '-' draws text on "
          "standard output");
    CHECK(problem_of({"a", "--json", "-", "--chart", "-"}) ==
          "--json and --chart cannot both go to standard output; name a file for one of them");
    CHECK(problem_of({"a", "--csv", "x", "--yaml", "./x"}) ==
          "--csv and --yaml name the same file './x'");
    CHECK(problem_of({"a.yaml", "--yaml", "./a.yaml"}) ==
          "'./a.yaml' is the test itself; name another file to write");
}

TEST_CASE("options that do not go with the test are told") {
    const FitFolder tests;
    CHECK(
        complaint(tests, {"pit.yaml", "--ring", "300 mm"}) ==
        "--ring goes with a CSV of readings, and 'pit.yaml' is a field test; state 'ring:' in it");
    CHECK(complaint(tests, {"pit.yaml", "--design-factor", "2"}) ==
          "--design-factor goes with a CSV of readings, and 'pit.yaml' is a field test; state "
          "'design_factor:' in it");
    CHECK(complaint(tests, {"pit.yaml", "--csv", "./pit.csv"}) ==
          "'./pit.csv' holds the test's readings; name another file to write");
    CHECK(complaint(tests, {"pit.csv", "--json", "./pit.csv"}) ==
          "'./pit.csv' is the test itself; name another file to write");
    tests.folder.write("few.yaml", "readings: pit.csv\nlaws: [horton]\n");
    CHECK(complaint(tests, {"few.yaml", "--yaml", "x.yaml", "--law", "philip"}) ==
          "--law: the test's 'laws:' leave out philip");
    CHECK(tests.folder.read("pit.csv") == kGoodReadings);
}

TEST_CASE("the laws that a field test names are those that can be fitted") {
    REQUIRE(kFittedLaws.size() == kFieldLaws.size());
    for (std::size_t i = 0; i < kFieldLaws.size(); ++i)
        CHECK(kFittedLaws[i] == field_law_key(kFieldLaws[i]));
}

TEST_CASE("the help of fit names every option, and its test runs as it stands") {
    const FitFolder tests;
    const std::string page = tests.fit({"--help"}).out;
    for (const OptionRow& row : kFitOptions)
        CHECK_THAT(page, Contains("  --" + std::string(row.name)));
    const std::size_t begin = page.find("  title: ");
    REQUIRE(begin != std::string::npos);
    std::string yaml = page.substr(begin, page.find("\n\n", begin) - begin + 1);
    for (std::size_t at = 0; at != std::string::npos; at = yaml.find("\n  ", at + 1))
        yaml.erase(at == 0 ? 0 : at + 1, 2);
    tests.folder.write("help.yaml", yaml);
    tests.folder.write("pit3.csv", kGoodReadings);
    const Outcome outcome = tests.fit({"help.yaml"});
    INFO(yaml);
    CHECK(outcome.err.empty());
    CHECK(outcome.status == 0);
}

}  // namespace rainledger::cli_test
