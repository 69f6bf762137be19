#pragma once

#include <span>
#include <string>

#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

namespace rainledger {

/// Everything but the steps, as JSON for programs: always mm, h, m2, m3 and L/s, numbers as the
/// shortest text that parses back to the same double, a value that does not exist as null. Ends in
/// a newline. `ledgers` holds one ledger per storm of the scenario, in its order, every phi index
/// matched.
[[nodiscard]] std::string results_json(const Scenario& scenario,
                                       std::span<const SiteLedger> ledgers,
                                       std::span<const std::string> warnings);

}  // namespace rainledger
