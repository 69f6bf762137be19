#pragma once

#include <cmath>
#include <limits>

// Finding the instant of an event inside a stretch of time.
namespace rainledger {

/// A depth and the rate at which it changes.
struct DepthAndRate {
    double depth_mm = 0.0;
    double rate_mm_per_h = 0.0;
};

/// The instant in (0, until) at which `depth_at` (h -> DepthAndRate), monotone there, passes zero;
/// it has opposite signs at the two ends. Newton's method inside a shrinking bracket, with
/// bisection wherever a step leaves it or fails to halve the last. Stops when the depth is zero, or
/// the bracket or the step is down to a rounding of the instant; the cap of 200 covers bisection
/// alone from any bracket of doubles wider than that.
template <class DepthAt>
double find_instant(const DepthAt& depth_at, double until) {
    const bool falls = depth_at(until).depth_mm < 0.0;
    double low = 0.0;
    double high = until;
    double at = until;
    double last_step = until;
    for (int i = 0; i < 200; ++i) {
        const DepthAndRate now = depth_at(at);
        if (now.depth_mm == 0.0) return at;
        const bool before = (now.depth_mm > 0.0) == falls;
        (before ? low : high) = at;
        double next = at - now.depth_mm / now.rate_mm_per_h;
        if (!(next > low && next < high) || std::abs(next - at) > 0.5 * last_step)
            next = 0.5 * (low + high);
        last_step = std::abs(next - at);
        at = next;
        if (last_step <= 2.0 * std::numeric_limits<double>::epsilon() * at) return at;
    }
    return at;
}

}  // namespace rainledger
