#pragma once

#include "rain/storm_steps.hpp"

// Alternating blocks (Chow, Maidment and Mays, Applied Hydrology, 1988, section 14.4).
namespace rainledger {

/// The blocks of a curve of depths by duration in order of time, as make_design_storm tells.
[[nodiscard]] StormDepths alternating_blocks(const DepthDuration& curve, const StormSteps& steps,
                                             double peak_at);

}  // namespace rainledger
