#include "published/design_operations.hpp"

#include <algorithm>
#include <array>
#include <functional>
#include <stdexcept>

#include "rainledger/rain/design_storm.hpp"
#include "rainledger/rain/mass_curve.hpp"
#include "rainledger/reference/mass_curves.hpp"

namespace rainledger::published {
namespace {

using enum Dimension;
using enum BetweenPoints;

// --- Mass curves. ---

constexpr double kNrcsHours = 24.0;

/// A time as a share of the storm: in hours of an NRCS curve's day, or in per cent.
double time_share(Inputs& in, const std::string& name, std::size_t i) {
    if (in.has(name)) return in.quantity(name, time, i) / kNrcsHours;
    return in.number(name + "_percent", i) / 100.0;
}

/// What has fallen by a time, or between two.
double fallen(const MassCurve& curve, Inputs& in, std::size_t i) {
    if (in.has("time") || in.has("time_percent")) return curve.depth_at(time_share(in, "time", i));
    return curve.depth_at(time_share(in, "to", i)) - curve.depth_at(time_share(in, "from", i));
}

template <std::size_t entry, BetweenPoints how = linear>
double curve_share(Inputs& in, std::size_t i) {
    return fallen(MassCurve(mass_curve_table()[entry].points, how), in, i);
}

template <std::size_t entry>
double curve_percent(Inputs& in, std::size_t i) {
    return 100.0 * curve_share<entry>(in, i);
}

// --- Formulas and the storms made from them. ---

IntensityFormula formula(Inputs& in, std::size_t i) {
    return {in.quantity("a", rate, i), in.number("b", i), in.number("m", i), 1.0, 1.0 / 60.0};
}

Hyetograph storm(StormPattern pattern, std::variant<double, DepthDuration> total, Inputs& in,
                 std::size_t i, double every_h) {
    DesignRequest request{pattern,          in.quantity("duration", time, i),
                          every_h,          in.number("peak_at", i),
                          std::move(total), std::nullopt};
    DesignStorm made = make_design_storm(request);
    if (!made.rain) throw std::runtime_error(made.problem);
    return *std::move(made.rain);
}

Hyetograph formula_storm(StormPattern pattern, Inputs& in, std::size_t i) {
    return storm(pattern, DepthDuration{formula(in, i)}, in, i, in.quantity("every", time, i));
}

double block_cumulative_depth(Inputs& in, std::size_t i) {
    return depth_of(DepthDuration{formula(in, i)}, in.quantity("time", time, i))
        .depth_mm.value_or(0.0);
}

double block_in_falling_order(Inputs& in, std::size_t i) {
    Hyetograph rain = formula_storm(StormPattern::alternating_blocks, in, i);
    std::sort(rain.depth_mm.begin(), rain.depth_mm.end(), std::greater<>());
    return rain.depth_mm.at(i);
}

double block_in_time_order(Inputs& in, std::size_t i) {
    return formula_storm(StormPattern::alternating_blocks, in, i).depth_mm.at(i);
}

double block_total(Inputs& in, std::size_t i) {
    return total_depth_mm(formula_storm(StormPattern::alternating_blocks, in, i));
}

double keifer_chu_step(Inputs& in, std::size_t i) {
    return formula_storm(StormPattern::keifer_chu, in, i).depth_mm.at(i);
}

double keifer_chu_total(Inputs& in, std::size_t i) {
    return total_depth_mm(formula_storm(StormPattern::keifer_chu, in, i));
}

/// A triangle's storm in two steps or more that meet at its peak.
Hyetograph triangle(Inputs& in, std::size_t i) {
    const double rising_h = in.number("peak_at", i) * in.quantity("duration", time, i);
    return storm(StormPattern::triangular, in.quantity("depth", depth, i), in, i, rising_h);
}

double triangle_peak_time(Inputs& in, std::size_t i) {
    return triangle(in, i).edges_h[1];
}

double triangle_depth_to_peak(Inputs& in, std::size_t i) {
    return triangle(in, i).depth_mm.front();
}

/// Twice the mean of the rising side.
double triangle_peak_intensity(Inputs& in, std::size_t i) {
    return 2.0 * triangle(in, i).intensity_mm_per_h(0);
}

constexpr std::array kOperations{
    Operation{"nrcs_I_share", {}, curve_share<0>},
    Operation{"nrcs_IA_share", {}, curve_share<1>},
    Operation{"nrcs_II_share", {}, curve_share<2>},
    Operation{"nrcs_II_percent", {}, curve_percent<2>},
    Operation{"nrcs_III_share", {}, curve_share<3>},
    Operation{"nrcs_III_percent", {}, curve_percent<3>},
    Operation{"nrcs_III_smooth_share", {}, curve_share<3, smooth>},
    Operation{"huff_1_percent", {}, curve_percent<4>},
    Operation{"huff_2_percent", {}, curve_percent<5>},
    Operation{"huff_3_percent", {}, curve_percent<6>},
    Operation{"huff_4_percent", {}, curve_percent<7>},
    Operation{"block_cumulative_depth", depth, block_cumulative_depth},
    Operation{"block_in_falling_order", depth, block_in_falling_order},
    Operation{"block_in_time_order", depth, block_in_time_order},
    Operation{"block_total", depth, block_total},
    Operation{"keifer_chu_step", depth, keifer_chu_step},
    Operation{"keifer_chu_total", depth, keifer_chu_total},
    Operation{"triangle_peak_time", time, triangle_peak_time},
    Operation{"triangle_depth_to_peak", depth, triangle_depth_to_peak},
    Operation{"triangle_peak_intensity", rate, triangle_peak_intensity},
};

}  // namespace

std::span<const Operation> design_operations() {
    return kOperations;
}

}  // namespace rainledger::published
