#include "rain/storm_shapes.hpp"

#include <algorithm>

namespace rainledger {
namespace {

/// Depths from the share of the total that has fallen by a share of the duration.
template <class Share>
std::vector<double> by_share(double total_mm, const StormSteps& steps, const Share& share) {
    std::vector<double> out;
    out.reserve(steps.count());
    double before = 0.0;
    for (std::size_t edge = 1; edge <= steps.count(); ++edge) {
        // Never less than before: rounding alone could make a step next to nothing negative.
        const double end = std::max(before, share(steps.edge_min[edge] / steps.edge_min.back()));
        out.push_back(total_mm * (end - before));
        before = end;
    }
    return out;
}

}  // namespace

std::vector<double> uniform_depths(double total_mm, const StormSteps& steps) {
    const double whole_share = steps.edge_min[1] / steps.edge_min.back();
    std::vector<double> out(steps.whole, total_mm * whole_share);
    if (steps.has_rest)
        out.push_back(total_mm * (1.0 - steps.edge_min[steps.whole] / steps.edge_min.back()));
    return out;
}

std::vector<double> triangular_depths(double total_mm, const StormSteps& steps, double peak_at) {
    return by_share(total_mm, steps, [peak_at](double time) {
        if (time <= peak_at) return time * (time / peak_at);
        return 1.0 - (1.0 - time) * ((1.0 - time) / (1.0 - peak_at));
    });
}

std::vector<double> curve_depths(double total_mm, const StormSteps& steps, const MassCurve& curve) {
    return by_share(total_mm, steps, [&curve](double time) { return curve.depth_at(time); });
}

}  // namespace rainledger
