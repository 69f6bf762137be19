#pragma once

#include <span>
#include <vector>

#include "chart/drawing.hpp"
#include "chart/loss_view.hpp"

namespace rainledger {

/// Rain, and run-on below it, as columns that hang from the top of a panel at the scale `down`.
[[nodiscard]] Panel supply_strip(const Box& box, const Axis& time, const Axis& down,
                                 const std::vector<DrawnStep>& drawn,
                                 std::span<const StepRates> rates);

/// Excess on top of what stays of the supply: everything in a step from the axis up.
[[nodiscard]] double kept(const StepRates& rate);

/// The largest supply of any step.
[[nodiscard]] double peak_supply(std::span<const StepRates> rates);

}  // namespace rainledger
