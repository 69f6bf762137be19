#include "rainledger/losses/green_ampt.hpp"

#include <cmath>
#include <random>

#include <boost/math/special_functions/lambert_w.hpp>
#include <boost/multiprecision/cpp_bin_float.hpp>

#include "test.hpp"

namespace rainledger {
namespace {

using Wide = boost::multiprecision::cpp_bin_float_50;

/// F after t of ponding through the lower branch of the Lambert W function (Boost.Math):
/// F = S (-1 - W_-1(-exp(-1 - K t/S))), at 50 digits since -1 - W cancels for small t.
double cumulative_by_lambert_w(double K, double S, double t) {
    const Wide argument = -exp(-1 - Wide(K) * Wide(t) / Wide(S));
    return static_cast<double>(Wide(S) * (-1 - boost::math::lambert_wm1(argument)));
}

}  // namespace

TEST_CASE("Green-Ampt growth agrees with the Lambert W function of Boost.Math") {
    std::mt19937_64 engine(20260302);
    std::uniform_real_distribution<double> exponent(-4.0, 2.5);
    for (int i = 0; i < 300; ++i) {
        const double K = std::pow(10.0, 0.5 * exponent(engine));
        const double S = std::pow(10.0, exponent(engine));
        const double t = std::pow(10.0, exponent(engine)) * 0.1;
        INFO("K " << K << " S " << S << " t " << t);
        const double expected = cumulative_by_lambert_w(K, S, t);
        CHECK_THAT(green_ampt_cumulative(K, S, t), WithinRel(expected, 4e-15));
        // From a wetted start: the rest of the way in one go.
        const double F0 = green_ampt_cumulative(K, S, 0.3 * t);
        CHECK_THAT(F0 + green_ampt_growth(K, S, F0, 0.7 * t), WithinRel(expected, 8e-15));
        CHECK_THAT(green_ampt_time_between(K, S, 0.0, expected), WithinRel(t, 8e-15));
    }
}

TEST_CASE("a small increment of growth keeps its digits") {
    // dF = fp dt to first order; the second-order term is below 1e-12 of it here.
    const double F = 40.0;
    const double dt = 1.0e-10;
    CHECK_THAT(green_ampt_growth(10.0, 22.0, F, dt),
               WithinRel(green_ampt_capacity(10.0, 22.0, F) * dt, 1e-9));
    CHECK_THAT(green_ampt_growth(10.0, 22.0, F, dt) / dt,
               WithinRel(green_ampt_growth(10.0, 22.0, F, 10.0 * dt) / (10.0 * dt), 1e-8));
}

TEST_CASE("Green-Ampt at the edges of its domain") {
    CHECK(green_ampt_capacity(0.0, 22.0, 0.0) == 0.0);
    CHECK(green_ampt_capacity(10.0, 0.0, 0.0) == 10.0);
    CHECK(green_ampt_capacity(10.0, 22.0, 0.0) == kNever);
    CHECK(green_ampt_growth(0.0, 22.0, 1.0, 5.0) == 0.0);
    CHECK(green_ampt_growth(10.0, 0.0, 1.0, 0.5) == 5.0);
    CHECK_THAT(green_ampt_growth(10.0, 1e-300, 1.0, 0.5), WithinRel(5.0, 1e-15));
    CHECK_THAT(green_ampt_growth(10.0, 1e-12, 0.0, 1.0), WithinRel(10.0, 1e-11));
    CHECK(green_ampt_time_between(0.0, 22.0, 0.0, 1.0) == kNever);
    CHECK(green_ampt_ponding_time(10.0, 22.0, 10.0) == kNever);
    CHECK(green_ampt_ponding_time(10.0, 22.0, 0.0) == kNever);
    CHECK(green_ampt_ponding_time(0.0, 22.0, 1.0) == 0.0);
    CHECK_THAT(green_ampt_ponding_time(10.0, 22.0, 20.0), WithinRel(22.0 / 20.0, 1e-15));
}

TEST_CASE("a storage limit brings the capacity down to the barrier's rate") {
    GreenAmpt law{10.0, 22.0, 5.0, 2.0};
    GreenAmpt::State state = law.start();
    law.advance_below(state, 10.0, 0.4);
    CHECK(law.capacity(state) == 10.0 * (1.0 + 22.0 / 4.0));
    CHECK_THAT(law.time_below(state, 10.0, 1.0), WithinRel(0.1, 1e-13));
    CHECK(law.time_below(state, 2.0, 1.0) == kNever);  // equal to the barrier's constant capacity
    CHECK_THAT(law.time_at_capacity(state, 30.0),
               WithinRel(green_ampt_time_between(10.0, 22.0, 4.0, 5.0), 1e-14));
    const double to_limit = green_ampt_time_between(10.0, 22.0, 4.0, 5.0);
    CHECK_THAT(law.advance_at_capacity(state, to_limit + 0.5), WithinRel(1.0 + 1.0, 1e-13));
    CHECK(law.capacity(state) == 2.0);
}

TEST_CASE("depths that add up to the storage limit have reached it") {
    GreenAmpt law{10.0, 22.0, 6.13, 2.0};
    GreenAmpt::State state = law.start();
    for (int i = 0; i < 613; ++i)
        law.advance_below(state, 1.0, 0.01);
    CHECK(law.capacity(state) == 2.0);
    CHECK(law.time_below(state, 5.0, 1.0) == 0.0);
    CHECK(law.time_at_capacity(state, 5.0) == 0.0);
    GreenAmpt none{10.0, 22.0, 0.0, 2.0};
    CHECK(none.capacity(none.start()) == 2.0);
    CHECK(none.time_below(none.start(), 3.0, 1.0) == 0.0);
    state = none.start();
    CHECK(none.advance_at_capacity(state, 0.5) == 1.0);
}

TEST_CASE("a barrier faster than the soil limits only for a while") {
    // Capacity 10 (1 + 22/F): at F = 5 it is 54; the barrier lets 20 through until F = 22.
    GreenAmpt law{10.0, 22.0, 5.0, 20.0};
    GreenAmpt::State state = law.start();
    const double to_limit = green_ampt_time_between(10.0, 22.0, 0.0, 5.0);
    const double at_barrier = (22.0 - 5.0) / 20.0;
    const double depth = law.advance_at_capacity(state, to_limit + at_barrier + 1.0);
    CHECK_THAT(depth, WithinRel(22.0 + green_ampt_growth(10.0, 22.0, 22.0, 1.0), 1e-13));
    CHECK_THAT(
        law.time_at_capacity(law.start(), 15.0),
        WithinRel(to_limit + at_barrier + green_ampt_time_between(10.0, 22.0, 22.0, 44.0), 1e-13));
    CHECK_THAT(law.time_at_capacity(law.start(), 30.0), WithinRel(to_limit, 1e-13));
}

}  // namespace rainledger
