#pragma once

#include <span>

#include "rain/csv_text.hpp"
#include "rain/statistics_rows.hpp"
#include "rainledger/rain/rainfall_statistics.hpp"

// The durations, return periods and depths of one block of a file of rainfall statistics.
namespace rainledger {

/// Reads a block. `above` are the lines that may state the unit of its values. What is returned
/// stands only if nothing was reported.
[[nodiscard]] RainfallStatistics read_statistics_table(const StatisticsBlock& block,
                                                       std::span<const CsvLine> above,
                                                       CsvProblems& problems);

}  // namespace rainledger
