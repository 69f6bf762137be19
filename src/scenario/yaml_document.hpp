#pragma once

#include <optional>

#include "scenario/yaml.hpp"

// From text to the one YAML document of a file.
namespace rainledger {

/// The document of the text; nothing, after reporting, where the text is no UTF-8 or no YAML, is
/// empty, or holds more than one document.
[[nodiscard]] std::optional<YAML::Node> read_document(const Reading& reading);

}  // namespace rainledger
