#pragma once

#include <cstddef>
#include <string>
#include <string_view>

// Text that came from outside, made safe to show.
namespace rainledger {

/// Length of the well-formed UTF-8 character of one to four bytes that begins at `at`; 0 if there
/// is none (Unicode Standard, table 3-7, "Well-formed UTF-8 byte sequences", from memory).
[[nodiscard]] std::size_t utf8_length(std::string_view text, std::size_t at);

/// `text` with every control character (C0, DEL, C1) and everything that turns the direction or
/// ends a line in Unicode shown as '?', and bytes that are no UTF-8 as U+FFFD: a name or a title
/// cannot move the cursor, change colours or reorder what is read.
[[nodiscard]] std::string printable(std::string_view text);

}  // namespace rainledger
