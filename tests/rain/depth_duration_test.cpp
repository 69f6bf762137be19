#include "rainledger/rain/depth_duration.hpp"

#include <cmath>
#include <limits>

#include "test.hpp"

namespace rainledger {
namespace {

constexpr double kMinute = 1.0 / 60.0;
constexpr double kRounding = 1e-14;

DepthList list_of_three() {
    return {{5.0 / 60.0, 0.25, 1.0}, {9.8, 17.3, 31.1}};
}

/// Denver, 10 years: Wenzel 1982, in Chow, Maidment and Mays, Applied Hydrology, 1988, table 14.2.3
/// (from memory).
IntensityFormula denver() {
    return {96.6 * 25.4, 13.90, 0.97, 1.0, kMinute};
}

}  // namespace

TEST_CASE("a list gives its tabulated depths to the last bit, however the duration was made") {
    const DepthList list = list_of_three();
    CHECK(depth_of(list, 5.0 / 60.0).depth_mm == 9.8);
    CHECK(depth_of(list, 3.0 * (5.0 / 60.0)).depth_mm == 17.3);
    CHECK(depth_of(list, 12.0 * 0.0833333333333333).depth_mm == 31.1);
    CHECK(depth_of(list, 0.0833333333333333).depth_mm == 9.8);
}

TEST_CASE("between listed durations log depth is linear in log duration") {
    const DepthList list = list_of_three();
    // At the geometric mean of two durations stands the geometric mean of their depths.
    const DepthAnswer middle = depth_of(list, std::sqrt(0.25));
    REQUIRE(middle.depth_mm.has_value());
    CHECK_THAT(*middle.depth_mm, WithinRel(std::sqrt(17.3 * 31.1), kRounding));
    const DepthAnswer third = depth_of(list, 0.25 * std::cbrt(4.0));
    REQUIRE(third.depth_mm.has_value());
    CHECK_THAT(*third.depth_mm, WithinRel(17.3 * std::cbrt(31.1 / 17.3), kRounding));
    CHECK(depth_of(DepthList{{1.0, 2.0}, {40.0, 40.0}}, 1.7).depth_mm == 40.0);
}

TEST_CASE("a list never falls between what it holds") {
    const DepthList list{{1.0, 2.0, 3.0}, {40.0, std::nextafter(40.0, 50.0), 40.1}};
    double before = 0.0;
    for (int i = 0; i <= 2000; ++i) {
        const auto depth = depth_of(list, 1.0 + i * 0.001).depth_mm;
        REQUIRE(depth.has_value());
        CHECK(*depth >= before);
        before = *depth;
    }
}

TEST_CASE("outside a list there is no depth, and the answer says what there is") {
    const DepthAnswer shorter = depth_of(list_of_three(), 2.0 / 60.0);
    CHECK_FALSE(shorter.depth_mm.has_value());
    CHECK(shorter.problem ==
          "there is no depth for 2 min: the depths known here go from 5 min to 1 h");
    CHECK(shorter.hint ==
          "choose a step no shorter than 5 min, add the depth to the table, or use a formula "
          "fitted to it, as 'rainledger storm TABLE --fit-formula' prints");
    const DepthAnswer longer = depth_of(list_of_three(), 1.5);
    CHECK_FALSE(longer.depth_mm.has_value());
    CHECK(longer.problem ==
          "there is no depth for 1 h 30 min: the depths known here go from 5 min to 1 h");
    CHECK(longer.hint ==
          "choose a duration of no more than 1 h, add the depth to the table, or use a formula "
          "fitted to it, as 'rainledger storm TABLE --fit-formula' prints");
    CHECK(depth_of(DepthList{{24.0}, {88.0}}, 12.0).problem ==
          "there is no depth for 12 h: the one depth known here is that of 24 h");
}

TEST_CASE("a depth needs a duration above zero") {
    for (const double hours : {0.0, -1.0, std::numeric_limits<double>::quiet_NaN(),
                               std::numeric_limits<double>::infinity()}) {
        CHECK(depth_of(list_of_three(), hours).problem == "a depth needs a duration above zero");
        CHECK(depth_of(denver(), hours).problem == "a depth needs a duration above zero");
    }
}

TEST_CASE("a formula gives intensity and depth in its own unit of time") {
    CHECK_THAT(intensity_mm_per_h(denver(), 0.0), WithinRel(96.6 * 25.4 / 13.9, kRounding));
    CHECK_THAT(*depth_of(denver(), 1.0).depth_mm,
               WithinRel(96.6 * 25.4 / (std::pow(60.0, 0.97) + 13.9), kRounding));
    const IntensityFormula in_hours{36.0, -0.2, 1.0, 1.0, 1.0};
    CHECK_THAT(intensity_mm_per_h(in_hours, 1.0), WithinRel(45.0, kRounding));
    const IntensityFormula with_n{1000.0, 8.0, 1.0, 0.75, kMinute};
    CHECK_THAT(intensity_mm_per_h(with_n, 0.5), WithinRel(1000.0 / std::pow(38.0, 0.75), 1e-14));
}

TEST_CASE("a formula has no intensity up to its pole") {
    const IntensityFormula formula{600.0, -4.0, 0.5, 1.0, kMinute};
    CHECK(std::isnan(intensity_mm_per_h(formula, 16.0 / 60.0)));
    const DepthAnswer answer = depth_of(formula, 10.0 / 60.0);
    CHECK_FALSE(answer.depth_mm.has_value());
    CHECK(answer.problem ==
          "the formula gives no intensity at 10 min: t^m + b is not above zero there");
    CHECK(answer.hint == "choose a longer step, or check b = -4");
}

TEST_CASE("a formula answers where its depth does not fall") {
    SECTION("everywhere for b >= 0 and m n <= 1") {
        CHECK(depth_rises_from_h(denver()) == 0.0);
        CHECK(std::isinf(depth_rises_until_h(denver())));
        CHECK(std::isinf(depth_rises_until_h({100.0, 0.0, 1.0, 1.0, 1.0})));
        CHECK(depth_of(denver(), 1000.0).depth_mm.has_value());
    }
    SECTION("up to a limit for m n > 1") {
        // t^m = b / (m n - 1) = 6.25 / 0.25 = 25, in minutes.
        const IntensityFormula formula{5000.0, 6.25, 1.0, 1.25, kMinute};
        CHECK_THAT(depth_rises_until_h(formula), WithinRel(25.0 / 60.0, kRounding));
        CHECK(depth_of(formula, 0.4).depth_mm.has_value());
        const DepthAnswer beyond = depth_of(formula, 0.5);
        CHECK(beyond.problem ==
              "the formula's depth falls with duration at 30 min; it rises up to 25 min");
        CHECK(beyond.hint == "choose a shorter duration, or check the formula's constants");
    }
    SECTION("from a limit on for b < 0 and m n < 1") {
        const IntensityFormula formula{600.0, -2.0, 0.5, 1.0, kMinute};
        CHECK_THAT(depth_rises_from_h(formula), WithinRel(16.0 / 60.0, kRounding));
        CHECK(std::isinf(depth_rises_until_h(formula)));
        CHECK(depth_of(formula, 0.3).depth_mm.has_value());
        const DepthAnswer before = depth_of(formula, 0.2);
        CHECK(before.problem ==
              "the formula's depth falls with duration at 12 min; it rises from 16 min on");
        CHECK(before.hint == "choose a longer step, or check the formula's constants");
    }
    SECTION("nowhere for b < 0 and m n >= 1") {
        const IntensityFormula formula{36.0, -0.2, 1.0, 1.0, 1.0};
        CHECK(depth_rises_until_h(formula) == 0.0);
        const DepthAnswer answer = depth_of(formula, 1.0);
        CHECK(answer.problem ==
              "the formula's depth falls with duration at 1 h, as it does everywhere");
        CHECK(answer.hint == "check its constants");
    }
}

TEST_CASE("the limits of a formula are where its depth turns") {
    const IntensityFormula with_limit{5000.0, 20.0, 0.9, 1.4, kMinute};
    const IntensityFormula from_limit{600.0, -1.5, 0.6, 0.9, kMinute};
    for (const auto& [formula, turn] : {std::pair{with_limit, depth_rises_until_h(with_limit)},
                                        std::pair{from_limit, depth_rises_from_h(from_limit)}}) {
        const auto depth = [&f = formula](double h) { return intensity_mm_per_h(f, h) * h; };
        const double slope = (depth(turn * 1.0001) - depth(turn * 0.9999)) / depth(turn);
        CHECK_THAT(slope, WithinAbs(0.0, 1e-10));
        CHECK(std::fabs(depth(turn * 1.1) - depth(turn)) > 1e-4 * depth(turn));
    }
}

TEST_CASE("a formula with constants out of range gives no depth") {
    for (const IntensityFormula& formula :
         {IntensityFormula{0.0, 1.0, 1.0, 1.0, 1.0}, IntensityFormula{1.0, 1.0, 0.0, 1.0, 1.0},
          IntensityFormula{1.0, 1.0, 1.0, -1.0, 1.0},
          IntensityFormula{1.0, std::numeric_limits<double>::quiet_NaN(), 1.0, 1.0, 1.0}})
        CHECK(depth_of(formula, 1.0).problem ==
              "the formula i = a / (t^m + b)^n needs a, m and n above zero");
    const DepthAnswer too_small = depth_of(IntensityFormula{1e-300, 1e200, 1.0, 1.0, 1.0}, 1.0);
    CHECK(too_small.problem == "the formula gives no usable depth at 1 h");
    CHECK(too_small.hint == "check its constants and the unit of its time");
}

TEST_CASE("durations are named as statistics tables name them") {
    CHECK(duration_label(5.0 / 60.0) == "5 min");
    CHECK(duration_label(0.25) == "15 min");
    CHECK(duration_label(7.5 / 60.0) == "7.5 min");
    CHECK(duration_label(20.0 / 3600.0) == "20 s");
    CHECK(duration_label(1.0 / 3600.0) == "1 s");
    CHECK(duration_label(12.0 * (5.0 / 60.0)) == "1 h");
    CHECK(duration_label(12.0 * 0.0833333333333333) == "1 h");
    CHECK(duration_label(1.5) == "1 h 30 min");
    CHECK(duration_label(95.0 / 60.0) == "1 h 35 min");
    CHECK(duration_label(1.0 + 1.0 / 3600.0) == "1.00028 h");
    CHECK(duration_label(24.0) == "24 h");
    CHECK(duration_label(36.0) == "36 h");
    CHECK(duration_label(48.0) == "2 d");
    CHECK(duration_label(50.0) == "50 h");
    CHECK(duration_label(240.0) == "10 d");
}

}  // namespace rainledger
