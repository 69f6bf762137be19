#pragma once

#include <span>
#include <string>

#include "rainledger/cli/exit_status.hpp"

namespace rainledger {

/// Runs the program with the words after its name.
[[nodiscard]] ExitStatus run_program(std::span<const std::string> words);

}  // namespace rainledger
