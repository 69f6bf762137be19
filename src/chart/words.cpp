#include "chart/words.hpp"

#include <algorithm>

#include "rainledger/base/printable.hpp"

namespace rainledger {
namespace {

// Wide scripts begin here (Unicode Standard Annex 11, from memory; emoji and the like included).
constexpr std::string_view kFirstWide = "\xE2\xBA\x80";  // U+2E80

std::size_t columns_of(std::string_view character) {
    return character.size() >= 3 && character >= kFirstWide ? 2 : 1;
}

}  // namespace

std::string shown_words(std::string_view text) {
    constexpr std::string_view kNoCharacter = "\xEF\xBF\xBE";
    constexpr std::string_view kNoCharacterEither = "\xEF\xBF\xBF";
    const std::string shown = printable(text);
    std::string out;
    for (std::size_t i = 0; i < shown.size();) {
        const std::string_view three = std::string_view(shown).substr(i, 3);
        const bool none = three == kNoCharacter || three == kNoCharacterEither;
        out += none ? '?' : shown[i];
        i += none ? 3 : 1;
    }
    return out;
}

std::string quoted(std::string_view text) {
    constexpr std::string_view kApostrophe = "\xE2\x80\x99";  // U+2019
    std::string out = "'";
    for (const char c : shown_words(text)) {
        if (c == '\'') {
            out += kApostrophe;
        } else {
            out += c;
        }
    }
    return out + "'";
}

std::string shortened(std::string_view text, std::size_t most) {
    constexpr std::string_view kDots = "...";
    std::size_t used = 0;
    std::size_t fits = 0;  // bytes that leave room for the dots
    for (std::size_t i = 0; i < text.size();) {
        const std::size_t length = std::max<std::size_t>(utf8_length(text, i), 1);
        used += columns_of(text.substr(i, length));
        if (used > most) return std::string(text.substr(0, fits)) + std::string(kDots);
        i += length;
        if (used + kDots.size() <= most) fits = i;
    }
    return std::string(text);
}

std::size_t columns_used(std::string_view text) {
    std::size_t used = 0;
    for (std::size_t i = 0; i < text.size();) {
        const std::size_t length = std::max<std::size_t>(utf8_length(text, i), 1);
        used += columns_of(text.substr(i, length));
        i += length;
    }
    return used;
}

}  // namespace rainledger
