#pragma once

#include <span>
#include <vector>

#include "rainledger/fieldtest/law_fits.hpp"

namespace rainledger {

/// What the practitioner must know of a fit to `tests`, from its parameters, the readings against
/// them, and its residuals.
[[nodiscard]] std::vector<FitWarning> law_warnings(const LawFit& fit,
                                                   std::span<const InfiltrationTest> tests);

}  // namespace rainledger
