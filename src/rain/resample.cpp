#include <algorithm>
#include <cmath>
#include <cstdint>
#include <span>
#include <utility>

#include "rain/storm_steps.hpp"
#include "rainledger/base/quantity.hpp"
#include "rainledger/rain/rain_events.hpp"

namespace rainledger {
namespace {

constexpr double kSameEdge_h = 1e-9;
constexpr double kMsPerHour = 3.6e6;

/// Own steps alone: what continues a storm is not resampled.
std::size_t steps_needed(const Hyetograph& rain, double every_h) {
    const double whole = std::ceil((own_duration_h(rain) - kSameEdge_h) / every_h);
    return static_cast<std::size_t>(std::max(whole, 1.0));
}

StampedEdges stamps_every(const Hyetograph& rain, double every_h, std::size_t count) {
    const StampedEdges& old = *rain.stamps;
    StampedEdges edges;
    edges.has_offset = old.has_offset;
    std::size_t at = 0;
    for (std::size_t k = 0; k <= count; ++k) {
        const std::int64_t ms =
            old.unix_ms.front() + std::llround(static_cast<double>(k) * every_h * kMsPerHour);
        while (at < rain.own_steps && old.unix_ms[at + 1] <= ms)
            ++at;
        edges.unix_ms.push_back(ms);
        edges.offset_minutes.push_back(old.offset_minutes[at]);
    }
    return edges;
}

/// The new steps without rain yet.
Hyetograph empty_steps(const Hyetograph& rain, double every_h) {
    const std::size_t count = steps_needed(rain, every_h);
    std::vector<double> depth_mm(count, 0.0);
    if (rain.stamps)
        return make_hyetograph(stamps_every(rain, every_h, count), std::move(depth_mm));
    const std::string unit_name = rain.given ? rain.given->unit : "h";
    const Unit unit = find_unit(unit_name, Dimension::time).value_or(Unit{});
    const double first = rain.given ? rain.given->value.front() : rain.edges_h.front();
    // Whole milliseconds are added up before they are brought to the unit: no sum of rounded hours.
    const double every_ms = clean_ms(every_h);
    std::vector<double> edges;
    edges.reserve(count + 1);
    for (std::size_t k = 0; k <= count; ++k)
        edges.push_back(first + static_cast<double>(k) * every_ms * unit.divide /
                                    (unit.multiply * kMsPerHour));
    return make_hyetograph(std::move(edges), unit_name, std::move(depth_mm));
}

/// Puts the parts of the old steps, cut at the new edges, into the new steps.
void fill(const Hyetograph& rain, Hyetograph& steps) {
    const CutHyetograph cut =
        cut_hyetograph(rain, std::span(steps.edges_h).subspan(1, steps.steps() - 1));
    std::vector<bool> known(steps.steps(), false);
    auto dry = rain.dry_steps.begin();
    std::size_t step = 0;
    for (std::size_t i = 0; i < cut.rain.own_steps; ++i) {
        while (step + 1 < steps.steps() &&
               cut.rain.edges_h[i] >= steps.edges_h[step + 1] - kSameEdge_h)
            ++step;
        steps.depth_mm[step] += cut.rain.depth_mm[i];
        while (dry != rain.dry_steps.end() && *dry < cut.step_of[i])
            ++dry;
        if (dry == rain.dry_steps.end() || *dry != cut.step_of[i]) known[step] = true;
    }
    for (std::size_t k = 0; k < known.size(); ++k)
        if (!known[k]) steps.dry_steps.push_back(k);
}

}  // namespace

ResampledRain resample(const Hyetograph& rain, double every_h) {
    ResampledRain resampled;
    resampled.rain = empty_steps(rain, every_h);
    fill(rain, resampled.rain);
    resampled.rain.clock_assumed = rain.clock_assumed;
    resampled.rain.taken_as_dry_h = rain.taken_as_dry_h;
    resampled.peak_before_mm_per_h = peak_intensity_mm_per_h(rain);
    resampled.peak_after_mm_per_h = peak_intensity_mm_per_h(resampled.rain);
    return resampled;
}

}  // namespace rainledger
