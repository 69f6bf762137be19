#include <algorithm>
#include <cmath>
#include <string>
#include <vector>

#include "rain/design_cases.hpp"
#include "rainledger/rain/rain_windows.hpp"
#include "test.hpp"

// Storms of alternating blocks (Chow, Maidment and Mays, Applied Hydrology, 1988, section 14.4).
namespace rainledger {
namespace {

DesignStorm blocks(DepthDuration curve, double duration_min, double every_min, double peak_at) {
    return make_design_storm(request_of(StormPattern::alternating_blocks, duration_min / 60.0,
                                        every_min / 60.0, std::move(curve), peak_at));
}

std::size_t largest_step(const Hyetograph& rain) {
    const auto largest = std::max_element(rain.depth_mm.begin(), rain.depth_mm.end());
    return static_cast<std::size_t>(largest - rain.depth_mm.begin());
}

/// For each step its rank by depth, 1 for the largest; of a formula no two are equal.
std::vector<int> ranks(const Hyetograph& rain) {
    std::vector<int> out;
    for (const double depth_mm : rain.depth_mm)
        out.push_back(
            1 + static_cast<int>(std::count_if(rain.depth_mm.begin(), rain.depth_mm.end(),
                                               [&](double other) { return other > depth_mm; })));
    return out;
}

/// The depth of the `count` adjoining steps around the peak that were filled first.
double depth_around_peak(const Hyetograph& rain, std::size_t count) {
    const std::vector<int> rank = ranks(rain);
    double sum_mm = 0.0;
    std::size_t first = rain.steps();
    std::size_t last = 0;
    for (std::size_t i = 0; i < rain.steps(); ++i) {
        if (rank[i] > static_cast<int>(count)) continue;
        sum_mm += rain.depth_mm[i];
        first = std::min(first, i);
        last = i;
    }
    CHECK(last - first + 1 == count);
    return sum_mm;
}

/// Depths of an invented county.
DepthList county() {
    return {{5.0 / 60, 10.0 / 60, 15.0 / 60, 0.5, 1, 2, 3, 6, 12, 24},
            {12.5, 19, 23.5, 32.5, 41, 48, 52, 62, 74, 88}};
}

std::string grows_faster_after(const std::string& duration) {
    return "the depths by duration grow faster after " + duration +
           " than before it; the blocks stand in falling order all the same, so that the storm "
           "holds more than the statistic of some durations";
}

}  // namespace

TEST_CASE("blocks stand right and left of the peak by turns, then on the side that is left") {
    const auto order = [](double peak_at) { return ranks(*blocks(denver(), 35, 5, peak_at).rain); };
    using Ranks = std::vector<int>;
    CHECK(order(0.5) == Ranks{7, 5, 3, 1, 2, 4, 6});
    CHECK(order(0.0) == Ranks{1, 2, 3, 4, 5, 6, 7});
    CHECK(order(1.0) == Ranks{7, 6, 5, 4, 3, 2, 1});
    CHECK(order(0.2) == Ranks{3, 1, 2, 4, 5, 6, 7});
    CHECK(order(0.8) == Ranks{7, 6, 5, 4, 3, 1, 2});
}

TEST_CASE("a peak on an edge lies in the earlier block") {
    CHECK(largest_step(*blocks(denver(), 120, 10, 0.5).rain) == 5);
    CHECK(largest_step(*blocks(denver(), 120, 10, 0.51).rain) == 6);
    CHECK(largest_step(*blocks(denver(), 120, 5, 0.375).rain) == 8);
    CHECK(largest_step(*blocks(denver(), 60, 6, 0.3).rain) == 2);
    CHECK(largest_step(*blocks(denver(), 60, 6, 0.7).rain) == 6);
}

TEST_CASE("the blocks around the peak hold the statistic, and no window holds more") {
    const auto seed = GENERATE(range(1U, 101U));
    INFO("seed " << seed);
    std::mt19937_64 random(seed);
    const DepthDuration formula = random_formula(random);
    std::uniform_int_distribution<int> steps(1, 120);
    std::uniform_int_distribution<int> every(1, 20);
    std::uniform_real_distribution<double> share(0.0, 1.0);
    const double every_min = every(random);
    const double duration_min = every_min * steps(random);
    const DesignStorm storm = blocks(formula, duration_min, every_min, share(random));
    REQUIRE(storm.rain);
    CHECK(storm.warnings.empty());
    const CumulativeDepth depth(*storm.rain);
    for (std::size_t count = 1; count <= storm.rain->steps(); ++count) {
        const double window_h = static_cast<double>(count) * every_min / 60.0;
        const double statistic_mm = *depth_of(formula, window_h).depth_mm;
        CHECK_THAT(depth_around_peak(*storm.rain, count), WithinRel(statistic_mm, 1e-12));
        CHECK_THAT(depth.largest_depth_mm(window_h), WithinRel(statistic_mm, 1e-12));
    }
    for (const HeldStatistic& held : storm.held) {
        CHECK(held.duration_h * 60.0 <= duration_min * (1.0 + 1e-9));
        CHECK_THAT(held.storm_mm, WithinRel(held.statistic_mm, 1e-9));
    }
}

TEST_CASE("a storm from a table holds every tabulated depth of whole steps") {
    const DesignStorm storm = blocks(county(), 120, 5, 0.4);
    REQUIRE(storm.rain);
    CHECK(storm.warnings.empty());
    REQUIRE(storm.held.size() == 6);
    for (std::size_t i = 0; i < storm.held.size(); ++i) {
        CHECK(storm.held[i].duration_h == county().duration_h[i]);
        CHECK(storm.held[i].statistic_mm == county().depth_mm[i]);
        CHECK_THAT(storm.held[i].storm_mm, WithinRel(county().depth_mm[i], 1e-9));
    }
    CHECK(storm.depth_mm == 48.0);
}

// From 2 to 3 h the county's depths follow duration^0.197, from 3 to 6 h duration^0.254.
TEST_CASE("a table whose depths grow faster from a duration on makes a storm that holds more") {
    const DesignStorm storm = blocks(county(), 24 * 60, 5, 0.4);
    REQUIRE(storm.rain);
    REQUIRE(storm.held.size() == county().duration_h.size());
    for (const HeldStatistic& held : storm.held) {
        INFO(held.duration_h << " h");
        if (held.duration_h == 3.0)
            CHECK(held.storm_mm > 52.2);
        else
            CHECK_THAT(held.storm_mm, WithinRel(held.statistic_mm, 1e-9));
    }
    CHECK(storm.depth_mm == 88.0);
    CHECK(storm.warnings == std::vector<std::string>{grows_faster_after("3 h")});
}

TEST_CASE("what a storm holds is judged for whole numbers of steps within it") {
    std::vector<double> minutes;
    for (const HeldStatistic& held : blocks(denver(), 90, 10, 0.5).held)
        minutes.push_back(std::round(held.duration_h * 60.0));
    CHECK(minutes == std::vector<double>{10, 30, 60});
    minutes.clear();
    for (const HeldStatistic& held : blocks(denver(), 65, 10, 0.5).held)
        minutes.push_back(std::round(held.duration_h * 60.0));
    CHECK(minutes == std::vector<double>{10, 30, 60});
}

TEST_CASE("a rest is the last step, holds what is left and never the peak") {
    const double peak_at = GENERATE(0.0, 0.5, 0.9, 0.97, 1.0);
    const DesignStorm storm = blocks(denver(), 64, 10, peak_at);
    REQUIRE(storm.rain);
    REQUIRE(storm.rain->steps() == 7);
    CHECK_THAT(storm.rain->duration_h.back(), WithinRel(4.0 / 60.0, 1e-12));
    const double whole_mm = *depth_of(DepthDuration{denver()}, 1.0).depth_mm;
    CHECK_THAT(storm.rain->depth_mm.back(), WithinRel(storm.depth_mm - whole_mm, 1e-12));
    CHECK(largest_step(*storm.rain) <= 5);
    if (peak_at > 0.9) CHECK(largest_step(*storm.rain) == 5);
}

TEST_CASE("depths that grow faster with duration are put in falling order, and that is said") {
    const DepthList list{{10.0 / 60, 20.0 / 60, 30.0 / 60, 40.0 / 60}, {10.0, 12.0, 18.0, 19.0}};
    const DesignStorm storm = blocks(list, 40, 10, 0.5);
    REQUIRE(storm.rain);
    CHECK(storm.warnings == std::vector<std::string>{grows_faster_after("20 min")});
    const std::vector<double> expected{2.0, 10.0, 6.0, 1.0};
    for (std::size_t i = 0; i < 4; ++i)
        CHECK_THAT(storm.rain->depth_mm[i], WithinRel(expected[i], 1e-12));
    CHECK_THAT(storm.held[1].statistic_mm, WithinRel(12.0, 1e-15));
    CHECK_THAT(storm.held[1].storm_mm, WithinRel(16.0, 1e-12));
}

TEST_CASE("rain of one intensity makes equal blocks without a warning") {
    const DesignStorm storm = blocks(DepthList{{0.05, 1.0, 4.0}, {1.0, 20.0, 80.0}}, 240, 3, 0.5);
    REQUIRE(storm.rain);
    CHECK(storm.warnings.empty());
}

TEST_CASE("where the curve is flat no block is below zero by rounding") {
    // i t is the same for every t.
    const DesignStorm storm =
        blocks(IntensityFormula{500.0, 0.0, 1.0, 1.0, 1.0 / 60.0}, 120, 5, 0.5);
    REQUIRE(storm.rain);
    for (const double depth_mm : storm.rain->depth_mm)
        CHECK(depth_mm >= 0.0);
    CHECK_THAT(storm.depth_mm, WithinRel(500.0 / 60.0, 1e-12));
    CHECK(storm.warnings.empty());
}

TEST_CASE("a table that begins above the step gives no blocks") {
    const DepthList list{{10.0 / 60.0, 1.0}, {19.0, 41.0}};
    const DesignStorm storm = blocks(list, 60, 5, 0.5);
    CHECK_FALSE(storm.rain);
    CHECK(storm.problem == depth_of(DepthDuration{list}, 5.0 / 60.0).problem);
    CHECK(storm.hint == depth_of(DepthDuration{list}, 5.0 / 60.0).hint);
}

}  // namespace rainledger
