#pragma once

#include <span>
#include <vector>

#include "rainledger/fieldtest/field_fit.hpp"

namespace rainledger {

/// The fits to all pits together, and the spread between them. Where fc is the tail's, it is the
/// mean of the pits' tails.
[[nodiscard]] PooledFit pool_pits(std::span<const TestFit> pits, const FieldFitOptions& options);

}  // namespace rainledger
