#pragma once

#include <optional>
#include <span>

#include "rain/csv_text.hpp"
#include "rain/statistics_labels.hpp"
#include "rain/statistics_rows.hpp"

// The unit of the values of a table of rainfall statistics, which may stand in its header, in the
// lines above it, or in both.
namespace rainledger {

struct StatedUnit {
    std::optional<ValueUnit> unit;
    bool contradictory = false;  ///< then values cannot be compared
};

/// The unit of a block's values. None, wrong or contradictory units are errors.
[[nodiscard]] StatedUnit unit_of_values(std::span<const CsvLine> above,
                                        const StatisticsBlock& block, CsvProblems& problems);

}  // namespace rainledger
