#include "report/clock.hpp"

#include <array>

#include "report/display.hpp"
#include "report/sample.hpp"
#include "test.hpp"

namespace rainledger {

TEST_CASE("durations and elapsed times are said to the minute") {
    CHECK(duration_text(2.0) == "2 h 00 min");
    CHECK(duration_text(1.9999) == "2 h 00 min");
    CHECK(duration_text(10.0 / 60.0) == "10 min");
    CHECK(duration_text(0.0) == "0 min");
    CHECK(duration_text(1.0e12) == "1000000000000 h");
    CHECK(elapsed_text(0.52) == "0:31");
    CHECK(elapsed_text(26.25) == "26:15");
    CHECK(elapsed_text(-0.25) == "-0:15");
    CHECK(elapsed_text(-0.001) == "0:00");
}

TEST_CASE("clock times name the day where it is not the first") {
    const Hyetograph rain = sample::two_stamped_steps();
    CHECK(clock_text(rain, 0.1) == "23:56");
    CHECK(clock_text(rain, 2.5 / 60.0) == "23:53");
    CHECK(elapsed_text(2.5 / 60.0) == "0:03");
    CHECK(clock_text(rain, 10.0 / 60.0) == "5 Mar 00:00");
    CHECK(clock_text(rain, 27.0 * 24.0) == "31 Mar 23:50");
}

TEST_CASE("a clock that changes during the storm is followed") {
    StampedEdges edges;  // the night of 29 March 2026, 00:30 to 03:30 by the clock
    edges.unix_ms = {1774740600000, 1774744200000, 1774747800000};
    edges.offset_minutes = {60, 60, 120};
    edges.has_offset = true;
    const Hyetograph rain = make_hyetograph(std::move(edges), {1.0, 1.0});
    CHECK(clock_text(rain, 0.0) == "00:30");
    CHECK(clock_text(rain, 1.25) == "01:45");
    CHECK(clock_text(rain, 2.0) == "03:30");
}

TEST_CASE("stamps without an offset are the clock face itself") {
    Hyetograph rain = sample::two_stamped_steps();
    rain.stamps->has_offset = false;
    rain.stamps->offset_minutes = {0, 0, 0};
    CHECK(clock_text(rain, 0.0) == "22:50");
    const std::array elapsed{0.0, 0.125};
    CHECK(iso_stamp(stamps_at(rain, elapsed), 1) == "2026-03-04T22:57:30");
}

TEST_CASE("quantities are printed as finely as they are known") {
    const Display metric(DisplayUnits::metric);
    const Display inches(DisplayUnits::inches);
    CHECK(metric.depth(12.345) == "12.3");
    CHECK(inches.depth(25.4) == "1.00");
    CHECK(metric.depth_with_unit(0.04) == "under 0.1 mm");
    CHECK(inches.depth_with_unit(0.04) == "under 0.01 in");
    CHECK(metric.depth_with_unit(0.0) == "0.0 mm");
    CHECK(metric.flow(342.4) == "342");
    CHECK(inches.flow(28.316846592) == "1.00");
    CHECK(inches.volume(28.316846592) == "1000");
    CHECK(metric.area_unit(99999.0) == "m2");
    CHECK(metric.area_unit(100000.0) == "ha");
    CHECK(inches.area_unit(1.0) == "ac");
    CHECK(metric.area(2800.0, "ha") == "0.280");
    CHECK(inches.parameter(25.4, Dimension::rate) == "1 in/h");
    CHECK(metric.parameter(4.14, Dimension::decay) == "4.14 1/h");
    CHECK(inches.parameter(25.4, Dimension::sorptivity) == "1 in/h^0.5");
    CHECK(four_figures(123456.0) == "123456");
    CHECK(four_figures(0.00012345) == "0.0001234");
    CHECK(four_figures(0.0) == "0");
    CHECK(four_figures(100.0) == "100");
    CHECK(printable("a\tb\x7f") == "a?b?");
}

}  // namespace rainledger
