#include "rainledger/base/number.hpp"

#include <algorithm>
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
    constexpr int kMostDecimals = 6;
    if (!(std::abs(value) >= 0.5e-6)) return "0";
    // The place of the first figure is that of the value as rounded: 9.999 prints 10.0, not 10.00.
    int first = static_cast<int>(std::floor(std::log10(std::abs(value))));
    const double unit = std::pow(10.0, first - 2);
    if (std::round(std::abs(value) / unit) >= 1000.0) ++first;
    if (first > 2) {
        const double last = std::pow(10.0, first - 2);
        return fixed(std::round(value / last) * last, 0);
    }
    return fixed(value, std::min(2 - first, kMostDecimals));
}

}  // namespace rainledger
