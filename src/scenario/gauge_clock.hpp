#pragma once

#include <cstdint>
#include <optional>
#include <string>

#include "rainledger/rain/gauge_record.hpp"
#include "rainledger/rain/rain_events.hpp"
#include "rainledger/rain/timestamp.hpp"

// The clock of a rain gauge: instants of its record as people read and write them.
namespace rainledger {

/// Whether the record has stamps, and not elapsed times.
[[nodiscard]] bool is_stamped(const GaugeRecord& record);

/// Whether its stamps are instants of known UTC offset.
[[nodiscard]] bool has_offset(const GaugeRecord& record);

/// An instant of the record on the gauge's clock, "2031-06-14 13:45", with seconds where there are
/// any; hours in a record of elapsed times, "13.75 h".
[[nodiscard]] std::string clock_text(const GaugeRecord& record, std::int64_t instant_ms);

/// The start of an event in the same way. The clock is that of its first tip, which may have been
/// set since the rain before.
[[nodiscard]] std::string start_text(const GaugeRecord& record, const RainEvent& event);

/// The instant at which the gauge's clock read `reading`: by the reading's own offset, else in
/// `zone`, else by the offset that the record has there. Nothing for a time that the zone skips.
/// The record is stamped, and the reading has no offset where the record has none.
[[nodiscard]] std::optional<std::int64_t> instant_of(const GaugeRecord& record,
                                                     const ClockReading& reading,
                                                     const std::optional<std::string>& zone);

/// Depth in mm of a stamped record's rain after one instant and up to another.
[[nodiscard]] double depth_between(const GaugeRecord& record, std::int64_t from_ms,
                                   std::int64_t to_ms);

}  // namespace rainledger
