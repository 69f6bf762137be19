#pragma once

#include <vector>

#include "rain/storm_steps.hpp"

// Shapes that spread a total depth over a design storm's steps; depths in mm.
namespace rainledger {

[[nodiscard]] std::vector<double> uniform_depths(double total_mm, const StormSteps& steps);
[[nodiscard]] std::vector<double> triangular_depths(double total_mm, const StormSteps& steps,
                                                    double peak_at);
[[nodiscard]] std::vector<double> curve_depths(double total_mm, const StormSteps& steps,
                                               const MassCurve& curve);

}  // namespace rainledger
