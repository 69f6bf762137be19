#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

// Depth of rain by duration for one return period: a list of tabulated depths, or an intensity
// formula.
namespace rainledger {

/// Depths by duration. At least one; durations > 0 and rising, depths > 0 and not falling.
struct DepthList {
    std::vector<double> duration_h;
    std::vector<double> depth_mm;
};

/// i = a / (t^m + b)^n, t in `time_unit_h` hours (1/60 for minutes): the forms with n = 1
/// (Wenzel 1982, in Chow, Maidment and Mays, Applied Hydrology, 1988, eq. 14.2.3) and m = 1 are the
/// common ones. a > 0, m > 0, n > 0; t^m + b > 0 over the durations asked for.
struct IntensityFormula {
    double a_mm_per_h = 0.0;
    double b = 0.0;
    double m = 1.0;
    double n = 1.0;
    double time_unit_h = 1.0 / 60.0;
};

using DepthDuration = std::variant<DepthList, IntensityFormula>;

/// A depth, or what stands in its way.
struct DepthAnswer {
    std::optional<double> depth_mm;
    std::string problem;  ///< empty when there is a depth
    std::string hint;
};

/// The depth of `duration_h` > 0. In a list log depth is linear in log duration between the listed
/// ones; a tabulated duration (within 1e-12 of itself) gives its depth to the last bit; outside the
/// list there is no answer. A formula answers wherever it is positive and its depth does not fall
/// with duration.
[[nodiscard]] DepthAnswer depth_of(const DepthDuration& rain, double duration_h);

/// Intensity in mm/h of a formula at `duration_h` >= 0; NaN where t^m + b <= 0.
[[nodiscard]] double intensity_mm_per_h(const IntensityFormula& formula, double duration_h);

/// The durations in h over which the depth i t of a formula does not fall: where
/// t^m + b >= m n t^m. With b >= 0 that is from 0 up to a limit, infinite for m n <= 1. With b < 0
/// the depth falls from its pole on: until a limit for m n < 1, after which it rises for ever, and
/// for ever otherwise (`until` is then 0).
[[nodiscard]] double depth_rises_from_h(const IntensityFormula& formula);
[[nodiscard]] double depth_rises_until_h(const IntensityFormula& formula);

/// "30 min", "2 h", "1 h 30 min", "24 h", "2 d": a duration as statistics tables name it, to six
/// figures; whole days only from two days on.
[[nodiscard]] std::string duration_label(double hours);

}  // namespace rainledger
