#include <algorithm>
#include <sstream>

#include "cli/runner.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

Outcome run_here(const std::vector<std::string>& words) {
    const Folder folder;
    return run({folder.path()}, words);
}

struct Size {
    std::size_t lines = 0;
    std::size_t columns = 0;
};

Size size_of(const std::string& page) {
    Size size;
    std::istringstream lines(page);
    for (std::string line; std::getline(lines, line); ++size.lines)
        size.columns = std::max(size.columns, line.size());
    return size;
}

}  // namespace

TEST_CASE("the option --version names the program and its version") {
    const Outcome outcome = run_here({"--version"});
    CHECK(outcome.status == 0);
    CHECK(outcome.out == "rainledger " RAINLEDGER_VERSION "\n");
    CHECK(outcome.err.empty());
}

TEST_CASE("help: -h is one screen, --help says more, both on standard output with status 0") {
    for (const std::vector<std::string>& command :
         {std::vector<std::string>{}, {"losses"}, {"storm"}, {"fit"}, {"schema"}}) {
        std::vector<std::string> words = command;
        words.emplace_back("-h");
        const Outcome brief = run_here(words);
        words.back() = "--help";
        const Outcome full = run_here(words);
        CHECK(brief.status == 0);
        CHECK(full.status == 0);
        CHECK(brief.err.empty());
        CHECK(full.err.empty());
        CHECK(size_of(brief.out).lines <= 24);
        CHECK(size_of(full.out).lines > size_of(brief.out).lines);
        CHECK(size_of(full.out).columns < 100);
        CHECK_THAT(full.out, Contains("Usage:") && Contains("Example") &&
                                 Contains("Exit status:") && Contains("130  interrupted"));
    }
}

TEST_CASE("the help of losses names every option and its default") {
    const std::string page = run_here({"losses", "--help"}).out;
    for (const char* const option :
         {"--ledger FILE.csv", "--json FILE", "--units mm|in", "--every DURATION", "--chart FILE",
          "--storm NAME", "--surface NAME", "--quiet", "--help", "Defaults:"})
        CHECK_THAT(page, Contains(option));
}

TEST_CASE("the scenario in the help runs as it stands") {
    std::istringstream page(run_here({"losses", "--help"}).out);
    std::string scenario;
    for (std::string line; std::getline(page, line);)
        if (line.starts_with("  title:") || (!scenario.empty() && line.starts_with("  ")))
            scenario += line.substr(2) + "\n";
        else if (!scenario.empty())
            break;
    const Folder folder;
    folder.write("quarry_row.yaml", scenario);
    const Outcome outcome = run({folder.path()}, {"losses", "quarry_row.yaml"});
    INFO(outcome.err);
    CHECK(outcome.status == 0);
    CHECK(outcome.out.starts_with("Quarry Row yard\n"));
}

TEST_CASE("a wrong command line is two lines on standard error and status 2") {
    const auto complaint = [](const std::vector<std::string>& words) {
        const Outcome outcome = run_here(words);
        CHECK(outcome.status == 2);
        CHECK(outcome.out.empty());
        return outcome.err;
    };
    CHECK(complaint({}) == "rainledger: no command given\nSee 'rainledger --help'.\n");
    CHECK(
        complaint({"loses", "x.yaml"}) ==
        "rainledger: unknown command 'loses'; did you mean 'losses'?\nSee 'rainledger --help'.\n");
    CHECK(complaint({"x.yaml"}) ==
          "rainledger: unknown command 'x.yaml'; known here: losses, storm, fit, lookup, schema\n"
          "See 'rainledger --help'.\n");
    CHECK(complaint({"--quiet", "losses", "x.yaml"}) ==
          "rainledger: unknown option '--quiet'; options of a command stand after the command\n"
          "See 'rainledger --help'.\n");
    CHECK(complaint({"losses"}) ==
          "rainledger losses: no scenario given; write 'rainledger losses SCENARIO'\n"
          "See 'rainledger losses --help'.\n");
    CHECK(complaint({"losses", "x.yaml", "--unit", "in"}) ==
          "rainledger losses: unknown option '--unit'; did you mean '--units'?\n"
          "See 'rainledger losses --help'.\n");
    CHECK(complaint({"schema", "field-tests"}) ==
          "rainledger schema: 'field-tests' is not known; did you mean 'field_test'?\n"
          "See 'rainledger schema --help'.\n");
    CHECK(complaint({"schema", "x"}) ==
          "rainledger schema: 'x' is not known; known here: scenario, field_test\n"
          "See 'rainledger schema --help'.\n");
    CHECK(complaint({"schema", "scenario", "x"}) ==
          "rainledger schema: one schema at a time; 'x' is one word too many\n"
          "See 'rainledger schema --help'.\n");
    CHECK(complaint({"schema", "--json"}) ==
          "rainledger schema: unknown option '--json'\nSee 'rainledger schema --help'.\n");
}

TEST_CASE("schema writes a JSON schema of each kind of file") {
    const auto schema = [](const std::vector<std::string>& words) {
        const Outcome outcome = run_here(words);
        CHECK(outcome.status == 0);
        CHECK(outcome.err.empty());
        CHECK_THAT(outcome.out, Contains("https://json-schema.org/draft/2020-12/schema"));
        CHECK(outcome.out.ends_with("}\n"));
        return outcome.out;
    };
    CHECK_THAT(schema({"schema"}), Contains("\"title\": \"rainledger scenario\""));
    CHECK(schema({"schema", "scenario"}) == schema({"schema"}));
    CHECK_THAT(schema({"schema", "field_test"}), Contains("\"title\": \"rainledger field test\""));
}

}  // namespace rainledger::cli_test
