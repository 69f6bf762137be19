#pragma once

#include <cstddef>
#include <optional>
#include <string>

#include "rainledger/rain/rain_events.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "scenario/depth_source_reader.hpp"
#include "scenario/yaml.hpp"

// Gauge records that a scenario names, and the storms in them.
namespace rainledger {

/// A record with how its events are told apart, and the table that says how rare they are.
struct ReadRecord {
    GaugeRecord record;  ///< its file as the scenario names it
    RecordSource source;
    std::optional<StatisticsFile> statistics;

    [[nodiscard]] const RainfallStatistics* table() const {
        return statistics ? &statistics->table : nullptr;
    }
};

/// The record by the keys that `record` and `from_record` share. Nothing where anything in `map`
/// was wrong, and reported: `errors_before` is the number of errors before the map was read.
[[nodiscard]] std::optional<ReadRecord> read_record(const ClosedMap& map,
                                                    std::size_t errors_before);

/// What is said of the rain before an event, and within it, that the record does not hold.
inline constexpr const char* kAntecedentUnknown =
    "the record begins less than 5 days before, so the rain of those 5 days is not known";
inline constexpr const char* kAntecedentHint =
    "what is stated is what fell in the part that the record holds";
inline constexpr const char* kNoDataHint = "the depth may be too small: compare a gauge nearby";

/// Reports a record without any event.
void refuse_no_event(const Reading& reading, const YAML::Mark& mark, const GaugeRecord& record);
/// Reports more than kMostEventSteps.
void refuse_steps(const ClosedMap& map, const std::string& what);

}  // namespace rainledger
