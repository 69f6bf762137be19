#include <algorithm>
#include <cstddef>

#include <boost/math/special_functions/lambert_w.hpp>
#include <boost/multiprecision/cpp_bin_float.hpp>

#include "ledger/cases.hpp"
#include "test.hpp"

// Whole random storms against a stepper of its own kind: 50 digits, capacity and depth through the
// Lambert W function of Boost.Math, ponding by Chu's case distinction (1978, Water Resour. Res.
// 14), excess leaving at once.
namespace rainledger {
namespace {

using Wide = boost::multiprecision::cpp_bin_float_50;

struct WideGreenAmpt {
    Wide K, S;

    [[nodiscard]] bool is_above(const Wide& F, const Wide& w) const { return K * (F + S) > w * F; }
    [[nodiscard]] Wide depth_at(const Wide& w) const {
        if (w <= K) return 1e30;
        return K * S / (w - K);
    }
    /// F after dt at capacity from F0: the time on the curve is shifted so that F0 is at zero.
    [[nodiscard]] Wide grown(const Wide& F0, const Wide& dt) const {
        const Wide t0 = (F0 - S * log(1 + F0 / S)) / K;
        const Wide argument = -exp(-1 - K * (t0 + dt) / S);
        return S * (-1 - boost::math::lambert_wm1(argument));
    }
};

struct WideHorton {
    Wide f0, fc, k;

    [[nodiscard]] Wide time_at(const Wide& F) const {
        const Wide c = fc / k;
        const Wide a = (f0 - fc) / k;
        return ((F - a) / c + boost::math::lambert_w0(a / c * exp((a - F) / c))) / k;
    }
    [[nodiscard]] Wide cumulative(const Wide& t) const {
        return fc * t + (f0 - fc) / k * (1 - exp(-k * t));
    }
    [[nodiscard]] bool is_above(const Wide& F, const Wide& w) const {
        return fc + (f0 - fc) * exp(-k * time_at(F)) > w;
    }
    [[nodiscard]] Wide depth_at(const Wide& w) const {
        if (w <= fc) return Wide(1e30);
        if (w >= f0) return Wide(0);
        return cumulative(log((f0 - fc) / (w - fc)) / k);
    }
    [[nodiscard]] Wide grown(const Wide& F0, const Wide& dt) const {
        return cumulative(time_at(F0) + dt);
    }
};

/// F at the end of a step of supply w over dt, without storage.
template <class Law>
Wide after_step(const Law& law, const Wide& F, const Wide& w, const Wide& dt) {
    if (w > 0 && !law.is_above(F, w)) return law.grown(F, dt);
    const Wide ponds_at = law.depth_at(w);
    if (F + w * dt <= ponds_at) return F + w * dt;
    return law.grown(ponds_at, dt - (ponds_at - F) / w);
}

template <class Wider, class Law>
void compare(const Wider& wide, const Law& law, const Hyetograph& rain) {
    Surface surface;
    surface.name = "plot";
    surface.losses = law;
    const SurfaceLedger ledger = keep_ledger(testing::site_of(surface), rain).surfaces.front();
    Wide F = 0;
    for (std::size_t i = 0; i < rain.steps(); ++i) {
        const Wide dt = Wide(rain.duration_h[i]);
        const Wide next = after_step(wide, F, Wide(rain.depth_mm[i]) / dt, dt);
        const auto step = static_cast<double>(next - F);
        F = next;
        INFO("step " << i + 1);
        CHECK_THAT(ledger.rows[i].accounts.infiltrated_mm, WithinAbs(step, 1e-11));
        CHECK_THAT(ledger.rows[i].accounts.excess_mm, WithinAbs(rain.depth_mm[i] - step, 1e-11));
    }
    CHECK_THAT(ledger.total.infiltrated_mm, WithinAbs(static_cast<double>(F), 1e-10));
}

}  // namespace

TEST_CASE("random storms under Green-Ampt agree with Lambert W at 50 digits") {
    const unsigned seed = 20260303;
    testing::Cases cases(seed);
    for (int i = 0; i < 40; ++i) {
        const Hyetograph rain = cases.storm();
        const GreenAmpt law{cases.between(0.5, 25.0), cases.between(2.0, 120.0)};
        INFO("seed " << seed << " case " << i);
        compare(WideGreenAmpt{law.conductivity_mm_per_h, law.suction_deficit_mm}, law, rain);
    }
}

TEST_CASE("random storms under Horton agree with Lambert W at 50 digits") {
    const unsigned seed = 20260304;
    testing::Cases cases(seed);
    for (int i = 0; i < 40; ++i) {
        const Hyetograph rain = cases.storm();
        const double fc = cases.between(1.0, 20.0);
        const HortonCurve curve{fc + cases.between(5.0, 120.0), fc, cases.between(0.5, 8.0)};
        INFO("seed " << seed << " case " << i);
        compare(WideHorton{curve.initial_capacity_mm_per_h, fc, curve.decay_per_h},
                Horton{curve, 0.0}, rain);
    }
}

}  // namespace rainledger
