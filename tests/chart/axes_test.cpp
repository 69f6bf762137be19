#include <numeric>
#include <string>
#include <vector>

#include "chart/drawn_steps.hpp"
#include "chart/scale.hpp"
#include "chart/scenes.hpp"
#include "chart/stacked_labels.hpp"
#include "chart/storm_view.hpp"
#include "chart/time_axis.hpp"
#include "test.hpp"

using namespace rainledger;

namespace {

std::string labels(const std::vector<Tick>& ticks) {
    std::string out;
    for (const Tick& tick : ticks)
        out += (out.empty() ? "" : " ") + tick.label;
    return out;
}

/// Rain in equal steps of `step_min` minutes.
Hyetograph even(double step_min, std::size_t steps, double depth_mm) {
    std::vector<double> edges;
    for (std::size_t i = 0; i <= steps; ++i)
        edges.push_back(step_min * static_cast<double>(i));
    return make_hyetograph(std::move(edges), "min", std::vector<double>(steps, depth_mm));
}

std::string axis_words(const Hyetograph& rain, int most) {
    const TimeAxis axis = time_axis(rain, most);
    return labels(axis.ticks) + " | " + axis.title;
}

}  // namespace

TEST_CASE("round ticks") {
    CHECK(labels(round_ticks(88.8, 5)) == "0 20 40 60 80 100");
    CHECK(labels(round_ticks(0.37, 4)) == "0.0 0.1 0.2 0.3 0.4");
    CHECK(labels(round_ticks(3.5, 2)) == "0 2 4");
    CHECK(labels(round_ticks(1.0e6, 2)) == "0 500000 1000000");
    CHECK(labels(round_ticks(0.0, 2)) == "0.0 0.5 1.0");
    CHECK(round_ticks(1.0e300, 4).back().at == 1.0e12);
    CHECK(labels(ticks_to(100.0, 50.0)) == "0 50 100");
    CHECK(labels(ticks_to(0.0, 50.0)) == "0 50");
}

TEST_CASE("elapsed time in the unit of its ticks") {
    CHECK(axis_words(even(5.0, 24, 1.0), 8) ==
          "0:00 0:15 0:30 0:45 1:00 1:15 1:30 1:45 2:00 | time [h:min]");
    CHECK(axis_words(even(60.0, 24, 1.0), 8) == "0 3 6 9 12 15 18 21 24 | time [h]");
    CHECK(axis_words(even(1440.0, 6, 1.0), 8) == "0 1 2 3 4 5 6 | time [d]");
    CHECK(axis_words(even(1440.0, 400, 1.0), 8) == "0 50 100 150 200 250 300 350 400 | time [d]");
    CHECK(axis_words(even(0.5, 4, 1.0), 4) == "0 0.5 1 1.5 2 | time [min]");
}

TEST_CASE("elapsed time that does not begin at zero keeps its numbers") {
    const TimeAxis axis = time_axis(make_hyetograph({55.0, 65.0, 90.0}, "min", {1.0, 2.0}), 4);
    CHECK(labels(axis.ticks) == "1:00 1:10 1:20 1:30");
    CHECK_THAT(axis.ticks[0].at, WithinAbs(5.0 / 60.0, 1e-12));
}

TEST_CASE("stamped rain has the clock's face, and the date at midnight") {
    CHECK(axis_words(scenes::over_midnight(), 6) ==
          "22:00 23:00 4 Nov 01:00 02:00 03:00 | clock time, 3 Nov 2031 to 4 Nov 2031 "
          "(UTC+01:00)");
    Hyetograph faces = scenes::over_midnight();
    faces.stamps->has_offset = false;
    CHECK_THAT(axis_words(faces, 6), Contains("21:00 22:00") && !Contains("UTC"));
}

TEST_CASE("a clock that is set back during the storm is followed and told") {
    Hyetograph rain = scenes::over_midnight();
    for (std::size_t edge = 2; edge < 6; ++edge)
        rain.stamps->offset_minutes[edge] = 0;
    CHECK(axis_words(rain, 6) ==
          "22:00 23:00 23:00 4 Nov 01:00 02:00 | clock time, 3 Nov 2031 to 4 Nov 2031, clock "
          "changed");
}

TEST_CASE("lengths of time in few characters") {
    CHECK(span_words(0.5) == "30 min");
    CHECK(span_words(5.0 / 60.0) == "5 min");
    CHECK(span_words(2.0) == "2 h");
    CHECK(span_words(20.0 / 3.0) == "6 h 40 min");
    CHECK(span_words(240.0) == "10 d");
}

TEST_CASE("few steps are drawn one by one") {
    const Hyetograph rain = scenes::uneven();
    const auto drawn = drawn_steps(rain, rain.steps(), intensities(rain), 5);
    REQUIRE(drawn.size() == 5);
    for (std::size_t i = 0; i < drawn.size(); ++i) {
        CHECK(drawn[i].step == i);
        CHECK(drawn[i].last == i);
        CHECK(drawn[i].from_h == rain.edges_h[i]);
        CHECK(drawn[i].to_h == rain.edges_h[i + 1]);
    }
}

TEST_CASE("of many steps the heaviest in each part of the time is drawn") {
    Hyetograph rain = even(1.0, 100'000, 0.1);
    rain.depth_mm[54'321] = 7.0;
    rain.depth_mm[99'999] = 5.0;
    const auto weight = intensities(rain);
    const auto drawn = drawn_steps(rain, rain.steps(), weight, 700);
    CHECK(drawn.size() <= 700);
    CHECK(drawn.size() >= 699);
    double from = 0.0;
    bool peak = false;
    for (const DrawnStep& step : drawn) {
        CHECK(step.from_h == from);
        from = step.to_h;
        peak = peak || step.step == 54'321;
    }
    CHECK(peak);
    CHECK(drawn.back().step == 99'999);
    CHECK(drawn.back().last == 99'999);
    CHECK(from == rain.edges_h.back());
}

TEST_CASE("labels that would overlap move apart within their strip") {
    std::vector<StackedLabel> labels{{1.0, "a", ""}, {2.0, "b", ""}, {99.0, "c", ""}};
    spread(labels, 5.0, 95.0, 15.0);
    CHECK(labels[0].y == 5.0);
    CHECK(labels[1].y == 20.0);
    CHECK(labels[2].y == 95.0);
}
