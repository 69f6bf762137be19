#include "rainledger/rain/hyetograph_csv.hpp"

#include "rain/csv_helpers.hpp"
#include "rainledger/rain/timestamp.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Numbers = std::vector<double>;

std::vector<std::string> stamps_of(const Hyetograph& rain) {
    std::vector<std::string> out;
    for (std::size_t i = 0; i < rain.stamps->unix_ms.size(); ++i)
        out.push_back(iso_stamp(*rain.stamps, i));
    return out;
}

void check_plain(const Hyetograph& rain) {
    CHECK(rain.given->value == Numbers{0, 5, 10});
    CHECK(rain.given->unit == "min");
    CHECK(rain.depth_mm == Numbers{0.4, 1.1});
    CHECK(rain.own_steps == 2);
    CHECK(rain.taken_as_dry_h == 0.0);
}

CsvLayout dry_gaps() {
    CsvLayout layout;
    layout.gaps_are_dry = true;
    return layout;
}

}  // namespace

TEST_CASE("the same rain in every accepted dress") {
    for (const char* text : {
             "end [min],depth [mm]\n5,0.4\n10,1.1\n",
             "end [min],depth [mm]\n5,0.4\n10,1.1",
             "end [min],depth [mm]\r\n5,0.4\r\n10,1.1\r\n",
             "end [min],depth [mm]\r\n5,0.4\r\n10,1.1\r\n\r\n",
             "\xEF\xBB\xBF"
             "end [min],depth [mm]\n5,0.4\n10,1.1\n",
             "# gauge at Quarry Row\n\nend [min],depth [mm]\n  # a note\n5,0.4\n \t\n10,1.1\n\n",
             "end [min];depth [mm]\n5;0,4\n10;1,1\n",
             "end [min];depth [mm]\n5;0.4\n10;1.1\n",
             "end [min]\tdepth [mm]\n5\t0,4\n10\t1,1\n",
             "end [min]\tdepth [mm]\n5\t0.4\n10\t1.1\n",
             "  end  [ min ] , depth [mm]\n 5 , 0.4 \n  10,\t1.1\n",
             "\"end [min]\",\"depth [mm]\"\n\"5\",\"0.4\"\n\"10\" , \" 1.1\"\n",
             "End [min],DEPTH [mm]\n5,0.4\n10,1.1\n",
             "depth [mm],end [min]\n0.4,5\n1.1,10\n",
             ";;\n;\nend [min];depth [mm]\n;\n5;0,4\n ; \n10;1,1\n;;;\n;\n",
             "end [min],depth [mm]\n5,0.4\n,\n\"\" , \"\"\n10,1.1\n,,,\n,",
             "end [min]\tdepth [mm]\n\t\n5\t0.4\n10\t1.1\n\t\t\"\"\n",
             "site,end [min],note,depth [mm],\nM1,5,\"wind, \"\"gusts\"\"\",0.4,\nM1,10,,1.1,\n",
             "end [min],depth [cm]\n5,0.04\n+10,1.1e-1\n",
             "end [min],intensity [mm/h]\n5,4.8\n10,13.2\n",
             "end [min],cumulative [mm]\n0,0\n5,0.4\n10,1.5\n",
             "end [min],cumulative [mm]\n0,20\n5,20.4\n10,21.5\n",
             "end [min],cumulative [mm]\n5,0.4\n10,1.5\n",
             "start [min],depth [mm]\n0,0.4\n5,1.1\n",
             "start [min],cumulative [mm]\n0,0.4\n5,1.5\n",
             "start [min],end [min],depth [mm]\n0,5,0.4\n5,10,1.1\n",
             "end [min],start [min],intensity [mm/h]\n5,0,4.8\n10,5,13.2\n",
         }) {
        INFO(text);
        const Hyetograph rain = read_clean(text);
        CHECK(rain.given->value == Numbers{0, 5, 10});
        CHECK(rain.given->unit == "min");
        REQUIRE(rain.steps() == 2);
        CHECK_THAT(rain.depth_mm[0], WithinAbs(0.4, 1e-14));
        CHECK_THAT(rain.depth_mm[1], WithinAbs(1.1, 1e-14));
        CHECK(rain.own_steps == 2);
        CHECK(rain.taken_as_dry_h == 0.0);
    }
}

TEST_CASE("the scenario names columns and states what they mean") {
    CsvLayout layout;
    layout.rain_column = "P (mm)";
    layout.kind = RainKind::depth;
    layout.rain_unit = "mm";

    SECTION("both columns") {
        layout.time_column = "Minutes";
        layout.stamp = StampMeaning::end;
        layout.time_unit = "min";
        check_plain(read_clean("Minutes,depth [in],P (mm)\n5,9,0.4\n10,9,1.1\n", layout));
    }
    SECTION("a column called time, as the start") {
        layout.stamp = StampMeaning::start;
        check_plain(read_clean("time [min],P (mm)\n0,0.4\n5,1.1\n", layout));
    }
    SECTION("a named column called end, beside a start") {
        layout.time_column = "end [min]";
        check_plain(read_clean("start [min],end [min],P (mm)\n9,5,0.4\n9,10,1.1\n", layout));
    }
}

TEST_CASE("units and kinds stated in the scenario") {
    CsvLayout layout;
    layout.rain_unit = "in";
    CHECK(read_clean("end [min],depth\n5,1\n", layout).depth_mm == Numbers{25.4});
    CHECK(read_clean("end [min],depth [in]\n5,1\n", layout).depth_mm == Numbers{25.4});
    layout.rain_column = "depth [mm]";
    CHECK(read_clean("end [min],depth [mm]\n5,1\n", layout).depth_mm == Numbers{25.4});
    layout.rain_column.reset();
    layout.rain_unit = "in/hr";
    CHECK(read_clean("end [h],intensity [in/h]\n1,1\n", layout).depth_mm == Numbers{25.4});
    layout.rain_unit.reset();
    layout.kind = RainKind::cumulative;
    CHECK(read_clean("end [h],depth [mm],cumulative [in]\n1,9,1\n2,9,1\n", layout).depth_mm ==
          Numbers{25.4, 0.0});
    layout.kind.reset();
    layout.rain_column = "depth";
    CHECK(read_clean("end [h],depth [mm],cumulative [in]\n1,9,1\n2,9,1\n", layout).depth_mm ==
          Numbers{9, 9});
}

TEST_CASE("units of time and intensity") {
    CHECK(read_clean("end [s],depth [mm]\n1800,1\n").edges_h == Numbers{0, 0.5});
    CHECK(read_clean("end [hr],depth [mm]\n0.5,1\n").edges_h == Numbers{0, 0.5});
    CHECK(read_clean("end [h],intensity [in/hr]\n0.5,1\n").depth_mm == Numbers{12.7});
    CHECK(read_clean("end [h],intensity [in/h]\n0.5,1\n").depth_mm == Numbers{12.7});
    CHECK(read_clean("end [h],intensity [mm/min]\n0.5,1\n").depth_mm == Numbers{30});
}

TEST_CASE("steps of different lengths are kept") {
    const Hyetograph rain = read_clean("end [min],depth [mm]\n5,1\n12,2\n30,0\n");
    CHECK(rain.given->value == Numbers{0, 5, 12, 30});
    CHECK(rain.duration_h == Numbers{5.0 / 60, 7.0 / 60, 18.0 / 60});
    CHECK(read_clean("start [min],depth [mm]\n0,1\n5,2\n12,0\n").given->value ==
          Numbers{0, 5, 12, 19});
    CHECK(read_clean("start [min],end [min],depth [mm]\n3,5,1\n5,50,1\n").given->value ==
          Numbers{3, 5, 50});
}

TEST_CASE("rain may be all zero") {
    CHECK(total_depth_mm(read_clean("end [min],depth [mm]\n5,0\n10,0\n")) == 0.0);
}

TEST_CASE("every says how long each row covers") {
    CsvLayout layout = dry_gaps();
    layout.every_h = 0.1;
    SECTION("from end times") {
        const Hyetograph rain =
            read_clean("end [h],depth [mm]\n0.1,1\n0.2,2\n0.3,3\n0.5,4\n", layout);
        CHECK(rain.given->value == Numbers{0, 0.1, 0.2, 0.3, 0.4, 0.5});
        CHECK(rain.depth_mm == Numbers{1, 2, 3, 0, 4});
        CHECK_THAT(rain.taken_as_dry_h, WithinAbs(0.1, 1e-15));
    }
    SECTION("from start times, kept as read") {
        const Hyetograph rain =
            read_clean("start [h],depth [mm]\n0.1,1\n0.2,2\n0.3,3\n0.6,4\n", layout);
        CHECK(rain.steps() == 5);
        CHECK(rain.given->value[1] == 0.2);
        CHECK(rain.given->value[2] == 0.3);
        CHECK(rain.given->value[4] == 0.6);
        CHECK_THAT(rain.taken_as_dry_h, WithinAbs(0.2, 1e-15));
    }
    SECTION("of one row") {
        CHECK(read_clean("end,depth [mm]\n2026-03-04T10:06,1\n", layout).edges_h ==
              Numbers{0, 0.1});
    }
}

TEST_CASE("gaps taken as dry are steps without rain, and are added up") {
    CsvLayout layout = dry_gaps();
    layout.missing = "-999";
    const Hyetograph rain = read_clean(
        "start [min],end [min],depth [mm]\n0,5,1\n5,10,\n10,15,NA\n15,20,nan\n20,25,-999.0\n"
        "45,60,2\n",
        layout);
    CHECK(rain.given->value == Numbers{0, 5, 10, 15, 20, 25, 45, 60});
    CHECK(rain.depth_mm == Numbers{1, 0, 0, 0, 0, 0, 2});
    CHECK_THAT(rain.taken_as_dry_h, WithinAbs(40.0 / 60, 1e-15));
}

TEST_CASE("cumulative rain loses nothing across missing readings and holes") {
    const Hyetograph missing =
        read_clean("end [min],cumulative [mm]\n5,1\n10,\n15,NA\n20,4\n25,4.5\n", dry_gaps());
    CHECK(missing.depth_mm == Numbers{1, 0, 0, 3, 0.5});
    CHECK_THAT(missing.taken_as_dry_h, WithinAbs(10.0 / 60, 1e-15));
    const Hyetograph hole =
        read_clean("start [min],end [min],cumulative [mm]\n0,5,1\n15,20,4\n", dry_gaps());
    CHECK(hole.depth_mm == Numbers{1, 0, 3});
}

TEST_CASE("timestamps with offsets") {
    const Hyetograph rain = read_clean(
        "end,depth [mm]\n2026-03-04T10:05+01:00,1\n2026-03-04 10:10:00+0100,2\n"
        "2026-03-04T09:15:00.5Z,3\n");
    CHECK(stamps_of(rain) ==
          std::vector<std::string>{"2026-03-04T10:00:00+01:00", "2026-03-04T10:05:00+01:00",
                                   "2026-03-04T10:10:00+01:00", "2026-03-04T09:15:00.500Z"});
    CHECK(rain.depth_mm == Numbers{1, 2, 3});
    CHECK_FALSE(rain.clock_assumed);
    CHECK_FALSE(rain.given);
}

TEST_CASE("timestamps without zone or offset: the clock is taken never to change") {
    const Hyetograph rain = read_clean(
        "start,depth [mm]\n2026-03-29 01:00,1\n2026-03-29 02:00,2\n2026-03-29 03:00,3\n");
    CHECK(rain.clock_assumed);
    CHECK_FALSE(rain.stamps->has_offset);
    CHECK(rain.edges_h == Numbers{0, 1, 2, 3});
    CHECK(iso_stamp(*rain.stamps, 3) == "2026-03-29T04:00:00");
}

TEST_CASE("a zone beside offsets is for output only") {
    CsvLayout layout;
    layout.zone = "Europe/Madrid";
    const Hyetograph rain =
        read_clean("end,depth [mm]\n2026-07-01T10:00Z,1\n2026-07-01T12:05,2\n", layout);
    CHECK(stamps_of(rain) == std::vector<std::string>{"2026-07-01T11:55:00+02:00",
                                                      "2026-07-01T12:00:00+02:00",
                                                      "2026-07-01T12:05:00+02:00"});
}

TEST_CASE("clocks that go back inside a storm neither lose nor invent an hour") {
    CsvLayout layout;
    layout.zone = "Europe/Madrid";
    const std::string local =
        "end,depth [mm]\n2026-10-25 01:30,1\n2026-10-25 02:00,2\n2026-10-25 02:30,3\n"
        "2026-10-25 02:00,4\n2026-10-25 02:30,5\n2026-10-25 03:00,6\n2026-10-25 03:30,7\n";
    const std::string universal =
        "end,depth [mm]\n2026-10-24T23:30Z,1\n2026-10-25T00:00Z,2\n2026-10-25T00:30Z,3\n"
        "2026-10-25T01:00Z,4\n2026-10-25T01:30Z,5\n2026-10-25T02:00Z,6\n2026-10-25T02:30Z,7\n";
    const Hyetograph rain = read_clean(local, layout);
    CHECK(rain.stamps->unix_ms == read_clean(universal).stamps->unix_ms);
    CHECK(rain.duration_h == Numbers(7, 0.5));
    CHECK(iso_stamp(*rain.stamps, 3) == "2026-10-25T02:30:00+02:00");
    CHECK(iso_stamp(*rain.stamps, 4) == "2026-10-25T02:00:00+01:00");
}

TEST_CASE("clocks that go back between start and end columns") {
    CsvLayout layout;
    layout.zone = "Europe/Madrid";
    for (const char* text : {"start,end,depth [mm]\n2026-10-25 01:00,2026-10-25 02:00,1\n"
                             "2026-10-25 02:00,2026-10-25 02:00,2\n"
                             "2026-10-25 02:00,2026-10-25 03:00,3\n",
                             "end,start,depth [mm]\n2026-10-25 02:00,2026-10-25 01:00,1\n"
                             "2026-10-25 02:00,2026-10-25 02:00,2\n"
                             "2026-10-25 03:00,2026-10-25 02:00,3\n"}) {
        const Hyetograph rain = read_clean(text, layout);
        CHECK(rain.duration_h == Numbers{1, 1, 1});
        CHECK(iso_stamp(*rain.stamps, 0) == "2026-10-25T01:00:00+02:00");
        CHECK(iso_stamp(*rain.stamps, 3) == "2026-10-25T03:00:00+01:00");
    }
}

TEST_CASE("clocks that go forward inside a storm neither lose nor invent an hour") {
    CsvLayout layout;
    layout.zone = "Europe/Madrid";
    const Hyetograph rain = read_clean(
        "start,depth [mm]\n2026-03-29 01:00,1\n2026-03-29 01:30,2\n2026-03-29 03:00,3\n"
        "2026-03-29 03:30,4\n",
        layout);
    CHECK(rain.stamps->unix_ms ==
          read_clean("start,depth [mm]\n2026-03-29T00:00Z,1\n2026-03-29T00:30Z,2\n"
                     "2026-03-29T01:00Z,3\n2026-03-29T01:30Z,4\n")
              .stamps->unix_ms);
    CHECK(rain.duration_h == Numbers(4, 0.5));
    CHECK(iso_stamp(*rain.stamps, 1) == "2026-03-29T01:30:00+01:00");
    CHECK(iso_stamp(*rain.stamps, 2) == "2026-03-29T03:00:00+02:00");
}

TEST_CASE("a day that ends at 24:00") {
    const Hyetograph rain =
        read_clean("end,depth [mm]\n2026-03-04 23:55,1\n2026-03-04 24:00,2\n2026-03-05 00:05,3\n");
    CHECK(rain.duration_h == Numbers(3, 5.0 / 60));
}

TEST_CASE("after twenty errors the rest are counted") {
    std::string text = "end [min],depth [mm]\n";
    for (int i = 0; i < 20; ++i)
        text += "x,1\n";
    CHECK_THAT(problems_in(text, {}), !Contains("more error"));
    CHECK_THAT(problems_in(text + "x,1\n", {}),
               Catch::EndsWith("gauge.csv: error: and 1 more error\n"));
    CHECK_THAT(problems_in(text + "x,1\nx,1\n", {}),
               Catch::EndsWith("gauge.csv: error: and 2 more errors\n"));
}

TEST_CASE("a row that cannot be read is no hole as well") {
    CHECK(
        problems_in("start [min],end [min],depth [mm]\n0,5,1\n5\n10,15,1\nx,20,1\n20,25,1\n", {}) ==
        R"(gauge.csv:3:2: error: this row has 1 cell, the header 3
    5
     ^
    write every cell, or begin the line with # if it is a note
gauge.csv:5:1: error: 'x' is not a number
    x,20,1
    ^
)");
}

TEST_CASE("after five long steps the rest are counted") {
    std::string text = "start [min],depth [mm]\n";
    for (int hour = 0; hour < 8; ++hour)
        for (int minute = 0; minute < 4; ++minute)
            text += std::to_string(60 * hour + minute) + ",1\n";
    CHECK_THAT(problems_in(text, {}),
               Catch::EndsWith("gauge.csv: warning: and 2 more long steps\n"));
}

}  // namespace rainledger
