#pragma once

#include <optional>
#include <string>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/gauge_record.hpp"

// Tipping-bucket logs from CSV text.
namespace rainledger {

/// Reads a log of tips of `layout.tip_mm`, as read_gauge_record, out of text without a byte-order
/// mark.
[[nodiscard]] std::optional<GaugeRecord> read_tip_log(const std::string& name, std::string text,
                                                      const RecordLayout& layout,
                                                      Diagnostics& diagnostics);

}  // namespace rainledger
