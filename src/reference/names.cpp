#include "rainledger/reference/names.hpp"

#include <string>

namespace rainledger {
namespace {

/// Letters in lower case, digits, slashes and bytes beyond ASCII; the rest is left out.
std::string bare(std::string_view name) {
    std::string out;
    for (const char c : name) {
        const bool lower = c >= 'a' && c <= 'z';
        const bool digit = c >= '0' && c <= '9';
        const bool beyond = static_cast<unsigned char>(c) >= 0x80U;
        if (c >= 'A' && c <= 'Z') out += static_cast<char>(c - 'A' + 'a');
        if (lower || digit || beyond || c == '/') out += c;
    }
    return out;
}

}  // namespace

bool same_name(std::string_view a, std::string_view b) {
    const std::string typed = bare(a);
    return !typed.empty() && typed == bare(b);
}

bool mentions(std::string_view name, std::string_view typed) {
    const std::string part = bare(typed);
    return !part.empty() && bare(name).find(part) != std::string::npos;
}

std::optional<std::size_t> find_name(std::string_view typed,
                                     std::span<const std::string_view> known) {
    for (std::size_t i = 0; i < known.size(); ++i)
        if (same_name(typed, known[i])) return i;
    return std::nullopt;
}

}  // namespace rainledger
