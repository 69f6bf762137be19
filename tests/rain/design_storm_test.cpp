#include "rainledger/rain/design_storm.hpp"

#include <array>
#include <limits>
#include <numeric>

#include "rain/design_cases.hpp"
#include "test.hpp"

namespace rainledger {
namespace {

using Numbers = std::vector<double>;
using enum StormPattern;

constexpr std::array<StormPattern, 5> kPatterns{uniform, triangular,
                                                StormPattern::alternating_blocks,
                                                StormPattern::keifer_chu, StormPattern::mass_curve};
constexpr std::array<MassPoint, 4> kPoints{{{0, 0}, {0.3, 0.1}, {0.4, 0.7}, {1, 1}}};

double sum_of(const Numbers& values) {
    return std::accumulate(values.begin(), values.end(), 0.0);
}

DesignRequest random_request(std::mt19937_64& random, StormPattern pattern) {
    std::uniform_real_distribution<double> duration_min(1.0, 3000.0);
    std::uniform_int_distribution<int> steps(1, 400);
    std::uniform_real_distribution<double> share(0.0, 1.0);
    const double duration_h = duration_min(random) / 60.0;
    const double every_h = duration_h / (steps(random) + (share(random) < 0.5 ? 0.0 : 0.37));
    DesignRequest request = request_of(pattern, duration_h, every_h,
                                       DepthDuration{random_formula(random)}, share(random));
    if (share(random) < 0.2) request.peak_at = share(random) < 0.5 ? 0.0 : 1.0;
    request.curve =
        MassCurve(kPoints, share(random) < 0.5 ? BetweenPoints::linear : BetweenPoints::smooth);
    return request;
}

/// The triangle's intensity at a time, 2 P / T at its peak.
double triangle_mm_per_h(double total_mm, double duration_h, double peak_at, double time_h) {
    const double peak_h = peak_at * duration_h;
    const double height = 2.0 * total_mm / duration_h;
    return time_h < peak_h ? height * time_h / peak_h
                           : height * (duration_h - time_h) / (duration_h - peak_h);
}

/// Its depth between two times, by trapezoids that meet at the peak.
double triangle_mm(double total_mm, double duration_h, double peak_at, double from_h, double to_h) {
    const auto trapezoid = [&](double begin_h, double end_h) {
        const double middle_h = (begin_h + end_h) / 2.0;
        return triangle_mm_per_h(total_mm, duration_h, peak_at, middle_h) * (end_h - begin_h);
    };
    const double peak_h = peak_at * duration_h;
    if (from_h < peak_h && peak_h < to_h)
        return trapezoid(from_h, peak_h) + trapezoid(peak_h, to_h);
    return trapezoid(from_h, to_h);
}

void check_refused(const DesignRequest& request, const std::string& problem,
                   const std::string& hint) {
    const DesignStorm storm = make_design_storm(request);
    CHECK_FALSE(storm.rain);
    CHECK(storm.problem == problem);
    CHECK(storm.hint == hint);
}

}  // namespace

TEST_CASE("every design storm holds its depth exactly, over its whole duration") {
    const auto seed = GENERATE(range(1U, 101U));
    const auto pattern = GENERATE(from_range(kPatterns));
    INFO("seed " << seed << ", pattern " << static_cast<int>(pattern));
    std::mt19937_64 random(seed);
    const DesignRequest request = random_request(random, pattern);
    const DesignStorm storm = make_design_storm(request);
    REQUIRE(storm.problem == "");
    const Hyetograph& rain = *storm.rain;
    const double curve_mm =
        *depth_of(std::get<DepthDuration>(request.depth), request.duration_h).depth_mm;
    CHECK_THAT(storm.depth_mm, WithinRel(curve_mm, 1e-12));
    CHECK_THAT(sum_of(rain.depth_mm), WithinRel(storm.depth_mm, 1e-12));
    CHECK(rain.edges_h.front() == 0.0);
    CHECK_THAT(rain.edges_h.back(), WithinRel(request.duration_h, 1e-9));
    CHECK(rain.own_steps == rain.steps());
    for (std::size_t i = 0; i < rain.steps(); ++i) {
        CHECK(rain.depth_mm[i] >= 0.0);
        if (i + 1 < rain.steps())
            CHECK_THAT(rain.duration_h[i], WithinRel(request.every_h, 1e-9));
        else
            CHECK(rain.duration_h[i] <= request.every_h * (1.0 + 1e-9));
    }
}

TEST_CASE("a given depth is spread by each pattern that takes one") {
    const auto pattern = GENERATE(uniform, triangular, StormPattern::mass_curve);
    DesignRequest request = request_of(pattern, 2.0, 5.0 / 60.0, 62.0, 0.375);
    request.curve = MassCurve(kPoints, BetweenPoints::linear);
    const DesignStorm storm = make_design_storm(request);
    REQUIRE(storm.rain);
    CHECK(storm.depth_mm == 62.0);
    CHECK_THAT(sum_of(storm.rain->depth_mm), WithinRel(62.0, 1e-12));
    CHECK(storm.warnings.empty());
    CHECK(storm.held.empty());
}

TEST_CASE("a uniform storm has equal steps to the last bit, and a shorter one in proportion") {
    const DesignStorm even = make_design_storm(request_of(uniform, 2.0, 5.0 / 60.0, 62.0));
    REQUIRE(even.rain);
    CHECK(even.rain->depth_mm == Numbers(24, 62.0 * (5.0 / 120.0)));
    const DesignStorm uneven = make_design_storm(request_of(uniform, 1.0, 25.0 / 60.0, 60.0));
    REQUIRE(uneven.rain);
    REQUIRE(uneven.rain->steps() == 3);
    CHECK_THAT(uneven.rain->depth_mm[1], WithinRel(25.0, 1e-14));
    CHECK_THAT(uneven.rain->depth_mm[2], WithinRel(10.0, 1e-14));
}

// Yen and Chow, Design hyetographs for small drainage structures, 1980.
TEST_CASE("a triangular storm is the integral of its triangle over each step") {
    const double peak_at = GENERATE(0.0, 0.2, 0.375, 0.41, 0.5, 0.9, 1.0);
    const double every_h = GENERATE(5.0 / 60.0, 7.0 / 60.0, 2.0);
    const DesignStorm storm =
        make_design_storm(request_of(triangular, 2.0, every_h, 41.63, peak_at));
    REQUIRE(storm.rain);
    for (std::size_t i = 0; i < storm.rain->steps(); ++i)
        CHECK_THAT(storm.rain->depth_mm[i],
                   WithinAbs(triangle_mm(41.63, 2.0, peak_at, storm.rain->edges_h[i],
                                         storm.rain->edges_h[i + 1]),
                             1e-13));
}

TEST_CASE("a storm by a mass curve takes the curve's rise over each step") {
    DesignRequest request = request_of(StormPattern::mass_curve, 2.0, 12.0 / 60.0, 50.0);
    request.curve = MassCurve(kPoints, BetweenPoints::linear);
    const DesignStorm linear = make_design_storm(request);
    REQUIRE(linear.rain);
    const Numbers expected{5.0 / 3, 5.0 / 3, 5.0 / 3, 30.0, 2.5, 2.5, 2.5, 2.5, 2.5, 2.5};
    for (std::size_t i = 0; i < expected.size(); ++i)
        CHECK_THAT(linear.rain->depth_mm[i], WithinRel(expected[i], 1e-12));
    request.curve = MassCurve(kPoints, BetweenPoints::smooth);
    const DesignStorm smooth = make_design_storm(request);
    REQUIRE(smooth.rain);
    CHECK_THAT(smooth.rain->depth_mm[3], WithinRel(30.0, 1e-12));
    CHECK(smooth.rain->depth_mm[0] < 1.0);
}

TEST_CASE("edges are whole minutes where the step is, and equal steps equally long") {
    const auto pattern = GENERATE(uniform, StormPattern::keifer_chu);
    const DesignStorm storm =
        make_design_storm(request_of(pattern, 24.0, 5.0 / 60.0, DepthDuration{denver()}));
    REQUIRE(storm.rain);
    REQUIRE(storm.rain->steps() == 288);
    CHECK(storm.rain->given->unit == "min");
    for (std::size_t i = 0; i <= 288; ++i)
        CHECK(storm.rain->given->value[i] == 5.0 * static_cast<double>(i));
    CHECK(storm.rain->duration_h == Numbers(288, 5.0 / 60.0));
}

TEST_CASE("edges of steps of seconds are the nearest minutes") {
    const DesignStorm quarter = make_design_storm(request_of(uniform, 1.0, 15.0 / 3600.0, 10.0));
    REQUIRE(quarter.rain);
    CHECK(quarter.rain->duration_h == Numbers(240, 0.25 / 60.0));
    const DesignStorm third = make_design_storm(request_of(uniform, 1.0, 20.0 / 3600.0, 10.0));
    REQUIRE(third.rain);
    for (std::size_t i = 0; i <= 180; ++i)
        CHECK(third.rain->given->value[i] == static_cast<double>(i) / 3.0);
}

TEST_CASE("a step typed with few digits divides the duration all the same") {
    const DesignStorm storm = make_design_storm(request_of(uniform, 1.0, 0.0833333333333, 10.0));
    REQUIRE(storm.rain);
    CHECK(storm.warnings.empty());
    CHECK(storm.rain->given->value[7] == 35.0);
}

TEST_CASE("a storm of one step") {
    const auto pattern = GENERATE(from_range(kPatterns));
    DesignRequest request = request_of(pattern, 0.5, 0.5, DepthDuration{denver()});
    request.curve = MassCurve(kPoints, BetweenPoints::linear);
    const DesignStorm storm = make_design_storm(request);
    REQUIRE(storm.rain);
    REQUIRE(storm.rain->steps() == 1);
    CHECK_THAT(storm.rain->depth_mm[0], WithinRel(storm.depth_mm, 1e-14));
}

TEST_CASE("steps that do not divide the duration, and steps too long for the table, are said") {
    const DepthList list{{5.0 / 60.0, 0.5, 1.0}, {10.0, 25.0, 30.0}};
    const auto of = [&](StormPattern pattern, double every_min) {
        return make_design_storm(request_of(pattern, 1.0, every_min / 60.0, DepthDuration{list}))
            .warnings;
    };
    const std::string long_step =
        "the step of 15 min is longer than the shortest tabulated duration, 5 min, whose intensity "
        "the storm cannot show";
    CHECK(of(StormPattern::alternating_blocks, 5.0).empty());
    CHECK(of(StormPattern::alternating_blocks, 15.0) == std::vector<std::string>{long_step});
    CHECK(of(triangular, 15.0) == std::vector<std::string>{long_step});
    CHECK(of(uniform, 15.0).empty());
    CHECK(
        of(uniform, 7.0) ==
        std::vector<std::string>{
            "the step of 7 min does not divide the duration of 1 h; the last step is 4 min long"});
}

TEST_CASE("what a design storm cannot be made of is said with what to give instead") {
    const double nan = std::numeric_limits<double>::quiet_NaN();
    const double infinity = std::numeric_limits<double>::infinity();
    for (const double wrong : {0.0, -1.0, nan, infinity}) {
        check_refused(request_of(uniform, wrong, 0.1, 10.0),
                      "the duration of a design storm must be above zero", "give one such as 2 h");
        check_refused(request_of(uniform, 1.0, 0.1, wrong),
                      "the depth of a design storm must be above zero", "give one such as 62 mm");
    }
    for (const double wrong : {0.0, -1.0, nan, infinity, 1e-8})
        check_refused(request_of(uniform, 1.0, wrong, 10.0),
                      "the step of a design storm must be at least a thousandth of a second",
                      "give one such as 5 min");
    check_refused(request_of(uniform, 0.5, 1.0, 10.0),
                  "the step of 1 h is longer than the storm of 30 min",
                  "give a step that divides the duration");
    check_refused(request_of(uniform, 24.0, 1e-5, 10.0),
                  "a storm of 24 h has more than a million steps of 0.036 s", "give a longer step");
    for (const double wrong : {-0.01, 1.01, nan})
        check_refused(request_of(triangular, 1.0, 0.1, 10.0, wrong),
                      "the peak must lie at a share of 0 to 1 of the duration",
                      "give one such as 0.375");
}

TEST_CASE("a pattern without what it needs is refused") {
    check_refused(request_of(StormPattern::mass_curve, 1.0, 0.1, 10.0),
                  "a storm by a mass curve needs the curve",
                  "name one such as nrcs_II or huff_2, or give its points");
    check_refused(request_of(StormPattern::alternating_blocks, 1.0, 0.1, 10.0),
                  "alternating_blocks needs depths by duration, not one depth alone",
                  "give statistics with a return_period, depths, or a formula");
    check_refused(request_of(StormPattern::keifer_chu, 1.0, 0.1, 10.0),
                  "keifer_chu needs an intensity formula, not one depth alone", "give a formula");
}

TEST_CASE("what the curve does not give is passed on") {
    const DepthDuration list = DepthList{{10.0 / 60.0, 1.0}, {19.0, 41.0}};
    const auto pattern = GENERATE(uniform, StormPattern::alternating_blocks);
    const DesignStorm longer = make_design_storm(request_of(pattern, 2.0, 10.0 / 60.0, list));
    CHECK(longer.problem == depth_of(list, 2.0).problem);
    CHECK(longer.hint == depth_of(list, 2.0).hint);
    CHECK_FALSE(longer.problem.empty());
}

}  // namespace rainledger
