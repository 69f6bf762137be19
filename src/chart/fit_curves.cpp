#include <algorithm>
#include <cmath>
#include <limits>

#include "chart/fit_view.hpp"

namespace rainledger {
namespace {

/// Straight between the two points around a time; the ends' values beyond them.
double between(std::span<const CurvePoint> curve, double time_h, double CurvePoint::*value) {
    const auto after = std::ranges::upper_bound(curve, time_h, {}, &CurvePoint::time_h);
    if (after == curve.begin()) return curve.front().*value;
    if (after == curve.end()) return curve.back().*value;
    const CurvePoint& from = *(after - 1);
    const CurvePoint& to = *after;
    const double share = (time_h - from.time_h) / (to.time_h - from.time_h);
    if (share == 0.0) return from.*value;
    return from.*value + share * (to.*value - from.*value);
}

}  // namespace

double curve_depth_mm(std::span<const CurvePoint> curve, double time_h) {
    return between(curve, time_h, &CurvePoint::depth_mm);
}

double curve_rate_mm_per_h(std::span<const CurvePoint> curve, double time_h) {
    const double rate = between(curve, time_h, &CurvePoint::rate_mm_per_h);
    return std::isfinite(rate) ? rate : std::numeric_limits<double>::infinity();
}

}  // namespace rainledger
