#pragma once

#include <array>
#include <cstddef>
#include <optional>
#include <span>
#include <string_view>

#include "rainledger/fieldtest/readings.hpp"

// Whether the end of a test is steady, by named conventions.
//
// * last_three_within_tenth: the last three rates differ by less than 10 % of their mean, and the
//   steady rate is their mean (common practice, from memory);
// * less_than_tenth_in_an_hour: the basic intake rate, where the rate changes by less than 10 % of
//   itself within one hour (USDA Soil Conservation Service, National Engineering Handbook, section
//   15, chapter 1, "Soil-plant-water relationships", and its border irrigation chapter; from
//   memory).
namespace rainledger {

enum class SteadyConvention { last_three_within_tenth, less_than_tenth_in_an_hour };
inline constexpr std::array kSteadyConventions{SteadyConvention::last_three_within_tenth,
                                               SteadyConvention::less_than_tenth_in_an_hour};

/// The convention in words: "last three rates within 10 %", "less than 10 % change in an hour".
[[nodiscard]] std::string_view steady_convention_words(SteadyConvention convention);

/// What a convention says of a test. The mean is of the interval rates of the steady readings, each
/// counted once; its error is their standard deviation over the root of their number, and its 95 %
/// interval Student's. Where the test is not steady, the mean is of the last three rates (of all,
/// where there are fewer) and stands for want of better.
struct SteadyRate {
    SteadyConvention convention = SteadyConvention::last_three_within_tenth;
    bool steady = false;
    /// Too few readings, or too short a test, for the convention to say anything.
    bool undecided = false;
    std::size_t first_reading = 0;  ///< of those that the mean is of
    std::size_t readings = 0;       ///< how many those are
    double mean_mm_per_h = 0.0;
    std::optional<double> standard_error_mm_per_h = {};  ///< from two readings on
    std::optional<double> low_mm_per_h = {};
    std::optional<double> high_mm_per_h = {};
    /// What the convention judges: the span of the last three rates over their mean; the largest
    /// change within the last hour over the rate. Nothing where undecided.
    std::optional<double> relative_change = {};
};

/// The steady stretch is the longest end of the test, of three readings or more, that keeps the
/// convention: all rates within 10 % of their mean; or, from the first of them on, no rate further
/// than 10 % from any one of the hour before it (of neighbours more than an hour apart, the share
/// of their change that falls to an hour). Times are those of the intervals' middles. A test that
/// has run dry, its last rates all 0, is steady. The test must have at least one reading.
[[nodiscard]] SteadyRate steady_rate(const InfiltrationTest& test, SteadyConvention convention);

/// Time at which the rate of F = a t^b changes by 10 % of itself in an hour, h: 10 (1 - b), the
/// 600 (1 - b) min of the handbook. For 0 <= b <= 1.
[[nodiscard]] double kostiakov_steady_time_h(double exponent);

}  // namespace rainledger
