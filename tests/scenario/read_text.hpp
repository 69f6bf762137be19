#pragma once

#include <optional>
#include <string>
#include <utility>

#include "rainledger/scenario/scenario.hpp"

// Scenarios read from text held in memory, with their problems as the user sees them.
namespace rainledger {

struct Outcome {
    std::optional<Scenario> scenario;
    std::string problems;  ///< every diagnostic, rendered
    std::size_t errors = 0;
};

inline Outcome read_text_of_test(std::string yaml) {
    Diagnostics diagnostics;
    Outcome outcome;
    outcome.scenario = read_scenario_text("lane.yaml", std::move(yaml), diagnostics);
    outcome.errors = diagnostics.error_count();
    for (const Diagnostic& diagnostic : diagnostics.list())
        outcome.problems += render(diagnostic);
    return outcome;
}

inline std::string problems(std::string yaml) {
    return read_text_of_test(std::move(yaml)).problems;
}

/// Six hours that rise to a peak: rain that gives no warnings of its own.
inline const std::string kQuietStorm =
    "storm: {steps: {every: 1 h, depths: [1, 2, 9, 2, 1, 1], unit: mm}}\n";

/// A scenario of one surface, `text` being the lines below its area (line 5 and on).
inline std::string with_surface(const std::string& text) {
    return kQuietStorm + "surfaces:\n  lawn:\n    area: 100 m2\n" + text;
}

/// A scenario whose losses are `law`, on line 5 from column 13 on.
inline std::string with_losses(const std::string& law) {
    return with_surface("    losses: " + law + "\n");
}

/// A scenario whose storm is `storm`, on line 1 from column 8 on.
inline std::string with_storm(const std::string& storm) {
    return "storm: " + storm + "\nsurfaces: {parking: {area: 100 m2, losses: impervious}}\n";
}

}  // namespace rainledger
