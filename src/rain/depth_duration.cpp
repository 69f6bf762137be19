#include "rainledger/rain/depth_duration.hpp"

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <cstddef>
#include <limits>
#include <string>
#include <utility>

#include "rain/log_interpolation.hpp"
#include "rainledger/base/number.hpp"

// Symbols of the formula follow Chow, Maidment and Mays, Applied Hydrology, 1988, eq. 14.2.3, with
// a further exponent n: i = a / (t^m + b)^n.
namespace rainledger {
namespace {

constexpr double kInfinity = std::numeric_limits<double>::infinity();

DepthAnswer refused(std::string problem, std::string hint = {}) {
    return {std::nullopt, std::move(problem), std::move(hint)};
}

std::string range_of(const DepthList& list) {
    const std::string first = duration_label(list.duration_h.front());
    if (list.duration_h.size() == 1) return "the one depth known here is that of " + first;
    return "the depths known here go from " + first + " to " +
           duration_label(list.duration_h.back());
}

DepthAnswer outside(const DepthList& list, double duration_h) {
    const bool shorter = duration_h < list.duration_h.front();
    const std::string way_out =
        shorter ? "a step no shorter than " + duration_label(list.duration_h.front())
                : "a duration of no more than " + duration_label(list.duration_h.back());
    return refused("there is no depth for " + duration_label(duration_h) + ": " + range_of(list),
                   "choose " + way_out +
                       ", add the depth to the table, or use a formula fitted to it, as "
                       "'rainledger storm TABLE --fit-formula' prints");
}

DepthAnswer depth_in(const DepthList& list, double duration_h) {
    const auto& t = list.duration_h;
    for (std::size_t i = 0; i < t.size(); ++i)
        if (is_same_coordinate(t[i], duration_h)) return {list.depth_mm[i], {}, {}};
    if (duration_h < t.front() || duration_h > t.back()) return outside(list, duration_h);
    const auto above = std::upper_bound(t.begin(), t.end(), duration_h);
    const auto i = static_cast<std::size_t>(above - t.begin());
    const double share = std::log(duration_h / t[i - 1]) / std::log(t[i] / t[i - 1]);
    return {between_depths(list.depth_mm[i - 1], list.depth_mm[i], share), {}, {}};
}

/// t of the formula, in its own unit.
double own_time(const IntensityFormula& formula, double duration_h) {
    return duration_h / formula.time_unit_h;
}

/// The duration at which t^m reaches `power`.
double duration_of_power_h(const IntensityFormula& formula, double power) {
    return std::pow(power, 1.0 / formula.m) * formula.time_unit_h;
}

bool is_sound(const IntensityFormula& formula) {
    const auto positive = [](double x) { return x > 0.0 && std::isfinite(x); };
    return positive(formula.a_mm_per_h) && positive(formula.m) && positive(formula.n) &&
           positive(formula.time_unit_h) && std::isfinite(formula.b);
}

DepthAnswer falling(const IntensityFormula& formula, double duration_h) {
    const double from = depth_rises_from_h(formula);
    const double until = depth_rises_until_h(formula);
    const std::string problem =
        "the formula's depth falls with duration at " + duration_label(duration_h);
    if (until == 0.0) return refused(problem + ", as it does everywhere", "check its constants");
    if (duration_h < from)
        return refused(problem + "; it rises from " + duration_label(from) + " on",
                       "choose a longer step, or check the formula's constants");
    return refused(problem + "; it rises up to " + duration_label(until),
                   "choose a shorter duration, or check the formula's constants");
}

DepthAnswer depth_in(const IntensityFormula& formula, double duration_h) {
    if (!is_sound(formula))
        return refused("the formula i = a / (t^m + b)^n needs a, m and n above zero");
    const double intensity = intensity_mm_per_h(formula, duration_h);
    if (std::isnan(intensity))
        return refused("the formula gives no intensity at " + duration_label(duration_h) +
                           ": t^m + b is not above zero there",
                       "choose a longer step, or check b = " + shortest(formula.b));
    if (duration_h < depth_rises_from_h(formula) || duration_h > depth_rises_until_h(formula))
        return falling(formula, duration_h);
    const double depth_mm = intensity * duration_h;
    if (!(depth_mm > 0.0) || !std::isfinite(depth_mm))
        return refused("the formula gives no usable depth at " + duration_label(duration_h),
                       "check its constants and the unit of its time");
    return {depth_mm, {}, {}};
}

/// `value` to six significant figures.
std::string six_figures(double value) {
    std::array<char, 32> text{};
    const auto end =
        std::to_chars(text.data(), text.data() + text.size(), value, std::chars_format::general, 6);
    return {text.data(), end.ptr};
}

/// `value` is a whole number but for the roundings of a conversion.
bool is_whole(double value) {
    return is_same_coordinate(value, std::round(value));
}

}  // namespace

DepthAnswer depth_of(const DepthDuration& rain, double duration_h) {
    if (!(duration_h > 0.0) || !std::isfinite(duration_h))
        return refused("a depth needs a duration above zero");
    return std::visit([&](const auto& known) { return depth_in(known, duration_h); }, rain);
}

double intensity_mm_per_h(const IntensityFormula& formula, double duration_h) {
    const double inside = std::pow(own_time(formula, duration_h), formula.m) + formula.b;
    if (!(inside > 0.0)) return std::numeric_limits<double>::quiet_NaN();
    return formula.a_mm_per_h / std::pow(inside, formula.n);
}

double depth_rises_from_h(const IntensityFormula& formula) {
    const double excess = formula.m * formula.n - 1.0;
    if (formula.b >= 0.0 || excess >= 0.0) return 0.0;
    return duration_of_power_h(formula, formula.b / excess);
}

double depth_rises_until_h(const IntensityFormula& formula) {
    const double excess = formula.m * formula.n - 1.0;
    if (excess < 0.0 || (excess == 0.0 && formula.b >= 0.0)) return kInfinity;
    return formula.b > 0.0 ? duration_of_power_h(formula, formula.b / excess) : 0.0;
}

std::string duration_label(double hours) {
    const double minutes = hours * 60.0;
    if (hours >= 48.0 && is_whole(hours / 24.0)) return six_figures(hours / 24.0) + " d";
    if (is_whole(hours) || (hours > 1.0 && !is_whole(minutes))) return six_figures(hours) + " h";
    if (minutes < 1.0) return six_figures(hours * 3600.0) + " s";
    if (hours < 1.0) return six_figures(minutes) + " min";
    const double whole_hours = std::floor(hours);
    return six_figures(whole_hours) + " h " + six_figures(minutes - 60.0 * whole_hours) + " min";
}

}  // namespace rainledger
