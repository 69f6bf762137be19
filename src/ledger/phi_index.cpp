#include "ledger/phi_index.hpp"

#include <algorithm>
#include <cmath>

#include "ledger/recorders.hpp"

namespace rainledger {
namespace {

constexpr double kLimitTolerance = 1.0e-9;

double excess_at(double rate, const Surface& surface, const Hyetograph& rain,
                 const MarchInput& input) {
    TotalsRecorder recorder;
    const ConstantRate law{rate, 0.0};
    March<ConstantRate, TotalsRecorder>(law, surface, input, recorder).run(rain);
    return recorder.total().excess_mm;
}

double peak_supply(const Hyetograph& rain, const RateSeries* run_on) {
    double peak = 0.0;
    for (std::size_t step = 0; step < rain.steps(); ++step)
        for_each_piece(run_on, step, rain.duration_h[step], [&](double, double, double rate) {
            peak = std::max(peak, rain.intensity_mm_per_h(step) + rate);
        });
    return peak;
}

}  // namespace

PhiMatch match_phi_index(const PhiIndex& phi, const Surface& surface, const Hyetograph& rain,
                         const MarchInput& input) {
    const double observed = phi.observed_excess_mm;
    const double most = excess_at(0.0, surface, rain, input);
    if (observed > most * (1.0 + kLimitTolerance)) return UnmatchedPhi{0, observed, most};
    if (observed >= most * (1.0 - kLimitTolerance)) return ConstantRate{};
    double too_low = 0.0;  // leaves more than observed
    const double peak = peak_supply(rain, input.run_on);
    double enough = peak;
    // At most 64 halvings separate any two doubles of one order; small rates take more, up to 1100.
    while (true) {
        const double middle = too_low + 0.5 * (enough - too_low);
        if (middle <= too_low || middle >= enough) break;
        (excess_at(middle, surface, rain, input) > observed ? too_low : enough) = middle;
    }
    // A rate equal to the supply takes all of it, and so does one short of it by a rounding.
    return ConstantRate{enough >= peak * (1.0 - 2.0 * kRateTolerance) ? peak : enough, 0.0};
}

}  // namespace rainledger
