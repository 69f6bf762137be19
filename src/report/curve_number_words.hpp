#pragma once

#include <string>
#include <string_view>

#include "rainledger/losses/curve_number.hpp"

// A curve number as given, and what it became.
namespace rainledger {

/// The number that acts, after both conversions, and its retention curve.
struct CurveNumberInUse {
    double for_condition = 100.0;      ///< after the antecedent condition
    double number_used = 100.0;        ///< after the change of ratio too
    bool condition_converted = false;  ///< condition I or III
    bool ratio_converted = false;      ///< from the tabulated ratio 0.2 to 0.05
    RetentionCurve curve;
};
[[nodiscard]] CurveNumberInUse number_in_use(const CurveNumber& given);

/// "I", "II" or "III".
[[nodiscard]] std::string_view condition_name(AntecedentCondition condition);

/// The published sources of the conversions that were made, "; " between two; empty without one.
[[nodiscard]] std::string conversion_source(const CurveNumberInUse& use);

}  // namespace rainledger
