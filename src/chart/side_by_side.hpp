#pragma once

#include <string_view>

#include "chart/chart_units.hpp"
#include "chart/drawing.hpp"
#include "chart/loss_view.hpp"

namespace rainledger {

/// Losses as panels of one scale, twelve at most: supply hanging from the top, excess standing on
/// the axis, and the infiltration rate as a line.
[[nodiscard]] Drawing side_by_side_drawing(std::string_view title, const ChosenLosses& losses,
                                           const ChartUnits& units);

}  // namespace rainledger
