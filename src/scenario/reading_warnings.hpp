#pragma once

#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "scenario/storm_reader.hpp"
#include "scenario/surface_reader.hpp"

// Warnings that need the whole of a valid scenario: what its storms and surfaces mean together.
namespace rainledger {

/// Adds the warnings to `diagnostics`. Storms and surfaces are valid.
void warn_about_scenario(const std::vector<Storm>& storms, const std::vector<ReadSurface>& surfaces,
                         Diagnostics& diagnostics);

}  // namespace rainledger
