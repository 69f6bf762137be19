#include <string>

#include "rain/record_helpers.hpp"

namespace rainledger {
namespace {

std::string problems(const std::string& text, const RecordLayout& layout = tip_layout()) {
    const ReadRecordText read = read_record_text(text, layout);
    CHECK_FALSE(read.record.has_value());
    return read.report;
}

}  // namespace

TEST_CASE("a tip log of elapsed times is refused") {
    CHECK(problems("time [s]\n12\n15\n") ==
          R"(logger.csv:1:1: error: column 'time [s]' holds elapsed times
    time [s]
    ^
    a tip log needs the instant of every tip, such as 2031-06-14T13:45:07Z, in a column 'time' without a unit
)");
    CHECK(problems("time\n12\n15\n") ==
          R"(logger.csv:2:1: error: column 'time' holds numbers, not timestamps
    12
    ^
    a tip log needs the instant of every tip, such as 2031-06-14T13:45:07Z
)");
}

TEST_CASE("columns of a tip log that are not found") {
    SECTION("no header row") {
        CHECK(problems("2026-03-04T10:05Z,1\n2026-03-04T10:06Z,1\n") ==
              R"(logger.csv:1:1: error: the first row is data, not a header row
    2026-03-04T10:05Z,1
    ^
    put a row 'time' above it, with a name for every column: 'time,tips'
)");
    }
    SECTION("no time") {
        CHECK(problems("Date,tips\n2026-03-04T10:05Z,1\n") ==
              R"(logger.csv:1:1: error: there is no time column
    Date,tips
    ^
    columns here: 'Date', 'tips'; call the one of timestamps 'time', or name it with time: in the scenario
)");
    }
    SECTION("none of the name") {
        RecordLayout layout = tip_layout();
        layout.csv.time_column = "Dat";
        layout.csv.rain_column = "N";
        CHECK(problems("Date,tips\n2026-03-04T10:05Z,1\n", layout) ==
              R"(logger.csv:1:1: error: there is no column 'Dat'
    Date,tips
    ^
    did you mean 'Date'? columns here: 'Date', 'tips'
logger.csv:1:1: error: there is no column 'N'
    Date,tips
    ^
    columns here: 'Date', 'tips'
)");
    }
    SECTION("two of them") {
        CHECK(problems("time,tips,count,time\n") ==
              R"(logger.csv:1:17: error: a second column is called 'time'
    time,tips,count,time
                    ^
    rename one of the two
logger.csv:1:11: error: there are two columns of counts, 'tips' and 'count'
    time,tips,count,time
              ^
    state which to read in the scenario with rain:
)");
    }
    SECTION("one for both") {
        RecordLayout layout = tip_layout();
        layout.csv.rain_column = "time";
        CHECK(problems("time,tips\n", layout) ==
              R"(logger.csv:1:1: error: this column is named for both time and rain
    time,tips
    ^
    name two different columns under time: and rain:
)");
    }
    SECTION("no counter") {
        RecordLayout layout = tip_layout();
        layout.running_count = true;
        CHECK(problems("time,total\n2026-03-04T10:05Z,1\n", layout) ==
              R"(logger.csv:1:1: error: there is no column of counts
    time,total
    ^
    columns here: 'time', 'total'; call the counter's 'count', or name it with rain: in the scenario
)");
    }
    SECTION("interval data taken for tips") {
        CHECK(
            problems("time,depth [mm]\n2026-03-04T10:05Z,0.4\n") ==
            R"(logger.csv:1:6: error: column 'depth [mm]' gives rain, but a row of a tip log is a tip
    time,depth [mm]
         ^
    for interval data leave out tip:; where every row is one tip take the column out; a column of counts is named with rain: in the scenario
)");
    }
    SECTION("a column of rain by its unit alone") {
        CHECK(
            problems("time,bucket [mm]\n2026-03-04T10:05Z,0.4\n") ==
            R"(logger.csv:1:6: error: column 'bucket [mm]' gives rain, but a row of a tip log is a tip
    time,bucket [mm]
         ^
    for interval data leave out tip:; where every row is one tip take the column out; a column of counts is named with rain: in the scenario
)");
    }
}

TEST_CASE("cells of a tip log that cannot be read") {
    CHECK(problems("time,tips\n"
                   "2026-03-04T10:05Z,1.5\n"
                   "2026-03-04T10:06Z,-2\n"
                   "2026-03-04T10:07,1\n"
                   "04/03/2026 10:08,1\n"
                   "2026-03-04T10:09Z,one\n"
                   ",1\n"
                   "2026-03-04T10:11Z\n"
                   "2026-03-04T10:12Z,1e13\n") ==
          R"(logger.csv:2:19: error: 1.5 is not a whole number of tips
    2026-03-04T10:05Z,1.5
                      ^
    for depths instead of counts leave out tip: and state unit: mm
logger.csv:3:19: error: a count of tips cannot be negative
    2026-03-04T10:06Z,-2
                      ^
    if -2 marks a missing value, state missing: -2 in the scenario
logger.csv:4:1: error: this timestamp has no UTC offset, unlike those above
    2026-03-04T10:07,1
    ^
    write the offset in every row or in none, or state zone: in the scenario
logger.csv:5:1: error: '04/03/2026 10:08' is not a timestamp
    04/03/2026 10:08,1
    ^
    write year-month-day and the time of the day, 2026-03-04 10:08 or 2026-04-03 10:08
logger.csv:6:19: error: 'one' is not a number
    2026-03-04T10:09Z,one
                      ^
logger.csv:7:1: error: the time is missing here
    ,1
    ^
    every row needs its time
logger.csv:8:18: error: this row has 1 cell, the header 2
    2026-03-04T10:11Z
                     ^
    write every cell, or begin the line with # if it is a note
logger.csv:9:19: error: this rain is too large to compute with, over 1e12 mm
    2026-03-04T10:12Z,1e13
                      ^
    check the count and the depth of a tip
)");
}

TEST_CASE("a tip log without tips is refused") {
    CHECK(problems("time,tips\n") == R"(logger.csv:1:1: error: there are no rows below the header
    time,tips
    ^
    a tip log begins with a row 'time' or 'time,tips', then one row per tip
)");
    CHECK(problems("time,tips\n2026-03-04T10:05Z,0\n") ==
          R"(logger.csv:1:1: error: no row below the header is a tip
    time,tips
    ^
    a tip log begins with a row 'time' or 'time,tips', then one row per tip
)");
    CHECK(problems("# nothing\n") == R"(logger.csv:1:1: error: the file holds no rows
    # nothing
    ^
    a tip log begins with a row 'time' or 'time,tips', then one row per tip
)");
}

TEST_CASE("a damaged tip log, and an unknown zone") {
    CHECK(problems(std::string("time\n2026-03-04T10:0\0Z\n", 23)) ==
          "logger.csv:2:16: error: there is a NUL byte here\n"
          "    2026-03-04T10:0?Z\n"
          "                   ^\n"
          "    the file is damaged, or not plain text; save it anew as UTF-8\n");
    RecordLayout layout = tip_layout();
    layout.csv.zone = "Europe/Madird";
    CHECK(problems("time\n2026-03-04 10:05\n", layout) ==
          R"(logger.csv:1:1: error: time zone 'Europe/Madird' is not known here
    time
    ^
    write a name of the time zone database, such as Europe/Madrid
)");
}

TEST_CASE("after twenty errors the rest are counted, and oddities are still told") {
    std::string text = "time\n2026-03-04T10:05Z\n2026-03-04T10:05Z\n";
    for (int i = 0; i < 25; ++i)
        text += "x\n";
    CHECK_THAT(problems(text), Catch::EndsWith(
                                   R"(logger.csv: error: and 5 more errors
logger.csv:3:1: warning: this tip falls at the instant of the one before; both count
    2026-03-04T10:05Z
    ^
    two quick tips within the logger's resolution, or a row written twice: then take one out
)"));
}

}  // namespace rainledger
