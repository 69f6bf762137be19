#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

// Whether bytes are text at all, before anything reads them as YAML.
namespace rainledger {

/// Removes a UTF-8 byte-order mark.
void strip_byte_order_mark(std::string& text);

/// The first byte that is NUL or breaks UTF-8 (RFC 3629: no overlong forms, no surrogates).
[[nodiscard]] std::optional<std::size_t> first_byte_not_text(std::string_view text);

}  // namespace rainledger
