#pragma once

#include <span>
#include <string>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// The summary that people read: plain text, a line ending in every line.
namespace rainledger {

/// The units of what people read.
enum class DisplayUnits {
    metric,  ///< mm, mm/h, m2 or ha, m3, L/s
    inches,  ///< in, in/h, ac, ft3, ft3/s
};

struct SummaryOptions {
    DisplayUnits units = DisplayUnits::metric;
};

/// The summary of a scenario. `ledgers` holds one ledger per storm of the scenario, in its order,
/// every phi index matched. Depths are printed to 0.1 mm or 0.01 in, times to the minute, flows and
/// volumes to three figures. Control characters in names are shown as '?'.
[[nodiscard]] std::string summary(const Scenario& scenario, std::span<const SiteLedger> ledgers,
                                  const SummaryOptions& options = {});

}  // namespace rainledger
