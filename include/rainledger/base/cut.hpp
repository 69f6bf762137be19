#pragma once

#include <cstddef>
#include <string>
#include <string_view>

// Values of the input in messages, kept short enough to read.
namespace rainledger {

/// `text` cut to `most` characters, with "..." where something was left out.
[[nodiscard]] inline std::string cut(std::string_view text, std::size_t most = 60) {
    std::size_t characters = 0;
    for (std::size_t i = 0; i < text.size(); ++i) {
        if ((static_cast<unsigned char>(text[i]) & 0xC0U) == 0x80U) continue;
        if (characters == most) return std::string(text.substr(0, i)) + "...";
        ++characters;
    }
    return std::string(text);
}

/// The same in quotes.
[[nodiscard]] inline std::string in_quotes(std::string_view text, std::size_t most = 60) {
    return "'" + cut(text, most) + "'";
}

}  // namespace rainledger
