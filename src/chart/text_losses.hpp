#pragma once

#include <string>
#include <string_view>

#include "chart/chart_units.hpp"
#include "chart/loss_view.hpp"

namespace rainledger {

/// Losses for a terminal, in block characters: one surface's ledger, or a pair of rows for each of
/// several.
[[nodiscard]] std::string text_losses(std::string_view title, const ChosenLosses& losses,
                                      const ChartUnits& units);

}  // namespace rainledger
