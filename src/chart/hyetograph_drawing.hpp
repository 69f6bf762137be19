#pragma once

#include "chart/chart_units.hpp"
#include "chart/drawing.hpp"
#include "rainledger/scenario/scenario.hpp"

namespace rainledger {

/// The hyetographs of a scenario's storms, their own steps: one across the page, several as panels
/// of one scale (twelve at most).
[[nodiscard]] Drawing hyetograph_drawing(const Scenario& scenario, const ChartUnits& units);

}  // namespace rainledger
