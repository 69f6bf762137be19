#include <nlohmann/json.hpp>

#include "cli/fit_inputs.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Catch::Matchers::StartsWith;
using nlohmann::json;

json results_of(const Outcome& outcome) {
    INFO(outcome.err);
    REQUIRE(outcome.status == 0);
    return json::parse(outcome.out);
}

/// Whether a warning of the fit, of its test or of a law, holds the words.
bool warns(const json& results, const std::string& words) {
    return results.dump().find(words) != std::string::npos;
}

/// The `losses:` of a file that --yaml wrote, put into a scenario as they stand, four blanks in.
std::string scenario_with(const std::string& written) {
    std::string scenario =
        "storm: {steps: {every: 10 min, depths: [2, 9, 24, 8, 3], unit: mm}}\n"
        "surfaces:\n  yard:\n    area: 1200 m2\n";
    std::string block = written.substr(0, written.find("\ndraws:") + 1);
    for (std::size_t at = 0; at < block.size(); at = block.find('\n', at) + 1)
        scenario += "    " + block.substr(at, block.find('\n', at) - at) + "\n";
    return scenario;
}

}  // namespace

TEST_CASE("a good test gives laws, intervals and files in one command") {
    const FitFolder tests;
    const Outcome outcome = tests.fit({"pit.yaml", "--csv", "out.csv", "--json", "out.json",
                                       "--yaml", "losses.yaml", "--chart", "out.txt"});
    INFO(outcome.err);
    CHECK(outcome.status == 0);
    CHECK(outcome.err.empty());
    CHECK_THAT(outcome.out, Contains("Quarry Row, pit 3") && Contains("Horton") &&
                                Contains("Green-Ampt") && Contains("Kostiakov"));
    const json results = json::parse(tests.folder.read("out.json"));
    const json& horton = results["laws"]["horton"];
    for (const auto& [key, truth] :
         {std::pair{"initial_capacity_mm_per_h", 120.0}, std::pair{"final_capacity_mm_per_h", 24.0},
          std::pair{"decay_per_h", 3.0}}) {
        INFO(key);
        CHECK_THAT(horton[key]["value"].get<double>(), WithinRel(truth, 0.02));
        CHECK(horton[key]["low"].get<double>() < truth);
        CHECK(horton[key]["high"].get<double>() > truth);
    }
    CHECK(results["laws"].size() == 5);
    CHECK_FALSE(warns(results, "stopped too early"));
    CHECK_THAT(tests.folder.read("out.csv"), StartsWith("pit,reading,end_min,"));
    CHECK_FALSE(tests.folder.read("out.txt").empty());
}

TEST_CASE("the losses of --yaml run in a scenario as they stand") {
    const FitFolder tests;
    for (const std::string law : {"", "horton", "green_ampt", "philip"}) {
        INFO(law);
        const std::vector<std::string> words{"pit.yaml", "--yaml", "losses.yaml"};
        const Outcome fitted = tests.fit(law.empty() ? words : joined(words, {"--law", law}));
        INFO(fitted.err);
        REQUIRE(fitted.status == 0);
        const std::string written = tests.folder.read("losses.yaml");
        INFO(written);
        CHECK_THAT(written, Contains("losses:\n") && Contains("\ndraws:\n"));
        tests.folder.write("site.yaml", scenario_with(written));
        const Outcome outcome =
            run(tests.setting, {"losses", "site.yaml", "--json", "-", "--quiet"});
        INFO(outcome.err);
        REQUIRE(outcome.status == 0);
        const json surface = json::parse(outcome.out)["storms"]["storm"]["surfaces"]["yard"];
        CHECK(surface["method"] == (law.empty() ? "horton" : law));
    }
}

TEST_CASE("what the fit found reaches the ledger: the same final capacity") {
    const FitFolder tests;
    const Outcome fitted = tests.fit({"pit.yaml", "--yaml", "losses.yaml", "--json", "-"});
    const double final_capacity =
        results_of(fitted)["laws"]["horton"]["final_capacity_mm_per_h"]["value"];
    tests.folder.write("site.yaml", scenario_with(tests.folder.read("losses.yaml")));
    const Outcome outcome = run(tests.setting, {"losses", "site.yaml", "--json", "-", "--quiet"});
    const json surface = results_of(outcome)["storms"]["storm"]["surfaces"]["yard"];
    CHECK_THAT(surface["parameters"]["final_capacity_mm_per_h"].get<double>(),
               WithinRel(final_capacity, 1e-3));
}

TEST_CASE("a test that stopped too early is told apart from a good one") {
    const FitFolder tests;
    const json results = results_of(tests.fit({"short.csv", "--json", "-"}));
    CHECK(warns(results, "the test stopped too early: its last three rates still differ by"));
    CHECK_THAT(tests.fit({"short.csv"}).out, Contains("the test stopped too early"));
    CHECK_THAT(tests.fit({"pit.csv"}).out, !Contains("stopped too early"));
}

TEST_CASE("noisy readings are told apart from good ones") {
    const FitFolder tests;
    tests.folder.write("noisy.csv",
                       "time [min],drop [mm]\n5,9\n10,2\n15,11\n20,1\n30,12\n45,4\n60,13\n80,3\n"
                       "100,14\n120,2\n");
    CHECK(warns(results_of(tests.fit({"noisy.csv", "--json", "-"})), "the readings are noisy"));
    CHECK_FALSE(warns(results_of(tests.fit({"pit.csv", "--json", "-"})), "noisy"));
}

TEST_CASE("a test of one reading gives no law, and a file of losses cannot be had of it") {
    const FitFolder tests;
    tests.folder.write("one.csv", "time [min],drop [mm]\n5,9\n");
    const Outcome summary = tests.fit({"one.csv"});
    CHECK(summary.status == 0);
    CHECK_THAT(summary.out, Contains("could not be fitted"));
    const Outcome outcome = tests.fit({"one.csv", "--yaml", "losses.yaml", "--csv", "out.csv"});
    CHECK(outcome.status == 3);
    CHECK(outcome.out.empty());
    CHECK_THAT(outcome.err, StartsWith("rainledger: --yaml: ") &&
                                Catch::Matchers::EndsWith("; nothing was written\n"));
    CHECK_THROWS(tests.folder.read("losses.yaml"));
    CHECK_THROWS(tests.folder.read("out.csv"));
}

TEST_CASE("volumes are fitted with the ring of the command line") {
    const FitFolder tests;
    const Outcome without = tests.fit({"volumes.csv"});
    CHECK(without.status == 3);
    CHECK(without.err ==
          "volumes.csv:1:12: error: volumes need the inner ring's diameter to become depths\n"
          "    time [min],volume_added [mL]\n"
          "               ^\n"
          "    state it: 'ring: {inner_diameter: 300 mm}' beside 'readings:', or --ring '300 mm'\n"
          "rainledger: 1 error in volumes.csv; nothing was computed\n");
    const json single = results_of(tests.fit({"volumes.csv", "--ring", "300 mm", "--json", "-"}));
    const json both =
        results_of(tests.fit({"volumes.csv", "--ring", "300 mm,600 mm", "--json", "-"}));
    CHECK(single["laws"] == both["laws"]);
    const auto said = [&](const std::string& ring) {
        return tests.fit({"volumes.csv", "--ring", ring}).out;
    };
    CHECK_THAT(said("300 mm"), Contains("single ring"));
    CHECK_THAT(said("300 mm, 600 mm"), !Contains("single ring"));
}

TEST_CASE("a design factor divides the rates of the losses") {
    const FitFolder tests;
    const auto final_capacity = [&](const std::vector<std::string>& words) {
        REQUIRE(tests.fit(joined({"pit.csv", "--yaml", "losses.yaml"}, words)).status == 0);
        tests.folder.write("site.yaml", scenario_with(tests.folder.read("losses.yaml")));
        const Outcome outcome =
            run(tests.setting, {"losses", "site.yaml", "--json", "-", "--quiet"});
        const json surface = results_of(outcome)["storms"]["storm"]["surfaces"]["yard"];
        return surface["parameters"]["final_capacity_mm_per_h"].get<double>();
    };
    CHECK_THAT(final_capacity({"--design-factor", "2"}), WithinRel(final_capacity({}) / 2.0, 1e-3));
}

TEST_CASE("bad inputs of fit are located, and nothing is written") {
    const FitFolder tests;
    const auto refused = [&](const std::vector<std::string>& words, int status) {
        const Outcome outcome = tests.fit(words);
        CHECK(outcome.status == status);
        CHECK(outcome.out.empty());
        return outcome.err;
    };
    CHECK(refused({"nowhere.yaml"}, 4) ==
          "nowhere.yaml: error: cannot read the file: No such file or directory\n"
          "rainledger: 1 error in nowhere.yaml; nothing was computed\n");
    tests.folder.write("lost.yaml", "readings: lost.csv\n");
    CHECK(refused({"lost.yaml"}, 4) ==
          "lost.yaml:1:11: error: cannot read 'lost.csv': No such file or directory\n"
          "    readings: lost.csv\n"
          "              ^\n"
          "    file names are relative to the field test's folder\n"
          "rainledger: 1 error in lost.yaml; nothing was computed\n");
    tests.folder.write("late.yaml", "readings: pit.csv\nignore_first: 3 h\n");
    CHECK(refused({"late.yaml", "--csv", "out.csv"}, 3) ==
          "late.yaml:2:15: error: no reading is left after the time to ignore\n"
          "    ignore_first: 3 h\n"
          "                  ^\n"
          "rainledger: 1 error in late.yaml; nothing was computed\n");
    CHECK_THAT(refused({"scenario.yaml"}, 3),
               StartsWith("scenario.yaml:1:1: error: this is a scenario, not a field test\n") &&
                   Contains("    'rainledger losses' reads it\n"));
    tests.folder.write("falls.csv", "time [min],infiltrated [mm]\n5,9\n10,8\n10,12\n");
    CHECK_THAT(refused({"falls.csv"}, 3), StartsWith("falls.csv:3:4: error: ") &&
                                              Contains("falls.csv:4:1: error: ") &&
                                              Contains("2 errors in falls.csv"));
    CHECK_THROWS(tests.folder.read("out.csv"));
}

TEST_CASE("losses and storm say which command a field test belongs to") {
    const FitFolder tests;
    for (const char* const command : {"losses", "storm"}) {
        const Outcome outcome = run(tests.setting, {command, "pit.yaml"});
        CHECK(outcome.status == 3);
        CHECK_THAT(outcome.err,
                   StartsWith("pit.yaml:2:1: error: this is a field test, not a scenario\n") &&
                       Contains("    'rainledger fit' reads it\n"));
    }
}

TEST_CASE("a field test is told by its first line where its name does not say so") {
    const FitFolder tests;
    tests.folder.write("pit.txt", "# pit 3\nreadings: pit.csv\n");
    CHECK(results_of(tests.fit({"pit.txt", "--json", "-"}))["laws"] ==
          results_of(tests.fit({"pit.csv", "--json", "-"}))["laws"]);
}

TEST_CASE("outputs of fit appear whole or not at all") {
    const FitFolder tests;
    const Outcome outcome = tests.fit({"pit.csv", "--csv", "out.csv", "--json", "no/out.json"});
    CHECK(outcome.status == 4);
    CHECK(outcome.err == "rainledger: cannot write no/out.json: No such file or directory\n");
    CHECK_THROWS(tests.folder.read("out.csv"));
    Setting full = tests.setting;
    full.out = Out::full_disk;
    CHECK(run(full, {"fit", "pit.csv", "--yaml", "losses.yaml"}).status == 4);
    CHECK_THROWS(tests.folder.read("losses.yaml"));
}

}  // namespace rainledger::cli_test
