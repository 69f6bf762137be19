#include <cstdint>
#include <string>
#include <variant>
#include <vector>

#include "rainledger/scenario/storm_making.hpp"
#include "rainledger/scenario/warnings.hpp"
#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kRounding = 1e-12;  // relative: sums of a few tips

Storm storm_in(const StormRoom& room, const std::string& record) {
    Outcome outcome = room.read("storm: {record: {" + record + "}}\n");
    INFO(record << "\n" << outcome.problems);
    REQUIRE(outcome.scenario);
    return outcome.scenario->storms.at(0);
}

const EventOrigin& origin_of(const Storm& storm) {
    return std::get<EventOrigin>(storm.origin);
}

std::string start_of(const Storm& storm) {
    return iso_stamp(*storm.rain.stamps, 0);
}

std::string end_of(const Storm& storm) {
    return iso_stamp(*storm.rain.stamps, storm.rain.steps());
}

const std::string kTips = "file: logger.csv, tip: 0.2 mm, ";

}  // namespace

TEST_CASE("the largest event of a tip log is taken, or one by its number") {
    const StormRoom room;
    const Storm largest = storm_in(room, kTips + "event: largest");
    CHECK(largest.name == "storm");
    CHECK_THAT(total_depth_mm(largest.rain), WithinRel(2.4, kRounding));
    CHECK(start_of(largest) == "2031-06-14T13:45:00");
    CHECK(end_of(largest) == "2031-06-14T14:30:00");
    CHECK(largest.rain.steps() == 9);  // of 5 min unless stated
    CHECK(largest.file == "logger.csv");
    CHECK(largest.files == std::vector<std::string>{room.path("logger.csv")});
    CHECK(origin_of(largest).event.number == 2);
    CHECK(origin_of(largest).events_in_record == 3);
    CHECK(origin_of(largest).event.antecedent_known);
    CHECK_FALSE(origin_of(largest).rarity);

    const Storm third = storm_in(room, kTips + "event: 3, every: 15 min");
    CHECK(start_of(third) == "2031-06-20T22:00:00");
    CHECK(third.rain.steps() == 4);
    CHECK_THAT(total_depth_mm(third.rain), WithinRel(1.0, kRounding));
}

TEST_CASE("tips fall in steps or are spread since the tip before") {
    const StormRoom room;
    const Storm steps = storm_in(room, kTips + "event: 3, every: 5 min, tips: in_steps");
    const Storm spread = storm_in(room, kTips + "event: 3, every: 5 min, tips: spread");
    CHECK_THAT(total_depth_mm(spread.rain), WithinRel(1.0, kRounding));
    CHECK(peak_intensity_mm_per_h(steps.rain) > peak_intensity_mm_per_h(spread.rain));
}

TEST_CASE("the rule of events is the scenario's") {
    const StormRoom room;
    CHECK(origin_of(storm_in(room, kTips + "event: largest, dry_spell: 7 d")).events_in_record ==
          2);
    CHECK(origin_of(storm_in(room, kTips + "event: largest, dry_spell: 5 min")).events_in_record >
          6);
    // The first event alone holds less than 0.7 mm; the second keeps its weak ends.
    const Storm storm = storm_in(room, kTips + "event: 1, threshold: 0.7 mm");
    CHECK(origin_of(storm).events_in_record == 2);
    CHECK(start_of(storm) == "2031-06-14T13:45:00");
    CHECK_THAT(total_depth_mm(storm.rain), WithinRel(2.4, kRounding));
}

TEST_CASE("counts are tips of the row or a running counter") {
    StormRoom room;
    room.write("counts.csv",
               "time,tips\n2031-06-02 04:10,2\n2031-06-02 04:15,0\n"
               "2031-06-02 04:20,5\n2031-06-02 04:25,9\n");
    const std::string record = "file: counts.csv, tip: 0.2 mm, event: largest, count: ";
    CHECK_THAT(total_depth_mm(storm_in(room, record + "per_row").rain), WithinRel(3.2, kRounding));
    room.write("counts.csv",
               "time,tips\n2031-06-02 04:10,2\n2031-06-02 04:15,2\n"
               "2031-06-02 04:20,5\n2031-06-02 04:25,9\n");
    CHECK_THAT(total_depth_mm(storm_in(room, record + "running").rain), WithinRel(1.4, kRounding));
}

TEST_CASE("a stretch is taken whatever the dry spells") {
    const StormRoom room;
    const Storm storm = storm_in(
        room,
        kTips + "event: {from: 2031-06-14 13:00, to: 2031-06-14 15:00}, statistics: county.csv");
    CHECK(start_of(storm) == "2031-06-14T13:00:00");
    CHECK(end_of(storm) == "2031-06-14T15:00:00");
    CHECK_THAT(total_depth_mm(storm.rain), WithinRel(2.4, kRounding));
    CHECK(origin_of(storm).event.number == 0);
    CHECK(origin_of(storm).events_in_record == 0);
    CHECK(origin_of(storm).rarity);
    CHECK(storm.file == "logger.csv");
    CHECK(storm.files ==
          std::vector<std::string>{room.path("logger.csv"), room.path("county.csv")});
}

TEST_CASE("a stretch of a record with offsets is on the gauge's clock, or has its own offset") {
    const StormRoom room;
    const std::string zoned = "file: zoned.csv, tip: 0.2 mm, event: ";
    for (const char* event : {"{from: 2031-06-14 13:00, to: 2031-06-14 15:00}",
                              "{from: 2031-06-14 11:00Z, to: 2031-06-14 13:00Z}",
                              "{from: 2031-06-14 13:00, to: 2031-06-14 18:00+05:00}"})
        CHECK(start_of(storm_in(room, zoned + event)) == "2031-06-14T13:00:00+02:00");
    CHECK(start_of(storm_in(room, kTips + "zone: Europe/Madrid, event: {from: 2031-06-14 13:00, "
                                          "to: 2031-06-14 15:00}")) == "2031-06-14T13:00:00+02:00");
}

TEST_CASE("interval data are cut into events with their own steps") {
    const StormRoom room;
    const Storm storm = storm_in(room, "file: hourly.csv, every: 1 h, event: largest");
    CHECK(storm.rain.depth_mm == std::vector<double>{4.0, 2.5, 0.0, 1.0});
    CHECK(start_of(storm) == "2031-06-10T02:00:00");
    CHECK(origin_of(storm).event.without_data_h == 2.0);
    CHECK(origin_of(storm).event.antecedent_known);
    const Storm elapsed = storm_in(room, "file: elapsed.csv, every: 1 h, event: 1");
    CHECK(elapsed.rain.depth_mm == std::vector<double>{3.0, 1.0});
    CHECK(elapsed.rain.edges_h.front() == 1.0);
}

TEST_CASE("an event has its rarity where statistics are named") {
    const StormRoom room;
    const Storm storm =
        storm_in(room, "file: elapsed.csv, every: 1 h, event: 2, statistics: county.csv");
    REQUIRE(origin_of(storm).rarity);
    const EventRarity& rarity = *origin_of(storm).rarity;
    REQUIRE(rarity.by_duration.size() == 3);  // 5 min, 1 h and 2 h fit into two hours
    CHECK_THAT(rarity.by_duration[1].depth_mm, WithinRel(5.0, kRounding));
    CHECK(rarity.by_duration[1].rarity.less_than == 2.0);
}

TEST_CASE("what resampling and an allowance do to an event leaves its figures as they were") {
    const StormRoom room;
    Outcome outcome =
        room.read("storm: {record: {" + kTips + "event: 2}, resample: 15 min, multiply_by: 1.5}\n");
    REQUIRE(outcome.scenario);
    const Storm& storm = outcome.scenario->storms.at(0);
    CHECK(storm.rain.steps() == 3);
    CHECK_THAT(total_depth_mm(storm.rain), WithinRel(3.6, kRounding));
    CHECK_THAT(origin_of(storm).event.depth_mm, WithinRel(2.4, kRounding));
    REQUIRE(storm.resampled);
    CHECK(storm.resampled->peak_before_mm_per_h > storm.resampled->peak_after_mm_per_h);
}

TEST_CASE("hours without data in an event are told once, on reading") {
    const StormRoom room;
    const Outcome outcome = room.read(
        "storm: {record: {file: hourly.csv, every: 1 h, event: largest}}\n"
        "surfaces: {lot: {area: 1 ha, losses: impervious}}\n");
    REQUIRE(outcome.scenario);
    const Storm& storm = outcome.scenario->storms.at(0);
    CHECK(storm.rain.taken_as_dry_h == 2.0);
    Diagnostics results;
    warn_of_results(*outcome.scenario, storm, keep_ledger(outcome.scenario->site, storm.rain),
                    results);
    CHECK(results.list().empty());
}

}  // namespace rainledger
