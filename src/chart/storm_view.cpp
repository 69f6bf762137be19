#include "chart/storm_view.hpp"

#include <cstddef>
#include <variant>

#include "chart/time_axis.hpp"
#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

template <class Value>
void keep_first(std::vector<Value>& values, std::size_t count) {
    values.erase(values.begin() + static_cast<std::ptrdiff_t>(count), values.end());
}

}  // namespace

Hyetograph own_rain(const Hyetograph& rain) {
    Hyetograph own = rain;
    const std::size_t steps = rain.own_steps;
    keep_first(own.depth_mm, steps);
    keep_first(own.duration_h, steps);
    keep_first(own.edges_h, steps + 1);
    if (own.stamps) {
        keep_first(own.stamps->unix_ms, steps + 1);
        keep_first(own.stamps->offset_minutes, steps + 1);
    }
    return own;
}

std::vector<double> intensities(const Hyetograph& rain) {
    std::vector<double> out;
    out.reserve(rain.steps());
    for (std::size_t step = 0; step < rain.steps(); ++step)
        out.push_back(rain.intensity_mm_per_h(step));
    return out;
}

std::string rain_words(const Hyetograph& own, const ChartUnits& units) {
    const std::vector<double> rates = intensities(own);
    std::size_t peak = 0;
    for (std::size_t step = 1; step < rates.size(); ++step)
        if (rates[step] > rates[peak]) peak = step;
    const std::string in_time = " in " + span_words(span_h(own));
    if (rates[peak] <= 0.0) return "no rain" + in_time;
    return units.depth_words(total_depth_mm(own)) + in_time + ", peak " +
           units.rate_words(rates[peak]) + " over " + span_words(own.duration_h[peak]);
}

std::string short_rain_words(const Hyetograph& own, const ChartUnits& units) {
    const double peak = peak_intensity_mm_per_h(own);
    if (peak <= 0.0) return "no rain";
    return units.depth_words(total_depth_mm(own)) + ", peak " + units.rate_words(peak);
}

std::string storm_words(const Storm& storm) {
    const bool is_named = storm.name != "storm";
    std::string name = is_named ? "storm " + storm.name : "";
    const auto* design = std::get_if<DesignOrigin>(&storm.origin);
    if (!is_named && design != nullptr && design->return_period_yr)
        name = "return period " + shortest(*design->return_period_yr) + " yr";
    if (storm.multiply_by == 1.0) return name;
    return joined(name, "rain multiplied by " + shortest(storm.multiply_by));
}

std::string joined(std::string_view first, std::string_view second) {
    std::string out(first);
    if (!first.empty() && !second.empty()) out += ", ";
    out += second;
    return out;
}

}  // namespace rainledger
