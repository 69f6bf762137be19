#pragma once

#include <string>
#include <string_view>

#include "chart/chart_units.hpp"
#include "chart/fit_view.hpp"

namespace rainledger {

/// A field test for a terminal: rates, cumulative depth and residuals with the best law's curve.
[[nodiscard]] std::string text_fit(std::string_view title, const FitView& view,
                                   const ChartUnits& units);

}  // namespace rainledger
