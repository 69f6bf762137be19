#pragma once

#include <span>
#include <string>

#include "rainledger/rain/rainfall_statistics.hpp"
#include "rainledger/report/storm_summary.hpp"
#include "rainledger/scenario/scenario.hpp"

// The same for programs: JSON in mm, h and yr, numbers as the shortest text that parses back to the
// same double, what does not exist as null. Ends in a newline. Each is an object with `title`,
// `program` ({name, version}), `warnings` and `caution`, and between them what is told below.
namespace rainledger {

/// `storms`, by name:
/// - `rain`: as in the JSON of losses. Beside depth_mm, duration_h, peak_intensity_mm_per_h, steps,
///   starts, starts_h, file, multiply_by, continued_h, taken_as_dry_h and clock_assumed it holds,
///   each only where it applies,
///   - `design`: pattern, duration_h, every_h, peak_at, peak_at_assumed, return_period_yr,
///     depth_from, curve, held: [{duration_h, statistic_mm, storm_mm}];
///   - `event`: number and events_in_record (null for rain between two instants), depth_mm,
///     peaks_mm ({"5": ..., "1440": ...}, by minutes), antecedent_5_day_mm, antecedent_known,
///     without_data_h, rarity;
///   - `resampled`: every_h, peak_before_mm_per_h, peak_after_mm_per_h;
/// - `peaks`, by minutes: {"5": {depth_mm, intensity_mm_per_h}, ..., "60": ...};
/// - `steps`: [{start_h, end_h, depth_mm}], the storm's own, with `start` in ISO 8601 where it has
///   stamps.
///
/// A `rarity` is null without statistics, else {by_duration: [{duration_h, depth_mm,
/// return_period_yr, more_than_yr, less_than_yr}], rarest_duration_h}.
[[nodiscard]] std::string storm_json(const Scenario& scenario,
                                     std::span<const std::string> warnings);

/// `statistics`: duration_h and return_period_yr (empty for a list without any) as lists, depth_mm
/// as a list of rows by duration, set_aside; `formulas`: [{return_period_yr, fits: [{free ("m" or
/// "n"), a_mm_per_h, b, m, n, time_unit_h, residual, rms_log_residual, problem}]}], the better fit
/// first; a fit that failed has its `problem` alone.
[[nodiscard]] std::string statistics_json(const std::string& title,
                                          const RainfallStatistics& statistics,
                                          std::span<const ColumnFit> fits,
                                          std::span<const std::string> warnings);

/// `record`: file, kind ("tips" or "intervals"), tip_mm, depth_mm, starts, ends, taken_as_dry_h,
/// clock_assumed, notes (as RecordNotes); `rule`: dry_spell_h, threshold_mm; `events`, by time:
/// [{number, starts, ends, duration_h, depth_mm, peaks_mm, antecedent_5_day_mm, antecedent_known,
/// without_data_h, rarity}]; `outside_mm`. Without stamps starts and ends are null, and starts_h
/// and ends_h stand beside them.
[[nodiscard]] std::string events_json(const std::string& title, const GaugeRecord& record,
                                      const EventRule& rule, const RecordEvents& events,
                                      std::span<const EventRarity> rarities,
                                      std::span<const std::string> warnings);

}  // namespace rainledger
