#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "rainledger/base/quantity.hpp"

// The labels of a table of rainfall statistics: durations, return periods and the unit of its
// values.
namespace rainledger {

/// A label and the unit in square or round brackets at its end: "10 yr [mm]" is "10 yr" and "mm".
/// A colon behind them is left out.
struct LabelParts {
    std::string_view name;
    std::optional<std::string_view> unit;
};
[[nodiscard]] LabelParts take_apart_label(std::string_view label);
/// The unit of a cell that holds nothing else: "mm", "[mm]", "Depth (mm)".
[[nodiscard]] std::string_view unit_part(std::string_view cell);

/// A duration as a row label has it: "5 min", "5-min:", "24-hr", "2 days", or a bare number.
struct DurationLabel {
    double value = 0.0;        ///< > 0
    std::optional<Unit> unit;  ///< none for a bare number
};
[[nodiscard]] std::optional<DurationLabel> duration_in(std::string_view label);

/// A time unit in any spelling ("min", "minutes", "HR").
[[nodiscard]] std::optional<Unit> time_unit_of(std::string_view text);

/// A return period as a column label has it: "10", "10 yr", "10-year". Any number; the range is the
/// caller's to check.
struct PeriodLabel {
    double years = 0.0;
    bool has_unit = false;
};
[[nodiscard]] std::optional<PeriodLabel> period_in(std::string_view label);

/// The unit of the values: of depth, or of intensity.
struct ValueUnit {
    std::string name;  ///< as written
    Unit unit;
    bool is_rate = false;
};
/// The unit of depth or intensity that `text` is, in any spelling.
[[nodiscard]] std::optional<ValueUnit> value_unit_of(std::string_view text);
[[nodiscard]] bool is_same_unit(const ValueUnit& one, const ValueUnit& other);

}  // namespace rainledger
