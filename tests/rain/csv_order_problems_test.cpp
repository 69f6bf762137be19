#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("rows out of order, overlaps and holes are refused") {
    SECTION("repeated") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: the time of the row above comes again, 5 min
    5,1
    ^
    rows must come in the order of time, each time once
)");
    }
    SECTION("repeated stamp") {
        CsvLayout layout;
        CHECK(problems_in("end,depth [mm]\n"
                          "2026-03-04T10:05,1\n"
                          "2026-03-04T10:05,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: the time of the row above comes again, 2026-03-04T10:05:00
    2026-03-04T10:05,1
    ^
    rows must come in the order of time, each time once
)");
    }
    SECTION("back") {
        CsvLayout layout;
        CHECK(problems_in("start [min],depth [mm]\n"
                          "5,1\n"
                          "0,1\n"
                          "10,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: time goes back, from 5 min to 0 min
    0,1
    ^
    rows must come in the order of time, each time once
)");
    }
    SECTION("back in stamps") {
        CsvLayout layout;
        CHECK(
            problems_in("end,depth [mm]\n"
                        "2026-03-04T10:05+01:00,1\n"
                        "2026-03-04T10:04:59.5+01:00,1\n",
                        layout) ==
            R"(gauge.csv:3:1: error: time goes back, from 2026-03-04T10:05:00+01:00 to 2026-03-04T10:04:59.500+01:00
    2026-03-04T10:04:59.5+01:00,1
    ^
    rows must come in the order of time, each time once
)");
    }
    SECTION("back with every") {
        CsvLayout layout;
        layout.every_h = 5.0 / 60.0;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "10,1\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:4:1: error: time goes back, from 10 min to 5 min
    5,1
    ^
    rows must come in the order of time, each time once
)");
    }
    SECTION("end before start") {
        CsvLayout layout;
        CHECK(problems_in("start [min],end [min],depth [mm]\n"
                          "0,5,1\n"
                          "5,5,1\n",
                          layout) ==
              R"(gauge.csv:3:3: error: the step ends at 5 min, but starts at 5 min
    5,5,1
      ^
    a step ends later than it starts
)");
    }
    SECTION("overlap") {
        CsvLayout layout;
        CHECK(problems_in("start [min],end [min],depth [mm]\n"
                          "0,5,1\n"
                          "4,10,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: the step starts at 4 min, before the one above ends at 5 min
    4,10,1
    ^
    steps may not overlap
)");
    }
    SECTION("overlap with every") {
        CsvLayout layout;
        layout.every_h = 10.0 / 60.0;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "10,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: the step starts at 0 min, before the one above ends at 5 min
    10,1
    ^
    check every:, and whether the times are starts or ends
)");
    }
    SECTION("hole") {
        CsvLayout layout;
        CHECK(problems_in("start [min],end [min],depth [mm]\n"
                          "0,5,1\n"
                          "10,15,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: nothing is known from 5 min to 10 min
    10,15,1
    ^
    add what is missing, or take gaps as no rain with gaps: dry in the scenario
)");
    }
    SECTION("hole with every") {
        CsvLayout layout;
        layout.every_h = 5.0 / 60.0;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "20,1\n",
                          layout) ==
              R"(gauge.csv:3:1: error: nothing is known from 5 min to 15 min
    20,1
    ^
    add what is missing, or take gaps as no rain with gaps: dry in the scenario
)");
    }
    SECTION("first end at 0") {
        CsvLayout layout;
        CHECK(
            problems_in("end [min],depth [mm]\n"
                        "0,0\n"
                        "5,1\n",
                        layout) ==
            R"(gauge.csv:2:1: error: the first step ends at 0 min, but rain given by end times begins at 0
    0,0
    ^
    if the times are starts, call the column start
)");
    }
    SECTION("falling") {
        CsvLayout layout;
        CHECK(problems_in("end [min],cumulative [mm]\n"
                          "5,1\n"
                          "10,0.4\n",
                          layout) ==
              R"(gauge.csv:3:4: error: cumulative rain falls from 1 to 0.4
    10,0.4
       ^
    if the gauge started anew here, give the rain as depth per step
)");
    }
    SECTION("single start") {
        CsvLayout layout;
        CHECK(problems_in("start [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: a single row does not tell how long its step is
    5,1
    ^
    state it in the scenario with every:, such as every: 5 min
)");
    }
    SECTION("baseline alone") {
        CsvLayout layout;
        CHECK(problems_in("end [min],cumulative [mm]\n"
                          "0,1\n",
                          layout) ==
              R"(gauge.csv:2:1: error: a reading at time 0 alone gives no rain
    0,1
    ^
    the first reading is where counting begins; add the rows after it
)");
    }
}

}  // namespace rainledger
