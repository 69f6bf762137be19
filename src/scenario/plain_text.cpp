#include "scenario/plain_text.hpp"

#include <algorithm>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/printable.hpp"

namespace rainledger {

void strip_byte_order_mark(std::string& text) {
    if (text.starts_with("\xEF\xBB\xBF")) text.erase(0, 3);
}

std::optional<std::size_t> first_byte_not_text(std::string_view text) {
    std::size_t at = 0;
    while (at < text.size()) {
        const std::size_t length = text[at] == '\0' ? 0 : utf8_length(text, at);
        if (length == 0) return at;
        at += length;
    }
    return std::nullopt;
}

bool holds_hidden_characters(std::string_view text) {
    return printable(text) != text;
}

bool is_blank(std::string_view text) {
    return text.find_first_not_of(" \t") == std::string_view::npos;
}

std::optional<std::string> with_blank_after_colon(std::string_view text) {
    const auto is_word = [](char c) {
        return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || (c >= '0' && c <= '9') ||
               c == '_' || c == '-' || c == ' ';
    };
    const std::size_t colon = text.find(':');
    if (colon == 0 || colon == std::string_view::npos || colon + 1 == text.size())
        return std::nullopt;
    const char first = text[0];
    const char next = text[colon + 1];
    const bool starts_a_value = next != ' ' && next != '\t' && next != ':' && next != '/';
    if ((first >= '0' && first <= '9') || !starts_a_value) return std::nullopt;
    if (!std::ranges::all_of(text.substr(0, colon), is_word)) return std::nullopt;
    return std::string(text.substr(0, colon + 1)) + " " + std::string(text.substr(colon + 1));
}

std::string blank_hint(std::string_view apart) {
    return "write a blank after the colon: " + in_quotes(apart);
}

std::optional<std::string> hint_for_lone_key(std::string_view key) {
    if (const auto apart = with_blank_after_colon(key)) return blank_hint(*apart);
    if (key.empty() || key[0] < '0' || key[0] > '9') return std::nullopt;
    return "commas separate entries: write a decimal point, and no mark for thousands";
}

}  // namespace rainledger
