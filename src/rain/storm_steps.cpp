#include "rain/storm_steps.hpp"

#include <cmath>
#include <utility>

#include "rain/log_interpolation.hpp"

namespace rainledger {
namespace {

constexpr double kMsPerHour = 3.6e6;
constexpr double kMsPerMinute = 6e4;
constexpr double kShortest_h = 1.0 / kMsPerHour;  // as a hyetograph's CSV takes it
constexpr double kMostSteps = 1e6;
constexpr double kSameRatio = 1e-9;  // relative: rounding of a quotient of two times

StepsAnswer refused(std::string problem, std::string hint) {
    return {{}, std::move(problem), std::move(hint)};
}

/// Why there cannot be such steps; without a problem where there can.
StepsAnswer check_range(double duration_h, double every_h) {
    if (!(duration_h > 0.0) || !std::isfinite(duration_h))
        return refused("the duration of a design storm must be above zero", "give one such as 2 h");
    if (!(every_h >= kShortest_h * (1.0 - kSameRatio)) || !std::isfinite(every_h))
        return refused("the step of a design storm must be at least a thousandth of a second",
                       "give one such as 5 min");
    if (every_h > duration_h * (1.0 + kSameRatio))
        return refused("the step of " + duration_label(every_h) + " is longer than the storm of " +
                           duration_label(duration_h),
                       "give a step that divides the duration");
    if (duration_h / every_h > kMostSteps * (1.0 + kSameRatio))
        return refused("a storm of " + duration_label(duration_h) +
                           " has more than a million steps of " + duration_label(every_h),
                       "give a longer step");
    return {};
}

}  // namespace

double clean_ms(double hours) {
    const double ms = hours * kMsPerHour;
    return is_same_coordinate(ms, std::round(ms)) ? std::round(ms) : ms;
}

StepsAnswer make_storm_steps(double duration_h, double every_h) {
    StepsAnswer out = check_range(duration_h, every_h);
    if (!out.problem.empty()) return out;
    StormSteps& steps = out.steps;
    const double ratio = duration_h / every_h;
    steps.has_rest = std::abs(ratio - std::round(ratio)) > kSameRatio * ratio;
    steps.whole = static_cast<std::size_t>(steps.has_rest ? std::floor(ratio) : std::round(ratio));
    const double every_ms = clean_ms(every_h);
    steps.edge_min.reserve(steps.whole + 2);
    const std::size_t before_end = steps.has_rest ? steps.whole : steps.whole - 1;
    for (std::size_t edge = 0; edge <= before_end; ++edge)
        steps.edge_min.push_back(static_cast<double>(edge) * every_ms / kMsPerMinute);
    steps.edge_min.push_back(clean_ms(duration_h) / kMsPerMinute);
    return out;
}

}  // namespace rainledger
