#pragma once

#include <cmath>
#include <string>

#include "rainledger/base/number.hpp"

// Numbers in messages.
namespace rainledger {

/// To a thousandth at most, without trailing zeros: "40", "37.2".
[[nodiscard]] inline std::string brief(double value) {
    return shortest(std::round(value * 1000.0) / 1000.0);
}

/// A duration in h, under one hour in min: "2.5 h", "15 min".
[[nodiscard]] inline std::string brief_time(double hours) {
    return hours < 1.0 ? brief(hours * 60.0) + " min" : brief(hours) + " h";
}

}  // namespace rainledger
