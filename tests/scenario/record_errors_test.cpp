#include <string>

#include "scenario/storm_room.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a record names its file and the event") {
    const StormRoom room;
    CHECK(room.record_problems("") == R"(lane.yaml:1:9: error: 'file' is missing from record
    storm: {record: {}}
            ^
    add 'file: logger.csv'
lane.yaml:1:9: error: 'event' is missing from record
    storm: {record: {}}
            ^
    add 'event: largest'
)");
    CHECK(room.problems(R"(storm: {record: logger.csv}
)") == R"(lane.yaml:1:17: error: a map belongs here, not 'logger.csv'
    storm: {record: logger.csv}
                    ^
    write 'record: {file: logger.csv, tip: 0.2 mm, event: largest}'
)");
    CHECK(room.record_problems("file: nowhere.csv, event: largest, statistics: none.csv") ==
          R"(lane.yaml:1:24: error: cannot read 'nowhere.csv': No such file or directory
    storm: {record: {file: nowhere.csv, event: largest, statistics: none.csv}}
                           ^
    file names are relative to the scenario's folder
lane.yaml:1:65: error: cannot read 'none.csv': No such file or directory
    storm: {record: {file: nowhere.csv, event: largest, statistics: none.csv}}
                                                                    ^
    file names are relative to the scenario's folder
)");
    CHECK(room.record_problems(R"(file: "", event: largest)") ==
          R"(lane.yaml:1:24: error: the file name is empty
    storm: {record: {file: "", event: largest}}
                           ^
    write a file name, such as 'file: logger.csv'
)");
    CHECK(room.record_problems("csv: logger.csv, bucket: 0.2 mm, inter_event_time: 6 h, storm: "
                               "largest, idf: county.csv, at_least: 3 mm, gaps: dry") ==
          R"(lane.yaml:1:18: error: unknown key 'csv' in record
    storm: {record: {csv: logger.csv, bucket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: co...
                     ^
    here it is called 'file'
lane.yaml:1:35: error: unknown key 'bucket' in record
    storm: {record: {csv: logger.csv, bucket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: co...
                                      ^
    here it is called 'tip'
lane.yaml:1:51: error: unknown key 'inter_event_time' in record
    ...orm: {record: {csv: logger.csv, bucket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: coun...
                                                       ^
    here it is called 'dry_spell'
lane.yaml:1:74: error: unknown key 'storm' in record
    ...ger.csv, bucket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: county.csv, at_least: 3 mm,...
                                                       ^
    here it is called 'event'
lane.yaml:1:90: error: unknown key 'idf' in record
    ...ket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: county.csv, at_least: 3 mm, gaps: dry}}
                                                           ^
    here it is called 'statistics'
lane.yaml:1:107: error: unknown key 'at_least' in record
    ...ket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: county.csv, at_least: 3 mm, gaps: dry}}
                                                                            ^
    it belongs under 'from_record'
lane.yaml:1:123: error: unknown key 'gaps' in record
    ...ket: 0.2 mm, inter_event_time: 6 h, storm: largest, idf: county.csv, at_least: 3 mm, gaps: dry}}
                                                                                            ^
    holes in a record are always taken as dry: take it out
)");
}

TEST_CASE("an event is the largest, a number or a stretch") {
    StormRoom room;
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: biggest") ==
          R"(lane.yaml:1:56: error: event: 'biggest' is not a choice here
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: biggest}}
                                                           ^
    write 'event: largest'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: 0") ==
          R"(lane.yaml:1:56: error: event: '0' is not a choice here
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: 0}}
                                                           ^
    write 'event: largest', or an event's number by time such as 'event: 3', or 'event: {from: 2031-06-14 13:00, to: 2031-06-14 18:00}'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: 2.5") ==
          R"(lane.yaml:1:56: error: event: '2.5' is not a choice here
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: 2.5}}
                                                           ^
    write 'event: largest', or an event's number by time such as 'event: 3', or 'event: {from: 2031-06-14 13:00, to: 2031-06-14 18:00}'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: [1, 2]") ==
          R"(lane.yaml:1:56: error: 'event' takes a word, a number or a map, not a list
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: [1, 2]}}
                                                           ^
    write 'event: largest', or an event's number by time such as 'event: 3', or 'event: {from: 2031-06-14 13:00, to: 2031-06-14 18:00}'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: {}") ==
          R"(lane.yaml:1:49: error: 'from' is missing from event
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: {}}}
                                                    ^
    add 'from: 2031-06-14 13:00'
lane.yaml:1:49: error: 'to' is missing from event
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: {}}}
                                                    ^
    add 'to: 2031-06-14 18:00'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: 4") ==
          R"(lane.yaml:1:56: error: event: there is no event 4; 'logger.csv' holds 3
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: 4}}
                                                           ^
    they are numbered by time: 'rainledger storm logger.csv --tip "0.2 mm" --events' lists them
)");
    room.write("in july.csv", "end,depth [mm]\n2031-07-01 01:00,2\n2031-07-01 02:00,1\n");
    CHECK(room.record_problems("file: in july.csv, dry_spell: 3 h, threshold: 0.5 mm, zone: "
                               "Europe/Madrid, event: 4") ==
          R"(lane.yaml:1:100: error: event: there is no event 4; 'in july.csv' holds 1
    ... {record: {file: in july.csv, dry_spell: 3 h, threshold: 0.5 mm, zone: Europe/Madrid, event: 4}}
                                                                                                    ^
    they are numbered by time: 'rainledger storm "in july.csv" --dry-spell "3 h" --threshold "0.5 mm" --zone "Europe/Madrid" --events' lists them
)");
    CHECK(
        room.record_problems(
            "file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14, until: 2031-06-14 13:00}") ==
        R"(lane.yaml:1:63: error: from: '2031-06-14' is not a timestamp
    ...m: {record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14, until: 2031-06-14 13:00}}}
                                                                 ^
    write 2026-03-04T10:05 or 2026-03-04 10:05:00+01:00
lane.yaml:1:75: error: unknown key 'until' in event
    ...m: {record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14, until: 2031-06-14 13:00}}}
                                                                             ^
    here it is called 'to'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 15:00, to: "
                               "2031-06-14 15:00}") ==
          R"(lane.yaml:1:85: error: 'to' is not after 'from'
    ...{record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 15:00, to: 2031-06-14 15:00}}}
                                                                                    ^
    exchange them, or check the dates
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: {from: 2031-05-14 15:00, to: "
                               "2031-05-14 16:00}") ==
          R"(lane.yaml:1:56: error: 'logger.csv' holds no time in this stretch
    ...{record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-05-14 15:00, to: 2031-05-14 16:00}}}
                                                       ^
    it runs from 2031-06-02 04:10:20 to 2031-06-20 22:51
)");
}

TEST_CASE("a record without events says so") {
    const StormRoom room;
    CHECK(room.record_problems("file: dry.csv, event: largest") ==
          R"(lane.yaml:1:40: error: 'dry.csv' holds no event
    storm: {record: {file: dry.csv, event: largest}}
                                           ^
    it has no rain: check the file and its columns
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, threshold: 30 mm, event: 1") ==
          R"(lane.yaml:1:74: error: 'logger.csv' holds no event
    storm: {record: {file: logger.csv, tip: 0.2 mm, threshold: 30 mm, event: 1}}
                                                                             ^
    all its rain is below the threshold: lower it
)");
}

TEST_CASE("a stretch is on the clock of the gauge") {
    const StormRoom room;
    CHECK(
        room.record_problems("file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 13:00+02:00, "
                             "to: 2031-06-14 18:00}") ==
        R"(lane.yaml:1:63: error: the stamps of 'logger.csv' have no UTC offset, so one cannot be matched
    ...d: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 13:00+02:00, to: 2031-06-14 18:00}}}
                                                        ^
    write the time that the gauge's clock showed, or add 'zone'
)");
    CHECK(
        room.record_problems("file: logger.csv, tip: 0.2 mm, zone: Europe/Madrid, event: {from: "
                             "2031-03-30 02:30, to: 2031-06-14 18:00}") ==
        R"(lane.yaml:1:84: error: '2031-03-30 02:30' is a time that the clocks of Europe/Madrid skip
    ...r.csv, tip: 0.2 mm, zone: Europe/Madrid, event: {from: 2031-03-30 02:30, to: 2031-06-14 18:00}}}
                                                              ^
    write the time before or after the change
)");
    CHECK(room.record_problems(
              "file: elapsed.csv, event: {from: 2031-06-10 03:00, to: 2031-06-10 08:00}") ==
          R"(lane.yaml:1:44: error: 'elapsed.csv' has elapsed times, not dates
    storm: {record: {file: elapsed.csv, event: {from: 2031-06-10 03:00, to: 2031-06-10 08:00}}}
                                               ^
    name an event: 'event: largest', or its number by time
elapsed.csv:5:1: warning: this step lasts 1020 min, over three times the usual 60 min
    20,2
    ^
    if rows are missing here, state how long each row covers with every:
)");
}

TEST_CASE("keys of tip logs and of interval data are told apart") {
    const StormRoom room;
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, unit: mm, kind: depth, stamp: end, "
                               "time_unit: s, event: largest") ==
          R"(lane.yaml:1:49: error: 'unit' does not go with 'tip'
    storm: {record: {file: logger.csv, tip: 0.2 mm, unit: mm, kind: depth, stamp: end, time_unit: s,...
                                                    ^
    each row of a tip log is a tip of that depth at an instant: take it out
lane.yaml:1:59: error: 'kind' does not go with 'tip'
    ...cord: {file: logger.csv, tip: 0.2 mm, unit: mm, kind: depth, stamp: end, time_unit: s, event: la...
                                                       ^
    each row of a tip log is a tip of that depth at an instant: take it out
lane.yaml:1:72: error: 'stamp' does not go with 'tip'
    ...file: logger.csv, tip: 0.2 mm, unit: mm, kind: depth, stamp: end, time_unit: s, event: largest}}
                                                             ^
    each row of a tip log is a tip of that depth at an instant: take it out
lane.yaml:1:84: error: 'time_unit' does not go with 'tip'
    ...file: logger.csv, tip: 0.2 mm, unit: mm, kind: depth, stamp: end, time_unit: s, event: largest}}
                                                                         ^
    each row of a tip log is a tip of that depth at an instant: take it out
)");
    CHECK(room.record_problems("file: hourly.csv, tips: spread, count: running, event: largest") ==
          R"(lane.yaml:1:36: error: 'tips' goes with a tip log only
    storm: {record: {file: hourly.csv, tips: spread, count: running, event: largest}}
                                       ^
    add the depth of one tip, 'tip: 0.2 mm'
lane.yaml:1:50: error: 'count' goes with a tip log only
    storm: {record: {file: hourly.csv, tips: spread, count: running, event: largest}}
                                                     ^
    add the depth of one tip, 'tip: 0.2 mm'
)");
    CHECK(room.record_problems("file: logger.csv, event: largest") ==
          R"(lane.yaml:1:24: warning: 'logger.csv' is read as interval data
    storm: {record: {file: logger.csv, event: largest}}
                           ^
    for a log of tips add the depth of one tip, 'tip: 0.2 mm'
logger.csv:1:1: error: it is not stated whether 'time' is the start or the end of a step
    time
    ^
    state it in the scenario with stamp: start or stamp: end, or call the column start or end
logger.csv:1:1: error: there is no rain column
    time
    ^
    if this line is a note, begin it with #; columns here: 'time'; call it 'depth [mm]', 'intensity [mm/h]' or 'cumulative [mm]'
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, tips: evenly, count: total, every: "
                               "0.0001 s, dry_spell: 0 h, threshold: -1 mm, event: largest") ==
          R"(lane.yaml:1:55: error: tips: 'evenly' is not a choice here
    ... {record: {file: logger.csv, tip: 0.2 mm, tips: evenly, count: total, every: 0.0001 s, dry_spell...
                                                       ^
    known here: in_steps, spread
lane.yaml:1:70: error: count: 'total' is not a choice here
    ...: logger.csv, tip: 0.2 mm, tips: evenly, count: total, every: 0.0001 s, dry_spell: 0 h, threshol...
                                                       ^
    here it is called 'running'
lane.yaml:1:84: error: every: a step shorter than 1 ms cannot be computed
    ...tip: 0.2 mm, tips: evenly, count: total, every: 0.0001 s, dry_spell: 0 h, threshold: -1 mm, even...
                                                       ^
    check the number and its unit
lane.yaml:1:105: error: dry_spell: '0 h' is not above zero
    ... tips: evenly, count: total, every: 0.0001 s, dry_spell: 0 h, threshold: -1 mm, event: largest}}
                                                                ^
    write more than zero, such as '15 min'
lane.yaml:1:121: error: threshold: '-1 mm' is below zero
    ... tips: evenly, count: total, every: 0.0001 s, dry_spell: 0 h, threshold: -1 mm, event: largest}}
                                                                                ^
    write zero or more
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, every: 25 h, event: largest") ==
          R"(lane.yaml:1:56: error: every: '25 h' is longer than a day
    storm: {record: {file: logger.csv, tip: 0.2 mm, every: 25 h, event: largest}}
                                                           ^
    tips become steps that count from midnight: write some minutes
)");
    CHECK(
        room.record_problems("file: hourly.csv, unit: inch, zone: Nowhere/None, event: largest") ==
        R"(lane.yaml:1:42: error: unit: 'inch' is not a unit here
    storm: {record: {file: hourly.csv, unit: inch, zone: Nowhere/None, event: largest}}
                                             ^
    did you mean 'in'?
lane.yaml:1:54: error: zone: 'Nowhere/None' is not in the time zone database
    storm: {record: {file: hourly.csv, unit: inch, zone: Nowhere/None, event: largest}}
                                                         ^
    write a zone by its place, such as 'Europe/Madrid'
)");
}

TEST_CASE("more steps than can be held are refused") {
    const StormRoom room;
    CHECK(room.record_problems(
              "file: logger.csv, tip: 0.2 mm, every: 0.001 s, dry_spell: 100 d, event: largest") ==
          R"(lane.yaml:1:56: error: the storm would have more than 10 million steps
    ...orm: {record: {file: logger.csv, tip: 0.2 mm, every: 0.001 s, dry_spell: 100 d, event: largest}}
                                                            ^
    write a longer 'every', or take less of the record
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, every: 0.001 s, event: {from: "
                               "2031-06-02 04:00, to: 2031-06-14 18:00}") ==
          R"(lane.yaml:1:56: error: the storm would have more than 10 million steps
    ...{record: {file: logger.csv, tip: 0.2 mm, every: 0.001 s, event: {from: 2031-06-02 04:00, to: 203...
                                                       ^
    write a longer 'every', or take less of the record
)");
}

TEST_CASE("what a record lacks around an event is warned of") {
    const StormRoom room;
    CHECK(
        room.record_problems("file: logger.csv, tip: 0.2 mm, event: 1") ==
        R"(lane.yaml:1:56: warning: event 1: the record begins less than 5 days before, so the rain of those 5 days is not known
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: 1}}
                                                           ^
    what is stated is what fell in the part that the record holds
)");
    CHECK(room.record_problems("file: hourly.csv, event: largest, every: 1 h") ==
          R"(lane.yaml:1:43: warning: event 1: 2 h without data in the record were taken as dry
    storm: {record: {file: hourly.csv, event: largest, every: 1 h}}
                                              ^
    the depth may be too small: compare a gauge nearby
)");
    CHECK(
        room.record_problems("file: elapsed.csv, event: largest, every: 1 h") ==
        R"(lane.yaml:1:44: warning: event 2: the record begins less than 5 days before, so the rain of those 5 days is not known
    storm: {record: {file: elapsed.csv, event: largest, every: 1 h}}
                                               ^
    what is stated is what fell in the part that the record holds
)");
}

TEST_CASE("a stretch that begins in rain, or holds none, is warned of") {
    const StormRoom room;
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 13:50, to: "
                               "2031-06-14 15:00}") ==
          R"(lane.yaml:1:63: warning: the stretch begins in rain: 1.2 mm fell in the 6 h before it
    ...{record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-14 13:50, to: 2031-06-14 15:00}}}
                                                              ^
    a burst without the rain before it meets losses that this rain would have filled: begin earlier
)");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, threshold: 2 mm, event: {from: "
                               "2031-06-14 13:50, to: 2031-06-14 15:00}") == R"()");
    CHECK(room.record_problems("file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-16 15:00, to: "
                               "2031-06-16 16:00}") ==
          R"(lane.yaml:1:63: warning: no rain fell in the stretch
    ...{record: {file: logger.csv, tip: 0.2 mm, event: {from: 2031-06-16 15:00, to: 2031-06-16 16:00}}}
                                                              ^
    the record runs from 2031-06-02 04:10:20 to 2031-06-20 22:51
)");
    CHECK(room.record_problems("file: hourly.csv, every: 1 h, event: {from: 2031-06-10 03:00, to: "
                               "2031-06-10 04:00}") ==
          R"(lane.yaml:1:62: warning: the stretch begins in rain: 4 mm fell in the 6 h before it
    ... {record: {file: hourly.csv, every: 1 h, event: {from: 2031-06-10 03:00, to: 2031-06-10 04:00}}}
                                                              ^
    a burst without the rain before it meets losses that this rain would have filled: begin earlier
)");
}

TEST_CASE("rarity needs return periods") {
    const StormRoom room;
    CHECK(
        room.record_problems("file: logger.csv, tip: 0.2 mm, event: 2, statistics: list.csv") ==
        R"(lane.yaml:1:71: error: 'list.csv' names no return periods, so it cannot say how rare an event was
    storm: {record: {file: logger.csv, tip: 0.2 mm, event: 2, statistics: list.csv}}
                                                                          ^
    name a table with a column for each return period, or take it out
)");
    CHECK(
        room.record_problems("file: logger.csv, tip: 0.2 mm, event: 2, statistics: falling.csv") ==
        R"(falling.csv:3:10: error: depth falls with return period: 11 mm for 10 yr is less than 27.1 mm for 2 yr
    1 h,27.1,11
             ^
    rarer rain is deeper; check both values
falling.csv:3:10: error: depth falls with duration: 11 mm over 1 h is less rain than 12.5 mm over 5 min
    1 h,27.1,11
             ^
    a longer duration holds the shorter one; check both values
)");
}

}  // namespace rainledger
