#pragma once

#include <span>

#include "published/operations.hpp"

namespace rainledger::published {

/// The operations on mass curves and design storms.
[[nodiscard]] std::span<const Operation> design_operations();

}  // namespace rainledger::published
