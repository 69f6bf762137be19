#pragma once

#include <cmath>
#include <cstddef>
#include <cstdint>
#include <utility>
#include <vector>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"

namespace rainledger {

/// A log of 0.2 mm tips at given minutes since 2031-06-14T00:00Z.
inline GaugeRecord log_at(const std::vector<double>& minutes) {
    TipLog log;
    log.tip_mm = 0.2;
    log.has_offset = true;
    for (const double minute : minutes) {
        log.unix_ms.push_back(1'939'161'600'000 + std::llround(minute * 60'000.0));
        log.offset_minutes.push_back(0);
    }
    GaugeRecord record;
    record.rain = std::move(log);
    return record;
}

inline double minute_of(std::int64_t ms) {
    return static_cast<double>(ms - 1'939'161'600'000) / 60'000.0;
}

/// First and end of each event's tips or steps.
using Ranges = std::vector<std::pair<std::size_t, std::size_t>>;
inline Ranges ranges_of(const RecordEvents& found) {
    Ranges ranges;
    for (const RainEvent& event : found.events)
        ranges.emplace_back(event.first, event.end);
    return ranges;
}

}  // namespace rainledger
