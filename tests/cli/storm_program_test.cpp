#include <nlohmann/json.hpp>

#include "cli/storm_inputs.hpp"
#include "rainledger/base/number.hpp"
#include "test.hpp"

namespace rainledger::cli_test {
namespace {

using Catch::Matchers::StartsWith;

using nlohmann::json;

const std::vector<std::string> kDesign{"county.csv", "--return-period", "10 yr", "--duration",
                                       "2 h",        "--every",         "5 min"};

std::vector<std::string> design_with(const std::vector<std::string>& more) {
    return joined(kDesign, more);
}

}  // namespace

TEST_CASE("one line makes a design storm of a table and writes it") {
    const RainFolder rain;
    const Outcome outcome = rain.storm(design_with({"--csv", "storm.csv"}));
    CHECK(outcome.status == 0);
    CHECK(outcome.err.empty());
    CHECK(outcome.out.starts_with(
        "county.csv is read as a table of rainfall statistics: its rows are durations.\n\n"
        "Design storm from county.csv\n\nStorm\n"
        "  48.0 mm of rain in 2 h 00 min, at most 150.0 mm/h\n"
        "  in 24 steps\n"
        "  design storm: alternating blocks over 2 h in steps of 5 min, peak at 0.5 of it "
        "(assumed);\n      from county.csv, return period 10 yr\n"));
    CHECK_THAT(outcome.out, Contains("The storm holds the depth of every duration listed."));
    CHECK_THAT(rain.folder.read("storm.csv"),
               StartsWith("start [min],end [min],depth [mm]\n0,5,") && Contains("\n55,60,12.5\n"));
}

TEST_CASE("a storm written as CSV comes back as the same storm and the same bytes") {
    const RainFolder rain;
    REQUIRE(rain.storm(design_with({"--csv", "storm.csv"})).status == 0);
    const Outcome again = rain.storm({"storm.csv", "--csv", "again.csv"});
    CHECK(again.status == 0);
    CHECK(again.out.starts_with(
        "storm.csv is read as one storm: its times are elapsed, without dates.\n\n"
        "Storm of storm.csv\n\nStorm\n"
        "  48.0 mm of rain in 2 h 00 min, at most 150.0 mm/h\n"
        "  in 24 steps (file storm.csv)\n"));
    CHECK(rain.folder.read("again.csv") == rain.folder.read("storm.csv"));
}

TEST_CASE("a table without a wish for a storm is printed, with --fit-formula fitted") {
    const RainFolder rain;
    const Outcome table = rain.storm({"county.csv"});
    CHECK(table.status == 0);
    CHECK_THAT(table.out, Contains("Rainfall statistics of county.csv\n\n"
                                   "Depth of rain in mm by duration and return period\n"
                                   "  duration  2 yr  10 yr  100 yr\n") &&
                              !Contains("Formula"));
    const Outcome fitted = rain.storm({"county.csv", "--fit-formula", "--json", "fits.json"});
    CHECK(fitted.status == 0);
    CHECK_THAT(fitted.out, Contains("Formula i = a / (t^m + b)^n fitted to the depths of 2 yr\n") &&
                               Contains("    formula: {a: "));
    const json fits = json::parse(rain.folder.read("fits.json"))["formulas"];
    REQUIRE(fits.size() == 3);
    CHECK(fits[1]["return_period_yr"] == 10.0);
    CHECK(fits[1]["fits"].size() == 2);
    CHECK(fits[1]["fits"][0]["rms_log_residual"] <= fits[1]["fits"][1]["rms_log_residual"]);
}

TEST_CASE("the fitted line runs in a scenario") {
    const RainFolder rain;
    const std::string out = rain.storm({"county.csv", "--fit-formula"}).out;
    const std::size_t at = out.find("formula: {a: ");
    REQUIRE(at != std::string::npos);
    rain.folder.write("fitted.yaml",
                      "storm:\n  design:\n    pattern: keifer_chu\n    duration: 2 h\n"
                      "    every: 5 min\n    " +
                          out.substr(at, out.find('\n', at) - at) + "\n");
    const Outcome outcome = rain.storm({"fitted.yaml"});
    INFO(outcome.err);
    CHECK(outcome.status == 0);
    CHECK(outcome.out.starts_with("fitted.yaml is read as a scenario, by its ending.\n\n"));
    CHECK_THAT(outcome.out, Contains("  design storm: Keifer and Chu over 2 h"));
}

TEST_CASE("a warning of a design stands on standard error and in the JSON") {
    const RainFolder rain;
    const Outcome curve =
        rain.storm(design_with({"--pattern", "mass_curve", "--curve", "nrcs_II", "--json", "-"}));
    CHECK(curve.status == 0);
    CHECK_THAT(curve.err, StartsWith("county.csv: warning: the curve nrcs_II was made for storms "
                                     "of 24 h, not 2 h\n"));
    const json results = json::parse(curve.out);
    CHECK(results["warnings"][0] ==
          "county.csv: the curve nrcs_II was made for storms of 24 h, not 2 h");
    CHECK(results["storms"]["storm"]["rain"]["design"]["pattern"] == "mass_curve");
    CHECK(results["storms"]["storm"]["steps"].size() == 24);
    const Outcome quiet = rain.storm(
        design_with({"--pattern", "mass_curve", "--curve", "nrcs_II", "--json", "-", "--quiet"}));
    CHECK(quiet.err.empty());
    CHECK(quiet.out == curve.out);
}

TEST_CASE("the events of a tip log are listed, sorted and rated") {
    const RainFolder rain;
    const Outcome list = rain.storm({"logger.csv", "--tip", "0.2 mm"});
    CHECK(list.status == 0);
    CHECK(
        list.out.starts_with("logger.csv is read as a tip log: --tip says what a tip is worth.\n"
                             "\nEvents of logger.csv\n\nRecord\n"));
    CHECK_THAT(list.out, Contains("    1  2031-06-14 13:45  13:55") &&
                             Contains("  2 events with 1.0 mm, and 0.0 mm outside events\n"));
    const Outcome rated = rain.storm({"logger.csv", "--tip", "20 mm", "--events", "--sort",
                                      "rarity", "--statistics", "county.csv", "--units", "in"});
    CHECK(rated.status == 0);
    CHECK_THAT(rated.out, Contains("Events by rarity, parted by at least 6 h without rain\n") &&
                              Contains(">100  5 min\n"));
    const Outcome one = rain.storm({"logger.csv", "--tip", "0.2 mm", "--dry-spell", "2 d"});
    CHECK_THAT(one.out, Contains("  1 event with 1.0 mm"));
    const Outcome told = rain.storm({"logger.csv", "--tip", "0.2 mm", "--json", "-"});
    CHECK(json::parse(told.out)["events"].size() == 2);
}

TEST_CASE("an event is cut out, written, and read back") {
    const RainFolder rain;
    const Outcome cut =
        rain.storm({"logger.csv", "--tip", "0.2 mm", "--event", "largest", "--csv", "event.csv"});
    CHECK(cut.status == 0);
    CHECK_THAT(cut.out, Contains("Storm 2031-06-14 13:45\n") &&
                            Contains("  event 1 of 2 in the record logger.csv\n") &&
                            Contains("begins 2031-06-14T13:45:00Z, ends 2031-06-14T13:55:00Z\n"));
    CHECK(rain.folder.read("event.csv") ==
          "start,end,depth [mm]\n"
          "2031-06-14T13:45:00Z,2031-06-14T13:50:00Z,0.4\n"
          "2031-06-14T13:50:00Z,2031-06-14T13:55:00Z,0.2\n");
    const Outcome again = rain.storm({"event.csv", "--event", "1", "--csv", "again.csv"});
    CHECK(again.status == 0);
    CHECK(rain.folder.read("again.csv") == rain.folder.read("event.csv"));
    const Outcome second = rain.storm({"logger.csv", "--tip", "0.2 mm", "--event", "2", "--every",
                                       "1 min", "--statistics", "county.csv"});
    CHECK_THAT(second.out, Contains("  event 2 of 2 in the record logger.csv\n") &&
                               Contains("How rare the event was\n"));
}

TEST_CASE("interval data are listed, and an event of them takes other steps") {
    const RainFolder rain;
    const Outcome list = rain.storm({"gauge.csv"});
    CHECK(list.status == 0);
    CHECK(list.out.starts_with("gauge.csv is read as a gauge record: its rows carry dates.\n"));
    CHECK_THAT(list.out, Contains("  23 h 30 min of it without data, taken as dry\n") &&
                             Contains("  2 events with 12.0 mm"));
    const Outcome event =
        rain.storm({"gauge.csv", "--event", "1", "--every", "30 min", "--csv", "event.csv"});
    CHECK(event.status == 0);
    CHECK_THAT(event.out, Contains("  brought to steps of 30 min: the peak falls from 36.0 to 18.0 "
                                   "mm/h, by 50 %\n"));
    CHECK(rain.folder.read("event.csv") ==
          "start,end,depth [mm]\n2031-06-14T13:00:00Z,2031-06-14T13:30:00Z,9\n");
}

TEST_CASE("a scenario shows its storms without surfaces, one of them to be written") {
    const RainFolder rain;
    const Outcome all = rain.storm({"two.yaml"});
    CHECK(all.status == 0);
    CHECK_THAT(all.out, Contains("Quarry Row\n\nStorm short (1 of 2)\n") &&
                            Contains("\nStorm long (2 of 2)\n"));
    const Outcome one = rain.storm({"two.yaml", "--storm", "long", "--csv", "long.csv"});
    CHECK(one.status == 0);
    CHECK_THAT(one.out, Contains("\nStorm long\n") && !Contains("short"));
    CHECK(rain.folder.read("long.csv") ==
          "start [min],end [min],depth [mm]\n0,10,2\n10,20,6\n20,30,1\n");
    rain.folder.write("two.txt", "# a scenario by another name\n" + kTwoStorms);
    const Outcome named = rain.storm({"two.txt"});
    CHECK(named.status == 0);
    CHECK(named.out.starts_with("two.txt is read as a scenario, it begins with a key.\n"));
}

TEST_CASE("one scenario gives the published alternating blocks to their printed digits") {
    // Chow, Maidment and Mays, Applied Hydrology, 1988, example 14.4.2 (14.4.1 in some printings):
    // Denver, 10 years, 2 h in blocks of 10 min, depths in inches; from memory.
    const std::vector<std::string> printed{"0.024", "0.033", "0.050", "0.084", "0.178", "0.693",
                                           "0.308", "0.117", "0.063", "0.040", "0.028", "0.021"};
    const RainFolder rain;
    rain.folder.write("denver.yaml",
                      "storm:\n  design:\n    pattern: alternating_blocks\n    duration: 2 h\n"
                      "    every: 10 min\n    peak_at: 0.5\n"
                      "    formula: {a: 96.6 in/h, b: 13.9, m: 0.97, n: 1, time: min}\n");
    const Outcome outcome = rain.storm({"denver.yaml", "--json", "-"});
    REQUIRE(outcome.status == 0);
    const json results = json::parse(outcome.out);
    std::vector<std::string> blocks;
    for (const json& step : results["storms"]["storm"]["steps"])
        blocks.push_back(fixed(step["depth_mm"].get<double>() / 25.4, 3));
    CHECK(blocks == printed);
}

TEST_CASE("other steps of a scenario's storm keep its depth, and its peak is told") {
    const RainFolder rain;
    rain.folder.write("more.yaml",
                      "storm:\n  steps: {every: 5 min, depths: [2, 6, 1, 1], unit: mm}\n"
                      "  multiply_by: 1.5\n  continue_for: 1 h\n");
    const Outcome outcome = rain.storm({"more.yaml", "--every", "10 min", "--csv", "more.csv"});
    CHECK(outcome.status == 0);
    CHECK_THAT(outcome.out, Contains("the peak falls from 72.0 to 48.0 mm/h, by 33 %, before the "
                                     "allowance\n") &&
                                !Contains("continue_for"));
    CHECK(rain.folder.read("more.csv") == "start [min],end [min],depth [mm]\n0,10,12\n10,20,3\n");
}

TEST_CASE("an error of the input is status 3, a file that cannot be read 4, and nothing written") {
    const RainFolder rain;
    rain.folder.write("falling.csv", "duration,10 yr [mm]\n5 min,12\n10 min,11\n");
    const Outcome falling = rain.storm({"falling.csv", "--json", "x.json"});
    CHECK(falling.status == 3);
    CHECK(falling.out.empty());
    CHECK_THAT(falling.err, StartsWith("falling.csv:3:8: error: "));
    CHECK(falling.err.ends_with("rainledger: 1 error in falling.csv; nothing was computed\n"));
    const Outcome gap = rain.storm({"none.csv"});
    CHECK(gap.status == 4);
    CHECK_THAT(gap.err, StartsWith("none.csv: error: cannot read the file: "));
    const Outcome nowhere = rain.storm({"rain.csv", "--csv", "no/such/x.csv"});
    CHECK(nowhere.status == 4);
    CHECK(nowhere.out.empty());
    CHECK(nowhere.err == "rainledger: cannot write no/such/x.csv: No such file or directory\n");
    const Outcome table =
        rain.storm({"gauge.csv", "--statistics", "falling.csv", "--json", "x.json"});
    CHECK(table.status == 3);
    CHECK(rain.folder.names() == std::vector<std::string>{"county.csv", "falling.csv", "gauge.csv",
                                                          "logger.csv", "rain.csv", "two.yaml"});
}

TEST_CASE("a hole in a storm of elapsed times is an error, in a record it is dry") {
    const RainFolder rain;
    rain.folder.write("holed.csv", "start [min],end [min],depth [mm]\n0,10,2\n20,30,1\n");
    const Outcome storm = rain.storm({"holed.csv"});
    CHECK(storm.status == 3);
    CHECK_THAT(storm.err, StartsWith("holed.csv:3:1: error: "));
    const Outcome record = rain.storm({"holed.csv", "--events"});
    CHECK(record.status == 0);
    CHECK_THAT(record.out, StartsWith("holed.csv is read as a gauge record of elapsed times.\n") &&
                               Contains("  10 min of it without data, taken as dry\n"));
}

}  // namespace rainledger::cli_test
