#pragma once

#include "cli/losses_options.hpp"
#include "rainledger/cli/exit_status.hpp"

namespace rainledger {

/// Runs `rainledger losses`: reads the scenario, keeps the ledger of every storm, writes the
/// summary and the files.
[[nodiscard]] ExitStatus run_losses(const LossesOptions& options);

}  // namespace rainledger
