#pragma once

#include <string_view>

#include "chart/chart_units.hpp"
#include "chart/drawing.hpp"
#include "chart/fit_view.hpp"

namespace rainledger {

/// A field test on a page: rates, cumulative depth and residuals, one above the other.
[[nodiscard]] Drawing fit_drawing(std::string_view title, const FitView& view,
                                  const ChartUnits& units);

}  // namespace rainledger
