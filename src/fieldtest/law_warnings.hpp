#pragma once

#include <span>
#include <string_view>
#include <vector>

#include "rainledger/fieldtest/law_fits.hpp"

namespace rainledger {

/// A parameter in words, without its unit: "initial capacity".
[[nodiscard]] std::string_view words_of_parameter(std::string_view key);

/// What the practitioner must know of a fit to `tests`, from its parameters, the readings against
/// them, and its residuals.
[[nodiscard]] std::vector<FitWarning> law_warnings(const LawFit& fit,
                                                   std::span<const InfiltrationTest> tests);

}  // namespace rainledger
