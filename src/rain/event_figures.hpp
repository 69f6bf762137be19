#pragma once

#include <cstddef>

#include "rain/dry_spells.hpp"
#include "rain/rain_before.hpp"
#include "rain/tip_steps.hpp"
#include "rainledger/rain/rain_events.hpp"

// The figures of an event.
namespace rainledger {

/// The event of tips `range.first` to `range.end` as `stepped`; without its antecedent rain.
[[nodiscard]] RainEvent event_of_tips(const TipLog& log, const TipRange& range,
                                      const SteppedTips& stepped);

/// The event of steps `steps.first` to `steps.end` of interval data, likewise.
[[nodiscard]] RainEvent event_of_steps(const Hyetograph& rain, const ElementRun& steps);

/// Sets an event's antecedent rain.
void set_antecedent(RainEvent& event, const GaugeRecord& record, const RainBefore& before);

}  // namespace rainledger
