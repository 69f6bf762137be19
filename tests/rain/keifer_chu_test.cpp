#include <cmath>
#include <numeric>

#include "rain/design_cases.hpp"
#include "test.hpp"

// Keifer and Chu's storm (Synthetic storm pattern for drainage design, 1957).
namespace rainledger {
namespace {

DesignStorm storm_of(DepthDuration curve, double duration_h, double every_h, double peak_at) {
    return make_design_storm(
        request_of(StormPattern::keifer_chu, duration_h, every_h, std::move(curve), peak_at));
}

/// The published intensity for n = 1 (Chow, Maidment and Mays, Applied Hydrology, 1988, eq. 14.4.11
/// and 14.4.12; from memory), in the formula's own unit of time; `t` is tb / r or ta / (1 - r).
double published_mm_per_h(const IntensityFormula& formula, double t) {
    const double power = std::pow(t, formula.m);
    return formula.a_mm_per_h * ((1.0 - formula.m) * power + formula.b) /
           std::pow(power + formula.b, 2.0);
}

/// Its depth in mm between two times in minutes, by Simpson's rule on one side of the peak.
double published_mm(const IntensityFormula& formula, double peak_min, double r, double from_min,
                    double to_min) {
    constexpr int kPieces = 2000;
    const double h = (to_min - from_min) / kPieces;
    double sum = 0.0;
    for (int i = 0; i <= kPieces; ++i) {
        const double offset = from_min + i * h - peak_min;
        const bool before = to_min <= peak_min;
        const double t = before ? std::fmax(-offset, 0.0) / r : std::fmax(offset, 0.0) / (1.0 - r);
        const double weight = i == 0 || i == kPieces ? 1.0 : (i % 2 == 1 ? 4.0 : 2.0);
        sum += weight * published_mm_per_h(formula, t);
    }
    return sum * h / 3.0 / 60.0;
}

}  // namespace

TEST_CASE("each step is the integral of the published intensity") {
    const double r = GENERATE(0.2, 0.375, 0.5, 0.75);
    const double every_min = 3.0;
    const DesignStorm storm = storm_of(denver(), 2.0, every_min / 60.0, r);
    REQUIRE(storm.rain);
    const double peak_min = 120.0 * r;
    for (std::size_t i = 0; i < storm.rain->steps(); ++i) {
        const double from_min = storm.rain->given->value[i];
        const double to_min = storm.rain->given->value[i + 1];
        if (from_min < peak_min && peak_min < to_min) continue;
        // Simpson's error where the slope is steepest, at the peak.
        CHECK_THAT(storm.rain->depth_mm[i],
                   WithinRel(published_mm(denver(), peak_min, r, from_min, to_min), 1e-6));
    }
}

TEST_CASE("the stretch of any length around the peak holds the formula's depth") {
    const auto seed = GENERATE(range(1U, 101U));
    INFO("seed " << seed);
    std::mt19937_64 random(seed);
    const IntensityFormula formula = random_formula(random);
    std::uniform_int_distribution<int> count(1, 9);
    const int before = count(random);
    const int after = count(random);
    const int stretches = 20 * count(random);
    const double every_h = count(random) / 60.0;
    const double r = static_cast<double>(before) / (before + after);
    const DesignStorm storm = storm_of(formula, (before + after) * stretches * every_h, every_h, r);
    REQUIRE(storm.rain);
    const auto peak = storm.rain->depth_mm.begin() + before * stretches;
    for (int k = 1; k <= stretches; ++k) {
        const double held_mm = std::accumulate(peak - before * k, peak + after * k, 0.0);
        const double statistic_mm =
            *depth_of(DepthDuration{formula}, (before + after) * k * every_h).depth_mm;
        CHECK_THAT(held_mm, WithinRel(statistic_mm, 1e-12));
    }
}

TEST_CASE("a peak at either end leaves one side of the curve") {
    const DesignStorm falling = storm_of(denver(), 2.0, 10.0 / 60.0, 0.0);
    const DesignStorm rising = storm_of(denver(), 2.0, 10.0 / 60.0, 1.0);
    REQUIRE(falling.rain);
    REQUIRE(rising.rain);
    double before_mm = 0.0;
    for (std::size_t i = 0; i < 12; ++i) {
        const double end_mm =
            *depth_of(DepthDuration{denver()}, static_cast<double>(i + 1) / 6.0).depth_mm;
        CHECK_THAT(falling.rain->depth_mm[i], WithinRel(end_mm - before_mm, 1e-12));
        CHECK_THAT(rising.rain->depth_mm[11 - i], WithinRel(end_mm - before_mm, 1e-12));
        before_mm = end_mm;
    }
}

TEST_CASE("a formula without b has an endless peak, whose depth is finite") {
    const IntensityFormula formula{300.0, 0.0, 0.6, 1.0, 1.0 / 60.0};
    const DesignStorm storm = storm_of(formula, 2.0, 5.0 / 60.0, 0.4);
    REQUIRE(storm.rain);
    CHECK_THAT(total_depth_mm(*storm.rain), WithinRel(600.0 / std::pow(120.0, 0.6), 1e-12));
}

TEST_CASE("a list of depths is refused with the way to a formula") {
    const DesignStorm storm = storm_of(DepthList{{0.5, 1.0}, {20.0, 30.0}}, 1.0, 0.5, 0.5);
    CHECK_FALSE(storm.rain);
    CHECK(storm.problem == "keifer_chu needs an intensity formula; this is a list of depths");
    CHECK(storm.hint ==
          "fit a formula to the depths with 'rainledger storm --fit-formula', or take "
          "alternating_blocks");
}

TEST_CASE("a formula that cannot be followed to its peak is refused") {
    const DesignStorm negative =
        storm_of(IntensityFormula{900.0, -0.2, 0.6, 1.0, 1.0 / 60.0}, 2.0, 5.0 / 60.0, 0.5);
    CHECK_FALSE(negative.rain);
    CHECK(negative.problem ==
          "with b below zero the formula has no intensity near the storm's peak");
    CHECK(negative.hint ==
          "fit the formula with b of zero or more, or take alternating_blocks, which needs it at "
          "whole steps only");
    const DesignStorm constant =
        storm_of(IntensityFormula{900.0, 0.0, 1.0, 1.0, 1.0 / 60.0}, 2.0, 5.0 / 60.0, 0.5);
    CHECK_FALSE(constant.rain);
    CHECK(constant.problem ==
          "with b of zero and m times n of 1 or more the formula's depth does not vanish with the "
          "duration, so that rain would fall in no time at the peak");
    CHECK(constant.hint == "fit the formula with b above zero");
}

TEST_CASE("a storm beyond the duration up to which a formula's depth rises is refused") {
    const IntensityFormula formula{3000.0, 14.0, 1.2, 1.0, 1.0 / 60.0};
    const double rises_until_h = depth_rises_until_h(formula);
    CHECK(storm_of(formula, rises_until_h * 0.99, rises_until_h / 100.0, 0.4).rain);
    const DesignStorm storm = storm_of(formula, 2.0, 5.0 / 60.0, 0.4);
    CHECK_FALSE(storm.rain);
    CHECK(storm.problem == depth_of(DepthDuration{formula}, 2.0).problem);
    CHECK_FALSE(storm.hint.empty());
}

}  // namespace rainledger
