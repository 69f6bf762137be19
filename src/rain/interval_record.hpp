#pragma once

#include <optional>
#include <string>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/gauge_record.hpp"

// Interval data of a gauge: a hyetograph with the oddities of a record.
namespace rainledger {

/// Reads interval data, as read_gauge_record, out of text without a byte-order mark.
[[nodiscard]] std::optional<GaugeRecord> read_interval_record(const std::string& name,
                                                              std::string text,
                                                              const CsvLayout& layout,
                                                              Diagnostics& diagnostics);

}  // namespace rainledger
