#pragma once

#include <cstddef>
#include <string>
#include <string_view>
#include <vector>

// Numbers as they are printed in a source: "2.68 4.82 6.56 in" is three numbers and one unit. The
// digits are kept, since they say how far a value can be held to them.
namespace rainledger::published {

/// One printed number.
struct Printed {
    std::string text;
    double value = 0.0;
    int decimals = 0;  ///< digits after the point; negative for "12e3"
};

/// A row of printed numbers with the unit that follows them; no unit: plain numbers.
struct ValueRow {
    std::vector<Printed> numbers;
    std::string unit;
};

/// Reads a row. Throws std::runtime_error when `text` is anything else, or holds no number.
[[nodiscard]] ValueRow parse_value_row(std::string_view text);

/// True if `value`, in the unit of the printed number, rounds to it: it lies within half a unit of
/// the last printed digit. A tie counts as either neighbour, since sources differ there.
[[nodiscard]] bool prints_as(double value, const Printed& printed);

}  // namespace rainledger::published
