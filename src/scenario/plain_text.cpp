#include "scenario/plain_text.hpp"

namespace rainledger {
namespace {

/// The bytes of the character that begins at `at`; 0 if it is none.
std::size_t character_length(std::string_view text, std::size_t at) {
    const auto byte = [&](std::size_t i) {
        return i < text.size() ? static_cast<unsigned char>(text[i]) : 0U;
    };
    const auto follows = [&](std::size_t i) { return (byte(i) & 0xC0U) == 0x80U; };
    const unsigned lead = byte(at);
    const unsigned second = byte(at + 1);
    if (lead == 0U) return 0;
    if (lead < 0x80U) return 1;
    if (lead < 0xC2U || lead > 0xF4U || !follows(at + 1)) return 0;
    if (lead < 0xE0U) return 2;
    if (!follows(at + 2)) return 0;
    if (lead < 0xF0U) {
        const bool overlong = lead == 0xE0U && second < 0xA0U;
        const bool surrogate = lead == 0xEDU && second >= 0xA0U;
        return overlong || surrogate ? 0 : 3;
    }
    const bool overlong = lead == 0xF0U && second < 0x90U;
    const bool beyond = lead == 0xF4U && second >= 0x90U;
    return overlong || beyond || !follows(at + 3) ? 0 : 4;
}

}  // namespace

void strip_byte_order_mark(std::string& text) {
    if (text.starts_with("\xEF\xBB\xBF")) text.erase(0, 3);
}

std::optional<std::size_t> first_byte_not_text(std::string_view text) {
    std::size_t at = 0;
    while (at < text.size()) {
        const std::size_t length = character_length(text, at);
        if (length == 0) return at;
        at += length;
    }
    return std::nullopt;
}

}  // namespace rainledger
