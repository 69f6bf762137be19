#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "chart/chart_units.hpp"
#include "chart/drawn_steps.hpp"
#include "rainledger/scenario/scenario.hpp"

// A storm's rain, ready to be drawn, in words or in ink.
namespace rainledger {

/// The storm's own steps alone, without the dry time appended to them.
[[nodiscard]] Hyetograph own_rain(const Hyetograph& rain);

/// Intensity of every step, mm/h.
[[nodiscard]] std::vector<double> intensities(const Hyetograph& rain);

/// "48.0 mm in 2 h, peak 150.0 mm/h over 5 min"; "no rain in 2 h".
[[nodiscard]] std::string rain_words(const Hyetograph& own, const ChartUnits& units);

/// The same for a narrow place: "48.0 mm, peak 150.0 mm/h".
[[nodiscard]] std::string short_rain_words(const Hyetograph& own, const ChartUnits& units);

/// "storm 25 years": the storm's name where it has one of its own, else the return period of a
/// design storm; and the factor on its rain; may be empty.
[[nodiscard]] std::string storm_words(const Storm& storm);

/// Two phrases with ", " between them where both say something.
[[nodiscard]] std::string joined(std::string_view first, std::string_view second);

}  // namespace rainledger
