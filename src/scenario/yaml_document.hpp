#pragma once

#include <optional>

#include "scenario/yaml.hpp"

// From text to the one YAML document of a scenario.
namespace rainledger {

inline constexpr const char* kScenarioExample =
    "a scenario starts with 'storm:' and 'surfaces:', each a map of its own";

/// The document of the text; nothing, after reporting, where the text is no YAML, is empty, or
/// holds more than one document.
[[nodiscard]] std::optional<YAML::Node> read_document(const Reading& reading);

}  // namespace rainledger
