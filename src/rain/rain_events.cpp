#include "rainledger/rain/rain_events.hpp"

#include <variant>

#include "rain/dry_spells.hpp"
#include "rain/event_figures.hpp"
#include "rain/rain_before.hpp"
#include "rain/rain_elements.hpp"
#include "rain/tip_steps.hpp"

namespace rainledger {
namespace {

RecordEvents find_in(const TipLog& log, const EventRule& rule, const EventSteps& steps) {
    const EventRuns found = event_runs(TipElements(log), rule);
    RecordEvents events;
    events.outside_mm = found.outside_mm;
    events.events.reserve(found.runs.size());
    for (const ElementRun& run : found.runs) {
        const TipRange range{run.first, run.end, {}};
        const StepGrid grid = grid_at(log, run.first, steps);
        const SteppedTips stepped = step_tips(log, range, grid, rule, steps.spread_tips);
        events.events.push_back(event_of_tips(log, range, stepped));
    }
    return events;
}

RecordEvents find_in(const Hyetograph& rain, const EventRule& rule, const EventSteps& /*steps*/) {
    const WetSteps wet(rain);
    const EventRuns found = event_runs(wet, rule);
    RecordEvents events;
    events.outside_mm = found.outside_mm;
    events.events.reserve(found.runs.size());
    for (const ElementRun& run : found.runs)
        events.events.push_back(
            event_of_steps(rain, {wet.step(run.first), wet.step(run.end - 1) + 1}));
    return events;
}

}  // namespace

RecordEvents find_events(const GaugeRecord& record, const EventRule& rule,
                         const EventSteps& steps) {
    RecordEvents events =
        std::visit([&](const auto& rain) { return find_in(rain, rule, steps); }, record.rain);
    const RainBefore before(record);
    for (std::size_t i = 0; i < events.events.size(); ++i) {
        events.events[i].number = i + 1;
        set_antecedent(events.events[i], record, before);
    }
    return events;
}

}  // namespace rainledger
