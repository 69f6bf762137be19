#pragma once

#include <variant>

#include "ledger/march.hpp"

// Matching a phi index: the smallest constant rate that leaves the observed excess.
namespace rainledger {

/// The rate matched, or the excess at rate zero where even that is too little.
using PhiMatch = std::variant<ConstantRate, UnmatchedPhi>;

/// Matches `phi` on `surface` under its rain and run-on. Excess falls as the rate rises, so the
/// rate is found by halving between zero and the peak supply down to neighbouring doubles; limits
/// are judged to 1e-9 relative.
[[nodiscard]] PhiMatch match_phi_index(const PhiIndex& phi, const Surface& surface,
                                       const Hyetograph& rain, const MarchInput& input);

}  // namespace rainledger
