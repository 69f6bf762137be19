#pragma once

#include "cli/fit_options.hpp"
#include "rainledger/cli/exit_status.hpp"

namespace rainledger {

/// Runs `rainledger fit`: the laws fitted to a field test, the summary and the files.
[[nodiscard]] ExitStatus run_fit(const FitOptions& options);

}  // namespace rainledger
