#include <string>
#include <variant>
#include <vector>

#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

std::vector<Storm> storms_in(const StormRoom& room, const std::string& record) {
    Outcome outcome = room.read("storms: {from_record: {" + record + "}}\n");
    INFO(record << "\n" << outcome.problems);
    REQUIRE(outcome.scenario);
    return outcome.scenario->storms;
}

std::vector<std::string> names_of(const std::vector<Storm>& storms) {
    std::vector<std::string> names;
    for (const Storm& storm : storms)
        names.push_back(storm.name);
    return names;
}

using Names = std::vector<std::string>;

}  // namespace

TEST_CASE("every event of a record is a storm named by its start") {
    const StormRoom room;
    const auto storms = storms_in(room, "file: logger.csv, tip: 0.2 mm");
    CHECK(names_of(storms) == Names{"2031-06-02 04:10", "2031-06-14 13:45", "2031-06-20 22:00"});
    for (const Storm& storm : storms) {
        CHECK(storm.file == "logger.csv");
        CHECK(storm.files == Names{room.path("logger.csv")});
        CHECK(storm.place.line == 1);
        CHECK(storm.place.column == 10);
    }
    const auto& second = std::get<EventOrigin>(storms[1].origin);
    CHECK(second.event.number == 2);
    CHECK(second.events_in_record == 3);
    CHECK_THAT(second.event.depth_mm, WithinRel(2.4, 1e-12));
    // The first event, 0.6 mm, fell twelve days before.
    CHECK(second.event.antecedent_5_day_mm == 0.0);
    CHECK_FALSE(std::get<EventOrigin>(storms[0].origin).event.antecedent_known);
}

TEST_CASE("events of a depth and more keep their numbers and have their rarity") {
    const StormRoom room;
    const auto storms =
        storms_in(room, "file: logger.csv, tip: 0.2 mm, at_least: 1 mm, statistics: county.csv");
    CHECK(names_of(storms) == Names{"2031-06-14 13:45", "2031-06-20 22:00"});
    CHECK(std::get<EventOrigin>(storms[1].origin).event.number == 3);
    CHECK(std::get<EventOrigin>(storms[1].origin).rarity);
    CHECK(storms[0].files == Names{room.path("logger.csv"), room.path("county.csv")});
}

TEST_CASE("rain of the five days before is counted") {
    const StormRoom room;
    const auto storms = storms_in(room, "file: hourly.csv, every: 1 h");
    REQUIRE(storms.size() == 2);
    CHECK(std::get<EventOrigin>(storms[1].origin).event.antecedent_5_day_mm == 7.5);
}

TEST_CASE("events of elapsed times are named by number") {
    const StormRoom room;
    CHECK(names_of(storms_in(room, "file: elapsed.csv, every: 1 h")) ==
          Names{"event 1", "event 2"});
}

TEST_CASE("names of events differ even where the clock reads the same") {
    StormRoom room;
    room.write("seconds.csv",
               "end,depth [mm]\n2031-06-01 00:00:10,1\n2031-06-01 00:00:20,0\n"
               "2031-06-01 00:00:30,1\n2031-06-01 00:00:40,0\n2031-06-01 00:00:50,2\n");
    CHECK(names_of(storms_in(room, "file: seconds.csv, dry_spell: 10 s")) ==
          Names{"2031-06-01 00:00", "2031-06-01 00:00:20", "2031-06-01 00:00:40"});
    room.write("autumn.csv", "time\n2031-10-26 02:32+02:00\n2031-10-26 02:32+01:00\n");
    CHECK(names_of(storms_in(room, "file: autumn.csv, tip: 0.2 mm, dry_spell: 30 min")) ==
          Names{"2031-10-26 02:30", "2031-10-26 02:30 (event 2)"});
}

}  // namespace rainledger
