#include "rainledger/rain/mass_curve.hpp"

#include <array>
#include <cmath>
#include <limits>
#include <random>

#include "rain/smooth_curve_values.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

constexpr std::array<MassPoint, 9> kUneven{{{0, 0},
                                            {0.05, 0.02},
                                            {0.2, 0.1},
                                            {0.25, 0.4},
                                            {0.45, 0.4},
                                            {0.6, 0.55},
                                            {0.625, 0.8},
                                            {0.9, 0.97},
                                            {1, 1}}};
constexpr std::array<MassPoint, 3> kThree{{{0, 0}, {0.3, 0.1}, {1, 1}}};
constexpr std::array<MassPoint, 5> kFlatEnds{{{0, 0}, {0.2, 0}, {0.5, 0.7}, {0.8, 1}, {1, 1}}};
constexpr std::array<MassPoint, 2> kStraight{{{0, 0}, {1, 1}}};

void check_smooth(std::span<const MassPoint> points, std::span<const double> expected) {
    const MassCurve curve(points, BetweenPoints::smooth);
    for (std::size_t i = 0; i < expected.size(); ++i) {
        const double time = 0.01 + 0.02 * static_cast<double>(i);
        INFO("at " << time);
        CHECK_THAT(curve.depth_at(time), WithinAbs(expected[i], 1e-14));
    }
}

std::vector<MassPoint> random_points(std::mt19937_64& random) {
    std::uniform_int_distribution<int> count(0, 12);
    std::uniform_real_distribution<double> gap(0.001, 1.0);
    std::uniform_real_distribution<double> rise(-0.5, 1.0);
    std::vector<MassPoint> points{{0.0, 0.0}};
    for (int left = count(random); left >= 0; --left)
        points.push_back(
            {points.back().time + gap(random), points.back().depth + std::max(rise(random), 0.0)});
    points.back().depth += 0.1;
    const MassPoint last = points.back();
    for (MassPoint& point : points)
        point = {point.time / last.time, point.depth / last.depth};
    return points;
}

std::string problem_of(std::vector<MassPoint> points, std::size_t at) {
    const auto found = mass_curve_problem(points);
    if (!found) return "";
    CHECK(found->point == at);
    return found->problem;
}

}  // namespace

TEST_CASE("the smooth curve is SciPy's monotone cubic") {
    check_smooth(kUneven, kUnevenValues);
    check_smooth(kThree, kThreeValues);
    check_smooth(kFlatEnds, kFlatEndsValues);
}

TEST_CASE("between two points alone both curves are straight") {
    const auto between = GENERATE(BetweenPoints::linear, BetweenPoints::smooth);
    const MassCurve curve(kStraight, between);
    for (const double time : {0.0, 0.1, 0.5, 0.77, 1.0})
        CHECK_THAT(curve.depth_at(time), WithinAbs(time, 1e-15));
}

TEST_CASE("a linear curve is linear between its points and flat where they are") {
    const MassCurve curve(kUneven, BetweenPoints::linear);
    CHECK_THAT(curve.depth_at(0.125), WithinRel(0.06, 1e-15));
    CHECK(curve.depth_at(0.31) == 0.4);
    CHECK(curve.depth_at(0.44) == 0.4);
    CHECK_THAT(curve.depth_at(0.95), WithinRel(0.985, 1e-15));
}

TEST_CASE("curves pass through their points, and never fall") {
    const auto seed = GENERATE(range(1U, 201U));
    const auto between = GENERATE(BetweenPoints::linear, BetweenPoints::smooth);
    INFO("seed " << seed);
    std::mt19937_64 random(seed);
    const std::vector<MassPoint> points = random_points(random);
    REQUIRE_FALSE(mass_curve_problem(points));
    const MassCurve curve(points, between);
    for (const MassPoint& point : points)
        CHECK(curve.depth_at(point.time) == point.depth);
    double before = 0.0;
    for (int i = 0; i <= 2000; ++i) {
        const double depth = curve.depth_at(i / 2000.0);
        CHECK(depth >= before - 1e-15);
        before = depth;
    }
    CHECK(before == 1.0);
}

TEST_CASE("what is wrong with the points of a mass curve is said, with the point") {
    const double nan = std::numeric_limits<double>::quiet_NaN();
    CHECK(problem_of({}, 0) == "a mass curve needs at least two points");
    CHECK(problem_of({{0, 0}}, 0) == "a mass curve needs at least two points");
    CHECK(problem_of({{0, 0.1}, {1, 1}}, 0) == "a mass curve must begin with time 0 and depth 0");
    CHECK(problem_of({{0.1, 0}, {1, 1}}, 0) == "a mass curve must begin with time 0 and depth 0");
    CHECK(problem_of({{0, 0}, {0.5, 0.4}, {0.5, 0.6}, {1, 1}}, 2) ==
          "time 0.5 is not later than the time before it, 0.5");
    CHECK(problem_of({{0, 0}, {0.5, 0.4}, {0.6, 0.3}, {1, 1}}, 2) ==
          "depth 0.3 is less than the depth before it, 0.4; rain cannot be negative");
    for (const double wrong : {nan, -0.1, 1.1, 50.0, std::numeric_limits<double>::infinity()}) {
        CHECK(problem_of({{0, 0}, {0.5, wrong}, {1, 1}}, 1) ==
              "time and depth of a mass curve must lie from 0 to 1");
        CHECK(problem_of({{0, 0}, {wrong, 0.5}, {1, 1}}, 1) ==
              "time and depth of a mass curve must lie from 0 to 1");
    }
    CHECK(problem_of({{0, 0}, {0.9, 1}}, 1) == "a mass curve must end with time 1 and depth 1");
    CHECK(problem_of({{0, 0}, {0.5, 0.5}, {1, 0.9}}, 2) ==
          "a mass curve must end with time 1 and depth 1");
    CHECK(problem_of({{0, 0}, {0.5, 0}, {0.6, 1}, {1, 1}}, 0) == "");
}

}  // namespace rainledger
