#pragma once

#include <cstdint>
#include <string>
#include <utility>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "report/sample.hpp"

// Hand-made storms with an origin, and a record with its events: only their form matters.
namespace rainledger::sample {

/// 2 mm, 12.5 mm and 6.5 mm in steps of 5 min, as blocks of a table.
inline Storm design_storm() {
    Storm storm = storm_of(make_hyetograph({0.0, 5.0, 10.0, 15.0}, "min", {2.0, 12.5, 6.5}));
    DesignOrigin origin;
    origin.pattern = StormPattern::alternating_blocks;
    origin.duration_h = 0.25;
    origin.every_h = 5.0 / 60.0;
    origin.peak_at = 0.5;
    origin.peak_at_assumed = true;
    origin.return_period_yr = 10.0;
    origin.depth_words = "county_rain.csv";
    origin.held = {{5.0 / 60.0, 12.5, 12.5}, {10.0 / 60.0, 19.0, 19.0}, {15.0 / 60.0, 21.0, 21.0}};
    storm.origin = std::move(origin);
    storm.file = "county_rain.csv";
    return storm;
}

/// About 14 years within 5 minutes, more than 100 within 10, less than 2 within 15.
inline EventRarity rarity() {
    EventRarity rarity;
    rarity.by_duration = {{5.0 / 60.0, 13.2, {14.2, {}, {}}},
                          {10.0 / 60.0, 29.0, {{}, 100.0, {}}},
                          {15.0 / 60.0, 12.0, {{}, {}, 2.0}}};
    rarity.rarest = 1;
    return rarity;
}

inline constexpr std::int64_t kHourMs = 3'600'000;

/// Two events of 14 June 2031 at UTC+2; the second lasts over midnight.
inline RecordEvents two_events() {
    constexpr std::int64_t kNoonMs = 1'939'197'600'000;  // 2031-06-14 10:00 UTC, 12:00 on the clock
    RainEvent first;
    first.number = 1;
    first.from_ms = kNoonMs;
    first.to_ms = kNoonMs + kHourMs;
    first.depth_mm = 9.0;
    first.peak_mm = {3.0, 5.0, 6.0, 8.0, 9.0, 9.0};
    first.antecedent_5_day_mm = 1.25;
    first.antecedent_known = false;
    RainEvent second = first;
    second.number = 2;
    second.from_ms = kNoonMs + 9 * kHourMs + kHourMs / 2;
    second.to_ms = second.from_ms + 5 * kHourMs + kHourMs / 4;
    second.depth_mm = 21.0;
    second.peak_mm = {2.0, 3.0, 4.0, 6.0, 7.0, 21.0};
    second.antecedent_5_day_mm = 10.25;
    second.antecedent_known = true;
    second.without_data_h = 0.5;
    return {{first, second}, 0.75};
}

inline GaugeRecord tip_record() {
    constexpr std::int64_t kFirstMs = 1'939'197'707'000;  // 2031-06-14 10:01:47 UTC
    TipLog tips;
    tips.tip_mm = 0.25;
    tips.unix_ms = {kFirstMs, kFirstMs + 20 * kHourMs};
    tips.offset_minutes = {120, 120};
    tips.has_offset = true;
    GaugeRecord record;
    record.rain = std::move(tips);
    record.notes.rows = 2;
    record.file = "logger.csv";
    return record;
}

inline Storm event_storm() {
    Storm storm = storm_of(two_stamped_steps());
    storm.name = "2026-03-04 23:50";
    storm.origin = EventOrigin{{}, two_events().events[1], 7, rarity()};
    storm.file = "logger.csv";
    return storm;
}

}  // namespace rainledger::sample
