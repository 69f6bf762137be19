#include "published/value_row.hpp"

#include <charconv>
#include <cmath>
#include <sstream>
#include <stdexcept>

#include "rainledger/base/number.hpp"

namespace rainledger::published {
namespace {

// A tie that is exact in decimals may miss by a rounding in binary.
constexpr double kTieRoom = 1.0e-9;

int decimals_of(std::string_view text) {
    const std::size_t e = text.find_first_of("eE");
    const std::string_view mantissa = text.substr(0, e);
    const std::size_t point = mantissa.find('.');
    int decimals = 0;
    if (point != std::string_view::npos) decimals = static_cast<int>(mantissa.size() - point - 1);
    if (e == std::string_view::npos) return decimals;
    int exponent = 0;
    std::from_chars(text.data() + e + 1, text.data() + text.size(), exponent);
    return decimals - exponent;
}

}  // namespace

ValueRow parse_value_row(std::string_view text) {
    ValueRow row;
    std::istringstream words{std::string(text)};
    for (std::string word; words >> word;) {
        const auto value = parse_number(word);
        if (!row.unit.empty() || (!value && row.numbers.empty()))
            throw std::runtime_error("'" + std::string(text) + "' is not numbers and a unit");
        if (value)
            row.numbers.push_back({word, *value, decimals_of(word)});
        else
            row.unit = word;
    }
    if (row.numbers.empty()) throw std::runtime_error("no number where one is expected");
    return row;
}

bool prints_as(double value, const Printed& printed) {
    const double half = 0.5 * std::pow(10.0, -printed.decimals);
    return std::abs(value - printed.value) <= half * (1.0 + kTieRoom);
}

}  // namespace rainledger::published
