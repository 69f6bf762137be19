#pragma once

#include <optional>
#include <span>
#include <string_view>

#include "rainledger/reference/answer.hpp"
#include "rainledger/reference/provenance.hpp"
#include "rainledger/reference/published_value.hpp"

// Interception by vegetation in one storm (Horton 1919).
namespace rainledger {

/// A formula as printed, in inches: (a + b P^n), for crops times the crop's height in feet.
struct InterceptionRow {
    std::string_view name;
    double constant_in = 0.0;  ///< a
    double share = 0.0;        ///< b
    double exponent = 1.0;     ///< n
    bool per_foot_of_height = false;
    Provenance provenance;
};

[[nodiscard]] std::span<const InterceptionRow> interception_rows();
[[nodiscard]] RowView view_of(const InterceptionRow& row);

/// The depth held of a storm of `rain_mm`, never more than the rain. A crop needs its height, mm,
/// above 0; a height given for anything else is refused, and so is rain below 0 or not finite.
[[nodiscard]] Answer<double> interception_mm(const InterceptionRow& row, double rain_mm,
                                             std::optional<double> crop_height_mm = {});

}  // namespace rainledger
