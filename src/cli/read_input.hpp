#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "rainledger/base/diagnostic.hpp"

// An input file of a command, and whether it is YAML or a table.
namespace rainledger {

/// The text of a file; nothing after adding to `diagnostics`.
[[nodiscard]] std::optional<std::string> read_file(const std::string& path,
                                                   Diagnostics& diagnostics);

/// A letter of the alphabet as a small one; other characters as they are.
[[nodiscard]] constexpr char lower(char c) {
    return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
}

/// Whether a file is called .yaml or .yml, whatever the case.
[[nodiscard]] bool has_yaml_ending(const std::string& path);

/// Whether text begins with a key and its colon, or a marker of YAML: no row of a CSV file begins
/// so.
[[nodiscard]] bool begins_as_yaml(std::string_view text);

/// The first line that says something: neither blank nor a comment.
[[nodiscard]] std::string_view first_line(std::string_view text);

}  // namespace rainledger
