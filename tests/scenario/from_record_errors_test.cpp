#include <string>

#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("from_record stands alone under storms") {
    const StormRoom room;
    CHECK(room.from_record_problems("") ==
          R"(lane.yaml:1:10: error: 'file' is missing from from_record
    storms: {from_record: {}}
             ^
    add 'file: logger.csv'
)");
    CHECK(room.problems(R"(storms: {from_record: [3]}
)") == R"(lane.yaml:1:23: error: a map belongs here, not a list
    storms: {from_record: [3]}
                          ^
    write 'from_record: {file: logger.csv, tip: 0.2 mm, at_least: 10 mm}'
)");
    CHECK(
        room.problems(
            R"(storms: {from_record: {file: logger.csv, tip: 0.2 mm, at_least: 2 mm}, other: {steps: {every: 5 min, depths: [1], unit: mm}}}
)") == R"(lane.yaml:1:10: error: 'from_record' stands alone under 'storms'
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, at_least: 2 mm}, other: {steps: {every: 5 ...
             ^
    take the other storms out, or name events one by one with 'record'
)");
    CHECK(room.problems(R"(storm: {from_record: {file: logger.csv, tip: 0.2 mm}}
)") == R"(lane.yaml:1:1: error: the storm has no rain
    storm: {from_record: {file: logger.csv, tip: 0.2 mm}}
    ^
    add 'hyetograph: rain.csv', 'steps: {every: 5 min, depths: [0.4, 1.1], unit: mm}', 'design: {...}' or 'record: {...}'
lane.yaml:1:9: error: unknown key 'from_record' in the storm
    storm: {from_record: {file: logger.csv, tip: 0.2 mm}}
            ^
    it stands alone under 'storms'
)");
    CHECK(room.problems(R"(from_record: {file: logger.csv, tip: 0.2 mm}
)") == R"(lane.yaml:1:1: error: unknown key 'from_record' in the scenario
    from_record: {file: logger.csv, tip: 0.2 mm}
    ^
    it stands alone under 'storms'
lane.yaml:1:1: error: the scenario has no storm
    from_record: {file: logger.csv, tip: 0.2 mm}
    ^
    write 'storm: {hyetograph: rain.csv}', or 'steps', 'design' or 'record' in its place
)");
}

TEST_CASE("a record without an event that is large enough says so") {
    const StormRoom room;
    CHECK(room.from_record_problems("file: logger.csv, tip: 0.2 mm, at_least: 10 mm") ==
          R"(lane.yaml:1:65: error: no event of 'logger.csv' has 10 mm or more; 3 have less
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, at_least: 10 mm}}
                                                                    ^
    the largest has 2.4 mm
)");
    CHECK(room.from_record_problems("file: dry.csv") ==
          R"(lane.yaml:1:10: error: 'dry.csv' holds no event
    storms: {from_record: {file: dry.csv}}
             ^
    it has no rain: check the file and its columns
)");
    CHECK(room.from_record_problems(
              "file: logger.csv, tip: 0.2 mm, event: largest, minimum: 10 mm") ==
          R"(lane.yaml:1:55: error: unknown key 'event' in from_record
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, event: largest, minimum: 10 mm}}
                                                          ^
    all events are taken here; 'record' in a storm takes one
lane.yaml:1:71: error: unknown key 'minimum' in from_record
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, event: largest, minimum: 10 mm}}
                                                                          ^
    here it is called 'at_least'
)");
}

TEST_CASE("rain in the place of a named storm is told so") {
    const StormRoom room;
    CHECK(room.problems("storms: {record: {file: logger.csv, tip: 0.2 mm, event: 1}}\n") ==
          R"(lane.yaml:1:10: error: 'record' stands where the name of a storm belongs
    storms: {record: {file: logger.csv, tip: 0.2 mm, event: 1}}
             ^
    give the storm a name, 'storms: {july: {record: ...}}', or write 'storm:' for a single one
)");
    CHECK(room.problems("storms: {hyetograph: rain.csv}\n") ==
          R"(lane.yaml:1:10: error: 'hyetograph' stands where the name of a storm belongs
    storms: {hyetograph: rain.csv}
             ^
    give the storm a name, 'storms: {july: {hyetograph: ...}}', or write 'storm:' for a single one
)");
    const std::string steps = "{steps: {every: 5 min, depths: [1], unit: mm}}";
    CHECK(room.read("storms: {design: " + steps + ", steps: " + steps + "}\n").errors == 0);
}

TEST_CASE("storms of too many steps are refused together") {
    const StormRoom room;
    CHECK(room.from_record_problems(
              "file: logger.csv, tip: 0.2 mm, every: 0.001 s, dry_spell: 20 d") ==
          R"(lane.yaml:1:62: error: the storms would have more than 10 million steps
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, every: 0.001 s, dry_spell: 20 d}}
                                                                 ^
    write a longer 'every', or take less of the record
)");
    CHECK(room.from_record_problems("file: logger.csv, tip: 0.2 mm, every: 0.0005 s") ==
          R"(lane.yaml:1:62: error: every: a step shorter than 1 ms cannot be computed
    storms: {from_record: {file: logger.csv, tip: 0.2 mm, every: 0.0005 s}}
                                                                 ^
    check the number and its unit
)");
}

TEST_CASE("what a record lacks around its events is warned of once") {
    const StormRoom room;
    CHECK(
        room.from_record_problems("file: logger.csv, tip: 0.2 mm") ==
        R"(lane.yaml:1:10: warning: the record begins less than 5 days before, so the rain of those 5 days is not known: 2031-06-02 04:10
    storms: {from_record: {file: logger.csv, tip: 0.2 mm}}
             ^
    what is stated is what fell in the part that the record holds
)");
    CHECK(
        room.from_record_problems("file: hourly.csv, every: 1 h") ==
        R"(lane.yaml:1:10: warning: hours without data in the record were taken as dry: 2031-06-10 02:00
    storms: {from_record: {file: hourly.csv, every: 1 h}}
             ^
    the depth may be too small: compare a gauge nearby
)");
    CHECK(
        room.from_record_problems("file: elapsed.csv, dry_spell: 2 h") ==
        R"(lane.yaml:1:10: warning: the record begins less than 5 days before, so the rain of those 5 days is not known: event 1
    storms: {from_record: {file: elapsed.csv, dry_spell: 2 h}}
             ^
    what is stated is what fell in the part that the record holds
elapsed.csv:5:1: warning: this step lasts 1020 min, over three times the usual 60 min
    20,2
    ^
    if rows are missing here, state how long each row covers with every:
)");
}

}  // namespace rainledger
