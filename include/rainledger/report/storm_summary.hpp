#pragma once

#include <optional>
#include <span>
#include <string>
#include <vector>

#include "rainledger/rain/formula_fit.hpp"
#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"
#include "rainledger/report/summary.hpp"
#include "rainledger/scenario/scenario.hpp"

// What people read about rain: storms, tables of statistics, events of a record. Plain text, a line
// ending in every line, the caution at the end.
namespace rainledger {

/// The storms of a scenario, or of a scenario made around one storm: where each comes from, its
/// depth, duration and steps, peak depth and intensity for 5, 10, 15, 30 and 60 minutes, what an
/// alternating-block storm holds of its statistics, an event's antecedent rain and rarity.
[[nodiscard]] std::string storm_summary(const Scenario& scenario, const SummaryOptions& options);

/// The fits of one column of a table: its return period, empty for the only column of a list.
struct ColumnFit {
    std::optional<double> return_period_yr;
    DepthList list;
    std::vector<FitAnswer> fits;  ///< one per form tried, best first
};

/// A table of statistics as depths, and the formulas fitted to it with their residuals and as lines
/// to put into a scenario.
[[nodiscard]] std::string statistics_summary(const std::string& title,
                                             const RainfallStatistics& statistics,
                                             std::span<const ColumnFit> fits,
                                             const SummaryOptions& options);

/// The order of a list of events.
enum class EventOrder { time, depth, peak_5, peak_15, peak_30, peak_60, rarity };

/// The events of a record: start, end, depth, peaks, the five days before; with statistics the
/// return period and duration at which each was rarest. `rarities` is empty or one per event.
[[nodiscard]] std::string events_summary(const std::string& title, const GaugeRecord& record,
                                         const EventRule& rule, const RecordEvents& events,
                                         std::span<const EventRarity> rarities, EventOrder order,
                                         const SummaryOptions& options);

}  // namespace rainledger
