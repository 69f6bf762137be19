#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/depth_duration.hpp"

// Rainfall statistics: depths by duration and return period, read from CSV and looked up between
// what is tabulated.
namespace rainledger {

/// Depths by duration and return period. At least one duration; durations and return periods rise,
/// return periods >= 1 yr; depths > 0, not falling with either. A single list of depths by duration
/// that names no return period has none (`return_period_yr` is empty) and one depth per duration.
struct RainfallStatistics {
    std::vector<double> duration_h;
    std::vector<double> return_period_yr;
    std::vector<double> depth_mm;        ///< by duration, within it by return period
    std::vector<std::string> set_aside;  ///< what the file holds besides and was not used, in words

    /// Columns of depths: the return periods, or 1 for a list without any.
    [[nodiscard]] std::size_t columns() const {
        return return_period_yr.empty() ? 1 : return_period_yr.size();
    }
    [[nodiscard]] double at(std::size_t duration, std::size_t column) const {
        return depth_mm[duration * columns() + column];
    }
};

/// Reads a table of statistics. Every problem is added to `diagnostics` with its line and column
/// (twenty listed, the rest counted); nothing is returned if any was an error.
///
/// The plain form: a header row whose first cell names the durations, with their unit
/// (`duration [min]`) or without where each row has it, and whose other cells name return periods
/// (`10`, `10 yr`, `10-year`), rising, from 1 yr on; then a row per duration, rising (`5`, `5 min`,
/// `60-min`, `24-hr`, `2 d`). The values are depths or intensities; their unit stands in a bracket
/// of the header (`10 yr [mm]`) or in a line above it (`depth [mm]`, `intensity [in/h]`). A table
/// without return periods has two columns, `duration [min],depth [mm]`.
///
/// The form in which agencies publish: lines of text above, one of which states the unit in words
/// or brackets (inches, mm/h, inches per hour); a row of return periods behind a label; rows
/// labelled by durations. Further blocks, or those headed as upper or lower confidence limits, and
/// lines of text below are left aside; `set_aside` says which blocks. Cells are separated by
/// commas, semicolons or tabs; decimals by a point, or by a comma where none separates cells.
///
/// Errors are: no row of return periods, no unit, two units, a unit of depth where the text speaks
/// of intensity or the other way round, a cell that is empty or no number above zero, a row too
/// short or too long, durations or return periods that do not rise, and depths that fall with
/// duration or with return period (at the cell, with both values).
[[nodiscard]] std::optional<RainfallStatistics> read_rainfall_statistics_csv(
    const std::string& name, std::string text, Diagnostics& diagnostics);

/// Whether CSV text looks like a table of rainfall statistics rather than rain: by its first rows.
[[nodiscard]] bool looks_like_statistics(const std::string& text);

/// The depths of one return period as a list by duration, or what stands in the way. Between
/// tabulated return periods log depth is linear in the Gumbel reduced variate -ln(-ln(1 - 1/T));
/// a tabulated one (within 1e-12 of itself) gives its column to the last bit; a 1-year column is
/// used as it stands and never interpolated to or from; outside the table there is no answer. The
/// return period must be left out for a list without return periods, and may be for a table with
/// one column.
struct ListAnswer {
    std::optional<DepthList> list;
    std::string problem;  ///< empty when there is a list
    std::string hint;
};
[[nodiscard]] ListAnswer depths_of(const RainfallStatistics& statistics,
                                   std::optional<double> return_period_yr);

/// -ln(-ln(1 - 1/T)), T > 1 (Gumbel 1958, Statistics of Extremes).
[[nodiscard]] double gumbel_variate(double return_period_yr);

/// How rare a depth is: the return period that the table gives it, the exact inverse of
/// `depths_of`. A depth that several neighbouring columns share has the longest of their periods.
struct Rarity {
    /// The return period, where the depth lies within the table: from its first column's depth to
    /// its last one's, but not between a 1-year column and the next.
    std::optional<double> years;
    /// Where `years` is empty: the longest tabulated period whose depth it exceeds, if any ...
    std::optional<double> more_than;
    /// ... and the shortest tabulated period whose depth it does not reach, if any. Between a
    /// 1-year column and the next both stand.
    std::optional<double> less_than;
};
/// Nothing where the duration lies outside the table, the table has no return periods, or the depth
/// is no finite number >= 0.
[[nodiscard]] std::optional<Rarity> rarity_of(const RainfallStatistics& statistics,
                                              double duration_h, double depth_mm);

}  // namespace rainledger
