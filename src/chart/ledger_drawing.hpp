#pragma once

#include <string_view>

#include "chart/chart_units.hpp"
#include "chart/drawing.hpp"
#include "chart/loss_view.hpp"

namespace rainledger {

/// The ledger of one surface under one storm, three strips on one time axis: supply hanging from
/// the top; what becomes of it, as rates, with the capacity; and the accounts as they come
/// together.
[[nodiscard]] Drawing ledger_drawing(std::string_view title, const ChosenLosses& losses,
                                     const ChartUnits& units);

}  // namespace rainledger
