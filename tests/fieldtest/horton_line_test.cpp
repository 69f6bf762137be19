#include "rainledger/fieldtest/horton_line.hpp"

#include <cmath>

#include "fieldtest/tests_of.hpp"

namespace rainledger {
namespace {

constexpr HortonCurve kCurve{120.0, 25.0, 3.0};

std::vector<TimedRate> rates_of(const HortonCurve& curve, const std::vector<double>& times) {
    std::vector<TimedRate> rates;
    for (const double time : times)
        rates.push_back({time, horton_capacity(curve, time)});
    return rates;
}

}  // namespace

TEST_CASE("exact rates lie on the line") {
    const auto answer = fit_horton_line(rates_of(kCurve, {0.0, 0.2, 0.5, 0.9, 1.4}), 25.0);
    REQUIRE(answer.line);
    CHECK_THAT(answer.line->curve.initial_capacity_mm_per_h, WithinRel(120.0, 1.0e-12));
    CHECK_THAT(answer.line->curve.decay_per_h, WithinRel(3.0, 1.0e-12));
    CHECK(answer.line->curve.final_capacity_mm_per_h == 25.0);
    CHECK_THAT(answer.line->r_squared, WithinRel(1.0, 1.0e-12));
    CHECK(*answer.line->decay_standard_error_per_h < 1.0e-6);
    CHECK(answer.line->used == 5);
    CHECK(answer.line->left_out == 0);
}

TEST_CASE("rates at or below the final capacity are left out and counted") {
    std::vector<TimedRate> rates = rates_of(kCurve, {0.0, 0.2, 0.5});
    rates.push_back({1.0, 25.0});
    rates.push_back({1.5, 24.0});
    const auto answer = fit_horton_line(rates, 25.0);
    REQUIRE(answer.line);
    CHECK(answer.line->used == 3);
    CHECK(answer.line->left_out == 2);
    CHECK_THAT(answer.line->curve.decay_per_h, WithinRel(3.0, 1.0e-12));
}

TEST_CASE("the line's figures are those of hand calculation") {
    // ln(f - fc) = 4, 2, 3, 1 at 0, 1, 2, 3: slope -0.8, intercept 3.7, residual sum 1.8.
    const std::vector<TimedRate> rates{{0.0, 5.0 + std::exp(4.0)},
                                       {1.0, 5.0 + std::exp(2.0)},
                                       {2.0, 5.0 + std::exp(3.0)},
                                       {3.0, 5.0 + std::exp(1.0)}};
    const auto answer = fit_horton_line(rates, 5.0);
    REQUIRE(answer.line);
    CHECK_THAT(answer.line->curve.decay_per_h, WithinRel(0.8, 1.0e-12));
    CHECK_THAT(answer.line->curve.initial_capacity_mm_per_h,
               WithinRel(5.0 + std::exp(3.7), 1.0e-12));
    CHECK_THAT(answer.line->r_squared, WithinRel(0.64, 1.0e-12));
    CHECK_THAT(*answer.line->decay_standard_error_per_h,
               WithinRel(std::sqrt(1.8 / 2.0 / 5.0), 1.0e-12));
}

TEST_CASE("ends lag behind middles: the same line, set back by half an interval") {
    // Equal intervals of an exact curve have mean rates that fall by the same ratio.
    std::vector<double> minutes;
    std::vector<double> depths;
    for (int i = 1; i <= 8; ++i) {
        minutes.push_back(10.0 * i);
        depths.push_back(horton_cumulative(kCurve, i / 6.0));
    }
    const InfiltrationTest test = test_of(ReadingKind::infiltrated, minutes, depths);
    const auto ends = fit_horton_line(test, RatePlace::interval_end, 25.0);
    const auto middles = fit_horton_line(test, RatePlace::interval_middle, 25.0);
    REQUIRE(ends.line);
    REQUIRE(middles.line);
    CHECK_THAT(ends.line->curve.decay_per_h, WithinRel(3.0, 1.0e-9));
    CHECK_THAT(middles.line->curve.decay_per_h, WithinRel(3.0, 1.0e-9));
    // Mean over an interval over the rate at its middle, less fc: sinh(x)/x with x = k dt/2.
    const double x = 0.25;
    CHECK_THAT(middles.line->curve.initial_capacity_mm_per_h,
               WithinRel(25.0 + 95.0 * std::sinh(x) / x, 1.0e-9));
    CHECK_THAT(ends.line->curve.initial_capacity_mm_per_h,
               WithinRel(25.0 + 95.0 * std::sinh(x) / x * std::exp(x), 1.0e-9));
}

TEST_CASE("where there is no line, it is said why") {
    const auto few = fit_horton_line(rates_of(kCurve, {0.0, 0.5}), 100.0);
    CHECK_FALSE(few.line);
    CHECK(few.problem == "fewer than two rates lie above the final capacity");
    CHECK(few.left_out == 1);
    const std::vector<TimedRate> rising{{0.0, 30.0}, {1.0, 40.0}};
    CHECK(fit_horton_line(rising, 5.0).problem == "the rates do not fall with time");
    const std::vector<TimedRate> steep{{1.0, 1.0e4}, {1.001, 6.0}};
    CHECK(fit_horton_line(steep, 5.0).problem ==
          "the line's initial capacity is beyond all numbers");
}

}  // namespace rainledger
