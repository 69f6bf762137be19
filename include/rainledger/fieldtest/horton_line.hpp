#pragma once

#include <cstddef>
#include <optional>
#include <span>
#include <string>

#include "rainledger/fieldtest/readings.hpp"
#include "rainledger/losses/horton.hpp"

// Horton's parameters by the classical straight line (common practice since Horton 1940): with fc
// known, ln(f - fc) falls along a line on time, of slope -k and intercept ln(f0 - fc), fitted by
// ordinary least squares.
//
// The line is biased. Taking logarithms gives readings near fc, where f - fc is mostly error, the
// most weight; readings at or below fc cannot be taken at all, so that low errors drop out; fc is
// taken as known; and a mean rate is not the rate at the interval's end.
namespace rainledger {

/// Where in its interval a mean rate is put.
enum class RatePlace { interval_end, interval_middle };

/// A rate at a time.
struct TimedRate {
    double time_h = 0.0;
    double rate_mm_per_h = 0.0;
};

struct HortonLine {
    HortonCurve curve;
    std::size_t used = 0;
    std::size_t left_out = 0;  ///< at or below fc
    double r_squared = 0.0;    ///< of the line, on ln(f - fc); 1 for two points
    std::optional<double> decay_standard_error_per_h = {};  ///< of the slope, from three points on
};

/// The line, or why there is none; what was left out stands in either case.
struct HortonLineAnswer {
    std::optional<HortonLine> line;
    std::string problem;
    std::size_t left_out = 0;
};

/// The line through rates with fc = `final_capacity_mm_per_h` >= 0. Two rates above fc are needed,
/// and they must fall.
[[nodiscard]] HortonLineAnswer fit_horton_line(std::span<const TimedRate> rates,
                                               double final_capacity_mm_per_h);

/// The line through a test's mean interval rates.
[[nodiscard]] HortonLineAnswer fit_horton_line(const InfiltrationTest& test, RatePlace place,
                                               double final_capacity_mm_per_h);

}  // namespace rainledger
