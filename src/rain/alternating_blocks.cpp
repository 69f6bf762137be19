#include "rain/alternating_blocks.hpp"

#include <algorithm>
#include <cmath>
#include <functional>
#include <utility>

namespace rainledger {
namespace {

constexpr double kSameInstant = 1e-9;  // in steps: an instant nearer to an edge stands on it
constexpr double kSameDepth = 1e-9;    // share of the total: below it two blocks are equal

/// The whole step that holds an instant, the earlier one on an edge. An instant in the shorter last
/// step falls to the whole step before it.
std::size_t peak_step(const StormSteps& steps, double peak_at) {
    const double instant = peak_at * steps.duration_h() / steps.every_h();
    const double edge = std::round(instant);
    const double step =
        std::abs(instant - edge) <= kSameInstant ? std::max(edge - 1.0, 0.0) : std::floor(instant);
    return std::min(static_cast<std::size_t>(step), steps.whole - 1);
}

/// The steps in the order in which they are filled: the peak's, then right, left, right, ..., and
/// the rest of the side that is left.
std::vector<std::size_t> filling_order(std::size_t whole, std::size_t peak) {
    std::vector<std::size_t> order{peak};
    order.reserve(whole);
    std::size_t right = peak + 1;
    std::size_t left = peak;  // steps still empty before the peak
    while (right < whole || left > 0) {
        if (right < whole) order.push_back(right++);
        if (left > 0) order.push_back(--left);
    }
    return order;
}

/// Blocks by duration: what each further step adds to the curve's depth, a shorter last one too.
StormDepths blocks_by_duration(const DepthDuration& curve, const StormSteps& steps) {
    StormDepths out;
    out.depth_mm.reserve(steps.count());
    double before_mm = 0.0;
    for (std::size_t edge = 1; edge <= steps.count(); ++edge) {
        DepthAnswer answer = depth_of(curve, steps.edge_h(edge));
        if (!answer.depth_mm) {
            out.problem = std::move(answer.problem);
            out.hint = std::move(answer.hint);
            return out;
        }
        // Never less than before: where the curve is flat, rounding alone could let it fall.
        const double depth_mm = std::max(*answer.depth_mm, before_mm);
        out.depth_mm.push_back(depth_mm - before_mm);
        before_mm = depth_mm;
    }
    return out;
}

/// Says where a block is larger than the one before it, which leaves windows of the storm with more
/// than their statistic.
void warn_of_rising_blocks(StormDepths& blocks, const StormSteps& steps, double total_mm) {
    for (std::size_t i = 1; i < steps.whole; ++i) {
        if (blocks.depth_mm[i] <= blocks.depth_mm[i - 1] + kSameDepth * total_mm) continue;
        blocks.warnings.push_back(
            "the depths by duration grow faster after " + duration_label(steps.edge_h(i)) +
            " than before it; the blocks stand in falling order all the same, so that the storm "
            "holds more than the statistic of some durations");
        return;
    }
}

}  // namespace

StormDepths alternating_blocks(const DepthDuration& curve, const StormSteps& steps,
                               double peak_at) {
    StormDepths blocks = blocks_by_duration(curve, steps);
    if (!blocks.problem.empty()) return blocks;
    double total_mm = 0.0;
    for (const double block_mm : blocks.depth_mm)
        total_mm += block_mm;
    warn_of_rising_blocks(blocks, steps, total_mm);
    std::vector<double> falling = blocks.depth_mm;
    const auto whole_end = falling.begin() + static_cast<std::ptrdiff_t>(steps.whole);
    std::stable_sort(falling.begin(), whole_end, std::greater<>());
    const std::vector<std::size_t> order = filling_order(steps.whole, peak_step(steps, peak_at));
    for (std::size_t i = 0; i < order.size(); ++i)
        blocks.depth_mm[order[i]] = falling[i];
    return blocks;
}

}  // namespace rainledger
