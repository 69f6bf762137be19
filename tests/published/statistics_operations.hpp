#pragma once

#include <span>

#include "published/operations.hpp"

namespace rainledger::published {

/// The operations on intensity formulas.
[[nodiscard]] std::span<const Operation> statistics_operations();

}  // namespace rainledger::published
