#include "rainledger/losses/horton.hpp"

#include <cmath>
#include <random>

#include <boost/math/special_functions/lambert_w.hpp>

#include "test.hpp"

namespace rainledger {
namespace {

constexpr HortonCurve kLawn{50.0, 6.0, 4.14};

/// te at depth F through the Lambert W function (Boost.Math): with x = k te, c = fc/k, a = (f0 -
/// fc)/k, c x + a (1 - exp(-x)) = F has the root x = (F - a)/c + W0((a/c) exp((a - F)/c)).
double time_by_lambert_w(const HortonCurve& curve, double F) {
    const double c = curve.final_capacity_mm_per_h / curve.decay_per_h;
    const double a =
        (curve.initial_capacity_mm_per_h - curve.final_capacity_mm_per_h) / curve.decay_per_h;
    const double w = boost::math::lambert_w0(a / c * std::exp((a - F) / c));
    return ((F - a) / c + w) / curve.decay_per_h;
}

}  // namespace

TEST_CASE("Horton's curve at its ends and at known points") {
    CHECK(horton_capacity(kLawn, 0.0) == 50.0);
    CHECK(horton_cumulative(kLawn, 0.0) == 0.0);
    CHECK_THAT(horton_capacity(kLawn, 100.0), WithinRel(6.0, 1e-15));
    // F(te) = fc te + (f0 - fc)/k (1 - exp(-k te)) by hand for te = 0.5 h: 3 + 10.6280193 (1 -
    // 0.1261857)
    CHECK_THAT(horton_cumulative(kLawn, 0.5),
               WithinAbs(3.0 + 44.0 / 4.14 * (1.0 - std::exp(-2.07)), 1e-13));
}

TEST_CASE("depth and time on Horton's curve invert each other") {
    for (const double te : {1e-9, 1e-3, 0.1, 0.5, 2.0, 10.0, 200.0})
        CHECK_THAT(horton_time_at_depth(kLawn, horton_cumulative(kLawn, te)), WithinRel(te, 1e-13));
    const HortonCurve capped{50.0, 0.0, 4.0};
    CHECK(horton_time_at_depth(capped, 12.5) == kNever);  // f0/k
    CHECK_THAT(horton_time_at_depth(capped, horton_cumulative(capped, 1.0)), WithinRel(1.0, 1e-13));
    CHECK(horton_time_at_depth({8.0, 8.0, 2.0}, 4.0) == 0.5);
    CHECK(horton_time_at_depth({8.0, 2.0, 0.0}, 4.0) == 0.5);
    CHECK(horton_time_at_depth({8.0, 2.0, 1e-308}, 4.0) == 0.5);  // k too small to fall
}

TEST_CASE("time on Horton's curve agrees with the Lambert W function of Boost.Math") {
    std::mt19937_64 engine(20260301);
    std::uniform_real_distribution<double> unit(0.0, 1.0);
    for (int i = 0; i < 2000; ++i) {
        const double fc = 1.0 + 29.0 * unit(engine);
        const HortonCurve curve{fc + 100.0 * unit(engine), fc, 0.5 + 8.0 * unit(engine)};
        const double F = 60.0 * unit(engine);
        const double c = fc / curve.decay_per_h;
        if ((100.0 / curve.decay_per_h - F) / c > 600.0) continue;  // exp would overflow
        INFO("f0 " << curve.initial_capacity_mm_per_h << " fc " << fc << " k " << curve.decay_per_h
                   << " F " << F);
        // As depths: both times on the curve give the same F to 1e-9 mm.
        CHECK_THAT(horton_cumulative(curve, horton_time_at_depth(curve, F)), WithinAbs(F, 1e-11));
        CHECK_THAT(horton_cumulative(curve, time_by_lambert_w(curve, F)), WithinAbs(F, 1e-9));
        CHECK_THAT(horton_time_at_depth(curve, F), WithinAbs(time_by_lambert_w(curve, F), 1e-9));
    }
}

TEST_CASE("ponding time under constant rain, following infiltrated depth") {
    CHECK(horton_ponding_time(kLawn, 50.0) == 0.0);
    CHECK(horton_ponding_time(kLawn, 80.0) == 0.0);
    CHECK(horton_ponding_time(kLawn, 6.0) == kNever);
    CHECK(horton_ponding_time(kLawn, 0.0) == kNever);
    const double te = std::log(44.0 / 14.0) / 4.14;  // capacity 20 mm/h
    CHECK_THAT(horton_ponding_time(kLawn, 20.0),
               WithinRel(horton_cumulative(kLawn, te) / 20.0, 1e-14));
    CHECK(horton_ponding_time({8.0, 8.0, 2.0}, 8.0) == kNever);  // equal to a constant capacity
    CHECK(horton_ponding_time({8.0, 8.0, 2.0}, 8.1) == 0.0);
}

TEST_CASE("the law takes the same path in one step as in many") {
    const Horton law{kLawn, 0.0};
    Horton::State whole = law.start();
    Horton::State parts = law.start();
    law.advance_below(whole, 20.0, 0.25);
    for (int i = 0; i < 25; ++i)
        law.advance_below(parts, 20.0, 0.01);
    CHECK_THAT(law.capacity(parts), WithinRel(law.capacity(whole), 1e-13));
    const double once = law.advance_at_capacity(whole, 0.5);
    double sum = 0.0;
    for (int i = 0; i < 50; ++i)
        sum += law.advance_at_capacity(parts, 0.01);
    CHECK_THAT(sum, WithinRel(once, 1e-12));
    CHECK_THAT(law.time_at_capacity(law.start(), law.capacity(whole)),
               WithinRel(horton_time_at_depth(kLawn, 5.0 + once), 1e-12));
}

TEST_CASE("recovery climbs back toward the initial capacity while the soil rests") {
    const Horton law{kLawn, 0.5};
    Horton::State state = law.start();
    law.advance_at_capacity(state, 0.4);
    const double spent = law.capacity(state);
    law.rest(state, 3.0);
    CHECK_THAT(law.capacity(state), WithinRel(50.0 - (50.0 - spent) * std::exp(-1.5), 1e-14));
    const Horton still{kLawn, 0.0};
    Horton::State other = still.start();
    still.advance_at_capacity(other, 0.4);
    still.rest(other, 3.0);
    CHECK(still.capacity(other) == spent);
}

TEST_CASE("elapsed-time Horton spends capacity in the dry") {
    const HortonElapsed law{kLawn};
    HortonElapsed::State state = law.start();
    law.rest(state, 0.25);
    law.advance_below(state, 1.0, 0.25);
    CHECK(law.capacity(state) == horton_capacity(kLawn, 0.5));
    CHECK_THAT(law.advance_at_capacity(state, 0.5),
               WithinRel(horton_cumulative(kLawn, 1.0) - horton_cumulative(kLawn, 0.5), 1e-13));
    CHECK(law.time_at_capacity(law.start(), 50.0) == 0.0);
    CHECK_THAT(law.time_at_capacity(law.start(), 20.0),
               WithinRel(std::log(44.0 / 14.0) / 4.14, 1e-14));
}

}  // namespace rainledger
