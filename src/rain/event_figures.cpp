#include "rain/event_figures.hpp"

#include <algorithm>
#include <cstdint>

#include "rain/rain_elements.hpp"
#include "rainledger/rain/rain_windows.hpp"

namespace rainledger {
namespace {

constexpr std::int64_t kFiveDays_ms = std::int64_t{120} * 3'600'000;

void set_peaks(RainEvent& event, const CumulativeDepth& rain) {
    for (std::size_t i = 0; i < kEventWindowsMinutes.size(); ++i)
        event.peak_mm[i] = rain.largest_depth_mm(kEventWindowsMinutes[i] / 60.0);
}

/// Hours of the steps from `first` to `end` that were taken as dry.
double without_data_h(const Hyetograph& rain, const ElementRun& steps) {
    double hours = 0.0;
    const auto begin = std::ranges::lower_bound(rain.dry_steps, steps.first);
    for (auto at = begin; at != rain.dry_steps.end() && *at < steps.end; ++at)
        hours += rain.duration_h[*at];
    return hours;
}

}  // namespace

RainEvent event_of_tips(const TipLog& log, const TipRange& range, const SteppedTips& stepped) {
    RainEvent event;
    event.from_ms = stepped.grid.edge_ms(stepped.first);
    event.to_ms = stepped.grid.edge_ms(stepped.end);
    event.first = range.first;
    event.end = range.end;
    for (std::size_t i = range.first; i < range.end; ++i)
        event.depth_mm += log.depth(i);
    CumulativeDepth cumulative(stepped.runs.size());
    for (const StepRun& run : stepped.runs) {
        const auto count = static_cast<double>(run.count);
        cumulative.add_step(count * static_cast<double>(stepped.grid.every_ms) / kMsPerHour,
                            count * run.depth_mm);
    }
    set_peaks(event, cumulative);
    return event;
}

RainEvent event_of_steps(const Hyetograph& rain, const ElementRun& steps) {
    RainEvent event;
    event.from_ms = edge_ms(rain, steps.first);
    event.to_ms = edge_ms(rain, steps.end);
    event.first = steps.first;
    event.end = steps.end;
    CumulativeDepth cumulative(steps.end - steps.first);
    for (std::size_t i = steps.first; i < steps.end; ++i) {
        event.depth_mm += rain.depth_mm[i];
        cumulative.add_step(rain.duration_h[i], rain.depth_mm[i]);
    }
    event.without_data_h = without_data_h(rain, steps);
    set_peaks(event, cumulative);
    return event;
}

void set_antecedent(RainEvent& event, const GaugeRecord& record, const RainBefore& before) {
    const std::int64_t from_ms = event.from_ms - kFiveDays_ms;
    event.antecedent_5_day_mm = before.between_mm(from_ms, event.from_ms);
    event.antecedent_known = span_of(record).from_ms <= from_ms;
}

}  // namespace rainledger
