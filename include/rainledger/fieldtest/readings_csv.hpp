#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/fieldtest/readings.hpp"

// The CSV of readings of infiltration tests.
//
//   time [min],drop [mm]
//   5,12
//   10,8.5
//
// One header row naming the columns, each with its unit in square brackets; comma, semicolon or
// tab; `#` comment lines; decimal point, or decimal comma when the separator is not a comma; no
// quotes. `time` counts from the start of its pit's test, in a unit of time. Then one of
// `infiltrated`, `drop`, `water_level`, in a unit of depth, or `volume_added`, in a unit of
// volume. Optional: `pit`, the name of the pit, on every row; `refill`, with water levels: x or yes
// on a row that gives the level just after filling up, at the time of the row above. Other columns
// (notes, temperature) are passed over, unless their name looks like a slip for one of these.
namespace rainledger {

struct FieldReadings {
    ReadingKind kind = ReadingKind::infiltrated;
    std::string time_unit;   ///< as in the header
    std::string value_unit;  ///< as in the header
    std::vector<InfiltrationTest> tests;
};

/// Reads and reduces; nothing after an error. `name` stands in messages. Volumes need `rings`,
/// which must be sound (rings_problem).
[[nodiscard]] std::optional<FieldReadings> read_readings_csv(const std::string& name,
                                                             std::string text,
                                                             const std::optional<Rings>& rings,
                                                             Diagnostics& diagnostics);

}  // namespace rainledger
