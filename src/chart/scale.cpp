#include "chart/scale.hpp"

#include <algorithm>
#include <cmath>
#include <cstddef>
#include <limits>

#include "rainledger/base/number.hpp"

namespace rainledger {

double round_step(double least) {
    const double power = std::pow(10.0, std::floor(std::log10(least)));
    for (const double factor : {1.0, 2.0, 5.0})
        if (factor * power >= least * (1.0 - 1e-9)) return factor * power;
    return 10.0 * power;
}

std::vector<Tick> ticks_of(double step, std::size_t intervals) {
    constexpr int kMostDecimals = 9;
    const int decimals =
        std::clamp(static_cast<int>(std::ceil(-std::log10(step) - 1e-9)), 0, kMostDecimals);
    std::vector<Tick> ticks;
    for (std::size_t i = 0; i <= intervals; ++i) {
        const double at = step * static_cast<double>(i);
        ticks.push_back({at, fixed(at, decimals)});
    }
    return ticks;
}

double measurable(double most) {
    constexpr double kLeast = 1e-9;
    constexpr double kMost = 1e12;
    return most > 0.0 ? std::clamp(most, kLeast, kMost) : 1.0;
}

std::vector<Tick> round_ticks(double given, int wanted) {
    const double most = measurable(given);
    const double coarse = round_step(most / wanted);
    double step = coarse;
    double farthest = std::numeric_limits<double>::infinity();
    for (const double tried : {coarse, round_step(coarse * 0.4)}) {
        const double off = std::abs(std::ceil(most / tried - 1e-9) - wanted);
        if (off < farthest) step = tried;
        farthest = std::min(farthest, off);
    }
    return ticks_to(most, step);
}

std::vector<Tick> ticks_to(double most, double step) {
    const double intervals = std::max(1.0, std::ceil(most / step - 1e-9));
    return ticks_of(step, static_cast<std::size_t>(intervals));
}

Axis stepped_axis(double most, double step) {
    constexpr double kHeadroom = 1.05;
    Axis axis{0.0, most * kHeadroom, ticks_to(most * kHeadroom, step), true};
    if (axis.ticks.back().at > axis.to && axis.ticks.size() > 2) axis.ticks.pop_back();
    axis.to = std::max(axis.to, axis.ticks.back().at);
    return axis;
}

Axis scale_axis(double most, int wanted) {
    return stepped_axis(measurable(most), round_ticks(most, wanted)[1].at);
}

Axis matching_axis(double most, const Axis& axis) {
    const double intervals = axis.to / axis.ticks[1].at;  // need not be whole
    const double step = round_step(measurable(most) / intervals);
    return {0.0, step * intervals, ticks_of(step, axis.ticks.size() - 1), true};
}

}  // namespace rainledger
