#pragma once

#include <optional>

#include "rain/csv_header.hpp"
#include "rain/csv_text.hpp"
#include "rainledger/rain/gauge_record.hpp"

// The header row of a log of tips.
namespace rainledger {

/// Finds the columns of times (`start` of the columns) and, if there is one, of counts (`rain`);
/// nothing after an error.
[[nodiscard]] std::optional<CsvColumns> read_tip_header(const CsvLine& line,
                                                        const RecordLayout& layout,
                                                        CsvProblems& problems);

}  // namespace rainledger
