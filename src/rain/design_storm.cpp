#include "rainledger/rain/design_storm.hpp"

#include <array>
#include <cmath>
#include <utility>

#include "rain/alternating_blocks.hpp"
#include "rain/keifer_chu.hpp"
#include "rain/storm_shapes.hpp"
#include "rain/storm_steps.hpp"
#include "rainledger/rain/rain_windows.hpp"

namespace rainledger {
namespace {

constexpr double kSameRatio = 1e-9;  // relative: rounding of a quotient of two times

// Durations in h at which a formula's storm is held against it.
constexpr std::array<double, 10> kFormulaDurations_h{
    5.0 / 60.0, 10.0 / 60.0, 15.0 / 60.0, 30.0 / 60.0, 1.0, 2.0, 3.0, 6.0, 12.0, 24.0};

DesignStorm refused(std::string problem, std::string hint) {
    DesignStorm out;
    out.problem = std::move(problem);
    out.hint = std::move(hint);
    return out;
}

bool is_by_duration(StormPattern pattern) {
    return pattern == StormPattern::alternating_blocks || pattern == StormPattern::keifer_chu;
}

/// What stands in the way before any depth is looked up.
DesignStorm check_request(const DesignRequest& request) {
    if (has_peak(request.pattern) && !(request.peak_at >= 0.0 && request.peak_at <= 1.0))
        return refused("the peak must lie at a share of 0 to 1 of the duration",
                       "give one such as 0.375");
    if (request.pattern == StormPattern::mass_curve && !request.curve)
        return refused("a storm by a mass curve needs the curve",
                       "name one such as nrcs_II or huff_2, or give its points");
    const auto* total_mm = std::get_if<double>(&request.depth);
    if (total_mm == nullptr) return {};
    if (!(*total_mm > 0.0) || !std::isfinite(*total_mm))
        return refused("the depth of a design storm must be above zero", "give one such as 62 mm");
    if (request.pattern == StormPattern::alternating_blocks)
        return refused("alternating_blocks needs depths by duration, not one depth alone",
                       "give statistics with a return_period, depths, or a formula");
    if (request.pattern == StormPattern::keifer_chu)
        return refused("keifer_chu needs an intensity formula, not one depth alone",
                       "give a formula");
    return {};
}

/// The storm's total: the depth given, or the curve's at the duration.
DepthAnswer total_depth(const DesignRequest& request, const StormSteps& steps) {
    if (const auto* total_mm = std::get_if<double>(&request.depth)) return {*total_mm, {}, {}};
    return depth_of(std::get<DepthDuration>(request.depth), steps.duration_h());
}

/// Depths per step; for the patterns by duration the caller has made sure that there is a curve.
StormDepths depths_of_steps(const DesignRequest& request, const StormSteps& steps,
                            double total_mm) {
    switch (request.pattern) {
        case StormPattern::triangular:
            return {triangular_depths(total_mm, steps, request.peak_at), {}, {}, {}};
        case StormPattern::alternating_blocks:
            return alternating_blocks(std::get<DepthDuration>(request.depth), steps,
                                      request.peak_at);
        case StormPattern::keifer_chu:
            return keifer_chu(std::get<DepthDuration>(request.depth), steps, request.peak_at);
        case StormPattern::mass_curve:
            return {curve_depths(total_mm, steps, *request.curve), {}, {}, {}};
        case StormPattern::uniform:
            break;
    }
    return {uniform_depths(total_mm, steps), {}, {}, {}};
}

void warn_of_step(DesignStorm& storm, const DesignRequest& request, const StormSteps& steps) {
    const std::string step = "the step of " + duration_label(steps.every_h());
    if (steps.has_rest)
        storm.warnings.push_back(step + " does not divide the duration of " +
                                 duration_label(steps.duration_h()) + "; the last step is " +
                                 duration_label(steps.duration_h() - steps.edge_h(steps.whole)) +
                                 " long");
    const auto* curve = std::get_if<DepthDuration>(&request.depth);
    const auto* list = curve == nullptr ? nullptr : std::get_if<DepthList>(curve);
    if (list == nullptr || request.pattern == StormPattern::uniform) return;
    const double shortest_h = list->duration_h.front();
    if (steps.every_h() > shortest_h * (1.0 + kSameRatio))
        storm.warnings.push_back(step + " is longer than the shortest tabulated duration, " +
                                 duration_label(shortest_h) +
                                 ", whose intensity the storm cannot show");
}

/// Whether a duration is a whole number of steps within the storm.
bool is_window(double duration_h, const StormSteps& steps) {
    const double count = duration_h / steps.every_h();
    return count < static_cast<double>(steps.whole) + 0.5 &&
           std::abs(count - std::round(count)) <= kSameRatio * count;
}

std::vector<HeldStatistic> held_statistics(const DepthDuration& curve, const StormSteps& steps,
                                           const Hyetograph& rain) {
    const auto* list = std::get_if<DepthList>(&curve);
    const std::span<const double> durations = list == nullptr
                                                  ? std::span<const double>(kFormulaDurations_h)
                                                  : std::span<const double>(list->duration_h);
    const CumulativeDepth storm(rain);
    std::vector<HeldStatistic> held;
    for (const double duration_h : durations) {
        if (!is_window(duration_h, steps)) continue;
        const DepthAnswer statistic = depth_of(curve, duration_h);
        if (statistic.depth_mm)
            held.push_back({duration_h, *statistic.depth_mm, storm.largest_depth_mm(duration_h)});
    }
    return held;
}

}  // namespace

bool has_peak(StormPattern pattern) {
    return pattern == StormPattern::triangular || is_by_duration(pattern);
}

DesignStorm make_design_storm(const DesignRequest& request) {
    DesignStorm out = check_request(request);
    if (!out.problem.empty()) return out;
    StepsAnswer answer = make_storm_steps(request.duration_h, request.every_h);
    if (!answer.problem.empty()) return refused(std::move(answer.problem), std::move(answer.hint));
    StormSteps& steps = answer.steps;
    DepthAnswer total = total_depth(request, steps);
    if (!total.depth_mm) return refused(std::move(total.problem), std::move(total.hint));
    StormDepths depths = depths_of_steps(request, steps, *total.depth_mm);
    if (!depths.problem.empty()) return refused(std::move(depths.problem), std::move(depths.hint));

    out.depth_mm = *total.depth_mm;
    warn_of_step(out, request, steps);
    out.warnings.insert(out.warnings.end(), depths.warnings.begin(), depths.warnings.end());
    out.rain = make_hyetograph(steps.edge_min, "min", std::move(depths.depth_mm));
    if (request.pattern == StormPattern::alternating_blocks)
        out.held = held_statistics(std::get<DepthDuration>(request.depth), steps, *out.rain);
    return out;
}

}  // namespace rainledger
