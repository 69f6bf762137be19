#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/ledger/surface.hpp"
#include "rainledger/rain/hyetograph.hpp"

// A scenario: a site and the storms that fall on it, read from YAML.
namespace rainledger {

/// One storm of a scenario.
struct Storm {
    std::string name;  ///< "storm" when given under `storm:`
    Hyetograph rain;   ///< with multiply_by and continue_for applied
    double multiply_by = 1.0;
    double continued_h = 0.0;
    Place place;       ///< of its name, for messages that only the march can give
    std::string file;  ///< the rain's file as the scenario names it; empty for steps written out
};

/// Where a surface stands in the scenario's text, for messages that only the march can give.
struct SurfacePlaces {
    Place surface;          ///< its name
    Place observed_excess;  ///< of a phi index; line 0 elsewhere
};

struct Scenario {
    std::string title;
    std::vector<Storm> storms;  ///< at least one
    Site site;
    std::vector<SurfacePlaces> places;  ///< one per surface
};

/// Reads a scenario from a file; paths in it are relative to the file. Every problem found is added
/// to `diagnostics`; nothing is returned if any is an error.
[[nodiscard]] std::optional<Scenario> read_scenario(const std::string& path,
                                                    Diagnostics& diagnostics);

/// The same from text that is already in memory; `name` stands for the file in messages and gives
/// the folder for relative paths.
[[nodiscard]] std::optional<Scenario> read_scenario_text(const std::string& name, std::string text,
                                                         Diagnostics& diagnostics);

/// The JSON Schema (draft 2020-12) of the scenario YAML, as text ending in a newline.
[[nodiscard]] std::string scenario_schema();

}  // namespace rainledger
