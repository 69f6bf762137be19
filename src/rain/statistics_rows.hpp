#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "rain/csv_text.hpp"

// The rows of a file of rainfall statistics, and the blocks that they form: a row of return periods
// and the rows of durations beneath it.
namespace rainledger {

struct StatisticsCell {
    std::string text;
    std::size_t column = 1;  ///< in bytes, from 1
};

struct StatisticsRow {
    CsvLine line;
    std::vector<StatisticsCell> cells;  ///< without empty ones at the end
    std::optional<CsvCell> unsound;     ///< the first cell whose quotes are wrong; its place alone

    [[nodiscard]] std::string_view label() const {
        return cells.empty() ? std::string_view{} : std::string_view(cells.front().text);
    }
};

struct StatisticsBlock {
    std::string heading;  ///< the line above, if one stands there
    std::size_t heading_line = 0;
    StatisticsRow header;
    std::optional<StatisticsRow> units;  ///< a row of units alone, right below the header
    std::vector<StatisticsRow> rows;
    bool is_confidence_limit = false;
};

struct StatisticsLayout {
    std::vector<CsvLine> preamble;        ///< the lines above the first block
    std::vector<StatisticsBlock> blocks;  ///< empty where no header was found
    std::vector<StatisticsRow> strays;    ///< rows with numbers that belong to no block
};

/// Whether a cell names the column of durations: "duration", "Duration [min]", "(hours)".
[[nodiscard]] bool names_durations(std::string_view cell);

/// Whether a header is that of a single list, "duration [min],depth [mm]" or "min,mm": without
/// return periods.
[[nodiscard]] bool is_list_header(const StatisticsRow& header);

/// Finds the blocks among the lines of a file.
[[nodiscard]] StatisticsLayout find_statistics_blocks(std::span<const CsvLine> lines);

/// Whether a line alone is a duration with its unit and numbers behind it.
[[nodiscard]] bool is_row_of_depths(const CsvLine& line);

/// Whether a line alone is a header of a table turned round: two durations with their units or more
/// behind its first cell.
[[nodiscard]] bool is_row_of_durations(const CsvLine& line);

}  // namespace rainledger
