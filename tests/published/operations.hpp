#pragma once

#include <cstddef>
#include <optional>
#include <string_view>

#include "published/inputs.hpp"
#include "rainledger/base/quantity.hpp"

namespace rainledger::published {

/// One of the library's functions under the name that the check files use.
struct Operation {
    std::string_view name;
    std::optional<Dimension> dimension;  ///< of its value; empty: a plain number
    double (*value)(Inputs& inputs, std::size_t item);
};

/// The operation called `name`. Throws std::runtime_error if there is none.
[[nodiscard]] const Operation& find_operation(std::string_view name);

}  // namespace rainledger::published
