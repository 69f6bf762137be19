#pragma once

#include <span>

#include "published/operations.hpp"

namespace rainledger::published {

/// The operations on field tests: reduction, straight lines, fits.
[[nodiscard]] std::span<const Operation> fieldtest_operations();

}  // namespace rainledger::published
