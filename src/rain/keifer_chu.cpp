#include "rain/keifer_chu.hpp"

#include <algorithm>
#include <utility>

namespace rainledger {
namespace {

/// D(t) = t i(t), the formula's depth of the most intense stretch of length t.
double depth_mm(const IntensityFormula& formula, double duration_h) {
    return duration_h > 0.0 ? duration_h * intensity_mm_per_h(formula, duration_h) : 0.0;
}

/// The depth between the peak and the instant `from_peak_h` after it (before it: negative). The
/// stretch of length t around the peak lies r t before and (1 - r) t after it, so that a depth of
/// r D(tb / r) falls in the tb before the peak and (1 - r) D(ta / (1 - r)) in the ta after it;
/// their derivatives are the published intensities.
double from_peak_mm(const IntensityFormula& formula, double r, double from_peak_h) {
    if (from_peak_h == 0.0) return 0.0;
    if (from_peak_h < 0.0) return -r * depth_mm(formula, -from_peak_h / r);
    return (1.0 - r) * depth_mm(formula, from_peak_h / (1.0 - r));
}

StormDepths refused(std::string problem, std::string hint) {
    return {{}, std::move(problem), std::move(hint), {}};
}

/// Why the formula cannot be followed down to its peak. Up to the storm's duration depth_of has
/// judged it.
StormDepths check_near_peak(const IntensityFormula& formula) {
    if (formula.b < 0.0)
        return refused("with b below zero the formula has no intensity near the storm's peak",
                       "fit the formula with b of zero or more, or take alternating_blocks, which "
                       "needs it at whole steps only");
    if (formula.b == 0.0 && formula.m * formula.n >= 1.0)
        return refused(
            "with b of zero and m times n of 1 or more the formula's depth does not "
            "vanish with the duration, so that rain would fall in no time at the peak",
            "fit the formula with b above zero");
    return {};
}

}  // namespace

StormDepths keifer_chu(const DepthDuration& curve, const StormSteps& steps, double peak_at) {
    const auto* formula = std::get_if<IntensityFormula>(&curve);
    if (formula == nullptr)
        return refused("keifer_chu needs an intensity formula; this is a list of depths",
                       "fit a formula to the depths with 'rainledger storm --fit-formula', or take "
                       "alternating_blocks");
    DepthAnswer total = depth_of(curve, steps.duration_h());
    if (!total.depth_mm) return refused(std::move(total.problem), std::move(total.hint));
    StormDepths out = check_near_peak(*formula);
    if (!out.problem.empty()) return out;
    const double peak_h = peak_at * steps.duration_h();
    double before_mm = from_peak_mm(*formula, peak_at, -peak_h);
    for (std::size_t edge = 1; edge <= steps.count(); ++edge) {
        const double end_mm = from_peak_mm(*formula, peak_at, steps.edge_h(edge) - peak_h);
        // Rounding alone could make the depth of a step next to nothing negative.
        out.depth_mm.push_back(std::max(end_mm - before_mm, 0.0));
        before_mm = std::max(before_mm, end_mm);
    }
    return out;
}

}  // namespace rainledger
