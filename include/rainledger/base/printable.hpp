#pragma once

#include <string>
#include <string_view>

// Text that came from outside, made safe to show on a terminal.
namespace rainledger {

/// `text` with every control character (C0, DEL, and C1 as UTF-8 writes it) shown as '?': a name or
/// a title cannot move the cursor or change colours.
[[nodiscard]] std::string printable(std::string_view text);

}  // namespace rainledger
