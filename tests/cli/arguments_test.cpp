#include "cli/arguments.hpp"

#include "cli/losses_options.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

std::string problem_of(const std::vector<std::string>& words) {
    std::string problem;
    const auto options = read_losses_options(words, problem);
    CHECK(options.has_value() == problem.empty());
    return problem;
}

LossesOptions options_of(const std::vector<std::string>& words) {
    std::string problem;
    const auto options = read_losses_options(words, problem);
    INFO(problem);
    REQUIRE(options);
    return *options;
}

}  // namespace

TEST_CASE("options stand before or after the scenario, with a blank or an equals sign") {
    for (const std::vector<std::string>& words :
         {std::vector<std::string>{"s.yaml", "--ledger", "l.csv", "--units", "in", "--quiet"},
          {"--ledger=l.csv", "--quiet", "--units=in", "s.yaml"},
          {"--quiet", "s.yaml", "--units", "in", "--ledger", "l.csv"}}) {
        const LossesOptions options = options_of(words);
        CHECK(options.scenario == "s.yaml");
        CHECK(options.ledger == "l.csv");
        CHECK(options.units == DisplayUnits::inches);
        CHECK(options.quiet);
        CHECK_FALSE(options.json);
        CHECK_FALSE(options.every_h);
    }
    CHECK(options_of({"--", "--s.yaml"}).scenario == "--s.yaml");
    CHECK(options_of({"s.yaml", "--json", "-"}).json_on_stdout());
    CHECK(options_of({"s.yaml", "--json=-"}).json_on_stdout());
    CHECK(options_of({"s.yaml", "--every", "15 min"}).every_h == 0.25);
    CHECK(options_of({"s.yaml", "--units", "mm"}).units == DisplayUnits::metric);
}

TEST_CASE("what is wrong with the words after losses is said in one line") {
    CHECK(problem_of({}) == "no scenario given; write 'rainledger losses SCENARIO'");
    CHECK(problem_of({""}) == "the name of the scenario is empty");
    CHECK(problem_of({"a", "b"}) == "one scenario at a time; 'b' is one word too many");
    CHECK(problem_of({"a", "--every", "15", "min"}) ==
          "one scenario at a time; 'min' is one word too many (write a duration as one word: "
          "--every '15 min')");
    CHECK(problem_of({"a", "--jsn", "x"}) == "unknown option '--jsn'; did you mean '--json'?");
    CHECK(problem_of({"a", "--ledg", "x"}) == "unknown option '--ledg'; did you mean '--ledger'?");
    CHECK(problem_of({"a", "--colour"}) == "unknown option '--colour'");
    CHECK(problem_of({"a", "-q"}) == "unknown option '-q'");
    CHECK(problem_of({"a", "--json", "x", "--json", "y"}) == "--json is given twice");
    CHECK(problem_of({"a", "--quiet", "--quiet"}) == "--quiet is given twice");
    CHECK(problem_of({"a", "--json"}) == "--json needs a value: FILE");
    CHECK(problem_of({"a", "--json", "--quiet"}) == "--json needs a value: FILE");
    CHECK(problem_of({"a", "--json="}) == "--json needs a value: FILE");
    CHECK(problem_of({"a", "--units"}) == "--units needs a value: mm|in");
    CHECK(problem_of({"a", "--ledger", ""}) == "--ledger needs a value: FILE.csv");
    CHECK(problem_of({"a", "--quiet=yes"}) == "--quiet takes no argument");
    CHECK(problem_of({"a", "--units", "cm"}) == "--units: 'cm' is not known; write mm or in");
    CHECK(problem_of({"a", "--every", "15"}) ==
          "--every: '15' has no unit; write a number with a unit, such as '15 min' (units: s, min, "
          "h, hr, d)");
    CHECK(problem_of({"a", "--every", "nan min"}) ==
          "--every: 'nan min' is not a time; write a number with a unit, such as '15 min' (units: "
          "s, min, h, hr, d)");
    CHECK(problem_of({"a", "--every", "0 min"}) ==
          "--every: '0 min' is no step; it must be above zero");
    CHECK(problem_of({"a", "--every=-5 min"}) ==
          "--every: '-5 min' is no step; it must be above zero");
    CHECK(problem_of({"a", "--ledger", "-"}) ==
          "--ledger: the ledger goes to a file, not to '-'; for standard output write --ledger "
          "/dev/stdout");
    CHECK(problem_of({"a", "--ledger", "x", "--json", "./x"}) ==
          "--ledger and --json name the same file './x'");
    CHECK(problem_of({"a.yaml", "--json", "./a.yaml"}) ==
          "'./a.yaml' is the scenario itself; name another file to write");
    CHECK(problem_of({"a", "--ledger", "/dev/null", "--json", "/dev/null"}).empty());
}

TEST_CASE("help is found among the words, not after --") {
    const std::vector<std::string> long_page{"x", "--help"};
    const std::vector<std::string> short_page{"-h", "--help"};
    const std::vector<std::string> no_page{"--", "--help"};
    CHECK(help_wanted(long_page) == HelpWanted::long_page);
    CHECK(help_wanted(short_page) == HelpWanted::short_page);
    CHECK(help_wanted(no_page) == HelpWanted::none);
}

}  // namespace rainledger
