#pragma once

#include <string>
#include <vector>

#include "rainledger/ledger/surface.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "scenario/yaml.hpp"

// The surfaces of a scenario.
namespace rainledger {

/// A share of excess on its way to a surface that is known by name only.
struct NamedShare {
    std::string surface;
    YAML::Mark mark;
    double share = 1.0;
};

/// A surface as read, with the places that later messages need.
struct ReadSurface {
    Surface surface;
    SurfacePlaces places;
    Place law;
    std::vector<NamedShare> runs_onto;
};

/// The surfaces of the scenario's top level, their run-on resolved. Where they are not needed there
/// may be none.
[[nodiscard]] std::vector<ReadSurface> read_surfaces(const ClosedMap& scenario, Surfaces needed);

/// The value of `runs_onto`: a name, or a map of shares.
[[nodiscard]] std::vector<NamedShare> read_runs_onto(const Reading& reading, const Entry& entry);

/// Turns names into indices; unknown names, a surface running onto itself and loops are errors.
void resolve_run_on(const Reading& reading, std::vector<ReadSurface>& surfaces);

}  // namespace rainledger
