#pragma once

#include <string>

#include "cli/arguments.hpp"

// The help pages: a short one of a screen for -h, a long one for --help.
namespace rainledger {

[[nodiscard]] std::string program_help(HelpWanted page);
[[nodiscard]] std::string losses_help(HelpWanted page);
[[nodiscard]] std::string storm_help(HelpWanted page);
[[nodiscard]] std::string fit_help(HelpWanted page);
[[nodiscard]] std::string lookup_help(HelpWanted page);
[[nodiscard]] std::string schema_help(HelpWanted page);

}  // namespace rainledger
