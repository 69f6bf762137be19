#pragma once

#include <span>

#include "published/operations.hpp"

// Operations on the tables and regressions of the room `reference`. Rows count from 1 in the
// table's order; textures from 1, sand, to 12, clay; soil groups from 1, A, to 4, D.
namespace rainledger::published {

/// Soil by texture, regressions, soil groups.
[[nodiscard]] std::span<const Operation> soil_operations();

/// Curve numbers by cover, Horton's parameters, storage, interception and steady rates.
[[nodiscard]] std::span<const Operation> cover_operations();

}  // namespace rainledger::published
