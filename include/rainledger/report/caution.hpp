#pragma once

#include <string_view>

namespace rainledger {

/// The line that stands under every result of losses.
inline constexpr std::string_view kCaution =
    "This is an estimate from assumed losses; local codes and a licensed engineer decide.";

/// The line that stands under every storm, table of statistics and list of events.
inline constexpr std::string_view kRainCaution =
    "Rain figures are estimates from past records; local codes and a licensed engineer decide.";

/// The words that stand under every look-up.
inline constexpr std::string_view kLookupCaution =
    "Published values are means that scatter widely; local codes and a licensed engineer decide.";

}  // namespace rainledger
