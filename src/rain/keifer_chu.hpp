#pragma once

#include "rain/storm_steps.hpp"

// Keifer and Chu's storm (Synthetic storm pattern for drainage design, Journal of the Hydraulics
// Division, ASCE, 83(HY4), 1957).
namespace rainledger {

/// The instantaneous curve of a formula, integrated over each step.
[[nodiscard]] StormDepths keifer_chu(const DepthDuration& curve, const StormSteps& steps,
                                     double peak_at);

}  // namespace rainledger
