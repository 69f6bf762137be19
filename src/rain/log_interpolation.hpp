#pragma once

#include <algorithm>
#include <cmath>

// What looking up a table of depths shares.
namespace rainledger {

/// Two tabulated coordinates (durations, return periods) closer than this are the same one: a few
/// roundings of a unit conversion, far below any printed digit.
inline constexpr double kSameCoordinate = 1e-12;

[[nodiscard]] inline bool is_same_coordinate(double one, double other) {
    return std::fabs(one - other) <= kSameCoordinate * std::fmax(std::fabs(one), std::fabs(other));
}

/// Between two depths > 0, linear in log depth; `share` 0 gives `from`, 1 gives `to`. Held between
/// the two, which rounding alone could leave.
[[nodiscard]] inline double between_depths(double from, double to, double share) {
    const auto [low, high] = std::minmax(from, to);
    return std::clamp(from * std::pow(to / from, share), low, high);
}

}  // namespace rainledger
