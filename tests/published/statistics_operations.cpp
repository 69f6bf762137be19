#include "published/statistics_operations.hpp"

#include <array>

#include "rainledger/rain/depth_duration.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;

constexpr double kMinute = 1.0 / 60.0;
constexpr double kHour = 1.0;

/// i = a / (t^m + b), t in minutes.
double formula_intensity(Inputs& in, std::size_t i) {
    const IntensityFormula formula{in.quantity("a", rate, i), in.number("b", i), in.number("m", i),
                                   1.0, kMinute};
    return intensity_mm_per_h(formula, in.quantity("time", time, i));
}

// --- i = a / (t + b), t in hours, through two points. ---

double hyperbola_intensity(Inputs& in, std::size_t i) {
    const IntensityFormula formula{in.quantity("a", rate, i), in.number("b", i), 1.0, 1.0, kHour};
    return intensity_mm_per_h(formula, in.quantity("time", time, i));
}

/// b of the curve through both points: i1 (t1 + b) = i2 (t2 + b).
double hyperbola_b(Inputs& in, std::size_t i) {
    const double t1 = in.quantity("first_time", time, i);
    const double t2 = in.quantity("second_time", time, i);
    const double i1 = in.quantity("first_intensity", rate, i);
    const double i2 = in.quantity("second_intensity", rate, i);
    return (i2 * t2 - i1 * t1) / (i1 - i2);
}

/// a of the curve with this b, or that of both points, through the first of them.
double hyperbola_a(Inputs& in, std::size_t i) {
    const double b = in.has("b") ? in.number("b", i) : hyperbola_b(in, i);
    const double with_a_of_1 =
        intensity_mm_per_h({1.0, b, 1.0, 1.0, kHour}, in.quantity("first_time", time, i));
    return in.quantity("first_intensity", rate, i) / with_a_of_1;
}

constexpr std::array kOperations{
    Operation{"formula_intensity", rate, formula_intensity},
    Operation{"hyperbola_intensity", rate, hyperbola_intensity},
    Operation{"hyperbola_a", rate, hyperbola_a},
    Operation{"hyperbola_b", {}, hyperbola_b},
};

}  // namespace

std::span<const Operation> statistics_operations() {
    return kOperations;
}

}  // namespace rainledger::published
