#pragma once

#include <string_view>

namespace rainledger {

/// The line that stands under every result.
inline constexpr std::string_view kCaution =
    "This is an estimate from assumed losses; local codes and a licensed engineer decide.";

}  // namespace rainledger
