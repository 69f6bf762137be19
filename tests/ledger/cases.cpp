#include "ledger/cases.hpp"

#include <cmath>
#include <cstddef>
#include <utility>

namespace rainledger::testing {

Hyetograph storm_of(double step_min, std::vector<double> depths_mm) {
    std::vector<double> edges;
    for (std::size_t i = 0; i <= depths_mm.size(); ++i)
        edges.push_back(step_min * static_cast<double>(i));
    return make_hyetograph(std::move(edges), "min", std::move(depths_mm));
}

Site site_of(Surface surface) {
    surface.area_m2 = surface.area_m2 > 0.0 ? surface.area_m2 : 1000.0;
    return {{std::move(surface)}};
}

double Cases::between(double low, double high) {
    return std::uniform_real_distribution<double>(low, high)(engine_);
}

bool Cases::one_in(int n) {
    return std::uniform_int_distribution<int>(1, n)(engine_) == 1;
}

Hyetograph Cases::storm() {
    const int steps = one_in(12) ? 1 : std::uniform_int_distribution<int>(4, 60)(engine_);
    const bool irregular = one_in(3);
    const double step_min = one_in(2) ? 5.0 : 15.0;
    std::vector<double> edges{one_in(4) ? 30.0 : 0.0};
    std::vector<double> depths;
    const double peak = between(2.0, 15.0) * step_min / 5.0;
    const double first = between(0.1, 0.5) * steps;
    const double second = between(0.6, 0.9) * steps;
    for (int i = 0; i < steps; ++i) {
        const double dt = irregular ? step_min * between(0.2, 3.0) : step_min;
        edges.push_back(edges.back() + dt);
        const double a = (i - first) / 3.0;
        const double b = (i - second) / 2.0;
        double depth = peak * (std::exp(-a * a) + 0.7 * std::exp(-b * b)) * dt / step_min;
        if (one_in(4) || depth < 0.05) depth = 0.0;
        depths.push_back(depth);
    }
    return make_hyetograph(std::move(edges), "min", std::move(depths));
}

Losses Cases::losses(int kind) {
    const double fc = one_in(6) ? 0.0 : between(0.5, 25.0);
    const HortonCurve curve{one_in(8) ? fc : fc + between(1.0, 150.0), fc,
                            one_in(8) ? 0.0 : between(0.3, 12.0)};
    switch (kind) {
        case 0:
            return Horton{curve, one_in(2) ? 0.0 : between(0.01, 2.0)};
        case 1:
            return HortonElapsed{curve};
        case 2:
            return GreenAmpt{one_in(8) ? 0.0 : between(0.3, 30.0),
                             one_in(8) ? 0.0 : between(1.0, 120.0)};
        case 3: {
            GreenAmpt law{between(1.0, 30.0), between(1.0, 80.0)};
            law.storage_limit_mm = between(2.0, 40.0);
            law.barrier_rate_mm_per_h = one_in(2) ? 0.0 : between(0.0, 60.0);
            return law;
        }
        case 4:
            return Philip{one_in(8) ? 0.0 : between(1.0, 40.0),
                          one_in(8) ? 0.0 : between(0.5, 15.0)};
        case 5:
            return ConstantRate{between(0.0, 30.0), one_in(2) ? 0.0 : between(0.5, 15.0)};
        case 6:
            return Impervious{};
        default:
            return CurveNumber{one_in(8) ? 100.0 : between(40.0, 99.0)};
    }
}

Surface Cases::infiltrating_surface() {
    Surface out;
    out.name = "plot";
    out.area_m2 = between(50.0, 5000.0);
    out.interception_mm = one_in(2) ? 0.0 : between(0.2, 3.0);
    out.depression_storage_mm = one_in(3) ? 0.0 : between(0.5, 8.0);
    out.ponded_water = one_in(4) ? PondedWater::held : PondedWater::infiltrates;
    out.losses = losses(std::uniform_int_distribution<int>(0, 6)(engine_));
    return out;
}

Surface Cases::surface() {
    if (!one_in(8)) return infiltrating_surface();
    Surface out;
    out.name = "plot";
    out.area_m2 = between(50.0, 5000.0);
    out.losses = losses(7);
    return out;
}

}  // namespace rainledger::testing
