#include <string>
#include <vector>

#include "rain/csv_helpers.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("what may be a slip is warned of, and read") {
    SECTION("long steps") {
        CsvLayout layout;
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n"
                          "10,1\n"
                          "30,1\n"
                          "35,1\n"
                          "40,1\n"
                          "45,1\n"
                          "50,1\n",
                          layout) ==
              R"(gauge.csv:4:1: warning: this step lasts 20 min, over three times the usual 5 min
    30,1
    ^
    if rows are missing here, state how long each row covers with every:
)");
    }
    SECTION("long stamped step") {
        CsvLayout layout;
        CHECK(problems_in("depth [mm];end\n"
                          "1;2026-03-04T10:05Z\n"
                          "1;2026-03-04T10:10Z\n"
                          "1;2026-03-04T10:15Z\n"
                          "1;2026-03-04T12:00Z\n",
                          layout) ==
              R"(gauge.csv:5:3: warning: this step lasts 105 min, over three times the usual 5 min
    1;2026-03-04T12:00Z
      ^
    if rows are missing here, state how long each row covers with every:
)");
    }
    SECTION("zone without stamps") {
        CsvLayout layout;
        layout.zone = "Europe/Madrid";
        CHECK(problems_in("end [min],depth [mm]\n"
                          "5,1\n",
                          layout) ==
              R"(gauge.csv:1:1: warning: elapsed times have no use for the scenario's zone:
    end [min],depth [mm]
    ^
)");
    }
}

TEST_CASE("a first reading of a stamped counter is always told of, since it is taken as rain") {
    SECTION("by end stamps") {
        CHECK(
            problems_in("end,cumulative [mm]\n"
                        "2026-03-04T10:05,0.4\n"
                        "2026-03-04T10:10,2.4\n",
                        {}) ==
            R"(gauge.csv:2:18: warning: the first reading, 0.4 mm, is taken as rain that fell before 2026-03-04T10:05:00
    2026-03-04T10:05,0.4
                     ^
    if the counter did not stand at 0 when the storm began, subtract what it showed then from every reading
)");
    }
    SECTION("by start stamps, after a missing reading") {
        CsvLayout layout;
        layout.gaps_are_dry = true;
        CHECK(
            problems_in("start,cumulative [in]\n"
                        "2026-03-04T10:00Z,\n"
                        "2026-03-04T10:05Z,12.1\n"
                        "2026-03-04T10:10Z,12.2\n",
                        layout) ==
            R"(gauge.csv:3:19: warning: the first reading, 12.1 in, is taken as rain that fell after 2026-03-04T10:05:00Z
    2026-03-04T10:05Z,12.1
                      ^
    if the counter did not stand at 0 when the storm began, subtract what it showed then from every reading
)");
    }
    SECTION("the advice works: the readings less what the counter showed at the beginning") {
        Diagnostics diagnostics;
        const auto raw = read_hyetograph_csv("gauge.csv",
                                             "end,cumulative [mm]\n2026-03-04T10:05,120.5\n"
                                             "2026-03-04T10:10,121.5\n",
                                             {}, diagnostics);
        REQUIRE(raw.has_value());
        CHECK(raw->depth_mm == std::vector<double>{120.5, 1.0});
        CHECK(
            read_clean("end,cumulative [mm]\n2026-03-04T10:05,0\n2026-03-04T10:10,1\n").depth_mm ==
            std::vector<double>{0.0, 1.0});
    }
}

TEST_CASE("a step that a change of the UTC offset made longer or shorter is told of") {
    SECTION("longer, hourly") {
        CHECK(
            problems_in("end,depth [mm]\n"
                        "2026-10-25T01:00+02:00,1\n"
                        "2026-10-25T02:00+02:00,1\n"
                        "2026-10-25T03:00+01:00,1\n"
                        "2026-10-25T04:00+01:00,1\n",
                        {}) ==
            R"(gauge.csv:4:1: warning: this step lasts 120 min, the one beside it 60 min; the UTC offset changes in it from +02:00 to +01:00
    2026-10-25T03:00+01:00,1
    ^
    if the logger's clock is never changed, write one offset in every row, or state a zone without changes
)");
    }
    SECTION("shorter, by a zone") {
        CsvLayout layout;
        layout.zone = "Europe/Madrid";
        CHECK(
            problems_in("start,depth [mm]\n"
                        "2026-03-29 00:00,1\n"
                        "2026-03-29 01:30,1\n"
                        "2026-03-29 03:00,1\n"
                        "2026-03-29 04:30,1\n",
                        layout) ==
            R"(gauge.csv:3:1: warning: this step lasts 30 min, the one beside it 90 min; the UTC offset changes in it from +01:00 to +02:00
    2026-03-29 01:30,1
    ^
    if the logger's clock is never changed, write one offset in every row, or state a zone without changes
)");
    }
    SECTION("again and again") {
        std::string text = "end,depth [mm]\n";
        for (int row = 0; row < 14; ++row)
            text += "2026-10-" + std::to_string(11 + row) +
                    (row / 2 % 2 == 0 ? "T06:00+02:00,1\n" : "T06:00+01:00,1\n");
        CHECK_THAT(problems_in(text, {}),
                   Catch::EndsWith("gauge.csv: warning: and 1 more changed step\n"));
    }
    SECTION("far longer, told of once") {
        CHECK(
            problems_in("end,depth [mm]\n"
                        "2026-10-25T02:45+02:00,1\n"
                        "2026-10-25T02:50+02:00,1\n"
                        "2026-10-25T02:55+02:00,1\n"
                        "2026-10-25T03:00+01:00,1\n"
                        "2026-10-25T03:05+01:00,1\n",
                        {}) ==
            R"(gauge.csv:5:1: warning: this step lasts 65 min, over three times the usual 5 min; the UTC offset changes in it from +02:00 to +01:00
    2026-10-25T03:00+01:00,1
    ^
    if rows are missing here, state how long each row covers with every:
)");
    }
}

}  // namespace rainledger
