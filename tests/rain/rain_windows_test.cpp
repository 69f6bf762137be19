#include "rainledger/rain/rain_windows.hpp"

#include <algorithm>
#include <random>
#include <vector>

#include "test.hpp"

namespace rainledger {
namespace {

Hyetograph random_rain(std::mt19937_64& random) {
    std::uniform_int_distribution<std::size_t> steps(1, 40);
    std::uniform_real_distribution<double> step_min(0.5, 30.0);
    std::uniform_real_distribution<double> depth(-1.0, 5.0);
    std::vector<double> edges{0.0};
    std::vector<double> depth_mm;
    for (std::size_t left = steps(random); left > 0; --left) {
        edges.push_back(edges.back() + step_min(random));
        depth_mm.push_back(std::max(depth(random), 0.0));
    }
    return make_hyetograph(edges, "min", depth_mm);
}

/// Depth in one window, step by step.
double depth_between(const Hyetograph& rain, double from_h, double to_h) {
    double sum_mm = 0.0;
    for (std::size_t i = 0; i < rain.own_steps; ++i) {
        const double begin_h = std::max(from_h, rain.edges_h[i]);
        const double end_h = std::min(to_h, rain.edges_h[i + 1]);
        if (end_h > begin_h) sum_mm += rain.intensity_mm_per_h(i) * (end_h - begin_h);
    }
    return sum_mm;
}

double largest_by_trial(const Hyetograph& rain, double window_h) {
    double largest_mm = 0.0;
    for (const double edge_h : rain.edges_h)
        largest_mm = std::max({largest_mm, depth_between(rain, edge_h, edge_h + window_h),
                               depth_between(rain, edge_h - window_h, edge_h)});
    return largest_mm;
}

}  // namespace

TEST_CASE("the largest depth in a window is that of the worst of all windows") {
    const auto seed = GENERATE(range(1U, 101U));
    INFO("seed " << seed);
    std::mt19937_64 random(seed);
    const Hyetograph rain = random_rain(random);
    std::uniform_real_distribution<double> window(0.005, 1.2 * own_duration_h(rain));
    const double window_h = window(random);
    const double largest_mm = largest_window_depth_mm(rain, window_h);
    CHECK_THAT(largest_mm, WithinAbs(largest_by_trial(rain, window_h), 1e-12));
    std::uniform_real_distribution<double> start(-window_h, own_duration_h(rain));
    for (int trial = 0; trial < 50; ++trial) {
        const double from_h = start(random);
        CHECK(depth_between(rain, from_h, from_h + window_h) <= largest_mm + 1e-12);
    }
}

TEST_CASE("windows of whole steps, of half a step and longer than the storm") {
    const Hyetograph rain = make_hyetograph({10, 15, 20, 25}, "min", {1.0, 4.0, 3.0});
    const CumulativeDepth depth(rain);
    CHECK_THAT(depth.largest_depth_mm(2.5 / 60.0), WithinRel(2.0, 1e-14));
    CHECK_THAT(depth.largest_depth_mm(5.0 / 60.0), WithinRel(4.0, 1e-14));
    CHECK_THAT(depth.largest_depth_mm(10.0 / 60.0), WithinRel(7.0, 1e-14));
    CHECK_THAT(depth.largest_depth_mm(12.5 / 60.0), WithinRel(7.5, 1e-14));
    CHECK(depth.largest_depth_mm(1.0) == 8.0);
}

TEST_CASE("dry time appended to a storm is in no window of its own") {
    Hyetograph rain = make_hyetograph({0, 5, 10}, "min", {1.0, 2.0});
    append_dry_time(rain, 1.0);
    rain.depth_mm.back() = 9.0;
    CHECK(largest_window_depth_mm(rain, 1.0) == 3.0);
}

TEST_CASE("a series without steps holds nothing") {
    CHECK(CumulativeDepth(0).largest_depth_mm(1.0) == 0.0);
}

}  // namespace rainledger
