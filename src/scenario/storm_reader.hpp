#pragma once

#include <optional>
#include <string>
#include <vector>

#include "rainledger/scenario/scenario.hpp"
#include "scenario/yaml.hpp"

// The storms of a scenario: hyetograph files and steps written out.
namespace rainledger {

/// The storms under `storm` or `storms` of the scenario's top level. Where something in one was
/// wrong, and reported, its rain may be empty.
[[nodiscard]] std::vector<Storm> read_storms(const ClosedMap& scenario);

/// The rain of `steps: {...}`.
[[nodiscard]] std::optional<Hyetograph> read_steps(const Reading& reading, const Entry& entry);

/// The rain of `hyetograph: ...`; `file_name` is set to the file as named.
[[nodiscard]] std::optional<Hyetograph> read_hyetograph(const Reading& reading, const Entry& entry,
                                                        std::string& file_name);

}  // namespace rainledger
