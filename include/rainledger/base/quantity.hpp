#pragma once

#include <optional>
#include <string>
#include <string_view>

// Quantities with their units as text. Inside the program every quantity is a double in its
// dimension's canonical unit; text is converted here and nowhere else.
namespace rainledger {

/// What a quantity measures, with its canonical unit.
enum class Dimension {
    depth,       ///< mm
    rate,        ///< mm/h
    time,        ///< h
    decay,       ///< 1/h
    area,        ///< m2
    volume,      ///< m3
    discharge,   ///< L/s
    suction,     ///< mm of water
    sorptivity,  ///< mm/h^0.5
    frequency,   ///< yr (a return period)
};

/// A unit of one dimension: canonical value = value * multiply / divide. Two factors instead of one
/// keep conversions such as minutes to hours correctly rounded.
struct Unit {
    double multiply = 1.0;
    double divide = 1.0;

    [[nodiscard]] double to_canonical(double value) const { return value * multiply / divide; }
    [[nodiscard]] double from_canonical(double value) const { return value * divide / multiply; }
};

/// The unit written `name` in dimension `dimension`, if there is one.
[[nodiscard]] std::optional<Unit> find_unit(std::string_view name, Dimension dimension);

/// The accepted units of a dimension as text, most used first: "mm, cm, m, in, ft".
[[nodiscard]] std::string_view accepted_units(Dimension dimension);

/// A complete example of a quantity: "12.5 mm".
[[nodiscard]] std::string_view example_quantity(Dimension dimension);

/// The word for a dimension in a message: "depth", "rate".
[[nodiscard]] std::string_view dimension_name(Dimension dimension);

/// A quantity read from text, or what is wrong with it and what to write instead.
struct ParsedQuantity {
    std::optional<double> value;  ///< canonical unit
    std::string problem;          ///< empty when there is a value
    std::string hint;
};

/// Reads "12.5 mm": a number, optional blanks, a unit of the dimension. A bare number is refused.
[[nodiscard]] ParsedQuantity parse_quantity(std::string_view text, Dimension dimension);

/// Reads a share: a bare number ("0.4") or a percentage ("40 %"), as a fraction of one. The range
/// is the caller's to check.
[[nodiscard]] ParsedQuantity parse_share(std::string_view text);

/// Reads a dimensionless number; a number followed by a unit is refused.
[[nodiscard]] ParsedQuantity parse_bare_number(std::string_view text);

}  // namespace rainledger
