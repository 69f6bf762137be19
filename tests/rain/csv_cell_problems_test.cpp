#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("a cell that is not understood is refused where it stands") {
    SECTION("cell counts") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5\n"
                          "10,0,4\n",
                          layout) ==
              R"(gauge.csv:2:2: error: this row has 1 cell, the header 2
    5
     ^
    write every cell, or begin the line with # if it is a note
gauge.csv:3:5: error: this row has 3 cells, the header 2
    10,0,4
        ^
    with decimal commas, separate the cells by semicolons or tabs
)");
    }
    SECTION("cell counts, semicolon") {
        CsvLayout layout;
        CHECK(problems_in("end [min];depth [mm]\n"
                          "5\n"
                          "10;0,4;\n",
                          layout) ==
              R"(gauge.csv:2:2: error: this row has 1 cell, the header 2
    5
     ^
    write every cell, or begin the line with # if it is a note
gauge.csv:3:7: error: this row has 3 cells, the header 2
    10;0,4;
          ^
    remove what is behind the last cell, or name its column in the header
)");
    }
    SECTION("not a number") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "five,1\n"
                          "10,0.4 mm\n"
                          "15,abc\n",
                          layout) ==
              R"(gauge.csv:2:1: error: 'five' is not a number
    five,1
    ^
gauge.csv:3:4: error: '0.4 mm' is not a number
    10,0.4 mm
       ^
    write a plain number such as 12.5; the unit stands in the header
gauge.csv:4:4: error: 'abc' is not a number
    15,abc
       ^
)");
    }
    SECTION("thousands") {
        CsvLayout layout;
        CHECK(problems_in("end [min];depth [mm]\n"
                          "5;1.234,5\n",
                          layout) ==
              R"(gauge.csv:2:3: error: '1.234,5' is not a number
    5;1.234,5
      ^
    write a plain number such as 1234.5, without marks for thousands
)");
    }
    SECTION("not finite") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,inf\n"
                          "1e999,1\n",
                          layout) ==
              R"(gauge.csv:2:3: error: 'inf' is not a finite number
    5,inf
      ^
gauge.csv:3:1: error: '1e999' is not a finite number
    1e999,1
    ^
)");
    }
    SECTION("negative") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,-999\n",
                          layout) ==
              R"(gauge.csv:2:3: error: rain cannot be negative
    5,-999
      ^
    if -999 marks a missing value, state missing: -999 in the scenario
)");
    }
    SECTION("missing") {
        CsvLayout layout;
        layout.missing = "-999";
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,\n"
                          "10,NA\n"
                          "15,NaN\n"
                          "20,-999\n"
                          "25,-\n",
                          layout) ==
              R"(gauge.csv:2:3: error: the rain is missing here
    5,
      ^
    write the value, or take gaps as no rain with gaps: dry in the scenario
gauge.csv:3:4: error: the rain is missing here, marked 'NA'
    10,NA
       ^
    write the value, or take gaps as no rain with gaps: dry in the scenario
gauge.csv:4:4: error: the rain is missing here, marked 'NaN'
    15,NaN
       ^
    write the value, or take gaps as no rain with gaps: dry in the scenario
gauge.csv:5:4: error: the rain is missing here, marked '-999'
    20,-999
       ^
    write the value, or take gaps as no rain with gaps: dry in the scenario
gauge.csv:6:4: error: '-' is not a number
    25,-
       ^
)");
    }
    SECTION("missing marker text") {
        CsvLayout layout;
        layout.missing = "-";
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,-\n",
                          layout) ==
              R"(gauge.csv:2:3: error: the rain is missing here, marked '-'
    5,-
      ^
    write the value, or take gaps as no rain with gaps: dry in the scenario
)");
    }
    SECTION("no time") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          ",1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: the time is missing here
    ,1
    ^
    every row needs its time
)");
    }
    SECTION("timestamp under a unit") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "2026-03-04T10:05,1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: '2026-03-04T10:05' is not a number
    2026-03-04T10:05,1
    ^
    timestamps take no unit in the header
)");
    }
    SECTION("decimal marks") {
        CsvLayout layout;
        CHECK(problems_in("end [min];depth [mm]\n"
                          "5;0,4\n"
                          "10;1.100\n",
                          layout) ==
              R"(gauge.csv:3:4: error: a decimal point here, but decimal commas above
    10;1.100
       ^
    write all numbers with the same decimal mark, and none for thousands
)");
    }
    SECTION("decimal marks, other way") {
        CsvLayout layout;
        CHECK(problems_in("end [min];depth [mm]\n"
                          "5;0.4\n"
                          "10;1,1\n",
                          layout) ==
              R"(gauge.csv:3:4: error: a decimal comma here, but decimal points above
    10;1,1
       ^
    write all numbers with the same decimal mark, and none for thousands
)");
    }
    SECTION("quotes") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,\"1\n"
                          "10,\"1\"x\n",
                          layout) ==
              R"(gauge.csv:2:3: error: the quote that opens here is not closed on this line
    5,"1
      ^
    a cell in quotes ends with a quote; a quote inside it is doubled
gauge.csv:3:4: error: there is text behind the closing quote of this cell
    10,"1"x
       ^
    a quote inside a quoted cell is doubled
)");
    }
    SECTION("long cell") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,xxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxx\n",
                          layout) ==
              R"(gauge.csv:2:3: error: 'xxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxx...' is not a number
    5,xxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxxx
      ^
)");
    }
}

TEST_CASE("timestamps that cannot be are refused") {
    SECTION("impossible") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-02-30T10:05,1\n"
                          "2026-13-01 10:05,1\n"
                          "2026-03-04 10:60,1\n"
                          "04/03/2026 10:05,1\n"
                          "2026-03-04T10:05+19:00,1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: '2026-02-30T10:05' is no date of the calendar
    2026-02-30T10:05,1
    ^
    that month ends on day 28
gauge.csv:3:1: error: '2026-13-01 10:05' is no date of the calendar
    2026-13-01 10:05,1
    ^
    a date is written year-month-day, 2026-03-04 for the fourth of March
gauge.csv:4:1: error: '2026-03-04 10:60' is no time of the day
    2026-03-04 10:60,1
    ^
    times run from 00:00:00 to 23:59:59.999, and 24:00 ends a day
gauge.csv:5:1: error: '04/03/2026 10:05' is not a timestamp
    04/03/2026 10:05,1
    ^
    write year-month-day and the time of the day, 2026-03-04 10:05 or 2026-04-03 10:05
gauge.csv:6:1: error: '2026-03-04T10:05+19:00' has an impossible UTC offset
    2026-03-04T10:05+19:00,1
    ^
    offsets run from -18:00 to +18:00
)");
    }
    SECTION("skipped hour") {
        CsvLayout layout;
        layout.zone = "Europe/Madrid";
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-29 01:55,1\n"
                          "2026-03-29 02:00,1\n"
                          "2026-03-29 03:05,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: clocks in Europe/Madrid skip this time when they go forward
    2026-03-29 02:00,1
    ^
    write the timestamps with their UTC offsets, or state the zone that the logger's clock keeps
)");
    }
    SECTION("offset comes late") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-04T10:05,1\n"
                          "2026-03-04T10:10Z,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: this timestamp has a UTC offset, unlike those above
    2026-03-04T10:10Z,1
    ^
    write the offset in every row or in none, or state zone: in the scenario
)");
    }
    SECTION("offset is lost") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-04T10:05Z,1\n"
                          "2026-03-04T10:10,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: this timestamp has no UTC offset, unlike those above
    2026-03-04T10:10,1
    ^
    write the offset in every row or in none, or state zone: in the scenario
)");
    }
    SECTION("single stamp") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-04T10:05Z,1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: a single row does not tell how long its step is
    2026-03-04T10:05Z,1
    ^
    state it in the scenario with every:, such as every: 5 min
)");
    }
}

}  // namespace rainledger
