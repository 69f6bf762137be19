#pragma once

#include <string>
#include <vector>

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// What only the march can tell: warnings where a result could mislead, and faults of the input that
// show in the ledger.
namespace rainledger {

/// Warnings about one storm's ledger, as text that begins with the surface's name, and the storm's
/// where it is not "storm": "lawn: ...", "lawn in morning: ...". Warnings about the storm or the
/// whole site begin with "storm" or the storm's name, or "site". In order: the storm, the surfaces
/// in the site's order, the site.
///
/// - record taken as dry where it had holes;
/// - a curve number with excess above 0 and under 12.7 mm (0.5 inch);
/// - a storm step, the one in which a surface first ponds, longer than half the time from the first
///   rain to ponding; not where ponding comes with the first rain, nor on impervious surfaces;
/// - run-on below an infiltrating giver still moving an account after the finest cut.
[[nodiscard]] std::vector<std::string> result_warnings(const Storm& storm, const Site& site,
                                                       const SiteLedger& ledger);

/// Adds an error at `observed_excess` for every phi index that the march could not match. Nothing
/// is added where all were matched.
void report_unmatched(const Scenario& scenario, const Storm& storm, const SiteLedger& ledger,
                      Diagnostics& diagnostics);

}  // namespace rainledger
