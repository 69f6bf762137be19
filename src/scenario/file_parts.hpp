#pragma once

#include <string>

#include "rainledger/base/diagnostic.hpp"
#include "scenario/yaml.hpp"

// What the files of scenarios and of field tests have in common.
namespace rainledger {

/// Reports a scenario where a field test belongs, and the other way round: told by keys of the one
/// and none of the other. True where it did.
[[nodiscard]] bool refuse_other_kind(const Reading& reading, const YAML::Node& document);

/// The title; the file's name where there is none.
[[nodiscard]] std::string read_title(const ClosedMap& map);

/// Hands problems on in the order in which they stand in the file `name`; those of other files
/// follow, each once even where the file is named several times.
void hand_over(const Diagnostics& found, const std::string& name, Diagnostics& diagnostics);

}  // namespace rainledger
