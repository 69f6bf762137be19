#include "rainledger/base/number.hpp"

#include <array>
#include <charconv>
#include <cmath>
#include <system_error>

namespace rainledger {

std::optional<double> parse_number(std::string_view text) {
    if (text.starts_with('+')) {  // from_chars takes no plus sign
        text.remove_prefix(1);
        if (text.starts_with('-')) return std::nullopt;
    }
    double value = 0.0;
    const char* const end = text.data() + text.size();
    const auto [stop, error] = std::from_chars(text.data(), end, value);
    if (error != std::errc{} || stop != end || !std::isfinite(value)) return std::nullopt;
    return value;
}

void append_shortest(std::string& out, double value) {
    std::array<char, 32> buffer{};
    const auto result = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value);
    out.append(buffer.data(), result.ptr);
}

std::string shortest(double value) {
    std::string out;
    append_shortest(out, value);
    return out;
}

std::string fixed(double value, int decimals) {
    // 1.8e308 has 309 digits before the point.
    std::array<char, 400> buffer{};
    const auto result = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value,
                                      std::chars_format::fixed, decimals);
    std::string out(buffer.data(), result.ptr);
    if (out.starts_with('-') && out.find_first_not_of("-0.") == std::string::npos) out.erase(0, 1);
    return out;
}

std::string three_figures(double value) {
    // The decimals follow from the value as rounded, so that 9.999 prints 10.0 and not 10.00.
    for (int decimals = 3; decimals > 0; --decimals) {
        const double scale = std::pow(10.0, decimals);
        if (std::abs(std::round(value * scale)) < 1000.0) return fixed(value, decimals);
    }
    return fixed(value, 0);
}

}  // namespace rainledger
