#pragma once

#include <string>

#include "scenario/yaml.hpp"

// Names that the scenario gives to things.
namespace rainledger {

/// Whether the key of `entry` can be the name of a thing ("surface"): reports when it cannot.
[[nodiscard]] bool is_name(const Reading& reading, const Entry& entry, const std::string& thing);

}  // namespace rainledger
