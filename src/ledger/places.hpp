#pragma once

#include <vector>

#include "rainledger/ledger/ledger.hpp"

// The ledgers of the places drained to and of the whole site.
namespace rainledger {

/// One ledger per place, in order of first mention: area-weighted over the surfaces that drain to
/// it. Its run-on is what arrives from surfaces draining elsewhere less what is sent to such; its
/// excess is what reaches the place.
[[nodiscard]] std::vector<PlaceLedger> place_ledgers(const Site& site,
                                                     const std::vector<SurfaceLedger>& surfaces,
                                                     const Hyetograph& rain);

/// The ledger of the site: every surface, run-on among them cancelling to zero.
[[nodiscard]] PlaceLedger site_ledger(const Site& site, const std::vector<SurfaceLedger>& surfaces,
                                      const Hyetograph& rain);

}  // namespace rainledger
