#pragma once

#include <optional>
#include <string>

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
    std::optional<std::string> rain_unit;    ///< "mm", "in", "mm/h", ...: replaces the bracket
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
[[nodiscard]] std::optional<Hyetograph> read_hyetograph_csv(const std::string& name,
                                                            std::string text,
                                                            const CsvLayout& layout,
                                                            Diagnostics& diagnostics);

/// True if `zone` is in the machine's time zone database.
[[nodiscard]] bool is_known_zone(const std::string& zone);

}  // namespace rainledger
