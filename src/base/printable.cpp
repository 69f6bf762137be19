#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kReplacement = "\xEF\xBF\xBD";  // U+FFFD

unsigned byte_at(std::string_view text, std::size_t i) {
    return static_cast<unsigned char>(text[i]);
}

/// What a lead byte announces: how many bytes follow, and the range of the first of them (narrower
/// than 80..BF where overlong forms, surrogates and values past U+10FFFF begin).
struct Sequence {
    std::size_t following = 0;  // 0: no lead byte of a sequence
    unsigned lowest = 0x80U;
    unsigned highest = 0xBFU;
};

Sequence sequence_of(unsigned lead) {
    if (lead >= 0xC2U && lead <= 0xDFU) return {1};
    if (lead == 0xE0U) return {2, 0xA0U, 0xBFU};
    if (lead == 0xEDU) return {2, 0x80U, 0x9FU};
    if (lead >= 0xE1U && lead <= 0xEFU) return {2};
    if (lead == 0xF0U) return {3, 0x90U, 0xBFU};
    if (lead >= 0xF1U && lead <= 0xF3U) return {3};
    if (lead == 0xF4U) return {3, 0x80U, 0x8FU};
    return {};
}

/// Whether a well-formed character acts on what is around it instead of being shown.
bool is_active(std::string_view character) {
    const unsigned first = byte_at(character, 0);
    if (character.size() == 1) return first < 0x20U || first == 0x7FU;
    const unsigned second = byte_at(character, 1);
    if (character.size() == 2) return first == 0xC2U && second <= 0x9FU;  // C1
    if (character.size() != 3 || first != 0xE2U) return false;
    const unsigned third = byte_at(character, 2);
    // U+2028, U+2029 end lines, U+202A to U+202E and U+2066 to U+2069 turn the direction.
    if (second == 0x80U) return third >= 0xA8U && third <= 0xAEU;
    return second == 0x81U && third >= 0xA6U && third <= 0xA9U;
}

}  // namespace

std::size_t utf8_length(std::string_view text, std::size_t at) {
    if (byte_at(text, at) < 0x80U) return 1;
    const Sequence sequence = sequence_of(byte_at(text, at));
    if (sequence.following == 0 || at + sequence.following >= text.size()) return 0;
    const unsigned second = byte_at(text, at + 1);
    if (second < sequence.lowest || second > sequence.highest) return 0;
    for (std::size_t i = at + 2; i <= at + sequence.following; ++i)
        if ((byte_at(text, i) & 0xC0U) != 0x80U) return 0;
    return sequence.following + 1;
}

std::string printable(std::string_view text) {
    std::string out;
    out.reserve(text.size());
    for (std::size_t i = 0; i < text.size();) {
        const std::size_t length = utf8_length(text, i);
        const std::string_view character = text.substr(i, length);
        if (length == 0) {
            out += kReplacement;
        } else if (is_active(character)) {
            out += '?';
        } else {
            out += character;
        }
        i += length > 0 ? length : 1;
    }
    return out;
}

}  // namespace rainledger
