#include "rainledger/base/printable.hpp"

#include <cstddef>

namespace rainledger {

std::string printable(std::string_view text) {
    std::string out;
    out.reserve(text.size());
    for (std::size_t i = 0; i < text.size(); ++i) {
        const auto byte = static_cast<unsigned char>(text[i]);
        const unsigned next = i + 1 < text.size() ? static_cast<unsigned char>(text[i + 1]) : 0U;
        const bool is_c1 = byte == 0xC2U && next >= 0x80U && next <= 0x9FU;
        out.push_back(byte < 0x20U || byte == 0x7FU || is_c1 ? '?' : text[i]);
        if (is_c1) ++i;
    }
    return out;
}

}  // namespace rainledger
