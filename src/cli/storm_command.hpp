#pragma once

#include "cli/storm_options.hpp"
#include "rainledger/cli/exit_status.hpp"

namespace rainledger {

/// Runs `rainledger storm`: a scenario's storms, a design storm from a table of statistics, or the
/// events of a gauge record; the summary and the files.
[[nodiscard]] ExitStatus run_storm(const StormOptions& options);

}  // namespace rainledger
