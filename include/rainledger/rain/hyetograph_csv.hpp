#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/rain/hyetograph.hpp"

// Hyetographs from CSV text: one header row naming the columns with their units in square brackets;
// elapsed times or ISO 8601 timestamps; depth, intensity or cumulative rain.
namespace rainledger {

/// What a rain column holds.
enum class RainKind { depth, intensity, cumulative };
/// Which edge of its step a row's time marks.
enum class StampMeaning { start, end };

/// What the scenario says about a CSV file; everything is optional.
struct CsvLayout {
    std::optional<std::string> time_column;  ///< header of the time column, in full
    std::optional<std::string> rain_column;  ///< header of the rain column, in full
    std::optional<std::string> rain_unit;    ///< "mm", "in", "mm/h", ...: replaces the bracket of a
                                             ///< column named by rain_column, else may only fill it
    std::optional<std::string> time_unit;    ///< "s", "min", "h": replaces the bracket
    std::optional<RainKind> kind;
    std::optional<StampMeaning>
        stamp;                        ///< meaning of a column called `time` or named by time_column
    std::optional<double> every_h;    ///< how long each row covers; what lies between is a hole
    std::optional<std::string> zone;  ///< IANA name, "Europe/Madrid"
    std::optional<std::string> missing;  ///< text that marks a missing value, "-999"
    bool gaps_are_dry = false;
};

/// Reads a hyetograph. Every problem is added to `diagnostics` with its line and column; after
/// twenty errors the rest are counted, not listed. Nothing is returned if any was an error.
///
/// Text: UTF-8 with or without a byte-order mark; lines end in LF or CRLF; blank lines, rows of
/// nothing but empty cells and lines that begin with `#` say nothing. The header row decides the
/// separator: tab, else semicolon, else comma. Cells may be padded with blanks and may stand in
/// quotes, within their line. Decimal commas are read where the separator is none, but not mixed
/// with decimal points.
///
/// Columns are found by name, whatever the case: `start`, `end`, both, or `time`; and `depth`,
/// `intensity` or `cumulative`, each with its unit in square brackets; timestamps have none. A name
/// in the layout matches a whole header cell, or what stands before its bracket. Others are
/// ignored.
///
/// With one time column and no `every_h` the steps are contiguous. `end` begins at 0, with
/// timestamps as long before the first as the second is after it; `start` repeats its last
/// interval. A step over three times the median length is a warning. Otherwise each row covers its
/// own time, and holes may lie between; times within 1e-9 h are the same.
///
/// A cumulative reading stands at the end of its row's step and counts from 0; a first row at
/// elapsed time 0 of `end` times is a baseline instead. Where readings are missing or holes lie
/// between, those steps are dry and what fell meanwhile falls in the step of the next reading, so
/// that nothing is lost. With timestamps a first reading above 0 is a warning, since nothing says
/// that the counter stood at 0 when the storm began.
///
/// Errors too: a step shorter than 1 ms, and a time, depth or intensity above 1e12 h, mm or mm/h.
/// A warning too: a step made longer or shorter than the one beside it by a change of UTC offset.
///
/// An empty cell, NA, NaN and the stated mark are missing values. Zones: see Zone::instant.
[[nodiscard]] std::optional<Hyetograph> read_hyetograph_csv(const std::string& name,
                                                            std::string text,
                                                            const CsvLayout& layout,
                                                            Diagnostics& diagnostics);

/// The line of CSV text that read_hyetograph_csv takes for its header, from 1; 0 where there is
/// none.
[[nodiscard]] std::size_t header_line(std::string_view text);

/// True if `zone` is in the machine's time zone database. Never throws.
[[nodiscard]] bool is_known_zone(const std::string& zone);

}  // namespace rainledger
