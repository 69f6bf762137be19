#pragma once

#include <string_view>

namespace rainledger {

/// The program's version, "0.1.0".
[[nodiscard]] std::string_view version();

}  // namespace rainledger
