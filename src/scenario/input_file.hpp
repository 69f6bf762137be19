#pragma once

#include <optional>
#include <string>

#include "scenario/yaml.hpp"

// Files that a scenario or a field test names.
namespace rainledger {

/// A file that another one names, with its content.
struct InputFile {
    std::string name;  ///< as named
    std::string path;  ///< as opened, and as messages show it: beside the other
    std::string text;
};

/// Reads the file that `entry` names. Nothing, after reporting, where it names none or the file
/// cannot be read; `example` shows how to name one.
[[nodiscard]] std::optional<InputFile> read_input_file(const Reading& reading, const Entry& entry,
                                                       const std::string& example);

}  // namespace rainledger
