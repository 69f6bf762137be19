#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "rainledger/base/quantity.hpp"

// Units as others write them. None is accepted; each finds the unit that was meant.
namespace rainledger {

/// The unit of the dimension that `typed` spells in another way ("sqm", "mm/hour", "h^-1").
[[nodiscard]] std::optional<std::string> meant_unit(std::string_view typed, Dimension dimension);

}  // namespace rainledger
