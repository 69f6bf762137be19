#include <nlohmann/json.hpp>

#include "cli/storm_inputs.hpp"
#include "test.hpp"

// `rainledger storm SCENARIO --events`: the events of the record that a scenario's storms come
// from.
namespace rainledger::cli_test {
namespace {

using nlohmann::json;

constexpr const char* kLargest =
    "storm:\n"
    "  record: {file: logger.csv, tip: 0.2 mm, dry_spell: 12 h, event: largest}\n";

}  // namespace

TEST_CASE("the events of a scenario's record are listed as the record alone lists them") {
    const RainFolder rain;
    rain.folder.write("lane.yaml", kLargest);
    const Outcome alone =
        rain.storm({"logger.csv", "--tip", "0.2 mm", "--dry-spell", "12 h", "--sort", "depth"});
    REQUIRE(alone.status == 0);
    const std::string list = alone.out.substr(alone.out.find("Record\n"));
    CHECK_THAT(list, Contains("Events by depth, parted by at least 12 h without rain\n") &&
                         Contains("  2 events with 1.0 mm, and 0.0 mm outside events\n"));
    for (const std::vector<std::string>& words :
         {std::vector<std::string>{"lane.yaml", "--events", "--sort", "depth"},
          std::vector<std::string>{"lane.yaml", "--sort", "depth"}}) {
        const Outcome outcome = rain.storm(words);
        INFO(outcome.err);
        CHECK(outcome.status == 0);
        CHECK(outcome.out ==
              "lane.yaml is read as a scenario, by its ending.\n\n"
              "Events of logger.csv\n\n" +
                  list);
    }
    const Outcome as_json = rain.storm({"lane.yaml", "--events", "--quiet", "--json", "-"});
    CHECK(as_json.status == 0);
    CHECK(json::parse(as_json.out)["events"].size() == 2);
}

TEST_CASE("all events of a record stand in one list, and --storm chooses the record") {
    const RainFolder rain;
    rain.folder.write("all.yaml", "storms: {from_record: {file: logger.csv, tip: 0.2 mm}}\n");
    CHECK_THAT(rain.storm({"all.yaml", "--events", "--quiet"}).out,
               Contains("\nEvents of logger.csv\n") && Contains("  2 events with 1.0 mm"));
    rain.folder.write("both.yaml",
                      "storms:\n"
                      "  tips: {record: {file: logger.csv, tip: 0.2 mm, event: 1}}\n"
                      "  rain: {record: {file: gauge.csv, event: 1}}\n"
                      "  apart: {record: {file: gauge.csv, dry_spell: 2 d, event: 1}}\n"
                      "  made: {steps: {every: 5 min, depths: [2], unit: mm}}\n");
    CHECK(complaint(rain, {"both.yaml", "--events"}) ==
          "--events lists one record, taken apart in one way; choose a storm out of it with "
          "--storm NAME: tips, rain, apart");
    CHECK_THAT(rain.storm({"both.yaml", "--events", "--storm", "rain"}).out,
               Contains("\nEvents of gauge.csv\n") && Contains("  2 events with 12.0 mm"));
    CHECK_THAT(rain.storm({"both.yaml", "--events", "--storm", "apart"}).out,
               Contains("\nEvents of gauge.csv\n") && Contains("  1 event with 12.0 mm"));
    CHECK(complaint(rain, {"both.yaml", "--events", "--storm", "made"}) ==
          "--events lists the events of a record, and no storm of 'both.yaml' is taken out of one "
          "('record:')");
}

TEST_CASE("the rarity of a scenario's events comes from the table that it names") {
    const RainFolder rain;
    rain.folder.write("lane.yaml", kLargest);
    CHECK(complaint(rain, {"lane.yaml", "--sort", "rarity"}) ==
          "--sort rarity needs a table of statistics: name one under 'record:'");
    rain.folder.write("rated.yaml",
                      "storm: {record: {file: logger.csv, tip: 20 mm, event: 1, statistics: "
                      "county.csv}}\n");
    const Outcome rated = rain.storm({"rated.yaml", "--sort", "rarity", "--quiet"});
    CHECK(rated.status == 0);
    CHECK_THAT(rated.out, Contains("Events by rarity, ") && Contains(">100  5 min\n"));
}

TEST_CASE("what a list of events cannot do is refused") {
    const RainFolder rain;
    rain.folder.write("lane.yaml", kLargest);
    CHECK(complaint(rain, {"two.yaml", "--events"}) ==
          "--events lists the events of a record, and no storm of 'two.yaml' is taken out of one "
          "('record:')");
    CHECK(complaint(rain, {"lane.yaml", "--events", "--every", "10 min"}) ==
          "--every gives storms other steps, and --events lists events");
    CHECK(complaint(rain, {"lane.yaml", "--events", "--csv", "x.csv"}) ==
          "--csv needs a storm, and --events lists events; leave out one of the two");
    CHECK(complaint(rain, {"lane.yaml", "--sort", "depth", "--chart", "x.svg"}) ==
          "--chart needs a storm, and --sort lists events; leave out one of the two");
    CHECK(
        complaint(rain, {"lane.yaml", "--event", "1"}) ==
        "--event goes with a gauge record, and 'lane.yaml' is a scenario; name the record itself");
    CHECK(complaint(rain, {"lane.yaml", "--events", "--json", "./logger.csv"}) ==
          "'./logger.csv' is the scenario's rain; name another file to write");
}

}  // namespace rainledger::cli_test
