#pragma once

#include <string>

#include "chart/chart_units.hpp"
#include "rainledger/scenario/scenario.hpp"

namespace rainledger {

/// The hyetographs of a scenario's storms for a terminal, in block characters.
[[nodiscard]] std::string text_hyetograph(const Scenario& scenario, const ChartUnits& units);

}  // namespace rainledger
