#pragma once

#include <cstddef>
#include <span>
#include <string>
#include <string_view>

#include "cli/arguments.hpp"

// Pieces that the help pages share.
namespace rainledger {

inline constexpr std::string_view kExitStatuses = R"(
Exit status:
  0    done
  2    the command line is wrong
  3    an input is wrong
  4    a file could not be read or written, or a chart not drawn
  5    a fault of the program itself
  130  interrupted
)";

/// The options of a table, their texts from `column` on.
[[nodiscard]] std::string option_lines(std::span<const OptionRow> rows, std::size_t column);

/// The line about -h and --help.
[[nodiscard]] std::string help_line(std::size_t column);

}  // namespace rainledger
