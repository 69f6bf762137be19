#include <nlohmann/json.hpp>

#include "cli/runner.hpp"
#include "cli/scenarios.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Names = std::vector<std::string>;

}  // namespace

TEST_CASE("losses writes the summary, in the units asked for") {
    const Yard yard;
    const Outcome metric = run(yard.setting, {"losses", "yard.yaml"});
    CHECK(metric.status == 0);
    CHECK(metric.err.empty());
    CHECK_THAT(metric.out,
               Contains("Millbrook depot\n") && Contains("  9.0 mm of rain in 30 min") &&
                   Contains("  in 3 steps (file rain.csv)\n") && Contains("The books balance."));
    const Outcome inches = run(yard.setting, {"losses", "--units", "in", "yard.yaml"});
    CHECK(inches.status == 0);
    CHECK_THAT(inches.out, Contains("  0.35 in of rain in 30 min") && Contains("ft3/s"));
}

TEST_CASE("losses writes the ledger and the JSON whole, and nothing else") {
    const Yard yard;
    const Outcome outcome = run(
        yard.setting, {"losses", "yard.yaml", "--ledger", "ledger.csv", "--json", "results.json"});
    CHECK(outcome.status == 0);
    CHECK(yard.folder.names() == Names{"ledger.csv", "rain.csv", "results.json", "yard.yaml"});
    CHECK_THAT(yard.folder.read("ledger.csv"),
               Contains("\nstorm,outlet,yard,1,0,0.16666666666666666,2,0,0,0,1,1,0\n"));
    const auto json = nlohmann::json::parse(yard.folder.read("results.json"));
    CHECK(json["storms"]["storm"]["site"]["excess_mm"] == 8.0);
    CHECK(json["warnings"].empty());
}

TEST_CASE("JSON on standard output replaces the summary") {
    const Yard yard;
    const Outcome outcome = run(yard.setting, {"losses", "yard.yaml", "--json", "-"});
    CHECK(outcome.status == 0);
    CHECK(nlohmann::json::parse(outcome.out)["title"] == "Millbrook depot");
}

TEST_CASE("reporting with --every has its own steps and changes no total") {
    const Yard yard;
    const Outcome own = run(yard.setting, {"losses", "yard.yaml", "--json", "-"});
    const Outcome every = run(yard.setting, {"losses", "yard.yaml", "--json", "-", "--every",
                                             "20min", "--ledger", "ledger.csv"});
    CHECK(every.status == 0);
    CHECK(every.out == own.out);
    CHECK_THAT(yard.folder.read("ledger.csv"),
               Contains("storm,outlet,yard,1,0,0.3333333333333333,8,0,0,0,1,7,0\n") &&
                   Contains("storm,outlet,yard,2,0.3333333333333333,0.5,1,0,0,0,1,1,0\n"));
}

TEST_CASE("the option --every without a ledger is noted, and far too fine a step refused") {
    const Yard yard;
    const Outcome noted = run(yard.setting, {"losses", "yard.yaml", "--every", "20 min"});
    CHECK(noted.status == 0);
    CHECK(noted.err ==
          "rainledger: note: --every shapes the ledger file alone; --ledger FILE.csv writes one\n");
    CHECK(run(yard.setting, {"losses", "yard.yaml", "--every", "20 min", "--quiet"}).err.empty());
    const Outcome fine = run(yard.setting, {"losses", "yard.yaml", "--every", "0.0001 s"});
    CHECK(fine.status == 2);
    CHECK_THAT(fine.err, Contains("--every: that step would cut a storm into more than 10 "
                                  "million\n"));
}

TEST_CASE("warnings stand on standard error and in the JSON; --quiet silences the first") {
    const Folder folder;
    folder.write("s.yaml", kWarning);
    const Outcome loud = run({folder.path()}, {"losses", "s.yaml", "--json", "-"});
    const Outcome quiet = run({folder.path()}, {"losses", "s.yaml", "--json", "-", "--quiet"});
    CHECK(loud.status == 0);
    CHECK_THAT(loud.err, Contains("s.yaml:6:14: warning: surface 'yard' has a curve number in a "
                                  "storm under 6 h"));
    CHECK(quiet.err.empty());
    CHECK(quiet.out == loud.out);
    const auto warnings = nlohmann::json::parse(loud.out)["warnings"];
    REQUIRE(!warnings.empty());
    CHECK_THAT(warnings[0].get<std::string>(),
               Contains("s.yaml:6:14: surface 'yard' has a curve number in a storm under 6 h"));
}

TEST_CASE("a hyetograph is found beside its scenario from any working directory") {
    const Yard yard;
    const Folder elsewhere;
    const Outcome outcome =
        run({elsewhere.path()}, {"losses", yard.folder.path("yard.yaml"), "--ledger", "l.csv"});
    CHECK(outcome.status == 0);
    CHECK(outcome.err.empty());
    CHECK(elsewhere.names() == Names{"l.csv"});
}

TEST_CASE("an output never replaces an input") {
    const Yard yard;
    const Outcome scenario = run(yard.setting, {"losses", "yard.yaml", "--json", "./yard.yaml"});
    CHECK(scenario.status == 2);
    const Outcome rain = run(yard.setting, {"losses", "yard.yaml", "--ledger", "rain.csv"});
    CHECK(rain.status == 2);
    CHECK(rain.err ==
          "rainledger losses: 'rain.csv' is the scenario's rain; name another file to write\n"
          "See 'rainledger losses --help'.\n");
    CHECK(yard.folder.read("yard.yaml") == kYard);
    CHECK(yard.folder.read("rain.csv") == kRain);
}

TEST_CASE("a scenario with errors: all of them, a count, status 3, no file") {
    const Folder folder;
    folder.write("s.yaml",
                 "storm:\n  steps: {every: 10 min, depths: [20], unit: mm}\nsurfaces:\n  yard:\n"
                 "    area: 10\n    losses: impervous\n");
    folder.write("old.csv", "old\n");
    const Outcome outcome = run({folder.path()}, {"losses", "s.yaml", "--ledger", "old.csv",
                                                  "--json", "new.json", "--quiet"});
    CHECK(outcome.status == 3);
    CHECK(outcome.out.empty());
    CHECK_THAT(outcome.err, Contains("s.yaml:5:11: error: ") && Contains("s.yaml:6:13: error: "));
    CHECK(outcome.err.ends_with("rainledger: 2 errors in s.yaml; nothing was computed\n"));
    CHECK(folder.names() == Names{"old.csv", "s.yaml"});
    CHECK(folder.read("old.csv") == "old\n");
}

TEST_CASE("of very many errors the first fifty are shown and the rest counted") {
    const Folder folder;
    std::string text = kWarning;
    for (int i = 0; i < 60; ++i)
        text += "    unheard_of_" + std::to_string(i) + ": 1\n";
    folder.write("s.yaml", text);
    const Outcome outcome = run({folder.path()}, {"losses", "s.yaml"});
    CHECK(outcome.status == 3);
    std::size_t shown = 0;
    for (std::size_t at = outcome.err.find(": error: "); at != std::string::npos;
         at = outcome.err.find(": error: ", at + 1))
        ++shown;
    CHECK(shown == 50);
    CHECK(
        outcome.err.ends_with("rainledger: 10 more errors not shown\n"
                              "rainledger: 60 errors in s.yaml; nothing was computed\n"));
}

TEST_CASE("a phi index that cannot be matched is an error of the input, after the march") {
    const Folder folder;
    folder.write("s.yaml",
                 "storm:\n  steps: {every: 10 min, depths: [20], unit: mm}\nsurfaces:\n  yard:\n"
                 "    area: 10 m2\n    losses: {phi_index: {observed_excess: 30 mm}}\n");
    const Outcome outcome = run({folder.path()}, {"losses", "s.yaml", "--ledger", "l.csv"});
    CHECK(outcome.status == 3);
    CHECK_THAT(outcome.err, Contains("s.yaml:6:43: error: more excess observed (30 mm)"));
    CHECK(outcome.err.ends_with("rainledger: 1 error in s.yaml; nothing was computed\n"));
    CHECK(folder.names() == Names{"s.yaml"});
}

}  // namespace rainledger::cli_test
