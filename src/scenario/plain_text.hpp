#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

// Whether bytes are text at all, before anything reads them as YAML, and whether text is fit to be
// a name.
namespace rainledger {

/// Removes a UTF-8 byte-order mark.
void strip_byte_order_mark(std::string& text);

/// The first byte that is NUL or breaks UTF-8 (RFC 3629: no overlong forms, no surrogates).
[[nodiscard]] std::optional<std::size_t> first_byte_not_text(std::string_view text);

/// Whether UTF-8 text holds characters that are not shown but act on what is: controls (C0, DEL,
/// C1), Unicode ends of lines and marks of direction.
[[nodiscard]] bool holds_hidden_characters(std::string_view text);

/// What such characters are and what to do, for a hint.
inline constexpr const char* kHiddenHint =
    "control characters, line ends and marks of writing direction cannot stand in it: write it "
    "anew on one line";

/// Whether there is nothing but blanks.
[[nodiscard]] bool is_blank(std::string_view text);

/// "area: 1 ha" for "area:1 ha": a key and its value that YAML takes for one text.
[[nodiscard]] std::optional<std::string> with_blank_after_colon(std::string_view text);

/// How to write a text that with_blank_after_colon mended.
[[nodiscard]] std::string blank_hint(std::string_view apart);

/// What went wrong where a key without a value is no key at all: the blank after a colon is
/// missing, or a comma within a number began a new entry. Nothing for other words.
[[nodiscard]] std::optional<std::string> hint_for_lone_key(std::string_view key);

}  // namespace rainledger
