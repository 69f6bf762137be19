#pragma once

#include "cli/lookup_options.hpp"
#include "rainledger/cli/exit_status.hpp"

namespace rainledger {

/// Looks up and shows, or lists the topics.
[[nodiscard]] ExitStatus run_lookup(const LookupOptions& options);

}  // namespace rainledger
