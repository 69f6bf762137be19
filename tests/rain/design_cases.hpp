#pragma once

#include <optional>
#include <random>
#include <utility>
#include <variant>

#include "rainledger/rain/design_storm.hpp"

// What the tests of design storms share.
namespace rainledger {

/// The 10-year formula of Denver: i = 96.6 / (t^0.97 + 13.90) in in/h and minutes (Chow, Maidment
/// and Mays, Applied Hydrology, 1988, table 14.2.3; from memory).
inline IntensityFormula denver() {
    return {96.6 * 25.4, 13.90, 0.97, 1.0, 1.0 / 60.0};
}

/// A formula whose depth rises ever more slowly with duration: m <= 1 and m n <= 1.
inline IntensityFormula random_formula(std::mt19937_64& random) {
    std::uniform_real_distribution<double> a(100.0, 3000.0);
    std::uniform_real_distribution<double> b(0.5, 30.0);
    std::uniform_real_distribution<double> m(0.3, 1.0);
    std::uniform_real_distribution<double> n(0.2, 1.0);
    return {a(random), b(random), m(random), n(random), 1.0 / 60.0};
}

inline DesignRequest request_of(StormPattern pattern, double duration_h, double every_h,
                                std::variant<double, DepthDuration> depth, double peak_at = 0.5) {
    return {pattern, duration_h, every_h, peak_at, std::move(depth), std::nullopt};
}

}  // namespace rainledger
