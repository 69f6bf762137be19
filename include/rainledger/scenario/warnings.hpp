#pragma once

#include "rainledger/base/diagnostic.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/scenario/scenario.hpp"

// What only the march can tell: warnings where a result could mislead, and faults of the input that
// show in the ledger.
namespace rainledger {

/// Adds warnings about one storm's ledger, at the place of the surface's or the storm's name. The
/// text begins with that name, and tells the storm where it is not "storm": "lawn in morning: ...".
///
/// - record taken as dry where it had holes;
/// - a curve number with less than 12.7 mm (0.5 inch) of excess, under rain;
/// - a storm step, the one in which a surface first ponds, longer than half the time from the first
///   rain to ponding; not where ponding comes with the first rain, nor on impervious surfaces;
/// - run-on below an infiltrating giver handed over more coarsely than intended.
void warn_of_results(const Scenario& scenario, const Storm& storm, const SiteLedger& ledger,
                     Diagnostics& diagnostics);

/// Adds an error at `observed_excess` for every phi index that the march could not match. Nothing
/// is added where all were matched.
void report_unmatched(const Scenario& scenario, const Storm& storm, const SiteLedger& ledger,
                      Diagnostics& diagnostics);

}  // namespace rainledger
