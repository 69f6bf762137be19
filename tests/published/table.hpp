#pragma once

#include <string>

#include "published/check_file.hpp"

// The tables of docs/validation.md, in Markdown.
namespace rainledger::published {

/// One file of checks: a heading, a row per check with printed and own figures, and the reasons of
/// those that do not reproduce.
[[nodiscard]] std::string table_of(const CheckFile& file);

/// How many checks and values there are, and how many reproduce, by status.
[[nodiscard]] std::string summary_of_all();

}  // namespace rainledger::published
